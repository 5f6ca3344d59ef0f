use super::{Combined, Steel};

/// Moment and shear of greatest size at the place where their ratio to the reduced resistance is greatest.
#[derive(Clone, Debug, PartialEq)]
pub struct BendingWithShear {
    pub steel: Steel,
    pub moment: Combined<1, 1>,
    pub shear: Combined<1, 0>,
}
