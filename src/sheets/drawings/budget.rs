//! How each limit is used: one bar a member, on one scale, cut into what each beam's bending takes.

use sagledger_calc::building::Building;
use sagledger_calc::results::{Chain, Results};

use super::diagrams::listed;
use super::figures::{fixed, tenth};
use super::labels::{Column, Placer, WIDE, below, left_of, right_of};
use super::letters::{self, Face, Run, run, words};
use super::scene::{Align, Drawing, Fill, Line, Path, Rect, Size, point};

/// Where the bars begin and how long they may be.
const LEFT: f64 = 8.0;
const LENGTH: f64 = 111.0;
const BAR: f64 = 3.2;
const PITCH: f64 = 10.5;
/// Bars on one drawing.
const BARS: usize = 16;
/// Parts that would print as 0.0 mm are left out, m.
const LEAST: f64 = 0.05e-3;

/// How a beam's part is filled, by its level in the chain; lower levels than these stay white. A level of several
/// beams, and a white one, is named under its part.
#[derive(Clone, Copy, PartialEq)]
enum Ink {
    Solid,
    Tint25,
    Hatch,
    Tint10,
    White,
}

const INKS: [Ink; 4] = [Ink::Solid, Ink::Tint25, Ink::Hatch, Ink::Tint10];

/// One bar; m.
#[derive(Clone, Debug, PartialEq)]
pub struct Budget {
    pub mark: String,
    /// The bar's own beam first.
    pub shares: Vec<Share>,
    pub settled: f64,
    pub total: f64,
    pub limit: Option<f64>,
}

/// What one beam's bending adds at the governing point.
#[derive(Clone, Debug, PartialEq)]
pub struct Share {
    pub mark: String,
    /// Distance of the beam from the top of the chain.
    pub level: usize,
    pub movement: f64,
}

/// The bars of a chain, on as many drawings as they need.
pub fn budget_bars(building: &Building, results: &Results, chain: &Chain) -> Vec<Drawing> {
    let mark = |beam: usize| building.beams.get(beam).map_or_else(String::new, |b| b.mark.clone());
    let level = |beam: usize| results.beams.get(beam).map_or(0, |b| b.level);
    let bars = chain.beams.iter().filter_map(|beam| {
        let movements = &results.beams.get(*beam)?.movements;
        let stacked = movements.governing.as_ref().unwrap_or(&movements.stacked);
        // Down is what a limit looks at; a point that rises is measured upward.
        let sign = if stacked.total.value.si() < 0.0 { -1.0 } else { 1.0 };
        Some(Budget {
            mark: mark(*beam),
            shares: stacked
                .shares
                .iter()
                .map(|(b, m)| Share { mark: mark(*b), level: level(*b), movement: sign * m.si() })
                .collect(),
            settled: sign * stacked.settled.si(),
            total: sign * stacked.total.value.si(),
            limit: stacked.limit.map(|l| l.si()),
        })
    });
    drawings(&bars.collect::<Vec<_>>())
}

/// The bars as drawings.
pub fn drawings(bars: &[Budget]) -> Vec<Drawing> {
    let longest = bars.iter().flat_map(|b| {
        let parts = b.shares.iter().map(|s| s.movement).chain([b.settled]).filter(|p| *p > 0.0).sum::<f64>();
        [parts * 1e3, b.total * 1e3, b.limit.unwrap_or(0.0) * 1e3]
    });
    let longest = longest.fold(0.0, f64::max);
    let scales = [20.0, 15.0, 10.0, 8.0, 6.0, 5.0, 4.5, 4.0, 3.5, 3.0, 2.5, 2.0, 1.5, 1.0, 0.5, 0.2, 0.1, 0.05];
    let scale = scales.into_iter().find(|s| s * longest <= LENGTH).unwrap_or(0.02);
    bars.chunks(BARS).map(|part| one(part, scale)).collect()
}

