//! The load table: every row with where it comes from.

use sagledger_calc::actions::Action;
use sagledger_calc::building::{Beam, Load, Stage};
use sagledger_calc::quantity::Force;
use sagledger_calc::results::{BeamResult, RowLoad, RowResult};
use sagledger_calc::workings::decimal;
use sagledger_calc::workings::unit::Unit;
use serde::Serialize;

use crate::data::text::{Run, Runs, breakable, keys, sheet, to, words};
use crate::data::view::{View, along, kn, of};

/// Loads of one group of actions.
#[derive(Debug, Serialize)]
pub(super) struct LoadTable {
    actions: Vec<String>,
    lines: Vec<Row>,
    points: Vec<Row>,
    total: Vec<String>,
    total_note: String,
}

#[derive(Debug, Serialize)]
struct Row {
    what: Runs,
    /// One entry, or two where the load varies: from where, to where.
    extent: Vec<String>,
    stage: &'static str,
    /// For each action as many figures as `extent` has entries.
    figures: Vec<Vec<String>>,
    origin: Runs,
}

/// Actions that one table has room for.
const ROOM: usize = 5;

pub(super) fn tables(view: View, beam: &Beam, result: &BeamResult) -> Vec<LoadTable> {
    view.results.actions.present.chunks(ROOM).map(|actions| table(view, actions, beam, result)).collect()
}

fn table(view: View, actions: &[Action], beam: &Beam, result: &BeamResult) -> LoadTable {
    let mut lines = Vec::new();
    let mut points = Vec::new();
    for row in &result.rows {
        match &row.load {
            RowLoad::Line { from, to, intensities } => {
                let varies = intensities.iter().any(|(_, a, b)| a.si() != b.si());
                let text = |si: f64| decimal::three_figures(si, Unit::KnPerM);
                let figures = actions.iter().map(|action| match intensities.iter().find(|(a, ..)| a == action) {
                    None => vec![String::new(); if varies { 2 } else { 1 }],
                    Some((_, a, b)) if varies => vec![text(a.si()), text(b.si())],
                    Some((_, a, _)) => vec![text(a.si())],
                });
                let (from, to) = (along(from.si()), along(to.si()));
                lines.push(Row {
                    what: vec![words(breakable(&row.what))],
                    extent: if varies { vec![from, format!("to {to}")] } else { vec![format!("{from} to {to}")] },
                    stage: stage(row.stage),
                    figures: figures.collect(),
                    origin: origin(view, beam, row),
                });
            }
            RowLoad::Point { at, forces } => points.push(Row {
                what: vec![words(breakable(&row.what))],
                extent: vec![along(at.si())],
                stage: stage(row.stage),
                figures: actions.iter().map(|&a| vec![kn(of(forces, a))]).collect(),
                origin: origin(view, beam, row),
            }),
        }
    }
    for landing in &result.landings {
        let bearing = view.results.beams.get(landing.beam).and_then(|b| b.bearings.get(landing.bearing));
        let reactions: &[(Action, Force)] = bearing.map_or(&[], |b| &b.reactions);
        points.push(Row {
            what: vec![view_link(view, landing.beam), words(" lands")],
            extent: vec![along(landing.at.si())],
            stage: "",
            figures: actions.iter().map(|&a| vec![kn(of(reactions, a))]).collect(),
            origin: vec![
                words("reaction of "),
                view_link(view, landing.beam),
                words(", "),
                sheet(keys::beam(landing.beam)),
            ],
        });
    }
    let total = |action: Action| {
        let own = result.rows.iter().filter_map(|row| of(&row.totals, action)).map(Force::si);
        let landed = result.landings.iter().filter_map(|landing| {
            let bearing = view.results.beams.get(landing.beam)?.bearings.get(landing.bearing)?;
            of(&bearing.reactions, action).map(Force::si)
        });
        let all: Vec<f64> = own.chain(landed).collect();
        (!all.is_empty()).then(|| Force::from_si(all.iter().sum()))
    };
    LoadTable {
        actions: actions.iter().map(|&a| view.results.actions.name(a)).collect(),
        lines,
        points,
        total: actions.iter().map(|&a| kn(total(a))).collect(),
        total_note: "kN".into(),
    }
}

fn view_link(view: View, beam: usize) -> Run {
    to(keys::beam(beam), breakable(view.mark(beam)))
}

fn stage(stage: Stage) -> &'static str {
    match stage {
        Stage::Before => "before",
        Stage::After => "after",
    }
}

/// "timber floor × 1.80 m, sheet 4".
fn origin(view: View, beam: &Beam, row: &RowResult) -> Runs {
    let Some(typed) = row.row.and_then(|n| beam.loads.get(n)) else { return vec![words("section")] };
    let pair = |(a, b): (f64, f64)| {
        if a == b { format!("{} m", along(a)) } else { format!("{} to {} m", along(a), along(b)) }
    };
    let (build_up, size) = match &typed.load {
        Load::Area { build_up, width, .. } => (*build_up, pair((width.0.si(), width.1.si()))),
        Load::Wall { build_up, height, .. } => (*build_up, pair((height.0.si(), height.1.si()))),
        Load::Line { .. } | Load::Point { .. } => return vec![words("given directly")],
    };
    let name = view.building.build_ups.get(build_up).map_or("", |b| b.name.as_str());
    vec![
        to(keys::build_up(build_up), breakable(name)),
        words(format!(" × {size}, ")),
        sheet(keys::build_up(build_up)),
    ]
}
