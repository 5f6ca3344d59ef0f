//! Everything that is required of one beam, as checks with their inputs, in the order of every table.

use super::forces::{ForceFields, Forces, scalar};
use super::interaction::worst_place;
use super::movements::{chord_movements, in_stretch, parts_under, stacked, stretch_at, tilt};
use super::required::{allowed, beside, resolved};
use super::{MovementFields, Sets};
use crate::actions::Action;
use crate::analysis::contribution::Contribution;
use crate::analysis::envelope::{Found, Sense};
use crate::analysis::solved::Solved;
use crate::building::{Carrier, FlangeHold, Joint, Load};
use crate::checks::bending::Bending;
use crate::checks::bending_with_shear::{BendingWithShear, Reduced};
use crate::checks::deflection::{Deflection, SecondMomentInHand};
use crate::checks::lateral_torsional_buckling::LateralTorsionalBuckling;
use crate::checks::shear::Shear;
use crate::checks::stacked_deflection::{BearingMovement, HandRule, Inherited, StackedDeflection};
use crate::checks::tilt::TiltOfBearings;
use crate::checks::torsion::Torsion;
use crate::checks::uplift::Uplift;
use crate::checks::web_under_force::{StiffLength, Way, WebUnderForce};
use crate::checks::web_with_bending::WebWithBending;
use crate::checks::{self, Combined, Inputs, Outcome, Required, Steel};
use crate::fault::Fault;
use crate::limits::{Limit, Movement};
use crate::quantity::{Force, Length, Moment, SecondMoment};
use crate::results::{
    Arrangement, BearingResult, Check, CheckKind, CombinationId, Effect, Place, RequiredSecondMoment, Stacked,
    StretchKind, Tilt,
};

/// What is already known of the beam.
pub struct Known<'k> {
    pub forces: &'k Forces,
    pub force_fields: &'k ForceFields<'k>,
    pub movement_fields: &'k MovementFields<'k>,
    pub bearings: &'k [BearingResult],
    pub hand_route: Vec<(String, Length)>,
    pub exact: Length,
}

/// The checks of a beam and what they found beside a verdict.
pub struct Requirements {
    pub checks: Vec<Check>,
    pub governing_stacked: Option<(Stacked, Found<0, 1>)>,
    pub tilts: Vec<Tilt>,
    pub second_moment: RequiredSecondMoment,
}

/// Places nearer than this are one, m.
const SAME_PLACE: f64 = 1e-9;

/// Place along the beam, where that is, the force by contribution, and over which length it arrives.
type FromAbove = (Length, Place, Vec<(usize, f64)>, StiffLength);

struct Collect<'c> {
    solved: &'c Solved<'c>,
    local: usize,
    sets: &'c Sets<'c>,
    known: &'c Known<'c>,
    steel: Steel,
    checks: Vec<Check>,
    required: Vec<(Movement, Option<SecondMoment>)>,
}

/// All requirements of one beam.
///
/// # Errors
/// Those of solving a continuous beam again with other second moments of area.
pub fn requirements(solved: &Solved, local: usize, sets: &Sets, known: &Known) -> Result<Requirements, Fault> {
    let beam = solved.beam(local);
    let steel = Steel { section: beam.section, grade: beam.grade, choices: solved.building.basis.choices };
    let mut all = Collect { solved, local, sets, known, steel, checks: Vec::new(), required: Vec::new() };
    all.bending();
    all.shear();
    all.bending_with_shear();
    all.buckling();
    all.webs();
    all.uplift();
    all.own_movements()?;
    let governing_stacked = all.stacked()?;
    let tilts = all.tilts();
    all.torsion();
    let second_moment = all.second_moment();
    let mut checks = all.checks;
    checks.sort_by_key(|c| c.kind);
    Ok(Requirements { checks, governing_stacked, tilts, second_moment })
}

