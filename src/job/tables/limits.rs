//! `[limits]` and the `limits` of a beam.

use sagledger_calc::limits::{Bound, LimitSet, LimitTable, Movement};
use sagledger_calc::quantity::Length;
use toml::de::DeValue;

use crate::job::bounds;
use crate::job::findings::Findings;
use crate::job::registry::Name;
use crate::job::values::quoted;
use crate::job::view::{Item, Table};

/// Keys of single limits.
const MOVEMENTS: [(&str, Movement); 5] = [
    ("total", Movement::Total),
    ("after", Movement::After),
    ("variable", Movement::Variable),
    ("stacked", Movement::Stacked),
    ("tilt", Movement::Tilt),
];

pub(super) fn read(table: &Table, found: &mut Findings) -> LimitTable {
    let sets: Vec<(&'static str, LimitSet)> = LimitSet::ALL.iter().map(|set| (set.name(), *set)).collect();
    let set = table.field("for", found, |item, f| item.choice(&sets, f)).value().copied();
    let mut single = Vec::new();
    for (key, movement) in MOVEMENTS {
        if let Some(limits) = table.field(key, found, |item, f| bounds_of(item, movement, f)).value() {
            single.push((movement, limits.clone()));
        }
    }
    let reason = table.field("reason", found, Item::text).value().cloned();
    LimitTable { set, single, reason }
}

/// One limit, or a list of which the tightest governs.
fn bounds_of(item: &Item, movement: Movement, found: &mut Findings) -> Option<Vec<Bound>> {
    let items = match item.value {
        DeValue::Array(_) => item.list(found)?,
        _ => vec![item.clone()],
    };
    let limits: Vec<Option<Bound>> = items.iter().map(|item| bound(item, movement, found)).collect();
    limits.into_iter().collect()
}

fn bound(item: &Item, movement: Movement, found: &mut Findings) -> Option<Bound> {
    let tilt = movement == Movement::Tilt;
    let Some(text) = item.value.as_str() else {
        let example = if tilt { "\"1/500\"" } else { "\"span/250\"" };
        item.wrong_type("a limit", format!("write it in quotes: {example}"), found);
        return None;
    };
    let Some((left, right)) = text.split_once('/') else {
        if tilt {
            let fact = format!("{} is not a limit of tilt", quoted(text));
            found.add(item.fault(Name::LimitMalformed, fact, "write it as in \"1/500\""));
            return None;
        }
        if !text.contains(|c: char| c.is_ascii_digit()) {
            let fact = format!("{} is not a limit", quoted(text));
            found.add(item.fault(Name::LimitMalformed, fact, "write span/N or a length: \"span/250\", \"10 mm\""));
            return None;
        }
        let length = item.quantity(&bounds::LIMIT, found)?;
        return Some(Bound::Length(Length::from_si(length.si)));
    };
    let (head, count, prefix) =
        if tilt { ("1", &bounds::ONE_IN, "1") } else { ("span", &bounds::SPAN_OVER, "span") };
    let divisor = plain_number(right.trim());
    match divisor {
        Some(n) if left.trim() == head && count.admit(n) => {
            Some(if tilt { Bound::OneIn(n) } else { Bound::SpanOver(n) })
        }
        Some(_) if left.trim() == head => {
            let fact = format!("{} is out of bounds", quoted(text));
            let remedy = format!("give {prefix}/{} to {prefix}/{}", count.least, count.greatest);
            found.add(item.fault(Name::OutOfBounds, fact, remedy));
            None
        }
        Some(n) if count.admit(n) => {
            let meant = format!("\"{prefix}/{}\"", right.trim());
            let what = if tilt { "a limit of tilt" } else { "a limit of a movement" };
            let fact = format!("{} is not {what}", quoted(text));
            found.add(item.fault(Name::LimitMalformed, fact, format!("write {meant}")).replaced_by(meant));
            None
        }
        _ => {
            let fact = format!("{} is not a limit", quoted(text));
            let example = if tilt { "\"1/500\"" } else { "\"span/250\" or \"10 mm\"" };
            found.add(item.fault(Name::LimitMalformed, fact, format!("write it as in {example}")));
            None
        }
    }
}

/// Digits with at most one point.
fn plain_number(text: &str) -> Option<f64> {
    let plain = text.bytes().all(|b| b.is_ascii_digit() || b == b'.') && text.bytes().any(|b| b.is_ascii_digit());
    plain.then(|| text.parse::<f64>().ok()).flatten().filter(|n| n.is_finite())
}
