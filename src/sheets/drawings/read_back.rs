//! Reading a set document back: where its drawn curves really stand. For tests that measure what was drawn against
//! the results; the templates tag each curve of interest.

use typst::foundations::Value;
use typst::introspection::{MetadataElem, Tag};
use typst::layout::{Abs, Frame, FrameItem, Point as Place, Transform};
use typst::visualize::{CurveItem, Geometry};
use typst_layout::PagedDocument;

use super::scene::{Path, Point, Step, point};

/// A curve on a page, in mm from the page's upper left corner.
#[derive(Clone, Debug, PartialEq)]
pub struct DrawnCurve {
    pub page: usize,
    /// Which drawing of the document it belongs to, counted from 0, and that drawing's kind.
    pub drawing: usize,
    pub kind: String,
    pub tag: String,
    pub paths: Vec<Path>,
}

/// A run of text on a page, from the left end of its baseline, in mm.
#[derive(Clone, Debug, PartialEq)]
pub struct DrawnText {
    pub page: usize,
    pub at: Point,
    pub width: f64,
    pub text: String,
    /// mm.
    pub size: f64,
}

/// Everything of interest in a document.
#[derive(Clone, Debug, Default, PartialEq)]
pub struct Drawn {
    pub curves: Vec<DrawnCurve>,
    pub texts: Vec<DrawnText>,
}

/// Walks all pages of a document.
pub fn read(document: &PagedDocument) -> Drawn {
    let mut reader = Reader::default();
    for (number, page) in document.pages().iter().enumerate() {
        reader.page = number;
        reader.frame(&page.frame, Transform::identity());
    }
    reader.found
}

#[derive(Default)]
struct Reader {
    found: Drawn,
    page: usize,
    drawing: Option<usize>,
    kind: String,
    /// Tag of the curve that comes next.
    awaited: Option<String>,
}

impl Reader {
    fn frame(&mut self, frame: &Frame, outer: Transform) {
        for (at, item) in frame.items() {
            let here = outer.pre_concat(Transform::translate(at.x, at.y));
            match item {
                FrameItem::Group(group) => self.frame(&group.frame, here.pre_concat(group.transform)),
                FrameItem::Tag(Tag::Start(content, _)) => {
                    if let Some(metadata) = content.to_packed::<MetadataElem>() {
                        self.metadata(&metadata.value);
                    }
                }
                FrameItem::Shape(shape, _) => {
                    if let Some(tag) = self.awaited.take() {
                        let curve = DrawnCurve {
                            page: self.page,
                            drawing: self.drawing.unwrap_or(0),
                            kind: self.kind.clone(),
                            tag,
                            paths: paths(&shape.geometry, here),
                        };
                        self.found.curves.push(curve);
                    }
                }
                FrameItem::Text(text) => self.found.texts.push(DrawnText {
                    page: self.page,
                    at: on_page(Place::zero(), here),
                    width: text.width().to_mm(),
                    text: text.text.to_string(),
                    size: text.size.to_mm(),
                }),
                FrameItem::Image(..) | FrameItem::Link(..) | FrameItem::Tag(Tag::End(..)) => {}
            }
        }
    }

    fn metadata(&mut self, value: &Value) {
        let Value::Dict(dict) = value else { return };
        if let Ok(Value::Str(kind)) = dict.get("drawing") {
            self.drawing = Some(self.drawing.map_or(0, |n| n + 1));
            self.kind = kind.to_string();
        }
        if let Ok(Value::Str(tag)) = dict.get("drawn") {
            self.awaited = Some(tag.to_string());
        }
    }
}

fn on_page(p: Place, here: Transform) -> Point {
    let at = p.transform(here);
    point(at.x.to_mm(), at.y.to_mm())
}

fn paths(geometry: &Geometry, here: Transform) -> Vec<Path> {
    let at = |p: Place| on_page(p, here);
    match geometry {
        Geometry::Line(to) => vec![Path::line(at(Place::zero()), at(*to))],
        Geometry::Rect(size) => {
            let corner = |x: Abs, y: Abs| at(Place::new(x, y));
            let (w, h) = (size.x, size.y);
            let zero = Abs::zero();
            vec![Path::straight(&[corner(zero, zero), corner(w, zero), corner(w, h), corner(zero, h)])]
        }
        Geometry::Curve(curve) => {
            let mut list: Vec<Path> = Vec::new();
            for item in &curve.0 {
                match item {
                    CurveItem::Move(p) => list.push(Path { start: at(*p), steps: vec![] }),
                    CurveItem::Line(p) => add(&mut list, Step::To(at(*p))),
                    CurveItem::Cubic(a, b, p) => add(&mut list, Step::Cubic(at(*a), at(*b), at(*p))),
                    CurveItem::Close => {}
                }
            }
            list
        }
    }
}

fn add(list: &mut Vec<Path>, step: Step) {
    if list.is_empty() {
        list.push(Path { start: Point::default(), steps: vec![] });
    }
    if let Some(path) = list.last_mut() {
        path.steps.push(step);
    }
}
