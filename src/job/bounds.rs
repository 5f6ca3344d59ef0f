//! The least and the greatest value of every quantity of a job, in one table: the reader's checks, the texts of
//! faults, the schema, the guide and the generators of tests all use it. Wide enough for any real building.

use super::quantity::{self, Dimension};

/// The bounds of one quantity, both ends included, written as in a job file.
#[derive(Debug, PartialEq)]
pub struct Bounds {
    /// In words, as in "600 m is no length of a beam".
    pub name: &'static str,
    pub dimension: Dimension,
    pub least: &'static str,
    pub greatest: &'static str,
    /// A usual value.
    pub example: &'static str,
}

impl Bounds {
    const fn of(
        name: &'static str,
        dimension: Dimension,
        least: &'static str,
        greatest: &'static str,
        example: &'static str,
    ) -> Bounds {
        Bounds { name, dimension, least, greatest, example }
    }

    /// Least and greatest value in SI units, angles in radians.
    pub fn si(&self) -> (f64, f64) {
        // A bound that cannot be read admits nothing; a test reads them all.
        let si = |text| quantity::si(text, self.dimension).unwrap_or(f64::NAN);
        (si(self.least), si(self.greatest))
    }

    /// Whether an SI value lies within, ends included; what is not a number does not.
    pub fn admit(&self, si: f64) -> bool {
        let (least, greatest) = self.si();
        si >= least && si <= greatest
    }

    /// Whether negative values are meant to be possible.
    pub fn signed(&self) -> bool {
        self.least.starts_with('-')
    }

    /// "0.1 m to 60 m".
    pub fn range(&self) -> String {
        format!("{} to {}", self.least, self.greatest)
    }
}

use Dimension::{Angle, AreaLoad, Force, Length, LineLoad, WeightDensity};

pub static BEAM_LENGTH: Bounds = Bounds::of("length of a beam", Length, "0.1 m", "60 m", "5.20 m");
pub static PLACE: Bounds = Bounds::of("place along a beam", Length, "0 m", "60 m", "1.60 m");
pub static SEAT: Bounds = Bounds::of("bearing length", Length, "10 mm", "3 m", "150 mm");
pub static SETTLEMENT: Bounds = Bounds::of("settlement", Length, "0 mm", "500 mm", "2 mm");
pub static OFFSET: Bounds = Bounds::of("offset from a web", Length, "0 mm", "2 m", "60 mm");
pub static WIDTH: Bounds = Bounds::of("tributary width", Length, "10 mm", "100 m", "3.40 m");
pub static HEIGHT: Bounds = Bounds::of("height of a wall", Length, "10 mm", "60 m", "2.40 m");
pub static THICKNESS: Bounds = Bounds::of("thickness of a layer", Length, "0.01 mm", "5 m", "15 mm");
pub static LIMIT: Bounds = Bounds::of("limit of a movement", Length, "0.1 mm", "1 m", "10 mm");
pub static PITCH: Bounds = Bounds::of("pitch", Angle, "0 deg", "75 deg", "38 deg");
pub static LAYER_LOAD: Bounds = Bounds::of("load of a layer", AreaLoad, "0 kN/m2", "200 kN/m2", "0.42 kN/m2");
pub static DENSITY: Bounds = Bounds::of("density of a layer", WeightDensity, "0.01 kN/m3", "250 kN/m3", "20 kN/m3");
pub static IMPOSED_AREA: Bounds = Bounds::of("imposed load", AreaLoad, "0 kN/m2", "200 kN/m2", "1.50 kN/m2");
pub static PARTITIONS: Bounds = Bounds::of("load of partitions", AreaLoad, "0 kN/m2", "20 kN/m2", "0.50 kN/m2");
pub static SNOW_AREA: Bounds = Bounds::of("snow load", AreaLoad, "0 kN/m2", "50 kN/m2", "0.30 kN/m2");
pub static WIND_AREA: Bounds = Bounds::of("wind load", AreaLoad, "-20 kN/m2", "20 kN/m2", "-0.60 kN/m2");
pub static LINE_LOAD: Bounds = Bounds::of("line load", LineLoad, "0 kN/m", "5000 kN/m", "1.2 kN/m");
pub static LINE_WIND: Bounds = Bounds::of("wind line load", LineLoad, "-5000 kN/m", "5000 kN/m", "-1.2 kN/m");
pub static POINT_LOAD: Bounds = Bounds::of("point load", Force, "0 kN", "20000 kN", "4.0 kN");
pub static POINT_WIND: Bounds = Bounds::of("wind point load", Force, "-20000 kN", "20000 kN", "-4.0 kN");
pub static HELD_DOWN: Bounds = Bounds::of("resistance to uplift", Force, "0 kN", "20000 kN", "6 kN");

