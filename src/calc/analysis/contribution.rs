//! Unit loads: one shape for each row on each stretch of each beam, and what each action makes of it.

use crate::actions::{Action, Actions};
use crate::analysis::loads::{Resolved, Shape, own_weight};
use crate::building::{Building, Stage};
use crate::results::Stretch;

/// A unit load of the building: a shape on one stretch of one beam, to be solved for once.
#[derive(Clone, Copy, Debug)]
pub struct UnitLoad {
    /// Index into the component's beams.
    pub beam: usize,
    pub shape: Shape,
}

/// `amount` times a unit load, belonging to one action.
#[derive(Clone, Copy, Debug)]
pub struct Contribution {
    pub unit: usize,
    /// Index into the building's beams.
    pub beam: usize,
    /// None: own weight.
    pub row: Option<usize>,
    pub stretch: usize,
    pub action: Action,
    pub stage: Stage,
    pub amount: f64,
}

impl Contribution {
    /// Imposed rows stand wherever they make an effect worse (EN 1991-1-1 6.2.1(1)).
    pub fn is_free(&self) -> bool {
        matches!(self.action, Action::Imposed(_))
    }
}

/// Unit loads and contributions of some beams (`members`, indices into the building).
pub fn contributions(
    building: &Building,
    members: &[usize],
    rows: &[Vec<Resolved>],
    stretches: &[Vec<Stretch>],
    actions: &Actions,
) -> (Vec<UnitLoad>, Vec<Contribution>) {
    let mut units = Vec::new();
    let mut list = Vec::new();
    for (local, &beam) in members.iter().enumerate() {
        let b = &building.beams[beam];
        let weight = Resolved {
            shape: Shape::Line { from: 0.0, to: b.length.si(), start: 1.0, end: 1.0 },
            amounts: vec![(Action::Permanent, own_weight(b))],
            stage: Stage::Before,
        };
        let all = std::iter::once((None, &weight)).chain(rows[beam].iter().enumerate().map(|(n, r)| (Some(n), r)));
        for (row, resolved) in all {
            for (stretch, s) in stretches[beam].iter().enumerate() {
                let Some(shape) = resolved.shape.within(s.from.si(), s.to.si(), stretch == 0) else { continue };
                units.push(UnitLoad { beam: local, shape });
                let unit = units.len() - 1;
                list.extend(resolved.amounts.iter().filter(|(_, amount)| *amount != 0.0).map(
                    |&(action, amount)| Contribution {
                        unit,
                        beam,
                        row,
                        stretch,
                        action,
                        stage: resolved.stage,
                        amount,
                    },
                ));
            }
        }
    }
    list.sort_by_key(|c| actions.present.iter().position(|a| *a == c.action));
    (units, list)
}
