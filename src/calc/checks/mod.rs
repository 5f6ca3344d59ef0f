//! The checks, one file each. Every check is written once, generic over its number: [`run`] gives the figures,
//! [`workings`] the same figures with their derivation.

pub mod bending;
pub mod bending_with_shear;
pub mod combined;
pub mod deflection;
pub mod inputs;
pub mod lateral_torsional_buckling;
pub mod shear;
pub mod stacked_deflection;
pub mod tilt;
pub mod torsion;
pub mod uplift;
pub mod web_under_force;
pub mod web_with_bending;

pub use combined::Combined;
pub use inputs::{Inputs, Steel};

use crate::quantity::SecondMoment;
use crate::results::{CheckUnit, Verdict};

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
    Of(SecondMoment),
    /// The supports have used the whole budget: no beam, however stiff, keeps the limit.
    BudgetUsed,
}

/// Runs a check on plain numbers.
pub fn run(_inputs: &Inputs) -> Outcome {
    unimplemented!()
}
