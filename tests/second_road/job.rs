//! A job file's text into what the statics need. Only valid jobs are expected; anything else panics.

use super::limits::{self, Limit};
use super::sections::Shape;
use super::units::quantity;
use toml::{Table, Value};

/// An action by its kind; rows that share one act together.
#[derive(Clone, Debug, PartialEq, Eq, PartialOrd, Ord)]
pub enum Action {
    Permanent,
    Imposed(char),
    Snow,
    Wind(String),
}

impl Action {
    /// The name in the results file.
    pub fn name(&self) -> String {
        match self {
            Action::Permanent => "permanent".into(),
            Action::Imposed(category) => format!("imposed {category}"),
            Action::Snow => "snow".into(),
            Action::Wind(case) if case == "wind" => "wind".into(),
            Action::Wind(case) => format!("wind {case}"),
        }
    }
}

/// A load along a beam, N and m from the beam's start: a line load varying linearly, or a point load.
#[derive(Clone, Copy, Debug)]
pub enum Load {
    Line { from: f64, to: f64, start: f64, end: f64 },
    Point { at: f64, force: f64 },
}

impl Load {
    pub fn total(&self) -> f64 {
        match *self {
            Load::Line { from, to, start, end } => (start + end) / 2.0 * (to - from),
            Load::Point { force, .. } => force,
        }
    }

    /// The part between two places; a point load at `from` belongs to it, one at `to` does not.
    pub fn within(&self, left: f64, right: f64) -> Option<Load> {
        match *self {
            Load::Line { from, to, start, end } => {
                let (a, b) = (from.max(left), to.min(right));
                let intensity = |x: f64| start + (end - start) * ((x - from) / (to - from));
                let ends = |x: f64| {
                    if x == from {
                        start
                    } else if x == to {
                        end
                    } else {
                        intensity(x)
                    }
                };
                (b > a).then(|| Load::Line { from: a, to: b, start: ends(a), end: ends(b) })
            }
            Load::Point { at, .. } => (left <= at && at < right).then_some(*self),
        }
    }

    fn scaled(&self, factor: f64) -> Load {
        match *self {
            Load::Line { from, to, start, end } => {
                Load::Line { from, to, start: start * factor, end: end * factor }
            }
            Load::Point { at, force } => Load::Point { at, force: force * factor },
        }
    }
}

/// One load row: where it acts with intensity 1, and each of its actions.
#[derive(Clone, Debug)]
pub struct Row {
    pub before: bool,
    pub loads: Vec<(Action, Load)>,
}

#[derive(Clone, Debug, PartialEq)]
pub enum Support {
    Wall(String),
    /// The carrying beam's index and the distance along it.
    Beam(usize, f64),
}

#[derive(Clone, Debug)]
pub struct Bearing {
    pub on: Support,
    pub at: f64,
    pub seat: f64,
    pub held_down: f64,
    pub settles: f64,
}

#[derive(Clone, Debug)]
pub struct Beam {
    pub mark: String,
    pub shape: Shape,
    pub length: f64,
    pub bearings: Vec<Bearing>,
    pub rows: Vec<Row>,
    pub limits: [Vec<Limit>; 5],
}

#[derive(Clone, Debug)]
pub struct Job {
    pub uk: bool,
    pub two_expressions: bool,
    pub shear_flexible: bool,
    pub walls: Vec<String>,
    pub beams: Vec<Beam>,
}

impl Job {
    pub fn read(text: &str) -> Job {
        let table: Table = text.parse().expect("a valid job file");
        let basis = table.get("basis").and_then(Value::as_table).cloned().unwrap_or_default();
        let word = |key: &str, default: &'static str| basis.get(key).and_then(Value::as_str).unwrap_or(default);
        let build_ups: Vec<&Table> = tables(&table, "build-up");
        let beams = tables(&table, "beam");
        let marks: Vec<&str> = beams.iter().map(|beam| string(beam, "mark")).collect();
        let job_limits = table.get("limits").and_then(Value::as_table);
        Job {
            uk: word("national-choices", "UK") == "UK",
            two_expressions: word("combination", "6.10") == "6.10a/b",
            shear_flexible: basis.get("shear-flexibility").and_then(Value::as_bool).unwrap_or(false),
            walls: tables(&table, "wall").iter().map(|wall| string(wall, "name").to_string()).collect(),
            beams: beams.iter().map(|beam| read_beam(beam, &marks, &build_ups, job_limits)).collect(),
        }
    }
}

