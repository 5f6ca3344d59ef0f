//! Writers of workings: one neutral tree, written as plain text, as speech, and as JSON for the templates. Each writer
//! adds the brackets that it needs.

pub mod json;
pub mod plain;
pub mod speech;

use sagledger_calc::workings::formula::Formula;

/// How a formula stands.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Form {
    /// In symbols, factors side by side.
    Symbols,
    /// In figures, × between them, with the powers of ten that make the units meet.
    Figures,
    /// In figures that carry their units instead of powers of ten.
    Units,
}

/// How tightly a formula holds together.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord)]
enum Tightness {
    Sum,
    Product,
    Power,
    Whole,
}

fn tightness(formula: &Formula) -> Tightness {
    match formula {
        Formula::Sum(_) => Tightness::Sum,
        Formula::Number(figure) if figure.decimal.is_negative() => Tightness::Sum,
        Formula::Product(_) | Formula::Quotient(..) => Tightness::Product,
        Formula::Power(..) | Formula::TenTo(_) => Tightness::Power,
        Formula::Number(_) | Formula::Symbol(_) | Formula::Root(_) | Formula::Least(_) | Formula::Greatest(_) => {
            Tightness::Whole
        }
    }
}

/// Whether a sign of multiplication stands between two factors.
fn times_between(form: Form, next: &Formula) -> bool {
    form != Form::Symbols || starts_with_figure(next)
}

fn starts_with_figure(formula: &Formula) -> bool {
    match formula {
        Formula::Number(_) | Formula::TenTo(_) => true,
        Formula::Power(base, _) => starts_with_figure(base),
        Formula::Product(factors) => factors.first().is_some_and(starts_with_figure),
        Formula::Quotient(over, _) => starts_with_figure(over),
        Formula::Symbol(_) | Formula::Sum(_) | Formula::Root(_) | Formula::Least(_) | Formula::Greatest(_) => false,
    }
}