impl Collect<'_> {
    fn push(
        &mut self,
        kind: CheckKind,
        place: Place,
        at: Length,
        how: Option<(CombinationId, Arrangement)>,
        inputs: Inputs,
    ) -> Outcome {
        let outcome = checks::run(&inputs);
        let (combination, arrangement) = how.unzip();
        self.checks.push(Check {
            kind,
            place,
            at,
            demand: outcome.demand,
            capacity: outcome.capacity,
            unit: outcome.unit,
            utilisation: outcome.utilisation,
            verdict: outcome.verdict,
            reason: outcome.reason.clone(),
            clause: outcome.clause.clone(),
            combination,
            arrangement,
            note: outcome.note,
            advice: false,
            inputs: Some(inputs),
        });
        outcome
    }

    fn combined<const F: i8, const L: i8>(&self, effect: &Effect<F, L>) -> Option<Combined<F, L>> {
        Combined::of(effect, self.sets.combinations)
    }

    fn bending(&mut self) {
        let effect = &self.known.forces.moment().effect;
        let Some(moment) = self.combined(effect) else { return };
        let inputs = Inputs::Bending(Bending { steel: self.steel, moment });
        self.push(CheckKind::Bending, Place::Point { at: effect.at }, effect.at, how(effect), inputs);
    }

    fn shear(&mut self) {
        let effect = &self.known.forces.shear.effect;
        let Some(shear) = self.combined(effect) else { return };
        let inputs = Inputs::Shear(Shear { steel: self.steel, shear });
        self.push(CheckKind::Shear, Place::Point { at: effect.at }, effect.at, how(effect), inputs);
    }

    /// At the place of the greatest ratio: where shear reduces the resistance, or where the moment is greatest.
    fn bending_with_shear(&mut self) {
        let fields = self.known.force_fields;
        let strength = [self.sets.strength()];
        let greatest = &self.known.forces.moment().effect;
        let mut x = greatest.at.si();
        if let Some(reduced) = Reduced::of(&self.steel) {
            let resistance = |shear: f64| reduced.under(Force::from_si(shear)).si();
            let half = 0.5 * reduced.shear().si();
            let shear_there = fields.shear.size_at(&strength, x);
            let full = if shear_there <= half { reduced.bending().si() } else { resistance(shear_there) };
            let plain = if full > 0.0 { greatest.value.si().abs() / full } else { f64::MAX };
            if let Some((worst, ratio)) = worst_place(fields, self.sets, half, resistance)
                && ratio > plain
            {
                x = worst;
            }
        }
        let moment: Option<Found<1, 1>> = fields.moment.greatest_size_at(&strength, x);
        let shear: Option<Found<1, 0>> = fields.shear.greatest_size_at(&strength, x);
        let (Some(moment), Some(shear)) = (moment, shear) else { return };
        let (Some(m), Some(v)) = (self.combined(&moment.effect), self.combined(&shear.effect)) else { return };
        let inputs = Inputs::BendingWithShear(BendingWithShear { steel: self.steel, moment: m, shear: v });
        let at = Length::from_si(x);
        self.push(CheckKind::BendingWithShear, Place::Point { at }, at, how(&moment.effect), inputs);
    }

    /// One entry a span or overhang. The flange in compression is held throughout where the flange that each sign
    /// of moment compresses is.
    fn buckling(&mut self) {
        let strength = [self.sets.strength()];
        let scale = self.known.forces.moment().size();
        let restraint = &self.solved.beam(self.local).restraint;
        let (top, bottom) = (restraint.top == FlangeHold::Continuous, restraint.bottom == FlangeHold::Continuous);
        for s in self.solved.stretches(self.local) {
            if s.kind == StretchKind::SeatEnd {
                continue;
            }
            let range = (s.from.si(), s.to.si());
            let moment = &self.known.force_fields.moment;
            let greatest: Option<Found<1, 1>> = moment.extreme(&strength, Sense::Greatest, range);
            let least: Option<Found<1, 1>> = moment.extreme(&strength, Sense::Least, range);
            let (Some(greatest), Some(least)) = (greatest, least) else { continue };
            let sags = greatest.effect.value.si() > 1e-9 * scale;
            let hogs = least.effect.value.si() < -1e-9 * scale;
            let held = (!sags || top) && (!hogs || bottom);
            let found = if least.size() > greatest.size() * (1.0 + 1e-12) { least } else { greatest };
            let Some(moment) = self.combined(&found.effect) else { continue };
            let inputs =
                Inputs::LateralTorsionalBuckling(LateralTorsionalBuckling { steel: self.steel, moment, held });
            let place = Place::Segment { from: s.from, to: s.to };
            self.push(CheckKind::LateralTorsionalBuckling, place, found.effect.at, how(&found.effect), inputs);
        }
    }

    /// At bearings, under landings and under point loads, by place along the beam.
    fn webs(&mut self) {
        let mut forces: Vec<(Length, Place, Effect<1, 0>, Way, StiffLength)> = Vec::new();
        let (solved, local) = (self.solved, self.local);
        let beam = solved.beam(local);
        let length = beam.length.si();
        let last = beam.bearings.len().saturating_sub(1);
        for (n, seat) in beam.bearings.iter().enumerate() {
            let stiff = match seat.on {
                Carrier::Wall(_) => seat.bearing_length.map_or(StiffLength::Unknown, StiffLength::Seat),
                Carrier::Beam { .. } if seat.joint == Joint::ToTheWeb => continue,
                Carrier::Beam { beam, .. } => crossing(solved, beam),
            };
            let at = seat.at.si();
            let to_end = at.min(length - at);
            let outer = n == 0 || n == last;
            let way = if outer && to_end < beam.section.h.si() {
                // At the very end the beam is taken to reach the far edge of its seat.
                let c = if to_end == 0.0 { 0.0 } else { (to_end - 0.5 * stiff.length().si()).max(0.0) };
                Way::AtEnd { c: Length::from_si(c) }
            } else {
                Way::Within
            };
            if let Some(bearing) = self.known.bearings.get(n) {
                let place = Place::Bearing { index: n };
                forces.push((seat.at, place, bearing.design_max.clone(), way, stiff));
            }
        }
        for (at, place, values, stiff) in self.forces_from_above() {
            if let Some(force) = scalar::<1, 0>(solved, values, &[self.sets.strength()], Sense::Greatest) {
                forces.push((at, place, force, Way::Within, stiff));
            }
        }
        forces.sort_by(|a, b| a.0.si().total_cmp(&b.0.si()));
        for (at, place, force, way, stiff) in forces {
            let Some(combined) = self.combined(&force) else { continue };
            let web = WebUnderForce { steel: self.steel, force: combined, way, stiff, a: beam.length };
            self.push(CheckKind::WebUnderForce, place, at, how(&force), Inputs::WebUnderForce(web.clone()));
            let moment: Option<Found<1, 1>> =
                self.known.force_fields.moment.greatest_size_at(&[self.sets.strength()], at.si());
            if let Some(moment) = moment
                && let Some(m) = self.combined(&moment.effect)
            {
                let inputs = Inputs::WebWithBending(WebWithBending { web, moment: m });
                self.push(CheckKind::WebWithBending, place, at, how(&force), inputs);
            }
        }
    }

    /// Forces that come in through the top flange: point loads and beams that land on it. Those at one place act
    /// together, over the least of their stiff lengths.
    fn forces_from_above(&self) -> Vec<FromAbove> {
        let (solved, local) = (self.solved, self.local);
        let index = solved.members[local];
        let mut together: Vec<FromAbove> = Vec::new();
        let mut add = |at: Length, place, values: Vec<(usize, f64)>, stiff: StiffLength| match together
            .iter_mut()
            .find(|other| (other.0.si() - at.si()).abs() <= SAME_PLACE)
        {
            Some((_, _, sum, least)) => {
                for (c, value) in values {
                    match sum.iter_mut().find(|(n, _)| *n == c) {
                        Some((_, of)) => *of += value,
                        None => sum.push((c, value)),
                    }
                }
                if stiff.length().si() < least.length().si() {
                    *least = stiff;
                }
            }
            None => together.push((at, place, values, stiff)),
        };
        for (n, landing) in solved.layout.landings[index].iter().enumerate() {
            let joint = solved.building.beams[landing.beam].bearings[landing.bearing].joint;
            if joint == Joint::OnTopFlange
                && let Some(other) = solved.local(landing.beam)
            {
                let values = solved.reaction(other, landing.bearing);
                add(landing.at, Place::Landing { index: n }, values, crossing(solved, landing.beam));
            }
        }
        for (row, load) in solved.beam(local).loads.iter().enumerate() {
            let Load::Point { at, .. } = load.load else { continue };
            let own = |(_, c): &(usize, &Contribution)| c.beam == index && c.row == Some(row);
            let values = solved.contributions.iter().enumerate().filter(own).map(|(n, c)| (n, c.amount));
            add(at, Place::Load { row: row + 1 }, values.collect(), StiffLength::Unknown);
        }
        together
    }

    fn uplift(&mut self) {
        for (n, bearing) in self.known.bearings.iter().enumerate() {
            let held_down = self.solved.beam(self.local).bearings[n].held_down;
            let Some(reaction) = self.combined(&bearing.least) else { continue };
            // Where permanent actions alone press least, no combination of variable ones is to be named.
            let alone = reaction.parts.iter().all(|part| part.action == Action::Permanent);
            let how = if alone { None } else { how(&bearing.least) };
            let inputs = Inputs::Uplift(Uplift { reaction, held_down });
            self.push(CheckKind::Uplift, Place::Bearing { index: n }, bearing.at, how, inputs);
        }
    }

    fn second_moment_in_hand(&self, movement: Movement, now: f64) -> Result<SecondMomentInHand, Fault> {
        let beam = self.solved.beam(self.local);
        let provided = beam.section.i_y;
        if beam.bearings.len() == 2 {
            return Ok(SecondMomentInHand::Scales { provided });
        }
        let required = resolved(self.solved, self.local, movement, now, self.sets)?;
        Ok(SecondMomentInHand::Resolved { provided, required })
    }

    fn own_movements(&mut self) -> Result<(), Fault> {
        let (own, after) = (&self.known.movement_fields.own, &self.known.movement_fields.after);
        let cases = [
            (Movement::Total, CheckKind::TotalDeflection, own, self.sets.characteristic()),
            (Movement::After, CheckKind::AfterDeflection, after, self.sets.characteristic()),
            (Movement::Variable, CheckKind::VariableDeflection, own, self.sets.variable()),
        ];
        for (movement, kind, envelope, set) in cases {
            let Some(limit) = self.solved.beam(self.local).limits.of(movement) else { continue };
            let mut entries = Vec::new();
            for (n, s) in self.solved.stretches(self.local).iter().enumerate() {
                let Some(allowed) = allowed(self.solved, self.local, movement, n) else { continue };
                if let Some(found) = in_stretch(envelope, &[set], s) {
                    entries.push((n, *s, found, allowed));
                }
            }
            let share = |(_, s, f, allowed): &(usize, crate::results::Stretch, Found<0, 1>, Length)| {
                let value = if s.kind == StretchKind::Span { f.size() } else { f.effect.value.si() };
                value / allowed.si()
            };
            let now = entries.iter().map(share).fold(0.0, f64::max);
            if entries.is_empty() {
                continue;
            }
            let second_moment = self.second_moment_in_hand(movement, now)?;
            for (n, stretch, found, _) in entries {
                let Some(combined) = self.combined(&found.effect) else { continue };
                let inputs = Deflection { limit: limit.clone(), stretch, movement: combined, second_moment };
                let place = Place::Stretch { index: n };
                let at = found.effect.at;
                let outcome = self.push(kind, place, at, how(&found.effect), Inputs::Deflection(inputs));
                self.require(movement, &outcome);
            }
        }
        Ok(())
    }

    fn require(&mut self, movement: Movement, outcome: &Outcome) {
        match outcome.required {
            Some(Required::Of(value)) => self.required.push((movement, Some(value))),
            Some(Required::BudgetUsed) => self.required.push((movement, None)),
            None => {}
        }
    }

    /// One entry a span or overhang; gives back the one that takes the greatest share of its limit.
    fn stacked(&mut self) -> Result<Option<(Stacked, Found<0, 1>)>, Fault> {
        let (solved, local) = (self.solved, self.local);
        let Some(limit) = solved.beam(local).limits.of(Movement::Stacked) else { return Ok(None) };
        let set = [self.sets.characteristic()];
        let mut entries = Vec::new();
        for (n, s) in solved.stretches(local).iter().enumerate() {
            let Some(allowed) = allowed(solved, local, Movement::Stacked, n) else { continue };
            if let Some(found) = in_stretch(&self.known.movement_fields.stacked, &set, s) {
                let value = if s.kind == StretchKind::Span { found.size() } else { found.effect.value.si() };
                entries.push((n, found, allowed, value / allowed.si()));
            }
        }
        let now = entries.iter().map(|e| e.3).fold(0.0, f64::max);
        if entries.is_empty() {
            return Ok(None);
        }
        let second_moment = self.second_moment_in_hand(Movement::Stacked, now)?;
        let mut governing: Option<(f64, Stacked, Found<0, 1>)> = None;
        for (n, found, allowed, share) in entries {
            let result = stacked(solved, local, &found, Some(allowed));
            let inputs = self.stacked_inputs(limit, n, &found, &result, second_moment);
            let place = Place::Stretch { index: n };
            let at = found.effect.at;
            let kind = CheckKind::StackedDeflection;
            let outcome = self.push(kind, place, at, how(&found.effect), Inputs::StackedDeflection(inputs));
            self.require(Movement::Stacked, &outcome);
            if governing.as_ref().is_none_or(|g| share > g.0) {
                governing = Some((share, result, found));
            }
        }
        Ok(governing.map(|(_, result, found)| (result, found)))
    }

    fn stacked_inputs(
        &self,
        limit: &Limit,
        stretch: usize,
        found: &Found<0, 1>,
        result: &Stacked,
        second_moment: SecondMomentInHand,
    ) -> StackedDeflection {
        let (solved, local) = (self.solved, self.local);
        let x = found.effect.at.si();
        let stretches = solved.stretches(local);
        let chord = stretch_at(stretches, x);
        let (a, b) = solved.chord(local, chord);
        let (left, right) = chord_movements(solved, local, chord, &found.factors);
        let (left_bearing, right_bearing) = solved.chord_bearings(local, chord);
        let own_values = own_values(solved, local, x, chord);
        let combination = self.sets.combination(found.effect.combination);
        let own = Combined {
            parts: parts_under(solved, self.sets, &found.effect, &found.factors, &own_values),
            purpose: combination.map_or(crate::actions::combinations::Purpose::Characteristic, |c| c.purpose),
            expression: combination.map_or(crate::actions::combinations::Expression::E614b, |c| c.expression),
        };
        let s = stretches[stretch];
        StackedDeflection {
            limit: limit.clone(),
            stretch: s,
            beside: (s.kind == StretchKind::Overhang).then(|| beside(stretches, stretch)).flatten(),
            own,
            inherited: Inherited {
                left: self.bearing_movement(left_bearing, left),
                right: self.bearing_movement(right_bearing, right),
                span: Length::from_si(b - a),
                to_place: Length::from_si(x - a),
            },
            settled: result.settled,
            second_moment,
            hand_rule: Some(HandRule { route: self.known.hand_route.clone(), exact: self.known.exact }),
        }
    }

    fn bearing_movement(&self, bearing: usize, movement: f64) -> BearingMovement {
        let building = self.solved.building;
        let (on, wall) = match self.solved.beam(self.local).bearings[bearing].on {
            Carrier::Wall(wall) => (building.walls[wall].name.clone(), true),
            Carrier::Beam { beam, .. } => (building.beams[beam].mark.clone(), false),
        };
        BearingMovement { on, wall, movement: Length::from_si(movement) }
    }

    fn tilts(&mut self) -> Vec<Tilt> {
        let (solved, local) = (self.solved, self.local);
        let mut tilts = Vec::new();
        for (n, s) in solved.stretches(local).iter().enumerate() {
            if s.kind != StretchKind::Span {
                continue;
            }
            let Some(result) = tilt(solved, local, n, self.sets) else { continue };
            if let Some(limit) = solved.beam(local).limits.of(Movement::Tilt) {
                let (left, right) = solved.chord_bearings(local, n);
                let inputs = TiltOfBearings {
                    limit: limit.clone(),
                    left: self.bearing_movement(left, result.left.si()),
                    right: self.bearing_movement(right, result.right.si()),
                    span: result.span,
                };
                let place = Place::Stretch { index: n };
                self.push(CheckKind::Tilt, place, s.from, how(&result.difference), Inputs::Tilt(inputs));
            }
            tilts.push(result);
        }
        tilts
    }

    /// Loads and landings that act beside the web.
    fn torsion(&mut self) {
        let (solved, local) = (self.solved, self.local);
        let beam = solved.beam(local);
        let mut beside: Vec<(Length, Place, String, Length)> = Vec::new();
        for (row, load) in beam.loads.iter().enumerate().filter(|(_, l)| l.offset.si() != 0.0) {
            let (at, place) = match load.load {
                Load::Point { at, .. } => (at, Place::Load { row: row + 1 }),
                Load::Area { from, to, .. } | Load::Wall { from, to, .. } | Load::Line { from, to, .. } => {
                    (from, Place::Segment { from, to })
                }
            };
            beside.push((at, place, load.what.clone(), load.offset));
        }
        for (n, landing) in solved.layout.landings[solved.members[local]].iter().enumerate() {
            let other = &solved.building.beams[landing.beam];
            let offset = other.bearings[landing.bearing].offset;
            if offset.si() != 0.0 {
                let what = format!("{} lands", other.mark);
                beside.push((landing.at, Place::Landing { index: n }, what, offset));
            }
        }
        beside.sort_by(|a, b| a.0.si().total_cmp(&b.0.si()));
        for (at, place, what, offset) in beside {
            self.push(CheckKind::Torsion, place, at, None, Inputs::Torsion(Torsion { what, offset }));
        }
    }

    /// The greatest that own total, after, variable and stacked ask for; where the supports have used the whole
    /// stacked budget there is no figure.
    fn second_moment(&self) -> RequiredSecondMoment {
        let provided = self.steel.section.i_y;
        if let Some((movement, _)) = self.required.iter().find(|(_, value)| value.is_none()) {
            return RequiredSecondMoment {
                provided,
                required: None,
                governed_by: Some(*movement),
                budget_used: true,
            };
        }
        let mut worst: Option<(Movement, SecondMoment)> = None;
        for (movement, value) in &self.required {
            if let Some(value) = value
                && worst.is_none_or(|w| value.si() > w.1.si())
            {
                worst = Some((*movement, *value));
            }
        }
        RequiredSecondMoment {
            provided,
            required: worst.map(|w| w.1),
            governed_by: worst.map(|w| w.0),
            budget_used: false,
        }
    }
}

