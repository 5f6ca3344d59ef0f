//! Jobs as files: what is opened, what is refused, and the logo.

use std::fs;
use std::path::Path;

use sagledger::job::{self, PictureFormat, Reading};
use tempfile::TempDir;

use super::names;

const JOB: &str = r#"
[job]
number = "3107"
title = "Granary, new openings"
date = 2027-03-04
LOGO

[[wall]]
name = "mill wall"

[[beam]]
mark = "T1"
section = "305x165x40 UB"
length = "5.60 m"
bearings = [ { on = "mill wall" }, { on = "mill wall" } ]
"#;

fn job_with(logo: &str) -> TempDir {
    let dir = tempfile::tempdir().unwrap();
    let line = if logo.is_empty() { String::new() } else { format!("logo = \"{logo}\"") };
    fs::write(dir.path().join("job.toml"), JOB.replace("LOGO", &line)).unwrap();
    dir
}

fn open(path: &Path) -> Reading {
    job::open(path).unwrap()
}

fn said(dir: &TempDir) -> Vec<&'static str> {
    names(&open(dir.path()))
}

/// A picture of one colour.
fn picture(format: image::ImageFormat, width: u32, height: u32) -> Vec<u8> {
    let mut bytes = std::io::Cursor::new(Vec::new());
    image::RgbImage::new(width, height).write_to(&mut bytes, format).unwrap();
    bytes.into_inner()
}

/// Every name that only files can bring about.
pub fn names_said() -> Vec<&'static str> {
    let mut said = Vec::new();
    let missing = tempfile::tempdir().unwrap();
    said.extend(names(&open(missing.path())));
    let folder = tempfile::tempdir().unwrap();
    fs::create_dir(folder.path().join("job.toml")).unwrap();
    said.extend(names(&open(folder.path())));
    let large = tempfile::tempdir().unwrap();
    fs::write(large.path().join("job.toml"), vec![b'#'; 4 * 1024 * 1024 + 1]).unwrap();
    said.extend(names(&open(large.path())));
    let latin = tempfile::tempdir().unwrap();
    fs::write(latin.path().join("job.toml"), b"title = \"B\xfcro\"").unwrap();
    said.extend(names(&open(latin.path())));
    said.extend(super::files::said(&job_with("none.png")));
    let broken = job_with("logo.png");
    fs::write(broken.path().join("logo.png"), b"no picture").unwrap();
    said.extend(super::files::said(&broken));
    let vast = job_with("logo.png");
    fs::write(vast.path().join("logo.png"), vec![0; 8 * 1024 * 1024 + 1]).unwrap();
    said.extend(super::files::said(&vast));
    said
}

#[test]
fn a_job_is_its_folder_or_its_file() {
    let dir = job_with("");
    let by_folder = open(dir.path());
    let by_file = open(&dir.path().join("job.toml"));
    for reading in [by_folder, by_file] {
        assert!(names(&reading).is_empty());
        let job = reading.job.unwrap();
        assert_eq!(job.building.beams.len(), 1);
        assert!(reading.source.file().ends_with("job.toml"));
    }
}

#[test]
fn what_is_no_plain_file_is_refused() {
    assert_eq!(
        names_said(),
        [
            "file-missing",
            "file-not-plain",
            "file-too-large",
            "not-utf8",
            "logo-missing",
            "logo-broken",
            "logo-too-large"
        ]
    );
    assert_eq!(names(&open(Path::new("no/such/place"))), ["file-missing"]);
    assert_eq!(names(&open(Path::new(""))), ["file-missing"]);
}

#[test]
fn a_file_of_4_mib_is_read_and_one_byte_more_is_not() {
    let comment = "#".repeat(4 * 1024 * 1024 - JOB.len() - 1);
    let mut text = format!("{}\n{comment}", JOB.replace("LOGO", "    "));
    assert_eq!(text.len(), 4 * 1024 * 1024);
    assert!(job::read(text.as_bytes(), "job.toml").job.is_some());
    text.push('#');
    assert_eq!(names(&job::read(text.as_bytes(), "job.toml")), ["file-too-large"]);
}

#[test]
fn utf_16_is_named() {
    let wide: Vec<u8> = [0xff, 0xfe].into_iter().chain(JOB.encode_utf16().flat_map(u16::to_le_bytes)).collect();
    let reading = job::read(&wide, "job.toml");
    assert_eq!(reading.findings[0].fact, "this is UTF-16, not UTF-8");
    let reading = job::read(b"a = 1\nb = \"\xe4\"\n", "job.toml");
    assert_eq!(reading.findings[0].fact, "not UTF-8 text, from line 2 on");
}

