//! What every check of a section begins with: its symbols, its yield strength, its class for bending.
//!
//! Yield strength: the product standard's table for the thicker of flange and web (UK NA.2.4 to EN 1993-1-1).
//!
//! Class for bending about the major axis, EN 1993-1-1 Table 5.2, ε = √(235 / f_y):
//! flange, outstand c_f = (b − t_w − 2 r) / 2: c_f / t_f ≤ 9 ε, 10 ε, 14 ε for classes 1, 2, 3;
//! web, d = h − 2 t_f − 2 r: d / t_w ≤ 72 ε, 83 ε, 124 ε for classes 1, 2, 3.
//! The section has the class of the worse of the two. Class 4 is not verified, nor is a web with h_w / t_w > 72 ε
//! (EN 1993-1-5 5.1(2) with η = 1.0: it could buckle in shear).
//!
//! Worked example (EN 1993-1-1 Table 5.2): 152x152x23 UC in S275: c_f = (152.2 − 5.8 − 15.2) / 2 = 65.6 mm,
//! c_f / t_f = 65.6 / 6.8 = 9.65, ε = 0.924: more than 10 ε = 9.24, at most 14 ε = 12.9: class 3.

use super::inputs::Steel;
use crate::materials::yield_row;
use crate::quantity::{Force, Length, Moment, Ratio, Stress, Volume, max, min};
use crate::sections::Section;
use crate::workings::lines::{quantities, step};
use crate::workings::unit::Unit;
use crate::workings::{Number, Silent, Workings, glossary};

quantities! {
    /// Dimensions and moduli of a rolled section.
    pub(super) struct Profile from Section {
        h: Length = h,
        b: Length = b,
        t_w: Length = t_w,
        t_f: Length = t_f,
        r: Length = r,
        W_pl_y: Volume = w_pl_y,
        W_el_y: Volume = w_el_y,
    }
}

/// Class 1 to 4 of EN 1993-1-1 5.5.2.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord)]
pub enum Class {
    One,
    Two,
    Three,
    Four,
}

/// Why a section is not verified.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) enum Refusal {
    Thick,
    ClassFour,
    SlenderWeb,
}

impl Refusal {
    pub fn reason(self) -> &'static str {
        match self {
            Refusal::Thick => "thicker than the table of yield strengths goes",
            Refusal::ClassFour => "section of class 4",
            Refusal::SlenderWeb => "web that could buckle in shear",
        }
    }
}

/// A section whose yield strength is known.
#[derive(Clone, Copy)]
pub(super) struct Yielding<N> {
    pub profile: Profile<N>,
    pub f_y: Stress<N>,
    pub epsilon: Ratio<N>,
}

/// Yield strength and ε.
pub(super) fn yielding<N: Number, W: Workings<N>>(w: &mut W, steel: &Steel) -> Result<Yielding<N>, Refusal> {
    let profile = Profile::given(w, &steel.section);
    let Profile { t_w, t_f, .. } = profile;
    let clause = steel.grade.product_standard();
    let grade = steel.grade.name();
    let Some(row) = yield_row(steel.grade, steel.section.thickest()) else {
        w.note(clause, move || {
            format!("The table of {grade} ends below this thickness: the section is not verified.")
        });
        return Err(Refusal::Thick);
    };
    let up_to = row.up_to.to_mm();
    w.say(move || format!("The thicker of flange and web decides the row of {grade}: up to {up_to:.0} mm."));
    step!(w, clause, t = max(t_f, t_w));
    let _ = t;
    let f_y = w.looked_up(clause, &glossary::f_y, row.strength, "");
    step!(w, "EN 1993-1-1 Table 5.2", epsilon = (235.0 / f_y.measured_in(Unit::NPerMm2)).root());
    Ok(Yielding { profile, f_y, epsilon })
}

