//! The checks, one file each. Every check is written once, generic over its number.

/// What a check is computed from.
#[derive(Clone, Debug, PartialEq)]
pub enum Inputs {}
