//! What a traced run leaves behind: every operation, every line, and what was wrong with them. One tape a member.

use std::cell::RefCell;
use std::panic::Location;

use super::decimal::Decimal;
use super::number::{Constant, Number};
use super::quantity::Relation;
use super::symbol::{Info, Written};
use super::unit::{Dimension, Unit};

/// Most figures a literal in a formula may have: a number like 1/3 has already lost its origin.
const LITERAL_FIGURES: u8 = 5;

/// The record of one member's workings.
#[derive(Default)]
pub struct Tape {
    state: RefCell<State>,
}

#[derive(Default)]
pub(super) struct State {
    pub nodes: Vec<NodeData>,
    pub variables: Vec<Variable>,
    pub records: Vec<Record>,
    pub faults: Vec<TapeFault>,
    pub groups: u32,
    /// The group that `say` opened, with its sentence.
    pub open: Option<(u32, String)>,
    /// What each symbol stands for just now, and the number of records when it came to.
    pub bindings: Vec<(VariableId, usize)>,
}

pub(super) type NodeId = u32;
pub(super) type VariableId = usize;

#[derive(Clone, Copy)]
pub(super) struct NodeData {
    pub node: Node,
    pub value: f64,
    pub dimension: Dimension,
}

#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) enum Node {
    Literal,
    Constant(&'static Constant),
    Variable(VariableId),
    Negative(NodeId),
    Sum(NodeId, NodeId),
    Difference(NodeId, NodeId),
    Product(NodeId, NodeId),
    Quotient(NodeId, NodeId),
    Square(NodeId),
    Cube(NodeId),
    Root(NodeId),
    Least(NodeId, NodeId),
    Greatest(NodeId, NodeId),
    Measured(NodeId, Unit),
}

/// A symbol with its value. The same symbol with the same value is the same variable all through a tape.
pub(super) struct Variable {
    pub info: &'static Info,
    pub sub: Option<String>,
    pub value: f64,
}

impl Variable {
    pub fn written(&self) -> Written {
        Written::new(self.info, self.sub.as_deref())
    }

    pub fn same_symbol(&self, other: &Variable) -> bool {
        std::ptr::eq(self.info, other.info) && self.sub == other.sub
    }
}

/// What a line of the account is made from.
#[derive(Clone, Debug)]
pub(super) struct Record {
    /// Records of one group share a sentence and a line number.
    pub group: u32,
    pub sentence: String,
    pub clause: String,
    pub what: What,
}

#[derive(Clone, Debug, PartialEq)]
pub(super) enum What {
    Chapter,
    Note,
    Equation {
        variable: VariableId,
        node: NodeId,
    },
    Value {
        variable: VariableId,
    },
    /// `ring`: the comparison is itself the result of a check.
    Comparison {
        left: NodeId,
        right: NodeId,
        relation: Relation,
        dimension: Dimension,
        ring: bool,
    },
    Requirement {
        demand: NodeId,
        capacity: NodeId,
        node: NodeId,
        variable: VariableId,
    },
}

/// Something that must never be printed; a test walks every check for it.
#[derive(Clone, Debug, PartialEq)]
pub struct TapeFault {
    pub what: String,
    pub at: String,
}

impl Tape {
    pub fn new() -> Tape {
        Tape::default()
    }

    /// Faults so far.
    pub fn faults(&self) -> Vec<TapeFault> {
        self.state.borrow().faults.clone()
    }

    /// Starts a chapter: what follows stands under this heading.
    pub fn chapter(&self, heading: &str) {
        let mut state = self.state.borrow_mut();
        state.open = None;
        let group = state.next_group();
        let record = Record { group, sentence: heading.into(), clause: String::new(), what: What::Chapter };
        state.records.push(record);
    }

    pub(super) fn with<T>(&self, look: impl FnOnce(&mut State) -> T) -> T {
        look(&mut self.state.borrow_mut())
    }
}

impl State {
    pub fn next_group(&mut self) -> u32 {
        self.groups += 1;
        self.groups
    }

