//! The logo: its name checked, its file read and decoded once, so that typesetting never meets a broken picture.

use std::io::Cursor;
use std::path::{Component, Path};

use image::{ImageFormat, ImageReader, Limits};

use super::fault::Fault;
use super::findings::Findings;
use super::meta::{Logo, Picture, PictureFormat};
use super::open;
use super::registry::Name;
use super::view::{At, Item};

/// Bytes of a picture file.
const LARGEST: u64 = 8 * 1024 * 1024;
/// Pixels of a picture.
const MOST_PIXELS: u64 = 24_000_000;
/// Bytes that decoding may take.
const MOST_MEMORY: u64 = 128 * 1024 * 1024;

/// A path that stays inside the job's folder, on every system.
pub(super) fn named(item: &Item, found: &mut Findings) -> Option<Logo> {
    let text = item.reference(found)?;
    let outside =
        |remedy: &str| item.fault(Name::LogoOutsideFolder, "logo is not a path inside the job's folder", remedy);
    let parts: Vec<&str> = text.split('/').collect();
    let odd = |part: &&str| part.is_empty() || matches!(*part, "." | "..") || part.trim() != *part;
    let foreign = text.contains(['\\', ':']) || text.chars().any(char::is_control);
    let plain = Path::new(&text).components().all(|c| matches!(c, Component::Normal(_)));
    if text.trim().is_empty() {
        found.add(item.fault(Name::TextEmpty, "logo is empty", "name a file, or take the key out"));
        return None;
    }
    if parts.iter().any(odd) || foreign || !plain {
        found.add(outside("put the file into the folder and give its name alone"));
        return None;
    }
    Some(Logo { path: text, picture: None })
}

/// The logo's file, read from the job's folder and found whole.
pub(super) fn picture(logo: &At<Logo>, folder: &Path, found: &mut Findings) -> Option<Picture> {
    match read(folder, &logo.value.path) {
        Ok(picture) => Some(picture),
        Err((name, fact, remedy)) => {
            found.add(Fault::new(name, Some(logo.span.clone()), fact, remedy));
            None
        }
    }
}

type Trouble = (Name, String, &'static str);

fn read(folder: &Path, path: &str) -> Result<Picture, Trouble> {
    let too_large = |fact: String| (Name::LogoTooLarge, fact, "save it with 1000 pixels or so");
    let broken = |fact: &str| (Name::LogoBroken, fact.to_string(), "save it again as PNG or JPEG");
    let bytes = match open::plain_file(folder, path, LARGEST) {
        Ok(bytes) => bytes,
        Err(open::Plain::Missing) => {
            return Err((Name::LogoMissing, format!("the folder has no {path}"), "put it there, or mend its name"));
        }
        Err(open::Plain::Other(what)) => {
            return Err((Name::FileNotPlain, format!("{path} is {what}"), "put a plain file in its place"));
        }
        Err(open::Plain::TooLarge) => return Err(too_large(format!("{path} is larger than 8 MiB"))),
        Err(open::Plain::Machine(error)) => {
            return Err((
                Name::LogoMissing,
                format!("{path} cannot be opened: {}", error.kind()),
                "make it readable",
            ));
        }
    };
    let reader = || ImageReader::new(Cursor::new(bytes.as_slice())).with_guessed_format();
    let sized = reader().map_err(|_| broken("the logo cannot be read"))?;
    let format = match sized.format() {
        Some(ImageFormat::Png) => PictureFormat::Png,
        Some(ImageFormat::Jpeg) => PictureFormat::Jpeg,
        _ => return Err(broken("the logo is neither PNG nor JPEG")),
    };
    let (width, height) = sized.into_dimensions().map_err(|_| broken("the logo cannot be decoded"))?;
    if width == 0 || height == 0 {
        return Err(broken("the logo has no pixels"));
    }
    if u64::from(width) * u64::from(height) > MOST_PIXELS {
        return Err(too_large(format!("{path} has {width} by {height} pixels")));
    }
    let mut whole = reader().map_err(|_| broken("the logo cannot be read"))?;
    let mut limits = Limits::default();
    limits.max_alloc = Some(MOST_MEMORY);
    whole.limits(limits);
    whole.decode().map_err(|_| broken("the logo cannot be decoded"))?;
    Ok(Picture { format, width, height, bytes })
}
