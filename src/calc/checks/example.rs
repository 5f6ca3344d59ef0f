//! Short ways to write the worked examples of the checks.

use super::{Combined, Steel};
use crate::actions::combinations::{Expression, Purpose};
use crate::actions::{Action, Category, Choices};
use crate::materials::Grade;
use crate::quantity::Q;
use crate::results::Part;
use crate::sections;

impl Steel {
    /// A section of the catalogue; its first one where the name is unknown.
    pub(super) fn named(name: &str, grade: Grade) -> Steel {
        let section = sections::find(name).unwrap_or(&sections::catalogue()[0]);
        Steel { section: *section, grade, choices: Choices::Uk }
    }
}

/// Permanent and imposed A by (6.10): 1.35 G + 1.5 Q.
pub(super) fn two<const F: i8, const L: i8>(permanent: f64, imposed: f64) -> Combined<F, L> {
    combined(permanent, imposed, Purpose::Strength, Expression::E610, (1.35, 1.5))
}

/// Permanent and imposed A by (6.14b): G + Q.
pub(super) fn characteristic<const F: i8, const L: i8>(permanent: f64, imposed: f64) -> Combined<F, L> {
    combined(permanent, imposed, Purpose::Characteristic, Expression::E614b, (1.0, 1.0))
}

fn combined<const F: i8, const L: i8>(
    permanent: f64,
    imposed: f64,
    purpose: Purpose,
    expression: Expression,
    (gamma_G, gamma_Q): (f64, f64),
) -> Combined<F, L> {
    let part =
        |action, value, partial, leads| Part { action, value: Q::from_si(value), partial, reduction: 1.0, leads };
    let parts = vec![
        part(Action::Permanent, permanent, gamma_G, false),
        part(Action::Imposed(Category::A), imposed, gamma_Q, true),
    ];
    Combined { parts, purpose, expression }
}

/// Within a relative tolerance.
#[cfg(test)]
pub(super) fn near(found: Option<f64>, expected: f64, tolerance: f64) {
    let found = found.expect("a value");
    assert!((found - expected).abs() <= tolerance * expected.abs(), "{found} is not {expected}");
}
