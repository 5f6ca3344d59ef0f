//! Web under a concentrated force, EN 1993-1-5 section 6: F_Ed ≤ F_Rd, without stiffeners.
//!
//! Type (a), a force through one flange, resisted by shear on both sides:
//! k_F = 6 + 2 (h_w / a)²; l_y = s_s + 2 t_f (1 + √(m_1 + m_2)) ≤ a (6.10).
//! Type (c), a force near the beam's end: k_F = 2 + 6 (s_s + c) / h_w ≤ 6;
//! l_e = k_F E t_w² / (2 f_y h_w) ≤ s_s + c (6.13); l_y the least of (6.10), l_e + t_f √(m_1 / 2 + (l_e / t_f)² + m_2)
//! (6.11) and l_e + t_f √(m_1 + m_2) (6.12), and at most a.
//! m_1 = b_f / t_w, flange and web having one yield strength (6.8); m_2 = 0.02 (h_w / t_f)² where λ_F then comes out
//! above 0.5, else 0 (6.9). F_cr = 0.9 k_F E t_w³ / h_w (6.5), λ_F = √(l_y t_w f_y / F_cr) (6.4),
//! χ_F = 0.5 / λ_F ≤ 1 (6.3), L_eff = χ_F l_y (6.2), F_Rd = f_y L_eff t_w / γ_M1 (6.1).
//! s_s is at most h_w (6.3(1)). Stiff length under a crossing rolled beam: 2 t_f + t_w + 1.17 r of that beam; 0 where
//! it is not known. Forces in kN, lengths in mm.
//!
//! Where it is not met, a transverse stiffener (9.4) is required, and said so.
//!
//! Worked example (by hand, test below): 254x146x37 UB in S275, seat of 150 mm at the beam's very end, length 4.80 m.

use super::Inputs;
use super::combined::{Writing, size};
use super::example::two;
use super::section::{Profile, Yielding, yielding};
use super::{Combined, Outcome, Steel, judge, unverified};
use crate::materials;
use crate::materials::Grade;
use crate::quantity::{Force, Length, Ratio, min, number};
use crate::results::{CheckUnit, Verdict};
use crate::workings::lines::step;
use crate::workings::{Number, Silent, Workings, glossary};

pub(super) const CLAUSE: &str = "EN 1993-1-5 6.2";

/// A force brought into the web through a flange.
#[derive(Clone, Debug, PartialEq)]
pub struct WebUnderForce {
    pub steel: Steel,
    pub force: Combined<1, 0>,
    pub way: Way,
    pub stiff: StiffLength,
    /// Distance between transverse stiffeners: the beam's length where it has none.
    pub a: Length,
}

/// How the force meets the web, EN 1993-1-5 Figure 6.1.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Way {
    /// Type (a): through one flange, resisted by shear in the web on both sides.
    Within,
    /// Type (c): near the beam's end; `c` is the distance from the edge of the stiff length to the end, 0 or more.
    AtEnd { c: Length },
}

/// Over which length the force arrives stiffly, EN 1993-1-5 6.3.
#[derive(Clone, Debug, PartialEq)]
pub enum StiffLength {
    /// The seat on a wall.
    Seat(Length),
    /// A rolled beam that crosses: 2 t_f + t_w + 1.17 r of its section.
    Crossing { mark: String, t_f: Length, t_w: Length, r: Length },
    /// Not known (point loads): 0.
    Unknown,
}

const FORCE: Writing<'_, 1, 0> = Writing::new(&glossary::F_Ed, &glossary::F, "forces");

/// Said where the web alone does not resist the force.
pub const STIFFENER: &str = "a transverse stiffener is required (EN 1993-1-5 9.4)";

pub(super) fn check<N: Number, W: Workings<N>>(w: &mut W, inputs: &WebUnderForce) -> Outcome {
    let F_Ed = size(w, &inputs.force, &FORCE);
    let s = match yielding(w, &inputs.steel) {
        Ok(s) => s,
        Err(refusal) => return unverified(w, CLAUSE, F_Ed, CheckUnit::Force, refusal.reason()),
    };
    let F_Rd = resistance(w, inputs, &s);
    let mut outcome = judge(w, CLAUSE, F_Ed, F_Rd, CheckUnit::Force);
    if outcome.verdict == Verdict::NotMet {
        w.note("EN 1993-1-5 9.4", STIFFENER);
        outcome.reason = Some(STIFFENER.into());
    }
    outcome
}

/// F_Ed and F_Rd, for the interaction with bending.
pub(super) fn force_and_resistance<N: Number, W: Workings<N>>(
    w: &mut W,
    inputs: &WebUnderForce,
    s: &Yielding<N>,
) -> (Force<N>, Force<N>) {
    (size(w, &inputs.force, &FORCE), resistance(w, inputs, s))
}

