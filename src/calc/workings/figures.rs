//! How many figures each number is printed with, so that a checker with a pencil gets each printed result from the
//! printed numbers before it, while every number has one rounding on the page.

use super::decimal::{Decimal, Rounding, utilisation_decimal};
use super::quantity::Relation;
use super::tape::{Node, NodeId, State, VariableId, What};
use super::unit::Unit;

/// Figures that a number may be given at most.
const MOST: u8 = 7;
/// Figures that an input may have and still be printed as it was typed.
const TYPED: u8 = 5;
/// Results start with this many.
const FIRST: u8 = 3;
/// Pure numbers start no finer than 1e-4.
const FINEST_RATIO: u8 = 4;

/// The rounding of every number on a tape.
pub(super) struct Figures {
    variables: Vec<Rounded>,
    /// By record: the figures of a comparison's sides, and whether even the most figures do not tell them apart.
    sides: Vec<Sides>,
    /// Records whose result does not follow from what is printed, in spite of everything.
    pub unfollowed: Vec<usize>,
}

#[derive(Clone, Copy)]
struct Rounded {
    unit: Unit,
    value: f64,
    /// None: exactly as typed.
    rounding: Option<Rounding>,
    /// It was made coarser because nothing could grow: it stays so.
    settled: bool,
    decimal: Decimal,
    /// The decimal read back, SI.
    read: f64,
}

#[derive(Clone, Copy)]
pub(super) struct Sides {
    figures: u8,
    pub undecided: bool,
}

/// A formula whose value must come out as printed.
enum Target {
    Variable(VariableId),
    /// A side of a comparison in the record, printed at its own figures.
    Side(usize),
}

impl Figures {
    pub fn choose(state: &State) -> Figures {
        let results = results(state);
        let first = |(id, variable): (usize, &super::tape::Variable)| {
            Rounded::new(
                variable.info.unit,
                variable.value,
                variable.info.rounding,
                variable.info.least_places,
                results[id],
            )
        };
        let mut figures = Figures {
            variables: state.variables.iter().enumerate().map(first).collect(),
            sides: vec![Sides { figures: FIRST, undecided: false }; state.records.len()],
            unfollowed: Vec::new(),
        };
        // Growing never takes figures back, so that this ends; a dozen rounds are far more than were ever needed.
        for _ in 0..24 {
            let before = figures.state_of_play();
            figures.unfollowed.clear();
            for record in (0..state.records.len()).rev() {
                figures.settle(state, record);
            }
            if figures.state_of_play() == before {
                break;
            }
        }
        figures
    }

    /// A variable as printed, in the unit of its symbol.
    pub fn decimal(&self, id: VariableId) -> Decimal {
        self.variables[id].decimal
    }

    /// A side of a comparison as printed in `unit`: a variable alone keeps its own figures.
    pub fn side(&self, state: &State, record: usize, node: NodeId, unit: Unit) -> Decimal {
        match state.nodes[node as usize].node {
            Node::Variable(id) => {
                let own = &self.variables[id];
                own.decimal.moved(own.unit.power() - unit.power())
            }
            Node::Literal => {
                let value = state.nodes[node as usize].value;
                Decimal::as_typed(value, TYPED).unwrap_or(Decimal::ZERO)
            }
            _ => {
                let value = state.nodes[node as usize].value;
                let n = self.sides[record].figures;
                Decimal::rounded(value, Rounding::Significant(n), unit).unwrap_or(Decimal::ZERO)
            }
        }
    }

    pub fn sides(&self, record: usize) -> Sides {
        self.sides[record]
    }

    fn state_of_play(&self) -> Vec<(u64, bool)> {
        let decimals = self.variables.iter().map(|v| (v.read.to_bits(), v.settled));
        decimals.chain(self.sides.iter().map(|s| (u64::from(s.figures), s.undecided))).collect()
    }

