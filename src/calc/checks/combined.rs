//! What the actions add up to: the design (or characteristic) value of an effect from its parts.
//!
//! EN 1990 6.4.3.2, (6.10), (6.10a), (6.10b), and 6.5.3, (6.14b):
//! E_d = Σ γ_G E_G + γ_Q E_Q,1 + Σ γ_Q ψ_0 E_Q,i, with ξ on permanent actions in (6.10b).
//!
//! Worked example (by hand): permanent 20 kNm, imposed A leading 8 kNm, imposed H accompanying 4 kNm with ψ_0 = 0.7:
//! M_Ed = 1.35 × 20 + 1.5 × 8 + 1.5 × 0.7 × 4 = 43.2 kNm.

use std::borrow::Cow;

use crate::actions::combinations::{Expression, Purpose, listed};
use crate::actions::{Action, Category};
use crate::quantity::{Q, Ratio};
use crate::results::{Combinations, Effect, Part};
use crate::workings::symbol::{Entry, Symbol};
use crate::workings::{Number, Workings, glossary};

/// The parts of an effect and the expression that combines them.
#[derive(Clone, Debug, PartialEq)]
pub struct Combined<const FORCE: i8, const LENGTH: i8> {
    /// Permanent first. Contributions factored apart (set A: worsening and relieving) are parts of their own.
    pub parts: Vec<Part<FORCE, LENGTH>>,
    pub purpose: Purpose,
    pub expression: Expression,
}

impl<const FORCE: i8, const LENGTH: i8> Combined<FORCE, LENGTH> {
    /// The parts of an effect with the expression of its combination; none where the effect's combination is not in
    /// the list.
    pub fn of(effect: &Effect<FORCE, LENGTH>, combinations: &Combinations) -> Option<Self> {
        let combination = combinations.get(effect.combination)?;
        Some(Combined {
            parts: effect.parts.clone(),
            purpose: combination.purpose,
            expression: combination.expression,
        })
    }

    /// The combined value, with its sign, SI.
    pub fn value(&self) -> f64 {
        self.without_noise().parts.iter().fold(0.0, |sum, p| sum + p.partial * p.reduction * p.value.si())
    }

    /// Without parts that are nothing but the rounding of the solution: below a millionth of a newton (metre) or a
    /// millionth of a micrometre, or 12 orders below the greatest part.
    fn without_noise(&self) -> Cow<'_, Self> {
        let floor = if FORCE == 0 { 1e-12 } else { 1e-6 };
        let greatest = self.parts.iter().map(|p| p.value.si().abs()).fold(0.0, f64::max);
        let acts = |p: &Part<FORCE, LENGTH>| p.value.si().abs() > f64::max(floor, 1e-12 * greatest);
        if self.parts.iter().all(acts) {
            return Cow::Borrowed(self);
        }
        let parts = self.parts.iter().copied().filter(acts).collect();
        Cow::Owned(Combined { parts, ..self.clone() })
    }

    /// "EN 1990 6.4.3.2, (6.10)".
    pub fn clause(&self) -> &'static str {
        match (self.purpose, self.expression) {
            (Purpose::Equilibrium, _) => "EN 1990 6.4.3.2, set A",
            (_, Expression::E610) => "EN 1990 6.4.3.2, (6.10)",
            (_, Expression::E610a) => "EN 1990 6.4.3.2, (6.10a)",
            (_, Expression::E610b) => "EN 1990 6.4.3.2, (6.10b)",
            (_, Expression::E614b) => "EN 1990 6.5.3, (6.14b)",
            (_, Expression::E615b) => "EN 1990 6.5.3, (6.15b)",
            (_, Expression::E616b) => "EN 1990 6.5.3, (6.16b)",
        }
    }
}

/// How a combined effect is written.
#[derive(Clone, Copy)]
pub(super) struct Writing<'a, const FORCE: i8, const LENGTH: i8> {
    pub whole: &'static Entry<FORCE, LENGTH>,
    /// The effect of one action; its name becomes the subscript.
    pub part: &'static Entry<FORCE, LENGTH>,
    /// "moments": what is combined.
    pub plural: &'a str,
    /// What it means that the signs are turned; empty where a size says it all.
    pub turned: &'static str,
    /// A subscript of its own for the whole.
    pub sub: Option<&'a str>,
}

impl<'a, const F: i8, const L: i8> Writing<'a, F, L> {
    pub const fn new(whole: &'static Entry<F, L>, part: &'static Entry<F, L>, plural: &'a str) -> Self {
        Writing { whole, part, plural, turned: "", sub: None }
    }

    pub const fn turned(self, turned: &'static str) -> Self {
        Writing { turned, ..self }
    }

    fn symbol(&self) -> Symbol<'a, F, L> {
        match self.sub {
            Some(sub) => self.whole.of(sub),
            None => self.whole.into(),
        }
    }

    /// The symbol of the sum of the first terms.
    fn so_far(&self, line: usize) -> Symbol<'static, F, L> {
        match self.sub {
            Some(sub) => self.whole.of(format!("{sub},{line}")),
            None => self.whole.of(line.to_string()),
        }
    }
}

