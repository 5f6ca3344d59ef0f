//! Takes each working as printed, evaluates it, and gets the printed result.

mod evaluator;

use std::collections::BTreeMap;

use evaluator::{Token, Value, evaluate, evaluate_with, measured, printed, tokens};
use sagledger_calc::checks::generated::Dice;
use sagledger_calc::checks::registry::CHECKS;
use sagledger_calc::checks::workings;
use sagledger_calc::quantity::{Q, Ratio, max, min};
use sagledger_calc::workings::account::{Account, Side, Step};
use sagledger_calc::workings::formula::{Figure, Formula};
use sagledger_calc::workings::quantity::Relation;
use sagledger_calc::workings::{Tape, Traced, Workings, glossary};
use sagledger_sheets::writers::{Form, plain};

/// What the workings' column of 94 mm leaves after its indent of 6, in em of the formulas' 9.6 pt.
const COLUMN: f64 = 88.0 / (9.6 * 25.4 / 72.0);

#[test]
fn printed_lines_of_every_check_compute_to_what_they_print() {
    for (seed, check) in CHECKS.iter().enumerate() {
        let mut dice = Dice::seeded(seed as u64 + 1);
        for round in 0..400 {
            let inputs = if round == 0 { (check.example)() } else { (check.generate)(&mut dice) };
            let tape = Tape::new();
            workings(&inputs, &tape);
            verify(&Account::of(&tape), true);
            assert_eq!(tape.faults(), [], "{inputs:?}");
        }
    }
}

#[test]
fn several_checks_on_one_tape_keep_one_rounding() {
    let mut dice = Dice::seeded(99);
    for _ in 0..60 {
        let tape = Tape::new();
        for check in CHECKS {
            tape.chapter(check.spoken);
            workings(&(check.generate)(&mut dice), &tape);
        }
        verify(&Account::of(&tape), true);
        assert_eq!(tape.faults(), []);
    }
}

#[test]
fn random_lines_compute_to_what_they_print() {
    let mut dice = Dice::seeded(2024);
    let (mut lines, mut finer) = (0, 0);
    for _ in 0..4000 {
        let tape = Tape::new();
        random_account(&mut dice, &tape);
        let account = Account::of(&tape);
        assert_eq!(tape.faults(), [], "{}", shown(&account));
        verify(&account, false);
        for step in account.lines().flat_map(|l| &l.steps) {
            if let Step::Equation { result, .. } = step {
                lines += 1;
                finer += usize::from(result.decimal.figures() > 4);
            }
        }
    }
    assert!(lines > 15_000, "{lines}");
    // Most results keep three or four figures; the algorithm gives more only where lines ask for them.
    assert!(finer * 5 < lines, "{finer} of {lines}");
}

fn shown(account: &Account) -> String {
    let steps = account.lines().flat_map(|l| &l.steps).map(plain::step);
    steps.map(|s| format!("{} = {}", s.lines.join(" "), s.result)).collect::<Vec<_>>().join("\n")
}

/// A handful of lines, each a random formula of what stands before it.
fn random_account(dice: &mut Dice, mut tape: &Tape) {
    let w = &mut tape;
    let mut known: Vec<Ratio<Traced<'_>>> = Vec::new();
    for n in 0..3 + dice.below(4) {
        let size = 10f64.powf(dice.between(-1.0, 3.0));
        let value = if dice.chance(0.4) { (size * 10.0).round() / 10.0 + 0.1 } else { size };
        known.push(w.given(glossary::rho.of(format!("i{n}")), Q::from_si(value)));
    }
    for n in 0..3 + dice.below(5) {
        let mut formula = known[dice.below(known.len())];
        for _ in 0..1 + dice.below(4) {
            let other = known[dice.below(known.len())];
            formula = match dice.below(9) {
                0 => formula + other,
                1 => formula - 0.5 * other,
                2 => formula * other,
                3 => formula / other,
                4 => (1.0 + (other / (formula.squared() + 1.0)).squared()).root(),
                5 => min(formula, 3.0 * other),
                6 => max(formula, other / 2.0),
                7 => formula.squared() / (other + formula.squared().root()),
                _ => 2.0 * formula + other / 7.0,
            };
        }
        let size = formula.plain().si().abs();
        if !(1e-9..1e9).contains(&size) {
            continue;
        }
        let line = w.line("any", glossary::rho.of(n.to_string()), formula);
        known.push(line);
        if dice.chance(0.3) {
            let other = known[dice.below(known.len())];
            w.when("any", line.at_most(1.1 * other), "yes", "no");
        }
    }
}

