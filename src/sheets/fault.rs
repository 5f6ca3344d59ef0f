//! Why a package could not be typeset: each problem with the template, line and column that it points at.

use std::fmt;

use typst::World;
use typst::WorldExt;
use typst::diag::SourceDiagnostic;
use typst::syntax::{DiagSpan, DiagSpanKind, FileId};

use crate::world;

/// All that went wrong; never empty.
#[derive(Clone, Debug, PartialEq)]
pub struct Fault {
    pub problems: Vec<Problem>,
}

#[derive(Clone, Debug, PartialEq)]
pub struct Problem {
    /// One fact.
    pub fact: String,
    /// None where the typesetter cannot say: faults of the export may have no place.
    pub place: Option<Place>,
    pub hints: Vec<String>,
    /// Who called, innermost first: the mistake is often there.
    pub called_from: Vec<Place>,
}

/// A place in a template; line and column count from 1.
#[derive(Clone, Debug, PartialEq)]
pub struct Place {
    /// As under the job folder or the program: `templates/cover.typ`.
    pub file: String,
    pub line: usize,
    pub column: usize,
}

impl Fault {
    pub(crate) fn of(fact: impl Into<String>) -> Fault {
        Fault { problems: vec![Problem::of(fact)] }
    }

    pub(crate) fn from_diagnostics<'a>(
        world: &dyn World,
        diagnostics: impl IntoIterator<Item = &'a SourceDiagnostic>,
    ) -> Fault {
        let mut problems: Vec<Problem> =
            diagnostics.into_iter().map(|d| Problem::from_diagnostic(world, d)).collect();
        if problems.is_empty() {
            problems.push(Problem::of("the sheets could not be typeset"));
        }
        Fault { problems }
    }
}

impl Problem {
    fn of(fact: impl Into<String>) -> Problem {
        Problem { fact: fact.into(), place: None, hints: vec![], called_from: vec![] }
    }

    pub(crate) fn from_diagnostic(world: &dyn World, diagnostic: &SourceDiagnostic) -> Problem {
        Problem {
            fact: diagnostic.message.to_string(),
            place: place(world, diagnostic.span),
            hints: diagnostic.hints.iter().map(|hint| hint.v.to_string()).collect(),
            called_from: diagnostic.trace.iter().filter_map(|t| place(world, t.span.into())).collect(),
        }
    }
}

fn place(world: &dyn World, span: DiagSpan) -> Option<Place> {
    let id: FileId = match span.get() {
        DiagSpanKind::Detached => return None,
        DiagSpanKind::Number { id, .. } | DiagSpanKind::Range { id, .. } => id,
    };
    let source = world.source(id).ok()?;
    let start = world.range(span)?.start;
    let (line, column) = (source.lines().byte_to_line(start)?, source.lines().byte_to_column(start)?);
    Some(Place { file: world::name(id), line: line + 1, column: column + 1 })
}

impl fmt::Display for Place {
    fn fmt(&self, f: &mut fmt::Formatter) -> fmt::Result {
        write!(f, "{}:{}:{}", self.file, self.line, self.column)
    }
}

impl fmt::Display for Fault {
    fn fmt(&self, f: &mut fmt::Formatter) -> fmt::Result {
        for (n, problem) in self.problems.iter().enumerate() {
            if n > 0 {
                writeln!(f)?;
            }
            match &problem.place {
                Some(place) => write!(f, "{place}: {}", problem.fact)?,
                None => write!(f, "{}", problem.fact)?,
            }
            for hint in &problem.hints {
                write!(f, "\n  {hint}")?;
            }
            for place in &problem.called_from {
                write!(f, "\n  called from {place}")?;
            }
        }
        Ok(())
    }
}

impl std::error::Error for Fault {}
