use super::stacked_deflection::BearingMovement;
use crate::limits::Limit;
use crate::quantity::Length;

/// Difference of two neighbouring bearings over their distance, `settles` included; its sign does not matter.
#[derive(Clone, Debug, PartialEq)]
pub struct TiltOfBearings {
    pub limit: Limit,
    pub left: BearingMovement,
    pub right: BearingMovement,
    pub span: Length,
}