    fn settle(&mut self, state: &State, record: usize) {
        match &state.records[record].what {
            What::Chapter | What::Note | What::Value { .. } => {}
            What::Equation { variable, node } => self.follow(state, record, *node, Target::Variable(*variable)),
            What::Comparison { left, right, relation, .. } => {
                self.compare(state, record, (*left, *right), *relation);
                self.follow(state, record, *left, Target::Side(record));
                self.follow(state, record, *right, Target::Side(record));
            }
            What::Requirement { demand, capacity, node, variable } => {
                let (over, under) = (state.nodes[*demand as usize].value, state.nodes[*capacity as usize].value);
                let relation = if over <= under { Relation::AtMost } else { Relation::MoreThan };
                self.compare(state, record, (*demand, *capacity), relation);
                self.follow(state, record, *node, Target::Variable(*variable));
            }
        }
    }

    /// Gives both sides figures until they compare as the exact values do.
    fn compare(&mut self, state: &State, record: usize, (left, right): (NodeId, NodeId), relation: Relation) {
        loop {
            let (a, b) = (self.read_side(state, record, left), self.read_side(state, record, right));
            if relation.holds(a, b) {
                self.sides[record].undecided = false;
                return;
            }
            let n = self.sides[record].figures;
            if n >= MOST {
                self.sides[record].undecided = true;
                return;
            }
            self.sides[record].figures = n + 1;
            for side in [left, right] {
                if let Node::Variable(id) = state.nodes[side as usize].node {
                    self.variables[id].reach(n + 1);
                }
            }
        }
    }

    fn read_side(&self, state: &State, record: usize, node: NodeId) -> f64 {
        let data = state.nodes[node as usize];
        match data.node {
            Node::Variable(id) => self.variables[id].read,
            Node::Literal => data.value,
            _ => {
                let n = self.sides[record].figures;
                Decimal::significant(data.value, n).map_or(f64::NAN, Decimal::value)
            }
        }
    }

    /// Makes the inputs of a formula finer until its printed value follows from them.
    fn follow(&mut self, state: &State, record: usize, node: NodeId, target: Target) {
        if matches!(target, Target::Side(_))
            && matches!(state.nodes[node as usize].node, Node::Variable(_) | Node::Literal)
        {
            return;
        }
        let exact = state.nodes[node as usize].value;
        let mut inputs = Vec::new();
        state.variables_of(node, &mut inputs);
        loop {
            let (printed, unit) = self.target(&target, exact);
            let found = state.evaluate(node, &|id| self.variables[id].read);
            let miss = (found - printed).abs();
            // A hair of tolerance for the binary arithmetic of this comparison itself.
            if miss <= 0.5 * unit * (1.0 + 1e-9) {
                return;
            }
            let moves = |id: VariableId| {
                let alone = state.evaluate(node, &|other| {
                    if other == id { self.variables[id].read } else { self.variables[other].value }
                });
                (alone - exact).abs()
            };
            let growable = inputs.iter().copied().filter(|id| self.variables[*id].can_grow());
            let worst = growable.map(|id| (moves(id), id)).filter(|(by, _)| *by > 0.0);
            let worst = worst.fold(None, |worst: Option<(f64, VariableId)>, next| match worst {
                Some(worst) if worst.0 >= next.0 => Some(worst),
                _ => Some(next),
            });
            match (worst, &target) {
                (Some((_, id)), _) => self.variables[id].grow(),
                _ if miss <= unit * (1.0 + 1e-9) => return,
                (None, Target::Variable(id)) if self.variables[*id].coarsen() => {}
                (None, Target::Side(at)) if self.sides[*at].figures > FIRST => self.sides[*at].figures -= 1,
                (None, _) => {
                    self.unfollowed.push(record);
                    return;
                }
            }
        }
    }

