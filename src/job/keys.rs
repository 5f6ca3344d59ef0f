//! Every table of a job file and its keys: those that this version reads, and those that the language has and a
//! later version brings. The reader, its messages, the schema and the guide use the same lists.

/// A table of the language.
#[derive(Debug, PartialEq)]
pub struct Keys {
    /// As messages and the guide name it.
    pub title: &'static str,
    /// Keys with a value as an example, in the order of the guide.
    pub now: &'static [(&'static str, &'static str)],
    /// Keys refused as "not in this version".
    pub later: &'static [&'static str],
}

pub static FILE: Keys = Keys {
    title: "the job file",
    now: &[
        ("job", "[job]"),
        ("basis", "[basis]"),
        ("limits", "[limits]"),
        ("package", "[package]"),
        ("build-up", "[[build-up]]"),
        ("wall", "[[wall]]"),
        ("beam", "[[beam]]"),
    ],
    later: &["post", "pad", "sizing", "picture", "notes"],
};

pub static JOB: Keys = Keys {
    title: "[job]",
    now: &[
        ("language", "1"),
        ("number", "\"2614\""),
        ("title", "\"Boat store to dwelling\""),
        ("site", "\"Saltmarsh Quay\""),
        ("client", "\"Private client\""),
        ("practice", "\"Quayside Structures\""),
        ("engineer", "\"R. Hale\""),
        ("checker", "\"T. Okoro\""),
        ("date", "2026-11-20"),
        ("logo", "\"logo.png\""),
        ("drawings", "[\"A-110 rev C\"]"),
    ],
    later: &[],
};

pub static BASIS: Keys = Keys {
    title: "[basis]",
    now: &[
        ("national-choices", "\"UK\""),
        ("combination", "\"6.10\""),
        ("grade", "\"S275\""),
        ("shear-flexibility", "false"),
    ],
    later: &[],
};

pub static LIMITS: Keys = Keys {
    title: "limits",
    now: &[
        ("for", "\"brittle finish\""),
        ("total", "\"span/250\""),
        ("variable", "\"span/360\""),
        ("after", "[\"span/500\", \"10 mm\"]"),
        ("stacked", "\"span/250\""),
        ("tilt", "\"1/500\""),
        ("reason", "\"doors below\""),
    ],
    later: &[],
};

pub static PACKAGE: Keys = Keys {
    title: "[package]",
    now: &[("accent", "\"#1f3b57\""), ("drawings", "\"A4\""), ("lang", "\"en-GB\"")],
    later: &[],
};

pub static BUILD_UP: Keys = Keys {
    title: "[[build-up]]",
    now: &[
        ("name", "\"slate roof\""),
        ("pitch", "\"38 deg\""),
        ("layers", "[ { what = \"slates\", load = \"0.42 kN/m2\" } ]"),
        ("imposed", "{ category = \"A\", load = \"1.50 kN/m2\" }"),
        ("snow", "\"0.30 kN/m2\""),
        ("wind", "\"-0.60 kN/m2\""),
    ],
    later: &[],
};

pub static LAYER: Keys = Keys {
    title: "a layer",
    now: &[
        ("what", "\"slates and battens\""),
        ("load", "\"0.42 kN/m2\""),
        ("thickness", "\"15 mm\""),
        ("density", "\"9.0 kN/m3\""),
    ],
    later: &[],
};

pub static IMPOSED: Keys = Keys {
    title: "imposed",
    now: &[("category", "\"A\""), ("load", "\"1.50 kN/m2\""), ("partitions", "\"0.50 kN/m2\"")],
    later: &[],
};

pub static WALL: Keys = Keys {
    title: "[[wall]]",
    now: &[("name", "\"north wall\"")],
    later: &[
        "thickness",
        "height",
        "length",
        "units",
        "mortar",
        "lengthwise-joint",
        "execution-class",
        "held-by",
        "outer-leaf",
        "density",
        "above",
        "strength",
    ],
};

pub static BEAM: Keys = Keys {
    title: "[[beam]]",
    now: &[
        ("mark", "\"B1\""),
        ("title", "\"Ridge beam\""),
        ("section", "\"203x102x23 UB\""),
        ("grade", "\"S355\""),
        ("existing", "true"),
        ("length", "\"5.20 m\""),
        ("bearings", "[ { on = \"north wall\" }, { on = \"south wall\" } ]"),
        ("restraint", "{ top = \"continuous\", by = \"joists\" }"),
        ("load-height", "\"top flange\""),
        ("limits", "{ for = \"masonry\" }"),
        ("load", "[[beam.load]]"),
    ],
    later: &["chosen", "count"],
};

pub static BEARING: Keys = Keys {
    title: "a bearing",
    now: &[
        ("on", "\"north wall\""),
        ("at", "\"2.60 m\""),
        ("lands", "\"1.60 m\""),
        ("bearing-length", "\"150 mm\""),
        ("joint", "\"on top flange\""),
        ("end-restraint", "\"fork\""),
        ("held-down", "\"6 kN\""),
        ("settles", "\"2 mm\""),
        ("offset", "\"60 mm\""),
    ],
    later: &["along", "lies", "end", "face", "padstone", "bends", "side"],
};

