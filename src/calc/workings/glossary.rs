//! Every symbol that a working prints: how it is written, what it means, its unit and its rounding.
//!
//! Symbols are those of the standards where these have one. A test walks [`ALL`].

// Entries carry the names of the standards' symbols, so that `step!(w, …, A_w = …)` finds them.
#![allow(non_upper_case_globals)]

use super::decimal::Rounding;
use super::quantity::{Area, Force, Length, Moment, Q, Ratio, SecondMoment, Stress, Volume};
use super::symbol::{Accent, Entry, Info};
use super::unit::Unit;

/// The entry type of a quantity's dimension.
pub trait Dimensioned {
    type Entry;
}

impl<N, const F: i8, const L: i8> Dimensioned for Q<N, F, L> {
    type Entry = Entry<F, L>;
}

macro_rules! glossary {
    ($($name:ident: $quantity:ident, $base:literal $sub:literal, $words:literal, $unit:ident $(, $extra:ident $value:expr)*;)*) => {
        $(
            #[doc = $words]
            pub static $name: <$quantity as Dimensioned>::Entry = Entry {
                info: Info {
                    $($extra: $value,)*
                    ..plain($base, $sub, $words, Unit::$unit)
                },
            };
        )*
        /// All entries, with the names that checks call them by.
        pub static ALL: &[(&str, &Info)] = &[$((stringify!($name), &$name.info)),*];

        #[cfg(test)]
        const DIMENSIONS: &[super::unit::Dimension] = &[$(<$quantity>::DIMENSION),*];
    };
}

const fn plain(base: &'static str, sub: &'static str, words: &'static str, unit: Unit) -> Info {
    Info { base, sub, accent: Accent::None, words, unit, rounding: Rounding::Significant(3), least_places: 0 }
}

const TENTHS: Rounding = Rounding::Places(1);
const HUNDREDTHS: Rounding = Rounding::Places(2);

