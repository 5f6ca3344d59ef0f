//! One building by chance: one to twelve beams, from the lowest up, each on walls or on beams below it.

use super::rows::{build_ups, rows};
use super::{chance, length, on_grid, pick};
use fastrand::Rng;
use std::fmt::Write;

const MOST_BEAMS: usize = 12;
const WALLS: [&str; 5] = ["north wall", "south wall", "east gable", "pier 4", "party wall"];
/// Sections by how far they span, m.
const SECTIONS: &[(f64, &[&str])] = &[
    (2.5, &["127x76x13 UB", "152x89x16 UB", "178x102x19 UB", "203x102x23 UB", "152x152x23 UC", "152x152x30 UC"]),
    (4.5, &["203x133x25 UB", "203x133x30 UB", "254x102x28 UB", "254x146x37 UB", "203x203x46 UC", "254x146x31 UB"]),
    (6.5, &["254x146x43 UB", "305x165x40 UB", "305x165x54 UB", "356x171x45 UB", "203x203x60 UC", "254x254x73 UC"]),
    (
        99.0,
        &["356x171x57 UB", "406x178x60 UB", "457x191x67 UB", "457x191x82 UB", "533x210x92 UB", "610x229x101 UB"],
    ),
];

/// A generated job and what it has.
pub struct Generated {
    pub text: String,
    pub traits: Traits,
}

#[derive(Clone, Copy, Debug, Default)]
pub struct Traits {
    pub beams: usize,
    /// A beam on more than two bearings.
    pub continuous: bool,
    pub overhang: bool,
    /// A beam on a beam on a beam.
    pub three_deep: bool,
    /// A beam that carries two others or more.
    pub shared_carrier: bool,
    pub trapezoidal: bool,
    pub point_load: bool,
    pub wind_uplift: bool,
    pub settles: bool,
    pub staged: bool,
    pub shear_flexible: bool,
    pub two_expressions: bool,
    pub recommended: bool,
    /// The roof's build-up has wind.
    pub wind_on_roof: bool,
}

struct Seat {
    /// The carrier's index and the place on it; a wall otherwise.
    on: Result<(usize, f64), &'static str>,
    at: f64,
}

struct Frame {
    length: f64,
    section: &'static str,
    seats: Vec<Seat>,
    /// How many beams stand below each other here, itself included.
    level: usize,
    /// Places that a landing keeps away from.
    taken: Vec<f64>,
    carries: usize,
}

/// The building of a seed. The same seed gives the same text.
pub fn building(seed: u64) -> Generated {
    let rng = &mut Rng::with_seed(seed);
    let mut traits =
        Traits { beams: if chance(rng, 10) { 1 } else { rng.usize(2..=MOST_BEAMS) }, ..Traits::default() };
    let mut frames: Vec<Frame> = Vec::new();
    for _ in 0..traits.beams {
        let frame = frame(rng, &mut frames);
        frames.push(frame);
    }
    let text = write_job(rng, &frames, &mut traits);
    for frame in &frames {
        traits.continuous |= frame.seats.len() > 2;
        let last = frame.seats[frame.seats.len() - 1].at;
        traits.overhang |= frame.seats[0].at > 0.0 || last < frame.length;
        traits.three_deep |= frame.level >= 3;
        traits.shared_carrier |= frame.carries >= 2;
    }
    Generated { text, traits }
}

