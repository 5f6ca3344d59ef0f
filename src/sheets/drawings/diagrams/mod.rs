//! A member's diagrams, one above the other on a common axis: loading, shear, moment, deflection.
//!
//! Curves are calc's polynomials; values stand at the points that matter, placed so that no label covers another or
//! stands on a curve. A value that finds no room stands in the outer column and names its place.

mod deflection;
mod forces;
mod loading;
mod said;

pub(super) use said::listed;

use sagledger_calc::building::{Building, Carrier};
use sagledger_calc::results::{Curve, ForceSource, Results};

use super::figures;
use super::labels::{Column, Placer, TEXT, WIDE};
use super::letters::{Face, Run, run};
use super::scene::{Align, Drawing, Line, Path, Rect, Size, point};
use super::shape::Mapping;

/// Where the axis begins, and how long it is on paper.
const INSET: f64 = 4.0;
const AXIS: f64 = TEXT - 2.0 * INSET;
/// Tops of the four diagrams, and how high each may be drawn.
const LOADING: (f64, f64) = (0.0, 22.0);
const SHEAR: (f64, f64) = (32.0, 22.0);
const MOMENT: (f64, f64) = (64.0, 21.0);
const DEFLECTION: (f64, f64) = (97.0, 28.0);
const RULER: f64 = 130.4;
const HEIGHT: f64 = 137.0;

/// What is drawn: SI throughout, places along the member from its first end.
#[derive(Clone, Debug)]
pub struct Diagrams {
    pub mark: String,
    pub length: f64,
    /// "from the spine wall".
    pub from: String,
    pub bearings: Vec<f64>,
    /// Name of the combination of loading, shear and moment, and of the one of the deflections.
    pub strength: String,
    pub characteristic: String,
    pub bands: Vec<Band>,
    pub forces: Vec<PointForce>,
    pub shear: Curve,
    pub moment: Curve,
    pub own: Curve,
    pub stacked: Curve,
}

/// A distributed load, straight between its ends; N/m, positive downward.
#[derive(Clone, Debug, PartialEq)]
pub struct Band {
    pub what: String,
    pub from: f64,
    pub to: f64,
    pub intensity: (f64, f64),
}

/// N, positive downward.
#[derive(Clone, Debug, PartialEq)]
pub struct PointForce {
    pub at: f64,
    pub force: f64,
    /// "from B1", or what the load row calls it.
    pub source: String,
}

impl Diagrams {
    /// The diagrams of one beam of a calculation. None for an index without a beam.
    pub fn of(building: &Building, results: &Results, beam: usize) -> Option<Diagrams> {
        let (typed, found) = (building.beams.get(beam)?, results.beams.get(beam)?);
        let drawn = &found.drawn;
        let name = |id| results.combinations.get(id).map_or_else(String::new, |c| c.name(&results.actions));
        let arranged = |name: String, absent: usize| match absent {
            0 => name,
            _ => format!("{name}, absent where it relieves"),
        };
        let row_name = |row: usize| found.rows.get(row).map_or_else(String::new, |r| r.what.clone());
        let bands = drawn.line_loads.iter().filter(|l| l.intensity.0.si() != 0.0 || l.intensity.1.si() != 0.0);
        let bands = bands.map(|load| Band {
            what: row_name(load.row),
            from: load.from.si(),
            to: load.to.si(),
            intensity: (load.intensity.0.si(), load.intensity.1.si()),
        });
        let forces = drawn.point_loads.iter().map(|load| PointForce {
            at: load.at.si(),
            force: load.force.si(),
            source: match load.source {
                ForceSource::Row(row) => row_name(row),
                ForceSource::Landing(landing) => {
                    let lands = found.landings.get(landing).and_then(|l| building.beams.get(l.beam));
                    lands.map_or_else(String::new, |b| format!("from {}", b.mark))
                }
            },
        });
        let first = typed.bearings.first().filter(|b| b.at.si() == 0.0);
        let from = match first.map(|b| b.on) {
            Some(Carrier::Wall(wall)) => {
                let name = building.walls.get(wall).map_or("", |w| w.name.as_str());
                if name.starts_with("the ") { format!("from {name}") } else { format!("from the {name}") }
            }
            Some(Carrier::Beam { beam, .. }) => {
                building.beams.get(beam).map_or_else(String::new, |b| format!("from {}", b.mark))
            }
            None => "from the first end".to_string(),
        };
        Some(Diagrams {
            mark: typed.mark.clone(),
            length: typed.length.si(),
            from,
            bearings: typed.bearings.iter().map(|b| b.at.si()).collect(),
            strength: arranged(name(drawn.strength), drawn.strength_arrangement.absent.len()),
            characteristic: arranged(name(drawn.characteristic), drawn.characteristic_arrangement.absent.len()),
            bands: joined(bands.filter(|b| b.from < b.to)),
            forces: forces.filter(|f| f.force != 0.0).collect(),
            shear: drawn.shear.clone(),
            moment: drawn.moment.clone(),
            own: drawn.own.clone(),
            stacked: drawn.stacked.clone(),
        })
    }

