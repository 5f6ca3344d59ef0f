//! Peaks along a beam: a grid in every stretch without a break, then closing in on each high place of the grid.

use super::building::Building;
use super::element::Side;

/// Intervals of the grid in a stretch.
const GRID: usize = 20;
/// Golden sections: the bracket shrinks by 0.618 each, so that two intervals of the grid become 1e-3 of one and a
/// parabola through what is left hits the top.
const SECTIONS: usize = 16;

/// Effects of each contribution at one place.
#[derive(Clone, Debug)]
pub struct Sample {
    pub x: f64,
    pub shear: Vec<f64>,
    pub moment: Vec<f64>,
    /// Absolute movement without settlement.
    pub movement: Vec<f64>,
    /// The straight line between the adjacent bearings, continued into overhangs.
    pub chord: Vec<f64>,
    /// Movement from settlement of walls.
    pub settled: f64,
}

impl Sample {
    pub fn own(&self, index: usize) -> f64 {
        self.movement[index] - self.chord[index]
    }
}

/// A stretch of a beam without any break inside: every effect is a polynomial in it.
pub struct Stretch {
    element: usize,
    samples: Vec<Sample>,
}

impl Building {
    fn sampled(&self, beam: usize) -> &[Stretch] {
        let sample = || self.breaks(beam).windows(2).map(|ends| self.stretch(beam, [ends[0], ends[1]])).collect();
        self.stretches[beam].get_or_init(sample)
    }

    fn stretch(&self, beam: usize, ends: [f64; 2]) -> Stretch {
        let middle = (ends[0] + ends[1]) / 2.0;
        let element = self.frame.nodes[beam].iter().rposition(|node| *node < middle).expect("a place on the beam");
        let sample = |step: usize| {
            let x = ends[0] + (ends[1] - ends[0]) * step as f64 / GRID as f64;
            let side = if step == GRID { Side::Before } else { Side::Beyond };
            self.sample(beam, element, if step == GRID { ends[1] } else { x }, side)
        };
        Stretch { element, samples: (0..=GRID).map(sample).collect() }
    }

    /// The greatest value of an effect between two places of a beam, and where.
    pub fn peak(&self, beam: usize, from: f64, to: f64, effect: impl Fn(&Sample) -> f64) -> (f64, f64) {
        let mut whole: Vec<&Stretch> = Vec::new();
        let mut ends = Vec::new();
        for stretch in self.sampled(beam) {
            let (left, right) = (stretch.samples[0].x, stretch.samples[GRID].x);
            if left >= from - 1e-9 && right <= to + 1e-9 {
                whole.push(stretch);
            } else if right.min(to) - left.max(from) > 1e-9 {
                ends.push([left.max(from), right.min(to)]);
            }
        }
        let cut: Vec<Stretch> = ends.into_iter().map(|ends| self.stretch(beam, ends)).collect();
        let mut grids: Vec<(&Stretch, Vec<f64>)> = Vec::new();
        let mut best = (f64::NEG_INFINITY, from);
        let mut scale = 0.0_f64;
        for stretch in whole.into_iter().chain(&cut) {
            let values: Vec<f64> = stretch.samples.iter().map(&effect).collect();
            for (value, sample) in values.iter().zip(&stretch.samples) {
                scale = scale.max(value.abs());
                if *value > best.0 {
                    best = (*value, sample.x);
                }
            }
            grids.push((stretch, values));
        }
        // Between two places of the grid an effect rises above both by no more than a fraction of its scale.
        let worth_a_look = best.0 - 0.05 * scale;
        for (stretch, values) in grids {
            for middle in 1..GRID {
                let high = values[middle] >= values[middle - 1] && values[middle] >= values[middle + 1];
                if high && values[middle] >= worth_a_look {
                    let ends = [stretch.samples[middle - 1].x, stretch.samples[middle + 1].x];
                    let found = self.close_in(beam, stretch.element, ends, &effect);
                    if found.0 > best.0 {
                        best = found;
                    }
                }
            }
            for (end, inner) in [(0, 1), (GRID, GRID - 1)] {
                if values[end] >= worth_a_look {
                    let (a, b) = (stretch.samples[end].x, stretch.samples[inner].x);
                    let found = self.close_in(beam, stretch.element, [a.min(b), a.max(b)], &effect);
                    if found.0 > best.0 {
                        best = found;
                    }
                }
            }
        }
        best
    }

    fn close_in(
        &self,
        beam: usize,
        element: usize,
        ends: [f64; 2],
        effect: &impl Fn(&Sample) -> f64,
    ) -> (f64, f64) {
        let golden = (5.0_f64.sqrt() - 1.0) / 2.0;
        let value = |x: f64| effect(&self.sample(beam, element, x, Side::Before));
        let [mut a, mut b] = ends;
        let (mut c, mut d) = (b - golden * (b - a), a + golden * (b - a));
        let (mut at_c, mut at_d) = (value(c), value(d));
        for _ in 0..SECTIONS {
            if at_c >= at_d {
                (b, d, at_d) = (d, c, at_c);
                c = b - golden * (b - a);
                at_c = value(c);
            } else {
                (a, c, at_c) = (c, d, at_d);
                d = a + golden * (b - a);
                at_d = value(d);
            }
        }
        let golden_best = if at_c >= at_d { (at_c, c) } else { (at_d, d) };
        let (middle, half) = ((a + b) / 2.0, (b - a) / 2.0);
        let [left, top, right] = [value(a), value(middle), value(b)];
        let bend = left - 2.0 * top + right;
        if bend < 0.0 {
            let vertex = (middle - half * (right - left) / (2.0 * bend)).clamp(a, b);
            let at_vertex = value(vertex);
            if at_vertex >= golden_best.0 - 1e-13 * golden_best.0.abs() {
                return (at_vertex, vertex);
            }
        }
        golden_best
    }

    /// An effect at any place of a beam, the greater of what both sides of a jump give.
    pub fn at_place(&self, beam: usize, x: f64, effect: impl Fn(&Sample) -> f64) -> f64 {
        self.samples_at(beam, x).iter().map(&effect).fold(f64::NEG_INFINITY, f64::max)
    }

    /// The effects at a place; at a node seen from both sides, and within a rounding of a break at the break too.
    pub fn samples_at(&self, beam: usize, x: f64) -> Vec<Sample> {
        let nodes = &self.frame.nodes[beam];
        let mut samples = Vec::new();
        for element in 0..nodes.len() - 1 {
            if nodes[element] - 1e-9 <= x && x <= nodes[element + 1] + 1e-9 {
                let x = x.clamp(nodes[element], nodes[element + 1]);
                samples.extend([Side::Before, Side::Beyond].map(|side| self.sample(beam, element, x, side)));
            }
        }
        samples
    }

    /// The greatest value on the grid alone: enough for a scale.
    pub fn greatest_on_grid(&self, beam: usize, effect: impl Fn(&Sample) -> f64) -> f64 {
        self.sampled(beam).iter().flat_map(|s| &s.samples).map(effect).fold(0.0, f64::max)
    }
}
