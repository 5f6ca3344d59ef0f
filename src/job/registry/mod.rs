//! Every fault and warning that a job file can have, each with its stable name, two sentences that explain it, and
//! an example wrong and right.

mod file;
mod loads;
mod members;
mod values;

use super::fault::Kind;

/// What `explain` says about one name.
#[derive(Debug)]
pub struct Entry {
    pub name: Name,
    /// The stable name, kebab-case.
    pub text: &'static str,
    pub kind: Kind,
    /// What it means, and why it matters or what to do: two sentences.
    pub meaning: &'static str,
    pub wrong: &'static str,
    pub right: &'static str,
}

/// Names of faults and warnings, in the order in which the guide lists them.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Name {
    FileMissing,
    FileNotPlain,
    FileTooLarge,
    NotUtf8,
    NestedTooDeep,
    Syntax,
    KeyTwice,
    TooMany,
    LanguageNewer,
    LogoOutsideFolder,
    LogoMissing,
    LogoBroken,
    LogoTooLarge,
    KeyUnknown,
    KeyMissing,
    KeyOutOfPlace,
    HeaderMissing,
    NotInThisVersion,
    TypeWrong,
    ValueUnknown,
    TextEmpty,
    TextTooLong,
    NameMalformed,
    NameGlyph,
    GlyphReplaced,
    DateMalformed,
    AccentMalformed,
    LangMalformed,
    LimitMalformed,
    ListEmpty,
    PairMalformed,
    UnitMissing,
    UnitUnknown,
    UnitWrong,
    UnitCentimetre,
    DecimalComma,
    ThousandsMark,
    NumberMalformed,
    OutOfBounds,
    BeamMissing,
    NameTaken,
    NameUnknown,
    SectionUnknown,
    BearingsTooFew,
    BearingPlaceMissing,
    NotIncreasing,
    BearingsTooClose,
    OutsideBeam,
    LandsOutsideCarrier,
    CarriersLoop,
    Mechanism,
    SeatShort,
    WallUnused,
    BuildUpUnknown,
    BuildUpEmpty,
    BuildUpNotForHeight,
    BuildUpUnused,
    LayerMixed,
    LoadEmpty,
    LoadMixed,
    LoadUnsized,
    LoadNegative,
    LoadPlaceMissing,
    LoadPlaceMixed,
    CategoryMissing,
    FromAfterTo,
}

/// All entries, in the order of [`Name`].
pub fn entries() -> impl Iterator<Item = &'static Entry> {
    [file::ENTRIES, values::ENTRIES, members::ENTRIES, loads::ENTRIES].into_iter().flatten()
}

impl Name {
    /// The stable name: "unit-missing".
    pub fn text(self) -> &'static str {
        self.entry().map_or("", |entry| entry.text)
    }

    pub fn kind(self) -> Kind {
        self.entry().map_or(Kind::Fault, |entry| entry.kind)
    }

    /// What there is to explain; a test shows that every name has an entry.
    pub fn entry(self) -> Option<&'static Entry> {
        entries().nth(self as usize)
    }

    /// The entry with this stable name.
    pub fn called(text: &str) -> Option<&'static Entry> {
        entries().find(|entry| entry.text == text)
    }

    /// Stable names near this one, for a slip of the pen.
    pub fn near(text: &str) -> Vec<&'static str> {
        super::near::nearest(text, entries().map(|entry| entry.text))
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn every_name_has_its_entry_in_order_and_no_two_share_a_text() {
        let mut texts: Vec<&str> = Vec::new();
        for (at, entry) in entries().enumerate() {
            assert_eq!(entry.name as usize, at, "{}", entry.text);
            assert!(!texts.contains(&entry.text), "{} twice", entry.text);
            texts.push(entry.text);
        }
        assert_eq!(texts.len(), Name::FromAfterTo as usize + 1);
    }

    #[test]
    fn texts_are_kebab_case_and_meanings_two_sentences() {
        for entry in entries() {
            assert!(entry.text.bytes().all(|b| b.is_ascii_lowercase() || b == b'-' || b == b'8'), "{}", entry.text);
            assert!(entry.text.len() <= 24, "{}", entry.text);
            assert_eq!(entry.meaning.matches(". ").count(), 1, "{}", entry.text);
            assert!(entry.meaning.ends_with('.'), "{}", entry.text);
            assert!(
                !entry.wrong.is_empty() && !entry.right.is_empty() && entry.wrong != entry.right,
                "{}",
                entry.text
            );
        }
    }

    #[test]
    fn near_names_are_found() {
        assert_eq!(Name::near("unit-mising"), ["unit-missing"]);
        assert!(Name::called("unit-missing").is_some());
    }
}
