//! Beams on two bearings.

use super::*;

pub fn cases() -> Vec<Case> {
    vec![
        uniform(),
        off_centre_point(),
        triangle(),
        trapezoid(),
        partial(),
        stages(),
        shear_flexible(),
        restrained_beam_of_the_handbook(),
    ]
}

fn uniform() -> Case {
    let (section, span, g, q) = ("203x133x25 UB", 4.4_f64, 3.1, 2.7);
    let (stiffness, weight) = stiffness_and_weight(section);
    let (permanent, total) = (g + weight, g + weight + q);
    let design = 1.35 * permanent + 1.5 * q;
    let deflection = |load: f64| 5.0 * load * span.powi(4) / (384.0 * stiffness) * 1e3;
    Case::new(
        "uniform load",
        "wL/2, wL2/8, 5wL4/384EI, handbooks",
        job(
            "",
            &beam(
                "S",
                section,
                span,
                &[wall("a", 0.0), wall("b", span)],
                &[&line("permanent", g), &line("imposed", q)],
            ),
        ),
    )
    .is("beams.0.bearings.0.reaction_kN.permanent", permanent * span / 2.0, EXACT)
    .is("beams.0.bearings.1.reaction_kN.imposed A", q * span / 2.0, EXACT)
    .is("beams.0.bearings.0.reaction_kN.design_max", design * span / 2.0, EXACT)
    .is("beams.0.bearings.0.reaction_kN.design_min", permanent * span / 2.0, EXACT)
    .is("beams.0.bearings.0.reaction_kN.characteristic_max", total * span / 2.0, EXACT)
    .within("beams.0.bearings.0.reaction_kN.uplift_max", 0.0, 1e-12)
    .is("beams.0.moment_kNm.max", design * span * span / 8.0, EXACT)
    .within("beams.0.moment_kNm.at_m", span / 2.0, 1e-6)
    .within("beams.0.moment_kNm.min", 0.0, 1e-9)
    .is("beams.0.shear_kN.max", design * span / 2.0, EXACT)
    .is("beams.0.deflection_mm.own_total", deflection(total), EXACT)
    .is("beams.0.deflection_mm.own_after", deflection(total - weight), EXACT)
    .is("beams.0.deflection_mm.own_variable", deflection(q), EXACT)
    .is("beams.0.deflection_mm.stacked_total", deflection(total), EXACT)
    .within("beams.0.deflection_mm.stacked_at_m", span / 2.0, 1e-6)
    .within("beams.0.deflection_mm.inherited_there", 0.0, 1e-12)
    .is("beams.0.deflection_mm.hand_rule", deflection(total), EXACT)
    .within("beams.0.tilt", 0.0, 1e-15)
    .is("beams.0.cut_length_m", span + 0.1, EXACT)
    .is("takedown.applied_kN.permanent", permanent * span, EXACT)
    .is("takedown.to_supports_kN.imposed A", q * span, EXACT)
}

/// Greatest deflection P a (L2 - a2)^1.5 / (9 sqrt 3 L EI), a < b.
fn off_centre_point() -> Case {
    let (section, span, force, a) = ("254x102x28 UB", 5.1_f64, 21.0, 1.8);
    let (stiffness, weight) = stiffness_and_weight(section);
    let b = span - a;
    let deflection = force * a * (span * span - a * a).powf(1.5) / (9.0 * 3f64.sqrt() * span * stiffness) * 1e3;
    // The load is heavy enough for the shear to change its sign under it.
    let design = 1.5 * force * a * b / span + 1.35 * weight * a * b / 2.0;
    Case::new(
        "point load off the centre",
        "Pab/L and P a (L2 - a2)^1.5 / (9 sqrt 3 L EI), handbooks",
        job("", &beam("S", section, span, &[wall("a", 0.0), wall("b", span)], &[&point("imposed", force, a)])),
    )
    .is("beams.0.bearings.0.reaction_kN.imposed A", force * b / span, EXACT)
    .is("beams.0.bearings.1.reaction_kN.imposed A", force * a / span, EXACT)
    .is("beams.0.moment_kNm.max", design, EXACT)
    .within("beams.0.moment_kNm.at_m", a, 1e-6)
    .is("beams.0.shear_kN.max", 1.5 * force * b / span + 1.35 * weight * span / 2.0, EXACT)
    .within("beams.0.shear_kN.at_m", 0.0, 1e-6)
    .is("beams.0.deflection_mm.own_variable", deflection, EXACT)
}

