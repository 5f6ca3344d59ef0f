//! Deflections: own, inherited and stacked, at a simple multiple of full size, with a ruler in mm.

use sagledger_calc::results::Curve;

use super::super::figures::{self, tenth};
use super::super::labels::{Place, below, centred, left_of, right_of, sideways};
use super::super::letters::{self, Face, run, words};
use super::super::scene::{Align, Line, Path, Point, Size, point};
use super::super::shape::{self, Mapping, Peak};
use super::{AXIS, DEFLECTION, Diagrams, Part, RULER, Sheet, value};

/// Factors of full size; the design's five first, smaller ones only for movements they cannot hold.
const FACTORS: [f64; 11] = [10.0, 5.0, 2.0, 1.0, 0.5, 0.2, 0.1, 0.05, 0.02, 0.01, 0.005];
/// Movements below this are not told apart, in m.
const NOTHING: f64 = 0.5e-6;

/// "2 times full size", "full size", "half full size", "a tenth of full size".
pub(super) fn in_words(factor: f64) -> String {
    match factor {
        1.0 => "full size".to_string(),
        0.5 => "half full size".to_string(),
        f if f > 1.0 => format!("{f} times full size"),
        f => format!("1:{} of full size", (1.0 / f).round()),
    }
}

/// The largest factor at which the movements fit their height.
pub(super) fn factor(data: &Diagrams) -> f64 {
    let (own, stacked) = (shape::range(&data.own), shape::range(&data.stacked));
    let extent = (own.1.max(stacked.1) - own.0.min(stacked.0)) * 1e3;
    FACTORS.into_iter().find(|f| f * extent <= DEFLECTION.1).unwrap_or(0.002)
}

/// Movements of the bearings, in order.
fn chord(data: &Diagrams) -> Vec<Peak> {
    let bearings = data.bearings.iter();
    bearings.map(|at| Peak { at: *at, value: shape::value_at(&data.stacked, *at) }).collect()
}

/// The chord through the bearings' movements, continued into overhangs.
fn chord_line(chord: &[Peak], length: f64) -> Vec<Peak> {
    let beyond = |a: &Peak, b: &Peak, at: f64| {
        let slope = (b.value - a.value) / (b.at - a.at);
        Peak { at, value: a.value + slope * (at - a.at) }
    };
    let mut line = chord.to_vec();
    if let [first, second, ..] = chord
        && first.at > 0.0
    {
        line.insert(0, beyond(first, second, 0.0));
    }
    if let [.., before, last] = chord
        && last.at < length
    {
        line.push(beyond(before, last, length));
    }
    line
}

fn greatest(curve: &Curve) -> Option<Peak> {
    let most = |best: Option<Peak>, peak: Peak| match best {
        Some(b) if b.value.abs() >= peak.value.abs() => Some(b),
        _ => Some(peak),
    };
    shape::peaks(curve).into_iter().fold(None, most)
}

pub(super) fn draw(data: &Diagrams, sheet: &mut Sheet) -> Part {
    let factor = factor(data);
    let mut part = Part { unit: "mm", scale: format!("Drawn {}.", in_words(factor)), ..Part::default() };
    let (own, stacked) = (shape::range(&data.own), shape::range(&data.stacked));
    let (least, most) = (own.0.min(stacked.0), own.1.max(stacked.1));
    let axis = DEFLECTION.0 - least * 1e3 * factor;
    let map = sheet.map(axis, 1e3 * factor);
    sheet.within_ruler(DEFLECTION.0 - 4.8, RULER - 0.8);
    sheet.axis(axis, "deflection axis");

    let chord = chord(data);
    let inherits = chord.iter().any(|p| p.value.abs() > NOTHING);
    if inherits {
        let points: Vec<Point> = chord_line(&chord, data.length).iter().map(|p| map.point(p.at, p.value)).collect();
        sheet.curve(Line::ChordDashed, Path::straight(&points), "chord");
        if let Some(path) = shape::drawn(&data.own, &map) {
            sheet.curve(Line::Own, path, "own");
        }
    }
    if let Some(path) = shape::drawn(&data.stacked, &map) {
        sheet.curve(Line::Stacked, path, "stacked");
    }
    ruler(sheet, &map, (least * 1e3, most * 1e3), factor);

    if let Some(peak) = greatest(&data.stacked) {
        let name = if inherits { "stacked " } else { "own and stacked " };
        sheet.drawing.dot(map.point(peak.at, peak.value), 0.75);
        label(sheet, &mut part, &map, name, &peak);
    }
    if inherits && let Some(peak) = greatest(&data.own) {
        sheet.drawing.dot(map.point(peak.at, peak.value), 0.5);
        label(sheet, &mut part, &map, "own ", &peak);
    }
    if inherits {
        inherited(sheet, &mut part, &map, &chord);
    }
    lesser_peaks(data, sheet, &mut part, &map, most.max(-least));
    part
}

