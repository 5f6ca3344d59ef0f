//! A building and its results as plain text and lists: what the templates print, with every figure already written.

mod meta;

use serde::Serialize;

use crate::glue::PartName;
use crate::package::Package;

#[derive(Debug, Serialize)]
pub(crate) struct Document {
    meta: meta::Meta,
    parts: Vec<Part>,
}

/// The parts, each printed by its own template.
#[derive(Debug, Serialize)]
#[serde(untagged)]
enum Part {
    Cover(()),
}

impl Part {
    fn template(&self) -> &'static str {
        match self {
            Part::Cover(_) => "cover.typ",
        }
    }
}

impl Document {
    pub fn part_names(&self) -> Vec<PartName> {
        self.parts.iter().map(|part| PartName { template: part.template() }).collect()
    }
}

pub(crate) fn document(package: &Package) -> Document {
    Document { meta: meta::meta(package), parts: vec![Part::Cover(())] }
}
