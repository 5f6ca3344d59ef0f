//! Quantities whose dimensions live in their type: `Q<N, FORCE, LENGTH>` is a number of N^FORCE m^LENGTH.
//!
//! The number inside is private and SI. It goes in and out through constructors and readers that name the unit.

/// A number `N` of dimension force^FORCE × length^LENGTH, held in N and m.
#[derive(Clone, Copy, Debug, PartialEq, Default)]
pub struct Q<N, const FORCE: i8, const LENGTH: i8>(pub(super) N);

pub type Ratio<N = f64> = Q<N, 0, 0>;
pub type Length<N = f64> = Q<N, 0, 1>;
pub type Area<N = f64> = Q<N, 0, 2>;
pub type Volume<N = f64> = Q<N, 0, 3>;
pub type SecondMoment<N = f64> = Q<N, 0, 4>;
pub type Warping<N = f64> = Q<N, 0, 6>;
pub type Force<N = f64> = Q<N, 1, 0>;
pub type Moment<N = f64> = Q<N, 1, 1>;
pub type LineLoad<N = f64> = Q<N, 1, -1>;
pub type Stress<N = f64> = Q<N, 1, -2>;
pub type AreaLoad<N = f64> = Q<N, 1, -2>;
pub type WeightDensity<N = f64> = Q<N, 1, -3>;
pub type Stiffness<N = f64> = Q<N, 1, 2>;

impl<const FORCE: i8, const LENGTH: i8> Q<f64, FORCE, LENGTH> {
    /// From the coherent SI unit of this dimension.
    pub const fn from_si(value: f64) -> Self {
        Q(value)
    }

    /// In the coherent SI unit of this dimension: for kernels, which work on bare SI numbers.
    pub const fn si(self) -> f64 {
        self.0
    }
}

macro_rules! units {
    ($($quantity:ident: $from:ident, $to:ident = $factor:literal;)*) => {$(
        impl $quantity<f64> {
            #[doc = concat!("From a value in the unit of its name (1 of it is ", stringify!($factor), " SI).")]
            pub const fn $from(value: f64) -> Self { Q(value * $factor) }
            #[doc = concat!("In the unit of its name (1 of it is ", stringify!($factor), " SI).")]
            pub const fn $to(self) -> f64 { self.0 / $factor }
        }
    )*};
}

units! {
    Length: m, to_m = 1.0;
    Length: mm, to_mm = 1e-3;
    Area: m2, to_m2 = 1.0;
    Area: cm2, to_cm2 = 1e-4;
    Area: mm2, to_mm2 = 1e-6;
    Volume: cm3, to_cm3 = 1e-6;
    SecondMoment: cm4, to_cm4 = 1e-8;
    Warping: dm6, to_dm6 = 1e-6;
    Force: kn, to_kn = 1e3;
    Moment: knm, to_knm = 1e3;
    LineLoad: kn_per_m, to_kn_per_m = 1e3;
    AreaLoad: kn_per_m2, to_kn_per_m2 = 1e3;
    Stress: n_per_mm2, to_n_per_mm2 = 1e6;
    WeightDensity: kn_per_m3, to_kn_per_m3 = 1e3;
    Stiffness: knm2, to_knm2 = 1e3;
}
