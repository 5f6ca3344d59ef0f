//! Rolled I sections from their dimensions. The properties are integrals over strips of the section; the roots are
//! integrated along their arc, so that nothing of the closed expressions for a fillet is used.

/// Name and h, b, tw, tf, r in mm. Source: section tables to EN 10365, from memory.
const DIMENSIONS: &[(&str, [f64; 5])] = &[
    ("127x76x13 UB", [127.0, 76.0, 4.0, 7.6, 7.6]),
    ("152x89x16 UB", [152.4, 88.7, 4.5, 7.7, 7.6]),
    ("178x102x19 UB", [177.8, 101.2, 4.8, 7.9, 7.6]),
    ("203x102x23 UB", [203.2, 101.8, 5.4, 9.3, 7.6]),
    ("203x133x25 UB", [203.2, 133.2, 5.7, 7.8, 7.6]),
    ("203x133x30 UB", [206.8, 133.9, 6.4, 9.6, 7.6]),
    ("254x102x22 UB", [254.0, 101.6, 5.7, 6.8, 7.6]),
    ("254x102x25 UB", [257.2, 101.9, 6.0, 8.4, 7.6]),
    ("254x102x28 UB", [260.4, 102.2, 6.3, 10.0, 7.6]),
    ("254x146x31 UB", [251.4, 146.1, 6.0, 8.6, 7.6]),
    ("254x146x37 UB", [256.0, 146.4, 6.3, 10.9, 7.6]),
    ("254x146x43 UB", [259.6, 147.3, 7.2, 12.7, 7.6]),
    ("305x102x25 UB", [305.1, 101.6, 5.8, 7.0, 7.6]),
    ("305x102x33 UB", [312.7, 102.4, 6.6, 10.8, 7.6]),
    ("305x127x48 UB", [311.0, 125.3, 9.0, 14.0, 8.9]),
    ("305x165x40 UB", [303.4, 165.0, 6.0, 10.2, 8.9]),
    ("305x165x46 UB", [306.6, 165.7, 6.7, 11.8, 8.9]),
    ("305x165x54 UB", [310.4, 166.9, 7.9, 13.7, 8.9]),
    ("356x171x45 UB", [351.4, 171.1, 7.0, 9.7, 10.2]),
    ("356x171x57 UB", [358.0, 172.2, 8.1, 13.0, 10.2]),
    ("406x178x60 UB", [406.4, 177.9, 7.9, 12.8, 10.2]),
    ("406x178x74 UB", [412.8, 179.5, 9.5, 16.0, 10.2]),
    ("457x191x67 UB", [453.4, 189.9, 8.5, 12.7, 10.2]),
    ("457x191x82 UB", [460.0, 191.3, 9.9, 16.0, 10.2]),
    ("533x210x92 UB", [533.1, 209.3, 10.1, 15.6, 12.7]),
    ("610x229x101 UB", [602.6, 227.6, 10.5, 14.8, 12.7]),
    ("152x152x23 UC", [152.4, 152.2, 5.8, 6.8, 7.6]),
    ("152x152x30 UC", [157.6, 152.9, 6.5, 9.4, 7.6]),
    ("152x152x37 UC", [161.8, 154.4, 8.0, 11.5, 7.6]),
    ("203x203x46 UC", [203.2, 203.6, 7.2, 11.0, 10.2]),
    ("203x203x52 UC", [206.2, 204.3, 7.9, 12.5, 10.2]),
    ("203x203x60 UC", [209.6, 205.8, 9.4, 14.2, 10.2]),
    ("254x254x73 UC", [254.1, 254.6, 8.6, 14.2, 12.7]),
];

/// h, b, tw, tf, r in mm of a section by its name.
pub fn dimensions(name: &str) -> [f64; 5] {
    let plain = |name: &str| name.to_lowercase().replace('×', "x").replace(' ', "");
    let wanted = plain(name);
    let (_, dimensions) = DIMENSIONS
        .iter()
        .find(|(known, _)| plain(known) == wanted)
        .unwrap_or_else(|| panic!("the second road has no section {name:?}"));
    *dimensions
}