fn verify(account: &Account, narrow: bool) {
    let mut stands: BTreeMap<String, String> = BTreeMap::new();
    for step in account.lines().flat_map(|l| &l.steps) {
        match step {
            Step::Equation { symbol, formula, figures, result } => {
                follows(formula, figures, result, &stands, narrow);
                // The figures stand under the first "=", which the symbol pushes to the right.
                let pushed = width(&Formula::Symbol(symbol.clone())) + 0.9 + width(figures);
                assert!(!narrow || pushed <= COLUMN, "{pushed:.1} em: {}", plain::formula(figures, Form::Figures));
                stands.insert(plain::symbol(symbol), plain::figure(result));
            }
            Step::Value { symbol, result } => {
                stands.insert(plain::symbol(symbol), plain::figure(result));
            }
            Step::Comparison { left, right, relation, undecided, .. } => {
                for side in [left, right] {
                    if let Side { formula: Some(formula), figures: Some(figures), result } = side {
                        follows(formula, figures, result, &stands, narrow);
                    }
                }
                let (a, b) = (left.result.value(), right.result.value());
                let printed_so = match relation {
                    Relation::AtMost => a <= b,
                    Relation::MoreThan => a > b,
                };
                assert!(printed_so || *undecided, "{step:?}");
            }
            Step::Requirement { formula, figures, result, met, undecided } => {
                follows(formula, figures, result, &stands, narrow);
                let share = printed(&result.decimal.to_string()).0;
                assert!(*undecided || *met == (share <= 1.0), "{step:?}");
            }
        }
    }
}

/// The figures give the result within a unit of its last figure, by the powers of ten as by the units; and figures of
/// symbols that stand on the page are the figures that stand there.
fn follows(formula: &Formula, figures: &Formula, result: &Figure, stands: &BTreeMap<String, String>, narrow: bool) {
    let text = plain::formula(figures, Form::Figures);
    let (expected, last) = printed(&result.decimal.to_string());
    let unit_of_last_figure = last.min(result.decimal.unit_of_last_figure());
    let found = evaluate(&text);
    assert!(
        (found.si - expected).abs() <= unit_of_last_figure * (1.0 + 1e-6),
        "{text} = {} is not {expected}",
        found.si
    );

    let with_units = plain::formula(figures, Form::Units);
    let found = evaluate(&with_units);
    let expected = measured(expected, result.unit.name());
    assert!(found.same_dimension(expected) || found.si == 0.0, "{with_units}: {found:?} is not {expected:?}");
    let one = measured(unit_of_last_figure, result.unit.name()).si;
    assert!((found.si - expected.si).abs() <= one * (1.0 + 1e-6), "{with_units} = {found:?} is not {expected:?}");

    let symbols = plain::formula(formula, Form::Symbols);
    let values = align(&symbols, &with_units);
    for (symbol, figure) in &values {
        if let Some(standing) = stands.get(symbol) {
            // Where only the number of units counts (ε = √(235 / f_y)) the figure stands without its unit.
            let same = standing == figure || standing.starts_with(&format!("{figure} "));
            assert!(same, "{symbol}: {standing} in {symbols} = {with_units}");
        }
    }
    let found = evaluate_with(&symbols, &|name| {
        let (_, figure) = values.iter().find(|(symbol, _)| symbol == name).unwrap();
        let (digits, unit) = figure.split_once(' ').unwrap_or((figure, ""));
        measured(printed(digits).0, unit)
    });
    let agrees = |a: Value, b: Value| (a.si - b.si).abs() <= 1e-9 * a.si.abs().max(one);
    assert!(agrees(found, evaluate(&with_units)), "{symbols} and {with_units}");

    if narrow {
        let wide = width(figures);
        assert!(wide + 0.9 <= COLUMN, "{wide:.1} em of {COLUMN:.1}: {text}");
    }
}

