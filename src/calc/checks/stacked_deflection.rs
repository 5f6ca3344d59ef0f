//! Stacked deflection: the absolute movement of a beam, all that it inherits included, against its limit.
//!
//! w_st = w_own + w_inh + w_set, mm, at the place of the greatest ratio to the limit, all of one characteristic
//! combination and arrangement. w_inh is the straight line between the movements of the two bearings beside the place,
//! continued into an overhang; w_set comes from supports that settle. In an overhang the limit is the larger of its
//! own and that of the span beside it. On two bearings the beam needs I_req = I_y w_own / (w_lim − w_inh − w_set): what
//! it may move itself is what its supports have left of the limit (common practice).
//!
//! The hand rule simply adds the largest own movements down the route to the ground. It is printed beside the exact
//! figure with the difference, and is never a check (common practice).
//!
//! Worked example (by hand): w_own = 10.4 mm, left bearing 9.0 mm, right bearing 2.0 mm, at 2 m of 5 m:
//! w_inh = 9.0 + (2.0 − 9.0) × 2 / 5 = 6.2 mm, w_st = 16.6 mm; limit 5200 / 250 = 20.8 mm: utilisation 0.80.

use super::Inputs;
use super::combined::{Writing, signed};
use super::deflection::{SecondMomentInHand, required, upward};
use super::example::characteristic;
use super::places::the_wall;
use super::{Combined, Outcome, Required, judge, limit};
use crate::limits::Limit;
use crate::limits::{Bound, LimitFrom, Movement};
use crate::quantity::SecondMoment;
use crate::quantity::{Length, max};
use crate::results::{CheckUnit, Stretch, StretchKind};
use crate::workings::lines::step;
use crate::workings::{Number, Workings, glossary};

/// An absolute movement against its limit, at the place of the greatest ratio to it. `own`, `inherited` and
/// `settled` belong to one combination, arrangement and place and add up to it.
#[derive(Clone, Debug, PartialEq)]
pub struct StackedDeflection {
    pub limit: Limit,
    pub stretch: Stretch,
    /// In an overhang: the span beside it, whose limit counts where it is the larger.
    pub beside: Option<Stretch>,
    /// Own movement at the place, by action.
    pub own: Combined<0, 1>,
    pub inherited: Inherited,
    /// Movement from `settles` anywhere in the building, at the place.
    pub settled: Length,
    pub second_moment: SecondMomentInHand,
    pub hand_rule: Option<HandRule>,
}

/// The straight line between the two bearings beside the place, continued into an overhang.
#[derive(Clone, Debug, PartialEq)]
pub struct Inherited {
    pub left: BearingMovement,
    pub right: BearingMovement,
    /// From the left one to the right one.
    pub span: Length,
    /// From the left one to the place; negative in an overhang to its left.
    pub to_place: Length,
}

/// How far a bearing goes down; without `settles` unless said otherwise.
#[derive(Clone, Debug, PartialEq)]
pub struct BearingMovement {
    /// Mark of the beam or name of the wall.
    pub on: String,
    /// It stands on a wall.
    pub wall: bool,
    pub movement: Length,
}

/// The largest own movements down the worst route to the ground, simply added; never a check.
#[derive(Clone, Debug, PartialEq)]
pub struct HandRule {
    /// Marks and largest own movements, this beam first.
    pub route: Vec<(String, Length)>,
    /// The greatest stacked movement of this beam.
    pub exact: Length,
}

