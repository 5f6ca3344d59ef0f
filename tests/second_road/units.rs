//! Quantities of a job file, as strings with a unit, into SI.

/// The value of a quantity such as `"4.2 m"` in SI units; an angle in radians. Only valid text is expected.
pub fn quantity(text: &str) -> f64 {
    let text = text.trim();
    let bytes = text.as_bytes();
    let mut end = 0;
    while end < bytes.len() {
        let exponent = (bytes[end] == b'e' || bytes[end] == b'E')
            && bytes.get(end + 1).is_some_and(|next| next.is_ascii_digit() || *next == b'-' || *next == b'+');
        let sign_of_exponent =
            (bytes[end] == b'-' || bytes[end] == b'+') && (end == 0 || matches!(bytes[end - 1], b'e' | b'E'));
        if bytes[end].is_ascii_digit() || bytes[end] == b'.' || exponent || sign_of_exponent {
            end += 1;
        } else {
            break;
        }
    }
    let number: f64 = text[..end].parse().unwrap_or_else(|_| panic!("no number in {text:?}"));
    match text[end..].trim() {
        "m" | "N" | "kg" | "kg/m" => number,
        "mm" => number / 1e3,
        "kN" | "kN/m" | "N/mm" | "kN/m2" | "kN/m²" | "kPa" | "kN/m3" | "kN/m³" | "kNm" => number * 1e3,
        "N/mm2" | "N/mm²" | "MPa" => number * 1e6,
        "deg" => number.to_radians(),
        other => panic!("no unit {other:?} in {text:?}"),
    }
}

#[test]
fn quantities_become_si() {
    for (text, expected) in [
        ("4.2 m", 4.2),
        ("4200mm", 4.2),
        ("-0.75 kN/m2", -750.0),
        ("0.75 kPa", 750.0),
        ("1.5e1 kN", 15_000.0),
        ("2e-1 m", 0.2),
        ("3 N/mm", 3000.0),
        ("180 deg", std::f64::consts::PI),
    ] {
        assert!((quantity(text) - expected).abs() <= 1e-12 * expected.abs(), "{text}");
    }
}