/// A load rising from zero to w: reactions wL/6 and wL/3, deflection 0.00652 wL4/EI.
fn triangle() -> Case {
    let (section, span, width) = ("254x146x31 UB", 4.8_f64, 3.5);
    let (stiffness, _) = stiffness_and_weight(section);
    let load = 2.0 * width;
    let row = format!("  build-up = \"floor\"\n  width = [\"0 m\", \"{width} m\"]");
    let line = |x: f64| {
        load * x * (7.0 * span.powi(4) - 10.0 * span * span * x * x + 3.0 * x.powi(4)) / (360.0 * span * stiffness)
    };
    let top = span * (1.0 - (8.0_f64 / 15.0).sqrt()).sqrt();
    Case::new(
        "triangular load",
        "wL/6, wL/3; elastic line wx(7L4 - 10L2x2 + 3x4)/360LEI, greatest at L sqrt(1 - sqrt(8/15)), handbooks",
        job("", &beam("S", section, span, &[wall("a", 0.0), wall("b", span)], &[&row])),
    )
    .is("beams.0.bearings.0.reaction_kN.imposed A", load * span / 6.0, EXACT)
    .is("beams.0.bearings.1.reaction_kN.imposed A", load * span / 3.0, EXACT)
    .is("beams.0.deflection_mm.own_variable", line(top) * 1e3, EXACT)
    .is("beams.0.deflection_mm.own_variable", 0.00652 * load * span.powi(4) / stiffness * 1e3, PRINTED)
}

/// From w1 to w2 over the whole span: a uniform load and a triangle.
fn trapezoid() -> Case {
    let (section, span, widths) = ("305x165x40 UB", 6.0_f64, [2.4, 0.9]);
    let (_, weight) = stiffness_and_weight(section);
    let [first, second] = widths.map(|width| 2.0 * width);
    let row = format!("  build-up = \"floor\"\n  width = [\"{} m\", \"{} m\"]", widths[0], widths[1]);
    // Design intensity falls linearly from p to p - slope L; the moment is greatest where the shear is zero.
    let intensity = |share: f64| 1.35 * (0.5 * share + weight) + 1.5 * 2.0 * share;
    let (p, slope) = (intensity(widths[0]), (intensity(widths[0]) - intensity(widths[1])) / span);
    let reaction = p * span / 2.0 - slope * span * span / 6.0;
    let x = (p - (p * p - 2.0 * slope * reaction).sqrt()) / slope;
    let moment = reaction * x - p * x * x / 2.0 + slope * x.powi(3) / 6.0;
    Case::new(
        "trapezoidal load",
        "R1 = (2 w1 + w2) L / 6; moment where p x - s x2 / 2 equals R1 (statics)",
        job("", &beam("S", section, span, &[wall("a", 0.0), wall("b", span)], &[&row])),
    )
    .is("beams.0.bearings.0.reaction_kN.imposed A", (2.0 * first + second) * span / 6.0, EXACT)
    .is("beams.0.bearings.1.reaction_kN.imposed A", (first + 2.0 * second) * span / 6.0, EXACT)
    .is("beams.0.moment_kNm.max", moment, EXACT)
    .within("beams.0.moment_kNm.at_m", x, 1e-6)
}

