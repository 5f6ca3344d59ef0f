//! A formula as a neutral tree without brackets: each writer adds the brackets that it needs.

use super::decimal::Decimal;
use super::figures::Figures;
use super::number::ConstantKind;
use super::symbol::{Accent, Written};
use super::tape::{Node, NodeId, State};
use super::unit::Unit;

/// A formula, in symbols or with numbers put in.
#[derive(Clone, Debug, PartialEq)]
pub enum Formula {
    /// A figure in its unit; a number of the formula itself has unit [`Unit::One`].
    Number(Figure),
    /// Ten to a power, which makes the units meet.
    TenTo(i32),
    Symbol(Written),
    /// Terms in order; the first may be negative too.
    Sum(Vec<Term>),
    Product(Vec<Formula>),
    Quotient(Box<Formula>, Box<Formula>),
    /// Squares and cubes.
    Power(Box<Formula>, u8),
    Root(Box<Formula>),
    Least(Vec<Formula>),
    Greatest(Vec<Formula>),
}

#[derive(Clone, Debug, PartialEq)]
pub struct Term {
    pub minus: bool,
    pub formula: Formula,
}

/// A figure as printed.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Figure {
    pub decimal: Decimal,
    pub unit: Unit,
}

impl Figure {
    pub fn pure(decimal: Decimal) -> Figure {
        Figure { decimal, unit: Unit::One }
    }

    /// The printed figure, SI.
    pub fn value(&self) -> f64 {
        self.decimal.moved(self.unit.power()).value()
    }
}

impl Formula {
    pub fn is_symbol(&self) -> bool {
        matches!(self, Formula::Symbol(_))
    }
}

/// The formula in symbols.
pub(super) fn symbolic(state: &State, node: NodeId) -> Formula {
    build(state, node, &|id| Formula::Symbol(state.variables[id].written()), &|_, _, symbol| symbol)
}

/// The formula with printed figures put in, so that it gives the figure of a result in `unit`.
///
/// Figures stand in the units of their symbols where the powers of ten of these meet by themselves (sums of moments,
/// ratios); else everything is brought to N and mm and the result back to its unit.
pub(super) fn substituted(state: &State, figures: &Figures, node: NodeId, unit: Unit) -> Formula {
    let in_unit = |id: usize, unit: Unit| {
        let own = state.variables[id].info.unit;
        let decimal = figures.decimal(id).moved(own.power() - unit.power());
        Formula::Number(Figure { decimal, unit })
    };
    let number = |id: usize| in_unit(id, state.variables[id].info.unit);
    let measured = |inner: NodeId, unit: Unit, formula: Formula| match state.nodes[inner as usize].node {
        // The number of units is a pure number.
        Node::Variable(id) => match in_unit(id, unit) {
            Formula::Number(figure) => Formula::Number(Figure::pure(figure.decimal)),
            other => other,
        },
        _ => formula,
    };
    if own_power(state, node) == Some(unit.power_in_n_and_mm()) || is_plain_number(state, node) {
        return build(state, node, &number, &measured);
    }
    let in_n_and_mm = |id: usize| {
        let power = state.variables[id].info.unit.power_in_n_and_mm();
        if power == 0 { number(id) } else { product(vec![number(id), Formula::TenTo(power)]) }
    };
    let formula = build(state, node, &in_n_and_mm, &measured);
    match unit.power_in_n_and_mm() {
        0 => formula,
        power => product(vec![formula, Formula::TenTo(-power)]),
    }
}

fn is_plain_number(state: &State, node: NodeId) -> bool {
    let mut variables = Vec::new();
    state.variables_of(node, &mut variables);
    variables.is_empty()
}

