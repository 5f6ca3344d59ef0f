//! The templates of the package: embedded, and replaced one by one by a practice's own.

use std::collections::BTreeMap;

macro_rules! embedded {
    ($($name:literal),* $(,)?) => {
        /// Every template with its text, by its name under `templates/`.
        pub const EMBEDDED: &[(&str, &str)] =
            &[$(($name, include_str!(concat!("../../templates/", $name)))),*];
    };
}

embedded![
    "data.typ",
    "look.typ",
    "text.typ",
    "sheet.typ",
    "tables.typ",
    "workings.typ",
    "cover.typ",
    "basis.typ",
    "loads.typ",
    "load-path.typ",
    "governing.typ",
    "member.typ",
    "stacked.typ",
    "cautions.typ",
    "record.typ",
    "drawings/ink.typ",
    "drawings/drawings.typ",
];

/// Templates that stand in for embedded ones: name under `templates/` (such as `cover.typ`) to text. A name that is
/// not embedded is a further file that an overriding template may import.
#[derive(Clone, Debug, Default, PartialEq)]
pub struct Overrides(pub BTreeMap<String, String>);

/// All templates of a package, embedded or overridden, by name.
pub(crate) fn in_force(overrides: &Overrides) -> BTreeMap<&str, &str> {
    let mut all: BTreeMap<&str, &str> = EMBEDDED.iter().copied().collect();
    all.extend(overrides.0.iter().map(|(name, text)| (name.as_str(), text.as_str())));
    all
}

#[cfg(test)]
mod tests {
    use super::*;

    /// Names of all `.typ` files under a folder, relative to it.
    fn on_disk(folder: &std::path::Path, prefix: &str, found: &mut Vec<String>) {
        for entry in std::fs::read_dir(folder).unwrap() {
            let entry = entry.unwrap();
            let name = format!("{prefix}{}", entry.file_name().to_string_lossy());
            if entry.file_type().unwrap().is_dir() {
                on_disk(&entry.path(), &format!("{name}/"), found);
            } else if name.ends_with(".typ") {
                found.push(name);
            }
        }
    }

    #[test]
    fn every_template_is_embedded() {
        let folder = std::path::Path::new(env!("CARGO_MANIFEST_DIR")).join("../../templates");
        let mut files = Vec::new();
        on_disk(&folder, "", &mut files);
        files.sort();
        let mut names: Vec<&str> = EMBEDDED.iter().map(|(name, _)| *name).collect();
        names.sort();
        assert_eq!(files, names);
    }
}
