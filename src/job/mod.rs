//! A job file in, the job that it means out, together with all its faults. Every fault carries the part of the text
//! that it is about.
//!
//! This room knows the language of job files and the building of calc. It knows no formula, and nothing of pages.
//! What was typed (the TOML tree, places, words) stays in here; what it means leaves as a [`Job`].

pub mod bounds;
mod brackets;
mod coverage;
mod explain;
mod fault;
mod findings;
pub mod glyphs;
pub mod keys;
mod logo;
mod meaning;
mod meta;
mod near;
mod number;
mod open;
mod origins;
mod quantity;
pub mod registry;
pub mod show;
mod source;
mod syntax;
mod tables;
mod values;
mod view;

use sagledger_calc::building::{Building, Origin};

pub use fault::{Fault, Kind, Span};
pub use meta::{Lang, Logo, Meta, Paper, Picture, PictureFormat};
pub use open::{Machine, open};
pub use quantity::{Dimension, UNITS, Unit};
pub use registry::Name;
pub use source::{Place, Source};

use findings::Findings;
use origins::Origins;

/// A job that can be calculated.
#[derive(Clone, Debug)]
pub struct Job {
    pub meta: Meta,
    pub building: Building,
    source: Source,
    origins: Origins,
}

/// What reading a file gave: everything there is to say about it, in order of lines, and the job if nothing is at
/// fault.
#[derive(Clone, Debug)]
pub struct Reading {
    pub source: Source,
    pub findings: Vec<Fault>,
    pub job: Option<Job>,
}

impl Job {
    /// The text of the job file, without a BOM.
    pub fn text(&self) -> &str {
        self.source.text()
    }

    /// The text with its places.
    pub fn source(&self) -> &Source {
        &self.source
    }

    /// The part of the text that a part of the building came from.
    pub fn span_of(&self, origin: Origin) -> Option<&Span> {
        self.origins.span(origin)
    }

    /// The line, from 1, that a part of the building came from.
    pub fn line_of(&self, origin: Origin) -> Option<usize> {
        self.span_of(origin).map(|span| self.source.line_of(span.start))
    }

    /// A fault that only the calculation could find, with its place in the file.
    pub fn explain_fault(&self, fault: &sagledger_calc::fault::Fault) -> Fault {
        explain::fault(fault, &self.origins, &self.source)
    }
}

impl Reading {
    /// A reading that ended before there was a text.
    pub(crate) fn refused(file: &str, fault: Fault) -> Reading {
        Reading { source: Source::new(file, ""), findings: vec![fault], job: None }
    }

    pub fn faults(&self) -> usize {
        self.findings.iter().filter(|f| f.kind() == Kind::Fault).count()
    }

    pub fn warnings(&self) -> usize {
        self.findings.len() - self.faults()
    }
}

/// Reads a job from the bytes of its file. Pictures that it names are not looked at: that is for [`open`].
pub fn read(bytes: &[u8], file_name: &str) -> Reading {
    read_in(bytes, file_name, None)
}

/// Reads a job; with a folder, the logo that it names too.
fn read_in(bytes: &[u8], file_name: &str, folder: Option<&std::path::Path>) -> Reading {
    if bytes.len() as u64 > open::LARGEST {
        return Reading::refused(file_name, open::too_large());
    }
    let text = match std::str::from_utf8(bytes) {
        Ok(text) => text,
        Err(error) => return Reading::refused(file_name, open::not_utf8(bytes, error.valid_up_to())),
    };
    let source = Source::new(file_name, text);
    let mut found = Findings::new(&source);
    let made = understand(&source, folder, &mut found);
    let at_fault = found.has_faults();
    let findings = found.in_order();
    let job = made.filter(|_| !at_fault).map(|(meta, building, origins)| Job {
        meta,
        building,
        source: source.clone(),
        origins,
    });
    Reading { source, findings, job }
}

fn understand<'s>(
    source: &'s Source,
    folder: Option<&std::path::Path>,
    found: &mut Findings<'s>,
) -> Option<(Meta, Building, Origins)> {
    let parsed = syntax::parse(source.text(), found);
    if !parsed.whole || tables::is_newer_language(&parsed, found) {
        return None;
    }
    let told = found.count();
    let typed = tables::read(&parsed, found);
    let building = meaning::building(&typed, found);
    let picture = match (&typed.logo, folder) {
        (Some(logo), Some(folder)) => logo::picture(logo, folder, found),
        _ => None,
    };
    let mut meta = typed.meta;
    if let Some(logo) = meta.as_mut().and_then(|meta| meta.logo.as_mut()) {
        logo.picture = picture;
    }
    found.leave_out_within(&parsed.spoiled, told);
    if let Some(part) = parsed.spoiled.first().filter(|_| !found.has_faults()) {
        // What the parser complained of is told elsewhere, or here.
        found.add(Fault::new(
            Name::Syntax,
            Some(part.clone()),
            "this part cannot be read",
            "mend it or take it out",
        ));
    }
    let (building, origins) = building?;
    Some((meta?, building, origins))
}
