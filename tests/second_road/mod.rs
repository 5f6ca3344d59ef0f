//! The second road: a calculation of a whole job that shares no type and no function with the program.
//!
//! It reads the text of a (valid) job with its own small reader, takes the sections from dimensions of its own,
//! assembles every beam of the building into one stiffness system, and finds envelopes by looking along a fine grid
//! and closing in on each peak. The program finds them from its polynomials: two roads to each number.
//!
//! Conventions: SI throughout (N, m, Pa, rad), loads and movements positive downward, sagging moments positive,
//! reactions positive upward, shear = dM/dx.
#![allow(dead_code)] // each test binary that includes this module uses a part of it

pub mod actions;
pub mod building;
pub mod compare;
pub mod element;
pub mod job;
pub mod limits;
pub mod profile_matrix;
pub mod required;
pub mod results;
pub mod search;
pub mod sections;
pub mod solve;
pub mod units;

/// The steel's modulus of elasticity, Pa (EN 1993-1-1 3.2.6).
pub const YOUNG: f64 = 210_000e6;
/// The steel's shear modulus, Pa (EN 1993-1-1 3.2.6, as the design rounds it).
pub const SHEAR_MODULUS: f64 = 81_000e6;
/// Weight of steel, N/m3: 7850 kg/m3 at 9.81 m/s2.
pub const STEEL_WEIGHT: f64 = 7850.0 * 9.81;
