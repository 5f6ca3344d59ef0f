//! Member diagrams.

use super::super::diagrams::Diagrams;
use super::super::scene::{Drawing, Rect};
use super::random::{Made, Random, band, force};
use super::set::set;

/// One of each kind of beam that a sheet must carry.
fn kinds() -> Vec<Diagrams> {
    let simple = Made {
        length: 4.7,
        bearings: vec![0.0, 4.7],
        bands: vec![
            band("own weight", 0.0, 4.7, (0.5e3, 0.5e3)),
            band("loft floor", 0.0, 4.7, (6.6e3, 6.6e3)),
            band("gable, north slope", 0.0, 2.2, (1.9e3, 7.0e3)),
            band("gable, south slope", 2.2, 4.7, (7.0e3, 0.5e3)),
        ],
        forces: vec![force("from B1", 2.2, 16.6e3)],
        stiffness: 11.6e6,
        ends: (0.0, 9.2e-3),
        ..Made::default()
    };
    let lone = Made {
        length: 3.3,
        bearings: vec![0.0, 3.3],
        bands: vec![band("own weight", 0.0, 3.3, (0.4e3, 0.4e3)), band("flat roof", 0.0, 3.3, (5.1e3, 5.1e3))],
        stiffness: 5.0e6,
        ..Made::default()
    };
    let overhanging = Made {
        length: 9.4,
        bearings: vec![0.0, 4.1, 7.9],
        inner_share: 0.6,
        bands: vec![
            band("own weight", 0.0, 9.4, (0.8e3, 0.8e3)),
            band("deck", 0.0, 9.4, (11.0e3, 11.0e3)),
            band("parapet", 6.0, 9.4, (2.0e3, 2.0e3)),
        ],
        forces: vec![force("balustrade post", 9.4, 6.0e3)],
        stiffness: 30.0e6,
        ends: (4.2e-3, 0.0),
    };
    let lifted = Made {
        length: 5.6,
        bearings: vec![0.0, 3.4],
        bands: vec![band("own weight", 0.0, 5.6, (0.4e3, 0.4e3)), band("roof uplift", 0.0, 5.6, (-3.0e3, -3.0e3))],
        forces: vec![force("tie", 5.6, -8.0e3)],
        stiffness: 8.0e6,
        ends: (-1.1e-3, 0.6e-3),
        ..Made::default()
    };
    let crowded = Made {
        length: 6.0,
        bearings: vec![0.0, 6.0],
        bands: vec![band("own weight", 0.0, 6.0, (0.6e3, 0.6e3))],
        forces: (0..24)
            .map(|n| force("purlin seat on the beam", 1.0 + 0.1 * f64::from(n), 3.0e3 + 40.0 * f64::from(n)))
            .collect(),
        stiffness: 20.0e6,
        ..Made::default()
    };
    let carrier = Made {
        length: 7.2,
        bearings: vec![0.0, 7.2],
        bands: vec![
            band("own weight", 0.0, 7.2, (1.1e3, 1.1e3)),
            band("wall of the upper storey", 0.0, 5.0, (9.0e3, 9.0e3)),
        ],
        forces: (0..8).map(|n| force(&format!("from J{}", n + 1), 0.6 + 0.85 * f64::from(n), 14.2e3)).collect(),
        stiffness: 60.0e6,
        ..Made::default()
    };
    let long_marks = Made {
        forces: vec![
            force("from Wwwwwwwwwwwwwwwwwwwwwwww", 1.2, 21.0e3),
            force("from MMMMMMMMMMMMMMMMMMMMMMMM", 2.6, 13.0e3),
        ],
        ..simple.clone()
    };
    vec![
        simple.diagrams("B2"),
        lone.diagrams("L1"),
        overhanging.diagrams("M3"),
        lifted.diagrams("R4"),
        crowded.diagrams("P5"),
        carrier.diagrams("C6"),
        long_marks.diagrams("Wwwwwwwwwwwwwwwwwwwwwwww"),
    ]
}

pub fn generated(random: &mut Random) -> Diagrams {
    let length = random.between(0.8, 14.0);
    let mut bearings = vec![0.0, length];
    if random.share() < 0.4 {
        bearings[1] = length * random.between(0.6, 0.95);
    }
    if random.share() < 0.2 {
        bearings[0] = length * random.between(0.03, 0.2);
    }
    let (first, last) = (bearings[0], bearings[1]);
    for _ in 0..random.below(3) {
        bearings.push(random.between(first + 0.1 * (last - first), last - 0.1 * (last - first)));
    }
    bearings.sort_by(f64::total_cmp);
    let mut bands = vec![band("own weight", 0.0, length, (0.4e3, 0.4e3))];
    for n in 0..random.below(5) {
        let whole = random.share() < 0.4;
        let (from, to) = (random.between(0.0, 0.6) * length, random.between(0.65, 1.0) * length);
        let (from, to) = if whole { (0.0, length) } else { (from, to) };
        let sign = if random.share() < 0.1 { -1.0 } else { 1.0 };
        let (p, q) = (random.between(0.5e3, 20.0e3), random.between(0.0, 20.0e3));
        let q = if random.share() < 0.5 { p } else { q };
        bands.push(band(
            ["floor", "gable above", "party wall, upper leaf", "roof"][n % 4],
            from,
            to,
            (sign * p, sign * q),
        ));
    }
    let forces = (0..random.below(9)).map(|n| {
        let size = random.between(-5.0e3, 40.0e3);
        force(["from B1", "water tank", "from Roof beam 12"][n % 3], random.share() * length, size)
    });
    let forces = forces.collect();
    let made = Made {
        length,
        bearings,
        inner_share: random.between(0.1, 0.6),
        bands,
        forces,
        stiffness: length.powi(4) * random.between(2.0e4, 4.0e5),
        ends: (
            random.between(-2.0e-3, 12.0e-3),
            random.between(-1.0e-3, 20.0e-3) * f64::from(u8::from(random.share() < 0.5)),
        ),
    };
    made.diagrams("B7")
}

/// No label on another, outside the drawing, or on a curve.
pub fn tidy(drawing: &Drawing) {
    let frame = Rect::new(-4.0, -0.5, drawing.width + 0.5, drawing.height + 0.5);
    let boxes = drawing.boxes();
    for (n, text) in drawing.texts.iter().enumerate() {
        let here = boxes[n];
        assert!(frame.contains(&here), "{:?} leaves the drawing at {here:?}", text.runs);
        for (m, other) in boxes.iter().enumerate().skip(n + 1) {
            assert!(!here.grown(-0.05).overlaps(other), "{:?} on {:?}", text.runs, drawing.texts[m].runs);
        }
        for stroke in drawing.strokes.iter().filter(|s| s.line.keeps_labels_off()) {
            for path in &stroke.paths {
                let cut = path.flattened().windows(2).any(|p| here.meets(p[0], p[1]));
                assert!(!cut, "{:?} on {:?} {:?}", text.runs, stroke.line, stroke.tag);
            }
        }
    }
}

#[test]
fn every_kind_of_beam_is_drawn_tidily() {
    let drawings: Vec<Drawing> = kinds().iter().map(Diagrams::drawing).collect();
    set("diagrams", &drawings);
    drawings.iter().for_each(tidy);
}

#[test]
fn labels_of_generated_beams_keep_apart() {
    let mut random = Random(20_261_120);
    for _ in 0..400 {
        tidy(&generated(&mut random).drawing());
    }
}
