//! Numbers of the results file: 12 significant digits, never negative zero.

use serde::{Serialize, Serializer};

/// A number that is written with 12 significant digits; not finite ones are written as null.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Figure(pub f64);

impl Serialize for Figure {
    fn serialize<S: Serializer>(&self, serializer: S) -> Result<S::Ok, S::Error> {
        if !self.0.is_finite() {
            return serializer.serialize_none();
        }
        let rounded: f64 = format!("{:.11e}", self.0).parse().unwrap_or(self.0);
        serializer.serialize_f64(if rounded == 0.0 { 0.0 } else { rounded })
    }
}

#[cfg(test)]
mod tests {
    use super::Figure;

    #[test]
    fn twelve_digits_and_no_negative_zero() {
        let written = |value: f64| serde_json::to_string(&Figure(value)).unwrap();
        assert_eq!(written(1.0 / 3.0), "0.333333333333");
        assert_eq!(written(-0.0), "0.0");
        assert_eq!(written(-1e-320), "-1e-320");
        assert_eq!(written(f64::NAN), "null");
    }
}
