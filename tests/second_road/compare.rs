//! A results file of the program against this road, figure by figure.

use super::actions::Rule;
use super::building::Building;
use super::limits::allowed;
use super::results::{inherited_and_settled, results};
use super::search::Sample;
use serde_json::Value;

/// Tolerance, as a part of the scale of an effect: the sum of the sizes of all that adds to it. The file's twelve
/// figures, the two solvers' rounding and the search for peaks each stay below it; a factor, a rule or a place read
/// differently moves a figure by a hundred thousand times as much.
pub const TOLERANCE: f64 = 1e-9;

/// Every figure that the two roads do not agree on, in words.
pub fn differences(building: &Building, program: &Value) -> Vec<String> {
    let mut report = Report { lines: Vec::new(), beam: String::new() };
    let own = results(building);
    let beams = program["beams"].as_array().cloned().unwrap_or_default();
    if beams.len() != building.job.beams.len() {
        report.lines.push(format!("{} beams, {} expected", beams.len(), building.job.beams.len()));
    }
    for (beam, expected) in own["beams"].as_array().into_iter().flatten().enumerate() {
        report.beam = building.job.beams[beam].mark.clone();
        match beams.iter().find(|found| found["mark"] == expected["mark"]) {
            Some(found) => compare_beam(&mut report, building, beam, found, expected),
            None => report.lines.push(format!("{} is missing", report.beam)),
        }
    }
    report.beam = "building".into();
    let total: f64 = building.contributions.iter().map(|contribution| contribution.load.total().abs()).sum();
    for wall in own["walls"].as_array().into_iter().flatten() {
        let found = program["walls"].as_array().and_then(|walls| walls.iter().find(|w| w["name"] == wall["name"]));
        report.figures(&found.unwrap_or(&Value::Null)["total_kN"], &wall["total_kN"], total / 1e3);
    }
    for side in ["applied_kN", "to_supports_kN"] {
        report.figures(&program["takedown"][side], &own["takedown"][side], total / 1e3);
    }
    report.lines
}

struct Report {
    lines: Vec<String>,
    beam: String,
}

impl Report {
    fn same(&mut self, what: &str, found: &Value, expected: f64, scale: f64) {
        match found.as_f64() {
            Some(found) if (found - expected).abs() <= TOLERANCE * scale => {}
            _ => self
                .lines
                .push(format!("{}: {what}: {found}, second road {expected} (scale {scale:.4})", self.beam)),
        }
    }

    /// Every figure of an object of this road must be in the program's.
    fn figures(&mut self, found: &Value, expected: &Value, scale: f64) {
        for (key, expected) in expected.as_object().into_iter().flatten() {
            if let Some(expected) = expected.as_f64() {
                self.same(key, &found[key], expected, scale);
            }
        }
    }
}

/// The scales of a beam's effects: the greatest sum of sizes over its length.
struct Scales {
    moment: f64,
    shear: f64,
    movement: f64,
}

fn scales(building: &Building, beam: usize) -> Scales {
    let sum = |values: &[f64]| values.iter().map(|value| value.abs()).sum::<f64>();
    let greatest = |effect: &dyn Fn(&Sample) -> f64| building.greatest_on_grid(beam, effect);
    Scales {
        moment: greatest(&|sample| sum(&sample.moment)),
        shear: greatest(&|sample| sum(&sample.shear)),
        movement: greatest(&|sample| sum(&sample.movement) + sum(&sample.chord) + sample.settled.abs()),
    }
}

fn compare_beam(report: &mut Report, building: &Building, beam: usize, found: &Value, expected: &Value) {
    let scales = scales(building, beam);
    let number = |value: &Value| value.as_f64().unwrap_or(f64::NAN);
    for key in ["length_m", "cut_length_m", "mass_kg"] {
        report.same(key, &found[key], number(&expected[key]), number(&expected[key]));
    }
    let provided = number(&expected["second_moment_cm4"]["provided"]);
    report.same("second moment", &found["second_moment_cm4"]["provided"], provided, provided);
    for (index, bearing) in expected["bearings"].as_array().into_iter().flatten().enumerate() {
        let scale: f64 = building.reactions(beam, index).iter().map(|reaction| reaction.abs()).sum();
        let at = &found["bearings"][index];
        if at["on"] != bearing["on"] {
            report.lines.push(format!("{}: bearing {index} on {}, not {}", report.beam, at["on"], bearing["on"]));
        }
        let before = report.lines.len();
        report.figures(at, &serde_json::json!({"at_m": bearing["at_m"], "lands_m": bearing["lands_m"]}), 1.0);
        report.figures(&at["reaction_kN"], &bearing["reaction_kN"], scale / 1e3);
        for line in &mut report.lines[before..] {
            line.push_str(&format!(", bearing {index}"));
        }
    }
    // Greatest values, and that the place named has them. Two places may tie, so places are not compared as such.
    let moment = &expected["moment_kNm"];
    report.figures(
        &found["moment_kNm"],
        &serde_json::json!({"max": moment["max"], "min": moment["min"]}),
        scales.moment / 1e3,
    );
    let there = |key: &str| number(&found[key]["at_m"]);
    let at_place = building.at_place(beam, there("moment_kNm"), |sample| building.strength_moment(sample)[0]);
    report.same("moment at its place", &found["moment_kNm"]["max"], at_place / 1e3, scales.moment / 1e3);
    report.same(
        "shear",
        &size(&found["shear_kN"]["max"]),
        number(&expected["shear_kN"]["max"]),
        scales.shear / 1e3,
    );
    let at_place = building.at_place(beam, there("shear_kN"), |sample| building.strength_shear(sample));
    report.same("shear at its place", &size(&found["shear_kN"]["max"]), at_place / 1e3, scales.shear / 1e3);
    compare_movements(report, building, beam, found, expected, scales.movement);
    for check in found["checks"].as_array().into_iter().flatten() {
        compare_check(report, building, beam, check, &scales);
    }
}

