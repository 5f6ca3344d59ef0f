//! Arrangements and places in words, the same wherever they are said.

use crate::building::Building;
use crate::results::{Arrangement, Results, StretchKind};

/// "imposed loads everywhere", or which rows are left out where; empty where no imposed load is looked at.
pub fn arrangement(building: &Building, results: &Results, arrangement: &Arrangement) -> String {
    if arrangement.absent.is_empty() {
        return if arrangement.any_present { "imposed loads everywhere".into() } else { String::new() };
    }
    let mut parts: Vec<String> = Vec::new();
    for absent in &arrangement.absent {
        let Some(beam) = building.beams.get(absent.beam) else { continue };
        let what = beam.loads.get(absent.row).map_or("own weight", |row| row.what.as_str());
        let stretches = results.beams.get(absent.beam).map_or(&[][..], |b| &b.stretches);
        let words = match stretches.get(absent.stretch) {
            Some(s) if stretches.len() > 1 => {
                let kind = match s.kind {
                    StretchKind::Span => "span",
                    StretchKind::Overhang | StretchKind::SeatEnd => "end",
                };
                format!("{what} on {}, {kind} {:.2} to {:.2} m", beam.mark, s.from.si(), s.to.si())
            }
            _ => format!("{what} on {}", beam.mark),
        };
        if !parts.contains(&words) {
            parts.push(words);
        }
    }
    format!("without {}", parts.join("; "))
}
