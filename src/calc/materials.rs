//! Structural steel: grades, yield strengths, elastic constants.

use crate::quantity::Stress;

/// EN 1993-1-1 3.2.6.
pub const E: Stress = Stress::n_per_mm2(210_000.0);
/// EN 1993-1-1 3.2.6, rounded as the standard gives it.
pub const G: Stress = Stress::n_per_mm2(81_000.0);
/// kg/m3, EN 1991-1-1 Table A.4.
pub const DENSITY: f64 = 7850.0;
/// m/s2.
pub const GRAVITY: f64 = 9.81;

#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Grade {
    S235,
    S275,
    S355,
    S460,
}
