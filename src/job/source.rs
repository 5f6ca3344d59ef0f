//! The text of a job file and the places in it. Columns count characters from 1, a tab is one, a BOM none.

use super::fault::Span;

/// Characters are counted from here at every so many bytes, so that a place in a long line costs little.
const STEP: usize = 4096;

/// A job file as text, with the name that messages give it.
#[derive(Clone, Debug, Default)]
pub struct Source {
    file: String,
    text: String,
    line_starts: Vec<usize>,
    counted: Vec<usize>,
}

/// A place as editors count it, both from 1.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Place {
    pub line: usize,
    pub column: usize,
}

impl Source {
    /// `text` may begin with a BOM, which is taken off: spans refer to the text without it.
    pub fn new(file: &str, text: &str) -> Source {
        let text = text.strip_prefix('\u{feff}').unwrap_or(text).to_string();
        let mut line_starts = vec![0];
        line_starts.extend(text.match_indices('\n').map(|(at, _)| at + 1));
        let mut counted = Vec::with_capacity(text.len() / STEP + 1);
        let mut characters = 0;
        for (at, byte) in text.bytes().enumerate() {
            if at % STEP == 0 {
                counted.push(characters);
            }
            characters += usize::from(begins_character(byte));
        }
        Source { file: file.to_string(), text, line_starts, counted }
    }

    /// The name of the file in messages.
    pub fn file(&self) -> &str {
        &self.file
    }

    /// The whole text, without a BOM.
    pub fn text(&self) -> &str {
        &self.text
    }

    /// Line and column of a byte; past the end, the end.
    pub fn place(&self, at: usize) -> Place {
        let at = at.min(self.text.len());
        let line = self.line_of(at);
        let column = self.characters_before(at) - self.characters_before(self.line_starts[line - 1]) + 1;
        Place { line, column }
    }

    /// The line, from 1, that a byte lies on.
    pub fn line_of(&self, at: usize) -> usize {
        self.line_starts.partition_point(|start| *start <= at).max(1)
    }

    /// Where a line, counted from 1, begins and ends, its line break left out.
    pub fn line_span(&self, line: usize) -> Span {
        let Some(&start) = self.line_starts.get(line.wrapping_sub(1)) else {
            return self.text.len()..self.text.len();
        };
        let end = self.line_starts.get(line).map_or(self.text.len(), |next| next - 1);
        let end = if self.text[start..end].ends_with('\r') { end - 1 } else { end };
        start..end
    }

    /// The text of a span.
    pub fn slice(&self, span: &Span) -> &str {
        self.text.get(span.clone()).unwrap_or("")
    }

    /// The span that a message underlines: what of it lies on its first line.
    pub fn first_line_part(&self, span: &Span) -> Span {
        let line = self.line_span(self.line_of(span.start.min(self.text.len())));
        let start = span.start.clamp(line.start, line.end.max(line.start));
        start..span.end.clamp(start, line.end.max(start))
    }

    fn characters_before(&self, at: usize) -> usize {
        let block = at / STEP;
        let Some(counted) = self.counted.get(block).or(self.counted.last()) else { return 0 };
        let from = block.min(self.counted.len() - 1) * STEP;
        counted + self.text.as_bytes()[from..at].iter().filter(|b| begins_character(**b)).count()
    }
}

fn begins_character(byte: u8) -> bool {
    byte & 0xC0 != 0x80
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn columns_count_characters_and_a_tab_is_one() {
        let source = Source::new("job.toml", "\u{feff}a = 1\n\té = 2\r\nend");
        assert_eq!(source.text().chars().next(), Some('a'));
        let at = source.text().find('2').unwrap();
        assert_eq!(source.place(at), Place { line: 2, column: 6 });
        assert_eq!(source.slice(&source.line_span(2)), "\té = 2");
        assert_eq!(source.place(usize::MAX), Place { line: 3, column: 4 });
        assert_eq!(source.line_span(9), source.text().len()..source.text().len());
    }

    #[test]
    fn a_place_far_along_a_line_is_counted_right() {
        let text = format!("{}x", "é".repeat(10_000));
        let source = Source::new("job.toml", &text);
        assert_eq!(source.place(20_000), Place { line: 1, column: 10_001 });
    }

    #[test]
    fn an_empty_text_has_one_line() {
        let source = Source::new("job.toml", "");
        assert_eq!(source.place(0), Place { line: 1, column: 1 });
        assert_eq!(source.line_span(1), 0..0);
    }
}
