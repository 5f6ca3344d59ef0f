//! A list whose last bracket is missing. The parser complains where it can go no further; the engineer wants to know
//! which list it was.

use super::fault::Span;

/// The bracket of a list that is still open where a header or another key begins.
pub(super) fn unclosed(text: &str) -> Option<Span> {
    let mut open: Vec<(usize, char)> = Vec::new();
    let mut at = 0;
    for line in text.split_inclusive('\n') {
        let start = line.trim_start();
        if let Some((bracket, '[')) = open.last().copied()
            && (is_header(start) || is_key(start))
        {
            return Some(bracket..bracket + 1);
        }
        if !open.is_empty() || !start.starts_with('[') {
            follow(line, at, &mut open);
        }
        at += line.len();
    }
    None
}

/// `[name]` or `[[name]]`, which no list holds.
fn is_header(line: &str) -> bool {
    let Some(rest) = line.strip_prefix('[') else { return false };
    let name = rest.strip_prefix('[').unwrap_or(rest);
    let end =
        name.find(|c: char| !(c.is_ascii_alphanumeric() || matches!(c, '-' | '_' | '.'))).unwrap_or(name.len());
    let word = &name[..end];
    word.starts_with(|c: char| c.is_ascii_alphabetic())
        && !matches!(word, "true" | "false" | "nan" | "inf")
        && name[end..].starts_with(']')
}

/// `name = `, which no list holds outside braces.
fn is_key(line: &str) -> bool {
    let end = line.find(|c: char| !(c.is_ascii_alphanumeric() || matches!(c, '-' | '_'))).unwrap_or(0);
    end > 0 && line[end..].trim_start().starts_with('=')
}

/// Follows the brackets of a line outside texts and comments. Texts of several lines are not followed: none of a job
/// holds a list.
fn follow(line: &str, at: usize, open: &mut Vec<(usize, char)>) {
    let mut quote: Option<char> = None;
    let mut escaped = false;
    for (offset, c) in line.char_indices() {
        match (quote, c) {
            (Some('"'), '\\') if !escaped => {
                escaped = true;
                continue;
            }
            (Some(mark), c) if c == mark && !escaped => quote = None,
            (Some(_), _) => {}
            (None, '"' | '\'') => quote = Some(c),
            (None, '#') => return,
            (None, '[' | '{') => open.push((at + offset, c)),
            (None, ']' | '}') => {
                open.pop();
            }
            _ => {}
        }
        escaped = false;
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn an_open_list_is_found_and_a_closed_one_is_not() {
        assert_eq!(unclosed("a = [\n  1,\n[[beam]]\n"), Some(4..5));
        assert_eq!(unclosed("a = [ 1, \"]\"\nb = 2\n"), Some(4..5));
        assert_eq!(unclosed("a = [ 1, # ]\n]\nb = { x = [\n1 ] }\n[c]\nd = [[1],\n[2]]\n"), None);
        assert_eq!(unclosed("a = { b = 1,\nc = 2 }\n"), None);
    }
}
