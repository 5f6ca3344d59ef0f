//! A rolled section to scale, with its root radii and dimensions.

use sagledger_calc::sections::Section;

use super::figures::fixed;
use super::letters::{self, Face, run, words};
use super::scene::{Align, Drawing, Fill, Line, Path, Point, Rect, Size, Step, point};

/// The drawing's paper: width, and height.
const WIDTH: f64 = 56.0;
const HEIGHT: f64 = 66.0;
/// Room for the dimensions: left of the section, right of it, above (the axis' name) and below.
const LEFT: f64 = 13.0;
const RIGHT: f64 = 11.0;
const ABOVE: f64 = 3.8;
const BELOW: f64 = 10.0;
/// Control length of a cubic that follows a quarter of a circle, as a share of its radius; off by 0.03 % of it.
const QUARTER: f64 = 0.552_284_75;

/// The largest of the scales 1:2, 1:5 and 1:10 (then 1:20) at which the section fits its paper, as the number of mm
/// that one mm on paper stands for.
pub fn scale(section: &Section) -> f64 {
    let fits = |scale: f64| {
        section.b.to_mm() / scale <= WIDTH - LEFT - RIGHT && section.h.to_mm() / scale <= HEIGHT - ABOVE - BELOW
    };
    [2.0, 5.0, 10.0].into_iter().find(|s| fits(*s)).unwrap_or(20.0)
}

/// The drawing of a section, with "Scale 1:5." for the outer column.
pub fn section_drawing(section: &Section) -> Drawing {
    let scale = scale(section);
    let on_paper = |length: sagledger_calc::quantity::Length| length.to_mm() / scale;
    let (h, b) = (on_paper(section.h), on_paper(section.b));
    let (web, flange, root) = (on_paper(section.t_w), on_paper(section.t_f), on_paper(section.r));
    let mut drawing = Drawing::new("section-drawing", WIDTH, (ABOVE + h + BELOW).min(HEIGHT));
    let centre = LEFT + (WIDTH - LEFT - RIGHT) / 2.0;
    let (top, left) = (ABOVE, centre - b / 2.0);
    let (bottom, right) = (top + h, left + b);
    let middle = top + h / 2.0;

    let mut outline = outline(centre, top, [h, b, web, flange, root]);
    outline.steps.push(Step::To(outline.start));
    drawing.areas.push(super::scene::Area {
        fill: Fill::Tint10,
        edge: Some(Line::Outline),
        path: outline,
        tag: Some("section".into()),
    });

    // Axes, a little beyond the outline, with their names.
    let over = 2.6;
    let cross = |from: Point, to: Point| Path::line(from, to);
    drawing.stroke(Line::AxisOfSymmetry, cross(point(left - over, middle), point(right + over + 1.2, middle)));
    drawing.stroke(Line::AxisOfSymmetry, cross(point(centre, top - over), point(centre, bottom + over)));
    drawing.text(point(right + over + 2.0, middle + 0.7), Align::Left, Size::Diagram, words("y"));
    drawing.text(point(centre + 1.2, top - 1.2), Align::Left, Size::Diagram, words("z"));

    // Depth at the left, its figure standing in the line; width below.
    let mm = |length: sagledger_calc::quantity::Length| fixed(length.to_mm(), 1);
    let wide = letters::width(&words(mm(section.h)), Size::Diagram);
    let x = left - over - 1.4 - wide / 2.0;
    let figure = drawing.text(point(x, middle + 0.95), Align::Center, Size::Diagram, words(mm(section.h)));
    dimension(&mut drawing, point(x, top), point(x, bottom), Some((figure.top - 0.6, figure.bottom + 0.6)));
    let y = bottom + 7.0;
    dimension(&mut drawing, point(left, y), point(right, y), None);
    drawing.text(point(centre, y - 0.9), Align::Center, Size::Diagram, words(mm(section.b)));

    // Thicknesses on leaders to the right, the root radius on a leader from the lower left root.
    drawing.stroke(
        Line::Dimension,
        Path::line(point(right, top + flange / 2.0), point(right + 2.6, top + flange / 2.0)),
    );
    drawing.text(point(right + 3.0, top + flange / 2.0 + 0.95), Align::Left, Size::Diagram, words(mm(section.t_f)));
    let at = top + h * 0.3;
    let leader = centre + web / 2.0 + 5.0_f64.min(b / 2.0 - web / 2.0 + 3.0);
    drawing.stroke(Line::Dimension, Path::line(point(centre + web / 2.0, at), point(leader, at)));
    drawing.text(point(leader + 0.4, at + 0.95), Align::Left, Size::Diagram, words(mm(section.t_w)));
    let touch = root * (1.0 - std::f64::consts::FRAC_1_SQRT_2);
    let arc = point(centre - web / 2.0 - touch, bottom - flange - touch);
    let bend = point(arc.x - 3.6, arc.y - 3.6);
    drawing.stroke(Line::Dimension, Path::line(arc, bend));
    let radius = vec![run(Face::Regular, format!("r {}", mm(section.r)))];
    drawing.text(point(bend.x - 0.5, bend.y + 0.6), Align::Right, Size::Diagram, radius);

    drawing.alt = format!(
        "Section {} to scale 1:{scale:.0}: depth {} mm, width {} mm, web {} mm, flanges {} mm thick, root radius {} mm.",
        section.name,
        mm(section.h),
        mm(section.b),
        mm(section.t_w),
        mm(section.t_f),
        mm(section.r)
    );
    drawing
}

