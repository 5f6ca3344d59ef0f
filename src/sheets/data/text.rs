//! Running text as data: words, values with units, symbols, links to sheets.

use serde::Serialize;

/// A piece of running text. The templates know how each is set; user text only ever comes as words.
#[derive(Clone, Debug, PartialEq, Serialize)]
#[serde(untagged)]
pub(crate) enum Run {
    Words(String),
    /// A value with its unit.
    Value {
        v: String,
        u: &'static str,
    },
    /// "sheet 7", leading there.
    Sheet {
        sheet: String,
    },
    /// Words that lead to a sheet.
    To {
        to: String,
        text: String,
    },
    /// "sheets 7 to 9, 12": stretches from a first to a last key.
    Sheets {
        sheets: Vec<(String, String)>,
    },
    /// A symbol, by its name in the templates.
    Symbol {
        sym: &'static str,
    },
}

impl Run {
    /// About what it reads in print.
    pub fn plain(&self) -> String {
        match self {
            Run::Words(text) | Run::To { text, .. } => text.clone(),
            Run::Value { v, u } => format!("{v} {u}"),
            Run::Sheet { .. } => "sheet 000".into(),
            Run::Sheets { sheets } => format!("sheets{}", " 000,".repeat(sheets.len())),
            Run::Symbol { sym } => (*sym).into(),
        }
    }
}

pub(crate) type Runs = Vec<Run>;

pub(crate) fn words(text: impl Into<String>) -> Run {
    Run::Words(text.into())
}

pub(crate) fn value(v: impl Into<String>, u: &'static str) -> Run {
    Run::Value { v: v.into(), u }
}

pub(crate) fn sheet(key: impl Into<String>) -> Run {
    Run::Sheet { sheet: key.into() }
}

pub(crate) fn to(key: impl Into<String>, text: impl Into<String>) -> Run {
    Run::To { to: key.into(), text: text.into() }
}

pub(crate) fn symbol(sym: &'static str) -> Run {
    Run::Symbol { sym }
}

/// "a", "a and b", "a, b and c" of pieces.
pub(crate) fn listed(items: Vec<Run>) -> Runs {
    let count = items.len();
    let mut runs = Runs::new();
    for (n, item) in items.into_iter().enumerate() {
        if n > 0 {
            runs.push(words(if n + 1 == count { " and " } else { ", " }));
        }
        runs.push(item);
    }
    runs
}

/// A sentence of the calculation: its symbols as symbols, its apostrophes as print has them.
pub(crate) fn sentence(text: &str) -> Runs {
    let text = text.replace('\'', "’");
    match text.split_once("Q_k") {
        Some((before, after)) => vec![words(before), symbol("Q_k"), words(after)],
        None => vec![words(text)],
    }
}

/// Numbers up to twelve as words, as running text has them.
pub(crate) fn counted(n: usize) -> String {
    const WORDS: [&str; 13] =
        ["no", "one", "two", "three", "four", "five", "six", "seven", "eight", "nine", "ten", "eleven", "twelve"];
    WORDS.get(n).map_or_else(|| n.to_string(), |word| (*word).to_string())
}

/// Gives a long word of a name places to break at (U+200B), so that it stays in a narrow column.
pub(crate) fn breakable(text: &str) -> String {
    const LONGEST: usize = 12;
    let mut out = String::with_capacity(text.len());
    let mut run = 0;
    for c in text.chars() {
        run = if c.is_whitespace() { 0 } else { run + 1 };
        if run > LONGEST {
            out.push('\u{200b}');
            run = 1;
        }
        out.push(c);
    }
    out
}

/// The names of sheets and of things on them, which links lead to. They hold no user text.
pub(crate) mod keys {
    pub const BASIS: &str = "basis";
    pub const MATERIALS: &str = "materials";
    pub const GOVERNING: &str = "governing";
    pub const LOAD_PATH: &str = "load-path";
    pub const OUTSIDE: &str = "outside";
    pub const RECORD: &str = "record";

    /// A member's first sheet.
    pub fn beam(index: usize) -> String {
        format!("beam-{index}")
    }

    /// A member's sheet of diagrams and checks.
    pub fn beam_checks(index: usize) -> String {
        format!("beam-{index}-checks")
    }

    pub fn beam_workings(index: usize) -> String {
        format!("beam-{index}-workings")
    }

    /// The stretch of sheets of a member.
    pub fn beam_sheets(index: usize) -> (String, String) {
        (beam(index), format!("{}-end", beam_workings(index)))
    }

    pub fn build_up(index: usize) -> String {
        format!("build-up-{index}")
    }

    pub fn assumption(number: usize) -> String {
        format!("assumption-{number}")
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn long_words_can_break() {
        assert_eq!(breakable("short words only"), "short words only");
        assert_eq!(breakable("ABCDEFGHIJKLMNOP x"), "ABCDEFGHIJKL\u{200b}MNOP x");
    }

    #[test]
    fn lists_of_runs() {
        let runs = listed(vec![words("a"), words("b"), words("c")]);
        assert_eq!(runs, vec![words("a"), words(", "), words("b"), words(" and "), words("c")]);
    }
}
