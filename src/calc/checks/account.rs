//! The account of a member: the workings of its governing checks, chapter by chapter, and of its reactions.

use std::cmp::Ordering;

use super::combined::{Combined, Writing, signed};
use super::places::{carrier, heading};
use super::{Required, run, workings};
use crate::building::Building;
use crate::limits::Movement;
use crate::results::{BeamResult, Check, CheckKind, Combinations, Place, Results, Verdict};
use crate::workings::account::Account;
use crate::workings::{Tape, glossary};

/// The workings of a beam: of each kind of check the worst entry, then the reactions.
/// Empty where there is no such beam.
pub fn account(building: &Building, results: &Results, beam: usize) -> Account {
    let tape = Tape::new();
    let Some(own) = results.beams.get(beam) else { return Account::default() };
    let closest = closest(own);
    for check in shown(own) {
        let Some(inputs) = &check.inputs else { continue };
        let mut head = heading(building, results, beam, check);
        if closest.is_some_and(|closest| std::ptr::eq(closest, check))
            && let Some(beam) = building.beams.get(beam)
        {
            head = match check.verdict {
                Verdict::NotVerified => format!("{head}: what keeps {} from being verified", beam.mark),
                Verdict::Met | Verdict::NotMet => format!("{head}: the closest check of {}", beam.mark),
            };
        }
        tape.chapter(&head);
        workings(inputs, &tape);
    }
    tape.chapter("Reactions");
    reactions(building, own, &results.combinations, &tape);
    Account::of(&tape)
}

/// The checks whose workings are shown, in the order of their names: of each kind the worst, and the one that asks for
/// the second moment of area that the beam needs.
pub fn shown(own: &BeamResult) -> Vec<&Check> {
    let mut shown = Vec::new();
    for kind in CheckKind::ALL {
        let of_kind = own.checks.iter().filter(|c| c.kind == kind && !c.advice);
        match kind {
            // The web that is worst under its force alone, and the one that is worst with the moment beside it: each
            // alone first, then with the moment at the same place, which goes on from it.
            CheckKind::WebUnderForce => {
                let with_moment = || own.checks.iter().filter(|c| c.kind == CheckKind::WebWithBending);
                let worst = [of_kind.clone().reduce(worse), with_moment().reduce(worse)];
                let mut places: Vec<Place> = worst.into_iter().flatten().map(|c| c.place).collect();
                places.dedup();
                for place in places {
                    shown.extend(of_kind.clone().filter(|c| c.place == place));
                    shown.extend(with_moment().filter(|c| c.place == place));
                }
            }
            CheckKind::WebWithBending => {}
            CheckKind::Torsion => shown.extend(of_kind),
            CheckKind::Bending
            | CheckKind::Shear
            | CheckKind::BendingWithShear
            | CheckKind::LateralTorsionalBuckling
            | CheckKind::Uplift
            | CheckKind::Tilt => shown.extend(of_kind.reduce(worse)),
            // On several spans the one nearest its limit need not be the one that asks for the stiffest beam.
            CheckKind::TotalDeflection
            | CheckKind::AfterDeflection
            | CheckKind::VariableDeflection
            | CheckKind::StackedDeflection => {
                let worst = of_kind.clone().reduce(worse);
                shown.extend(worst);
                if !worst.is_some_and(|check| requires(own, check)) {
                    shown.extend(of_kind.clone().find(|check| requires(own, check)));
                }
            }
        }
    }
    shown
}

/// Whether this check asks for the second moment of area that its beam needs.
fn requires(own: &BeamResult, check: &Check) -> bool {
    let second = &own.second_moment;
    let movement = match check.kind {
        CheckKind::TotalDeflection => Movement::Total,
        CheckKind::AfterDeflection => Movement::After,
        CheckKind::VariableDeflection => Movement::Variable,
        CheckKind::StackedDeflection => Movement::Stacked,
        _ => return false,
    };
    if second.governed_by != Some(movement) {
        return false;
    }
    match check.inputs.as_ref().and_then(|inputs| run(inputs).required) {
        Some(Required::Of(value)) => second.required == Some(value),
        Some(Required::BudgetUsed) => second.budget_used,
        None => false,
    }
}

/// The check that decides a beam: the greatest share of those not met, else the first not verified, else the greatest
/// share. None without checks.
pub fn closest(own: &BeamResult) -> Option<&Check> {
    own.checks.iter().filter(|c| !c.advice).reduce(worse)
}

/// The worse of two; the first where they are alike.
fn worse<'a>(one: &'a Check, other: &'a Check) -> &'a Check {
    let by_verdict = one.verdict.cmp(&other.verdict);
    // Not met without a utilisation (nothing holds down what lifts) is the worst there is.
    let share = |c: &Check| c.utilisation.unwrap_or(f64::INFINITY);
    let order = match (by_verdict, one.verdict) {
        (Ordering::Equal, Verdict::NotVerified) => Ordering::Equal,
        (Ordering::Equal, _) => share(one).total_cmp(&share(other)),
        (order, _) => order,
    };
    if order == Ordering::Less { other } else { one }
}

/// R_Ed and R_k of every bearing, from the reactions of each action.
fn reactions(building: &Building, own: &BeamResult, combinations: &Combinations, mut tape: &Tape) {
    let w = &mut tape;
    for (place, bearing) in own.bearings.iter().enumerate() {
        let sub = (place + 1).to_string();
        let at = carrier(building, bearing.on);
        let plural = format!("reactions at {at}, bearing {sub},");
        let design = Writing { sub: Some(&sub), ..Writing::new(&glossary::R_Ed, &glossary::R, &plural) };
        if let Some(combined) = Combined::of(&bearing.design_max, combinations) {
            signed(w, &combined, 1.0, &design);
        }
        let characteristic = Writing { whole: &glossary::R_k, ..design };
        if let Some(combined) = Combined::of(&bearing.characteristic_max, combinations) {
            signed(w, &combined, 1.0, &characteristic);
        }
    }
}
