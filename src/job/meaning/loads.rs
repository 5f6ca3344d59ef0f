//! Rows of loads as they are meant.

use sagledger_calc::building::{Direct, Load, LoadHeight, LoadRow, Stage, WindCase};
use sagledger_calc::quantity::{Force, Length, LineLoad};

use super::names::Names;
use crate::job::fault::Fault;
use crate::job::findings::Findings;
use crate::job::origins::Origins;
use crate::job::quantity::Quantity;
use crate::job::registry::Name;
use crate::job::tables::beam::{TypedBeam, beyond};
use crate::job::tables::load::{Actions, TypedKind, TypedLoad};
use crate::job::tables::{self, Typed};
use crate::job::view::{At, Field};

/// The name of the wind case that rows without one belong to.
const DEFAULT_WIND_CASE: &str = "wind";

/// The build-up that a row uses, as named.
pub(super) fn build_up_named(row: &TypedLoad) -> Option<&String> {
    build_up_field(row)?.value()
}

fn build_up_field(row: &TypedLoad) -> Option<&Field<String>> {
    match &row.kind {
        TypedKind::Area { build_up, .. } | TypedKind::Wall { build_up, .. } | TypedKind::Unclear { build_up } => {
            Some(build_up)
        }
        TypedKind::Direct(_) => None,
    }
}

pub(super) fn meant(
    row: &TypedLoad,
    beam: &TypedBeam,
    height: LoadHeight,
    typed: &Typed,
    names: &Names,
    origins: &mut Origins,
    found: &mut Findings,
) -> Option<LoadRow> {
    let origin = origins.mark(&tables::place_of(&row.what, &row.place));
    let build_up = build_up(row, names, found);
    let stretch = stretch(row, beam, found);
    let at = place(&row.at, beam, found);
    not_for_height(row, build_up, typed, found);
    wind_case_without_wind(row, build_up, typed, found);
    let load = match &row.kind {
        TypedKind::Area { width, .. } => {
            let (from, to) = stretch?;
            Load::Area { build_up: build_up?, width: lengths((*width)?), from, to }
        }
        TypedKind::Wall { height, .. } => {
            let (from, to) = stretch?;
            Load::Wall { build_up: build_up?, height: lengths((*height)?), from, to }
        }
        TypedKind::Direct(actions) if actions.faulty => return None,
        TypedKind::Direct(actions) => match row.at {
            Field::Absent => {
                let (from, to) = stretch?;
                Load::Line { direct: direct(actions, LineLoad::from_si), from, to }
            }
            _ => Load::Point { direct: direct(actions, Force::from_si), at: at? },
        },
        TypedKind::Unclear { .. } => return None,
    };
    let wind_case = match &row.wind_case {
        Field::Absent => WindCase::default(),
        Field::Faulty => return None,
        Field::Given(at) if at.value == DEFAULT_WIND_CASE => WindCase::default(),
        Field::Given(at) => WindCase(at.value.clone()),
    };
    Some(LoadRow {
        what: row.what.value()?.clone(),
        stage: row.stage.unwrap_or(Stage::After),
        stage_defaulted: row.stage.is_none(),
        height: row.height.unwrap_or(height),
        offset: row.offset.as_ref().map_or(Length::default(), |offset| Length::from_si(offset.si)),
        load,
        wind_case,
        origin,
    })
}

fn lengths(pair: (f64, f64)) -> (Length, Length) {
    (Length::from_si(pair.0), Length::from_si(pair.1))
}

fn direct<T>(actions: &Actions, of: impl Fn(f64) -> T) -> Direct<T> {
    Direct {
        permanent: actions.permanent.map(&of),
        imposed: actions.imposed.map(|(category, load)| (category, of(load))),
        snow: actions.snow.map(&of),
        wind: actions.wind.map(&of),
    }
}

fn build_up(row: &TypedLoad, names: &Names, found: &mut Findings) -> Option<usize> {
    let name = build_up_field(row)?.given()?;
    let build_up = names.build_up(&name.value);
    if build_up.is_none() {
        names.unknown_build_up(name, found);
    }
    build_up
}

/// A place on the beam, in m; one beyond its end is a fault.
fn place(field: &Field<Quantity>, beam: &TypedBeam, found: &mut Findings) -> Option<Length> {
    let at: &At<Quantity> = field.given()?;
    let length = beam.length.value()?;
    if at.value.si > length.si {
        found.add(beyond(Name::OutsideBeam, &at.span, &beam.called, length));
        return None;
    }
    Some(Length::from_si(at.value.si))
}

/// Where a row begins and ends: the whole beam unless it says otherwise.
fn stretch(row: &TypedLoad, beam: &TypedBeam, found: &mut Findings) -> Option<(Length, Length)> {
    let (from, to) = (place(&row.from, beam, found), place(&row.to, beam, found));
    let whole = beam.length.value()?;
    let from = if row.from.is_absent() { Length::default() } else { from? };
    let to = if row.to.is_absent() { Length::from_si(whole.si) } else { to? };
    if from.si() < to.si() {
        return Some((from, to));
    }
    let (at, fact) = match (row.from.given(), row.to.given()) {
        (Some(from), Some(to)) => (to, format!("{} is not beyond {}", to.value.typed, from.value.typed)),
        (Some(from), None) => (from, format!("{} leaves nothing of {}", from.value.typed, beam.called)),
        (None, Some(to)) => (to, format!("{} leaves nothing before it", to.value.typed)),
        (None, None) => return None,
    };
    found.add(Fault::new(Name::FromAfterTo, Some(at.span.clone()), fact, "let from lie before to"));
    None
}

fn not_for_height(row: &TypedLoad, build_up: Option<usize>, typed: &Typed, found: &mut Findings) {
    let (TypedKind::Wall { build_up: name, .. }, Some(at)) = (&row.kind, build_up) else { return };
    let Some(key) = typed.build_ups[at].on_plan.first() else { return };
    let name = name.given().map(|name| (name.value.clone(), name.span.clone()));
    let Some((name, span)) = name else { return };
    let fact = format!("{name} has {key}, so no height");
    let mut fault = Fault::new(Name::BuildUpNotForHeight, Some(span), fact, "give it a width, or layers alone");
    fault.also.extend(typed.build_ups[at].name.as_ref().map(|name| name.span.clone()));
    found.add(fault);
}

fn wind_case_without_wind(row: &TypedLoad, build_up: Option<usize>, typed: &Typed, found: &mut Findings) {
    let Some(key) = &row.wind_case_key else { return };
    let windy = match (&row.kind, build_up) {
        (TypedKind::Direct(actions), _) => actions.wind.is_some() || actions.faulty,
        (TypedKind::Area { .. }, Some(at)) => typed.build_ups[at].has_wind,
        (TypedKind::Wall { .. }, Some(_)) => false,
        _ => true,
    };
    if !windy {
        let fact = "wind-case on a row without wind";
        found.add(Fault::new(Name::KeyOutOfPlace, Some(key.clone()), fact, "take it out, or add the wind load"));
    }
}
