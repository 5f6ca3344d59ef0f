//! The diagrams in words, for readers who do not see them.

use super::super::figures::{fixed, place, tenth, three};
use super::super::shape;
use super::{Diagrams, deflection};

pub(super) fn alt(data: &Diagrams) -> String {
    let mut text = format!(
        "Diagrams of {} over {} m, bearings at {}. Loading, shear and moment for {}.",
        data.mark,
        fixed(data.length, 2),
        listed(data.bearings.iter().map(|b| place(*b))),
        data.strength
    );
    if !data.bands.is_empty() {
        let bands = data.bands.iter().map(|b| {
            let (from, to) = (three(b.intensity.0 / 1e3), three(b.intensity.1 / 1e3));
            let load = if from == to { from } else { format!("{from} to {to}") };
            format!("{} {load} kN/m from {} to {}", b.what, place(b.from), place(b.to))
        });
        text.push_str(&format!(" Loads: {}.", bands.collect::<Vec<_>>().join("; ")));
    }
    if !data.forces.is_empty() {
        let forces =
            data.forces.iter().map(|f| format!("{} kN {} at {}", three(f.force / 1e3), f.source, place(f.at)));
        text.push_str(&format!(" Concentrated loads: {}.", forces.collect::<Vec<_>>().join("; ")));
    }
    let (least, most) = shape::range(&data.shear);
    text.push_str(&format!(" Shear between {} and {} kN.", three(most / 1e3), three(least / 1e3)));
    let peaks = |curve, unit: f64, size: f64, write: fn(f64) -> String, after: &str| {
        let peaks = shape::peaks(curve).into_iter().filter(|p| p.value.abs() > 0.02 * size);
        listed(peaks.map(|p| format!("{}{after} at {}", write(p.value * unit), place(p.at))))
    };
    let (least, most) = shape::range(&data.moment);
    let moments = peaks(&data.moment, 1e-3, most.max(-least), three, " kNm");
    if !moments.is_empty() {
        text.push_str(&format!(" Moment, sagging positive: {moments}."));
    }
    let (least, most) = shape::range(&data.stacked);
    let size = most.max(-least);
    text.push_str(&format!(
        " Deflections for {}, drawn {}.",
        data.characteristic,
        deflection::in_words(deflection::factor(data))
    ));
    for (name, curve) in [("Own", &data.own), ("Stacked", &data.stacked)] {
        let found = peaks(curve, 1e3, size, tenth, " mm");
        if !found.is_empty() {
            text.push_str(&format!(" {name} deflection: {found}."));
        }
    }
    text
}

pub(in super::super) fn listed(words: impl Iterator<Item = String>) -> String {
    let words: Vec<String> = words.collect();
    match words.as_slice() {
        [] => String::new(),
        [one] => one.clone(),
        [head @ .., last] => format!("{} and {last}", head.join(", ")),
    }
}