pub static RESTRAINT: Keys = Keys {
    title: "restraint",
    now: &[
        ("top", "\"continuous\""),
        ("bottom", "[\"1.5 m\", \"3.0 m\"]"),
        ("by", "\"joists nailed to a bolted plate\""),
    ],
    later: &[],
};

pub static LOAD: Keys = Keys {
    title: "[[beam.load]]",
    now: &[
        ("what", "\"roof, both slopes\""),
        ("build-up", "\"slate roof\""),
        ("width", "\"3.40 m\""),
        ("height", "[\"0.40 m\", \"1.90 m\"]"),
        ("from", "\"0 m\""),
        ("to", "\"2.60 m\""),
        ("at", "\"2.0 m\""),
        ("permanent", "\"1.2 kN/m\""),
        ("imposed", "\"4.0 kN\""),
        ("category", "\"A\""),
        ("snow", "\"0.8 kN/m\""),
        ("wind", "\"-0.8 kN/m\""),
        ("wind-case", "\"west\""),
        ("stage", "\"before\""),
        ("load-height", "\"shear centre\""),
        ("offset", "\"60 mm\""),
    ],
    later: &[],
};

/// Every table.
pub static TABLES: [&Keys; 13] = [
    &FILE, &JOB, &BASIS, &LIMITS, &PACKAGE, &BUILD_UP, &LAYER, &IMPOSED, &WALL, &BEAM, &BEARING, &RESTRAINT, &LOAD,
];

impl Keys {
    pub fn has(&self, key: &str) -> bool {
        self.now.iter().any(|(name, _)| *name == key)
    }

    /// "length = "5.20 m"" or "[[beam]]", as messages ask for it.
    pub fn example(&self, key: &str) -> String {
        let header = |value: &str| value.trim_start_matches('[').starts_with(|c: char| c.is_ascii_lowercase());
        match self.now.iter().find(|(name, _)| *name == key) {
            Some((_, value)) if value.starts_with('[') && header(value) => value.to_string(),
            Some((name, value)) => format!("{name} = {value}"),
            None => key.to_string(),
        }
    }
}

/// Tables that begin with a line in brackets, with the key that each of them has and no other table can do without;
/// of those that a list of keys fits equally well, the first is meant.
const HEADED: [(&Keys, &str, Option<&str>); 8] = [
    (&JOB, "[job]", None),
    (&WALL, "[[wall]]", Some("name")),
    (&BUILD_UP, "[[build-up]]", Some("name")),
    (&BEAM, "[[beam]]", Some("mark")),
    (&LOAD, "[[beam.load]]", Some("what")),
    (&BASIS, "[basis]", None),
    (&LIMITS, "[limits]", None),
    (&PACKAGE, "[package]", None),
];

/// A table whose header seems to be missing above the first of some keys that do not belong to `here`: they hold the
/// key that it begins with or, for a table without such a key, two of its own.
pub(super) fn headless(strangers: &[&str], here: &Keys) -> Option<(&'static Keys, &'static str)> {
    let mut best: Option<(usize, &'static Keys, &'static str)> = None;
    for (table, title, first) in HEADED {
        let fitting = strangers.iter().filter(|key| table.has(key)).count();
        let begins = match first {
            Some(first) => strangers.first() == Some(&first),
            None => fitting >= 2 && strangers.first().is_some_and(|key| table.has(key)),
        };
        if begins && !std::ptr::eq(table, here) && best.is_none_or(|(most, ..)| fitting > most) {
            best = Some((fitting, table, title));
        }
    }
    best.map(|(_, table, title)| (table, title))
}

/// The table, other than `here`, that a key most likely belongs to.
pub(super) fn home_of(key: &str, here: &Keys) -> Option<&'static Keys> {
    let is = |one: &Keys, other: &Keys| std::ptr::eq(one, other);
    let near: &[&'static Keys] = match here {
        here if is(here, &BEAM) => &[&LOAD, &BEARING, &RESTRAINT],
        here if is(here, &LOAD) || is(here, &RESTRAINT) => &[&BEAM],
        here if is(here, &BEARING) => &[&BEAM],
        here if is(here, &BUILD_UP) => &[&LAYER, &IMPOSED],
        here if is(here, &LAYER) || is(here, &IMPOSED) => &[&BUILD_UP, &LAYER],
        here if is(here, &WALL) => &[&BEARING],
        _ => &[],
    };
    let file_last = TABLES.into_iter().skip(1).chain([&FILE]);
    near.iter().copied().chain(file_last).find(|table| !is(table, here) && table.has(key))
}

/// The key that begins a table in a list, such as `mark`: twice in one table, it begins another.
pub(super) fn begins_a_table(key: &str) -> bool {
    HEADED.iter().any(|(.., first)| *first == Some(key))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn examples_are_lines_of_a_job_file() {
        assert_eq!(BEAM.example("length"), "length = \"5.20 m\"");
        assert_eq!(FILE.example("beam"), "[[beam]]");
        assert_eq!(JOB.example("drawings"), "drawings = [\"A-110 rev C\"]");
        for table in TABLES {
            for (key, _) in table.now {
                let line = table.example(key);
                assert!(toml::de::DeTable::parse(&line).is_ok(), "{line}");
            }
        }
    }

    #[test]
    fn no_key_is_both_now_and_later() {
        for table in TABLES {
            assert!(table.later.iter().all(|key| !table.has(key)), "{}", table.title);
        }
    }
}
