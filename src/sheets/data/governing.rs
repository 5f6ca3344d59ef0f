//! Every check of every member in one table.

use sagledger_calc::checks::places;
use serde::Serialize;

use super::text::{breakable, keys};
use super::view::{Verdict, View, clause, verdict};

#[derive(Debug, Serialize)]
pub(super) struct Governing {
    groups: Vec<Group>,
    notes: Vec<String>,
}

#[derive(Debug, Serialize)]
struct Group {
    mark: String,
    section: String,
    rows: Vec<Row>,
}

#[derive(Debug, Serialize)]
struct Row {
    name: String,
    place: String,
    combination: String,
    verdict: Verdict,
    clause: String,
    sheet: String,
    /// The closest of its member.
    closest: bool,
}

pub(super) fn governing(view: View) -> Governing {
    let groups = view
        .beams()
        .map(|(index, beam, result)| {
            let closest = view.closest(result);
            let rows = result.checks.iter().filter(|check| !check.advice).map(|check| Row {
                name: breakable(&view.check_name(index, check)),
                place: places::place(result, check),
                combination: view.short_combination(check),
                verdict: verdict(check),
                clause: clause(check),
                sheet: keys::beam_checks(index),
                closest: closest.is_some_and(|c| std::ptr::eq(c, check)),
            });
            let section = match &beam.title {
                Some(title) => format!("{}, {}", beam.section.name, lower(title)),
                None => beam.section.name.to_string(),
            };
            Group { mark: beam.mark.clone(), section, rows: rows.collect() }
        })
        .collect();
    let mut notes = Vec::new();
    let mut bearings = view.results.beams.iter().flat_map(|beam| &beam.bearings);
    if bearings.all(|bearing| bearing.uplift_max().si() == 0.0) {
        notes.push("No bearing lifts in any combination.".into());
    }
    Governing { groups, notes }
}

/// A title within a line: its first letter small unless the word has further capitals.
fn lower(title: &str) -> String {
    let first = title.split_whitespace().next().unwrap_or_default();
    if first.chars().skip(1).any(char::is_uppercase) || first.chars().count() < 2 {
        return title.to_string();
    }
    let mut letters = title.chars();
    match letters.next() {
        Some(c) => c.to_lowercase().chain(letters).collect(),
        None => String::new(),
    }
}
