//! What the parts ask of a building and its results, in words.

use sagledger_calc::actions::Action;
use sagledger_calc::building::{Beam, Building, Carrier};
use sagledger_calc::checks::account::closest;
use sagledger_calc::checks::places;
use sagledger_calc::limits::{Limit, LimitFrom, Movement};
use sagledger_calc::quantity::Force;
use sagledger_calc::results::{BeamResult, Check, CheckKind, CheckUnit, Results, Verdict as Word};
use sagledger_calc::workings::decimal;
use sagledger_calc::workings::unit::Unit;
use serde::Serialize;

use super::text::{Run, keys, to, words};

/// A building with its results.
#[derive(Clone, Copy)]
pub(super) struct View<'a> {
    pub building: &'a Building,
    pub results: &'a Results,
}

/// What a check's row says besides its name.
#[derive(Debug, Serialize)]
pub(super) struct Verdict {
    /// "met", "not met" or "not verified".
    word: &'static str,
    /// For the place of the mark; 0 where there is no share.
    share: f64,
    /// The share as printed; empty where there is none.
    printed: String,
}

impl<'a> View<'a> {
    /// Beams with their results, in the order in which loads travel.
    pub fn beams(self) -> impl Iterator<Item = (usize, &'a Beam, &'a BeamResult)> {
        self.results.order.iter().filter_map(move |&index| {
            Some((index, self.building.beams.get(index)?, self.results.beams.get(index)?))
        })
    }

    pub fn mark(self, index: usize) -> &'a str {
        self.building.beams.get(index).map_or("", |beam| beam.mark.as_str())
    }

    /// A member's mark, leading to its sheets.
    pub fn link(self, index: usize) -> Run {
        to(keys::beam(index), self.mark(index))
    }

    /// What a bearing stands on, in a sentence: a member's mark leads to its sheets, a wall to the load path.
    pub fn carrier(self, on: Carrier) -> Run {
        match on {
            Carrier::Wall(_) => words(places::carrier(self.building, on)),
            Carrier::Beam { beam, .. } => self.link(beam),
        }
    }

    /// The member's index by its mark.
    pub fn by_mark(self, mark: &str) -> Option<usize> {
        self.building.beams.iter().position(|beam| beam.mark == mark)
    }

    pub fn check_name(self, beam: usize, check: &Check) -> String {
        places::name(self.building, self.results, beam, check)
    }

    pub fn closest(self, beam: &'a BeamResult) -> Option<&'a Check> {
        closest(beam)
    }

    /// "imposed A leads"; empty where the check knows no combination.
    pub fn short_combination(self, check: &Check) -> String {
        let combination = check.combination.and_then(|id| self.results.combinations.get(id));
        combination.map_or_else(String::new, |c| c.short_name(&self.results.actions))
    }

    /// The limit in force for a movement of a beam.
    pub fn limit(self, beam: &'a Beam, movement: Movement) -> Option<&'a Limit> {
        beam.limits.limits.iter().find(|limit| limit.movement == movement)
    }
}

pub(super) fn verdict(check: &Check) -> Verdict {
    Verdict {
        word: check.verdict.word(),
        share: check.utilisation.filter(|u| u.is_finite()).unwrap_or(0.0),
        printed: check.utilisation.map(decimal::utilisation).unwrap_or_default(),
    }
}

/// A demand or capacity of a check with its unit; movements to 0.1 mm, tilts as 1/n, the rest to three figures.
pub(super) fn amount(check: &Check, si: Option<f64>) -> (String, &'static str) {
    let Some(si) = si else { return (String::new(), "") };
    match check.unit {
        CheckUnit::Force => (three(si, Unit::Kn), "kN"),
        CheckUnit::Moment => (three(si, Unit::Knm), "kNm"),
        CheckUnit::Length => (decimal::movement(si), "mm"),
        CheckUnit::Ratio if check.kind == CheckKind::Tilt => (decimal::one_in(si), ""),
        CheckUnit::Ratio => (decimal::utilisation(si), ""),
    }
}

/// "3-1-1 6.2.5": the clause column has no room for the words that all its rows share.
fn short_clause(clause: &str) -> String {
    match (clause.strip_prefix("EN 1993-"), clause.strip_prefix("EN ")) {
        (Some(rest), _) => format!("3-{rest}"),
        (None, Some(rest)) => rest.to_string(),
        (None, None) => clause.to_string(),
    }
}

/// What the clause column says: the clause or limit, the reason where a check is not verified, what else is required.
pub(super) fn clause(check: &Check) -> String {
    let clause = short_clause(&check.clause);
    match (check.verdict, &check.reason) {
        (Word::NotVerified, Some(reason)) if reason == check.kind.name() => {
            format!("{clause}; not in this version")
        }
        (Word::NotVerified, Some(reason)) => reason.clone(),
        (Word::NotMet, Some(reason)) => format!("{clause}; {reason}"),
        _ => clause,
    }
}

/// The value of one action in a list.
pub(super) fn of<T: Copy>(list: &[(Action, T)], action: Action) -> Option<T> {
    list.iter().find(|(a, _)| *a == action).map(|(_, value)| *value)
}

/// A force in kN to three figures, never finer than 1 N; empty where the action brings none.
pub(super) fn kn(force: Option<Force>) -> String {
    let Some(newtons) = force.map(Force::si) else { return String::new() };
    // What is left of nothing after a solve is nothing.
    if newtons.abs() < 1e-3 { String::new() } else { three(newtons, Unit::Kn) }
}

/// Three figures, never finer than a thousandth of the unit; zero is plain.
pub(super) fn three(si: f64, unit: Unit) -> String {
    let size = si.abs() / unit.one();
    if size == 0.0 {
        "0".into()
    } else if size < 0.1 {
        decimal::places(si, 3, unit)
    } else {
        decimal::three_figures(si, unit)
    }
}

/// A place along a beam in m, with its unit.
pub(super) fn along(metres: f64) -> String {
    decimal::along(metres)
}

/// "3.12 m" or "0 m".
pub(super) fn along_m(metres: f64) -> String {
    format!("{} m", decimal::along(metres))
}

/// Who set a limit, as a set's own if it is one.
pub(super) fn limit_words(limit: &Limit) -> (String, String) {
    fn of(from: &LimitFrom, movement: Movement) -> (String, String) {
        match from {
            LimitFrom::Given { reason: Some(reason) } => (reason.clone(), "job file".into()),
            LimitFrom::Given { reason: None } => ("as asked for".into(), "job file".into()),
            LimitFrom::Set(set) => (set.reason(movement).into(), set.source(movement).into()),
            LimitFrom::SameAsTotal(from) => of(from, Movement::Total),
        }
    }
    of(&limit.from, limit.movement)
}

/// A load as typed where that is short, else to three figures.
pub(super) fn compact(si: f64, unit: Unit) -> String {
    match decimal::Decimal::as_typed(si, 4) {
        Some(typed) => {
            let typed = typed.moved(-unit.power()).without_trailing_zeros();
            if typed.figures() <= 3 { typed.with_places(2).to_string() } else { decimal::three_figures(si, unit) }
        }
        None => decimal::three_figures(si, unit),
    }
}
