//! Decimals as they are printed. The exact value of a double is rounded once; units only move the point, so that a
//! figure printed in two places is one figure, rounded to more or fewer digits.

use std::fmt;

use super::unit::Unit;

/// U+2212, the minus sign.
pub const MINUS: char = '\u{2212}';

/// Powers of ten that a double holds exactly.
const TENS: [f64; 23] = [
    1e0, 1e1, 1e2, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8, 1e9, 1e10, 1e11, 1e12, 1e13, 1e14, 1e15, 1e16, 1e17, 1e18, 1e19,
    1e20, 1e21, 1e22,
];

/// A decimal number `digits × 10^exponent` with a sign; zero has none.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Decimal {
    negative: bool,
    digits: u64,
    exponent: i32,
}

/// How far a figure is rounded.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Rounding {
    /// To this many significant figures, 1 to 17.
    Significant(u8),
    /// To this many places after the point, in the unit that it is printed in.
    Places(u8),
}

impl Decimal {
    pub const ZERO: Decimal = Decimal { negative: false, digits: 0, exponent: 0 };

    /// An SI value rounded once and written in `unit`. A value that is not finite becomes `None`.
    pub fn rounded(si: f64, rounding: Rounding, unit: Unit) -> Option<Decimal> {
        let rounded = match rounding {
            Rounding::Significant(figures) => Self::significant(si, figures),
            Rounding::Places(places) => Self::at_power(si, unit.power() - i32::from(places)),
        };
        rounded.map(|d| d.moved(-unit.power()))
    }

    /// The exact value of `x`, rounded to significant figures (ties to even).
    pub fn significant(x: f64, figures: u8) -> Option<Decimal> {
        let figures = figures.clamp(1, 17);
        if !x.is_finite() {
            return None;
        }
        if x == 0.0 {
            return Some(Decimal { exponent: 1 - i32::from(figures), ..Decimal::ZERO });
        }
        Self::parse_scientific(&format!("{:.*e}", usize::from(figures) - 1, x))
    }

    /// The exact value of `x`, rounded to a multiple of 10^power (ties to even).
    fn at_power(x: f64, power: i32) -> Option<Decimal> {
        if !x.is_finite() {
            return None;
        }
        let leading = format!("{x:.17e}");
        let magnitude: i32 = leading.split_once('e').and_then(|(_, e)| e.parse().ok())?;
        let figures = magnitude - power + 1;
        if x == 0.0 || figures < 0 {
            return Some(Decimal { exponent: power, ..Decimal::ZERO });
        }
        if figures == 0 {
            // Less than one unit of the last place: it rounds to none or to one.
            let above_half = x.abs() > format!("5e{}", power - 1).parse().ok()?;
            let digits = u64::from(above_half);
            return Some(Decimal { negative: above_half && x < 0.0, digits, exponent: power });
        }
        let figures = u8::try_from(figures).ok().filter(|f| *f <= 17).unwrap_or(17);
        let mut rounded = Self::significant(x, figures)?;
        // 9.96 to one place has gained a figure, which is one more than was asked for.
        while rounded.exponent > power && rounded.digits < 10u64.pow(17) {
            rounded.digits *= 10;
            rounded.exponent -= 1;
        }
        Some(rounded)
    }

    fn parse_scientific(text: &str) -> Option<Decimal> {
        let (mantissa, exponent) = text.split_once('e')?;
        let negative = mantissa.starts_with('-');
        let mantissa = mantissa.trim_start_matches('-');
        let (whole, fraction) = mantissa.split_once('.').unwrap_or((mantissa, ""));
        let digits: u64 = format!("{whole}{fraction}").parse().ok()?;
        let exponent = exponent.parse::<i32>().ok()? - i32::try_from(fraction.len()).ok()?;
        Some(Decimal { negative: negative && digits != 0, digits, exponent })
    }

    /// The shortest decimal that reads back as `x` within a few units in its last binary place, if that takes at most
    /// `most` figures: `x` is then taken to have been typed so.
    pub fn as_typed(x: f64, most: u8) -> Option<Decimal> {
        if x == 0.0 {
            return Some(Decimal::ZERO);
        }
        (1..=most).filter_map(|n| Self::significant(x, n)).find(|d| {
            let error = (d.value() - x).abs();
            error <= 8.0 * f64::EPSILON * x.abs()
        })
    }

    /// The decimal read back as a double.
    pub fn value(self) -> f64 {
        let sign = if self.negative { -1.0 } else { 1.0 };
        // Up to these sizes digits and power of ten are exact doubles, so that one operation rounds correctly.
        let exact = self.digits < 1 << 53;
        match usize::try_from(self.exponent.unsigned_abs()).ok().and_then(|n| TENS.get(n)) {
            Some(ten) if exact && self.exponent >= 0 => sign * (self.digits as f64 * ten),
            Some(ten) if exact => sign * (self.digits as f64 / ten),
            // A decimal of at most 17 digits always reads.
            _ => sign * format!("{}e{}", self.digits, self.exponent).parse().unwrap_or(f64::NAN),
        }
    }

