//! What each beam's limits on movement ask for: that every check is there, and the second moment of area required.

use super::building::Building;
use super::compare::{Governing, TOLERANCE, governing};
use super::job::Job;
use super::results::inherited_and_settled;
use serde_json::Value;

/// What a beam needs, m4.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Required {
    /// No limit, or none that any movement uses.
    Nothing,
    SecondMoment(f64),
    /// The supports have used the whole stacked budget.
    NoneIsEnough,
}

const OWN_KINDS: [&str; 3] = ["total", "after", "variable"];

/// For a beam on two bearings, whose own movement goes with 1 / I: the greatest of I delta / delta_lim and, where the
/// stacked movement of each stretch is closest to its limit, of I own / (limit - inherited - settled).
pub fn of_simple(building: &Building, beam: usize) -> Required {
    let provided = building.job.beams[beam].shape.second_moment;
    let whole = [0.0, building.length(beam)];
    let mut most = 0.0_f64;
    for kind in OWN_KINDS {
        if let Some(found) = governing(building, beam, kind, whole) {
            most = most.max(provided * found.movement / found.limit);
        }
    }
    // Each span and overhang at its own governing point: a second moment that leaves another stretch over its limit
    // would not be what is required.
    for (from, to, ..) in building.limited(beam, "stacked") {
        let Some(Governing { movement, limit, at, sign, .. }) = governing(building, beam, "stacked", [from, to])
        else {
            continue;
        };
        if movement == 0.0 {
            continue;
        }
        let parts = inherited_and_settled(building, beam, (sign * movement, at));
        let supports = sign * (parts[0].0 + parts[0].1);
        let own = movement - supports;
        if limit <= supports {
            return Required::NoneIsEnough;
        }
        most = most.max(provided * own / (limit - supports));
    }
    if most > 0.0 { Required::SecondMoment(most) } else { Required::Nothing }
}

/// The greatest share of any limit that a beam uses when its second moment of area (and with it its shear area) is
/// multiplied, its weight kept.
pub fn share_with(building: &Building, beam: usize, factor: f64) -> f64 {
    let mut job: Job = building.job.clone();
    job.beams[beam].shape.second_moment *= factor;
    job.beams[beam].shape.shear_area *= factor;
    let changed = Building::of(job);
    let whole = [0.0, building.length(beam)];
    let kinds = OWN_KINDS.iter().chain(&["stacked"]);
    kinds
        .filter_map(|kind| governing(&changed, beam, kind, whole))
        .map(|g| g.movement / g.limit)
        .fold(0.0, f64::max)
}

/// What the program's file says differently of the checks that must be there and of required second moments.
pub fn differences(building: &Building, program: &Value) -> Vec<String> {
    let mut lines = Vec::new();
    for beam in 0..building.job.beams.len() {
        let mark = &building.job.beams[beam].mark;
        let found = &program["beams"][beam];
        let missing = missing_checks(building, beam, found);
        lines.extend(missing.into_iter().map(|line| format!("{mark}: {line}")));
        lines.extend(wrong_requirement(building, beam, found).map(|line| format!("{mark}: {line}")));
    }
    lines
}

/// One entry a stretch with a limit, one a bearing for uplift, at least one for each check of every beam.
fn missing_checks(building: &Building, beam: usize, found: &Value) -> Vec<String> {
    let count =
        |name: &str| found["checks"].as_array().into_iter().flatten().filter(|c| c["check"] == name).count();
    let mut lines = Vec::new();
    let mut expect = |name: &str, expected: usize, exactly: bool| {
        let there = count(name);
        if there < expected || (exactly && there != expected) {
            lines.push(format!("{there} checks of {name}, {expected} expected"));
        }
    };
    for kind in OWN_KINDS.iter().chain(&["stacked"]) {
        expect(&format!("{kind} deflection"), building.limited(beam, kind).len(), true);
    }
    let bearings = building.job.beams[beam].bearings.len();
    expect("uplift", bearings, true);
    expect("tilt", usize::from(!building.job.beams[beam].limits[4].is_empty()), false);
    for name in ["bending", "shear", "bending with shear", "lateral-torsional buckling"] {
        expect(name, 1, false);
    }
    lines
}

/// The required second moment of area; of a beam on more than two bearings, that with it the closest limit is just met.
fn wrong_requirement(building: &Building, beam: usize, found: &Value) -> Option<String> {
    let required = found["second_moment_cm4"]["required"].as_f64().map(|required| required / 1e8);
    let bearings = building.job.beams[beam].bearings.len();
    let provided = building.job.beams[beam].shape.second_moment;
    if bearings > 2 {
        let share = required.map(|required| share_with(building, beam, required / provided));
        let right = match (required, share) {
            // A ten-thousandth of what is there is as little as a search needs to go down to.
            (Some(required), Some(share)) if required <= 1.000_001e-4 * provided => share <= 1.0,
            // Movements there are a small part of what cancels in them.
            (Some(_), Some(share)) => (share - 1.0).abs() < 1e-5,
            _ => share_with(building, beam, 1e6) > 1.0 || of_simple(building, beam) == Required::Nothing,
        };
        return (!right).then(|| format!("required {required:?} m4 of {provided}: share with it {share:?}"));
    }
    let expected = of_simple(building, beam);
    let right = match (required, expected) {
        (Some(required), Required::SecondMoment(expected)) => {
            (required - expected).abs() <= 1e2 * TOLERANCE * (required + provided)
        }
        (Some(required), Required::Nothing) => required.abs() <= TOLERANCE * provided,
        (None, Required::SecondMoment(expected)) => expected.abs() <= TOLERANCE * provided,
        (None, _) => true,
        (Some(_), Required::NoneIsEnough) => false,
    };
    (!right).then(|| format!("required {required:?} m4 of {provided}, second road {expected:?}"))
}
