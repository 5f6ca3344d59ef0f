//! What must hold of any building, whatever its figures: equilibrium, reciprocity, superposition, proportion, mirror
//! image, split rows. Buildings by chance from fixed seeds; figures from the program alone.

mod generate;
mod rewrite;
#[path = "second_road/mod.rs"]
mod second_road;

use fastrand::Rng;
use generate::building::building;
use generate::chains::chains;
use rewrite::{add_point_load, add_probe, bare, beams, metres, read, word, write};
use second_road::job::{Job, Load, Support};
use serde_json::Value;

/// Both sides of an identity come from one solver: they differ by rounding alone, some 1e-10 of the figures.
const TOLERANCE: f64 = 1e-8;

fn results(text: &str, seed: u64) -> Value {
    let results = sagledger::results_json(text).unwrap_or_else(|fault| panic!("seed {seed}: {fault}\n{text}"));
    serde_json::from_str(&results).expect("a results file is JSON")
}

fn beam<'a>(results: &'a Value, mark: &str) -> &'a Value {
    let beams = results["beams"].as_array().expect("beams");
    beams.iter().find(|beam| beam["mark"] == mark).expect("the beam")
}

fn number(value: &Value) -> f64 {
    value.as_f64().unwrap_or(f64::NAN)
}

/// Each beam under each action: what comes down on it goes up at its bearings, in sum and about its start.
#[test]
fn every_beam_is_in_equilibrium_under_every_action() {
    for seed in 1000..1060 {
        let text = building(seed).text;
        let (job, results) = (Job::read(&text), results(&text, seed));
        let reaction = |beam: usize, bearing: usize, action: &str| {
            let figure = &results["beams"][beam]["bearings"][bearing]["reaction_kN"][action];
            figure.as_f64().unwrap_or(0.0)
        };
        for (index, beam) in job.beams.iter().enumerate() {
            let actions: Vec<String> =
                results["takedown"]["applied_kN"].as_object().expect("actions").keys().cloned().collect();
            for action in &actions {
                let loads = job.beams.iter().flat_map(|beam| &beam.rows).flat_map(|row| &row.loads);
                let of_action = loads.filter(|(kind, _)| kind.name() == *action);
                let all: f64 = of_action.map(|(_, load)| load.total().abs() / 1e3).sum();
                // Force, and moment about the start.
                let mut sums = [0.0; 2];
                let mut add = |force: f64, at: f64| {
                    sums[0] += force;
                    sums[1] += force * at;
                };
                for (kind, load) in beam.rows.iter().flat_map(|row| &row.loads) {
                    if kind.name() == *action {
                        add(load.total() / 1e3, centre(load));
                    }
                }
                for (other, carried) in job.beams.iter().enumerate() {
                    for (bearing, at) in carried.bearings.iter().enumerate() {
                        if let Support::Beam(on, lands) = at.on
                            && on == index
                        {
                            add(reaction(other, bearing, action), lands);
                        }
                    }
                }
                for (bearing, at) in beam.bearings.iter().enumerate() {
                    add(-reaction(index, bearing, action), at.at);
                }
                let slack = 1e-9 * all;
                assert!(
                    sums[0].abs() <= slack && sums[1].abs() <= slack * beam.length,
                    "seed {seed}, {}, {action}: {sums:?}",
                    beam.mark
                );
            }
        }
    }
}

/// Action by action, what is applied to a building arrives at the supports, to 1e-9 of the sum of its sizes; and what
/// is applied is what the job says, what arrives the reactions of all bearings on walls. Chains too, which stay
/// determinate whatever happens to a landing.
#[test]
fn what_is_applied_arrives_at_the_supports() {
    let jobs = (900..960).map(|seed| (seed, building(seed).text)).chain([(9, chains(20, 9))]);
    let mut wrong = Vec::new();
    for (seed, text) in jobs {
        let job = Job::read(&text);
        let results: Value = match sagledger::results_json(&text) {
            Ok(results) => serde_json::from_str(&results).expect("a results file is JSON"),
            Err(fault) => {
                wrong.push(format!("seed {seed}: {fault}"));
                continue;
            }
        };
        let takedown = &results["takedown"];
        for (action, applied) in takedown["applied_kN"].as_object().expect("actions") {
            let loads = job.beams.iter().flat_map(|beam| &beam.rows).flat_map(|row| &row.loads);
            let of_action = loads.filter(|(kind, _)| kind.name() == *action);
            let totals: Vec<f64> = of_action.map(|(_, load)| load.total() / 1e3).collect();
            let (typed, sizes) = totals.iter().fold((0.0, 0.0), |(sum, sizes), t| (sum + t, sizes + t.abs()));
            let (applied, arrived) = (number(applied), number(&takedown["to_supports_kN"][action]));
            let seats = job.beams.iter().enumerate().flat_map(|(beam, of)| {
                let on_walls =
                    of.bearings.iter().enumerate().filter(|(_, seat)| matches!(seat.on, Support::Wall(_)));
                on_walls.map(move |(bearing, _)| (beam, bearing))
            });
            let reaction = |(beam, bearing): (usize, usize)| {
                number(&results["beams"][beam]["bearings"][bearing]["reaction_kN"][action])
            };
            let seated: f64 = seats.map(reaction).sum();
            let same = |one: f64, other: f64| (one - other).abs() <= 1e-9 * sizes;
            if !same(applied, arrived) || !same(applied, typed) || !same(applied, seated) {
                wrong.push(format!(
                    "seed {seed}, {action}: {typed} typed, {applied} applied, {arrived} arrived, kN"
                ));
            }
        }
    }
    assert!(wrong.is_empty(), "{} are out of balance:\n{}", wrong.len(), wrong.join("\n"));
}

