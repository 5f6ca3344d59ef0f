//! What is drawn, tested as data and as set pages.

mod diagrams;
mod random;
mod set;
