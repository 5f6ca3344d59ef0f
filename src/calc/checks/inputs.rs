//! What each check is computed from.

use super::bending::Bending;
use super::bending_with_shear::BendingWithShear;
use super::deflection::Deflection;
use super::lateral_torsional_buckling::LateralTorsionalBuckling;
use super::shear::Shear;
use super::stacked_deflection::StackedDeflection;
use super::tilt::TiltOfBearings;
use super::torsion::Torsion;
use super::uplift::Uplift;
use super::web_under_force::WebUnderForce;
use super::web_with_bending::WebWithBending;
use crate::actions::Choices;
use crate::materials::Grade;
use crate::sections::Section;

/// The inputs of one check, as plain numbers.
#[derive(Clone, Debug, PartialEq)]
pub enum Inputs {
    Bending(Bending),
    Shear(Shear),
    BendingWithShear(BendingWithShear),
    LateralTorsionalBuckling(LateralTorsionalBuckling),
    WebUnderForce(WebUnderForce),
    WebWithBending(WebWithBending),
    Uplift(Uplift),
    Deflection(Deflection),
    StackedDeflection(StackedDeflection),
    Tilt(TiltOfBearings),
    Torsion(Torsion),
}

/// What resists: one section of one grade, under one set of national choices (they give the partial factors).
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Steel {
    pub section: Section,
    pub grade: Grade,
    pub choices: Choices,
}
