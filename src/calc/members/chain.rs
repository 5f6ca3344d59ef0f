//! Connected beams, moved together.

use crate::analysis::envelope::Found;
use crate::analysis::solved::Solved;
use crate::quantity::Length;
use crate::results::{Chain, ChainCurve};

/// The chain under the combination and arrangement of one movement of one of its beams.
pub fn chain(solved: &Solved, governing_beam: usize, movement: &Found<0, 1>) -> Chain {
    let one = |(local, &beam): (usize, &usize)| {
        let places = solved.beam(local).bearings.iter().map(|b| b.at.si());
        let bearings = places.map(|x| {
            let loads = solved.factored_movement(local, x, &movement.factors);
            Length::from_si(loads + solved.settled_at(local, x))
        });
        ChainCurve {
            beam,
            own: solved.factored(&solved.own(local), &movement.factors),
            stacked: solved.factored(&solved.stacked(local), &movement.factors),
            bearings: bearings.collect(),
        }
    };
    Chain {
        beams: solved.members.clone(),
        governing_beam,
        characteristic: movement.effect.combination,
        arrangement: movement.effect.arrangement.clone(),
        curves: solved.members.iter().enumerate().map(one).collect(),
    }
}