    /// What a formula must give, and one unit of its last figure; both SI.
    fn target(&self, target: &Target, exact: f64) -> (f64, f64) {
        match target {
            Target::Variable(id) => {
                let own = &self.variables[*id];
                (own.read, own.decimal.moved(own.unit.power()).unit_of_last_figure())
            }
            Target::Side(record) => {
                let n = self.sides[*record].figures;
                let decimal = Decimal::significant(exact, n).unwrap_or(Decimal::ZERO);
                (decimal.value(), decimal.unit_of_last_figure())
            }
        }
    }
}

/// Which variables are results of lines.
fn results(state: &State) -> Vec<bool> {
    let mut results = vec![false; state.variables.len()];
    for record in &state.records {
        match record.what {
            What::Equation { variable, .. } | What::Requirement { variable, .. } => results[variable] = true,
            What::Chapter | What::Note | What::Value { .. } | What::Comparison { .. } => {}
        }
    }
    results
}

impl Rounded {
    fn new(unit: Unit, value: f64, rule: Rounding, least_places: u8, result: bool) -> Rounded {
        let typed = if result { None } else { Decimal::as_typed(value, TYPED) };
        let mut rounded =
            Rounded { unit, value, rounding: None, settled: false, decimal: Decimal::ZERO, read: 0.0 };
        match typed {
            Some(typed) => {
                let decimal = typed.moved(-unit.power()).without_trailing_zeros().with_places(least_places);
                rounded.decimal = decimal;
                rounded.read = value;
            }
            None => rounded.set(first_rounding(unit, value, rule)),
        }
        rounded
    }

    fn set(&mut self, rounding: Rounding) {
        self.rounding = Some(rounding);
        let decimal = Decimal::rounded(self.value, rounding, self.unit).unwrap_or(Decimal::ZERO);
        self.decimal =
            if self.value == 0.0 && matches!(rounding, Rounding::Significant(_)) { Decimal::ZERO } else { decimal };
        self.read = self.decimal.moved(self.unit.power()).value();
    }

    fn can_grow(&self) -> bool {
        self.rounding.is_some() && !self.settled && self.value.is_normal() && self.decimal.figures() < MOST
    }

    fn grow(&mut self) {
        match self.rounding {
            Some(Rounding::Significant(n)) => self.set(Rounding::Significant(n + 1)),
            Some(Rounding::Places(n)) => self.set(Rounding::Places(n + 1)),
            None => {}
        }
    }

    /// At least so many figures, as far as it can grow.
    fn reach(&mut self, figures: u8) {
        while self.can_grow() && self.decimal.figures() < figures {
            self.grow();
        }
    }

    /// One figure less, for good; false if there is none to take.
    fn coarsen(&mut self) -> bool {
        self.settled = true;
        match self.rounding {
            Some(Rounding::Significant(n)) if n > 1 => self.set(Rounding::Significant(n - 1)),
            Some(Rounding::Places(n)) if n > 0 => self.set(Rounding::Places(n - 1)),
            _ => return false,
        }
        true
    }
}

fn first_rounding(unit: Unit, value: f64, rule: Rounding) -> Rounding {
    match rule {
        Rounding::Places(places) if unit == Unit::One && value > 1.0 => {
            // A utilisation above 1 never prints as 1.00.
            let needed = utilisation_decimal(value).map_or(0, |d| u8::try_from(-d.last_place()).unwrap_or(0));
            Rounding::Places(places.max(needed))
        }
        Rounding::Significant(n) if unit == Unit::One => {
            let fine = Decimal::significant(value, n).is_some_and(|d| d.last_place() < -i32::from(FINEST_RATIO));
            let coarse = Decimal::rounded(value, Rounding::Places(FINEST_RATIO), unit);
            match (fine, coarse.is_some_and(|d| !d.is_zero())) {
                (false, _) => Rounding::Significant(n),
                (true, true) => Rounding::Places(FINEST_RATIO),
                // Something that is not nought never prints as nought.
                (true, false) => Rounding::Significant(1),
            }
        }
        rule => rule,
    }
}