    /// Times ten to a power: only the point moves.
    pub fn moved(self, power: i32) -> Decimal {
        Decimal { exponent: self.exponent + power, ..self }
    }

    /// The place of the last figure: the decimal is a whole multiple of ten to this power.
    pub fn last_place(self) -> i32 {
        self.exponent
    }

    /// One unit of the last figure.
    pub fn unit_of_last_figure(self) -> f64 {
        Decimal { negative: false, digits: 1, exponent: self.exponent }.value()
    }

    /// Number of figures, leading zeros not counted.
    pub fn figures(self) -> u8 {
        let mut n = 0;
        let mut rest = self.digits;
        while rest > 0 {
            n += 1;
            rest /= 10;
        }
        n
    }

    pub fn is_zero(self) -> bool {
        self.digits == 0
    }

    pub fn is_negative(self) -> bool {
        self.negative
    }

    pub fn is_one(self) -> bool {
        self.value() == 1.0
    }

    pub fn without_sign(self) -> Decimal {
        Decimal { negative: false, ..self }
    }

    /// With at least this many places after the point.
    pub fn with_places(mut self, places: u8) -> Decimal {
        while self.exponent > -i32::from(places) && self.digits < 10u64.pow(17) {
            self.digits *= 10;
            self.exponent -= 1;
        }
        self
    }

    /// Without zeros at the end of the places after the point.
    pub fn without_trailing_zeros(mut self) -> Decimal {
        if self.digits == 0 {
            return Decimal::ZERO;
        }
        while self.exponent < 0 && self.digits.is_multiple_of(10) {
            self.digits /= 10;
            self.exponent += 1;
        }
        self
    }
}

impl fmt::Display for Decimal {
    /// Plain digits with a point, the minus sign U+2212, and never a negative zero.
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        if self.negative && self.digits != 0 {
            write!(f, "{MINUS}")?;
        }
        let digits = self.digits.to_string();
        match usize::try_from(-self.exponent) {
            Ok(places) if places > 0 => {
                let padded = format!("{digits:0>width$}", width = places + 1);
                let (whole, fraction) = padded.split_at(padded.len() - places);
                write!(f, "{whole}.{fraction}")
            }
            _ if self.digits == 0 => write!(f, "0"),
            _ => write!(f, "{digits}{}", "0".repeat(usize::try_from(self.exponent).unwrap_or(0))),
        }
    }
}

/// Three significant figures in `unit`, as tables and text print most figures: "54.2"; nothing at all is "0". Not
/// finite: "none".
pub fn three_figures(si: f64, unit: Unit) -> String {
    if si == 0.0 {
        return "0".into();
    }
    text(Decimal::rounded(si, Rounding::Significant(3), unit))
}

/// So many places after the point, in `unit`.
pub fn places(si: f64, places: u8, unit: Unit) -> String {
    text(Decimal::rounded(si, Rounding::Places(places), unit))
}

/// A movement: mm to 0.1.
pub fn movement(metres: f64) -> String {
    places(metres, 1, Unit::Mm)
}

/// A place along a beam: m to 0.01, and finer where two decimals are not what was typed; "0" at the end.
pub fn along(metres: f64) -> String {
    if metres == 0.0 {
        return "0".into();
    }
    match Decimal::as_typed(metres, 6) {
        Some(typed) if typed.last_place() >= -3 => typed.with_places(2).to_string(),
        _ => places(metres, 2, Unit::M),
    }
}

/// A utilisation: two places, and finer where two would print a requirement that is not met as 1.00.
pub fn utilisation(ratio: f64) -> String {
    text(utilisation_decimal(ratio))
}

/// [`utilisation`] as a decimal.
pub fn utilisation_decimal(ratio: f64) -> Option<Decimal> {
    let at = |places| Decimal::rounded(ratio, Rounding::Places(places), Unit::One);
    let two = at(2)?;
    if ratio <= 1.0 || two.value() > 1.0 {
        return Some(two);
    }
    (3..=7).filter_map(at).find(|d| d.value() > 1.0).or_else(|| at(7))
}

/// A tilt or the like: "1/522"; "0" where there is none.
pub fn one_in(ratio: f64) -> String {
    let size = ratio.abs();
    if size < 1e-6 {
        return "0".into();
    }
    format!("1/{}", text(Decimal::rounded(1.0 / size, Rounding::Places(0), Unit::One)))
}

fn text(decimal: Option<Decimal>) -> String {
    decimal.map_or_else(|| "none".into(), |d| d.to_string())
}

#[cfg(test)]
mod tests {
    use super::*;

    fn significant(x: f64, n: u8) -> String {
        Decimal::significant(x, n).unwrap().to_string()
    }

