//! Finding sections by the names the trade gives them.

use super::{Section, catalogue};

/// Most names that [`nearest`] gives.
const MOST: usize = 3;
/// Names further away than this many single-letter changes are no likely slips.
const FURTHEST: usize = 4;
/// Longer texts are not compared at all: no name comes near them.
const LONGEST: usize = 32;

/// The section of this name. `x`, `X` and `×` are the same, so are capitals and small letters; spaces do not count.
pub fn find(name: &str) -> Option<&'static Section> {
    catalogue().iter().find(|section| plain(section.name).eq(plain(name)))
}

/// Up to three names of sections near one that was not found, the nearest first; none where nothing is near.
/// Among names as near by their letters, those nearer by their mass come first.
pub fn nearest(name: &str) -> Vec<&'static str> {
    if plain(name).nth(LONGEST).is_some() {
        return Vec::new();
    }
    let wanted = family_last(plain(name).collect());
    let mass = mass_in(&wanted);
    let mut near: Vec<(usize, f64, &'static str)> = catalogue()
        .iter()
        .map(|section| {
            let own: String = plain(section.name).collect();
            let apart = match (mass, mass_in(&own)) {
                (Some(wanted), Some(own)) => (wanted - own).abs(),
                _ => 0.0,
            };
            (strsim::damerau_levenshtein(&wanted, &own), apart, section.name)
        })
        .filter(|(changes, ..)| *changes <= FURTHEST)
        .collect();
    near.sort_by(|a, b| a.0.cmp(&b.0).then(a.1.total_cmp(&b.1)));
    near.into_iter().take(MOST).map(|(.., name)| name).collect()
}

/// Small letters, `x` for the sign of multiplication, no spaces.
fn plain(name: &str) -> impl Iterator<Item = char> {
    let letters = name.chars().filter(|c| !c.is_whitespace()).flat_map(char::to_lowercase);
    letters.map(|c| if c == '×' { 'x' } else { c })
}

/// `ub254x146x37` as `254x146x37ub`.
fn family_last(plain: String) -> String {
    match plain.find(|c: char| c.is_ascii_digit()) {
        Some(digits) if digits > 0 => format!("{}{}", &plain[digits..], &plain[..digits]),
        _ => plain,
    }
}

/// The last number of a name in its plain spelling: the mass in kg/m of the sections that carry it in their names.
fn mass_in(plain: &str) -> Option<f64> {
    let last = plain.rsplit('x').next()?;
    last.trim_end_matches(|c: char| c.is_alphabetic()).parse().ok()
}
