//! Where bending with shear is worst along a beam.

use super::Sets;
use super::forces::ForceFields;

/// The place where the moment is the greatest share of the resistance that shear leaves, among the places where the
/// shear reduces it; none where it does so nowhere. `resistance` is the reduced resistance for a shear (both SI);
/// `from` is the shear above which it is reduced.
///
/// Between the places where an envelope changes its polynomial the ratio is smooth: it is looked at in 32 steps, and
/// the worst of them narrowed by golden sections.
pub fn worst_place(
    fields: &ForceFields,
    sets: &Sets,
    from: f64,
    resistance: impl Fn(f64) -> f64,
) -> Option<(f64, f64)> {
    let strength = [sets.strength()];
    let mut places = fields.moment.places();
    places.extend(fields.shear.places());
    places.sort_by(f64::total_cmp);
    places.dedup();
    let ratio = |x: f64| {
        let shear = fields.shear.size_at(&strength, x);
        if shear <= from {
            return 0.0;
        }
        let (moment, left) = (fields.moment.size_at(&strength, x), resistance(shear));
        // Shear above its own resistance leaves nothing of the web; the check itself then says so.
        if left > 0.0 { moment / left } else { f64::MAX }
    };
    let mut best: Option<(f64, f64)> = None;
    let mut take = |x: f64, value: f64| {
        if value > best.map_or(0.0, |b| b.1) {
            best = Some((x, value));
        }
    };
    for pair in places.windows(2) {
        let (a, b) = (pair[0], pair[1]);
        let highest = (0..=4).map(|k| fields.shear.size_at(&strength, a + (b - a) * f64::from(k) / 4.0));
        if highest.fold(0.0, f64::max) <= from {
            continue;
        }
        let steps: Vec<f64> = (0..=32).map(|k| a + (b - a) * f64::from(k) / 32.0).collect();
        let values: Vec<f64> = steps.iter().map(|x| ratio(*x)).collect();
        let worst = (0..values.len()).fold(0, |w, k| if values[k] > values[w] { k } else { w });
        take(steps[worst], values[worst]);
        let (x, value) = golden(&ratio, steps[worst.saturating_sub(1)], steps[(worst + 1).min(32)]);
        take(x, value);
    }
    best
}

/// The greatest value between two places, where there is one peak.
fn golden(f: &impl Fn(f64) -> f64, mut a: f64, mut b: f64) -> (f64, f64) {
    let inverse = 0.618_033_988_749_894_9;
    let (mut left, mut right) = (b - inverse * (b - a), a + inverse * (b - a));
    let (mut at_left, mut at_right) = (f(left), f(right));
    for _ in 0..60 {
        if at_left >= at_right {
            b = right;
            (right, at_right) = (left, at_left);
            left = b - inverse * (b - a);
            at_left = f(left);
        } else {
            a = left;
            (left, at_left) = (right, at_right);
            right = a + inverse * (b - a);
            at_right = f(right);
        }
    }
    if at_left >= at_right { (left, at_left) } else { (right, at_right) }
}