/// The class for bending about the major axis.
pub(super) fn class<N: Number, W: Workings<N>>(w: &mut W, s: &Yielding<N>) -> Class {
    const CLAUSE: &str = "EN 1993-1-1 Table 5.2";
    let Profile { h, b, t_w, t_f, r, .. } = s.profile;
    let eps = s.epsilon;

    w.say("what stands out of the flange and what is flat of the web decide the class");
    step!(w, CLAUSE, c_f = (b - t_w - 2.0 * r) / 2.0);
    step!(w, CLAUSE, d = h - 2.0 * t_f - 2.0 * r);
    let flange =
        if w.when(CLAUSE, (c_f / t_f).at_most(9.0 * eps), "the flange is class 1", "the flange is not class 1") {
            Class::One
        } else if w.when(
            CLAUSE,
            (c_f / t_f).at_most(10.0 * eps),
            "the flange is class 2",
            "the flange is not class 2",
        ) {
            Class::Two
        } else if w.when(CLAUSE, (c_f / t_f).at_most(14.0 * eps), "the flange is class 3", "the flange is class 4")
        {
            Class::Three
        } else {
            Class::Four
        };

    let web = if w.when(CLAUSE, (d / t_w).at_most(72.0 * eps), "the web is class 1", "the web is not class 1") {
        Class::One
    } else if w.when(CLAUSE, (d / t_w).at_most(83.0 * eps), "the web is class 2", "the web is not class 2") {
        Class::Two
    } else if w.when(CLAUSE, (d / t_w).at_most(124.0 * eps), "the web is class 3", "the web is class 4") {
        Class::Three
    } else {
        Class::Four
    };
    flange.max(web)
}

/// The class of a section for bending about its major axis (EN 1993-1-1 Table 5.2).
///
/// # Errors
/// Why the section is not verified, in words: it is thicker than the table of yield strengths goes.
pub fn class_in_bending(steel: &Steel) -> Result<Class, &'static str> {
    let w = &mut Silent;
    let yielding = yielding::<f64, _>(w, steel).map_err(Refusal::reason)?;
    Ok(class(w, &yielding))
}

/// Depth of the web, which must not be so slender that it could buckle in shear.
pub(super) fn stocky_web<N: Number, W: Workings<N>>(w: &mut W, s: &Yielding<N>) -> Result<Length<N>, Refusal> {
    let Profile { h, t_w, t_f, .. } = s.profile;
    step!(w, "EN 1993-1-5 5.1(2)", h_w = h - 2.0 * t_f);
    let stocky = w.when(
        "EN 1993-1-5 5.1(2)",
        (h_w / t_w).at_most(72.0 * s.epsilon),
        "the web is too stocky to buckle in shear",
        "the web could buckle in shear, which is not verified",
    );
    if stocky { Ok(h_w) } else { Err(Refusal::SlenderWeb) }
}

/// A section with its resistance to bending alone.
#[derive(Clone, Copy)]
pub(super) struct Bent<N> {
    pub yielding: Yielding<N>,
    /// The modulus that its class allows.
    pub modulus: Volume<N>,
    pub gamma_M0: Ratio<N>,
    pub M_c_Rd: Moment<N>,
}

/// EN 1993-1-1 6.2.5: M_c,Rd = W f_y / γ_M0, with W_pl in classes 1 and 2 and W_el in class 3.
pub(super) fn bent<N: Number, W: Workings<N>>(w: &mut W, steel: &Steel) -> Result<Bent<N>, Refusal> {
    let yielding = yielding(w, steel)?;
    let Yielding { profile, f_y, .. } = yielding;
    let class = class(w, &yielding);
    stocky_web(w, &yielding)?;
    let gamma_M0 = w.given(&glossary::gamma_M0, Ratio::from_si(steel.choices.gamma_m()));
    let (modulus, M_c_Rd) = match class {
        Class::One | Class::Two => {
            w.say("the section resists the moment with its plastic modulus");
            step!(w, "EN 1993-1-1 6.2.5(2), (6.13)", M_c_Rd = profile.W_pl_y * f_y / gamma_M0);
            (profile.W_pl_y, M_c_Rd)
        }
        Class::Three => {
            w.say("the section is class 3, so that only its elastic modulus resists the moment");
            step!(w, "EN 1993-1-1 6.2.5(2), (6.14)", M_c_Rd = profile.W_el_y * f_y / gamma_M0);
            (profile.W_el_y, M_c_Rd)
        }
        Class::Four => return Err(Refusal::ClassFour),
    };
    Ok(Bent { yielding, modulus, gamma_M0, M_c_Rd })
}