    /// The drawing.
    pub fn drawing(&self) -> Drawing {
        let mut sheet = Sheet::new(self);
        let names = [
            ("Loading", loading::draw(self, &mut sheet), self.strength.clone()),
            ("Shear", forces::draw_shear(self, &mut sheet), "the same combination".to_string()),
            ("Moment", forces::draw_moment(self, &mut sheet), "the same combination".to_string()),
        ];
        let deflection = deflection::draw(self, &mut sheet);
        sheet.drop_lines(self);
        sheet.ruler(self);

        let mut column = Column::new();
        let tops = [LOADING.0 + 4.4, SHEAR.0 + 2.0, MOMENT.0, DEFLECTION.0 + 2.0, RULER - 2.0];
        for ((name, part, combination), slot) in names.iter().zip(tops.windows(2)) {
            let note = part.note(&column, name, combination, slot[0], slot[1]);
            column.note(&mut sheet.drawing, slot[0], note);
        }
        let combination = format!("{}. {}", self.characteristic, deflection.scale);
        let note = deflection.note(&column, "Deflection", &combination, tops[3], tops[4]);
        column.note(&mut sheet.drawing, tops[3], note);
        let along = vec![
            vec![run(Face::Medium, format!("Along {}", self.mark)), run(Face::Regular, ", m")],
            vec![run(Face::Regular, self.from.clone())],
        ];
        let along = along.into_iter().flat_map(|line| fitted(&column, line)).collect();
        column.note(&mut sheet.drawing, RULER - 2.0, along);
        sheet.drawing.height = HEIGHT.max(column.next() - 2.0);
        sheet.drawing.alt = said::alt(self);
        sheet.drawing
    }
}

/// Pieces of one row, cut at bearings, become one band again where they continue each other in a straight line.
fn joined(pieces: impl Iterator<Item = Band>) -> Vec<Band> {
    let mut list: Vec<Band> = Vec::new();
    for next in pieces {
        let slope = |b: &Band| (b.intensity.1 - b.intensity.0) / (b.to - b.from);
        let size = next.intensity.0.abs().max(next.intensity.1.abs());
        let length = next.to - next.from;
        let continued = list.iter_mut().find(|b| {
            b.what == next.what
                && (b.to - next.from).abs() < 1e-9
                && (b.intensity.1 - next.intensity.0).abs() <= 1e-9 * size
                && ((slope(b) - slope(&next)) * length).abs() <= 1e-9 * size
        });
        match continued {
            Some(band) => (band.to, band.intensity.1) = (next.to, next.intensity.1),
            None => list.push(next),
        }
    }
    list
}

/// A line of the outer column; one that is too wide is broken and loses its weights.
fn fitted(column: &Column, line: Vec<Run>) -> Vec<Vec<Run>> {
    let text = super::letters::said(&line);
    let lines = column.wrap(Face::Medium, &text);
    if lines.len() == 1 { vec![line] } else { lines.into_iter().map(|l| vec![run(Face::Regular, l)]).collect() }
}

/// What one diagram leaves for the outer column.
#[derive(Default)]
struct Part {
    /// The unit after the diagram's name.
    unit: &'static str,
    /// Labels that found no place, the most important first, each naming its place.
    displaced: Vec<Vec<Run>>,
    /// Values that stand too close together to be given at all.
    left_out: usize,
    /// "Drawn 2 times full size."
    scale: String,
}

impl Part {
    /// The note from `top` down; displaced labels take what room is left above `end`.
    fn note(&self, column: &Column, name: &str, combination: &str, top: f64, end: f64) -> Vec<Vec<Run>> {
        let mut note = vec![vec![run(Face::Medium, name), run(Face::Regular, format!(", {}", self.unit))]];
        note.extend(column.wrap(Face::Regular, combination).into_iter().map(|l| vec![run(Face::Regular, l)]));
        let mut room = column.lines_between(top, end).saturating_sub(note.len());
        let wanted: Vec<Vec<Vec<Run>>> = self.displaced.iter().map(|line| fitted(column, line.clone())).collect();
        let all = wanted.iter().map(Vec::len).sum::<usize>();
        let mut left_out = self.left_out;
        if all + usize::from(left_out > 0) > room {
            room = room.saturating_sub(1);
        }
        for lines in wanted {
            if lines.len() <= room {
                room -= lines.len();
                note.extend(lines);
            } else {
                room = 0;
                left_out += 1;
            }
        }
        if left_out > 0 {
            note.push(vec![run(Face::Regular, format!("and {left_out} more, too close to figure"))]);
        }
        note
    }
}

/// The paper while it is drawn on.
struct Sheet {
    drawing: Drawing,
    placer: Placer,
    x0: f64,
    per_metre: f64,
}

