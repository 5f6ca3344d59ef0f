//! Drawing calc's curves exactly: values, peaks and cubic Béziers of piecewise polynomials.

use sagledger_calc::results::{Curve, Piece};

use super::scene::{Path, Point, Step, point};

/// How far a drawn curve may lie from the exact one, in mm on paper: a fifth of the finest line.
const TOLERANCE: f64 = 0.004;

/// From a place along the beam (m) and a value (SI) to paper (mm).
#[derive(Clone, Copy, Debug)]
pub struct Mapping {
    pub x0: f64,
    pub per_metre: f64,
    pub y0: f64,
    /// mm on paper downward for one SI unit.
    pub per_unit: f64,
}

impl Mapping {
    pub fn x(&self, at: f64) -> f64 {
        self.x0 + self.per_metre * at
    }

    pub fn y(&self, value: f64) -> f64 {
        self.y0 + self.per_unit * value
    }

    pub fn point(&self, at: f64, value: f64) -> Point {
        point(self.x(at), self.y(value))
    }
}

fn value(c: &[f64], x: f64) -> f64 {
    c.iter().rev().fold(0.0, |sum, c| sum * x + c)
}

fn derivative(c: &[f64]) -> Vec<f64> {
    c.iter().enumerate().skip(1).map(|(n, c)| n as f64 * c).collect()
}

fn piece_value(piece: &Piece, at: f64) -> f64 {
    value(&piece.coefficients, at - piece.from)
}

/// Value at a place; at a step the one to the right, except at the very end.
pub fn value_at(curve: &Curve, at: f64) -> f64 {
    let piece = curve.pieces.iter().find(|p| at < p.to).or(curve.pieces.last());
    piece.map_or(0.0, |piece| piece_value(piece, at))
}

/// Value just left of a place.
pub fn value_before(curve: &Curve, at: f64) -> f64 {
    let piece = curve.pieces.iter().rev().find(|p| at > p.from).or(curve.pieces.first());
    piece.map_or(0.0, |piece| piece_value(piece, at))
}

/// Roots in the open interval from 0 to `length`, by way of the roots of the derivative, between which the
/// polynomial is monotone.
fn roots(c: &[f64], length: f64) -> Vec<f64> {
    let Some(degree) = c.iter().rposition(|c| *c != 0.0) else { return vec![] };
    if degree == 0 {
        return vec![];
    }
    let mut ends = vec![0.0];
    ends.extend(roots(&derivative(&c[..=degree]), length));
    ends.push(length);
    let mut found = Vec::new();
    for pair in ends.windows(2) {
        let (mut low, mut high) = (pair[0], pair[1]);
        let (at_low, at_high) = (value(c, low), value(c, high));
        if at_low * at_high >= 0.0 {
            if at_high == 0.0 && high < length {
                found.push(high);
            }
            continue;
        }
        for _ in 0..100 {
            let middle = 0.5 * (low + high);
            if (value(c, middle) > 0.0) == (at_low > 0.0) { low = middle } else { high = middle }
        }
        found.push(0.5 * (low + high));
    }
    found.dedup();
    found
}

/// A turning point of a curve: place and value.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Peak {
    pub at: f64,
    pub value: f64,
}

/// The local greatest and least values of a continuous curve, ends included, in order of place. Of a level stretch
/// the first point stands for all.
pub fn peaks(curve: &Curve) -> Vec<Peak> {
    let mut points: Vec<Peak> = Vec::new();
    for piece in &curve.pieces {
        let length = piece.to - piece.from;
        points.push(Peak { at: piece.from, value: piece_value(piece, piece.from) });
        for root in roots(&derivative(&piece.coefficients), length) {
            points.push(Peak { at: piece.from + root, value: piece_value(piece, piece.from + root) });
        }
        points.push(Peak { at: piece.to, value: piece_value(piece, piece.to) });
    }
    let most = points.iter().fold(0.0_f64, |most, p| most.max(p.value.abs()));
    points.dedup_by(|next, kept| (next.value - kept.value).abs() <= 1e-12 * most);
    let mut found = Vec::new();
    for (n, here) in points.iter().enumerate() {
        let before = n.checked_sub(1).map(|n| points[n].value);
        let after = points.get(n + 1).map(|p| p.value);
        let rises = before.is_none_or(|b| b < here.value) && after.is_none_or(|a| a < here.value);
        let falls = before.is_none_or(|b| b > here.value) && after.is_none_or(|a| a > here.value);
        if rises || falls {
            found.push(*here);
        }
    }
    found
}

/// The greatest and the least value.
pub fn range(curve: &Curve) -> (f64, f64) {
    let ends = curve.pieces.iter().flat_map(|piece| {
        let mut values = vec![piece_value(piece, piece.from), piece_value(piece, piece.to)];
        let turning = roots(&derivative(&piece.coefficients), piece.to - piece.from);
        values.extend(turning.iter().map(|x| value(&piece.coefficients, *x)));
        values
    });
    ends.fold((0.0, 0.0), |(low, high), v| (f64::min(low, v), f64::max(high, v)))
}

