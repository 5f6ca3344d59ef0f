//! Build-ups and rows of loads.

use super::{Entry, Name};
use crate::job::fault::Kind::{Fault, Warning};

pub(super) const ENTRIES: &[Entry] = &[
    Entry {
        name: Name::BuildUpUnknown,
        text: "build-up-unknown",
        kind: Fault,
        meaning: "A load row uses a build-up that the job does not have. Names are matched exactly, capital letters and \
                  blanks too.",
        wrong: "build-up = \"slated roof\"",
        right: "build-up = \"slate roof\"",
    },
    Entry {
        name: Name::BuildUpEmpty,
        text: "build-up-empty",
        kind: Fault,
        meaning: "A build-up has neither layers nor imposed, snow or wind load. It would load nothing, which nobody means.",
        wrong: "[[build-up]]\nname = \"slate roof\"",
        right: "[[build-up]]\nname = \"slate roof\"\nlayers = [ { what = \"slates\", load = \"0.42 kN/m2\" } ]",
    },
    Entry {
        name: Name::BuildUpNotForHeight,
        text: "build-up-not-for-height",
        kind: Fault,
        meaning: "A height takes the layers of a build-up along a wall. One with a pitch, or with imposed, snow or wind \
                  load, lies on plan and takes a width.",
        wrong: "build-up = \"slate roof\"\nheight = \"2.40 m\"",
        right: "build-up = \"slate roof\"\nwidth = \"2.40 m\"",
    },
    Entry {
        name: Name::BuildUpUnused,
        text: "build-up-unused",
        kind: Warning,
        meaning: "No load row uses this build-up. It is left in the job and printed nowhere; a row may have been forgotten.",
        wrong: "a [[build-up]] that no row names",
        right: "build-up = \"slate roof\" in a [[beam.load]]",
    },
    Entry {
        name: Name::LayerMixed,
        text: "layer-mixed",
        kind: Fault,
        meaning: "A layer is given by its load, or by a thickness with a density. With both, one of them would have to be \
                  ignored.",
        wrong: "{ what = \"screed\", load = \"1.5 kN/m2\", thickness = \"65 mm\" }",
        right: "{ what = \"screed\", thickness = \"65 mm\", density = \"22 kN/m3\" }",
    },
    Entry {
        name: Name::LoadEmpty,
        text: "load-empty",
        kind: Fault,
        meaning: "A load row says neither a build-up nor an action, so that it loads nothing. Give it a build-up with a \
                  width or a height, or actions such as permanent.",
        wrong: "[[beam.load]]\nwhat = \"parapet\"",
        right: "[[beam.load]]\nwhat = \"parapet\"\npermanent = \"1.2 kN/m\"",
    },
    Entry {
        name: Name::LoadMixed,
        text: "load-mixed",
        kind: Fault,
        meaning: "A load row is a build-up with a width, or a build-up with a height, or actions given directly. Two rows \
                  say the same without doubt.",
        wrong: "build-up = \"slate roof\"\nwidth = \"3.40 m\"\npermanent = \"1.2 kN/m\"",
        right: "build-up = \"slate roof\"\nwidth = \"3.40 m\"",
    },
    Entry {
        name: Name::LoadUnsized,
        text: "load-unsized",
        kind: Fault,
        meaning: "A build-up loads an area, so that its row needs a width or a height; a width or a height needs a \
                  build-up. One of the two is missing.",
        wrong: "build-up = \"slate roof\"",
        right: "build-up = \"slate roof\"\nwidth = \"3.40 m\"",
    },
    Entry {
        name: Name::LoadNegative,
        text: "load-negative",
        kind: Fault,
        meaning: "Loads act downward and are positive. Only wind may be negative: uplift.",
        wrong: "permanent = \"-1.2 kN/m\"",
        right: "wind = \"-1.2 kN/m\"",
    },
    Entry {
        name: Name::LoadPlaceMissing,
        text: "load-place-missing",
        kind: Fault,
        meaning: "The row's actions are forces, but it does not say where they act. A point load has a place along the \
                  beam, with at; a load along a line is in kN/m.",
        wrong: "what = \"water tank\"\npermanent = \"1.0 kN\"",
        right: "what = \"water tank\"\nat = \"2.0 m\"\npermanent = \"1.0 kN\"",
    },
    Entry {
        name: Name::LoadPlaceMixed,
        text: "load-place-mixed",
        kind: Fault,
        meaning: "Point loads take at, all others from and to. A row cannot be at a place and along a stretch at once.",
        wrong: "at = \"2.0 m\"\nto = \"3.0 m\"",
        right: "from = \"2.0 m\"\nto = \"3.0 m\"",
    },
    Entry {
        name: Name::CategoryMissing,
        text: "category-missing",
        kind: Fault,
        meaning: "An imposed load needs its category of use, A to H (EN 1991-1-1 6.3). It decides how the load combines \
                  with others, and there is no safe default.",
        wrong: "imposed = \"4.0 kN\"",
        right: "imposed = \"4.0 kN\"\ncategory = \"A\"",
    },
    Entry {
        name: Name::FromAfterTo,
        text: "from-after-to",
        kind: Fault,
        meaning: "A stretch begins before it ends: from lies before to along the beam. Without from it begins at 0, \
                  without to it goes on to the beam's end.",
        wrong: "from = \"2.60 m\"\nto = \"0 m\"",
        right: "from = \"0 m\"\nto = \"2.60 m\"",
    },
];
