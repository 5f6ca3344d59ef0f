//! Decimal numbers as typed, kept as digits so that nothing is rounded before the unit is known.

use super::quantity::Trouble;

/// Digits with at most one point, a sign and an exponent.
#[derive(Clone, Debug, PartialEq)]
pub struct Number {
    sign: &'static str,
    digits: String,
    exponent: i64,
    /// The exponent as typed, "" where there is none.
    exponent_text: String,
}

/// A text cut into its number and its unit.
pub struct Scanned<'t> {
    pub number: Number,
    pub unit: &'t str,
}

impl Number {
    /// As typed.
    pub fn text(&self) -> String {
        format!("{}{}{}", self.sign, self.digits, self.exponent_text)
    }

    /// The nearest f64 to the number times a power of ten; none where it would be infinite.
    pub fn value(&self, power: i32) -> Option<f64> {
        let exponent = self.exponent.saturating_add(i64::from(power));
        let value: f64 = format!("{}{}e{exponent}", self.sign, self.digits).parse().ok()?;
        // Adding nothing turns -0 into 0.
        value.is_finite().then_some(value + 0.0)
    }

    /// The same figures times a power of ten, with as many of them: 520 by -2 is 5.20.
    pub fn shifted(&self, places: i32) -> Number {
        let (whole, part) = self.digits.split_once('.').unwrap_or((&self.digits, ""));
        let figures = format!("{whole}{part}");
        let point = whole.len() as i64 + i64::from(places);
        let digits = if point <= 0 {
            format!("0.{}{figures}", "0".repeat(point.unsigned_abs() as usize))
        } else if (point as usize) < figures.len() {
            format!("{}.{}", &figures[..point as usize], &figures[point as usize..])
        } else {
            format!("{figures}{}", "0".repeat(point as usize - figures.len()))
        };
        let trimmed = digits.trim_start_matches('0');
        let digits = match trimmed.chars().next() {
            None => "0".to_string(),
            Some('.') => format!("0{trimmed}"),
            Some(_) => trimmed.to_string(),
        };
        Number { digits, ..self.clone() }
    }
}

/// Cuts a text into a number and what follows it.
pub fn scan(text: &str) -> Result<Scanned<'_>, Trouble> {
    let text = text.trim();
    let not_a_number = || Trouble::NotANumber(text.to_string());
    let (sign, rest) = match text.strip_prefix('-') {
        Some(rest) => ("-", rest),
        None => ("", text.strip_prefix('+').unwrap_or(text)),
    };
    let body_end = body_length(rest);
    let (body, rest) = rest.split_at(body_end);
    if !body.bytes().any(|b| b.is_ascii_digit()) {
        return Err(not_a_number());
    }
    let (exponent, exponent_text, unit) = exponent_of(rest);
    let unit = unit.trim();
    let number = |digits: String| Number { sign, digits, exponent, exponent_text: exponent_text.to_string() };
    let marks = |c: char| matches!(c, '\'' | '’' | '_') || c.is_whitespace();
    let commas = body.matches(',').count();
    let points = body.matches('.').count();
    let unmarked: String = body.chars().filter(|c| !marks(*c)).collect();
    let plain = |s: &str| s.replace([',', '.'], "");
    let unit_text = || unit.to_string();
    if commas == 1 && points == 0 {
        let meant = number(unmarked.replace(',', "."));
        if unmarked.len() < body.len() {
            return Err(Trouble::ThousandsMark { meant, or: None, unit: unit_text() });
        }
        if looks_like_thousands(&unmarked, ',') {
            return Err(Trouble::ThousandsMark {
                meant: number(plain(&unmarked)),
                or: Some(Box::new(meant)),
                unit: unit_text(),
            });
        }
        return Err(Trouble::DecimalComma { meant, unit: unit_text() });
    }
    if commas > 0 || points > 1 {
        // The mark that comes last and only once is the decimal one.
        let last = unmarked.rfind([',', '.']).unwrap_or(0);
        let mark = unmarked[last..].chars().next().unwrap_or('.');
        let (head, tail) = unmarked.split_at(last);
        let meant = match head.contains(mark) {
            true if looks_like_thousands(&unmarked, mark) => number(plain(&unmarked)),
            true => return Err(not_a_number()),
            false => number(format!("{}.{}", plain(head), plain(tail))),
        };
        return Err(Trouble::ThousandsMark { meant, or: None, unit: unit_text() });
    }
    if unmarked.len() < body.len() {
        return Err(Trouble::ThousandsMark { meant: number(unmarked), or: None, unit: unit_text() });
    }
    Ok(Scanned { number: number(unmarked), unit })
}

