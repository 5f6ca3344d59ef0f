//! Units that figures are printed in: each is a power of ten of the coherent SI unit of its dimension.

/// A printed unit.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Unit {
    /// A pure number.
    One,
    Mm,
    M,
    Mm2,
    Cm2,
    M2,
    Mm3,
    Cm3,
    Cm4,
    Dm6,
    Kn,
    Knm,
    KnPerM,
    KnPerM2,
    KnPerM3,
    NPerMm2,
    Knm2,
}

/// Powers of force and length.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash, Default)]
pub struct Dimension {
    pub force: i8,
    pub length: i8,
}

impl Dimension {
    pub const NONE: Dimension = Dimension { force: 0, length: 0 };

    pub const fn of(force: i8, length: i8) -> Self {
        Dimension { force, length }
    }
}

impl Unit {
    pub const ALL: [Unit; 17] = [
        Unit::One,
        Unit::Mm,
        Unit::M,
        Unit::Mm2,
        Unit::Cm2,
        Unit::M2,
        Unit::Mm3,
        Unit::Cm3,
        Unit::Cm4,
        Unit::Dm6,
        Unit::Kn,
        Unit::Knm,
        Unit::KnPerM,
        Unit::KnPerM2,
        Unit::KnPerM3,
        Unit::NPerMm2,
        Unit::Knm2,
    ];

    /// As printed; empty for pure numbers.
    pub const fn name(self) -> &'static str {
        self.facts().0
    }

    /// As read aloud, after a number.
    pub const fn spoken(self) -> &'static str {
        self.facts().1
    }

    pub const fn dimension(self) -> Dimension {
        self.facts().2
    }

    /// One of this unit is ten to this power of the coherent SI unit.
    pub const fn power(self) -> i32 {
        self.facts().3
    }

    /// One of this unit in the coherent SI unit.
    pub fn one(self) -> f64 {
        // Powers of ten from -9 to 6 are read exactly as far as a double can.
        const ONES: [f64; 16] =
            [1e-9, 1e-8, 1e-7, 1e-6, 1e-5, 1e-4, 1e-3, 1e-2, 1e-1, 1e0, 1e1, 1e2, 1e3, 1e4, 1e5, 1e6];
        usize::try_from(self.power() + 9).ok().and_then(|n| ONES.get(n)).copied().unwrap_or(f64::NAN)
    }

    /// One of this unit is ten to this power of the product of N and mm that has its dimension.
    pub const fn power_in_n_and_mm(self) -> i32 {
        self.power() + 3 * self.dimension().length as i32
    }

    /// The unit for a figure of this dimension that no symbol decides.
    pub const fn usual(dimension: Dimension) -> Option<Unit> {
        Some(match (dimension.force, dimension.length) {
            (0, 0) => Unit::One,
            (0, 1) => Unit::Mm,
            (0, 2) => Unit::Mm2,
            (0, 3) => Unit::Mm3,
            (0, 4) => Unit::Cm4,
            (0, 6) => Unit::Dm6,
            (1, 0) => Unit::Kn,
            (1, 1) => Unit::Knm,
            (1, -1) => Unit::KnPerM,
            (1, -2) => Unit::NPerMm2,
            (1, -3) => Unit::KnPerM3,
            (1, 2) => Unit::Knm2,
            _ => return None,
        })
    }

    const fn facts(self) -> (&'static str, &'static str, Dimension, i32) {
        match self {
            Unit::One => ("", "", Dimension::NONE, 0),
            Unit::Mm => ("mm", "millimetres", Dimension::of(0, 1), -3),
            Unit::M => ("m", "metres", Dimension::of(0, 1), 0),
            Unit::Mm2 => ("mm²", "square millimetres", Dimension::of(0, 2), -6),
            Unit::Cm2 => ("cm²", "square centimetres", Dimension::of(0, 2), -4),
            Unit::M2 => ("m²", "square metres", Dimension::of(0, 2), 0),
            Unit::Mm3 => ("mm³", "cubic millimetres", Dimension::of(0, 3), -9),
            Unit::Cm3 => ("cm³", "cubic centimetres", Dimension::of(0, 3), -6),
            Unit::Cm4 => ("cm⁴", "centimetres to the fourth", Dimension::of(0, 4), -8),
            Unit::Dm6 => ("dm⁶", "decimetres to the sixth", Dimension::of(0, 6), -6),
            Unit::Kn => ("kN", "kilonewtons", Dimension::of(1, 0), 3),
            Unit::Knm => ("kNm", "kilonewton metres", Dimension::of(1, 1), 3),
            Unit::KnPerM => ("kN/m", "kilonewtons a metre", Dimension::of(1, -1), 3),
            Unit::KnPerM2 => ("kN/m²", "kilonewtons a square metre", Dimension::of(1, -2), 3),
            Unit::KnPerM3 => ("kN/m³", "kilonewtons a cubic metre", Dimension::of(1, -3), 3),
            Unit::NPerMm2 => ("N/mm²", "newtons a square millimetre", Dimension::of(1, -2), 6),
            Unit::Knm2 => ("kNm²", "kilonewton metres squared", Dimension::of(1, 2), 3),
        }
    }
}
