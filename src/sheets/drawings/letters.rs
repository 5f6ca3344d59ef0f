//! Widths of text, from the embedded typefaces: labels are placed by them, before anything is typeset.

use std::sync::LazyLock;

use serde::Serialize;
use ttf_parser::Face as Font;

use super::scene::Size;

/// Heights over and under the baseline that labels keep free, in em (IBM Plex Sans: b, d, l and g, p, y).
pub const ASCENT: f64 = 0.78;
pub const DESCENT: f64 = 0.22;
/// Height of capitals and digits, in em.
pub const CAPITALS: f64 = 0.698;

/// mm in a typographic point.
const POINT: f64 = 25.4 / 72.0;
/// A unit after a value is a little smaller than the value, down to the least size there is.
const UNIT_SCALE: f64 = 7.2 / 7.6;
const SUBSCRIPT_SCALE: f64 = 0.72;

/// How a run of text is set.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Serialize)]
#[serde(rename_all = "kebab-case")]
pub enum Face {
    Regular,
    Medium,
    SemiBold,
    /// The unit after a SemiBold value.
    Unit,
    /// A symbol, from the mathematical typeface.
    Symbol,
    Subscript,
}

#[derive(Clone, Debug, PartialEq, Serialize)]
pub struct Run {
    pub text: String,
    pub face: Face,
}

pub fn run(face: Face, text: impl Into<String>) -> Run {
    Run { text: text.into(), face }
}

pub fn words(text: impl Into<String>) -> Vec<Run> {
    vec![run(Face::Regular, text)]
}

/// What the runs say, one after the other.
pub fn said(runs: &[Run]) -> String {
    runs.iter().map(|r| r.text.as_str()).collect()
}

struct Fonts {
    regular: Option<Font<'static>>,
    medium: Option<Font<'static>>,
    semi_bold: Option<Font<'static>>,
    math: Option<Font<'static>>,
}

static FONTS: LazyLock<Fonts> = LazyLock::new(|| {
    let font = |wanted: &str| {
        let file = crate::fonts::FILES.iter().find(|(name, _)| *name == wanted);
        file.and_then(|(_, data)| Font::parse(data, 0).ok())
    };
    Fonts {
        regular: font("IBMPlexSans-Regular.ttf"),
        medium: font("IBMPlexSans-Medium.ttf"),
        semi_bold: font("IBMPlexSans-SemiBold.ttf"),
        math: font("IBMPlexMath-Regular.ttf"),
    }
});

/// The em of a size in mm.
pub fn em(size: Size) -> f64 {
    match size {
        Size::Diagram => 7.6 * POINT,
        Size::Note => 7.8 * POINT,
        Size::Least => 7.2 * POINT,
    }
}

/// Line pitch of the outer column in mm.
pub const NOTE_PITCH: f64 = 10.1 * POINT;

/// Width of a line of text in mm. Kerning is left out, which errs by some hundredths of an em.
pub fn width(runs: &[Run], size: Size) -> f64 {
    runs.iter().map(|run| run_width(run) * em(size)).sum()
}

fn run_width(run: &Run) -> f64 {
    let (font, scale) = match run.face {
        Face::Regular => (&FONTS.regular, 1.0),
        Face::Medium => (&FONTS.medium, 1.0),
        Face::SemiBold => (&FONTS.semi_bold, 1.0),
        Face::Unit => (&FONTS.semi_bold, UNIT_SCALE),
        Face::Symbol => (&FONTS.math, 1.0),
        Face::Subscript => (&FONTS.regular, SUBSCRIPT_SCALE),
    };
    let advance = |letter: char| -> f64 {
        let Some(font) = font else { return 0.6 };
        let glyph = font.glyph_index(letter).and_then(|glyph| font.glyph_hor_advance(glyph));
        // A letter that this typeface lacks is set from another one: a full em is on the safe side.
        glyph.map_or(1.0, |advance| f64::from(advance) / f64::from(font.units_per_em()))
    };
    scale * run.text.chars().map(advance).sum::<f64>()
}

/// Breaks text at spaces into lines no wider than `width` mm. A word that is wider by itself is broken inside.
pub fn wrapped(face: Face, text: &str, size: Size, width: f64) -> Vec<String> {
    let fits = |line: &str| self::width(&[run(face, line)], size) <= width;
    let mut lines: Vec<String> = Vec::new();
    let mut line = String::new();
    for word in text.split(' ').filter(|w| !w.is_empty()) {
        let longer = if line.is_empty() { word.to_string() } else { format!("{line} {word}") };
        if fits(&longer) {
            line = longer;
            continue;
        }
        if !line.is_empty() {
            lines.push(std::mem::take(&mut line));
        }
        for letter in word.chars() {
            if !line.is_empty() && !fits(&format!("{line}{letter}")) {
                lines.push(std::mem::take(&mut line));
            }
            line.push(letter);
        }
    }
    if !line.is_empty() {
        lines.push(line);
    }
    lines
}

/// The text cut to a width, with an ellipsis where something was left out.
pub fn shortened(face: Face, text: &str, size: Size, width: f64) -> String {
    if self::width(&[run(face, text)], size) <= width {
        return text.to_string();
    }
    let mut kept: String = text.to_string();
    while kept.pop().is_some() {
        let cut = format!("{}…", kept.trim_end());
        if self::width(&[run(face, cut.as_str())], size) <= width {
            return cut;
        }
    }
    "…".to_string()
}

#[cfg(test)]
mod tests {
    use super::*;

    /// Advance of a digit in IBM Plex Sans: 600 of 1000 units (look of the package: "digit and minus 0.6 em").
    #[test]
    fn a_digit_is_six_tenths_of_an_em() {
        for face in [Face::Regular, Face::Medium, Face::SemiBold] {
            let width = width(&[run(face, "8")], Size::Diagram);
            assert!((width - 0.6 * em(Size::Diagram)).abs() < 1e-9, "{face:?}: {width}");
        }
        let minus = width(&[run(Face::SemiBold, "\u{2212}")], Size::Diagram);
        assert!((minus - 0.6 * em(Size::Diagram)).abs() < 1e-9);
    }

    #[test]
    fn lines_keep_to_their_width_and_lose_nothing() {
        let text = "characteristic, imposed A leading, imposed H with it, Wwwwwwwwwwwwwwwwwwwwwwwwwwwwwwwwwwww";
        let lines = wrapped(Face::Regular, text, Size::Note, 40.0);
        assert!(lines.len() > 2);
        for line in &lines {
            assert!(width(&words(line.as_str()), Size::Note) <= 40.0);
        }
        assert_eq!(lines.concat().replace(' ', ""), text.replace(' ', ""));
    }
}
