//! Build-ups and load rows by chance.

use super::building::Traits;
use super::{chance, force, length, on_grid, pick};
use fastrand::Rng;
use std::fmt::Write;

const FLOORS: [&str; 2] = ["timber floor", "store floor"];
const WALLS: [&str; 2] = ["brick skin", "stud wall"];

/// The build-ups of a job: a roof with imposed load, snow and wind, two floors, two walls.
pub fn build_ups(rng: &mut Rng, traits: &mut Traits) -> String {
    let mut text = String::new();
    let area = |from: f64, to: f64, rng: &mut Rng| {
        let size = on_grid(rng, from, to, 0.01);
        force(rng, size, "/m2")
    };
    let _ = writeln!(text, "[[build-up]]\nname = \"roof\"\npitch = \"{} deg\"\nlayers = [", rng.u32(0..=50));
    let _ = writeln!(text, "  {{ what = \"tiles and battens\", load = \"{}\" }},", area(0.3, 0.8, rng));
    let _ = writeln!(text, "  {{ what = \"plasterboard\", thickness = \"15 mm\", density = \"9.0 kN/m3\" }},\n]");
    let _ = writeln!(text, "imposed = {{ category = \"H\", load = \"{}\" }}", area(0.2, 0.8, rng));
    let _ = writeln!(text, "snow = \"{}\"", area(0.2, 0.9, rng));
    traits.wind_on_roof = chance(rng, 40);
    if traits.wind_on_roof {
        let size = on_grid(rng, 0.1, 1.2, 0.01);
        let sign = if chance(rng, 60) { "-" } else { "" };
        let _ = writeln!(text, "wind = \"{sign}{} kN/m2\"", size);
    }
    for (name, category) in FLOORS.iter().zip([pick(rng, &["A", "B"]), pick(rng, &["C", "D", "E", "F", "G"])]) {
        let layers = area(0.4, 1.2, rng);
        let load = area(1.5, 4.0, rng);
        let partitions = if chance(rng, 50) { ", partitions = \"0.50 kN/m2\"" } else { "" };
        let _ = writeln!(text, "\n[[build-up]]\nname = \"{name}\"");
        let _ = writeln!(text, "layers = [ {{ what = \"boards and joists\", load = \"{layers}\" }} ]");
        let _ = writeln!(text, "imposed = {{ category = \"{category}\", load = \"{load}\"{partitions} }}");
    }
    let _ = writeln!(text, "\n[[build-up]]\nname = \"brick skin\"\nlayers = [");
    let _ = writeln!(text, "  {{ what = \"brickwork\", thickness = \"102.5 mm\", density = \"20 kN/m3\" }},");
    let _ = writeln!(text, "  {{ what = \"plaster\", load = \"{}\" }},\n]", area(0.1, 0.3, rng));
    let _ = writeln!(text, "\n[[build-up]]\nname = \"stud wall\"");
    let _ = writeln!(text, "layers = [ {{ what = \"studs and boards\", load = \"{}\" }} ]\n", area(0.3, 0.9, rng));
    text
}

/// Load rows of one beam.
pub fn rows(rng: &mut Rng, along: f64, traits: &mut Traits) -> String {
    let mut text = String::new();
    for number in 0..rng.u32(0..=4) {
        let _ = writeln!(text, "\n  [[beam.load]]\n  what = \"row {}\"", number + 1);
        let lines = match rng.u32(0..10) {
            0..3 => area_row(rng, along, traits),
            3..5 => wall_row(rng, along, traits),
            5..8 => line_row(rng, along, traits),
            _ => point_row(rng, along, traits),
        };
        for line in lines {
            let _ = writeln!(text, "  {line}");
        }
        if chance(rng, 25) {
            traits.staged = true;
            text.push_str("  stage = \"before\"\n");
        }
        if chance(rng, 15) {
            let place = pick(rng, &["top flange", "shear centre", "bottom flange"]);
            let _ = writeln!(text, "  load-height = \"{place}\"");
        }
    }
    text
}

