//! A number with its unit, as a job file writes it.
//!
//! The value is the `f64` nearest to the decimal that was typed: the unit's power of ten joins the exponent before
//! the text is turned into a number, so that "9.3 mm" is read as 9.3e-3, not as 9.3 times 1e-3.

use super::number::{Number, scan};

/// What a unit measures.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Dimension {
    Length,
    Angle,
    Force,
    Moment,
    LineLoad,
    AreaLoad,
    Stress,
    WeightDensity,
    Mass,
    MassPerLength,
}

/// A unit: its spellings and the power of ten that leads to SI (degrees to degrees).
#[derive(Debug, PartialEq)]
pub struct Unit {
    pub spellings: &'static [&'static str],
    pub dimensions: &'static [Dimension],
    pub exponent: i32,
}

use Dimension::{Angle, AreaLoad, Force, Length, LineLoad, Mass, MassPerLength, Moment, Stress, WeightDensity};

/// Every unit of the language.
pub static UNITS: [Unit; 13] = [
    Unit { spellings: &["m"], dimensions: &[Length], exponent: 0 },
    Unit { spellings: &["mm"], dimensions: &[Length], exponent: -3 },
    Unit { spellings: &["kN"], dimensions: &[Force], exponent: 3 },
    Unit { spellings: &["N"], dimensions: &[Force], exponent: 0 },
    Unit { spellings: &["kN/m"], dimensions: &[LineLoad], exponent: 3 },
    Unit { spellings: &["N/mm"], dimensions: &[LineLoad], exponent: 3 },
    Unit { spellings: &["kN/m2", "kN/m²", "kPa"], dimensions: &[AreaLoad], exponent: 3 },
    Unit { spellings: &["N/mm2", "N/mm²", "MPa"], dimensions: &[Stress], exponent: 6 },
    Unit { spellings: &["kNm"], dimensions: &[Moment], exponent: 3 },
    Unit { spellings: &["kN/m3", "kN/m³"], dimensions: &[WeightDensity], exponent: 3 },
    Unit { spellings: &["deg"], dimensions: &[Angle], exponent: 0 },
    Unit { spellings: &["kg"], dimensions: &[Mass], exponent: 0 },
    Unit { spellings: &["kg/m"], dimensions: &[MassPerLength], exponent: 0 },
];

impl Dimension {
    /// The units that messages offer, the most usual first.
    pub fn units(self) -> &'static [&'static str] {
        match self {
            Length => &["m", "mm"],
            Angle => &["deg"],
            Force => &["kN", "N"],
            Moment => &["kNm"],
            LineLoad => &["kN/m", "N/mm"],
            AreaLoad => &["kN/m2", "kPa"],
            Stress => &["N/mm2", "MPa"],
            WeightDensity => &["kN/m3"],
            Mass => &["kg"],
            MassPerLength => &["kg/m"],
        }
    }
}

/// A quantity that was read.
#[derive(Clone, Debug, PartialEq)]
pub struct Quantity {
    /// N, m, rad.
    pub si: f64,
    /// As it was typed, with one blank before the unit.
    pub typed: String,
}

/// What is wrong with the text of a quantity.
#[derive(Clone, Debug, PartialEq)]
pub enum Trouble {
    /// No number stands where one should; what stands there.
    NotANumber(String),
    /// A decimal comma; the number meant.
    DecimalComma {
        meant: Number,
        unit: String,
    },
    /// A mark between thousands; the number meant, and what it would be if a decimal comma was.
    ThousandsMark {
        meant: Number,
        or: Option<Box<Number>>,
        unit: String,
    },
    UnitMissing(Number),
    /// Centimetres; the same in metres.
    Centimetre(Number),
    UnitUnknown(Number, String),
    UnitWrong(&'static str),
    /// Too large to be a number.
    Overflow(String),
}

/// Reads a quantity of one dimension; whether it lies within its bounds is not looked at.
pub fn read(text: &str, dimension: Dimension) -> Result<Quantity, Trouble> {
    let scanned = scan(text)?;
    let (number, unit) = (scanned.number, scanned.unit);
    if unit.is_empty() {
        return Err(Trouble::UnitMissing(number));
    }
    let Some((spelling, found)) = unit_called(unit) else {
        return Err(match unit {
            "cm" if dimension == Length => Trouble::Centimetre(number.shifted(-2)),
            _ => Trouble::UnitUnknown(number, unit.to_string()),
        });
    };
    if !found.dimensions.contains(&dimension) {
        return Err(Trouble::UnitWrong(spelling));
    }
    let typed = format!("{} {spelling}", number.text());
    match number.value(found.exponent) {
        Some(value) if dimension == Angle => Ok(Quantity { si: value.to_radians(), typed }),
        Some(value) => Ok(Quantity { si: value, typed }),
        None => Err(Trouble::Overflow(typed)),
    }
}

/// The SI value of a well written quantity.
pub fn si(text: &str, dimension: Dimension) -> Option<f64> {
    read(text, dimension).ok().map(|q| q.si)
}

/// What a text measures, by its unit alone.
pub(super) fn dimension_of(text: &str) -> Option<Dimension> {
    let unit = scan(text).ok()?.unit;
    unit_called(unit).and_then(|(_, unit)| unit.dimensions.first().copied())
}

fn unit_called(text: &str) -> Option<(&'static str, &'static Unit)> {
    UNITS.iter().find_map(|unit| {
        let spelling = unit.spellings.iter().find(|s| **s == text)?;
        Some((*spelling, unit))
    })
}

/// The unit that differs only in case, or is otherwise plainly meant.
pub(super) fn unit_meant(text: &str, dimension: Dimension) -> Option<&'static str> {
    let flat = |s: &str| s.replace(['^', ' '], "").replace('²', "2").replace('³', "3").to_lowercase();
    let words: &[(&str, &str)] = &[
        ("metre", "m"),
        ("metres", "m"),
        ("meter", "m"),
        ("meters", "m"),
        ("millimetre", "mm"),
        ("millimetres", "mm"),
        ("°", "deg"),
        ("degrees", "deg"),
        ("degree", "deg"),
        ("knm-2", "kN/m2"),
        ("kn/sqm", "kN/m2"),
        ("kn/qm", "kN/m2"),
    ];
    let typed = flat(text);
    let word = words.iter().find(|(word, _)| *word == typed).map(|(_, unit)| *unit);
    let fits = |unit: &&'static str| unit_called(unit).is_some_and(|(_, u)| u.dimensions.contains(&dimension));
    let spelled = || UNITS.iter().flat_map(|u| u.spellings).copied().filter(fits).find(|s| flat(s) == typed);
    word.filter(fits).or_else(spelled)
}

