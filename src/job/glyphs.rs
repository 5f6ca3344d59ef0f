//! Which characters of a text can be printed: those that the package's typefaces have and that do something visible
//! and harmless on one line. Signs that steer the direction of writing, that have no width or that belong to nobody
//! (private use) are not among them, whatever a font says of them.

use super::coverage::COVERED;

/// Stands where a character could not be printed.
pub const REPLACEMENT: char = '\u{fffd}';

/// Whether a character prints as itself in a text.
pub fn printable(character: char) -> bool {
    if steers_or_hides(character) {
        return false;
    }
    let code = character as u32;
    let at = COVERED.partition_point(|(_, last)| *last < code);
    COVERED.get(at).is_some_and(|(first, _)| *first <= code)
}

/// Whether a character may stand in a mark or a name, where blanks of other widths would make two look alike.
pub fn printable_in_name(character: char) -> bool {
    printable(character) && (character == ' ' || !character.is_whitespace())
}

/// A text as it is printed: what cannot be printed replaced, line breaks and tabs made blanks. Also tells which
/// characters were replaced, each once, in order.
pub fn printed(text: &str) -> (String, Vec<char>) {
    let mut replaced = Vec::new();
    let printed = text
        .replace("\r\n", "\n")
        .chars()
        .map(|character| {
            if printable(character) {
                return character;
            }
            if !replaced.contains(&character) {
                replaced.push(character);
            }
            if matches!(character, '\n' | '\r' | '\t') { ' ' } else { REPLACEMENT }
        })
        .collect();
    (printed, replaced)
}

/// A character as messages name it.
pub(super) fn named(character: char) -> String {
    match character {
        '\n' | '\r' => "a line break".into(),
        '\t' => "a tab".into(),
        c => format!("U+{:04X}", c as u32),
    }
}

/// Control, format and private-use characters.
pub(super) fn steers_or_hides(character: char) -> bool {
    character.is_control()
        || matches!(character as u32,
            0x00ad | 0x034f | 0x061c | 0x115f | 0x1160 | 0x17b4 | 0x17b5 | 0x180b..=0x180f | 0x200b..=0x200f
            | 0x2028..=0x202e | 0x2060..=0x206f | 0x3164 | 0xfe00..=0xfe0f | 0xfeff | 0xffa0 | 0xfff0..=0xfffb
            | 0xe000..=0xf8ff | 0x1bca0..=0x1bca3 | 0x1d173..=0x1d17a | 0xe0000..=0x10ffff)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn what_prints() {
        for c in "aÄß×²°−–…€½Ωж\u{a0}\u{301}".chars() {
            assert!(printable(c), "{c:?}");
        }
        for c in "\0\u{1b}\t\n\u{ad}\u{200b}\u{202e}\u{2066}\u{feff}\u{e000}\u{f6d7}אب水\u{1f3e0}\u{10ffff}".chars()
        {
            assert!(!printable(c), "{c:?}");
        }
        assert!(printable(REPLACEMENT));
        assert!(!printable_in_name('\u{a0}') && printable_in_name(' '));
    }

    #[test]
    fn what_cannot_be_printed_is_replaced_once_each_told() {
        let (text, replaced) = printed("Loft\r\n\u{1f3e0}\u{1f3e0}\u{202e}x");
        assert_eq!(text, "Loft \u{fffd}\u{fffd}\u{fffd}x");
        assert_eq!(replaced, ['\n', '\u{1f3e0}', '\u{202e}']);
    }

    /// The table is what the fonts have: read from the fonts themselves.
    #[test]
    fn the_table_is_that_of_the_fonts() {
        let covered = COVERED.iter().flat_map(|(first, last)| *first..=*last);
        let table: std::collections::BTreeSet<u32> = covered.collect();
        for style in ["Regular", "Italic", "Medium", "SemiBold", "SemiBoldItalic"] {
            let path = format!("{}/fonts/IBMPlexSans-{style}.ttf", env!("CARGO_MANIFEST_DIR"));
            let bytes = std::fs::read(path).unwrap();
            let face = ttf_parser::Face::parse(&bytes, 0).unwrap();
            let mut in_font = std::collections::BTreeSet::new();
            for subtable in face.tables().cmap.unwrap().subtables.into_iter().filter(|s| s.is_unicode()) {
                subtable.codepoints(|code| {
                    if subtable.glyph_index(code).is_some_and(|glyph| glyph.0 != 0) {
                        in_font.insert(code);
                    }
                });
            }
            assert_eq!(table, in_font, "{style}");
        }
    }
}
