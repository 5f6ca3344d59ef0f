use crate::quantity::Length;

/// A load or bearing that acts beside the web.
#[derive(Clone, Debug, PartialEq)]
pub struct Torsion {
    /// What is off the web: a load row or a landing, as printed.
    pub what: String,
    pub offset: Length,
}
