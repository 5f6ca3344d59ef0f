//! Properties of an I section with parallel flanges, computed from its dimensions, root radii included.
//!
//! The outline is three rectangles and four root fillets. A fillet is the square of side r in the corner between web
//! and flange less the quarter circle that rounds it. All but the torsion constant are exact for that outline; the
//! warping constant is that of its flanges alone, as section tables give it. Everything is in m, m2, m3, m4, m6.

use core::f64::consts::PI;

/// Dimensions of an I section with parallel flanges, in m.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct Outline {
    /// Depth.
    pub h: f64,
    /// Flange width.
    pub b: f64,
    /// Web thickness.
    pub t_w: f64,
    /// Flange thickness.
    pub t_f: f64,
    /// Root radius.
    pub r: f64,
}

impl Outline {
    /// Clear depth of the web between the flanges, m.
    pub fn h_w(self) -> f64 {
        self.h - 2.0 * self.t_f
    }

    /// Area of one fillet, m2.
    fn fillet_area(self) -> f64 {
        (1.0 - PI / 4.0) * self.r * self.r
    }

    /// From the corner of web and flange to the centroid of a fillet, along either of them, m: the first moment
    /// r³/2 of the square less (π r²/4)(r − 4r/3π) of the quarter circle, over the area.
    fn fillet_centroid(self) -> f64 {
        self.r * (10.0 - 3.0 * PI) / (3.0 * (4.0 - PI))
    }

    /// Second moment of area of one fillet about its own centroidal axis, m4: about the corner the square has r⁴/3,
    /// the quarter circle r⁴ (π/16 − 4/9π) about its centroid, which lies r − 4r/3π away.
    fn fillet_own(self) -> f64 {
        let quarter = PI / 16.0 - 4.0 / (9.0 * PI);
        let away = 1.0 - 4.0 / (3.0 * PI);
        let about_corner = (1.0 / 3.0 - quarter - PI / 4.0 * away * away) * fourth_power(self.r);
        about_corner - self.fillet_area() * self.fillet_centroid().powi(2)
    }

    /// From the y axis to the centroid of a fillet, m.
    fn fillet_from_y(self) -> f64 {
        self.h_w() / 2.0 - self.fillet_centroid()
    }

    /// From the z axis to the centroid of a fillet, m.
    fn fillet_from_z(self) -> f64 {
        self.t_w / 2.0 + self.fillet_centroid()
    }

    /// Area, m2.
    pub fn area(self) -> f64 {
        2.0 * self.b * self.t_f + self.h_w() * self.t_w + 4.0 * self.fillet_area()
    }

    /// Second moment of area about the y axis (major), m4: the enclosing rectangle less the two gaps beside the web,
    /// plus the fillets.
    pub fn i_y(self) -> f64 {
        let rectangles = (self.b * self.h.powi(3) - (self.b - self.t_w) * self.h_w().powi(3)) / 12.0;
        rectangles + 4.0 * (self.fillet_own() + self.fillet_area() * self.fillet_from_y().powi(2))
    }

    /// Second moment of area about the z axis (minor), m4.
    pub fn i_z(self) -> f64 {
        let rectangles = (2.0 * self.t_f * self.b.powi(3) + self.h_w() * self.t_w.powi(3)) / 12.0;
        rectangles + 4.0 * (self.fillet_own() + self.fillet_area() * self.fillet_from_z().powi(2))
    }

    /// Elastic section modulus about the y axis, m3.
    pub fn w_el_y(self) -> f64 {
        self.i_y() / (self.h / 2.0)
    }

    /// Elastic section modulus about the z axis, m3.
    pub fn w_el_z(self) -> f64 {
        self.i_z() / (self.b / 2.0)
    }

    /// Plastic section modulus about the y axis, m3: the first moments of both halves.
    pub fn w_pl_y(self) -> f64 {
        let flanges = self.b * self.t_f * (self.h - self.t_f);
        let web = self.t_w * self.h_w().powi(2) / 4.0;
        flanges + web + 4.0 * self.fillet_area() * self.fillet_from_y()
    }

    /// Plastic section modulus about the z axis, m3.
    pub fn w_pl_z(self) -> f64 {
        let flanges = self.t_f * self.b * self.b / 2.0;
        let web = self.h_w() * self.t_w * self.t_w / 4.0;
        flanges + web + 4.0 * self.fillet_area() * self.fillet_from_z()
    }

    /// Diameter of the greatest circle inscribed where web and flange meet, m.
    fn junction_diameter(self) -> f64 {
        ((self.t_f + self.r).powi(2) + (self.r + self.t_w / 4.0) * self.t_w) / (2.0 * self.r + self.t_f)
    }

    /// St Venant torsion constant, m4: thin rectangles, less the ends of the flanges, plus the junctions of web and
    /// flange with their fillets (El Darwish and Johnston 1965, as the published tables of UB and UC have it; from
    /// memory). For every UB and UC within 0.8 % of a numerical solution of Prandtl's stress function, which a test
    /// holds it to; most are within 0.2 %.
    pub fn i_t(self) -> f64 {
        let (web, root) = (self.t_w / self.t_f, self.r / self.t_f);
        let junction = -0.042 + 0.2204 * web + 0.1355 * root - 0.0865 * web * root - 0.0725 * web * web;
        let flanges = 2.0 / 3.0 * self.b * self.t_f.powi(3) - 0.420 * fourth_power(self.t_f);
        flanges + self.h_w() * self.t_w.powi(3) / 3.0 + 2.0 * junction * fourth_power(self.junction_diameter())
    }

    /// Warping constant, m6: Iz of the section on the distance of the flanges' middles.
    pub fn i_w(self) -> f64 {
        self.i_z() * (self.h - self.t_f).powi(2) / 4.0
    }

    /// Radius of gyration about the y axis, m.
    pub fn radius_y(self) -> f64 {
        (self.i_y() / self.area()).sqrt()
    }

    /// Radius of gyration about the z axis, m.
    pub fn radius_z(self) -> f64 {
        (self.i_z() / self.area()).sqrt()
    }

    /// Shear area for load parallel to the web, m2: EN 1993-1-1 6.2.6(3)a, not less than eta h_w t_w.
    pub fn a_v(self) -> f64 {
        let rolled = self.area() - 2.0 * self.b * self.t_f + (self.t_w + 2.0 * self.r) * self.t_f;
        rolled.max(ETA * self.h_w() * self.t_w)
    }
}

fn fourth_power(x: f64) -> f64 {
    (x * x) * (x * x)
}

/// EN 1993-1-1 6.2.6(3): the value on the safe side.
const ETA: f64 = 1.0;
