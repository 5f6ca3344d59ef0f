//! Place, fact and name; the line of the file; a wavy line under the part, and the remedy.

use unicode_width::{UnicodeWidthChar, UnicodeWidthStr};

use super::{Screen, shown};
use crate::job::fault::{Fault, Kind, Span};
use crate::job::source::Source;

/// The name stands flush right here, however wide the terminal is.
const RIGHT: usize = 80;
/// Where the text of a line of the file begins: five for its number, two blanks.
const TEXT: usize = 7;
/// The wide layout, which pipes get too.
const WIDE: usize = 120;
/// So many are shown; the last line says how many more there are.
const SHOWN: usize = 50;
/// Pipes get lines of the file uncut, up to a length that no line written by hand has.
const UNCUT: usize = 4000;
/// Cells of a cut line that show what comes before the part.
const CONTEXT: usize = 24;

/// All findings of a file, and, where one of them is a fault, the line that says that nothing was computed.
pub fn faults(source: &Source, findings: &[Fault], screen: Screen) -> String {
    let mut lines: Vec<String> = Vec::new();
    for fault in findings.iter().take(SHOWN) {
        lines.extend(one(source, fault, screen));
    }
    let faults = findings.iter().filter(|f| f.kind() == Kind::Fault).count();
    let warnings = findings.len() - faults;
    let more = findings.len().saturating_sub(SHOWN);
    let counted = |n: usize, word: &str| match n {
        1 => format!("1 {word}"),
        n => format!("{n} {word}s"),
    };
    let mut last = Vec::new();
    if faults > 0 {
        last.push(counted(faults, "fault"));
    }
    if warnings > 0 {
        last.push(counted(warnings, "warning"));
    }
    if more > 0 {
        last.push(format!("{more} more than are shown"));
    }
    if faults > 0 {
        lines.extend(wrapped(&format!("not read: {}; nothing was computed", last.join(", ")), 0, screen));
    } else if more > 0 {
        lines.push(last.join(", "));
    }
    let mut text = lines.join("\n");
    if !text.is_empty() {
        text.push('\n');
    }
    text
}

fn one(source: &Source, fault: &Fault, screen: Screen) -> Vec<String> {
    let name = match fault.kind() {
        Kind::Fault => fault.name.text().to_string(),
        Kind::Warning => format!("warning {}", fault.name.text()),
    };
    let file = shown(source.file(), screen);
    let place = match &fault.span {
        Some(span) => {
            let place = source.place(span.start);
            format!("{file}:{}:{}", place.line, place.column)
        }
        None => file,
    };
    let mut lines = head(&place, &shown(&fault.fact, screen), &name, screen);
    let remedy = shown(&fault.remedy, screen);
    match &fault.span {
        Some(span) => lines.extend(marked(source, span, &remedy, screen)),
        None => lines.extend(wrapped(&remedy, TEXT, screen)),
    }
    lines
}

/// The first line; a fact that is too long for it goes on below, where nothing may be cut it stays on one.
fn head(place: &str, fact: &str, name: &str, screen: Screen) -> Vec<String> {
    let right = screen.width.unwrap_or(RIGHT).min(RIGHT);
    let flush = |left: String| {
        let blanks = right.saturating_sub(left.width() + name.width()).max(2);
        format!("{left}{}{name}", " ".repeat(blanks))
    };
    let indent = place.width() + 2;
    let room = right.saturating_sub(indent + 2 + name.width());
    if fact.width() <= room || screen.width.is_none() {
        return vec![flush(format!("{place}  {fact}"))];
    }
    if room < CONTEXT {
        let mut lines = vec![flush(place.to_string())];
        lines.extend(wrapped(fact, TEXT, screen));
        return lines;
    }
    let mut parts = words_into(fact, room, right.saturating_sub(indent)).into_iter();
    let mut lines = vec![flush(format!("{place}  {}", parts.next().unwrap_or_default()))];
    lines.extend(parts.map(|part| format!("{}{part}", " ".repeat(indent))));
    lines
}

