//! From load rows as described to line loads and forces per action.

use crate::actions::{Action, Actions, Category};
use crate::building::{Beam, BuildUp, Building, LayerWeight, Load, LoadRow, Stage};
use crate::materials::{DENSITY, GRAVITY};

/// A row, resolved: one shape along the beam, and how much of it each action brings.
#[derive(Clone, Debug)]
pub struct Resolved {
    pub shape: Shape,
    /// Per action, what one unit of the shape carries: N/m2 on a width or height in m, or N/m on 1, or N on 1.
    pub amounts: Vec<(Action, f64)>,
    pub stage: Stage,
}

/// Along the beam in m.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Shape {
    Line { from: f64, to: f64, start: f64, end: f64 },
    Point { at: f64 },
}

/// Permanent load on plan of a build-up, N/m2 (EN 1991-1-1 5.2.1): layers lie on the slope.
pub fn permanent_on_plan(build_up: &BuildUp) -> f64 {
    on_slope(build_up) / libm::cos(build_up.pitch)
}

/// Sum of the layers, N/m2 of their own surface.
pub fn on_slope(build_up: &BuildUp) -> f64 {
    build_up.layers.iter().map(|layer| layer_load(&layer.weight)).sum()
}

/// One layer, N/m2 of its own surface.
pub fn layer_load(weight: &LayerWeight) -> f64 {
    match weight {
        LayerWeight::Load(load) => load.si(),
        LayerWeight::Thick { thickness, density } => thickness.si() * density.si(),
    }
}

/// Own weight, N/m: A × 7850 kg/m3 × 9.81 m/s2.
pub fn own_weight(beam: &Beam) -> f64 {
    beam.section.area.si() * DENSITY * GRAVITY
}

/// The actions that a building has: permanent always, the others where some row brings them.
pub fn actions_of(building: &Building) -> Actions {
    let mut wind_cases: Vec<String> = Vec::new();
    let mut present = vec![Action::Permanent];
    let mut add = |action: Action| {
        if !present.contains(&action) {
            present.push(action);
        }
    };
    for row in building.beams.iter().flat_map(|beam| &beam.loads) {
        for action in variable_actions(building, row) {
            match action {
                Found::Imposed(category) => add(Action::Imposed(category)),
                Found::Snow => add(Action::Snow),
                Found::Wind => {
                    let name = &row.wind_case.0;
                    let case = wind_cases.iter().position(|n| n == name).unwrap_or_else(|| {
                        wind_cases.push(name.clone());
                        wind_cases.len() - 1
                    });
                    add(Action::Wind(case));
                }
            }
        }
    }
    present.sort();
    Actions { present, wind_cases }
}

enum Found {
    Imposed(Category),
    Snow,
    Wind,
}

fn variable_actions(building: &Building, row: &LoadRow) -> Vec<Found> {
    let list = |imposed: Option<Category>, snow: bool, wind: bool| {
        let mut found = Vec::new();
        found.extend(imposed.map(Found::Imposed));
        found.extend(snow.then_some(Found::Snow));
        found.extend(wind.then_some(Found::Wind));
        found
    };
    match &row.load {
        Load::Area { build_up, .. } => match building.build_ups.get(*build_up) {
            Some(b) => list(b.imposed.map(|i| i.category), b.snow.is_some(), b.wind.is_some()),
            None => Vec::new(),
        },
        Load::Wall { .. } => Vec::new(),
        Load::Line { direct, .. } => {
            list(direct.imposed.map(|i| i.0), direct.snow.is_some(), direct.wind.is_some())
        }
        Load::Point { direct, .. } => {
            list(direct.imposed.map(|i| i.0), direct.snow.is_some(), direct.wind.is_some())
        }
    }
}

/// A row's shape and amounts. A build-up that does not exist carries nothing.
pub fn resolve(building: &Building, actions: &Actions, row: &LoadRow) -> Resolved {
    let wind = |_: ()| {
        let case = actions.wind_cases.iter().position(|name| *name == row.wind_case.0);
        Action::Wind(case.unwrap_or(0))
    };
    let mut amounts: Vec<(Action, f64)> = Vec::new();
    let mut put = |action: Action, amount: Option<f64>| amounts.extend(amount.map(|a| (action, a)));
    let shape = match &row.load {
        Load::Area { build_up, width, from, to } => {
            if let Some(b) = building.build_ups.get(*build_up) {
                put(Action::Permanent, Some(permanent_on_plan(b)));
                if let Some(i) = b.imposed {
                    let partitions = i.partitions.map_or(0.0, |p| p.si());
                    put(Action::Imposed(i.category), Some(i.load.si() + partitions));
                }
                put(Action::Snow, b.snow.map(|s| s.si()));
                put(wind(()), b.wind.map(|w| w.si()));
            }
            Shape::Line { from: from.si(), to: to.si(), start: width.0.si(), end: width.1.si() }
        }
        Load::Wall { build_up, height, from, to } => {
            put(Action::Permanent, building.build_ups.get(*build_up).map(on_slope));
            Shape::Line { from: from.si(), to: to.si(), start: height.0.si(), end: height.1.si() }
        }
        Load::Line { direct, from, to } => {
            put(Action::Permanent, direct.permanent.map(|p| p.si()));
            if let Some((category, load)) = direct.imposed {
                put(Action::Imposed(category), Some(load.si()));
            }
            put(Action::Snow, direct.snow.map(|s| s.si()));
            put(wind(()), direct.wind.map(|w| w.si()));
            Shape::Line { from: from.si(), to: to.si(), start: 1.0, end: 1.0 }
        }
        Load::Point { direct, at } => {
            put(Action::Permanent, direct.permanent.map(|p| p.si()));
            if let Some((category, load)) = direct.imposed {
                put(Action::Imposed(category), Some(load.si()));
            }
            put(Action::Snow, direct.snow.map(|s| s.si()));
            put(wind(()), direct.wind.map(|w| w.si()));
            Shape::Point { at: at.si() }
        }
    };
    Resolved { shape, amounts, stage: row.stage }
}

impl Shape {
    /// The integral of the shape along the beam (1 for a point).
    pub fn total(&self) -> f64 {
        match self {
            Shape::Line { from, to, start, end } => 0.5 * (start + end) * (to - from),
            Shape::Point { .. } => 1.0,
        }
    }

    /// The part of the shape between two places; none if nothing of it lies there. A point at a shared border
    /// belongs to the stretch before it.
    pub fn within(&self, a: f64, b: f64, first: bool) -> Option<Shape> {
        match *self {
            Shape::Line { from, to, start, end } => {
                let (low, high) = (from.max(a), to.min(b));
                if low >= high {
                    return None;
                }
                let at = |x: f64| {
                    if x == from {
                        start
                    } else if x == to {
                        end
                    } else {
                        start + (end - start) * ((x - from) / (to - from))
                    }
                };
                Some(Shape::Line { from: low, to: high, start: at(low), end: at(high) })
            }
            Shape::Point { at } => {
                let inside = at > a && at <= b || (first && at == a);
                inside.then_some(Shape::Point { at })
            }
        }
    }
}
