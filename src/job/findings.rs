//! What the reader has found so far. Whatever reads a part of a job adds to it and goes on.

use super::fault::{Fault, Kind, Span};
use super::registry::Name;
use super::source::Source;

/// Near names are looked for until there are this many findings: nobody reads on, and the search would cost too much.
const NEAR_NAMES_UP_TO: usize = 200;
/// Findings beyond this many are counted and not kept: a hostile file could fill the memory with them.
const KEPT: usize = 20_000;

pub(super) struct Findings<'s> {
    pub source: &'s Source,
    list: Vec<Fault>,
    unlisted: usize,
    /// Tables whose header was told to be missing, so that what they hold is not known.
    missing_headers: Vec<&'static str>,
}

impl<'s> Findings<'s> {
    pub fn new(source: &'s Source) -> Findings<'s> {
        Findings { source, list: Vec::new(), unlisted: 0, missing_headers: Vec::new() }
    }

    pub fn add(&mut self, fault: Fault) {
        match self.list.len() < KEPT {
            true => self.list.push(fault),
            false => self.unlisted += 1,
        }
    }

    /// Tells that a table's header is missing before a part.
    pub fn header_missing(&mut self, title: &'static str, before: &Span) {
        let fact = format!("a line {title} is missing above this");
        let remedy = format!("put {title} above it");
        self.add(Fault::new(Name::HeaderMissing, Some(before.clone()), fact, remedy));
        self.missing_headers.push(title);
    }

    pub fn lacks_header(&self, title: &str) -> bool {
        self.missing_headers.contains(&title)
    }

    pub fn line(&self, span: &Span) -> usize {
        self.source.line_of(span.start)
    }

    pub fn may_look_for_near_names(&self) -> bool {
        self.list.len() < NEAR_NAMES_UP_TO
    }

    pub fn has_faults(&self) -> bool {
        self.list.iter().any(|f| f.kind() == Kind::Fault)
    }

    /// Leaves out what touches one of these spans and follows from what is said about them already.
    pub fn leave_out_within(&mut self, spans: &[Span], from: usize) {
        let touches = |fault: &Fault| {
            let Some(part) = &fault.span else { return false };
            spans.iter().any(|s| part.start < s.end.max(s.start + 1) && s.start < part.end.max(part.start + 1))
        };
        let mut at = 0;
        self.list.retain(|fault| {
            at += 1;
            at <= from || !touches(fault)
        });
    }

    pub fn count(&self) -> usize {
        self.list.len()
    }

    /// In order of places, what is about the whole file first. Those that were not kept are counted at the end.
    pub fn in_order(mut self) -> Vec<Fault> {
        in_order(&mut self.list);
        if self.unlisted > 0 {
            let last = self.list.last().and_then(|fault| fault.span.clone());
            let fact = format!("{} faults and warnings more", self.unlisted);
            self.list.push(Fault::new(Name::TooMany, last, fact, "mend those above first"));
        }
        self.list
    }
}

/// Sorts by places; what has none comes first.
pub(super) fn in_order(faults: &mut [Fault]) {
    faults.sort_by_key(|fault| fault.span.as_ref().map(|span| (span.start, span.end)));
}
