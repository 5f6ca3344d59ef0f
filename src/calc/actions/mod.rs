//! Actions, national choices and the combinations of EN 1990.

pub mod choices;
pub mod combinations;

pub use choices::Choices;

/// Categories of imposed load (EN 1991-1-1 6.3, Table 6.1 and following).
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Category {
    A,
    B,
    C,
    D,
    E,
    F,
    G,
    H,
}

impl Category {
    pub const ALL: [Category; 8] =
        [Category::A, Category::B, Category::C, Category::D, Category::E, Category::F, Category::G, Category::H];

    pub fn letter(self) -> char {
        match self {
            Category::A => 'A',
            Category::B => 'B',
            Category::C => 'C',
            Category::D => 'D',
            Category::E => 'E',
            Category::F => 'F',
            Category::G => 'G',
            Category::H => 'H',
        }
    }
}

/// A kind of action; figures per action are always listed in this order. Wind cases are numbered in the order in
/// which the building first uses them ([`Actions::wind_cases`]).
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Action {
    Permanent,
    Imposed(Category),
    Snow,
    Wind(usize),
}

/// The actions that a building has.
#[derive(Clone, Debug, PartialEq)]
pub struct Actions {
    /// Ordered; permanent always first.
    pub present: Vec<Action>,
    /// Names of the wind cases; the default case has the empty name.
    pub wind_cases: Vec<String>,
}

impl Actions {
    /// "permanent", "imposed A", "snow", "wind" or "wind NAME".
    pub fn name(&self, action: Action) -> String {
        match action {
            Action::Permanent => "permanent".into(),
            Action::Imposed(category) => format!("imposed {}", category.letter()),
            Action::Snow => "snow".into(),
            Action::Wind(case) => match self.wind_cases.get(case).map(String::as_str) {
                None | Some("") => "wind".into(),
                Some(name) => format!("wind {name}"),
            },
        }
    }
}

/// Which expression of EN 1990 6.4.3.2 strength uses.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum StrengthRule {
    /// (6.10)
    Single,
    /// The less favourable of (6.10a) and (6.10b).
    Pair,
}
