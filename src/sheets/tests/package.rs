//! Whole packages of small buildings, as documents and as bytes.

mod support;

use std::collections::BTreeSet;

use sagledger_calc::calculate;
use sagledger_sheets::{Compiled, Draft, Overrides, Package, compile, source, typeset};
use support::{meta, package, single, three_deep, twelve};
use typst::layout::{Frame, FrameItem};

const HOSTILE: &str = "#panic(\"x\") $a$ *b* <c> @d [e] \\u{1F} // << y >> <% z %> \u{1f}\u{202e}\u{1f3d7}";

fn compiled(package: &Package) -> Compiled {
    let compiled = compile(&source(package).unwrap()).unwrap_or_else(|fault| panic!("{fault}"));
    assert_eq!(compiled.warnings, vec![], "warnings of the embedded templates");
    compiled
}

/// All text of a sheet in the order in which it is drawn, and the names of its faces.
fn read(frame: &Frame, text: &mut String, faces: &mut BTreeSet<String>) {
    for (_, item) in frame.items() {
        match item {
            FrameItem::Group(group) => read(&group.frame, text, faces),
            FrameItem::Text(run) => {
                text.push_str(&run.text);
                text.push(' ');
                let info = run.font.info();
                faces.insert(format!("{} {}", info.family, info.variant.weight.to_number()));
            }
            _ => {}
        }
    }
}

fn sheets(compiled: &Compiled) -> Vec<String> {
    let mut faces = BTreeSet::new();
    let pages = compiled.document.pages().iter();
    pages
        .map(|page| {
            let mut text = String::new();
            read(&page.frame, &mut text, &mut faces);
            text
        })
        .collect()
}

#[test]
fn packages_are_archives_without_warnings() {
    for (building, least) in [(single(), 9), (three_deep(), 15), (twelve(), 40)] {
        let results = calculate(&building).unwrap();
        let done = typeset(&package(&building, &results, meta("11", "A small job"))).unwrap();
        assert_eq!(done.warnings, vec![]);
        assert!(done.sheets >= least, "{} sheets", done.sheets);
        assert!(done.pdf.starts_with(b"%PDF-1.7"));
        let text = String::from_utf8_lossy(&done.pdf);
        // ISO 19005-3 6.6.4 and ISO 14289-1 5: the identification in the XMP packet, which is not compressed.
        assert!(text.contains("<pdfaid:part>3</pdfaid:part>") && text.contains("<pdfaid:conformance>A<"));
        assert!(text.contains("<pdfuaid:part>1</pdfuaid:part>"));
    }
}

#[test]
fn every_sheet_says_which_it_is_of_how_many() {
    let building = three_deep();
    let results = calculate(&building).unwrap();
    let sheets = sheets(&compiled(&package(&building, &results, meta("11", "A small job"))));
    for (n, text) in sheets.iter().enumerate() {
        let words: Vec<&str> = text.split_whitespace().collect();
        let said = words.windows(4).any(|w| {
            w[0] == "sheet" && w[1] == (n + 1).to_string() && w[2] == "of" && w[3] == sheets.len().to_string()
        });
        assert!(said, "sheet {} of {} does not say so: {text}", n + 1, sheets.len());
        assert!(!text.contains("\u{2212}0.0 "), "a negative zero on sheet {}", n + 1);
        assert!(!text.contains("sheet 0"), "a reference that leads nowhere on sheet {}", n + 1);
    }
}

#[test]
fn the_same_bytes_every_time_and_on_any_number_of_threads() {
    let building = three_deep();
    let results = calculate(&building).unwrap();
    let package = package(&building, &results, meta("11", "A small job"));
    let on = |threads| {
        // Nothing that an earlier run remembered may help.
        typst::comemo::evict(0);
        let pool = rayon::ThreadPoolBuilder::new().num_threads(threads).stack_size(8 << 20).build().unwrap();
        pool.install(|| typeset(&package).unwrap().pdf)
    };
    let first = on(1);
    assert!(first == on(1), "one thread, twice");
    assert!(first == on(2), "two threads");
}

