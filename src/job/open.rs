//! The one place where a job's files are opened.

use std::fs::{self, File};
use std::io::{self, Read};
use std::path::{Path, PathBuf};

use super::fault::Fault;
use super::registry::Name;
use super::{Reading, read_in};

/// Bytes of a job file.
pub(super) const LARGEST: u64 = 4 * 1024 * 1024;

/// The file of a job inside its folder.
const JOB_FILE: &str = "job.toml";

/// The machine, not the job, kept a file from being read.
#[derive(Debug)]
pub struct Machine {
    pub path: PathBuf,
    pub error: io::Error,
}

/// Opens and reads a job, given its folder or its file, with the pictures that it names.
pub fn open(path: &Path) -> Result<Reading, Machine> {
    let file = if path.is_dir() && path.file_name().is_none_or(|n| n != JOB_FILE) {
        path.join(JOB_FILE)
    } else {
        path.to_path_buf()
    };
    let shown = shown(&file);
    let folder = match file.parent() {
        Some(parent) if !parent.as_os_str().is_empty() => parent.to_path_buf(),
        _ => PathBuf::from("."),
    };
    let refused =
        |name, fact: String, remedy: &str| Ok(Reading::refused(&shown, Fault::new(name, None, fact, remedy)));
    let Some(name) = file.file_name() else {
        return refused(Name::FileMissing, "this is no file".into(), "give a job's folder or its job.toml");
    };
    match plain_file(&folder, Path::new(name), LARGEST) {
        Ok(bytes) => Ok(read_in(&bytes, &shown, Some(&folder))),
        Err(Plain::Missing) => refused(
            Name::FileMissing,
            "there is no such file".into(),
            "give a job's folder or its job.toml; sagledger new DIR starts one",
        ),
        Err(Plain::Other(what)) => {
            refused(Name::FileNotPlain, format!("this is {what}"), "put a plain file in its place")
        }
        Err(Plain::TooLarge) => Ok(Reading::refused(&shown, too_large())),
        Err(Plain::Machine(error)) => Err(Machine { path: file, error }),
    }
}

/// The path as it was given, without a leading "./".
fn shown(file: &Path) -> String {
    let file = file.strip_prefix(".").unwrap_or(file);
    file.to_string_lossy().replace('\\', "/")
}

pub(super) fn too_large() -> Fault {
    Fault::new(Name::FileTooLarge, None, "a job file of more than 4 MiB", "give the job's own file")
}

pub(super) fn not_utf8(bytes: &[u8], valid: usize) -> Fault {
    let line = bytes[..valid].iter().filter(|b| **b == b'\n').count() + 1;
    let wide = bytes.starts_with(&[0xff, 0xfe]) || bytes.starts_with(&[0xfe, 0xff]);
    let fact = match wide {
        true => "this is UTF-16, not UTF-8".to_string(),
        false => format!("not UTF-8 text, from line {line} on"),
    };
    Fault::new(Name::NotUtf8, None, fact, "save it as UTF-8")
}

/// Why a file is not read.
pub(super) enum Plain {
    Missing,
    /// "a folder", "a link".
    Other(&'static str),
    TooLarge,
    Machine(io::Error),
}

/// The bytes of a plain file inside a folder. No part of the way below the folder may be a link.
pub(super) fn plain_file(folder: &Path, path: impl AsRef<Path>, largest: u64) -> Result<Vec<u8>, Plain> {
    let mut full = folder.to_path_buf();
    let parts: Vec<_> = path.as_ref().components().collect();
    for (at, part) in parts.iter().enumerate() {
        full.push(part);
        let kind = fs::symlink_metadata(&full).map_err(of_io)?.file_type();
        let last = at + 1 == parts.len();
        match () {
            () if kind.is_symlink() => return Err(Plain::Other("a link")),
            () if kind.is_dir() && last => return Err(Plain::Other("a folder")),
            () if !kind.is_dir() && !last => return Err(Plain::Missing),
            () if !kind.is_dir() && !kind.is_file() => return Err(Plain::Other("a device, not a plain file")),
            () => {}
        }
    }
    let file = File::open(&full).map_err(of_io)?;
    let mut bytes = Vec::new();
    // One byte more than allowed tells a file that is too large, whatever its size was said to be.
    file.take(largest + 1).read_to_end(&mut bytes).map_err(Plain::Machine)?;
    match bytes.len() as u64 > largest {
        true => Err(Plain::TooLarge),
        false => Ok(bytes),
    }
}

fn of_io(error: io::Error) -> Plain {
    match error.kind() {
        io::ErrorKind::NotFound | io::ErrorKind::NotADirectory => Plain::Missing,
        io::ErrorKind::InvalidInput | io::ErrorKind::InvalidFilename => Plain::Missing,
        _ => Plain::Machine(error),
    }
}
