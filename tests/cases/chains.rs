//! Beams on beams, by hand.

use super::*;

pub fn cases() -> Vec<Case> {
    vec![three_deep(), overhang_magnifies(), landing_on_a_bearing()]
}

/// Three beams on each other. Every load pushes down everywhere, so that the characteristic combination is all of it.
/// Reactions by statics; movements by the elastic lines of handbooks, added down the chain.
fn three_deep() -> Case {
    let sections = ["203x133x25 UB", "254x146x43 UB", "356x171x57 UB"];
    let spans = [3.7, 4.6, 5.9];
    let lands = [1.7, 2.3]; // of the first on the second, of the second on the third
    let (g, q) = ([2.2, 1.4, 3.0], [3.1, 0.0, 2.6]);
    let own = sections.map(stiffness_and_weight);
    let total = [0, 1, 2].map(|index| g[index] + q[index] + own[index].1);
    // The first comes in at the second's 1.7 m with its end, the second at the third's 2.3 m.
    let first = total[0] * spans[0] / 2.0;
    let second = total[1] * spans[1] / 2.0 + first * lands[0] / spans[1];
    let movement = |index: usize, force: f64, at: f64, x: f64| {
        let [uniform, uniform_slope] = uniform_line(total[index], spans[index], x);
        let [point, point_slope] = point_line(force, spans[index], at, x);
        [(uniform + point) / own[index].0, (uniform_slope + point_slope) / own[index].0]
    };
    let third_there = movement(2, second, lands[1], lands[1])[0];
    let second_there = movement(1, first, lands[0], lands[0])[0] + third_there * lands[0] / spans[1];
    let inherited = |end: f64, index: usize, x: f64| end * x / spans[index];
    // Stacked movement of the first: its own line and the tilted chord.
    let slope = |x: f64| uniform_line(total[0], spans[0], x)[1] / own[0].0 + second_there / spans[0];
    let top = root(0.4 * spans[0], spans[0], slope);
    let own_there = uniform_line(total[0], spans[0], top)[0] / own[0].0;
    let lowest = |index: usize, force: f64, at: f64| {
        let top = root(0.2 * spans[index], 0.8 * spans[index], |x| movement(index, force, at, x)[1]);
        movement(index, force, at, top)[0]
    };
    let hand_rule = uniform_line(total[0], spans[0], spans[0] / 2.0)[0] / own[0].0
        + lowest(1, first, lands[0])
        + lowest(2, second, lands[1]);
    let rows = [0, 1, 2].map(|index| [line("permanent", g[index]), line("imposed", q[index].max(1e-9))]);
    let job = job(
        "",
        &[
            beam(
                "R",
                sections[0],
                spans[0],
                &[wall("a", 0.0), carried(spans[0], "T", lands[0])],
                &[&rows[0][0], &rows[0][1]],
            ),
            beam("T", sections[1], spans[1], &[wall("a", 0.0), carried(spans[1], "U", lands[1])], &[&rows[1][0]]),
            beam("U", sections[2], spans[2], &[wall("b", 0.0), wall("c", spans[2])], &[&rows[2][0], &rows[2][1]]),
        ]
        .concat(),
    );
    let design = |index: usize| 1.35 * (g[index] + own[index].1) + 1.5 * q[index];
    let first_design = design(0) * spans[0] / 2.0;
    let second_design = design(1) * spans[1] / 2.0 + first_design * lands[0] / spans[1];
    Case::new("three deep", "statics and elastic lines of handbooks, added by hand", job)
        .is("beams.0.bearings.1.reaction_kN.characteristic_max", first, EXACT)
        .is("beams.1.bearings.1.reaction_kN.characteristic_max", second, EXACT)
        .is("beams.1.bearings.1.reaction_kN.design_max", second_design, EXACT)
        .is(
            "beams.2.bearings.1.reaction_kN.design_max",
            design(2) * spans[2] / 2.0 + second_design * lands[1] / spans[2],
            EXACT,
        )
        .is("beams.1.bearings.1.reaction_kN.imposed A", q[0] * spans[0] / 2.0 * lands[0] / spans[1], 1e-8)
        .is("beams.0.tilt", second_there / spans[0], EXACT)
        .is("beams.1.tilt", third_there / spans[1], EXACT)
        .is("beams.0.deflection_mm.stacked_total", (own_there + inherited(second_there, 0, top)) * 1e3, EXACT)
        .within("beams.0.deflection_mm.stacked_at_m", top, 1e-6)
        .within("beams.0.deflection_mm.inherited_there", inherited(second_there, 0, top) * 1e3, 1e-5)
        .is("beams.2.deflection_mm.stacked_total", lowest(2, second, lands[1]) * 1e3, EXACT)
        .is("beams.0.deflection_mm.hand_rule", hand_rule * 1e3, EXACT)
        .is("takedown.to_supports_kN.imposed A", q[0] * spans[0] + q[2] * spans[2], EXACT)
}

