//! A table of the TOML tree as the readers of tables see it: keys checked against the language once, values asked
//! for by name.

use toml::Spanned;
use toml::de::{DeTable, DeValue};

use super::fault::{Fault, Span};
use super::findings::Findings;
use super::keys::{self, Keys};
use super::near::nearest;
use super::registry::Name;

pub(super) type Value<'t> = Spanned<DeValue<'t>>;

/// A value with the key that it stands under and its place.
#[derive(Clone)]
pub(super) struct Item<'t> {
    pub key: &'static str,
    pub value: &'t DeValue<'t>,
    pub span: Span,
    pub key_span: Span,
}

/// A value with its place.
#[derive(Clone, Debug, PartialEq)]
pub(super) struct At<T> {
    pub value: T,
    pub span: Span,
}

/// What a key of a table gave.
#[derive(Clone, Debug, PartialEq)]
pub(super) enum Field<T> {
    Absent,
    /// There, with a fault that has been told.
    Faulty,
    Given(At<T>),
}

impl<T> Field<T> {
    pub fn given(&self) -> Option<&At<T>> {
        match self {
            Field::Given(at) => Some(at),
            Field::Absent | Field::Faulty => None,
        }
    }

    pub fn value(&self) -> Option<&T> {
        self.given().map(|at| &at.value)
    }

    pub fn is_absent(&self) -> bool {
        matches!(self, Field::Absent)
    }
}

pub(super) struct Table<'t> {
    keys: &'static Keys,
    /// How messages name it: "B1", "[job]".
    pub called: String,
    /// Its header, or itself where it stands in braces.
    pub place: Span,
    items: Vec<Item<'t>>,
    /// Known keys that an unknown one was taken for: they are not missing as well.
    meant: Vec<&'static str>,
}

impl<'t> Table<'t> {
    /// Looks at a table's keys: unknown and later ones are faults.
    pub fn of(keys: &'static Keys, table: &'t DeTable<'t>, place: Span, found: &mut Findings) -> Table<'t> {
        let mut typed: Vec<(&str, Span, &Value)> =
            table.iter().map(|(key, value)| (key.get_ref().as_ref(), key.span(), value)).collect();
        typed.sort_by_key(|(_, span, _)| span.start);
        let mut view = Table { keys, called: keys.title.to_string(), place, items: Vec::new(), meant: Vec::new() };
        let mut strangers: Vec<(&str, Span)> = Vec::new();
        for (key, key_span, value) in typed {
            match keys.now.iter().find(|(name, _)| *name == key) {
                Some((name, _)) => {
                    view.items.push(Item { key: name, value: value.get_ref(), span: value.span(), key_span })
                }
                None => strangers.push((key, key_span)),
            }
        }
        view.tell_strangers(strangers, found);
        view
    }

    /// Keys that this table does not read: those of a table whose header is missing together, others one by one.
    fn tell_strangers(&mut self, mut strangers: Vec<(&str, Span)>, found: &mut Findings) {
        let mut at = 0;
        while at < strangers.len() {
            let rest: Vec<&str> = strangers[at..].iter().map(|(key, _)| *key).collect();
            if let Some((table, title)) = keys::headless(&rest, self.keys) {
                found.header_missing(title, &strangers[at].1);
                self.meant.extend(self.keys.now.iter().map(|(name, _)| *name).filter(|name| title.contains(*name)));
                let mut index = 0;
                strangers.retain(|(key, _)| {
                    index += 1;
                    index <= at || !table.has(key)
                });
                continue;
            }
            let (key, span) = strangers[at].clone();
            match self.keys.later.iter().find(|name| **name == key) {
                Some(name) => found.add(later(name, self.keys, span)),
                None => self.unknown(key, span, found),
            }
            at += 1;
        }
    }

    fn unknown(&mut self, key: &str, span: Span, found: &mut Findings) {
        // Lists such as [[wall]] may well be there under their right name too.
        let listed = std::ptr::eq(self.keys, &keys::FILE);
        let absent = |name: &&str| listed || !self.items.iter().any(|item| item.key == *name);
        let near = nearest(key, self.keys.now.iter().map(|(name, _)| *name).filter(absent));
        let fact = format!("{} has no key of this name", self.keys.title);
        let fault = |remedy: String| Fault::new(Name::KeyUnknown, Some(span.clone()), fact.clone(), remedy);
        let under_a_load = std::ptr::eq(self.keys, &keys::LOAD);
        let fault = match (near.first(), keys::home_of(key, self.keys)) {
            (Some(name), _) => {
                self.meant.extend(self.keys.now.iter().map(|(n, _)| *n).filter(|n| n == name));
                fault(format!("write {name}")).replaced_by(*name)
            }
            (None, Some(home)) if under_a_load && std::ptr::eq(home, &keys::BEAM) => {
                fault(format!("{key} belongs to [[beam]]: move it above [[beam.load]]"))
            }
            (None, Some(home)) => fault(format!("{key} belongs to {}: move it there", home.title)),
            (None, None) => {
                let known: Vec<&str> = self.keys.now.iter().map(|(name, _)| *name).collect();
                fault(match known.as_slice() {
                    [one] => format!("take it out: the only key here is {one}"),
                    several => format!("take one of {}", several.join(", ")),
                })
            }
        };
        found.add(fault);
    }

    pub fn get(&self, key: &str) -> Option<&Item<'t>> {
        self.items.iter().find(|item| item.key == key)
    }

