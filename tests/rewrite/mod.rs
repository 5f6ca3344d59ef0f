//! Changes to the text of a job that must not change its figures, or change them in a known way.
#![allow(dead_code)] // each test binary that includes this module uses a part of it

use crate::second_road::units::quantity;
use toml::{Table, Value};

pub fn read(text: &str) -> Table {
    text.parse().expect("a valid job file")
}

pub fn write(job: &Table) -> String {
    toml::to_string(job).expect("a job file")
}

/// The tables under a key; none where it is absent.
pub fn tables<'a>(parent: &'a mut Table, key: &str) -> Vec<&'a mut Table> {
    match parent.get_mut(key) {
        Some(Value::Array(items)) => items.iter_mut().filter_map(Value::as_table_mut).collect(),
        _ => Vec::new(),
    }
}

pub fn beams(job: &mut Table) -> Vec<&mut Table> {
    tables(job, "beam")
}

pub fn word(table: &Table, key: &str) -> String {
    table.get(key).and_then(Value::as_str).unwrap_or_default().to_string()
}

pub fn metres(table: &Table, key: &str) -> Option<f64> {
    table.get(key).and_then(Value::as_str).map(quantity)
}

fn set_metres(table: &mut Table, key: &str, value: f64) {
    table.insert(key.to_string(), Value::String(format!("{value} m")));
}

/// Turns beams end for end: those for which `turn` says so by their mark. What lands on them lands where it did.
pub fn turned(text: &str, turn: impl Fn(&str) -> bool) -> String {
    let mut job = read(text);
    let mut lengths = Vec::new();
    for beam in beams(&mut job) {
        let length = metres(beam, "length").expect("a length");
        if turn(&word(beam, "mark")) {
            lengths.push((word(beam, "mark"), length));
        }
    }
    for beam in beams(&mut job) {
        let length = metres(beam, "length").expect("a length");
        let turns = turn(&word(beam, "mark"));
        let last = tables(beam, "bearings").len() - 1;
        for (index, bearing) in tables(beam, "bearings").into_iter().enumerate() {
            if let Some((_, below)) = lengths.iter().find(|(mark, _)| *mark == word(bearing, "on")) {
                let lands = metres(bearing, "lands").expect("lands");
                set_metres(bearing, "lands", below - lands);
            }
            if turns {
                let default = if index == 0 { 0.0 } else { length };
                assert!(index == 0 || index == last || bearing.contains_key("at"));
                let at = metres(bearing, "at").unwrap_or(default);
                set_metres(bearing, "at", length - at);
            }
        }
        if !turns {
            continue;
        }
        if let Some(Value::Array(bearings)) = beam.get_mut("bearings") {
            bearings.reverse();
        }
        if let Some(Value::Table(restraint)) = beam.get_mut("restraint") {
            for flange in ["top", "bottom"] {
                if let Some(Value::Array(places)) = restraint.get_mut(flange) {
                    places.reverse();
                    for place in places {
                        *place =
                            Value::String(format!("{} m", length - quantity(place.as_str().expect("a place"))));
                    }
                }
            }
        }
        for row in tables(beam, "load") {
            if let Some(at) = metres(row, "at") {
                set_metres(row, "at", length - at);
                continue;
            }
            let (from, to) = (metres(row, "from").unwrap_or(0.0), metres(row, "to").unwrap_or(length));
            set_metres(row, "from", length - to);
            set_metres(row, "to", length - from);
            for key in ["width", "height"] {
                if let Some(Value::Array(pair)) = row.get_mut(key) {
                    pair.reverse();
                }
            }
        }
    }
    write(&job)
}

const SIZES: [&str; 6] = ["width", "height", "permanent", "imposed", "snow", "wind"];

/// A row with every size multiplied.
pub fn scaled(row: &Table, factor: f64, keys: &[&str]) -> Table {
    let mut row = row.clone();
    let times = |value: &Value| {
        let text = value.as_str().expect("a quantity");
        let digits = text.find(|c: char| c.is_whitespace() || c.is_alphabetic()).expect("a unit");
        let number: f64 = text[..digits].parse().expect("a number");
        Value::String(format!("{}{}", number * factor, &text[digits..]))
    };
    for key in keys {
        if let Some(value) = row.get_mut(*key) {
            *value = match &*value {
                Value::Array(pair) => Value::Array(pair.iter().map(times).collect()),
                single => times(single),
            };
        }
    }
    row
}