/// A uniform load over a part, off the own weight by statics.
fn partial() -> Case {
    let (section, span, load, from, to) = ("254x146x37 UB", 5.6_f64, 14.0, 0.8, 2.7);
    let (_, weight) = stiffness_and_weight(section);
    let total = load * (to - from);
    let first = total * (span - (from + to) / 2.0) / span;
    let (p, g) = (1.5 * load, 1.35 * weight);
    let reaction = 1.5 * first + g * span / 2.0;
    let x = (reaction + p * from) / (p + g);
    let moment = reaction * x - g * x * x / 2.0 - p * (x - from).powi(2) / 2.0;
    Case::new(
        "uniform load over a part",
        "statics",
        job("", &beam("S", section, span, &[wall("a", 0.0), wall("b", span)], &[&part("imposed", load, from, to)])),
    )
    .is("beams.0.bearings.0.reaction_kN.imposed A", first, EXACT)
    .is("beams.0.bearings.1.reaction_kN.imposed A", total - first, EXACT)
    .is("beams.0.moment_kNm.max", moment, EXACT)
    .within("beams.0.moment_kNm.at_m", x, 1e-6)
    .is("beams.0.shear_kN.max", reaction, EXACT)
}

/// What stood before the finish does not move it: own weight and rows of stage "before".
fn stages() -> Case {
    let (section, span, before, after, imposed) = ("254x146x31 UB", 5.0_f64, 4.0, 1.5, 2.0);
    let (stiffness, weight) = stiffness_and_weight(section);
    let row = format!("{}\n  stage = \"before\"", line("permanent", before));
    let deflection = |load: f64| 5.0 * load * span.powi(4) / (384.0 * stiffness) * 1e3;
    Case::new(
        "stages",
        "5wL4/384EI of what comes after",
        job(
            "",
            &beam(
                "S",
                section,
                span,
                &[wall("a", 0.0), wall("b", span)],
                &[&row, &line("permanent", after), &line("imposed", imposed)],
            ),
        ),
    )
    .is("beams.0.deflection_mm.own_total", deflection(before + after + imposed + weight), EXACT)
    .is("beams.0.deflection_mm.own_after", deflection(after + imposed), EXACT)
    .is("beams.0.deflection_mm.own_variable", deflection(imposed), EXACT)
}

/// Timoshenko: w L2 / 8 G A_v more at midspan.
fn shear_flexible() -> Case {
    let (section, span, load) = ("356x171x57 UB", 3.0_f64, 60.0);
    let shape = Shape::named(section);
    let stiffness = YOUNG * shape.second_moment / 1e3;
    let shear = 81e6 * shape.shear_area; // kN, G of EN 1993-1-1 3.2.6
    let deflection = 5.0 * load * span.powi(4) / (384.0 * stiffness) + load * span * span / (8.0 * shear);
    Case::new(
        "shear flexibility",
        "5wL4/384EI + wL2/8GA, Timoshenko; A_v of EN 1993-1-1 6.2.6(3)",
        job(
            "shear-flexibility = true",
            &beam("S", section, span, &[wall("a", 0.0), wall("b", span)], &[&line("imposed", load)]),
        ),
    )
    .is("beams.0.deflection_mm.own_variable", deflection * 1e3, EXACT)
}

/// A published worked example of a restrained beam, from memory: own weight within the 15 kN/m.
fn restrained_beam_of_the_handbook() -> Case {
    let (section, span) = ("533x210x92 UB", 6.5_f64);
    let (_, weight) = stiffness_and_weight(section);
    Case::new(
        "restrained beam",
        "worked example, from memory: M_Ed 540 kNm, variable deflection 8.5 mm",
        job(
            "combination = \"6.10a/b\"",
            &beam(
                "S",
                section,
                span,
                &[wall("a", 0.0), wall("b", span)],
                &[
                    &line("permanent", 15.0 - weight),
                    &line("imposed", 30.0),
                    &point("permanent", 40.0, span / 2.0),
                    &point("imposed", 50.0, span / 2.0),
                ],
            ),
        ),
    )
    .is("beams.0.moment_kNm.max", 540.0, PRINTED)
    .is("beams.0.deflection_mm.own_variable", 8.5, PRINTED)
    .is("beams.0.moment_kNm.max", (18.73125 + 45.0) * 6.5 * 6.5 / 8.0 + (49.95 + 75.0) * 6.5 / 4.0, EXACT)
}
