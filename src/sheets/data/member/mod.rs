//! A member's sheets.

mod by_hand;
mod checks;
mod loads;
mod properties;
mod reactions;
mod site;
mod workings;

use sagledger_calc::building::{Beam, Carrier};
use sagledger_calc::checks::{account, places};
use sagledger_calc::limits::Movement;
use sagledger_calc::results::{BeamResult, Check, CheckKind};
use sagledger_calc::workings::decimal;
use sagledger_calc::workings::unit::Unit;
use serde::Serialize;
use serde_json::Value;

use super::text::{Run, Runs, breakable, counted, keys, listed, value, words};
use super::view::{View, along, along_m};

#[derive(Debug, Serialize)]
pub(super) struct Member {
    keys: Keys,
    mark: String,
    title: String,
    intro: Runs,
    figures: Vec<KeyFigure>,
    chain: Option<Value>,
    section: Option<Value>,
    properties: properties::Properties,
    loads: Vec<loads::LoadTable>,
    reactions: Vec<reactions::ReactionTable>,
    diagrams: Option<Value>,
    checks: Vec<checks::Row>,
    check_notes: Vec<Runs>,
    workings: Value,
    by_hand: Option<by_hand::ByHand>,
    relies_on: Vec<Labelled>,
    site: Vec<Labelled>,
}

#[derive(Debug, Serialize)]
struct Keys {
    first: String,
    checks: String,
    workings: String,
}

#[derive(Debug, Serialize)]
struct KeyFigure {
    label: &'static str,
    value: String,
    below: String,
}

/// A label with its text.
#[derive(Debug, Serialize)]
struct Labelled {
    label: Run,
    body: Runs,
    beside: Option<Runs>,
    plain: bool,
}

/// Drawings of a member, made elsewhere.
#[derive(Default)]
pub(super) struct Drawings {
    pub chain: Option<Value>,
    pub section: Option<Value>,
    pub diagrams: Option<Value>,
}

pub(super) fn member(view: View, index: usize, beam: &Beam, result: &BeamResult, drawings: Drawings) -> Member {
    let account = account(view.building, view.results, index);
    Member {
        keys: Keys {
            first: keys::beam(index),
            checks: keys::beam_checks(index),
            workings: keys::beam_workings(index),
        },
        mark: beam.mark.clone(),
        title: beam.title.clone().unwrap_or_else(|| "Beam".into()),
        intro: intro(view, beam, result),
        figures: figures(view, index, beam, result),
        chain: drawings.chain,
        section: drawings.section,
        properties: properties::properties(view, beam, result),
        loads: loads::tables(view, beam, result),
        reactions: reactions::tables(view, result),
        diagrams: drawings.diagrams,
        checks: checks::rows(view, index, result),
        check_notes: checks::notes(view, beam, result),
        workings: workings::workings(&account),
        by_hand: result.hand_check.as_ref().map(|hand| by_hand::by_hand(view, beam, hand)),
        relies_on: relies_on(view, beam),
        site: site::items(view, beam, result),
    }
}

/// "254x146x37 UB in S275, 4.80 m between bearings. It stands on the spine wall and on B3, and carries B1."
fn intro(view: View, beam: &Beam, result: &BeamResult) -> Runs {
    let mut runs = vec![words(format!("{} in {}, ", beam.section.name, beam.grade.name()))];
    let whole = beam.length.si();
    let (first, last) = match (beam.bearings.first(), beam.bearings.last()) {
        (Some(first), Some(last)) => (first.at.si(), last.at.si()),
        _ => (0.0, whole),
    };
    if beam.bearings.len() == 2 && first == 0.0 && last == whole {
        runs.push(value(along(whole), "m"));
        runs.push(words(" between bearings. "));
    } else if beam.bearings.len() == 2 {
        runs.push(value(along(whole), "m"));
        runs.push(words(" long, "));
        runs.push(value(along(last - first), "m"));
        runs.push(words(" between bearings. "));
    } else {
        runs.push(value(along(whole), "m"));
        runs.push(words(format!(" long on {} bearings. ", counted(beam.bearings.len()))));
    }
    if beam.existing {
        runs.push(words("It stands already. "));
    }
    runs.push(words("It stands on "));
    let mut carriers: Vec<Run> = Vec::new();
    for bearing in &beam.bearings {
        let carrier = view.carrier(bearing.on);
        if !carriers.contains(&carrier) {
            carriers.push(carrier);
        }
    }
    runs.extend(listed(carriers));
    if !result.landings.is_empty() {
        runs.push(words(", and carries "));
        let mut landed: Vec<Run> = Vec::new();
        for landing in &result.landings {
            let link = view.link(landing.beam);
            if !landed.contains(&link) {
                landed.push(link);
            }
        }
        runs.extend(listed(landed));
    }
    runs.push(words("."));
    runs
}

