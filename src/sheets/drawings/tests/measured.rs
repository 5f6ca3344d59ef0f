//! Set pages measured with a ruler: every deflected line, landing and diagram against the results and the scale that
//! the page itself states.

use sagledger_calc::building::Building;
use sagledger_calc::results::{Curve, Results};

use super::super::diagrams::Diagrams;
use super::super::load_path::load_path;
use super::super::read_back::{Drawn, DrawnCurve, read};
use super::super::scene::{Drawing, Point};
use super::super::shape::{value_at, value_before};
use super::super::stack::Stack;
use super::buildings::{Spec, continuous, eight_on_one, grid, solved, tangle, three_deep};
use super::random::Random;
use super::set::set;

/// mm: the thinnest line of a diagram is 0.30 wide.
const TOLERANCE: f64 = 0.02;

struct Page<'a> {
    curves: Vec<&'a DrawnCurve>,
    words: String,
}

impl Page<'_> {
    fn points(&self, tag: &str) -> Option<Vec<Point>> {
        let curve = self.curves.iter().find(|c| c.tag == tag)?;
        Some(curve.paths.iter().flat_map(|p| p.flattened()).collect())
    }

    /// The number that stands after some words.
    fn number_after(&self, words: &str) -> Option<f64> {
        let rest = &self.words[self.words.find(words)? + words.len()..];
        let end = rest.find(|c: char| !c.is_ascii_digit() && c != '.').unwrap_or(rest.len());
        rest[..end].trim_end_matches('.').parse().ok()
    }

    /// How many times full size the page says that deflections are drawn.
    fn stated_factor(&self) -> f64 {
        let rest = &self.words[self.words.find("Drawn ").unwrap() + 6..];
        if rest.starts_with("full size") {
            1.0
        } else if rest.starts_with("half full size") {
            0.5
        } else if let Some(rest) = rest.strip_prefix("1:") {
            1.0 / rest.split(' ').next().unwrap().parse::<f64>().unwrap()
        } else {
            rest.split(' ').next().unwrap().parse().unwrap()
        }
    }
}

fn pages(drawn: &Drawn) -> Vec<Page<'_>> {
    let count = drawn.texts.iter().map(|t| t.page + 1).max().unwrap_or(0);
    let page = |n: usize| Page {
        curves: drawn.curves.iter().filter(|c| c.page == n).collect(),
        words: drawn.texts.iter().filter(|t| t.page == n).map(|t| t.text.as_str()).collect::<Vec<_>>().join(" "),
    };
    (0..count).map(page).collect()
}

/// Every point of a drawn curve lies where its value belongs.
fn measure(points: &[Point], axis: &[Point], length: f64, curve: &Curve, per_unit: f64, what: &str) {
    let (left, right) = (axis[0], axis[axis.len() - 1]);
    assert!(points.len() > 1, "{what}");
    let span = right.x - left.x;
    assert!((points[0].x - left.x).abs() < TOLERANCE && (points[points.len() - 1].x - right.x).abs() < TOLERANCE);
    for p in points {
        let at = ((p.x - left.x) / span * length).clamp(0.0, length);
        // Typesetting rounds places a little; at a step the line runs between the values on both sides of it, and
        // at the ends of the beam from and to the axis.
        let near = 2e-6 * length;
        let values = [
            value_at(curve, (at + near).min(length)),
            value_before(curve, (at - near).max(0.0)),
            value_at(curve, at),
            value_before(curve, at),
        ];
        let mut low = values.into_iter().fold(f64::MAX, f64::min);
        let mut high = values.into_iter().fold(f64::MIN, f64::max);
        if at < near || at > length - near {
            (low, high) = (low.min(0.0), high.max(0.0));
        }
        let (a, b) = (left.y + per_unit * low, left.y + per_unit * high);
        assert!(
            p.y > a.min(b) - TOLERANCE && p.y < a.max(b) + TOLERANCE,
            "{what} at {at} m: drawn {} below the axis, {} to {} wanted",
            p.y - left.y,
            a - left.y,
            b - left.y
        );
    }
}

