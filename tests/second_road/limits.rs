//! Limits on movement: the named sets, what overrides what, and what a limit allows on a span.

use super::units::quantity;
use toml::{Table, Value};

/// The kinds of movement that a job can limit.
pub const KINDS: [&str; 5] = ["total", "after", "variable", "stacked", "tilt"];

/// One limit: a part of the span (or of the distance between bearings), or a length in m.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Limit {
    Part(f64),
    Fixed(f64),
}

impl Limit {
    fn read(text: &str) -> Limit {
        match text.split_once('/') {
            Some((_, divisor)) => Limit::Part(divisor.trim().parse().expect("a number after the stroke")),
            None => Limit::Fixed(quantity(text)),
        }
    }
}

/// The tightest of a list on a span: the movement allowed in m; for tilt (span 1) the ratio allowed.
pub fn allowed(list: &[Limit], span: f64) -> f64 {
    list.iter()
        .map(|limit| match *limit {
            Limit::Part(divisor) => span / divisor,
            Limit::Fixed(length) => length,
        })
        .fold(f64::INFINITY, f64::min)
}

/// The limits of one beam, by kind in the order of `KINDS`; an empty list is no limit. A `stacked` limit that nobody
/// gives is the beam's own total limit.
pub fn of_beam(job: Option<&Table>, beam: Option<&Table>) -> [Vec<Limit>; 5] {
    let is_set = |table: Option<&Table>| table.is_some_and(|table| table.keys().any(|key| key != "reason"));
    fn set_of(table: Option<&Table>) -> Option<&str> {
        table.and_then(|table| table.get("for")).and_then(Value::as_str)
    }
    let beams_set = set_of(beam);
    let jobs_set = set_of(job).or(if is_set(job) || is_set(beam) { None } else { Some("brittle finish") });
    let single = |table: Option<&Table>, kind: &str| table.and_then(|table| table.get(kind)).map(read_list);
    let find = |kind: &str| {
        single(beam, kind)
            .or_else(|| beams_set.and_then(|set| in_set(set, kind)))
            .or_else(|| single(job, kind))
            .or_else(|| if beams_set.is_none() { jobs_set.and_then(|set| in_set(set, kind)) } else { None })
            .unwrap_or_default()
    };
    let mut limits = KINDS.map(find);
    if limits[3].is_empty() {
        limits[3] = limits[0].clone();
    }
    limits
}

fn read_list(value: &Value) -> Vec<Limit> {
    match value {
        Value::String(text) => vec![Limit::read(text)],
        Value::Array(items) => items.iter().map(|item| Limit::read(item.as_str().expect("a limit"))).collect(),
        other => panic!("no limit: {other}"),
    }
}

/// The named sets; common practice but for span/360 and span/200 on variable movement (UK NA to EN 1993-1-1, NA.2.23).
fn in_set(set: &str, kind: &str) -> Option<Vec<Limit>> {
    use Limit::{Fixed, Part};
    let limits = match (set, kind) {
        ("brittle finish", "variable") => vec![Part(360.0)],
        ("brittle finish", "total") => vec![Part(250.0)],
        ("masonry", "after") => vec![Part(500.0), Fixed(0.010)],
        ("masonry", "total") => vec![Part(250.0)],
        ("masonry", "variable") => vec![Part(360.0)],
        ("masonry", "tilt") => vec![Part(500.0)],
        ("glazed doors", "after") => vec![Part(500.0), Fixed(0.005)],
        ("timber floor", "variable") => vec![Part(360.0)],
        ("timber floor", "total") => vec![Part(250.0), Fixed(0.014)],
        ("no finish", "variable") => vec![Part(200.0)],
        ("no finish", "total") => vec![Part(200.0)],
        _ => return None,
    };
    Some(limits)
}
