//! What the calculation must never know of, as house.md has it: its dependencies hold no typesetting, no template
//! engine, no file format and no calendar.

use std::collections::{BTreeMap, BTreeSet};
use std::path::Path;

const NEVER: [&str; 10] =
    ["typst", "typst-pdf", "minijinja", "toml", "toml_edit", "chrono", "serde", "serde_json", "image", "rayon"];

#[expect(clippy::disallowed_methods, clippy::disallowed_macros, reason = "a test about the workspace's own files")]
fn read(relative: &str) -> String {
    let path = Path::new(env!("CARGO_MANIFEST_DIR")).join(relative);
    std::fs::read_to_string(&path).unwrap_or_else(|error| panic!("{}: {error}", path.display()))
}

/// Names under `[dependencies]`, so that what only tests use does not count.
fn direct(manifest: &str) -> BTreeSet<String> {
    let table = manifest.lines().skip_while(|line| line.trim() != "[dependencies]").skip(1);
    let lines = table.take_while(|line| !line.starts_with('['));
    let keys = lines.filter_map(|line| line.split(['=', '.']).next()).map(str::trim);
    keys.filter(|key| !key.is_empty() && !key.starts_with('#')).map(str::to_string).collect()
}

/// What each package of a lock file depends on, by name.
fn packages(lock: &str) -> BTreeMap<String, BTreeSet<String>> {
    let mut packages = BTreeMap::new();
    for package in lock.split("[[package]]").skip(1) {
        let name = package.lines().find_map(|line| line.strip_prefix("name = ")).expect("a package has a name");
        let listed = package.split_once("dependencies = [").map_or("", |(_, rest)| rest);
        let listed = listed.split(']').next().unwrap_or_default();
        let names = listed.lines().map(|line| line.trim().trim_matches([',', '"']));
        let names = names.filter_map(|name| name.split(' ').next()).filter(|name| !name.is_empty());
        // Two versions of one package are taken together.
        let of_name: &mut BTreeSet<String> = packages.entry(name.trim_matches('"').to_string()).or_default();
        of_name.extend(names.map(str::to_string));
    }
    packages
}

fn tree(roots: BTreeSet<String>, packages: &BTreeMap<String, BTreeSet<String>>) -> BTreeSet<String> {
    let mut open: Vec<String> = roots.into_iter().collect();
    let mut seen = BTreeSet::new();
    while let Some(name) = open.pop() {
        let dependencies = packages.get(&name).unwrap_or_else(|| panic!("{name} is in no lock file"));
        if seen.insert(name) {
            open.extend(dependencies.iter().cloned());
        }
    }
    seen
}

#[test]
fn calculation_depends_on_no_page_file_or_clock() {
    let packages = packages(&read("../../Cargo.lock"));
    let roots = direct(&read("Cargo.toml"));
    assert!(roots.contains("libm"), "the manifest was read wrongly: {roots:?}");
    let tree = tree(roots, &packages);
    for never in NEVER {
        assert!(!tree.contains(never), "{never} is among the dependencies of the calculation");
    }
    // The lock file was read rightly: the room of the sheets does have the typesetting.
    let sheets = self::tree(BTreeSet::from(["sagledger-sheets".to_string()]), &packages);
    assert!(sheets.contains("typst") && sheets.contains("typst-pdf") && sheets.contains("sagledger-calc"));
}

#[test]
fn calculation_chooses_no_instructions_at_run_time() {
    // house.md: figures are the same on every processor. Crates that dispatch, or that bring dispatching along.
    let tree = tree(direct(&read("Cargo.toml")), &packages(&read("../../Cargo.lock")));
    for never in ["matrixmultiply", "gemm", "pulp", "cpufeatures", "multiversion", "blas", "lapack", "faer"] {
        assert!(!tree.contains(never), "{never} is among the dependencies of the calculation");
    }
}
