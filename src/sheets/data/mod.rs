//! A building and its results as plain text and lists: what the templates print, with every figure already written.

mod basis;
mod cautions;
mod cover;
mod governing;
mod loads;
mod member;
mod meta;
mod record;
mod stacked;
mod takedown;
mod text;
mod view;

use serde::Serialize;
use serde_json::Value;

use crate::fonts;
use crate::glue::PartName;
use crate::package::{Package, Paper};
use member::Drawings;
use view::View;

#[derive(Debug, Serialize)]
pub(crate) struct Document {
    meta: meta::Meta,
    parts: Vec<Part>,
}

/// The parts, each printed by its own template.
#[derive(Debug, Serialize)]
#[serde(untagged)]
enum Part {
    Cover(Box<cover::Cover>),
    Basis(basis::Basis),
    Loads(loads::Loads),
    LoadPath(takedown::LoadPath),
    Governing(governing::Governing),
    Member(Box<member::Member>),
    Stacked(stacked::StackedDeflections),
    Cautions(cautions::Cautions),
    Record(record::Record),
}

impl Part {
    fn template(&self) -> &'static str {
        match self {
            Part::Cover(_) => "cover.typ",
            Part::Basis(_) => "basis.typ",
            Part::Loads(_) => "loads.typ",
            Part::LoadPath(_) => "load-path.typ",
            Part::Governing(_) => "governing.typ",
            Part::Member(_) => "member.typ",
            Part::Stacked(_) => "stacked.typ",
            Part::Cautions(_) => "cautions.typ",
            Part::Record(_) => "record.typ",
        }
    }
}

impl Document {
    pub fn part_names(&self) -> Vec<PartName> {
        self.parts.iter().map(|part| PartName { template: part.template() }).collect()
    }

    /// The data as JSON. Whatever no font can print is replaced, wherever it stands.
    pub fn to_json(&self) -> Result<Vec<u8>, serde_json::Error> {
        let mut value = serde_json::to_value(self)?;
        sieve(&mut value);
        serde_json::to_vec(&value)
    }
}

/// Replaces what no font can print in every text. Places to break at (U+200B) stay.
fn sieve(value: &mut Value) {
    match value {
        Value::String(text) => {
            let prints = |c: char| c == '\u{200b}' || fonts::prints(c);
            if !text.chars().all(prints) {
                *text = fonts::replaced(text, prints).0;
            }
        }
        Value::Array(items) => items.iter_mut().for_each(sieve),
        Value::Object(map) => map.values_mut().for_each(sieve),
        Value::Null | Value::Bool(_) | Value::Number(_) => {}
    }
}

pub(crate) fn document(package: &Package) -> Document {
    let view = View { building: package.building, results: package.results };
    let paper = package.meta.drawing_sheets;
    let mut parts = vec![Part::Cover(Box::new(cover::cover(package, view, None))), Part::Basis(basis::basis(package, view))];
    parts.extend(loads::loads(view).map(Part::Loads));
    parts.push(Part::LoadPath(takedown::load_path(view, paper, vec![])));
    parts.push(Part::Governing(governing::governing(view)));
    for (index, beam, result) in view.beams() {
        let drawings = Drawings::default();
        parts.push(Part::Member(Box::new(member::member(view, index, beam, result, drawings))));
    }
    parts.push(Part::Stacked(stacked::stacked(view, paper, vec![], None)));
    parts.push(Part::Cautions(cautions::cautions(package, view)));
    parts.push(Part::Record(record::record(package)));
    Document { meta: meta::meta(package), parts }
}

fn paper_name(paper: Paper) -> &'static str {
    match paper {
        Paper::A4 => "a4",
        Paper::A3 => "a3",
    }
}
