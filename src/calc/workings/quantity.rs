//! Quantities whose dimensions live in their type: `Q<N, FORCE, LENGTH>` is a number of N^FORCE m^LENGTH.
//!
//! The number inside is private and SI. It goes in and out through constructors and readers that name the unit.
//! A force plus a length does not compile, whichever branch it stands on:
//!
//! ```compile_fail,E0308
//! use sagledger_calc::quantity::{Force, Length};
//! let nonsense = Force::kn(3.0) + Length::mm(4.0);
//! ```
//!
//! nor does a bare comparison, which would decide without printing why (`Workings::when` does both):
//!
//! ```compile_fail,E0369
//! use sagledger_calc::quantity::Force;
//! if Force::kn(3.0) < Force::kn(4.0) {}
//! ```
//!
//! Written right, both do:
//!
//! ```
//! use sagledger_calc::quantity::Force;
//! let sum = Force::kn(3.0) + Force::kn(4.0);
//! assert_eq!(sum.to_kn(), 7.0);
//! assert!(sum.at_most(Force::kn(8.0)).holds());
//! ```

use std::ops::{Add, Div, Mul, Neg, Sub};

use super::number::{Constant, Number};
use super::unit::{Dimension, Unit};

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
    ($($quantity:ident: $from:ident, $to:ident = $up:literal / $down:literal;)*) => {$(
        impl $quantity<f64> {
            #[doc = concat!("From a value in the unit of its name (1 of it is ", stringify!($up), "/", stringify!($down), " SI).")]
            pub const fn $from(value: f64) -> Self { Q(value * $up / $down) }
            #[doc = concat!("In the unit of its name (1 of it is ", stringify!($up), "/", stringify!($down), " SI).")]
            pub const fn $to(self) -> f64 { self.0 * $down / $up }
        }
    )*};
}

// Dividing by a whole power of ten rounds once; multiplying by 1e-3 would round twice and miss the decimal.
units! {
    Length: m, to_m = 1.0 / 1.0;
    Length: mm, to_mm = 1.0 / 1e3;
    Area: m2, to_m2 = 1.0 / 1.0;
    Area: cm2, to_cm2 = 1.0 / 1e4;
    Area: mm2, to_mm2 = 1.0 / 1e6;
    Volume: cm3, to_cm3 = 1.0 / 1e6;
    SecondMoment: cm4, to_cm4 = 1.0 / 1e8;
    Warping: dm6, to_dm6 = 1.0 / 1e6;
    Force: kn, to_kn = 1e3 / 1.0;
    Moment: knm, to_knm = 1e3 / 1.0;
    LineLoad: kn_per_m, to_kn_per_m = 1e3 / 1.0;
    AreaLoad: kn_per_m2, to_kn_per_m2 = 1e3 / 1.0;
    Stress: n_per_mm2, to_n_per_mm2 = 1e6 / 1.0;
    WeightDensity: kn_per_m3, to_kn_per_m3 = 1e3 / 1.0;
    Stiffness: knm2, to_knm2 = 1e3 / 1.0;
}

impl<N: Number, const FORCE: i8, const LENGTH: i8> Q<N, FORCE, LENGTH> {
    pub(super) const DIMENSION: Dimension = Dimension::of(FORCE, LENGTH);

    /// `self ≤ other`, to be decided by `Workings::when` or `Workings::require`.
    pub fn at_most(self, other: Self) -> Comparison<N> {
        Comparison { left: self.0, right: other.0, relation: Relation::AtMost, dimension: Self::DIMENSION }
    }

    /// `self > other`.
    pub fn more_than(self, other: Self) -> Comparison<N> {
        Comparison { left: self.0, right: other.0, relation: Relation::MoreThan, dimension: Self::DIMENSION }
    }

    /// `self > 0`.
    pub fn is_positive(self) -> Comparison<N> {
        Comparison {
            left: self.0,
            right: N::literal(0.0),
            relation: Relation::MoreThan,
            dimension: Self::DIMENSION,
        }
    }

    /// `factor × self`, for a dimension that is not written out.
    #[track_caller]
    pub fn scaled_by(self, factor: Ratio<N>) -> Self {
        Q(factor.0.times(self.0))
    }

    /// The value in SI, plain. For results; nothing may be decided on it.
    pub fn plain(self) -> Q<f64, FORCE, LENGTH> {
        Q(self.0.value())
    }

    /// The number of it in a unit, for empirical formulas that are not dimensionally sound (f_b^0.7, 18/√δ).
    #[track_caller]
    pub fn measured_in(self, unit: Unit) -> Ratio<N> {
        Q(self.0.measured(unit, Self::DIMENSION))
    }
}

