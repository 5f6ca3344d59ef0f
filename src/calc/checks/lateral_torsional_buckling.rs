//! Lateral-torsional buckling, EN 1993-1-1 6.3.2, of a segment between places where the beam is held.
//!
//! A segment whose flange in compression is held along its whole length is not susceptible (6.3.2.1(2)): M_Ed ≤
//! M_c,Rd, the resistance of the section, and the entry says "compression flange held". Any other segment is not
//! verified, and says so.
//!
//! Worked example: 152x152x23 UC in S275, held, M_Ed = 1.35 × 10 + 1.5 × 12 = 31.5 kNm: class 3,
//! M_c,Rd = 45.1 kNm (EN 1993-1-1 Table 5.2 and section tables, from memory), utilisation 0.70.

use super::Inputs;
use super::bending::MOMENT;
use super::combined::size;
use super::example::two;
use super::section::bent;
use super::{Combined, Outcome, Steel, judge, unverified};
use crate::materials::Grade;
use crate::results::CheckUnit;
use crate::workings::{Number, Workings};

pub(super) const HELD_CLAUSE: &str = "EN 1993-1-1 6.3.2.1(2)";
pub(super) const CLAUSE: &str = "EN 1993-1-1 6.3.2";

/// Printed as the check's name where the flange is held.
pub const HELD: &str = "compression flange held";

/// A segment between places where the beam is held against lateral movement and twist.
#[derive(Clone, Debug, PartialEq)]
pub struct LateralTorsionalBuckling {
    pub steel: Steel,
    /// The moment of greatest size in the segment.
    pub moment: Combined<1, 1>,
    /// The flange in compression is held along the whole segment.
    pub held: bool,
}

pub(super) fn check<N: Number, W: Workings<N>>(w: &mut W, inputs: &LateralTorsionalBuckling) -> Outcome {
    let M_Ed = size(w, &inputs.moment, &MOMENT);
    if !inputs.held {
        w.note(
            CLAUSE,
            "the flange in compression is not held along the whole segment, so that it could buckle sideways",
        );
        return unverified(w, CLAUSE, M_Ed, CheckUnit::Moment, "lateral-torsional buckling");
    }
    let outcome = match bent(w, &inputs.steel) {
        Ok(bent) => {
            w.note(
                HELD_CLAUSE,
                "the flange in compression is held along the whole segment: the beam cannot buckle sideways, and its \
                 section resists in full",
            );
            judge(w, HELD_CLAUSE, M_Ed, bent.M_c_Rd, CheckUnit::Moment)
        }
        Err(refusal) => unverified(w, HELD_CLAUSE, M_Ed, CheckUnit::Moment, refusal.reason()),
    };
    Outcome { note: Some(HELD), ..outcome }
}

/// The worked example above.
pub fn example() -> Inputs {
    Inputs::LateralTorsionalBuckling(LateralTorsionalBuckling {
        steel: Steel::named("152x152x23 UC", Grade::S275),
        moment: two(10e3, 12e3),
        held: true,
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
        // Class 3 by EN 1993-1-1 Table 5.2; W_el 164 cm3 from section tables, from memory.
        let outcome = run(&example());
        near(outcome.capacity, 45.1e3, 0.005);
        near(outcome.demand, 31.5e3, 1e-12);
        assert_eq!(outcome.note, Some("compression flange held"));
        assert_eq!(outcome.verdict, Verdict::Met);

        let Inputs::LateralTorsionalBuckling(inputs) = example() else { unreachable!() };
        let free = run(&Inputs::LateralTorsionalBuckling(LateralTorsionalBuckling { held: false, ..inputs }));
        assert_eq!(free.verdict, Verdict::NotVerified);
        assert_eq!(free.reason.as_deref(), Some("lateral-torsional buckling"));
        assert_eq!((free.capacity, free.utilisation), (None, None));
    }
}
