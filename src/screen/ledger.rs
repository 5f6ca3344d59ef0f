//! The ledger of `check`: one line a member, in the order in which loads travel.

use sagledger_calc::building::Building;
use sagledger_calc::checks::{account, places};
use sagledger_calc::results::{Check, CheckKind, CheckUnit, Results, Verdict};
use sagledger_calc::workings::decimal::{movement, one_in, three_figures, utilisation};
use sagledger_calc::workings::unit::Unit;

use super::table::{Align, Cell, Column, Row, lines};
use super::{Screen, cells, movements, right, scale, verdict};

/// What a job says of itself above its ledger.
pub struct Heading<'a> {
    pub number: &'a str,
    pub title: &'a str,
    /// Eight hexadecimal digits in two groups.
    pub fingerprint: &'a str,
}

/// Levels are indented by two, by twelve at most.
pub fn indent(results: &Results, beam: usize) -> String {
    " ".repeat((2 * results.beams[beam].level).min(12))
}

/// The whole screen. With `only_not_met` the rows that are met are left out, and the movements.
pub fn text(
    screen: &Screen,
    heading: &Heading,
    building: &Building,
    results: &Results,
    only_not_met: bool,
) -> String {
    let mut out = vec![head(screen, heading), String::new()];
    out.extend(members(screen, building, results, only_not_met).iter().map(|l| screen.plain(l)));
    out.push(String::new());
    if !only_not_met {
        out.extend(movements::table(screen, building, results).iter().map(|l| screen.plain(l)));
        out.push(String::new());
    }
    out.extend(verdict::lines(screen, building, results));
    out.join("\n") + "\n"
}

fn head(screen: &Screen, heading: &Heading) -> String {
    let width = screen.text_width();
    let (number, fingerprint) = (heading.number, heading.fingerprint);
    let room = width.saturating_sub(cells(number) + 2 + 2 + cells(fingerprint));
    let title = if screen.width.is_some() { shortened(heading.title, room) } else { heading.title.to_string() };
    let title = screen.plain(&title);
    let filled = width.saturating_sub(cells(number) + 2 + cells(&title));
    format!(
        "{}  {title}{}",
        screen.bold(number),
        screen.dim(&right(fingerprint, filled.max(cells(fingerprint) + 2)))
    )
}

/// A title that ends in … where it is too long.
fn shortened(title: &str, room: usize) -> String {
    if cells(title) <= room {
        return title.to_string();
    }
    let mut short = String::new();
    for c in title.chars() {
        if cells(&short) + 2 > room {
            break;
        }
        short.push(c);
    }
    short.trim_end().to_string() + "…"
}

/// What a layout shows beside mark, check, share and word.
#[derive(Clone, Copy)]
struct Shown {
    wide: bool,
    scale: bool,
    section: bool,
}

fn members(screen: &Screen, building: &Building, results: &Results, only_not_met: bool) -> Vec<String> {
    let layouts = [
        Shown { wide: screen.is_wide(), scale: true, section: true },
        Shown { wide: false, scale: true, section: true },
        Shown { wide: false, scale: false, section: true },
        Shown { wide: false, scale: false, section: false },
    ];
    let mut last = Vec::new();
    for shown in layouts {
        last = laid_out(screen, building, results, only_not_met, shown);
        let width = screen.width.unwrap_or(usize::MAX);
        if last.iter().all(|line| cells(&unweighted(line)) <= width) {
            break;
        }
    }
    last
}

/// A line without the codes of bold and dim.
fn unweighted(line: &str) -> String {
    let mut out = line.to_string();
    for code in ["\x1b[1m", "\x1b[2m", "\x1b[22m"] {
        out = out.replace(code, "");
    }
    out
}