glossary! {
    // The section.
    h: Length, "h" "", "depth of the section", Mm;
    b: Length, "b" "", "width of the flanges", Mm;
    t_w: Length, "t" "w", "thickness of the web", Mm;
    t_f: Length, "t" "f", "thickness of the flanges", Mm;
    r: Length, "r" "", "root radius", Mm;
    t: Length, "t" "", "thickness that decides the yield strength", Mm;
    A: Area, "A" "", "area of the section", Mm2;
    W_pl_y: Volume, "W" "pl,y", "plastic section modulus", Cm3;
    W_el_y: Volume, "W" "el,y", "elastic section modulus", Cm3;
    I_y: SecondMoment, "I" "y", "second moment of area", Cm4;
    h_w: Length, "h" "w", "depth of the web between the flanges", Mm;
    A_w: Area, "A" "w", "area of the web", Mm2;
    A_r: Area, "A" "r", "area of the flanges over the web and its roots", Mm2;
    A_v: Area, "A" "v", "shear area", Mm2;

    // The material.
    f_y: Stress, "f" "y", "yield strength", NPerMm2;
    E: Stress, "E" "", "modulus of elasticity", NPerMm2;
    epsilon: Ratio, "ε" "", "factor for the yield strength", One;
    gamma_M0: Ratio, "γ" "M0", "partial factor for the resistance of sections", One, least_places 1;
    gamma_M1: Ratio, "γ" "M1", "partial factor for the resistance to buckling", One, least_places 1;

    // Actions and what they add up to.
    gamma_G: Ratio, "γ" "G", "partial factor of permanent actions", One, least_places 1;
    gamma_G_sup: Ratio, "γ" "G,sup", "partial factor of permanent actions that worsen", One, least_places 1;
    gamma_G_inf: Ratio, "γ" "G,inf", "partial factor of permanent actions that relieve", One, least_places 1;
    gamma_Q: Ratio, "γ" "Q", "partial factor of variable actions", One, least_places 1;
    psi_0: Ratio, "ψ" "0", "combination factor of an action that accompanies", One, least_places 1;
    xi: Ratio, "ξ" "", "reduction of permanent actions", One;
    M: Moment, "M" "", "moment of one action", Knm;
    V: Force, "V" "", "shear of one action", Kn;
    F: Force, "F" "", "force of one action", Kn;
    R: Force, "R" "", "reaction of one action", Kn;
    w: Length, "w" "", "movement", Mm, rounding TENTHS;
    M_Ed: Moment, "M" "Ed", "design moment", Knm;
    V_Ed: Force, "V" "Ed", "design shear", Kn;
    F_Ed: Force, "F" "Ed", "design force on the web", Kn;
    R_Ed: Force, "R" "Ed", "design reaction", Kn;
    R_k: Force, "R" "k", "characteristic reaction", Kn;
    R_up: Force, "R" "up", "uplift at the bearing", Kn;
    R_min: Force, "R" "min", "least reaction of the bearing", Kn;
    R_held: Force, "R" "held", "design resistance to uplift", Kn;

    // Section class.
    c_f: Length, "c" "f", "outstand of the flange", Mm;
    d: Length, "d" "", "depth of the web between the roots", Mm;

    // Bending and shear.
    M_c_Rd: Moment, "M" "c,Rd", "design resistance to bending", Knm;
    V_pl_Rd: Force, "V" "pl,Rd", "design resistance to shear", Kn;
    rho: Ratio, "ρ" "", "reduction of the web's yield strength by shear", One;
    W_V: Volume, "W" "V", "modulus that the shear leaves", Cm3;
    M_V_Rd: Moment, "M" "V,Rd", "resistance to bending that the shear leaves", Knm;

    // Web under a concentrated force.
    s_s: Length, "s" "s", "stiff length over which the force arrives", Mm;
    c: Length, "c" "", "distance from the stiff length to the beam's end", Mm;
    a: Length, "a" "", "distance between transverse stiffeners, here the beam's length", Mm;
    k_F: Ratio, "k" "F", "buckling coefficient of the web", One;
    m_1: Ratio, "m" "1", "part of the flange in spreading the force", One;
    m_2: Ratio, "m" "2", "part of the web in spreading the force", One;
    m: Ratio, "m" "", "part of flange and web in spreading the force", One;
    m_e: Ratio, "m" "e", "part of flange, web and loaded length in spreading the force", One;
    l_e: Length, "l" "e", "loaded length at the beam's end", Mm;
    l_y: Length, "l" "y", "effective loaded length", Mm;
    F_cr: Force, "F" "cr", "critical force of the web", Kn;
    lambda_F: Ratio, "λ" "F", "slenderness of the web", One, accent Accent::Bar;
    chi_F: Ratio, "χ" "F", "reduction for buckling of the web", One;
    L_eff: Length, "L" "eff", "effective length that resists the force", Mm;
    F_Rd: Force, "F" "Rd", "design resistance of the web to the force", Kn;
    t_f_above: Length, "t" "f", "flange thickness of the crossing beam", Mm;
    t_w_above: Length, "t" "w", "web thickness of the crossing beam", Mm;
    r_above: Length, "r" "", "root radius of the crossing beam", Mm;
    eta_1: Ratio, "η" "1", "share of the elastic moment of resistance", One;
    eta_2: Ratio, "η" "2", "share of the web's resistance to the force", One;
    eta: Ratio, "η" "", "web under force and moment together", One;

    // Movements.
    L: Length, "L" "", "distance between the bearings", Mm;
    L_lim: Length, "L" "lim", "length that the limit refers to", Mm;
    L_o: Length, "L" "o", "length of the overhang", Mm;
    x: Length, "x" "", "distance from the left bearing", Mm;
    n: Ratio, "n" "", "part of the span that is the limit", One;
    w_tot: Length, "w" "tot", "own movement under all characteristic actions", Mm, rounding TENTHS;
    w_aft: Length, "w" "aft", "own movement after what could crack is there", Mm, rounding TENTHS;
    w_var: Length, "w" "var", "own movement under variable actions", Mm, rounding TENTHS;
    w_own: Length, "w" "own", "own movement", Mm, rounding TENTHS;
    w_inh: Length, "w" "inh", "inherited movement", Mm, rounding TENTHS;
    w_set: Length, "w" "set", "movement from supports that settle", Mm, rounding TENTHS;
    w_st: Length, "w" "st", "stacked movement", Mm, rounding TENTHS;
    w_up: Length, "w" "up", "size of the upward movement", Mm, rounding TENTHS;
    w_giv: Length, "w" "giv", "limit given as a length", Mm;
    w_lim: Length, "w" "lim", "limit of the movement", Mm, rounding TENTHS;
    w_left: Length, "w" "left", "what the supports and the settlements leave of the limit", Mm, rounding TENTHS;
    dw: Length, "Δ" "w", "difference between the two bearings", Mm, rounding TENTHS;
    I_req: SecondMoment, "I" "req", "second moment of area that the limit asks for", Cm4;
    w_hand: Length, "w" "hand", "largest own movements down the route, simply added", Mm, rounding TENTHS;
    w_exact: Length, "w" "exact", "greatest stacked movement", Mm, rounding TENTHS;
    dw_hand: Length, "Δ" "hand", "difference of the hand rule", Mm, rounding TENTHS;
    e: Length, "e" "", "distance from the web", Mm;

    utilisation: Ratio, "u" "", "share of the limit", One, rounding HUNDREDTHS;
}

#[cfg(test)]
mod tests {
    use super::{ALL, DIMENSIONS, Info};

    #[test]
    fn every_entry_says_what_it_is() {
        for ((name, info), dimension) in ALL.iter().zip(DIMENSIONS) {
            assert_eq!(info.unit.dimension(), *dimension, "{name}");
            assert!(!info.words.is_empty() && !info.base.is_empty(), "{name}");
            assert!(!info.words.ends_with('.') && !info.words.starts_with(char::is_uppercase), "{name}");
            assert_eq!(ALL.iter().filter(|(other, _)| other == name).count(), 1, "{name}");
        }
    }

    #[test]
    fn two_symbols_are_written_alike_only_where_they_belong_to_different_beams() {
        let crossing = |name: &str| name.ends_with("_above");
        for (name, info) in ALL.iter().filter(|(other, _)| !crossing(other)) {
            let alike = |(_, other): &&(&str, &Info)| (other.base, other.sub) == (info.base, info.sub);
            let twins = ALL.iter().filter(|(other, _)| !crossing(other)).filter(alike).count();
            assert_eq!(twins, 1, "{name}");
        }
    }
}
