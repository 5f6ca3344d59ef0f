//! Names that resemble what was typed.

/// Longer texts are no slips of the pen, and comparing them costs the square of their length.
const LONGEST: usize = 64;

/// The nearest of `known` to `typed`, if any is near: nearest first, in the order given where they tie.
pub(super) fn nearest<'k>(typed: &str, known: impl Iterator<Item = &'k str>) -> Vec<&'k str> {
    let length = typed.chars().count();
    if length > LONGEST {
        return Vec::new();
    }
    let plain = flattened(typed);
    let mut near: Vec<(usize, &str)> = known
        .filter(|name| name.len() <= 4 * LONGEST)
        .filter_map(|name| {
            let distance = strsim::osa_distance(&plain, &flattened(name));
            let allowed = (length.max(name.chars().count()) + 1) / 3;
            (distance <= allowed.max(1)).then_some((distance, name))
        })
        .collect();
    near.sort_by_key(|(distance, _)| *distance);
    let best = near.first().map_or(0, |(distance, _)| *distance);
    near.into_iter().filter(|(distance, _)| *distance <= best + 1).map(|(_, name)| name).collect()
}

/// Case, blanks, hyphens and underscores do not make names differ much.
fn flattened(name: &str) -> String {
    name.chars().filter(|c| !matches!(c, ' ' | '-' | '_')).flat_map(char::to_lowercase).collect()
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn near_is_near() {
        let known = ["length", "load-height", "limits"];
        assert_eq!(nearest("lenght", known.into_iter()), ["length"]);
        assert_eq!(nearest("load_height", known.into_iter()), ["load-height"]);
        assert_eq!(nearest("Limits", known.into_iter()), ["limits"]);
        assert!(nearest("colour", known.into_iter()).is_empty());
        assert!(nearest(&"length".repeat(1000), known.into_iter()).is_empty());
    }
}
