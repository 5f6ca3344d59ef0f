//! How numbers are written in drawings: three significant figures, a true minus sign, never a negative zero.

/// Decimals that give `value` three significant figures; negative for tens and hundreds, never more than the three of
/// the tables.
fn decimals(value: f64) -> i32 {
    let size = value.abs();
    if size < 1e-12 || !size.is_finite() {
        return 2;
    }
    let mut decimals = 2;
    let mut bound = 10.0;
    // 9.995 prints as 10.0: the bound is where rounding reaches the next figure.
    while size >= bound * (1.0 - 0.0005) && decimals > -9 {
        bound *= 10.0;
        decimals -= 1;
    }
    if decimals == 2 {
        let mut bound = 1.0;
        while size < bound * (1.0 - 0.0005) && decimals < 3 {
            bound /= 10.0;
            decimals += 1;
        }
    }
    decimals
}

/// With a fixed number of decimals; negative ones round to tens, hundreds and so on.
pub fn fixed(value: f64, decimals: i32) -> String {
    let text = if decimals >= 0 {
        format!("{:.*}", decimals as usize, value)
    } else {
        let unit = (0..-decimals).fold(1.0, |unit, _| unit * 10.0);
        format!("{:.0}", (value / unit).round() * unit)
    };
    match text.strip_prefix('-') {
        Some(size) if size.bytes().any(|b| (b'1'..=b'9').contains(&b)) => format!("\u{2212}{size}"),
        Some(size) => size.to_string(),
        None => text,
    }
}

/// Three significant figures.
pub fn three(value: f64) -> String {
    fixed(value, decimals(value))
}

/// With a sign in front, plus included; zero has none.
pub fn signed(value: f64, decimals: i32) -> String {
    let text = fixed(value, decimals);
    if value > 0.0 && !is_zero(&text) { format!("+{text}") } else { text }
}

/// Decimals for a family of values printed beside each other: those that its largest needs.
pub fn common_decimals(values: impl IntoIterator<Item = f64>) -> i32 {
    decimals(values.into_iter().fold(0.0, |most: f64, v| most.max(v.abs())))
}

pub fn is_zero(text: &str) -> bool {
    !text.bytes().any(|b| (b'1'..=b'9').contains(&b))
}

/// A place along a beam, in m to the centimetre; zero is plain.
pub fn place(at: f64) -> String {
    if at.abs() < 0.005 { "0 m".to_string() } else { format!("{} m", fixed(at, 2)) }
}

/// Movements, in mm to 0.1.
pub fn tenth(mm: f64) -> String {
    fixed(mm, 1)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn three_significant_figures() {
        let cases = [
            (54.23, "54.2"),
            (0.3629, "0.363"),
            (5543.0, "5540"),
            (99.96, "100"),
            (9.996, "10.0"),
            (-33.34, "\u{2212}33.3"),
            (1.0, "1.00"),
            (0.99999, "1.00"),
            (0.0, "0.00"),
            (123.4, "123"),
            (0.07, "0.070"),
        ];
        for (value, text) in cases {
            assert_eq!(three(value), text);
        }
    }

    #[test]
    fn no_negative_zero() {
        assert_eq!(fixed(-0.04, 1), "0.0");
        assert_eq!(signed(-0.0, 1), "0.0");
        assert_eq!(signed(0.02, 1), "0.0");
        assert_eq!(signed(12.66, 1), "+12.7");
    }
}