#[test]
fn text_is_never_markup() {
    let mut building = three_deep();
    building.beams[0].title = Some(HOSTILE.into());
    building.beams[0].loads[0].what = HOSTILE.into();
    building.build_ups[0].layers[0].what = HOSTILE.into();
    building.beams[1].restraint.by = Some(HOSTILE.into());
    let results = calculate(&building).unwrap();
    let mut meta = meta("11 #x <<", HOSTILE);
    meta.site = Some(HOSTILE.into());
    meta.practice = Some(HOSTILE.into());
    meta.engineer = Some(HOSTILE.into());
    meta.drawings = vec![HOSTILE.into()];
    let mut package = package(&building, &results, meta);
    let job = format!("title = '{HOSTILE}'\n");
    package.job_text = &job;
    package.draft = Some(Draft { after: Some("P01 #x".into()) });
    let done = typeset(&package).unwrap();
    assert_eq!(done.warnings, vec![]);
    let sheets = sheets(&compiled(&package));
    let shown = "#panic(\"x\") $a$ *b* <c> @d [e] \\u{1F} // << y >> <% z %> \u{fffd}\u{fffd}\u{fffd}";
    let squeezed = |text: &str| text.split_whitespace().collect::<String>();
    let all = squeezed(&sheets.concat()).replace('\u{200b}', "");
    let count = all.matches(&squeezed(shown)).count();
    assert!(count >= 8, "printed as itself {count} times");
    assert!(squeezed(&sheets[0]).contains(&squeezed(shown)), "the cover: {}", sheets[0]);
}

#[test]
fn the_weights_are_really_there() {
    let building = three_deep();
    let results = calculate(&building).unwrap();
    let compiled = compiled(&package(&building, &results, meta("11", "A small job")));
    let mut faces = BTreeSet::new();
    for page in compiled.document.pages() {
        read(&page.frame, &mut String::new(), &mut faces);
    }
    for face in [
        "IBM Plex Sans 400",
        "IBM Plex Sans Medm 500",
        "IBM Plex Sans SmBld 600",
        "IBM Plex Mono 400",
        "IBM Plex Math 400",
    ] {
        assert!(faces.contains(face), "{face} is not among {faces:?}");
    }
    assert_eq!(faces.len(), 5, "only these: {faces:?}");
}

#[test]
fn one_template_can_be_overridden() {
    let building = single();
    let results = calculate(&building).unwrap();
    let mut package = package(&building, &results, meta("11", "A small job"));
    let own = "#import \"sheet.typ\": *\n#let sheets(d) = sheet(\"cautions\", \"Our cautions\")[#section(key: \"outside\")[Not ours]]\n";
    package.templates = Overrides([("cautions.typ".to_string(), own.to_string())].into());
    let sheets = sheets(&compiled(&package));
    assert!(sheets.iter().any(|sheet| sheet.contains("Our cautions")));
    assert!(!sheets.iter().any(|sheet| sheet.contains("Propping")));
}

#[test]
fn a_broken_template_names_its_file_and_line() {
    let building = single();
    let results = calculate(&building).unwrap();
    let mut package = package(&building, &results, meta("11", "A small job"));
    let cases = [
        ("#let a = 1\n#let sheets(d) = (\n", "unclosed", 2),
        ("#let sheets(d) = {\n  let a = 1\n  d.nothing\n}\n", "nothing", 3),
        ("#import \"@preview/cetz:0.3.0\": canvas\n#let sheets(d) = []\n", "packages are not fetched", 1),
        ("#let sheets(d) = read(\"/etc/passwd\")\n", "not found", 1),
        ("#let sheets(d) = [#datetime.today().display() #panic(\"ours\")]\n", "ours", 1),
    ];
    for (text, fact, line) in cases {
        package.templates = Overrides([("cautions.typ".to_string(), text.to_string())].into());
        let fault = typeset(&package).unwrap_err();
        let problem = &fault.problems[0];
        assert!(problem.fact.contains(fact), "{fault}");
        let place = problem.place.as_ref().unwrap_or_else(|| panic!("no place: {fault}"));
        assert_eq!((place.file.as_str(), place.line), ("templates/cautions.typ", line), "{fault}");
    }
}

#[test]
fn what_is_attached_can_be_read_back() {
    let building = single();
    let results = calculate(&building).unwrap();
    let done = typeset(&package(&building, &results, meta("11", "A small job"))).unwrap();
    let pdf = hayro_syntax::Pdf::new(done.pdf).unwrap();
    let streams: Vec<Vec<u8>> = pdf
        .objects()
        .into_iter()
        .filter_map(|object| object.into_stream())
        .filter_map(|stream| stream.decoded().ok().map(|data| data.to_vec()))
        .collect();
    assert!(streams.iter().any(|data| data == support::JOB.as_bytes()), "the job file");
    assert!(streams.iter().any(|data| data == b"{\"format\": 1}\n"), "the results");
}
