//! The job's verdict, what is not met, what is not verified, what is outside.

use sagledger_calc::building::Building;
use sagledger_calc::checks::places;
use sagledger_calc::outside::outside;
use sagledger_calc::results::{Check, Results, Verdict};

use super::ledger::{capacity, demand};
use super::{Screen, scale, wrapped};

/// The lines of the verdict.
pub fn lines(screen: &Screen, building: &Building, results: &Results) -> Vec<String> {
    let width = screen.text_width();
    let items = outside(building);
    let count = match items.len() {
        1 => "1 item".to_string(),
        n => format!("{n} items"),
    };
    let mut out = Vec::new();
    if results.verdict == Verdict::Met {
        let line = format!("{} Met, with {count} outside this calculation", scale::mark(screen, Verdict::Met));
        out.push(screen.bold(&line));
        out.extend(wrapped(&items.join("; "), 2, width));
        return out.iter().map(|line| screen.plain(line)).collect();
    }
    for (verdict, head) in [(Verdict::NotMet, "Not met"), (Verdict::NotVerified, "Not verified")] {
        let said = said(building, results, verdict);
        if said.is_empty() {
            continue;
        }
        let text = format!("{} {head}: {}", scale::mark(screen, verdict), said.join("; "));
        let hanging = wrapped(&text, 2, width);
        for (n, line) in hanging.into_iter().enumerate() {
            let line = if n == 0 { line.trim_start().to_string() } else { line };
            out.push(if verdict == Verdict::NotMet { screen.bold(&line) } else { line });
        }
    }
    out.extend(wrapped(&format!("and {count} outside this calculation: {}", items.join("; ")), 2, width));
    out.iter().map(|line| screen.plain(line)).collect()
}

/// Requirements of one verdict in words: "tilt of B2, 1/522 against 1/600".
fn said(building: &Building, results: &Results, verdict: Verdict) -> Vec<String> {
    let mut said: Vec<String> = Vec::new();
    for &beam in &results.order {
        let own = &results.beams[beam];
        for check in own.checks.iter().filter(|c| !c.advice && c.verdict == verdict) {
            let name = places::name(building, results, beam, check);
            let words = match verdict {
                Verdict::NotVerified => unverified(building, results, beam, check, &name),
                Verdict::NotMet | Verdict::Met => {
                    let limit = capacity(check);
                    let against = if limit.is_empty() { String::new() } else { format!(" against {limit}") };
                    format!("{name} of {}, {}{against}", building.beams[beam].mark, demand(check))
                }
            };
            if !said.contains(&words) {
                said.push(words);
            }
        }
    }
    said
}

fn unverified(building: &Building, results: &Results, beam: usize, check: &Check, name: &str) -> String {
    let mark = &building.beams[beam].mark;
    let place = places::place(&results.beams[beam], check);
    match &check.reason {
        Some(reason) if reason != name => format!("{name} of {mark}, {place}, {reason}"),
        _ => format!("{name} of {mark}, {place}"),
    }
}
