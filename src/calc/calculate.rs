//! From a building to its results.

use std::collections::BTreeMap;

use crate::actions::combinations::{Purpose, combinations};
use crate::actions::{Action, Actions};
use crate::analysis::component::{carriers, components, order};
use crate::analysis::contribution::Contribution;
use crate::analysis::envelope::{Envelope, Field, Found, Sense};
use crate::analysis::geometry::{landings, stretches};
use crate::analysis::loads::{actions_of, resolve};
use crate::analysis::solved::{Layout, Solved};
use crate::analysis::system::Variant;
use crate::assumptions::assumptions;
use crate::building::{Building, Carrier};
use crate::fault::Fault;
use crate::materials::DENSITY;
use crate::members::chain::chain;
use crate::members::drawn::drawn;
use crate::members::forces::{ForceFields, Forces, bearings};
use crate::members::hand_check::hand_check;
use crate::members::movements::{Own, hand_rules, stacked};
use crate::members::requirements::{Known, requirements, settlement_moment};
use crate::members::rows::rows;
use crate::members::{MovementFields, Sets};
use crate::quantity::{Force, Length};
use crate::results::{
    BeamResult, Chain, Combinations, Effect, Movements, Results, TakeDown, Tilt, Verdict, WallResult,
};

/// Calculates a building.
///
/// # Errors
/// Beams that carry each other in a ring, and beams that could move freely; all of them.
pub fn calculate(building: &Building) -> Result<Results, Vec<Fault>> {
    let mechanisms: Vec<Fault> = building
        .beams
        .iter()
        .filter(|b| b.bearings.len() < 2)
        .map(|b| Fault::Mechanism { beam: b.origin })
        .collect();
    if !mechanisms.is_empty() {
        return Err(mechanisms);
    }
    let order = order(building)?;
    let actions = actions_of(building);
    let layout = Layout {
        rows: building
            .beams
            .iter()
            .map(|b| b.loads.iter().map(|r| resolve(building, &actions, r)).collect())
            .collect(),
        stretches: building.beams.iter().map(stretches).collect(),
        landings: landings(building),
        actions: actions.clone(),
    };
    let all = |purpose| combinations(purpose, building.basis.rule, building.basis.choices, &actions);
    let combined = Combinations {
        strength: all(Purpose::Strength),
        equilibrium: all(Purpose::Equilibrium),
        characteristic: all(Purpose::Characteristic),
    };
    let sets = Sets { combinations: &combined };
    let mut beams: Vec<Option<BeamResult>> = vec![None; building.beams.len()];
    let mut chains = Vec::new();
    let mut supports = Supports::new(building, &actions);
    for members in components(building, &order) {
        let solved = Solved::new(building, &layout, members).map_err(|f| vec![f])?;
        supports.add(&solved);
        chains.extend(component(&solved, &sets, &mut beams).map_err(|f| vec![f])?);
    }
    let beams: Vec<BeamResult> = beams.into_iter().flatten().collect();
    let takedown = TakeDown {
        applied: sum_rows(&actions, &beams, |f| f),
        to_supports: supports.totals(&actions),
        absolute: sum_rows(&actions, &beams, f64::abs),
    };
    let walls = supports.walls(&sets);
    let verdict = beams.iter().map(|b| b.verdict).max().unwrap_or(Verdict::Met);
    let assumptions = assumptions(building, &actions);
    Ok(Results { actions, combinations: combined, beams, walls, takedown, order, chains, assumptions, verdict })
}

