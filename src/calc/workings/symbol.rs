//! Symbols: how a quantity is written, said, and rounded. Their list is the [glossary](super::glossary).

use std::borrow::Cow;

use super::decimal::Rounding;
use super::unit::Unit;

/// A glossary entry of a quantity of this dimension.
#[derive(Debug)]
pub struct Entry<const FORCE: i8, const LENGTH: i8> {
    pub info: Info,
}

/// What the glossary says about a symbol, its dimension apart.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Info {
    /// One letter as a rule: "M", "γ", "ψ".
    pub base: &'static str,
    /// "c,Rd"; empty where there is none.
    pub sub: &'static str,
    pub accent: Accent,
    /// "design resistance to bending".
    pub words: &'static str,
    pub unit: Unit,
    /// To begin with; more figures where later lines need them.
    pub rounding: Rounding,
    /// Places after the point even where the value is whole (γ = 1.0).
    pub least_places: u8,
}

#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Accent {
    None,
    /// A bar over the base, of slendernesses.
    Bar,
}

impl<const F: i8, const L: i8> Entry<F, L> {
    /// This symbol with a further subscript: an action, a mark, a number.
    pub fn of<'a>(&'static self, sub: impl Into<Cow<'a, str>>) -> Symbol<'a, F, L> {
        Symbol { info: &self.info, sub: Some(sub.into()) }
    }
}

/// A symbol in use: an entry, perhaps with a subscript of its own.
#[derive(Clone, Debug)]
pub struct Symbol<'a, const FORCE: i8, const LENGTH: i8> {
    pub(super) info: &'static Info,
    pub(super) sub: Option<Cow<'a, str>>,
}

impl<const F: i8, const L: i8> From<&'static Entry<F, L>> for Symbol<'static, F, L> {
    fn from(entry: &'static Entry<F, L>) -> Self {
        Symbol { info: &entry.info, sub: None }
    }
}

/// A symbol as it is written: base, subscripts joined by commas, accent.
#[derive(Clone, Debug, PartialEq, Eq, Hash)]
pub struct Written {
    pub base: String,
    pub sub: String,
    pub accent: Accent,
}

impl Written {
    pub(super) fn new(info: &Info, own: Option<&str>) -> Written {
        let sub = match own {
            Some(own) if info.sub.is_empty() => own.to_string(),
            Some(own) => format!("{},{own}", info.sub),
            None => info.sub.to_string(),
        };
        Written { base: info.base.to_string(), sub, accent: info.accent }
    }
}
