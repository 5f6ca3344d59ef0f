//! `[job]` and `[package]`.

use chrono::NaiveDate;
use toml::de::DeValue;

use crate::job::bounds;
use crate::job::fault::Fault;
use crate::job::findings::Findings;
use crate::job::keys;
use crate::job::logo;
use crate::job::meta::{Lang, Logo, Meta, Paper};
use crate::job::registry::Name;
use crate::job::view::{At, Item, Table};

/// The language of job files that this program reads.
pub const LANGUAGE: i64 = 1;

pub(super) fn read(root: &Table, found: &mut Findings) -> (Option<Meta>, Option<At<Logo>>) {
    let package = root.get("package").and_then(|item| item.table(&keys::PACKAGE, found));
    let package = package.map(|table| Package::read(&table, found)).unwrap_or_default();
    let Some(job) = root.require("job", found).and_then(|item| item.table(&keys::JOB, found)) else {
        return (None, None);
    };
    language(&job, found);
    let number = job.required("number", found, Item::name);
    let title = job.required("title", found, Item::text);
    let mut line = |key: &str| job.field(key, found, Item::text).value().cloned();
    let (site, client, practice) = (line("site"), line("client"), line("practice"));
    let (engineer, checker) = (line("engineer"), line("checker"));
    let date = job.required("date", found, date);
    let logo = job.field("logo", found, logo::named).given().cloned();
    let drawings = job.field("drawings", found, texts).value().cloned().unwrap_or_default();
    let meta = || {
        Some(Meta {
            number: number.value()?.clone(),
            title: title.value()?.clone(),
            site,
            client,
            practice,
            engineer,
            checker,
            date: *date.value()?,
            logo: logo.as_ref().map(|logo| logo.value.clone()),
            drawings,
            accent: package.accent,
            drawing_sheets: package.drawing_sheets.unwrap_or(Paper::A4),
            lang: package.lang.unwrap_or_default(),
        })
    };
    (meta(), logo)
}

#[derive(Default)]
struct Package {
    accent: Option<String>,
    drawing_sheets: Option<Paper>,
    lang: Option<Lang>,
}

impl Package {
    fn read(table: &Table, found: &mut Findings) -> Package {
        let paper = [("A4", Paper::A4), ("A3", Paper::A3)];
        Package {
            accent: table.field("accent", found, accent).value().cloned(),
            drawing_sheets: table.field("drawings", found, |item, f| item.choice(&paper, f)).value().copied(),
            lang: table.field("lang", found, lang).value().cloned(),
        }
    }
}

/// A later language was refused before; here it is a whole number from 1 to ours.
fn language(job: &Table, found: &mut Findings) {
    let Some(item) = job.get("language") else { return };
    let DeValue::Integer(number) = item.value else {
        return item.wrong_type("a whole number", format!("write language = {LANGUAGE}"), found);
    };
    let known = i64::from_str_radix(number.as_str(), number.radix()).is_ok_and(|n| (1..=LANGUAGE).contains(&n));
    if !known {
        let fact = format!("no job file has language {}", number.as_str());
        let fault = item.fault(Name::OutOfBounds, fact, format!("write language = {LANGUAGE}"));
        found.add(fault.replaced_by(LANGUAGE.to_string()));
    }
}

fn texts(item: &Item, found: &mut Findings) -> Option<Vec<String>> {
    let items = item.list(found)?;
    let texts: Vec<Option<String>> = items.iter().map(|item| item.text(found)).collect();
    texts.into_iter().collect()
}

fn date(item: &Item, found: &mut Findings) -> Option<NaiveDate> {
    let malformed = |fact: &str, remedy: &str| item.fault(Name::DateMalformed, fact, remedy);
    let DeValue::Datetime(typed) = item.value else {
        let text = found.source.slice(&item.span).trim_matches(['"', '\'']);
        found.add(match NaiveDate::parse_from_str(text, "%Y-%m-%d") {
            Ok(date) => malformed("a date in quotes", &format!("write {date}")).replaced_by(date.to_string()),
            Err(_) => malformed("date is not a date", "write it as in 2026-11-20, without quotes"),
        });
        return None;
    };
    let (Some(day), None) = (typed.date, typed.time) else {
        found.add(malformed("date is not a day alone", "write it as in 2026-11-20, without a time"));
        return None;
    };
    if !bounds::YEAR.admit(f64::from(day.year)) {
        let fact = format!("the year {} is no year of a package", day.year);
        let remedy = format!("give {} to {}", bounds::YEAR.least, bounds::YEAR.greatest);
        found.add(item.fault(Name::OutOfBounds, fact, remedy));
        return None;
    }
    let date = NaiveDate::from_ymd_opt(i32::from(day.year), u32::from(day.month), u32::from(day.day));
    if date.is_none() {
        found.add(malformed("a date that does not exist", "write a day of the calendar"));
    }
    date
}

fn accent(item: &Item, found: &mut Findings) -> Option<String> {
    let text = item.reference(found)?;
    let digits = text.strip_prefix('#').unwrap_or(&text);
    let hexadecimal = digits.len() == 6 && digits.bytes().all(|b| b.is_ascii_hexdigit());
    if hexadecimal && text.starts_with('#') {
        return Some(text.to_ascii_lowercase());
    }
    let fault = item.fault(Name::AccentMalformed, "accent is not #rrggbb", "write it as in \"#1f3b57\"");
    found.add(match hexadecimal {
        true => Fault { remedy: format!("write \"#{digits}\""), ..fault }.replaced_by(format!("\"#{digits}\"")),
        false => fault,
    });
    None
}

fn lang(item: &Item, found: &mut Findings) -> Option<Lang> {
    let text = item.reference(found)?;
    let (language, region) = match text.split_once('-') {
        Some((language, region)) => (language, Some(region)),
        None => (text.as_str(), None),
    };
    let lower = (2..=3).contains(&language.len()) && language.bytes().all(|b| b.is_ascii_lowercase());
    let upper = region.is_none_or(|r| r.len() == 2 && r.bytes().all(|b| b.is_ascii_uppercase()));
    if lower && upper {
        return Some(Lang { language: language.to_string(), region: region.map(str::to_string) });
    }
    found.add(item.fault(Name::LangMalformed, "lang is not a language tag", "write it as in \"en-GB\""));
    None
}
