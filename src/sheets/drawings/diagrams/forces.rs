//! Shear and moment.

use super::super::figures::{self, common_decimals, signed};
use super::super::labels::{Place, below, centred, left_of, middle, right_of, sideways};
use super::super::letters::{self, words};
use super::super::scene::{Line, Path, Size, Step, point};
use super::super::shape::{self, Mapping};
use super::{Diagrams, MOMENT, Part, SHEAR, Sheet, value, value_and};

/// A value of the shear beside a step: which side of the step it belongs to (-1 left, 1 right).
struct StepValue {
    at: f64,
    value: f64,
    side: f64,
    rank: f64,
    /// Length of its stretch on paper.
    room: f64,
}

/// Width of a usual figure of the shear on paper.
const FIGURE: f64 = 8.4;

pub(super) fn draw_shear(data: &Diagrams, sheet: &mut Sheet) -> Part {
    let mut part = Part { unit: "kN", ..Part::default() };
    let (least, most) = shape::range(&data.shear);
    let scale = if most > least { SHEAR.1 / (most - least) } else { 0.0 };
    let axis = SHEAR.0 + most * scale;
    let map = sheet.map(axis, -scale);
    sheet.within(SHEAR.0 - 3.2, SHEAR.0 + SHEAR.1 + 3.4);
    sheet.axis(axis, "shear axis");
    if let Some(path) = shape::drawn(&data.shear, &map) {
        sheet.curve(Line::Curve, closed(path, axis), "shear");
    }

    let values = step_values(data, sheet.per_metre, &mut part);
    let decimals = common_decimals(values.iter().map(|s| s.value / 1e3));
    let greatest = |sign: f64| values.iter().map(|s| s.value * sign).fold(0.0, f64::max);
    let (top, foot) = (greatest(1.0), greatest(-1.0));
    for step in &values {
        let text = signed(step.value / 1e3, decimals);
        if figures::is_zero(&text) {
            continue;
        }
        let unit = if step.value == top || -step.value == foot { "kN" } else { "" };
        let runs = value(text.clone(), unit);
        let places = shear_places(&map, step, letters::width(&runs, Size::Diagram));
        if !sheet.placer.place(&mut sheet.drawing, Size::Diagram, &runs, places) {
            part.displaced.push(value_and(text, "kN", format!(" at {}", figures::place(step.at))));
        }
    }
    part
}

/// The curve with its uprights from and to the axis.
fn closed(mut path: Path, axis: f64) -> Path {
    let first = path.start;
    let last = path.steps.last().map_or(first, Step::end);
    path.start = point(first.x, axis);
    path.steps.insert(0, Step::To(first));
    path.steps.push(Step::To(point(last.x, axis)));
    path
}

/// Ends first, then steps at bearings, then the others by size. A step has two values; of a stretch too short for
/// both of its own only the greater is given, and none of one too short for any, unless it ends at a bearing.
fn step_values(data: &Diagrams, per_metre: f64, part: &mut Part) -> Vec<StepValue> {
    let (least, most) = shape::range(&data.shear);
    let tiny = 1e-6 * (most - least);
    let mut places: Vec<f64> = vec![0.0];
    let inner = data.shear.pieces.iter().map(|p| p.to);
    places.extend(inner.filter(|at| {
        let step = shape::value_before(&data.shear, *at) - shape::value_at(&data.shear, *at);
        *at >= data.length || step.abs() > tiny
    }));
    let bearing = |at: f64| data.bearings.iter().any(|b| (b - at).abs() < 1e-9);
    let mut values = Vec::new();
    for pair in places.windows(2) {
        let (from, to) = (pair[0], pair[1]);
        let room = (to - from) * per_metre;
        let rank = |at: f64, v: f64| v.abs() + if bearing(at) { most - least } else { 0.0 };
        let (start, end) = (shape::value_at(&data.shear, from), shape::value_before(&data.shear, to));
        let start = StepValue { at: from, value: start, side: 1.0, rank: rank(from, start), room };
        let end = StepValue { at: to, value: end, side: -1.0, rank: rank(to, end), room };
        let even = (start.value - end.value).abs() <= 0.004 * (most - least);
        let needed = bearing(from) || bearing(to);
        if room >= 2.0 * FIGURE + 4.0 && !even {
            values.extend([start, end]);
        } else if room >= FIGURE + 2.0 || needed {
            if !even && bearing(from) && bearing(to) {
                values.extend([start, end]);
            } else {
                part.left_out += usize::from(!even);
                values.push(if start.rank >= end.rank { start } else { end });
            }
        } else {
            part.left_out += if even { 1 } else { 2 };
        }
    }
    values.sort_by(|a, b| b.rank.total_cmp(&a.rank).then(a.at.total_cmp(&b.at)));
    values
}