fn figures(view: View, index: usize, beam: &Beam, result: &BeamResult) -> Vec<KeyFigure> {
    let (max, min) = (&result.moment_max, &result.moment_min);
    let moment = if min.value.si().abs() > max.value.si().abs() { min } else { max };
    let limit_of = |kind: CheckKind| {
        let of_kind = result.checks.iter().filter(|c| c.kind == kind);
        of_kind.max_by(|a, b| a.utilisation.unwrap_or(0.0).total_cmp(&b.utilisation.unwrap_or(0.0)))
    };
    let mm_limit = |kind: CheckKind| match limit_of(kind).and_then(|c| c.capacity) {
        Some(limit) => format!("mm, limit {}", decimal::movement(limit)),
        None => "mm, no limit".into(),
    };
    let movements = &result.movements;
    let stacked = movements.governing.as_ref().unwrap_or(&movements.stacked);
    let tilt = movements.tilt.ratio();
    let closest = view.closest(result);
    vec![
        KeyFigure {
            label: "moment",
            value: decimal::three_figures(moment.value.si(), Unit::Knm),
            below: format!("kNm at {}", along_m(moment.at.si())),
        },
        KeyFigure {
            label: "shear",
            value: decimal::three_figures(result.shear.value.si().abs(), Unit::Kn),
            below: format!("kN at {}", along_m(result.shear.at.si())),
        },
        KeyFigure {
            label: "own deflection",
            value: decimal::movement(movements.own_total.value.si()),
            below: mm_limit(CheckKind::TotalDeflection),
        },
        KeyFigure {
            label: "stacked",
            value: decimal::movement(stacked.total.value.si()),
            below: mm_limit(CheckKind::StackedDeflection),
        },
        KeyFigure {
            label: "tilt",
            value: decimal::one_in(tilt),
            below: match (view.limit(beam, Movement::Tilt), limit_of(CheckKind::Tilt).and_then(|c| c.capacity)) {
                (Some(_), Some(limit)) => format!("limit {}", decimal::one_in(limit)),
                _ => "no limit".into(),
            },
        },
        closest.map_or_else(
            || KeyFigure { label: "closest check", value: String::new(), below: String::new() },
            |check| closest_figure(view, index, check),
        ),
    ]
}

fn closest_figure(view: View, index: usize, check: &Check) -> KeyFigure {
    KeyFigure {
        label: "closest check",
        value: check.utilisation.map_or_else(|| "–".into(), decimal::utilisation),
        below: format!("{}, {}", breakable(&view.check_name(index, check)), check.verdict.word()),
    }
}

/// The assumptions that name this member.
fn relies_on(view: View, beam: &Beam) -> Vec<Labelled> {
    let named = view.results.assumptions.iter().enumerate().filter(|(_, a)| a.marks.contains(&beam.mark));
    let mut items: Vec<Labelled> = named
        .map(|(n, assumption)| Labelled {
            label: super::text::to(keys::assumption(n + 1), format!("Assumption {}", n + 1)),
            body: super::text::sentence(&assumption.sentence),
            beside: None,
            plain: false,
        })
        .collect();
    if let Some(first) = items.first_mut() {
        first.beside = Some(vec![words("written out on "), super::text::sheet(keys::BASIS)]);
    }
    items
}

/// What a bearing stands on as a label.
fn on_label(view: View, on: Carrier) -> Run {
    match on {
        Carrier::Wall(_) => words(format!("on {}", breakable(&places::carrier(view.building, on)))),
        Carrier::Beam { beam, .. } => {
            super::text::to(keys::beam(beam), format!("on {}", breakable(view.mark(beam))))
        }
    }
}
