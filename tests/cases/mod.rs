//! Jobs whose figures are known in closed form, with their sources, and one function that holds any results file
//! against them. Own weight is always part of a job: it is in every closed form, or is taken off the load that is
//! typed so that the handbook's figure holds as printed. Effects of variable load alone are free of it.
#![allow(dead_code)] // each test binary that includes this module uses a part of it

mod chains;
mod combinations;
mod continuous;
mod overhangs;
mod places;
mod requirements;
mod spans;

use crate::second_road::YOUNG;
use crate::second_road::sections::Shape;
use serde_json::Value;

/// Closed forms hold to this part of themselves: the file prints twelve figures.
pub const EXACT: f64 = 1e-9;
/// Coefficients that a handbook prints with three figures.
pub const PRINTED: f64 = 0.005;

pub struct Case {
    pub name: &'static str,
    pub source: &'static str,
    pub job: String,
    pub expected: Vec<Expected>,
}

pub struct Expected {
    pub path: String,
    pub wanted: Wanted,
}

pub enum Wanted {
    /// A figure, and how far it may be away.
    Figure {
        value: f64,
        slack: f64,
    },
    Word(&'static str),
    /// Nothing under this path.
    Absent,
}

impl Case {
    fn new(name: &'static str, source: &'static str, job: String) -> Case {
        Case { name, source, job, expected: Vec::new() }
    }

    /// A figure of the results file, such as `beams.0.moment_kNm.max`, and a part of it as tolerance.
    fn is(self, path: &str, value: f64, part: f64) -> Case {
        let slack = part * value.abs();
        self.within(path, value, slack)
    }

    fn within(self, path: &str, value: f64, slack: f64) -> Case {
        self.wants(path, Wanted::Figure { value, slack })
    }

    fn says(self, path: &str, word: &'static str) -> Case {
        self.wants(path, Wanted::Word(word))
    }

    fn absent(self, path: &str) -> Case {
        self.wants(path, Wanted::Absent)
    }

    fn wants(mut self, path: &str, wanted: Wanted) -> Case {
        self.expected.push(Expected { path: path.to_string(), wanted });
        self
    }
}

/// Cases of checks, which the second road does not make.
pub fn requirements() -> Vec<Case> {
    requirements::cases()
}

/// Every case.
pub fn cases() -> Vec<Case> {
    [
        spans::cases(),
        combinations::cases(),
        continuous::cases(),
        overhangs::cases(),
        chains::cases(),
        places::cases(),
    ]
    .into_iter()
    .flatten()
    .collect()
}

/// What a results file gets wrong of a case.
pub fn misses(case: &Case, results: &Value) -> Vec<String> {
    let miss = |expected: &Expected| {
        let found = expected.path.split('.').try_fold(results, step);
        // A tilt may carry the sign of the side that goes down; its size is what is known here.
        let tilt = expected.path.ends_with("tilt");
        let figure = found.and_then(Value::as_f64).map(|figure| if tilt { figure.abs() } else { figure });
        let (right, wanted) = match expected.wanted {
            Wanted::Figure { value, slack } => {
                (figure.is_some_and(|figure| (figure - value).abs() <= slack), format!("{value} within {slack:e}"))
            }
            Wanted::Word(word) => (found.is_some_and(|found| found == word), format!("{word:?}")),
            Wanted::Absent => (found.is_none(), "absent".to_string()),
        };
        let line = || format!("{}: {} is {found:?}, not {wanted} ({})", case.name, expected.path, case.source);
        (!right).then(line)
    };
    case.expected.iter().filter_map(miss).collect()
}

/// One step down a path: a key, the place in a list, or `bending#0`, the first check of that name.
fn step<'v>(value: &'v Value, key: &str) -> Option<&'v Value> {
    if let Some((name, place)) = key.split_once('#') {
        let mut named = value.as_array()?.iter().filter(|check| check["check"] == name);
        return named.nth(place.parse().ok()?);
    }
    match key.parse::<usize>() {
        Ok(index) => value.get(index),
        Err(_) => value.get(key),
    }
}