fn diagrams_hold(building: &Building, results: &Results, name: &str) {
    let data: Vec<Diagrams> =
        (0..building.beams.len()).filter_map(|n| Diagrams::of(building, results, n)).collect();
    let drawings: Vec<Drawing> = data.iter().map(Diagrams::drawing).collect();
    let drawn = read(&set(&format!("{name}-diagrams"), &drawings));
    let pages = pages(&drawn);
    assert_eq!(pages.len(), data.len());
    for (page, d) in pages.iter().zip(&data) {
        let factor = page.stated_factor();
        let what = |part: &str| format!("{name} {} {part}", d.mark);
        let axis = page.points("deflection axis").unwrap();
        assert!((axis[1].x - axis[0].x - 112.0).abs() < TOLERANCE, "the axis is 112 mm long");
        measure(&page.points("stacked").unwrap(), &axis, d.length, &d.stacked, 1e3 * factor, &what("stacked"));
        if let Some(own) = page.points("own") {
            measure(&own, &axis, d.length, &d.own, 1e3 * factor, &what("own"));
        }
        // Shear upward, moment on the tension side: sagging below its axis. One scale each, from the highest point.
        for (tag, curve, sign) in [("shear", &d.shear, -1.0), ("moment", &d.moment, 1.0)] {
            let points = page.points(tag).unwrap();
            let axis = page.points(&format!("{tag} axis")).unwrap();
            // The scale from the point that is drawn farthest from its axis.
            let far = |p: &&Point| (p.y - axis[0].y).abs();
            let top = points.iter().max_by(|a, b| far(a).total_cmp(&far(b))).unwrap();
            let at = (top.x - axis[0].x) / 112.0 * d.length;
            // Typesetting rounds places a little: a step is looked at from both sides.
            let near = 1e-6 * d.length;
            let value = [value_at(curve, at + near), value_before(curve, at - near)];
            let value = if value[0].abs() > value[1].abs() { value[0] } else { value[1] };
            let scale = (top.y - axis[0].y) / value;
            assert!(scale * sign > 0.0, "{}: drawn on its side of the axis", what(tag));
            measure(&points, &axis, d.length, curve, scale, &what(tag));
        }
    }
}

fn stacks_hold(building: &Building, results: &Results, name: &str) {
    let mut landings = 0;
    for (n, chain) in results.chains.iter().enumerate() {
        let stack = Stack::of(building, results, chain);
        let drawings = stack.drawings();
        let drawn = read(&set(&format!("{name}-stack-{n}"), &drawings));
        for page in pages(&drawn) {
            let scale = page.number_after("Spans 1:").unwrap();
            let factor = page.number_after("Movements are drawn ").unwrap() / scale;
            let full = page.words.contains("one millimetre on paper is one millimetre of movement");
            assert_eq!(full, factor == 1.0, "{}", page.words);
            for curve in &chain.curves {
                let beam = &building.beams[curve.beam];
                let Some(axis) = page.points(&format!("undeformed {}", beam.mark)) else { continue };
                let length = beam.length.si();
                assert!((axis[1].x - axis[0].x - length * 1000.0 / scale).abs() < TOLERANCE, "spans to scale");
                let what = format!("{name} {} stacked", beam.mark);
                let line = page.points(&format!("stacked {}", beam.mark)).unwrap();
                measure(&line, &axis, length, &curve.stacked, 1e3 * factor, &what);
                for (seat, bearing) in beam.bearings.iter().enumerate() {
                    let Some(dotted) = page.points(&format!("landing {} {seat}", beam.mark)) else { continue };
                    let top = (dotted[0].x - axis[0].x, dotted[0].y - axis[0].y);
                    let moved = curve.bearings[seat].to_mm() * factor;
                    assert!((top.0 - bearing.at.si() * 1000.0 / scale).abs() < TOLERANCE);
                    assert!((top.1 - moved).abs() < TOLERANCE, "{what}: bearing {seat} at {} for {moved}", top.1);
                    // Joined to its carrier: over the landing place, down to the carrier's deflected line.
                    let sagledger_calc::building::Carrier::Beam { beam: carrier, lands } = bearing.on else {
                        continue;
                    };
                    let mark = &building.beams[carrier].mark;
                    let Some(lower) = page.points(&format!("undeformed {mark}")) else { continue };
                    let foot = dotted[dotted.len() - 1];
                    let there = (lower[0].x + lands.si() * 1000.0 / scale, lower[0].y + moved);
                    if foot.y - dotted[0].y > 5.0 {
                        assert!((foot.x - there.0).abs() < TOLERANCE && (foot.y - there.1).abs() < TOLERANCE);
                        landings += 1;
                    }
                }
            }
        }
    }
    let carried = building.beams.iter().flat_map(|b| &b.bearings);
    let carried = carried.filter(|b| matches!(b.on, sagledger_calc::building::Carrier::Beam { .. })).count();
    assert!(landings > 0 || carried == 0, "{name}: no landing was measured");
}