fn frame(rng: &mut Rng, below: &mut [Frame]) -> Frame {
    let bearings = match rng.u32(0..100) {
        0..70 => 2,
        70..88 => 3,
        _ => 4,
    };
    let spans: Vec<f64> =
        (1..bearings).map(|_| on_grid(rng, 1.2, if bearings > 2 { 4.5 } else { 8.0 }, 0.005)).collect();
    let before = if chance(rng, 14) { on_grid(rng, 0.05, 1.6, 0.01) } else { 0.0 };
    let after = if chance(rng, 14) { on_grid(rng, 0.05, 1.6, 0.01) } else { 0.0 };
    let round = |value: f64| (value * 1e9).round() / 1e9;
    let mut places = vec![before];
    for span in &spans {
        places.push(round(places[places.len() - 1] + span));
    }
    let total = round(places[places.len() - 1] + after);
    let longest = spans.iter().copied().fold(0.0, f64::max);
    let sections = SECTIONS.iter().find(|(reach, _)| longest <= *reach).map_or(SECTIONS[0].1, |(_, names)| names);
    let mut used = Vec::new();
    let mut level = 1;
    let seats = places.iter().map(|&at| {
        let carrier = if chance(rng, 52) { carrier(rng, below, &used) } else { None };
        let on = match carrier {
            Some((index, lands)) => {
                used.push(index);
                below[index].carries += 1;
                below[index].taken.push(lands);
                level = level.max(below[index].level + 1);
                Ok((index, lands))
            }
            None => Err(pick(rng, &WALLS)),
        };
        Seat { on, at }
    });
    let seats: Vec<Seat> = seats.collect();
    let taken = places.iter().copied().chain([0.0, total]).collect();
    Frame { length: total, section: pick(rng, sections), seats, level, taken, carries: 0 }
}

/// A beam below to land on, and where: mostly away from what is there already, sometimes on its tip, on its bearing or
/// where another lands.
fn carrier(rng: &mut Rng, below: &[Frame], used: &[usize]) -> Option<(usize, f64)> {
    let free: Vec<usize> =
        (0..below.len()).filter(|index| !used.contains(index) && below[*index].level < 5).collect();
    if free.is_empty() {
        return None;
    }
    let index = pick(rng, &free);
    let frame = &below[index];
    if chance(rng, 5) {
        return Some((index, pick(rng, &frame.taken)));
    }
    for _ in 0..20 {
        let place = match chance(rng, 80) {
            true => on_grid(rng, 0.05, frame.length - 0.05, 0.001),
            false => (rng.f64() * frame.length * 1e7).floor() / 1e7,
        };
        if place > 0.05 && frame.taken.iter().all(|taken| (taken - place).abs() > 0.06) {
            return Some((index, place));
        }
    }
    None
}

fn write_job(rng: &mut Rng, frames: &[Frame], traits: &mut Traits) -> String {
    let mut text = String::from("[job]\nnumber = \"G-1\"\ntitle = \"Generated building\"\ndate = 2027-02-03\n\n");
    write_basis(rng, &mut text, traits);
    if chance(rng, 60) {
        let _ = writeln!(text, "[limits]\n{}", limits(rng));
    }
    text.push_str(&build_ups(rng, traits));
    for wall in WALLS {
        let _ = writeln!(text, "[[wall]]\nname = \"{wall}\"\n");
    }
    let mut order: Vec<usize> = (0..frames.len()).collect();
    rng.shuffle(&mut order);
    for index in order {
        write_beam(rng, &mut text, index, &frames[index], traits);
    }
    text
}

fn write_basis(rng: &mut Rng, text: &mut String, traits: &mut Traits) {
    text.push_str("[basis]\n");
    traits.recommended = chance(rng, 35);
    if traits.recommended {
        text.push_str("national-choices = \"recommended\"\n");
    }
    traits.two_expressions = chance(rng, 40);
    if traits.two_expressions {
        text.push_str("combination = \"6.10a/b\"\n");
    }
    traits.shear_flexible = chance(rng, 25);
    if traits.shear_flexible {
        text.push_str("shear-flexibility = true\n");
    }
    let _ = writeln!(text, "grade = \"{}\"\n", pick(rng, &["S235", "S275", "S355", "S460"]));
}

