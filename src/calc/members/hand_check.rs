//! A beam on two bearings once more, by superposed textbook cases on a simple span.
//!
//! Shares nothing with the solver but the loads: every case is a closed form of the simply supported beam (common
//! handbooks): a straight-sided load over part of the span by brackets, a point load, a moment at an end.

use super::drawn::{line_loads, point_loads};
use crate::analysis::envelope::Found;
use crate::analysis::solved::Solved;
use crate::materials::E;
use crate::quantity::{Length, LineLoad, Moment};
use crate::results::{DrawnForce, DrawnLoad, ForceSource, HandCase, HandCheck, TextbookCase};

/// None for continuous beams, where the closed forms do not apply, and where shear deformation is looked at.
pub fn hand_check(solved: &Solved, local: usize, moment: &Found<1, 1>, own: &Found<0, 1>) -> Option<HandCheck> {
    let beam = solved.beam(local);
    if beam.bearings.len() != 2 || solved.building.basis.shear_flexibility {
        return None;
    }
    let (left, right) = (beam.bearings[0].at.si(), beam.bearings[1].at.si());
    let span = right - left;
    // Both are looked at where the moment is greatest, or where the own movement is if that is beyond the span.
    let candidates = [moment.effect.at.si(), own.effect.at.si(), 0.5 * (left + right)];
    // A place that only rounding tells from a bearing would show a movement of nothing.
    let margin = 1e-6 * span;
    let x = candidates.into_iter().find(|x| *x > left + margin && *x < right - margin)? - left;
    let ei = E.si() * beam.section.i_y.si();

    let name = |row: usize| match row {
        0 => "own weight".to_string(),
        n => beam.loads[n - 1].what.clone(),
    };
    let mut cases: Vec<HandCase> = Vec::new();
    let mut ends = [[0.0; 2]; 2];
    let lines = (line_loads(solved, local, &moment.factors), line_loads(solved, local, &own.factors));
    for (d, c) in lines.0.iter().zip(&lines.1) {
        let (from, to) = (d.from.si() - left, d.to.si() - left);
        if from >= 0.0 && to <= span {
            let (design, movement) = (values(d), values(c));
            push_line(&mut cases, name(d.row), (from, to), design, movement, x, span, ei);
        } else {
            let end = usize::from(to > span);
            let arm = if end == 0 { 0.0 } else { span };
            ends[end][0] -= moment_of_line((from, to), values(d), arm);
            ends[end][1] -= moment_of_line((from, to), values(c), arm);
        }
    }
    let points = (point_loads(solved, local, &moment.factors), point_loads(solved, local, &own.factors));
    for (d, c) in points.0.iter().zip(&points.1) {
        let at = d.at.si() - left;
        if (0.0..=span).contains(&at) {
            let what = point_name(solved, local, d, &name);
            let case = TextbookCase::Point { at: Length::from_si(at), design: d.force, characteristic: c.force };
            cases.push(HandCase {
                what,
                moment: Moment::from_si(d.force.si() * point_moment(at, x, span)),
                own: Length::from_si(c.force.si() * point_movement(at, x, span) / ei),
                case,
            });
        } else {
            let end = usize::from(at > span);
            let arm = if end == 0 { -at } else { at - span };
            ends[end][0] -= d.force.si() * arm;
            ends[end][1] -= c.force.si() * arm;
        }
    }
    for (end, [design, movement]) in ends.into_iter().enumerate() {
        if design == 0.0 && movement == 0.0 {
            continue;
        }
        let at_left = end == 0;
        let from_far = if at_left { span - x } else { x };
        cases.push(HandCase {
            what: if at_left { "first overhang".into() } else { "last overhang".into() },
            moment: Moment::from_si(design * from_far / span),
            own: Length::from_si(movement * from_far * (span * span - from_far * from_far) / (6.0 * span * ei)),
            case: TextbookCase::EndMoment {
                at_left,
                design: Moment::from_si(design),
                characteristic: Moment::from_si(movement),
            },
        });
    }
    let solved_moment = solved.factored(&solved.moment(local), &moment.factors);
    let solved_own = solved.factored(&solved.own(local), &own.factors);
    Some(HandCheck {
        at: Length::from_si(x + left),
        span: Length::from_si(span),
        moment_by_hand: Moment::from_si(cases.iter().map(|c| c.moment.si()).sum()),
        moment_solved: Moment::from_si(solved_moment.at(x + left)),
        own_by_hand: Length::from_si(cases.iter().map(|c| c.own.si()).sum()),
        own_solved: Length::from_si(solved_own.at(x + left)),
        cases,
    })
}

