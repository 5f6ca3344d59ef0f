//! Bearings as they are meant: what they stand on, where they lie, and which of their keys mean something there.

use sagledger_calc::building::{Bearing, Carrier, EndRestraint, Joint};
use sagledger_calc::quantity::{Force, Length};

use super::names::{Names, Support, with_article};
use crate::job::bounds;
use crate::job::fault::{Fault, Span};
use crate::job::findings::Findings;
use crate::job::origins::Origins;
use crate::job::registry::Name;
use crate::job::tables::beam::{TypedBeam, beyond};
use crate::job::tables::bearing::TypedBearing;
use crate::job::tables::{self, Typed};
use crate::job::view::Field;

pub(super) fn meant(
    beam: &TypedBeam,
    typed: &Typed,
    names: &Names,
    origins: &mut Origins,
    found: &mut Findings,
) -> Vec<Option<Bearing>> {
    let places = places(beam, found);
    let bearings = beam.bearings.iter().zip(places);
    bearings
        .map(|(bearing, at)| {
            let origin = origins.mark(&tables::place_of(&bearing.on, &bearing.place));
            let on = carrier(bearing, typed, names, found);
            let wall = matches!(on, Some(Carrier::Wall(_)));
            let length = |field: &Field<_>| known(field).map(|q: Option<f64>| q.map(Length::from_si));
            let on = on?;
            let seat = length(&bearing.bearing_length)?;
            Some(Bearing {
                on,
                at: Length::from_si(at?),
                bearing_length: wall.then(|| seat.unwrap_or(Length::from_si(bounds::SEAT_DEFAULT))),
                bearing_length_defaulted: wall && seat.is_none(),
                joint: choice(&bearing.joint)?.unwrap_or(Joint::OnTopFlange),
                joint_defaulted: !wall && bearing.joint.is_absent(),
                end_restraint: choice(&bearing.end_restraint)?.unwrap_or(match wall {
                    true => EndRestraint::Resting,
                    false => EndRestraint::BottomFlangeHeld,
                }),
                end_restraint_defaulted: bearing.end_restraint.is_absent(),
                held_down: known(&bearing.held_down)?.map(Force::from_si),
                settles: length(&bearing.settles)?.unwrap_or_default(),
                offset: length(&bearing.offset)?.unwrap_or_default(),
                origin,
            })
        })
        .collect()
}

/// What a key gave in SI, unless it is at fault.
fn known(field: &Field<crate::job::quantity::Quantity>) -> Option<Option<f64>> {
    match field {
        Field::Absent => Some(None),
        Field::Faulty => None,
        Field::Given(at) => Some(Some(at.value.si)),
    }
}

fn choice<T: Copy>(field: &Field<T>) -> Option<Option<T>> {
    match field {
        Field::Absent => Some(None),
        Field::Faulty => None,
        Field::Given(at) => Some(Some(at.value)),
    }
}

/// Places along the beam in SI; none where one is at fault.
fn places(beam: &TypedBeam, found: &mut Findings) -> Vec<Option<f64>> {
    let last = beam.bearings.len().saturating_sub(1);
    let length = beam.length.value();
    let mut places: Vec<Option<f64>> = Vec::new();
    // The last place that is known, with where it stands.
    let mut before: Option<(f64, String)> = None;
    for (index, bearing) in beam.bearings.iter().enumerate() {
        let outer = index == 0 || index == last;
        let place = match &bearing.at {
            Field::Given(at) => Some((at.value.si, at.value.typed.clone(), at.span.clone())),
            Field::Faulty => None,
            Field::Absent if index == 0 => Some((0.0, "0 m".into(), bearing.place.clone())),
            Field::Absent if outer => length.map(|l| (l.si, l.typed.clone(), bearing.place.clone())),
            Field::Absent if beam.all_bearings => {
                let fact = "an inner bearing without its place";
                let remedy = "add at, measured along this beam";
                let place = tables::place_of(&bearing.on, &bearing.place);
                found.add(Fault::new(Name::BearingPlaceMissing, Some(place), fact, remedy));
                None
            }
            Field::Absent => None,
        };
        if let Some((at, typed, span)) = &place {
            match length {
                Some(length) if *at > length.si => {
                    found.add(beyond(Name::OutsideBeam, span, &beam.called, length));
                }
                _ => spacing(&before, *at, typed, span, found),
            }
            before = Some((*at, typed.clone()));
        }
        places.push(place.map(|(at, _, _)| at));
    }
    places
}