fn load_paths_hold(building: &Building, results: &Results, name: &str) {
    let drawn = read(&set(&format!("{name}-path"), &load_path(building, results)));
    let mut measured = 0;
    for page in pages(&drawn) {
        let scale = page.number_after("Spans 1:").unwrap();
        for beam in &building.beams {
            let Some(line) = page.points(&format!("member {}", beam.mark)) else { continue };
            assert!((line[1].x - line[0].x - beam.length.si() * 1000.0 / scale).abs() < TOLERANCE);
            for (seat, bearing) in beam.bearings.iter().enumerate() {
                let Some(dotted) = page.points(&format!("landing {} {seat}", beam.mark)) else { continue };
                assert!((dotted[0].x - line[0].x - bearing.at.si() * 1000.0 / scale).abs() < TOLERANCE);
                let sagledger_calc::building::Carrier::Beam { beam: carrier, lands } = bearing.on else { continue };
                let carrier = page.points(&format!("member {}", building.beams[carrier].mark));
                if let Some(lower) = carrier.filter(|_| dotted[1].y - dotted[0].y > 5.0) {
                    let there = lower[0].x + lands.si() * 1000.0 / scale;
                    assert!((dotted[1].x - there).abs() < TOLERANCE, "{name} {} {seat}", beam.mark);
                    measured += 1;
                }
            }
        }
    }
    let carried = building.beams.iter().flat_map(|b| &b.bearings);
    let carried = carried.filter(|b| matches!(b.on, sagledger_calc::building::Carrier::Beam { .. })).count();
    assert!(measured > 0 || carried == 0, "{name}: no landing was measured");
}

fn hold(specs: &[Spec], name: &str) {
    let (building, results) = solved(specs);
    diagrams_hold(&building, &results, name);
    stacks_hold(&building, &results, name);
    load_paths_hold(&building, &results, name);
}

#[test]
fn known_chains_measure_what_they_state() {
    hold(&three_deep(), "measured-three");
    hold(&grid(), "measured-grid");
    hold(&eight_on_one(), "measured-eight");
    hold(&continuous(), "measured-continuous");
}

#[test]
fn fifty_generated_buildings_measure_what_they_state() {
    let mut random = Random(50);
    for n in 0..50 {
        let count = 2 + random.below(3);
        hold(&tangle(&mut random, count), &format!("measured-{n}"));
    }
}

/// Labels were placed by widths reckoned without the typesetter.
#[test]
fn reckoned_widths_are_those_that_are_set() {
    let (building, results) = solved(&three_deep());
    let drawings: Vec<Drawing> =
        (0..3).filter_map(|n| Diagrams::of(&building, &results, n)).map(|d| d.drawing()).collect();
    let drawn = read(&set("widths", &drawings));
    let mut compared = 0;
    for text in drawings.iter().flat_map(|d| &d.texts) {
        let [run] = text.runs.as_slice() else { continue };
        let size = super::super::letters::em(text.size);
        let same = drawn.texts.iter().find(|t| t.text.trim() == run.text.trim() && (t.size - size).abs() < 1e-6);
        let Some(same) = same else { continue };
        let reckoned = super::super::letters::width(&text.runs, text.size);
        // Kerning moves letters by a few hundredths of an em.
        assert!((same.width - reckoned).abs() < 0.04 * size * run.text.len() as f64 / 4.0 + 0.1, "{}", run.text);
        compared += 1;
    }
    assert!(compared > 30, "{compared}");
    let least = drawn.texts.iter().filter(|t| t.text.trim() != "" && t.text != "k").map(|t| t.size);
    // Nothing is set smaller than 7.2 pt, indices of symbols apart.
    assert!(least.fold(f64::MAX, f64::min) * 72.0 / 25.4 >= 7.2 - 1e-9);
}