/// All results of one component's beams, written to their places in `beams`, and its chain.
fn component(solved: &Solved, sets: &Sets, beams: &mut [Option<BeamResult>]) -> Result<Option<Chain>, Fault> {
    let count = solved.members.len();
    let movement_fields: Vec<MovementFields> = (0..count).map(|l| MovementFields::new(solved, l)).collect();
    let owns: Vec<Option<Own>> =
        movement_fields.iter().enumerate().map(|(l, fields)| Own::new(solved, l, fields, sets)).collect();
    let sizes: Vec<f64> = owns.iter().map(|own| own.as_ref().map_or(0.0, |o| o.total.size())).collect();
    let hand = hand_rules(solved, &sizes);
    let other_shear = solved.variant(Variant { other_shear: true, ..Variant::default() })?;
    let levels = levels(solved);
    let mut closest: Option<(f64, usize, Found<0, 1>)> = None;
    for (local, own) in owns.iter().enumerate() {
        let fields = &movement_fields[local];
        let force_fields = ForceFields::new(solved, local);
        let Some(forces) = Forces::new(solved, local, &force_fields, sets) else { continue };
        let whole = super::members::whole(solved, local);
        let Some(moved): Option<Found<0, 1>> = fields.stacked.greatest_size(&[sets.characteristic()], whole) else {
            continue;
        };
        let Some(own) = own else { continue };
        let bearings = bearings(solved, local, sets);
        let route = hand[local].1.iter().map(|&beam| {
            let of = solved.local(beam).map_or(0.0, |l| sizes[l]);
            (solved.building.beams[beam].mark.clone(), Length::from_si(of))
        });
        let greatest = stacked(solved, local, &moved, None);
        let known = Known {
            forces: &forces,
            force_fields: &force_fields,
            movement_fields: fields,
            bearings: &bearings,
            hand_route: route.collect(),
            exact: greatest.total.value,
        };
        let found = requirements(solved, local, sets, &known)?;
        let (governing, governed_by) = found.governing_stacked.clone().unzip();
        let share =
            governing.as_ref().map_or(0.0, |g| g.limit.map_or(0.0, |limit| g.total.value.si().abs() / limit.si()));
        let drawn_movement = governed_by.unwrap_or_else(|| moved.clone());
        let measure = if share > 0.0 { share } else { moved.size() * 1e-9 };
        if closest.as_ref().is_none_or(|c| measure > c.0 * (1.0 + 1e-9)) {
            closest = Some((measure, solved.members[local], drawn_movement.clone()));
        }
        let beam = solved.beam(local);
        let cut_length = cut_length(beam);
        let verdict = found.checks.iter().filter(|c| !c.advice).map(|c| c.verdict).max();
        let x = own.total.effect.at.si();
        let with_other = other_shear.factored(&other_shear.own(local), &own.total.factors).at(x);
        let plain = solved.factored(fields.own.field(), &own.total.factors).at(x);
        let tilt = greatest_tilt(&found.tilts);
        let Some(tilt) = tilt else { continue };
        beams[solved.members[local]] = Some(BeamResult {
            stretches: solved.stretches(local).to_vec(),
            level: levels[local],
            rows: rows(solved.building, &solved.layout.actions, solved.members[local]),
            landings: solved.layout.landings[solved.members[local]].clone(),
            cut_length,
            mass: cut_length.si() * beam.section.area.si() * DENSITY,
            moment_max: forces.moment_max.effect.clone(),
            moment_min: forces.moment_min.effect.clone(),
            shear: forces.shear.effect.clone(),
            movements: Movements {
                own_total: own.total.effect.clone(),
                own_after: own.after.effect.clone(),
                own_variable: own.variable.effect.clone(),
                stacked: greatest,
                governing,
                hand_rule: Length::from_si(hand[local].0),
                hand_route: hand[local].1.clone(),
                tilt,
            },
            second_moment: found.second_moment,
            drawn: drawn(solved, local, forces.moment(), &drawn_movement, &force_fields, fields),
            hand_check: hand_check(solved, local, forces.moment(), &own.total),
            settlement_moment: settlement_moment(solved, local),
            shear_movement: Length::from_si((with_other - plain).abs()),
            verdict: verdict.unwrap_or(Verdict::Met),
            checks: found.checks,
            bearings,
        });
    }
    Ok(closest.map(|(_, beam, movement)| chain(solved, beam, &movement)))
}

/// Length + half the seat at each end that stands on a wall at the beam's very end.
fn cut_length(beam: &crate::building::Beam) -> Length {
    let length = beam.length.si();
    let at_end = |at: f64| at == 0.0 || at == length;
    let seats = beam.bearings.iter().filter(|b| matches!(b.on, Carrier::Wall(_)) && at_end(b.at.si()));
    let halves: f64 = seats.filter_map(|b| b.bearing_length).map(|l| 0.5 * l.si()).sum();
    Length::from_si(length + halves)
}

