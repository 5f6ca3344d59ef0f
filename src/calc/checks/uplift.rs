use super::Combined;
use crate::quantity::Force;

/// `reaction`: the least reaction of a bearing over sets A and B, upward positive, so that uplift is negative.
#[derive(Clone, Debug, PartialEq)]
pub struct Uplift {
    pub reaction: Combined<1, 0>,
    /// Design resistance of what holds the bearing down.
    pub held_down: Option<Force>,
}
