//! The building as one linear system, solved exactly.
//!
//! Loads travel down: a beam's reactions are loads on whatever carries it. Movements travel up: a bearing on another
//! beam has that beam's movement at the landing point. Beams on two bearings are determinate, so their reactions are
//! equilibrium alone; the forces of inner bearings are the unknowns of the system, whose matrix is the movement that
//! unit forces cause between each inner bearing and what carries it. It is factored once and solved for every unit
//! load; everything else is superposition of piecewise polynomials, so results carry no mesh error.

pub mod component;
pub mod contribution;
pub mod envelope;
pub mod geometry;
pub mod loads;
pub mod polynomial;
pub mod profile;
pub mod solved;
pub mod system;
