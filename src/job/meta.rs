//! What a job says about itself and its package, apart from what is calculated.

use chrono::NaiveDate;

/// `[job]` and `[package]`. Texts are as they are printed: characters that no typeface has are replaced already.
#[derive(Clone, Debug, PartialEq)]
pub struct Meta {
    pub number: String,
    pub title: String,
    pub site: Option<String>,
    pub client: Option<String>,
    pub practice: Option<String>,
    pub engineer: Option<String>,
    pub checker: Option<String>,
    /// The date printed on the package.
    pub date: NaiveDate,
    pub logo: Option<Logo>,
    /// Drawings that the sizes were taken from.
    pub drawings: Vec<String>,
    /// The ink besides black, "#rrggbb" in lower case.
    pub accent: Option<String>,
    /// Paper of the sheets that are drawings.
    pub drawing_sheets: Paper,
    pub lang: Lang,
}

#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Paper {
    A4,
    A3,
}

/// A language tag, "en" and "GB".
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct Lang {
    pub language: String,
    pub region: Option<String>,
}

impl Default for Lang {
    fn default() -> Lang {
        Lang { language: "en".into(), region: Some("GB".into()) }
    }
}

/// The practice's logo.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct Logo {
    /// Its path in the job's folder, parts divided by `/`.
    pub path: String,
    /// The file; none where a job is read without its folder.
    pub picture: Option<Picture>,
}

/// A picture file that was decoded once, so that it is known to be whole.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct Picture {
    pub format: PictureFormat,
    pub width: u32,
    pub height: u32,
    pub bytes: Vec<u8>,
}

#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum PictureFormat {
    Png,
    Jpeg,
}
