//! Bending, EN 1993-1-1 6.2.5: M_Ed ≤ M_c,Rd.
//!
//! M_Ed: design moment of greatest size, kNm. M_c,Rd = W f_y / γ_M0, kNm, with the plastic modulus in classes 1 and
//! 2, the elastic one in class 3. Class 4, a web with h_w / t_w > 72 ε and steel thicker than the table of yield
//! strengths are not verified. Holes in the tension flange are outside this calculation (6.2.5(4)).
//!
//! Worked example: 457x191x67 UB in S275, M_Ed = 1.35 × 100 + 1.5 × 100 = 285 kNm: class 1,
//! M_c,Rd = 1470 cm³ × 275 N/mm² / 1.0 = 405 kNm (section tables, from memory), utilisation 0.70.

use super::combined::{Writing, size};
use super::section::bent;
use super::{Combined, Outcome, Steel, judge, unverified};
use crate::results::CheckUnit;
use crate::workings::{Number, Workings, glossary};

pub(super) const CLAUSE: &str = "EN 1993-1-1 6.2.5";

/// `moment`: the moment of greatest size over the beam; its sign does not matter.
#[derive(Clone, Debug, PartialEq)]
pub struct Bending {
    pub steel: Steel,
    pub moment: Combined<1, 1>,
}

pub(super) const MOMENT: Writing<'_, 1, 1> = Writing::new(&glossary::M_Ed, &glossary::M, "moments");

pub(super) fn check<N: Number, W: Workings<N>>(w: &mut W, inputs: &Bending) -> Outcome {
    let M_Ed = size(w, &inputs.moment, &MOMENT);
    match bent(w, &inputs.steel) {
        Ok(bent) => judge(w, CLAUSE, M_Ed, bent.M_c_Rd, CheckUnit::Moment),
        Err(refusal) => unverified(w, CLAUSE, M_Ed, CheckUnit::Moment, refusal.reason()),
    }
}
