//! `Workings`: what a check says while it computes. Without a tape nothing of it costs anything.

use super::number::Number;
use super::quantity::{Comparison, Q, Ratio};
use super::symbol::Symbol;
use super::tape::{Record, State, Tape, Traced, Variable, What};
use super::unit::Dimension;

/// Words that are only made where somebody reads them.
pub trait Words {
    fn words(self) -> String;
}

impl Words for &'static str {
    fn words(self) -> String {
        self.to_string()
    }
}

impl<F: FnOnce() -> String> Words for F {
    fn words(self) -> String {
        self()
    }
}

/// A demand against a capacity.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Requirement {
    pub demand: f64,
    pub capacity: f64,
    pub utilisation: f64,
    pub met: bool,
}

/// What a check says while it computes on numbers `N`.
pub trait Workings<N: Number> {
    /// A number that the check starts from; it prints inside the formulas that use it.
    fn given<'a, const F: i8, const L: i8>(
        &mut self,
        symbol: impl Into<Symbol<'a, F, L>>,
        value: Q<f64, F, L>,
    ) -> Q<N, F, L>;

    /// A number from somewhere else, on a line of its own that says from where.
    fn known<'a, const F: i8, const L: i8>(
        &mut self,
        symbol: impl Into<Symbol<'a, F, L>>,
        value: Q<f64, F, L>,
        origin: impl Words,
    ) -> Q<N, F, L>;

    /// A number from a table; `why` is the sentence that says which row, empty where `say` has said it.
    fn looked_up<'a, const F: i8, const L: i8>(
        &mut self,
        clause: impl Words,
        symbol: impl Into<Symbol<'a, F, L>>,
        value: Q<f64, F, L>,
        why: impl Words,
    ) -> Q<N, F, L>;

    /// A result: `step!` writes it.
    #[track_caller]
    fn line<'a, const F: i8, const L: i8>(
        &mut self,
        clause: impl Words,
        symbol: impl Into<Symbol<'a, F, L>>,
        value: Q<N, F, L>,
    ) -> Q<N, F, L>;

    /// A decision, with both consequences in words.
    #[track_caller]
    fn when(&mut self, clause: impl Words, comparison: Comparison<N>, yes: impl Words, no: impl Words) -> bool;

    /// Demand over capacity: the result of a check.
    #[track_caller]
    fn require<const F: i8, const L: i8>(
        &mut self,
        clause: impl Words,
        demand: Q<N, F, L>,
        capacity: Q<N, F, L>,
    ) -> Requirement;

    /// [`Workings::when`] as the result of a check that has no ratio: a capacity of nought.
    #[track_caller]
    fn judged(&mut self, clause: impl Words, comparison: Comparison<N>, yes: impl Words, no: impl Words) -> bool;

    /// The sentence of the results that follow, up to the next decision, result of a check or sentence.
    fn say(&mut self, words: impl Words);

    /// A sentence without a formula.
    fn note(&mut self, clause: impl Words, words: impl Words);
}

/// `step!(w, "6.2.6(2)", V_pl_Rd = …)`: names a result by its glossary entry and binds it to the same name.
macro_rules! step {
    ($w:expr, $clause:expr, $symbol:ident = $value:expr) => {
        let $symbol = $w.line($clause, &$crate::workings::glossary::$symbol, $value);
    };
}
pub(crate) use step;

/// Workings that nobody reads.
#[derive(Clone, Copy, Debug, Default)]
pub struct Silent;

impl Workings<f64> for Silent {
    #[inline]
    fn given<'a, const F: i8, const L: i8>(
        &mut self,
        _: impl Into<Symbol<'a, F, L>>,
        value: Q<f64, F, L>,
    ) -> Q<f64, F, L> {
        value
    }

    #[inline]
    fn known<'a, const F: i8, const L: i8>(
        &mut self,
        _: impl Into<Symbol<'a, F, L>>,
        value: Q<f64, F, L>,
        _: impl Words,
    ) -> Q<f64, F, L> {
        value
    }

    #[inline]
    fn looked_up<'a, const F: i8, const L: i8>(
        &mut self,
        _: impl Words,
        _: impl Into<Symbol<'a, F, L>>,
        value: Q<f64, F, L>,
        _: impl Words,
    ) -> Q<f64, F, L> {
        value
    }

    #[inline]
    fn line<'a, const F: i8, const L: i8>(
        &mut self,
        _: impl Words,
        _: impl Into<Symbol<'a, F, L>>,
        value: Q<f64, F, L>,
    ) -> Q<f64, F, L> {
        value
    }

    #[inline]
    fn when(&mut self, _: impl Words, comparison: Comparison<f64>, _: impl Words, _: impl Words) -> bool {
        comparison.holds()
    }

    #[inline]
    fn judged(&mut self, _: impl Words, comparison: Comparison<f64>, _: impl Words, _: impl Words) -> bool {
        comparison.holds()
    }

    #[inline]
    fn require<const F: i8, const L: i8>(
        &mut self,
        _: impl Words,
        demand: Q<f64, F, L>,
        capacity: Q<f64, F, L>,
    ) -> Requirement {
        requirement(demand.0, capacity.0, demand.0.over(capacity.0))
    }

    #[inline]
    fn say(&mut self, _: impl Words) {}

    #[inline]
    fn note(&mut self, _: impl Words, _: impl Words) {}
}

