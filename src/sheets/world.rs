//! What the typesetter can see: templates, the data, the attached files, the fonts. Nothing else exists for it.

use std::collections::HashMap;
use std::sync::LazyLock;

use chrono::{Datelike, NaiveDate};
use typst::diag::{FileError, FileResult};
use typst::foundations::{Bytes, Datetime, Duration};
use typst::syntax::{FileId, RootedPath, Source, VirtualPath, VirtualRoot};
use typst::text::{Font, FontBook};
use typst::utils::LazyHash;
use typst::{Library, LibraryExt, World};

use crate::fonts;

static LIBRARY: LazyLock<LazyHash<Library>> = LazyLock::new(|| LazyHash::new(Library::default()));

/// The files of one package under their paths in the in-memory world.
#[derive(Clone, Debug, Default, PartialEq)]
pub struct Files {
    /// Typst sources: the generated main file and the templates. Paths such as `/templates/cover.typ`.
    pub sources: Vec<(String, String)>,
    /// Everything that is read as bytes: the data, the logo, what is attached.
    pub bytes: Vec<(String, Vec<u8>)>,
    /// The job's date, which is the only one that templates can ask for.
    pub date: NaiveDate,
}

/// Path of the generated file that compilation starts from.
pub const MAIN: &str = "/main.typ";
/// Path of the data that the templates read.
pub const DATA: &str = "/package.json";

pub(crate) struct SheetWorld {
    main: FileId,
    sources: HashMap<FileId, Source>,
    bytes: HashMap<FileId, Bytes>,
    date: Option<Datetime>,
}

impl SheetWorld {
    /// Freezes the files. A path that cannot be one (only an override could have it) is left out, and then reported
    /// as a missing file by whoever imports it.
    pub fn new(files: &Files) -> Option<SheetWorld> {
        let sources = files.sources.iter().filter_map(|(path, text)| {
            let id = file_id(path)?;
            Some((id, Source::new(id, text.clone())))
        });
        let bytes = files.bytes.iter().filter_map(|(path, data)| Some((file_id(path)?, Bytes::new(data.clone()))));
        Some(SheetWorld {
            main: file_id(MAIN)?,
            sources: sources.collect(),
            bytes: bytes.collect(),
            date: datetime(files.date),
        })
    }
}

/// Midnight of a date.
pub(crate) fn datetime(date: NaiveDate) -> Option<Datetime> {
    Datetime::from_ymd_hms(date.year(), u8::try_from(date.month()).ok()?, u8::try_from(date.day()).ok()?, 0, 0, 0)
}

fn file_id(path: &str) -> Option<FileId> {
    Some(RootedPath::new(VirtualRoot::Project, VirtualPath::new(path).ok()?).intern())
}

/// A file of the world as messages name it: `templates/cover.typ`.
pub(crate) fn name(id: FileId) -> String {
    id.vpath().get_without_slash().to_string()
}

impl World for SheetWorld {
    fn library(&self) -> &LazyHash<Library> {
        &LIBRARY
    }

    fn book(&self) -> &LazyHash<FontBook> {
        fonts::store().book()
    }

    fn main(&self) -> FileId {
        self.main
    }

    fn source(&self, id: FileId) -> FileResult<Source> {
        no_package(id)?;
        self.sources.get(&id).cloned().ok_or_else(|| missing(id))
    }

    fn file(&self, id: FileId) -> FileResult<Bytes> {
        no_package(id)?;
        match (self.bytes.get(&id), self.sources.get(&id)) {
            (Some(bytes), _) => Ok(bytes.clone()),
            (None, Some(source)) => Ok(Bytes::from_string(source.clone())),
            (None, None) => Err(missing(id)),
        }
    }

    fn font(&self, index: usize) -> Option<Font> {
        fonts::store().font(index)
    }

    fn today(&self, _offset: Option<Duration>) -> Option<Datetime> {
        self.date
    }
}

fn no_package(id: FileId) -> FileResult<()> {
    match id.root() {
        VirtualRoot::Project => Ok(()),
        VirtualRoot::Package(_) => Err(FileError::Other(Some("packages are not fetched for a calculation".into()))),
    }
}

fn missing(id: FileId) -> FileError {
    FileError::NotFound(name(id).into())
}
