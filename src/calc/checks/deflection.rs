use super::Combined;
use crate::limits::Limit;
use crate::quantity::SecondMoment;
use crate::results::Stretch;

/// An own movement (total, after or variable) against its limit.
#[derive(Clone, Debug, PartialEq)]
pub struct Deflection {
    /// `limit.movement` says which movement this is.
    pub limit: Limit,
    /// The span or overhang that it is measured in.
    pub stretch: Stretch,
    pub movement: Combined<0, 1>,
    pub second_moment: SecondMomentInHand,
}

/// The beam's second moment of area, and how the one that a limit asks for follows from it.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum SecondMomentInHand {
    /// Two bearings: own movements are inversely proportional to it.
    Scales { provided: SecondMoment },
    /// Continuous: `required` was found by solving again with other second moments; none where none keeps the limit.
    Resolved { provided: SecondMoment, required: Option<SecondMoment> },
}
