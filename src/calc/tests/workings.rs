//! Walks every registered check over generated inputs: the trace has no faults, gives the same bits as plain numbers,
//! and takes every branch.

use std::collections::BTreeSet;

use sagledger_calc::checks::generated::Dice;
use sagledger_calc::checks::registry::CHECKS;
use sagledger_calc::checks::{Outcome, run, workings};
use sagledger_calc::results::CheckKind;
use sagledger_calc::workings::Tape;
use sagledger_calc::workings::account::{Account, Step};
use sagledger_calc::workings::glossary;
use sagledger_calc::workings::symbol::Written;

const ROUNDS: u64 = 600;

fn bits(outcome: &Outcome) -> [Option<u64>; 3] {
    [outcome.demand, outcome.capacity, outcome.utilisation].map(|v| v.map(f64::to_bits))
}

#[test]
fn the_registry_names_every_kind_of_check_once() {
    let listed: Vec<CheckKind> = CHECKS.iter().flat_map(|c| c.kinds).copied().collect();
    assert_eq!(listed, CheckKind::ALL);
    for check in CHECKS {
        assert!(!check.clause.is_empty() && check.spoken.ends_with('?'), "{:?}", check.kinds);
    }
    let spoken: BTreeSet<&str> = CHECKS.iter().map(|c| c.spoken).collect();
    assert_eq!(spoken.len(), CHECKS.len());
}

#[test]
fn worked_examples_leave_workings_that_end_in_a_result() {
    for check in CHECKS {
        let tape = Tape::new();
        let outcome = workings(&(check.example)(), &tape);
        let account = Account::of(&tape);
        assert_eq!(tape.faults(), [], "{:?}", check.kinds);
        let required = account.lines().flat_map(|l| &l.steps).any(|s| matches!(s, Step::Requirement { .. }));
        assert_eq!(required, outcome.utilisation.is_some(), "{:?}", check.kinds);
    }
}

#[test]
fn traced_numbers_are_plain_numbers_bit_for_bit() {
    for check in CHECKS {
        let mut dice = Dice::seeded(7);
        for _ in 0..ROUNDS {
            let inputs = (check.generate)(&mut dice);
            let tape = Tape::new();
            let (plain, traced) = (run(&inputs), workings(&inputs, &tape));
            assert_eq!(bits(&plain), bits(&traced), "{inputs:?}");
            assert_eq!(plain, traced);
        }
    }
}

#[test]
fn no_trace_has_a_fault_and_every_symbol_is_in_the_glossary() {
    for check in CHECKS {
        let mut dice = Dice::seeded(11);
        for _ in 0..ROUNDS {
            let inputs = (check.generate)(&mut dice);
            let tape = Tape::new();
            let outcome = workings(&inputs, &tape);
            let account = Account::of(&tape);
            assert_eq!(tape.faults(), [], "{inputs:?}");
            for value in [outcome.demand, outcome.capacity, outcome.utilisation].into_iter().flatten() {
                assert!(value.is_finite(), "{inputs:?}");
            }
            for line in account.lines() {
                assert!(line.sentence.ends_with('.') && !line.sentence.starts_with(char::is_lowercase), "{line:?}");
                for step in &line.steps {
                    if let Step::Equation { symbol, .. } | Step::Value { symbol, .. } = step {
                        assert!(known(symbol), "{symbol:?}");
                    }
                }
            }
        }
    }
}

fn known(symbol: &Written) -> bool {
    glossary::ALL.iter().any(|(_, info)| {
        let longer = format!("{},", info.sub);
        info.base == symbol.base
            && (info.sub == symbol.sub || info.sub.is_empty() || symbol.sub.starts_with(&longer))
    })
}

#[test]
fn generated_inputs_take_every_branch() {
    let mut said = BTreeSet::new();
    for check in CHECKS {
        let mut dice = Dice::seeded(3);
        for _ in 0..ROUNDS {
            let inputs = (check.generate)(&mut dice);
            let tape = Tape::new();
            workings(&inputs, &tape);
            said.extend(Account::of(&tape).lines().map(|l| l.sentence.clone()));
        }
    }
    // Both consequences of every decision, and every note.
    for consequence in [
        "The flange is class 1.",
        "The flange is not class 1.",
        "The flange is class 2.",
        "The flange is not class 2.",
        "The flange is class 3.",
        "The flange is class 4.",
        "The web is class 1.",
        "The web is not class 1.",
        "The web is class 2.",
        "The web is not class 2.",
        "The web is class 3.",
        "The web is class 4.",
        "The web is too stocky to buckle in shear.",
        "The web could buckle in shear, which is not verified.",
        "The section resists the moment with its plastic modulus.",
        "The section is class 3, so that only its elastic modulus resists the moment.",
        "Not verified: section of class 4.",
        "Not verified: web that could buckle in shear.",
        "Not verified: thicker than the table of yield strengths goes.",
        "Not verified: torsion.",
        "Not verified: lateral-torsional buckling.",
        "It is no less than the web between the flanges.",
        "It is less than the web between the flanges, which counts instead.",
        "The shear at this place is at most half of the resistance to it, so that the resistance to bending stays.",
        "The shear at this place is more than half of the resistance to it and takes from the resistance to bending.",
        "The shear alone is more than the section resists: not met.",
        "The force comes through one flange and is resisted on both sides, type (a).",
        "The force stands near the beam\u{2019}s end, type (c).",
        "The seat is stiff over its length.",
        "The stiff length is not known and taken as nought.",
        "The stiff length counts in full.",
        "The stiff length counts up to the web\u{2019}s depth.",
        "The slenderness is above 0.5, so that the web keeps its part in spreading the force.",
        "The slenderness is not above 0.5, so that the web has no part in spreading the force, and the length is found again.",
        "A transverse stiffener is required (EN 1993-1-5 9.4).",
        "The least reaction still presses down: the bearing does not lift.",
        "Nothing holds the bearing down.",
        "The requirement is not met.",
        "Limits look at twice the length of an overhang.",
        "The tightest of the bounds is the limit.",
        "No second moment of area of this beam keeps the limit.",
        "Something of the limit is left for the beam itself.",
        "The supports have used the whole limit: no second moment of area of this beam keeps it.",
        "The overhang goes up, and limits look at its downward movement: nothing of it is used.",
        "Neither bearing moves under the loads: the stacked movement is the beam\u{2019}s own.",
        "Own and settled movement add up.",
        "Own and inherited movement add up.",
        "Own, inherited and settled movement add up.",
        "The hand rule is on the safe side.",
        "The hand rule is on the unsafe side.",
    ] {
        assert!(said.contains(consequence), "never said: {consequence}");
    }
}
