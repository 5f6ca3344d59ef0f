//! Structural steel: grades, yield strengths, elastic constants.

use crate::quantity::{Length, Stress};

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

/// Thickness up to which a yield strength holds, mm, and the strength, N/mm2.
type Step = (f64, f64);

/// EN 10025-2 Table 6 (ReH), up to 100 mm.
const S235: [Step; 5] = [(16.0, 235.0), (40.0, 225.0), (63.0, 215.0), (80.0, 215.0), (100.0, 215.0)];
/// EN 10025-2 Table 6 (ReH), up to 100 mm.
const S275: [Step; 5] = [(16.0, 275.0), (40.0, 265.0), (63.0, 255.0), (80.0, 245.0), (100.0, 235.0)];
/// EN 10025-2 Table 6 (ReH), up to 100 mm.
const S355: [Step; 5] = [(16.0, 355.0), (40.0, 345.0), (63.0, 335.0), (80.0, 325.0), (100.0, 315.0)];
/// EN 10025-4 Table 5 (ReH, grade S460M), up to 100 mm.
const S460: [Step; 5] = [(16.0, 460.0), (40.0, 440.0), (63.0, 430.0), (80.0, 410.0), (100.0, 400.0)];

impl Grade {
    pub const ALL: [Grade; 4] = [Grade::S235, Grade::S275, Grade::S355, Grade::S460];

    /// As a job file and a drawing write it.
    pub fn name(self) -> &'static str {
        match self {
            Grade::S235 => "S235",
            Grade::S275 => "S275",
            Grade::S355 => "S355",
            Grade::S460 => "S460",
        }
    }

    /// The grade of this name, capitals or not, surrounding spaces ignored.
    pub fn parse(name: &str) -> Option<Grade> {
        Grade::ALL.into_iter().find(|grade| grade.name().eq_ignore_ascii_case(name.trim()))
    }

    /// The product standard that its yield strengths for open sections come from.
    pub fn product_standard(self) -> &'static str {
        match self {
            Grade::S235 | Grade::S275 | Grade::S355 => "EN 10025-2",
            Grade::S460 => "EN 10025-4",
        }
    }

    fn steps(self) -> &'static [Step] {
        match self {
            Grade::S235 => &S235,
            Grade::S275 => &S275,
            Grade::S355 => &S355,
            Grade::S460 => &S460,
        }
    }
}

/// A row of a table of yield strengths: up to which thickness it holds.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct YieldRow {
    pub up_to: Length,
    pub strength: Stress,
}

/// The row of the product standard's table for this thickness; `None` where it is thicker than the table goes.
pub fn yield_row(grade: Grade, thickness: Length) -> Option<YieldRow> {
    let of =
        |(up_to, strength): &Step| YieldRow { up_to: Length::mm(*up_to), strength: Stress::n_per_mm2(*strength) };
    grade.steps().iter().map(of).find(|row| thickness.to_m() <= row.up_to.to_m())
}

/// Yield strength f_y of open sections (UK NA.2.4 to EN 1993-1-1: from the product standard) for the thicker of flange
/// and web; `None` where it is thicker than the table goes.
pub fn yield_strength(grade: Grade, thickness: Length) -> Option<Stress> {
    yield_row(grade, thickness).map(|row| row.strength)
}

#[cfg(test)]
mod tests {
    use super::*;

    /// EN 10025-2 Table 6 (S235 to S355) and EN 10025-4 Table 5 (S460M), ReH in N/mm2 by thickness in mm; from memory.
    #[test]
    fn yield_strength_steps_down_with_thickness() {
        let thicknesses = [3.0, 16.0, 16.01, 40.0, 40.01, 63.0, 63.01, 80.0, 80.01, 100.0];
        let cases = [
            (Grade::S235, [235, 235, 225, 225, 215, 215, 215, 215, 215, 215]),
            (Grade::S275, [275, 275, 265, 265, 255, 255, 245, 245, 235, 235]),
            (Grade::S355, [355, 355, 345, 345, 335, 335, 325, 325, 315, 315]),
            (Grade::S460, [460, 460, 440, 440, 430, 430, 410, 410, 400, 400]),
        ];
        for (grade, strengths) in cases {
            for (thickness, strength) in thicknesses.into_iter().zip(strengths) {
                let found = yield_strength(grade, Length::mm(thickness));
                assert_eq!(found, Some(Stress::n_per_mm2(f64::from(strength))), "{grade:?} at {thickness} mm");
            }
            for beyond in [100.01, 140.0, f64::INFINITY, f64::NAN] {
                assert_eq!(yield_strength(grade, Length::mm(beyond)), None, "{grade:?} at {beyond} mm");
            }
        }
    }

    #[test]
    fn grades_are_known_by_their_names() {
        for grade in Grade::ALL {
            assert_eq!(Grade::parse(grade.name()), Some(grade));
            assert_eq!(Grade::parse(&format!(" {} ", grade.name().to_lowercase())), Some(grade));
        }
        for other in ["", "S 275", "S275JR", "275", "S450"] {
            assert_eq!(Grade::parse(other), None, "{other:?}");
        }
    }
}
