//! What a drawing is made of: strokes, areas, dots and texts with places on paper, in mm from the top left corner
//! of the drawing, y downward. Styles travel by name; `templates/drawings/scene.typ` gives them ink.

use serde::ser::SerializeSeq;
use serde::{Serialize, Serializer};

use super::letters::{self, Run};

#[derive(Clone, Copy, Debug, PartialEq, Default)]
pub struct Point {
    pub x: f64,
    pub y: f64,
}

pub const fn point(x: f64, y: f64) -> Point {
    Point { x, y }
}

/// An upright rectangle: left, top, right, bottom.
#[derive(Clone, Copy, Debug, PartialEq, Default)]
pub struct Rect {
    pub left: f64,
    pub top: f64,
    pub right: f64,
    pub bottom: f64,
}

impl Rect {
    pub const fn new(left: f64, top: f64, right: f64, bottom: f64) -> Rect {
        Rect { left, top, right, bottom }
    }

    pub fn overlaps(&self, other: &Rect) -> bool {
        self.left < other.right && other.left < self.right && self.top < other.bottom && other.top < self.bottom
    }

    pub fn contains(&self, other: &Rect) -> bool {
        self.left <= other.left && self.top <= other.top && self.right >= other.right && self.bottom >= other.bottom
    }

    pub fn grown(&self, by: f64) -> Rect {
        Rect::new(self.left - by, self.top - by, self.right + by, self.bottom + by)
    }

    /// Whether any part of the straight line between two points lies inside (Liang and Barsky's clipping).
    pub fn meets(&self, a: Point, b: Point) -> bool {
        let (dx, dy) = (b.x - a.x, b.y - a.y);
        let (mut enter, mut leave) = (0.0_f64, 1.0_f64);
        let sides =
            [(-dx, a.x - self.left), (dx, self.right - a.x), (-dy, a.y - self.top), (dy, self.bottom - a.y)];
        for (towards, room) in sides {
            if towards == 0.0 {
                if room < 0.0 {
                    return false;
                }
            } else if towards < 0.0 {
                enter = enter.max(room / towards);
            } else {
                leave = leave.min(room / towards);
            }
        }
        enter <= leave
    }
}

/// How a line is drawn; widths and dashes stand in the template.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash, Serialize)]
#[serde(rename_all = "kebab-case")]
pub enum Line {
    /// Outline of a section.
    Outline,
    /// Diagrams of loading, shear and moment.
    Curve,
    Member,
    /// This member, in a small chain.
    MemberHere,
    /// Other members, in a small chain.
    MemberOther,
    Bearing,
    /// Fine strokes that stand for the ground or masonry below a bearing.
    Hatch,
    Axis,
    AxisOfSymmetry,
    Limit,
    Dimension,
    DimensionTick,
    Deflected,
    Undeformed,
    Chord,
    ChordDashed,
    /// A landing: from a bearing down to the beam that carries it.
    Dotted,
    Drop,
    Own,
    Stacked,
    Arrow,
    Ruler,
    RulerTick,
    /// Edge of a band of load or of a bar.
    Edge,
    /// What is left of a limit.
    Left,
    LimitTick,
}

impl Line {
    /// Drop lines and axes may be interrupted by the halo of a label; everything else lies over halos.
    fn under_halos(self) -> bool {
        matches!(self, Line::Drop | Line::Axis)
    }

    /// Lines that a label never stands on.
    pub fn keeps_labels_off(self) -> bool {
        !matches!(self, Line::Drop | Line::Axis | Line::AxisOfSymmetry | Line::Dimension | Line::RulerTick)
    }
}

#[derive(Clone, Copy, Debug, PartialEq, Eq, Serialize)]
#[serde(rename_all = "kebab-case")]
pub enum Fill {
    Solid,
    #[serde(rename = "tint-10")]
    Tint10,
    #[serde(rename = "tint-25")]
    Tint25,
    White,
}

/// One step of a path after its start.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Step {
    To(Point),
    /// A cubic Bézier curve: two control points and the end.
    Cubic(Point, Point, Point),
}

impl Step {
    pub fn end(&self) -> Point {
        match self {
            Step::To(end) | Step::Cubic(_, _, end) => *end,
        }
    }
}