fn values(load: &DrawnLoad) -> (f64, f64) {
    (load.intensity.0.si(), load.intensity.1.si())
}

fn point_name(solved: &Solved, local: usize, force: &DrawnForce, name: &dyn Fn(usize) -> String) -> String {
    match force.source {
        ForceSource::Row(row) => name(row),
        ForceSource::Landing(n) => {
            let landing = &solved.layout.landings[solved.members[local]][n];
            format!("{} lands", solved.building.beams[landing.beam].mark)
        }
    }
}

#[allow(clippy::too_many_arguments)]
fn push_line(
    cases: &mut Vec<HandCase>,
    what: String,
    (from, to): (f64, f64),
    design: (f64, f64),
    movement: (f64, f64),
    x: f64,
    span: f64,
    ei: f64,
) {
    let line = |v: (f64, f64)| (LineLoad::from_si(v.0), LineLoad::from_si(v.1));
    cases.push(HandCase {
        what,
        moment: Moment::from_si(line_moment((from, to), design, x, span)),
        own: Length::from_si(line_movement((from, to), movement, x, span) / ei),
        case: TextbookCase::Line {
            from: Length::from_si(from),
            to: Length::from_si(to),
            design: line(design),
            characteristic: line(movement),
        },
    });
}

/// P a b / L and its sides: M(x) of a unit load at `a`.
fn point_moment(a: f64, x: f64, span: f64) -> f64 {
    if x <= a { (span - a) * x / span } else { a * (span - x) / span }
}

/// E I w(x) of a unit load at `a`: b x (L² − b² − x²) / 6 L.
fn point_movement(a: f64, x: f64, span: f64) -> f64 {
    let (b, x) = if x <= a { (span - a, x) } else { (a, span - x) };
    b * x * (span * span - b * b - x * x) / (6.0 * span)
}

/// Moment of a straight-sided load about a place, as a hogging arm: force times distance from it.
fn moment_of_line((from, to): (f64, f64), (start, end): (f64, f64), about: f64) -> f64 {
    let length = to - from;
    let near = |centroid: f64| (centroid - about).abs();
    start * length * near(from + 0.5 * length) + 0.5 * (end - start) * length * near(from + length * 2.0 / 3.0)
}

/// Left reaction of a straight-sided load on part of the span.
fn line_reaction((from, to): (f64, f64), (start, end): (f64, f64), span: f64) -> f64 {
    let length = to - from;
    (start * length * (span - from - 0.5 * length)
        + 0.5 * (end - start) * length * (span - from - length * 2.0 / 3.0))
        / span
}

/// ⟨x⟩ to a power of 0 to 5, nothing where negative.
fn bracket(x: f64, power: usize) -> f64 {
    if x <= 0.0 { 0.0 } else { (0..power).fold(1.0, |p, _| p * x) }
}

/// M(x) = R x − q₁⟨x−c⟩²/2 − k⟨x−c⟩³/6 + q₂⟨x−d⟩²/2 + k⟨x−d⟩³/6 for a load from c to d that changes by k a metre.
fn line_moment((from, to): (f64, f64), load: (f64, f64), x: f64, span: f64) -> f64 {
    let k = (load.1 - load.0) / (to - from);
    line_reaction((from, to), load, span) * x - load.0 * bracket(x - from, 2) / 2.0 - k * bracket(x - from, 3) / 6.0
        + load.1 * bracket(x - to, 2) / 2.0
        + k * bracket(x - to, 3) / 6.0
}

/// E I w(x) by integrating the brackets of [`line_moment`] twice, with nothing at both ends.
fn line_movement((from, to): (f64, f64), load: (f64, f64), x: f64, span: f64) -> f64 {
    let k = (load.1 - load.0) / (to - from);
    let reaction = line_reaction((from, to), load, span);
    let twice = |x: f64| {
        reaction * bracket(x, 3) / 6.0 - load.0 * bracket(x - from, 4) / 24.0 - k * bracket(x - from, 5) / 120.0
            + load.1 * bracket(x - to, 4) / 24.0
            + k * bracket(x - to, 5) / 120.0
    };
    twice(span) * x / span - twice(x)
}
