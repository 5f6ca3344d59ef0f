//! The check by superposed textbook cases.

use sagledger_calc::building::Beam;
use sagledger_calc::materials::E;
use sagledger_calc::results::{HandCase, HandCheck, TextbookCase};
use sagledger_calc::workings::decimal::{self, Decimal, Rounding};
use sagledger_calc::workings::unit::Unit;
use serde::Serialize;

use crate::data::text::{Runs, breakable, symbol, value, words};
use crate::data::view::{View, along, along_m};

#[derive(Debug, Serialize)]
pub(super) struct ByHand {
    at: String,
    rows: Vec<Row>,
    by_hand: (String, String),
    solved: (String, String),
    difference: (String, String),
    beside: Runs,
}

#[derive(Debug, Serialize)]
struct Row {
    what: String,
    /// Where on the span.
    place: String,
    load: String,
    unit: &'static str,
    /// The closed form, by its name in the templates.
    form: &'static str,
    moment: String,
    own: String,
}

pub(super) fn by_hand(_view: View, beam: &Beam, hand: &HandCheck) -> ByHand {
    let left = beam.bearings.first().map_or(0.0, |b| b.at.si());
    let at = hand.at.si() - left;
    let span = hand.span.si();
    let pair = |moment: f64, own: f64| (decimal::places(moment, 2, Unit::Knm), decimal::places(own, 2, Unit::Mm));
    let rows: Vec<Row> = hand.cases.iter().map(|case| row(case, at, span)).collect();
    ByHand {
        at: along_m(hand.at.si()),
        by_hand: pair(hand.moment_by_hand.si(), hand.own_by_hand.si()),
        solved: pair(hand.moment_solved.si(), hand.own_solved.si()),
        difference: pair(
            hand.moment_by_hand.si() - hand.moment_solved.si(),
            hand.own_by_hand.si() - hand.own_solved.si(),
        ),
        beside: beside(beam, &rows, at, span),
        rows,
    }
}

fn row(case: &HandCase, at: f64, span: f64) -> Row {
    // Moments stand beside the loads to 0.01 kNm: they follow from loads as they are printed.
    let figures = if case.moment.si().abs() < 5e3 { 4 } else { 5 };
    let fine = |si: f64, unit: Unit| {
        let rounded = Decimal::rounded(si, Rounding::Significant(figures), unit);
        rounded.map_or_else(|| decimal::three_figures(si, unit), |d| d.to_string())
    };
    let kn_m = |si: f64| fine(si, Unit::KnPerM);
    let (place, load, unit, form) = match &case.case {
        TextbookCase::Line { from, to, design, .. } => {
            let (from, to) = (from.si(), to.si());
            let (start, end) = (kn_m(design.0.si()), kn_m(design.1.si()));
            let load = if start == end { start } else { format!("{start} to {end}") };
            let whole = from.abs() < 1e-9 && (to - span).abs() < 1e-9 && design.0 == design.1;
            let form = if whole {
                "even"
            } else if to <= at {
                "line-left"
            } else if from >= at {
                "line-right"
            } else {
                "line"
            };
            (format!("{} to {}", along(from), along(to)), load, "kN/m", form)
        }
        TextbookCase::Point { at: place, design, .. } => {
            let p = place.si();
            let form = if (p - at).abs() < 1e-9 {
                "point"
            } else if p < at {
                "point-left"
            } else {
                "point-right"
            };
            (along(p), fine(design.si(), Unit::Kn), "kN", form)
        }
        TextbookCase::EndMoment { at_left, design, .. } => {
            let place = if *at_left { along(0.0) } else { along(span) };
            let form = if *at_left { "moment-left" } else { "moment-right" };
            (place, fine(design.si(), Unit::Knm), "kNm", form)
        }
    };
    Row {
        what: breakable(&case.what),
        place,
        load,
        unit,
        form,
        moment: decimal::places(case.moment.si(), 2, Unit::Knm),
        own: decimal::places(case.own.si(), 2, Unit::Mm),
    }
}

fn beside(beam: &Beam, rows: &[Row], at: f64, span: f64) -> Runs {
    const EQUALS: &str = " =\u{a0}";
    let stiffness = E.si() * beam.section.i_y.si();
    let mut runs = vec![
        words("Textbook cases on a simple span "),
        symbol("L"),
        words(EQUALS),
        value(along(span), "m"),
        words(", all at "),
        symbol("a"),
        words(EQUALS),
        value(along(at), "m"),
        words(" from its left end, with "),
        symbol("b"),
        words(EQUALS),
        value(along(span - at), "m"),
        words(" and "),
        symbol("EI"),
        words(EQUALS),
        value(decimal::places(stiffness, 0, Unit::Knm2), "kNm²"),
        words(". "),
    ];
    let has = |forms: &[&str]| rows.iter().any(|row| forms.contains(&row.form));
    if has(&["point-left", "point-right"]) {
        runs.extend([symbol("c"), words(" is where a point load stands. ")]);
    }
    if has(&["line-left", "line-right"]) {
        runs.extend([symbol("W"), words(" is a load in all, "), symbol("c"), words(" where its centre stands. ")]);
    }
    if has(&["line"]) {
        runs.extend([
            symbol("R"),
            words(" is the case’s own left reaction, "),
            symbol("W"),
            words(" its load left of "),
            symbol("a"),
            words(", "),
            symbol("d"),
            words(" the lever of that. "),
        ]);
    }
    runs.push(words("Moments under the design loads, own deflection under the characteristic ones."));
    runs
}
