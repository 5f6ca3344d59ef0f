//! Files that no engineer writes: a message, never a panic, and nothing that is no number gets through.

use std::fmt::Write as _;
use std::fs;

use sagledger::job::Reading;
use sagledger::job::show::{self, Screen};

use super::{folder, names, read, shown};

/// Reads and shows; what is shown must hold no control character but line breaks.
fn survive(bytes: &[u8]) -> Reading {
    let reading = read(bytes);
    assert_eq!(reading.job.is_some(), reading.faults() == 0);
    for screen in [Screen::cells(80), Screen::cells(40).ascii(), Screen::PIPE] {
        let text = show::terminal(&reading.source, &reading.findings, screen);
        assert!(!text.chars().any(|c| c.is_control() && c != '\n'));
    }
    show::json(&reading.source, &reading.findings);
    reading
}

fn good_jobs() -> Vec<Vec<u8>> {
    let mut jobs: Vec<_> = fs::read_dir(folder("jobs")).unwrap().map(|entry| entry.unwrap().path()).collect();
    jobs.sort();
    assert!(jobs.len() >= 3);
    jobs.into_iter().map(|path| fs::read(path).unwrap()).collect()
}

#[test]
fn nested_without_end() {
    let deep = 10_000;
    let cases = [
        format!("a = {}{}", "[".repeat(deep), "]".repeat(deep)),
        format!("a = {}", "[".repeat(deep)),
        format!("a = {}1{}", "{ b = ".repeat(deep), " }".repeat(deep)),
        format!("a = {}", "{ b = ".repeat(deep)),
        format!("[{}]", vec!["a"; deep].join(".")),
        format!("[[{}]]", vec!["a"; deep].join(".")),
        format!("{} = 1", vec!["a"; deep].join(".")),
        format!("a = {{ {} = 1 }}", vec!["a"; deep].join(".")),
        (1..400).fold(String::new(), |mut text, n| {
            let _ = writeln!(text, "[{}]", vec!["a"; n].join("."));
            text
        }),
    ];
    for text in cases {
        let reading = survive(text.as_bytes());
        let said = names(&reading);
        assert!(
            said.iter().any(|name| ["nested-too-deep", "syntax", "key-unknown"].contains(name)),
            "{:.40}: {said:?}",
            text
        );
    }
}

#[test]
fn large_and_odd() {
    let most = 4 * 1024 * 1024;
    // Some hundred thousand of each; the largest file is read where it matters.
    let fill = |part: &str| part.repeat(most / 8 / part.len());
    for part in [
        "a",
        "[",
        "]",
        "{",
        "\"",
        "'",
        "\\",
        "=",
        ".",
        ",",
        "\n",
        "\r",
        "\t",
        "\0",
        "#",
        "é",
        "\u{feff}",
        "a = 1\n",
        "[[beam]]\n",
        "[[wall]]\nname = \"w\"\n",
        "[beam]\n",
        "x.y = 1\n",
        "\u{202e}",
    ] {
        survive(fill(part).as_bytes());
    }
    survive(format!("[job]\ntitle = \"{}\"", "x".repeat(most - 100)).as_bytes());
    survive(format!("[[beam]]\nmark = \"{}\"", "é".repeat(most / 2 - 100)).as_bytes());
    survive(format!("[[beam]]\nlength = \"{} m\"", "9".repeat(most - 100)).as_bytes());
    survive(format!("[[beam]]\nsection = \"{}\"", "x".repeat(most - 100)).as_bytes());
    survive(format!("[[beam]]\nbearings = [{}]", "{ on = \"w\" },".repeat(200_000)).as_bytes());
}

