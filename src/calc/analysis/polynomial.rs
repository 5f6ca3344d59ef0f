//! Polynomials up to degree 5 on one piece of a beam, and their roots and extremes on it.

/// Coefficients, lowest power first.
pub type Poly = [f64; 6];

pub const ZERO: Poly = [0.0; 6];

pub fn evaluate(p: &Poly, t: f64) -> f64 {
    ((((p[5] * t + p[4]) * t + p[3]) * t + p[2]) * t + p[1]) * t + p[0]
}

pub fn derivative(p: &Poly) -> Poly {
    [p[1], 2.0 * p[2], 3.0 * p[3], 4.0 * p[4], 5.0 * p[5], 0.0]
}

/// sum += factor × p
pub fn accumulate(sum: &mut Poly, factor: f64, p: &Poly) {
    for (s, c) in sum.iter_mut().zip(p) {
        *s += factor * c;
    }
}

/// The same polynomial in a variable that starts at `by`: p(t + by).
pub fn shifted(p: &Poly, by: f64) -> Poly {
    let mut q = *p;
    for lowest in 0..5 {
        for k in (lowest..5).rev() {
            q[k] += by * q[k + 1];
        }
    }
    q
}

/// A bound of |p| on [0, length]: the sum of the sizes of its terms.
pub fn size(p: &Poly, length: f64) -> f64 {
    let mut power = 1.0;
    let mut sum = 0.0;
    for c in p {
        sum += c.abs() * power;
        power *= length;
    }
    sum
}

/// Coefficients in the Bernstein basis on [a, b]: their greatest is a bound from above of p there, their least one
/// from below.
fn bernstein(p: &Poly, a: f64, b: f64) -> Poly {
    let mut q = shifted(p, a);
    let mut scale = 1.0;
    for c in q.iter_mut() {
        *c *= scale;
        scale *= b - a;
    }
    const BINOMIAL: [[f64; 6]; 6] = [
        [1.0, 0.0, 0.0, 0.0, 0.0, 0.0],
        [1.0, 0.2, 0.0, 0.0, 0.0, 0.0],
        [1.0, 0.4, 0.1, 0.0, 0.0, 0.0],
        [1.0, 0.6, 0.3, 0.1, 0.0, 0.0],
        [1.0, 0.8, 0.6, 0.4, 0.2, 0.0],
        [1.0, 1.0, 1.0, 1.0, 1.0, 1.0],
    ];
    let mut bernstein = ZERO;
    for (out, row) in bernstein.iter_mut().zip(BINOMIAL) {
        *out = row.iter().zip(&q).map(|(weight, c)| weight * c).sum();
    }
    bernstein
}

/// A value that p does not exceed on [a, b].
pub fn upper_bound(p: &Poly, a: f64, b: f64) -> f64 {
    bernstein(p, a, b).into_iter().fold(f64::NEG_INFINITY, f64::max)
}

/// Whether p has no change of sign inside ]a, b[ for certain.
fn surely_one_sign(p: &Poly, a: f64, b: f64) -> bool {
    let b = bernstein(p, a, b);
    b.iter().all(|c| *c >= 0.0) || b.iter().all(|c| *c <= 0.0)
}

/// Places in ]a, b[ where p changes its sign, in order. Found between the places where its derivative changes sign,
/// so that none can be missed; each is as exact as p can be evaluated.
pub fn sign_changes(p: &Poly, a: f64, b: f64, roots: &mut Vec<f64>) {
    if a.partial_cmp(&b) != Some(std::cmp::Ordering::Less) || surely_one_sign(p, a, b) {
        return;
    }
    let slope = derivative(p);
    let mut turns = Vec::new();
    if slope.iter().skip(1).any(|c| *c != 0.0) {
        sign_changes(&slope, a, b, &mut turns);
    }
    let mut left = a;
    for right in turns.into_iter().chain([b]) {
        let (at_left, at_right) = (evaluate(p, left), evaluate(p, right));
        if at_left * at_right < 0.0 {
            roots.push(bisect(p, left, right, at_left));
        } else if at_right == 0.0 && right < b {
            roots.push(right);
        }
        left = right;
    }
}

/// The sign change between `left` and `right`, where p is monotonic.
fn bisect(p: &Poly, mut left: f64, mut right: f64, at_left: f64) -> f64 {
    let slope = derivative(p);
    let mut x = 0.5 * (left + right);
    for _ in 0..200 {
        let value = evaluate(p, x);
        if value == 0.0 {
            return x;
        }
        if value * at_left > 0.0 {
            left = x;
        } else {
            right = x;
        }
        let newton = x - value / evaluate(&slope, x);
        let inside = newton > left && newton < right;
        let next = if inside { newton } else { 0.5 * (left + right) };
        if next == x || right - left <= 4.0 * f64::EPSILON * right.abs() {
            return next;
        }
        // A Newton step that hardly narrows the bracket is followed by a bisection from the other side.
        x = if inside && (next - x).abs() > 0.5 * (right - left) { 0.5 * (left + right) } else { next };
    }
    x
}

/// The greatest value of p on [a, b] and where it is taken; the first place among equals.
pub fn greatest(p: &Poly, a: f64, b: f64) -> (f64, f64) {
    let mut best = (evaluate(p, a), a);
    let mut turns = Vec::new();
    sign_changes(&derivative(p), a, b, &mut turns);
    for t in turns.into_iter().chain([b]) {
        let value = evaluate(p, t);
        if value > best.0 {
            best = (value, t);
        }
    }
    best
}

#[cfg(test)]
mod tests {
    use super::*;

    /// Closed form: (t-1)(t-2)(t-3)(t-4)(t-4.5) has these sign changes and no other.
    #[test]
    fn finds_every_sign_change_of_a_quintic() {
        let mut p = [1.0, 0.0, 0.0, 0.0, 0.0, 0.0];
        let zeros = [1.0, 2.0, 3.0, 4.0, 4.5];
        for (degree, zero) in zeros.iter().enumerate() {
            let mut q = ZERO;
            for k in 0..=degree {
                q[k + 1] += p[k];
                q[k] -= zero * p[k];
            }
            p = q;
        }
        let mut roots = Vec::new();
        sign_changes(&p, 0.0, 5.0, &mut roots);
        assert_eq!(roots.len(), 5);
        for (root, zero) in roots.iter().zip(zeros) {
            assert!((root - zero).abs() < 1e-10, "{root} against {zero}");
        }
    }

    #[test]
    fn a_shift_moves_the_origin() {
        let p = [1.0, -2.0, 3.0, 0.5, -0.25, 0.125];
        let q = shifted(&p, 0.7);
        for t in [0.0, 0.3, 1.9] {
            assert!((evaluate(&q, t) - evaluate(&p, t + 0.7)).abs() < 1e-13);
        }
    }

    #[test]
    fn the_bound_holds_and_the_greatest_value_is_stationary_or_at_an_end() {
        let mut rng = fastrand::Rng::with_seed(7);
        for _ in 0..2000 {
            let p: Poly = std::array::from_fn(|_| rng.f64() * 2.0 - 1.0);
            let (a, b) = (rng.f64() - 0.5, 1.0 + rng.f64());
            let (value, at) = greatest(&p, a, b);
            assert!((a..=b).contains(&at));
            assert!(upper_bound(&p, a, b) >= value - 1e-12);
            for k in 0..=200 {
                let t = a + (b - a) * f64::from(k) / 200.0;
                assert!(evaluate(&p, t) <= value + 1e-12);
            }
        }
    }
}