/// The curve on paper, in one stroke; a step of the curve becomes an upright line.
pub fn drawn(curve: &Curve, map: &Mapping) -> Option<Path> {
    let first = curve.pieces.first()?;
    let mut path = Path { start: map.point(first.from, piece_value(first, first.from)), steps: vec![] };
    let mut here = path.start;
    for piece in &curve.pieces {
        let start = map.point(piece.from, piece_value(piece, piece.from));
        if (start.x - here.x).abs() > 1e-6 || (start.y - here.y).abs() > 1e-6 {
            path.steps.push(Step::To(start));
        }
        path.steps.extend(piece_steps(piece, map));
        here = path.steps.last().map_or(start, Step::end);
    }
    Some(path)
}

/// Cubic Béziers through exact values and slopes at their ends: exact up to third degree; above it the piece is
/// cut until the remainder, at most |f''''| h⁴ / 384, is within the tolerance.
fn piece_steps(piece: &Piece, map: &Mapping) -> Vec<Step> {
    let c = &piece.coefficients;
    let length = piece.to - piece.from;
    let straight = c[2..].iter().all(|c| *c == 0.0);
    if straight {
        return vec![Step::To(map.point(piece.to, value(c, length)))];
    }
    let fourth = |x: f64| (24.0 * c[4] + 120.0 * c[5] * x).abs();
    let remainder = fourth(0.0).max(fourth(length)) * length.powi(4) / 384.0 * map.per_unit.abs();
    let parts = (remainder / TOLERANCE).sqrt().sqrt().ceil().clamp(1.0, 64.0) as usize;
    let slope = derivative(c);
    let mut steps = Vec::with_capacity(parts);
    for part in 0..parts {
        let a = length * part as f64 / parts as f64;
        let b = length * (part + 1) as f64 / parts as f64;
        let third = (b - a) / 3.0;
        let first = map.point(piece.from + a + third, value(c, a) + third * value(&slope, a));
        let second = map.point(piece.from + b - third, value(c, b) - third * value(&slope, b));
        steps.push(Step::Cubic(first, second, map.point(piece.from + b, value(c, b))));
    }
    steps
}

#[cfg(test)]
mod tests {
    use super::*;

    fn piece(from: f64, to: f64, coefficients: [f64; 6]) -> Piece {
        Piece { from, to, coefficients }
    }

    /// A simply supported span under w: M = w x (l − x) / 2, greatest w l² / 8 at l / 2 (closed form).
    #[test]
    fn peak_of_a_parabola() {
        let (w, l) = (3.0, 4.2);
        let curve = Curve { pieces: vec![piece(0.0, l, [0.0, w * l / 2.0, -w / 2.0, 0.0, 0.0, 0.0])] };
        let found = peaks(&curve);
        let top = found.iter().find(|p| p.value > 0.0).unwrap();
        assert!((top.at - l / 2.0).abs() < 1e-12 && (top.value - w * l * l / 8.0).abs() < 1e-12);
        assert_eq!(found.len(), 3);
    }

    /// (x − 1)(x − 2)(x − 3)(x − 4)(x − 5) expanded: five roots known beforehand.
    #[test]
    fn roots_of_a_quintic() {
        let c = [-120.0, 274.0, -225.0, 85.0, -15.0, 1.0];
        let found = roots(&c, 6.0);
        assert_eq!(found.len(), 5);
        for (n, root) in found.iter().enumerate() {
            assert!((root - (n as f64 + 1.0)).abs() < 1e-9);
        }
    }

    #[test]
    fn beziers_stay_within_a_fiftieth_of_a_millimetre() {
        // The fifth-degree line of a triangular load, on the scale of a sheet.
        let c = [0.0, 7.0e-3, 0.0, -1.0e-3, 1.0e-5, 1.7e-5];
        let curve = Curve { pieces: vec![piece(0.0, 4.0, c)] };
        let map = Mapping { x0: 4.0, per_metre: 28.0, y0: 10.0, per_unit: 2000.0 };
        let path = drawn(&curve, &map).unwrap();
        for p in path.flattened() {
            let at = (p.x - map.x0) / map.per_metre;
            let exact = map.y(value_at(&curve, at));
            assert!((p.y - exact).abs() < 0.02, "{} {exact}", p.y);
        }
    }

    #[test]
    fn a_step_has_two_values() {
        let curve =
            Curve { pieces: vec![piece(0.0, 1.0, [5.0, -1.0, 0.0, 0.0, 0.0, 0.0]), piece(1.0, 2.0, [-2.0; 6])] };
        assert_eq!(value_before(&curve, 1.0), 4.0);
        assert_eq!(value_at(&curve, 1.0), -2.0);
        assert_eq!(value_before(&curve, 0.0), 5.0);
    }
}
