//! Greatest and least effects over all combinations and arrangements, from the polynomials themselves.
//!
//! Along a beam the effect of every contribution is a piecewise polynomial. Between the places where a contribution
//! that may come and go changes its sign, the worst arrangement is the same everywhere, so that the envelope is a
//! polynomial again and its extremes are where it ends or is stationary.

use std::borrow::Cow;

use crate::actions::Action;
use crate::actions::combinations::{Combination, Purpose};
use crate::analysis::contribution::Contribution;
use crate::analysis::polynomial::{Poly, ZERO, accumulate, evaluate, greatest, sign_changes, size, upper_bound};
use crate::analysis::profile::piece_at;
use crate::quantity::{Length, Q};
use crate::results::{AbsentRow, Arrangement, CombinationId, Effect, Part};

/// Which extreme is looked for.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Sense {
    Greatest,
    Least,
}

impl Sense {
    pub const BOTH: [Sense; 2] = [Sense::Greatest, Sense::Least];

    fn sign(self) -> f64 {
        match self {
            Sense::Greatest => 1.0,
            Sense::Least => -1.0,
        }
    }

    fn worsens(self, value: f64) -> bool {
        self.sign() * value > 0.0
    }
}

/// What one contribution does along the beam: its amount times pieces per unit.
#[derive(Clone, Debug)]
pub struct Term<'a> {
    /// Index into the component's contributions.
    pub contribution: usize,
    pub amount: f64,
    pub pieces: Cow<'a, [Poly]>,
}

/// An effect along one beam, contribution by contribution.
#[derive(Clone, Debug)]
pub struct Field<'a> {
    pub breaks: Cow<'a, [f64]>,
    pub contributions: &'a [Contribution],
    pub terms: Vec<Term<'a>>,
    /// A part that no combination factors (movement from `settles`).
    pub constant: Option<Cow<'a, [Poly]>>,
}

/// A field with its pieces cut where some contribution changes sign.
pub struct Envelope<'a> {
    field: Field<'a>,
    cells: Vec<Cell>,
}

/// Inside a cell no contribution that may come and go changes its sign.
struct Cell {
    piece: usize,
    from: f64,
    to: f64,
    permanent: Poly,
    /// Permanent contributions one by one (set A, which is only asked of effects with one value): those that are
    /// positive, those that are negative.
    permanent_apart: [Poly; 2],
    /// Per variable action: what stands where only positive, and where only negative parts are present.
    variable: Vec<(Action, [Poly; 2])>,
    constant: Poly,
}

/// An extreme: the effect, and the factor on every contribution of the component with which it arises.
#[derive(Clone, Debug)]
pub struct Found<const FORCE: i8, const LENGTH: i8> {
    pub effect: Effect<FORCE, LENGTH>,
    pub sense: Sense,
    pub factors: Vec<f64>,
}

impl<const FORCE: i8, const LENGTH: i8> Found<FORCE, LENGTH> {
    pub fn size(&self) -> f64 {
        self.effect.value.si().abs()
    }
}

/// Combinations of one purpose; `id` makes the name of the n-th.
#[derive(Clone, Copy)]
pub struct Set<'a> {
    pub list: &'a [Combination],
    pub id: fn(usize) -> CombinationId,
    /// Leaves permanent actions out: the variable part of a movement.
    pub without_permanent: bool,
}

impl<'a> Set<'a> {
    pub fn of(list: &'a [Combination], id: fn(usize) -> CombinationId) -> Set<'a> {
        Set { list, id, without_permanent: false }
    }

    fn permanent_factor(&self, combination: &Combination, worsens: bool) -> f64 {
        if self.without_permanent { 0.0 } else { combination.permanent_factor(worsens) }
    }
}

impl<'a> Field<'a> {
    /// An effect that has one value, such as a reaction: a curve of no length.
    pub fn scalar(contributions: &'a [Contribution], values: Vec<(usize, f64)>, constant: f64) -> Field<'a> {
        let constant_piece = |value: f64| Cow::Owned(vec![[value, 0.0, 0.0, 0.0, 0.0, 0.0]]);
        let terms = values.into_iter().filter(|(_, v)| *v != 0.0);
        Field {
            breaks: Cow::Owned(vec![0.0, 0.0]),
            contributions,
            terms: terms
                .map(|(contribution, v)| Term { contribution, amount: 1.0, pieces: constant_piece(v) })
                .collect(),
            constant: (constant != 0.0).then(|| constant_piece(constant)),
        }
    }

    /// Value of a term on a piece at a distance from the piece's start; what is only rounding is nothing.
    fn term(&self, term: &Term, piece: usize, t: f64) -> f64 {
        let Some(p) = term.pieces.get(piece) else { return 0.0 };
        let value = evaluate(p, t);
        if value.abs() <= 8.0 * f64::EPSILON * size(p, t) { 0.0 } else { term.amount * value }
    }

    fn constant_at(&self, piece: usize, t: f64) -> f64 {
        self.constant.as_ref().and_then(|c| c.get(piece)).map_or(0.0, |p| evaluate(p, t))
    }
}

impl<'a> Envelope<'a> {
    pub fn new(field: Field<'a>) -> Envelope<'a> {
        let mut cells = Vec::new();
        for piece in 0..field.breaks.len().saturating_sub(1) {
            cut(&field, piece, &mut cells);
        }
        Envelope { field, cells }
    }

    pub fn field(&self) -> &Field<'a> {
        &self.field
    }