/// "stacked 12.5 mm at 2.99 m", beyond the peak.
fn label(sheet: &mut Sheet, part: &mut Part, map: &Mapping, name: &str, peak: &Peak) {
    let text = tenth(peak.value * 1e3);
    let mut runs = words(name);
    runs.extend(value(text, "mm"));
    runs.push(run(Face::Regular, format!(" at {}", figures::place(peak.at))));
    let width = letters::width(&runs, Size::Diagram);
    let (x, y) = (map.x(peak.at), map.y(peak.value));
    let down = peak.value >= 0.0;
    let mut places: Vec<Place> = Vec::new();
    for away in [1.4, 2.2, 3.2] {
        let y = if down { below(y, away) } else { y - away };
        places.extend(sideways(centred(x, y), width));
    }
    for inside in [1.8, 3.0, 4.4, 6.0, 8.0] {
        let y = if down { y - inside } else { below(y, inside) };
        places.extend(sideways(centred(x, y), 1.5 * width));
    }
    if !sheet.placer.place(&mut sheet.drawing, Size::Diagram, &runs, places) {
        part.displaced.push(runs);
    }
}

/// Movements of bearings: in words at the greatest, a figure at the others.
fn inherited(sheet: &mut Sheet, part: &mut Part, map: &Mapping, chord: &[Peak]) {
    let mut order: Vec<&Peak> = chord.iter().filter(|p| p.value.abs() >= 0.05e-3).collect();
    order.sort_by(|a, b| b.value.abs().total_cmp(&a.value.abs()).then(a.at.total_cmp(&b.at)));
    for (n, peak) in order.into_iter().enumerate() {
        let text = tenth(peak.value * 1e3);
        let mut runs = if n == 0 { words("inherited ") } else { vec![] };
        runs.extend(value(text, if n == 0 { "mm" } else { "" }));
        let (x, y) = (map.x(peak.at), map.y(peak.value));
        let mut places = Vec::new();
        for step in 0..18 {
            let away = 0.5 * f64::from(step);
            let (up, down) = (y - 1.0 - away, below(y, 1.0 + away));
            for aside in [0.6, 4.0, 8.0] {
                places.extend([left_of(x - aside, up), right_of(x + aside, up)]);
                if step < 12 {
                    places.extend([left_of(x - aside, down), right_of(x + aside, down)]);
                }
            }
        }
        if !sheet.placer.place(&mut sheet.drawing, Size::Diagram, &runs, places) {
            runs.push(run(Face::Regular, format!(" at {}", figures::place(peak.at))));
            part.displaced.push(runs);
        }
    }
}

/// The other turning points of the stacked line, where there is room for them.
fn lesser_peaks(data: &Diagrams, sheet: &mut Sheet, part: &mut Part, map: &Mapping, size: f64) {
    let Some(first) = greatest(&data.stacked) else { return };
    for peak in shape::peaks(&data.stacked) {
        let bearing = data.bearings.iter().any(|b| (b - peak.at).abs() < 1e-6);
        let small = peak.value.abs() < 0.04 * size || peak.value.abs() < 0.05e-3;
        if bearing || small || peak == first {
            continue;
        }
        let runs = super::value_and(tenth(peak.value * 1e3), "", format!(" at {}", figures::place(peak.at)));
        let (x, y) = (map.x(peak.at), map.y(peak.value));
        let down = peak.value >= 0.0;
        let width = letters::width(&runs, Size::Diagram);
        let beyond = if down { below(y, 1.4) } else { y - 1.4 };
        let inside = if down { y - 1.8 } else { below(y, 1.8) };
        let places = sideways(centred(x, beyond), width).chain(sideways(centred(x, inside), width));
        if sheet.placer.place(&mut sheet.drawing, Size::Diagram, &runs, places) {
            sheet.drawing.dot(point(x, y), 0.5);
        } else {
            let mut line = words("stacked ");
            line.extend(runs);
            part.displaced.push(line);
        }
    }
}

/// The ruler in mm right of the axis, zero on the undeformed line.
fn ruler(sheet: &mut Sheet, map: &Mapping, (least, most): (f64, f64), factor: f64) {
    let x = map.x0 + AXIS + 1.6;
    let steps = [0.1, 0.2, 0.5, 1.0, 2.0, 5.0, 10.0, 20.0, 50.0, 100.0, 200.0, 500.0];
    let fine = steps.into_iter().find(|s| s * factor >= 0.95).unwrap_or(1000.0);
    let figured = steps.into_iter().find(|s| s * factor >= 4.4 && (s / fine).fract() == 0.0).unwrap_or(1000.0);
    let first = (least / fine + 1e-9).floor() as i64;
    let last = (most / fine - 1e-9).ceil().max(1.0) as i64;
    let y = |mm: f64| map.y(mm * 1e-3);
    let mut ticks = Vec::new();
    for n in first..=last {
        let mm = n as f64 * fine;
        let on = |step: f64| {
            let share = mm / step;
            (share - share.round()).abs() < 1e-6
        };
        let length = if on(figured) {
            2.2
        } else if on(figured / 2.0) {
            1.5
        } else {
            0.9
        };
        ticks.push(Path::line(point(x, y(mm)), point(x + length, y(mm))));
        if on(figured) {
            let text = figures::fixed(mm, if figured < 1.0 { 1 } else { 0 });
            sheet.drawing.text(point(x + 2.7, y(mm) + 0.93), Align::Left, Size::Diagram, words(text));
        }
    }
    let (top, foot) = (y(first as f64 * fine), y(last as f64 * fine));
    sheet.drawing.tagged(Line::Ruler, Path::line(point(x, top), point(x, foot)), "mm ruler");
    sheet.drawing.strokes_of(Line::RulerTick, ticks, None);
}
