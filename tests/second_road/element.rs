//! One beam element between two nodes, by integrating its governing equations once and for all.
//!
//! With the shear V0 and moment M0 at its start: M(x) = M0 + V0 x - m(x), where m is the load integrated twice;
//! the rotation is phi(x) = phi0 - (integral of M) / EI, the movement
//! w(x) = w0 + phi0 x - (double integral of M) / EI + (M(x) - M0) / GA, GA being infinite unless shear counts.
//! V0 and M0 follow from the movement and rotation that the nodes give at the far end. The stiffness of the element is
//! its answer to unit movements of the nodes.

/// A load inside the element, x from its start.
#[derive(Clone, Copy, Debug)]
pub enum Part {
    Line { from: f64, to: f64, start: f64, end: f64 },
    Point { at: f64, force: f64 },
}

/// Which side of a point load is looked at where one stands at the very place.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Side {
    Before,
    Beyond,
}

/// A place this close to a point load is the load's, m.
const SAME_PLACE: f64 = 2e-9;

#[derive(Clone, Copy, Debug)]
pub struct Element {
    pub length: f64,
    pub bending: f64,
    /// 1 / (G A_v), 0 where shear deformation is left out.
    pub shear_softness: f64,
}

/// State of an element under one load: what fixes its whole line.
#[derive(Clone, Debug, Default)]
pub struct Line {
    pub movement: f64,
    pub rotation: f64,
    pub shear: f64,
    pub moment: f64,
    pub parts: Vec<Part>,
}

/// The load integrated `order` times from the element's start to x.
pub fn load_integral(parts: &[Part], x: f64, side: Side, order: i32) -> f64 {
    // A bracket <x - a>^degree over degree factorial: each integration raises the degree by one.
    let bracket = |a: f64, degree: i32| {
        let mut value = if x > a { 1.0 } else { 0.0 };
        for n in 1..=degree {
            value *= (x - a) / f64::from(n);
        }
        value
    };
    let integral = |part: &Part| match *part {
        Part::Line { from, to, start, end } => {
            let slope = (end - start) / (to - from);
            let mut sum = start * bracket(from, order) - end * bracket(to, order);
            if slope != 0.0 {
                sum += slope * (bracket(from, order + 1) - bracket(to, order + 1));
            }
            sum
        }
        Part::Point { at, force } if order == 1 => {
            let passed = if (x - at).abs() <= SAME_PLACE { side == Side::Beyond } else { x > at };
            if passed { force } else { 0.0 }
        }
        Part::Point { at, force } => force * bracket(at, order - 1),
    };
    parts.iter().map(integral).sum()
}

impl Element {
    /// The line of an element whose nodes move and turn as given, under the loads inside it.
    pub fn line(&self, start: [f64; 2], end: [f64; 2], parts: Vec<Part>) -> Line {
        let Element { length, bending, shear_softness } = *self;
        let (m, m1, m2) = match parts.is_empty() {
            true => (0.0, 0.0, 0.0),
            false => {
                let integral = |order| load_integral(&parts, length, Side::Before, order);
                (integral(2), integral(3), integral(4))
            }
        };
        // M0 L + V0 L^2/2 = turn;  -(M0 L^2/2 + V0 L^3/6) + V0 L EI/GA = fall.
        let turn = bending * (start[1] - end[1]) + m1;
        let fall = bending * (end[0] - start[0] - start[1] * length) - m2 + bending * shear_softness * m;
        let (a, b) = (length, length * length / 2.0);
        let (c, d) = (-b, -b * length / 3.0 + length * bending * shear_softness);
        let determinant = a * d - b * c;
        let moment = (turn * d - b * fall) / determinant;
        let shear = (a * fall - c * turn) / determinant;
        Line { movement: start[0], rotation: start[1], shear, moment, parts }
    }

