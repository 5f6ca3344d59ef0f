//! What is said in a terminal: the sheets' language without the paper. Two weights, no colour.

pub mod ledger;
pub mod movements;
pub mod scale;
pub mod summary;
pub mod table;
pub mod verdict;

use std::io::IsTerminal;

use unicode_width::UnicodeWidthStr;

use crate::job::show::Screen as Cells;

/// From here on a terminal gets the wide layout; pipes always do.
pub const WIDE: usize = 120;

/// What a terminal or a pipe can show.
#[derive(Clone, Copy, Debug)]
pub struct Screen {
    /// Cells across; none for a pipe.
    pub width: Option<usize>,
    pub unicode: bool,
    /// Bold and dim.
    pub weights: bool,
}

/// `--color`.
#[derive(Clone, Copy, Debug, PartialEq, Eq, clap::ValueEnum)]
pub enum Weights {
    Always,
    Never,
    Auto,
}

impl Screen {
    pub const PIPE: Screen = Screen { width: None, unicode: true, weights: false };

    /// Standard output (or standard error) as it is.
    pub fn detect(error: bool, ascii: bool, weights: Weights) -> Screen {
        let terminal = if error { std::io::stderr().is_terminal() } else { std::io::stdout().is_terminal() };
        let set = |name: &str| std::env::var_os(name).filter(|value| !value.is_empty());
        let term = std::env::var("TERM").unwrap_or_default();
        let width = terminal.then(|| {
            let columns = set("COLUMNS").and_then(|c| c.to_str().and_then(|c| c.parse().ok()));
            columns.or_else(|| terminal_size::terminal_size().map(|(w, _)| usize::from(w.0))).unwrap_or(80)
        });
        let weights = match weights {
            Weights::Always => true,
            Weights::Never => false,
            Weights::Auto => terminal && set("NO_COLOR").is_none() && term != "dumb",
        };
        Screen { width, unicode: !ascii && unicode(&term, terminal), weights }
    }

    pub fn cells(&self) -> Cells {
        Cells { width: self.width, unicode: self.unicode }
    }

    pub fn is_wide(&self) -> bool {
        self.width.is_none_or(|w| w >= WIDE)
    }

    /// Width that running text wraps at.
    pub fn text_width(&self) -> usize {
        self.width.map_or(WIDE, |w| w.min(WIDE))
    }

    pub fn bold(&self, text: &str) -> String {
        if self.weights { format!("\x1b[1m{text}\x1b[22m") } else { text.to_string() }
    }

    pub fn dim(&self, text: &str) -> String {
        if self.weights { format!("\x1b[2m{text}\x1b[22m") } else { text.to_string() }
    }

    /// One of two spellings: with Unicode, or without.
    pub fn either(&self, unicode: &'static str, ascii: &'static str) -> &'static str {
        if self.unicode { unicode } else { ascii }
    }

    /// Text of ours without Unicode where the screen has none.
    pub fn plain(&self, text: &str) -> String {
        crate::job::show::shown(text, self.cells())
    }
}

/// Whether the locale says UTF-8 and no script in which marks are two cells wide.
fn unicode(term: &str, terminal: bool) -> bool {
    if terminal && matches!(term, "dumb" | "linux") {
        return false;
    }
    let first = ["LC_ALL", "LC_CTYPE", "LANG"]
        .into_iter()
        .find_map(|name| std::env::var(name).ok().filter(|v| !v.is_empty()));
    match first {
        None => !terminal,
        Some(locale) => {
            let lower = locale.to_lowercase();
            let wide = ["zh", "ja", "ko"].iter().any(|language| lower.starts_with(language));
            let utf8 = lower.contains("utf-8") || lower.contains("utf8");
            !wide && (utf8 || !terminal)
        }
    }
}

/// Width of a text in terminal cells.
pub fn cells(text: &str) -> usize {
    text.width()
}

/// Filled with blanks on the right.
pub fn left(text: &str, width: usize) -> String {
    format!("{text}{}", " ".repeat(width.saturating_sub(cells(text))))
}

/// Filled with blanks on the left.
pub fn right(text: &str, width: usize) -> String {
    format!("{}{text}", " ".repeat(width.saturating_sub(cells(text))))
}

/// Words wrapped to a width, each line behind the same indent.
pub fn wrapped(text: &str, indent: usize, width: usize) -> Vec<String> {
    let mut lines: Vec<String> = Vec::new();
    let mut line = String::new();
    for word in text.split_whitespace() {
        let needed = indent + cells(&line) + usize::from(!line.is_empty()) + cells(word);
        if needed > width && !line.is_empty() {
            lines.push(format!("{}{line}", " ".repeat(indent)));
            line.clear();
        }
        if !line.is_empty() {
            line.push(' ');
        }
        line.push_str(word);
    }
    if !line.is_empty() {
        lines.push(format!("{}{line}", " ".repeat(indent)));
    }
    lines
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn words_wrap_inside_the_width() {
        let lines = wrapped("north wall and south wall as bearings", 2, 20);
        assert_eq!(lines, ["  north wall and", "  south wall as", "  bearings"]);
    }

    #[test]
    fn without_weights_nothing_is_added() {
        assert_eq!(Screen::PIPE.bold("met"), "met");
        assert_eq!(Screen { weights: true, ..Screen::PIPE }.bold("met"), "\x1b[1mmet\x1b[22m");
    }
}