/// Longest way from the top, by local beam.
fn levels(solved: &Solved) -> Vec<usize> {
    let mut levels = vec![0; solved.members.len()];
    for local in 0..solved.members.len() {
        for carrier in carriers(solved.beam(local)).filter_map(|c| solved.local(c)) {
            levels[carrier] = levels[carrier].max(levels[local] + 1);
        }
    }
    levels
}

/// The tilt of greatest size; beams with bearings have at least one span.
fn greatest_tilt(tilts: &[Tilt]) -> Option<Tilt> {
    let mut worst: Option<&Tilt> = None;
    for tilt in tilts {
        if worst.is_none_or(|w| tilt.ratio().abs() > w.ratio().abs()) {
            worst = Some(tilt);
        }
    }
    worst.cloned()
}

fn sum_rows(actions: &Actions, beams: &[BeamResult], measure: impl Fn(f64) -> f64) -> Vec<(Action, Force)> {
    let sum = |action: &Action| -> f64 {
        let totals = beams.iter().flat_map(|b| &b.rows).flat_map(|r| &r.totals);
        totals.filter(|(a, _)| a == action).map(|(_, f)| measure(f.si())).sum()
    };
    actions.present.iter().map(|a| (*a, Force::from_si(sum(a)))).collect()
}

/// What arrives at each wall, gathered component by component.
struct Supports {
    walls: Vec<(Vec<Contribution>, Vec<f64>)>,
    actions: Actions,
}

impl Supports {
    fn new(building: &Building, actions: &Actions) -> Supports {
        Supports { walls: vec![(Vec::new(), Vec::new()); building.walls.len()], actions: actions.clone() }
    }

    fn add(&mut self, solved: &Solved) {
        let mut arriving: BTreeMap<usize, Vec<f64>> = BTreeMap::new();
        for local in 0..solved.members.len() {
            for (n, seat) in solved.beam(local).bearings.iter().enumerate() {
                let Carrier::Wall(wall) = seat.on else { continue };
                let values = arriving.entry(wall).or_insert_with(|| vec![0.0; solved.contributions.len()]);
                for (c, value) in solved.reaction(local, n) {
                    values[c] += value;
                }
            }
        }
        for (wall, values) in arriving {
            if let Some(all) = self.walls.get_mut(wall) {
                all.0.extend(solved.contributions.iter().copied());
                all.1.extend(values);
            }
        }
    }

    fn totals(&self, actions: &Actions) -> Vec<(Action, Force)> {
        let sum = |action: &Action| -> f64 {
            let all = self.walls.iter().flat_map(|(list, values)| list.iter().zip(values));
            all.filter(|(c, _)| c.action == *action).map(|(_, v)| v).sum()
        };
        actions.present.iter().map(|a| (*a, Force::from_si(sum(a)))).collect()
    }

    fn walls(&self, sets: &Sets) -> Vec<WallResult> {
        let one = |(list, values): &(Vec<Contribution>, Vec<f64>)| {
            let pairs: Vec<(usize, f64)> = values.iter().copied().enumerate().collect();
            let envelope = Envelope::new(Field::scalar(list, pairs, 0.0));
            let most = |set| -> Option<Effect<1, 0>> {
                envelope.extreme(&[set], Sense::Greatest, (0.0, 0.0)).map(|f| f.effect)
            };
            let sum = |action: &Action| -> f64 {
                list.iter().zip(values).filter(|(c, _)| c.action == *action).map(|(_, v)| v).sum()
            };
            WallResult {
                totals: self.actions.present.iter().map(|a| (*a, Force::from_si(sum(a)))).collect(),
                design_max: most(sets.strength()).map_or(Force::from_si(0.0), |e| e.value),
                characteristic_max: most(sets.characteristic()).map_or(Force::from_si(0.0), |e| e.value),
            }
        };
        self.walls.iter().map(one).collect()
    }
}
