//! Continuous beams.

use super::*;

pub fn cases() -> Vec<Case> {
    vec![
        two_spans_permanent(),
        two_spans_pattern(),
        three_spans(),
        four_spans(),
        middle_settles(),
        on_a_crossing_beam(),
    ]
}

fn spans(basis: &str, section: &str, count: usize, span: f64, rows: &[&str]) -> String {
    let names = ["a", "b", "c", "d", "e"];
    let bearings: Vec<String> = (0..=count).map(|index| wall(names[index], index as f64 * span)).collect();
    job(basis, &beam("C", section, count as f64 * span, &bearings, rows))
}

fn two_spans_permanent() -> Case {
    let (section, span, load) = ("254x146x31 UB", 4.0_f64, 9.0);
    let (stiffness, weight) = stiffness_and_weight(section);
    let row = line("permanent", load - weight);
    // EI w = q x (L3 - 3 L x2 + 2 x3) / 48, the propped cantilever's line.
    let slope = |x: f64| span.powi(3) - 9.0 * span * x * x + 8.0 * x.powi(3);
    let top = root(0.3 * span, 0.6 * span, slope);
    let line = |x: f64| load * x * (span.powi(3) - 3.0 * span * x * x + 2.0 * x.powi(3)) / (48.0 * stiffness);
    Case::new(
        "two equal spans, permanent load",
        "0.375, 1.25 wL; -wL2/8; 0.0703 wL2; wL4/185EI at 0.4215 L, handbooks",
        spans("", section, 2, span, &[&row]),
    )
    .is("beams.0.bearings.0.reaction_kN.permanent", 0.375 * load * span, EXACT)
    .is("beams.0.bearings.1.reaction_kN.permanent", 1.25 * load * span, EXACT)
    .is("beams.0.moment_kNm.min", -1.35 * load * span * span / 8.0, EXACT)
    .is("beams.0.moment_kNm.max", 1.35 * 9.0 / 128.0 * load * span * span, EXACT)
    .is("beams.0.moment_kNm.max", 1.35 * 0.0703 * load * span * span, PRINTED)
    .is("beams.0.shear_kN.max", 1.35 * 0.625 * load * span, EXACT)
    .within("beams.0.shear_kN.at_m", span, 1e-9)
    .is("beams.0.deflection_mm.own_total", line(top) * 1e3, EXACT)
    .is("beams.0.deflection_mm.own_total", load * span.powi(4) / (185.0 * stiffness) * 1e3, PRINTED)
}

/// Imposed load where it worsens: one span for the greatest span moment and deflection, both for the middle bearing.
fn two_spans_pattern() -> Case {
    let (section, span, g, q) = ("254x146x31 UB", 4.0_f64, 1.2, 9.0);
    let (stiffness, weight) = stiffness_and_weight(section);
    let rows = [line("permanent", g - weight), line("imposed", q)];
    // One span loaded: 0.4375, 0.625, -0.0625 wL; bending at the middle wL2/16.
    let design = 1.35 * g + 1.5 * q;
    let first = (0.375 * 1.35 * g + 0.4375 * 1.5 * q) * span;
    let variable =
        |x: f64| uniform_line(q, span, x)[0] - q * span * span / 16.0 * x * (span * span - x * x) / (6.0 * span);
    let slope =
        |x: f64| uniform_line(q, span, x)[1] - q * span * span / 16.0 * (span * span - 3.0 * x * x) / (6.0 * span);
    let top = root(0.3 * span, 0.7 * span, slope);
    Case::new(
        "two equal spans, imposed load free",
        "0.4375 wL and wL2/16 with one span loaded, handbooks",
        spans("", section, 2, span, &[&rows[0], &rows[1]]),
    )
    .is("beams.0.bearings.0.reaction_kN.imposed A", 0.375 * q * span, EXACT)
    .is("beams.0.bearings.0.reaction_kN.design_max", first, EXACT)
    .is("beams.0.bearings.0.reaction_kN.design_min", (0.375 * g - 0.0625 * 1.5 * q) * span, EXACT)
    .is("beams.0.bearings.1.reaction_kN.design_max", 1.25 * design * span, EXACT)
    .is("beams.0.bearings.2.reaction_kN.characteristic_max", (0.375 * g + 0.4375 * q) * span, EXACT)
    // Own weight and the rest of the permanent load push down at the end bearing whichever span they are on, but for
    // the far span: each is a contribution of its own in set A.
    .within(
        "beams.0.bearings.0.reaction_kN.uplift_max",
        (1.5 * 0.0625 * q - 0.9 * 0.4375 * g + 1.1 * 0.0625 * g).max(0.0) * span,
        1e-9,
    )
    .is("beams.0.moment_kNm.min", -design * span * span / 8.0, EXACT)
    .is("beams.0.moment_kNm.max", first * first / (2.0 * design), EXACT)
    .is("beams.0.deflection_mm.own_variable", variable(top) / stiffness * 1e3, EXACT)
}

fn three_spans() -> Case {
    let (section, span, load) = ("203x133x25 UB", 3.5_f64, 8.0);
    let (_, weight) = stiffness_and_weight(section);
    Case::new(
        "three equal spans",
        "0.4, 1.1, 1.1, 0.4 wL; -0.100, 0.080 wL2, handbooks",
        spans("", section, 3, span, &[&line("permanent", load - weight)]),
    )
    .is("beams.0.bearings.0.reaction_kN.permanent", 0.4 * load * span, EXACT)
    .is("beams.0.bearings.1.reaction_kN.permanent", 1.1 * load * span, EXACT)
    .is("beams.0.bearings.2.reaction_kN.permanent", 1.1 * load * span, EXACT)
    .is("beams.0.bearings.3.reaction_kN.permanent", 0.4 * load * span, EXACT)
    .is("beams.0.moment_kNm.min", -1.35 * 0.1 * load * span * span, EXACT)
    .is("beams.0.moment_kNm.max", 1.35 * 0.08 * load * span * span, EXACT)
}

