//! The commands as a new user runs them: whole jobs in, screens, files and exit codes out.

use std::collections::BTreeSet;
use std::fs;
use std::path::{Path, PathBuf};
use std::process::{Command, Output};

/// A folder of its own for each test.
struct Desk {
    folder: tempfile::TempDir,
}

impl Desk {
    fn new() -> Desk {
        Desk { folder: tempfile::tempdir().unwrap() }
    }

    fn job(&self, text: impl AsRef<[u8]>) -> PathBuf {
        let path = self.folder.path().join("job.toml");
        fs::write(&path, text).unwrap();
        path
    }

    fn run(&self, arguments: &[&str]) -> Output {
        Command::new(env!("CARGO_BIN_EXE_sagledger"))
            .args(arguments)
            .current_dir(self.folder.path())
            .env_remove("NO_COLOR")
            .env("LANG", "en_GB.UTF-8")
            .output()
            .unwrap()
    }

    fn files(&self) -> Vec<String> {
        let mut names: Vec<String> = fs::read_dir(self.folder.path())
            .unwrap()
            .map(|entry| entry.unwrap().file_name().to_string_lossy().into_owned())
            .collect();
        names.sort();
        names
    }
}

fn sample(name: &str) -> String {
    let path = Path::new(env!("CARGO_MANIFEST_DIR")).join("sample-jobs").join(name).join("job.toml");
    fs::read_to_string(path).unwrap()
}

fn text(bytes: &[u8]) -> String {
    String::from_utf8(bytes.to_vec()).unwrap()
}

#[test]
fn check_prints_the_ledger_of_a_met_job_and_exits_0() {
    let desk = Desk::new();
    desk.job(sample("weir-cottage"));
    let output = desk.run(&["check"]);
    assert_eq!(output.status.code(), Some(0), "{}", text(&output.stderr));
    let ledger = text(&output.stdout);
    for expected in ["0417  Weir Cottage", "member", "share of the limit", "R1", "  T1", "    T2", "hand rule"] {
        assert!(ledger.contains(expected), "{expected} is not in\n{ledger}");
    }
    assert!(ledger.contains("○ Met, with 9 items outside this calculation"), "{ledger}");
    assert!(!ledger.contains('\x1b') && !ledger.contains("-0.0"), "{ledger}");
    assert_eq!(desk.files(), ["job.toml"]);
}

#[test]
fn a_job_that_is_not_wholly_verified_says_so_and_exits_1() {
    let desk = Desk::new();
    desk.job(sample("packing-mezzanine"));
    let output = desk.run(&["check"]);
    assert_eq!(output.status.code(), Some(1));
    let ledger = text(&output.stdout);
    assert!(ledger.contains("Not verified: lateral-torsional buckling of S1"), "{ledger}");
}

#[test]
fn the_results_file_is_json_with_twelve_figures_and_units_in_its_keys() {
    let desk = Desk::new();
    desk.job(sample("garden-door"));
    let output = desk.run(&["check", "--format", "json"]);
    let results: serde_json::Value = serde_json::from_slice(&output.stdout).unwrap();
    assert_eq!(results["format"], 1);
    assert_eq!(results["program"]["name"], "sagledger");
    assert_eq!(results["beams"][0]["mark"], "L1");
    assert_eq!(results["beams"][0]["bearings"][0]["on"], "left jamb");
    assert!(results["beams"][0]["moment_kNm"]["max"].as_f64().unwrap() > 0.0);
    assert!(results["outside"].as_array().unwrap().len() >= 8);
}

#[test]
fn faults_exit_2_and_write_nothing() {
    let desk = Desk::new();
    desk.job(sample("garden-door").replace("length   = \"2.75 m\"", "length   = \"2.75\""));
    for command in ["check", "draft"] {
        let output = desk.run(&[command]);
        assert_eq!(output.status.code(), Some(2));
        assert!(output.stdout.is_empty());
        assert!(text(&output.stderr).contains("unit-missing"), "{}", text(&output.stderr));
        assert_eq!(desk.files(), ["job.toml"]);
    }
    let output = desk.run(&["check", "--format", "json"]);
    let faults: serde_json::Value = serde_json::from_slice(&output.stderr).unwrap();
    assert!(text(&output.stderr).contains("\"unit-missing\""), "{faults}");
}