/// F_Rd.
fn resistance<N: Number, W: Workings<N>>(w: &mut W, inputs: &WebUnderForce, s: &Yielding<N>) -> Force<N> {
    let Profile { h, b, t_w, t_f, .. } = s.profile;
    let f_y = s.f_y;
    let E = w.given(&glossary::E, materials::E);
    let a = w.given(&glossary::a, inputs.a);
    let gamma_M1 = w.given(&glossary::gamma_M1, Ratio::from_si(inputs.steel.choices.gamma_m()));
    step!(w, "EN 1993-1-5 5.1(2)", h_w = h - 2.0 * t_f);
    let s_s = stiff_length(w, &inputs.stiff, h_w);

    let (k_F, l_e) = match inputs.way {
        Way::Within => {
            w.say("the force comes through one flange and is resisted on both sides, type (a)");
            step!(w, "EN 1993-1-5 6.4(1), Figure 6.1", k_F = 6.0 + 2.0 * (h_w / a).squared());
            (k_F, None)
        }
        Way::AtEnd { c } => {
            let c = w.given(&glossary::c, c);
            w.say("the force stands near the beam\u{2019}s end, type (c)");
            step!(w, "EN 1993-1-5 6.4(1), Figure 6.1", k_F = min(2.0 + 6.0 * (s_s + c) / h_w, number(6.0)));
            let l_e_13 = w.line(
                "EN 1993-1-5 6.5(3), (6.13)",
                glossary::l_e.of("13"),
                k_F * E * t_w.squared() / (2.0 * f_y * h_w),
            );
            step!(w, "EN 1993-1-5 6.5(3), (6.13)", l_e = min(l_e_13, s_s + c));
            (k_F, Some(l_e))
        }
    };
    w.say("critical force of the web");
    step!(w, "EN 1993-1-5 6.4(1), (6.5)", F_cr = 0.9 * k_F * E * t_w.cubed() / h_w);
    w.say("flange and web have one yield strength, which leaves their widths");
    step!(w, "EN 1993-1-5 6.5(1), (6.8)", m_1 = b / t_w);
    step!(w, "EN 1993-1-5 6.5(1), (6.9)", m_2 = 0.02 * (h_w / t_f).squared());

    let web = Web { s_s, t_f, t_w, a, m_1, l_e, f_y, F_cr };
    let (mut l_y, mut lambda_F) = web.slenderness(w, Some(m_2));
    let slender = w.when(
        "EN 1993-1-5 6.5(1), (6.9)",
        lambda_F.more_than(number(0.5)),
        "the slenderness is above 0.5, so that the web keeps its part in spreading the force",
        "the slenderness is not above 0.5, so that the web has no part in spreading the force, and the length is found again",
    );
    if !slender {
        (l_y, lambda_F) = web.slenderness(w, None);
    }
    w.say("the slenderness decides how much of the length resists with the yield strength");
    step!(w, "EN 1993-1-5 6.4(1), (6.3)", chi_F = min(0.5 / lambda_F, number(1.0)));
    step!(w, "EN 1993-1-5 6.2(1), (6.2)", L_eff = chi_F * l_y);
    step!(w, "EN 1993-1-5 6.2(1), (6.1)", F_Rd = f_y * L_eff * t_w / gamma_M1);
    F_Rd
}

impl StiffLength {
    /// How long it is, before the web's depth bounds it.
    pub fn length(&self) -> Length {
        arriving(&mut Silent, self)
    }
}

fn stiff_length<N: Number, W: Workings<N>>(w: &mut W, stiff: &StiffLength, h_w: Length<N>) -> Length<N> {
    let s_s = arriving(w, stiff);
    if w.when(
        STIFF,
        s_s.at_most(h_w),
        "the stiff length counts in full",
        "the stiff length counts up to the web\u{2019}s depth",
    ) {
        return s_s;
    }
    step!(w, "EN 1993-1-5 6.3(1)", s_s = min(s_s, h_w));
    s_s
}

const STIFF: &str = "EN 1993-1-5 6.3";

/// Over which length the force arrives, before the web's depth bounds it.
fn arriving<N: Number, W: Workings<N>>(w: &mut W, stiff: &StiffLength) -> Length<N> {
    match stiff {
        StiffLength::Seat(length) => {
            w.looked_up(STIFF, &glossary::s_s, *length, "the seat is stiff over its length")
        }
        StiffLength::Crossing { mark, t_f, t_w, r } => {
            let t_f = w.given(glossary::t_f_above.of(mark.as_str()), *t_f);
            let t_w = w.given(glossary::t_w_above.of(mark.as_str()), *t_w);
            let r = w.given(glossary::r_above.of(mark.as_str()), *r);
            w.say(|| {
                format!("The force comes from the flange of {mark} and spreads through its thickness and roots.")
            });
            step!(w, "EN 1993-1-5 6.3, Figure 6.2", s_s = 2.0 * t_f + t_w + 1.17 * r);
            s_s
        }
        StiffLength::Unknown => {
            let nought = Length::from_si(0.0);
            w.looked_up(STIFF, &glossary::s_s, nought, "the stiff length is not known and taken as nought")
        }
    }
}

