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

use crate::drawings;
use crate::drawings::diagrams::Diagrams;
use crate::drawings::scene::Drawing;
use crate::drawings::stack::Stack;
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
    let (building, results) = (package.building, package.results);
    let view = View { building, results };
    let paper = package.meta.drawing_sheets;
    let stacks: Vec<Stack> = results.chains.iter().map(|chain| Stack::of(building, results, chain)).collect();

    // The cover shows the longest chain.
    let longest = results.chains.iter().zip(&stacks).rev().max_by_key(|(chain, _)| chain.beams.len());
    let picture = longest.and_then(|(_, stack)| stack.cover()).map(json);
    let mut parts =
        vec![Part::Cover(Box::new(cover::cover(package, view, picture))), Part::Basis(basis::basis(package, view))];
    parts.extend(loads::loads(view).map(Part::Loads));
    let path = drawings::load_path::load_path(building, results);
    parts.push(Part::LoadPath(takedown::load_path(view, paper, path.into_iter().map(json).collect())));
    parts.push(Part::Governing(governing::governing(view)));
    for (index, beam, result) in view.beams() {
        let drawings = Drawings {
            chain: drawings::small_chain::small_chain(building, index).map(json),
            section: Some(json(drawings::section::section_drawing(&beam.section))),
            diagrams: Diagrams::of(building, results, index).map(|d| json(d.drawing())),
        };
        parts.push(Part::Member(Box::new(member::member(view, index, beam, result, drawings))));
    }
    let chains = results.chains.iter().zip(&stacks).map(|(chain, stack)| stacked::Chain {
        drawings: stack.drawings().into_iter().map(json).collect(),
        budgets: drawings::budget::budget_bars(building, results, chain).into_iter().map(json).collect(),
    });
    parts.push(Part::Stacked(stacked::stacked(view, paper, chains.collect())));
    parts.push(Part::Cautions(cautions::cautions(package, view)));
    parts.push(Part::Record(record::record(package)));
    Document { meta: meta::meta(package), parts }
}

/// A drawing as it travels to its template.
fn json(drawing: Drawing) -> Value {
    serde_json::to_value(drawing).unwrap_or(Value::Null)
}

fn paper_name(paper: Paper) -> &'static str {
    match paper {
        Paper::A4 => "a4",
        Paper::A3 => "a3",
    }
}
