//! A fault or a warning about a job file: where, what is wrong, what would be right.

use std::ops::Range;

use super::registry::Name;

/// Bytes of the text of a [`Source`](super::Source).
pub type Span = Range<usize>;

/// A fault keeps a job from being computed, a warning does not.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord)]
pub enum Kind {
    Fault,
    Warning,
}

impl Kind {
    pub fn text(self) -> &'static str {
        match self {
            Kind::Fault => "fault",
            Kind::Warning => "warning",
        }
    }
}

/// One thing to say about a job file.
#[derive(Clone, Debug, PartialEq)]
pub struct Fault {
    pub name: Name,
    /// The part it is about; none where it is about the file as a whole.
    pub span: Option<Span>,
    /// Lower case, one fact, no full stop.
    pub fact: String,
    /// An order, or the near name with its line.
    pub remedy: String,
    /// What to put in the place of the part, where that is definite.
    pub replacement: Option<String>,
    /// Other places that have to do with it.
    pub also: Vec<Span>,
}

impl Fault {
    pub fn new(name: Name, span: Option<Span>, fact: impl Into<String>, remedy: impl Into<String>) -> Fault {
        Fault { name, span, fact: fact.into(), remedy: remedy.into(), replacement: None, also: Vec::new() }
    }

    pub fn kind(&self) -> Kind {
        self.name.kind()
    }

    /// With a definite replacement of the part.
    pub fn replaced_by(mut self, text: impl Into<String>) -> Fault {
        self.replacement = Some(text.into());
        self
    }

    /// With another place.
    pub fn with(mut self, place: Span) -> Fault {
        self.also.push(place);
        self
    }
}
