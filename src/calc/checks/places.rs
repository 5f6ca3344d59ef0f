//! Names and places of checks in words, the same in tables, headings and on the terminal.

use crate::building::{Building, Carrier};
use crate::limits::Movement;
use crate::results::{BeamResult, Check, CheckKind, Place, Results};
use crate::workings::decimal::along;

use super::Inputs;

/// The name of a check as tables print it: "bending", "web under B1", "web at the spine wall".
pub fn name(building: &Building, results: &Results, beam: usize, check: &Check) -> String {
    if let Some(note) = check.note {
        return note.into();
    }
    match check.kind {
        CheckKind::WebUnderForce => match what_bears(building, results, beam, check.place) {
            Some(Bears::Under(mark)) => format!("web under {mark}"),
            Some(Bears::Over(mark)) => format!("web over {mark}"),
            Some(Bears::At(wall)) => format!("web at {wall}"),
            None => CheckKind::WebUnderForce.name().into(),
        },
        kind => kind.name().into(),
    }
}

/// The place of a check as tables print it: "2.10 m", "0 to 4.80 m".
pub fn place(results: &BeamResult, check: &Check) -> String {
    match check.place {
        Place::Segment { from, to } => format!("{} to {} m", along(from.to_m()), along(to.to_m())),
        Place::Stretch { index } if matches!(check.kind, CheckKind::Tilt) => match results.stretches.get(index) {
            Some(stretch) => format!("{} to {} m", along(stretch.from.to_m()), along(stretch.to.to_m())),
            None => at(check.at.to_m()),
        },
        Place::Point { .. }
        | Place::Stretch { .. }
        | Place::Bearing { .. }
        | Place::Landing { .. }
        | Place::Load { .. } => at(check.at.to_m()),
    }
}

fn at(metres: f64) -> String {
    match along(metres).as_str() {
        "0" => "0 m".into(),
        text => format!("{text} m"),
    }
}

/// The heading of a check's workings: "Bending, at 2.10 m where B1 lands".
pub fn heading(building: &Building, results: &Results, beam: usize, check: &Check) -> String {
    let name = capital(&name(building, results, beam, check));
    let Some(own) = results.beams.get(beam) else { return name };
    let what = match (check.kind, &check.inputs) {
        (CheckKind::WebWithBending, _) => match what_bears(building, results, beam, check.place) {
            Some(Bears::Under(mark)) => format!(" under {mark}"),
            Some(Bears::Over(mark)) => format!(" over {mark}"),
            Some(Bears::At(wall)) => format!(" at {wall}"),
            None => String::new(),
        },
        (CheckKind::Torsion, Some(Inputs::Torsion(inputs))) => format!(" ({})", inputs.what),
        _ => String::new(),
    };
    let place = match (check.kind, check.place) {
        (_, Place::Segment { .. }) | (CheckKind::Tilt, _) => place(own, check),
        (CheckKind::WebUnderForce | CheckKind::WebWithBending, _) => format!("at {}", place(own, check)),
        _ => match landmark(building, own, check.at.to_m()) {
            Some(Landmark::Bearing(on)) => format!("at {on}"),
            Some(Landmark::Landing(mark)) => format!("at {} where {mark} lands", place(own, check)),
            None => format!("at {}", place(own, check)),
        },
    };
    format!("{name}{what}, {place}")
}

/// The name of a limited movement as a check.
pub fn of_movement(movement: Movement) -> CheckKind {
    match movement {
        Movement::Total => CheckKind::TotalDeflection,
        Movement::After => CheckKind::AfterDeflection,
        Movement::Variable => CheckKind::VariableDeflection,
        Movement::Stacked => CheckKind::StackedDeflection,
        Movement::Tilt => CheckKind::Tilt,
    }
}

/// A wall in a sentence: "the spine wall"; a name with a capital stands alone.
pub fn the_wall(name: &str) -> String {
    let lower = name.chars().next().is_some_and(char::is_lowercase);
    if lower && !name.starts_with("the ") { format!("the {name}") } else { name.into() }
}

/// What a bearing stands on, in a sentence: "B3", "the spine wall".
pub fn carrier(building: &Building, on: Carrier) -> String {
    match on {
        Carrier::Wall(wall) => building.walls.get(wall).map_or_else(String::new, |w| the_wall(&w.name)),
        Carrier::Beam { beam, .. } => building.beams.get(beam).map_or_else(String::new, |b| b.mark.clone()),
    }
}

enum Bears {
    Under(String),
    Over(String),
    At(String),
}

fn what_bears(building: &Building, results: &Results, beam: usize, place: Place) -> Option<Bears> {
    let own = results.beams.get(beam)?;
    match place {
        Place::Bearing { index } => {
            let on = own.bearings.get(index)?.on;
            Some(match on {
                Carrier::Wall(_) => Bears::At(carrier(building, on)),
                Carrier::Beam { .. } => Bears::Over(carrier(building, on)),
            })
        }
        Place::Landing { index } => {
            let landing = own.landings.get(index)?;
            Some(Bears::Under(building.beams.get(landing.beam)?.mark.clone()))
        }
        Place::Load { row } => Some(Bears::Under(format!("\u{201c}{}\u{201d}", own.rows.get(row)?.what))),
        Place::Point { .. } | Place::Stretch { .. } | Place::Segment { .. } => None,
    }
}

enum Landmark {
    Bearing(String),
    Landing(String),
}

/// What stands at a place along the beam, within a tenth of a millimetre.
fn landmark(building: &Building, own: &BeamResult, metres: f64) -> Option<Landmark> {
    let here = |at: f64| (at - metres).abs() < 1e-4;
    if let Some(bearing) = own.bearings.iter().find(|b| here(b.at.to_m())) {
        return Some(Landmark::Bearing(carrier(building, bearing.on)));
    }
    let landing = own.landings.iter().find(|l| here(l.at.to_m()))?;
    Some(Landmark::Landing(building.beams.get(landing.beam)?.mark.clone()))
}

/// With a capital at the head.
pub fn capital(text: &str) -> String {
    let mut letters = text.chars();
    match letters.next() {
        Some(first) => first.to_uppercase().chain(letters).collect(),
        None => String::new(),
    }
}