    pub fn has(&self, key: &str) -> bool {
        self.get(key).is_some()
    }

    /// Whether an unknown key was taken for this one: a slip of the pen hides it, so that it is not absent.
    pub fn hides(&self, key: &str) -> bool {
        self.meant.contains(&key)
    }

    /// The key that stands first in the file, of these.
    pub fn first_of(&self, keys: &[&str]) -> Option<&Item<'t>> {
        self.items.iter().find(|item| keys.contains(&item.key))
    }

    /// A key that must be there.
    pub fn require(&self, key: &str, found: &mut Findings) -> Option<&Item<'t>> {
        let item = self.get(key);
        if item.is_none() && !self.hides(key) {
            let example = self.keys.example(key);
            let fact = match example.starts_with('[') {
                true => format!("{} has no {example}", self.called),
                false => format!("{} has no {key}", self.called),
            };
            let remedy = format!("add {example}");
            found.add(Fault::new(Name::KeyMissing, Some(self.place.clone()), fact, remedy));
        }
        item
    }

    /// Reads a key if it is there.
    pub fn field<T>(
        &self,
        key: &str,
        found: &mut Findings,
        read: impl FnOnce(&Item<'t>, &mut Findings) -> Option<T>,
    ) -> Field<T> {
        match self.get(key) {
            None if self.hides(key) => Field::Faulty,
            None => Field::Absent,
            Some(item) => match read(item, found) {
                Some(value) => Field::Given(At { value, span: item.span.clone() }),
                None => Field::Faulty,
            },
        }
    }

    /// Reads a key that must be there.
    pub fn required<T>(
        &self,
        key: &str,
        found: &mut Findings,
        read: impl FnOnce(&Item<'t>, &mut Findings) -> Option<T>,
    ) -> Field<T> {
        match self.require(key, found) {
            None => Field::Faulty,
            Some(_) => self.field(key, found, read),
        }
    }

    /// Says that a key means nothing here.
    pub fn out_of_place(&self, key: &str, fact: &str, remedy: &str, found: &mut Findings) {
        if let Some(item) = self.get(key) {
            found.add(Fault::new(Name::KeyOutOfPlace, Some(item.key_span.clone()), fact, remedy));
        }
    }
}

fn later(name: &str, keys: &Keys, span: Span) -> Fault {
    Fault::new(
        Name::NotInThisVersion,
        Some(span),
        format!("{name} is not in this version"),
        match keys.title.starts_with('[') {
            true => format!("take it out of {}", keys.title),
            false => "take it out".to_string(),
        },
    )
}