    /// Shear, moment and movement at x.
    pub fn at(&self, line: &Line, x: f64, side: Side) -> [f64; 3] {
        let (mut shear, mut moment) = (line.shear, line.moment + line.shear * x);
        let mut twice = x * x * (line.moment / 2.0 + line.shear * x / 6.0);
        if !line.parts.is_empty() {
            shear -= load_integral(&line.parts, x, side, 1);
            moment -= load_integral(&line.parts, x, side, 2);
            twice -= load_integral(&line.parts, x, side, 4);
        }
        let movement =
            line.movement + line.rotation * x - twice / self.bending + (moment - line.moment) * self.shear_softness;
        [shear, moment, movement]
    }

    /// Forces that the element puts on its nodes' freedoms [w, phi, w, phi] when they move: the resisting forces.
    pub fn forces(&self, line: &Line) -> [f64; 4] {
        let [shear, moment, _] = self.at(line, self.length, Side::Before);
        [-line.shear, line.moment, shear, -moment]
    }

    pub fn stiffness(&self) -> [[f64; 4]; 4] {
        [0, 1, 2, 3].map(|freedom| {
            let unit = |place: usize| if place == freedom { 1.0 } else { 0.0 };
            self.forces(&self.line([unit(0), unit(1)], [unit(2), unit(3)], Vec::new()))
        })
    }
}

/// Timoshenko and Gere: 12 EI/L^3, 6 EI/L^2, 4 EI/L, 2 EI/L without shear; with it divided by 1 + Phi,
/// Phi = 12 EI / (G A L^2), and (4 + Phi), (2 - Phi) on the rotations.
#[test]
fn stiffness_is_the_textbooks() {
    for shear_softness in [0.0, 1.0 / 70.0e6] {
        let element = Element { length: 3.2, bending: 8.0e6, shear_softness };
        let phi = 12.0 * element.bending * shear_softness / (3.2 * 3.2);
        let base = element.bending / (1.0 + phi);
        let stiffness = element.stiffness();
        let expected = [
            [12.0 / 3.2f64.powi(3), 6.0 / 3.2f64.powi(2), -12.0 / 3.2f64.powi(3), 6.0 / 3.2f64.powi(2)],
            [6.0 / 3.2f64.powi(2), (4.0 + phi) / 3.2, -6.0 / 3.2f64.powi(2), (2.0 - phi) / 3.2],
        ];
        for row in 0..2 {
            for column in 0..4 {
                let difference = stiffness[row][column] - base * expected[row][column];
                assert!(difference.abs() < 1e-12 * base, "{row} {column}: {difference}");
                assert!((stiffness[row][column] - stiffness[column][row]).abs() < 1e-12 * base);
            }
        }
    }
}

/// Handbooks: a span fixed at both ends: wL^2/12 under a uniform load, 11 and 5 wL^2/192 where it covers the first half,
/// Pab^2/L^2 and Pa^2b/L^2 under a point load, wL^2/30 and wL^2/20 under a triangle that rises from zero.
#[test]
fn fixed_end_moments_are_the_handbooks() {
    let element = Element { length: 4.0, bending: 1.0e6, shear_softness: 0.0 };
    let ends = |part: Part| {
        let line = element.line([0.0; 2], [0.0; 2], vec![part]);
        [line.moment, element.at(&line, 4.0, Side::Before)[1]]
    };
    for (part, expected) in [
        (Part::Line { from: 0.0, to: 4.0, start: 6.0, end: 6.0 }, [-8.0, -8.0]),
        (Part::Line { from: 0.0, to: 2.0, start: 6.0, end: 6.0 }, [-11.0 * 96.0 / 192.0, -5.0 * 96.0 / 192.0]),
        (Part::Point { at: 1.0, force: 8.0 }, [-8.0 * 9.0 / 16.0, -8.0 * 3.0 / 16.0]),
        (Part::Line { from: 0.0, to: 4.0, start: 0.0, end: 6.0 }, [-6.0 * 16.0 / 30.0, -6.0 * 16.0 / 20.0]),
    ] {
        let found = ends(part);
        for side in 0..2 {
            assert!((found[side] - expected[side]).abs() < 1e-12, "{part:?}: {found:?}");
        }
    }
}
