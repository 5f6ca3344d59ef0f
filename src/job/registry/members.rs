//! Beams, what they stand on, and how they carry each other.

use super::{Entry, Name};
use crate::job::fault::Kind::{Fault, Warning};

pub(super) const ENTRIES: &[Entry] = &[
    Entry {
        name: Name::BeamMissing,
        text: "beam-missing",
        kind: Fault,
        meaning: "The job has no beam, so that there is nothing to calculate. A beam begins with a line [[beam]].",
        wrong: "[job]\nnumber = \"2614\"",
        right: "[job]\nnumber = \"2614\"\n\n[[beam]]\nmark = \"B1\"",
    },
    Entry {
        name: Name::NameTaken,
        text: "name-taken",
        kind: Fault,
        meaning: "Two members share a mark or name, or two build-ups do. Walls, posts and beams share one set of names, \
                  since a bearing says by name what it stands on.",
        wrong: "mark = \"B1\" on two beams",
        right: "mark = \"B1\" and mark = \"B2\"",
    },
    Entry {
        name: Name::NameUnknown,
        text: "name-unknown",
        kind: Fault,
        meaning: "A bearing stands on something that the job does not have. Names are matched exactly, capital letters \
                  and blanks too.",
        wrong: "{ on = \"spline wall\" }",
        right: "{ on = \"spine wall\" }",
    },
    Entry {
        name: Name::SectionUnknown,
        text: "section-unknown",
        kind: Fault,
        meaning: "The catalogue has no section of this name. Sections are written as the trade writes them, depth by \
                  width by mass and then the family; sagledger sections lists them all.",
        wrong: "section = \"203x102x24 UB\"",
        right: "section = \"203x102x23 UB\"",
    },
    Entry {
        name: Name::BearingsTooFew,
        text: "bearings-too-few",
        kind: Fault,
        meaning: "A beam needs two or more bearings, else it can turn freely. A cantilever is a beam whose length goes on \
                  beyond its outer bearing.",
        wrong: "bearings = [ { on = \"north wall\" } ]",
        right: "bearings = [ { on = \"north wall\" }, { on = \"south wall\" } ]",
    },
    Entry {
        name: Name::BearingPlaceMissing,
        text: "bearing-place-missing",
        kind: Fault,
        meaning: "A bearing between the first and the last says where it lies along the beam, with at. Only the first and \
                  the last have a place by default, the beam's two ends.",
        wrong: "{ on = \"B2\", lands = \"1.60 m\" } as the second of three",
        right: "{ on = \"B2\", at = \"2.60 m\", lands = \"1.60 m\" }",
    },
    Entry {
        name: Name::NotIncreasing,
        text: "not-increasing",
        kind: Fault,
        meaning: "Bearings, and places of restraint, are listed along the beam from its beginning. Each lies beyond the \
                  one before it.",
        wrong: "top = [\"3.0 m\", \"1.5 m\"]",
        right: "top = [\"1.5 m\", \"3.0 m\"]",
    },
    Entry {
        name: Name::BearingsTooClose,
        text: "bearings-too-close",
        kind: Fault,
        meaning: "Two bearings of a beam lie less than 20 mm apart. Together they would clamp the beam, which no real \
                  pair of seats does.",
        wrong: "at = \"2.600 m\" and at = \"2.610 m\"",
        right: "one bearing at \"2.605 m\"",
    },
    Entry {
        name: Name::OutsideBeam,
        text: "outside-beam",
        kind: Fault,
        meaning: "A place along a beam lies beyond its end. Places are measured from the beam's first end, both ends \
                  included.",
        wrong: "at = \"5.40 m\" on a beam of \"5.20 m\"",
        right: "at = \"5.20 m\"",
    },
    Entry {
        name: Name::LandsOutsideCarrier,
        text: "lands-outside-carrier",
        kind: Fault,
        meaning: "A beam lands beyond the end of the beam that carries it. The landing is measured along the carrying \
                  beam, from its first end.",
        wrong: "{ on = \"B3\", lands = \"6.60 m\" } where B3 is 6.20 m long",
        right: "{ on = \"B3\", lands = \"6.20 m\" }",
    },
    Entry {
        name: Name::CarriersLoop,
        text: "carriers-loop",
        kind: Fault,
        meaning: "Beams carry each other in a ring, so that none of them stands on anything. Let one of them stand on a \
                  wall or a post.",
        wrong: "B1 on B2, B2 on B1",
        right: "B1 on B2, B2 on the north wall",
    },
    Entry {
        name: Name::Mechanism,
        text: "mechanism",
        kind: Fault,
        meaning: "The calculation found that a beam can move without resistance. Its bearings do not hold it; give it two \
                  that stand on something.",
        wrong: "two bearings at one place",
        right: "two bearings a span apart",
    },
    Entry {
        name: Name::SeatShort,
        text: "seat-short",
        kind: Warning,
        meaning: "A seat on a wall is shorter than 75 mm. 100 mm is usual, since walls and beams are seldom where the \
                  drawing has them (common practice).",
        wrong: "bearing-length = \"20 mm\"",
        right: "bearing-length = \"100 mm\"",
    },
    Entry {
        name: Name::WallUnused,
        text: "wall-unused",
        kind: Warning,
        meaning: "No beam bears on this wall. It is left in the job, but stands nowhere in the package.",
        wrong: "a [[wall]] that no bearing names",
        right: "{ on = \"north wall\" } in the bearings of a beam",
    },
];