#[test]
fn ten_faults_are_all_said_in_order_of_lines_and_nothing_is_written() {
    let desk = Desk::new();
    let case = Path::new(env!("CARGO_MANIFEST_DIR")).join("tests/faults/ten.toml");
    desk.job(fs::read(case).unwrap());
    for command in ["check", "draft"] {
        let output = desk.run(&[command]);
        let said = text(&output.stderr);
        assert_eq!(output.status.code(), Some(2), "{said}");
        assert!(output.stdout.is_empty());
        let heads: Vec<&str> = said.lines().filter(|line| line.starts_with("job.toml:")).collect();
        let lines: Vec<u32> =
            heads.iter().map(|head| head.split(':').nth(1).unwrap().parse().expect("a line")).collect();
        let names: BTreeSet<&str> = heads.iter().filter_map(|head| head.split_whitespace().last()).collect();
        // The lines of the ten faults of that file, counted by hand.
        assert_eq!(lines, [2, 4, 8, 9, 23, 24, 25, 30, 38, 46], "{said}");
        assert_eq!(names.len(), 10, "{said}");
        assert!(said.ends_with("not read: 10 faults; nothing was computed\n"), "{said}");
        assert_eq!(desk.files(), ["job.toml"]);
    }
    let output = desk.run(&["check", "--format", "json"]);
    let faults: serde_json::Value = serde_json::from_slice(&output.stderr).unwrap();
    assert_eq!((output.status.code(), output.stdout.len()), (Some(2), 0));
    assert_eq!(faults.as_array().map(Vec::len), Some(10), "{faults}");
}

#[test]
fn a_loop_of_beams_names_its_lines() {
    let desk = Desk::new();
    let job = sample("weir-cottage")
        .replace("{ on = \"garden wall\", bearing-length = \"200 mm\" }", "{ on = \"R1\", lands = \"2.00 m\" }");
    desk.job(job);
    let output = desk.run(&["check"]);
    assert_eq!(output.status.code(), Some(2));
    let said = text(&output.stderr);
    assert!(said.contains("carriers-loop") && said.contains("R1 on T1"), "{said}");
}

#[test]
fn hostile_files_are_answered_with_a_message() {
    let nested = format!("{}{}", "[job]\nx = ", "[".repeat(10_000));
    let tables = (0..10_000).fold(String::from("x = "), |mut text, _| {
        text.push_str("{a=");
        text
    });
    let large = format!("# {}\n", "x".repeat(4 * 1024 * 1024));
    let number = |value: &str| sample("garden-door").replace("\"0.85 m\"", &format!("\"{value}\""));
    let cases: Vec<Vec<u8>> = vec![
        Vec::new(),
        vec![0xff, 0xfe, 0x00, 0x41],
        vec![0; 1000],
        nested.into_bytes(),
        tables.into_bytes(),
        large.into_bytes(),
        number("NaN m").into_bytes(),
        number("inf m").into_bytes(),
        number("1e999 m").into_bytes(),
        number("-0.85 m").into_bytes(),
        number("1e-320 m").into_bytes(),
    ];
    for (n, case) in cases.iter().enumerate() {
        let desk = Desk::new();
        desk.job(case);
        let output = desk.run(&["draft"]);
        let said = text(&output.stderr);
        assert_eq!(output.status.code(), Some(2), "case {n}: {said}");
        assert!(!said.is_empty() && !said.contains("panicked"), "case {n}: {said}");
        assert_eq!(desk.files(), ["job.toml"]);
    }
    let desk = Desk::new();
    fs::create_dir(desk.folder.path().join("job.toml")).unwrap();
    assert_eq!(desk.run(&["check"]).status.code(), Some(2));
    assert_eq!(Desk::new().run(&["check"]).status.code(), Some(2));
    assert_eq!(Desk::new().run(&["no-such-command"]).status.code(), Some(2));
}