/// Room of one line of the sum, where a value takes 4 and a factor before it 2: more would not fit its column.
const ROOM: usize = 20;
const OF_VALUE: usize = 4;
const OF_FACTOR: usize = 2;
const OF_BRACKETS: usize = 2;

/// The size of a combined effect, whichever way it acts.
pub(super) fn size<N: Number, W: Workings<N>, const F: i8, const L: i8>(
    w: &mut W,
    combined: &Combined<F, L>,
    writing: &Writing<'_, F, L>,
) -> Q<N, F, L> {
    let sign = if combined.value() < 0.0 { -1.0 } else { 1.0 };
    signed(w, combined, sign, writing)
}

/// A combined effect times `sign`, 1 or -1.
pub(super) fn signed<N: Number, W: Workings<N>, const F: i8, const L: i8>(
    w: &mut W,
    combined: &Combined<F, L>,
    sign: f64,
    writing: &Writing<'_, F, L>,
) -> Q<N, F, L> {
    let combined = &*combined.without_noise();
    let clause = combined.clause();
    if combined.parts.is_empty() {
        let nought = Q::from_si(0.0);
        return w.looked_up(clause, writing.symbol(), nought, "no action contributes at this place");
    }
    w.say(|| sentence(combined, sign, writing));
    let mut sum: Option<Q<N, F, L>> = None;
    let (mut taken, mut lines) = (0, 0);
    for (place, part) in combined.parts.iter().enumerate() {
        let value = Q::from_si(sign * part.value.si());
        let value = w.given(writing.part.of(action_name(combined, place)), value);
        let term = factored(w, combined, part, value);
        let own = room_of(combined, part) + if value.plain().si() < 0.0 { OF_BRACKETS } else { 0 };
        sum = Some(match sum {
            None => term,
            Some(sum) if taken + own > ROOM => {
                lines += 1;
                taken = OF_VALUE;
                w.line(clause, writing.so_far(lines), sum) + term
            }
            Some(sum) => sum + term,
        });
        taken += own;
    }
    match sum {
        Some(sum) => w.line(clause, writing.symbol(), sum),
        None => w.given(writing.symbol(), Q::from_si(0.0)),
    }
}

/// The room that its term takes.
fn room_of<const F: i8, const L: i8>(combined: &Combined<F, L>, part: &Part<F, L>) -> usize {
    let factors = usize::from(has_partial(combined)) + usize::from(part.reduction != 1.0);
    OF_VALUE + OF_FACTOR * factors
}

/// Factors of serviceability are all 1 and not written.
fn has_partial<const F: i8, const L: i8>(combined: &Combined<F, L>) -> bool {
    match combined.purpose {
        Purpose::Strength | Purpose::Equilibrium => true,
        Purpose::Characteristic | Purpose::Frequent | Purpose::QuasiPermanent => false,
    }
}

/// γ × reduction × value; factors of serviceability, all 1, are not written.
fn factored<N: Number, W: Workings<N>, const F: i8, const L: i8>(
    w: &mut W,
    combined: &Combined<F, L>,
    part: &Part<F, L>,
    value: Q<N, F, L>,
) -> Q<N, F, L> {
    let permanent = part.action == Action::Permanent;
    let several = combined.parts.iter().filter(|p| p.action == Action::Permanent).count() > 1;
    let reduction: Option<Ratio<N>> = (part.reduction != 1.0).then(|| {
        let reduction = Q::from_si(part.reduction);
        match permanent {
            true => w.given(&glossary::xi, reduction),
            false if differing_psi(combined) => w.given(glossary::psi_0.of(letter(part.action)), reduction),
            false => w.given(&glossary::psi_0, reduction),
        }
    });
    let partial: Option<Ratio<N>> = has_partial(combined).then(|| {
        let partial = Q::from_si(part.partial);
        match (permanent, part.partial <= 1.0, several) {
            (true, true, _) => w.given(&glossary::gamma_G_inf, partial),
            (true, false, true) => w.given(&glossary::gamma_G_sup, partial),
            (true, false, false) => w.given(&glossary::gamma_G, partial),
            (false, ..) => w.given(&glossary::gamma_Q, partial),
        }
    });
    // As f64 both ways of leaving a factor out are a multiplication by 1.
    match (partial, reduction) {
        (Some(partial), Some(xi)) if permanent => value.scaled_by(xi * partial),
        (Some(partial), Some(psi)) => value.scaled_by(partial * psi),
        (Some(factor), None) | (None, Some(factor)) => value.scaled_by(factor),
        (None, None) => value,
    }
}

/// Accompanying actions come with different factors, so that each needs its own symbol.
fn differing_psi<const F: i8, const L: i8>(combined: &Combined<F, L>) -> bool {
    let mut psi = combined.parts.iter().filter(|p| p.action != Action::Permanent && p.reduction != 1.0);
    let first = psi.next().map(|p| p.reduction);
    psi.any(|p| Some(p.reduction) != first)
}