/// The outline of an I section, clockwise from its upper left corner; the roots are quarter circles.
fn outline(centre: f64, top: f64, [h, b, web, flange, root]: [f64; 5]) -> Path {
    let mut path = Path { start: point(centre - b / 2.0, top), steps: vec![] };
    let half = web / 2.0;
    let to = |x: f64, y: f64| Step::To(point(centre + x, top + y));
    // From `from` to `to` on a quarter circle; both tangents meet in `corner`.
    let quarter = |from: (f64, f64), corner: (f64, f64), end: (f64, f64)| {
        let mix = |p: (f64, f64)| {
            point(centre + p.0 + (corner.0 - p.0) * QUARTER, top + p.1 + (corner.1 - p.1) * QUARTER)
        };
        Step::Cubic(mix(from), mix(end), point(centre + end.0, top + end.1))
    };
    path.steps.extend([
        to(b / 2.0, 0.0),
        to(b / 2.0, flange),
        to(half + root, flange),
        quarter((half + root, flange), (half, flange), (half, flange + root)),
        to(half, h - flange - root),
        quarter((half, h - flange - root), (half, h - flange), (half + root, h - flange)),
        to(b / 2.0, h - flange),
        to(b / 2.0, h),
        to(-b / 2.0, h),
        to(-b / 2.0, h - flange),
        to(-half - root, h - flange),
        quarter((-half - root, h - flange), (-half, h - flange), (-half, h - flange - root)),
        to(-half, flange + root),
        quarter((-half, flange + root), (-half, flange), (-half - root, flange)),
        to(-b / 2.0, flange),
    ]);
    path
}

/// A dimension line with ticks at 45°; where `gap` is given the (upright) line is interrupted for its figure.
fn dimension(drawing: &mut Drawing, from: Point, to: Point, gap: Option<(f64, f64)>) {
    let beyond = 1.2;
    let (dx, dy) = if from.x == to.x { (0.0, beyond) } else { (beyond, 0.0) };
    let (a, b) = (point(from.x - dx, from.y - dy), point(to.x + dx, to.y + dy));
    let paths = match gap {
        Some((upper, lower)) => vec![Path::line(a, point(a.x, upper)), Path::line(point(a.x, lower), b)],
        None => vec![Path::line(a, b)],
    };
    drawing.strokes_of(Line::Dimension, paths, None);
    let reach = 0.8 * std::f64::consts::FRAC_1_SQRT_2;
    let ticks = [from, to].map(|p| Path::line(point(p.x - reach, p.y + reach), point(p.x + reach, p.y - reach)));
    drawing.strokes_of(Line::DimensionTick, ticks.to_vec(), None);
}

/// Everything that is drawn stays on this paper.
pub fn paper() -> Rect {
    Rect::new(0.0, 0.0, WIDTH, HEIGHT)
}
