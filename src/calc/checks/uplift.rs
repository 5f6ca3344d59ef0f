//! Uplift at a bearing, EN 1990 6.4.1(1)P: what lifts is at most what holds the bearing down.
//!
//! R_up: size of the least reaction over sets A and B of EN 1990 Table A1.2 where it is negative, kN, else 0.
//! R_held: design resistance of what holds the bearing down, kN; without it 0, since a seat does not pull.
//!
//! Worked example (by hand): permanent 4 kN at 0.90 and wind −8 kN at 1.5 leave 3.6 − 12 = −8.4 kN: 8.4 kN of uplift;
//! held down for 12 kN: utilisation 0.70.

use super::Inputs;
use super::combined::{Writing, signed};
use super::{Combined, Outcome, judge};
use crate::actions::Action;
use crate::actions::combinations::{Expression, Purpose};
use crate::quantity::Force;
use crate::results::Part;
use crate::results::{CheckUnit, Verdict};
use crate::workings::{Number, Workings, glossary};

pub(super) const CLAUSE: &str = "EN 1990 6.4.1(1)P";

/// `reaction`: the least reaction of a bearing over sets A and B, upward positive, so that uplift is negative.
#[derive(Clone, Debug, PartialEq)]
pub struct Uplift {
    pub reaction: Combined<1, 0>,
    /// Design resistance of what holds the bearing down.
    pub held_down: Option<Force>,
}

pub(super) fn check<N: Number, W: Workings<N>>(w: &mut W, inputs: &Uplift) -> Outcome {
    let least = Writing::new(&glossary::R_min, &glossary::R, "reactions");
    let lifting = Writing::new(&glossary::R_up, &glossary::R, "reactions")
        .turned("The bearing lifts; what lifts counts as positive");
    let nothing = Outcome {
        demand: Some(0.0),
        capacity: Some(inputs.held_down.map_or(0.0, Force::si)),
        unit: CheckUnit::Force,
        utilisation: Some(0.0),
        verdict: Verdict::Met,
        reason: None,
        clause: CLAUSE.into(),
        note: None,
        required: None,
    };
    if inputs.reaction.value() >= 0.0 {
        let R_min = signed(w, &inputs.reaction, 1.0, &least);
        let _ = R_min;
        w.note(CLAUSE, "the least reaction still presses down: the bearing does not lift");
        return nothing;
    }
    let R_up = signed(w, &inputs.reaction, -1.0, &lifting);
    let R_held = match inputs.held_down {
        Some(held) => w.known(&glossary::R_held, held, "as the bearing says"),
        None => w.looked_up(CLAUSE, &glossary::R_held, Force::from_si(0.0), "nothing holds the bearing down"),
    };
    judge(w, CLAUSE, R_up, R_held, CheckUnit::Force)
}

/// The worked example above.
pub fn example() -> Inputs {
    let part = |action, value, partial, leads| Part {
        action,
        value: Force::from_si(value),
        partial,
        reduction: 1.0,
        leads,
    };
    let parts = vec![part(Action::Permanent, 4e3, 0.90, false), part(Action::Wind(0), -8e3, 1.5, true)];
    let reaction = Combined { parts, purpose: Purpose::Equilibrium, expression: Expression::E610 };
    Inputs::Uplift(Uplift { reaction, held_down: Some(Force::kn(12.0)) })
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
        near(outcome.demand, 8.4e3, 1e-12);
        near(outcome.capacity, 12e3, 1e-12);
        near(outcome.utilisation, 0.70, 1e-12);

        // A seat does not pull: a demand without a capacity has no utilisation.
        let Inputs::Uplift(inputs) = example() else { unreachable!() };
        let loose = run(&Inputs::Uplift(Uplift { held_down: None, ..inputs.clone() }));
        assert_eq!((loose.capacity, loose.utilisation, loose.verdict), (Some(0.0), None, Verdict::NotMet));

        let mut still = inputs;
        still.reaction.parts.truncate(1);
        let still = run(&Inputs::Uplift(Uplift { held_down: None, ..still }));
        assert_eq!((still.demand, still.utilisation, still.verdict), (Some(0.0), Some(0.0), Verdict::Met));
    }
}
