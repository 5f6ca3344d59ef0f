//! The catalogue of rolled sections: dimensions are data, properties are computed from them.

use crate::quantity::{Area, Length, SecondMoment, Volume, Warping};

#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Family {
    Ub,
    Uc,
}

/// A rolled section. The y axis is the major one. All properties include the root radii.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Section {
    /// As the trade writes it: "254x146x37 UB".
    pub name: &'static str,
    pub family: Family,
    /// Depth.
    pub h: Length,
    /// Flange width.
    pub b: Length,
    /// Web thickness.
    pub t_w: Length,
    /// Flange thickness.
    pub t_f: Length,
    /// Root radius.
    pub r: Length,
    pub area: Area,
    pub i_y: SecondMoment,
    pub i_z: SecondMoment,
    pub w_el_y: Volume,
    pub w_pl_y: Volume,
    pub w_el_z: Volume,
    pub w_pl_z: Volume,
    /// Torsion constant of St Venant.
    pub i_t: SecondMoment,
    /// Warping constant.
    pub i_w: Warping,
    /// Radii of gyration.
    pub radius_y: Length,
    pub radius_z: Length,
    /// Shear area for load parallel to the web, EN 1993-1-1 6.2.6(3)a with eta = 1.0.
    pub a_v: Area,
    /// kg/m, from the area and 7850 kg/m3.
    pub mass: f64,
}
