use super::Combined;
use super::deflection::SecondMomentInHand;
use crate::limits::Limit;
use crate::quantity::Length;
use crate::results::Stretch;

/// An absolute movement against its limit, at the place of the greatest ratio to it. `own`, `inherited` and
/// `settled` belong to one combination, arrangement and place and add up to it.
#[derive(Clone, Debug, PartialEq)]
pub struct StackedDeflection {
    pub limit: Limit,
    pub stretch: Stretch,
    /// In an overhang: the span beside it, whose limit counts where it is the larger.
    pub beside: Option<Stretch>,
    /// Own movement at the place, by action.
    pub own: Combined<0, 1>,
    pub inherited: Inherited,
    /// Movement from `settles` anywhere in the building, at the place.
    pub settled: Length,
    pub second_moment: SecondMomentInHand,
    pub hand_rule: Option<HandRule>,
}

/// The straight line between the two bearings beside the place, continued into an overhang.
#[derive(Clone, Debug, PartialEq)]
pub struct Inherited {
    pub left: BearingMovement,
    pub right: BearingMovement,
    /// From the left one to the right one.
    pub span: Length,
    /// From the left one to the place; negative in an overhang to its left.
    pub to_place: Length,
}

/// How far a bearing goes down without `settles`.
#[derive(Clone, Debug, PartialEq)]
pub struct BearingMovement {
    /// Mark of the beam or name of the wall.
    pub on: String,
    /// It stands on a wall.
    pub wall: bool,
    pub movement: Length,
}

/// The largest own movements down the worst route to the ground, simply added; never a check.
#[derive(Clone, Debug, PartialEq)]
pub struct HandRule {
    /// Marks and largest own movements, this beam first.
    pub route: Vec<(String, Length)>,
    /// The greatest stacked movement of this beam.
    pub exact: Length,
}
