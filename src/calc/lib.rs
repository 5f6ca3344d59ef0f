//! The calculation of sagledger: a [`Building`](building::Building) in, [`Results`](results::Results) out.
//!
//! Pure: no files, no clock, no printing, no typesetting. Everything inside is SI (N, m, Pa, rad); units exist
//! only at the two doors, where a job is read and where figures are printed.
//!
//! Sign conventions: loads and movements positive downward, reactions positive upward, sagging moments positive,
//! shear positive where the part of the beam to the left is pushed up.

#![deny(clippy::unwrap_used, clippy::expect_used, clippy::dbg_macro, clippy::todo, clippy::unimplemented)]

pub mod actions;
pub mod analysis;
pub mod assumptions;
pub mod building;
pub mod calculate;
pub mod checks;
pub mod fault;
pub mod limits;
pub mod materials;
pub mod members;
pub mod outside;
pub mod results;
pub mod sections;
pub mod standards;
pub mod words;
pub mod workings;

pub use calculate::calculate;
pub use workings::quantity;
