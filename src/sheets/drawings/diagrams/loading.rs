//! The loading: bands stacked on the beam's line, uplift hanging below it, concentrated loads as arrows.

use super::super::figures::{self, common_decimals};
use super::super::labels::{COLUMN_WIDTH, Place, centred, left_of, middle, right_of, sideways};
use super::super::letters::{self, Face, Run, run, words};
use super::super::scene::{Line, Path, Point, Rect, Size, point};
use super::{Band, Diagrams, LOADING, Part, PointForce, Sheet, value, value_and};

/// Length of the arrow of a concentrated load.
const ARROW: f64 = 7.6;
/// Room for figures above bands without arrows.
const FIGURES: f64 = 3.4;
/// Pitch of a label in two lines.
const PITCH: f64 = 3.1;

/// Straight between breaks: at each break the sum just left and just right of it.
struct Profile {
    breaks: Vec<f64>,
    left: Vec<f64>,
    right: Vec<f64>,
}

impl Profile {
    fn level(breaks: &[f64]) -> Profile {
        Profile { breaks: breaks.to_vec(), left: vec![0.0; breaks.len()], right: vec![0.0; breaks.len()] }
    }

    fn raised_by(&self, band: &Band) -> Profile {
        let at = |x: f64| {
            let share = (x - band.from) / (band.to - band.from);
            band.intensity.0 + share * (band.intensity.1 - band.intensity.0)
        };
        let mut next = Profile::level(&self.breaks);
        for (n, x) in self.breaks.iter().enumerate() {
            let left = if *x > band.from && *x <= band.to { at(*x) } else { 0.0 };
            let right = if *x >= band.from && *x < band.to { at(*x) } else { 0.0 };
            next.left[n] = self.left[n] + left;
            next.right[n] = self.right[n] + right;
        }
        next
    }

    fn at(&self, x: f64) -> f64 {
        let n = self.breaks.iter().rposition(|b| *b <= x).unwrap_or(0);
        if n + 1 >= self.breaks.len() {
            return self.left.last().copied().unwrap_or(0.0);
        }
        let share = (x - self.breaks[n]) / (self.breaks[n + 1] - self.breaks[n]);
        self.right[n] + share * (self.left[n + 1] - self.right[n])
    }

    fn most(&self) -> f64 {
        self.left.iter().chain(&self.right).fold(0.0, |most: f64, v| most.max(v.abs()))
    }
}

/// Even loads over the whole length become one band at the foot of the stack; the others follow in their order.
fn stacked(bands: &[Band], length: f64) -> Vec<Band> {
    let whole = |b: &&Band| b.from <= 0.0 && b.to >= length && b.intensity.0 == b.intensity.1;
    let even: Vec<&Band> = bands.iter().filter(whole).collect();
    let mut list = Vec::new();
    if !even.is_empty() {
        let mut names: Vec<&str> = even.iter().map(|b| b.what.as_str()).collect();
        // Own weight stands first among the rows and last in words.
        if names.first() == Some(&"own weight") {
            names.rotate_left(1);
        }
        let what = match names.as_slice() {
            [head @ .., last] if !head.is_empty() => format!("{} and {last}", head.join(", ")),
            names => names.concat(),
        };
        let sum = even.iter().map(|b| b.intensity.0).sum::<f64>();
        list.push(Band { what, from: 0.0, to: length, intensity: (sum, sum) });
    }
    list.extend(bands.iter().filter(|b| !whole(b)).cloned());
    list
}