/// Every load row of every beam replaced by others.
fn with_rows(text: &str, replace: impl Fn(&Table, &Table) -> Vec<Table>) -> String {
    let mut job = read(text);
    for beam in beams(&mut job) {
        let whole = beam.clone();
        if let Some(Value::Array(rows)) = beam.get_mut("load") {
            let new = rows.iter().filter_map(Value::as_table).flat_map(|row| replace(&whole, row));
            *rows = new.map(Value::Table).collect();
        }
    }
    write(&job)
}

/// Every row as two, of 0.375 and 0.625 of its size (exact in binary).
pub fn split_in_size(text: &str) -> String {
    with_rows(text, |_, row| vec![scaled(row, 0.375, &SIZES), scaled(row, 0.625, &SIZES)])
}

/// Direct variable loads and build-ups' variable parts doubled.
pub fn variable_doubled(text: &str) -> String {
    let keys = ["imposed", "snow", "wind"];
    let mut job = read(&with_rows(text, |_, row| vec![scaled(row, 2.0, &keys)]));
    for build_up in tables(&mut job, "build-up") {
        let imposed = build_up.remove("imposed");
        *build_up = scaled(build_up, 2.0, &["snow", "wind"]);
        if let Some(Value::Table(imposed)) = imposed {
            build_up.insert("imposed".into(), Value::Table(scaled(&imposed, 2.0, &["load", "partitions"])));
        }
    }
    write(&job)
}

/// Every line load cut at places along its beam, its breadth where the cut is by proportion.
pub fn cut(text: &str, places: impl Fn(&Table) -> Vec<f64>) -> String {
    with_rows(text, |beam, row| {
        if row.contains_key("at") {
            return vec![row.clone()];
        }
        let length = metres(beam, "length").expect("a length");
        let (from, to) = (metres(row, "from").unwrap_or(0.0), metres(row, "to").unwrap_or(length));
        let mut edges = vec![from];
        edges.extend(places(beam).into_iter().filter(|place| *place > from + 1e-3 && *place < to - 1e-3));
        edges.push(to);
        let piece = |ends: &[f64]| {
            let mut piece = row.clone();
            set_metres(&mut piece, "from", ends[0]);
            set_metres(&mut piece, "to", ends[1]);
            for key in ["width", "height"] {
                if let Some(Value::Array(pair)) = piece.get_mut(key) {
                    let sizes: Vec<f64> =
                        pair.iter().map(|size| quantity(size.as_str().expect("a size"))).collect();
                    let there = |x: f64| match x {
                        _ if x == from => sizes[0],
                        _ if x == to => sizes[1],
                        _ => sizes[0] + (sizes[1] - sizes[0]) * (x - from) / (to - from),
                    };
                    *pair = ends.iter().map(|x| Value::String(format!("{} m", there(*x)))).collect();
                }
            }
            piece
        };
        edges.windows(2).map(piece).collect()
    })
}

/// Places of a beam's bearings.
pub fn bearings(beam: &Table) -> Vec<f64> {
    let mut beam = beam.clone();
    let length = metres(&beam, "length").expect("a length");
    let places = tables(&mut beam, "bearings").into_iter().enumerate();
    places.map(|(index, bearing)| metres(bearing, "at").unwrap_or(if index == 0 { 0.0 } else { length })).collect()
}

/// No load but own weight, and no settlement.
pub fn bare(text: &str) -> Table {
    let mut job = read(text);
    for beam in beams(&mut job) {
        beam.remove("load");
        for bearing in tables(beam, "bearings") {
            bearing.remove("settles");
        }
    }
    job
}

/// A short beam from a wall to a place on another: its tilt tells how that place moves.
pub const PROBE: f64 = 0.8;
pub fn add_probe(job: &mut Table, mark: &str, on: &str, lands: f64) {
    let probe = format!(
        "mark = \"{mark}\"\nsection = \"203x203x60 UC\"\nlength = \"{PROBE} m\"\n\
         bearings = [ {{ on = \"north wall\" }}, {{ on = \"{on}\", lands = \"{lands} m\" }} ]\n"
    );
    if let Some(Value::Array(beams)) = job.get_mut("beam") {
        beams.push(Value::Table(read(&probe)));
    }
}

pub fn add_point_load(job: &mut Table, mark: &str, at: f64, kilonewtons: f64) {
    let row = format!("what = \"test load\"\nat = \"{at} m\"\npermanent = \"{kilonewtons} kN\"\n");
    for beam in beams(job) {
        if word(beam, "mark") == mark {
            let rows = beam.entry("load").or_insert_with(|| Value::Array(Vec::new()));
            rows.as_array_mut().expect("rows").push(Value::Table(read(&row)));
        }
    }
}
