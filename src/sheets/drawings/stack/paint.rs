//! The lines and figures of a stack drawing.

use sagledger_calc::results::Curve;

use super::super::figures::{self, place, tenth};
use super::super::labels::{Place, below, centred, left_of, middle, right_of, sideways};
use super::super::letters::{self, Face, Run, run, words};
use super::super::scene::{Align, Line, Path, Point, Rect, Size, point};
use super::super::shape::{self, Mapping, Peak};
use super::{Governing, LEFT, PAPER, Sheet};

/// Movements below this are not drawn apart, in m.
const NOTHING: f64 = 0.5e-6;
/// Half the length of the dashed line of a limit.
const LIMIT_HALF: f64 = 12.0;

/// The turning point of greatest size.
pub(super) fn greatest(curve: &Curve) -> Option<Peak> {
    let most = |best: Option<Peak>, peak: Peak| match best {
        Some(b) if b.value.abs() >= peak.value.abs() => Some(b),
        _ => Some(peak),
    };
    shape::peaks(curve).into_iter().fold(None, most)
}

fn figure(movement: f64) -> Run {
    run(Face::SemiBold, tenth(movement * 1e3))
}

impl Sheet<'_> {
    pub(super) fn level(&self, row: usize) -> f64 {
        self.levels.get(row).copied().unwrap_or(0.0)
    }

    fn map(&self, member: usize) -> Option<Mapping> {
        let placed = self.page.find(member)?;
        let (x0, per_metre) = (LEFT + placed.x, self.layout.per_metre());
        Some(Mapping { x0, per_metre, y0: self.level(placed.row), per_unit: 1e3 * self.k })
    }

    /// Undeformed line, chord, deflected line, walls and landings of one beam.
    pub(super) fn lines(&mut self, member: usize) {
        let Some((map, beam)) = self.map(member).zip(self.stack.moved(member)) else { return };
        let place = &self.stack.places[member];
        let (left, right) = (map.point(0.0, 0.0), map.point(place.length, 0.0));
        let undeformed = Path::line(left, right);
        self.placer.avoid(&undeformed);
        self.drawing.tagged(Line::Undeformed, undeformed, format!("undeformed {}", beam.mark));
        if self.figures && beam.seats.iter().any(|s| s.abs() > NOTHING) {
            let chord: Vec<Point> = place.seats.iter().zip(&beam.seats).map(|(s, m)| map.point(s.at, *m)).collect();
            let path = Path::straight(&chord);
            self.placer.avoid(&path);
            self.drawing.tagged(Line::Chord, path, format!("chord {}", beam.mark));
        }
        for (n, (seat, moved)) in place.seats.iter().zip(&beam.seats).enumerate() {
            let at = map.point(seat.at, *moved);
            match seat.on {
                None => {
                    self.drawing.wall(at);
                    self.placer.keep_off(Rect::new(at.x - 3.0, at.y, at.x + 2.4, at.y + 2.0));
                }
                Some((carrier, lands)) => self.landing(member, n, at, carrier, lands),
            }
        }
        if let Some(path) = shape::drawn(&beam.stacked, &map) {
            self.placer.avoid(&path);
            self.drawing.tagged(Line::Deflected, path, format!("stacked {}", beam.mark));
        }
    }

    /// The dotted line from a bearing to the deflected line of its carrier, or its first piece where it is cut.
    fn landing(&mut self, member: usize, seat: usize, at: Point, carrier: usize, lands: f64) {
        let foot = self.landing_foot(member, seat, carrier, lands).unwrap_or(point(at.x, at.y + 4.5));
        let line = Path::line(at, foot);
        self.placer.avoid(&line);
        let mark = self.stack.moved(member).map_or("", |b| b.mark.as_str());
        self.drawing.tagged(Line::Dotted, line, format!("landing {mark} {seat}"));
    }

    fn landing_foot(&self, member: usize, seat: usize, carrier: usize, lands: f64) -> Option<Point> {
        let joined = self.layout.joined(self.page, &self.stack.places, member, seat, PAPER.clear - 1e-3);
        let (map, beam) = self.map(carrier).zip(self.stack.moved(carrier))?;
        joined.then(|| map.point(lands, shape::value_at(&beam.stacked, lands)))
    }

    pub(super) fn mark(&mut self, member: usize) {
        let Some((map, beam)) = self.map(member).zip(self.stack.moved(member)) else { return };
        let runs = vec![run(Face::SemiBold, beam.mark.clone())];
        let y = map.y0 - 1.8;
        let length = self.stack.places[member].length * map.per_metre;
        let along = (0..=(length / 1.5) as i32).map(|n| right_of(map.x0 + 1.5 * f64::from(n), y));
        let higher = (0..8).map(|n| right_of(map.x0 + 1.5 * f64::from(n), y - 2.8));
        let beside = [left_of(map.x0 - 3.4, map.y0 + 0.9), right_of(map.x0 + length + 3.4, map.y0 + 0.9)];
        let back = (1..24).map(|n| right_of(map.x0 - 1.5 * f64::from(n), y));
        let places = along.chain(higher).chain(beside).chain(back);
        self.placer.place(&mut self.drawing, Size::Diagram, &runs, places);
    }

    /// The ruler in mm beside a beam, zero on the undeformed line: right of it, else left.
    pub(super) fn mm_ruler(&mut self, member: usize) {
        let Some((map, beam)) = self.map(member).zip(self.stack.moved(member)) else { return };
        let (least, most) = shape::range(&beam.stacked);
        let (fine, figured) = match self.k {
            k if k >= 1.0 => (1.0, if k >= 5.0 { 1.0 } else { 10.0 }),
            k => (1.0 / k, 10.0 / k),
        };
        let last = (most * 1e3 / figured - 1e-9).ceil().max(1.0) * figured;
        let first = (least * 1e3 / fine + 0.2).floor().min(0.0) * fine;
        let y = |mm: f64| map.y0 + mm * self.k;
        let (left, right) = (map.x0, map.x(self.stack.places[member].length));
        let (top, foot) = (y(first) - 1.2, y(last) + 1.2);
        let to_right = |x: f64| Rect::new(x - 0.3, top, x + 7.6, foot);
        let to_left = |x: f64| Rect::new(x - 7.6, top, x + 0.3, foot);
        let rights = [4.4, 5.6, 8.0, 2.4, 12.0].map(|d| (right + d, to_right(right + d)));
        let lefts = [5.6, 8.0, 4.2, 12.0].map(|d| (left - d, to_left(left - d)));
        let ends = |side: usize| {
            let seats = &self.stack.places[member].seats;
            let seat = if side == 0 { seats.first() } else { seats.last() };
            seat.is_some_and(|s| s.on.is_none())
        };
        // Beyond the end that stands on no wall.
        let order: Vec<(f64, Rect)> = if ends(1) && !ends(0) {
            lefts.into_iter().chain(rights).collect()
        } else {
            rights.into_iter().chain(lefts).collect()
        };
        let frame = Rect::new(-3.5, 0.0, 125.6, self.drawing.height.max(foot));
        let mut placer = self.placer.clone();
        placer.frame = frame;
        let Some((x, rect)) = order.into_iter().find(|(_, rect)| placer.is_free(rect)) else { return };
        self.placer.keep_off(rect);
        let side = if x > left { 1.0 } else { -1.0 };
        let mut ticks = Vec::new();
        let count = ((last - first) / fine).round() as i64;
        for n in 0..=count {
            let mm = first + n as f64 * fine;
            let on = |step: f64| ((mm / step) - (mm / step).round()).abs() < 1e-6;
            let length = if on(figured) {
                2.2
            } else if on(figured / 2.0) {
                1.5
            } else {
                0.9
            };
            ticks.push(Path::line(point(x, y(mm)), point(x + side * length, y(mm))));
            if on(figured) {
                let align = if side > 0.0 { Align::Left } else { Align::Right };
                let at = point(x + side * 2.9, middle(y(mm)));
                self.drawing.text(at, align, Size::Diagram, words(figures::fixed(mm, 0)));
            }
        }
        let upright = Path::line(point(x, y(first)), point(x, y(last)));
        self.drawing.tagged(Line::Ruler, upright, format!("mm ruler {}", beam.mark));
        self.drawing.strokes_of(Line::RulerTick, ticks, None);
        self.drawing.height = self.drawing.height.max(foot);
        self.placer.frame.bottom = self.drawing.height;
    }

    /// The upright at the governing point, its dot, and the limit.
    pub(super) fn governing_lines(&mut self, g: &Governing) {
        let Some(map) = self.map(g.member) else { return };
        let (top, foot) = (map.point(g.at, 0.0), map.point(g.at, g.total));
        let upright = Path::line(top, foot);
        self.placer.avoid(&upright);
        self.drawing.tagged(Line::Chord, upright, "governing");
        self.drawing.dot(foot, 0.9);
        self.placer.keep_off(Rect::new(foot.x - 0.9, foot.y - 0.9, foot.x + 0.9, foot.y + 0.9));
        let Some(limit) = g.limit else { return };
        let size = if g.total < 0.0 { -limit } else { limit };
        let y = map.y(size);
        // A limit that reaches into the next level is only said.
        if self.shows_limit(g.member, limit) {
            let (left, right) = (foot.x - LIMIT_HALF, foot.x + LIMIT_HALF);
            let line = Path::line(point(left.max(-1.0), y), point(right, y));
            self.placer.avoid(&line);
            self.drawing.tagged(Line::Left, line, "limit");
            self.drawing.height = self.drawing.height.max(y + 5.0);
            self.placer.frame.bottom = self.drawing.height;
        }
    }

    fn shows_limit(&self, member: usize, limit: f64) -> bool {
        let row = self.page.find(member).map_or(0, |p| p.row);
        let next = self.levels.get(row + 1).map_or(f64::from(u8::MAX), |next| next - self.level(row));
        limit * 1e3 * self.k < next.min(60.0) - 14.0
    }

    pub(super) fn governing_figures(&mut self, g: &Governing) {
        let Some(map) = self.map(g.member) else { return };
        let (x, foot) = (map.x(g.at), map.y(g.total));
        let chord = map.y(g.inherited + g.settled);
        let down = g.total >= 0.0;
        let total = vec![figure(g.total)];
        let beside = |y: f64| [left_of(x - 1.7, y), left_of(x - 3.2, y), right_of(x + 1.7, y)];
        let up = if down { -1.0 } else { 1.0 };
        let places = [middle(foot + 2.6 * up), middle(foot + 4.2 * up), middle(foot - 2.6 * up)];
        let mut places: Vec<Place> = places.into_iter().flat_map(beside).collect();
        places.extend([1.7, 2.6].map(|d| centred(x, if down { below(foot, d) } else { foot - d })));
        self.placer.place(&mut self.drawing, Size::Diagram, &total, places);
        let mut parts = vec![("own ", g.own, chord, foot)];
        if (g.inherited + g.settled).abs() > NOTHING {
            let name = if g.settled.abs() > NOTHING { "inherited, settled " } else { "inherited " };
            parts.insert(0, (name, g.inherited + g.settled, map.y0, chord));
        }
        for (name, movement, from, to) in parts {
            let mut runs = words(name);
            runs.push(figure(movement));
            let centre = 0.5 * (from + to);
            let heights = [0.0, 0.8, -0.8, 1.6, -1.6, 2.4, -2.4].map(|d| middle(centre + d));
            let rights = heights.into_iter().map(|y| right_of(x + 1.5, y));
            let lefts = heights.into_iter().map(|y| left_of(x - 1.5, y));
            self.placer.place(&mut self.drawing, Size::Diagram, &runs, rights.chain(lefts));
        }
        if let Some(limit) = g.limit {
            let y = map.y(if down { limit } else { -limit });
            let runs = vec![run(Face::Regular, "limit "), run(Face::SemiBold, tenth(limit * 1e3))];
            let under = sideways(centred(x, below(y, 1.3)), 14.0).chain(sideways(centred(x, y - 1.0), 10.0));
            if self.shows_limit(g.member, limit) {
                self.placer.place(&mut self.drawing, Size::Diagram, &runs, under);
            }
        }
    }

    /// The movement that a bearing and its landing share, once, on the dotted line.
    pub(super) fn landing_figures(&mut self, member: usize) {
        let Some((map, beam)) = self.map(member).zip(self.stack.moved(member)) else { return };
        for (n, (seat, moved)) in self.stack.places[member].seats.iter().zip(&beam.seats).enumerate() {
            let Some((carrier, lands)) = seat.on else { continue };
            let at = map.point(seat.at, *moved);
            match self.landing_foot(member, n, carrier, lands) {
                Some(foot) => {
                    let runs = vec![run(Face::Regular, "both ends "), figure(*moved)];
                    let centre = at.y + 0.35 * (foot.y - at.y);
                    let heights = (0..12).flat_map(|n| [centre + 1.5 * f64::from(n), centre - 1.5 * f64::from(n)]);
                    let heights: Vec<f64> = heights.filter(|y| *y > at.y + 2.0 && *y < foot.y - 1.0).collect();
                    let lefts = heights.iter().map(|y| left_of(at.x - 1.5, middle(*y)));
                    let rights = heights.iter().map(|y| right_of(at.x + 1.5, middle(*y)));
                    self.placer.place(&mut self.drawing, Size::Diagram, &runs, lefts.chain(rights));
                }
                None => {
                    let on = format!(" on {} at {}", beam.on.get(n).map_or("", String::as_str), place(lands));
                    let runs = vec![figure(*moved), run(Face::Regular, on)];
                    let heights = [3.2, 5.0, 6.8, 8.6, 10.4].map(|d| at.y + d);
                    let sides = heights.into_iter().flat_map(|y| [left_of(at.x - 1.3, y), right_of(at.x + 1.3, y)]);
                    let under = heights.into_iter().flat_map(|y| sideways(centred(at.x, y + 5.0), 12.0));
                    self.placer.place(&mut self.drawing, Size::Diagram, &runs, sides.chain(under));
                }
            }
        }
    }

    /// The greatest movement of a beam whose governing point is not written out.
    pub(super) fn greatest(&mut self, member: usize) {
        let Some((map, beam)) = self.map(member).zip(self.stack.moved(member)) else { return };
        let Some(most) = greatest(&beam.stacked).filter(|p| p.value.abs() > NOTHING) else { return };
        let (x, y) = (map.x(most.at), map.y(most.value));
        self.drawing.dot(point(x, y), 0.75);
        let runs = vec![figure(most.value), run(Face::Regular, format!(" at {}", place(most.at)))];
        let width = letters::width(&runs, Size::Diagram);
        let down = most.value >= 0.0;
        let beyond = |d: f64| if down { below(y, d) } else { y - d };
        let places = [1.7, 2.6, 3.6].into_iter().flat_map(|d| sideways(centred(x, beyond(d)), width));
        let inside = sideways(centred(x, if down { y - 2.2 } else { below(y, 2.2) }), width);
        let across = [1.2, 2.4, 3.6]
            .into_iter()
            .flat_map(|d| sideways(centred(x, if down { map.y0 - d } else { below(map.y0, d) }), width));
        self.placer.place(&mut self.drawing, Size::Diagram, &runs, places.chain(inside).chain(across));
    }
}