pub(super) fn draw(data: &Diagrams, sheet: &mut Sheet) -> Part {
    let mut part = Part { unit: if data.forces.is_empty() { "kN/m" } else { "kN/m, kN" }, ..Part::default() };
    let mut breaks: Vec<f64> = vec![0.0, data.length];
    breaks.extend(data.bands.iter().flat_map(|b| [b.from, b.to]));
    breaks.retain(|b| (0.0..=data.length).contains(b));
    breaks.sort_by(f64::total_cmp);
    breaks.dedup();

    let pressing = |b: &Band| b.intensity.0 + b.intensity.1 >= 0.0;
    let (down, up): (Vec<Band>, Vec<Band>) = data.bands.iter().cloned().partition(pressing);
    let (down, up) = (stacked(&down, data.length), stacked(&up, data.length));
    let pile = |bands: &[Band]| -> Vec<Profile> {
        let mut levels = vec![Profile::level(&breaks)];
        for band in bands {
            let next = levels.last().map(|l| l.raised_by(band));
            levels.extend(next);
        }
        levels
    };
    let (above, below) = (pile(&down), pile(&up));
    let most = |levels: &[Profile]| levels.last().map_or(0.0, Profile::most);
    let (high, deep) = (most(&above), most(&below));
    let room = LOADING.1 - if data.forces.is_empty() { FIGURES } else { ARROW + 0.5 };
    let scale = if high + deep > 0.0 { room / (high + deep) } else { 0.0 };
    let base = LOADING.0 + LOADING.1 - deep * scale;
    let (x0, per_metre) = (sheet.x0, sheet.per_metre);
    let on_paper = move |x: f64, load: f64| point(x0 + per_metre * x, base - load * scale);

    sheet.within(LOADING.0, LOADING.0 + LOADING.1 + 4.6);
    let axis = Path::line(on_paper(0.0, 0.0), on_paper(data.length, 0.0));
    sheet.curve(Line::Member, axis, "loading axis");
    for levels in [&above, &below] {
        let Some((top, inner)) = levels.split_last() else { continue };
        if inner.is_empty() {
            continue;
        }
        for level in inner.iter().skip(1) {
            for path in outline(level, &on_paper, false) {
                sheet.placer.avoid(&path);
                sheet.drawing.stroke(Line::Edge, path);
            }
        }
        for path in outline(top, &on_paper, true) {
            sheet.curve(Line::Curve, path, "loading");
        }
    }
    bearings(data, sheet, base);
    arrows(data, sheet, &above, &on_paper);
    force_labels(data, sheet, &mut part, |x| on_paper(x, top_at(&above, x)));
    if let Some(total) = above.last().filter(|_| high > 0.0) {
        figures_of(data, sheet, &mut part, total, &on_paper, 1.0);
    }
    if let Some(total) = below.last().filter(|_| deep > 0.0) {
        figures_of(data, sheet, &mut part, total, &on_paper, -1.0);
    }
    band_names(sheet, &mut part, &down, &above, &on_paper);
    band_names(sheet, &mut part, &up, &below, &on_paper);
    part
}

fn top_at(levels: &[Profile], x: f64) -> f64 {
    levels.last().map_or(0.0, |l| l.at(x).max(0.0))
}

/// The line along a profile, broken where there is nothing; with its upright sides where `sides`.
fn outline(profile: &Profile, on_paper: &dyn Fn(f64, f64) -> Point, sides: bool) -> Vec<Path> {
    let mut paths = Vec::new();
    let mut run: Vec<Point> = Vec::new();
    for n in 0..profile.breaks.len().saturating_sub(1) {
        let (x, next) = (profile.breaks[n], profile.breaks[n + 1]);
        let (from, to) = (profile.right[n], profile.left[n + 1]);
        if from == 0.0 && to == 0.0 {
            if let (true, Some(last)) = (sides && !run.is_empty(), run.last().copied()) {
                run.push(point(last.x, on_paper(x, 0.0).y));
            }
            if run.len() > 1 {
                paths.push(Path::straight(&run));
            }
            run.clear();
            continue;
        }
        if run.is_empty() && sides && from != 0.0 {
            run.push(on_paper(x, 0.0));
        }
        run.push(on_paper(x, from));
        run.push(on_paper(next, to));
    }
    if let (true, Some(last)) = (sides && !run.is_empty(), run.last().copied()) {
        run.push(point(last.x, on_paper(0.0, 0.0).y));
    }
    if run.len() > 1 {
        run.dedup();
        paths.push(Path::straight(&run));
    }
    paths
}

/// A small sign under the line at each bearing.
fn bearings(data: &Diagrams, sheet: &mut Sheet, base: f64) {
    for at in &data.bearings {
        let x = sheet.x0 + sheet.per_metre * at;
        let (top, foot, half) = (base + 0.35, base + 1.7, 1.1);
        let sign = [point(x, top), point(x - half, foot), point(x + half, foot), point(x, top)];
        sheet.drawing.stroke(Line::Bearing, Path::straight(&sign));
        sheet.placer.keep_off(Rect::new(x - half, base, x + half, foot));
    }
}

fn arrows(data: &Diagrams, sheet: &mut Sheet, above: &[Profile], on_paper: &dyn Fn(f64, f64) -> Point) {
    for force in &data.forces {
        let foot = on_paper(force.at, top_at(above, force.at));
        let near = point(foot.x, foot.y - 0.3);
        let far = point(foot.x, foot.y - ARROW);
        let (tail, tip) = if force.force >= 0.0 { (far, near) } else { (near, far) };
        sheet.placer.avoid(&Path::line(far, near));
        sheet.placer.keep_off(Rect::new(tip.x - 0.6, tip.y.min(tail.y), tip.x + 0.6, tip.y.max(tail.y)));
        sheet.drawing.arrow(tail, tip);
    }
}

