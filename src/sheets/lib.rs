//! The sheets of sagledger: a calculated building in, a numbered PDF package out.
//!
//! Nothing is calculated here. `data` turns a building and its results into plain text and lists, `glue` names the
//! parts in their order, the templates under `templates/` place them on paper, and Typst sets them. The same package
//! always gives the same bytes: fonts are embedded, the only date is the job's, no file, clock or network is read.

pub mod drawings;
pub mod fault;
pub mod fonts;
pub mod logo;
pub mod package;
pub mod templates;
pub mod world;
pub mod writers;

mod data;
mod export;
mod glue;

pub use export::{Typeset, source, typeset};
pub use fault::{Fault, Place, Problem};
pub use logo::Logo;
pub use package::{Draft, Meta, Package, Paper, Record};
pub use templates::Overrides;
