//! Single values: texts, names, words of a list, quantities. Each reader returns the value or tells the fault.

use toml::de::DeValue;

use super::bounds::{self, Bounds};
use super::fault::Fault;
use super::findings::Findings;
use super::glyphs;
use super::keys::Keys;
use super::near::nearest;
use super::quantity::{self, Dimension, Quantity, Trouble};
use super::registry::Name;
use super::view::{Item, Table};

/// "a number", "text", …
pub(super) fn kind_in_words(value: &DeValue) -> &'static str {
    match value {
        DeValue::String(_) => "text",
        DeValue::Integer(_) | DeValue::Float(_) => "a number",
        DeValue::Boolean(_) => "true or false",
        DeValue::Datetime(_) => "a date",
        DeValue::Array(_) => "a list",
        DeValue::Table(_) => "a table",
    }
}

/// A text in quotes, shortened where it is long.
pub(super) fn quoted(text: &str) -> String {
    let mut short: String = text.chars().take(24).collect();
    if text.chars().nth(24).is_some() {
        short.push('…');
    }
    format!("\"{short}\"")
}

impl<'t> Item<'t> {
    pub fn fault(&self, name: Name, fact: impl Into<String>, remedy: impl Into<String>) -> Fault {
        Fault::new(name, Some(self.span.clone()), fact, remedy)
    }

    pub fn wrong_type(&self, wanted: &str, remedy: impl Into<String>, found: &mut Findings) {
        let fact = format!("{} is {}, not {wanted}", self.key, kind_in_words(self.value));
        found.add(self.fault(Name::TypeWrong, fact, remedy));
    }

