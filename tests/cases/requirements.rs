//! Which checks a beam gets, where, and with what: forces on webs by EN 1993-1-5 section 6 written out in N and mm,
//! flanges held, bending with shear away from the greatest moment, walls.

use super::*;
use crate::second_road::SHEAR_MODULUS;
use crate::second_road::sections::dimensions;

pub fn cases() -> Vec<Case> {
    vec![
        landings_at_one_place(false),
        landings_at_one_place(true),
        joints_to_the_web(),
        seats_at_ends(),
        seat_within(),
        seat_before_an_overhang(),
        held_overhang(true),
        held_overhang(false),
        held_span(&line("imposed", 6.0), &["top"], "met"),
        held_span(&line("imposed", 6.0), &["bottom"], "not verified"),
        held_span(&line("wind", -3.0), &["top"], "not verified"),
        held_span(&line("wind", -3.0), &["bottom"], "not verified"),
        held_span(&line("wind", -3.0), &["top", "bottom"], "met"),
        bending_with_shear_beside_the_greatest_moment(),
        one_wall_under_two_beams(),
        movements_and_their_places(),
    ]
}

const WEB: &str = "web under concentrated force";
const BASIS: &str = "grade = \"S275\"";
/// EN 10025-2 Table 6, up to 16 mm, N/mm2.
const YIELD: f64 = 275.0;

/// Stiff length under a crossing rolled beam, mm: 2 tf + tw + 1.17 r (EN 1993-1-5 6.3, Figure 6.2).
fn under(section: &str) -> f64 {
    let [_, _, tw, tf, r] = dimensions(section);
    2.0 * tf + tw + 1.17 * r
}

/// F_Rd of EN 1993-1-5 (6.1), kN, without stiffeners, of S275: type (a), or type (c) where `end` is the distance from
/// the stiff length to the beam's end. Lengths in mm; `a` is the beam's length.
fn web(section: &str, seat: f64, end: Option<f64>, a: f64) -> f64 {
    let [h, b, tw, tf, _] = dimensions(section);
    let hw = h - 2.0 * tf;
    let ss = seat.min(hw);
    let m1 = b / tw;
    let with = |m2: f64| {
        let within = ss + 2.0 * tf * (1.0 + (m1 + m2).sqrt());
        let (kf, ly) = match end {
            None => (6.0 + 2.0 * (hw / a).powi(2), within),
            Some(c) => {
                let kf = (2.0 + 6.0 * (ss + c) / hw).min(6.0);
                let le = (kf * 210_000.0 * tw * tw / (2.0 * YIELD * hw)).min(ss + c);
                let eleven = le + tf * (m1 / 2.0 + (le / tf).powi(2) + m2).sqrt();
                (kf, within.min(eleven).min(le + tf * (m1 + m2).sqrt()))
            }
        };
        let critical = 0.9 * kf * 210_000.0 * tw.powi(3) / hw;
        let ly = ly.min(a);
        (ly, (ly * tw * YIELD / critical).sqrt())
    };
    let mut found = with(0.02 * (hw / tf).powi(2));
    if found.1 <= 0.5 {
        found = with(0.0);
    }
    let (ly, slenderness) = found;
    YIELD * ly * tw * (0.5 / slenderness).min(1.0) / 1e3
}

/// A bearing with further keys.
fn with(bearing: String, keys: &str) -> String {
    bearing.replace(" }", &format!(", {keys} }}"))
}

/// The same beam with a `restraint`.
fn restrained(beam: String, flanges: &str) -> String {
    beam.replace("\nbearings", &format!("\nrestraint = {{ {flanges}, by = \"joists\" }}\nbearings"))
}