fn requirement(demand: f64, capacity: f64, utilisation: f64) -> Requirement {
    Requirement { demand, capacity, utilisation, met: demand <= capacity }
}

impl<'t> Workings<Traced<'t>> for &'t Tape {
    fn given<'a, const F: i8, const L: i8>(
        &mut self,
        symbol: impl Into<Symbol<'a, F, L>>,
        value: Q<f64, F, L>,
    ) -> Q<Traced<'t>, F, L> {
        let symbol = symbol.into();
        let node = self.with(|s| {
            let id = s.variable(named(&symbol, value.0));
            s.bind(id);
            s.push(super::tape::Node::Variable(id), value.0, Dimension::of(F, L))
        });
        Q(Traced::node(value.0, node, self))
    }

    fn known<'a, const F: i8, const L: i8>(
        &mut self,
        symbol: impl Into<Symbol<'a, F, L>>,
        value: Q<f64, F, L>,
        origin: impl Words,
    ) -> Q<Traced<'t>, F, L> {
        let symbol = symbol.into();
        let words = sentence(symbol.info.words);
        self.looked_up(origin, symbol, value, || words)
    }

    fn looked_up<'a, const F: i8, const L: i8>(
        &mut self,
        clause: impl Words,
        symbol: impl Into<Symbol<'a, F, L>>,
        value: Q<f64, F, L>,
        why: impl Words,
    ) -> Q<Traced<'t>, F, L> {
        let symbol = symbol.into();
        let node = self.with(|s| {
            let id = s.variable(named(&symbol, value.0));
            s.bind(id);
            s.record(clause.words(), sentence(&why.words()), What::Value { variable: id });
            s.push(super::tape::Node::Variable(id), value.0, Dimension::of(F, L))
        });
        Q(Traced::node(value.0, node, self))
    }

    #[track_caller]
    fn line<'a, const F: i8, const L: i8>(
        &mut self,
        clause: impl Words,
        symbol: impl Into<Symbol<'a, F, L>>,
        value: Q<Traced<'t>, F, L>,
    ) -> Q<Traced<'t>, F, L> {
        let symbol = symbol.into();
        let at = std::panic::Location::caller();
        let plain = value.0.value();
        let formula = value.0.on(self);
        let node = self.with(|s| {
            let found = s.nodes[formula as usize].dimension;
            // A literal nought has no unit of its own.
            if found != Dimension::of(F, L) && plain != 0.0 {
                s.fault(format!("{} has {found:?}", symbol.info.words), at);
            }
            if !plain.is_finite() {
                s.fault(format!("{} is {plain}", symbol.info.words), at);
            }
            let id = s.variable(named(&symbol, plain));
            s.bind(id);
            let words = sentence(symbol.info.words);
            s.record(clause.words(), words, What::Equation { variable: id, node: formula });
            s.push(super::tape::Node::Variable(id), plain, Dimension::of(F, L))
        });
        Q(Traced::node(plain, node, self))
    }

    #[track_caller]
    fn when(
        &mut self,
        clause: impl Words,
        comparison: Comparison<Traced<'t>>,
        yes: impl Words,
        no: impl Words,
    ) -> bool {
        compared(self, clause.words(), comparison, (yes, no), false)
    }

    #[track_caller]
    fn judged(
        &mut self,
        clause: impl Words,
        comparison: Comparison<Traced<'t>>,
        yes: impl Words,
        no: impl Words,
    ) -> bool {
        compared(self, clause.words(), comparison, (yes, no), true)
    }

    #[track_caller]
    fn require<const F: i8, const L: i8>(
        &mut self,
        clause: impl Words,
        demand: Q<Traced<'t>, F, L>,
        capacity: Q<Traced<'t>, F, L>,
    ) -> Requirement {
        let ratio: Ratio<Traced<'t>> = Q(demand.0.over(capacity.0));
        let found = requirement(demand.0.value(), capacity.0.value(), ratio.0.value());
        let (over, under, node) = (demand.0.on(self), capacity.0.on(self), ratio.0.on(self));
        let info = &super::glossary::utilisation.info;
        self.with(|s| {
            let id = s.variable(Variable { info, sub: None, value: found.utilisation });
            let words = match (s.words_of(over), s.words_of(under)) {
                (Some(over), Some(under)) => sentence(&format!("{over} over {under}")),
                _ => sentence("demand over capacity"),
            };
            let what = What::Requirement { demand: over, capacity: under, node, variable: id };
            s.record(clause.words(), words, what);
        });
        found
    }

    fn say(&mut self, words: impl Words) {
        let words = sentence(&words.words());
        self.with(|s| {
            let group = s.next_group();
            s.open = Some((group, words));
        });
    }

    fn note(&mut self, clause: impl Words, words: impl Words) {
        let (clause, words) = (clause.words(), sentence(&words.words()));
        self.with(|s| s.record(clause, words, What::Note));
    }
}

