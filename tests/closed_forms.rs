//! Known figures, with their sources: the program against them, and the second road that the sweep trusts.

mod cases;
#[path = "second_road/mod.rs"]
mod second_road;

use cases::{Case, cases, misses, requirements};

#[test]
fn the_program_meets_every_closed_form() {
    program_meets(cases());
}

#[test]
fn the_program_checks_what_it_must() {
    program_meets(requirements());
}

fn program_meets(cases: Vec<Case>) {
    let mut all = Vec::new();
    for case in cases {
        let results = sagledger::results_json(&case.job).unwrap_or_else(|fault| panic!("{}: {fault}", case.name));
        all.extend(misses(&case, &serde_json::from_str(&results).expect("a results file is JSON")));
    }
    assert!(all.is_empty(), "{} figures miss:\n{}", all.len(), all.join("\n"));
}

#[test]
fn the_second_road_meets_every_closed_form() {
    let mut all = Vec::new();
    for case in cases() {
        let building = second_road::building::Building::new(&case.job);
        all.extend(misses(&case, &second_road::results::results(&building)));
    }
    assert!(all.is_empty(), "{} figures miss:\n{}", all.len(), all.join("\n"));
}
