//! Build-ups layer by layer, with the load that they bring on plan.

use sagledger_calc::analysis::loads::{layer_load, on_slope, permanent_on_plan};
use sagledger_calc::building::{BuildUp, LayerWeight, Load};
use sagledger_calc::workings::decimal::{self, Decimal};
use sagledger_calc::workings::unit::Unit;
use serde::Serialize;

use super::text::{Runs, keys, listed, words};
use super::view::{View, compact};

#[derive(Debug, Serialize)]
pub(super) struct Loads {
    build_ups: Vec<BuildUpTable>,
}

#[derive(Debug, Serialize)]
struct BuildUpTable {
    key: String,
    name: String,
    /// Layers: what, how its load comes about, load.
    layers: Vec<Row>,
    /// Permanent load on the slope and on plan, then variable loads.
    totals: Vec<Row>,
    /// Which members carry it.
    beside: Runs,
}

#[derive(Debug, Serialize)]
struct Row {
    what: String,
    how: String,
    load: String,
}

/// None where nothing is made of layers.
pub(super) fn loads(view: View) -> Option<Loads> {
    let build_ups: Vec<BuildUpTable> =
        view.building.build_ups.iter().enumerate().map(|(n, b)| table(view, n, b)).collect();
    (!build_ups.is_empty()).then_some(Loads { build_ups })
}

fn kn_per_m2(si: f64) -> String {
    decimal::three_figures(si, Unit::KnPerM2)
}

fn typed(si: f64, unit: Unit) -> String {
    match Decimal::as_typed(si, 6) {
        Some(typed) => typed.moved(-unit.power()).without_trailing_zeros().to_string(),
        None => decimal::three_figures(si, unit),
    }
}

fn table(view: View, index: usize, build_up: &BuildUp) -> BuildUpTable {
    let row = |what: &str, how: String, load: f64| Row { what: what.into(), how, load: kn_per_m2(load) };
    let layers = build_up
        .layers
        .iter()
        .map(|layer| {
            let how = match layer.weight {
                LayerWeight::Load(_) => String::new(),
                LayerWeight::Thick { thickness, density } => {
                    let (t, d) = (typed(thickness.si(), Unit::Mm), typed(density.si(), Unit::KnPerM3));
                    format!("{t} mm × {d} kN/m³")
                }
            };
            row(&layer.what, how, layer_load(&layer.weight))
        })
        .collect();
    let mut totals = Vec::new();
    if build_up.pitch == 0.0 {
        totals.push(row("permanent", String::new(), permanent_on_plan(build_up)));
    } else {
        let degrees = typed(build_up.pitch.to_degrees(), Unit::One);
        totals.push(row("permanent, on the slope", format!("pitch {degrees}°"), on_slope(build_up)));
        totals.push(row("permanent, on plan", format!("÷ cos {degrees}°"), permanent_on_plan(build_up)));
    }
    if let Some(imposed) = &build_up.imposed {
        let category = format!("category {}", imposed.category.letter());
        match imposed.partitions {
            None => totals.push(row("imposed, on plan", category, imposed.load.si())),
            Some(partitions) => {
                let how = format!(
                    "{category}, {} + {} of partitions",
                    compact(imposed.load.si(), Unit::KnPerM2),
                    compact(partitions.si(), Unit::KnPerM2)
                );
                totals.push(row("imposed, on plan", how, imposed.load.si() + partitions.si()));
            }
        }
    }
    if let Some(snow) = build_up.snow {
        totals.push(row("snow, on plan", "shape coefficient included".into(), snow.si()));
    }
    if let Some(wind) = build_up.wind {
        let way = if wind.si() < 0.0 { "upward" } else { "downward" };
        totals.push(row("wind, on plan", way.into(), wind.si()));
    }
    BuildUpTable {
        key: keys::build_up(index),
        name: build_up.name.clone(),
        layers,
        totals,
        beside: carried_by(view, index),
    }
}

fn carried_by(view: View, index: usize) -> Runs {
    let uses = |load: &Load| match load {
        Load::Area { build_up, .. } | Load::Wall { build_up, .. } => *build_up == index,
        Load::Line { .. } | Load::Point { .. } => false,
    };
    let beams: Vec<_> = view
        .beams()
        .filter(|(_, beam, _)| beam.loads.iter().any(|row| uses(&row.load)))
        .map(|(index, ..)| view.link(index))
        .collect();
    if beams.is_empty() {
        return vec![words("no member")];
    }
    listed(beams)
}
