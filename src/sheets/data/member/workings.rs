//! A member's workings for their template: the account as written by the JSON writer, with what each formula needs to
//! be placed. Whether a formula fits on one line is decided here, from widths of letters, so that the typesetter need
//! not try.

use serde_json::Value;

use crate::writers;
use sagledger_calc::workings::account::Account;

/// Room for a formula in em of its own size: 94 mm less the indent of 6, at 9.6 pt.
const ROOM: f64 = 88.0 / (9.6 * 25.4 / 72.0);

// Widths in em, rounded up: IBM Plex Sans for figures, IBM Plex Math for symbols and signs.
const FIGURE: f64 = 0.6;
const POINT: f64 = 0.28;
const LETTER: f64 = 0.66;
/// A sign of operation with the spaces around it, and an equals sign with its own.
const SIGN: f64 = 1.06;
const EQUALS: f64 = 1.20;
const BRACKETS: f64 = 0.9;
const ROOT: f64 = 0.85;
/// Figures and letters above or below the line.
const SMALL: f64 = 0.72;

/// The account with `fits` at every step that has a formula.
pub(super) fn workings(account: &Account) -> Value {
    let mut value = writers::json::account(account);
    for chapter in items(&mut value) {
        for line in chapter.get_mut("lines").map(items).unwrap_or_default() {
            for step in line.get_mut("steps").map(items).unwrap_or_default() {
                let fits = width(step) <= ROOM;
                if let Value::Object(map) = step {
                    map.insert("fits".into(), Value::Bool(fits));
                }
            }
        }
    }
    value
}

fn items(value: &mut Value) -> Vec<&mut Value> {
    value.as_array_mut().map(|array| array.iter_mut().collect()).unwrap_or_default()
}

/// Width of a step on one line.
fn width(step: &Value) -> f64 {
    let part = |name: &str| step.get(name).filter(|v| !v.is_null()).map(node);
    match step.get("kind").and_then(Value::as_str) {
        Some("comparison") => ["left", "right"]
            .iter()
            .filter_map(|side| step.get(*side))
            .map(|side| {
                let part = |name: &str| side.get(name).filter(|v| !v.is_null()).map(node);
                let Some(formula) = part("formula") else { return 0.0 };
                let result = side.get("result").and_then(Value::as_str).map_or(0.0, figures);
                formula + part("figures").map_or(0.0, |f| f + EQUALS) + EQUALS + result + 1.3
            })
            .sum(),
        _ => {
            let parts: Vec<f64> = ["symbol", "formula", "figures"].into_iter().filter_map(part).collect();
            parts.iter().sum::<f64>() + EQUALS * parts.len().saturating_sub(1) as f64
        }
    }
}

fn figures(text: &str) -> f64 {
    text.chars().map(|c| if c == '.' || c == ',' { POINT } else { FIGURE }).sum()
}

fn node(value: &Value) -> f64 {
    let list = |name: &str| value.get(name).and_then(Value::as_array);
    let child = |name: &str| value.get(name).map_or(0.0, node);
    if let Some(n) = value.get("n").and_then(Value::as_str) {
        figures(n)
    } else if let Some(power) = value.get("ten") {
        2.0 * FIGURE + SMALL * FIGURE * power.to_string().chars().count() as f64
    } else if let Some(s) = value.get("s").and_then(Value::as_str) {
        let sub = value.get("sub").and_then(Value::as_str).unwrap_or_default();
        LETTER * s.chars().count() as f64 + SMALL * FIGURE * sub.chars().count() as f64 + 0.05
    } else if let Some(terms) = list("sum") {
        let bodies: f64 = terms.iter().map(|term| term.get("of").map_or(0.0, node)).sum();
        bodies + SIGN * terms.len() as f64
    } else if let Some(factors) = list("product") {
        let times = list("times").map_or(0, |times| times.iter().filter(|t| **t == Value::Bool(true)).count());
        factors.iter().map(node).sum::<f64>() + SIGN * times as f64 + 0.1 * factors.len() as f64
    } else if value.get("over").is_some() {
        f64::max(child("over"), child("under")) + 0.3
    } else if value.get("base").is_some() {
        child("base") + SMALL * FIGURE
    } else if value.get("root").is_some() {
        child("root") + ROOT
    } else if let Some(all) = list("min").or_else(|| list("max")) {
        all.iter().map(|n| node(n) + 0.6).sum::<f64>() + 2.0 + BRACKETS
    } else {
        child("paren") + BRACKETS
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use serde_json::json;

    #[test]
    fn widths_grow_with_what_is_written() {
        // 6 figures and a point: 6 × 0.6 + 0.28.
        assert!((node(&json!({"n": "1234.56"})) - 3.88).abs() < 1e-12);
        let product = json!({"product": [{"n": "1.35"}, {"n": "20.53"}], "times": [true]});
        assert!((node(&product) - (1.8 + 0.28 + 2.4 + 0.28 + 1.06 + 0.2)).abs() < 1e-12);
        let short = json!({"kind": "equation", "symbol": {"s": "t", "sub": ""}, "formula": {"n": "1"}, "figures": {"n": "1"}});
        assert!(width(&short) < ROOM);
        let long: Vec<Value> = (0..8).map(|_| json!({"minus": false, "of": product})).collect();
        assert!(node(&json!({"sum": long})) > ROOM);
    }
}
