//! Columns: words left, numbers by their decimal point, two blanks apart; a cell that does not apply is empty.

use super::{Screen, cells};

/// How the cells of a column stand.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Align {
    Left,
    /// Flush right; numbers with the same places after the point so stand by their point.
    Right,
    /// By the decimal point.
    Point,
}

#[derive(Clone, Debug)]
pub struct Column {
    pub head: &'static str,
    pub align: Align,
    /// Blanks before it.
    pub gap: usize,
}

#[derive(Clone, Debug, Default)]
pub struct Cell {
    pub text: String,
    pub bold: bool,
    pub dim: bool,
}

impl Cell {
    pub fn of(text: impl Into<String>) -> Cell {
        Cell { text: text.into(), ..Cell::default() }
    }

    pub fn bold(text: impl Into<String>) -> Cell {
        Cell { text: text.into(), bold: true, dim: false }
    }
}

#[derive(Clone, Debug, Default)]
pub struct Row {
    pub cells: Vec<Cell>,
    /// The whole row, where a requirement is not met.
    pub bold: bool,
}

/// The lines of a table, heads first, without blanks at their ends.
pub fn lines(screen: &Screen, columns: &[Column], rows: &[Row]) -> Vec<String> {
    let texts = |n: usize| rows.iter().map(move |r| r.cells.get(n).map_or("", |c| c.text.as_str()));
    let measures: Vec<Measure> = (0..columns.len()).map(|n| Measure::of(columns[n].align, texts(n))).collect();
    let widths: Vec<usize> = columns.iter().zip(&measures).map(|(c, m)| m.width().max(cells(c.head))).collect();
    let mut out = Vec::with_capacity(rows.len() + 1);
    let mut head = String::new();
    for (n, column) in columns.iter().enumerate() {
        head.push_str(&" ".repeat(if n == 0 { 0 } else { column.gap }));
        head.push_str(&placed(column.head, widths[n], column.align));
    }
    out.push(screen.dim(head.trim_end()));
    for row in rows {
        let mut line = String::new();
        for (n, column) in columns.iter().enumerate() {
            line.push_str(&" ".repeat(if n == 0 { 0 } else { column.gap }));
            let Some(cell) = row.cells.get(n) else { continue };
            let inner = measures[n].pad(&cell.text);
            let text = placed(&inner, widths[n], column.align);
            let shown = match (cell.bold && !row.bold, cell.dim) {
                (true, _) => screen.bold(&text),
                (false, true) => screen.dim(&text),
                (false, false) => text,
            };
            line.push_str(&shown);
        }
        let line = line.trim_end().to_string();
        out.push(if row.bold { screen.bold(&line) } else { line });
    }
    out
}

fn placed(text: &str, width: usize, align: Align) -> String {
    match align {
        Align::Left => super::left(text, width),
        Align::Right | Align::Point => super::right(text, width),
    }
}

/// Widths before and after the decimal point.
struct Measure {
    align: Align,
    before: usize,
    after: usize,
    widest: usize,
}

impl Measure {
    fn of<'t>(align: Align, texts: impl Iterator<Item = &'t str>) -> Measure {
        let mut m = Measure { align, before: 0, after: 0, widest: 0 };
        for text in texts {
            m.widest = m.widest.max(cells(text));
            if let Some((before, after)) = parted(text) {
                m.before = m.before.max(cells(before));
                m.after = m.after.max(cells(after));
            }
        }
        m
    }

    fn width(&self) -> usize {
        match self.align {
            Align::Point => self.widest.max(self.before + self.after),
            Align::Left | Align::Right => self.widest,
        }
    }

    fn pad(&self, text: &str) -> String {
        match (self.align, parted(text)) {
            (Align::Point, Some((_, after))) => format!("{text}{}", " ".repeat(self.after - cells(after))),
            _ => text.to_string(),
        }
    }
}

/// A number parted before its point; words are not.
fn parted(text: &str) -> Option<(&str, &str)> {
    let number = text.chars().all(|c| c.is_ascii_digit() || matches!(c, '.' | '-' | '\u{2212}'));
    if text.is_empty() || !number {
        return None;
    }
    Some(text.split_at(text.find('.').unwrap_or(text.len())))
}