/// The line of the file with its wavy line, and the remedy beside that or, without room, below.
fn marked(source: &Source, span: &Span, remedy: &str, screen: Screen) -> Vec<String> {
    let number = source.line_of(span.start.min(source.text().len()));
    let line_span = source.line_span(number);
    let part = source.first_line_part(span);
    let line = source.slice(&line_span);
    let indent = line.len() - line.trim_start().len();
    // A part may begin in the indent, never before it shows.
    let from = (line_span.start + indent).min(part.start);
    let room = screen.width.map_or(UNCUT, |width| width.saturating_sub(TEXT).max(20));
    let near = |text: &str, end: bool| shown(nearest_part(text, 16 * room, end), screen);
    let before = near(source.slice(&(from..part.start)), true);
    let within = near(source.slice(&part), false);
    let after = near(source.slice(&(part.end..line_span.end)), false);
    let (text, wave_from, wave) = window(&before, &within, after.trim_end(), room, screen);
    let mut lines = vec![format!("{number:>5}  {text}")];
    let wave_line = format!("{}{}", " ".repeat(TEXT + wave_from), "~".repeat(wave));
    let right = match screen.width {
        None => WIDE,
        Some(width) if width >= WIDE => WIDE,
        Some(width) => width.min(RIGHT),
    };
    if remedy.is_empty() {
        lines.push(wave_line);
    } else if wave_line.width() + 2 + remedy.width() <= right {
        lines.push(format!("{wave_line}  {remedy}"));
    } else {
        lines.push(wave_line);
        let start = (TEXT + wave_from).min(right.saturating_sub(remedy.width())).max(TEXT);
        lines.extend(wrapped(remedy, start, screen));
    }
    lines
}

/// A line of the file cut so that its part shows: the text, where the part begins in it, and how long it is, in
/// cells.
fn window(before: &str, part: &str, after: &str, room: usize, screen: Screen) -> (String, usize, usize) {
    let whole = format!("{before}{part}{after}");
    let (before_cells, part_cells) = (before.width(), part.width().max(1));
    if whole.width() <= room {
        return (whole, before_cells, part_cells);
    }
    let dots = if screen.unicode { "…" } else { "..." };
    // The part with what follows it fits from the beginning: cut the end alone.
    if before_cells + part_cells + dots.width() <= room {
        return (format!("{}{dots}", cells_from_start(&whole, room - dots.width())), before_cells, part_cells);
    }
    let kept = cells_from_end(before, CONTEXT.min(room / 3));
    let cut_before = kept.len() < before.len();
    let lead = if cut_before { dots } else { "" };
    let start = lead.width() + kept.width();
    let rest = format!("{part}{after}");
    let left = room.saturating_sub(start);
    let text = match rest.width() <= left {
        true => rest,
        false => format!("{}{dots}", cells_from_start(&rest, left.saturating_sub(dots.width()))),
    };
    let wave = part_cells.min(left).max(1);
    (format!("{lead}{kept}{text}"), start, wave)
}

/// As much of a text as could ever show: its end, or its beginning. Lines may be megabytes long.
fn nearest_part(text: &str, bytes: usize, end: bool) -> &str {
    if text.len() <= bytes {
        return text;
    }
    let cut = if end { text.len() - bytes } else { bytes };
    let cut = (cut..text.len()).find(|at| text.is_char_boundary(*at)).unwrap_or(text.len());
    if end { &text[cut..] } else { &text[..cut] }
}

fn cells_from_start(text: &str, cells: usize) -> &str {
    let mut used = 0;
    for (at, c) in text.char_indices() {
        used += c.width().unwrap_or(0);
        if used > cells {
            return &text[..at];
        }
    }
    text
}

fn cells_from_end(text: &str, cells: usize) -> &str {
    let mut used = 0;
    for (at, c) in text.char_indices().rev() {
        used += c.width().unwrap_or(0);
        if used > cells {
            return &text[at + c.len_utf8()..];
        }
    }
    text
}

/// Words in lines from an indent to the right edge.
fn wrapped(text: &str, indent: usize, screen: Screen) -> Vec<String> {
    let blanks = " ".repeat(indent);
    let Some(width) = screen.width else { return vec![format!("{blanks}{text}")] };
    let room = width.min(RIGHT).saturating_sub(indent).max(20);
    words_into(text, room, room).into_iter().map(|line| format!("{blanks}{line}")).collect()
}

/// Words in lines of so many cells, the first with its own room.
fn words_into(text: &str, first: usize, others: usize) -> Vec<String> {
    let mut lines: Vec<String> = Vec::new();
    let mut line = String::new();
    for word in text.split(' ') {
        let room = if lines.is_empty() { first } else { others };
        if !line.is_empty() && line.width() + 1 + word.width() > room {
            lines.push(std::mem::take(&mut line));
        }
        if !line.is_empty() {
            line.push(' ');
        }
        line.push_str(word);
    }
    lines.push(line);
    lines
}
