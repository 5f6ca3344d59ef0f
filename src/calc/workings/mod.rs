//! Formulas that print themselves: a check is written once, generic over its number. On `f64` it is fast; on the
//! traced number the same code leaves its own working behind. See `DEVELOPERS.md`, "A check is written once".

pub mod account;
pub mod decimal;
mod figures;
pub mod formula;
pub mod glossary;
pub mod lines;
pub mod number;
pub mod quantity;
pub mod symbol;
pub mod tape;
pub mod unit;

pub use lines::{Requirement, Silent, Words, Workings};
pub use number::Number;
pub use tape::{Tape, Traced};