#[cfg(unix)]
#[test]
fn links_are_refused() {
    use std::os::unix::fs::symlink;
    let dir = job_with("");
    let linked = tempfile::tempdir().unwrap();
    symlink(dir.path().join("job.toml"), linked.path().join("job.toml")).unwrap();
    assert_eq!(said(&linked), ["file-not-plain"]);

    let pictures = tempfile::tempdir().unwrap();
    fs::write(pictures.path().join("logo.png"), picture(image::ImageFormat::Png, 4, 4)).unwrap();
    let dir = job_with("logo.png");
    symlink(pictures.path().join("logo.png"), dir.path().join("logo.png")).unwrap();
    assert_eq!(said(&dir), ["file-not-plain"]);
    // A link half-way leads out as well.
    let dir = job_with("pictures/logo.png");
    symlink(pictures.path(), dir.path().join("pictures")).unwrap();
    assert_eq!(said(&dir), ["file-not-plain"]);
}

#[test]
fn paths_of_logos() {
    for outside in [
        "../logo.png",
        "/logo.png",
        "pictures/../../logo.png",
        "./logo.png",
        "pictures//logo.png",
        "C:logo.png",
        "..\\\\logo.png",
        "\\\\\\\\server\\\\logo.png",
        "logo.png/",
        "lo\\u0000go.png",
    ] {
        assert_eq!(said(&job_with(outside)), ["logo-outside-folder"], "{outside}");
    }
    assert_eq!(said(&job_with(" ")), ["text-empty"]);
}

#[test]
fn logos_are_decoded_once() {
    for (file, format, of) in [
        ("logo.png", image::ImageFormat::Png, PictureFormat::Png),
        ("pictures/logo.jpg", image::ImageFormat::Jpeg, PictureFormat::Jpeg),
        // The content counts, not the ending.
        ("logo.jpg", image::ImageFormat::Png, PictureFormat::Png),
    ] {
        let dir = job_with(file);
        fs::create_dir(dir.path().join("pictures")).unwrap();
        let bytes = picture(format, 30, 20);
        fs::write(dir.path().join(file), &bytes).unwrap();
        let logo = open(dir.path()).job.unwrap().meta.logo.unwrap();
        assert_eq!(logo.path, file);
        let picture = logo.picture.unwrap();
        assert_eq!((picture.format, picture.width, picture.height), (of, 30, 20));
        assert_eq!(picture.bytes, bytes);
    }
}

#[test]
fn broken_logos_are_faults_at_their_line() {
    let whole = picture(image::ImageFormat::Png, 200, 200);
    let half = whole[..whole.len() / 2].to_vec();
    let jpeg = picture(image::ImageFormat::Jpeg, 200, 200);
    let gif = b"GIF89a\x01\x00\x01\x00\x80\x00\x00".to_vec();
    // 30000 by 30000 pixels in a few bytes: refused by its header.
    let mut vast = whole.clone();
    vast[16..24].copy_from_slice(&[0, 0, 0x75, 0x30, 0, 0, 0x75, 0x30]);
    let crc = crc32(&vast[12..29]);
    vast[29..33].copy_from_slice(&crc.to_be_bytes());
    for (bytes, name) in [
        (half, "logo-broken"),
        (jpeg[..40].to_vec(), "logo-broken"),
        (gif, "logo-broken"),
        (Vec::new(), "logo-broken"),
        (vast, "logo-too-large"),
    ] {
        let dir = job_with("logo.png");
        fs::write(dir.path().join("logo.png"), bytes).unwrap();
        let reading = open(dir.path());
        assert_eq!(names(&reading), [name]);
        let span = reading.findings[0].span.clone().unwrap();
        assert_eq!(reading.source.place(span.start).line, 6);
        assert_eq!(reading.source.slice(&span), "\"logo.png\"");
    }
    let dir = job_with("logo.png");
    fs::create_dir(dir.path().join("logo.png")).unwrap();
    assert_eq!(said(&dir), ["file-not-plain"]);
}

/// The checksum of PNG chunks (ISO/IEC 15948, Annex D).
fn crc32(bytes: &[u8]) -> u32 {
    let step = |crc: u32, byte: &u8| {
        (0..8).fold(crc ^ u32::from(*byte), |c, _| if c & 1 == 1 { 0xedb8_8320 ^ (c >> 1) } else { c >> 1 })
    };
    !bytes.iter().fold(u32::MAX, step)
}

/// The logo is told together with the other faults of the file.
#[test]
fn a_logo_is_looked_at_beside_other_faults() {
    let dir = job_with("none.png");
    let path = dir.path().join("job.toml");
    let text = fs::read_to_string(&path).unwrap().replace("title =", "titel =").replace("5.60 m", "5,60 m");
    fs::write(&path, text).unwrap();
    assert_eq!(said(&dir), ["key-unknown", "logo-missing", "decimal-comma"]);
}
