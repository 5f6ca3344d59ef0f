//! Torsion from a load or a bearing beside the web: not verified, EN 1993-1-1 6.2.7.
//!
//! Any distance e other than 0 makes the check "not verified: torsion"; e in mm.

use super::Inputs;
use super::{Outcome, unverified};
use crate::quantity::Length;
use crate::results::CheckUnit;
use crate::workings::{Number, Workings, glossary};

pub(super) const CLAUSE: &str = "EN 1993-1-1 6.2.7";

/// A load or bearing that acts beside the web.
#[derive(Clone, Debug, PartialEq)]
pub struct Torsion {
    /// What is off the web: a load row or a landing, as printed.
    pub what: String,
    pub offset: Length,
}

pub(super) fn check<N: Number, W: Workings<N>>(w: &mut W, inputs: &Torsion) -> Outcome {
    let what = inputs.what.clone();
    let e = w.looked_up(CLAUSE, &glossary::e, inputs.offset, move || {
        format!("Beside the web: {what}; the torsion that it causes is not verified")
    });
    let outcome = unverified(w, CLAUSE, e, CheckUnit::Length, "torsion");
    Outcome { demand: None, ..outcome }
}

/// A reaction 60 mm beside the web.
pub fn example() -> Inputs {
    Inputs::Torsion(Torsion { what: "reaction of B1".into(), offset: Length::mm(60.0) })
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::checks::run;
    use crate::results::Verdict;

    #[test]
    fn worked_example() {
        // Nothing is verified: that it says so is the whole check.
        let outcome = run(&example());
        assert_eq!(outcome.verdict, Verdict::NotVerified);
        assert_eq!(outcome.reason.as_deref(), Some("torsion"));
    }
}
