//! A row of loads as typed: which of the four kinds it is, and its values.

use sagledger_calc::actions::Category;
use sagledger_calc::building::{LoadHeight, Stage};
use toml::de::DeValue;

use super::build_up;
use crate::job::bounds::{self, Bounds};
use crate::job::fault::{Fault, Span};
use crate::job::findings::Findings;
use crate::job::quantity::{self, Dimension, Quantity};
use crate::job::registry::Name;
use crate::job::view::{Field, Item, Table};

pub(crate) struct TypedLoad {
    pub place: Span,
    pub what: Field<String>,
    pub stage: Option<Stage>,
    pub height: Option<LoadHeight>,
    pub offset: Option<Quantity>,
    pub wind_case: Field<String>,
    /// Where `wind-case` stands, to say that it means nothing here.
    pub wind_case_key: Option<Span>,
    pub from: Field<Quantity>,
    pub to: Field<Quantity>,
    pub at: Field<Quantity>,
    pub kind: TypedKind,
}

pub(crate) enum TypedKind {
    Area {
        build_up: Field<String>,
        width: Option<(f64, f64)>,
    },
    Wall {
        build_up: Field<String>,
        height: Option<(f64, f64)>,
    },
    /// A line load, or a point load where the row has `at`.
    Direct(Actions),
    /// What it is meant to be is at fault.
    Unclear {
        build_up: Field<String>,
    },
}

/// Actions given directly, SI.
#[derive(Default)]
pub(crate) struct Actions {
    pub permanent: Option<f64>,
    pub imposed: Option<(Category, f64)>,
    pub snow: Option<f64>,
    pub wind: Option<f64>,
    /// One of them is at fault.
    pub faulty: bool,
}

const DIRECT: [&str; 4] = ["permanent", "imposed", "snow", "wind"];

const STAGES: [(&str, Stage); 2] = [("before", Stage::Before), ("after", Stage::After)];

const HEIGHTS: [(&str, LoadHeight); 3] = [
    ("top flange", LoadHeight::TopFlange),
    ("shear centre", LoadHeight::ShearCentre),
    ("bottom flange", LoadHeight::BottomFlange),
];

pub(super) fn load_height(item: &Item, found: &mut Findings) -> Option<LoadHeight> {
    item.choice(&HEIGHTS, found)
}

pub(super) fn read(mut table: Table, found: &mut Findings) -> TypedLoad {
    let what = table.required("what", found, Item::text);
    table.called = what.value().cloned().unwrap_or_else(|| "this load".into());
    let stage = table.field("stage", found, |item, f| item.choice(&STAGES, f)).value().copied();
    let height = table.field("load-height", found, load_height).value().copied();
    let offset = table.field("offset", found, |item, f| item.quantity(&bounds::OFFSET, f)).value().cloned();
    let wind_case = table.field("wind-case", found, Item::name);
    let place = |key, found: &mut Findings| table.field(key, found, |item, f| item.quantity(&bounds::PLACE, f));
    let (from, to, at) = (place("from", found), place("to", found), place("at", found));
    let kind = kind(&table, found);
    if !matches!(kind, TypedKind::Direct(_) | TypedKind::Unclear { .. }) {
        if !at.is_absent() {
            mixed_place(&table, "only a point load has one place", "give from and to, or neither", found);
        }
        let remedy = "put the action in a row of its own";
        table.out_of_place("category", "category without imposed", remedy, found);
    }
    TypedLoad {
        place: table.place.clone(),
        what,
        stage,
        height,
        offset,
        wind_case,
        wind_case_key: table.get("wind-case").map(|item| item.key_span.clone()),
        from,
        to,
        at,
        kind,
    }
}

fn kind(table: &Table, found: &mut Findings) -> TypedKind {
    let build_up = table.field("build-up", found, Item::reference);
    let direct = table.first_of(&DIRECT);
    let sized = table.first_of(&["width", "height"]);
    let unclear = |name, span: &Span, fact: String, remedy: &str, build_up, found: &mut Findings| {
        found.add(Fault::new(name, Some(span.clone()), fact, remedy));
        TypedKind::Unclear { build_up }
    };
    let called = &table.called;
    match (&build_up, direct, sized) {
        (Field::Absent, None, None) => {
            // A key that a slip of the pen hides, such as "permanant", has been told.
            let hidden = DIRECT.iter().chain(&["width", "height"]).any(|key| table.hides(key));
            match hidden {
                true => TypedKind::Unclear { build_up },
                false => {
                    let fact = format!("{called} has neither a build-up nor an action");
                    let remedy = "give it a build-up, or an action such as permanent";
                    unclear(Name::LoadEmpty, &table.place, fact, remedy, build_up, found)
                }
            }
        }
        (Field::Absent, Some(_), None) => direct_actions(table, found),
        (Field::Absent, None, Some(item)) => {
            let fact = format!("a {} without a build-up", item.key);
            unclear(Name::LoadUnsized, &item.key_span, fact, "add the build-up that it is of", build_up, found)
        }
        (Field::Absent, Some(_), Some(item)) => {
            let fact = format!("a {} beside actions given directly", item.key);
            unclear(Name::LoadMixed, &item.key_span, fact, "take it out, or make two rows", build_up, found)
        }
        (_, Some(item), _) => {
            let fact = format!("{} beside a build-up", item.key);
            unclear(Name::LoadMixed, &item.key_span, fact, "put it in a row of its own", build_up, found)
        }
        (_, None, _) => sized_build_up(table, build_up, found),
    }
}

