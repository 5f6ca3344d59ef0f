//! The cover: what the package covers, its verdict, what is outside it.

use sagledger_calc::actions::Choices;
use sagledger_calc::checks::places;
use sagledger_calc::outside::outside;
use sagledger_calc::results::Verdict;
use serde::Serialize;
use serde_json::Value;

use super::text::{Run, Runs, counted, keys, listed, sheet, to, words};
use super::view::View;
use crate::drawings::letters::{Face, wrapped};
use crate::drawings::scene::Size;
use crate::package::Package;

#[derive(Debug, Serialize)]
pub(super) struct Cover {
    number: String,
    title: String,
    /// "Saltmarsh Quay, Eastmere, for a private client".
    place: String,
    practice: Option<String>,
    logo: bool,
    engineer: Option<String>,
    checker: Option<String>,
    verdict: &'static str,
    /// What follows the verdict's word.
    said: String,
    /// What is not met or not verified, worst first.
    open: Vec<Item>,
    outside: Vec<Item>,
    scope: Runs,
    closest: Option<Runs>,
    picture: Option<Value>,
}

/// A line with the sheets that it leads to.
#[derive(Debug, Serialize)]
pub(super) struct Item {
    words: Runs,
    beside: Runs,
}

pub(super) fn cover(package: &Package, view: View, picture: Option<Value>) -> Cover {
    let meta = &package.meta;
    let open = open(view);
    let outside: Vec<Item> = outside(view.building)
        .into_iter()
        .map(|item| {
            let key = if item.ends_with("as a bearing") || item.ends_with("as bearings") {
                keys::LOAD_PATH
            } else {
                keys::OUTSIDE
            };
            Item { words: vec![words(item)], beside: vec![sheet(key)] }
        })
        .collect();
    let verdict = view.results.verdict;
    let scope = scope(view);
    let room = room(&meta.title, &open, &scope, &outside);
    let fits = |picture: &Value| picture.get("height").and_then(Value::as_f64).is_some_and(|height| height <= room);
    Cover {
        number: meta.number.clone(),
        title: meta.title.clone(),
        place: place(meta.site.as_deref(), meta.client.as_deref()),
        practice: meta.practice.clone(),
        logo: meta.logo.is_some(),
        engineer: meta.engineer.clone(),
        checker: meta.checker.clone(),
        verdict: verdict.word(),
        said: said(view, outside.len()),
        open,
        outside,
        scope,
        closest: closest(view),
        picture: picture.filter(fits),
    }
}

/// Height in mm that the words of the cover leave to its picture, by the measures of its template.
fn room(title: &str, open: &[Item], scope: &Runs, outside: &[Item]) -> f64 {
    /// From the first line to where the body ends.
    const BODY: f64 = 247.5;
    /// The line pitch of running text.
    const LINE: f64 = 4.5;
    let running = |runs: &Runs, width: f64| {
        let text: String = runs.iter().map(Run::plain).collect();
        LINE * lines(Face::Regular, &text, 9.2, width)
    };
    let list = |items: &[Item]| items.iter().map(|item| running(&item.words, 115.0)).sum::<f64>();
    let head = 30.0 + 7.9 * lines(Face::Medium, title, 20.0, 120.0);
    // The statement of the verdict takes at most two lines.
    let verdict = if open.is_empty() { 22.0 } else { 39.0 + list(open) };
    let signs = 17.0;
    BODY - head - verdict - 9.0 - running(scope, 116.0) - list(outside) - signs - 10.0
}

/// Lines that a text takes, a little generously.
fn lines(face: Face, text: &str, points: f64, width: f64) -> f64 {
    /// The size that lines are counted at.
    const NOTE: f64 = 7.8;
    wrapped(face, text, Size::Note, 0.98 * width * NOTE / points).len().max(1) as f64
}

fn place(site: Option<&str>, client: Option<&str>) -> String {
    match (site, client) {
        (Some(site), Some(client)) => format!("{site}, for {}", in_a_sentence(client)),
        (Some(site), None) => site.to_string(),
        (None, Some(client)) => format!("For {}", in_a_sentence(client)),
        (None, None) => String::new(),
    }
}

/// "Private client" reads "a private client"; a name stays as it is.
fn in_a_sentence(client: &str) -> String {
    match client {
        "Private client" | "private client" => "a private client".into(),
        name => name.to_string(),
    }
}

fn said(view: View, outside: usize) -> String {
    let count = |wanted: Verdict| {
        let checks = view.results.beams.iter().flat_map(|beam| &beam.checks);
        checks.filter(|check| !check.advice && check.verdict == wanted).count()
    };
    let (not_met, open) = (count(Verdict::NotMet), count(Verdict::NotVerified));
    let all = not_met + open + count(Verdict::Met);
    let items = format!("{outside} {} outside this calculation", if outside == 1 { "item" } else { "items" });
    match view.results.verdict {
        Verdict::Met => format!(", with {items}"),
        Verdict::NotVerified => format!(" in full: {open} of {all} requirements; {items}"),
        Verdict::NotMet if open == 0 => format!(": {not_met} of {all} requirements; {items}"),
        Verdict::NotMet => {
            format!(": {not_met} of {all} requirements, and {open} not verified; {items}")
        }
    }
}