fn read_beam(beam: &Table, marks: &[&str], build_ups: &[&Table], job_limits: Option<&Table>) -> Beam {
    let length = measure(beam, "length").expect("a length");
    let shape = Shape::named(string(beam, "section"));
    let typed = tables(beam, "bearings");
    let last = typed.len() - 1;
    let bearings = typed.iter().enumerate().map(|(index, bearing)| {
        let on = string(bearing, "on");
        let default = if index == 0 {
            Some(0.0)
        } else if index == last {
            Some(length)
        } else {
            None
        };
        Bearing {
            on: match marks.iter().position(|mark| *mark == on) {
                Some(carrier) => Support::Beam(carrier, measure(bearing, "lands").expect("lands")),
                None => Support::Wall(on.to_string()),
            },
            at: measure(bearing, "at").or(default).expect("at of an inner bearing"),
            seat: measure(bearing, "bearing-length").unwrap_or(0.1),
            held_down: measure(bearing, "held-down").unwrap_or(0.0),
            settles: measure(bearing, "settles").unwrap_or(0.0),
        }
    });
    let mut rows: Vec<Row> = tables(beam, "load").iter().map(|row| read_row(row, length, build_ups)).collect();
    let weight = shape.weight();
    let own = Load::Line { from: 0.0, to: length, start: weight, end: weight };
    rows.push(Row { before: true, loads: vec![(Action::Permanent, own)] });
    Beam {
        mark: string(beam, "mark").to_string(),
        shape,
        length,
        bearings: bearings.collect(),
        rows,
        limits: limits::of_beam(job_limits, beam.get("limits").and_then(Value::as_table)),
    }
}

fn read_row(row: &Table, length: f64, build_ups: &[&Table]) -> Row {
    let before = row.get("stage").and_then(Value::as_str) == Some("before");
    let wind_case = row.get("wind-case").and_then(Value::as_str).unwrap_or("wind").to_string();
    let from = measure(row, "from").unwrap_or(0.0);
    let to = measure(row, "to").unwrap_or(length);
    let extent = |key: &str| {
        row.get(key).map(|value| match value {
            Value::Array(pair) => [0, 1].map(|end| quantity(pair[end].as_str().expect("a length"))),
            single => [quantity(single.as_str().expect("a length")); 2],
        })
    };
    let mut loads = Vec::new();
    if let Some(name) = row.get("build-up").and_then(Value::as_str) {
        let build_up = build_ups.iter().find(|build_up| string(build_up, "name") == name).expect("a build-up");
        let [start, end] = extent("width").or_else(|| extent("height")).expect("a width or a height");
        let breadth = Load::Line { from, to, start, end };
        let pitch = measure(build_up, "pitch").unwrap_or(0.0);
        let layers: f64 = tables(build_up, "layers").iter().map(|layer| layer_load(layer)).sum();
        if layers > 0.0 {
            loads.push((Action::Permanent, breadth.scaled(layers / pitch.cos())));
        }
        if let Some(imposed) = build_up.get("imposed").and_then(Value::as_table) {
            let intensity = measure(imposed, "load").unwrap_or(0.0) + measure(imposed, "partitions").unwrap_or(0.0);
            loads.push((Action::Imposed(category(imposed)), breadth.scaled(intensity)));
        }
        for (key, action) in [("snow", Action::Snow), ("wind", Action::Wind(wind_case.clone()))] {
            if let Some(intensity) = measure(build_up, key) {
                loads.push((action, breadth.scaled(intensity)));
            }
        }
    } else {
        let unit = match measure(row, "at") {
            Some(at) => Load::Point { at, force: 1.0 },
            None => Load::Line { from, to, start: 1.0, end: 1.0 },
        };
        for key in ["permanent", "imposed", "snow", "wind"] {
            if let Some(size) = measure(row, key) {
                let action = match key {
                    "permanent" => Action::Permanent,
                    "imposed" => Action::Imposed(category(row)),
                    "snow" => Action::Snow,
                    _ => Action::Wind(wind_case.clone()),
                };
                loads.push((action, unit.scaled(size)));
            }
        }
    }
    Row { before, loads }
}

fn layer_load(layer: &Table) -> f64 {
    measure(layer, "load").unwrap_or_else(|| {
        measure(layer, "thickness").expect("a thickness") * measure(layer, "density").expect("a density")
    })
}

fn category(table: &Table) -> char {
    string(table, "category").chars().next().expect("a category")
}

fn measure(table: &Table, key: &str) -> Option<f64> {
    table.get(key).map(|value| quantity(value.as_str().unwrap_or_else(|| panic!("{key} is no string"))))
}

fn string<'a>(table: &'a Table, key: &str) -> &'a str {
    table.get(key).and_then(Value::as_str).unwrap_or_else(|| panic!("no {key} in {table}"))
}

fn tables<'a>(table: &'a Table, key: &str) -> Vec<&'a Table> {
    table
        .get(key)
        .and_then(Value::as_array)
        .map(|items| items.iter().filter_map(Value::as_table).collect())
        .unwrap_or_default()
}
