//! From a solved component to what is said of each of its beams.

pub mod chain;
pub mod drawn;
pub mod forces;
pub mod hand_check;
pub mod interaction;
pub mod movements;
pub mod required;
pub mod requirements;
pub mod rows;

use crate::actions::combinations::Combination;
use crate::analysis::envelope::{Envelope, Set};
use crate::analysis::solved::Solved;
use crate::building::Stage;
use crate::results::{CombinationId, Combinations};

/// The sets of combinations that effects are looked for in.
#[derive(Clone, Copy)]
pub struct Sets<'a> {
    pub combinations: &'a Combinations,
}

impl<'a> Sets<'a> {
    pub fn strength(&self) -> Set<'a> {
        Set::of(&self.combinations.strength, CombinationId::Strength)
    }

    pub fn equilibrium(&self) -> Set<'a> {
        Set::of(&self.combinations.equilibrium, CombinationId::Equilibrium)
    }

    pub fn characteristic(&self) -> Set<'a> {
        Set::of(&self.combinations.characteristic, CombinationId::Characteristic)
    }

    /// Characteristic combinations, variable actions alone.
    pub fn variable(&self) -> Set<'a> {
        Set { without_permanent: true, ..self.characteristic() }
    }

    pub fn combination(&self, id: CombinationId) -> Option<&'a Combination> {
        self.combinations.get(id)
    }
}

/// The envelopes of the movements of one beam.
pub struct MovementFields<'s> {
    pub own: Envelope<'s>,
    /// Own movement less what permanent loads of stage "before" cause.
    pub after: Envelope<'s>,
    pub stacked: Envelope<'s>,
}

impl<'s> MovementFields<'s> {
    pub fn new(solved: &'s Solved<'_>, local: usize) -> MovementFields<'s> {
        let own = solved.own(local);
        let mut after = own.clone();
        after.terms.retain(|term| {
            let c = &solved.contributions[term.contribution];
            c.is_variable() || c.stage == Stage::After
        });
        MovementFields {
            own: Envelope::new(own),
            after: Envelope::new(after),
            stacked: Envelope::new(solved.stacked(local)),
        }
    }
}

/// The whole length of a beam.
pub fn whole(solved: &Solved, local: usize) -> (f64, f64) {
    (0.0, solved.beam(local).length.si())
}