    fn string(&self, found: &mut Findings) -> Option<&'t str> {
        match self.value {
            DeValue::String(text) => Some(text.as_ref()),
            DeValue::Integer(_) | DeValue::Float(_) | DeValue::Datetime(_) | DeValue::Boolean(_) => {
                let typed = format!("\"{}\"", found.source.slice(&self.span));
                let fact = format!("{} is not in quotes", self.key);
                found.add(self.fault(Name::TypeWrong, fact, format!("write {typed}")).replaced_by(typed));
                None
            }
            DeValue::Array(_) | DeValue::Table(_) => {
                self.wrong_type("text", "write one text in quotes", found);
                None
            }
        }
    }

    /// A text for the package, as it will be printed.
    pub fn text(&self, found: &mut Findings) -> Option<String> {
        let text = self.string(found)?.trim();
        let length = text.chars().count();
        if length == 0 {
            let fact = format!("{} is empty", self.key);
            found.add(self.fault(Name::TextEmpty, fact, "write a text, or take the key out"));
            return None;
        }
        if !bounds::TEXT_CHARACTERS.admit(length as f64) {
            let fact = format!("{} has {length} characters", self.key);
            let remedy = format!("shorten it to {} at most", bounds::TEXT_CHARACTERS.greatest);
            found.add(self.fault(Name::TextTooLong, fact, remedy));
            return None;
        }
        let (printed, replaced) = glyphs::printed(text);
        if !replaced.is_empty() {
            found.add(replaced_glyphs(self, &replaced));
        }
        Some(printed)
    }

    /// A mark or a name.
    pub fn name(&self, found: &mut Findings) -> Option<String> {
        let text = self.string(found)?;
        match name_trouble(text) {
            None => Some(text.to_string()),
            Some((name, fact, remedy)) => {
                found.add(self.fault(name, fact, remedy));
                None
            }
        }
    }

    /// A name that refers to something: whatever it is, it is compared and not judged.
    pub fn reference(&self, found: &mut Findings) -> Option<String> {
        self.string(found).map(str::to_string)
    }

    pub fn flag(&self, found: &mut Findings) -> Option<bool> {
        match self.value {
            DeValue::Boolean(value) => Some(*value),
            _ => {
                self.wrong_type("true or false", "write true or false, without quotes", found);
                None
            }
        }
    }

    /// One of a few words.
    pub fn choice<T: Copy>(&self, words: &[(&'static str, T)], found: &mut Findings) -> Option<T> {
        let text = self.string(found)?;
        if let Some((_, value)) = words.iter().find(|(word, _)| *word == text) {
            return Some(*value);
        }
        let fact = format!("{} is not a value of {}", quoted(text), self.key);
        let all: Vec<String> = words.iter().map(|(word, _)| format!("\"{word}\"")).collect();
        let near = nearest(text, words.iter().map(|(word, _)| *word));
        let mut fault = self.fault(Name::ValueUnknown, fact, format!("write {}", either(&all)));
        if let [one] = near.as_slice() {
            fault = fault.replaced_by(format!("\"{one}\""));
            fault.remedy = match words.len() {
                1..=3 => fault.remedy,
                _ => format!("write \"{one}\""),
            };
        }
        found.add(fault);
        None
    }

    /// The entries of a list, one at least; a single value is not a list.
    pub fn list(&self, found: &mut Findings) -> Option<Vec<Item<'t>>> {
        let DeValue::Array(values) = self.value else {
            self.wrong_type("a list", "write it in brackets: [ … ]", found);
            return None;
        };
        if values.is_empty() {
            let fact = format!("{} is empty", self.key);
            found.add(self.fault(Name::ListEmpty, fact, "list one entry at least, or take the key out"));
            return None;
        }
        let item = |value: &'t super::view::Value<'t>| Item {
            key: self.key,
            value: value.get_ref(),
            span: value.span(),
            key_span: self.key_span.clone(),
        };
        Some(values.iter().map(item).collect())
    }

    /// A table of this kind.
    pub fn table(&self, keys: &'static Keys, found: &mut Findings) -> Option<Table<'t>> {
        match self.value {
            DeValue::Table(table) => Some(Table::of(keys, table, self.span.clone(), found)),
            _ => {
                let (example, _) = keys.now.first().copied().unwrap_or(("key", ""));
                let doubled = found.source.slice(&self.span).starts_with("[[");
                let remedy = match keys.title {
                    _ if doubled => format!("write [{}] in single brackets", self.key),
                    title if title.starts_with('[') => format!("begin it with a line {title}"),
                    _ => format!("write it in braces: {{ {} }}", keys.example(example)),
                };
                self.wrong_type("a table", remedy, found);
                None
            }
        }
    }

    /// A quantity within its bounds.
    pub fn quantity(&self, bounds: &Bounds, found: &mut Findings) -> Option<Quantity> {
        let (text, bare) = match self.value {
            DeValue::String(text) => (text.as_ref(), false),
            DeValue::Integer(number) if number.radix() == 10 => (number.as_str(), true),
            DeValue::Float(number) => (number.as_str(), true),
            _ => {
                self.wrong_type("a quantity", format!("write it with its unit: \"{}\"", bounds.example), found);
                return None;
            }
        };
        match quantity::read(text, bounds.dimension) {
            Ok(quantity) if bounds.admit(quantity.si) => Some(quantity),
            Ok(quantity) => {
                found.add(self.outside(&quantity.typed, quantity.si < 0.0, bounds));
                None
            }
            Err(trouble) => {
                found.add(self.trouble(trouble, bounds, bare));
                None
            }
        }
    }

    fn outside(&self, typed: &str, negative: bool, bounds: &Bounds) -> Fault {
        let load = matches!(bounds.dimension, Dimension::Force | Dimension::LineLoad | Dimension::AreaLoad);
        if negative && load && !bounds.signed() {
            let fact = format!("{} is negative", self.key);
            return self.fault(Name::LoadNegative, fact, "write it positive; only wind may be negative");
        }
        let fact = format!("{} is no {}", clipped(typed), bounds.name);
        self.fault(Name::OutOfBounds, fact, format!("give {}", bounds.range()))
    }

    fn trouble(&self, trouble: Trouble, bounds: &Bounds, bare: bool) -> Fault {
        let units = bounds.dimension.units();
        let key = self.key;
        match trouble {
            Trouble::NotANumber(text) => {
                let fact = match bare {
                    true => format!("{key} is not a finite number"),
                    false => format!("{} is not a number with a unit", quoted(&text)),
                };
                self.fault(Name::NumberMalformed, fact, format!("write it as in \"{}\"", bounds.example))
            }
            Trouble::Overflow(typed) => self.outside(&typed, false, bounds),
            Trouble::UnitMissing(number) => {
                let fact = format!("{key} has no unit");
                self.offered(Name::UnitMissing, fact, &with_units(&number, bounds))
            }
            Trouble::Centimetre(metres) => {
                let typed = format!("\"{} m\"", metres.text());
                let fact = format!("{key} is in centimetres");
                self.fault(Name::UnitCentimetre, fact, format!("write {typed}")).replaced_by(typed)
            }
            Trouble::UnitUnknown(number, unit) => {
                let fact = format!("no unit is called {}", quoted(&unit));
                match quantity::unit_meant(&unit, bounds.dimension) {
                    Some(meant) => {
                        let typed = format!("\"{} {meant}\"", number.text());
                        self.fault(Name::UnitUnknown, fact, format!("write {typed}")).replaced_by(typed)
                    }
                    None => self.fault(Name::UnitUnknown, fact, format!("give {key} in {}", either(units))),
                }
            }
            Trouble::UnitWrong(unit) => {
                let fact = format!("{key} is not measured in {unit}");
                self.fault(Name::UnitWrong, fact, format!("give it in {}", either(units)))
            }
            Trouble::DecimalComma { meant, unit } => self.offered(
                Name::DecimalComma,
                "a decimal comma in a quantity".into(),
                &repaired(&meant, &unit, bounds),
            ),
            Trouble::ThousandsMark { meant, or, unit } => {
                let mut offers = repaired(&meant, &unit, bounds);
                offers.extend(or.iter().flat_map(|number| repaired(number, &unit, bounds)));
                self.offered(Name::ThousandsMark, "a mark between thousands in a quantity".into(), &offers)
            }
        }
    }

    /// A fault with what could be written instead; definite where there is one of it.
    fn offered(&self, name: Name, fact: String, offers: &[Offer]) -> Fault {
        let mut texts: Vec<String> = offers.iter().map(|offer| format!("\"{}\"", offer.text)).collect();
        texts.dedup();
        let fault = self.fault(name, fact, format!("write {}", either(&texts)));
        match offers.iter().filter(|offer| offer.likely).collect::<Vec<_>>().as_slice() {
            [one] => fault.replaced_by(format!("\"{}\"", one.text)),
            _ => fault,
        }
    }
}

/// A quantity that could have been meant; likely where it lies within the bounds and is not another way to write
/// one that does.
struct Offer {
    text: String,
    likely: bool,
}

/// A bare number with the units that it could have: "5.20 m" or, the same, "5200 mm".
fn with_units(number: &super::number::Number, bounds: &Bounds) -> Vec<Offer> {
    let admitted = |text: &str| quantity::si(text, bounds.dimension).is_some_and(|si| bounds.admit(si));
    let offer = |text: String, likely| Offer { text, likely };
    let typed = number.text();
    match bounds.dimension {
        Dimension::Length => {
            let (metres, millimetres) = (format!("{typed} m"), format!("{typed} mm"));
            match (admitted(&metres), admitted(&millimetres)) {
                (true, false) => {
                    let same = format!("{} mm", number.shifted(3).text());
                    vec![offer(metres, true), offer(same, false)]
                }
                (false, true) => {
                    let same = format!("{} m", number.shifted(-3).text());
                    vec![offer(millimetres, true), offer(same, false)]
                }
                (both, _) => vec![offer(metres, both), offer(millimetres, both)],
            }
        }
        Dimension::Force => {
            let (kilo, plain) = (format!("{typed} kN"), format!("{typed} N"));
            vec![offer(kilo, true), offer(plain, true)]
        }
        // Kilopascals and newtons a millimetre are the same numbers: the usual unit is enough.
        other => other.units().first().map(|unit| offer(format!("{typed} {unit}"), true)).into_iter().collect(),
    }
}

/// A number put right, with the unit that was typed or, where none was, those that it could have.
fn repaired(number: &super::number::Number, unit: &str, bounds: &Bounds) -> Vec<Offer> {
    match unit {
        "" => with_units(number, bounds),
        "cm" => vec![Offer { text: format!("{} m", number.shifted(-2).text()), likely: true }],
        unit => {
            let unit = quantity::unit_meant(unit, bounds.dimension).unwrap_or_else(|| {
                let known = bounds.dimension.units().first().copied();
                known.unwrap_or("")
            });
            vec![Offer { text: format!("{} {unit}", number.text()), likely: true }]
        }
    }
}

/// "a", "a or b", "a, b or c".
pub(super) fn either<T: AsRef<str>>(words: &[T]) -> String {
    match words {
        [] => String::new(),
        [one] => one.as_ref().to_string(),
        [head @ .., last] => {
            let head: Vec<&str> = head.iter().map(AsRef::as_ref).collect();
            // Parts with commas of their own are kept apart by one more.
            let or = if head.iter().any(|part| part.contains(", ")) { ", or" } else { " or" };
            format!("{}{or} {}", head.join(", "), last.as_ref())
        }
    }
}

fn clipped(text: &str) -> String {
    match text.chars().count() {
        0..=24 => text.to_string(),
        _ => format!("{}…", text.chars().take(23).collect::<String>()),
    }
}

fn replaced_glyphs(item: &Item, replaced: &[char]) -> Fault {
    let shown = if replaced.len() > 3 { 1 } else { replaced.len() };
    let named: Vec<String> = replaced.iter().take(shown).map(|c| glyphs::named(*c)).collect();
    let more = match replaced.len() - shown {
        0 => String::new(),
        more => format!(" and {more} more"),
    };
    let fact = format!("{} holds {}{more}", item.key, named.join(", "));
    let blanks = replaced.iter().all(|c| matches!(c, '\n' | '\r' | '\t'));
    let remedy = match blanks {
        true => "write it on one line; a blank stands there in print",
        false => "write it in other characters; a replacement sign stands there in print",
    };
    Fault::new(Name::GlyphReplaced, Some(item.span.clone()), fact, remedy)
}

/// What keeps a text from being a mark or a name.
fn name_trouble(text: &str) -> Option<(Name, String, String)> {
    let length = text.chars().count();
    if text.contains(['\n', '\r']) {
        let remedy = "write it on one line";
        return Some((Name::NameMalformed, "a mark or name of several lines".into(), remedy.into()));
    }
    if text.trim().is_empty() {
        return Some((
            Name::NameMalformed,
            "a mark or name without a character".into(),
            "give 1 to 24 characters".into(),
        ));
    }
    if !bounds::NAME_CHARACTERS.admit(length as f64) {
        let fact = format!("a mark or name of {length} characters");
        return Some((Name::NameMalformed, fact, "shorten it to 24 at most".into()));
    }
    if let Some(bad) = text.chars().find(|c| !glyphs::printable_in_name(*c)) {
        let fact = format!("a mark or name with {}, which cannot be printed", glyphs::named(bad));
        return Some((Name::NameGlyph, fact, "write it in other characters".into()));
    }
    if text.trim() != text {
        let remedy = format!("write \"{}\"", text.trim());
        return Some((Name::NameMalformed, "a mark or name with blanks at its ends".into(), remedy));
    }
    None
}
