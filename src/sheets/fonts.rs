//! The embedded typefaces, always in the same order. No other font is ever looked for.

use std::sync::LazyLock;

use typst::foundations::Bytes;
use typst::text::Font;
use typst_kit::fonts::FontStore;

/// The files of `fonts/`, in the order in which the typesetter sees them.
pub const FILES: [(&str, &[u8]); 7] = [
    ("IBMPlexSans-Regular.ttf", include_bytes!("../../fonts/IBMPlexSans-Regular.ttf")),
    ("IBMPlexSans-Medium.ttf", include_bytes!("../../fonts/IBMPlexSans-Medium.ttf")),
    ("IBMPlexSans-SemiBold.ttf", include_bytes!("../../fonts/IBMPlexSans-SemiBold.ttf")),
    ("IBMPlexSans-Italic.ttf", include_bytes!("../../fonts/IBMPlexSans-Italic.ttf")),
    ("IBMPlexSans-SemiBoldItalic.ttf", include_bytes!("../../fonts/IBMPlexSans-SemiBoldItalic.ttf")),
    ("IBMPlexMono-Regular.ttf", include_bytes!("../../fonts/IBMPlexMono-Regular.ttf")),
    ("IBMPlexMath-Regular.ttf", include_bytes!("../../fonts/IBMPlexMath-Regular.ttf")),
];

static STORE: LazyLock<FontStore> = LazyLock::new(|| {
    let mut store = FontStore::new();
    for (_, data) in FILES {
        store.extend(Font::iter(Bytes::new(data)).map(|font| {
            let info = font.info().clone();
            (font, info)
        }));
    }
    store
});

/// Fonts as the typesetter asks for them.
pub(crate) fn store() -> &'static FontStore {
    &STORE
}

/// Whether a character can be printed as itself. Control characters and those that turn the direction of reading
/// cannot: they would print as nothing and change what is read.
pub fn prints(character: char) -> bool {
    let code = u32::from(character);
    let mut fonts = (0..FILES.len()).filter_map(|n| STORE.font(n));
    !is_hidden(character) && fonts.any(|font| font.info().coverage.contains(code))
}

fn is_hidden(character: char) -> bool {
    character.is_control()
        || matches!(character, '\u{ad}' | '\u{61c}' | '\u{200b}'..='\u{200f}' | '\u{2028}'..='\u{202f}'
            | '\u{2060}'..='\u{206f}' | '\u{feff}' | '\u{fe00}'..='\u{fe0f}' | '\u{e0000}'..='\u{e0fff}')
}

/// Replaces what cannot be printed by U+FFFD and says how many characters that were.
pub(crate) fn replaced(text: &str, prints: impl Fn(char) -> bool) -> (String, usize) {
    let mut count = 0;
    let text = text
        .chars()
        .map(|c| {
            if prints(c) {
                c
            } else {
                count += 1;
                STAND_IN
            }
        })
        .collect();
    (text, count)
}

/// Stands for a character that no font has.
pub const STAND_IN: char = '\u{fffd}';

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_families_have_the_names_that_the_templates_use() {
        let families: Vec<String> = store().book().families().map(|(name, _)| name.to_string()).collect();
        for family in
            ["IBM Plex Sans", "IBM Plex Sans Medm", "IBM Plex Sans SmBld", "IBM Plex Mono", "IBM Plex Math"]
        {
            assert!(families.iter().any(|f| f == family), "{family} is not among {families:?}");
        }
    }

    #[test]
    fn what_prints() {
        for c in "aZ09 é£€²·×−–—“”’≤≥½°µΩγψ#$*_<>@[]{}\\".chars() {
            assert!(prints(c), "{c} {:x}", c as u32);
        }
        for c in ['\u{1f}', '\u{202e}', '\u{1f3d7}', '\u{200d}', '\n', '\u{5d0}'] {
            assert!(!prints(c), "{:x}", c as u32);
        }
        assert!(prints(STAND_IN));
    }
}
