//! The tables of a job file as typed: each read by itself, with places, before anything refers to anything.

pub(super) mod basis;
pub(super) mod beam;
pub(super) mod bearing;
pub(super) mod build_up;
pub(super) mod limits;
pub(super) mod load;
pub(super) mod meta;
pub(super) mod restraint;

use toml::de::DeValue;

use sagledger_calc::limits::LimitTable;

use super::fault::{Fault, Span};
use super::findings::Findings;
use super::keys::{self, Keys};
use super::meta::{Logo, Meta};
use super::registry::Name;
use super::syntax::Parsed;
use super::view::{At, Field, Item, Table};
use basis::TypedBasis;
use beam::TypedBeam;
use build_up::TypedBuildUp;

/// A whole file as typed. What could not be read is missing here and stands among the findings.
pub(super) struct Typed {
    pub meta: Option<Meta>,
    /// The logo with its place, also where the rest of `[job]` is at fault.
    pub logo: Option<At<Logo>>,
    pub basis: TypedBasis,
    pub limits: LimitTable,
    pub build_ups: Vec<TypedBuildUp>,
    pub walls: Vec<TypedWall>,
    /// Names of posts and pads, which this version refuses: what stands on them is no further fault.
    pub later_supports: Vec<String>,
    pub beams: Vec<TypedBeam>,
    /// A key of the file is misspelled or of the wrong type, so that walls and beams, or build-ups, are not known.
    pub supports_hidden: bool,
    pub build_ups_hidden: bool,
}

pub(super) struct TypedWall {
    /// The name, good enough for a package.
    pub name: Field<String>,
    /// The name as others may refer to it, whatever is wrong with it.
    pub known_as: Option<At<String>>,
}

/// The language of a file, looked at before anything else: a later one makes every other finding meaningless.
pub(super) fn is_newer_language(parsed: &Parsed, found: &mut Findings) -> bool {
    let language = parsed.root.get_ref().get("job").and_then(|job| job.get_ref().get("language"));
    let Some(language) = language else { return false };
    let DeValue::Integer(number) = language.get_ref() else { return false };
    // Whatever is too long for this is newer than anything.
    let newer = i64::from_str_radix(number.as_str(), number.radix()).map_or(true, |n| n > meta::LANGUAGE);
    if newer {
        let fact = "made for a newer sagledger";
        let remedy = format!("read it with that one; this reads language {}", meta::LANGUAGE);
        found.add(Fault::new(Name::LanguageNewer, Some(language.span()), fact, remedy));
    }
    newer
}

/// Reads every table. `whole` says that the text could be read to its end.
pub(super) fn read(parsed: &Parsed, found: &mut Findings) -> Typed {
    let root = Table::of(&keys::FILE, parsed.root.get_ref(), 0..0, found);
    let (meta, logo) = meta::read(&root, found);
    let limits = match root.get("limits").and_then(|item| item.table(&keys::LIMITS, found)) {
        Some(table) => limits::read(&table, found),
        None => LimitTable::default(),
    };
    let basis = basis::read(&root, found);
    let build_ups =
        rows(&root, "build-up", &keys::BUILD_UP, found).iter().map(|t| build_up::read(t, found)).collect();
    let walls = rows(&root, "wall", &keys::WALL, found)
        .iter()
        .map(|table| TypedWall {
            name: table.required("name", found, Item::name),
            known_as: referable(table, "name"),
        })
        .collect();
    let tables = rows(&root, "beam", &keys::BEAM, found);
    let beams: Vec<TypedBeam> = tables.into_iter().map(|table| beam::read(table, found)).collect();
    if !root.has("beam") && !root.hides("beam") && !found.lacks_header("[[beam]]") {
        let remedy = "begin one with a line [[beam]]";
        found.add(Fault::new(Name::BeamMissing, Some(0..0), "the job has no beam", remedy));
    }
    let later_supports = later_supports(parsed);
    let hidden = |key: &str| root.hides(key) || root.get(key).is_some_and(|item| item.value.as_array().is_none());
    let supports_hidden =
        hidden("wall") || hidden("beam") || found.lacks_header("[[wall]]") || found.lacks_header("[[beam]]");
    let build_ups_hidden = hidden("build-up") || found.lacks_header("[[build-up]]");
    Typed { supports_hidden, build_ups_hidden, meta, logo, basis, limits, build_ups, walls, later_supports, beams }
}

/// The tables of a list such as `[[beam]]`.
pub(super) fn rows<'t>(parent: &Table<'t>, key: &str, keys: &'static Keys, found: &mut Findings) -> Vec<Table<'t>> {
    let Some(item) = parent.get(key) else { return Vec::new() };
    if let DeValue::Table(_) = item.value
        && item.span == item.key_span
    {
        // No header of its own: a table below it, such as [[beam.load]], stands before any [[beam]].
        if !found.lacks_header(keys.title) {
            found.header_missing(keys.title, &item.span);
        }
        return Vec::new();
    }
    if let DeValue::Table(_) = item.value {
        let fact = format!("[{}] in single brackets", keys.title.trim_matches(['[', ']']));
        found.add(item.fault(Name::TypeWrong, fact, format!("write {}", keys.title)));
        // What it holds is looked at all the same.
        return item.table(keys, found).into_iter().collect();
    }
    let DeValue::Array(values) = item.value else {
        item.wrong_type("a list of tables", format!("begin each with a line {}", keys.title), found);
        return Vec::new();
    };
    let row = |value: &'t super::view::Value<'t>| Item {
        key: item.key,
        value: value.get_ref(),
        span: value.span(),
        key_span: item.key_span.clone(),
    };
    values.iter().map(row).filter_map(|row| row.table(keys, found)).collect()
}

fn later_supports(parsed: &Parsed) -> Vec<String> {
    let mut names = Vec::new();
    for (table, key) in [("post", "mark"), ("pad", "name")] {
        let Some(DeValue::Array(rows)) = parsed.root.get_ref().get(table).map(|v| v.get_ref()) else { continue };
        let named = rows.iter().filter_map(|row| row.get_ref().get(key)?.get_ref().as_str().map(str::to_string));
        names.extend(named);
    }
    names
}

/// A mark or name that can be referred to, even where it has a fault of its own.
pub(super) fn referable(table: &Table, key: &str) -> Option<At<String>> {
    let item = table.get(key)?;
    item.value.as_str().map(|name| At { value: name.to_string(), span: item.span.clone() })
}

/// "B1", or the table's own name where the mark cannot be read.
pub(super) fn called(mark: &Field<String>, otherwise: &str) -> String {
    mark.value().cloned().unwrap_or_else(|| otherwise.to_string())
}

/// The place that stands for a part that begins with a key or, without it, with a header.
pub(super) fn place_of<T>(field: &Field<T>, otherwise: &Span) -> Span {
    field.given().map_or_else(|| otherwise.clone(), |at| at.span.clone())
}