    pub fn push(&mut self, node: Node, value: f64, dimension: Dimension) -> NodeId {
        self.nodes.push(NodeData { node, value, dimension });
        // A tape holds a few thousand nodes; the cast cannot lose any.
        (self.nodes.len() - 1) as NodeId
    }

    pub fn fault(&mut self, what: String, at: &Location<'_>) {
        self.faults.push(TapeFault { what, at: at.to_string() });
    }

    /// The variable of this symbol and value, a new one if there is none yet.
    pub fn variable(&mut self, new: Variable) -> VariableId {
        let same = |known: &Variable| known.same_symbol(&new) && known.value.to_bits() == new.value.to_bits();
        match self.variables.iter().position(same) {
            Some(id) => id,
            None => {
                self.variables.push(new);
                self.variables.len() - 1
            }
        }
    }

    /// The symbol now stands for this variable. False if it did already.
    pub fn bind(&mut self, id: VariableId) -> bool {
        let now = self.records.len();
        let variable = &self.variables[id];
        let current = self.bindings.iter_mut().find(|(other, _)| self.variables[*other].same_symbol(variable));
        match current {
            Some((other, _)) if *other == id => false,
            Some(binding) => {
                *binding = (id, now);
                true
            }
            None => {
                self.bindings.push((id, now));
                true
            }
        }
    }

    /// Whether an equal record stands already, and every symbol in it still means what it meant there.
    pub fn stands(&self, what: &What, clause: &str) -> bool {
        let Some(at) = self.records.iter().rposition(|r| r.clause == clause && self.same(&r.what, what)) else {
            return false;
        };
        let mut variables = Vec::new();
        match what {
            What::Chapter | What::Note => return false,
            What::Value { variable } => variables.push(*variable),
            What::Equation { variable, node } => {
                variables.push(*variable);
                self.variables_of(*node, &mut variables);
            }
            What::Comparison { left, right, .. } => {
                self.variables_of(*left, &mut variables);
                self.variables_of(*right, &mut variables);
            }
            What::Requirement { .. } => return false,
        }
        variables.iter().all(|id| self.bindings.iter().any(|(bound, since)| bound == id && *since <= at))
    }

    fn same(&self, one: &What, other: &What) -> bool {
        match (one, other) {
            (What::Value { variable: a }, What::Value { variable: b }) => a == b,
            (What::Equation { variable: a, node: m }, What::Equation { variable: b, node: n }) => {
                a == b && self.same_formula(*m, *n)
            }
            (
                What::Comparison { left: a, right: b, relation: r, .. },
                What::Comparison { left: c, right: d, relation: s, .. },
            ) => r == s && self.same_formula(*a, *c) && self.same_formula(*b, *d),
            _ => false,
        }
    }

    fn same_formula(&self, one: NodeId, other: NodeId) -> bool {
        let (a, b) = (self.nodes[one as usize], self.nodes[other as usize]);
        match (a.node, b.node) {
            (Node::Literal, Node::Literal) => a.value.to_bits() == b.value.to_bits(),
            (Node::Constant(a), Node::Constant(b)) => a == b,
            (Node::Variable(a), Node::Variable(b)) => a == b,
            (Node::Measured(a, u), Node::Measured(b, v)) => u == v && self.same_formula(a, b),
            _ => {
                std::mem::discriminant(&a.node) == std::mem::discriminant(&b.node)
                    && a.node.parts().zip(b.node.parts()).all(|(a, b)| self.same_formula(a, b))
            }
        }
    }

    /// The variables that a formula uses, each once, in the order of reading.
    pub fn variables_of(&self, node: NodeId, found: &mut Vec<VariableId>) {
        let node = self.nodes[node as usize].node;
        if let Node::Variable(id) = node
            && !found.contains(&id)
        {
            found.push(id);
        }
        for part in node.parts() {
            self.variables_of(part, found);
        }
    }

