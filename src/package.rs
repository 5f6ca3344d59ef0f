//! From a computed job to what the sheets are given.

use sagledger_sheets::{Draft, Logo, Meta, Overrides, Package, Paper, Record};
use sha2::{Digest, Sha256};

use crate::{Computed, hexadecimal, job, program};

/// The package of a draft.
pub fn draft<'a>(computed: &'a Computed, results_text: &'a str, templates: Overrides) -> Package<'a> {
    let text = computed.job.text();
    let digest = computed.digest(results_text);
    Package {
        meta: meta(&computed.job.meta),
        building: &computed.job.building,
        results: &computed.results,
        job_text: text,
        results_json: results_text,
        record: Record {
            program_version: program::VERSION.into(),
            program_identity: program::IDENTITY.into(),
            catalogue_version: program::CATALOGUE.into(),
            job_sha256: hexadecimal(&Sha256::digest(text.as_bytes())),
            results_sha256: hexadecimal(&Sha256::digest(results_text.as_bytes())),
            fingerprint: digest[..8].into(),
        },
        draft: Some(Draft { after: None }),
        templates,
    }
}

fn meta(meta: &job::Meta) -> Meta {
    let picture = meta.logo.as_ref().and_then(|logo| logo.picture.as_ref());
    Meta {
        number: meta.number.clone(),
        title: meta.title.clone(),
        site: meta.site.clone(),
        client: meta.client.clone(),
        practice: meta.practice.clone(),
        engineer: meta.engineer.clone(),
        checker: meta.checker.clone(),
        date: meta.date,
        drawings: meta.drawings.clone(),
        accent: meta.accent.as_deref().and_then(rgb),
        // The reader decoded the picture already, so that it is known to be whole.
        logo: picture.and_then(|picture| Logo::read(&picture.bytes).ok()),
        lang: match &meta.lang.region {
            Some(region) => format!("{}-{region}", meta.lang.language),
            None => meta.lang.language.clone(),
        },
        drawing_sheets: match meta.drawing_sheets {
            job::Paper::A4 => Paper::A4,
            job::Paper::A3 => Paper::A3,
        },
    }
}

/// "#rrggbb" as three bytes.
fn rgb(text: &str) -> Option<[u8; 3]> {
    let digits = text.strip_prefix('#').filter(|d| d.len() == 6 && d.is_ascii())?;
    let byte = |at: usize| u8::from_str_radix(&digits[at..at + 2], 16).ok();
    Some([byte(0)?, byte(2)?, byte(4)?])
}
