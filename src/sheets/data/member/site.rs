//! What has to be fixed on site: seats, joints, holding down, restraint, ordering length.

use sagledger_calc::building::{Beam, Carrier, EndRestraint, FlangeHold, Joint};
use sagledger_calc::results::BeamResult;
use sagledger_calc::workings::decimal::{self, Decimal};
use sagledger_calc::workings::unit::Unit;

use super::{Labelled, on_label};
use crate::data::text::keys;
use crate::data::text::{Run, Runs, sheet, to, value, words};
use crate::data::view::{View, along};

pub(super) fn items(view: View, beam: &Beam, result: &BeamResult) -> Vec<Labelled> {
    let mut items = Vec::new();
    let mut item = |label: Run, body: Runs| items.push(Labelled { label, body, beside: None, plain: true });
    for (bearing, found) in beam.bearings.iter().zip(&result.bearings) {
        let kn = |si: f64| value(decimal::three_figures(si, Unit::Kn), "kN");
        let held = match bearing.end_restraint {
            EndRestraint::Fork => "held against lateral movement and twist",
            EndRestraint::BottomFlangeHeld => "bottom flange held",
            EndRestraint::Resting => "the beam rests on it",
        };
        let mut body: Runs = Vec::new();
        match bearing.on {
            Carrier::Wall(_) => {
                if let Some(length) = bearing.bearing_length {
                    body.push(words("Seat of "));
                    body.push(value(mm(length.si()), "mm"));
                    body.push(words(", "));
                }
                body.push(words(format!("{held}; ")));
                body.push(kn(found.design_max.value.si()));
                body.push(words(" down, design"));
                if bearing.settles.si() != 0.0 {
                    body.push(words("; settles by "));
                    body.push(value(decimal::movement(bearing.settles.si()), "mm"));
                }
            }
            Carrier::Beam { beam: carrier, lands } => {
                let joint = match bearing.joint {
                    Joint::OnTopFlange => "On its top flange",
                    Joint::ToTheWeb => "To its web",
                };
                body.push(words(format!("{joint} at ")));
                body.push(value(along(lands.si()), "m"));
                body.push(words(" of "));
                body.push(to(keys::beam(carrier), view.mark(carrier)));
                body.push(words(format!(", {held}; the joint carries ")));
                body.push(kn(found.design_max.value.si()));
                body.push(words(" down, design ("));
                body.push(sheet(keys::beam(carrier)));
                body.push(words(")"));
            }
        }
        let lifts = found.uplift_max().si();
        if lifts > 0.0 {
            body.push(words(", and "));
            body.push(kn(lifts));
            body.push(words(" up"));
        }
        if let Some(held_down) = bearing.held_down {
            body.push(words("; held down for "));
            body.push(kn(held_down.si()));
        }
        body.push(words("."));
        item(on_label(view, bearing.on), body);
    }
    for (name, hold) in [("top flange", &beam.restraint.top), ("bottom flange", &beam.restraint.bottom)] {
        let by = beam.restraint.by.as_ref().map(|by| format!(": {by}")).unwrap_or_default();
        match hold {
            FlangeHold::Ends => {}
            FlangeHold::Continuous => item(words(name), vec![words(format!("Held along its whole length{by}."))]),
            FlangeHold::At(places) => {
                let places: Vec<String> = places.iter().map(|p| along(p.si())).collect();
                let text = format!("Held at the bearings and at {} m{by}.", places.join(", "));
                item(words(name), vec![words(text)]);
            }
        }
    }
    if beam.existing {
        item(words("existing"), vec![words("The beam stands already; nothing is ordered.")]);
    } else {
        let length = decimal::places(result.cut_length.si(), 3, Unit::M);
        let mass = decimal::three_figures(result.mass, Unit::One);
        item(
            words("ordering length"),
            vec![value(length, "m"), words(", "), value(mass, "kg"), words(", one off.")],
        );
    }
    items
}

fn mm(si: f64) -> String {
    match Decimal::as_typed(si, 5) {
        Some(typed) => typed.moved(3).without_trailing_zeros().to_string(),
        None => decimal::movement(si),
    }
}