fn centre(load: &Load) -> f64 {
    match *load {
        Load::Point { at, .. } => at,
        Load::Line { from, to, start, end } if start + end != 0.0 => {
            from + (to - from) * (start + 2.0 * end) / (3.0 * (start + end))
        }
        Load::Line { from, .. } => from,
    }
}

/// Two places of a building, each with a probe; the building bare, with a load at one, the other, both, and with one
/// wall bearing settled.
#[test]
fn loads_movements_and_reactions_are_reciprocal_and_add() {
    let force = 30.0;
    let mut pairs = 0;
    for seed in 2000..2060 {
        let rng = &mut Rng::with_seed(seed);
        let mut job = bare(&building(seed).text);
        let marks: Vec<(String, f64)> = beams(&mut job)
            .iter()
            .map(|beam| (word(beam, "mark"), metres(beam, "length").expect("a length")))
            .collect();
        let mut place = || {
            let (mark, length) = marks[rng.usize(0..marks.len())].clone();
            (mark, (length * (0.1 + 0.8 * rng.f64()) * 1e3).round() / 1e3)
        };
        let places = [place(), place()];
        for (probe, (mark, at)) in ["probe 1", "probe 2"].iter().zip(&places) {
            add_probe(&mut job, probe, mark, *at);
        }
        let under = |loads: [bool; 2]| {
            let mut job = job.clone();
            for ((mark, at), loaded) in places.iter().zip(loads) {
                if loaded {
                    add_point_load(&mut job, mark, *at, force);
                }
            }
            results(&write(&job), seed)
        };
        let [none, first, second, both] = [[false, false], [true, false], [false, true], [true, true]].map(under);
        let moved = |results: &Value, probe: usize| movement(results, probe) - movement(&none, probe);
        let (across, back) = (moved(&first, 1), moved(&second, 0));
        let scale = moved(&first, 0).abs() + moved(&second, 1).abs();
        assert!((across - back).abs() <= TOLERANCE * scale, "seed {seed}: {across} and {back} m of {scale} m");
        if across.abs() > 1e-6 * scale {
            pairs += 1;
        }
        for probe in [0, 1] {
            let sum = moved(&first, probe) + moved(&second, probe);
            assert!((moved(&both, probe) - sum).abs() <= TOLERANCE * scale, "seed {seed}: movements do not add");
        }
        for (index, beam) in none["beams"].as_array().expect("beams").iter().enumerate() {
            for bearing in 0..beam["bearings"].as_array().map_or(0, Vec::len) {
                let reaction = |results: &Value| permanent(results, index, bearing);
                let sum = reaction(&first) + reaction(&second) - reaction(&none);
                assert!((reaction(&both) - sum).abs() <= TOLERANCE * force, "seed {seed}: reactions do not add");
            }
        }
        // Betti: a settlement moves the place as the load there presses on the bearing.
        let settles = 0.008;
        let Some((beam_index, bearing_index)) = settle_one(&mut job, settles) else { continue };
        let settled = results(&write(&job), seed);
        let press = permanent(&first, beam_index, bearing_index) - permanent(&none, beam_index, bearing_index);
        let (here, there) = (moved(&settled, 0), settles * press / force);
        assert!((here - there).abs() <= TOLERANCE * settles, "seed {seed}: {here} and {there} m by settlement");
    }
    assert!(pairs >= 15, "only {pairs} pairs of places know of each other");
}

fn permanent(results: &Value, beam: usize, bearing: usize) -> f64 {
    number(&results["beams"][beam]["bearings"][bearing]["reaction_kN"]["permanent"])
}