/// One to three digits not beginning with 0, then groups of three behind a mark.
fn looks_like_thousands(body: &str, mark: char) -> bool {
    let mut groups = body.split(mark);
    let first = groups.next().unwrap_or("");
    let leads = (1..=3).contains(&first.len()) && !first.starts_with('0');
    leads && groups.all(|g| g.len() == 3 && g.bytes().all(|b| b.is_ascii_digit()))
}

/// How far digits, points and marks between digits go.
fn body_length(text: &str) -> usize {
    let mut end = 0;
    for (at, c) in text.char_indices() {
        let belongs = match c {
            '0'..='9' | '.' | ',' => true,
            '\'' | '’' | '_' => end > 0,
            c if c.is_whitespace() => {
                let next = text[at..].trim_start().chars().next();
                end > 0 && next.is_some_and(|n| n.is_ascii_digit())
            }
            _ => false,
        };
        if !belongs {
            break;
        }
        end = at + c.len_utf8();
    }
    end
}

/// An exponent at the beginning of a text, as a number and as typed, and the rest.
fn exponent_of(text: &str) -> (i64, &str, &str) {
    let none = (0, "", text);
    let Some(after) = text.strip_prefix(['e', 'E']) else { return none };
    let (negative, digits) = match after.strip_prefix('-') {
        Some(digits) => (true, digits),
        None => (false, after.strip_prefix('+').unwrap_or(after)),
    };
    let length = digits.bytes().take_while(u8::is_ascii_digit).count();
    if length == 0 {
        return none;
    }
    // Beyond any number that a float can hold, more digits change nothing.
    let size = digits[..length].parse::<i64>().unwrap_or(i64::MAX / 4).min(i64::MAX / 4);
    let rest = &digits[length..];
    let typed = &text[..text.len() - rest.len()];
    (if negative { -size } else { size }, typed, rest)
}

#[cfg(test)]
mod tests {
    use super::*;

    fn number(text: &str) -> Number {
        scan(text).map(|s| s.number).unwrap()
    }

    #[test]
    fn shifting_keeps_the_figures() {
        for (text, places, expected) in [
            ("520", -2, "5.20"),
            ("5.20", 3, "5200"),
            ("5200", -3, "5.200"),
            ("0.075", 3, "75"),
            ("3", -3, "0.003"),
            ("0", 3, "0"),
            ("-1.5", 3, "-1500"),
        ] {
            assert_eq!(number(text).shifted(places).text(), expected, "{text} {places}");
        }
    }

    #[test]
    fn commas_and_marks() {
        let meant = |text: &str| match scan(text).err() {
            Some(Trouble::DecimalComma { meant, .. }) => format!("comma {}", meant.text()),
            Some(Trouble::ThousandsMark { meant, or: None, .. }) => format!("mark {}", meant.text()),
            Some(Trouble::ThousandsMark { meant, or: Some(or), .. }) => {
                format!("mark {} {}", meant.text(), or.text())
            }
            Some(Trouble::NotANumber(_)) => "none".into(),
            _ => "plain".into(),
        };
        for (text, expected) in [
            ("1,80 m", "comma 1.80"),
            ("0,750 m", "comma 0.750"),
            ("12,5", "comma 12.5"),
            (",5 m", "comma .5"),
            ("1,800 mm", "mark 1800 1.800"),
            ("1,234.5 mm", "mark 1234.5"),
            ("1.234,5 mm", "mark 1234.5"),
            ("1 800 mm", "mark 1800"),
            ("1'800 mm", "mark 1800"),
            ("1’800 mm", "mark 1800"),
            ("1_800 mm", "mark 1800"),
            ("1\u{a0}800 mm", "mark 1800"),
            ("1,234,567 mm", "mark 1234567"),
            ("1.234.567 mm", "mark 1234567"),
            ("1 234,5 mm", "mark 1234.5"),
            ("1.2.3 m", "none"),
            ("1.80 m", "plain"),
            ("1.80 m 3", "plain"),
        ] {
            assert_eq!(meant(text), expected, "{text}");
        }
    }
}