fn laid_out(
    screen: &Screen,
    building: &Building,
    results: &Results,
    only_not_met: bool,
    shown: Shown,
) -> Vec<String> {
    let word = |head, gap| Column { head, align: Align::Left, gap };
    let mut columns = vec![word("member", 0)];
    if shown.section {
        columns.push(word("section", 2));
    }
    columns.push(word("closest check", 2));
    if shown.wide {
        columns.push(word("place", 2));
        columns.push(Column { head: "demand", align: Align::Point, gap: 2 });
        columns.push(word("limit", 2));
    }
    columns.push(word("share of the limit", 2));
    let mut rows = Vec::new();
    for &beam in &results.order {
        let own = &results.beams[beam];
        let Some(closest) = account::closest(own) else { continue };
        let others =
            own.checks.iter().filter(|c| !c.advice && c.verdict != Verdict::Met && !std::ptr::eq(*c, closest));
        for (n, check) in std::iter::once(closest).chain(others).enumerate() {
            if only_not_met && check.verdict != Verdict::NotMet {
                continue;
            }
            let first = n == 0;
            let mark = format!("{}{}", indent(results, beam), building.beams[beam].mark);
            let mut cells = vec![Cell::bold(if first { mark } else { String::new() })];
            if shown.section {
                let section = building.beams[beam].section.name;
                cells.push(Cell::of(if first { section } else { "" }));
            }
            cells.push(Cell::of(places::name(building, results, beam, check)));
            if shown.wide {
                cells.push(Cell::of(places::place(own, check)));
                cells.push(Cell::of(demand_figure(check)));
                cells.push(Cell::of(limit_cell(check)));
            }
            cells.push(Cell::of(share(screen, check, shown.scale)));
            rows.push(Row { cells, bold: check.verdict == Verdict::NotMet });
        }
    }
    lines(screen, &columns, &rows)
}

/// Scale, number and word; the mark before the word where there is no scale.
fn share(screen: &Screen, check: &Check, with_scale: bool) -> String {
    let word = check.verdict.word();
    let number = match (check.verdict, check.utilisation) {
        (Verdict::NotVerified, _) | (_, None) => String::new(),
        (_, Some(u)) => format!("{}  ", utilisation(u)),
    };
    if with_scale {
        format!("{} {number}{word}", scale::scale(screen, check.verdict, check.utilisation))
    } else {
        format!("{number}{} {word}", scale::mark(screen, check.verdict))
    }
}

fn unit(check: &Check) -> (Unit, &'static str) {
    match check.unit {
        CheckUnit::Force => (Unit::Kn, "kN"),
        CheckUnit::Moment => (Unit::Knm, "kNm"),
        CheckUnit::Length => (Unit::Mm, "mm"),
        CheckUnit::Ratio => (Unit::One, ""),
    }
}

fn figure(check: &Check, value: f64) -> String {
    match (check.kind, check.unit) {
        (CheckKind::Tilt, _) => one_in(value.abs()),
        (_, CheckUnit::Length) => movement(value),
        (_, CheckUnit::Ratio) => utilisation(value),
        _ => three_figures(value, unit(check).0),
    }
}

fn demand_figure(check: &Check) -> String {
    check.demand.map_or(String::new(), |d| figure(check, d))
}

/// The limit with its unit; where a check is not verified, why.
fn limit_cell(check: &Check) -> String {
    match check.verdict {
        Verdict::NotVerified => check.reason.clone().filter(|r| r != check.kind.name()).unwrap_or_default(),
        Verdict::Met | Verdict::NotMet => capacity(check),
    }
}

/// A demand with its unit, as a sentence says it.
pub fn demand(check: &Check) -> String {
    check.demand.map_or(String::new(), |d| format!("{} {}", figure(check, d), unit(check).1).trim_end().to_string())
}

/// A limit with its unit, as a sentence says it.
pub fn capacity(check: &Check) -> String {
    check
        .capacity
        .map_or(String::new(), |c| format!("{} {}", figure(check, c), unit(check).1).trim_end().to_string())
}
