//! Beams that run on beyond a bearing.

use super::*;

pub fn cases() -> Vec<Case> {
    vec![tip_load(), uniform_on_overhang(), span_and_overhang_free()]
}

fn overhanging(section: &str, span: f64, beyond: f64, rows: &[&str]) -> String {
    job("", &beam("H", section, span + beyond, &[wall("a", 0.0), wall("b", span)], rows))
}

/// P at the tip: -P a / L and P (L + a) / L; tip P a2 (L + a) / 3EI.
fn tip_load() -> Case {
    let (section, span, beyond, force) = ("254x102x25 UB", 3.2_f64, 1.7, 9.0);
    let (stiffness, weight) = stiffness_and_weight(section);
    let whole = span + beyond;
    // Own weight: the span holds the first bearing down, the overhang lifts it.
    let (down, up) = (weight * span / 2.0, weight * beyond * beyond / (2.0 * span));
    let lift = force * beyond / span;
    Case::new(
        "load at the tip",
        "P a2 (L + a) / 3EI, handbooks; sets A and B by hand",
        overhanging(section, span, beyond, &[&point("imposed", force, whole)]),
    )
    .is("beams.0.bearings.0.reaction_kN.imposed A", -lift, EXACT)
    .is("beams.0.bearings.1.reaction_kN.imposed A", force + lift, EXACT)
    .is("beams.0.bearings.0.reaction_kN.design_min", down - up - 1.5 * lift, EXACT)
    .is("beams.0.bearings.0.reaction_kN.design_max", 1.35 * (down - up), EXACT)
    .is("beams.0.bearings.0.reaction_kN.uplift_max", 1.5 * lift + 1.1 * up - 0.9 * down, EXACT)
    .is("beams.0.moment_kNm.min", -1.5 * force * beyond - 1.35 * weight * beyond * beyond / 2.0, EXACT)
    .is(
        "beams.0.deflection_mm.own_variable",
        force * beyond * beyond * (span + beyond) / (3.0 * stiffness) * 1e3,
        EXACT,
    )
}

/// w on the overhang: tip w a3 (4 L + 3 a) / 24EI.
fn uniform_on_overhang() -> Case {
    let (section, span, beyond, load) = ("203x133x30 UB", 2.9_f64, 1.8, 6.0);
    let (stiffness, _) = stiffness_and_weight(section);
    Case::new(
        "uniform load on the overhang",
        "w a3 (4 L + 3 a) / 24EI, handbooks",
        overhanging(section, span, beyond, &[&part("imposed", load, span, span + beyond)]),
    )
    .is("beams.0.bearings.0.reaction_kN.imposed A", -load * beyond * beyond / (2.0 * span), EXACT)
    .is(
        "beams.0.deflection_mm.own_variable",
        load * beyond.powi(3) * (4.0 * span + 3.0 * beyond) / (24.0 * stiffness) * 1e3,
        EXACT,
    )
}

/// One imposed row over all of it is free on the span and on the overhang: each place where it worsens.
fn span_and_overhang_free() -> Case {
    let (section, span, beyond, q) = ("254x146x37 UB", 4.6_f64, 1.1, 8.0);
    let (stiffness, weight) = stiffness_and_weight(section);
    // Greatest sagging: the span alone. Permanent load whole, for or against.
    let first = 1.35 * weight * (span / 2.0 - beyond * beyond / (2.0 * span)) + 1.5 * q * span / 2.0;
    let design = 1.35 * weight + 1.5 * q;
    Case::new(
        "span and overhang free",
        "EN 1991-1-1 6.2.1(1), by statics",
        overhanging(section, span, beyond, &[&line("imposed", q)]),
    )
    .is("beams.0.moment_kNm.max", first * first / (2.0 * design), EXACT)
    .within("beams.0.moment_kNm.at_m", first / design, 1e-6)
    .is("beams.0.moment_kNm.min", -design * beyond * beyond / 2.0, EXACT)
    .is("beams.0.bearings.0.reaction_kN.design_max", first, EXACT)
    .is("beams.0.bearings.0.reaction_kN.imposed A", q * (span / 2.0 - beyond * beyond / (2.0 * span)), EXACT)
    // The span's own load sags it by 5wL4/384EI at midspan.
    .is("beams.0.deflection_mm.own_variable", 5.0 * q * span.powi(4) / (384.0 * stiffness) * 1e3, EXACT)
}