fn one(bars: &[Budget], scale: f64) -> Drawing {
    let height = (PITCH + 3.0) * bars.len() as f64 + 3.0;
    let mut drawing = Drawing::new("budget-bars", WIDE, height);
    let mut placer = Placer::new(Rect::new(0.0, 0.0, 122.0, height));
    let widest = bars.iter().map(|b| letters::width(&[run(Face::SemiBold, b.mark.as_str())], Size::Diagram));
    // Long marks stand above their bars.
    let above = widest.fold(0.0, f64::max) > LEFT - 1.0;
    let lift = if above { 2.9 } else { 0.0 };
    let pitch = PITCH + lift;
    let levels = levels(bars);
    for (n, bar) in bars.iter().enumerate() {
        let top = pitch * n as f64 + lift;
        let at = if above { point(LEFT, top - 0.8) } else { point(0.0, top + BAR / 2.0 + 0.93) };
        placer.keep_off(drawing.text(at, Align::Left, Size::Diagram, vec![run(Face::SemiBold, bar.mark.as_str())]));
        parts(&mut drawing, &mut placer, bar, &levels, top, scale);
    }
    let foot = pitch * bars.len() as f64 + 1.6;
    drawing.height = foot + 1.4;
    legend(&mut drawing, &levels, foot);
    let mut column = Column::new();
    let size = if scale == 1.0 { "full size".to_string() } else { format!("{scale} times full size") };
    let text = format!("Governing point of each beam, {size}, in mm. What is not used is left open.");
    let lines: Vec<Vec<Run>> = column.wrap(Face::Regular, &text).into_iter().map(words).collect();
    column.note(&mut drawing, 0.0, lines);
    drawing.height = drawing.height.max(column.next() - 3.0);
    drawing.alt = alt(bars);
    drawing
}

/// The beams of each level that take part in some bar.
fn levels(bars: &[Budget]) -> Vec<Vec<String>> {
    let mut levels: Vec<Vec<String>> = Vec::new();
    for share in bars.iter().flat_map(|b| &b.shares).filter(|s| s.movement.abs() >= LEAST) {
        if levels.len() <= share.level {
            levels.resize(share.level + 1, vec![]);
        }
        if !levels[share.level].contains(&share.mark) {
            levels[share.level].push(share.mark.clone());
        }
    }
    levels
}

fn parts(drawing: &mut Drawing, placer: &mut Placer, bar: &Budget, levels: &[Vec<String>], top: f64, scale: f64) {
    let foot = top + BAR;
    let mut x = LEFT;
    let mut figures: Vec<(f64, Vec<Run>)> = Vec::new();
    let mut less: Vec<Run> = Vec::new();
    let named = |mark: &str, movement: f64, name: bool| {
        let figure = run(Face::SemiBold, tenth(movement * 1e3));
        if name { vec![run(Face::Regular, format!("{mark} ")), figure] } else { vec![figure] }
    };
    let settled = Share { mark: "settled".to_string(), level: usize::MAX, movement: bar.settled };
    for share in bar.shares.iter().chain([&settled]).filter(|s| s.movement.abs() >= LEAST) {
        let width = share.movement * 1e3 * scale;
        if share.movement < 0.0 {
            less.extend(named(&format!(" {}", share.mark), -share.movement, true));
            continue;
        }
        let ink = INKS.get(share.level).copied().unwrap_or(Ink::White);
        let several = levels.get(share.level).is_some_and(|l| l.len() > 1) && share.mark != bar.mark;
        fill(drawing, Rect::new(x, top, x + width, foot), ink);
        figures.push((x, named(&share.mark, share.movement, ink == Ink::White || several)));
        x += width;
    }
    let end = LEFT + bar.total.max(0.0) * 1e3 * scale;
    if let Some(limit) = bar.limit {
        let at = LEFT + limit * 1e3 * scale;
        let tick = Path::line(point(at, top - 1.0), point(at, foot + 1.0));
        drawing.tagged(Line::LimitTick, tick, format!("limit {}", bar.mark));
        let middle = top + BAR / 2.0;
        if at > end.max(x) {
            drawing.stroke(Line::Left, Path::line(point(end.max(x), middle), point(at, middle)));
        }
        let runs = words(tenth(limit * 1e3));
        let under = below(foot, 1.4);
        let places = [left_of(at, under), right_of(at + 0.8, under), right_of(at + 1.2, top + 2.6)];
        placer.place(drawing, Size::Diagram, &runs, places);
        let (word, rest) =
            if limit >= bar.total { ("left ", limit - bar.total) } else { ("over ", bar.total - limit) };
        let runs = vec![run(Face::Regular, word), run(Face::SemiBold, tenth(rest * 1e3))];
        for (x, figure) in std::mem::take(&mut figures) {
            under_start(drawing, placer, &figure, x, under);
        }
        let start = end.max(x) + 1.2;
        let places = (0..3).map(|n| right_of(start + f64::from(n), under));
        let beyond = (0..8).map(|n| right_of(end.max(x).max(at) + 1.4 + f64::from(n), top + 2.6));
        placer.place(drawing, Size::Diagram, &runs, places.chain(beyond));
    } else {
        let under = below(foot, 1.4);
        for (x, figure) in figures {
            under_start(drawing, placer, &figure, x, under);
        }
        let runs = words("no limit");
        placer.place(drawing, Size::Diagram, &runs, [right_of(end.max(x) + 1.2, top + 2.6)]);
    }
    if !less.is_empty() {
        less.insert(0, run(Face::Regular, "less"));
        let places = (0..30).map(|n| right_of(LEFT + 4.0 * f64::from(n), below(foot, 1.4)));
        placer.place(drawing, Size::Diagram, &less, places);
    }
}

