//! The account of a tape: chapters of numbered lines, ready to be written out.

use super::figures::Figures;
use super::formula::{Figure, Formula, substituted, symbolic};
use super::quantity::Relation;
use super::symbol::Written;
use super::tape::{Node, NodeId, State, Tape, What};
use super::unit::{Dimension, Unit};

/// A member's workings.
#[derive(Clone, Debug, PartialEq, Default)]
pub struct Account {
    pub chapters: Vec<Chapter>,
}

#[derive(Clone, Debug, PartialEq)]
pub struct Chapter {
    /// "Bending, at 2.10 m where B1 lands".
    pub heading: String,
    pub lines: Vec<Line>,
}

/// One numbered line: a sentence, what follows from it, and where it stands in the standard.
#[derive(Clone, Debug, PartialEq)]
pub struct Line {
    /// From 1, through all chapters.
    pub number: u32,
    pub sentence: String,
    /// Clauses of its steps, joined by "; ". A standard is named where it changes within a chapter.
    pub clause: String,
    pub steps: Vec<Step>,
    /// Lines of earlier chapters whose results it uses.
    pub from: Vec<u32>,
}

#[derive(Clone, Debug, PartialEq)]
pub enum Step {
    /// symbol = formula = formula with figures = result.
    Equation { symbol: Written, formula: Formula, figures: Formula, result: Figure },
    /// symbol = result, from a table or from elsewhere.
    Value { symbol: Written, result: Figure },
    /// Two sides compared; the relation is the one that holds.
    /// `ring`: it is itself the result of a check.
    Comparison { left: Side, right: Side, relation: Relation, unit: Unit, undecided: bool, ring: bool },
    /// Demand over capacity = utilisation: a check's result, where the pencil ring stands.
    Requirement { formula: Formula, figures: Formula, result: Figure, met: bool, undecided: bool },
}

/// A side of a comparison.
#[derive(Clone, Debug, PartialEq)]
pub struct Side {
    /// In symbols; none for a plain number.
    pub formula: Option<Formula>,
    /// With figures; none where the side is a symbol or a number alone.
    pub figures: Option<Formula>,
    pub result: Figure,
}

/// Said where a comparison of printed figures cannot show what the exact ones do.
pub const UNDECIDED: &str = "equal to seven figures; the unrounded numbers decide";

impl Account {
    /// Chooses the figures of everything on the tape and puts it into lines. Chapters that said nothing new are left
    /// out.
    pub fn of(tape: &Tape) -> Account {
        tape.with(|state| {
            let figures = Figures::choose(state);
            for record in &figures.unfollowed {
                let sentence = state.records[*record].sentence.clone();
                state
                    .faults
                    .push(super::tape::TapeFault { what: "does not follow as printed".into(), at: sentence });
            }
            Writer::new(state, &figures).write()
        })
    }

    pub fn lines(&self) -> impl Iterator<Item = &Line> {
        self.chapters.iter().flat_map(|c| &c.lines)
    }
}

struct Writer<'a> {
    state: &'a State,
    figures: &'a Figures,
    account: Account,
    /// By variable: the line that gave it, and the chapter of that line.
    given_by: Vec<Option<(u32, usize)>>,
    numbered: u32,
    group: u32,
    /// The standard that the chapter named last.
    standard: String,
    /// Clauses of the line in hand, in full.
    clauses: Vec<String>,
}

/// "EN 1993-1-1" and the rest of a clause.
fn standard(clause: &str) -> Option<(&str, &str)> {
    let rest = clause.strip_prefix("EN ")?;
    let (number, rest) = rest.split_once(' ')?;
    Some((clause.get(..number.len() + 3)?, rest))
}

impl<'a> Writer<'a> {
    fn new(state: &'a State, figures: &'a Figures) -> Self {
        let given_by = vec![None; state.variables.len()];
        Writer {
            state,
            figures,
            account: Account::default(),
            given_by,
            numbered: 0,
            group: 0,
            standard: String::new(),
            clauses: vec![],
        }
    }

