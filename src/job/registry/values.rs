//! Single values: words, names, texts, limits and quantities.

use super::{Entry, Name};
use crate::job::fault::Kind::{Fault, Warning};

pub(super) const ENTRIES: &[Entry] = &[
    Entry {
        name: Name::ValueUnknown,
        text: "value-unknown",
        kind: Fault,
        meaning: "The key takes one of a few words, and this is none of them. Words are matched exactly.",
        wrong: "grade = \"S275JR\"",
        right: "grade = \"S275\"",
    },
    Entry {
        name: Name::TextEmpty,
        text: "text-empty",
        kind: Fault,
        meaning: "The text has no visible character. It is printed in the package, where an empty line would mislead.",
        wrong: "title = \"\"",
        right: "title = \"Boat store to dwelling\"",
    },
    Entry {
        name: Name::TextTooLong,
        text: "text-too-long",
        kind: Fault,
        meaning: "The text has more than 500 characters. It stands on one line or in one cell of the package, where there \
                  is no room for more.",
        wrong: "title = \"a whole page of text …\"",
        right: "title = \"Boat store to dwelling\"",
    },
    Entry {
        name: Name::NameMalformed,
        text: "name-malformed",
        kind: Fault,
        meaning: "A mark or a name is one line of 1 to 24 characters without blanks at its ends. It stands in narrow \
                  columns of every table, and other parts of the job refer to it exactly.",
        wrong: "mark = \"the beam over the new kitchen opening\"",
        right: "mark = \"B1\"",
    },
    Entry {
        name: Name::NameGlyph,
        text: "name-glyph",
        kind: Fault,
        meaning: "A mark or a name holds a character that cannot be printed or seen. Two marks that look alike on paper \
                  would be mistaken for each other on site, so such a character is not replaced as it is elsewhere.",
        wrong: "mark = \"B\\u200B1\"",
        right: "mark = \"B1\"",
    },
    Entry {
        name: Name::GlyphReplaced,
        text: "glyph-replaced",
        kind: Warning,
        meaning: "The text holds characters that the package's typefaces do not have. Each is printed as a replacement \
                  sign, line breaks and tabs as a blank; the job file itself stays as it is.",
        wrong: "title = \"Loft \u{1f3e0}\"",
        right: "title = \"Loft\"",
    },
    Entry {
        name: Name::DateMalformed,
        text: "date-malformed",
        kind: Fault,
        meaning: "The date of the package is a day, written year, month, day and without quotes. It is printed on every \
                  package, and equal jobs with equal dates make equal bytes.",
        wrong: "date = \"20 November 2026\"",
        right: "date = 2026-11-20",
    },
    Entry {
        name: Name::AccentMalformed,
        text: "accent-malformed",
        kind: Fault,
        meaning: "The accent is one colour, written as # and six hexadecimal digits. It is the one ink besides black.",
        wrong: "accent = \"navy\"",
        right: "accent = \"#1f3b57\"",
    },
    Entry {
        name: Name::LangMalformed,
        text: "lang-malformed",
        kind: Fault,
        meaning: "The language of the package is a language tag of two or three lower-case letters, with a region of two \
                  capital letters if wanted. Screen readers choose their voice by it.",
        wrong: "lang = \"English\"",
        right: "lang = \"en-GB\"",
    },
    Entry {
        name: Name::LimitMalformed,
        text: "limit-malformed",
        kind: Fault,
        meaning: "A limit of a movement is span/N or a length, a limit of tilt is 1/N. N lies between 20 and 10000, for \
                  tilt 100000.",
        wrong: "total = \"L/250\"",
        right: "total = \"span/250\"",
    },
    Entry {
        name: Name::ListEmpty,
        text: "list-empty",
        kind: Fault,
        meaning: "The list has no entry. Leave the key out where nothing is meant.",
        wrong: "layers = []",
        right: "layers = [ { what = \"slates\", load = \"0.42 kN/m2\" } ]",
    },
    Entry {
        name: Name::PairMalformed,
        text: "pair-malformed",
        kind: Fault,
        meaning: "A width or a height is one quantity, or a pair of them at the row's two ends. One of a pair may be \
                  zero, not both.",
        wrong: "height = [\"0.40 m\", \"1.20 m\", \"1.90 m\"]",
        right: "height = [\"0.40 m\", \"1.90 m\"]",
    },
    Entry {
        name: Name::UnitMissing,
        text: "unit-missing",
        kind: Fault,
        meaning: "A quantity is written with its unit, in quotes. A bare number is never taken, so that nobody reads \
                  millimetres as metres.",
        wrong: "length = 5.20",
        right: "length = \"5.20 m\"",
    },
    Entry {
        name: Name::UnitUnknown,
        text: "unit-unknown",
        kind: Fault,
        meaning: "The job file knows no unit of this name. Units are written as m, mm, kN, N, kN/m, N/mm, kN/m2, kPa, \
                  kN/m3 and deg, capital letters as shown.",
        wrong: "length = \"17 ft\"",
        right: "length = \"5.20 m\"",
    },
    Entry {
        name: Name::UnitWrong,
        text: "unit-wrong",
        kind: Fault,
        meaning: "The unit measures something else than this key takes. A line load is in kN/m, an area load in kN/m2, a \
                  point load in kN.",
        wrong: "permanent = \"1.2 kN/m2\"",
        right: "permanent = \"1.2 kN/m\"",
    },
    Entry {
        name: Name::UnitCentimetre,
        text: "unit-centimetre",
        kind: Fault,
        meaning: "Lengths are in metres or millimetres. Centimetres are left out, since drawings of structures do not \
                  use them and a factor of ten is easily missed.",
        wrong: "length = \"520 cm\"",
        right: "length = \"5.20 m\"",
    },
    Entry {
        name: Name::DecimalComma,
        text: "decimal-comma",
        kind: Fault,
        meaning: "Decimals follow a point. A comma is refused, since elsewhere it parts thousands.",
        wrong: "width = \"1,80 m\"",
        right: "width = \"1.80 m\"",
    },
    Entry {
        name: Name::ThousandsMark,
        text: "thousands-mark",
        kind: Fault,
        meaning: "Thousands are not parted by a mark or a blank. What parts thousands in one country parts decimals in \
                  the next.",
        wrong: "length = \"5,200 mm\"",
        right: "length = \"5200 mm\"",
    },
    Entry {
        name: Name::NumberMalformed,
        text: "number-malformed",
        kind: Fault,
        meaning: "A quantity begins with a number: digits, at most one point, an exponent and a sign if wanted. Words, \
                  ranges and sums are not read.",
        wrong: "length = \"about 5 m\"",
        right: "length = \"5.20 m\"",
    },
    Entry {
        name: Name::OutOfBounds,
        text: "out-of-bounds",
        kind: Fault,
        meaning: "The value lies outside what any real building has, so that a slip is more likely than intent. The \
                  bounds are those of the table of quantities in the guide.",
        wrong: "length = \"5200 m\"",
        right: "length = \"5200 mm\"",
    },
];
