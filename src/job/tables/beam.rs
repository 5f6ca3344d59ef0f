//! `[[beam]]` as typed.

use sagledger_calc::building::LoadHeight;
use sagledger_calc::limits::LimitTable;
use sagledger_calc::materials::Grade;
use sagledger_calc::sections::{self, Section};
use toml::de::DeValue;

use super::bearing::{self, TypedBearing};
use super::load::{self, TypedLoad};
use super::restraint::{self, TypedRestraint};
use super::{basis, limits};
use crate::job::bounds;
use crate::job::fault::{Fault, Span};
use crate::job::findings::Findings;
use crate::job::keys;
use crate::job::quantity::Quantity;
use crate::job::registry::Name;
use crate::job::values::{either, quoted};
use crate::job::view::{At, Field, Item, Table};

pub(crate) struct TypedBeam {
    /// The mark, good enough for a package.
    pub mark: Field<String>,
    /// The mark as others may refer to it, whatever is wrong with it.
    pub known_as: Option<At<String>>,
    pub called: String,
    pub place: Span,
    pub title: Option<String>,
    pub section: Field<&'static Section>,
    pub grade: Field<Grade>,
    pub existing: bool,
    pub length: Field<Quantity>,
    /// In the order of the file; those that are no tables are missing.
    pub bearings: Vec<TypedBearing>,
    /// Every bearing could be read, so that first and last are known.
    pub all_bearings: bool,
    pub restraint: Field<TypedRestraint>,
    pub load_height: Option<LoadHeight>,
    pub limits: LimitTable,
    pub loads: Vec<TypedLoad>,
}

/// Families of the language that a later version brings.
const LATER_FAMILIES: [&str; 6] = ["PFC", "IPE", "HEA", "HEB", "SHS", "RHS"];

pub(super) fn read(mut table: Table, found: &mut Findings) -> TypedBeam {
    let mark = table.required("mark", found, Item::name);
    table.called = super::called(&mark, "this beam");
    let title = table.field("title", found, Item::text).value().cloned();
    let section = table.required("section", found, section);
    let grade = table.field("grade", found, basis::grade);
    let existing = table.field("existing", found, Item::flag).value().copied().unwrap_or(false);
    let length = table.required("length", found, |item, f| item.quantity(&bounds::BEAM_LENGTH, f));
    let (bearings, all_bearings) = bearings(&table, found);
    let restraint = table.field("restraint", found, restraint::read);
    let load_height = table.field("load-height", found, load::load_height).value().copied();
    let limits = match table.get("limits").and_then(|item| item.table(&keys::LIMITS, found)) {
        Some(table) => limits::read(&table, found),
        None => LimitTable::default(),
    };
    let loads = super::rows(&table, "load", &keys::LOAD, found).into_iter().map(|t| load::read(t, found)).collect();
    TypedBeam {
        known_as: super::referable(&table, "mark"),
        mark,
        called: table.called,
        place: table.place,
        title,
        section,
        grade,
        existing,
        length,
        bearings,
        all_bearings,
        restraint,
        load_height,
        limits,
        loads,
    }
}

fn bearings(table: &Table, found: &mut Findings) -> (Vec<TypedBearing>, bool) {
    let Some(item) = table.require("bearings", found) else { return (Vec::new(), false) };
    let values = match item.value {
        DeValue::Array(values) if values.is_empty() => Vec::new(),
        _ => match item.list(found) {
            Some(items) => items,
            None => return (Vec::new(), false),
        },
    };
    if values.len() < 2 {
        let fact = match values.len() {
            0 => format!("{} has no bearing", table.called),
            _ => format!("{} has one bearing", table.called),
        };
        found.add(item.fault(Name::BearingsTooFew, fact, "give it two or more"));
    }
    let count = values.len();
    let read: Vec<TypedBearing> = values.iter().filter_map(|item| bearing::read(item, found)).collect();
    let all = read.len() == count && count >= 2;
    (read, all)
}

fn section(item: &Item, found: &mut Findings) -> Option<&'static Section> {
    if let DeValue::Table(table) = item.value {
        let choose = table.get("choose").is_some();
        let (fact, remedy) = match choose {
            true => ("choose is not in this version", "name one section"),
            false => ("section is a table, not text", "name one section"),
        };
        let name = if choose { Name::NotInThisVersion } else { Name::TypeWrong };
        found.add(item.fault(name, fact, format!("{remedy}: \"203x102x23 UB\"")));
        return None;
    }
    let text = item.reference(found)?;
    if let Some(section) = sections::find(&text) {
        return Some(section);
    }
    let family: String =
        text.chars().filter(char::is_ascii_alphabetic).filter(|c| !matches!(c, 'x' | 'X')).collect();
    if let Some(later) = LATER_FAMILIES.iter().find(|name| family.eq_ignore_ascii_case(name)) {
        let fact = format!("{later} sections are not in this version");
        found.add(item.fault(Name::NotInThisVersion, fact, "take a UB or a UC"));
        return None;
    }
    let fact = format!("no section is called {}", quoted(&text));
    let near = if found.may_look_for_near_names() { sections::nearest(&text) } else { Vec::new() };
    let names: Vec<String> = near.iter().take(3).map(|name| format!("\"{name}\"")).collect();
    found.add(match names.as_slice() {
        [] => item.fault(Name::SectionUnknown, fact, "write it as in \"203x102x23 UB\""),
        [one] => item.fault(Name::SectionUnknown, fact, format!("there is {one}")).replaced_by(one),
        several => item.fault(Name::SectionUnknown, fact, format!("there is {}", either(several))),
    });
    None
}

/// A fault about a place that lies beyond the end of a beam.
pub(in crate::job) fn beyond(name: Name, place: &Span, beam: &str, length: &Quantity) -> Fault {
    let fact = format!("{beam} is {} long", length.typed);
    let unit = length.typed.rsplit(' ').next().unwrap_or("m");
    Fault::new(name, Some(place.clone()), fact, format!("measure along {beam}: 0 {unit} to {}", length.typed))
}
