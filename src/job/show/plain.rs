//! Text of users made harmless for a terminal: no control character, nothing that steers the direction of writing,
//! and, where asked for, nothing beyond ASCII. The width in cells is kept.

use unicode_width::UnicodeWidthChar;

use super::Screen;
use crate::job::glyphs::{REPLACEMENT, steers_or_hides};

/// A text as this screen shows it.
pub fn shown(text: &str, screen: Screen) -> String {
    let mut shown = String::with_capacity(text.len());
    for character in text.chars() {
        match character {
            '\t' | '\n' | '\r' => shown.push(' '),
            c if steers_or_hides(c) => shown.push(if screen.unicode { REPLACEMENT } else { '?' }),
            c if c.is_ascii() || screen.unicode => shown.push(c),
            c => shown.push_str(&ascii(c)),
        }
    }
    shown
}

fn ascii(character: char) -> String {
    let known = match character {
        '×' => "x",
        '−' | '–' | '—' => "-",
        '…' => "...",
        '²' => "2",
        '³' => "3",
        '⁴' => "4",
        '·' => ".",
        '“' | '”' => "\"",
        '‘' | '’' => "'",
        '\u{a0}' | '\u{202f}' => " ",
        other => return "?".repeat(other.width().unwrap_or(1)),
    };
    known.to_string()
}

#[cfg(test)]
mod tests {
    use super::*;
    use unicode_width::UnicodeWidthStr;

    #[test]
    fn nothing_harmful_reaches_a_terminal() {
        let text = "a\u{1b}[31mb\u{202e}c\td\u{9b}e\u{200b}f";
        assert_eq!(shown(text, Screen::PIPE), "a\u{fffd}[31mb\u{fffd}c d\u{fffd}e\u{fffd}f");
        assert_eq!(shown(text, Screen::PIPE.ascii()), "a?[31mb?c d?e?f");
    }

    #[test]
    fn ascii_keeps_the_width() {
        for text in ["254×146", "水", "ähnlich", "e\u{301}"] {
            let ascii = shown(text, Screen::PIPE.ascii());
            assert!(ascii.is_ascii());
            assert_eq!(ascii.width(), text.width(), "{text}");
        }
    }
}
