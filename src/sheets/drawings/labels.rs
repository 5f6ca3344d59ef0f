//! Places for labels: the first of several wished-for places that is inside the frame, free of other labels and off
//! the curves.

use super::letters::{self, Run};
use super::scene::{Align, Drawing, Path, Point, Rect, Size, Text, point};

/// Clear paper around a label.
const CLEAR: f64 = 0.3;
/// The white around a label that interrupts drop lines and axes.
const HALO: f64 = 0.45;

/// What is taken already.
#[derive(Clone, Debug, Default)]
pub struct Placer {
    pub frame: Rect,
    taken: Vec<Rect>,
    lines: Vec<(Rect, Vec<Point>)>,
}

/// A place to try: where the baseline's anchor would stand.
#[derive(Clone, Copy, Debug)]
pub struct Place {
    pub at: Point,
    pub align: Align,
}

pub fn left_of(x: f64, y: f64) -> Place {
    Place { at: point(x, y), align: Align::Right }
}

pub fn right_of(x: f64, y: f64) -> Place {
    Place { at: point(x, y), align: Align::Left }
}

pub fn centred(x: f64, y: f64) -> Place {
    Place { at: point(x, y), align: Align::Center }
}

/// The baseline of text whose capitals are centred on `y`.
pub fn middle(y: f64) -> f64 {
    y + letters::CAPITALS / 2.0 * letters::em(Size::Diagram)
}

/// The baseline of text whose capitals begin `gap` below `y`, and of text that ends `gap` above it.
pub fn below(y: f64, gap: f64) -> f64 {
    y + gap + letters::CAPITALS * letters::em(Size::Diagram)
}

impl Placer {
    pub fn new(frame: Rect) -> Placer {
        Placer { frame, taken: vec![], lines: vec![] }
    }

    /// Nothing may stand on this line.
    pub fn avoid(&mut self, path: &Path) {
        let points = path.flattened();
        let mut bounds = Rect::new(f64::MAX, f64::MAX, f64::MIN, f64::MIN);
        for p in &points {
            bounds =
                Rect::new(bounds.left.min(p.x), bounds.top.min(p.y), bounds.right.max(p.x), bounds.bottom.max(p.y));
        }
        self.lines.push((bounds, points));
    }

    /// Nothing may stand in this box.
    pub fn keep_off(&mut self, rect: Rect) {
        self.taken.push(rect);
    }

    pub fn is_free(&self, rect: &Rect) -> bool {
        let wide = rect.grown(CLEAR);
        self.frame.contains(rect)
            && !self.taken.iter().any(|t| t.overlaps(&wide))
            && !self.lines.iter().any(|(bounds, points)| {
                bounds.grown(1e-6).overlaps(&wide) && points.windows(2).any(|pair| wide.meets(pair[0], pair[1]))
            })
    }

    /// Puts the text at the first free place; false where there is none.
    pub fn place(
        &mut self,
        drawing: &mut Drawing,
        size: Size,
        runs: &[Run],
        places: impl IntoIterator<Item = Place>,
    ) -> bool {
        let mut text = Text { at: Point::default(), align: Align::Left, size, runs: runs.to_vec(), halo: None };
        for place in places {
            text.at = place.at;
            text.align = place.align;
            let rect = text.rect();
            if self.is_free(&rect) {
                text.halo = Some(rect.grown(HALO));
                self.taken.push(rect);
                drawing.texts.push(text);
                return true;
            }
        }
        false
    }

    /// Whether the text would find a place, without putting it there.
    pub fn finds(&self, size: Size, runs: &[Run], places: impl IntoIterator<Item = Place>) -> bool {
        places.into_iter().any(|place| {
            let text = Text { at: place.at, align: place.align, size, runs: runs.to_vec(), halo: None };
            self.is_free(&text.rect())
        })
    }
}

/// A place and the same place moved sideways, in steps, up to `reach`: the nearest first.
pub fn sideways(place: Place, reach: f64) -> impl Iterator<Item = Place> {
    let steps = (reach / 1.5).floor().max(0.0) as i32;
    let shifts = (0..=steps).flat_map(|n| if n == 0 { vec![0] } else { vec![n, -n] });
    shifts.map(move |n| Place { at: point(place.at.x + 1.5 * f64::from(n), place.at.y), ..place })
}

/// The outer column: notes from the top down, none over another.
#[derive(Clone, Debug)]
pub struct Column {
    left: f64,
    width: f64,
    /// The next free baseline.
    next: f64,
}

/// Left edge and width of the outer column beside a drawing 120 wide.
const COLUMN_LEFT: f64 = 126.0;
pub const COLUMN_WIDTH: f64 = 40.0;
/// Width of the whole, outer column included.
pub const WIDE: f64 = 166.0;
/// Width of the text, and of what is drawn.
pub const TEXT: f64 = 120.0;

impl Column {
    pub fn new() -> Column {
        Column { left: COLUMN_LEFT, width: COLUMN_WIDTH, next: letters::CAPITALS * letters::em(Size::Note) }
    }

    pub fn wrap(&self, face: letters::Face, text: &str) -> Vec<String> {
        letters::wrapped(face, text, Size::Note, self.width)
    }

    /// Lines that begin with their first capitals' tops at `top`, or below what stands there already.
    pub fn note(&mut self, drawing: &mut Drawing, top: f64, lines: Vec<Vec<Run>>) {
        let mut baseline = (top + letters::CAPITALS * letters::em(Size::Note)).max(self.next);
        for runs in lines {
            drawing.text(point(self.left, baseline), Align::Left, Size::Note, runs);
            baseline += letters::NOTE_PITCH;
        }
        self.next = baseline + 0.35 * letters::NOTE_PITCH;
    }

    /// How many lines a note that begins at `top` has until `end`, with a little air below.
    pub fn lines_between(&self, top: f64, end: f64) -> usize {
        let first = (top + letters::CAPITALS * letters::em(Size::Note)).max(self.next);
        ((end - 0.6 - first) / letters::NOTE_PITCH + 1.0).floor().max(0.0) as usize
    }

    /// Baseline from which the next note would start.
    pub fn next(&self) -> f64 {
        self.next
    }
}

impl Default for Column {
    fn default() -> Self {
        Column::new()
    }
}
