//! Own, inherited, settled and stacked movements, tilt and the hand rule.

use super::{MovementFields, Sets, whole};
use crate::analysis::envelope::{Envelope, Field, Found, Sense};
use crate::analysis::solved::Solved;
use crate::building::Carrier;
use crate::quantity::Length;
use crate::results::{Effect, Part, Stacked, Stretch, StretchKind, Tilt};

/// Envelope values of the own movements over the whole beam.
pub struct Own {
    pub total: Found<0, 1>,
    pub after: Found<0, 1>,
    pub variable: Found<0, 1>,
}

impl Own {
    pub fn new(solved: &Solved, local: usize, fields: &MovementFields, sets: &Sets) -> Option<Own> {
        let range = whole(solved, local);
        Some(Own {
            total: fields.own.greatest_size(&[sets.characteristic()], range)?,
            after: fields.after.greatest_size(&[sets.characteristic()], range)?,
            variable: fields.own.greatest_size(&[sets.variable()], range)?,
        })
    }
}

/// The movement that a limit looks at in a stretch: the greatest size within a span, downward in an overhang.
pub fn in_stretch(
    envelope: &Envelope,
    sets: &[crate::analysis::envelope::Set],
    s: &Stretch,
) -> Option<Found<0, 1>> {
    let range = (s.from.si(), s.to.si());
    match s.kind {
        StretchKind::Span => envelope.greatest_size(sets, range),
        StretchKind::Overhang | StretchKind::SeatEnd => envelope.extreme(sets, Sense::Greatest, range),
    }
}

/// An absolute movement with the parts that add up to it.
pub fn stacked(solved: &Solved, local: usize, found: &Found<0, 1>, limit: Option<Length>) -> Stacked {
    let x = found.effect.at.si();
    let stretch = stretch_at(solved.stretches(local), x);
    let settled = solved.settled_at(local, x);
    let (left, right) = chord_movements(solved, local, stretch, &found.factors);
    let (a, b) = solved.chord(local, stretch);
    let inherited = left + (right - left) * ((x - a) / (b - a));
    let own = solved.factored_movement(local, x, &found.factors) - inherited;
    let mut shares = Vec::new();
    share(solved, local, x, stretch, 1.0, &found.factors, &mut shares);
    Stacked {
        total: found.effect.clone(),
        own: Length::from_si(own),
        inherited: Length::from_si(inherited),
        settled: Length::from_si(settled),
        limit,
        shares: shares.into_iter().map(|(beam, value)| (beam, Length::from_si(value))).collect(),
    }
}

/// The stretch that a place belongs to; at a border the span.
pub fn stretch_at(stretches: &[Stretch], x: f64) -> usize {
    let holds = |s: &Stretch| s.from.si() <= x && x <= s.to.si();
    let span = stretches.iter().position(|s| s.kind == StretchKind::Span && holds(s));
    span.or_else(|| stretches.iter().position(holds)).unwrap_or(0)
}

/// Movements of the two bearings beside a stretch under given factors, `settles` left out.
pub fn chord_movements(solved: &Solved, local: usize, stretch: usize, factors: &[f64]) -> (f64, f64) {
    let (left, right) = solved.chord_bearings(local, stretch);
    (solved.bearing_movement(local, left, factors), solved.bearing_movement(local, right, factors))
}

/// Adds what each beam's bending contributes to a movement: this beam's own part, then what its two bearings bring
/// with them, beam by beam down to the walls.
fn share(
    solved: &Solved,
    local: usize,
    x: f64,
    stretch: usize,
    weight: f64,
    factors: &[f64],
    shares: &mut Vec<(usize, f64)>,
) {
    let (left, right) = chord_movements(solved, local, stretch, factors);
    let (a, b) = solved.chord(local, stretch);
    let to_right = (x - a) / (b - a);
    let own = solved.factored_movement(local, x, factors) - (left + (right - left) * to_right);
    let beam = solved.members[local];
    match shares.iter_mut().find(|(of, _)| *of == beam) {
        Some((_, sum)) => *sum += weight * own,
        None => shares.push((beam, weight * own)),
    }
    let (left, right) = solved.chord_bearings(local, stretch);
    for (bearing, part) in [(left, 1.0 - to_right), (right, to_right)] {
        if let Carrier::Beam { beam, lands } = solved.beam(local).bearings[bearing].on
            && part != 0.0
            && let Some(carrier) = solved.local(beam)
        {
            let at = lands.si();
            let on = stretch_at(solved.stretches(carrier), at);
            share(solved, carrier, at, on, weight * part, factors, shares);
        }
    }
}