fn four_spans() -> Case {
    let (section, span, load) = ("203x133x30 UB", 3.0_f64, 10.0);
    let (_, weight) = stiffness_and_weight(section);
    let path = |index: usize| format!("beams.0.bearings.{index}.reaction_kN.permanent");
    let mut case = Case::new(
        "four equal spans",
        "11, 32, 26, 32, 11 twenty-eighths of wL; -3/28 wL2, handbooks",
        spans("", section, 4, span, &[&line("permanent", load - weight)]),
    )
    .is("beams.0.moment_kNm.min", -1.35 * 3.0 / 28.0 * load * span * span, EXACT);
    for (index, share) in [11.0, 32.0, 26.0, 32.0, 11.0].into_iter().enumerate() {
        case = case.is(&path(index), share / 28.0 * load * span, EXACT);
    }
    case
}

/// The middle wall settles: the line of a beam of two spans pushed down in its middle, d (3 x/L - (x/L)3) / 2 up to
/// there. Moments, reactions and own movement stay those of the loads.
fn middle_settles() -> Case {
    let (section, span, load, settles) = ("254x146x43 UB", 4.5_f64, 6.0, 0.005);
    let (stiffness, weight) = stiffness_and_weight(section);
    let bearings = [
        wall("a", 0.0),
        format!("{{ on = \"b\", at = \"{span} m\", settles = \"{} mm\" }}", settles * 1e3),
        wall("c", 2.0 * span),
    ];
    let own = |x: f64| load * x * (span.powi(3) - 3.0 * span * x * x + 2.0 * x.powi(3)) / (48.0 * stiffness);
    let own_slope = |x: f64| load * (span.powi(3) - 9.0 * span * x * x + 8.0 * x.powi(3)) / (48.0 * stiffness);
    let settled = |x: f64| settles * (3.0 * x / span - (x / span).powi(3)) / 2.0;
    let settled_slope = |x: f64| settles * (3.0 / span - 3.0 * x * x / span.powi(3)) / 2.0;
    // Up to the middle both push down; beyond the last zero of the sum of slopes the sum falls to the settlement.
    let top = root(0.4 * span, 0.999 * span, |x| own_slope(x) + settled_slope(x));
    let propped = root(0.3 * span, 0.6 * span, own_slope);
    let row = line("permanent", load - weight);
    Case::new(
        "the middle wall settles",
        "d (3 x/L - (x/L)3) / 2: a beam with a point load in its middle, handbooks",
        job("", &beam("C", section, 2.0 * span, &bearings, &[&row])),
    )
    .is("beams.0.moment_kNm.min", -1.35 * load * span * span / 8.0, EXACT)
    .is("beams.0.bearings.1.reaction_kN.permanent", 1.25 * load * span, EXACT)
    .is("beams.0.deflection_mm.own_total", own(propped) * 1e3, EXACT)
    .is("beams.0.deflection_mm.stacked_total", (own(top) + settled(top)).max(settles) * 1e3, EXACT)
    .within("beams.0.deflection_mm.inherited_there", 0.0, 1e-12)
    .is("beams.0.tilt", settles / span, EXACT)
}

/// The middle of two equal spans stands on the middle of another beam: a force method with one unknown. Each span's own
/// movement is measured from the line between its own two bearings, of which the middle one has gone down.
fn on_a_crossing_beam() -> Case {
    let (section, span, load) = ("254x146x31 UB", 3.6_f64, 7.0);
    let (stiffness, weight) = stiffness_and_weight(section);
    let (crossing, reach) = ("203x133x30 UB", 4.2_f64);
    let (crossing_stiffness, crossing_weight) = stiffness_and_weight(crossing);
    let whole = 2.0 * span;
    let free = uniform_line(load, whole, span)[0] / stiffness;
    let below = uniform_line(crossing_weight, reach, reach / 2.0)[0] / crossing_stiffness;
    let give = reach.powi(3) / (48.0 * crossing_stiffness);
    let force = (free - below) / (whole.powi(3) / (48.0 * stiffness) + give);
    let middle = below + force * give;
    let line = |x: f64| {
        let (uniform, point) = (uniform_line(load, whole, x), point_line(force, whole, span, x));
        [0, 1].map(|index| (uniform[index] - point[index]) / stiffness)
    };
    let own_top = root(0.2 * span, 0.8 * span, |x| line(x)[1] - middle / span);
    let row = self::line("permanent", load - weight);
    let bearings = [wall("a", 0.0), carried(span, "X", reach / 2.0), wall("b", whole)];
    let beams = [
        beam("C", section, whole, &bearings, &[&row]),
        beam("X", crossing, reach, &[wall("c", 0.0), wall("d", reach)], &[]),
    ];
    Case::new(
        "two spans over a crossing beam",
        "5wL4/384EI, PL3/48EI, handbooks, by a force method",
        job("", &beams.concat()),
    )
    .is("beams.0.bearings.1.reaction_kN.permanent", force, EXACT)
    .is("beams.0.bearings.0.reaction_kN.permanent", load * span - force / 2.0, EXACT)
    .is("beams.0.tilt", middle / span, EXACT)
    .is("beams.0.deflection_mm.own_total", (line(own_top)[0] - middle * own_top / span) * 1e3, EXACT)
    .is("beams.1.deflection_mm.stacked_total", middle * 1e3, EXACT)
}