fn how<const F: i8, const L: i8>(effect: &Effect<F, L>) -> Option<(CombinationId, Arrangement)> {
    Some((effect.combination, effect.arrangement.clone()))
}

fn crossing(solved: &Solved, beam: usize) -> StiffLength {
    let other = &solved.building.beams[beam];
    let s = &other.section;
    StiffLength::Crossing { mark: other.mark.clone(), t_f: s.t_f, t_w: s.t_w, r: s.r }
}

/// Own movement at a place by contribution.
pub fn own_values(solved: &Solved, local: usize, x: f64, stretch: usize) -> Vec<(usize, f64)> {
    let (a, b) = solved.chord(local, stretch);
    let to_right = (x - a) / (b - a);
    let mut values = vec![0.0; solved.contributions.len()];
    for (place, weight) in [(x, 1.0), (a, to_right - 1.0), (b, -to_right)] {
        for (c, value) in solved.movement_at(local, place).0 {
            values[c] += weight * value;
        }
    }
    values.into_iter().enumerate().collect()
}

/// The moment that `settles` causes in a beam, greatest in size; none where it causes none.
pub fn settlement_moment(solved: &Solved, local: usize) -> Option<Moment> {
    let response = solved.settlement.as_ref()?[local].as_ref()?;
    let breaks = &solved.breaks[local];
    let mut worst = 0.0f64;
    for (piece, pair) in response.moments.iter().zip(breaks.windows(2)) {
        let (up, _) = crate::analysis::polynomial::greatest(piece, 0.0, pair[1] - pair[0]);
        let negative = piece.map(|c| -c);
        let (down, _) = crate::analysis::polynomial::greatest(&negative, 0.0, pair[1] - pair[0]);
        worst = if up >= down && up > worst.abs() {
            up
        } else if down > worst.abs() {
            -down
        } else {
            worst
        };
    }
    (worst != 0.0).then(|| Moment::from_si(worst))
}
