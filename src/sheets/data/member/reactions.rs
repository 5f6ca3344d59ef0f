//! Reactions to each bearing, action by action, under the names that its carrier uses too.

use sagledger_calc::actions::Action;
use sagledger_calc::building::Carrier;
use sagledger_calc::checks::places;
use sagledger_calc::results::BeamResult;
use serde::Serialize;

use crate::data::text::{Run, Runs, breakable, keys, sheet, to, words};
use crate::data::view::{View, along, kn, of};

#[derive(Debug, Serialize)]
pub(super) struct ReactionTable {
    /// Short names of actions.
    actions: Vec<String>,
    rows: Vec<Row>,
    /// The greatest reactions stand in the last table.
    with_greatest: bool,
}

#[derive(Debug, Serialize)]
struct Row {
    to: Run,
    at: String,
    lands: String,
    figures: Vec<String>,
    characteristic: String,
    design: String,
    /// The least design reaction where the bearing can lift; empty elsewhere.
    least: String,
    under: Runs,
}

/// Actions that one table has room for.
const ROOM: usize = 4;

pub(super) fn tables(view: View, result: &BeamResult) -> Vec<ReactionTable> {
    let chunks: Vec<&[Action]> = view.results.actions.present.chunks(ROOM).collect();
    let last = chunks.len().saturating_sub(1);
    chunks.into_iter().enumerate().map(|(n, actions)| table(view, result, actions, n == last)).collect()
}

fn table(view: View, result: &BeamResult, actions: &[Action], with_greatest: bool) -> ReactionTable {
    let rows = result.bearings.iter().map(|bearing| {
        let combination = view.results.combinations.get(bearing.design_max.combination);
        let mut under: Runs = vec![words(combination.map_or_else(String::new, |c| leading(view, c)))];
        let (to, lands) = match bearing.on {
            Carrier::Wall(_) => {
                under.extend([words(", "), sheet(keys::LOAD_PATH)]);
                (words(breakable(&places::carrier(view.building, bearing.on))), String::new())
            }
            Carrier::Beam { beam, lands } => {
                under.extend([words(", "), sheet(keys::beam(beam))]);
                (to(keys::beam(beam), breakable(view.mark(beam))), along(lands.si()))
            }
        };
        Row {
            to,
            at: along(bearing.at.si()),
            lands,
            figures: actions.iter().map(|&a| kn(of(&bearing.reactions, a))).collect(),
            characteristic: kn(Some(bearing.characteristic_max.value)),
            design: kn(Some(bearing.design_max.value)),
            least: if bearing.least.value.si() < 0.0 { kn(Some(bearing.least.value)) } else { String::new() },
            under,
        }
    });
    ReactionTable {
        actions: actions.iter().map(|&a| short(&view.results.actions.name(a))).collect(),
        rows: rows.collect(),
        with_greatest,
    }
}

fn leading(view: View, combination: &sagledger_calc::actions::combinations::Combination) -> String {
    combination.short_name(&view.results.actions)
}

fn short(name: &str) -> String {
    match name.strip_prefix("imposed") {
        Some(category) => format!("imp.{category}"),
        None if name == "permanent" => "perm.".into(),
        None => name.to_string(),
    }
}