/// Between curve and axis, 1.2 from the drop line, on its own side and then on the other; sideways by its own width;
/// then beyond the curve.
fn shear_places(map: &Mapping, step: &StepValue, width: f64) -> Vec<Place> {
    let x = map.x(step.at);
    let (curve, axis) = (map.y(step.value), map.y0);
    let inward = (axis - curve).signum();
    let heights = [0.5 * (curve + axis) + 0.3 * inward, axis - 2.0 * inward, curve + 2.0 * inward];
    let mut places = Vec::new();
    // Beyond the step only where no other step is near.
    let sides = if step.room >= 3.0 * FIGURE { vec![step.side, -step.side] } else { vec![step.side] };
    for side in sides {
        for y in heights {
            let at = |shift: f64| match side > 0.0 {
                true => right_of(x + 1.2 + shift, middle(y)),
                false => left_of(x - 1.2 - shift, middle(y)),
            };
            places.push(at(0.0));
            let farthest = (step.room - width - 2.4).clamp(0.0, width);
            if side == step.side && farthest > 1.0 {
                places.extend([at(0.5 * farthest), at(farthest)]);
            }
        }
    }
    let outside = middle(curve - 2.2 * inward);
    // Small values: across the axis, on the free side of it.
    let beyond = middle(axis + 2.2 * inward);
    for y in [outside, beyond] {
        places.push(if step.side > 0.0 { right_of(x + 1.2, y) } else { left_of(x - 1.2, y) });
    }
    places
}

pub(super) fn draw_moment(data: &Diagrams, sheet: &mut Sheet) -> Part {
    let mut part = Part { unit: "kNm", ..Part::default() };
    let (least, most) = shape::range(&data.moment);
    let scale = if most > least { MOMENT.1 / (most - least) } else { 0.0 };
    let axis = MOMENT.0 - least * scale;
    let map = sheet.map(axis, scale);
    sheet.within(MOMENT.0 - 5.6, MOMENT.0 + MOMENT.1 + 6.6);
    sheet.axis(axis, "moment axis");
    if let Some(path) = shape::drawn(&data.moment, &map) {
        sheet.curve(Line::Curve, path, "moment");
    }

    let size = most.max(-least);
    let mut peaks = shape::peaks(&data.moment);
    peaks.retain(|p| p.value.abs() > 0.02 * size);
    peaks.sort_by(|a, b| b.value.abs().total_cmp(&a.value.abs()).then(a.at.total_cmp(&b.at)));
    let decimals = common_decimals(peaks.iter().map(|p| p.value / 1e3));
    for peak in &peaks {
        let text = signed(peak.value / 1e3, decimals);
        if figures::is_zero(&text) {
            continue;
        }
        let extreme = |v: f64| (peak.value - v).abs() <= 1e-9 * size;
        let unit = if extreme(most) || extreme(least) { "kNm" } else { "" };
        let after = format!(" at {}", figures::place(peak.at));
        let runs = value_and(text.clone(), unit, after.clone());
        let width = letters::width(&runs, Size::Diagram);
        let (x, y) = (map.x(peak.at), map.y(peak.value));
        let sagging = peak.value > 0.0;
        let beyond = if sagging { below(y, 1.4) } else { y - 1.4 };
        let away = if sagging { 1.2 } else { -1.2 };
        let mut places: Vec<Place> = sideways(centred(x, beyond), width).collect();
        places.extend(sideways(centred(x, beyond + away), width));
        let inside = if sagging { y - 2.0 } else { below(y, 2.0) };
        places.extend(sideways(centred(x, inside), width));
        if !sheet.placer.place(&mut sheet.drawing, Size::Diagram, &runs, places) {
            part.displaced.push(value_and(text, "kNm", after));
        }
    }
    tension_side(sheet, &map, most > -least);
    part
}

/// The words that say on which side the moment is drawn, once, where there is room near the axis.
fn tension_side(sheet: &mut Sheet, map: &Mapping, sagging: bool) {
    let length = super::AXIS;
    let y = if sagging { below(map.y0, 1.6) } else { map.y0 - 1.6 };
    let away = if sagging { 1.0 } else { -1.0 };
    let shares = [0.72, 0.66, 0.6, 0.5, 0.4, 0.3, 0.8, 0.2, 0.88, 0.12];
    let places = (0..4).flat_map(|n| {
        let y = y + away * 1.5 * f64::from(n);
        shares.map(|share| centred(map.x0 + share * length, y))
    });
    let outside =
        shares.map(|share| centred(map.x0 + share * length, map.y0 - away * 1.6 + if sagging { 0.0 } else { 1.9 }));
    let places: Vec<Place> = places.chain(outside).collect();
    sheet.placer.place(&mut sheet.drawing, Size::Diagram, &words("on the tension side"), places);
}