/// Beside the arrows: in one line, else in two, else in the outer column.
fn force_labels(data: &Diagrams, sheet: &mut Sheet, part: &mut Part, top: impl Fn(f64) -> Point) {
    let decimals = common_decimals(data.forces.iter().map(|f| f.force / 1e3));
    let mut order: Vec<&PointForce> = data.forces.iter().collect();
    order.sort_by(|a, b| b.force.abs().total_cmp(&a.force.abs()));
    let mut unplaced: Vec<(&PointForce, String)> = Vec::new();
    for force in order {
        let figure = figures::fixed(force.force / 1e3, decimals);
        if figures::is_zero(&figure) {
            continue;
        }
        let foot = top(force.at);
        let tail = foot.y - ARROW;
        let one = value_and(figure.clone(), "kN", format!(" {}", force.source));
        let sides = |y: f64| [right_of(foot.x + 1.2, y), left_of(foot.x - 1.2, y)];
        let high = middle(tail + 1.4);
        let places = sides(high).into_iter().chain(sides(high + 1.5)).chain(sides(high + 3.0));
        if sheet.placer.place(&mut sheet.drawing, Size::Diagram, &one, places) {
            continue;
        }
        // In two lines, a long name shortened: the table of loads has it whole.
        let short = letters::shortened(Face::Regular, &force.source, Size::Diagram, 24.0);
        let two = [value(figure.clone(), "kN"), words(short)];
        if in_two_lines(sheet, &two, &sides(high)) || in_two_lines(sheet, &two, &sides(high + 1.5)) {
            continue;
        }
        unplaced.push((force, figure));
    }
    // Many of the same kind are said together.
    let mut done: Vec<&str> = Vec::new();
    for (force, figure) in &unplaced {
        let alike: Vec<_> = unplaced.iter().filter(|(f, _)| f.source == force.source).collect();
        if alike.len() < 3 {
            let place = figures::place(force.at);
            // One line each, so that none is left out.
            let bare = value_and(figure.clone(), "kN", format!(" at {place}"));
            let room = COLUMN_WIDTH - letters::width(&bare, Size::Note) - 1.5;
            let source = letters::shortened(Face::Regular, &force.source, Size::Note, room);
            part.displaced.push(value_and(figure.clone(), "kN", format!(" {source} at {place}")));
        } else if !done.contains(&force.source.as_str()) {
            done.push(&force.source);
            let at = alike.iter().map(|(f, _)| f.at);
            let (from, to) = at.fold((f64::MAX, f64::MIN), |(a, b), x| (a.min(x), b.max(x)));
            let figures = (alike.last().map(|(_, t)| t.as_str()).unwrap_or(""), figure.as_str());
            let sizes = if figures.0 == figures.1 {
                figures.1.to_string()
            } else {
                format!("{} to {}", figures.0, figures.1)
            };
            let words = format!(
                " each, {} × {}, {} to {}",
                alike.len(),
                force.source,
                figures::fixed(from, 2),
                figures::place(to)
            );
            part.displaced.push(value_and(sizes, "kN", words));
        }
    }
}

fn in_two_lines(sheet: &mut Sheet, lines: &[Vec<Run>; 2], places: &[Place]) -> bool {
    for place in places {
        let lower = Place { at: point(place.at.x, place.at.y + PITCH), ..*place };
        let fits = sheet.placer.finds(Size::Diagram, &lines[0], [*place])
            && sheet.placer.finds(Size::Diagram, &lines[1], [lower]);
        if fits {
            for (line, place) in lines.iter().zip([*place, lower]) {
                // The second line comes closer to the first than strangers may.
                sheet.drawing.text(place.at, place.align, Size::Diagram, line.clone());
                let rect = sheet.drawing.texts.last().map(|t| t.rect());
                sheet.placer.keep_off(rect.unwrap_or_default());
            }
            return true;
        }
    }
    false
}