/// `from` and `to`, or neither, or one of the two.
fn extent(rng: &mut Rng, along: f64) -> Vec<String> {
    if chance(rng, 50) {
        return Vec::new();
    }
    let from = on_grid(rng, 0.0, along * 0.6, 0.005);
    let reach = on_grid(rng, 0.05, (along - from).max(0.05), 0.005);
    let to = ((from + reach).min(along) * 1e9).round() / 1e9;
    let mut lines = Vec::new();
    if from > 0.0 {
        lines.push(format!("from = \"{}\"", length(rng, from)));
    }
    if to < along {
        lines.push(format!("to = \"{}\"", length(rng, to)));
    }
    lines
}

/// A breadth, or a pair of which one may be zero.
fn breadth(rng: &mut Rng, key: &str, from: f64, to: f64, traits: &mut Traits) -> String {
    let first = on_grid(rng, from, to, 0.05);
    if chance(rng, 60) {
        return format!("{key} = \"{}\"", length(rng, first));
    }
    traits.trapezoidal = true;
    let second = if chance(rng, 35) { 0.0 } else { on_grid(rng, from, to, 0.05) + 0.01 };
    let pair = if chance(rng, 50) { [first, second] } else { [second, first] };
    format!("{key} = [\"{} m\", \"{}\"]", pair[0], length(rng, pair[1]))
}

fn wind_case(rng: &mut Rng) -> Option<String> {
    match rng.u32(0..3) {
        0 => None,
        1 => Some("wind-case = \"west\"".into()),
        _ => Some("wind-case = \"north east\"".into()),
    }
}

fn area_row(rng: &mut Rng, along: f64, traits: &mut Traits) -> Vec<String> {
    let roof = chance(rng, 45);
    let name = if roof { "roof" } else { pick(rng, &FLOORS) };
    let mut lines = vec![format!("build-up = \"{name}\""), breadth(rng, "width", 0.3, 4.0, traits)];
    lines.extend(extent(rng, along));
    if roof && traits.wind_on_roof {
        lines.extend(wind_case(rng));
    }
    lines
}

fn wall_row(rng: &mut Rng, along: f64, traits: &mut Traits) -> Vec<String> {
    let mut lines = vec![format!("build-up = \"{}\"", pick(rng, &WALLS)), breadth(rng, "height", 0.3, 3.0, traits)];
    lines.extend(extent(rng, along));
    lines
}

fn line_row(rng: &mut Rng, along: f64, traits: &mut Traits) -> Vec<String> {
    let mut lines = direct(rng, "/m", 4.0, traits);
    lines.extend(extent(rng, along));
    lines
}

fn point_row(rng: &mut Rng, along: f64, traits: &mut Traits) -> Vec<String> {
    traits.point_load = true;
    let mut lines = direct(rng, "", 12.0, traits);
    let at = if chance(rng, 90) { on_grid(rng, 0.0, along, 0.05).min(along) } else { along };
    lines.push(format!("at = \"{}\"", length(rng, at)));
    lines
}

/// Direct actions, at least one of them.
fn direct(rng: &mut Rng, per: &str, most: f64, traits: &mut Traits) -> Vec<String> {
    let mut lines = Vec::new();
    let size = |rng: &mut Rng| {
        let size = on_grid(rng, 0.1, most, 0.05);
        force(rng, size, per)
    };
    if chance(rng, 70) {
        lines.push(format!("permanent = \"{}\"", size(rng)));
    }
    if chance(rng, 55) {
        lines.push(format!("imposed = \"{}\"", size(rng)));
        lines.push(format!("category = \"{}\"", pick(rng, &["A", "A", "B", "C", "D", "E", "F", "G", "H"])));
    }
    if chance(rng, 20) {
        lines.push(format!("snow = \"{}\"", size(rng)));
    }
    if chance(rng, 35) || lines.is_empty() {
        let up = chance(rng, 65);
        traits.wind_uplift |= up;
        let (sign, case) = (if up { "-" } else { "" }, wind_case(rng));
        lines.push(format!("wind = \"{sign}{}\"", size(rng)));
        lines.extend(case);
    }
    lines
}
