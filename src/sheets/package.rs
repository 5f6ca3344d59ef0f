//! What a package is made of.

use chrono::NaiveDate;
use sagledger_calc::building::Building;
use sagledger_calc::results::Results;

use crate::logo::Logo;
use crate::templates::Overrides;

/// Everything that is printed or attached. All text is data: none of it is ever read as markup.
#[derive(Clone, Debug)]
pub struct Package<'a> {
    pub meta: Meta,
    pub building: &'a Building,
    pub results: &'a Results,
    /// The job file as it was read, printed in the record and attached.
    pub job_text: &'a str,
    /// The results file, attached.
    pub results_json: &'a str,
    pub record: Record,
    /// None for an issue.
    pub draft: Option<Draft>,
    pub templates: Overrides,
}

/// What the job says about itself. Characters that no font has are replaced before they come here
/// ([`prints`](crate::fonts::prints)); any that are left are replaced here.
#[derive(Clone, Debug, PartialEq)]
pub struct Meta {
    pub number: String,
    pub title: String,
    pub site: Option<String>,
    pub client: Option<String>,
    pub practice: Option<String>,
    pub engineer: Option<String>,
    pub checker: Option<String>,
    pub date: NaiveDate,
    /// What the sizes were taken from.
    pub drawings: Vec<String>,
    /// Red, green and blue of the one ink besides black.
    pub accent: Option<[u8; 3]>,
    pub logo: Option<Logo>,
    /// Such as `en-GB`.
    pub lang: String,
    /// Size of the sheets that are drawings.
    pub drawing_sheets: Paper,
}

#[derive(Clone, Copy, Debug, PartialEq, Eq, Default)]
pub enum Paper {
    #[default]
    A4,
    A3,
}

/// What made the package, and the fingerprints of what it was made from.
#[derive(Clone, Debug, PartialEq, Default)]
pub struct Record {
    pub program_version: String,
    pub program_identity: String,
    pub catalogue_version: String,
    /// Hexadecimal SHA-256 of the job file.
    pub job_sha256: String,
    /// Hexadecimal SHA-256 of the results file.
    pub results_sha256: String,
    /// The first 8 hexadecimal digits of the SHA-256 over job file, pictures and results.
    pub fingerprint: String,
}

/// A package that is not an issue: every sheet says so.
#[derive(Clone, Debug, PartialEq, Default)]
pub struct Draft {
    /// Code of the last issue before it.
    pub after: Option<String>,
}
