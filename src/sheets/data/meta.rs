//! What every sheet's head and foot say.

use chrono::{Datelike, NaiveDate};
use serde::Serialize;

use crate::package::Package;

#[derive(Debug, Serialize)]
pub(super) struct Meta {
    number: String,
    title: String,
    /// The title, cut to what the head has room for.
    #[serde(rename = "head-title")]
    head_title: String,
    practice: Option<String>,
    date: String,
    accent: String,
    fingerprint: String,
    draft: Option<Draft>,
}

#[derive(Debug, Serialize)]
struct Draft {
    after: Option<String>,
}

/// The ink that a practice that names none prints with besides black: black.
const NO_ACCENT: [u8; 3] = [0, 0, 0];
/// Characters of job number and title together that the head has room for.
const HEAD_ROOM: usize = 62;

pub(super) fn meta(package: &Package) -> Meta {
    let meta = &package.meta;
    let [red, green, blue] = meta.accent.unwrap_or(NO_ACCENT);
    Meta {
        number: meta.number.clone(),
        title: meta.title.clone(),
        head_title: cut(&meta.title, HEAD_ROOM.saturating_sub(meta.number.chars().count()).max(12)),
        practice: meta.practice.clone(),
        date: written_date(meta.date),
        accent: format!("#{red:02x}{green:02x}{blue:02x}"),
        fingerprint: package.record.fingerprint.clone(),
        draft: package.draft.as_ref().map(|draft| Draft { after: draft.after.clone() }),
    }
}

/// "20 November 2026".
pub(super) fn written_date(date: NaiveDate) -> String {
    const MONTHS: [&str; 12] = [
        "January",
        "February",
        "March",
        "April",
        "May",
        "June",
        "July",
        "August",
        "September",
        "October",
        "November",
        "December",
    ];
    let month = MONTHS.get(date.month0() as usize).copied().unwrap_or_default();
    format!("{} {month} {}", date.day(), date.year())
}

/// At most `room` characters, the last one an ellipsis where something was cut.
fn cut(text: &str, room: usize) -> String {
    if text.chars().count() <= room {
        return text.to_string();
    }
    let kept: String = text.chars().take(room.saturating_sub(1)).collect();
    format!("{}…", kept.trim_end())
}