/// A pure number written in a formula.
pub fn number<N: Number>(value: f64) -> Ratio<N> {
    Q(N::literal(value))
}

/// π, √3 and the like.
pub fn constant<N: Number>(constant: &'static Constant) -> Ratio<N> {
    Q(N::constant(constant))
}

/// The lesser of an expression and a cap.
#[track_caller]
pub fn min<N: Number, const F: i8, const L: i8>(expression: Q<N, F, L>, cap: Q<N, F, L>) -> Q<N, F, L> {
    Q(expression.0.least(cap.0))
}

/// The greater of an expression and a floor.
#[track_caller]
pub fn max<N: Number, const F: i8, const L: i8>(expression: Q<N, F, L>, floor: Q<N, F, L>) -> Q<N, F, L> {
    Q(expression.0.greatest(floor.0))
}

/// Two sides of one dimension and how they are compared.
#[derive(Clone, Copy, Debug)]
pub struct Comparison<N> {
    pub(super) left: N,
    pub(super) right: N,
    pub(super) relation: Relation,
    pub(super) dimension: Dimension,
}

#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Relation {
    AtMost,
    MoreThan,
}

impl Relation {
    pub fn holds(self, left: f64, right: f64) -> bool {
        match self {
            Relation::AtMost => left <= right,
            Relation::MoreThan => left > right,
        }
    }

    /// The relation that holds where this one does not.
    pub fn opposite(self) -> Relation {
        match self {
            Relation::AtMost => Relation::MoreThan,
            Relation::MoreThan => Relation::AtMost,
        }
    }

    pub fn sign(self) -> &'static str {
        match self {
            Relation::AtMost => "≤",
            Relation::MoreThan => ">",
        }
    }
}

impl Comparison<f64> {
    pub fn holds(&self) -> bool {
        self.relation.holds(self.left, self.right)
    }
}

impl<N: Number, const F: i8, const L: i8> Add for Q<N, F, L> {
    type Output = Self;
    #[inline]
    #[track_caller]
    fn add(self, other: Self) -> Self {
        Q(self.0.plus(other.0))
    }
}

impl<N: Number, const F: i8, const L: i8> Sub for Q<N, F, L> {
    type Output = Self;
    #[inline]
    #[track_caller]
    fn sub(self, other: Self) -> Self {
        Q(self.0.less(other.0))
    }
}

impl<N: Number, const F: i8, const L: i8> Neg for Q<N, F, L> {
    type Output = Self;
    #[inline]
    fn neg(self) -> Self {
        Q(self.0.negative())
    }
}

impl<N: Number, const F: i8, const L: i8> Mul<f64> for Q<N, F, L> {
    type Output = Self;
    #[inline]
    #[track_caller]
    fn mul(self, factor: f64) -> Self {
        Q(self.0.times(N::literal(factor)))
    }
}

impl<N: Number, const F: i8, const L: i8> Mul<Q<N, F, L>> for f64 {
    type Output = Q<N, F, L>;
    #[inline]
    #[track_caller]
    fn mul(self, quantity: Q<N, F, L>) -> Q<N, F, L> {
        Q(N::literal(self).times(quantity.0))
    }
}

impl<N: Number, const F: i8, const L: i8> Div<f64> for Q<N, F, L> {
    type Output = Self;
    #[inline]
    #[track_caller]
    fn div(self, divisor: f64) -> Self {
        Q(self.0.over(N::literal(divisor)))
    }
}

macro_rules! with_literal {
    ($($operator:ident, $method:ident => $number:ident;)*) => {$(
        impl<N: Number> $operator<f64> for Ratio<N> {
            type Output = Self;
            #[inline]
            #[track_caller]
            fn $method(self, literal: f64) -> Self { Q(self.0.$number(N::literal(literal))) }
        }
        impl<N: Number> $operator<Ratio<N>> for f64 {
            type Output = Ratio<N>;
            #[inline]
            #[track_caller]
            fn $method(self, ratio: Ratio<N>) -> Ratio<N> { Q(N::literal(self).$number(ratio.0)) }
        }
    )*};
}

with_literal! {
    Add, add => plus;
    Sub, sub => less;
}

impl<N: Number> Div<Ratio<N>> for f64 {
    type Output = Ratio<N>;
    #[inline]
    #[track_caller]
    fn div(self, ratio: Ratio<N>) -> Ratio<N> {
        Q(N::literal(self).over(ratio.0))
    }
}

