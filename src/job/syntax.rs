//! From text to a TOML tree with places, and from the parser's complaints to faults.

use std::ops::Range;

use toml::Spanned;
use toml::de::{DeTable, Error};

use super::brackets::unclosed;
use super::fault::{Fault, Span};
use super::findings::Findings;
use super::keys::{self, Keys};
use super::registry::Name;

/// More complaints than this are not worth telling one by one: the file is not a job.
const MOST_COMPLAINTS: usize = 500;
/// So many keys that stand twice are told with the place where they stood first.
const MOST_LOOKED_UP: usize = 60;

/// A tree, and the spans that a fault is already about.
pub(super) struct Parsed<'t> {
    pub root: Spanned<DeTable<'t>>,
    pub spoiled: Vec<Span>,
    /// The text could be read to its end, so that what the tree lacks is lacking in the file.
    pub whole: bool,
}

/// Parses a text. A complaint about a single value leaves the rest readable; one about the structure does not, and
/// hides what the parser says after it.
pub(super) fn parse<'t>(text: &'t str, found: &mut Findings) -> Parsed<'t> {
    // The first way stops gathering complaints at the first, so that a text with none costs nothing more.
    if let Ok(root) = DeTable::parse(text) {
        return Parsed { root, spoiled: Vec::new(), whole: true };
    }
    let (root, mut errors) = DeTable::parse_recoverable(text);
    errors.sort_by_key(|e| e.span().map(|s| s.start));
    let mut spoiled: Vec<Span> = Vec::new();
    let mut whole = true;
    let open = unclosed(text);
    let mut last_line = 0;
    for error in &errors {
        let span = widened(text, error.span());
        if spoiled.iter().any(|part| part.contains(&span.start)) {
            continue;
        }
        if error.message() == "duplicate key"
            && let Some(rest) = second_beginning(&span, text, found)
        {
            spoiled.push(rest);
            continue;
        }
        let line = found.line(&span);
        if let Some(open) = open.clone().filter(|open| span.start >= open.start) {
            let fact = "a list that is not closed";
            found.add(Fault::new(Name::Syntax, Some(open.clone()), fact, "close it with ] before the next key"));
            return Parsed { root, spoiled: vec![open], whole: false };
        }
        let structural = !about_one_value(error.message(), text, &span);
        if line != last_line || spoiled.is_empty() {
            found.add(fault(error, span.clone(), text, found));
        }
        last_line = line;
        spoiled.push(span);
        if structural || spoiled.len() >= MOST_COMPLAINTS {
            whole = false;
            break;
        }
    }
    Parsed { root, spoiled, whole }
}

/// What the parser says of a single value, with the rest of the file read as it stands.
fn about_one_value(message: &str, text: &str, span: &Span) -> bool {
    bare_word(message, &text[span.clone()]).is_some()
        || message == "duplicate key"
        || message.starts_with("invalid date")
        || message.starts_with("invalid datetime")
        || message.starts_with("unexpected leading zero")
        || message.starts_with("missing escaped value")
        || message.starts_with("redundant")
}

/// The word or figure that stands where only one in quotes can: what would stand between the quotes.
fn bare_word<'t>(message: &str, part: &'t str) -> Option<&'t str> {
    let scalars = ["invalid integer", "invalid float", "invalid boolean", "invalid number"];
    let unquoted = message.starts_with("string values must be quoted");
    let scalar = scalars.iter().any(|start| message.starts_with(start));
    let bare = part.trim().trim_matches(['“', '”', '‘', '’', '«', '»', '„']);
    let plain = !bare.is_empty() && !bare.contains(['=', '[', ']', '{', '}', '"', '\'', '\\', '\n']);
    (plain && (unquoted || scalar)).then_some(bare)
}

/// A complaint at a point takes the character at that point, or the one before it at the end of a line.
fn widened(text: &str, span: Option<Range<usize>>) -> Span {
    let Some(span) = span else { return 0..0 };
    let start = floor(text, span.start.min(text.len()));
    let end = floor(text, span.end.clamp(start, text.len()));
    if end > start {
        return start..end;
    }
    match text[start..].chars().next() {
        Some(c) if c != '\n' && c != '\r' => start..start + c.len_utf8(),
        _ => start..start,
    }
}

fn floor(text: &str, mut at: usize) -> usize {
    while !text.is_char_boundary(at) {
        at -= 1;
    }
    at
}