impl Sheet {
    fn new(data: &Diagrams) -> Sheet {
        Sheet {
            drawing: Drawing::new("member-diagrams", WIDE, HEIGHT),
            placer: Placer::new(Rect::new(0.0, 0.0, TEXT, HEIGHT)),
            x0: INSET,
            per_metre: if data.length > 0.0 { AXIS / data.length } else { 0.0 },
        }
    }

    fn map(&self, y0: f64, per_unit: f64) -> Mapping {
        Mapping { x0: self.x0, per_metre: self.per_metre, y0, per_unit }
    }

    /// Labels now belong to the diagram between these heights.
    fn within(&mut self, top: f64, bottom: f64) {
        self.placer.frame = Rect::new(0.0, top, TEXT, bottom);
    }

    /// The same, short of the ruler at the right.
    fn within_ruler(&mut self, top: f64, bottom: f64) {
        self.placer.frame = Rect::new(0.0, top, INSET + AXIS + 1.0, bottom);
    }

    fn axis(&mut self, y: f64, tag: &str) {
        let (a, b) = (point(self.x0, y), point(self.x0 + AXIS, y));
        self.drawing.tagged(Line::Axis, Path::line(a, b), tag);
    }

    /// A curve that labels keep off.
    fn curve(&mut self, line: Line, path: Path, tag: &str) {
        self.placer.avoid(&path);
        self.drawing.tagged(line, path, tag);
    }

    /// Thin lines through all diagrams at bearings and concentrated loads; where these stand too close together for
    /// print, bearings come first.
    fn drop_lines(&mut self, data: &Diagrams) {
        let mut kept: Vec<f64> = Vec::new();
        let ends = [0.0, data.length];
        let places = data.bearings.iter().chain(&ends).chain(data.forces.iter().map(|f| &f.at));
        for at in places {
            let x = self.x0 + self.per_metre * at;
            if kept.iter().all(|k| (k - x).abs() >= 1.2) {
                kept.push(x);
            }
        }
        kept.sort_by(f64::total_cmp);
        let paths = kept.iter().map(|x| Path::line(point(*x, LOADING.0), point(*x, RULER)));
        self.drawing.strokes_of(Line::Drop, paths.collect(), None);
    }

    /// The ruler at the foot: three kinds of tick, figures at the longest.
    fn ruler(&mut self, data: &Diagrams) {
        let end = self.x0 + AXIS;
        self.drawing.tagged(Line::Ruler, Path::line(point(self.x0, RULER), point(end, RULER)), "ruler");
        let steps = [(0.01, 10), (0.02, 10), (0.05, 20), (0.1, 10), (0.2, 10), (0.5, 10), (1.0, 10), (2.0, 10)];
        let (fine, long) = steps.into_iter().find(|(fine, _)| fine * self.per_metre >= 0.85).unwrap_or((5.0, 10));
        let ticks = (data.length / fine + 1e-9).floor() as usize;
        let mut paths = Vec::new();
        let last = vec![run(Face::Regular, format!("{} m", figures::fixed(data.length, 2)))];
        let last_box = {
            let at = point((end + 4.0).min(TEXT + 1.0), RULER + 4.6);
            self.drawing.text(at, Align::Right, Size::Diagram, last)
        };
        let decimals = if fine * (long as f64) < 0.95 { 1 } else { 0 };
        for n in 0..=ticks {
            let x = self.x0 + self.per_metre * fine * n as f64;
            let tick = match n {
                n if n % long == 0 => 2.0,
                n if n % (long / 2) == 0 => 1.4,
                _ => 0.8,
            };
            paths.push(Path::line(point(x, RULER), point(x, RULER + tick)));
            if n % long == 0 {
                let text = figures::fixed(fine * n as f64, if n == 0 { 0 } else { decimals });
                let runs = vec![run(Face::Regular, text)];
                let width = super::letters::width(&runs, Size::Diagram);
                if x + width / 2.0 + 1.2 < last_box.left {
                    self.drawing.text(point(x, RULER + 4.6), Align::Center, Size::Diagram, runs);
                }
            }
        }
        paths.push(Path::line(point(end, RULER), point(end, RULER + 2.0)));
        self.drawing.strokes_of(Line::RulerTick, paths, None);
    }
}

/// "+54.2 kNm" in the weight of values; without a unit where `unit` is empty.
fn value(text: impl Into<String>, unit: &str) -> Vec<Run> {
    let mut runs = vec![run(Face::SemiBold, text)];
    if !unit.is_empty() {
        runs.push(run(Face::Unit, format!("\u{a0}{unit}")));
    }
    runs
}

/// The same followed by words in Regular.
fn value_and(text: impl Into<String>, unit: &str, after: impl Into<String>) -> Vec<Run> {
    let mut runs = value(text, unit);
    runs.push(run(Face::Regular, after));
    runs
}
