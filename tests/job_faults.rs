//! Job files with faults, and what is said about them: each `tests/faults/NAME.toml` beside the text that a terminal
//! of 80 cells shows, `NAME.txt`. `SHOW_FAULTS=1` prints what is said now.

use std::collections::BTreeSet;
use std::fs;
use std::path::PathBuf;

use sagledger::job::show::{self, Screen};
use sagledger::job::{self, Kind, Reading, registry};

fn folder() -> PathBuf {
    PathBuf::from(env!("CARGO_MANIFEST_DIR")).join("tests/faults")
}

/// Every case of the folder, in order of names.
fn cases() -> Vec<(String, Vec<u8>, String)> {
    let mut names: Vec<PathBuf> = fs::read_dir(folder()).unwrap().map(|entry| entry.unwrap().path()).collect();
    names.retain(|path| path.extension().is_some_and(|e| e == "toml"));
    names.sort();
    let case = |path: PathBuf| {
        let name = path.file_stem().unwrap().to_string_lossy().into_owned();
        let expected = fs::read_to_string(path.with_extension("txt")).unwrap_or_default();
        (name, fs::read(&path).unwrap(), expected)
    };
    names.into_iter().map(case).collect()
}

fn read(bytes: &[u8]) -> Reading {
    job::read(bytes, "job.toml")
}

fn shown(reading: &Reading) -> String {
    show::terminal(&reading.source, &reading.findings, Screen::cells(80))
}

#[test]
fn each_case_says_what_is_expected() {
    let mut wrong = Vec::new();
    let cases = cases();
    assert!(cases.len() > 40, "only {} cases were found", cases.len());
    for (name, bytes, expected) in cases {
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