/// Two beams of different depth of flange land at one place, and a point load stands there as well: their forces act
/// together over the least of their stiff lengths, which is nought for the point load.
fn landings_at_one_place(with_point: bool) -> Case {
    let (section, span, at) = ("254x146x43 UB", 4.8, 2.0);
    let (one, other) = (("152x152x30 UC", 2.9, 9.0), ("203x133x25 UB", 3.4, 12.0));
    let point_force = if with_point { 6.0 } else { 0.0 };
    let end = |(upper, length, load): (&str, f64, f64)| {
        let (_, weight) = stiffness_and_weight(upper);
        (1.35 * weight + 1.5 * load) * length / 2.0
    };
    let force = end(one) + end(other) + 1.5 * point_force;
    let stiff = if with_point { 0.0 } else { under(other.0).min(under(one.0)) };
    let (stiffness, weight) = stiffness_and_weight(section);
    let moment = (force / span + 1.35 * weight / 2.0) * at * (span - at);
    // W_el = 2 I / h, EI in kNm2 and h in mm.
    let elastic = 2.0 * stiffness / (YOUNG / 1e3) / (dimensions(section)[0] / 1e3) * YIELD * 1e3;
    let resistance = web(section, stiff, None, span * 1e3);
    let row = point("imposed", 6.0, at);
    let rows: Vec<&str> = if with_point { vec![&row] } else { vec![] };
    let upper = |mark: &str, wall_name: &str, (upper, length, load): (&str, f64, f64)| {
        let carried = with(carried(length, "S", at), "joint = \"on top flange\"");
        beam(mark, upper, length, &[wall(wall_name, 0.0), carried], &[&line("imposed", load)])
    };
    let beams = [
        beam("S", section, span, &[wall("a", 0.0), wall("b", span)], &rows),
        upper("U", "c", one),
        upper("V", "d", other),
    ];
    Case::new(
        "forces that meet at a place",
        "EN 1993-1-5 6.1 to 6.5 and (7.2) by hand; the least stiff length is on the safe side",
        job(BASIS, &beams.concat()),
    )
    .is(&format!("beams.0.checks.{WEB}#1.demand"), force, EXACT)
    .is(&format!("beams.0.checks.{WEB}#1.capacity"), resistance, EXACT)
    .within(&format!("beams.0.checks.{WEB}#1.at_m"), at, 1e-9)
    .is("beams.0.checks.web with bending#1.demand", force / resistance + 0.8 * moment / elastic, EXACT)
    .absent(&format!("beams.0.checks.{WEB}#3"))
    // The upper beam's web over the carrier, at its very end: the carrier's flange is what it stands on.
    .is(&format!("beams.1.checks.{WEB}#1.demand"), end(one), EXACT)
    .is(&format!("beams.1.checks.{WEB}#1.capacity"), web(one.0, under(section), Some(0.0), one.1 * 1e3), EXACT)
}

/// A landing that is joined to the web brings no force through a flange, neither below nor above.
fn joints_to_the_web() -> Case {
    let section = "254x146x37 UB";
    let beams = [
        beam("S", section, 4.4, &[wall("a", 0.0), wall("b", 4.4)], &[]),
        beam(
            "U",
            "203x133x25 UB",
            3.1,
            &[wall("c", 0.0), with(carried(3.1, "S", 1.9), "joint = \"to the web\"")],
            &[&line("imposed", 8.0)],
        ),
    ];
    Case::new("a joint to the web", "EN 1993-1-5 6.1(1): forces through a flange", job(BASIS, &beams.concat()))
        .within(&format!("beams.0.checks.{WEB}#1.at_m"), 4.4, 1e-9)
        .absent(&format!("beams.0.checks.{WEB}#2"))
        .within(&format!("beams.1.checks.{WEB}#0.at_m"), 0.0, 1e-9)
        .absent(&format!("beams.1.checks.{WEB}#1"))
}

/// Seats near the ends, type (c): one whose edge is 40 mm from the end, one at the very end.
fn seats_at_ends() -> Case {
    let (section, length, at, q) = ("203x133x30 UB", 3.5, 0.09, 14.0);
    let (_, weight) = stiffness_and_weight(section);
    let span = length - at;
    // Permanent load whole; imposed load free before and beyond the bearing.
    let first = (1.35 * weight + 1.5 * q) * length * length / 2.0 / span;
    let last = (1.35 * weight * length * (length / 2.0 - at) + 1.5 * q * span * span / 2.0) / span;
    let bearings = [
        with(wall("a", at), "bearing-length = \"100 mm\""),
        with(wall("b", length), "bearing-length = \"150 mm\""),
    ];
    let beams = beam("S", section, length, &bearings, &[&line("imposed", q)]);
    Case::new("seats at ends", "EN 1993-1-5 Figure 6.1 type (c), by hand", job(BASIS, &beams))
        .is(&format!("beams.0.checks.{WEB}#0.demand"), first, EXACT)
        .is(&format!("beams.0.checks.{WEB}#0.capacity"), web(section, 100.0, Some(40.0), length * 1e3), EXACT)
        .is(&format!("beams.0.checks.{WEB}#1.demand"), last, EXACT)
        .is(&format!("beams.0.checks.{WEB}#1.capacity"), web(section, 150.0, Some(0.0), length * 1e3), EXACT)
}