fn compare_movements(
    report: &mut Report,
    building: &Building,
    beam: usize,
    found: &Value,
    expected: &Value,
    scale: f64,
) {
    let scale_mm = scale * 1e3;
    for key in ["own_total", "own_after", "own_variable", "stacked_total"] {
        let (there, here) =
            (&found["deflection_mm"][key], expected["deflection_mm"][key].as_f64().unwrap_or(f64::NAN));
        // Up and down of the same size, as in a job without loads: either sign is right.
        let tie = there.as_f64().is_some_and(|there| (there + here).abs() <= TOLERANCE * scale_mm);
        if !tie {
            report.same(key, there, here, scale_mm);
        }
    }
    let hand_rule = expected["deflection_mm"]["hand_rule"].as_f64().unwrap_or(f64::NAN);
    report.same("hand_rule", &found["deflection_mm"]["hand_rule"], hand_rule, hand_rule);
    let distance = building.job.beams[beam].bearings.windows(2).map(|pair| pair[1].at - pair[0].at);
    let least_distance = distance.fold(f64::INFINITY, f64::min);
    report.same("tilt", &size(&found["tilt"]), building.worst_tilt(beam), scale / least_distance);
    let figure = |key: &str| found["deflection_mm"][key].as_f64().unwrap_or(f64::NAN);
    let stacked = (figure("stacked_total") / 1e3, figure("stacked_at_m"));
    let at_place = building.at_place(beam, stacked.1, |sample| {
        let [most, least] = building.stacked(sample);
        if stacked.0 >= 0.0 { most } else { -least }
    });
    report.same("stacked at its place", &size(&found["deflection_mm"]["stacked_total"]), at_place * 1e3, scale_mm);
    // Combinations that tie for the stacked movement may part it differently: one of them must be the program's.
    let close = |there: f64, here: f64| (there - here * 1e3).abs() <= 1e2 * TOLERANCE * scale_mm;
    let parts = inherited_and_settled(building, beam, stacked);
    let agrees = |&(inherited, settled): &(f64, f64)| {
        close(figure("inherited_there"), inherited) && close(figure("settled_there"), settled)
    };
    if !parts.iter().any(agrees) {
        let there = (figure("inherited_there"), figure("settled_there"));
        report.lines.push(format!("{}: inherited and settled {there:?} mm, second road {parts:?} m", report.beam));
    }
}

fn size(value: &Value) -> Value {
    value.as_f64().map_or(Value::Null, |number| serde_json::json!(number.abs()))
}

