//! From what was typed to what it means: names looked up, places checked against lengths, defaults taken, and the
//! building made.

mod beams;
mod bearings;
mod loads;
mod loops;
mod names;

use sagledger_calc::actions::{Choices, StrengthRule};
use sagledger_calc::building::{Basis, BuildUp, Building, Wall};

use super::fault::Fault;
use super::findings::Findings;
use super::origins::Origins;
use super::registry::Name;
use super::tables::basis::TypedBasis;
use super::tables::{self, Typed};
use names::Names;

/// Checks what refers to what, and makes the building if nothing is at fault.
pub(super) fn building(typed: &Typed, found: &mut Findings) -> Option<(Building, Origins)> {
    let names = Names::of(typed, found);
    let mut origins = Origins::default();
    let build_ups: Vec<Option<BuildUp>> = typed
        .build_ups
        .iter()
        .map(|build_up| {
            let place = build_up.name.as_ref().map_or(&build_up.place, |name| &name.span);
            let origin = origins.mark(place);
            build_up.meant.clone().map(|meant| BuildUp { origin, ..meant })
        })
        .collect();
    let walls: Vec<Option<Wall>> = typed
        .walls
        .iter()
        .map(|wall| {
            let origin = origins.mark(&tables::place_of(&wall.name, &(0..0)));
            Some(Wall { name: wall.name.value()?.clone(), origin })
        })
        .collect();
    let beams: Vec<_> =
        typed.beams.iter().map(|beam| beams::meant(beam, typed, &names, &mut origins, found)).collect();
    loops::find(typed, &names, found);
    if !found.has_faults() {
        unused(typed, &names, found);
    }
    let building = Building {
        basis: basis(&typed.basis),
        build_ups: build_ups.into_iter().collect::<Option<_>>()?,
        walls: walls.into_iter().collect::<Option<_>>()?,
        beams: beams.into_iter().collect::<Option<_>>()?,
    };
    Some((building, origins))
}

fn basis(typed: &TypedBasis) -> Basis {
    Basis {
        choices: typed.choices.unwrap_or(Choices::Uk),
        rule: typed.rule.unwrap_or(StrengthRule::Single),
        shear_flexibility: typed.shear_flexibility.unwrap_or(false),
        choices_defaulted: typed.choices.is_none(),
        rule_defaulted: typed.rule.is_none(),
    }
}

/// Warns of what nothing refers to. Only where there is no fault: one may hide the reference.
fn unused(typed: &Typed, names: &Names, found: &mut Findings) {
    let (mut used_walls, mut used_build_ups) = (vec![false; typed.walls.len()], vec![false; typed.build_ups.len()]);
    for beam in &typed.beams {
        for on in beam.bearings.iter().filter_map(|bearing| bearing.on.value()) {
            if let Some(names::Support::Wall(wall)) = names.support(on) {
                used_walls[wall] = true;
            }
        }
        for name in beam.loads.iter().filter_map(loads::build_up_named) {
            if let Some(build_up) = names.build_up(name) {
                used_build_ups[build_up] = true;
            }
        }
    }
    for (wall, _) in typed.walls.iter().zip(used_walls).filter(|(_, used)| !used) {
        if let Some(name) = wall.name.given() {
            let fact = format!("no beam bears on {}", names::with_article(&name.value));
            let remedy = "let a beam bear on it, or take it out";
            found.add(Fault::new(Name::WallUnused, Some(name.span.clone()), fact, remedy));
        }
    }
    for (build_up, _) in typed.build_ups.iter().zip(used_build_ups).filter(|(_, used)| !used) {
        if let Some(name) = &build_up.name {
            let fact = format!("no load uses {}", names::with_article(&name.value));
            let remedy = "use it in a [[beam.load]], or take it out";
            found.add(Fault::new(Name::BuildUpUnused, Some(name.span.clone()), fact, remedy));
        }
    }
}
