//! The checks table of a member, and what is said beside the verdicts.

use sagledger_calc::building::Beam;
use sagledger_calc::checks::places;
use sagledger_calc::results::BeamResult;
use sagledger_calc::workings::decimal;
use sagledger_calc::workings::unit::Unit;
use serde::Serialize;

use crate::data::text::{Runs, breakable, value, words};
use crate::data::view::{Verdict, View, amount, clause, verdict};

#[derive(Debug, Serialize)]
pub(super) struct Row {
    name: String,
    place: String,
    demand: String,
    limit: String,
    unit: &'static str,
    verdict: Verdict,
    clause: String,
}

pub(super) fn rows(view: View, index: usize, result: &BeamResult) -> Vec<Row> {
    let shown = result.checks.iter().filter(|check| !check.advice);
    shown
        .map(|check| {
            let (demand, unit) = amount(check, check.demand);
            let (limit, _) = amount(check, check.capacity);
            Row {
                name: breakable(&view.check_name(index, check)),
                place: places::place(result, check),
                demand,
                limit,
                unit,
                verdict: verdict(check),
                clause: clause(check),
            }
        })
        .collect()
}

/// Beside the verdict: what shear would add, what settlement would cause, reports without a limit.
pub(super) fn notes(view: View, beam: &Beam, result: &BeamResult) -> Vec<Runs> {
    let mut notes = Vec::new();
    let mut said: Runs = Vec::new();
    let shear = decimal::movement(result.shear_movement.si().abs());
    if view.building.basis.shear_flexibility {
        said.push(words("Shear deformation is included: "));
        said.push(value(shear, "mm"));
        said.push(words(" of the greatest own deflection."));
    } else {
        said.push(words("Shear deformation, not included, would add "));
        said.push(value(shear, "mm"));
        said.push(words(" to the greatest own deflection."));
    }
    notes.push(said);
    if let Some(moment) = result.settlement_moment {
        notes.push(vec![
            words("The settlement of its supports would cause a moment of "),
            value(decimal::three_figures(moment.si(), Unit::Knm), "kNm"),
            words(format!(" in {}: outside this calculation.", beam.mark)),
        ]);
    }
    notes
}