/// "G", "A" … "H", "S", "W"; where an action has several parts, which of them.
fn action_name<const F: i8, const L: i8>(combined: &Combined<F, L>, place: usize) -> Cow<'static, str> {
    let part = &combined.parts[place];
    let same = |p: &&Part<F, L>| p.action == part.action;
    let all = combined.parts.iter().filter(same).count();
    match (part.action, all) {
        (_, 0 | 1) => letter(part.action).into(),
        (Action::Permanent, 2) if combined.parts.iter().filter(same).any(|p| p.partial != part.partial) => {
            if part.partial > 1.0 { "G,sup".into() } else { "G,inf".into() }
        }
        (action, _) => {
            let before = combined.parts[..place].iter().filter(same).count();
            format!("{},{}", letter(action), before + 1).into()
        }
    }
}

fn letter(action: Action) -> &'static str {
    match action {
        Action::Permanent => "G",
        Action::Imposed(Category::A) => "A",
        Action::Imposed(Category::B) => "B",
        Action::Imposed(Category::C) => "C",
        Action::Imposed(Category::D) => "D",
        Action::Imposed(Category::E) => "E",
        Action::Imposed(Category::F) => "F",
        Action::Imposed(Category::G) => "Q,G",
        Action::Imposed(Category::H) => "H",
        Action::Snow => "S",
        Action::Wind(_) => "W",
    }
}

fn spoken(action: Action) -> String {
    match action {
        Action::Permanent => "permanent".into(),
        Action::Imposed(category) => format!("imposed {}", category.letter()),
        Action::Snow => "snow".into(),
        Action::Wind(_) => "wind".into(),
    }
}

fn sentence<const F: i8, const L: i8>(combined: &Combined<F, L>, sign: f64, writing: &Writing<'_, F, L>) -> String {
    let Writing { plural, turned, .. } = writing;
    let names = |leads: bool| {
        let chosen = combined.parts.iter().filter(|p| p.action != Action::Permanent && p.leads == leads);
        let mut names: Vec<String> = chosen.map(|p| spoken(p.action)).collect();
        names.dedup();
        names
    };
    let (led, with) = (names(true), names(false));
    let mut words = format!("The {plural} of each action are combined.");
    if sign < 0.0 && !turned.is_empty() {
        words.push_str(&format!(" {turned}."));
    }
    let verb =
        |names: &[String], one: &str, more: &str| if names.len() == 1 { one.to_string() } else { more.to_string() };
    let capital = |text: String| {
        let mut letters = text.chars();
        letters.next().map(|c| c.to_uppercase().collect::<String>() + letters.as_str()).unwrap_or_default()
    };
    match (led.is_empty(), with.is_empty()) {
        (true, true) => words.push_str(" Permanent actions alone count."),
        (false, true) => {
            words.push_str(&format!(" {} {}.", capital(listed(&led)), verb(&led, "leads", "lead together")));
        }
        (true, false) => {
            words.push_str(&format!(
                " None leads: {} {} with the permanent actions.",
                listed(&with),
                verb(&with, "comes", "come")
            ));
        }
        (false, false) => words.push_str(&format!(
            " {} {}; {} {} with {}.",
            capital(listed(&led)),
            verb(&led, "leads", "lead together"),
            listed(&with),
            verb(&with, "comes", "come"),
            verb(&led, "it", "them"),
        )),
    }
    let relieves = |p: &Part<F, L>| p.action == Action::Permanent && sign * p.value.si() < 0.0;
    if combined.parts.iter().any(relieves) {
        words.push_str(" Permanent actions that relieve keep the smaller factor.");
    }
    words
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::checks::bending::MOMENT;
    use crate::checks::example::two;
    use crate::workings::Silent;

    #[test]
    fn what_the_solution_rounds_is_no_part() {
        let mut moment: Combined<1, 1> = two(20e3, 8e3);
        moment.parts[1].value = Q::from_si(3e-12);
        // 1.35 × 20 kNm, the imposed part being rounding.
        assert_eq!(size(&mut Silent, &moment, &MOMENT).si(), 27e3);
        moment.parts[0].value = Q::from_si(-2e-11);
        assert_eq!(size(&mut Silent, &moment, &MOMENT).si(), 0.0);
        assert_eq!(moment.value(), 0.0);
    }

    #[test]
    fn worked_example() {
        // By hand: see the head of this file.
        let mut moment: Combined<1, 1> = two(20e3, 8e3);
        moment.parts.push(Part {
            action: Action::Imposed(Category::H),
            value: Q::from_si(4e3),
            partial: 1.5,
            reduction: 0.7,
            leads: false,
        });
        let found = size(&mut Silent, &moment, &MOMENT).si();
        assert!((found - 43.2e3).abs() < 1e-9 * 43.2e3, "{found}");
    }
}