/// What the statics need of a section, SI.
#[derive(Clone, Copy, Debug)]
pub struct Shape {
    pub depth: f64,
    pub area: f64,
    pub second_moment: f64,
    /// A_v of EN 1993-1-1 6.2.6(3) for rolled I sections, eta = 1.0.
    pub shear_area: f64,
}

impl Shape {
    /// A section by the name that the trade gives it: any case, `x` or `×`, spaces free.
    pub fn named(name: &str) -> Shape {
        Shape::of(dimensions(name).map(|size| size / 1e3))
    }

    fn of([depth, width, web, flange, root]: [f64; 5]) -> Shape {
        let half = depth / 2.0;
        let inside = half - flange;
        let (mut area, mut second_moment) = (0.0, 0.0);
        let mut add = |strips: [f64; 2]| {
            area += 2.0 * strips[0]; // the other half is the same
            second_moment += 2.0 * strips[1];
        };
        add(integral(inside, half, |height| [width, width * height * height]));
        add(integral(0.0, inside - root, |height| [web, web * height * height]));
        // Where the roots are, along their arc: `angle` is 0 where the arc leaves the web, 90 degrees at the flange.
        add(integral(0.0, std::f64::consts::FRAC_PI_2, |angle| {
            let height = inside - root + root * angle.sin();
            let strip = (web + 2.0 * root * (1.0 - angle.cos())) * root * angle.cos();
            [strip, strip * height * height]
        }));
        let shear_area =
            (area - 2.0 * width * flange + (web + 2.0 * root) * flange).max((depth - 2.0 * flange) * web);
        Shape { depth, area, second_moment, shear_area }
    }

    /// Weight a metre, N/m.
    pub fn weight(&self) -> f64 {
        self.area * super::STEEL_WEIGHT
    }
}

/// Simpson's rule on 400 strips: exact for the flat parts, to 1e-12 for the smooth arc.
fn integral(from: f64, to: f64, strip: impl Fn(f64) -> [f64; 2]) -> [f64; 2] {
    let strips = 400;
    let step = (to - from) / f64::from(strips);
    let mut sum = [0.0; 2];
    for i in 0..=strips {
        let weight = match i {
            _ if i == 0 || i == strips => 1.0,
            _ if i % 2 == 1 => 4.0,
            _ => 2.0,
        };
        let values = strip(from + f64::from(i) * step);
        sum[0] += weight * values[0] * step / 3.0;
        sum[1] += weight * values[1] * step / 3.0;
    }
    sum
}

/// Section tables, from memory: A in cm2, Iy in cm4, to half a per cent (the tables print three figures).
#[test]
fn properties_are_those_of_the_tables() {
    for (name, area, second_moment) in [
        ("203x102x23 UB", 29.4, 2105.0),
        ("203x133x25 UB", 32.0, 2340.0),
        ("305x165x40 UB", 51.3, 8500.0),
        ("457x191x67 UB", 85.5, 29400.0),
        ("203x203x46 UC", 58.7, 4570.0),
        ("533x210x92 UB", 117.0, 55200.0),
    ] {
        let shape = Shape::named(name);
        assert!((shape.area * 1e4 / area - 1.0).abs() < 0.005, "{name}: A {}", shape.area * 1e4);
        assert!(
            (shape.second_moment * 1e8 / second_moment - 1.0).abs() < 0.005,
            "{name}: I {}",
            shape.second_moment
        );
    }
}

/// The mass in a section's name, within the rolling tolerance that names are rounded by.
#[test]
fn masses_are_those_in_the_names() {
    for (name, _) in DIMENSIONS {
        let mass: f64 = name.rsplit('x').next().and_then(|tail| tail.split(' ').next()).unwrap().parse().unwrap();
        let own = Shape::named(name).area * 7850.0;
        assert!((own - mass).abs() < 0.01 * mass + 0.5, "{name}: {own}");
    }
}
