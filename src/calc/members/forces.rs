//! Moments, shears and reactions of one beam.

use super::{Sets, whole};
use crate::actions::Action;
use crate::analysis::envelope::{Envelope, Field, Found, Sense};
use crate::analysis::solved::Solved;
use crate::quantity::Force;
use crate::results::{BearingResult, Effect};

/// The envelopes of one beam's internal forces.
pub struct ForceFields<'s> {
    pub moment: Envelope<'s>,
    pub shear: Envelope<'s>,
}

impl<'s> ForceFields<'s> {
    pub fn new(solved: &'s Solved<'_>, local: usize) -> ForceFields<'s> {
        ForceFields { moment: Envelope::new(solved.moment(local)), shear: Envelope::new(solved.shear(local)) }
    }
}

/// Extremes of strength over the whole beam.
pub struct Forces {
    pub moment_max: Found<1, 1>,
    pub moment_min: Found<1, 1>,
    pub shear: Found<1, 0>,
}

impl Forces {
    /// None only where there is nothing to look at (no combination or no length).
    pub fn new(solved: &Solved, local: usize, fields: &ForceFields, sets: &Sets) -> Option<Forces> {
        let range = whole(solved, local);
        let strength = [sets.strength()];
        Some(Forces {
            moment_max: fields.moment.extreme(&strength, Sense::Greatest, range)?,
            moment_min: fields.moment.extreme(&strength, Sense::Least, range)?,
            shear: fields.shear.greatest_size(&strength, range)?,
        })
    }

    /// The moment of greatest size.
    pub fn moment(&self) -> &Found<1, 1> {
        if self.moment_min.size() > self.moment_max.size() * (1.0 + 1e-12) {
            &self.moment_min
        } else {
            &self.moment_max
        }
    }
}

/// The extreme of an effect that has one value.
pub fn scalar<const FORCE: i8, const LENGTH: i8>(
    solved: &Solved,
    values: Vec<(usize, f64)>,
    sets: &[crate::analysis::envelope::Set],
    sense: Sense,
) -> Option<Effect<FORCE, LENGTH>> {
    let field = Field::scalar(&solved.contributions, values, 0.0);
    Envelope::new(field).extreme(sets, sense, (0.0, 0.0)).map(|found| found.effect)
}

/// Reactions of every bearing of a beam.
pub fn bearings(solved: &Solved, local: usize, sets: &Sets) -> Vec<BearingResult> {
    let beam = solved.beam(local);
    let one = |n: usize| {
        let values = solved.reaction(local, n);
        let seat = &beam.bearings[n];
        let extreme = |list: &[crate::analysis::envelope::Set], sense| {
            scalar::<1, 0>(solved, values.clone(), list, sense).map(|mut effect| {
                effect.at = seat.at;
                effect
            })
        };
        Some(BearingResult {
            on: seat.on,
            at: seat.at,
            reactions: by_action(solved, &values),
            design_max: extreme(&[sets.strength()], Sense::Greatest)?,
            design_min: extreme(&[sets.strength()], Sense::Least)?,
            least: extreme(&[sets.strength(), sets.equilibrium()], Sense::Least)?,
            characteristic_max: extreme(&[sets.characteristic()], Sense::Greatest)?,
        })
    };
    (0..beam.bearings.len()).filter_map(one).collect()
}

/// Sums per action with everything present, in the order of the actions; actions that the building has all appear.
pub fn by_action(solved: &Solved, values: &[(usize, f64)]) -> Vec<(Action, Force)> {
    let sum = |action: &Action| -> f64 {
        let chosen = values.iter().filter(|(c, _)| solved.contributions[*c].action == *action);
        chosen.map(|(_, v)| v).sum()
    };
    solved.layout.actions.present.iter().map(|a| (*a, Force::from_si(sum(a)))).collect()
}
