//! Tilt: the difference in movement between two neighbouring bearings over their distance, against 1/n.
//!
//! Δw: size of the difference, mm, characteristic, `settles` included. Limit L / n, mm, L the distance of the two
//! bearings: Δw / (L / n) is the same as (Δw / L) / (1 / n). Common practice.
//!
//! Worked example (by hand): 9.0 mm and 0 on 4.80 m: 9.0 / (4800 / 500) = 0.94, a tilt of 1/533.

use super::Inputs;
use super::stacked_deflection::{BearingMovement, bearings};
use super::{Outcome, judge, limit};
use crate::limits::Limit;
use crate::limits::{Bound, LimitFrom, LimitSet, Movement};
use crate::quantity::Length;
use crate::results::{CheckUnit, Stretch, StretchKind};
use crate::workings::lines::step;
use crate::workings::{Number, Workings};

/// Difference of two neighbouring bearings over their distance, `settles` included; its sign does not matter.
#[derive(Clone, Debug, PartialEq)]
pub struct TiltOfBearings {
    pub limit: Limit,
    pub left: BearingMovement,
    pub right: BearingMovement,
    pub span: Length,
}

pub(super) fn check<N: Number, W: Workings<N>>(w: &mut W, inputs: &TiltOfBearings) -> Outcome {
    let (w_1, w_2) = bearings(w, &inputs.left, &inputs.right);
    w.say("the difference of the two bearings tilts what stands on the beam");
    let difference = if inputs.left.movement.si() > inputs.right.movement.si() { w_1 - w_2 } else { w_2 - w_1 };
    step!(w, "common practice", dw = difference);
    let span = Stretch { kind: StretchKind::Span, from: Length::from_si(0.0), to: inputs.span };
    let w_lim = limit::length(w, &inputs.limit, &span);
    let judged = judge(w, "", dw, w_lim, CheckUnit::Ratio);
    let over_span = |movement: Length<N>| movement.plain().si() / inputs.span.si();
    Outcome {
        demand: Some(over_span(dw)),
        capacity: Some(over_span(w_lim)),
        clause: limit::with_set(&inputs.limit),
        ..judged
    }
}

/// The worked example above.
pub fn example() -> Inputs {
    let limit = Limit {
        movement: Movement::Tilt,
        bounds: vec![Bound::OneIn(500.0)],
        from: LimitFrom::Set(LimitSet::Masonry),
    };
    Inputs::Tilt(TiltOfBearings {
        limit,
        left: BearingMovement { on: "B4".into(), wall: false, movement: Length::mm(9.0) },
        right: BearingMovement { on: "spine wall".into(), wall: true, movement: Length::mm(0.0) },
        span: Length::m(4.8),
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
        near(outcome.demand, 9.0 / 4800.0, 1e-12);
        near(outcome.capacity, 1.0 / 500.0, 1e-12);
        near(outcome.utilisation, 0.9375, 1e-12);
        assert_eq!(outcome.clause, "1/500, masonry");
    }
}
