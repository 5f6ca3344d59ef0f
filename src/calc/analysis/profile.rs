//! What one load does to one beam: bending moment and movement, exact on every piece between breaks.

use crate::analysis::loads::Shape;
use crate::analysis::polynomial::{Poly, ZERO, evaluate};

/// Elastic properties of one beam, SI.
#[derive(Clone, Copy, Debug)]
pub struct Elastic {
    /// E I, N m2.
    pub bending: f64,
    /// 1 / (G A_v), 1/N; 0 where shear deformation is left out.
    pub shear_flexibility: f64,
}

/// Forces on a beam, downward positive, and at most one distributed load.
#[derive(Clone, Debug, Default)]
pub struct Forces {
    pub points: Vec<(f64, f64)>,
    pub line: Option<Line>,
}

/// Straight-sided line load; `start` and `end` in N/m.
#[derive(Clone, Copy, Debug)]
pub struct Line {
    pub from: f64,
    pub to: f64,
    pub start: f64,
    pub end: f64,
}

impl Forces {
    pub fn of(shape: &Shape) -> Forces {
        match *shape {
            Shape::Point { at } => Forces { points: vec![(at, 1.0)], line: None },
            Shape::Line { from, to, start, end } => {
                Forces { points: Vec::new(), line: Some(Line { from, to, start, end }) }
            }
        }
    }

    pub fn is_empty(&self) -> bool {
        self.points.is_empty() && self.line.is_none()
    }

    /// Sum of the forces and of their moments about `x`: clockwise positive for a force on the right of it.
    pub fn resultant(&self, x: f64) -> (f64, f64) {
        let mut force = 0.0;
        let mut moment = 0.0;
        for (at, p) in &self.points {
            force += p;
            moment += p * (at - x);
        }
        if let Some(Line { from, to, start, end }) = self.line {
            let length = to - from;
            let total = 0.5 * (start + end) * length;
            force += total;
            // Rectangle of `start` and triangle of the rest, each at its own centroid.
            moment += start * length * (from + 0.5 * length - x);
            moment += 0.5 * (end - start) * length * (from + length * (2.0 / 3.0) - x);
        }
        (force, moment)
    }
}

/// Moment by pieces: on piece k, between `breaks[k]` and `breaks[k + 1]`, a cubic in the distance from its start.
/// Sagging positive, all forces (reactions included) downward positive; both ends are free.
pub fn moments(breaks: &[f64], forces: &Forces) -> Vec<Poly> {
    let mut shear = 0.0;
    let mut moment = 0.0;
    let mut pieces = Vec::with_capacity(breaks.len().saturating_sub(1));
    for pair in breaks.windows(2) {
        let (a, b) = (pair[0], pair[1]);
        for (_, p) in forces.points.iter().filter(|(at, _)| *at == a) {
            shear -= p;
        }
        let (mut q0, mut q1) = (0.0, 0.0);
        if let Some(line) = forces.line
            && line.from <= a
            && b <= line.to
        {
            q1 = (line.end - line.start) / (line.to - line.from);
            q0 = line.start + q1 * (a - line.from);
        }
        let piece = [moment, shear, -0.5 * q0, -q1 / 6.0, 0.0, 0.0];
        let h = b - a;
        moment = evaluate(&piece, h);
        shear -= q0 * h + 0.5 * q1 * h * h;
        pieces.push(piece);
    }
    pieces
}

/// Movement by pieces caused by bending (and shear, if it is looked at), with nothing at the two places of `zero`.
pub fn elastic_curve(breaks: &[f64], moments: &[Poly], elastic: Elastic, zero: (f64, f64)) -> Vec<Poly> {
    let mut slope = 0.0;
    let mut movement = 0.0;
    let mut pieces: Vec<Poly> = Vec::with_capacity(moments.len());
    for (m, pair) in moments.iter().zip(breaks.windows(2)) {
        let h = pair[1] - pair[0];
        let c = -1.0 / elastic.bending;
        let w: Poly = [movement, slope, c * m[0] / 2.0, c * m[1] / 6.0, c * m[2] / 12.0, c * m[3] / 20.0];
        let next = evaluate(&w, h);
        slope += c * (((m[3] / 4.0 * h + m[2] / 3.0) * h + m[1] / 2.0) * h + m[0]) * h;
        movement = next;
        pieces.push(w);
    }
    if elastic.shear_flexibility != 0.0 {
        // V = dM/dx, so the movement of shear is M / (G A_v) and a straight line.
        for (w, m) in pieces.iter_mut().zip(moments) {
            for (w, m) in w.iter_mut().zip(m) {
                *w += elastic.shear_flexibility * m;
            }
        }
    }
    let (at_a, at_b) = (value_at(breaks, &pieces, zero.0), value_at(breaks, &pieces, zero.1));
    let tilt = (at_b - at_a) / (zero.1 - zero.0);
    add_line(breaks, &mut pieces, zero.0, -at_a, -tilt);
    pieces
}

/// Adds to every piece the straight line that has the value `value` at `x` and the slope `slope`.
pub fn add_line(breaks: &[f64], pieces: &mut [Poly], x: f64, value: f64, slope: f64) {
    for (piece, start) in pieces.iter_mut().zip(breaks) {
        piece[0] += value + slope * (start - x);
        piece[1] += slope;
    }
}

/// The piece that holds `x`; at a break the one that ends there, except at the first.
pub fn piece_at(breaks: &[f64], x: f64) -> usize {
    let after = breaks.partition_point(|b| *b < x);
    after.saturating_sub(1).min(breaks.len().saturating_sub(2))
}

/// Value of a piecewise curve that does not jump.
pub fn value_at(breaks: &[f64], pieces: &[Poly], x: f64) -> f64 {
    let k = piece_at(breaks, x);
    pieces.get(k).map_or(0.0, |p| evaluate(p, x - breaks[k]))
}

/// factor × pieces added to `sum`, which grows to their number.
pub fn accumulate(sum: &mut Vec<Poly>, factor: f64, pieces: &[Poly]) {
    if sum.len() < pieces.len() {
        sum.resize(pieces.len(), ZERO);
    }
    for (s, p) in sum.iter_mut().zip(pieces) {
        super::polynomial::accumulate(s, factor, p);
    }
}
