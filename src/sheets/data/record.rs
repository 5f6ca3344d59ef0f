//! The record: the job file as read, what made the package, fingerprints.

use serde::Serialize;

use crate::fonts::{prints, replaced};
use crate::package::Package;

#[derive(Debug, Serialize)]
pub(super) struct Record {
    made_by: Vec<(&'static str, String)>,
    fingerprints: Vec<(&'static str, String)>,
    listing: Vec<String>,
    /// Said where the listing had to replace characters.
    replaced: Option<String>,
}

/// Spaces for a tab in the listing.
const TAB: &str = "    ";

pub(super) fn record(package: &Package) -> Record {
    let record = &package.record;
    let mut count = 0;
    let listing: Vec<String> = package
        .job_text
        .trim_start_matches('\u{feff}')
        .lines()
        .map(|line| {
            let (line, replaced) = replaced(&line.replace('\t', TAB), prints);
            count += replaced;
            line
        })
        .collect();
    let shown = |text: &str| if text.is_empty() { None } else { Some(text.to_string()) };
    let made_by = [
        ("program", shown(&record.program_version).map(|version| format!("sagledger {version}"))),
        ("identity", shown(&record.program_identity)),
        ("catalogue", shown(&record.catalogue_version)),
    ];
    let fingerprints = [
        ("job.toml", shown(&record.job_sha256)),
        ("results.json", shown(&record.results_sha256)),
        ("in the head", shown(&record.fingerprint)),
    ];
    let present = |rows: [(&'static str, Option<String>); 3]| {
        rows.into_iter().filter_map(|(label, text)| Some((label, text?))).collect::<Vec<_>>()
    };
    Record {
        made_by: present(made_by),
        fingerprints: present(fingerprints),
        listing,
        replaced: (count > 0).then(|| {
            let noun = if count == 1 {
                "character that no font here has is"
            } else {
                "characters that no font here has are"
            };
            format!("{count} {noun} shown as \u{fffd}; the attached file has the original.")
        }),
    }
}
