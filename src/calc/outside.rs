//! What a package never covers, and what this building leaves open: listed by name in every package.

use crate::actions::combinations::listed;
use crate::building::Building;

/// Always outside the calculation.
pub const ALWAYS: [&str; 8] = [
    "torsion from offsets",
    "axial force in beams",
    "fire and corrosion protection",
    "holes and notches",
    "connections, given as design forces only",
    "lateral stability of the building",
    "foundations and ground",
    "temporary works and sequence",
];

/// Everything outside the calculation of a building: what always is, then the supports as one item.
pub fn outside(building: &Building) -> Vec<String> {
    let mut items: Vec<String> = ALWAYS.iter().map(|item| item.to_string()).collect();
    let names: Vec<String> = building.walls.iter().map(|w| w.name.clone()).collect();
    match names.len() {
        0 => {}
        1 => items.push(format!("{} as a bearing", names[0])),
        _ => items.push(format!("{} as bearings", listed(&names))),
    }
    items
}