/// A pen stroke without lifting.
#[derive(Clone, Debug, PartialEq)]
pub struct Path {
    pub start: Point,
    pub steps: Vec<Step>,
}

impl Path {
    pub fn straight(points: &[Point]) -> Path {
        let start = points.first().copied().unwrap_or_default();
        Path { start, steps: points.iter().skip(1).map(|p| Step::To(*p)).collect() }
    }

    pub fn line(a: Point, b: Point) -> Path {
        Path::straight(&[a, b])
    }

    pub fn rectangle(r: Rect) -> Path {
        Path::straight(&[
            point(r.left, r.top),
            point(r.right, r.top),
            point(r.right, r.bottom),
            point(r.left, r.bottom),
            point(r.left, r.top),
        ])
    }

    /// Points along the path, close enough together for distances of 0.02 mm.
    pub fn flattened(&self) -> Vec<Point> {
        let mut points = vec![self.start];
        let mut from = self.start;
        for step in &self.steps {
            match *step {
                Step::To(end) => points.push(end),
                Step::Cubic(a, b, end) => {
                    let parts = 24;
                    for n in 1..=parts {
                        let t = f64::from(n) / f64::from(parts);
                        let (u, v) = (1.0 - t, t);
                        let mix = |p: f64, q: f64, r: f64, s: f64| {
                            u * u * u * p + 3.0 * u * u * v * q + 3.0 * u * v * v * r + v * v * v * s
                        };
                        points.push(point(mix(from.x, a.x, b.x, end.x), mix(from.y, a.y, b.y, end.y)));
                    }
                }
            }
            from = step.end();
        }
        points
    }
}

/// Lengths on paper are written to 0.0001 mm, and never as a negative zero.
fn on_paper(value: f64) -> f64 {
    (value * 1e4).round() / 1e4 + 0.0
}

impl Serialize for Point {
    fn serialize<S: Serializer>(&self, serializer: S) -> Result<S::Ok, S::Error> {
        [on_paper(self.x), on_paper(self.y)].serialize(serializer)
    }
}

impl Serialize for Rect {
    fn serialize<S: Serializer>(&self, serializer: S) -> Result<S::Ok, S::Error> {
        [self.left, self.top, self.right, self.bottom].map(on_paper).serialize(serializer)
    }
}

/// A path is a list: the start, then for each step its end (straight) or its three points (curved), as bare numbers.
impl Serialize for Path {
    fn serialize<S: Serializer>(&self, serializer: S) -> Result<S::Ok, S::Error> {
        let mut list = serializer.serialize_seq(Some(1 + self.steps.len()))?;
        list.serialize_element(&self.start)?;
        for step in &self.steps {
            match step {
                Step::To(end) => list.serialize_element(end)?,
                Step::Cubic(a, b, end) => {
                    list.serialize_element(&[a.x, a.y, b.x, b.y, end.x, end.y].map(on_paper))?;
                }
            }
        }
        list.end()
    }
}

#[derive(Clone, Debug, PartialEq, Serialize)]
pub struct Stroke {
    pub line: Line,
    pub paths: Vec<Path>,
    /// What the stroke shows, where a reader of the drawn page may want to measure it.
    #[serde(skip_serializing_if = "Option::is_none")]
    pub tag: Option<String>,
}

#[derive(Clone, Debug, PartialEq, Serialize)]
pub struct Area {
    pub fill: Fill,
    #[serde(skip_serializing_if = "Option::is_none")]
    pub edge: Option<Line>,
    pub path: Path,
    #[serde(skip_serializing_if = "Option::is_none")]
    pub tag: Option<String>,
}

#[derive(Clone, Copy, Debug, PartialEq, Serialize)]
pub struct Dot {
    pub at: Point,
    pub radius: f64,
}

#[derive(Clone, Copy, Debug, PartialEq, Eq, Serialize)]
#[serde(rename_all = "kebab-case")]
pub enum Align {
    Left,
    Center,
    Right,
}

/// Which of the drawing's type sizes.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Serialize)]
#[serde(rename_all = "kebab-case")]
pub enum Size {
    /// Labels inside drawings.
    Diagram,
    /// The outer column.
    Note,
    /// The least size there is.
    Least,
}

