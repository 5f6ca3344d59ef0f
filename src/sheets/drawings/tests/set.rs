//! Setting drawings on pages of their own with the real templates.

use chrono::NaiveDate;
use typst_layout::PagedDocument;
use typst_pdf::{PdfOptions, PdfStandard, PdfStandards, Timestamp};

use super::super::scene::Drawing;
use crate::templates::EMBEDDED;
use crate::world::{DATA, Files, MAIN, SheetWorld, datetime};

/// One page a drawing. Warnings are errors. With `SAGLEDGER_LOOK` set to a folder, the pages are also written there
/// as `NAME.pdf`, to be looked at.
pub fn set(name: &str, drawings: &[Drawing]) -> PagedDocument {
    let mut main = String::from(
        "#import \"/templates/drawings/drawings.typ\" as drawings\n#import \"/templates/data.typ\": data\n\
         #import \"/templates/look.typ\": sans\n#set text(font: sans, lang: \"en\")\n\
         #set document(title: \"drawings\")\n\
         #set page(width: 210mm, height: 297mm, margin: (left: 24mm, right: 66mm, top: 26mm, bottom: 10mm))\n",
    );
    for (n, drawing) in drawings.iter().enumerate() {
        let function = drawing.kind;
        main.push_str(&format!("#drawings.{function}(data.drawings.at({n}))\n#pagebreak(weak: true)\n"));
    }
    let data = serde_json::json!({ "meta": { "accent": "#1f3b57" }, "drawings": drawings });
    let templates = EMBEDDED.iter().map(|(name, text)| (format!("/templates/{name}"), text.to_string()));
    let mut sources: Vec<(String, String)> = templates.collect();
    sources.push((MAIN.to_string(), main));
    let date = NaiveDate::from_ymd_opt(2026, 5, 4).unwrap();
    let bytes = vec![(DATA.to_string(), serde_json::to_vec(&data).unwrap())];
    let world = SheetWorld::new(&Files { sources, bytes, date }).unwrap();
    let set = typst::compile::<PagedDocument>(&world);
    assert!(set.warnings.is_empty(), "{:?}", set.warnings);
    let document = set.output.unwrap();
    if let Ok(folder) = std::env::var("SAGLEDGER_LOOK") {
        std::fs::write(std::path::Path::new(&folder).join(format!("{name}.pdf")), archived(&document)).unwrap();
    }
    document
}

/// The bytes of a document as an accessible archive: every figure needs its alternative text.
pub fn archived(document: &PagedDocument) -> Vec<u8> {
    let standards = PdfStandards::new(&[PdfStandard::A_3a, PdfStandard::Ua_1]).unwrap();
    let date = NaiveDate::from_ymd_opt(2026, 5, 4).unwrap();
    let timestamp = datetime(date).map(Timestamp::new_utc);
    typst_pdf::pdf(document, &PdfOptions { standards, timestamp, ..PdfOptions::default() }).unwrap()
}
