//! Faults that only the calculation can find. They carry origins, never lines.

use crate::building::Origin;

#[derive(Clone, Debug, PartialEq)]
pub enum Fault {
    /// Beams that carry each other in a ring: the bearings that close it, in order; the last one closes the loop.
    CarriersLoop { bearings: Vec<LoopStep> },
    /// A beam with fewer than two bearings that act.
    Mechanism { beam: Origin },
}

/// One bearing of a ring of carriers.
#[derive(Clone, Debug, PartialEq)]
pub struct LoopStep {
    /// Mark of the beam that stands on the next one.
    pub mark: String,
    pub on: String,
    pub bearing: Origin,
}