/// A section with its resistance to shear alone.
#[derive(Clone, Copy)]
pub(super) struct Sheared<N> {
    pub h_w: Length<N>,
    pub V_pl_Rd: Force<N>,
}

/// EN 1993-1-1 6.2.6: A_v = A − 2 b t_f + (t_w + 2 r) t_f, at least η h_w t_w with η = 1.0;
/// V_pl,Rd = A_v (f_y / √3) / γ_M0.
pub(super) fn sheared<N: Number, W: Workings<N>>(w: &mut W, steel: &Steel) -> Result<Sheared<N>, Refusal> {
    let s = yielding(w, steel)?;
    let Profile { b, t_w, t_f, r, .. } = s.profile;
    let h_w = stocky_web(w, &s)?;
    let A = w.given(&glossary::A, steel.section.area);
    let gamma_M0 = w.given(&glossary::gamma_M0, Ratio::from_si(steel.choices.gamma_m()));
    w.say("the shear area is the web with the roots of the flanges");
    step!(w, "EN 1993-1-1 6.2.6(3)a", A_r = (t_w + 2.0 * r) * t_f);
    step!(w, "EN 1993-1-1 6.2.6(3)a", A_v = A - 2.0 * b * t_f + A_r);
    let whole = w.when(
        "EN 1993-1-1 6.2.6(3)a",
        (h_w * t_w).at_most(A_v),
        "it is no less than the web between the flanges",
        "it is less than the web between the flanges, which counts instead",
    );
    let A_v = if whole { A_v } else { w.line("EN 1993-1-1 6.2.6(3)a", &glossary::A_v, h_w * t_w) };
    let root_3 = crate::quantity::constant(&crate::workings::number::ROOT_3);
    step!(w, "EN 1993-1-1 6.2.6(2), (6.18)", V_pl_Rd = A_v * s.f_y / (root_3 * gamma_M0));
    Ok(Sheared { h_w, V_pl_Rd })
}

/// EN 1993-1-1 6.2.8: bending resistance under a coexistent shear.
///
/// Up to half of V_pl,Rd shear takes nothing; beyond, ρ = (2 V_Ed / V_pl,Rd − 1)², never more than 1, and
/// M_V,Rd = (W − ρ A_w² / (4 t_w)) f_y / γ_M0 ≤ M_c,Rd (6.30), with W_pl, in class 3 with W_el, which is on the safe
/// side.
pub(super) fn with_shear<N: Number, W: Workings<N>>(
    w: &mut W,
    bent: &Bent<N>,
    sheared: &Sheared<N>,
    V_Ed: Force<N>,
) -> Moment<N> {
    let Sheared { h_w, V_pl_Rd } = *sheared;
    let Bent { modulus, gamma_M0, M_c_Rd, yielding: Yielding { profile, f_y, .. } } = *bent;
    let t_w = profile.t_w;
    let small = w.when(
        "EN 1993-1-1 6.2.8(2)",
        V_Ed.at_most(0.5 * V_pl_Rd),
        "the shear at this place is at most half of the resistance to it, so that the resistance to bending stays",
        "the shear at this place is more than half of the resistance to it and takes from the resistance to bending",
    );
    if small {
        return M_c_Rd;
    }
    step!(
        w,
        "EN 1993-1-1 6.2.8(3)",
        rho = min((2.0 * V_Ed / V_pl_Rd - 1.0).squared(), crate::quantity::number(1.0))
    );
    step!(w, "EN 1993-1-1 6.2.8(5)", A_w = h_w * t_w);
    w.say("what the shear leaves of the modulus resists the moment");
    step!(w, "EN 1993-1-1 6.2.8(5)", W_V = modulus - rho * A_w.squared() / (4.0 * t_w));
    step!(w, "EN 1993-1-1 6.2.8(5), (6.30)", M_V_Rd = min(W_V * f_y / gamma_M0, M_c_Rd));
    M_V_Rd
}
