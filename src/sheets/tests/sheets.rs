//! What stands on the sheets, and where: nothing on top of anything else, nothing beyond the edges.

mod support;

use sagledger_calc::building::Building;
use sagledger_calc::calculate;
use sagledger_sheets::{Compiled, Paper, compile, source};
use support::{meta, package, single, three_deep, twelve};
use typst::layout::{Frame, FrameItem, Point, Transform};

const MM: f64 = 72.0 / 25.4;

/// A run of text on a sheet: its box in mm, from its baseline up to its capitals.
#[derive(Clone, Debug)]
struct Set {
    left: f64,
    right: f64,
    top: f64,
    bottom: f64,
    text: String,
}

fn collect(frame: &Frame, at: Transform, found: &mut Vec<Set>) {
    for (place, item) in frame.items() {
        let here = at.pre_concat(Transform::translate(place.x, place.y));
        match item {
            FrameItem::Group(group) => collect(&group.frame, here.pre_concat(group.transform), found),
            FrameItem::Text(run) if !run.text.trim().is_empty() => {
                let start = Point::default().transform(here);
                // IBM Plex Sans: capitals are 0.698 em tall.
                let tall = 0.698 * run.size.to_pt();
                let left = start.x.to_pt() / MM;
                found.push(Set {
                    left,
                    right: left + run.width().to_pt() / MM,
                    top: (start.y.to_pt() - tall) / MM,
                    bottom: start.y.to_pt() / MM,
                    text: run.text.to_string(),
                });
            }
            _ => {}
        }
    }
}

fn compiled(building: &Building, number: &str, title: &str, paper: Paper) -> Compiled {
    let results = calculate(building).unwrap();
    let mut meta = meta(number, title);
    meta.drawing_sheets = paper;
    let compiled = compile(&source(&package(building, &results, meta)).unwrap()).unwrap();
    assert_eq!(compiled.warnings, vec![]);
    compiled
}

fn jobs() -> Vec<(&'static str, Compiled)> {
    let long = "A title of sixty letters goes on and on until it is full, yes";
    vec![
        ("single", compiled(&single(), "7", "Kitchen opening", Paper::A4)),
        ("three deep", compiled(&three_deep(), "2731", "Attic and stair", Paper::A4)),
        ("three deep on A3", compiled(&three_deep(), "2731", "Attic and stair", Paper::A3)),
        ("twelve", compiled(&twelve(), "2740-HALL-REFURBISHMENT", long, Paper::A4)),
    ]
}

fn sheets(compiled: &Compiled) -> impl Iterator<Item = (usize, f64, Vec<Set>)> {
    compiled.document.pages().iter().enumerate().map(|(n, page)| {
        let mut found = Vec::new();
        collect(&page.frame, Transform::identity(), &mut found);
        (n + 1, page.frame.width().to_pt() / MM, found)
    })
}

#[test]
fn nothing_stands_beyond_the_edges() {
    for (job, compiled) in jobs() {
        for (sheet, width, found) in sheets(&compiled) {
            for set in found {
                // Line numbers stand 3.5 and 10 left of the text at 24; the foot's baseline below 282.
                let inside = set.left > 9.0 && set.right < width - 19.4 && set.top > 12.0 && set.bottom < 286.0;
                assert!(inside, "{job}, sheet {sheet}: {set:?}");
                let in_body = set.bottom < 274.0 || set.top > 280.0;
                assert!(in_body, "{job}, sheet {sheet}, below the body: {set:?}");
            }
        }
    }
}

#[test]
fn no_text_stands_on_another() {
    for (job, compiled) in jobs() {
        for (sheet, _, found) in sheets(&compiled) {
            for (n, a) in found.iter().enumerate() {
                for b in &found[n + 1..] {
                    let across = a.right.min(b.right) - a.left.max(b.left);
                    let down = a.bottom.min(b.bottom) - a.top.max(b.top);
                    // Subscripts and exponents reach into the line, but never by half its height.
                    let taller = (a.bottom - a.top).max(b.bottom - b.top);
                    let on_top = across > 0.25 && down > 0.5 * taller;
                    assert!(!on_top, "{job}, sheet {sheet}: {a:?} and {b:?}");
                }
            }
        }
    }
}

#[test]
fn the_cover_is_one_sheet_and_parts_begin_on_their_own() {
    for (job, compiled) in jobs() {
        let second = sheets(&compiled).nth(1).unwrap().2;
        let title = second.iter().find(|set| set.text.contains("Basis")).unwrap_or_else(|| panic!("{job}"));
        // Titles stand with their capitals' tops at 26.
        assert!((title.top - 26.0).abs() < 0.3, "{job}: {title:?}");
    }
}

#[test]
fn every_table_names_its_columns() {
    for (name, text) in sagledger_sheets::templates::EMBEDDED {
        let tables = text.matches("table(\n").count() + text.matches("table(columns").count();
        let heads = text.matches("table.header(\n        table.hline").count();
        assert_eq!(tables, heads, "{name}: a table without a head is not read out with its columns");
    }
}