/// Width in em, as the drawn formula stands: digits and signs 0.6, points 0.29, a sign with its space 1.15, brackets
/// 0.35; a fraction as wide as the wider of its two halves (measured on the typefaces in use).
fn width(formula: &Formula) -> f64 {
    let bracketed = |f: &Formula| match f {
        Formula::Sum(_) => width(f) + 0.7,
        Formula::Number(figure) if figure.decimal.is_negative() => width(f) + 0.7,
        _ => width(f),
    };
    let between = |all: &[Formula], gap: f64| all.iter().map(bracketed).sum::<f64>() + gap * (all.len() - 1) as f64;
    match formula {
        Formula::Number(figure) => {
            figure.decimal.to_string().chars().map(|c| if c == '.' { 0.29 } else { 0.6 }).sum()
        }
        Formula::TenTo(power) => 1.2 + 0.42 * power.to_string().chars().count() as f64,
        Formula::Symbol(symbol) => 0.6 + 0.42 * symbol.sub.chars().count() as f64,
        Formula::Sum(terms) => {
            let terms: Vec<Formula> = terms.iter().map(|t| t.formula.clone()).collect();
            between(&terms, 1.15)
        }
        Formula::Product(factors) => between(factors, 1.15),
        Formula::Quotient(over, under) => width(over).max(width(under)) + 0.3,
        Formula::Power(base, _) => bracketed(base) + 0.42,
        Formula::Root(inner) => width(inner) + 0.9,
        Formula::Least(all) | Formula::Greatest(all) => {
            2.6 + all.iter().map(width).sum::<f64>() + 0.5 * all.len() as f64
        }
    }
}

/// Symbols with the figures that stand in their places.
fn align(symbols: &str, figures: &str) -> Vec<(String, String)> {
    let (names, numbers) = (leaves(symbols), leaves(figures));
    assert_eq!(names.len(), numbers.len(), "{symbols} and {figures}");
    let pairs = names.iter().zip(&numbers).filter(|(name, _)| name.symbol);
    pairs
        .map(|(name, number)| {
            let sign = if number.minuses > name.minuses { "\u{2212}" } else { "" };
            (name.text.clone(), format!("{sign}{}", number.text))
        })
        .collect()
}

struct Leaf {
    symbol: bool,
    text: String,
    /// Signs directly before it that belong to it alone.
    minuses: usize,
}

fn leaves(text: &str) -> Vec<Leaf> {
    let mut leaves: Vec<Leaf> = Vec::new();
    let all = tokens(text);
    let opens = |t: Option<&Token>| matches!(t, None | Some(Token::Sign('(' | ',')));
    let minuses = |at: usize| {
        let mut count = 0;
        let mut at = at;
        while at > 0 {
            match &all[at - 1] {
                Token::Sign('(') => {}
                Token::Sign('\u{2212}') if opens(at.checked_sub(2).map(|before| &all[before])) => count += 1,
                _ => break,
            }
            at -= 1;
        }
        count
    };
    for (at, token) in all.iter().enumerate() {
        match token {
            Token::Symbol(name) if name == "min" || name == "max" => {}
            Token::Symbol(name) => leaves.push(Leaf { symbol: true, text: name.clone(), minuses: minuses(at) }),
            Token::Number(digits) => {
                leaves.push(Leaf { symbol: false, text: digits.clone(), minuses: minuses(at) })
            }
            Token::Unit(unit) => {
                if let Some(last) = leaves.last_mut() {
                    last.text = format!("{} {unit}", last.text);
                }
            }
            Token::Raised(_) | Token::Sign(_) => {}
        }
    }
    leaves
}
