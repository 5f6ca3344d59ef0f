//! The numbers that a check runs on: plain `f64`, or the traced number that remembers how it came about.

use super::tape::Traced;
use super::unit::{Dimension, Unit};

/// What a check may do with a number. There are two of them, and both give the same bits.
pub trait Number: Copy + std::fmt::Debug + private::Sealed {
    /// A number written in a formula.
    fn literal(value: f64) -> Self;
    /// A number with a name of its own (π, √3): printed by its name, never as digits.
    fn constant(constant: &'static Constant) -> Self;
    /// The plain value, SI. For results; a check decides by `when` and `require`, which print their reason.
    fn value(self) -> f64;
    #[track_caller]
    fn plus(self, other: Self) -> Self;
    #[track_caller]
    fn less(self, other: Self) -> Self;
    #[track_caller]
    fn times(self, other: Self) -> Self;
    #[track_caller]
    fn over(self, other: Self) -> Self;
    fn negative(self) -> Self;
    fn squared(self) -> Self;
    fn cubed(self) -> Self;
    #[track_caller]
    fn root(self) -> Self;
    /// The lesser of an expression and a cap. NaN in the expression stays visible.
    #[track_caller]
    fn least(self, cap: Self) -> Self;
    /// The greater of an expression and a floor. NaN in the expression stays visible.
    #[track_caller]
    fn greatest(self, floor: Self) -> Self;
    /// How many of `unit` it is; it has dimension `dimension`.
    #[track_caller]
    fn measured(self, unit: Unit, dimension: Dimension) -> Self;
}

/// A named constant.
#[derive(Debug, PartialEq)]
pub struct Constant {
    pub kind: ConstantKind,
    pub value: f64,
}

#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum ConstantKind {
    Pi,
    /// The square root of a whole number.
    RootOf(u8),
}

pub static PI: Constant = Constant { kind: ConstantKind::Pi, value: std::f64::consts::PI };
/// The double nearest to √3.
pub static ROOT_3: Constant = Constant { kind: ConstantKind::RootOf(3), value: 1.732_050_807_568_877_2 };

impl Number for f64 {
    #[inline]
    fn literal(value: f64) -> Self {
        value
    }
    #[inline]
    fn constant(constant: &'static Constant) -> Self {
        constant.value
    }
    #[inline]
    fn value(self) -> f64 {
        self
    }
    #[inline]
    fn plus(self, other: Self) -> Self {
        self + other
    }
    #[inline]
    fn less(self, other: Self) -> Self {
        self - other
    }
    #[inline]
    fn times(self, other: Self) -> Self {
        self * other
    }
    #[inline]
    fn over(self, other: Self) -> Self {
        self / other
    }
    #[inline]
    fn negative(self) -> Self {
        -self
    }
    #[inline]
    fn squared(self) -> Self {
        self * self
    }
    #[inline]
    fn cubed(self) -> Self {
        self * self * self
    }
    #[inline]
    fn root(self) -> Self {
        self.sqrt()
    }
    #[inline]
    fn least(self, cap: Self) -> Self {
        if self > cap { cap } else { self }
    }
    #[inline]
    fn greatest(self, floor: Self) -> Self {
        if self < floor { floor } else { self }
    }
    #[inline]
    fn measured(self, unit: Unit, _: Dimension) -> Self {
        self / unit.one()
    }
}

mod private {
    pub trait Sealed {}
    impl Sealed for f64 {}
    impl Sealed for super::Traced<'_> {}
}
