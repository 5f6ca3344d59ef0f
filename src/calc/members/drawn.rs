//! The curves that a member's diagrams show.

use super::MovementFields;
use super::forces::ForceFields;
use crate::analysis::envelope::Found;
use crate::analysis::loads::Shape;
use crate::analysis::solved::Solved;
use crate::quantity::{Force, Length, LineLoad};
use crate::results::{Drawn, DrawnForce, DrawnLoad, ForceSource};

/// Under the combination and arrangement of two extremes: the moment of greatest size, and a movement.
pub fn drawn(
    solved: &Solved,
    local: usize,
    moment: &Found<1, 1>,
    movement: &Found<0, 1>,
    forces: &ForceFields,
    movements: &MovementFields,
) -> Drawn {
    Drawn {
        strength: moment.effect.combination,
        strength_arrangement: moment.effect.arrangement.clone(),
        line_loads: line_loads(solved, local, &moment.factors),
        point_loads: point_loads(solved, local, &moment.factors),
        shear: solved.factored(forces.shear.field(), &moment.factors),
        moment: solved.factored(forces.moment.field(), &moment.factors),
        characteristic: movement.effect.combination,
        characteristic_arrangement: movement.effect.arrangement.clone(),
        own: solved.factored(movements.own.field(), &movement.factors),
        stacked: solved.factored(movements.stacked.field(), &movement.factors),
    }
}

/// Line loads by row and stretch; own weight has row 0, typed rows follow.
pub fn line_loads(solved: &Solved, local: usize, factors: &[f64]) -> Vec<DrawnLoad> {
    let mut loads: Vec<(usize, DrawnLoad)> = Vec::new();
    for (n, c) in solved.contributions.iter().enumerate() {
        let Shape::Line { from, to, start, end } = solved.units[c.unit].shape else { continue };
        if c.beam != solved.members[local] {
            continue;
        }
        let amount = factors[n] * c.amount;
        match loads.iter_mut().find(|(unit, _)| *unit == c.unit) {
            Some((_, load)) => {
                let (a, b) = load.intensity;
                load.intensity =
                    (LineLoad::from_si(a.si() + amount * start), LineLoad::from_si(b.si() + amount * end));
            }
            None => loads.push((
                c.unit,
                DrawnLoad {
                    row: c.row.map_or(0, |r| r + 1),
                    from: Length::from_si(from),
                    to: Length::from_si(to),
                    intensity: (LineLoad::from_si(amount * start), LineLoad::from_si(amount * end)),
                },
            )),
        }
    }
    loads.sort_by_key(|(unit, _)| *unit);
    loads.into_iter().map(|(_, load)| load).collect()
}

/// Point loads of the beam's own rows and of the beams that land on it, by place.
pub fn point_loads(solved: &Solved, local: usize, factors: &[f64]) -> Vec<DrawnForce> {
    let beam = solved.members[local];
    let mut forces: Vec<DrawnForce> = Vec::new();
    for (n, c) in solved.contributions.iter().enumerate() {
        let Shape::Point { at } = solved.units[c.unit].shape else { continue };
        if c.beam != beam {
            continue;
        }
        let source = ForceSource::Row(c.row.map_or(0, |r| r + 1));
        let amount = factors[n] * c.amount;
        match forces.iter_mut().find(|f| f.source == source) {
            Some(f) => f.force = Force::from_si(f.force.si() + amount),
            None => {
                forces.push(DrawnForce { at: Length::from_si(at), force: Force::from_si(amount), source });
            }
        }
    }
    for (n, landing) in solved.layout.landings[beam].iter().enumerate() {
        let Some(other) = solved.local(landing.beam) else { continue };
        let sum: f64 = solved.reaction(other, landing.bearing).iter().map(|(c, r)| factors[*c] * r).sum();
        forces.push(DrawnForce { at: landing.at, force: Force::from_si(sum), source: ForceSource::Landing(n) });
    }
    forces.sort_by(|a, b| a.at.si().total_cmp(&b.at.si()));
    forces
}
