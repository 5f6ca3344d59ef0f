//! National choices as data, each with its clause: the UK National Annexes, or the values recommended in the
//! Eurocodes themselves. Matches have no wildcard, so that a new category or set must be decided everywhere.

use super::{Action, Category};

/// A set of national choices.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Choices {
    Uk,
    Recommended,
}

/// Combination, frequent and quasi-permanent factors (EN 1990 A1.2.2, Table A1.1; UK NA Table NA.A1.1).
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Psi {
    pub psi_0: f64,
    pub psi_1: f64,
    pub psi_2: f64,
}

impl Choices {
    pub const ALL: [Choices; 2] = [Choices::Uk, Choices::Recommended];

    pub fn name(self) -> &'static str {
        match self {
            Choices::Uk => "UK",
            Choices::Recommended => "recommended",
        }
    }

    /// EN 1990 Table A1.1 and UK NA Table NA.A1.1; snow for altitudes up to 1000 m. Permanent actions have none: 1.
    pub fn psi(self, action: Action) -> Psi {
        let psi = |psi_0, psi_1, psi_2| Psi { psi_0, psi_1, psi_2 };
        match (action, self) {
            (Action::Permanent, _) => psi(1.0, 1.0, 1.0),
            (Action::Imposed(Category::A | Category::B), _) => psi(0.7, 0.5, 0.3),
            (Action::Imposed(Category::C | Category::D), _) => psi(0.7, 0.7, 0.6),
            (Action::Imposed(Category::E), _) => psi(1.0, 0.9, 0.8),
            (Action::Imposed(Category::F), _) => psi(0.7, 0.7, 0.6),
            (Action::Imposed(Category::G), _) => psi(0.7, 0.5, 0.3),
            (Action::Imposed(Category::H), Choices::Uk) => psi(0.7, 0.0, 0.0),
            (Action::Imposed(Category::H), Choices::Recommended) => psi(0.0, 0.0, 0.0),
            (Action::Snow, _) => psi(0.5, 0.2, 0.0),
            (Action::Wind(_), Choices::Uk) => psi(0.5, 0.2, 0.0),
            (Action::Wind(_), Choices::Recommended) => psi(0.6, 0.2, 0.0),
        }
    }

    /// Reduction of unfavourable permanent actions in (6.10b): EN 1990 Table A1.2(B); UK NA Table NA.A1.2(B).
    pub fn xi(self) -> f64 {
        match self {
            Choices::Uk => 0.925,
            Choices::Recommended => 0.85,
        }
    }

    /// gamma_M0 and gamma_M1 (EN 1993-1-1 6.1; UK NA.2.15): 1.0 in both sets.
    pub fn gamma_m(self) -> f64 {
        match self {
            Choices::Uk | Choices::Recommended => 1.0,
        }
    }
}

/// Partial factors of EN 1990 Table A1.2(B), the same in both sets.
pub const GAMMA_G_UNFAVOURABLE: f64 = 1.35;
pub const GAMMA_G_FAVOURABLE: f64 = 1.0;
pub const GAMMA_Q: f64 = 1.5;

/// Partial factors for loss of equilibrium and uplift, EN 1990 Table A1.2(A).
pub const GAMMA_G_EQUILIBRIUM_UNFAVOURABLE: f64 = 1.10;
pub const GAMMA_G_EQUILIBRIUM_FAVOURABLE: f64 = 0.90;