fn fault(error: &Error, span: Span, text: &str, found: &Findings) -> Fault {
    let message = error.message();
    let part = text.get(span.clone()).unwrap_or("");
    if message == "duplicate key" {
        return twice(span, part, found);
    }
    if message.starts_with("cannot recurse") || message == "recursion limit" {
        return Fault::new(
            Name::NestedTooDeep,
            // Of a key with too many points the parser does not say where it stands.
            error.span().map(|_| span),
            "tables or lists nested too deep",
            "take this part out: nothing in a job is more than five deep",
        );
    }
    let (description, expected) = message.split_once(", expected ").unwrap_or((message, ""));
    let syntax = |fact: &str, remedy: String| Fault::new(Name::Syntax, Some(span.clone()), fact, remedy);
    match description {
        "string values must be quoted" if part.trim().is_empty() => {
            syntax("a key without a value", "write a value behind the =".into())
        }
        _ if bare_word(message, part).is_some() => {
            let bare = bare_word(message, part).unwrap_or_default();
            match bare.chars().count() > 60 {
                true => syntax("a text without quotes", "put it in double quotes".into()),
                false => {
                    syntax("a text without quotes", format!("write \"{bare}\"")).replaced_by(format!("\"{bare}\""))
                }
            }
        }
        "string values must be quoted" => syntax("a text without quotes", "put it in double quotes".into()),
        "invalid basic string" | "invalid literal string" if expected == "`\"`" || expected == "`'`" => {
            syntax("a text that does not end on its line", "close it with a double quote".into())
        }
        "key with no value" => syntax("a key without =", "write key = value; a key has no blanks".into()),
        "missing escaped value" => {
            syntax("a backslash that escapes nothing", "write two backslashes, or take it out".into())
        }
        "unclosed table" | "unclosed array table" => {
            syntax("a line [ that is not closed", "close it as it was opened, with ] or ]]".into())
        }
        "unclosed array" => syntax("a list that is not closed", "close it with ]".into()),
        "unclosed inline table" => syntax("a table in braces that is not closed", "close it with }".into()),
        "missing comma between array elements" | "missing comma between key-value pairs" => {
            syntax("a comma is missing", "put a comma before this".into())
        }
        "extra comma in array" | "extra comma in inline table" => syntax("a comma too many", "take it out".into()),
        "invalid date" => syntax("a date that does not exist", format!("give a {}", expected.trim())),
        other if expected.is_empty() => syntax(&lower(other), "mend or take out this part".into()),
        other => syntax(&lower(other), format!("here can stand {}", expected.replace('`', ""))),
    }
}

/// Where a key that begins a table of a list stands a second time, most often the header between the two is missing.
/// Says so, and gives what follows up to the next header: nothing in it can be read for certain. A header that is
/// twice only because a table below it came first is left to whoever reads that table.
fn second_beginning(span: &Span, text: &str, found: &mut Findings) -> Option<Span> {
    let line_start = text[..span.start].rfind('\n').map_or(0, |n| n + 1);
    let before = text[line_start..span.start].trim_start();
    let key = &text[span.clone()];
    if before.starts_with('[') {
        let is_list = keys::FILE.now.iter().any(|(name, example)| *name == key && example.starts_with("[["));
        return (is_list && first_of(span.start, key, text).is_none()).then(|| span.clone());
    }
    if !before.is_empty() || !keys::begins_a_table(key) || found.count() > MOST_LOOKED_UP {
        return None;
    }
    let header = text[..line_start].lines().rev().map(str::trim_start).find(|line| line.starts_with("[["))?;
    let title = keys::TABLES.iter().map(|table| table.title).find(|title| header.starts_with(title))?;
    let is_header = |at: &usize| text[*at..].trim_start_matches([' ', '\t']).starts_with("[[");
    let next = text[span.end..].match_indices('\n').map(|(at, _)| span.end + at + 1).find(is_header);
    let rest = span.start..next.unwrap_or(text.len());
    // A name with nothing behind it that only a build-up has is that of a wall.
    let has_keys_of = |table: &Keys| {
        let key_of = |line: &str| line.split('=').next().map(|key| key.trim().to_string());
        text[rest.clone()].lines().skip(1).filter_map(key_of).any(|key| key != "name" && table.has(&key))
    };
    let title = match title {
        "[[build-up]]" if !has_keys_of(&keys::BUILD_UP) => keys::WALL.title,
        title => title,
    };
    found.header_missing(title, span);
    Some(rest)
}

fn twice(span: Span, part: &str, found: &Findings) -> Fault {
    let key = part.trim_matches(['"', '\'']);
    let fact = match key.chars().count() <= 24 {
        true => format!("{key} stands twice"),
        false => "a key stands twice".into(),
    };
    let first = match found.count() < MOST_LOOKED_UP {
        true => first_of(span.start, part, found.source.text()),
        false => None,
    };
    match first {
        Some(first) => {
            let line = found.line(&first);
            Fault::new(
                Name::KeyTwice,
                Some(span),
                fact,
                format!("keep one of the two, the first is on line {line}"),
            )
            .with(first)
        }
        None => Fault::new(Name::KeyTwice, Some(span), fact, "keep one of the two"),
    }
}

/// Where a key stood before in the same table, or a table's header before: looked for backwards, line by line, as
/// keys stand at the beginning of a line; in a table in braces, on the same line.
fn first_of(at: usize, part: &str, text: &str) -> Option<Span> {
    let line_start = text[..at].rfind('\n').map_or(0, |n| n + 1);
    let header = text[line_start..at].trim_start().starts_with('[');
    if !header && !text[line_start..at].trim().is_empty() {
        let first = text[line_start..at].find(part)? + line_start;
        return Some(first..first + part.len());
    }
    let mut end = line_start;
    while end > 0 {
        let start = text[..end - 1].rfind('\n').map_or(0, |n| n + 1);
        let line = text[start..end].trim_start();
        let offset = end - line.len();
        let named = |rest: &str| {
            let after = rest.strip_prefix(part)?.trim_start();
            after.starts_with(if header { [']', ']'] } else { ['=', '.'] }).then_some(())
        };
        if header && line.starts_with('[') {
            let name = line.trim_start_matches('[');
            if named(name).is_some() {
                let first = offset + (line.len() - name.len());
                return Some(first..first + part.len());
            }
        } else if !header {
            if named(line).is_some() {
                return Some(offset..offset + part.len());
            }
            if line.starts_with('[') {
                return None;
            }
        }
        end = start;
    }
    None
}

/// The parser's words in our style.
fn lower(message: &str) -> String {
    let mut words = message.replace('`', "\"");
    if let Some(first) = words.get_mut(0..1) {
        first.make_ascii_lowercase();
    }
    words
}
