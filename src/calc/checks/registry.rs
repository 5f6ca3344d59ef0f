//! All checks in one list, which tests walk: a name, a clause, a spoken sentence, a worked example each.

use super::generated::{self, Dice};
use super::{
    Inputs, bending, bending_with_shear, deflection, lateral_torsional_buckling, shear, stacked_deflection, tilt,
    torsion, uplift, web_under_force, web_with_bending,
};
use crate::results::CheckKind;

/// A check as the registry knows it.
pub struct Registered {
    /// The kinds of entries that it makes.
    pub kinds: &'static [CheckKind],
    /// The standard and clause, or "common practice".
    pub clause: &'static str,
    /// What it asks, as one says it.
    pub spoken: &'static str,
    /// Inputs of its worked example.
    pub example: fn() -> Inputs,
    /// Inputs for tests.
    pub generate: fn(&mut Dice) -> Inputs,
}

/// Every check, in the order of its entries in tables.
pub static CHECKS: &[Registered] = &[
    Registered {
        kinds: &[CheckKind::Bending],
        clause: bending::CLAUSE,
        spoken: "Does the section resist the greatest moment?",
        example: bending::example,
        generate: generated::bending,
    },
    Registered {
        kinds: &[CheckKind::Shear],
        clause: shear::CLAUSE,
        spoken: "Does the web resist the greatest shear?",
        example: shear::example,
        generate: generated::shear,
    },
    Registered {
        kinds: &[CheckKind::BendingWithShear],
        clause: bending_with_shear::CLAUSE,
        spoken: "Does the section resist moment and shear at one place together?",
        example: bending_with_shear::example,
        generate: generated::bending_with_shear,
    },
    Registered {
        kinds: &[CheckKind::LateralTorsionalBuckling],
        clause: lateral_torsional_buckling::CLAUSE,
        spoken: "Could the beam buckle sideways between the places where it is held?",
        example: lateral_torsional_buckling::example,
        generate: generated::lateral_torsional_buckling,
    },
    Registered {
        kinds: &[CheckKind::WebUnderForce],
        clause: web_under_force::CLAUSE,
        spoken: "Does the web resist the force that a flange brings into it?",
        example: web_under_force::example,
        generate: generated::web_under_force,
    },
    Registered {
        kinds: &[CheckKind::WebWithBending],
        clause: web_with_bending::CLAUSE,
        spoken: "Does the web resist the force together with the moment at the same place?",
        example: web_with_bending::example,
        generate: generated::web_with_bending,
    },
    Registered {
        kinds: &[CheckKind::Uplift],
        clause: uplift::CLAUSE,
        spoken: "Is the bearing held down where it lifts?",
        example: uplift::example,
        generate: generated::uplift,
    },
    Registered {
        kinds: &[CheckKind::TotalDeflection, CheckKind::AfterDeflection, CheckKind::VariableDeflection],
        clause: "common practice; EN 1993-1-1, UK NA.2.23",
        spoken: "Does the beam\u{2019}s own movement keep its limit?",
        example: deflection::example,
        generate: generated::deflection,
    },
    Registered {
        kinds: &[CheckKind::StackedDeflection],
        clause: "common practice",
        spoken: "Does the movement keep its limit, all that the beam inherits included?",
        example: stacked_deflection::example,
        generate: generated::stacked_deflection,
    },
    Registered {
        kinds: &[CheckKind::Tilt],
        clause: "common practice",
        spoken: "Do two neighbouring bearings go down nearly alike?",
        example: tilt::example,
        generate: generated::tilt,
    },
    Registered {
        kinds: &[CheckKind::Torsion],
        clause: torsion::CLAUSE,
        spoken: "Does a load or a bearing beside the web twist the beam?",
        example: torsion::example,
        generate: generated::torsion,
    },
];
