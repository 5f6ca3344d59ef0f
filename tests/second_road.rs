//! The program against the second road, figure by figure, over buildings by chance.

mod generate;
#[path = "second_road/mod.rs"]
mod second_road;

use generate::building::{Traits, building};
use second_road::building::Building;
use second_road::compare::differences;
use second_road::required;
use std::ops::Range;

/// Seeds of the sweep, in parts that run beside each other.
const PARTS: [Range<u64>; 4] = [0..130, 130..260, 260..390, 390..520];

fn sweep(seeds: Range<u64>) {
    let mut all = Vec::new();
    let mut wrong = 0;
    for seed in seeds {
        let text = building(seed).text;
        let results = match sagledger::results_json(&text) {
            Ok(results) => results,
            Err(fault) => {
                wrong += 1;
                all.push(format!("seed {seed}: not read: {fault}"));
                continue;
            }
        };
        let results = serde_json::from_str(&results).expect("a results file is JSON");
        let building = Building::new(&text);
        let mut found = differences(&building, &results);
        found.extend(required::differences(&building, &results));
        wrong += usize::from(!found.is_empty());
        all.extend(found.into_iter().map(|line| format!("seed {seed}: {line}")));
    }
    let first = &all[..all.len().min(60)];
    assert!(all.is_empty(), "{} figures of {wrong} buildings differ:\n{}", all.len(), first.join("\n"));
}

#[test]
fn both_roads_agree_first_part() {
    sweep(PARTS[0].clone());
}

#[test]
fn both_roads_agree_second_part() {
    sweep(PARTS[1].clone());
}

#[test]
fn both_roads_agree_third_part() {
    sweep(PARTS[2].clone());
}

#[test]
fn both_roads_agree_fourth_part() {
    sweep(PARTS[3].clone());
}

/// The sweep is worth its name: a quarter of its buildings at least have each of the traits that it is for.
#[test]
fn the_sweep_has_every_kind_of_building() {
    let traits: Vec<Traits> = PARTS.into_iter().flatten().map(|seed| building(seed).traits).collect();
    assert!(traits.len() >= 500);
    let assert_share = |name: &str, has: fn(&Traits) -> bool, share: usize| {
        let count = traits.iter().filter(|traits| has(traits)).count();
        assert!(count * share >= traits.len(), "{count} of {} buildings: {name}", traits.len());
    };
    assert_share("continuous", |traits| traits.continuous, 4);
    assert_share("with overhang", |traits| traits.overhang, 4);
    assert_share("three deep", |traits| traits.three_deep, 4);
    assert_share("with a shared carrier", |traits| traits.shared_carrier, 4);
    assert_share("with a trapezoidal load", |traits| traits.trapezoidal, 4);
    assert_share("with a point load", |traits| traits.point_load, 4);
    assert_share("with wind uplift", |traits| traits.wind_uplift, 4);
    assert_share("with a settlement", |traits| traits.settles, 4);
    assert_share("with stages", |traits| traits.staged, 4);
    assert_share("6.10a/b", |traits| traits.two_expressions, 4);
    assert_share("recommended", |traits| traits.recommended, 4);
    assert_share("shear-flexible", |traits| traits.shear_flexible, 8);
    assert_share("of one beam", |traits| traits.beams == 1, 20);
    assert_share("of six beams or more", |traits| traits.beams >= 6, 4);
}

/// The comparison itself can fail: a figure that is off by a hundred-thousandth is found, whichever it is.
#[test]
fn a_figure_off_by_a_little_is_found() {
    let building = Building::new(&building(11).text);
    let results = second_road::results::results(&building);
    assert_eq!(differences(&building, &results), Vec::<String>::new());
    let keys = ["moment_kNm", "shear_kN", "deflection_mm", "bearings", "mass_kg"];
    for key in keys {
        let mut wrong = results.clone();
        nudge(&mut wrong["beams"][0][key]);
        assert!(!differences(&building, &wrong).is_empty(), "{key} may be anything");
    }
    for side in ["applied_kN", "to_supports_kN"] {
        let mut wrong = results.clone();
        nudge(&mut wrong["takedown"][side]);
        assert!(!differences(&building, &wrong).is_empty(), "{side} may be anything");
    }
}

/// Every number in a value a hundred-thousandth larger.
fn nudge(value: &mut serde_json::Value) {
    match value {
        serde_json::Value::Number(number) => {
            if let Some(number) = number.as_f64() {
                *value = serde_json::json!(number * (1.0 + 1e-5) + 1e-6);
            }
        }
        serde_json::Value::Array(items) => items.iter_mut().for_each(nudge),
        serde_json::Value::Object(items) => items.values_mut().for_each(nudge),
        _ => {}
    }
}
