//! Web under a concentrated force with bending, EN 1993-1-5 7.2: η_2 + 0.8 η_1 ≤ 1.4.
//!
//! η_2 = F_Ed / F_Rd; η_1 = M_Ed / (W_el f_y / γ_M0) for sections of classes 1 to 3. Force, kN, and moment, kNm, are
//! the greatest at the place, whatever combination each belongs to, which is on the safe side. Both are pure numbers.
//!
//! Worked example (by hand): η_2 = 0.50 and η_1 = 0.60 give 0.50 + 0.8 × 0.60 = 0.98 ≤ 1.4, utilisation 0.70.

use super::bending::MOMENT;
use super::combined::size;
use super::example::two;
use super::section::bent;
use super::web_under_force::{STIFFENER, WebUnderForce, force_and_resistance};
use super::{Combined, Outcome, judge, unverified_without_demand};
use super::{Inputs, web_under_force};
use crate::quantity::number;
use crate::results::{CheckUnit, Verdict};
use crate::workings::lines::step;
use crate::workings::{Number, Workings};

pub(super) const CLAUSE: &str = "EN 1993-1-5 7.2";

/// The force on the web together with the moment of greatest size at the same place.
#[derive(Clone, Debug, PartialEq)]
pub struct WebWithBending {
    pub web: WebUnderForce,
    pub moment: Combined<1, 1>,
}

pub(super) fn check<N: Number, W: Workings<N>>(w: &mut W, inputs: &WebWithBending) -> Outcome {
    let bent = match bent(w, &inputs.web.steel) {
        Ok(bent) => bent,
        Err(refusal) => return unverified_without_demand(w, CLAUSE, CheckUnit::Ratio, refusal.reason()),
    };
    let (F_Ed, F_Rd) = force_and_resistance(w, &inputs.web, &bent.yielding);
    let M_Ed = size(w, &inputs.moment, &MOMENT);
    let (f_y, W_el_y, gamma_M0) = (bent.yielding.f_y, bent.yielding.profile.W_el_y, bent.gamma_M0);
    w.say("the share of the force and four fifths of the share of the moment together stay below 1.4");
    step!(w, "EN 1993-1-5 7.2(1)", eta_2 = F_Ed / F_Rd);
    step!(w, "EN 1993-1-5 4.6(1)", eta_1 = M_Ed / (W_el_y * f_y / gamma_M0));
    step!(w, "EN 1993-1-5 7.2(1), (7.2)", eta = eta_2 + 0.8 * eta_1);
    let mut outcome = judge(w, CLAUSE, eta, number(1.4), CheckUnit::Ratio);
    if outcome.verdict == Verdict::NotMet {
        w.note("EN 1993-1-5 9.4", STIFFENER);
        outcome.reason = Some(STIFFENER.into());
    }
    outcome
}

/// The worked example above, by the resistances of the section of the example of a web under force.
pub fn example() -> Inputs {
    let Inputs::WebUnderForce(web) = web_under_force::example() else { return web_under_force::example() };
    // Half of 329 kN, and 0.60 of 432.6 cm3 x 275 N/mm2 = 119 kNm.
    let web = WebUnderForce { force: two(60e3, 55.67e3), ..web };
    let moment = two(30e3, 20.59e3);
    Inputs::WebWithBending(WebWithBending { web, moment })
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
        near(outcome.demand, 0.98, 0.003);
        near(outcome.capacity, 1.4, 1e-12);
        near(outcome.utilisation, 0.70, 0.003);
    }
}
