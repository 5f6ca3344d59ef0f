use super::{Combined, Steel};

/// A segment between places where the beam is held against lateral movement and twist.
#[derive(Clone, Debug, PartialEq)]
pub struct LateralTorsionalBuckling {
    pub steel: Steel,
    /// The moment of greatest size in the segment.
    pub moment: Combined<1, 1>,
    /// The flange in compression is held along the whole segment.
    pub held: bool,
}
