//! The load path: what bears on what, and every load taken down to the walls.

use sagledger_calc::actions::Action;
use sagledger_calc::analysis::loads::resolve;
use sagledger_calc::building::{Beam, Carrier, Load};
use sagledger_calc::checks::places;
use sagledger_calc::quantity::Force;
use sagledger_calc::results::{BeamResult, RowResult};
use sagledger_calc::workings::decimal;
use sagledger_calc::workings::unit::Unit;
use serde::Serialize;
use serde_json::Value;

use super::text::{Runs, breakable, keys, to, words};
use super::view::{View, along, compact, kn, of};
use crate::package::Paper;

#[derive(Debug, Serialize)]
pub(super) struct LoadPath {
    paper: &'static str,
    drawings: Vec<Value>,
    /// One table, or more where the job has more actions than one has room for.
    tables: Vec<Table>,
}

#[derive(Debug, Serialize)]
struct Table {
    actions: Vec<String>,
    groups: Vec<Group>,
    totals: Vec<Row>,
}

#[derive(Debug, Serialize)]
struct Group {
    mark: String,
    rows: Vec<Row>,
}

#[derive(Debug, Serialize)]
struct Row {
    what: Runs,
    at: String,
    figures: Vec<String>,
    beside: String,
}

/// Actions that one table has room for.
const ROOM: usize = 5;

pub(super) fn load_path(view: View, paper: Paper, drawings: Vec<Value>) -> LoadPath {
    let actions = &view.results.actions.present;
    LoadPath {
        paper: super::paper_name(paper),
        drawings,
        tables: actions.chunks(ROOM).map(|chunk| table(view, chunk)).collect(),
    }
}

fn table(view: View, actions: &[Action]) -> Table {
    let groups = view
        .beams()
        .map(|(_, beam, result)| Group { mark: beam.mark.clone(), rows: rows(view, actions, beam, result) })
        .collect();
    let totals = &view.results.takedown;
    let figures = |list: &[(Action, Force)]| actions.iter().map(|&a| kn(of(list, a))).collect::<Vec<_>>();
    let mut worst: f64 = 0.0;
    let difference = actions
        .iter()
        .map(|&action| {
            let (applied, found) = (of(&totals.applied, action), of(&totals.to_supports, action));
            let difference = found.map_or(0.0, Force::si) - applied.map_or(0.0, Force::si);
            let size = of(&totals.absolute, action).map_or(0.0, Force::si);
            worst = worst.max(if size > 0.0 { difference.abs() / size } else { difference.abs() });
            decimal::places(difference, 3, Unit::Kn)
        })
        .collect();
    let balance = if worst <= 1e-9 {
        "below 10⁻⁹ of the loads".to_string()
    } else {
        format!("{} of the loads", decimal::three_figures(worst, Unit::One))
    };
    let row = |what: &str, figures, beside: &str| Row {
        what: vec![words(what)],
        at: String::new(),
        figures,
        beside: beside.into(),
    };
    Table {
        actions: actions.iter().map(|&a| view.results.actions.name(a)).collect(),
        groups,
        totals: vec![
            row("total applied", figures(&totals.applied), "areas × loads as typed"),
            row("total to the walls", figures(&totals.to_supports), "from the solve"),
            row("difference", difference, &balance),
        ],
    }
}

fn rows(view: View, actions: &[Action], beam: &Beam, result: &BeamResult) -> Vec<Row> {
    let figures = |list: &[(Action, Force)], sign: f64| {
        actions
            .iter()
            .map(|&action| kn(of(list, action).map(|force| Force::from_si(sign * force.si()))))
            .collect::<Vec<_>>()
    };
    let mut rows = Vec::new();
    for landing in &result.landings {
        let reactions = view.results.beams.get(landing.beam).and_then(|b| b.bearings.get(landing.bearing));
        rows.push(Row {
            what: vec![words("from "), view.link(landing.beam)],
            at: along(landing.at.si()),
            figures: reactions.map(|b| figures(&b.reactions, 1.0)).unwrap_or_default(),
            beside: String::new(),
        });
    }
    // Own weight comes after what was typed.
    let (own, typed): (Vec<&RowResult>, Vec<&RowResult>) = result.rows.iter().partition(|row| row.row.is_none());
    for row in typed.into_iter().chain(own) {
        rows.push(Row {
            what: vec![words(breakable(&row.what))],
            at: String::new(),
            figures: figures(&row.totals, 1.0),
            beside: area_times_load(view, actions, beam, row),
        });
    }
    for bearing in &result.bearings {
        let what = match bearing.on {
            Carrier::Wall(_) => {
                vec![words(format!("to {}", breakable(&places::carrier(view.building, bearing.on))))]
            }
            Carrier::Beam { beam, lands } => vec![
                words("to "),
                to(keys::beam(beam), breakable(view.mark(beam))),
                words(format!(", lands at {}", along(lands.si()))),
            ],
        };
        rows.push(Row {
            what,
            at: along(bearing.at.si()),
            figures: figures(&bearing.reactions, -1.0),
            beside: String::new(),
        });
    }
    rows
}

/// How the totals of a row come about: "17.7 m² × 0.983, 0.44, 0.30".
fn area_times_load(view: View, actions: &[Action], beam: &Beam, row: &RowResult) -> String {
    let Some(typed) = row.row.and_then(|n| beam.loads.get(n)) else {
        let mass = decimal::three_figures(beam.section.mass, Unit::One);
        return format!("{mass} kg/m × {} m", along(beam.length.si()));
    };
    let resolved = resolve(view.building, &view.results.actions, typed);
    let amounts = |unit: Unit| {
        let shown = actions.iter().filter_map(|&a| of(&resolved.amounts, a));
        shown.map(|si| compact(si, unit)).collect::<Vec<_>>().join(", ")
    };
    match (&typed.load, row.area) {
        (Load::Area { .. } | Load::Wall { .. }, Some(area)) => {
            let amounts = amounts(Unit::KnPerM2);
            if amounts.is_empty() {
                return String::new();
            }
            format!("{} m² × {amounts}", decimal::three_figures(area.si(), Unit::M2))
        }
        (Load::Line { from, to, .. }, _) => {
            let amounts = amounts(Unit::KnPerM);
            if amounts.is_empty() {
                return String::new();
            }
            format!("{} m × {amounts}", along(to.si() - from.si()))
        }
        _ => String::new(),
    }
}
