//! The dimension tables of `data/`, read while the program is compiled: a row that does not parse stops the build,
//! so that no reading can fail later.

/// What the catalogue knows of a section before anything is computed; millimetres.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct Row {
    pub name: &'static str,
    pub h: f64,
    pub b: f64,
    pub t_w: f64,
    pub t_f: f64,
    pub r: f64,
}

const HEADER: &str = "name,h,b,tw,tf,r\n";

const UB_TEXT: &str = include_str!("data/ub.csv");
const UC_TEXT: &str = include_str!("data/uc.csv");

const UB_ROWS: [Row; count(UB_TEXT)] = rows(UB_TEXT);
const UC_ROWS: [Row; count(UC_TEXT)] = rows(UC_TEXT);

/// Universal beams, in the order of the data file.
pub(super) static UB: &[Row] = &UB_ROWS;
/// Universal columns, in the order of the data file.
pub(super) static UC: &[Row] = &UC_ROWS;

/// Rows of a table: its lines without the header, each of which ends with a line feed.
const fn count(text: &str) -> usize {
    let bytes = text.as_bytes();
    let (mut at, mut lines) = (0, 0);
    while at < bytes.len() {
        if bytes[at] == b'\n' {
            lines += 1;
        }
        at += 1;
    }
    lines - 1
}

/// All rows of a table; anything unexpected stops the compilation.
const fn rows<const N: usize>(text: &'static str) -> [Row; N] {
    let mut rows = [Row { name: "", h: 0.0, b: 0.0, t_w: 0.0, t_f: 0.0, r: 0.0 }; N];
    let mut rest = after_header(text);
    let mut i = 0;
    while i < N {
        (rows[i].name, rest) = cell(rest, b',');
        (rows[i].h, rest) = number(rest, b',');
        (rows[i].b, rest) = number(rest, b',');
        (rows[i].t_w, rest) = number(rest, b',');
        (rows[i].t_f, rest) = number(rest, b',');
        (rows[i].r, rest) = number(rest, b'\n');
        i += 1;
    }
    assert!(rest.is_empty(), "a table of sections ends with its last row");
    rows
}

const fn after_header(text: &'static str) -> &'static str {
    let (header, rest) = text.split_at(HEADER.len());
    let mut at = 0;
    while at < HEADER.len() {
        assert!(header.as_bytes()[at] == HEADER.as_bytes()[at], "a table of sections begins with its header");
        at += 1;
    }
    rest
}

/// The text before `end`, which must not be empty, and the text after it.
const fn cell(text: &'static str, end: u8) -> (&'static str, &'static str) {
    let mut at = 0;
    while text.as_bytes()[at] != end {
        assert!(text.as_bytes()[at] != b'\n', "a row of a table of sections has too few cells");
        at += 1;
    }
    assert!(at > 0, "a cell of a table of sections is empty");
    let (cell, rest) = text.split_at(at);
    (cell, rest.split_at(1).1)
}

/// A plain decimal such as `203.2`. Digits and power of ten are exact, so their quotient is the nearest double.
const fn number(text: &'static str, end: u8) -> (f64, &'static str) {
    let (cell, rest) = cell(text, end);
    let bytes = cell.as_bytes();
    let (mut digits, mut scale, mut point, mut at) = (0_u32, 1_u32, false, 0);
    while at < bytes.len() {
        match bytes[at] {
            b'.' if !point => point = true,
            digit @ b'0'..=b'9' => {
                digits = digits * 10 + (digit - b'0') as u32;
                if point {
                    scale *= 10;
                }
            }
            _ => panic!("a dimension in a table of sections is not a plain decimal"),
        }
        at += 1;
    }
    assert!(digits > 0, "a dimension in a table of sections is not positive");
    (digits as f64 / scale as f64, rest)
}
