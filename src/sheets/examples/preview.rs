//! Sets the packages of the test buildings into a folder, with the templates as they stand on disk: for whoever works
//! on the templates.
//!
//! `cargo run -p sagledger-sheets --example preview -- FOLDER`

#[path = "../tests/support/mod.rs"]
mod support;

use std::collections::BTreeMap;
use std::path::Path;
use std::time::Instant;

use sagledger_calc::calculate;
use sagledger_sheets::{Overrides, compile, source};

fn main() {
    let folder = std::env::args().nth(1).unwrap_or_else(|| ".".into());
    let wanted = std::env::args().nth(2);
    let templates = Path::new(env!("CARGO_MANIFEST_DIR")).join("../../templates");
    let mut overrides = BTreeMap::new();
    read(&templates, "", &mut overrides);
    let jobs = [
        ("three", "2731", "Warden’s lodge, attic and stair", support::three_deep()),
        ("one", "7", "Kitchen opening", support::single()),
        (
            "twelve",
            "2740-HALL-REFURB",
            "A hall with a title that goes on to its sixty characters.",
            support::twelve(),
        ),
    ];
    for (name, number, title, building) in jobs {
        if wanted.as_ref().is_some_and(|w| w != name) {
            continue;
        }
        let results = match calculate(&building) {
            Ok(results) => results,
            Err(faults) => {
                eprintln!("{name}: {faults:?}");
                continue;
            }
        };
        let mut package = support::package(&building, &results, support::meta(number, title));
        package.templates = Overrides(overrides.clone());
        let files = source(&package).expect("the main file");
        let start = Instant::now();
        let compiled = match compile(&files) {
            Ok(compiled) => compiled,
            Err(fault) => {
                eprintln!("{name}: {fault}");
                continue;
            }
        };
        let laid_out = start.elapsed();
        for warning in &compiled.warnings {
            eprintln!("{name}: {warning:?}");
        }
        match compiled.pdf(number, "preview") {
            Ok(pdf) => {
                let sheets = compiled.document.pages().len();
                println!("{name}: {sheets} sheets, {} kB, {laid_out:?} of {:?}", pdf.len() / 1024, start.elapsed());
                std::fs::write(format!("{folder}/{name}.pdf"), pdf).expect("the folder can be written to");
            }
            Err(fault) => eprintln!("{name}: {fault}"),
        }
    }
}

fn read(folder: &Path, prefix: &str, found: &mut BTreeMap<String, String>) {
    for entry in std::fs::read_dir(folder).expect("a folder").flatten() {
        let name = format!("{prefix}{}", entry.file_name().to_string_lossy());
        if entry.path().is_dir() {
            read(&entry.path(), &format!("{name}/"), found);
        } else if let Ok(text) = std::fs::read_to_string(entry.path()) {
            found.insert(name, text);
        }
    }
}
