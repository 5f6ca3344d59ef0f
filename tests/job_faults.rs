//! Reading jobs. Faults are data: each `tests/faults/NAME.toml` beside the text that a terminal of 80 cells shows,
//! `NAME.txt`; `SHOW_FAULTS=1` prints what is said now.

#[path = "job/files.rs"]
mod files;
#[path = "job/hostile.rs"]
mod hostile;
#[path = "job/meaning.rs"]
mod meaning;

use std::collections::BTreeSet;
use std::fs;
use std::path::PathBuf;

use sagledger::job::show::{self, Screen};
use sagledger::job::{self, Kind, Reading, registry};

/// A folder of the tests.
pub fn folder(name: &str) -> PathBuf {
    PathBuf::from(env!("CARGO_MANIFEST_DIR")).join("tests").join(name)
}

/// Every case of the folder, in order of names: its name, its file, what is expected.
fn cases() -> Vec<(String, Vec<u8>, String)> {
    let mut names: Vec<PathBuf> =
        fs::read_dir(folder("faults")).unwrap().map(|entry| entry.unwrap().path()).collect();
    names.retain(|path| path.extension().is_some_and(|e| e == "toml"));
    names.sort();
    let case = |path: PathBuf| {
        let name = path.file_stem().unwrap().to_string_lossy().into_owned();
        let expected = fs::read_to_string(path.with_extension("txt"));
        let expected = expected.unwrap_or_else(|_| panic!("{name}: no text is expected"));
        (name, fs::read(&path).unwrap(), expected)
    };
    names.into_iter().map(case).collect()
}

pub fn read(text: impl AsRef<[u8]>) -> Reading {
    job::read(text.as_ref(), "job.toml")
}

pub fn shown(reading: &Reading) -> String {
    show::terminal(&reading.source, &reading.findings, Screen::cells(80))
}

pub fn names(reading: &Reading) -> Vec<&'static str> {
    reading.findings.iter().map(|fault| fault.name.text()).collect()
}

#[test]
fn each_case_says_what_is_expected() {
    let mut wrong = Vec::new();
    for (name, bytes, expected) in cases() {
        let said = shown(&read(&bytes));
        if std::env::var_os("SHOW_FAULTS").is_some() {
            println!("--- {name}\n{said}");
        }
        if said != expected {
            wrong.push(format!("--- {name}, expected:\n{expected}--- said:\n{said}"));
        }
    }
    assert!(wrong.is_empty(), "{}", wrong.join("\n"));
}

#[test]
fn every_expected_text_has_its_case() {
    let cases: BTreeSet<String> = cases().into_iter().map(|(name, ..)| name).collect();
    for entry in fs::read_dir(folder("faults")).unwrap() {
        let name = entry.unwrap().path().file_stem().unwrap().to_string_lossy().into_owned();
        assert!(cases.contains(&name), "{name} has no job file");
    }
}

#[test]
fn every_name_of_the_registry_is_said_somewhere() {
    let mut said: BTreeSet<&str> = BTreeSet::new();
    for (_, bytes, _) in cases() {
        said.extend(names(&read(&bytes)));
    }
    said.extend(files::names_said());
    said.extend(meaning::names_that_calc_says());
    said.extend(names(&read("[[beam]]\n".repeat(6000))));
    let unsaid: Vec<&str> =
        registry::entries().map(|entry| entry.text).filter(|name| !said.contains(name)).collect();
    assert!(unsaid.is_empty(), "no case says {unsaid:?}");
}

#[test]
fn ten_faults_are_ten_in_order_of_lines() {
    let reading = read(fs::read(folder("faults").join("ten.toml")).unwrap());
    let lines: Vec<usize> = reading
        .findings
        .iter()
        .map(|fault| reading.source.place(fault.span.as_ref().unwrap().start).line)
        .collect();
    assert_eq!(lines.len(), 10);
    assert!(lines.is_sorted());
    let different: BTreeSet<&str> = names(&reading).into_iter().collect();
    assert_eq!(different.len(), 10);
    assert!(reading.job.is_none());
}

