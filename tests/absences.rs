//! The invariants of the house, as absences: what a room never knows is not in its sources.

use std::fs;
use std::path::{Path, PathBuf};

fn root() -> PathBuf {
    PathBuf::from(env!("CARGO_MANIFEST_DIR"))
}

/// Files that ship below a folder with one of the endings, with their text up to its tests.
fn sources(folder: &str, endings: &[&str]) -> Vec<(PathBuf, String)> {
    let mut found = Vec::new();
    let mut folders = vec![root().join(folder)];
    while let Some(next) = folders.pop() {
        for entry in fs::read_dir(&next).unwrap() {
            let path = entry.unwrap().path();
            if path.is_dir() {
                if !path.ends_with("tests") && !path.ends_with("examples") {
                    folders.push(path);
                }
            } else if endings.iter().any(|e| path.to_string_lossy().ends_with(e)) {
                let text = fs::read_to_string(&path).unwrap();
                let shipped = text.split("#[cfg(test)]").next().unwrap_or_default().to_string();
                found.push((path, shipped));
            }
        }
    }
    assert!(!found.is_empty(), "{folder} holds nothing to look at");
    found
}

fn absent(folder: &str, endings: &[&str], words: &[&str]) {
    for (path, text) in sources(folder, endings) {
        for (n, line) in text.lines().enumerate() {
            for word in words {
                assert!(!line.contains(word), "{}:{}: {word}", path.display(), n + 1);
            }
        }
    }
}

#[test]
fn calc_touches_no_file_clock_environment_or_output() {
    absent(
        "src/calc",
        &[".rs"],
        &["std::fs", "std::time", "std::env", "println!", "eprintln!", "std::io", "HashMap"],
    );
}

#[test]
fn the_reader_knows_no_formula_and_no_sheet() {
    absent("src/job", &[".rs"], &["sagledger_sheets", "sagledger_calc::analysis", "sagledger_calc::checks"]);
}

#[test]
fn sheets_know_no_solver_and_no_clock() {
    absent(
        "src/sheets",
        &[".rs"],
        &[
            "analysis::system",
            "analysis::solved",
            "analysis::envelope",
            "std::fs",
            "SystemTime",
            "Local::now",
            "Utc::now",
        ],
    );
}

#[test]
fn templates_read_nothing_but_their_data() {
    absent("templates", &[".typ"], &["@preview", "eval(", "sys.inputs", "datetime.today", "plugin("]);
}

#[test]
fn user_text_never_becomes_source() {
    for (path, text) in sources("src/sheets", &[".jinja"]) {
        assert!(!text.contains("| safe"), "{}", path.display());
    }
}

/// Tests may unwrap; what ships may not.
#[test]
fn nothing_that_ships_unwraps_or_panics() {
    for (path, text) in sources("src", &[".rs"]) {
        // The catalogue is read while the program is compiled: what does not parse there stops the build.
        if path.ends_with("src/calc/sections/table.rs") {
            continue;
        }
        for (n, line) in text.lines().enumerate() {
            let code = line.trim_start();
            if code.starts_with("//") {
                continue;
            }
            for word in [".unwrap()", ".expect(", "panic!(", "todo!(", "unimplemented!(", "unreachable!("] {
                assert!(!code.contains(word), "{}:{}: {word}", path.display(), n + 1);
            }
        }
    }
}

/// Every path that our Markdown names exists.
#[test]
fn every_path_in_our_markdown_exists() {
    for name in ["README.md", "DEVELOPERS.md"] {
        let text = fs::read_to_string(root().join(name)).unwrap();
        for quoted in text.split('`').skip(1).step_by(2) {
            let path = quoted.trim_end_matches('/');
            let looks_like_one = path.contains('/') && !path.contains([' ', '*', '<', ':', '(', '"', '=']);
            let is_made = path.ends_with(".pdf");
            if looks_like_one && !is_made && !path.starts_with('/') {
                assert!(Path::new(&root().join(path)).exists(), "{name} names {path}");
            }
        }
    }
}

#[test]
fn files_are_small_rooms() {
    for (path, text) in sources("src", &[".rs"]) {
        assert!(text.lines().count() <= 600, "{} is over 600 lines", path.display());
    }
}
