//! The generated main file: it names the parts in their order and nothing more. All else lives in the templates and
//! in the data.

use std::fmt::Write as _;

use minijinja::syntax::SyntaxConfig;
use minijinja::value::{Value, ValueKind};
use minijinja::{AutoEscape, Environment, Error, ErrorKind, UndefinedBehavior, context};
use serde::Serialize;

use crate::fault::Fault;

const MAIN: &str = include_str!("main.typ.jinja");

/// A part in its place: the template that prints it.
#[derive(Clone, Debug, Serialize, PartialEq)]
pub(crate) struct PartName {
    /// Name under `templates/`.
    pub template: &'static str,
}

/// A file that the package carries.
#[derive(Clone, Debug, Serialize, PartialEq)]
pub(crate) struct Attachment {
    pub path: &'static str,
    pub mime_type: &'static str,
    pub description: &'static str,
    /// PDF/A-3's word for what it is to the document.
    pub relationship: &'static str,
}

/// The main file of a package.
pub(crate) fn main_file(
    title: &str,
    authors: &[&str],
    lang: (&str, Option<&str>),
    parts: &[PartName],
    attachments: &[Attachment],
) -> Result<String, Fault> {
    let (lang, region) = lang;
    environment()
        .and_then(|environment| {
            environment.get_template("main.typ")?.render(context! {
                title, authors, lang, region, parts, attachments,
            })
        })
        .map_err(|e| Fault::of(format!("the main file could not be made: {e:#}")))
}

fn environment() -> Result<Environment<'static>, Error> {
    let mut environment = Environment::new();
    environment.set_undefined_behavior(UndefinedBehavior::Strict);
    environment.set_syntax(
        SyntaxConfig::builder()
            .block_delimiters("<%", "%>")
            .variable_delimiters("<<", ">>")
            .comment_delimiters("<!", "!>")
            .build()?,
    );
    environment.set_trim_blocks(true);
    environment.set_lstrip_blocks(true);
    environment.set_auto_escape_callback(|_| AutoEscape::Custom("typst"));
    environment.set_formatter(|out, _, value| {
        let literal = literal(value)?;
        out.write_str(&literal).map_err(|e| Error::new(ErrorKind::WriteFailure, e.to_string()))
    });
    environment.add_template("main.typ", MAIN)?;
    Ok(environment)
}

/// A value as a Typst literal. Text only ever becomes a string literal.
fn literal(value: &Value) -> Result<String, Error> {
    match value.kind() {
        ValueKind::None => Ok("none".into()),
        ValueKind::Bool => Ok(value.is_true().to_string()),
        ValueKind::Number => Ok(value.to_string()),
        ValueKind::String => Ok(string_literal(value.as_str().unwrap_or_default())),
        ValueKind::Seq => {
            let mut items = String::from("(");
            for item in value.try_iter()? {
                let _ = write!(items, "{}, ", literal(&item)?);
            }
            items.push(')');
            Ok(items)
        }
        kind => Err(Error::new(ErrorKind::BadSerialization, format!("{kind} has no literal"))),
    }
}

/// A string literal of Typst: the quotes, backslashes and control characters in it are escaped.
pub(crate) fn string_literal(text: &str) -> String {
    let mut literal = String::with_capacity(text.len() + 2);
    literal.push('"');
    for c in text.chars() {
        match c {
            '"' => literal.push_str("\\\""),
            '\\' => literal.push_str("\\\\"),
            c if c.is_control() => {
                let _ = write!(literal, "\\u{{{:x}}}", u32::from(c));
            }
            c => literal.push(c),
        }
    }
    literal.push('"');
    literal
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn literals() {
        // Typst reference, type "str": the escapes are \\ \" \n \r \t \u{…}.
        assert_eq!(string_literal("a\"b\\c\n\u{1f}#$"), "\"a\\\"b\\\\c\\u{a}\\u{1f}#$\"");
        assert_eq!(literal(&Value::from(vec!["x", "\")#panic(\""])).unwrap(), r#"("x", "\")#panic(\"", )"#);
        assert!(literal(&Value::from_serialize(std::collections::BTreeMap::from([("a", 1)]))).is_err());
    }

    #[test]
    fn the_main_file_as_text() {
        let part = |template| PartName { template };
        let attachment = Attachment {
            path: "/job.toml",
            mime_type: "application/toml",
            description: "The job file as it was read",
            relationship: "source",
        };
        let text = main_file(
            "7 #panic(\"x\") <% x %> << y >>",
            &["A. Nyberg"],
            ("en", Some("GB")),
            &[part("cover.typ"), part("member.typ")],
            &[attachment],
        );
        assert_eq!(text.unwrap(), include_str!("main.expected.typ"));
    }
}
