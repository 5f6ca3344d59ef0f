//! Beams with exact curves, made by integrating their loads: a road to diagrams without calc.

use sagledger_calc::results::{Curve, Piece};

use super::super::diagrams::{Band, Diagrams, PointForce};

/// A small generator with a fixed seed (Steele, Lea and Flood's SplitMix64).
pub struct Random(pub u64);

impl Random {
    pub fn next(&mut self) -> u64 {
        self.0 = self.0.wrapping_add(0x9e37_79b9_7f4a_7c15);
        let mut z = self.0;
        z = (z ^ (z >> 30)).wrapping_mul(0xbf58_476d_1ce4_e5b9);
        z = (z ^ (z >> 27)).wrapping_mul(0x94d0_49bb_1331_11eb);
        z ^ (z >> 31)
    }

    /// Between 0 and 1.
    pub fn share(&mut self) -> f64 {
        (self.next() >> 11) as f64 / (1u64 << 53) as f64
    }

    pub fn between(&mut self, low: f64, high: f64) -> f64 {
        low + (high - low) * self.share()
    }

    /// From 0 to `count` - 1.
    pub fn below(&mut self, count: usize) -> usize {
        (self.next() % count as u64) as usize
    }
}

/// What a test beam is made of; N, m, N/m.
#[derive(Clone, Default)]
pub struct Made {
    pub length: f64,
    pub bearings: Vec<f64>,
    /// Share of the whole load that each inner bearing takes.
    pub inner_share: f64,
    pub bands: Vec<Band>,
    pub forces: Vec<PointForce>,
    pub stiffness: f64,
    /// Movements of the outer bearings, m.
    pub ends: (f64, f64),
}

/// The integral of a polynomial that starts at `start`.
fn integral(c: &[f64; 6], start: f64) -> [f64; 6] {
    let mut out = [start, 0.0, 0.0, 0.0, 0.0, 0.0];
    for n in 0..5 {
        out[n + 1] = c[n] / (n as f64 + 1.0);
    }
    out
}

fn value(c: &[f64; 6], x: f64) -> f64 {
    c.iter().rev().fold(0.0, |sum, c| sum * x + c)
}

impl Made {
    pub fn diagrams(&self, mark: &str) -> Diagrams {
        let mut forces: Vec<(f64, f64)> = self.forces.iter().map(|f| (f.at, f.force)).collect();
        let total = |b: &Band| 0.5 * (b.intensity.0 + b.intensity.1) * (b.to - b.from);
        let centre = |b: &Band| {
            let (p, q) = b.intensity;
            b.from + (b.to - b.from) * (p + 2.0 * q) / (3.0 * (p + q))
        };
        let load: f64 = self.bands.iter().map(total).sum::<f64>() + forces.iter().map(|f| f.1).sum::<f64>();
        let (first, last) = (self.bearings[0], *self.bearings.last().unwrap());
        for at in &self.bearings[1..self.bearings.len() - 1] {
            forces.push((*at, -self.inner_share * load));
        }
        let moment: f64 = self.bands.iter().map(|b| total(b) * (centre(b) - first)).sum::<f64>()
            + forces.iter().map(|f| f.1 * (f.0 - first)).sum::<f64>();
        let right = moment / (last - first);
        let left = self.bands.iter().map(total).sum::<f64>() + forces.iter().map(|f| f.1).sum::<f64>() - right;
        forces.extend([(first, -left), (last, -right)]);

        let mut breaks: Vec<f64> = vec![0.0, self.length];
        breaks.extend(forces.iter().map(|f| f.0).chain(self.bands.iter().flat_map(|b| [b.from, b.to])));
        breaks.sort_by(f64::total_cmp);
        breaks.dedup();
        let mut curves: [Vec<Piece>; 3] = [vec![], vec![], vec![]];
        let (mut v, mut m, mut slope, mut sag) = (0.0, 0.0, 0.0, 0.0);
        for pair in breaks.windows(2) {
            let (from, to) = (pair[0], pair[1]);
            v -= forces.iter().filter(|f| f.0 == from).map(|f| f.1).sum::<f64>();
            let (mut even, mut rise) = (0.0, 0.0);
            for b in self.bands.iter().filter(|b| b.from <= from && to <= b.to) {
                let k = (b.intensity.1 - b.intensity.0) / (b.to - b.from);
                even += b.intensity.0 + k * (from - b.from);
                rise += k;
            }
            let shear = integral(&[-even, -rise, 0.0, 0.0, 0.0, 0.0], v);
            let moment = integral(&shear, m);
            let turning = integral(&moment.map(|c| -c / self.stiffness), slope);
            let sagging = integral(&turning, sag);
            for (list, coefficients) in curves.iter_mut().zip([shear, moment, sagging]) {
                list.push(Piece { from, to, coefficients });
            }
            let h = to - from;
            (v, m, slope, sag) = (value(&shear, h), value(&moment, h), value(&turning, h), value(&sagging, h));
        }
        let [shear, moment, sagging] = curves.map(|pieces| Curve { pieces });
        let own = straightened(&sagging, (first, 0.0), (last, 0.0));
        let stacked = straightened(&sagging, (first, self.ends.0), (last, self.ends.1));
        Diagrams {
            mark: mark.to_string(),
            length: self.length,
            from: "from the west wall".to_string(),
            bearings: self.bearings.clone(),
            strength: "6.10, imposed A leading, imposed H with it".to_string(),
            characteristic: "characteristic, imposed A leading, imposed H with it".to_string(),
            bands: self.bands.clone(),
            forces: self.forces.clone(),
            shear,
            moment,
            own,
            stacked,
        }
    }
}

/// The curve with a straight line added so that it passes through two points.
fn straightened(curve: &Curve, a: (f64, f64), b: (f64, f64)) -> Curve {
    let at = |x: f64| super::super::shape::value_at(curve, x);
    let (da, db) = (a.1 - at(a.0), b.1 - at(b.0));
    let slope = (db - da) / (b.0 - a.0);
    let pieces = curve.pieces.iter().map(|p| {
        let mut piece = *p;
        piece.coefficients[0] += da + slope * (p.from - a.0);
        piece.coefficients[1] += slope;
        piece
    });
    Curve { pieces: pieces.collect() }
}

pub fn band(what: &str, from: f64, to: f64, intensity: (f64, f64)) -> Band {
    Band { what: what.to_string(), from, to, intensity }
}

pub fn force(source: &str, at: f64, force: f64) -> PointForce {
    PointForce { at, force, source: source.to_string() }
}
