//! Own movements of a beam (total, after, variable) against their limits.
//!
//! w: size of the greatest own movement in a span, or of the downward one in an overhang, mm, under characteristic
//! combinations (EN 1990 6.5.3, (6.14b)). w_lim: the tightest of the bounds, L the span between neighbouring bearings
//! or twice an overhang. I_req = I_y w / w_lim on two bearings, own weight at the section in hand; on more, found by
//! solving again (common practice).
//!
//! Worked example (by hand): w = 5 + 7 = 12 mm on a span of 4 m limited to span/250 = 16 mm: utilisation 0.75;
//! with I_y = 4000 cm⁴ in hand, I_req = 4000 × 12 / 16 = 3000 cm⁴.

use super::Inputs;
use super::combined::{Writing, signed, size};
use super::example::characteristic;
use super::{Combined, Outcome, Required, judge, limit};
use crate::limits::{Bound, LimitFrom, LimitSet};
use crate::limits::{Limit, Movement};
use crate::quantity::{Length, SecondMoment};
use crate::results::{CheckUnit, Stretch, StretchKind, Verdict};
use crate::workings::lines::step;
use crate::workings::{Number, Workings, glossary};

/// An own movement (total, after or variable) against its limit.
#[derive(Clone, Debug, PartialEq)]
pub struct Deflection {
    /// `limit.movement` says which movement this is.
    pub limit: Limit,
    /// The span or overhang that it is measured in.
    pub stretch: Stretch,
    pub movement: Combined<0, 1>,
    pub second_moment: SecondMomentInHand,
}

/// The beam's second moment of area, and how the one that a limit asks for follows from it.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum SecondMomentInHand {
    /// Two bearings: own movements are inversely proportional to it.
    Scales { provided: SecondMoment },
    /// Continuous: `required` was found by solving again with other second moments; none where none keeps the limit.
    Resolved { provided: SecondMoment, required: Option<SecondMoment> },
}

pub(super) fn check<N: Number, W: Workings<N>>(w: &mut W, inputs: &Deflection) -> Outcome {
    let whole = match inputs.limit.movement {
        Movement::Total => &glossary::w_tot,
        Movement::After => &glossary::w_aft,
        Movement::Variable => &glossary::w_var,
        Movement::Stacked => &glossary::w_st,
        Movement::Tilt => &glossary::dw,
    };
    let writing = Writing::new(whole, &glossary::w, "own movements")
        .turned("The beam goes up here; its movement is given as a size");
    if inputs.stretch.kind != StretchKind::Span && inputs.movement.value() < 0.0 {
        signed(w, &inputs.movement, 1.0, &writing);
        let w_lim = limit::length(w, &inputs.limit, &inputs.stretch);
        return upward(w, limit::bounds(&inputs.limit), w_lim);
    }
    let movement = size(w, &inputs.movement, &writing);
    let w_lim = limit::length(w, &inputs.limit, &inputs.stretch);
    let outcome = judge(w, "", movement, w_lim, CheckUnit::Length);
    let required = required(w, &inputs.second_moment, |w, I_y| {
        w.say("on two bearings the own movement is inversely proportional to the second moment of area");
        step!(w, "common practice", I_req = I_y * movement / w_lim);
        Required::Of(I_req.plain())
    });
    Outcome { required, clause: limit::bounds(&inputs.limit), ..outcome }
}

/// An overhang that goes up: limits look at downward movement there, so that nothing of this one is used.
pub(super) fn upward<N: Number, W: Workings<N>>(w: &mut W, clause: String, limit: Length<N>) -> Outcome {
    w.note(
        "common practice",
        "the overhang goes up, and limits look at its downward movement: nothing of it is used",
    );
    Outcome {
        demand: Some(0.0),
        capacity: Some(limit.plain().si()),
        unit: CheckUnit::Length,
        utilisation: Some(0.0),
        verdict: Verdict::Met,
        reason: None,
        clause,
        note: None,
        required: None,
    }
}

/// What the limit asks of the second moment of area; nothing where the limit is no length at all.
pub(super) fn required<N: Number, W: Workings<N>>(
    w: &mut W,
    in_hand: &SecondMomentInHand,
    scale: impl FnOnce(&mut W, SecondMoment<N>) -> Required,
) -> Option<Required> {
    match *in_hand {
        SecondMomentInHand::Scales { provided } => {
            let I_y = w.given(&glossary::I_y, provided);
            Some(scale(w, I_y))
        }
        SecondMomentInHand::Resolved { required: Some(required), .. } => {
            let why = "found by solving the building again with other second moments of area of this beam";
            w.looked_up("common practice", &glossary::I_req, required, why);
            Some(Required::Of(required))
        }
        SecondMomentInHand::Resolved { required: None, .. } => {
            w.note("common practice", "no second moment of area of this beam keeps the limit");
            Some(Required::BudgetUsed)
        }
    }
}

/// The worked example above.
pub fn example() -> Inputs {
    Inputs::Deflection(Deflection {
        limit: Limit {
            movement: Movement::Total,
            bounds: vec![Bound::SpanOver(250.0)],
            from: LimitFrom::Set(LimitSet::BrittleFinish),
        },
        stretch: Stretch { kind: StretchKind::Span, from: Length::m(0.0), to: Length::m(4.0) },
        movement: characteristic(5e-3, 7e-3),
        second_moment: SecondMomentInHand::Scales { provided: SecondMoment::cm4(4000.0) },
    })
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::checks::example::near;
    use crate::checks::run;

    #[test]
    fn worked_example() {
        // By hand: see the head of this file.
        let outcome = run(&example());
        near(outcome.demand, 12e-3, 1e-12);
        near(outcome.capacity, 16e-3, 1e-12);
        near(outcome.utilisation, 0.75, 1e-12);
        assert_eq!(outcome.clause, "span/250");
        let Some(Required::Of(required)) = outcome.required else { panic!("{outcome:?}") };
        near(Some(required.si()), 3000e-8, 1e-12);
    }

    #[test]
    fn an_overhang_that_goes_up_uses_nothing_of_its_limit() {
        // engineering practice: limits of overhangs look at downward movement.
        let Inputs::Deflection(mut inputs) = example() else { unreachable!() };
        inputs.stretch.kind = StretchKind::Overhang;
        let down = run(&Inputs::Deflection(inputs.clone()));
        // Twice an overhang of 4 m: 8000 / 250 = 32 mm.
        near(down.capacity, 32e-3, 1e-12);
        near(down.demand, 12e-3, 1e-12);
        inputs.movement = characteristic(-5e-3, -7e-3);
        let up = run(&Inputs::Deflection(inputs.clone()));
        assert_eq!((up.demand, up.utilisation, up.required), (Some(0.0), Some(0.0), None));
        // Within a span the size counts, whichever way it goes.
        inputs.stretch.kind = StretchKind::Span;
        near(run(&Inputs::Deflection(inputs)).demand, 12e-3, 1e-12);
    }
}