    /// The extreme over the part of the beam from `range.0` to `range.1`, which are breaks; None where no
    /// combination or no piece is there. Among equals the first combination and the first place.
    pub fn extreme<const FORCE: i8, const LENGTH: i8>(
        &self,
        sets: &[Set],
        sense: Sense,
        range: (f64, f64),
    ) -> Option<Found<FORCE, LENGTH>> {
        let mut best: Option<(f64, usize, f64, usize, usize)> = None;
        for (set_index, set) in sets.iter().enumerate() {
            for (index, combination) in set.list.iter().enumerate() {
                for cell in &self.cells {
                    let (start, end) = (self.field.breaks[cell.piece], self.field.breaks[cell.piece + 1]);
                    if start < range.0 || end > range.1 {
                        continue;
                    }
                    let poly = cell.combined(set, combination, sense);
                    // Equal to within rounding counts as equal, so that the first combination keeps its place.
                    let floor = best.map_or(f64::NEG_INFINITY, |b| b.0 + 1e-12 * b.0.abs());
                    if upper_bound(&poly, cell.from, cell.to) <= floor {
                        continue;
                    }
                    let (value, t) = greatest(&poly, cell.from, cell.to);
                    if value > floor {
                        best = Some((value, cell.piece, t, set_index, index));
                    }
                }
            }
        }
        let (_, piece, t, set, index) = best?;
        Some(self.found(&sets[set], index, sense, piece, t))
    }

    /// The extreme of greatest size over a range.
    pub fn greatest_size<const FORCE: i8, const LENGTH: i8>(
        &self,
        sets: &[Set],
        range: (f64, f64),
    ) -> Option<Found<FORCE, LENGTH>> {
        let greatest = self.extreme(sets, Sense::Greatest, range)?;
        let least = self.extreme(sets, Sense::Least, range)?;
        let (up, down) = (greatest.effect.value.si(), -least.effect.value.si());
        Some(if down > up + 1e-12 * up.abs() { least } else { greatest })
    }

    /// The effect of greatest size at one place, from either side of it.
    pub fn greatest_size_at<const FORCE: i8, const LENGTH: i8>(
        &self,
        sets: &[Set],
        x: f64,
    ) -> Option<Found<FORCE, LENGTH>> {
        let mut best: Option<(f64, usize, f64, Sense, &Set, usize)> = None;
        for piece in self.pieces_at(x) {
            let t = x - self.field.breaks[piece];
            for sense in Sense::BOTH {
                for set in sets {
                    for (index, combination) in set.list.iter().enumerate() {
                        let size = self.value(set, combination, sense, piece, t).abs();
                        if size > best.map_or(-1.0, |b| b.0 * (1.0 + 1e-12)) {
                            best = Some((size, piece, t, sense, set, index));
                        }
                    }
                }
            }
        }
        best.map(|(_, piece, t, sense, set, index)| self.found(set, index, sense, piece, t))
    }

    /// The size of the envelope at a place, without saying how it arises.
    pub fn size_at(&self, sets: &[Set], x: f64) -> f64 {
        let mut best = 0.0f64;
        for piece in self.pieces_at(x) {
            let t = x - self.field.breaks[piece];
            for sense in Sense::BOTH {
                for set in sets {
                    for combination in set.list {
                        best = best.max(self.value(set, combination, sense, piece, t).abs());
                    }
                }
            }
        }
        best
    }

    /// Places where the envelope changes its polynomial, in order.
    pub fn places(&self) -> Vec<f64> {
        let mut places: Vec<f64> =
            self.cells.iter().flat_map(|c| [c.from, c.to].map(|t| self.field.breaks[c.piece] + t)).collect();
        places.sort_by(f64::total_cmp);
        places.dedup();
        places
    }

    fn pieces_at(&self, x: f64) -> impl Iterator<Item = usize> {
        let piece = piece_at(&self.field.breaks, x);
        let breaks = &self.field.breaks;
        let next = piece + 2 < breaks.len() && breaks[piece + 1] == x && breaks.len() > 2;
        [Some(piece), next.then_some(piece + 1)].into_iter().flatten()
    }