/// Movement of the place where a probe lands, m, with its sign.
fn movement(results: &Value, probe: usize) -> f64 {
    let probe = beam(results, ["probe 1", "probe 2"][probe]);
    let size = number(&probe["tilt"]).abs() * rewrite::PROBE;
    // The probe is short and stiff: it moves most where it lands, unless that moves less than the probe bends, 1e-8 m.
    size * number(&probe["deflection_mm"]["stacked_total"]).signum()
}

/// Settles the first wall bearing of the job; which one.
fn settle_one(job: &mut toml::Table, settles: f64) -> Option<(usize, usize)> {
    for (index, beam) in beams(job).into_iter().enumerate() {
        for (number, bearing) in rewrite::tables(beam, "bearings").into_iter().enumerate() {
            if !bearing.contains_key("lands") {
                bearing.insert("settles".into(), toml::Value::String(format!("{} mm", settles * 1e3)));
                return Some((index, number));
            }
        }
    }
    None
}

/// Beams turned end for end, some or all: the same figures, bearings in the other order.
#[test]
fn turning_beams_end_for_end_changes_nothing() {
    for seed in 3000..3040 {
        let text = building(seed).text;
        let bits = Rng::with_seed(seed).u64(..) | 1;
        let turn = |mark: &str| {
            let number: u32 = mark[1..].parse().expect("a number");
            seed % 2 == 0 || (bits >> number) & 1 == 1
        };
        let (plain, turned) = (results(&text, seed), results(&rewrite::turned(&text, turn), seed));
        assert_same(&plain, &turned, seed, turn);
    }
}

/// Two rows of 3/8 and 5/8 in place of each: the same figures, since both parts act in the same places.
#[test]
fn splitting_every_row_in_size_changes_nothing() {
    for seed in 4000..4040 {
        let text = building(seed).text;
        assert_same(&results(&text, seed), &results(&rewrite::split_in_size(&text), seed), seed, |_| false);
    }
}

/// Rows that cross a bearing are split there in any case; typed so, nothing changes.
#[test]
fn splitting_rows_at_bearings_changes_nothing() {
    for seed in 5000..5040 {
        let text = building(seed).text;
        let cut = rewrite::cut(&text, rewrite::bearings);
        assert_same(&results(&text, seed), &results(&cut, seed), seed, |_| false);
    }
}

/// Cut anywhere, each action as a whole is what it was. (Free arrangement may use the new freedom; reactions of an
/// action are those of all its loads.)
#[test]
fn splitting_rows_anywhere_leaves_each_action_as_it_was() {
    for seed in 6000..6040 {
        let text = building(seed).text;
        let cut = rewrite::cut(&text, |beam| {
            let length = metres(beam, "length").expect("a length");
            vec![0.31 * length, 0.64 * length]
        });
        let (plain, cut) = (results(&text, seed), results(&cut, seed));
        for (one, other) in
            plain["beams"].as_array().expect("beams").iter().zip(cut["beams"].as_array().expect("beams"))
        {
            let scale = largest_reaction(one);
            for (index, bearing) in one["bearings"].as_array().expect("bearings").iter().enumerate() {
                for action in plain["takedown"]["applied_kN"].as_object().expect("actions").keys() {
                    let (a, b) =
                        (&bearing["reaction_kN"][action], &other["bearings"][index]["reaction_kN"][action]);
                    assert!((number(a) - number(b)).abs() <= TOLERANCE * scale, "seed {seed}: {action}: {a}, {b}");
                }
            }
        }
    }
}

/// Twice the variable loads: twice the variable movement and twice every variable reaction.
#[test]
fn variable_figures_are_proportional_to_variable_loads() {
    for seed in 7000..7040 {
        let text = building(seed).text;
        let (plain, doubled) = (results(&text, seed), results(&rewrite::variable_doubled(&text), seed));
        for (one, other) in
            plain["beams"].as_array().expect("beams").iter().zip(doubled["beams"].as_array().expect("beams"))
        {
            let figure = |beam: &Value| number(&beam["deflection_mm"]["own_variable"]);
            let scale = number(&other["deflection_mm"]["hand_rule"]);
            let off = (2.0 * figure(one) - figure(other)).abs();
            assert!(off <= TOLERANCE * scale, "seed {seed}, {}: {} {}", one["mark"], figure(one), figure(other));
            let scale = largest_reaction(other);
            for (index, bearing) in one["bearings"].as_array().expect("bearings").iter().enumerate() {
                for action in plain["takedown"]["applied_kN"].as_object().expect("actions").keys() {
                    let factor = if action == "permanent" { 1.0 } else { 2.0 };
                    let (a, b) =
                        (&bearing["reaction_kN"][action], &other["bearings"][index]["reaction_kN"][action]);
                    let off = (factor * number(a) - number(b)).abs();
                    assert!(off <= TOLERANCE * scale, "seed {seed}: {action}: {a}, {b}");
                }
            }
        }
    }
}

