//! Drawings of what bears on what: load path, stack, cover, small chain, budget.

use super::super::scene::{Drawing, Rect};
use super::super::{budget, load_path, section, small_chain, stack};
use super::buildings::{Spec, continuous, eight_on_one, grid, long_names, solved, tangle, three_deep};
use super::diagrams::tidy;
use super::random::Random;
use super::set::{archived, set};

fn samples() -> Vec<(&'static str, Vec<Spec>)> {
    vec![
        ("three", three_deep()),
        ("grid", grid()),
        ("eight", eight_on_one()),
        ("continuous", continuous()),
        ("long", long_names()),
        ("tangle", tangle(&mut Random(7), 14)),
    ]
}

/// Every drawing of a building, with those of its members at the end.
fn all(specs: &[Spec]) -> Vec<Drawing> {
    let (building, results) = solved(specs);
    let mut list = load_path::load_path(&building, &results);
    for chain in &results.chains {
        let stack = stack::Stack::of(&building, &results, chain);
        list.extend(stack.drawings());
        list.extend(budget::budget_bars(&building, &results, chain));
        list.extend(stack.cover());
    }
    list.extend((0..building.beams.len()).filter_map(|n| small_chain::small_chain(&building, n)));
    list
}

#[test]
fn chains_are_drawn_tidily() {
    let drawn: Vec<Vec<Drawing>> = samples()
        .into_iter()
        .map(|(name, specs)| {
            let drawings = all(&specs);
            // Alternative text is there, or the export refuses.
            assert!(archived(&set(name, &drawings)).starts_with(b"%PDF"));
            drawings
        })
        .collect();
    drawn.iter().flatten().for_each(tidy);
}

#[test]
fn tangled_buildings_keep_their_labels_apart() {
    let mut random = Random(1_812);
    for count in [5, 9, 13, 17, 25, 40, 60] {
        let (building, results) = solved(&tangle(&mut random, count));
        let path = load_path::load_path(&building, &results);
        for drawing in &path {
            tidy(drawing);
            assert!(drawing.height < 247.0, "{} members: {} high", count, drawing.height);
        }
        // Every member stands in exactly one drawing.
        for beam in &building.beams {
            let tag = format!("member {}", beam.mark);
            let shown = path.iter().flat_map(|d| &d.strokes).filter(|s| s.tag.as_deref() == Some(tag.as_str()));
            assert_eq!(shown.count(), 1, "{tag}");
        }
        for chain in &results.chains {
            let stack = stack::Stack::of(&building, &results, chain);
            stack.drawings().iter().for_each(tidy);
        }
        for n in 0..building.beams.len() {
            let small = small_chain::small_chain(&building, n).unwrap();
            tidy(&small);
            assert!(small.width <= 40.0 && small.height <= 17.0);
        }
    }
}

#[test]
fn no_landing_line_crosses_a_member() {
    let mut random = Random(44);
    for count in [6, 12, 20, 30] {
        let (building, results) = solved(&tangle(&mut random, count));
        for drawing in load_path::load_path(&building, &results) {
            let tagged = |word: &str| {
                let word = word.to_string();
                drawing.strokes.iter().filter(move |s| s.tag.as_deref().is_some_and(|t| t.starts_with(&word)))
            };
            for line in tagged("landing ") {
                let points = line.paths[0].flattened();
                let (top, foot) = (points[0], points[points.len() - 1]);
                assert!((top.x - foot.x).abs() < 1e-9, "landing lines are upright");
                for member in tagged("member ") {
                    let ends = member.paths[0].flattened();
                    let (a, b) = (ends[0], ends[1]);
                    let between = a.y > top.y + 1e-9 && a.y < foot.y - 1e-9;
                    assert!(
                        !(between && top.x > a.x - 1.0 && top.x < b.x + 1.0),
                        "{:?} {:?}",
                        line.tag,
                        member.tag
                    );
                }
            }
        }
    }
}

#[test]
fn a_chain_of_three_is_joined_at_its_landings() {
    let (building, results) = solved(&three_deep());
    let path = load_path::load_path(&building, &results);
    assert_eq!(path.len(), 1);
    let find = |tag: &str| {
        let stroke = path[0].strokes.iter().find(|s| s.tag.as_deref() == Some(tag));
        stroke.unwrap_or_else(|| panic!("no {tag}")).paths[0].flattened()
    };
    // 4.9 m at 1:100 are 49 mm; the landing stands 17 mm from the carrier's end.
    let (upper, lower, line) = (find("member R1"), find("member T1"), find("landing R1 1"));
    assert!((upper[1].x - upper[0].x - 49.0).abs() < 1e-9);
    assert!((line[0].x - upper[1].x).abs() < 1e-9 && (line[1].x - lower[0].x - 17.0).abs() < 1e-9);
}

#[test]
fn sections_of_the_whole_catalogue_fit_their_paper() {
    let sections = sagledger_calc::sections::catalogue();
    for s in sections {
        let drawing = section::section_drawing(s);
        let paper = section::paper();
        for rect in drawing.boxes() {
            assert!(
                Rect::new(-0.01, -0.01, paper.right + 0.01, paper.bottom + 0.01).contains(&rect),
                "{} {rect:?}",
                s.name
            );
        }
        let boxes = drawing.boxes();
        for (n, a) in boxes.iter().enumerate() {
            assert!(!boxes[n + 1..].iter().any(|b| a.overlaps(b)), "{}", s.name);
        }
    }
    let some: Vec<Drawing> = sections.iter().step_by(sections.len() / 11).map(section::section_drawing).collect();
    set("sections", &some);
}
