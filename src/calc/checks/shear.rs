use super::{Combined, Steel};

/// `shear`: the shear of greatest size over the beam; its sign does not matter.
#[derive(Clone, Debug, PartialEq)]
pub struct Shear {
    pub steel: Steel,
    pub shear: Combined<1, 0>,
}
