//! Where things are along a beam: stretches, and the places between which everything is polynomial.

use crate::analysis::loads::{Resolved, Shape};
use crate::building::{Beam, Building, Carrier};
use crate::quantity::Length;
use crate::results::{Landing, Stretch, StretchKind};

/// From the first end to the last: an end beyond the outer bearing if there is one, the spans, the other end.
pub fn stretches(beam: &Beam) -> Vec<Stretch> {
    let length = beam.length.si();
    let depth = beam.section.h.si();
    let mut stretches = Vec::new();
    let mut push = |kind, from: f64, to: f64| {
        stretches.push(Stretch { kind, from: Length::from_si(from), to: Length::from_si(to) });
    };
    let end = |size: f64| if size < depth { StretchKind::SeatEnd } else { StretchKind::Overhang };
    let first = beam.bearings.first().map_or(0.0, |b| b.at.si());
    let last = beam.bearings.last().map_or(length, |b| b.at.si());
    if first > 0.0 {
        push(end(first), 0.0, first);
    }
    for pair in beam.bearings.windows(2) {
        push(StretchKind::Span, pair[0].at.si(), pair[1].at.si());
    }
    if last < length {
        push(end(length - last), last, length);
    }
    stretches
}

/// Beams that land on each beam of the building, by place along it; ties in the order of the building.
pub fn landings(building: &Building) -> Vec<Vec<Landing>> {
    let mut landings = vec![Vec::new(); building.beams.len()];
    for (beam, b) in building.beams.iter().enumerate() {
        for (bearing, seat) in b.bearings.iter().enumerate() {
            if let Carrier::Beam { beam: carrier, lands } = seat.on {
                landings[carrier].push(Landing { beam, bearing, at: lands });
            }
        }
    }
    for list in &mut landings {
        list.sort_by(|a: &Landing, b: &Landing| a.at.si().total_cmp(&b.at.si()));
    }
    landings
}

/// All places along a beam where a load, a landing, a bearing or the beam itself begins or ends, in order.
pub fn breaks(beam: &Beam, rows: &[Resolved], landings: &[Landing]) -> Vec<f64> {
    let length = beam.length.si();
    let mut places = vec![0.0, length];
    places.extend(beam.bearings.iter().map(|b| b.at.si()));
    places.extend(landings.iter().map(|l| l.at.si()));
    for row in rows {
        match row.shape {
            Shape::Line { from, to, .. } => places.extend([from, to]),
            Shape::Point { at } => places.push(at),
        }
    }
    places.retain(|x| *x >= 0.0 && *x <= length);
    places.sort_by(f64::total_cmp);
    places.dedup();
    places
}
