//! The limit of a movement as a length: the tightest of its bounds on the span that it refers to.

use crate::limits::{Bound, Limit, LimitFrom};
use crate::quantity::{Length, Ratio, min};
use crate::results::{Stretch, StretchKind};
use crate::workings::decimal::{Decimal, three_figures};
use crate::workings::lines::step;
use crate::workings::symbol::Symbol;
use crate::workings::unit::Unit;
use crate::workings::{Number, Workings, glossary};

/// The bounds as the clause column of a table prints them: "span/500, 10 mm".
pub fn bounds(limit: &Limit) -> String {
    let words: Vec<String> = limit.bounds.iter().map(bound).collect();
    words.join(", ")
}

fn bound(bound: &Bound) -> String {
    match bound {
        Bound::SpanOver(n) => format!("span/{}", plain(*n, Unit::One)),
        Bound::Length(length) => format!("{} mm", plain(length.si(), Unit::Mm)),
        Bound::OneIn(n) => format!("1/{}", plain(*n, Unit::One)),
    }
}

/// As typed where that is short, else at three figures.
fn plain(si: f64, unit: Unit) -> String {
    match Decimal::as_typed(si, 5) {
        Some(typed) => typed.moved(-unit.power()).without_trailing_zeros().to_string(),
        None => three_figures(si, unit),
    }
}

/// "span/250", with the name of the set that it comes from: "1/500, masonry".
pub fn with_set(limit: &Limit) -> String {
    match set(&limit.from) {
        Some(set) => format!("{}, {set}", bounds(limit)),
        None => bounds(limit),
    }
}

fn set(from: &LimitFrom) -> Option<&'static str> {
    match from {
        LimitFrom::Given { .. } => None,
        LimitFrom::Set(set) => Some(set.name()),
        LimitFrom::SameAsTotal(from) => set(from),
    }
}

/// "masonry: span/500, 10 mm; common practice".
fn source(limit: &Limit) -> String {
    match &limit.from {
        LimitFrom::Given { reason: Some(reason) } => format!("{}: {reason}", bounds(limit)),
        LimitFrom::Given { reason: None } => format!("{}, as asked for", bounds(limit)),
        LimitFrom::Set(set) => format!("{}: {}; {}", set.name(), bounds(limit), set.source(limit.movement)),
        LimitFrom::SameAsTotal(from) => {
            let same = Limit { movement: crate::limits::Movement::Total, from: (**from).clone(), ..limit.clone() };
            format!("{}, as for the total", source(&same))
        }
    }
}

/// The length that a limit on a span refers to: the span itself, or twice an overhang.
fn reference<N: Number, W: Workings<N>>(w: &mut W, stretch: &Stretch) -> Length<N> {
    let length = Length::from_si(stretch.to.si() - stretch.from.si());
    match stretch.kind {
        StretchKind::Span => w.given(&glossary::L, length),
        StretchKind::Overhang | StretchKind::SeatEnd => {
            let L_o = w.given(&glossary::L_o, length);
            w.say("limits look at twice the length of an overhang");
            step!(w, "EN 1993-1-1, UK NA.2.23", L_lim = 2.0 * L_o);
            L_lim
        }
    }
}

/// The limit on this stretch.
pub(super) fn length<N: Number, W: Workings<N>>(w: &mut W, limit: &Limit, stretch: &Stretch) -> Length<N> {
    named(w, limit, stretch, (&glossary::w_lim).into())
}

/// The limit on this stretch under a symbol of its own.
pub(super) fn named<N: Number, W: Workings<N>>(
    w: &mut W,
    limit: &Limit,
    stretch: &Stretch,
    symbol: Symbol<'static, 0, 1>,
) -> Length<N> {
    let span = reference(w, stretch);
    let lengths: Vec<Length<N>> = limit.bounds.iter().map(|bound| one(w, bound, span)).collect();
    let mut lengths = lengths.into_iter();
    // A limit without bounds limits nothing; whoever makes one gives at least one bound.
    let first = lengths.next().unwrap_or(span);
    let tightest = lengths.fold(first, |tightest, next| min(tightest, next));
    w.say(if limit.bounds.len() > 1 { "the tightest of the bounds is the limit" } else { "limit of the movement" });
    w.line(|| source(limit), symbol, tightest)
}

fn one<N: Number, W: Workings<N>>(w: &mut W, bound: &Bound, span: Length<N>) -> Length<N> {
    match *bound {
        Bound::SpanOver(n) | Bound::OneIn(n) => match Decimal::as_typed(n, 5) {
            Some(_) => span / n,
            None => span / w.given(&glossary::n, Ratio::from_si(n)),
        },
        Bound::Length(length) => w.given(&glossary::w_giv, length),
    }
}
