//! Bending, EN 1993-1-1 6.2.5: M_Ed ≤ M_c,Rd.
//!
//! M_Ed: design moment of greatest size, kNm. M_c,Rd = W f_y / γ_M0, kNm, with the plastic modulus in classes 1 and
//! 2, the elastic one in class 3. Class 4, a web with h_w / t_w > 72 ε and steel thicker than the table of yield
//! strengths are not verified. Holes in the tension flange are outside this calculation (6.2.5(4)).
//!
//! Worked example: 457x191x67 UB in S275, M_Ed = 1.35 × 100 + 1.5 × 100 = 285 kNm: class 1,
//! M_c,Rd = 1470 cm³ × 275 N/mm² / 1.0 = 405 kNm (section tables, from memory), utilisation 0.70.

use super::Inputs;
use super::combined::{Writing, size};
use super::example::two;
use super::section::bent;
use super::{Combined, Outcome, Steel, judge, unverified};
use crate::materials::Grade;
use crate::results::CheckUnit;
use crate::workings::{Number, Workings, glossary};

pub(super) const CLAUSE: &str = "EN 1993-1-1 6.2.5";

/// `moment`: the moment of greatest size over the beam; its sign does not matter.
#[derive(Clone, Debug, PartialEq)]
pub struct Bending {
    pub steel: Steel,
    pub moment: Combined<1, 1>,
}

pub(super) const MOMENT: Writing<'_, 1, 1> = Writing::new(&glossary::M_Ed, &glossary::M, "moments")
    .turned("The beam hogs here; its moment is given as a size");

pub(super) fn check<N: Number, W: Workings<N>>(w: &mut W, inputs: &Bending) -> Outcome {
    let M_Ed = size(w, &inputs.moment, &MOMENT);
    match bent(w, &inputs.steel) {
        Ok(bent) => judge(w, CLAUSE, M_Ed, bent.M_c_Rd, CheckUnit::Moment),
        Err(refusal) => unverified(w, CLAUSE, M_Ed, CheckUnit::Moment, refusal.reason()),
    }
}

/// The worked example above.
pub fn example() -> Inputs {
    Inputs::Bending(Bending { steel: Steel::named("457x191x67 UB", Grade::S275), moment: two(100e3, 100e3) })
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::checks::example::near;
    use crate::checks::run;
    use crate::quantity::Length;
    use crate::results::Verdict;

    #[test]
    fn worked_example() {
        // M_c,Rd 405 kNm: section tables, from memory.
        let outcome = run(&example());
        near(outcome.capacity, 405e3, 0.005);
        near(outcome.demand, 285e3, 1e-12);
        near(outcome.utilisation, 0.704, 0.005);
    }

    #[test]
    fn published_resistance() {
        // 533x210x92 UB in S275: M_c,Rd 649 kNm, published worked example of a restrained beam, from memory.
        let steel = Steel::named("533x210x92 UB", Grade::S275);
        near(run(&Inputs::Bending(Bending { steel, moment: two(1e3, 1e3) })).capacity, 649e3, 0.005);
    }

    #[test]
    fn a_section_of_class_four_is_not_verified() {
        // Flange of c_f / t_f = 65.6 / 4.5 = 14.6 > 14 x 0.924 = 12.9: class 4 by EN 1993-1-1 Table 5.2.
        let mut steel = Steel::named("152x152x23 UC", Grade::S275);
        steel.section.t_f = Length::mm(4.5);
        let outcome = run(&Inputs::Bending(Bending { steel, moment: two(1e3, 1e3) }));
        assert_eq!((outcome.verdict, outcome.capacity), (Verdict::NotVerified, None));
        assert_eq!(outcome.reason.as_deref(), Some("section of class 4"));
        near(outcome.demand, 2.85e3, 1e-12);
    }

    #[test]
    fn a_web_that_could_buckle_in_shear_is_not_verified() {
        // 406x140x39 UB in S355: h_w / t_w = (398.0 - 17.2) / 6.4 = 59.5 > 72 x 0.8136 = 58.6.
        let steel = Steel::named("406x140x39 UB", Grade::S355);
        let outcome = run(&Inputs::Bending(Bending { steel, moment: two(1e3, 1e3) }));
        assert_eq!(outcome.verdict, Verdict::NotVerified);
        assert_eq!(outcome.reason.as_deref(), Some("web that could buckle in shear"));
        assert!(super::super::Reduced::of(&steel).is_none());
    }
}