/// Every quantity with a unit.
pub static TABLE: [&Bounds; 21] = [
    &BEAM_LENGTH,
    &PLACE,
    &SEAT,
    &SETTLEMENT,
    &OFFSET,
    &WIDTH,
    &HEIGHT,
    &THICKNESS,
    &LIMIT,
    &PITCH,
    &LAYER_LOAD,
    &DENSITY,
    &IMPOSED_AREA,
    &PARTITIONS,
    &SNOW_AREA,
    &WIND_AREA,
    &LINE_LOAD,
    &LINE_WIND,
    &POINT_LOAD,
    &POINT_WIND,
    &HELD_DOWN,
];

/// Bounds of a plain number.
#[derive(Debug, PartialEq)]
pub struct Count {
    pub name: &'static str,
    pub least: f64,
    pub greatest: f64,
}

impl Count {
    pub fn admit(&self, value: f64) -> bool {
        value >= self.least && value <= self.greatest
    }
}

/// n of "span/n".
pub static SPAN_OVER: Count = Count { name: "n of span/n", least: 20.0, greatest: 10_000.0 };
/// n of "1/n".
pub static ONE_IN: Count = Count { name: "n of 1/n", least: 20.0, greatest: 100_000.0 };
/// Characters of a mark or a name.
pub static NAME_CHARACTERS: Count = Count { name: "characters of a mark or name", least: 1.0, greatest: 24.0 };
/// Characters of any other text.
pub static TEXT_CHARACTERS: Count = Count { name: "characters of a text", least: 1.0, greatest: 500.0 };
/// Years a package may be dated.
pub static YEAR: Count = Count { name: "year of a date", least: 1900.0, greatest: 2199.0 };

/// Every plain number.
pub static COUNTS: [&Count; 5] = [&SPAN_OVER, &ONE_IN, &NAME_CHARACTERS, &TEXT_CHARACTERS, &YEAR];

/// Least distance between two bearings of a beam, in m.
pub const BEARING_SPACING: f64 = 0.020;
/// The same, as messages write it.
pub const BEARING_SPACING_TEXT: &str = "20 mm";
/// Length of a seat on a wall where none is given, in m (common practice).
pub const SEAT_DEFAULT: f64 = 0.100;
/// Seats on walls shorter than this, in m, are warned of (common practice).
pub const SEAT_SHORT: f64 = 0.075;

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn every_bound_can_be_read_and_holds_its_example() {
        for bounds in TABLE {
            let (least, greatest) = bounds.si();
            assert!(least < greatest, "{}", bounds.name);
            let example = quantity::si(bounds.example, bounds.dimension).unwrap();
            assert!(bounds.admit(example), "{}", bounds.name);
            assert!(bounds.admit(least) && bounds.admit(greatest), "{}", bounds.name);
            assert!(!bounds.admit(f64::NAN) && !bounds.admit(f64::INFINITY), "{}", bounds.name);
        }
    }

    #[test]
    fn names_are_unique() {
        let mut names: Vec<&str> = TABLE.iter().map(|b| b.name).chain(COUNTS.iter().map(|c| c.name)).collect();
        names.sort_unstable();
        let all = names.len();
        names.dedup();
        assert_eq!(names.len(), all);
    }
}
