//! The checks, one file each. Every check is written once, generic over its number: [`run`] gives the figures,
//! [`workings`] the same figures with their derivation.

// Checks carry the symbols of the standards (M_Ed, W_pl, A_v), so that they read like the clause.
#![allow(non_snake_case)]

pub mod account;
pub mod bending;
pub mod bending_with_shear;
pub mod combined;
pub mod deflection;
mod example;
pub mod generated;
pub mod inputs;
pub mod lateral_torsional_buckling;
pub mod limit;
pub mod places;
pub mod registry;
mod section;
pub mod shear;
pub mod stacked_deflection;
pub mod tilt;
pub mod torsion;
pub mod uplift;
pub mod web_under_force;
pub mod web_with_bending;

pub use account::account;
pub use bending_with_shear::Reduced;
pub use combined::Combined;
pub use inputs::{Inputs, Steel};
pub use section::{Class, class_in_bending};

use crate::quantity::{Q, SecondMoment};
use crate::results::{CheckUnit, Verdict};
use crate::workings::{Number, Silent, Tape, Words, Workings};

/// What a check found; everything SI.
#[derive(Clone, Debug, PartialEq)]
pub struct Outcome {
    pub demand: Option<f64>,
    pub capacity: Option<f64>,
    pub unit: CheckUnit,
    /// Demand over capacity; none where it has no value.
    pub utilisation: Option<f64>,
    pub verdict: Verdict,
    /// Why it is not verified, or what else is required where it is not met.
    pub reason: Option<String>,
    /// The clause or the limit as the clause column of a table prints it.
    pub clause: String,
    /// Printed as the check's name instead of its kind.
    pub note: Option<&'static str>,
    /// What a limited movement asks of the beam's second moment of area.
    pub required: Option<Required>,
}

/// The second moment of area that a limit asks for.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Required {
    /// Not positive where the beam's own movement relieves.
    Of(SecondMoment),
    /// The supports have used the whole budget: no beam, however stiff, keeps the limit.
    BudgetUsed,
}

/// Runs a check on plain numbers.
pub fn run(inputs: &Inputs) -> Outcome {
    check(&mut Silent, inputs)
}

/// Runs the same check on traced numbers: its workings are left on the tape, its figures are those of [`run`] bit for
/// bit.
pub fn workings(inputs: &Inputs, mut tape: &Tape) -> Outcome {
    check(&mut tape, inputs)
}

fn check<N: Number, W: Workings<N>>(w: &mut W, inputs: &Inputs) -> Outcome {
    match inputs {
        Inputs::Bending(inputs) => bending::check(w, inputs),
        Inputs::Shear(inputs) => shear::check(w, inputs),
        Inputs::BendingWithShear(inputs) => bending_with_shear::check(w, inputs),
        Inputs::LateralTorsionalBuckling(inputs) => lateral_torsional_buckling::check(w, inputs),
        Inputs::WebUnderForce(inputs) => web_under_force::check(w, inputs),
        Inputs::WebWithBending(inputs) => web_with_bending::check(w, inputs),
        Inputs::Uplift(inputs) => uplift::check(w, inputs),
        Inputs::Deflection(inputs) => deflection::check(w, inputs),
        Inputs::StackedDeflection(inputs) => stacked_deflection::check(w, inputs),
        Inputs::Tilt(inputs) => tilt::check(w, inputs),
        Inputs::Torsion(inputs) => torsion::check(w, inputs),
    }
}

/// Demand against capacity. A capacity of nought has no utilisation unless the demand is nought too.
fn judge<N: Number, W: Workings<N>, const F: i8, const L: i8>(
    w: &mut W,
    clause: impl Words,
    demand: Q<N, F, L>,
    capacity: Q<N, F, L>,
    unit: CheckUnit,
) -> Outcome {
    let clause = clause.words();
    let column = clause.clone();
    let (over, under) = (demand.plain().si(), capacity.plain().si());
    let (utilisation, met) = if under > 0.0 {
        let found = w.require(|| column, demand, capacity);
        (Some(found.utilisation), found.met)
    } else {
        let met =
            w.judged(|| column, demand.at_most(capacity), "the requirement is met", "the requirement is not met");
        ((over == 0.0).then_some(0.0), met)
    };
    Outcome {
        demand: Some(over),
        capacity: Some(under),
        unit,
        utilisation,
        verdict: if met { Verdict::Met } else { Verdict::NotMet },
        reason: None,
        clause,
        note: None,
        required: None,
    }
}

/// A demand whose capacity this calculation does not give.
fn unverified<N: Number, W: Workings<N>, const F: i8, const L: i8>(
    w: &mut W,
    clause: &'static str,
    demand: Q<N, F, L>,
    unit: CheckUnit,
    reason: &'static str,
) -> Outcome {
    Outcome { demand: Some(demand.plain().si()), ..unverified_without_demand(w, clause, unit, reason) }
}

fn unverified_without_demand<N: Number, W: Workings<N>>(
    w: &mut W,
    clause: &'static str,
    unit: CheckUnit,
    reason: &'static str,
) -> Outcome {
    w.note(clause, || format!("Not verified: {reason}."));
    Outcome {
        demand: None,
        capacity: None,
        unit,
        utilisation: None,
        verdict: Verdict::NotVerified,
        reason: Some(reason.into()),
        clause: clause.into(),
        note: None,
        required: None,
    }
}