/// A beam that lands on the tip of an overhang: P a2 (L + a) / 3EI tilts it.
fn overhang_magnifies() -> Case {
    let (section, span, beyond) = ("254x146x37 UB", 3.0_f64, 1.2);
    let (stiffness, _) = stiffness_and_weight(section);
    let (upper, upper_span, load) = ("203x102x23 UB", 3.4_f64, 5.0);
    let (upper_stiffness, _) = stiffness_and_weight(upper);
    let force = load * upper_span / 2.0;
    let tip = force * beyond * beyond * (span + beyond) / (3.0 * stiffness);
    let job = job(
        "",
        &[
            beam(
                "L",
                upper,
                upper_span,
                &[wall("c", 0.0), carried(upper_span, "H", span + beyond)],
                &[&line("imposed", load)],
            ),
            beam("H", section, span + beyond, &[wall("a", 0.0), wall("b", span)], &[]),
        ]
        .concat(),
    );
    Case::new("a landing on a tip", "P a2 (L + a) / 3EI, handbooks", job)
        .is("beams.1.bearings.0.reaction_kN.imposed A", -force * beyond / span, EXACT)
        .is("beams.1.deflection_mm.own_variable", tip * 1e3, EXACT)
        .is(
            "beams.0.deflection_mm.own_variable",
            5.0 * load * upper_span.powi(4) / (384.0 * upper_stiffness) * 1e3,
            EXACT,
        )
}

/// A beam that lands right over a bearing of its carrier, and one that lands on that landing's own end: everything goes
/// straight down and moves nothing.
fn landing_on_a_bearing() -> Case {
    let (section, span, load) = ("203x133x30 UB", 3.0, 7.0);
    let (_, weight) = stiffness_and_weight(section);
    let job = job(
        "",
        &[
            beam("V", section, span, &[wall("d", 0.0), carried(span, "L", 2.0 * span)], &[&line("imposed", load)]),
            beam("L", section, 2.0 * span, &[wall("c", 0.0), carried(2.0 * span, "H", span)], &[]),
            beam("H", section, 2.0 * span, &[wall("a", 0.0), wall("b", span), wall("e", 2.0 * span)], &[]),
        ]
        .concat(),
    );
    Case::new("landings over bearings", "statics", job)
        .is("beams.1.bearings.1.reaction_kN.imposed A", load * span / 2.0, EXACT)
        .is("beams.2.bearings.1.reaction_kN.imposed A", load * span / 2.0, EXACT)
        .is("beams.2.bearings.1.reaction_kN.permanent", weight * span * (0.5 + 1.0 + 1.25), EXACT)
        .within("beams.2.bearings.0.reaction_kN.imposed A", 0.0, 1e-9)
        .within("beams.2.deflection_mm.own_variable", 0.0, 1e-9)
        .within("beams.0.tilt", 0.0, 1e-12)
        .within("beams.1.tilt", 0.0, 1e-12)
}