/// The middle seat of two equal spans, type (a): 1.25 w L.
fn seat_within() -> Case {
    let (section, span, q) = ("254x146x31 UB", 3.6, 16.0);
    let (_, weight) = stiffness_and_weight(section);
    let middle = with(wall("b", span), "bearing-length = \"200 mm\"");
    let bearings = [wall("a", 0.0), middle, wall("c", 2.0 * span)];
    let beams = beam("S", section, 2.0 * span, &bearings, &[&line("imposed", q)]);
    Case::new("a seat within", "1.25 w L, handbooks; EN 1993-1-5 Figure 6.1 type (a)", job(BASIS, &beams))
        .is(&format!("beams.0.checks.{WEB}#1.demand"), 1.25 * (1.35 * weight + 1.5 * q) * span, EXACT)
        .is(&format!("beams.0.checks.{WEB}#1.capacity"), web(section, 200.0, None, 2e3 * span), EXACT)
}

/// An outer bearing that is farther from the end than the section is deep: type (a).
fn seat_before_an_overhang() -> Case {
    let (section, span, beyond, q) = ("254x146x37 UB", 3.9, 0.8, 11.0);
    let (_, weight) = stiffness_and_weight(section);
    let length = span + beyond;
    let reaction = (1.35 * weight + 1.5 * q) * length * length / 2.0 / span;
    let bearings = [wall("a", 0.0), with(wall("b", span), "bearing-length = \"140 mm\"")];
    let beams = beam("S", section, length, &bearings, &[&line("imposed", q)]);
    Case::new("a seat before an overhang", "statics; EN 1993-1-5 Figure 6.1 type (a)", job(BASIS, &beams))
        .is(&format!("beams.0.checks.{WEB}#1.demand"), reaction, EXACT)
        .is(&format!("beams.0.checks.{WEB}#1.capacity"), web(section, 140.0, None, length * 1e3), EXACT)
}

/// Span and overhang hog at the bearing: the bottom flange is in compression there, in both of them.
fn held_overhang(bottom: bool) -> Case {
    let (section, span, beyond, q) = ("254x146x37 UB", 4.6, 1.1, 8.0);
    let (_, weight) = stiffness_and_weight(section);
    let design = 1.35 * weight + 1.5 * q;
    let first = 1.35 * weight * (span / 2.0 - beyond * beyond / (2.0 * span)) + 1.5 * q * span / 2.0;
    let flanges = if bottom { "top = \"continuous\", bottom = \"continuous\"" } else { "top = \"continuous\"" };
    let beams = beam("H", section, span + beyond, &[wall("a", 0.0), wall("b", span)], &[&line("imposed", q)]);
    let verdict = if bottom { "met" } else { "not verified" };
    Case::new(
        "flanges of a span and an overhang",
        "EN 1993-1-1 6.3.2.1(2): the flange in compression is held; moments by statics",
        job(BASIS, &restrained(beams, flanges)),
    )
    .says("beams.0.checks.lateral-torsional buckling#0.verdict", verdict)
    .says("beams.0.checks.lateral-torsional buckling#1.verdict", verdict)
    .is("beams.0.checks.lateral-torsional buckling#0.demand", first * first / (2.0 * design), EXACT)
    .is("beams.0.checks.lateral-torsional buckling#1.demand", design * beyond * beyond / 2.0, EXACT)
    .absent("beams.0.checks.lateral-torsional buckling#2")
    .within("beams.0.moment_kNm.min_at_m", span, 1e-6)
    // span/250 and span/360 unless the job says otherwise, of the span and of twice the overhang (UK NA.2.23, common
    // practice); the stacked movement of an overhang may be that of the span beside it.
    .is("beams.0.checks.total deflection#0.capacity", span * 4.0, EXACT)
    .is("beams.0.checks.total deflection#1.capacity", 2.0 * beyond * 4.0, EXACT)
    .is("beams.0.checks.variable deflection#1.capacity", 2.0 * beyond / 0.36, EXACT)
    .is("beams.0.checks.stacked deflection#1.capacity", span * 4.0, EXACT)
}

/// A beam that sags everywhere needs its top flange held and no other; one that wind lifts beyond its own weight sags in
/// one combination (1.35 G) and hogs in another (1.0 G - 1.5 W): it needs both.
fn held_span(row: &str, flanges: &[&str], verdict: &'static str) -> Case {
    let flanges: Vec<String> = flanges.iter().map(|flange| format!("{flange} = \"continuous\"")).collect();
    let beams = beam("S", "254x146x37 UB", 4.0, &[wall("a", 0.0), wall("b", 4.0)], &[row]);
    Case::new(
        "the flanges of a span",
        "EN 1993-1-1 6.3.2.1(2): the flange in compression is held",
        job(BASIS, &restrained(beams, &flanges.join(", "))),
    )
    .says("beams.0.checks.lateral-torsional buckling#0.verdict", verdict)
}

