//! Formulas that print themselves: see `DEVELOPERS.md`, "A check is written once".

pub mod quantity;