/// A line of text on its baseline.
#[derive(Clone, Debug, PartialEq, Serialize)]
pub struct Text {
    pub at: Point,
    pub align: Align,
    pub size: Size,
    pub runs: Vec<Run>,
    #[serde(skip_serializing_if = "Option::is_none")]
    pub halo: Option<Rect>,
}

impl Text {
    /// A label of a diagram, centred.
    pub fn centred(at: Point, runs: Vec<Run>) -> Text {
        Text { at, align: Align::Center, size: Size::Diagram, runs, halo: None }
    }

    /// The ink's box: from the ascenders to the descenders.
    pub fn rect(&self) -> Rect {
        let width = letters::width(&self.runs, self.size);
        let left = match self.align {
            Align::Left => self.at.x,
            Align::Center => self.at.x - width / 2.0,
            Align::Right => self.at.x - width,
        };
        let em = letters::em(self.size);
        Rect::new(left, self.at.y - letters::ASCENT * em, left + width, self.at.y + letters::DESCENT * em)
    }
}

/// A finished drawing, as the template reads it.
#[derive(Clone, Debug, PartialEq, Serialize)]
pub struct Drawing {
    /// Name of the drawing's kind, for readers of the drawn page.
    pub kind: &'static str,
    pub width: f64,
    pub height: f64,
    /// The alternative text, with the drawing's numbers.
    pub alt: String,
    pub areas: Vec<Area>,
    /// Strokes that halos may interrupt.
    pub under: Vec<Stroke>,
    pub strokes: Vec<Stroke>,
    pub dots: Vec<Dot>,
    pub texts: Vec<Text>,
}

impl Drawing {
    pub fn new(kind: &'static str, width: f64, height: f64) -> Drawing {
        Drawing {
            kind,
            width,
            height,
            alt: String::new(),
            areas: vec![],
            under: vec![],
            strokes: vec![],
            dots: vec![],
            texts: vec![],
        }
    }

    pub fn stroke(&mut self, line: Line, path: Path) {
        self.strokes_of(line, vec![path], None);
    }

    pub fn tagged(&mut self, line: Line, path: Path, tag: impl Into<String>) {
        self.strokes_of(line, vec![path], Some(tag.into()));
    }

    pub fn strokes_of(&mut self, line: Line, paths: Vec<Path>, tag: Option<String>) {
        if !paths.is_empty() {
            let list = if line.under_halos() { &mut self.under } else { &mut self.strokes };
            list.push(Stroke { line, paths, tag });
        }
    }

    pub fn fill(&mut self, fill: Fill, edge: Option<Line>, path: Path) {
        self.areas.push(Area { fill, edge, path, tag: None });
    }

    pub fn dot(&mut self, at: Point, radius: f64) {
        self.dots.push(Dot { at, radius });
    }

    pub fn text(&mut self, at: Point, align: Align, size: Size, runs: Vec<Run>) -> Rect {
        let text = Text { at, align, size, runs, halo: None };
        let rect = text.rect();
        self.texts.push(text);
        rect
    }

    /// An arrow from tail to tip, upright.
    pub fn arrow(&mut self, tail: Point, tip: Point) {
        let (length, half) = (1.7, 0.6);
        let back = if tip.y > tail.y { -length } else { length };
        self.stroke(Line::Arrow, Path::line(tail, point(tip.x, tip.y + back * 0.8)));
        let head = [tip, point(tip.x - half, tip.y + back), point(tip.x + half, tip.y + back), tip];
        self.fill(Fill::Solid, None, Path::straight(&head));
    }

    /// The sign of a wall under a bearing: a seat with hatching, centred on `at`, its top on `at`.
    pub fn wall(&mut self, at: Point) {
        let half = 2.4;
        let seat = at.y + 0.45;
        self.stroke(Line::Bearing, Path::line(point(at.x - half, seat), point(at.x + half, seat)));
        let strokes = (0..5).map(|n| {
            let x = at.x - half + 0.95 + f64::from(n) * 0.95;
            Path::line(point(x, seat + 0.1), point(x - 1.2, seat + 1.35))
        });
        self.strokes_of(Line::Hatch, strokes.collect(), None);
    }

    /// Boxes of all texts, with the drawing's own frame.
    pub fn boxes(&self) -> Vec<Rect> {
        self.texts.iter().map(Text::rect).collect()
    }
}