/// What the effective length and the slenderness depend on, but for m_2.
#[derive(Clone, Copy)]
struct Web<N> {
    s_s: Length<N>,
    t_f: Length<N>,
    t_w: Length<N>,
    a: Length<N>,
    m_1: Ratio<N>,
    /// Type (c).
    l_e: Option<Length<N>>,
    f_y: crate::quantity::Stress<N>,
    F_cr: Force<N>,
}

impl<N: Number> Web<N> {
    /// l_y and λ_F; without m_2 (it is 0) they carry a 0 in their names.
    fn slenderness<W: Workings<N>>(&self, w: &mut W, m_2: Option<Ratio<N>>) -> (Length<N>, Ratio<N>) {
        let Web { s_s, t_f, t_w, a, m_1, f_y, F_cr, .. } = *self;
        let named = |with: &'static str, without: &'static str| if m_2.is_some() { with } else { without };
        w.say(match self.l_e {
            None => "the force spreads through the flange, at most up to the stiffeners",
            Some(_) => {
                "the force spreads through the flange; the least length counts, at most up to the stiffeners"
            }
        });
        let m = match m_2 {
            Some(m_2) => {
                step!(w, "EN 1993-1-5 6.5(2), (6.10)", m = m_1 + m_2);
                m
            }
            None => m_1,
        };
        let l_y_10 = w.line(
            "EN 1993-1-5 6.5(2), (6.10)",
            glossary::l_y.of(named("10", "10,0")),
            s_s + 2.0 * t_f * (1.0 + m.root()),
        );
        let least = match self.l_e {
            None => min(l_y_10, a),
            Some(l_e) => {
                const ELEVEN: &str = "EN 1993-1-5 6.5(3), (6.11)";
                let m_e = match m_2 {
                    Some(m_2) => w.line(ELEVEN, &glossary::m_e, m_1 / 2.0 + (l_e / t_f).squared() + m_2),
                    None => w.line(ELEVEN, glossary::m_e.of("0"), m_1 / 2.0 + (l_e / t_f).squared()),
                };
                let l_y_11 = w.line(ELEVEN, glossary::l_y.of(named("11", "11,0")), l_e + t_f * m_e.root());
                let l_y_12 = w.line(
                    "EN 1993-1-5 6.5(3), (6.12)",
                    glossary::l_y.of(named("12", "12,0")),
                    l_e + t_f * m.root(),
                );
                min(min(min(l_y_10, l_y_11), l_y_12), a)
            }
        };
        let without = m_2.is_none();
        let symbol = if without { glossary::l_y.of("0") } else { (&glossary::l_y).into() };
        let l_y = w.line("EN 1993-1-5 6.5", symbol, least);
        w.say("slenderness of the web");
        let symbol = if without { glossary::lambda_F.of("0") } else { (&glossary::lambda_F).into() };
        let lambda_F = w.line("EN 1993-1-5 6.4(1), (6.4)", symbol, (l_y * t_w * f_y / F_cr).root());
        (l_y, lambda_F)
    }
}

/// The worked example above.
pub fn example() -> Inputs {
    Inputs::WebUnderForce(WebUnderForce {
        steel: Steel::named("254x146x37 UB", Grade::S275),
        force: two(20e3, 10e3),
        way: Way::AtEnd { c: Length::mm(0.0) },
        stiff: StiffLength::Seat(Length::mm(150.0)),
        a: Length::m(4.8),
    })
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::checks::example::near;
    use crate::checks::run;

    #[test]
    fn worked_example() {
        // By hand, in N and mm: h_w = 256.0 - 21.8 = 234.2; k_F = 2 + 6 * 150 / 234.2 = 5.843 (not above 6);
        // l_e = 5.843 * 210000 * 6.3^2 / (2 * 275 * 234.2) = 378 > 150, so 150; m_1 = 146.4 / 6.3 = 23.24;
        // m_2 = 0.02 * (234.2 / 10.9)^2 = 9.23; (6.12): l_y = 150 + 10.9 * sqrt(32.47) = 212.1, the least;
        // F_cr = 0.9 * 5.843 * 210000 * 6.3^3 / 234.2 = 1 179 000; lambda_F = sqrt(212.1 * 6.3 * 275 / 1179000) = 0.558;
        // chi_F = 0.5 / 0.558 = 0.896; F_Rd = 0.896 * 212.1 * 6.3 * 275 = 329 kN.
        let outcome = run(&example());
        near(outcome.capacity, 329e3, 0.002);
        near(outcome.demand, 42e3, 1e-12);
    }
}
