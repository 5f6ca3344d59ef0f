//! The rows of a beam's load table, with totals from the loads as typed.

use crate::actions::{Action, Actions};
use crate::analysis::loads::{Resolved, Shape, own_weight, resolve};
use crate::building::{Building, Load, Stage};
use crate::quantity::{Area, Force, Length, LineLoad};
use crate::results::{RowLoad, RowResult};

/// Own weight first, then the rows as typed.
pub fn rows(building: &Building, actions: &Actions, beam: usize) -> Vec<RowResult> {
    let b = &building.beams[beam];
    let weight = own_weight(b);
    let whole = (Length::from_si(0.0), b.length);
    let own = RowResult {
        row: None,
        what: "own weight".into(),
        stage: Stage::Before,
        load: RowLoad::Line {
            from: whole.0,
            to: whole.1,
            intensities: vec![(Action::Permanent, LineLoad::from_si(weight), LineLoad::from_si(weight))],
        },
        area: None,
        totals: vec![(Action::Permanent, Force::from_si(weight * b.length.si()))],
    };
    let typed = b.loads.iter().enumerate().map(|(n, row)| {
        let Resolved { shape, amounts, stage } = resolve(building, actions, row);
        let area = match row.load {
            Load::Area { .. } | Load::Wall { .. } => Some(Area::from_si(shape.total())),
            Load::Line { .. } | Load::Point { .. } => None,
        };
        let load = match shape {
            Shape::Line { from, to, start, end } => RowLoad::Line {
                from: Length::from_si(from),
                to: Length::from_si(to),
                intensities: amounts
                    .iter()
                    .map(|(action, a)| (*action, LineLoad::from_si(a * start), LineLoad::from_si(a * end)))
                    .collect(),
            },
            Shape::Point { at } => RowLoad::Point {
                at: Length::from_si(at),
                forces: amounts.iter().map(|(action, a)| (*action, Force::from_si(*a))).collect(),
            },
        };
        let totals = amounts.iter().map(|(action, a)| (*action, Force::from_si(a * shape.total()))).collect();
        RowResult { row: Some(n), what: row.what.clone(), stage, load, area, totals }
    });
    std::iter::once(own).chain(typed).collect()
}