/// The intensities of the whole at its ends, steps and bends; the unit on the greatest.
fn figures_of(
    data: &Diagrams,
    sheet: &mut Sheet,
    part: &mut Part,
    total: &Profile,
    on_paper: &dyn Fn(f64, f64) -> Point,
    side: f64,
) {
    let last = total.breaks.len() - 1;
    let slope = |n: usize| {
        let run = total.breaks[n + 1] - total.breaks[n];
        (total.left[n + 1] - total.right[n]) / run
    };
    let tiny = 1e-9 * total.most();
    // (place, value, which side of the place it belongs to: -1 left, 1 right, 0 both)
    let mut points: Vec<(f64, f64, i32)> = vec![(0.0, total.right[0], 1), (data.length, total.left[last], -1)];
    for n in 1..last {
        let (x, left, right) = (total.breaks[n], total.left[n], total.right[n]);
        if (left - right).abs() > tiny {
            points.extend([(x, left, -1), (x, right, 1)]);
        } else if (slope(n - 1) - slope(n)).abs() > tiny {
            points.push((x, left, 0));
        }
    }
    let decimals = common_decimals(points.iter().map(|p| p.1 / 1e3));
    points.sort_by(|a, b| b.1.abs().total_cmp(&a.1.abs()).then(a.0.total_cmp(&b.0)));
    let mut said: Vec<(f64, String, i32)> = Vec::new();
    for (n, (x, load, which)) in points.into_iter().enumerate() {
        let text = figures::fixed(load / 1e3, decimals);
        // A level stretch says its value once.
        let again = said.iter().any(|(at, other, side)| {
            *other == text && level_between(total, at.min(x), at.max(x)) && (*side != which || which == 0 || n > 0)
        });
        if figures::is_zero(&text) || again {
            continue;
        }
        said.push((x, text.clone(), which));
        let unit = if n == 0 { "kN/m" } else { "" };
        let runs = value(text.clone(), unit);
        let here = on_paper(x, load);
        let y = if side > 0.0 { here.y - 0.95 } else { here.y + 2.8 };
        let mut places: Vec<Place> = match which {
            -1 => vec![left_of(here.x - 1.2, y), left_of(here.x - 1.2, y - 1.0)],
            1 => vec![right_of(here.x + 1.2, y), right_of(here.x + 1.2, y - 1.0)],
            _ => vec![centred(here.x, y), right_of(here.x + 1.2, y), left_of(here.x - 1.2, y)],
        };
        let first = places[0];
        places.extend(sideways(first, 6.0));
        places.extend(places.clone().iter().map(|p| Place { at: point(p.at.x, p.at.y - side * 1.4), ..*p }));
        places
            .extend(places.clone().iter().take(3).map(|p| Place { at: point(p.at.x, p.at.y + side * 4.0), ..*p }));
        if !sheet.placer.place(&mut sheet.drawing, Size::Diagram, &runs, places) {
            part.displaced.push(value_and(text, "kN/m", format!(" at {}", figures::place(x))));
        }
    }
}

fn level_between(total: &Profile, from: f64, to: f64) -> bool {
    let inside = |x: f64| x > from && x < to;
    let at = total.at(0.5 * (from + to));
    let tiny = 1e-9 * total.most();
    from == to
        || total.breaks.iter().enumerate().all(|(n, x)| {
            !inside(*x) || ((total.left[n] - at).abs() <= tiny && (total.right[n] - at).abs() <= tiny)
        }) && (total.at(from + 0.01 * (to - from)) - at).abs() <= tiny
            && (total.at(to - 0.01 * (to - from)) - at).abs() <= tiny
}

/// Names inside the bands, where these are high enough.
fn band_names(
    sheet: &mut Sheet,
    part: &mut Part,
    bands: &[Band],
    levels: &[Profile],
    on_paper: &dyn Fn(f64, f64) -> Point,
) {
    for (n, band) in bands.iter().enumerate() {
        let (lower, upper) = (&levels[n], &levels[n + 1]);
        let runs = words(band.what.clone());
        let mut places = Vec::new();
        // From the middle outward, a little right of it first.
        for share in [0.56, 0.44, 0.68, 0.32, 0.8, 0.2, 0.5, 0.9, 0.1] {
            let x = band.from + share * (band.to - band.from);
            let (a, b) = (on_paper(x, lower.at(x)), on_paper(x, upper.at(x)));
            if (a.y - b.y).abs() >= 3.0 {
                places.push(centred(a.x, middle(0.5 * (a.y + b.y))));
            }
        }
        if !sheet.placer.place(&mut sheet.drawing, Size::Diagram, &runs, places) {
            let place = if n == 0 && bands.len() > 1 { "lowest: " } else { "" };
            part.displaced.push(vec![run(Face::Regular, format!("{place}{}", band.what))]);
        }
    }
}