#[cfg(test)]
mod tests {
    use super::*;

    fn length(text: &str) -> Result<f64, Trouble> {
        read(text, Length).map(|q| q.si)
    }

    /// The literal on the right is turned into the nearest f64 by the compiler: an independent road.
    #[test]
    fn values_are_the_nearest_to_the_decimal() {
        let cases = [
            ("9.3 mm", 0.0093),
            ("9.3mm", 0.0093),
            ("  4.2  m ", 4.2),
            ("1.1e1 m", 11.0),
            ("0.1E-1m", 0.001e1),
            ("+3 m", 3.0),
            ("-3 m", -3.0),
            (".5 m", 0.5),
            ("5. m", 5.0),
            ("102.5 mm", 0.1025),
            ("0.3 mm", 0.0003),
            ("1234567890123456789 mm", 1_234_567_890_123_456.8),
        ];
        for (text, expected) in cases {
            assert_eq!(length(text), Ok(expected), "{text}");
        }
        assert_eq!(si("0.75 kN/m2", AreaLoad), Some(750.0));
        assert_eq!(si("0.7 kN/m²", AreaLoad), Some(700.0));
        assert_eq!(si("2.3 kPa", AreaLoad), Some(2300.0));
        assert_eq!(si("1.7 N/mm", LineLoad), Some(1700.0));
        assert_eq!(si("20 kN/m3", WeightDensity), Some(20_000.0));
        assert_eq!(si("38 deg", Angle), Some(38f64.to_radians()));
        assert_eq!(si("275 MPa", Stress), Some(275e6));
    }

    #[test]
    fn minus_nothing_is_nothing() {
        assert!(length("-0 m").unwrap().is_sign_positive());
    }

    #[test]
    fn nothing_that_is_no_finite_number_passes() {
        for text in
            ["nan m", "inf m", "-inf m", "NaN mm", "infinity m", "about 5 m", "m", "", " ", "- m", ". m", "1e m"]
        {
            assert!(matches!(length(text), Err(Trouble::NotANumber(_) | Trouble::UnitUnknown(..))), "{text}");
        }
        for text in ["1e400 m", "1e99999999999999999999 m", "-1e309 m"] {
            assert!(matches!(length(text), Err(Trouble::Overflow(_))), "{text}");
        }
        let long = format!("{} m", "9".repeat(400));
        assert!(matches!(length(&long), Err(Trouble::Overflow(_))));
        assert_eq!(length("1e-99999999999999999999 m"), Ok(0.0));
    }

    #[test]
    fn units_are_told_apart() {
        assert!(matches!(length("5.2"), Err(Trouble::UnitMissing(_))));
        assert!(matches!(length("520 cm"), Err(Trouble::Centimetre(n)) if n.text() == "5.20"));
        assert!(matches!(length("5 kN"), Err(Trouble::UnitWrong("kN"))));
        assert!(matches!(length("5 M"), Err(Trouble::UnitUnknown(..))));
        assert!(matches!(length("5 m m"), Err(Trouble::UnitUnknown(..))));
        assert_eq!(unit_meant("M", Length), Some("m"));
        assert_eq!(unit_meant("kn/m^2", AreaLoad), Some("kN/m2"));
        assert_eq!(unit_meant("kn", Length), None);
        assert_eq!(unit_meant("°", Angle), Some("deg"));
    }

    #[test]
    fn no_spelling_has_two_meanings() {
        let mut spellings: Vec<&str> = UNITS.iter().flat_map(|u| u.spellings).copied().collect();
        spellings.sort_unstable();
        let all = spellings.len();
        spellings.dedup();
        assert_eq!(spellings.len(), all);
    }
}