fn spacing(before: &Option<(f64, String)>, at: f64, typed: &str, span: &Span, found: &mut Findings) {
    let Some((previous, previous_typed)) = before else { return };
    // A difference of decimals is not exact: a nanometre is allowed for that.
    let distance = at - previous + 1e-9;
    if distance < 1e-8 {
        let fact = format!("a bearing at {typed}, not beyond {previous_typed}");
        let remedy = "list bearings along the beam, from its beginning";
        found.add(Fault::new(Name::NotIncreasing, Some(span.clone()), fact, remedy));
    } else if distance < bounds::BEARING_SPACING {
        let fact = format!("bearings less than {} apart", bounds::BEARING_SPACING_TEXT);
        let remedy = format!("move it away from {previous_typed}, or make one of the two");
        found.add(Fault::new(Name::BearingsTooClose, Some(span.clone()), fact, remedy));
    }
}

/// What a bearing stands on; keys that mean nothing there are faults.
fn carrier(bearing: &TypedBearing, typed: &Typed, names: &Names, found: &mut Findings) -> Option<Carrier> {
    let on = bearing.on.given()?;
    match names.support(&on.value) {
        None => {
            names.unknown_support(on, found);
            None
        }
        Some(Support::Later) => None,
        Some(Support::Wall(wall)) => {
            let remedy = "take it out, or name a beam in on";
            refuse(bearing, &["lands", "joint", "offset"], "bearings on beams", remedy, found);
            short_seat(bearing, &on.value, found);
            Some(Carrier::Wall(wall))
        }
        Some(Support::Beam(carrier)) => {
            let remedy = "take it out, or name a wall in on";
            refuse(bearing, &["bearing-length", "settles"], "bearings on walls", remedy, found);
            let other = &typed.beams[carrier];
            match &bearing.lands {
                Field::Absent => {
                    let place = Some(on.span.clone());
                    let fact = format!("a bearing on {} without its landing", other.called);
                    let remedy = format!("add lands, measured along {}", other.called);
                    found.add(Fault::new(Name::KeyMissing, place, fact, remedy));
                    None
                }
                Field::Faulty => None,
                Field::Given(lands) => {
                    let length = other.length.value();
                    if let Some(length) = length.filter(|length| lands.value.si > length.si) {
                        found.add(beyond(Name::LandsOutsideCarrier, &lands.span, &other.called, length));
                        return None;
                    }
                    Some(Carrier::Beam { beam: carrier, lands: Length::from_si(lands.value.si) })
                }
            }
        }
    }
}

fn refuse(bearing: &TypedBearing, keys: &[&str], belongs: &str, remedy: &str, found: &mut Findings) {
    for key in keys {
        if let Some(span) = bearing.key_span(key) {
            let fact = format!("{key} belongs to {belongs}");
            found.add(Fault::new(Name::KeyOutOfPlace, Some(span.clone()), fact, remedy));
        }
    }
}

fn short_seat(bearing: &TypedBearing, wall: &str, found: &mut Findings) {
    let Some(seat) = bearing.bearing_length.given() else { return };
    if seat.value.si < bounds::SEAT_SHORT {
        let fact = format!("a seat of {} on {}", seat.value.typed, with_article(wall));
        found.add(Fault::new(Name::SeatShort, Some(seat.span.clone()), fact, "100 mm is usual"));
    }
}