/// As many walls as bearings on unknown names: looking for near names must not cost the product of both.
#[test]
fn many_unknown_names() {
    let mut text = String::new();
    for n in 0..20_000 {
        let _ = writeln!(text, "[[wall]]\nname = \"pier number {n}\"");
    }
    text.push_str("[[beam]]\nmark = \"B\"\nbearings = [\n");
    for n in 0..20_000 {
        let _ = writeln!(text, "{{ on = \"peer number {n}x\" }},");
    }
    text.push(']');
    let reading = survive(text.as_bytes());
    assert_eq!(reading.findings.len(), 20_001);
    let last = reading.findings.last().unwrap();
    // 20000 unknown names and 19998 inner bearings without a place, and the job, the section, the length.
    assert_eq!((last.name.text(), last.fact.as_str()), ("too-many", "20001 faults and warnings more"));
    assert!(shown(&reading).lines().last().unwrap().contains("19951 more than are shown"));
}

/// A chain of carriers as long as a file can hold, closed to a ring: found without recursion, told in one line.
#[test]
fn a_very_long_loop() {
    let beams = 20_000;
    let mut text =
        String::from("[job]\nnumber = \"1\"\ntitle = \"Ring\"\ndate = 2027-01-01\n[[wall]]\nname = \"w\"\n");
    for n in 0..beams {
        let next = (n + 1) % beams;
        let _ = writeln!(
            text,
            "[[beam]]\nmark = \"R{n}\"\nsection = \"203x133x25 UB\"\nlength = \"2 m\"\n\
             bearings = [{{ on = \"w\" }}, {{ on = \"R{next}\", lands = \"1 m\" }}]"
        );
    }
    let reading = survive(text.as_bytes());
    assert_eq!(names(&reading), ["carriers-loop"]);
    assert!(reading.findings[0].fact.len() < 200);
    assert_eq!(reading.findings[0].also.len(), beams - 1);
}

/// Valid jobs with bytes cut off, changed, left out, put in or moved: with a fixed seed.
#[test]
fn broken_jobs_are_told_and_never_panic() {
    let mut random = fastrand::Rng::with_seed(0x0005_a91e_d9e2);
    let mut faulty = 0;
    for job in good_jobs() {
        assert!(read(&job).job.is_some());
        for _ in 0..1500 {
            let mut bytes = job.clone();
            for _ in 0..random.usize(1..4) {
                mutate(&mut bytes, &mut random);
            }
            faulty += usize::from(survive(&bytes).faults() > 0);
        }
        // Every way to cut the file off, a step at a time.
        for end in (0..job.len()).step_by(7) {
            survive(&job[..end]);
        }
    }
    assert!(faulty > 2500, "only {faulty} of the broken jobs were at fault");
}

fn mutate(bytes: &mut Vec<u8>, random: &mut fastrand::Rng) {
    if bytes.is_empty() {
        return;
    }
    let at = random.usize(..bytes.len());
    let length = random.usize(1..24).min(bytes.len() - at);
    match random.u8(..7) {
        0 => bytes.truncate(at),
        1 => bytes[at] ^= 1 << random.u8(..8),
        2 => drop(bytes.drain(at..at + length)),
        3 => {
            const ODD: &[u8] = b"\"[]{}=,.#\n\t-+eE0m \0\x80\xff";
            bytes.insert(at, ODD[random.usize(..ODD.len())]);
        }
        4 => {
            let part = bytes[at..at + length].to_vec();
            let to = random.usize(..bytes.len());
            bytes.splice(to..to, part);
        }
        5 => {
            // A whole line twice, or gone.
            let start = bytes[..at].iter().rposition(|b| *b == b'\n').map_or(0, |n| n + 1);
            let end = bytes[at..].iter().position(|b| *b == b'\n').map_or(bytes.len(), |n| at + n + 1);
            let line = bytes[start..end].to_vec();
            if random.bool() {
                bytes.splice(start..start, line);
            } else {
                bytes.drain(start..end);
            }
        }
        _ => {
            const TEXTS: [&str; 8] = ["1e999", "nan", "inf", "\u{202e}", "\"\"\"", "[[beam]]\n", "−", "-0"];
            let text = TEXTS[random.usize(..TEXTS.len())];
            bytes.splice(at..at, text.bytes());
        }
    }
}