// Stable Rust cannot add const generics, so every product of two dimensions that a check passes through is listed
// once: a × b = c gives both orders of the product and both quotients.
macro_rules! products {
    ($($a:tt * $b:tt = $c:tt;)*) => {$(
        product!($a, $b, $c);
        product!($b, $a, $c);
    )*};
}

macro_rules! squares {
    ($($a:tt * $b:tt = $c:tt;)*) => {$( product!($a, $b, $c); )*};
}

macro_rules! product {
    (($f1:literal, $l1:literal), ($f2:literal, $l2:literal), ($f3:literal, $l3:literal)) => {
        impl<N: Number> Mul<Q<N, $f2, $l2>> for Q<N, $f1, $l1> {
            type Output = Q<N, $f3, $l3>;
            #[inline]
            #[track_caller]
            fn mul(self, other: Q<N, $f2, $l2>) -> Self::Output {
                Q(self.0.times(other.0))
            }
        }
        impl<N: Number> Div<Q<N, $f2, $l2>> for Q<N, $f3, $l3> {
            type Output = Q<N, $f1, $l1>;
            #[inline]
            #[track_caller]
            fn div(self, other: Q<N, $f2, $l2>) -> Self::Output {
                Q(self.0.over(other.0))
            }
        }
    };
}

squares! {
    (0, 0) * (0, 0) = (0, 0);
    (0, 1) * (0, 1) = (0, 2);
    (0, 2) * (0, 2) = (0, 4);
    (0, 3) * (0, 3) = (0, 6);
}

products! {
    (0, 0) * (0, 1) = (0, 1);
    (0, 0) * (0, 2) = (0, 2);
    (0, 0) * (0, 3) = (0, 3);
    (0, 0) * (0, 4) = (0, 4);
    (0, 0) * (0, 5) = (0, 5);
    (0, 0) * (0, 6) = (0, 6);
    (0, 0) * (1, -3) = (1, -3);
    (0, 0) * (1, -2) = (1, -2);
    (0, 0) * (1, -1) = (1, -1);
    (0, 0) * (1, 0) = (1, 0);
    (0, 0) * (1, 1) = (1, 1);
    (0, 0) * (1, 2) = (1, 2);
    (0, 0) * (1, 3) = (1, 3);
    (0, 0) * (1, 4) = (1, 4);
    (0, 1) * (0, 2) = (0, 3);
    (0, 1) * (0, 3) = (0, 4);
    (0, 1) * (0, 4) = (0, 5);
    (0, 1) * (0, 5) = (0, 6);
    (0, 2) * (0, 3) = (0, 5);
    (0, 2) * (0, 4) = (0, 6);
    (0, 1) * (1, -3) = (1, -2);
    (0, 1) * (1, -2) = (1, -1);
    (0, 1) * (1, -1) = (1, 0);
    (0, 1) * (1, 0) = (1, 1);
    (0, 1) * (1, 1) = (1, 2);
    (0, 1) * (1, 2) = (1, 3);
    (0, 1) * (1, 3) = (1, 4);
    (0, 2) * (1, -3) = (1, -1);
    (0, 2) * (1, -2) = (1, 0);
    (0, 2) * (1, -1) = (1, 1);
    (0, 2) * (1, 0) = (1, 2);
    (0, 2) * (1, 1) = (1, 3);
    (0, 3) * (1, -3) = (1, 0);
    (0, 3) * (1, -2) = (1, 1);
    (0, 3) * (1, -1) = (1, 2);
    (0, 3) * (1, 0) = (1, 3);
    (0, 4) * (1, -3) = (1, 1);
    (0, 4) * (1, -2) = (1, 2);
    (0, 4) * (1, -1) = (1, 3);
    (0, 5) * (1, -2) = (1, 3);
    (0, 6) * (1, -2) = (1, 4);
}

macro_rules! powers {
    ($($name:ident: $(($f1:literal, $l1:literal) => ($f2:literal, $l2:literal)),*;)*) => {$($(
        impl<N: Number> Q<N, $f1, $l1> {
            #[inline]
            #[track_caller]
            #[doc = concat!("Its number ", stringify!($name), ".")]
            pub fn $name(self) -> Q<N, $f2, $l2> { Q(self.0.$name()) }
        }
    )*)*};
}

powers! {
    squared: (0, 0) => (0, 0), (0, 1) => (0, 2), (0, 2) => (0, 4), (0, 3) => (0, 6);
    cubed: (0, 0) => (0, 0), (0, 1) => (0, 3), (0, 2) => (0, 6);
    root: (0, 0) => (0, 0), (0, 2) => (0, 1), (0, 4) => (0, 2), (0, 6) => (0, 3);
}
