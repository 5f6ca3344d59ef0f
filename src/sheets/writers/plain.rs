//! Workings as plain text: `M_Ed = γ_G M_G + γ_Q M_A`. For tests and for the terminal.

use sagledger_calc::workings::account::{Side, Step, UNDECIDED};
use sagledger_calc::workings::formula::{Figure, Formula};
use sagledger_calc::workings::symbol::{Accent, Written};

use super::{Form, Tightness, tightness, times_between};

/// A step in text: what stands at the left, line by line, and the result at the right.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct StepText {
    /// The first begins with the symbol or the left-hand side; the next ones begin with "=" and stand under the first
    /// "=".
    pub lines: Vec<String>,
    pub result: String,
}

pub fn step(step: &Step) -> StepText {
    match step {
        Step::Equation { symbol, formula, figures, result } => {
            let mut lines = vec![format!("{} = {}", self::symbol(symbol), self::formula(formula, Form::Symbols))];
            if figures != formula {
                lines.push(format!("= {}", self::formula(figures, Form::Figures)));
            }
            StepText { lines, result: figure(result) }
        }
        Step::Value { symbol, result } => StepText { lines: vec![self::symbol(symbol)], result: figure(result) },
        Step::Comparison { left, right, relation, unit, undecided, .. } => {
            let shown = [side(left), side(right)].concat().join(",  ");
            let unit = if unit.name().is_empty() { String::new() } else { format!(" {}", unit.name()) };
            let mut result = format!("{} {} {}{unit}", left.result.decimal, relation.sign(), right.result.decimal);
            if *undecided {
                result = format!("{result} ({UNDECIDED})");
            }
            StepText { lines: vec![shown], result }
        }
        Step::Requirement { formula, figures, result, met, undecided } => {
            let lines =
                vec![self::formula(formula, Form::Symbols), format!("= {}", self::formula(figures, Form::Figures))];
            let word = if *met { "met" } else { "not met" };
            let decided = if *undecided { format!(" ({UNDECIDED})") } else { String::new() };
            StepText { lines, result: format!("{}  {word}{decided}", figure(result)) }
        }
    }
}

fn side(side: &Side) -> Vec<String> {
    let Some(formula) = &side.formula else { return vec![] };
    let formula = self::formula(formula, Form::Symbols);
    vec![match &side.figures {
        Some(figures) => format!("{formula} = {}", self::formula(figures, Form::Figures)),
        None => format!("{formula} = {}", side.result.decimal),
    }]
}

/// "132.9 kNm".
pub fn figure(figure: &Figure) -> String {
    match figure.unit.name() {
        "" => figure.decimal.to_string(),
        unit => format!("{} {unit}", figure.decimal),
    }
}

/// "M_c,Rd"; a bar as a combining macron.
pub fn symbol(symbol: &Written) -> String {
    let bar = match symbol.accent {
        Accent::None => "",
        Accent::Bar => "\u{304}",
    };
    match symbol.sub.as_str() {
        "" => format!("{}{bar}", symbol.base),
        sub => format!("{}{bar}_{sub}", symbol.base),
    }
}

/// A formula with no more brackets than it needs.
pub fn formula(formula: &Formula, form: Form) -> String {
    match formula {
        Formula::Number(figure) if form == Form::Units => self::figure(figure),
        Formula::Number(figure) => figure.decimal.to_string(),
        Formula::TenTo(power) => format!("10{}", raised(*power)),
        Formula::Symbol(written) => symbol(written),
        Formula::Sum(terms) => {
            let mut text = String::new();
            for (place, term) in terms.iter().enumerate() {
                text.push_str(match (place, term.minus) {
                    (0, false) => "",
                    (0, true) => "\u{2212}",
                    (_, false) => " + ",
                    (_, true) => " \u{2212} ",
                });
                let alone = place == 0 && !term.minus;
                let least = if alone { Tightness::Sum } else { Tightness::Product };
                text.push_str(&at_least(&term.formula, least, form));
            }
            text
        }
        Formula::Product(factors) => {
            let mut text = String::new();
            let carried = |f: &&Formula| form != Form::Units || !matches!(f, Formula::TenTo(_));
            let factors: Vec<&Formula> = factors.iter().filter(carried).collect();
            if let [alone] = factors.as_slice() {
                return self::formula(alone, form);
            }
            for (place, factor) in factors.iter().enumerate() {
                let times = times_between(form, factor);
                if place > 0 {
                    text.push_str(if times { " × " } else { " " });
                }
                let next = factors.get(place + 1);
                let divides_next = matches!(factor, Formula::Quotient(..))
                    && next.is_some_and(|next: &&Formula| !times_between(form, next));
                let least = if divides_next { Tightness::Power } else { Tightness::Product };
                text.push_str(&at_least(factor, least, form));
            }
            text
        }
        Formula::Quotient(over, under) => {
            format!("{} / {}", at_least(over, Tightness::Product, form), at_least(under, Tightness::Power, form))
        }
        Formula::Power(base, exponent) => {
            let base = match **base {
                Formula::Number(figure) if form == Form::Units && !figure.unit.name().is_empty() => {
                    format!("({})", self::figure(&figure))
                }
                _ => at_least(base, Tightness::Whole, form),
            };
            format!("{base}{}", raised(i32::from(*exponent)))
        }
        Formula::Root(of) => match **of {
            Formula::Symbol(_) => format!("√{}", self::formula(of, form)),
            Formula::Number(figure) if form != Form::Units && !figure.decimal.is_negative() => {
                format!("√{}", figure.decimal)
            }
            _ => format!("√({})", self::formula(of, form)),
        },
        Formula::Least(all) => format!("min({})", listed(all, form)),
        Formula::Greatest(all) => format!("max({})", listed(all, form)),
    }
}

fn listed(all: &[Formula], form: Form) -> String {
    all.iter().map(|f| formula(f, form)).collect::<Vec<_>>().join(", ")
}

fn at_least(inner: &Formula, least: Tightness, form: Form) -> String {
    let text = formula(inner, form);
    if tightness(inner) < least { format!("({text})") } else { text }
}

/// A power in raised digits: "⁻⁶".
pub fn raised(power: i32) -> String {
    const DIGITS: [char; 10] = ['⁰', '¹', '²', '³', '⁴', '⁵', '⁶', '⁷', '⁸', '⁹'];
    let sign = if power < 0 { "⁻" } else { "" };
    let digits = power.unsigned_abs().to_string();
    let raised = digits.chars().filter_map(|c| c.to_digit(10)).filter_map(|d| DIGITS.get(d as usize));
    format!("{sign}{}", raised.collect::<String>())
}