/// What is said follows the style of the screens: lower case, one fact, no full stop, name flush right.
#[test]
fn facts_and_remedies_keep_their_style() {
    for (name, bytes, expected) in cases() {
        let reading = read(&bytes);
        for fault in &reading.findings {
            assert!(!fault.fact.ends_with('.') && !fault.remedy.ends_with('.'), "{name}: {fault:?}");
            assert!(!fault.fact.is_empty() && !fault.remedy.is_empty(), "{name}: {fault:?}");
            if let Some(span) = &fault.span {
                assert!(reading.source.text().get(span.clone()).is_some(), "{name}: {span:?}");
            }
        }
        for line in expected.lines().filter(|line| line.starts_with("job.toml:")) {
            let ends = registry::entries().any(|entry| line.ends_with(entry.text));
            assert!(ends, "{name}: {line}");
            assert_eq!(unicode_cells(line), 80, "{name}: {line}");
        }
        assert!(expected.lines().all(|line| unicode_cells(line) <= 80), "{name}");
    }
}

fn unicode_cells(line: &str) -> usize {
    unicode_width::UnicodeWidthStr::width(line)
}

/// Putting the replacement in the part's place mends the fault: what remains does not say it there again.
#[test]
fn replacements_can_be_pasted() {
    let mut pasted = 0;
    for (name, bytes, _) in cases() {
        let reading = read(&bytes);
        for fault in &reading.findings {
            let (Some(span), Some(replacement)) = (&fault.span, &fault.replacement) else { continue };
            let mut text = reading.source.text().to_string();
            text.replace_range(span.clone(), replacement);
            let again = read(&text);
            let same = again.findings.iter().any(|f| {
                f.name == fault.name
                    && f.fact == fault.fact
                    && f.span.as_ref().is_some_and(|s| s.start == span.start)
            });
            assert!(!same, "{name}: {fault:?} stands again after pasting");
            pasted += 1;
        }
    }
    assert!(pasted > 30, "only {pasted} replacements were tried");
}

#[test]
fn faults_as_json() {
    let (_, bytes, _) = cases().into_iter().find(|(name, ..)| name == "a-chain-with-five-faults").unwrap();
    let reading = read(bytes);
    let json = show::json(&reading.source, &reading.findings);
    let list = json.as_array().unwrap();
    assert_eq!(list.len(), 6);
    let expected = serde_json::json!({
        "name": "name-unknown", "kind": "fault", "file": "job.toml", "line": 62, "column": 10, "length": 13,
        "fact": "no wall, beam or post has this name", "remedy": "there is \"spine wall\", line 36",
        "replacement": "\"spine wall\"", "also": [{ "line": 36, "column": 12, "length": 12 }]
    });
    assert_eq!(list[1], expected);
    assert_eq!(list[4]["also"][0]["line"], 47);
    assert_eq!(list[4]["replacement"], serde_json::Value::Null);
    assert_eq!(list[5]["kind"], "warning");
    for fault in list {
        assert_eq!(fault.as_object().unwrap().len(), 10);
    }
}

/// A pipe gets everything uncut, ASCII the same widths, a narrow terminal no line that is too long.
#[test]
fn other_screens() {
    for (name, bytes, expected) in cases() {
        let reading = read(&bytes);
        let on = |screen| show::terminal(&reading.source, &reading.findings, screen);
        let pipe = on(Screen::PIPE);
        assert!(
            !pipe.contains('…') || reading.source.text().contains('…') || name == "type-wrong",
            "{name}:\n{pipe}"
        );
        let ascii = on(Screen::cells(80).ascii());
        assert!(ascii.is_ascii(), "{name}:\n{ascii}");
        assert_eq!(ascii.lines().count(), expected.lines().count(), "{name}");
        let narrow = on(Screen::cells(48));
        assert!(
            narrow.lines().all(|line| unicode_cells(line) <= 48 || line.starts_with("job.toml")),
            "{name}:\n{narrow}"
        );
    }
}

#[test]
fn warnings_alone_leave_a_job() {
    for name in ["seat-short", "unused", "glyph-replaced"] {
        let reading = read(fs::read(folder("faults").join(format!("{name}.toml"))).unwrap());
        assert!(reading.job.is_some(), "{name}");
        assert_eq!(reading.faults(), 0, "{name}");
        assert!(reading.findings.iter().all(|f| f.kind() == Kind::Warning) && reading.warnings() > 0, "{name}");
    }
}
