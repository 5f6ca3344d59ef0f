//! Findings as JSON, for editors and scripts.

use serde::Serialize;

use crate::job::fault::{Fault, Span};
use crate::job::source::Source;

#[derive(Serialize)]
struct Json<'f> {
    name: &'f str,
    kind: &'f str,
    file: &'f str,
    /// From 1; null where the file as a whole is meant.
    line: Option<usize>,
    /// Characters from 1.
    column: Option<usize>,
    /// Characters of the part on its first line.
    length: Option<usize>,
    fact: &'f str,
    remedy: &'f str,
    replacement: Option<&'f str>,
    also: Vec<JsonPlace>,
}

#[derive(Serialize)]
struct JsonPlace {
    line: usize,
    column: usize,
    length: usize,
}

fn place(source: &Source, span: &Span) -> JsonPlace {
    let place = source.place(span.start);
    let length = source.slice(&source.first_line_part(span)).chars().count();
    JsonPlace { line: place.line, column: place.column, length }
}

/// A list of findings, in order of lines.
pub fn faults(source: &Source, findings: &[Fault]) -> serde_json::Value {
    let findings: Vec<Json> = findings
        .iter()
        .map(|fault| {
            let at = fault.span.as_ref().map(|span| place(source, span));
            Json {
                name: fault.name.text(),
                kind: fault.kind().text(),
                file: source.file(),
                line: at.as_ref().map(|at| at.line),
                column: at.as_ref().map(|at| at.column),
                length: at.as_ref().map(|at| at.length),
                fact: &fault.fact,
                remedy: &fault.remedy,
                replacement: fault.replacement.as_deref(),
                also: fault.also.iter().map(|span| place(source, span)).collect(),
            }
        })
        .collect();
    // Texts and numbers alone can always be written.
    serde_json::to_value(findings).unwrap_or_default()
}
