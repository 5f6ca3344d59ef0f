//! A bearing of a beam as typed.

use sagledger_calc::building::{EndRestraint, Joint};

use crate::job::bounds;
use crate::job::fault::Span;
use crate::job::findings::Findings;
use crate::job::keys;
use crate::job::quantity::Quantity;
use crate::job::registry::Name;
use crate::job::values::quoted;
use crate::job::view::{Field, Item, Table};

pub(crate) struct TypedBearing {
    pub place: Span,
    pub on: Field<String>,
    pub at: Field<Quantity>,
    pub lands: Field<Quantity>,
    pub bearing_length: Field<Quantity>,
    pub joint: Field<Joint>,
    pub end_restraint: Field<EndRestraint>,
    pub held_down: Field<Quantity>,
    pub settles: Field<Quantity>,
    pub offset: Field<Quantity>,
    /// Where each key stands, to say that it means nothing here.
    pub keys: Vec<(&'static str, Span)>,
}

impl TypedBearing {
    pub fn key_span(&self, key: &str) -> Option<&Span> {
        self.keys.iter().find(|(name, _)| *name == key).map(|(_, span)| span)
    }
}

const END_RESTRAINTS: [(&str, EndRestraint); 3] = [
    ("fork", EndRestraint::Fork),
    ("bottom flange held", EndRestraint::BottomFlangeHeld),
    ("resting", EndRestraint::Resting),
];

const JOINTS: [(&str, Joint); 2] = [("on top flange", Joint::OnTopFlange), ("to the web", Joint::ToTheWeb)];

/// Joints on posts, which a later version brings.
const LATER_JOINTS: [&str; 2] = ["cap plate", "to its side"];

pub(super) fn read(item: &Item, found: &mut Findings) -> Option<TypedBearing> {
    let mut table: Table = item.table(&keys::BEARING, found)?;
    table.called = "this bearing".into();
    let length = |key, bounds, found: &mut Findings| table.field(key, found, |item, f| item.quantity(bounds, f));
    Some(TypedBearing {
        place: item.span.clone(),
        on: table.required("on", found, Item::reference),
        at: length("at", &bounds::PLACE, found),
        lands: length("lands", &bounds::PLACE, found),
        bearing_length: length("bearing-length", &bounds::SEAT, found),
        joint: table.field("joint", found, joint),
        end_restraint: table.field("end-restraint", found, |item, f| item.choice(&END_RESTRAINTS, f)),
        held_down: length("held-down", &bounds::HELD_DOWN, found),
        settles: length("settles", &bounds::SETTLEMENT, found),
        offset: length("offset", &bounds::OFFSET, found),
        keys: keys::BEARING
            .now
            .iter()
            .filter_map(|(key, _)| table.get(key).map(|item| (*key, item.key_span.clone())))
            .collect(),
    })
}

fn joint(item: &Item, found: &mut Findings) -> Option<Joint> {
    if let Some(text) = item.value.as_str().filter(|text| LATER_JOINTS.contains(text)) {
        let fact = format!("{} is not in this version", quoted(text));
        found.add(item.fault(Name::NotInThisVersion, fact, "write \"on top flange\" or \"to the web\""));
        return None;
    }
    item.choice(&JOINTS, found)
}
