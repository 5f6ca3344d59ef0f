//! From a package to the bytes of its PDF.

use typst::World;
use typst::diag::Warned;
use typst::foundations::Smart;
use typst_layout::PagedDocument;
use typst_pdf::{PdfOptions, PdfStandard, PdfStandards, Timestamp};

use crate::data;
use crate::fault::{Fault, Problem};
use crate::fonts::{self, replaced};
use crate::glue::{self, Attachment};
use crate::package::Package;
use crate::templates;
use crate::world::{DATA, Files, MAIN, SheetWorld};

/// A finished package.
#[derive(Clone, Debug)]
pub struct Typeset {
    /// PDF/A-3a and PDF/UA-1, tagged, with the job file and the results attached.
    pub pdf: Vec<u8>,
    pub sheets: usize,
    /// What the typesetter found doubtful; empty for the embedded templates.
    pub warnings: Vec<Problem>,
}

/// Sets a package, once: what the typesetter remembered of it is forgotten before it is written, which keeps the
/// greatest use of memory down. Whoever sets it again and again calls [`compile`] and [`Compiled::pdf`].
///
/// # Errors
/// A template that does not compile, or a document that cannot be an archive, with file and line where known.
pub fn typeset(package: &Package) -> Result<Typeset, Fault> {
    let compiled = compile(&source(package)?)?;
    typst::comemo::evict(0);
    Ok(Typeset {
        pdf: compiled.pdf(&package.meta.number, &package.record.program_version)?,
        sheets: compiled.document.pages().len(),
        warnings: compiled.warnings,
    })
}

/// Sheets as laid out, before they become a file.
pub struct Compiled {
    pub document: PagedDocument,
    pub warnings: Vec<Problem>,
    world: SheetWorld,
}

/// Compiles generated files with nothing else.
///
/// # Errors
/// A template that does not compile.
pub fn compile(files: &Files) -> Result<Compiled, Fault> {
    let world = SheetWorld::new(files).ok_or_else(|| Fault::of("the main file has no name"))?;
    let Warned { output, warnings } = typst::compile::<PagedDocument>(&world);
    let document = output.map_err(|errors| Fault::from_diagnostics(&world, &errors))?;
    let warnings = warnings.iter().map(|w| Problem::from_diagnostic(&world, w)).collect();
    Ok(Compiled { document, warnings, world })
}

impl Compiled {
    /// The bytes of the PDF of a job.
    ///
    /// # Errors
    /// A document that cannot be an archive.
    pub fn pdf(&self, number: &str, program_version: &str) -> Result<Vec<u8>, Fault> {
        let options = options(&self.world, number, program_version)?;
        typst_pdf::pdf(&self.document, &options).map_err(|errors| Fault::from_diagnostics(&self.world, &errors))
    }
}

fn options(world: &SheetWorld, number: &str, version: &str) -> Result<PdfOptions, Fault> {
    let standards = PdfStandards::new(&[PdfStandard::A_3a, PdfStandard::Ua_1])
        .map_err(|e| Fault::of(e.message().to_string()))?;
    let creator = format!("sagledger {version}");
    Ok(PdfOptions {
        ident: Smart::Custom(format!("sagledger {number}")),
        creator: Smart::Custom(Some(creator.trim_end().to_string())),
        timestamp: world.today(None).map(Timestamp::new_utc),
        page_ranges: None,
        standards,
        tagged: true,
        pretty: false,
    })
}

/// The generated files of a package, from which its PDF is set.
///
/// # Errors
/// Only a fault of the program itself.
pub fn source(package: &Package) -> Result<Files, Fault> {
    let meta = &package.meta;
    let printed = |text: &str| replaced(text, fonts::prints).0;
    let data = data::document(package);
    let authors: Vec<String> = meta.engineer.iter().chain(&meta.practice).map(|name| printed(name)).collect();
    let authors: Vec<&str> = authors.iter().map(String::as_str).collect();
    let parts = data.part_names();
    let title = format!("{} {}", printed(&meta.number), printed(&meta.title));
    let main = glue::main_file(&title, &authors, language(&meta.lang), &parts, &ATTACHED)?;

    let mut sources = vec![(MAIN.to_string(), main)];
    for (name, text) in templates::in_force(&package.templates) {
        sources.push((format!("/templates/{name}"), text.to_string()));
    }
    let json = data.to_json().map_err(|e| Fault::of(format!("the data could not be written: {e}")))?;
    let mut bytes = vec![
        (DATA.to_string(), json),
        (ATTACHED[0].path.to_string(), package.job_text.as_bytes().to_vec()),
        (ATTACHED[1].path.to_string(), package.results_json.as_bytes().to_vec()),
    ];
    if let Some(logo) = &meta.logo {
        bytes.push((LOGO.to_string(), logo.png().to_vec()));
    }
    Ok(Files { sources, bytes, date: meta.date })
}

/// Path of the logo in the in-memory world.
pub(crate) const LOGO: &str = "/logo.png";

const ATTACHED: [Attachment; 2] = [
    Attachment {
        path: "/job.toml",
        mime_type: "application/toml",
        description: "The job file as it was read: the inputs of every sheet",
        relationship: "source",
    },
    Attachment {
        path: "/results.json",
        mime_type: "application/json",
        description: "The results of the calculation in full figures",
        relationship: "data",
    },
];

/// "en-GB" as language and region; English where it is neither.
fn language(tag: &str) -> (&str, Option<&str>) {
    let (language, region) = match tag.split_once('-') {
        Some((language, region)) => (language, Some(region)),
        None => (tag, None),
    };
    let letters = |text: &str, least: usize, most: usize| {
        (least..=most).contains(&text.len()) && text.bytes().all(|b| b.is_ascii_alphabetic())
    };
    match (letters(language, 2, 3), region) {
        (true, Some(region)) if letters(region, 2, 2) => (language, Some(region)),
        (true, None) => (language, None),
        _ => ("en", Some("GB")),
    }
}