    #[test]
    fn rounds_the_exact_value_once() {
        assert_eq!(significant(54.246, 3), "54.2");
        assert_eq!(significant(54.246, 4), "54.25");
        assert_eq!(significant(9.996, 3), "10.0");
        assert_eq!(significant(12345.0, 3), "12300");
        assert_eq!(significant(-0.000_123_4, 2), "\u{2212}0.00012");
        // 2.675 as a double lies below 2.675 (2.67499…): the exact expansion decides.
        assert_eq!(significant(2.675, 3), "2.67");
    }

    #[test]
    fn units_only_move_the_point() {
        // 9.3e-3 m, read in mm at two figures.
        let d = Decimal::rounded(9.3e-3, Rounding::Significant(3), Unit::Mm).unwrap();
        assert_eq!(d.to_string(), "9.30");
        assert_eq!(three_figures(132_880.0, Unit::Knm), "133");
        assert_eq!(three_figures(275e6, Unit::NPerMm2), "275");
        assert_eq!(three_figures(483.2e-6, Unit::Cm3), "483");
    }

    #[test]
    fn places_reach_below_and_above_the_size() {
        assert_eq!(movement(0.016_64), "16.6");
        assert_eq!(movement(0.000_04), "0.0");
        assert_eq!(movement(-0.000_04), "0.0");
        assert_eq!(movement(0.000_06), "0.1");
        assert_eq!(movement(-0.000_06), "\u{2212}0.1");
        assert_eq!(movement(0.009_96), "10.0");
        assert_eq!(movement(0.0), "0.0");
        assert_eq!(places(0.04e3, 0, Unit::Kn), "0");
        assert_eq!(places(1234.0e3, 0, Unit::Kn), "1234");
    }

    #[test]
    fn a_requirement_that_is_not_met_never_prints_as_one() {
        assert_eq!(utilisation(0.96), "0.96");
        assert_eq!(utilisation(0.999), "1.00");
        assert_eq!(utilisation(1.0), "1.00");
        assert_eq!(utilisation(1.004), "1.004");
        assert_eq!(utilisation(1.000_04), "1.00004");
        assert_eq!(utilisation(1.2), "1.20");
    }

    #[test]
    fn knows_what_was_typed() {
        let typed = |x| Decimal::as_typed(x, 5).map(|d| d.to_string());
        assert_eq!(typed(9.3 * 1e-3).as_deref(), Some("0.0093"));
        assert_eq!(typed(146.4e-3).as_deref(), Some("0.1464"));
        assert_eq!(typed(1.0 / 3.0), None);
        assert_eq!(typed(2.0).as_deref(), Some("2"));
    }

    #[test]
    fn places_and_tilts() {
        assert_eq!(along(0.0), "0");
        assert_eq!(along(2.1), "2.10");
        assert_eq!(along(2.125), "2.125");
        assert_eq!(along(2.0 / 3.0), "0.67");
        assert_eq!(one_in(0.001_915), "1/522");
        assert_eq!(one_in(-0.002), "1/500");
        assert_eq!(one_in(0.0), "0");
    }

    #[test]
    fn every_rounding_lies_within_half_a_unit_and_reads_back_as_printed() {
        let mut state = 1u64;
        let mut unit = || {
            state = state.wrapping_mul(6_364_136_223_846_793_005).wrapping_add(1_442_695_040_888_963_407);
            (state >> 11) as f64 / (1u64 << 53) as f64
        };
        for _ in 0..20_000 {
            let x = (unit() - 0.5) * 10f64.powi((unit() * 18.0) as i32 - 9);
            for (rounding, kept) in [
                (Rounding::Significant(3), 3),
                (Rounding::Significant(7), 7),
                (Rounding::Places(1), 17),
                (Rounding::Places(3), 17),
            ] {
                let d = Decimal::rounded(x, rounding, Unit::Kn).unwrap();
                let half = 0.5 * d.moved(3).unit_of_last_figure();
                assert!((d.moved(3).value() - x).abs() <= half * (1.0 + 1e-9), "{x} {rounding:?} {d}");
                assert!(d.figures() <= kept, "{x} {rounding:?} {d}");
                let text = d.to_string();
                assert!(!text.contains('-'), "{text}");
                let long: f64 = format!("{}e{}", d.digits, d.exponent).parse().unwrap();
                assert_eq!(long, d.value().abs(), "{text}");
                let read: f64 = text.replace(MINUS, "-").parse().unwrap();
                assert_eq!(read, d.value(), "{text}");
                assert!(!(read == 0.0 && text.contains(MINUS)), "{text}");
            }
        }
    }

    #[test]
    fn one_value_rounded_coarser_is_the_finer_figure_rounded_again() {
        // Except where the finer one ends in 5, its rounding to fewer figures is the rounding of the value itself.
        for n in 1..20_000u32 {
            let x = f64::from(n).sqrt() * 7.3;
            let (fine, coarse) = (Decimal::significant(x, 5).unwrap(), Decimal::significant(x, 3).unwrap());
            let ends = fine.to_string().replace('.', "");
            if ends.ends_with("50") {
                continue;
            }
            assert_eq!(Decimal::significant(fine.value(), 3).unwrap(), coarse, "{x}");
        }
    }
}
