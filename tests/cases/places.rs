//! Greatest values at places that no sampling finds: `at_m` to 1e-6 m, the value to 1e-9 of itself.

use super::*;

pub fn cases() -> Vec<Case> {
    vec![patch(), irrational_landing()]
}

/// 8 kN on 10 mm: the shear falls through zero inside the patch.
fn patch() -> Case {
    let (section, span, load, from, to) = ("254x102x22 UB", 4.7_f64, 800.0, 2.713, 2.723);
    let (_, weight) = stiffness_and_weight(section);
    let reaction = load * (to - from) * (span - (from + to) / 2.0) / span + weight * span / 2.0;
    let x = (reaction + load * from) / (load + weight);
    let moment = reaction * x - weight * x * x / 2.0 - load * (x - from).powi(2) / 2.0;
    Case::new(
        "a load on 10 mm",
        "statics: M is greatest where V = R - g x - p (x - a) is zero",
        job(
            "",
            &beam("S", section, span, &[wall("a", 0.0), wall("b", span)], &[&part("permanent", load, from, to)]),
        ),
    )
    .is("beams.0.moment_kNm.max", 1.35 * moment, EXACT)
    .within("beams.0.moment_kNm.at_m", x, 1e-6)
}

/// A beam lands at 1.375 sqrt 2 m: the moment peaks there, the movement to one side.
fn irrational_landing() -> Case {
    let lands = 1.375 * 2f64.sqrt();
    let (upper, upper_span, load) = ("203x133x25 UB", 4.1_f64, 11.0);
    let (section, span) = ("254x146x43 UB", 4.9_f64);
    let (_, upper_weight) = stiffness_and_weight(upper);
    let (stiffness, weight) = stiffness_and_weight(section);
    let (permanent, imposed) = (upper_weight * upper_span / 2.0, load * upper_span / 2.0);
    let force = permanent + imposed;
    let line = |x: f64| {
        let (uniform, point) = (uniform_line(weight, span, x), point_line(force, span, lands, x));
        [0, 1].map(|index| (uniform[index] + point[index]) / stiffness)
    };
    let top = root(lands, span, |x| line(x)[1]);
    let b = span - lands;
    let job = job(
        "",
        &[
            beam(
                "U",
                upper,
                upper_span,
                &[wall("c", 0.0), carried(upper_span, "S", lands)],
                &[&super::line("imposed", load)],
            ),
            beam("S", section, span, &[wall("a", 0.0), wall("b", span)], &[]),
        ]
        .concat(),
    );
    Case::new("a landing at an irrational place", "Pab/L, handbooks; root of the slope of the elastic line", job)
        .is(
            "beams.1.moment_kNm.max",
            (1.35 * permanent + 1.5 * imposed) * lands * b / span + 1.35 * weight * lands * b / 2.0,
            EXACT,
        )
        .within("beams.1.moment_kNm.at_m", lands, 1e-6)
        .is("beams.1.deflection_mm.stacked_total", line(top)[0] * 1e3, EXACT)
        .within("beams.1.deflection_mm.stacked_at_m", top, 1e-6)
        .is(
            "beams.1.deflection_mm.own_variable",
            imposed * lands * (span * span - lands * lands).powf(1.5) / (9.0 * 3f64.sqrt() * span * stiffness)
                * 1e3,
            EXACT,
        )
        .is("beams.0.tilt", line(lands)[0] / upper_span, EXACT)
}
