//! `restraint` of a beam.

use sagledger_calc::building::{FlangeHold, Restraint};
use sagledger_calc::quantity::Length;
use toml::de::DeValue;

use crate::job::bounds;
use crate::job::findings::Findings;
use crate::job::keys;
use crate::job::quantity::Quantity;
use crate::job::registry::Name;
use crate::job::values::quoted;
use crate::job::view::{At, Item, Table};

/// Restraint as typed; places are checked against the beam's length later.
#[derive(Clone, Default)]
pub(crate) struct TypedRestraint {
    pub top: Option<TypedHold>,
    pub bottom: Option<TypedHold>,
    pub by: Option<String>,
}

#[derive(Clone)]
pub(crate) enum TypedHold {
    Continuous,
    Ends,
    At(Vec<At<Quantity>>),
}

impl TypedRestraint {
    pub fn meant(&self) -> Restraint {
        let hold = |hold: &Option<TypedHold>| match hold {
            None | Some(TypedHold::Ends) => FlangeHold::Ends,
            Some(TypedHold::Continuous) => FlangeHold::Continuous,
            Some(TypedHold::At(places)) => {
                FlangeHold::At(places.iter().map(|place| Length::from_si(place.value.si)).collect())
            }
        };
        Restraint { top: hold(&self.top), bottom: hold(&self.bottom), by: self.by.clone() }
    }

    pub fn places(&self) -> impl Iterator<Item = &[At<Quantity>]> {
        [&self.top, &self.bottom].into_iter().filter_map(|hold| match hold {
            Some(TypedHold::At(places)) => Some(places.as_slice()),
            _ => None,
        })
    }
}

pub(super) fn read(item: &Item, found: &mut Findings) -> Option<TypedRestraint> {
    if let Some(text) = item.value.as_str() {
        if text == "ends" {
            return Some(TypedRestraint { top: Some(TypedHold::Ends), bottom: Some(TypedHold::Ends), by: None });
        }
        let fact = format!("{} alone says no flange", quoted(text));
        let remedy = match text {
            "continuous" => "write { top = \"continuous\" }",
            _ => "write \"ends\" or { top = … }",
        };
        found.add(item.fault(Name::ValueUnknown, fact, remedy));
        return None;
    }
    let table: Table = item.table(&keys::RESTRAINT, found)?;
    Some(TypedRestraint {
        top: table.field("top", found, hold).value().cloned(),
        bottom: table.field("bottom", found, hold).value().cloned(),
        by: table.field("by", found, Item::text).value().cloned(),
    })
}

fn hold(item: &Item, found: &mut Findings) -> Option<TypedHold> {
    if let DeValue::String(text) = item.value {
        return match text.as_ref() {
            "continuous" => Some(TypedHold::Continuous),
            "ends" => Some(TypedHold::Ends),
            _ => {
                let fact = format!("{} is not a value of {}", quoted(text), item.key);
                let remedy = "write \"continuous\", \"ends\" or places: [\"1.5 m\"]";
                found.add(item.fault(Name::ValueUnknown, fact, remedy));
                None
            }
        };
    }
    let items = item.list(found)?;
    let places: Vec<Option<At<Quantity>>> = items
        .iter()
        .map(|item| {
            let value = item.quantity(&bounds::PLACE, found)?;
            Some(At { value, span: item.span.clone() })
        })
        .collect();
    let places: Vec<At<Quantity>> = places.into_iter().collect::<Option<_>>()?;
    for pair in places.windows(2) {
        if pair[1].value.si <= pair[0].value.si {
            let fact = format!("{} does not lie beyond {}", pair[1].value.typed, pair[0].value.typed);
            let place = Some(pair[1].span.clone());
            found.add(crate::job::fault::Fault::new(
                Name::NotIncreasing,
                place,
                fact,
                "list places along the beam",
            ));
        }
    }
    Some(TypedHold::At(places))
}