/// A figure under the start of its part, moved right while it would touch its neighbour.
fn under_start(drawing: &mut Drawing, placer: &mut Placer, runs: &[Run], x: f64, y: f64) {
    let places = (0..16).map(|n| right_of(x + 0.5 * f64::from(n), y));
    placer.place(drawing, Size::Diagram, runs, places);
}

fn fill(drawing: &mut Drawing, rect: Rect, ink: Ink) {
    let (fill, hatched) = match ink {
        Ink::Solid => (Fill::Solid, false),
        Ink::Tint25 => (Fill::Tint25, false),
        Ink::Tint10 => (Fill::Tint10, false),
        Ink::Hatch => (Fill::White, true),
        Ink::White => (Fill::White, false),
    };
    drawing.fill(fill, Some(Line::Edge), Path::rectangle(rect));
    if hatched {
        drawing.strokes_of(Line::Hatch, hatch(rect), None);
    }
}

/// Strokes at 45° over a rectangle, 0.9 apart across.
fn hatch(rect: Rect) -> Vec<Path> {
    let height = rect.bottom - rect.top;
    let mut strokes = Vec::new();
    let mut foot = rect.left - height + 0.9;
    while foot < rect.right {
        // From (foot, bottom) up to (foot + height, top), cut to the rectangle.
        let start = (rect.left - foot).max(0.0);
        let end = (rect.right - foot).min(height);
        if end > start {
            strokes
                .push(Path::line(point(foot + start, rect.bottom - start), point(foot + end, rect.bottom - end)));
        }
        foot += 0.9;
    }
    strokes
}

/// "Solid: B1 bends." and so on, for the fills that are used.
fn legend(drawing: &mut Drawing, levels: &[Vec<String>], y: f64) {
    let names = ["Solid", "Grey", "Hatched", "Light grey", "White"];
    let mut x = 0.0;
    let mut y = y + 1.0;
    for (name, marks) in names.iter().zip(levels).filter(|(_, marks)| !marks.is_empty()) {
        let (verb, more) = (if marks.len() == 1 { "bends" } else { "bend" }, marks.len().saturating_sub(6));
        let mut shown: Vec<String> = marks.iter().take(6).cloned().collect();
        if more > 0 {
            shown.push(format!("{more} more"));
        }
        let text = format!("{name}: {} {verb}.", listed(shown.into_iter()));
        for line in letters::wrapped(Face::Regular, &text, Size::Diagram, 120.0) {
            let width = letters::width(&words(line.as_str()), Size::Diagram);
            if x + width > 120.0 && x > 0.0 {
                x = 0.0;
                y += 3.6;
            }
            drawing.text(point(x, y), Align::Left, Size::Diagram, words(line));
            x += width + 5.0;
        }
    }
    drawing.height = drawing.height.max(y + 1.2);
}

fn alt(bars: &[Budget]) -> String {
    let told = bars.iter().map(|bar| {
        let parts = bar.shares.iter().filter(|s| s.movement.abs() >= LEAST);
        let parts = listed(parts.map(|s| format!("{} mm from {}", tenth(s.movement * 1e3), s.mark)));
        let settled = match tenth(bar.settled * 1e3) {
            t if super::figures::is_zero(&t) => String::new(),
            t => format!(", {t} mm settled"),
        };
        let limit = match bar.limit {
            Some(limit) if limit >= bar.total => {
                format!("of a limit of {} mm, {} mm left", tenth(limit * 1e3), tenth((limit - bar.total) * 1e3))
            }
            Some(limit) => {
                format!("over its limit of {} mm by {} mm", tenth(limit * 1e3), tenth((bar.total - limit) * 1e3))
            }
            None => "without a limit".to_string(),
        };
        format!("{}: {} mm {limit}; {parts}{settled}.", bar.mark, tenth(bar.total * 1e3))
    });
    let count = fixed(bars.len() as f64, 0);
    format!("How each limit is used, {count} members. {}", told.collect::<Vec<_>>().join(" "))
}
