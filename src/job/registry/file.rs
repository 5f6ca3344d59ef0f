//! The file as a whole, its syntax, the files it names and its keys.

use super::{Entry, Name};
use crate::job::fault::Kind::Fault;

pub(super) const ENTRIES: &[Entry] = &[
    Entry {
        name: Name::FileMissing,
        text: "file-missing",
        kind: Fault,
        meaning: "There is no job file at this place. A job is a folder with a job.toml in it, and a command takes \
                  either the folder or the file.",
        wrong: "sagledger check quay-hose",
        right: "sagledger check quay-house",
    },
    Entry {
        name: Name::FileNotPlain,
        text: "file-not-plain",
        kind: Fault,
        meaning: "The job file, or a file that it names, is a folder, a link or a device. Only plain files are read, so \
                  that a job can be packed, archived and read again elsewhere with everything it depends on.",
        wrong: "job.toml -> ../old/job.toml",
        right: "a copy of the file inside the job's folder",
    },
    Entry {
        name: Name::FileTooLarge,
        text: "file-too-large",
        kind: Fault,
        meaning: "The job file is larger than 4 MiB and was not read. A job of hundreds of beams is far smaller, so this \
                  is most likely another file.",
        wrong: "a job.toml of 5 MiB",
        right: "one job file for each building",
    },
    Entry {
        name: Name::NotUtf8,
        text: "not-utf8",
        kind: Fault,
        meaning: "The file holds bytes that are not UTF-8 text. Save it as UTF-8 in the editor; a BOM does no harm.",
        wrong: "a job.toml saved as UTF-16 or Windows-1252",
        right: "the same file saved as UTF-8",
    },
    Entry {
        name: Name::NestedTooDeep,
        text: "nested-too-deep",
        kind: Fault,
        meaning: "Tables or lists lie inside each other more than 80 levels deep. Nothing in a job needs more than five.",
        wrong: "layers = [[[[[[[[ … ]]]]]]]]",
        right: "layers = [ { what = \"slates\", load = \"0.42 kN/m2\" } ]",
    },
    Entry {
        name: Name::Syntax,
        text: "syntax",
        kind: Fault,
        meaning: "The text is not TOML at this place, so that what follows cannot be read with certainty. Faults further \
                  down show once this one is mended.",
        wrong: "length = 5.20 m",
        right: "length = \"5.20 m\"",
    },
    Entry {
        name: Name::KeyTwice,
        text: "key-twice",
        kind: Fault,
        meaning: "One table has the same key twice, or one table stands twice. Only one of the two can be meant, and the \
                  program does not guess which.",
        wrong: "length = \"5.20 m\"\nlength = \"5.40 m\"",
        right: "length = \"5.40 m\"",
    },
    Entry {
        name: Name::TooMany,
        text: "too-many",
        kind: Fault,
        meaning: "The file has more than 20000 faults and warnings. It is most likely no job at all; those beyond the \
                  first 20000 were counted and not kept.",
        wrong: "a list of parts saved as job.toml",
        right: "a job file, begun with sagledger new",
    },
    Entry {
        name: Name::LanguageNewer,
        text: "language-newer",
        kind: Fault,
        meaning: "The file says that it is written in a later language than this program knows. A newer sagledger reads \
                  it; nothing else in it was looked at.",
        wrong: "language = 2",
        right: "language = 1",
    },
    Entry {
        name: Name::LogoOutsideFolder,
        text: "logo-outside-folder",
        kind: Fault,
        meaning: "The logo is named by a path that leads, or could lead, out of the job's folder. Everything that a \
                  package depends on lies inside the folder, so that it can be archived and made again.",
        wrong: "logo = \"../office/logo.png\"",
        right: "logo = \"logo.png\"",
    },
    Entry {
        name: Name::LogoMissing,
        text: "logo-missing",
        kind: Fault,
        meaning: "The job's folder has no file of this name. The name is matched exactly, capital letters too.",
        wrong: "logo = \"Logo.png\"",
        right: "logo = \"logo.png\"",
    },
    Entry {
        name: Name::LogoBroken,
        text: "logo-broken",
        kind: Fault,
        meaning: "The logo cannot be read as a PNG or JPEG picture. Open it in a picture editor and save it again as PNG.",
        wrong: "logo = \"logo.svg\"",
        right: "logo = \"logo.png\"",
    },
    Entry {
        name: Name::LogoTooLarge,
        text: "logo-too-large",
        kind: Fault,
        meaning: "The logo is larger than 8 MiB or 24 million pixels. It is printed a few centimetres wide, for which \
                  1000 pixels are plenty.",
        wrong: "a logo of 12000 by 9000 pixels",
        right: "the same logo, 1000 pixels wide",
    },
    Entry {
        name: Name::KeyUnknown,
        text: "key-unknown",
        kind: Fault,
        meaning: "This table has no such key, and a key that nobody reads would be a value that nobody checks. Keys are \
                  kebab-case; one that stands below [[beam.load]] belongs to that load, not to the beam.",
        wrong: "lenght = \"5.20 m\"",
        right: "length = \"5.20 m\"",
    },
    Entry {
        name: Name::KeyMissing,
        text: "key-missing",
        kind: Fault,
        meaning: "A key that this table needs is not there. The program takes no default where a wrong one could be \
                  overlooked.",
        wrong: "[[beam]]\nmark = \"B1\"",
        right: "[[beam]]\nmark = \"B1\"\nlength = \"5.20 m\"",
    },
    Entry {
        name: Name::KeyOutOfPlace,
        text: "key-out-of-place",
        kind: Fault,
        meaning: "The key exists, but means nothing together with the others here. A seat belongs to a wall, a landing \
                  and a joint to a beam, a category to an imposed load.",
        wrong: "{ on = \"north wall\", lands = \"1.60 m\" }",
        right: "{ on = \"north wall\", bearing-length = \"150 mm\" }",
    },
    Entry {
        name: Name::HeaderMissing,
        text: "header-missing",
        kind: Fault,
        meaning: "The keys from here on belong to another table, whose first line in brackets is not there. Without it \
                  TOML counts them to the table above.",
        wrong: "[[wall]]\nname = \"north wall\"\nmark = \"B1\"\nlength = \"5.20 m\"",
        right: "[[wall]]\nname = \"north wall\"\n\n[[beam]]\nmark = \"B1\"\nlength = \"5.20 m\"",
    },
    Entry {
        name: Name::NotInThisVersion,
        text: "not-in-this-version",
        kind: Fault,
        meaning: "The language of job files has this, but this version of the program cannot calculate it yet. It is \
                  refused rather than left out, so that no package goes without something that its job asks for.",
        wrong: "count = 2",
        right: "one beam for each section, each with its share of the load",
    },
    Entry {
        name: Name::TypeWrong,
        text: "type-wrong",
        kind: Fault,
        meaning: "The value is of another type than the key takes. Texts and quantities stand in quotes, dates, whole \
                  numbers and true or false do not.",
        wrong: "existing = \"yes\"",
        right: "existing = true",
    },
];