/// The power of ten, against N and mm, in which the formula comes out with every figure in its symbol's unit; none
/// where terms do not meet.
fn own_power(state: &State, node: NodeId) -> Option<i32> {
    let of = |part| own_power(state, part);
    match state.nodes[node as usize].node {
        Node::Literal | Node::Constant(_) | Node::Measured(..) => Some(0),
        Node::Variable(id) => Some(state.variables[id].info.unit.power_in_n_and_mm()),
        Node::Negative(a) => of(a),
        Node::Sum(a, b) | Node::Difference(a, b) | Node::Least(a, b) | Node::Greatest(a, b) => {
            let (a, b) = (of(a)?, of(b)?);
            (a == b).then_some(a)
        }
        Node::Product(a, b) => Some(of(a)? + of(b)?),
        Node::Quotient(a, b) => Some(of(a)? - of(b)?),
        Node::Square(a) => Some(2 * of(a)?),
        Node::Cube(a) => Some(3 * of(a)?),
        Node::Root(a) => of(a).filter(|p| p % 2 == 0).map(|p| p / 2),
    }
}

type Measured<'a> = dyn Fn(NodeId, Unit, Formula) -> Formula + 'a;

fn build(state: &State, node: NodeId, variable: &dyn Fn(usize) -> Formula, measured: &Measured<'_>) -> Formula {
    let of = |part| build(state, part, variable, measured);
    let data = state.nodes[node as usize];
    match data.node {
        Node::Literal => {
            let decimal = Decimal::as_typed(data.value, 17).unwrap_or(Decimal::ZERO).without_trailing_zeros();
            Formula::Number(Figure::pure(decimal))
        }
        Node::Constant(constant) => match constant.kind {
            ConstantKind::Pi => {
                Formula::Symbol(Written { base: "π".into(), sub: String::new(), accent: Accent::None })
            }
            ConstantKind::RootOf(n) => {
                let whole = Decimal::significant(f64::from(n), 3).unwrap_or(Decimal::ZERO);
                Formula::Root(Box::new(Formula::Number(Figure::pure(whole.without_trailing_zeros()))))
            }
        },
        Node::Variable(id) => variable(id),
        Node::Negative(a) => Formula::Sum(vec![Term { minus: true, formula: of(a) }]),
        Node::Sum(a, b) => sum(of(a), false, of(b)),
        Node::Difference(a, b) => sum(of(a), true, of(b)),
        Node::Product(a, b) => product(vec![of(a), of(b)]),
        Node::Quotient(a, b) => quotient(of(a), of(b)),
        Node::Square(a) => power(of(a), 2),
        Node::Cube(a) => power(of(a), 3),
        Node::Root(a) => Formula::Root(Box::new(of(a))),
        Node::Least(a, b) => extreme(of(a), of(b), true),
        Node::Greatest(a, b) => extreme(of(a), of(b), false),
        Node::Measured(a, unit) => measured(a, unit, of(a)),
    }
}

fn sum(left: Formula, minus: bool, right: Formula) -> Formula {
    let mut terms = match left {
        Formula::Sum(terms) => terms,
        other => vec![Term { minus: false, formula: other }],
    };
    match right {
        Formula::Sum(more) if !minus => terms.extend(more),
        other => terms.push(Term { minus, formula: other }),
    }
    Formula::Sum(terms)
}

pub(super) fn product(factors: Vec<Formula>) -> Formula {
    let mut flat = Vec::new();
    for factor in factors {
        match factor {
            Formula::Product(more) => flat.extend(more),
            other => flat.push(other),
        }
    }
    if flat.len() == 1 { flat.remove(0) } else { Formula::Product(flat) }
}

/// a / b / c is written a / (b c).
fn quotient(over: Formula, under: Formula) -> Formula {
    match over {
        Formula::Quotient(over, first) => Formula::Quotient(over, Box::new(product(vec![*first, under]))),
        over => Formula::Quotient(Box::new(over), Box::new(under)),
    }
}

fn power(base: Formula, exponent: u8) -> Formula {
    Formula::Power(Box::new(base), exponent)
}

fn extreme(left: Formula, right: Formula, least: bool) -> Formula {
    match (left, least) {
        (Formula::Least(mut all), true) => {
            all.push(right);
            Formula::Least(all)
        }
        (Formula::Greatest(mut all), false) => {
            all.push(right);
            Formula::Greatest(all)
        }
        (left, true) => Formula::Least(vec![left, right]),
        (left, false) => Formula::Greatest(vec![left, right]),
    }
}
