//! The drawings of the package, as data on paper: places in mm, styles by name. `templates/drawings/` inks them.
//!
//! Places are found here, from calc's curves and the widths of the embedded typefaces, so that one pass of
//! typesetting is enough and tests can ask where everything stands.

pub mod budget;
pub mod diagrams;
pub mod figures;
pub mod labels;
pub mod layout;
pub mod letters;
pub mod load_path;
pub mod scene;
pub mod section;
pub mod shape;
pub mod small_chain;
pub mod stack;

pub mod read_back;

#[cfg(test)]
mod tests;