/// A check's demand and, for movements, its capacity, over the place that it names.
fn compare_check(report: &mut Report, building: &Building, beam: usize, check: &Value, scales: &Scales) {
    let name = check["check"].as_str().unwrap_or("");
    let place = &check["place"];
    let end = |key: &str, default: f64| place[key].as_f64().unwrap_or(default);
    let range = [end("from_m", 0.0), end("to_m", building.length(beam))];
    let before = report.lines.len();
    let demand = size(&check["demand"]);
    match name {
        "bending" => {
            let most = building.peak(beam, range[0], range[1], |sample| {
                let [most, least] = building.strength_moment(sample);
                most.max(-least)
            });
            report.same("demand", &demand, most.0 / 1e3, scales.moment / 1e3);
        }
        "shear" => {
            let most = building.peak(beam, range[0], range[1], |sample| building.strength_shear(sample));
            report.same("demand", &demand, most.0 / 1e3, scales.shear / 1e3);
        }
        "total deflection" | "after deflection" | "variable deflection" | "stacked deflection" => {
            let kind = name.split(' ').next().unwrap_or("");
            match governing(building, beam, kind, range) {
                Some(Governing { movement, limit, .. }) => {
                    report.same("demand", &demand, movement * 1e3, scales.movement * 1e3);
                    report.same("capacity", &check["capacity"], limit * 1e3, limit * 1e3);
                }
                None => report.lines.push(format!("{}: no limit is in force", report.beam)),
            }
        }
        "tilt" => {
            let bearings = &building.job.beams[beam].bearings;
            let spans = (0..bearings.len() - 1)
                .filter(|span| bearings[*span].at >= range[0] - 1e-9 && bearings[span + 1].at <= range[1] + 1e-9);
            let least = bearings.windows(2).map(|pair| pair[1].at - pair[0].at).fold(f64::INFINITY, f64::min);
            let worst = spans.map(|span| building.tilt(beam, span)).fold(0.0, f64::max);
            report.same("demand", &demand, worst, scales.movement / least);
            report.same("capacity", &check["capacity"], allowed(&building.job.beams[beam].limits[4], 1.0), 1.0);
        }
        "uplift" => {
            let bearings = &building.job.beams[beam].bearings;
            let at = place["at_m"].as_f64().or(check["at_m"].as_f64()).unwrap_or(f64::NAN);
            match bearings.iter().position(|bearing| (bearing.at - at).abs() < 1e-9) {
                Some(index) => {
                    let scale: f64 = building.reactions(beam, index).iter().map(|reaction| reaction.abs()).sum();
                    report.same("demand", &demand, building.uplift(beam, index) / 1e3, scale / 1e3);
                    report.same("capacity", &check["capacity"], bearings[index].held_down / 1e3, 1.0);
                }
                None => report.lines.push(format!("{}: no bearing at {at}", report.beam)),
            }
        }
        _ => {}
    }
    if let (Some(demand), Some(capacity), Some(share)) =
        (check["demand"].as_f64(), check["capacity"].as_f64(), check["utilisation"].as_f64())
        && capacity != 0.0
        && !matches!(name, "bending with shear" | "web under concentrated force" | "web with bending")
    {
        report.same("utilisation", &serde_json::json!(share), (demand / capacity).abs(), share.abs());
    }
    for line in &mut report.lines[before..] {
        line.push_str(&format!(", check {name} of {range:?}"));
    }
}

/// The movement that is closest to its limit.
#[derive(Clone, Copy, Debug)]
pub struct Governing {
    /// Its size, m; never negative.
    pub movement: f64,
    pub limit: f64,
    pub at: f64,
    /// 1 downward, -1 upward.
    pub sign: f64,
}

/// The movement that a kind of limit looks at within a range, where its share of the limit is greatest; nothing where
/// there is no limit.
pub fn governing(building: &Building, beam: usize, kind: &str, range: [f64; 2]) -> Option<Governing> {
    let mut worst: Option<Governing> = None;
    for (from, to, limit, downward_only) in building.limited(beam, kind) {
        if from < range[0] - 1e-9 || to > range[1] + 1e-9 {
            continue;
        }
        let both = |sample: &Sample| match kind {
            "total" => building.own(Rule::Characteristic, sample),
            "after" => building.own(Rule::After, sample),
            "variable" => building.own(Rule::Variable, sample),
            _ => building.stacked(sample),
        };
        let down = building.peak(beam, from, to, |sample| both(sample)[0]);
        let up = match downward_only {
            true => (0.0, from),
            false => building.peak(beam, from, to, |sample| -both(sample)[1]),
        };
        let (sign, size, at) = if down.0 >= up.0 { (1.0, down.0, down.1) } else { (-1.0, up.0, up.1) };
        let movement = size.max(0.0);
        if worst.is_none_or(|worst| movement / limit > worst.movement / worst.limit) {
            worst = Some(Governing { movement, limit, at, sign });
        }
    }
    worst
}

impl Building {
    /// The stretches of a beam that a kind of limit covers: from, to, the movement allowed, whether only downward
    /// movement counts. Spans between bearings, and overhangs longer than the section is deep with twice their length.
    pub fn limited(&self, beam: usize, kind: &str) -> Vec<(f64, f64, f64, bool)> {
        let typed = &self.job.beams[beam];
        let kinds = super::limits::KINDS;
        let list = &typed.limits[kinds.iter().position(|known| *known == kind).expect("a kind of limit")];
        if list.is_empty() {
            return Vec::new();
        }
        let places: Vec<f64> = typed.bearings.iter().map(|bearing| bearing.at).collect();
        let mut stretches: Vec<(f64, f64, f64, bool)> =
            places.windows(2).map(|ends| (ends[0], ends[1], allowed(list, ends[1] - ends[0]), false)).collect();
        let last = places.len() - 1;
        for (from, to, span) in
            [(0.0, places[0], places[1] - places[0]), (places[last], typed.length, places[last] - places[last - 1])]
        {
            if to - from >= typed.shape.depth {
                let own = allowed(list, 2.0 * (to - from));
                let limit = if kind == "stacked" { own.max(allowed(list, span)) } else { own };
                stretches.push((from, to, limit, true));
            }
        }
        stretches
    }
}
