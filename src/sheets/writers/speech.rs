//! Workings as they are read aloud, carrying their numbers: for alternative texts.

use sagledger_calc::workings::account::{Side, Step, UNDECIDED};
use sagledger_calc::workings::decimal::MINUS;
use sagledger_calc::workings::formula::{Figure, Formula};
use sagledger_calc::workings::quantity::Relation;
use sagledger_calc::workings::symbol::{Accent, Written};

use super::{Tightness, tightness};

/// "M c,Rd equals W pl,y times f y, over gamma M0; equals …; equals 132.9 kilonewton metres".
pub fn step(step: &Step) -> String {
    match step {
        Step::Equation { symbol: name, formula: symbols, figures, result } => {
            let shown = format!("{} equals {}", symbol(name), formula(symbols));
            let figures = if figures == symbols { String::new() } else { format!("; equals {}", formula(figures)) };
            format!("{shown}{figures}; equals {}", figure(result))
        }
        Step::Value { symbol: name, result } => format!("{} equals {}", symbol(name), figure(result)),
        Step::Comparison { left, right, relation, unit, undecided, .. } => {
            let relation = match relation {
                Relation::AtMost => "is at most",
                Relation::MoreThan => "is more than",
            };
            let unit = if unit.spoken().is_empty() { String::new() } else { format!(" {}", unit.spoken()) };
            let end = if *undecided { format!("; {UNDECIDED}") } else { String::new() };
            format!("{} {relation} {}{unit}{end}", side(left), side(right))
        }
        Step::Requirement { formula: symbols, figures, result, met, undecided } => {
            let word = if *met { "met" } else { "not met" };
            let end = if *undecided { format!("; {UNDECIDED}") } else { String::new() };
            format!("{}; equals {}; equals {}, {word}{end}", formula(symbols), formula(figures), figure(result))
        }
    }
}

fn side(side: &Side) -> String {
    let result = number(&side.result);
    match (&side.formula, &side.figures) {
        (Some(symbols), Some(figures)) => {
            format!("{}, which is {}, which is {result},", formula(symbols), formula(figures))
        }
        (Some(symbols), None) => format!("{}, which is {result},", formula(symbols)),
        (None, _) => result,
    }
}

/// "132.9 kilonewton metres".
pub fn figure(figure: &Figure) -> String {
    match figure.unit.spoken() {
        "" => number(figure),
        unit => format!("{} {unit}", number(figure)),
    }
}

fn number(figure: &Figure) -> String {
    figure.decimal.to_string().replace(MINUS, "minus ")
}

/// "lambda bar F".
pub fn symbol(symbol: &Written) -> String {
    let bar = match symbol.accent {
        Accent::None => "",
        Accent::Bar => " bar",
    };
    let base = letter(&symbol.base);
    match symbol.sub.as_str() {
        "" => format!("{base}{bar}"),
        sub => format!("{base}{bar} {sub}"),
    }
}

fn letter(base: &str) -> &str {
    match base {
        "γ" => "gamma",
        "ψ" => "psi",
        "ξ" => "xi",
        "ε" => "epsilon",
        "ρ" => "rho",
        "λ" => "lambda",
        "χ" => "chi",
        "η" => "eta",
        "π" => "pi",
        "Δ" => "delta",
        other => other,
    }
}

/// A formula in words.
pub fn formula(formula: &Formula) -> String {
    match formula {
        Formula::Number(figure) => number(figure),
        Formula::TenTo(power) if *power < 0 => format!("ten to the power minus {}", power.unsigned_abs()),
        Formula::TenTo(power) => format!("ten to the power {power}"),
        Formula::Symbol(written) => symbol(written),
        Formula::Sum(terms) => {
            let mut text = String::new();
            for (place, term) in terms.iter().enumerate() {
                text.push_str(match (place, term.minus) {
                    (0, false) => "",
                    (0, true) => "minus ",
                    (_, false) => " plus ",
                    (_, true) => " minus ",
                });
                let least = if place == 0 && !term.minus { Tightness::Sum } else { Tightness::Product };
                text.push_str(&at_least(&term.formula, least));
            }
            text
        }
        Formula::Product(factors) => {
            factors.iter().map(|f| at_least(f, Tightness::Product)).collect::<Vec<_>>().join(" times ")
        }
        Formula::Quotient(over, under) => {
            format!("{}, over {}", at_least(over, Tightness::Product), at_least(under, Tightness::Power))
        }
        Formula::Power(base, 2) => format!("{} squared", at_least(base, Tightness::Whole)),
        Formula::Power(base, 3) => format!("{} cubed", at_least(base, Tightness::Whole)),
        Formula::Power(base, power) => format!("{} to the power {power}", at_least(base, Tightness::Whole)),
        Formula::Root(of) => format!("the square root of {}", at_least(of, Tightness::Power)),
        Formula::Least(all) => format!("the least of {}", listed(all)),
        Formula::Greatest(all) => format!("the greatest of {}", listed(all)),
    }
}

fn listed(all: &[Formula]) -> String {
    let words: Vec<String> = all.iter().map(formula).collect();
    match words.as_slice() {
        [head @ .., last] if !head.is_empty() => format!("{}, and {last}", head.join(", ")),
        _ => words.join(""),
    }
}

fn at_least(inner: &Formula, least: Tightness) -> String {
    let text = formula(inner);
    let negative = matches!(inner, Formula::Number(_));
    if tightness(inner) < least && !negative { format!("open bracket {text} close bracket") } else { text }
}