    /// The value of a formula where each variable has the value that `read` gives it.
    pub fn evaluate(&self, node: NodeId, read: &dyn Fn(VariableId) -> f64) -> f64 {
        let of = |part| self.evaluate(part, read);
        let data = self.nodes[node as usize];
        match data.node {
            Node::Literal | Node::Constant(_) => data.value,
            Node::Variable(id) => read(id),
            Node::Negative(a) => Number::negative(of(a)),
            Node::Sum(a, b) => of(a).plus(of(b)),
            Node::Difference(a, b) => of(a).less(of(b)),
            Node::Product(a, b) => of(a).times(of(b)),
            Node::Quotient(a, b) => of(a).over(of(b)),
            Node::Square(a) => of(a).squared(),
            Node::Cube(a) => of(a).cubed(),
            Node::Root(a) => of(a).root(),
            Node::Least(a, b) => of(a).least(of(b)),
            Node::Greatest(a, b) => of(a).greatest(of(b)),
            Node::Measured(a, unit) => of(a) / unit.one(),
        }
    }
}

impl Node {
    pub fn parts(self) -> impl Iterator<Item = NodeId> {
        let parts = match self {
            Node::Literal | Node::Constant(_) | Node::Variable(_) => [None, None],
            Node::Negative(a) | Node::Square(a) | Node::Cube(a) | Node::Root(a) | Node::Measured(a, _) => {
                [Some(a), None]
            }
            Node::Sum(a, b)
            | Node::Difference(a, b)
            | Node::Product(a, b)
            | Node::Quotient(a, b)
            | Node::Least(a, b)
            | Node::Greatest(a, b) => [Some(a), Some(b)],
        };
        parts.into_iter().flatten()
    }
}

/// A number that knows how it came about. A literal has no tape until it meets a number that has one.
#[derive(Clone, Copy)]
pub struct Traced<'t> {
    value: f64,
    origin: Origin<'t>,
}

#[derive(Clone, Copy)]
enum Origin<'t> {
    Literal,
    Constant(&'static Constant),
    Node(NodeId, &'t Tape),
}

impl std::fmt::Debug for Traced<'_> {
    fn fmt(&self, f: &mut std::fmt::Formatter<'_>) -> std::fmt::Result {
        write!(f, "{}", self.value)
    }
}

impl<'t> Traced<'t> {
    pub(super) fn node(value: f64, node: NodeId, tape: &'t Tape) -> Self {
        Traced { value, origin: Origin::Node(node, tape) }
    }

    /// The node of this number on `tape`; a literal gets one.
    #[track_caller]
    pub(super) fn on(self, tape: &Tape) -> NodeId {
        let at = Location::caller();
        match self.origin {
            Origin::Node(node, own) => {
                if !std::ptr::eq(own, tape) {
                    tape.with(|s| s.fault("a number of another tape".into(), at));
                }
                node
            }
            Origin::Constant(constant) => {
                tape.with(|s| s.push(Node::Constant(constant), self.value, Dimension::NONE))
            }
            Origin::Literal => tape.with(|s| {
                if Decimal::as_typed(self.value, LITERAL_FIGURES).is_none() {
                    s.fault(format!("a literal of more than {LITERAL_FIGURES} figures: {}", self.value), at);
                }
                s.push(Node::Literal, self.value, Dimension::NONE)
            }),
        }
    }