fn sized_build_up(table: &Table, build_up: Field<String>, found: &mut Findings) -> TypedKind {
    match (table.get("width"), table.get("height")) {
        (Some(_), Some(height)) => {
            let remedy = "take one of them out, or make two rows";
            let place = Some(height.key_span.clone());
            found.add(Fault::new(Name::LoadMixed, place, "a width and a height in one row", remedy));
            TypedKind::Unclear { build_up }
        }
        (Some(width), None) => TypedKind::Area { build_up, width: pair(width, &bounds::WIDTH, found) },
        (None, Some(height)) => TypedKind::Wall { build_up, height: pair(height, &bounds::HEIGHT, found) },
        (None, None) => {
            if !table.hides("width") && !table.hides("height") {
                let place = table.get("build-up").map(|item| item.span.clone());
                let fact = format!("{} has no width or height", table.called);
                found.add(Fault::new(Name::LoadUnsized, place, fact, "add width = \"3.40 m\" or a height"));
            }
            TypedKind::Unclear { build_up }
        }
    }
}

/// One quantity, or a pair of which one may be nothing. SI.
fn pair(item: &Item, bounds: &Bounds, found: &mut Findings) -> Option<(f64, f64)> {
    let DeValue::Array(_) = item.value else {
        let both = item.quantity(bounds, found)?.si;
        return Some((both, both));
    };
    let items = item.list(found)?;
    let [first, last] = items.as_slice() else {
        let fact = format!("{} has {} values", item.key, items.len());
        found.add(item.fault(Name::PairMalformed, fact, "give one value, or two: at the row's ends"));
        return None;
    };
    // Nothing lies below the least value of the table, and is right at one end.
    let mut value = |item: &Item| match item.value.as_str().map(|text| quantity::si(text, bounds.dimension)) {
        Some(Some(0.0)) => Some(0.0),
        _ => item.quantity(bounds, found).map(|quantity| quantity.si),
    };
    let (first, last) = (value(first), value(last));
    let (first, last) = (first?, last?);
    if first == 0.0 && last == 0.0 {
        let fact = format!("{} is nothing at both ends", item.key);
        found.add(item.fault(Name::PairMalformed, fact, "let one end be more than 0"));
        return None;
    }
    Some((first, last))
}

fn mixed_place(table: &Table, fact: &str, remedy: &str, found: &mut Findings) {
    let place = table.get("at").map(|item| item.key_span.clone());
    found.add(Fault::new(Name::LoadPlaceMixed, place, fact, remedy));
}

fn direct_actions(table: &Table, found: &mut Findings) -> TypedKind {
    let unclear = TypedKind::Unclear { build_up: Field::Absent };
    let given: Vec<&Item> = DIRECT.iter().filter_map(|key| table.get(key)).collect();
    let all = |dimension| {
        given.iter().all(|item| item.value.as_str().and_then(quantity::dimension_of) == Some(dimension))
    };
    let has_at = table.has("at") || table.hides("at");
    let has_stretch = table.has("from") || table.has("to");
    // The category is looked at before the row is given up: its faults are its own.
    let category = table.field("category", found, build_up::category);
    if has_at && has_stretch {
        mixed_place(table, "at beside from or to", "give at to a point load, from and to to others", found);
        return unclear;
    }
    if has_at && all(Dimension::LineLoad) {
        mixed_place(table, "a line load at one place", "give from and to, or the load in kN", found);
        return unclear;
    }
    if !has_at && all(Dimension::Force) {
        let place = given.first().map(|item| item.span.clone());
        let remedy = "add at = \"2.0 m\", or give the load in kN/m";
        found.add(Fault::new(Name::LoadPlaceMissing, place, "a point load without its place", remedy));
        return unclear;
    }
    let (plain, wind) = match has_at {
        true => (&bounds::POINT_LOAD, &bounds::POINT_WIND),
        false => (&bounds::LINE_LOAD, &bounds::LINE_WIND),
    };
    let mut actions = Actions::default();
    let mut read = |key, bounds| match table.field(key, found, |item, f| item.quantity(bounds, f)) {
        Field::Given(at) => Some(at.value.si),
        Field::Faulty => {
            actions.faulty = true;
            None
        }
        Field::Absent => None,
    };
    let (permanent, imposed) = (read("permanent", plain), read("imposed", plain));
    let (snow, wind) = (read("snow", plain), read("wind", wind));
    actions.permanent = permanent;
    actions.snow = snow;
    actions.wind = wind;
    match (table.get("imposed"), &category) {
        (Some(item), Field::Absent) => {
            let fact = "an imposed load without its category";
            found.add(item.fault(Name::CategoryMissing, fact, "add category, A to H"));
            actions.faulty = true;
        }
        (None, Field::Given(_)) if !table.hides("imposed") => {
            let remedy = "take it out, or add the imposed load";
            table.out_of_place("category", "category without imposed", remedy, found);
        }
        _ => {}
    }
    match (imposed, category.value()) {
        (Some(load), Some(category)) => actions.imposed = Some((*category, load)),
        (Some(_), None) => actions.faulty = true,
        _ => {}
    }
    TypedKind::Direct(actions)
}