/// A point load near a bearing takes more than half of the shear resistance; the moment rises a little beyond it, where
/// hardly any shear is left. The moment with shear is worst at the load, not where the moment is greatest.
fn bending_with_shear_beside_the_greatest_moment() -> Case {
    let (section, span, at, force, q) = ("127x76x13 UB", 1.2, 0.25, 60.0, 38.0);
    let (_, weight) = stiffness_and_weight(section);
    let load = 1.35 * weight + 1.5 * q;
    let reaction = 1.35 * force * (span - at) / span + load * span / 2.0;
    let moment = reaction * at - load * at * at / 2.0;
    let left = reaction - load * at - 1.35 * force;
    let beams = beam(
        "S",
        section,
        span,
        &[wall("a", 0.0), wall("b", span)],
        &[&line("imposed", q), &point("permanent", force, at)],
    );
    Case::new("bending with shear", "EN 1993-1-1 6.2.8, by statics", job(BASIS, &beams))
        .within("beams.0.moment_kNm.at_m", at + left / load, 1e-6)
        .is("beams.0.moment_kNm.max", moment + left * left / (2.0 * load), EXACT)
        .within("beams.0.checks.bending with shear#0.at_m", at, 1e-6)
        .is("beams.0.checks.bending with shear#0.demand", moment, EXACT)
}

/// Two beams on one wall: its design and characteristic sums.
fn one_wall_under_two_beams() -> Case {
    let (section, spans, loads) = ("203x133x25 UB", [3.2, 4.1], [5.0, 7.0]);
    let (_, weight) = stiffness_and_weight(section);
    let sum = |g: f64, q: f64| (0..2).map(|n| (g * weight + q * loads[n]) * spans[n] / 2.0).sum::<f64>();
    let one = |mark: &str, n: usize, far: &str| {
        beam(mark, section, spans[n], &[wall("a", 0.0), wall(far, spans[n])], &[&line("imposed", loads[n])])
    };
    Case::new(
        "one wall under two beams",
        "statics, EN 1990 (6.10) and (6.14b)",
        job(BASIS, &[one("S", 0, "b"), one("T", 1, "c")].concat()),
    )
    .is("walls.0.design_max_kN", sum(1.35, 1.5), EXACT)
    .is("walls.0.characteristic_max_kN", sum(1.0, 1.0), EXACT)
    .is("walls.0.total_kN.imposed A", sum(0.0, 1.0), EXACT)
}

/// An end that settles tilts the beam, so that the stacked movement peaks elsewhere than the own one: each figure at
/// its own place. And the movement of shear, w L2 / (8 G A_v), which the basis leaves out.
fn movements_and_their_places() -> Case {
    let (section, span, settles) = ("254x146x31 UB", 5.2_f64, 4.0e-3);
    let (stiffness, weight) = stiffness_and_weight(section);
    let load = weight + 6.0;
    let own = |x: f64| uniform_line(load, span, x)[0] / stiffness;
    let x = root(0.5 * span, span, |x| uniform_line(load, span, x)[1] / stiffness + settles / span);
    let shear_area = Shape::named(section).shear_area;
    let bearings = [wall("a", 0.0), with(wall("b", span), "settles = \"4.0 mm\"")];
    let beams = beam("S", section, span, &bearings, &[&line("imposed", 6.0)]);
    Case::new("movements and their places", "5wL4/384EI, wL2/8GA, handbooks; a line tilted", job(BASIS, &beams))
        .within("beams.0.deflection_mm.own_total_at_m", span / 2.0, 1e-6)
        .is("beams.0.deflection_mm.own_total", own(span / 2.0) * 1e3, EXACT)
        .within("beams.0.deflection_mm.stacked_at_m", x, 1e-6)
        .is("beams.0.deflection_mm.stacked_total", (own(x) + settles * x / span) * 1e3, EXACT)
        .is("beams.0.deflection_mm.own_there", own(x) * 1e3, 1e-6)
        .is("beams.0.deflection_mm.settled_there", settles * x / span * 1e3, 1e-6)
        .is(
            "beams.0.deflection_mm.shear_movement",
            load * span * span / (8.0 * SHEAR_MODULUS / 1e3 * shear_area) * 1e3,
            EXACT,
        )
        .is("beams.0.tilt", settles / span, EXACT)
}