/// One line for each kind of requirement that is not met or not verified, with the members that it concerns.
fn open(view: View) -> Vec<Item> {
    let mut lines: Vec<Item> = Vec::new();
    for wanted in [Verdict::NotMet, Verdict::NotVerified] {
        let mut kinds: Vec<(String, String, Vec<usize>)> = Vec::new();
        for (index, _, result) in view.beams() {
            for check in result.checks.iter().filter(|c| !c.advice && c.verdict == wanted) {
                let name = check.kind.name().to_string();
                let said = match wanted {
                    Verdict::NotMet => {
                        let printed = check.utilisation.map(sagledger_calc::workings::decimal::utilisation);
                        printed.map_or_else(String::new, |p| format!(", {p} of its limit"))
                    }
                    Verdict::NotVerified | Verdict::Met => match &check.reason {
                        Some(reason) if *reason != name => format!(", {reason}"),
                        _ => String::new(),
                    },
                };
                match kinds.iter_mut().find(|(n, s, _)| *n == name && *s == said) {
                    Some((_, _, beams)) if beams.last() == Some(&index) => {}
                    Some((_, _, beams)) => beams.push(index),
                    None => kinds.push((name, said, vec![index])),
                }
            }
        }
        for (name, said, beams) in kinds {
            let mut runs = vec![words(format!("{}: {name} of ", wanted.word()))];
            runs.extend(named(view, &beams));
            runs.push(words(said));
            let pairs = beams.iter().map(|&b| (keys::beam_checks(b), keys::beam_checks(b))).collect();
            lines.push(Item { words: runs, beside: vec![Run::Sheets { sheets: pairs }] });
        }
    }
    if lines.len() > OPEN_ROOM {
        let more = lines.len() + 1 - OPEN_ROOM;
        lines.truncate(OPEN_ROOM - 1);
        lines.push(Item {
            words: vec![words(format!("and {} more kinds of requirement", counted(more)))],
            beside: vec![sheet(keys::GOVERNING)],
        });
    }
    lines
}

/// Lines of what is open that the cover has room for; the others stand on the sheet of governing checks.
const OPEN_ROOM: usize = 6;
/// Members that a line names.
const NAMED: usize = 4;

/// "B1, B2 and 3 more".
fn named(view: View, beams: &[usize]) -> Runs {
    if beams.len() <= NAMED {
        return listed(beams.iter().map(|&b| view.link(b)).collect());
    }
    let mut runs: Vec<Run> = beams.iter().take(NAMED - 1).map(|&b| view.link(b)).collect();
    runs.push(words(format!("{} more", beams.len() + 1 - NAMED)));
    listed(runs)
}

fn scope(view: View) -> Runs {
    let beams: Vec<Run> = view.beams().map(|(index, ..)| view.link(index)).collect();
    let count = beams.len();
    let noun = if count == 1 { "steel beam" } else { "steel beams" };
    let mut runs = vec![words(format!("This package covers {} {noun}", counted(count)))];
    if count <= 8 {
        runs.push(words(", "));
        runs.extend(listed(beams));
        runs.push(words(","));
    }
    let walls: Vec<Run> = (0..view.building.walls.len())
        .map(|wall| words(places::carrier(view.building, sagledger_calc::building::Carrier::Wall(wall))))
        .collect();
    let carry = if count == 1 { "carries it" } else { "carry them" };
    match walls.len() {
        0 => runs.push(words(".")),
        1..=4 => {
            runs.push(words(" down to "));
            let one = walls.len() == 1;
            runs.extend(listed(walls));
            let verb = if one && count > 1 {
                "carries them"
            } else if one {
                "carries it"
            } else {
                carry
            };
            let verb = if !one && count == 1 { "carry it" } else { verb };
            runs.push(words(format!(" that {verb}. ")));
        }
        n => runs.push(words(format!(" down to the {} walls that {carry}. ", counted(n)))),
    }
    let choices = match view.building.basis.choices {
        Choices::Uk => "the UK national choices",
        Choices::Recommended => "the values recommended in the Eurocodes",
    };
    let landed = view
        .building
        .beams
        .iter()
        .any(|b| b.bearings.iter().any(|x| matches!(x.on, sagledger_calc::building::Carrier::Beam { .. })));
    let subject = if count == 1 { "It is" } else { "Every beam is" };
    runs.push(words(if landed {
        format!(
            "{subject} checked with {choices} for strength, for its own deflection, and for the deflection that it \
             inherits from the beams below."
        )
    } else {
        format!("{subject} checked with {choices} for strength and for its deflection.")
    }));
    runs
}

/// "tilt of B2, 0.96 of its limit, sheet 11".
fn closest(view: View) -> Option<Runs> {
    let closest = |(index, _, result)| {
        let check = view.closest(result)?;
        check.utilisation.filter(|_| check.verdict == Verdict::Met)?;
        Some((index, check))
    };
    let all: Option<Vec<_>> = view.beams().map(closest).collect();
    let (index, check) = all?
        .into_iter()
        .max_by(|(_, a), (_, b)| a.utilisation.unwrap_or_default().total_cmp(&b.utilisation.unwrap_or_default()))?;
    Some(vec![
        words(format!("{} of ", view.check_name(index, check))),
        to(keys::beam(index), view.mark(index)),
        words(format!(
            ", {} of its limit, ",
            check.utilisation.map(sagledger_calc::workings::decimal::utilisation).unwrap_or_default()
        )),
        sheet(keys::beam_checks(index)),
    ])
}