pub(super) fn check<N: Number, W: Workings<N>>(w: &mut W, inputs: &StackedDeflection) -> Outcome {
    let own = Writing::new(&glossary::w_own, &glossary::w, "own movements");
    let w_own = signed(w, &inputs.own, 1.0, &own);
    let w_inh = inherited(w, &inputs.inherited);
    let w_set = settled(w, inputs.settled);
    let sum = match (w_inh, w_set) {
        (Some(w_inh), Some(w_set)) => w_own + w_inh + w_set,
        (Some(from_below), None) | (None, Some(from_below)) => w_own + from_below,
        (None, None) => w_own,
    };
    w.say(match (w_inh, w_set) {
        (None, None) => "neither bearing moves under the loads: the stacked movement is the beam\u{2019}s own",
        (None, Some(_)) => "own and settled movement add up",
        (Some(_), None) => "own and inherited movement add up",
        (Some(_), Some(_)) => "own, inherited and settled movement add up",
    });
    step!(w, "common practice", w_st = sum);
    let w_lim = match &inputs.beside {
        None => limit::length(w, &inputs.limit, &inputs.stretch),
        Some(beside) => {
            let of_overhang = limit::named(w, &inputs.limit, &inputs.stretch, glossary::w_lim.of("overhang"));
            let of_span = limit::named(w, &inputs.limit, beside, glossary::w_lim.of("span"));
            w.say("the larger of the overhang\u{2019}s limit and that of the span beside it counts");
            step!(w, "common practice", w_lim = max(of_overhang, of_span));
            w_lim
        }
    };
    let up = w_st.plain().si() < 0.0;
    if up && inputs.stretch.kind != StretchKind::Span {
        let outcome = upward(w, limit::bounds(&inputs.limit), w_lim);
        if let Some(rule) = &inputs.hand_rule {
            hand_rule(w, rule);
        }
        return outcome;
    }
    let size = if up {
        step!(w, "common practice", w_up = -w_st);
        w_up
    } else {
        w_st
    };
    let outcome = judge(w, "", size, w_lim, CheckUnit::Length);

    let required = required(w, &inputs.second_moment, |w, I_y| {
        let down = |movement: Length<N>| if up { -movement } else { movement };
        let used = match (w_inh, w_set) {
            (Some(w_inh), Some(w_set)) => Some(w_lim - down(w_inh) - down(w_set)),
            (Some(from_below), None) | (None, Some(from_below)) => Some(w_lim - down(from_below)),
            (None, None) => None,
        };
        let w_left = match used {
            None => w_lim,
            Some(left) => {
                w.say("what the supports have used of the limit is no longer the beam\u{2019}s own");
                step!(w, "common practice", w_left = left);
                w_left
            }
        };
        let some_left = used.is_none()
            || w.when(
                "common practice",
                w_left.is_positive(),
                "something of the limit is left for the beam itself",
                "the supports have used the whole limit: no second moment of area of this beam keeps it",
            );
        if !some_left {
            return Required::BudgetUsed;
        }
        w.say("the beam\u{2019}s own movement is inversely proportional to its second moment of area");
        step!(w, "common practice", I_req = I_y * down(w_own) / w_left);
        Required::Of(I_req.plain())
    });
    if let Some(rule) = &inputs.hand_rule {
        hand_rule(w, rule);
    }
    Outcome { required, clause: limit::bounds(&inputs.limit), ..outcome }
}

/// w_inh = w_1 + (w_2 − w_1) x / L; none where both bearings stay where they are.
fn inherited<N: Number, W: Workings<N>>(w: &mut W, line: &Inherited) -> Option<Length<N>> {
    if line.left.movement.si() == 0.0 && line.right.movement.si() == 0.0 {
        return None;
    }
    let (w_1, w_2) = bearings(w, &line.left, &line.right);
    let (x, L) = (w.given(&glossary::x, line.to_place), w.given(&glossary::L, line.span));
    w.say("what the place inherits is the straight line between the two bearings");
    step!(w, "common practice", w_inh = w_1 + (w_2 - w_1) * x / L);
    Some(w_inh)
}

/// The movements of two bearings, under the names of what they stand on.
pub(super) fn bearings<N: Number, W: Workings<N>>(
    w: &mut W,
    left: &BearingMovement,
    right: &BearingMovement,
) -> (Length<N>, Length<N>) {
    let same = left.on == right.on;
    let mut one = |bearing: &BearingMovement, side: &'static str| {
        let sub = match (same || left.wall && right.wall, bearing.wall) {
            (true, _) => side.to_string(),
            (false, true) => "wall".to_string(),
            (false, false) => bearing.on.clone(),
        };
        let on = if bearing.wall { the_wall(&bearing.on) } else { bearing.on.clone() };
        let still = bearing.movement.si() == 0.0;
        w.looked_up("solution of the whole building", glossary::w.of(sub), bearing.movement, move || match still {
            true => format!("{on} does not move under the loads"),
            false => format!("{on} goes down by this much at the bearing"),
        })
    };
    (one(left, "left"), one(right, "right"))
}

