use super::{Combined, Steel};

/// `moment`: the moment of greatest size over the beam; its sign does not matter.
#[derive(Clone, Debug, PartialEq)]
pub struct Bending {
    pub steel: Steel,
    pub moment: Combined<1, 1>,
}
