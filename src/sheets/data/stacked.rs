//! Stacked deflections: the ledger of every member with what it inherits.

use sagledger_calc::results::Stacked;
use sagledger_calc::workings::decimal;
use serde::Serialize;
use serde_json::Value;

use super::text::{Run, Runs, listed, words};
use super::view::{View, along};
use crate::package::Paper;

#[derive(Debug, Serialize)]
pub(super) struct StackedDeflections {
    paper: &'static str,
    intro: Runs,
    chains: Vec<Chain>,
    rows: Vec<Row>,
    notes: Vec<Runs>,
}

/// Drawings of a chain, made elsewhere.
#[derive(Debug, Serialize)]
pub(super) struct Chain {
    pub drawings: Vec<Value>,
    pub budgets: Vec<Value>,
}

#[derive(Debug, Serialize)]
struct Row {
    mark: Run,
    at: String,
    own: String,
    settled: String,
    inherited: String,
    stacked: String,
    limit: String,
    left: String,
    hand: String,
}

pub(super) fn stacked(view: View, paper: Paper, drawn: Vec<Chain>) -> StackedDeflections {
    let chains = &view.results.chains;
    let mut intro = vec![words("Each beam settles with whatever carries it. ")];
    if let [chain] = chains.as_slice() {
        let combination = view.results.combinations.get(chain.characteristic);
        if let Some(combination) = combination {
            intro.push(words("The chain is drawn for the combination that governs at "));
            intro.push(view.link(chain.governing_beam));
            intro.push(words(format!(": {}.", combination.name(&view.results.actions))));
        }
    } else {
        intro.push(words("Each chain is drawn for the combination that governs at the beam named beside it."));
    }
    let rows = view.beams().map(|(index, _, result)| {
        let movements = &result.movements;
        let found: &Stacked = movements.governing.as_ref().unwrap_or(&movements.stacked);
        let mm = decimal::movement;
        let limit = found.limit.map(|l| l.si());
        Row {
            mark: view.link(index),
            at: along(found.total.at.si()),
            own: mm(found.own.si()),
            settled: mm(found.settled.si()),
            inherited: mm(found.inherited.si()),
            stacked: mm(found.total.value.si()),
            limit: limit.map(mm).unwrap_or_default(),
            left: limit.map(|l| mm(l - found.total.value.si().abs())).unwrap_or_default(),
            hand: hand_rule(movements.hand_rule.si(), movements.stacked.total.value.si()),
        }
    });
    StackedDeflections {
        paper: super::paper_name(paper),
        intro,
        chains: drawn,
        rows: rows.collect(),
        notes: notes(view),
    }
}

/// "27.7, safe by 11.2 mm": the simple sum against the exact greatest movement.
fn hand_rule(by_hand: f64, exact: f64) -> String {
    let printed = decimal::movement(by_hand);
    let difference = by_hand - exact.abs();
    let size = decimal::movement(difference.abs());
    match (size.as_str(), difference > 0.0) {
        ("0.0", _) => format!("{printed}, the same"),
        (size, true) => format!("{printed}, safe by {size} mm"),
        (size, false) => format!("{printed}, unsafe by {size} mm"),
    }
}

fn notes(view: View) -> Vec<Runs> {
    let mut combinations: Vec<(String, Vec<Run>)> = Vec::new();
    for (index, _, result) in view.beams() {
        let movements = &result.movements;
        let found = movements.governing.as_ref().unwrap_or(&movements.stacked);
        let Some(combination) = view.results.combinations.get(found.total.combination) else { continue };
        let name = combination.name(&view.results.actions);
        match combinations.iter_mut().find(|(n, _)| *n == name) {
            Some((_, marks)) => marks.push(view.link(index)),
            None => combinations.push((name, vec![view.link(index)])),
        }
    }
    let mut note =
        vec![words("Each row is at the member’s governing point, under its own governing combination: ")];
    let count = combinations.len();
    for (n, (name, marks)) in combinations.into_iter().enumerate() {
        if n > 0 {
            note.push(words("; "));
        }
        if count > 1 {
            note.extend(listed(marks));
            note.push(words(", "));
        }
        note.push(words(name));
    }
    note.push(words("."));
    let rule = "The hand rule adds the largest own deflections down to the ground; an overhang can make it unsafe. \
                It is never a check.";
    vec![note, vec![words(rule)]]
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_hand_rule_says_which_way_it_errs() {
        assert_eq!(hand_rule(0.0277, 0.0166), "27.7, safe by 11.1 mm");
        assert_eq!(hand_rule(0.0094, 0.00941), "9.4, the same");
        assert_eq!(hand_rule(0.0100, -0.0125), "10.0, unsafe by 2.5 mm");
    }
}