    fn tape(self) -> Option<&'t Tape> {
        match self.origin {
            Origin::Node(_, tape) => Some(tape),
            Origin::Literal | Origin::Constant(_) => None,
        }
    }

    #[track_caller]
    fn one(
        self,
        value: f64,
        node: impl FnOnce(NodeId) -> Node,
        dimension: impl FnOnce(Dimension) -> Option<Dimension>,
    ) -> Self {
        let at = Location::caller();
        let Some(tape) = self.tape() else { return Traced { value, origin: Origin::Literal } };
        let part = self.on(tape);
        let id = tape.with(|s| {
            let of = s.nodes[part as usize].dimension;
            let dimension = dimension(of).unwrap_or_else(|| {
                s.fault("a root of an odd power of a unit".into(), at);
                of
            });
            s.push(node(part), value, dimension)
        });
        Traced::node(value, id, tape)
    }

    #[track_caller]
    fn two(self, other: Self, value: f64, node: impl FnOnce(NodeId, NodeId) -> Node, rule: Rule) -> Self {
        let at = Location::caller();
        let Some(tape) = self.tape().or(other.tape()) else { return Traced { value, origin: Origin::Literal } };
        let (a, b) = (self.on(tape), other.on(tape));
        let id = tape.with(|s| {
            let (left, right) = (s.nodes[a as usize].dimension, s.nodes[b as usize].dimension);
            let dimension = match rule {
                Rule::Same => {
                    if left != right {
                        s.fault(format!("{left:?} meets {right:?}"), at);
                    }
                    left
                }
                Rule::Product => Dimension::of(left.force + right.force, left.length + right.length),
                Rule::Quotient => Dimension::of(left.force - right.force, left.length - right.length),
            };
            s.push(node(a, b), value, dimension)
        });
        Traced::node(value, id, tape)
    }
}

#[derive(Clone, Copy)]
enum Rule {
    Same,
    Product,
    Quotient,
}

fn times(power: i8) -> impl FnOnce(Dimension) -> Option<Dimension> {
    move |d| Some(Dimension::of(d.force * power, d.length * power))
}

impl Number for Traced<'_> {
    fn literal(value: f64) -> Self {
        Traced { value, origin: Origin::Literal }
    }

    fn constant(constant: &'static Constant) -> Self {
        Traced { value: constant.value, origin: Origin::Constant(constant) }
    }

    fn value(self) -> f64 {
        self.value
    }

    #[track_caller]
    fn plus(self, other: Self) -> Self {
        self.two(other, self.value.plus(other.value), Node::Sum, Rule::Same)
    }

    #[track_caller]
    fn less(self, other: Self) -> Self {
        self.two(other, self.value.less(other.value), Node::Difference, Rule::Same)
    }

    #[track_caller]
    fn times(self, other: Self) -> Self {
        self.two(other, self.value.times(other.value), Node::Product, Rule::Product)
    }

    #[track_caller]
    fn over(self, other: Self) -> Self {
        self.two(other, self.value.over(other.value), Node::Quotient, Rule::Quotient)
    }

    #[track_caller]
    fn negative(self) -> Self {
        self.one(self.value.negative(), Node::Negative, Some)
    }

    #[track_caller]
    fn squared(self) -> Self {
        self.one(self.value.squared(), Node::Square, times(2))
    }

    #[track_caller]
    fn cubed(self) -> Self {
        self.one(self.value.cubed(), Node::Cube, times(3))
    }

    #[track_caller]
    fn root(self) -> Self {
        let half = |d: Dimension| {
            (d.force % 2 == 0 && d.length % 2 == 0).then(|| Dimension::of(d.force / 2, d.length / 2))
        };
        self.one(self.value.root(), Node::Root, half)
    }

    #[track_caller]
    fn least(self, cap: Self) -> Self {
        self.two(cap, self.value.least(cap.value), Node::Least, Rule::Same)
    }

    #[track_caller]
    fn greatest(self, floor: Self) -> Self {
        self.two(floor, self.value.greatest(floor.value), Node::Greatest, Rule::Same)
    }

    #[track_caller]
    fn measured(self, unit: Unit, dimension: Dimension) -> Self {
        let at = Location::caller();
        if unit.dimension() != dimension
            && let Some(tape) = self.tape()
        {
            tape.with(|s| s.fault(format!("{dimension:?} measured in {}", unit.name()), at));
        }
        if let Origin::Node(node, tape) = self.origin {
            tape.with(|s| {
                if !matches!(s.nodes[node as usize].node, Node::Variable(_)) {
                    s.fault("measured without a name".into(), at);
                }
            });
        }
        self.one(self.value / unit.one(), |a| Node::Measured(a, unit), |_| Some(Dimension::NONE))
    }
}