/// Parts of an effect under given factors on the contributions: per action, what its present contributions bring.
pub fn parts_under<const FORCE: i8, const LENGTH: i8>(
    solved: &Solved,
    sets: &Sets,
    of: &Effect<0, 1>,
    factors: &[f64],
    values: &[(usize, f64)],
) -> Vec<Part<FORCE, LENGTH>> {
    let Some(combination) = sets.combination(of.combination) else { return Vec::new() };
    let sum = |action| -> f64 {
        let present = values.iter().filter(|(c, _)| {
            let contribution = &solved.contributions[*c];
            contribution.action == action && factors[*c] != 0.0
        });
        present.map(|(_, v)| v).sum()
    };
    let mut parts = Vec::new();
    let permanent: f64 = sum(crate::actions::Action::Permanent);
    let one = |action, value: f64, partial, reduction, leads| Part {
        action,
        value: crate::quantity::Q::from_si(value),
        partial,
        reduction,
        leads,
    };
    if permanent != 0.0 {
        parts.push(one(crate::actions::Action::Permanent, permanent, 1.0, 1.0, false));
    }
    for v in &combination.variable {
        let value = sum(v.action);
        if value != 0.0 && v.factor() != 0.0 {
            parts.push(one(v.action, value, v.partial, v.psi, v.leads));
        }
    }
    parts
}

/// Tilt of one span, worst arrangement of the characteristic combinations; movement from `settles` is in it.
pub fn tilt(solved: &Solved, local: usize, stretch: usize, sets: &Sets) -> Option<Tilt> {
    let (a, b) = solved.chord(local, stretch);
    let (left_bearing, right_bearing) = solved.chord_bearings(local, stretch);
    let (settled_a, settled_b) = (solved.settled_at(local, a), solved.settled_at(local, b));
    let mut values = vec![0.0; solved.contributions.len()];
    for (bearing, sign) in [(right_bearing, 1.0), (left_bearing, -1.0)] {
        for (c, value) in solved.bearing_values(local, bearing) {
            values[c] += sign * value;
        }
    }
    let values: Vec<(usize, f64)> = values.into_iter().enumerate().collect();
    let field = Field::scalar(&solved.contributions, values, settled_b - settled_a);
    let found: Found<0, 1> = Envelope::new(field).greatest_size(&[sets.characteristic()], (0.0, 0.0))?;
    let (left, right) = chord_movements(solved, local, stretch, &found.factors);
    let (left, right) = (left + settled_a, right + settled_b);
    let mut difference = found.effect;
    difference.at = Length::from_si(b);
    Some(Tilt {
        stretch,
        difference,
        span: Length::from_si(b - a),
        left: Length::from_si(left),
        right: Length::from_si(right),
    })
}

/// Largest own movements down the worst route to the ground, simply added: (sum, beams of the route), by local beam.
pub fn hand_rules(solved: &Solved, own: &[f64]) -> Vec<(f64, Vec<usize>)> {
    let mut rules: Vec<(f64, Vec<usize>)> = vec![(0.0, Vec::new()); solved.members.len()];
    for local in (0..solved.members.len()).rev() {
        let carriers = crate::analysis::component::carriers(solved.beam(local)).filter_map(|c| solved.local(c));
        let mut worst: Option<usize> = None;
        for carrier in carriers {
            if worst.is_none_or(|w| rules[carrier].0 > rules[w].0) {
                worst = Some(carrier);
            }
        }
        let mut route = vec![solved.members[local]];
        let mut sum = own[local];
        if let Some(worst) = worst {
            sum += rules[worst].0;
            route.extend(&rules[worst].1);
        }
        rules[local] = (sum, route);
    }
    rules
}
