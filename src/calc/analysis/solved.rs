//! A component with the responses to all its unit loads, and the effects of its beams as fields.

use std::borrow::Cow;

use crate::actions::Actions;
use crate::analysis::contribution::{Contribution, UnitLoad, contributions};
use crate::analysis::envelope::{Field, Term};
use crate::analysis::loads::Resolved;
use crate::analysis::polynomial::{Poly, derivative};
use crate::analysis::profile::{accumulate, add_line, value_at};
use crate::analysis::system::{Response, Responses, System, Variant};
use crate::building::{Beam, Building, Carrier};
use crate::fault::Fault;
use crate::results::{Curve, Landing, Piece, Stretch, StretchKind};

/// What the whole building knows about its beams before anything is solved; lists by beam of the building.
pub struct Layout {
    pub actions: Actions,
    pub rows: Vec<Vec<Resolved>>,
    pub stretches: Vec<Vec<Stretch>>,
    pub landings: Vec<Vec<Landing>>,
}

/// A solved component.
pub struct Solved<'a> {
    pub building: &'a Building,
    pub layout: &'a Layout,
    /// Indices into the building's beams, in the order in which loads travel.
    pub members: Vec<usize>,
    pub breaks: Vec<Vec<f64>>,
    pub units: Vec<UnitLoad>,
    pub contributions: Vec<Contribution>,
    /// One entry a unit load.
    pub responses: Vec<Responses>,
    pub settlement: Option<Responses>,
}

