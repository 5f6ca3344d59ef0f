//! The second moment of area that the movements of a continuous beam ask for, by solving again with others.

use super::movements::in_stretch;
use super::{MovementFields, Sets};
use crate::analysis::solved::Solved;
use crate::analysis::system::Variant;
use crate::fault::Fault;
use crate::limits::{Movement, tightest};
use crate::quantity::{Length, SecondMoment};
use crate::results::{Stretch, StretchKind};

/// How closely a utilisation of 1 is met.
const TOLERANCE: f64 = 1e-12;
/// Second moments looked at, as multiples of the one in hand.
const LEAST: f64 = 1e-12;
const GREATEST: f64 = 1e6;

/// The length that a movement may reach in a stretch; none where nothing limits it.
pub fn allowed(solved: &Solved, local: usize, movement: Movement, stretch: usize) -> Option<Length> {
    let stretches = solved.stretches(local);
    let s = stretches[stretch];
    let limit = solved.beam(local).limits.of(movement)?;
    let own = tightest(&limit.bounds, s.span_for_limits())?;
    match (s.kind, movement) {
        (StretchKind::SeatEnd, _) => None,
        (StretchKind::Overhang, Movement::Stacked) => {
            let beside = beside(stretches, stretch)?;
            let other = tightest(&limit.bounds, beside.span_for_limits())?;
            Some(Length::from_si(own.si().max(other.si())))
        }
        _ => Some(own),
    }
}

/// The span next to an overhang.
pub fn beside(stretches: &[Stretch], overhang: usize) -> Option<Stretch> {
    let neighbour = if overhang == 0 { 1 } else { overhang - 1 };
    stretches.get(neighbour).copied()
}

/// The greatest share of its limit that a movement takes over the beam; 0 without a limit.
fn utilisation(solved: &Solved, local: usize, movement: Movement, sets: &Sets) -> f64 {
    let fields = MovementFields::new(solved, local);
    let mut worst = 0.0f64;
    for (n, s) in solved.stretches(local).iter().enumerate() {
        let Some(allowed) = allowed(solved, local, movement, n) else { continue };
        let found = match movement {
            Movement::Total => in_stretch(&fields.own, &[sets.characteristic()], s),
            Movement::After => in_stretch(&fields.after, &[sets.characteristic()], s),
            Movement::Variable => in_stretch(&fields.own, &[sets.variable()], s),
            Movement::Stacked => in_stretch(&fields.stacked, &[sets.characteristic()], s),
            Movement::Tilt => None,
        };
        let value = found.map_or(0.0, |f| match s.kind {
            StretchKind::Span => f.size(),
            StretchKind::Overhang | StretchKind::SeatEnd => f.effect.value.si(),
        });
        worst = worst.max(value / allowed.si());
    }
    worst
}

/// The second moment of area with which a movement of a continuous beam just keeps its limit; none where no beam,
/// however stiff, keeps it. `now` is the utilisation with the one in hand.
///
/// # Errors
/// Those of solving again.
pub fn resolved(
    solved: &Solved,
    local: usize,
    movement: Movement,
    now: f64,
    sets: &Sets,
) -> Result<Option<SecondMoment>, Fault> {
    let provided = solved.beam(local).section.i_y.si();
    let at = |factor: f64| -> Result<f64, Fault> {
        let again = solved.variant(Variant { scaled: Some((local, factor)), ..Variant::default() })?;
        Ok(utilisation(&again, local, movement, sets))
    };
    if now == 0.0 {
        return Ok(Some(SecondMoment::from_si(0.0)));
    }
    // A bracket: from here towards the side on which the limit is crossed, in growing steps.
    let (mut low, mut high) = ((1.0, now), (1.0, now));
    let mut step = now;
    if now > 1.0 {
        while high.1 > 1.0 {
            if high.0 >= GREATEST {
                return Ok(None);
            }
            low = high;
            let next = (high.0 * step.max(1.05)).min(GREATEST);
            high = (next, at(next)?);
            step *= step.max(1.05);
        }
    } else {
        while low.1 < 1.0 {
            if low.0 <= LEAST {
                return Ok(Some(SecondMoment::from_si(LEAST * provided)));
            }
            high = low;
            let next = (low.0 * step.min(0.95)).max(LEAST);
            low = (next, at(next)?);
            step *= step.min(0.95);
        }
    }
    // Movement times stiffness is nearly constant: the secant of 1 / utilisation, kept inside the bracket.
    for _ in 0..60 {
        if (high.1 - 1.0).abs() <= TOLERANCE {
            return Ok(Some(SecondMoment::from_si(high.0 * provided)));
        }
        if (low.1 - 1.0).abs() <= TOLERANCE {
            return Ok(Some(SecondMoment::from_si(low.0 * provided)));
        }
        if high.0 - low.0 <= 1e-14 * high.0 {
            break;
        }
        let (u, v) = (1.0 / low.1, 1.0 / high.1);
        let mut next = low.0 + (high.0 - low.0) * ((1.0 - u) / (v - u));
        let inside = next > low.0 && next < high.0;
        if !inside {
            next = 0.5 * (low.0 + high.0);
        }
        let value = at(next)?;
        if value > 1.0 {
            low = (next, value);
        } else {
            high = (next, value);
        }
        // Where the secant keeps one end of the bracket, a step beyond it brings the other end in.
        let width = high.0 - low.0;
        let over = if value > 1.0 { next + 0.02 * width } else { next - 0.02 * width };
        if inside && width > 1e-9 * high.0 && (value - 1.0).abs() > TOLERANCE {
            let value = at(over)?;
            if value > 1.0 {
                low = (over.max(low.0), value);
            } else {
                high = (over.min(high.0), value);
            }
        }
    }
    Ok(Some(SecondMoment::from_si(high.0 * provided)))
}
