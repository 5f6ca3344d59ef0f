//! Workings as JSON for the templates, which place nodes and decide nothing: brackets and signs of multiplication are
//! nodes and flags of their own.
//!
//! A line: `{"number": 3, "sentence": "…", "clause": "…", "from": [1], "steps": [STEP, …], "alt": "…"}`; `from` are
//! numbers of lines of earlier chapters that it uses; `alt` is the spoken form of its formulas.
//!
//! A step has a `kind`:
//! - `"equation"`: `symbol` = `formula` = `figures` = `result` `unit`;
//! - `"value"`: `symbol` = `result` `unit`, from a table or from elsewhere;
//! - `"comparison"`: `left` `relation` `right` in `unit`; a side is `{"formula": NODE or null, "figures": NODE or null,
//!   "result": "5.73"}`: in symbols (null: a number alone), with figures (null: a symbol or number alone), its value.
//!   `result` is "5.73 ≤ 8.32", `undecided` true where the printed figures cannot show it; `ring` true where it is
//!   itself the result of a check;
//! - `"requirement"`: `formula` = `figures` = `result`; `met`, `undecided`; here stands the pencil ring.
//!
//! Every step has an `alt`. A node is one of
//! `{"n": "483.2"}` a figure, digits only, with U+2212 for minus;
//! `{"ten": -6}` ten to a power;
//! `{"s": "M", "sub": "c,Rd", "bar": false}` a symbol; `sub` may be empty;
//! `{"sum": [{"minus": false, "of": NODE}, …]}`; the first may be negative;
//! `{"product": [NODE, …], "times": [false, …]}`; `times[i]`: a sign of multiplication between factors i and i + 1,
//! else they stand side by side;
//! `{"over": NODE, "under": NODE}` a fraction; `{"base": NODE, "power": 2}`; `{"root": NODE}`;
//! `{"min": [NODE, …]}`, `{"max": [NODE, …]}`; `{"paren": NODE}` brackets that are needed.

use sagledger_calc::workings::account::{Account, Chapter, Line, Side, Step};
use sagledger_calc::workings::formula::Formula;
use sagledger_calc::workings::symbol::{Accent, Written};
use serde_json::{Value, json};

use super::{Form, Tightness, speech, tightness, times_between};

/// `[{"heading": "…", "lines": [LINE, …]}, …]`.
pub fn account(account: &Account) -> Value {
    account.chapters.iter().map(chapter).collect()
}

fn chapter(chapter: &Chapter) -> Value {
    json!({"heading": chapter.heading, "lines": chapter.lines.iter().map(line).collect::<Vec<_>>()})
}

fn line(line: &Line) -> Value {
    json!({
        "number": line.number,
        "sentence": line.sentence,
        "clause": line.clause,
        "from": line.from,
        "steps": line.steps.iter().map(step).collect::<Vec<_>>(),
        "alt": line.steps.iter().map(speech::step).collect::<Vec<_>>().join("; "),
    })
}

pub fn step(step: &Step) -> Value {
    let alt = speech::step(step);
    match step {
        Step::Equation { symbol: name, formula, figures, result } => json!({
            "kind": "equation",
            "symbol": symbol(name),
            "formula": node(formula, Form::Symbols),
            "figures": node(figures, Form::Figures),
            "result": result.decimal.to_string(),
            "unit": result.unit.name(),
            "alt": alt,
        }),
        Step::Value { symbol: name, result } => json!({
            "kind": "value",
            "symbol": symbol(name),
            "result": result.decimal.to_string(),
            "unit": result.unit.name(),
            "alt": alt,
        }),
        Step::Comparison { left, right, relation, unit, undecided, ring } => json!({
            "kind": "comparison",
            "left": side(left),
            "right": side(right),
            "relation": relation.sign(),
            "result": format!("{} {} {}", left.result.decimal, relation.sign(), right.result.decimal),
            "unit": unit.name(),
            "undecided": undecided,
            "ring": ring,
            "alt": alt,
        }),
        Step::Requirement { formula, figures, result, met, undecided } => json!({
            "kind": "requirement",
            "formula": node(formula, Form::Symbols),
            "figures": node(figures, Form::Figures),
            "result": result.decimal.to_string(),
            "unit": result.unit.name(),
            "met": met,
            "undecided": undecided,
            "alt": alt,
        }),
    }
}

fn side(side: &Side) -> Value {
    json!({
        "formula": side.formula.as_ref().map(|f| node(f, Form::Symbols)),
        "figures": side.figures.as_ref().map(|f| node(f, Form::Figures)),
        "result": side.result.decimal.to_string(),
    })
}

fn symbol(written: &Written) -> Value {
    json!({"s": written.base, "sub": written.sub, "bar": written.accent == Accent::Bar})
}

/// A formula as nodes.
pub fn node(formula: &Formula, form: Form) -> Value {
    match formula {
        Formula::Number(figure) => json!({"n": figure.decimal.to_string()}),
        Formula::TenTo(power) => json!({"ten": power}),
        Formula::Symbol(written) => symbol(written),
        Formula::Sum(terms) => {
            let terms = terms.iter().enumerate().map(|(place, term)| {
                let least = if place == 0 && !term.minus { Tightness::Sum } else { Tightness::Product };
                json!({"minus": term.minus, "of": at_least(&term.formula, least, form)})
            });
            json!({"sum": terms.collect::<Vec<_>>()})
        }
        Formula::Product(factors) => {
            let nodes: Vec<Value> = factors.iter().map(|f| at_least(f, Tightness::Product, form)).collect();
            let times: Vec<bool> = factors.iter().skip(1).map(|next| times_between(form, next)).collect();
            json!({"product": nodes, "times": times})
        }
        // A fraction and a root draw their own limits.
        Formula::Quotient(over, under) => json!({"over": node(over, form), "under": node(under, form)}),
        Formula::Root(of) => json!({"root": node(of, form)}),
        Formula::Power(base, power) => {
            json!({"base": at_least(base, Tightness::Whole, form), "power": power})
        }
        Formula::Least(all) => json!({"min": all.iter().map(|f| node(f, form)).collect::<Vec<_>>()}),
        Formula::Greatest(all) => json!({"max": all.iter().map(|f| node(f, form)).collect::<Vec<_>>()}),
    }
}

fn at_least(inner: &Formula, least: Tightness, form: Form) -> Value {
    let node = node(inner, form);
    if tightness(inner) < least { json!({"paren": node}) } else { node }
}
