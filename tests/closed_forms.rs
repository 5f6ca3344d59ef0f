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

/// The middle of two equal spans settles: 3 E I d / L2, sagging (handbooks). Design forces leave it out, so that the
/// results alone say it.
#[test]
fn a_settlement_bends_as_handbooks_say() {
    let job = "[job]\nnumber = \"K-2\"\ntitle = \"A settlement\"\ndate = 2027-03-01\n[[wall]]\nname = \"a\"\n[[beam]]\nmark = \"C\"\n\
               section = \"254x146x43 UB\"\nlength = \"9.0 m\"\nbearings = [ { on = \"a\" }, \
               { on = \"a\", at = \"4.5 m\", settles = \"5 mm\" }, { on = \"a\" } ]\n";
    let read = sagledger::job::read(job.as_bytes(), "job.toml").job.expect("a job without faults");
    let results = sagledger_calc::calculate(&read.building).expect("results");
    let moment = results.beams[0].settlement_moment.expect("a moment").to_knm();
    let shape = second_road::sections::Shape::named("254x146x43 UB");
    let expected = 3.0 * second_road::YOUNG * shape.second_moment * 5e-3 / 4.5f64.powi(2) / 1e3;
    assert!((moment - expected).abs() <= 1e-9 * expected, "{moment} is not {expected} kNm");
}