/// A job of beams on walls named a to f, with keys of `[basis]` (may be empty).
fn job(basis: &str, beams: &str) -> String {
    let walls: String =
        ["a", "b", "c", "d", "e", "f"].map(|name| format!("[[wall]]\nname = \"{name}\"\n")).concat();
    format!(
        "[job]\nnumber = \"K-1\"\ntitle = \"Known figures\"\ndate = 2027-03-01\n[basis]\n{basis}\n{walls}\
         [[build-up]]\nname = \"floor\"\nlayers = [ {{ what = \"boards\", load = \"0.5 kN/m2\" }} ]\n\
         imposed = {{ category = \"A\", load = \"2.0 kN/m2\" }}\n{beams}"
    )
}

/// A beam of `[[beam]]` keys, bearings and load rows.
fn beam(mark: &str, section: &str, length: f64, bearings: &[String], rows: &[&str]) -> String {
    let rows: String = rows.iter().map(|row| format!("  [[beam.load]]\n  what = \"load\"\n{row}\n")).collect();
    format!(
        "[[beam]]\nmark = \"{mark}\"\nsection = \"{section}\"\nlength = \"{length} m\"\nbearings = [ {} ]\n{rows}",
        bearings.join(", ")
    )
}

/// A bearing on a wall at a place.
fn wall(name: &str, at: f64) -> String {
    format!("{{ on = \"{name}\", at = \"{at} m\" }}")
}

fn carried(at: f64, on: &str, lands: f64) -> String {
    format!("{{ on = \"{on}\", at = \"{at} m\", lands = \"{lands} m\" }}")
}

/// Rows of direct load over the whole beam, kN/m.
fn line(action: &str, size: f64) -> String {
    format!("  {action} = \"{size} kN/m\"{}", category(action))
}

fn part(action: &str, size: f64, from: f64, to: f64) -> String {
    format!("{}\n  from = \"{from} m\"\n  to = \"{to} m\"", line(action, size))
}

fn point(action: &str, size: f64, at: f64) -> String {
    format!("  {action} = \"{size} kN\"{}\n  at = \"{at} m\"", category(action))
}

fn category(action: &str) -> &'static str {
    if action == "imposed" { "\n  category = \"A\"" } else { "" }
}

/// EI in kNm2 and own weight in kN/m.
fn stiffness_and_weight(section: &str) -> (f64, f64) {
    let shape = Shape::named(section);
    (YOUNG * shape.second_moment / 1e3, shape.weight() / 1e3)
}

/// Where a function that falls once from above zero to below does so.
fn root(from: f64, to: f64, function: impl Fn(f64) -> f64) -> f64 {
    let (mut a, mut b) = (from, to);
    for _ in 0..200 {
        let middle = (a + b) / 2.0;
        if function(middle) > 0.0 { a = middle } else { b = middle }
    }
    (a + b) / 2.0
}

/// Movement and slope of a beam on two bearings under a uniform load, as handbooks give the elastic line.
fn uniform_line(load: f64, span: f64, x: f64) -> [f64; 2] {
    [
        load * x * (span.powi(3) - 2.0 * span * x * x + x.powi(3)) / 24.0,
        load * (span.powi(3) - 6.0 * span * x * x + 4.0 * x.powi(3)) / 24.0,
    ]
}

/// The same under a point load at `a`.
fn point_line(force: f64, span: f64, a: f64, x: f64) -> [f64; 2] {
    let b = span - a;
    if x <= a {
        [
            force * b * x * (span * span - b * b - x * x) / (6.0 * span),
            force * b * (span * span - b * b - 3.0 * x * x) / (6.0 * span),
        ]
    } else {
        let [movement, slope] = point_line(force, span, b, span - x);
        [movement, -slope]
    }
}
