//! The catalogue of rolled sections: dimensions are data, properties are computed from them.

mod names;
mod properties;
mod table;

use std::sync::LazyLock;

use crate::materials::DENSITY;
use crate::quantity::{Area, Length, SecondMoment, Volume, Warping};
pub use names::{find, nearest};
use properties::Outline;

/// Families of sections, in the order of the catalogue.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Family {
    /// Universal beams.
    Ub,
    /// Universal columns.
    Uc,
}

impl Family {
    pub const ALL: [Family; 2] = [Family::Ub, Family::Uc];

    /// As it stands in the names of sections.
    pub fn name(self) -> &'static str {
        match self {
            Family::Ub => "UB",
            Family::Uc => "UC",
        }
    }

    fn rows(self) -> &'static [table::Row] {
        match self {
            Family::Ub => table::UB,
            Family::Uc => table::UC,
        }
    }
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
    /// Torsion constant of St Venant, by a formula that is within 0.8 % (El Darwish and Johnston 1965).
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

impl Section {
    /// Clear depth of the web between the flanges, `h - 2 t_f`.
    pub fn web_depth(&self) -> Length {
        Length::m(self.outline().h_w())
    }

    /// Depth of the web between the fillets, `h - 2 t_f - 2 r`: c of EN 1993-1-1 Table 5.2, internal parts.
    pub fn flat_web_depth(&self) -> Length {
        Length::m(self.outline().h_w() - 2.0 * self.r.to_m())
    }

    /// What a flange stands out beyond the fillet, `(b - t_w - 2 r) / 2`: c of EN 1993-1-1 Table 5.2, outstands.
    pub fn flange_outstand(&self) -> Length {
        Length::m((self.b.to_m() - self.t_w.to_m()) / 2.0 - self.r.to_m())
    }

    /// The thickness that decides the yield strength: the greater of flange and web.
    pub fn thickest(&self) -> Length {
        Length::m(self.t_f.to_m().max(self.t_w.to_m()))
    }

    fn outline(&self) -> Outline {
        Outline { h: self.h.to_m(), b: self.b.to_m(), t_w: self.t_w.to_m(), t_f: self.t_f.to_m(), r: self.r.to_m() }
    }

    fn from_row(family: Family, row: &table::Row) -> Section {
        let (h, b) = (Length::mm(row.h), Length::mm(row.b));
        let (t_w, t_f, r) = (Length::mm(row.t_w), Length::mm(row.t_f), Length::mm(row.r));
        let outline = Outline { h: h.to_m(), b: b.to_m(), t_w: t_w.to_m(), t_f: t_f.to_m(), r: r.to_m() };
        Section {
            name: row.name,
            family,
            h,
            b,
            t_w,
            t_f,
            r,
            area: Area::m2(outline.area()),
            i_y: SecondMoment::from_si(outline.i_y()),
            i_z: SecondMoment::from_si(outline.i_z()),
            w_el_y: Volume::from_si(outline.w_el_y()),
            w_pl_y: Volume::from_si(outline.w_pl_y()),
            w_el_z: Volume::from_si(outline.w_el_z()),
            w_pl_z: Volume::from_si(outline.w_pl_z()),
            i_t: SecondMoment::from_si(outline.i_t()),
            i_w: Warping::from_si(outline.i_w()),
            radius_y: Length::m(outline.radius_y()),
            radius_z: Length::m(outline.radius_z()),
            a_v: Area::m2(outline.a_v()),
            mass: outline.area() * DENSITY,
        }
    }
}

static CATALOGUE: LazyLock<Vec<Section>> = LazyLock::new(|| {
    let families = Family::ALL.into_iter();
    families.flat_map(|family| family.rows().iter().map(move |row| Section::from_row(family, row))).collect()
});

/// Every section: beams, then columns, each as published tables list them, deep to shallow and heavy to light.
pub fn catalogue() -> &'static [Section] {
    &CATALOGUE
}