    fn write(mut self) -> Account {
        for (at, record) in self.state.records.iter().enumerate() {
            if record.what == What::Chapter {
                self.account.chapters.push(Chapter { heading: record.sentence.clone(), lines: vec![] });
                self.standard.clear();
                continue;
            }
            if self.account.chapters.is_empty() {
                self.account.chapters.push(Chapter { heading: String::new(), lines: vec![] });
            }
            let chapter = self.account.chapters.len() - 1;
            if record.group != self.group || self.account.chapters[chapter].lines.is_empty() {
                self.group = record.group;
                self.numbered += 1;
                let line = Line {
                    number: self.numbered,
                    sentence: record.sentence.clone(),
                    clause: String::new(),
                    steps: vec![],
                    from: vec![],
                };
                self.account.chapters[chapter].lines.push(line);
                self.clauses.clear();
            }
            let from = self.sources(&record.what, chapter);
            let step = self.step(at, &record.what);
            if let What::Equation { variable, .. } | What::Value { variable } = record.what {
                self.given_by[variable] = Some((self.numbered, chapter));
            }
            if let Some(line) = self.account.chapters[chapter].lines.last_mut() {
                let shown = match standard(&record.clause) {
                    Some((standard, rest)) if standard == self.standard => rest,
                    Some((standard, _)) => {
                        self.standard = standard.to_string();
                        &record.clause
                    }
                    None => &record.clause,
                };
                if !self.clauses.iter().any(|c| {
                    c == &record.clause
                        || c.starts_with(&format!("{}(", record.clause))
                        || c.starts_with(&format!("{},", record.clause))
                }) {
                    if !line.clause.is_empty() && !shown.is_empty() {
                        line.clause.push_str("; ");
                    }
                    line.clause.push_str(shown);
                    self.clauses.push(record.clause.clone());
                }
                line.from.extend(from.into_iter().filter(|n| *n != line.number));
                line.from.sort_unstable();
                line.from.dedup();
                line.steps.extend(step);
            }
        }
        self.account.chapters.retain(|c| !c.lines.is_empty());
        self.account
    }

    /// Lines of earlier chapters that gave the variables of a record.
    fn sources(&self, what: &What, chapter: usize) -> Vec<u32> {
        let mut used = Vec::new();
        match what {
            What::Chapter | What::Note | What::Value { .. } => {}
            What::Equation { node, .. } | What::Requirement { node, .. } => {
                self.state.variables_of(*node, &mut used)
            }
            What::Comparison { left, right, .. } => {
                self.state.variables_of(*left, &mut used);
                self.state.variables_of(*right, &mut used);
            }
        }
        let given = used.into_iter().filter_map(|id| self.given_by[id]);
        given.filter(|(_, in_chapter)| *in_chapter != chapter).map(|(line, _)| line).collect()
    }

    fn step(&self, record: usize, what: &What) -> Option<Step> {
        let state = self.state;
        match what {
            What::Chapter | What::Note => None,
            What::Equation { variable, node } => {
                let info = state.variables[*variable].info;
                Some(Step::Equation {
                    symbol: state.variables[*variable].written(),
                    formula: symbolic(state, *node),
                    figures: substituted(state, self.figures, *node, info.unit),
                    result: self.result(*variable),
                })
            }
            What::Value { variable } => {
                Some(Step::Value { symbol: state.variables[*variable].written(), result: self.result(*variable) })
            }
            What::Comparison { left, right, relation, dimension, ring } => {
                let unit = self.unit_of(*left, *right, *dimension);
                Some(Step::Comparison {
                    left: self.side(record, *left, unit),
                    right: self.side(record, *right, unit),
                    relation: *relation,
                    unit,
                    ring: *ring,
                    undecided: self.figures.sides(record).undecided,
                })
            }
            What::Requirement { demand, capacity, node, variable } => {
                let value = |node: &NodeId| state.nodes[*node as usize].value;
                Some(Step::Requirement {
                    formula: symbolic(state, *node),
                    figures: substituted(state, self.figures, *node, Unit::One),
                    result: self.result(*variable),
                    met: value(demand) <= value(capacity),
                    undecided: self.figures.sides(record).undecided,
                })
            }
        }
    }

    fn result(&self, variable: usize) -> Figure {
        Figure { decimal: self.figures.decimal(variable), unit: self.state.variables[variable].info.unit }
    }

    /// The unit that both sides are compared in: that of the first symbol of their dimension.
    fn unit_of(&self, left: NodeId, right: NodeId, dimension: Dimension) -> Unit {
        let mut used = Vec::new();
        self.state.variables_of(left, &mut used);
        self.state.variables_of(right, &mut used);
        let units = used.into_iter().map(|id| self.state.variables[id].info.unit);
        let own = units.filter(|u| u.dimension() == dimension).find(|u| *u != Unit::One);
        own.or(Unit::usual(dimension)).unwrap_or(Unit::One)
    }

    fn side(&self, record: usize, node: NodeId, unit: Unit) -> Side {
        let formula = symbolic(self.state, node);
        let alone = match self.state.nodes[node as usize].node {
            Node::Literal => {
                return Side { formula: None, figures: None, result: self.side_figure(record, node, unit) };
            }
            Node::Variable(_) => true,
            _ => false,
        };
        Side {
            formula: Some(formula),
            figures: (!alone).then(|| substituted(self.state, self.figures, node, unit)),
            result: self.side_figure(record, node, unit),
        }
    }

    fn side_figure(&self, record: usize, node: NodeId, unit: Unit) -> Figure {
        Figure { decimal: self.figures.side(self.state, record, node, unit), unit }
    }
}
