//! What is drawn, tested as data and as set pages.

mod buildings;
mod chains;
mod diagrams;
mod measured;
mod random;
mod set;