fn settled<N: Number, W: Workings<N>>(w: &mut W, settled: Length) -> Option<Length<N>> {
    if settled.si() == 0.0 {
        return None;
    }
    Some(w.known(&glossary::w_set, settled, "solution of the whole building"))
}

/// Never a check: the sum of the largest own movements down the route, and how far it is off.
fn hand_rule<N: Number, W: Workings<N>>(w: &mut W, rule: &HandRule) {
    let own = |w: &mut W, (mark, movement): &(String, Length)| w.given(glossary::w_own.of(mark.clone()), *movement);
    // A beam on walls alone has nothing to add.
    let [first, rest @ ..] = rule.route.as_slice() else { return };
    if rest.is_empty() {
        return;
    }
    let mut sum = own(w, first);
    for next in rest {
        sum = sum + own(w, next);
    }
    w.say("by the hand rule the largest own movements down the route are simply added");
    step!(w, "common practice; no check", w_hand = sum);
    let w_exact = w.known(&glossary::w_exact, rule.exact, "solution of the whole building");
    let safe = w.when(
        "common practice; no check",
        w_exact.at_most(w_hand),
        "the hand rule is on the safe side",
        "the hand rule is on the unsafe side",
    );
    if safe {
        w.say("it is safe by the difference");
        step!(w, "common practice; no check", dw_hand = w_hand - w_exact);
        let _ = dw_hand;
    } else {
        w.say("it is unsafe by the difference");
        step!(w, "common practice; no check", dw_hand = w_exact - w_hand);
        let _ = dw_hand;
    }
}

/// The worked example above.
pub fn example() -> Inputs {
    let on = |mark: &str, mm| BearingMovement { on: mark.into(), wall: false, movement: Length::mm(mm) };
    Inputs::StackedDeflection(StackedDeflection {
        limit: Limit {
            movement: Movement::Stacked,
            bounds: vec![Bound::SpanOver(250.0)],
            from: LimitFrom::Given { reason: None },
        },
        stretch: Stretch { kind: StretchKind::Span, from: Length::m(0.0), to: Length::m(5.2) },
        beside: None,
        own: characteristic(4.4e-3, 6.0e-3),
        inherited: Inherited {
            left: on("B2", 9.0),
            right: on("B3", 2.0),
            span: Length::m(5.0),
            to_place: Length::m(2.0),
        },
        settled: Length::m(0.0),
        second_moment: SecondMomentInHand::Scales { provided: SecondMoment::cm4(2340.0) },
        hand_rule: None,
    })
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::checks::example::near;
    use crate::checks::run;
    use crate::results::Verdict;

    #[test]
    fn worked_example() {
        // By hand: see the head of this file. What is left of the limit: 20.8 - 6.2 = 14.6 mm.
        let outcome = run(&example());
        near(outcome.demand, 16.6e-3, 1e-12);
        near(outcome.capacity, 20.8e-3, 1e-12);
        let Some(Required::Of(required)) = outcome.required else { panic!("{outcome:?}") };
        near(Some(required.si()), 2340e-8 * 10.4 / 14.6, 1e-12);

        // Supports that use the whole limit leave no room for any beam.
        let Inputs::StackedDeflection(mut inputs) = example() else { unreachable!() };
        inputs.inherited.left.movement = Length::mm(30.0);
        inputs.inherited.right.movement = Length::mm(30.0);
        let used = run(&Inputs::StackedDeflection(inputs));
        assert_eq!(used.required, Some(Required::BudgetUsed));
        assert_eq!(used.verdict, Verdict::NotMet);
    }
}