#[test]
fn a_draft_is_the_same_bytes_every_time() {
    let desk = Desk::new();
    desk.job(sample("garden-door"));
    let draft = |name: &str, threads: &str| {
        let output = Command::new(env!("CARGO_BIN_EXE_sagledger"))
            .args(["draft", "-o", name])
            .current_dir(desk.folder.path())
            .env("RAYON_NUM_THREADS", threads)
            .output()
            .unwrap();
        assert!(output.status.code() <= Some(1), "{}", text(&output.stderr));
        fs::read(desk.folder.path().join(name)).unwrap()
    };
    let one = draft("one.pdf", "1");
    let two = draft("two.pdf", "2");
    assert!(one.starts_with(b"%PDF-"));
    assert!(one == two, "the bytes differ");
}

#[test]
fn draft_goes_into_the_job_folder_and_is_written_whole() {
    let desk = Desk::new();
    desk.job(sample("garden-door"));
    let output = desk.run(&["draft"]);
    assert_eq!(output.status.code(), Some(0), "{}", text(&output.stderr));
    assert!(text(&output.stdout).contains("wrote"), "{}", text(&output.stdout));
    assert_eq!(desk.files(), ["draft.pdf", "job.toml"]);
    let missing = desk.run(&["draft", "-o", "no/such/folder/out.pdf"]);
    assert_eq!(missing.status.code(), Some(3));
    let refused = desk.run(&["draft", "--templates", "nowhere"]);
    assert_eq!(refused.status.code(), Some(2));
}

#[test]
fn only_if_met_refuses_and_says_why() {
    let desk = Desk::new();
    desk.job(sample("packing-mezzanine"));
    let output = desk.run(&["draft", "--only-if-met"]);
    assert_eq!(output.status.code(), Some(1));
    assert!(text(&output.stderr).contains("lateral-torsional buckling"));
    assert_eq!(desk.files(), ["job.toml"]);
}

#[test]
fn a_broken_template_names_its_file_and_line() {
    let desk = Desk::new();
    desk.job(sample("garden-door"));
    let folder = desk.folder.path().join("templates");
    fs::create_dir(&folder).unwrap();
    fs::write(folder.join("cover.typ"), "#let x = 1\n#let cover(d) = [\n").unwrap();
    let output = desk.run(&["draft"]);
    assert_eq!(output.status.code(), Some(2));
    assert!(text(&output.stderr).contains("cover.typ:2"), "{}", text(&output.stderr));
    assert_eq!(desk.files(), ["job.toml", "templates"]);
}

#[test]
fn several_jobs_print_one_line_each() {
    let folder = Path::new(env!("CARGO_MANIFEST_DIR")).join("sample-jobs");
    let jobs = ["weir-cottage", "garden-door"].map(|name| folder.join(name).to_string_lossy().into_owned());
    let output = Desk::new().run(&["check", &jobs[0], &jobs[1]]);
    let said = text(&output.stdout);
    assert!(said.contains("0417") && said.contains("0422") && said.contains("2 jobs: ○ 2 met"), "{said}");
}

#[test]
fn quiet_ascii_and_only_are_respected() {
    let desk = Desk::new();
    desk.job(sample("packing-mezzanine"));
    let quiet = text(&desk.run(&["check", "--quiet"]).stdout);
    assert!(quiet.starts_with("⊟ Not verified"), "{quiet}");
    let ascii = text(&desk.run(&["check", "--ascii"]).stdout);
    assert!(ascii.is_ascii(), "{ascii}");
    let only = text(&desk.run(&["check", "--only", "not met"]).stdout);
    assert!(!only.contains("movement"), "{only}");
    let bold = text(&desk.run(&["check", "--color", "always"]).stdout);
    assert!(bold.contains("\x1b[1m"), "{bold}");
}