    fn value(&self, set: &Set, combination: &Combination, sense: Sense, piece: usize, t: f64) -> f64 {
        let mut permanent = 0.0;
        let mut variable: Vec<(Action, f64)> = Vec::new();
        for term in &self.field.terms {
            let c = &self.field.contributions[term.contribution];
            let value = self.field.term(term, piece, t);
            if c.action == Action::Permanent {
                permanent += value;
            } else if !c.is_free() || sense.worsens(value) {
                match variable.iter_mut().find(|(a, _)| *a == c.action) {
                    Some((_, sum)) => *sum += value,
                    None => variable.push((c.action, value)),
                }
            }
        }
        let mut sum = set.permanent_factor(combination, sense.worsens(permanent)) * permanent;
        for v in &combination.variable {
            let value = variable.iter().find(|(a, _)| *a == v.action).map_or(0.0, |(_, value)| *value);
            if sense.worsens(value) {
                sum += v.factor() * value;
            }
        }
        sum + self.field.constant_at(piece, t)
    }

    fn found<const FORCE: i8, const LENGTH: i8>(
        &self,
        set: &Set,
        index: usize,
        sense: Sense,
        piece: usize,
        t: f64,
    ) -> Found<FORCE, LENGTH> {
        let combination = &set.list[index];
        let values: Vec<(usize, f64)> =
            self.field.terms.iter().map(|term| (term.contribution, self.field.term(term, piece, t))).collect();
        let at = Length::from_si(self.field.breaks[piece] + t);
        let mut found = combined(self.field.contributions, &values, set, combination, sense, (set.id)(index), at);
        let constant = self.field.constant_at(piece, t);
        if constant != 0.0 {
            found.effect.value = Q::from_si(found.effect.value.si() + constant);
        }
        found
    }
}

/// An effect from the values of its contributions at one place.
fn combined<const FORCE: i8, const LENGTH: i8>(
    contributions: &[Contribution],
    values: &[(usize, f64)],
    set: &Set,
    combination: &Combination,
    sense: Sense,
    id: CombinationId,
    at: Length,
) -> Found<FORCE, LENGTH> {
    let scale: f64 = values.iter().map(|(_, v)| v.abs()).sum();
    let mut of_contribution = vec![0.0; contributions.len()];
    for (c, value) in values {
        of_contribution[*c] = *value;
    }
    let sum_of = |action: Action| -> f64 {
        let chosen = values.iter().filter(|(c, _)| contributions[*c].action == action);
        chosen.map(|(_, v)| v).sum()
    };
    let mut parts: Vec<Part<FORCE, LENGTH>> = Vec::new();
    let mut factors = vec![0.0; contributions.len()];
    let mut put = |action, value: f64, partial: f64, reduction: f64, leads: bool| {
        if value != 0.0 {
            parts.push(Part { action, value: Q::from_si(value), partial, reduction, leads });
        }
    };
    let apart = combination.purpose == Purpose::Equilibrium;
    let permanent = sum_of(Action::Permanent);
    if apart {
        for worsening in [true, false] {
            let of_sign = values.iter().filter(|(c, v)| {
                contributions[*c].action == Action::Permanent && sense.worsens(*v) == worsening && *v != 0.0
            });
            let sum: f64 = of_sign.map(|(_, v)| v).sum();
            put(Action::Permanent, sum, combination.permanent_factor(worsening), 1.0, false);
        }
    } else if !set.without_permanent {
        let worsens = sense.worsens(permanent);
        let (partial, xi) =
            if worsens { (combination.permanent.0, combination.xi) } else { (combination.permanent.1, 1.0) };
        put(Action::Permanent, permanent, partial, xi, false);
    }
    for (c, contribution) in contributions.iter().enumerate() {
        if contribution.action == Action::Permanent {
            let worsens = if apart { sense.worsens(of_contribution[c]) } else { sense.worsens(permanent) };
            factors[c] = set.permanent_factor(combination, worsens);
        }
    }
    let mut arrangement = Arrangement::default();
    for v in &combination.variable {
        let mut present = 0.0;
        let total = sum_of(v.action);
        for (c, contribution) in contributions.iter().enumerate().filter(|(_, c)| c.action == v.action) {
            let value = of_contribution[c];
            let relieves = if contribution.is_free() {
                sense.worsens(-value) && value.abs() > 1e-9 * scale
            } else {
                sense.worsens(-total)
            };
            if relieves {
                if contribution.is_free() && v.factor() != 0.0 {
                    let row = AbsentRow {
                        beam: contribution.beam,
                        row: contribution.row.unwrap_or(usize::MAX),
                        stretch: contribution.stretch,
                    };
                    arrangement.absent.push(row);
                }
                continue;
            }
            factors[c] = v.factor();
            if !contribution.is_free() || sense.worsens(value) {
                present += value;
            }
            arrangement.any_present |= contribution.is_free() && v.factor() != 0.0;
        }
        if v.factor() != 0.0 {
            put(v.action, present, v.partial, v.psi, v.leads);
        }
    }
    let value = parts.iter().fold(0.0, |sum, p| sum + p.partial * p.reduction * p.value.si());
    Found { effect: Effect { value: Q::from_si(value), at, combination: id, parts, arrangement }, sense, factors }
}

impl Cell {
    /// The polynomial to be maximised: the combined effect, with its sign changed when the least is looked for.
    fn combined(&self, set: &Set, combination: &Combination, sense: Sense) -> Poly {
        let mid = 0.5 * (self.from + self.to);
        let sign = sense.sign();
        let mut sum = ZERO;
        if combination.purpose == Purpose::Equilibrium {
            let worsening = if sense == Sense::Greatest { 0 } else { 1 };
            accumulate(&mut sum, sign * combination.permanent_factor(true), &self.permanent_apart[worsening]);
            accumulate(&mut sum, sign * combination.permanent_factor(false), &self.permanent_apart[1 - worsening]);
        } else {
            let factor = set.permanent_factor(combination, sense.worsens(evaluate(&self.permanent, mid)));
            accumulate(&mut sum, sign * factor, &self.permanent);
        }
        let which = if sense == Sense::Greatest { 0 } else { 1 };
        for v in &combination.variable {
            if let Some((_, parts)) = self.variable.iter().find(|(a, _)| *a == v.action) {
                accumulate(&mut sum, sign * v.factor(), &parts[which]);
            }
        }
        accumulate(&mut sum, sign, &self.constant);
        sum
    }
}

/// Cuts one piece into cells.
fn cut(field: &Field, piece: usize, cells: &mut Vec<Cell>) {
    let length = field.breaks[piece + 1] - field.breaks[piece];
    let mut permanent = ZERO;
    let mut totals: Vec<(Action, Poly)> = Vec::new();
    let mut cuts: Vec<f64> = Vec::new();
    for term in &field.terms {
        let Some(poly) = term.pieces.get(piece) else { continue };
        let c = &field.contributions[term.contribution];
        if c.action == Action::Permanent {
            accumulate(&mut permanent, term.amount, poly);
        } else if c.is_free() {
            sign_changes(poly, 0.0, length, &mut cuts);
        } else {
            match totals.iter_mut().find(|(a, _)| *a == c.action) {
                Some((_, sum)) => accumulate(sum, term.amount, poly),
                None => {
                    let mut sum = ZERO;
                    accumulate(&mut sum, term.amount, poly);
                    totals.push((c.action, sum));
                }
            }
        }
    }
    sign_changes(&permanent, 0.0, length, &mut cuts);
    for (_, total) in &totals {
        sign_changes(total, 0.0, length, &mut cuts);
    }
    cuts.sort_by(f64::total_cmp);
    cuts.dedup();
    let ends: Vec<f64> = std::iter::once(0.0).chain(cuts).chain([length]).collect();
    for pair in ends.windows(2) {
        cells.push(cell(field, piece, (pair[0], pair[1]), permanent, &totals));
    }
}

fn cell(field: &Field, piece: usize, (from, to): (f64, f64), permanent: Poly, totals: &[(Action, Poly)]) -> Cell {
    let mid = 0.5 * (from + to);
    let mut permanent_apart = [ZERO; 2];
    let mut variable: Vec<(Action, [Poly; 2])> = Vec::new();
    for term in &field.terms {
        let Some(poly) = term.pieces.get(piece) else { continue };
        let c = &field.contributions[term.contribution];
        let which = if term.amount * evaluate(poly, mid) > 0.0 { 0 } else { 1 };
        if c.action == Action::Permanent {
            accumulate(&mut permanent_apart[which], term.amount, poly);
        } else if c.is_free() {
            match variable.iter_mut().find(|(a, _)| *a == c.action) {
                Some((_, parts)) => accumulate(&mut parts[which], term.amount, poly),
                None => {
                    let mut parts = [ZERO; 2];
                    accumulate(&mut parts[which], term.amount, poly);
                    variable.push((c.action, parts));
                }
            }
        }
    }
    for (action, total) in totals {
        let which = if evaluate(total, mid) > 0.0 { 0 } else { 1 };
        let mut parts = [ZERO; 2];
        parts[which] = *total;
        variable.push((*action, parts));
    }
    let constant = field.constant.as_ref().and_then(|c| c.get(piece)).copied().unwrap_or(ZERO);
    Cell { piece, from, to, permanent, permanent_apart, variable, constant }
}
