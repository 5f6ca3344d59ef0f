//! Who is called what: walls, posts and beams share one set of names, build-ups have their own.

use std::collections::HashMap;

use crate::job::fault::Fault;
use crate::job::findings::Findings;
use crate::job::near::nearest;
use crate::job::registry::Name;
use crate::job::tables::Typed;
use crate::job::values::{either, quoted};
use crate::job::view::At;

/// Marks of this length are near each other without a slip of the pen.
const SHORT: usize = 3;

/// What a bearing can stand on.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) enum Support {
    Wall(usize),
    Beam(usize),
    /// A post or a pad, which this version refuses elsewhere.
    Later,
}

pub(super) struct Names {
    supports: HashMap<String, Support>,
    build_ups: HashMap<String, usize>,
    /// Names with their places, in the order of the file.
    support_places: Vec<At<String>>,
    build_up_places: Vec<At<String>>,
    /// A wall or a beam lacks a readable name, or is hidden behind a slip of the pen.
    supports_hidden: bool,
    build_ups_hidden: bool,
}

impl Names {
    /// Gathers all names; a second owner of one is a fault, and the first keeps it.
    pub fn of(typed: &Typed, found: &mut Findings) -> Names {
        let mut owners: Vec<(At<String>, Support)> = Vec::new();
        for (at, wall) in typed.walls.iter().enumerate() {
            owners.extend(wall.known_as.clone().map(|name| (name, Support::Wall(at))));
        }
        for (at, beam) in typed.beams.iter().enumerate() {
            owners.extend(beam.known_as.clone().map(|mark| (mark, Support::Beam(at))));
        }
        owners.sort_by_key(|(name, _)| name.span.start);
        let mut names = Names {
            supports: HashMap::new(),
            build_ups: HashMap::new(),
            support_places: Vec::new(),
            build_up_places: Vec::new(),
            supports_hidden: typed.supports_hidden
                || typed.walls.iter().any(|wall| wall.known_as.is_none())
                || typed.beams.iter().any(|beam| beam.known_as.is_none()),
            build_ups_hidden: typed.build_ups_hidden || typed.build_ups.iter().any(|b| b.name.is_none()),
        };
        let mut first: HashMap<String, usize> = HashMap::new();
        for (name, support) in owners {
            match first.get(&name.value) {
                Some(at) => found.add(taken(&name, &names.support_places[*at], found)),
                None => {
                    first.insert(name.value.clone(), names.support_places.len());
                    names.supports.insert(name.value.clone(), support);
                    names.support_places.push(name);
                }
            }
        }
        for later in &typed.later_supports {
            names.supports.entry(later.clone()).or_insert(Support::Later);
        }
        for (at, build_up) in typed.build_ups.iter().enumerate() {
            let Some(name) = &build_up.name else { continue };
            match names.build_ups.get(&name.value) {
                Some(_) => {
                    let first = names.build_up_places.iter().find(|place| place.value == name.value);
                    if let Some(first) = first {
                        found.add(taken(name, first, found));
                    }
                }
                None => {
                    names.build_ups.insert(name.value.clone(), at);
                    names.build_up_places.push(name.clone());
                }
            }
        }
        names
    }

    pub fn support(&self, name: &str) -> Option<Support> {
        self.supports.get(name).copied()
    }

    pub fn build_up(&self, name: &str) -> Option<usize> {
        self.build_ups.get(name).copied()
    }

    pub fn unknown_support(&self, typed: &At<String>, found: &mut Findings) {
        self.unknown(Name::NameUnknown, typed, found);
    }

    pub fn unknown_build_up(&self, typed: &At<String>, found: &mut Findings) {
        self.unknown(Name::BuildUpUnknown, typed, found);
    }

    fn unknown(&self, name: Name, typed: &At<String>, found: &mut Findings) {
        let (fact, known, hidden) = match name {
            Name::BuildUpUnknown => ("no build-up has this name", &self.build_up_places, self.build_ups_hidden),
            _ => ("no wall, beam or post has this name", &self.support_places, self.supports_hidden),
        };
        let mut near = match found.may_look_for_near_names() {
            true => nearest(&typed.value, known.iter().map(|at| at.value.as_str())),
            false => Vec::new(),
        };
        let is_near = !near.is_empty();
        if hidden && !(is_near && typed.value.chars().count() > SHORT) {
            // It may be the name of one that has been told to lack it; short marks are all alike.
            return;
        }
        if near.is_empty() && known.len() <= 3 {
            near = known.iter().map(|at| at.value.as_str()).collect();
        }
        let place = |name: &str| known.iter().find(|at| at.value == name).map(|at| found.line(&at.span));
        let listed: Vec<String> = near
            .iter()
            .take(3)
            .filter_map(|name| Some(format!("{}, line {}", quoted(name), place(name)?)))
            .collect();
        let remedy = match listed.as_slice() {
            [] if known.len() <= 6 => {
                let all: Vec<String> = known.iter().map(|at| quoted(&at.value)).collect();
                format!("name one of {}", all.join(", "))
            }
            [] => "name one that is in this file".to_string(),
            several => format!("there is {}", either(several)),
        };
        let mut fault = Fault::new(name, Some(typed.span.clone()), fact, remedy);
        if let ([one], true) = (near.as_slice(), is_near) {
            fault = fault.replaced_by(toml_text(one));
        }
        fault.also = near
            .iter()
            .take(3)
            .filter_map(|n| known.iter().find(|at| at.value == *n))
            .map(|at| at.span.clone())
            .collect();
        found.add(fault);
    }
}

fn taken(name: &At<String>, first: &At<String>, found: &Findings) -> Fault {
    let fact = format!("{} is taken", quoted(&name.value));
    let remedy = format!("choose another, line {} has it", found.line(&first.span));
    Fault::new(Name::NameTaken, Some(name.span.clone()), fact, remedy).with(first.span.clone())
}

/// A text as TOML writes it.
fn toml_text(text: &str) -> String {
    format!("\"{}\"", text.replace('\\', "\\\\").replace('"', "\\\""))
}

/// "the east wall", but "W1".
pub(super) fn with_article(name: &str) -> String {
    match name.chars().next() {
        Some(c) if c.is_lowercase() => format!("the {name}"),
        _ => name.to_string(),
    }
}
