//! Shear, EN 1993-1-1 6.2.6: V_Ed ≤ V_pl,Rd.
//!
//! V_Ed: design shear of greatest size, kN. A_v = A − 2 b t_f + (t_w + 2 r) t_f ≥ η h_w t_w, mm², η = 1.0
//! (EN 1993-1-1 6.2.6(3)a; UK NA to EN 1993-1-5, NA.2.4). V_pl,Rd = A_v (f_y / √3) / γ_M0, kN.
//! A web with h_w / t_w > 72 ε is not verified: it could buckle in shear (EN 1993-1-5 5.1(2)).
//!
//! Worked example: 533x210x92 UB in S275, with the area as section tables round it, 117 cm²: A_v = 11700 − 6530 +
//! 554 = 5724 mm², V_pl,Rd = 909 kN (published worked example of a restrained beam, from memory); with V_Ed = 1.35 ×
//! 200 + 1.5 × 126.6 = 459.9 kN utilisation 0.51. The unrounded area, 117.4 cm², gives 915 kN.

use super::Inputs;
use super::combined::{Writing, size};
use super::example::two;
use super::section::sheared;
use super::{Combined, Outcome, Steel, judge, unverified};
use crate::materials::Grade;
use crate::quantity::Area;
use crate::results::CheckUnit;
use crate::workings::{Number, Workings, glossary};

pub(super) const CLAUSE: &str = "EN 1993-1-1 6.2.6";

/// `shear`: the shear of greatest size over the beam; its sign does not matter.
#[derive(Clone, Debug, PartialEq)]
pub struct Shear {
    pub steel: Steel,
    pub shear: Combined<1, 0>,
}

pub(super) const SHEAR: Writing<'_, 1, 0> = Writing::new(&glossary::V_Ed, &glossary::V, "shears");

pub(super) fn check<N: Number, W: Workings<N>>(w: &mut W, inputs: &Shear) -> Outcome {
    let V_Ed = size(w, &inputs.shear, &SHEAR);
    match sheared(w, &inputs.steel) {
        Ok(sheared) => judge(w, CLAUSE, V_Ed, sheared.V_pl_Rd, CheckUnit::Force),
        Err(refusal) => unverified(w, CLAUSE, V_Ed, CheckUnit::Force, refusal.reason()),
    }
}

/// The worked example above.
pub fn example() -> Inputs {
    let mut steel = Steel::named("533x210x92 UB", Grade::S275);
    steel.section.area = Area::cm2(117.0);
    Inputs::Shear(Shear { steel, shear: two(200e3, 126.6e3) })
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::checks::example::near;
    use crate::checks::run;

    #[test]
    fn worked_example() {
        // V_pl,Rd 909 kN: published worked example of a restrained beam, from memory.
        let outcome = run(&example());
        near(outcome.capacity, 909e3, 0.001);
        near(outcome.demand, 459.9e3, 1e-12);
    }

    #[test]
    fn published_resistance() {
        // 457x191x67 UB in S275: V_pl,Rd 650 kN, section tables, from memory.
        let steel = Steel::named("457x191x67 UB", Grade::S275);
        near(run(&Inputs::Shear(Shear { steel, shear: two(1e3, 1e3) })).capacity, 650e3, 0.005);
    }
}