impl<'a> Solved<'a> {
    pub fn new(building: &'a Building, layout: &'a Layout, members: Vec<usize>) -> Result<Solved<'a>, Fault> {
        let (units, contributions) =
            contributions(building, &members, &layout.rows, &layout.stretches, &layout.actions);
        let breaks: Vec<Vec<f64>> = members
            .iter()
            .map(|&b| super::geometry::breaks(&building.beams[b], &layout.rows[b], &layout.landings[b]))
            .collect();
        let mut solved =
            Solved { building, layout, members, breaks, units, contributions, responses: vec![], settlement: None };
        let (responses, settlement) = solved.solve(Variant::default())?;
        solved.responses = responses;
        solved.settlement = settlement;
        Ok(solved)
    }

    fn solve(&self, variant: Variant) -> Result<(Vec<Responses>, Option<Responses>), Fault> {
        let system = System::new(self.building, &self.members, &self.breaks, variant)?;
        Ok((self.units.iter().map(|unit| system.unit(unit)).collect(), system.settlement()))
    }

    /// The same component, solved in another way.
    pub fn variant(&self, variant: Variant) -> Result<Solved<'a>, Fault> {
        let (responses, settlement) = self.solve(variant)?;
        Ok(Solved {
            building: self.building,
            layout: self.layout,
            members: self.members.clone(),
            breaks: self.breaks.clone(),
            units: self.units.clone(),
            contributions: self.contributions.clone(),
            responses,
            settlement,
        })
    }

    pub fn beam(&self, local: usize) -> &'a Beam {
        &self.building.beams[self.members[local]]
    }

    pub fn stretches(&self, local: usize) -> &'a [Stretch] {
        &self.layout.stretches[self.members[local]]
    }

    pub fn local(&self, beam: usize) -> Option<usize> {
        self.members.iter().position(|m| *m == beam)
    }

    fn response(&self, unit: usize, local: usize) -> Option<&Response> {
        self.responses[unit][local].as_ref()
    }

    fn field<'s>(&'s self, local: usize, pieces: impl Fn(&'s Response) -> Option<Cow<'s, [Poly]>>) -> Field<'s> {
        let mut last: Option<(usize, Option<Cow<'s, [Poly]>>)> = None;
        let mut terms = Vec::new();
        for (contribution, c) in self.contributions.iter().enumerate() {
            if last.as_ref().is_none_or(|(unit, _)| *unit != c.unit) {
                last = Some((c.unit, self.response(c.unit, local).and_then(&pieces)));
            }
            if let Some((_, Some(pieces))) = &last {
                terms.push(Term { contribution, amount: c.amount, pieces: pieces.clone() });
            }
        }
        Field {
            breaks: Cow::Borrowed(&self.breaks[local]),
            contributions: &self.contributions,
            terms,
            constant: None,
        }
    }

    /// Bending moment along a beam.
    pub fn moment(&self, local: usize) -> Field<'_> {
        self.field(local, |r| (!r.moments.is_empty()).then_some(Cow::Borrowed(&r.moments[..])))
    }

    /// Shear along a beam, V = dM/dx.
    pub fn shear(&self, local: usize) -> Field<'_> {
        self.field(local, |r| {
            (!r.moments.is_empty()).then(|| Cow::Owned(r.moments.iter().map(derivative).collect()))
        })
    }

    /// Own movement along a beam: less the straight line between the two bearings beside the place.
    pub fn own(&self, local: usize) -> Field<'_> {
        self.field(local, |r| (!r.moments.is_empty()).then(|| Cow::Owned(self.own_pieces(local, &r.movement))))
    }

    /// Absolute movement along a beam; that from `settles` is the constant part.
    pub fn stacked(&self, local: usize) -> Field<'_> {
        let mut field = self.field(local, |r| Some(Cow::Borrowed(&r.movement[..])));
        let settled = self.settlement.as_ref().and_then(|s| s[local].as_ref());
        field.constant = settled.map(|r| Cow::Borrowed(&r.movement[..]));
        field
    }

    fn own_pieces(&self, local: usize, movement: &[Poly]) -> Vec<Poly> {
        let breaks = &self.breaks[local];
        let mut own = movement.to_vec();
        for stretch in 0..self.stretches(local).len() {
            let (a, b) = self.chord(local, stretch);
            let (at_a, at_b) = (value_at(breaks, movement, a), value_at(breaks, movement, b));
            let slope = (at_b - at_a) / (b - a);
            let s = self.stretches(local)[stretch];
            let first = breaks.partition_point(|x| *x < s.from.si());
            let last = breaks.partition_point(|x| *x < s.to.si());
            let last = last.min(own.len());
            if first < last {
                add_line(&breaks[first..], &mut own[first..last], a, -at_a, -slope);
            }
        }
        own
    }

    /// The two bearings beside a stretch (for an end: those of the span next to it), as places along the beam.
    pub fn chord(&self, local: usize, stretch: usize) -> (f64, f64) {
        let (left, right) = self.chord_bearings(local, stretch);
        let bearings = &self.beam(local).bearings;
        (bearings[left].at.si(), bearings[right].at.si())
    }

    /// The two bearings beside a stretch, as indices.
    pub fn chord_bearings(&self, local: usize, stretch: usize) -> (usize, usize) {
        let leading = usize::from(self.stretches(local).first().is_some_and(|s| s.kind != StretchKind::Span));
        let spans = self.beam(local).bearings.len() - 1;
        let span = stretch.saturating_sub(leading).min(spans - 1);
        (span, span + 1)
    }

    /// Reaction of a bearing, upward positive: (contribution, value) pairs.
    pub fn reaction(&self, local: usize, bearing: usize) -> Vec<(usize, f64)> {
        let value = |(n, c): (usize, &Contribution)| {
            let reaction = self.response(c.unit, local)?.reactions.get(bearing)?;
            Some((n, c.amount * reaction))
        };
        self.contributions.iter().enumerate().filter_map(value).collect()
    }

    /// Movement of a place of a beam: (contribution, value) pairs, and the part from `settles`.
    pub fn movement_at(&self, local: usize, x: f64) -> (Vec<(usize, f64)>, f64) {
        let breaks = &self.breaks[local];
        let value = |(n, c): (usize, &Contribution)| {
            Some((n, c.amount * value_at(breaks, &self.response(c.unit, local)?.movement, x)))
        };
        let values = self.contributions.iter().enumerate().filter_map(value).collect();
        (values, self.settled_at(local, x))
    }

    /// Movement of a bearing by contribution, which is that of what carries it; `settles` left out.
    pub fn bearing_values(&self, local: usize, bearing: usize) -> Vec<(usize, f64)> {
        match self.beam(local).bearings[bearing].on {
            Carrier::Wall(_) => Vec::new(),
            Carrier::Beam { beam, lands } => {
                self.local(beam).map_or_else(Vec::new, |carrier| self.movement_at(carrier, lands.si()).0)
            }
        }
    }

    /// Movement of a bearing under given factors, which is that of what carries it; `settles` left out.
    pub fn bearing_movement(&self, local: usize, bearing: usize, factors: &[f64]) -> f64 {
        self.bearing_values(local, bearing).iter().map(|(c, value)| factors[*c] * value).sum()
    }

    /// Movement from `settles` anywhere in the building.
    pub fn settled_at(&self, local: usize, x: f64) -> f64 {
        let settled = self.settlement.as_ref().and_then(|s| s[local].as_ref());
        settled.map_or(0.0, |r| value_at(&self.breaks[local], &r.movement, x))
    }

    /// Movement of a place under given factors on the contributions, `settles` left out.
    pub fn factored_movement(&self, local: usize, x: f64, factors: &[f64]) -> f64 {
        let (values, _) = self.movement_at(local, x);
        values.iter().map(|(c, value)| factors[*c] * value).sum()
    }

    /// A field with given factors on its contributions, as one curve to draw.
    pub fn factored(&self, field: &Field, factors: &[f64]) -> Curve {
        let mut sum: Vec<Poly> = Vec::new();
        for term in &field.terms {
            let factor = factors[term.contribution] * term.amount;
            if factor != 0.0 {
                accumulate(&mut sum, factor, &term.pieces);
            }
        }
        if let Some(constant) = &field.constant {
            accumulate(&mut sum, 1.0, constant);
        }
        curve(&field.breaks, sum)
    }
}

/// A curve from its pieces; zero where there are none.
pub fn curve(breaks: &[f64], mut pieces: Vec<Poly>) -> Curve {
    pieces.resize(breaks.len().saturating_sub(1), super::polynomial::ZERO);
    let pieces = pieces.into_iter().zip(breaks.windows(2));
    Curve { pieces: pieces.map(|(c, pair)| Piece { from: pair[0], to: pair[1], coefficients: c }).collect() }
}