fn largest_reaction(beam: &Value) -> f64 {
    let bearings = beam["bearings"].as_array().into_iter().flatten();
    let figures = bearings.flat_map(|bearing| bearing["reaction_kN"].as_object().into_iter().flatten());
    figures.map(|(_, figure)| number(figure).abs()).fold(0.0, f64::max)
}

/// Every figure of every beam the same; for a turned beam the bearings in the other order.
fn assert_same(one: &Value, other: &Value, seed: u64, turned: impl Fn(&str) -> bool) {
    for first in one["beams"].as_array().expect("beams") {
        let mark = first["mark"].as_str().expect("a mark");
        let second = beam(other, mark);
        let same = |what: &str, a: &Value, b: &Value, scale: f64| {
            let both_null = a.is_null() && b.is_null();
            let close = (number(a).abs() - number(b).abs()).abs() <= TOLERANCE * scale;
            assert!(both_null || close, "seed {seed}, {mark}: {what}: {a} and {b} (scale {scale})");
        };
        let scale = largest_reaction(first).max(largest_reaction(second));
        let bearings = first["bearings"].as_array().expect("bearings");
        for (index, bearing) in bearings.iter().enumerate() {
            let there = if turned(mark) { bearings.len() - 1 - index } else { index };
            for (key, figure) in bearing["reaction_kN"].as_object().expect("reactions") {
                let what = format!("bearing {index}, {key}");
                same(&what, figure, &second["bearings"][there]["reaction_kN"][key], scale);
                assert!(
                    (number(figure) - number(&second["bearings"][there]["reaction_kN"][key])).abs()
                        <= TOLERANCE * scale,
                    "seed {seed}, {mark}: {what} has the other sign"
                );
            }
        }
        let moments = ["max", "min"].map(|key| number(&first["moment_kNm"][key]).abs());
        for key in ["max", "min"] {
            same(key, &first["moment_kNm"][key], &second["moment_kNm"][key], moments[0].max(moments[1]));
        }
        same("shear", &first["shear_kN"]["max"], &second["shear_kN"]["max"], scale);
        let movement = number(&first["deflection_mm"]["hand_rule"])
            .max(number(&first["deflection_mm"]["stacked_total"]).abs());
        for key in ["own_total", "own_after", "own_variable", "stacked_total", "hand_rule"] {
            same(key, &first["deflection_mm"][key], &second["deflection_mm"][key], movement);
        }
        let length = number(&first["length_m"]);
        same("tilt", &first["tilt"], &second["tilt"], (10.0 * movement / 1e3 / length).max(1e-6));
        let required = &first["second_moment_cm4"]["required"];
        same("required", required, &second["second_moment_cm4"]["required"], number(required).abs());
        compare_checks(first, second, seed, mark);
    }
}

/// The worst share of each check by its name, and its verdict.
fn compare_checks(first: &Value, second: &Value, seed: u64, mark: &str) {
    let worst = |beam: &Value, name: &Value| {
        let checks = beam["checks"].as_array().into_iter().flatten();
        let named = checks.filter(|check| check["check"] == *name);
        named.filter_map(|check| check["utilisation"].as_f64()).fold(f64::NEG_INFINITY, f64::max)
    };
    for check in first["checks"].as_array().into_iter().flatten() {
        let name = &check["check"];
        let (a, b) = (worst(first, name), worst(second, name));
        let same = a == b || (a - b).abs() <= 1e2 * TOLERANCE * (1.0 + a.abs());
        assert!(same, "seed {seed}, {mark}: {name}: {a} and {b}");
    }
}

/// The rewriting itself: turned twice, a job is what it was.
#[test]
fn a_job_turned_twice_is_the_job() {
    for seed in 0..20 {
        let text = building(seed).text;
        let twice = rewrite::turned(&rewrite::turned(&text, |_| true), |_| true);
        let (one, other) = (Job::read(&text), Job::read(&twice));
        assert_eq!(read(&text)["beam"].as_array().map(Vec::len), read(&twice)["beam"].as_array().map(Vec::len));
        for (a, b) in one.beams.iter().zip(&other.beams) {
            for (a, b) in a.bearings.iter().zip(&b.bearings) {
                assert!((a.at - b.at).abs() < 1e-12);
            }
            for (a, b) in a.rows.iter().zip(&b.rows) {
                assert!((a.loads[0].1.total() - b.loads[0].1.total()).abs() < 1e-9);
            }
        }
    }
}