fn limits(rng: &mut Rng) -> String {
    let mut lines = String::new();
    if chance(rng, 50) {
        let set = pick(rng, &["brittle finish", "masonry", "glazed doors", "timber floor", "no finish"]);
        let _ = writeln!(lines, "for = \"{set}\"");
    }
    let part = |rng: &mut Rng| format!("span/{}", pick(rng, &[200, 250, 360, 400, 500]));
    for kind in ["total", "after", "variable", "stacked"] {
        if chance(rng, 30) {
            let part = part(rng);
            let limit = match rng.u32(0..3) {
                0 => format!("\"{part}\""),
                1 => format!("[\"{part}\", \"{} mm\"]", on_grid(rng, 4.0, 20.0, 0.5)),
                _ => format!("\"{} mm\"", on_grid(rng, 4.0, 20.0, 0.5)),
            };
            let _ = writeln!(lines, "{kind} = {limit}");
        }
    }
    if chance(rng, 30) {
        let _ = writeln!(lines, "tilt = \"1/{}\"", pick(rng, &[300, 400, 500]));
    }
    if lines.is_empty() { "for = \"no finish\"\n".into() } else { lines }
}

fn write_beam(rng: &mut Rng, text: &mut String, index: usize, frame: &Frame, traits: &mut Traits) {
    let _ = writeln!(text, "[[beam]]\nmark = \"{}\"", mark(index));
    let name = match rng.u32(0..4) {
        0 => frame.section.replace('x', "×"),
        1 => frame.section.replace(' ', ""),
        _ => frame.section.to_string(),
    };
    let _ = writeln!(text, "section = \"{name}\"\nlength = \"{}\"", length(rng, frame.length));
    text.push_str("bearings = [\n");
    let last = frame.seats.len() - 1;
    for (number, seat) in frame.seats.iter().enumerate() {
        let default = (number == 0 && seat.at == 0.0) || (number == last && seat.at == frame.length);
        let mut keys: Vec<String> = Vec::new();
        if !default || chance(rng, 20) {
            keys.push(format!("at = \"{}\"", length(rng, seat.at)));
        }
        match seat.on {
            Ok((carrier, lands)) => {
                keys.push(format!("on = \"{}\"", mark(carrier)));
                keys.push(format!("lands = \"{}\"", length(rng, lands)));
                if chance(rng, 30) {
                    keys.push(format!("joint = \"{}\"", pick(rng, &["on top flange", "to the web"])));
                }
            }
            Err(wall) => {
                keys.push(format!("on = \"{wall}\""));
                if chance(rng, 50) {
                    keys.push(format!("bearing-length = \"{} mm\"", on_grid(rng, 75.0, 250.0, 5.0)));
                }
                if chance(rng, 8) {
                    traits.settles = true;
                    keys.push(format!("settles = \"{} mm\"", on_grid(rng, 0.5, 6.0, 0.1)));
                }
            }
        }
        if chance(rng, 15) {
            keys.push(format!("held-down = \"{} kN\"", on_grid(rng, 0.5, 12.0, 0.5)));
        }
        let _ = writeln!(text, "  {{ {} }},", keys.join(", "));
    }
    text.push_str("]\n");
    match rng.u32(0..10) {
        0..5 => text.push_str("restraint = { top = \"continuous\", by = \"joists nailed to a plate\" }\n"),
        5 => text.push_str("restraint = { top = \"continuous\", bottom = \"continuous\", by = \"ties\" }\n"),
        6 => {
            let middle = on_grid(rng, frame.length * 0.3, frame.length * 0.7, 0.01);
            let middle = length(rng, middle);
            let _ = writeln!(text, "restraint = {{ top = [\"{middle}\"], by = \"a cross beam\" }}");
        }
        7 => text.push_str("restraint = \"ends\"\n"),
        _ => {}
    }
    if chance(rng, 30) {
        let _ = writeln!(text, "  [beam.limits]\n  {}", limits(rng).trim_end().replace('\n', "\n  "));
    }
    text.push_str(&rows(rng, frame.length, traits));
    text.push('\n');
}

fn mark(index: usize) -> String {
    format!("B{}", index + 1)
}
