//! `[[build-up]]`: an area load built from layers.

use sagledger_calc::actions::Category;
use sagledger_calc::building::{BuildUp, ImposedArea, Layer, LayerWeight, Origin};
use sagledger_calc::quantity::{AreaLoad, Length, WeightDensity};

use crate::job::bounds;
use crate::job::fault::{Fault, Span};
use crate::job::findings::Findings;
use crate::job::keys;
use crate::job::registry::Name;
use crate::job::view::{At, Field, Item, Table};

pub(crate) struct TypedBuildUp {
    pub name: Option<At<String>>,
    pub place: Span,
    /// The keys that keep it from being taken along a height.
    pub on_plan: Vec<&'static str>,
    pub has_wind: bool,
    /// What it means; none where something in it is at fault. Its origin is set where the building is made.
    pub meant: Option<BuildUp>,
}

pub(super) fn read(table: &Table, found: &mut Findings) -> TypedBuildUp {
    let name = table.required("name", found, Item::name);
    let pitch = table.field("pitch", found, |item, f| item.quantity(&bounds::PITCH, f));
    let layers = table.field("layers", found, layers);
    let imposed = table.field("imposed", found, imposed);
    let area = |key, bounds, found: &mut Findings| {
        let field = table.field(key, found, |item, f| item.quantity(bounds, f));
        match field {
            Field::Absent => Some(None),
            Field::Faulty => None,
            Field::Given(at) => Some(Some(AreaLoad::from_si(at.value.si))),
        }
    };
    let snow = area("snow", &bounds::SNOW_AREA, found);
    let wind = area("wind", &bounds::WIND_AREA, found);
    let parts = ["layers", "imposed", "snow", "wind"];
    if table.first_of(&parts).is_none() && !parts.iter().any(|key| table.hides(key)) {
        let called = name.value().map_or("this build-up".to_string(), Clone::clone);
        let fact = format!("{called} has no load");
        found.add(Fault::new(
            Name::BuildUpEmpty,
            Some(table.place.clone()),
            fact,
            "add layers, imposed, snow or wind",
        ));
    }
    let meant = || {
        Some(BuildUp {
            name: name.value()?.clone(),
            pitch: known(&pitch)?.map_or(0.0, |quantity| quantity.si),
            layers: known(&layers)?.cloned().unwrap_or_default(),
            imposed: known(&imposed)?.copied(),
            snow: snow?,
            wind: wind?,
            origin: Origin::default(),
        })
    };
    TypedBuildUp {
        name: super::referable(table, "name"),
        place: table.place.clone(),
        on_plan: ["pitch", "imposed", "snow", "wind"].into_iter().filter(|key| table.has(key)).collect(),
        has_wind: table.has("wind") || table.hides("wind"),
        meant: meant(),
    }
}

/// What a key gave, unless it is at fault.
fn known<T>(field: &Field<T>) -> Option<Option<&T>> {
    match field {
        Field::Absent => Some(None),
        Field::Faulty => None,
        Field::Given(at) => Some(Some(&at.value)),
    }
}

fn layers(item: &Item, found: &mut Findings) -> Option<Vec<Layer>> {
    let items = item.list(found)?;
    let layers: Vec<Option<Layer>> = items.iter().map(|item| layer(item, found)).collect();
    layers.into_iter().collect()
}

fn layer(item: &Item, found: &mut Findings) -> Option<Layer> {
    let mut table = item.table(&keys::LAYER, found)?;
    let what = table.required("what", found, Item::text);
    table.called = what.value().map_or("this layer".to_string(), Clone::clone);
    let load = table.field("load", found, |item, f| item.quantity(&bounds::LAYER_LOAD, f));
    let thickness = table.field("thickness", found, |item, f| item.quantity(&bounds::THICKNESS, f));
    let density = table.field("density", found, |item, f| item.quantity(&bounds::DENSITY, f));
    let thick = !thickness.is_absent() || !density.is_absent();
    if !load.is_absent() && thick {
        let fact = format!("{} has a load and a thickness", table.called);
        found.add(item.fault(Name::LayerMixed, fact, "give its load, or a thickness with a density"));
        return None;
    }
    if load.is_absent() && !thick {
        let fact = format!("{} has no load", table.called);
        let remedy = "add load, or a thickness with a density";
        found.add(Fault::new(Name::KeyMissing, Some(table.place.clone()), fact, remedy));
        return None;
    }
    if thick {
        table.require("thickness", found);
        table.require("density", found);
    }
    let weight = match load.value() {
        Some(load) => LayerWeight::Load(AreaLoad::from_si(load.si)),
        None => LayerWeight::Thick {
            thickness: Length::from_si(thickness.value()?.si),
            density: WeightDensity::from_si(density.value()?.si),
        },
    };
    Some(Layer { what: what.value()?.clone(), weight })
}

fn imposed(item: &Item, found: &mut Findings) -> Option<ImposedArea> {
    let table = item.table(&keys::IMPOSED, found)?;
    let category = match table.get("category") {
        Some(item) => category(item, found),
        None if !table.hides("category") => {
            let fact = "an imposed load without its category";
            found.add(Fault::new(Name::CategoryMissing, Some(table.place.clone()), fact, "add category, A to H"));
            None
        }
        None => None,
    };
    let load = table.required("load", found, |item, f| item.quantity(&bounds::IMPOSED_AREA, f));
    let partitions = table.field("partitions", found, |item, f| item.quantity(&bounds::PARTITIONS, f));
    Some(ImposedArea {
        category: category?,
        load: AreaLoad::from_si(load.value()?.si),
        partitions: known(&partitions)?.map(|quantity| AreaLoad::from_si(quantity.si)),
    })
}

/// A category of EN 1991-1-1 6.3 by its letter.
pub(super) fn category(item: &Item, found: &mut Findings) -> Option<Category> {
    let text = match item.value.as_str() {
        Some(text) => text,
        None => &item.reference(found)?,
    };
    let category = Category::ALL.into_iter().find(|c| text.chars().eq([c.letter()]));
    if category.is_none() {
        let fact = format!("{} is no category of imposed load", crate::job::values::quoted(text));
        let lower = Category::ALL.into_iter().find(|c| text.eq_ignore_ascii_case(&c.letter().to_string()));
        let fault = item.fault(Name::ValueUnknown, fact, "write one of \"A\" to \"H\"");
        found.add(match lower {
            Some(c) => Fault { remedy: format!("write \"{}\"", c.letter()), ..fault }
                .replaced_by(format!("\"{}\"", c.letter())),
            None => fault,
        });
    }
    category
}
