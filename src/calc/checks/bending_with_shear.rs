//! Bending with shear, EN 1993-1-1 6.2.8: M_Ed ≤ M_V,Rd at every place, by expression (6.30).
//!
//! M_Ed, kNm, and V_Ed, kN: greatest sizes at one place, whatever combination each belongs to, which is on the safe
//! side. Up to V_Ed = 0.5 V_pl,Rd nothing is taken from M_c,Rd; beyond, ρ = (2 V_Ed / V_pl,Rd − 1)²,
//! M_V,Rd = (W − ρ A_w² / (4 t_w)) f_y / γ_M0 ≤ M_c,Rd, A_w = h_w t_w, mm². In class 3 W is the elastic modulus,
//! which is on the safe side. Shear beyond V_pl,Rd is never met.
//!
//! Worked example (by hand): 457x191x67 UB in S275, V_Ed = 520 kN = 0.8 V_pl,Rd: ρ = 0.36, A_w = 428.0 × 8.5 =
//! 3638 mm², A_w² / (4 t_w) = 389.3 cm³, M_V,Rd = (1470 − 0.36 × 389.3) × 0.275 = 366 kNm.

use super::Inputs;
use super::bending::MOMENT;
use super::combined::size;
use super::example::two;
use super::section::{bent, sheared, with_shear};
use super::shear::SHEAR;
use super::{Combined, Outcome, Steel, judge, unverified};
use crate::materials::Grade;
use crate::quantity::{Force, Moment};
use crate::results::{CheckUnit, Verdict};
use crate::workings::{Number, Silent, Workings};

pub(super) const CLAUSE: &str = "EN 1993-1-1 6.2.8";

/// Moment and shear of greatest size at the place where their ratio to the reduced resistance is greatest.
#[derive(Clone, Debug, PartialEq)]
pub struct BendingWithShear {
    pub steel: Steel,
    pub moment: Combined<1, 1>,
    pub shear: Combined<1, 0>,
}

pub(super) fn check<N: Number, W: Workings<N>>(w: &mut W, inputs: &BendingWithShear) -> Outcome {
    let M_Ed = size(w, &inputs.moment, &MOMENT);
    let V_Ed = size(w, &inputs.shear, &SHEAR);
    let resisting = bent(w, &inputs.steel).and_then(|bent| Ok((bent, sheared(w, &inputs.steel)?)));
    let (bent, sheared) = match resisting {
        Ok(resisting) => resisting,
        Err(refusal) => return unverified(w, CLAUSE, M_Ed, CheckUnit::Moment, refusal.reason()),
    };
    let resistance = with_shear(w, &bent, &sheared, V_Ed);
    let mut outcome = judge(w, CLAUSE, M_Ed, resistance, CheckUnit::Moment);
    if V_Ed.plain().si() > sheared.V_pl_Rd.plain().si() {
        w.when(
            "EN 1993-1-1 6.2.6(1)",
            V_Ed.at_most(sheared.V_pl_Rd),
            "the shear alone is resisted",
            "the shear alone is more than the section resists: not met",
        );
        outcome.verdict = Verdict::NotMet;
    }
    outcome
}

/// The bending resistances of one section under any shear, for searching along a beam: what does not depend on the
/// shear is worked out once.
#[derive(Clone, Copy)]
pub struct Reduced {
    bent: super::section::Bent<f64>,
    sheared: super::section::Sheared<f64>,
}

impl Reduced {
    /// None where the section is not verified (class 4, a web that could buckle in shear, too thick).
    pub fn of(steel: &Steel) -> Option<Reduced> {
        let w = &mut Silent;
        Some(Reduced { bent: bent(w, steel).ok()?, sheared: sheared(w, steel).ok()? })
    }

    /// M_c,Rd.
    pub fn bending(&self) -> Moment {
        self.bent.M_c_Rd
    }

    /// V_pl,Rd.
    pub fn shear(&self) -> Force {
        self.sheared.V_pl_Rd
    }

    /// M_V,Rd under a shear of this size (its sign does not matter).
    pub fn under(&self, shear: Force) -> Moment {
        with_shear(&mut Silent, &self.bent, &self.sheared, Force::from_si(shear.si().abs()))
    }
}

/// The worked example above.
pub fn example() -> Inputs {
    Inputs::BendingWithShear(BendingWithShear {
        steel: Steel::named("457x191x67 UB", Grade::S275),
        moment: two(80e3, 80e3),
        shear: two(200e3, 500e3 / 3.0),
    })
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::checks::example::near;
    use crate::checks::run;

    #[test]
    fn worked_example() {
        // By hand from (6.30): see the head of this file.
        let outcome = run(&example());
        near(outcome.demand, 228e3, 1e-12);
        near(outcome.capacity, 366e3, 0.005);
    }
}