#[track_caller]
fn compared(
    tape: &Tape,
    clause: String,
    comparison: Comparison<Traced<'_>>,
    (yes, no): (impl Words, impl Words),
    ring: bool,
) -> bool {
    let (left, right) = (comparison.left.on(tape), comparison.right.on(tape));
    let holds = comparison.relation.holds(comparison.left.value(), comparison.right.value());
    let words = sentence(&if holds { yes.words() } else { no.words() });
    let relation = if holds { comparison.relation } else { comparison.relation.opposite() };
    let what = What::Comparison { left, right, relation, dimension: comparison.dimension, ring };
    tape.with(|s| s.record(clause, words, what));
    holds
}

impl State {
    /// Puts a record where it belongs; one that stands already, unchanged, is not written twice.
    fn record(&mut self, clause: String, words: String, what: What) {
        let joins = match what {
            What::Equation { .. } | What::Requirement { .. } => true,
            // A table's row has its own sentence, if any.
            What::Value { .. } => words.is_empty(),
            What::Chapter | What::Note | What::Comparison { .. } => false,
        };
        if self.stands(&what, &clause) {
            // What was said of several results still holds for those of them that are new.
            if !joins {
                self.open = None;
            }
            return;
        }
        let (group, sentence) = match (&what, self.open.take(), self.records.last()) {
            (_, Some((group, said)), _) if joins => {
                self.open = Some((group, said.clone()));
                (group, said)
            }
            // The result of a check stands under the line that it follows from.
            (What::Requirement { .. }, None, Some(last)) if !matches!(last.what, What::Chapter | What::Note) => {
                (last.group, last.sentence.clone())
            }
            _ => (self.next_group(), words),
        };
        if matches!(what, What::Requirement { .. }) {
            self.open = None;
        }
        self.records.push(Record { group, sentence, clause, what });
    }

    fn words_of(&self, node: super::tape::NodeId) -> Option<&'static str> {
        match self.nodes[node as usize].node {
            super::tape::Node::Variable(id) => Some(self.variables[id].info.words),
            _ => None,
        }
    }
}

fn named<const F: i8, const L: i8>(symbol: &Symbol<'_, F, L>, value: f64) -> Variable {
    Variable { info: symbol.info, sub: symbol.sub.as_deref().map(str::to_string), value }
}

/// With a capital at the head and a full stop at the end.
fn sentence(words: &str) -> String {
    let mut letters = words.trim_end_matches('.').chars();
    match letters.next() {
        Some(first) => format!("{}{}.", first.to_uppercase(), letters.as_str()),
        None => String::new(),
    }
}

/// `quantities! { pub struct Profile from Section { h: Length = h, … } }`: a struct generic over its number whose
/// fields are symbols of the glossary, and its reading from plain values, each of them `given`.
macro_rules! quantities {
    ($(#[$doc:meta])* $visibility:vis struct $name:ident from $source:ty {
        $($symbol:ident: $quantity:ident = $field:ident),* $(,)?
    }) => {
        $(#[$doc])*
        #[derive(Clone, Copy, Debug)]
        $visibility struct $name<N> {
            $($visibility $symbol: $crate::workings::quantity::$quantity<N>,)*
        }

        impl<N: $crate::workings::Number> $name<N> {
            $visibility fn given<W: $crate::workings::Workings<N>>(w: &mut W, from: &$source) -> Self {
                $name { $($symbol: w.given(&$crate::workings::glossary::$symbol, from.$field),)* }
            }
        }
    };
}
pub(crate) use quantities;
