//! The properties of every section against a second road: its outline cut into thin strips parallel to the flanges
//! and added up, with nothing taken from the calculation but the dimensions.

use sagledger_calc::sections::{self, Section};

/// Strips in each part of a half: web, fillets, flange.
const STRIPS: usize = 4000;

#[derive(Default)]
struct Sums {
    area: f64,
    i_y: f64,
    i_z: f64,
    w_pl_y: f64,
    w_pl_z: f64,
}

/// Both halves of the section, mm.
fn by_strips(section: &Section) -> Sums {
    let [h, b, t_w, t_f, r] = [section.h, section.b, section.t_w, section.t_f, section.r].map(|l| l.to_mm());
    let (fillet_begins, under_flange) = (h / 2.0 - t_f - r, h / 2.0 - t_f);
    let fillet_width = move |y: f64| {
        let up = y - fillet_begins;
        t_w + 2.0 * (r - (r * r - up * up).sqrt())
    };
    let mut sums = Sums::default();
    add(&mut sums, 0.0, fillet_begins, |_| t_w);
    add(&mut sums, fillet_begins, under_flange, fillet_width);
    add(&mut sums, under_flange, h / 2.0, |_| b);
    sums
}

fn add(sums: &mut Sums, from: f64, to: f64, width: impl Fn(f64) -> f64) {
    let thickness = (to - from) / STRIPS as f64;
    for i in 0..STRIPS {
        let y = from + (i as f64 + 0.5) * thickness;
        let width = width(y);
        let area = 2.0 * width * thickness;
        sums.area += area;
        sums.i_y += area * (y * y + thickness * thickness / 12.0);
        sums.i_z += area * width * width / 12.0;
        sums.w_pl_y += area * y;
        sums.w_pl_z += area * width / 4.0;
    }
}

#[test]
fn properties_of_every_section_agree_with_strips() {
    for section in sections::catalogue() {
        let sums = by_strips(section);
        let pairs = [
            ("A", section.area.to_mm2(), sums.area),
            ("Iy", section.i_y.to_cm4() * 1e4, sums.i_y),
            ("Iz", section.i_z.to_cm4() * 1e4, sums.i_z),
            ("Wel,y", section.w_el_y.to_cm3() * 1e3, sums.i_y / (section.h.to_mm() / 2.0)),
            ("Wel,z", section.w_el_z.to_cm3() * 1e3, sums.i_z / (section.b.to_mm() / 2.0)),
            ("Wpl,y", section.w_pl_y.to_cm3() * 1e3, sums.w_pl_y),
            ("Wpl,z", section.w_pl_z.to_cm3() * 1e3, sums.w_pl_z),
            ("iy", section.radius_y.to_mm(), (sums.i_y / sums.area).sqrt()),
            ("iz", section.radius_z.to_mm(), (sums.i_z / sums.area).sqrt()),
        ];
        for (what, computed, added) in pairs {
            assert!((computed / added - 1.0).abs() < 1e-6, "{} {what}: {computed} against {added}", section.name);
        }
    }
}

#[test]
fn shear_area_is_what_carries_shear() {
    // EN 1993-1-1 6.2.6(3)a: everything but the flanges beyond the fillets, and never below the web alone.
    for section in sections::catalogue() {
        let [h, b, t_w, t_f, r] = [section.h, section.b, section.t_w, section.t_f, section.r].map(|l| l.to_mm());
        let outstands = 4.0 * (b / 2.0 - t_w / 2.0 - r) * t_f;
        let without_outstands = by_strips(section).area - outstands - (t_w + 2.0 * r) * t_f;
        let expected = without_outstands.max((h - 2.0 * t_f) * t_w);
        let computed = section.a_v.to_mm2();
        assert!((computed / expected - 1.0).abs() < 1e-6, "{}: {computed} against {expected}", section.name);
    }
}
