//! What the actions add up to: the design (or characteristic) value of an effect from its parts.

use crate::actions::combinations::{Expression, Purpose};
use crate::results::{Combinations, Effect, Part};

/// The parts of an effect and the expression that combines them.
#[derive(Clone, Debug, PartialEq)]
pub struct Combined<const FORCE: i8, const LENGTH: i8> {
    /// Permanent first. Contributions factored apart (set A: worsening and relieving) are parts of their own.
    pub parts: Vec<Part<FORCE, LENGTH>>,
    pub purpose: Purpose,
    pub expression: Expression,
}

impl<const FORCE: i8, const LENGTH: i8> Combined<FORCE, LENGTH> {
    /// The parts of an effect with the expression of its combination; none where the effect's combination is not in
    /// the list.
    pub fn of(effect: &Effect<FORCE, LENGTH>, combinations: &Combinations) -> Option<Self> {
        let combination = combinations.get(effect.combination)?;
        Some(Combined {
            parts: effect.parts.clone(),
            purpose: combination.purpose,
            expression: combination.expression,
        })
    }

    /// The combined value, with its sign.
    pub fn value(&self) -> f64 {
        self.parts.iter().fold(0.0, |sum, p| sum + p.partial * p.reduction * p.value.si())
    }
}
