//! Faults and warnings as a terminal shows them and as JSON.

mod json;
mod plain;
mod terminal;

pub use json::faults as json;
pub use plain::shown;
pub use terminal::faults as terminal;

/// What a terminal, or a pipe, can show.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Screen {
    /// Cells across; none for a pipe, where nothing is cut or wrapped.
    pub width: Option<usize>,
    /// False for terminals without Unicode and for `--ascii`.
    pub unicode: bool,
}

impl Screen {
    pub const PIPE: Screen = Screen { width: None, unicode: true };

    pub fn cells(width: usize) -> Screen {
        Screen { width: Some(width), unicode: true }
    }

    pub fn ascii(self) -> Screen {
        Screen { unicode: false, ..self }
    }
}
