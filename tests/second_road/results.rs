//! The figures of the results file, computed on this road, under the same keys and in the same units.

use super::actions::Rule;
use super::building::Building;
use super::job::Support;
use super::search::Sample;
use serde_json::{Map, Value, json};

/// Envelopes of one beam over its whole length or a part of it. Sizes in SI.
impl Building {
    pub fn length(&self, beam: usize) -> f64 {
        self.job.beams[beam].length
    }

    pub fn strength_moment(&self, sample: &Sample) -> [f64; 2] {
        let value = |index: usize| sample.moment[index];
        [self.combinations.greatest(Rule::Strength, value), self.combinations.least(Rule::Strength, value)]
    }

    /// The greater shear in size.
    pub fn strength_shear(&self, sample: &Sample) -> f64 {
        self.combinations.governing(Rule::Strength, |index| sample.shear[index]).abs()
    }

    /// Greatest and least own movement under a rule.
    pub fn own(&self, rule: Rule, sample: &Sample) -> [f64; 2] {
        let value = |index: usize| sample.own(index);
        [self.combinations.greatest(rule, value), self.combinations.least(rule, value)]
    }

    /// Greatest and least stacked movement.
    pub fn stacked(&self, sample: &Sample) -> [f64; 2] {
        let value = |index: usize| sample.movement[index];
        let [most, least] = [
            self.combinations.greatest(Rule::Characteristic, value),
            self.combinations.least(Rule::Characteristic, value),
        ];
        [most + sample.settled, least + sample.settled]
    }

    /// The movement of greatest size of a pair of envelopes, with its sign and place.
    pub fn of_greatest_size(&self, beam: usize, both: impl Fn(&Sample) -> [f64; 2]) -> (f64, f64) {
        let down = self.peak(beam, 0.0, self.length(beam), |sample| both(sample)[0]);
        let up = self.peak(beam, 0.0, self.length(beam), |sample| -both(sample)[1]);
        if down.0 >= up.0 { down } else { (-up.0, up.1) }
    }

    /// Difference of movement between the two bearings of a span over their distance, the worst arrangement.
    pub fn tilt(&self, beam: usize, span: usize) -> f64 {
        let [left, right] = [&self.bearings[beam][span], &self.bearings[beam][span + 1]];
        let value = |index: usize| right.under[index] - left.under[index];
        let settled = right.settled - left.settled;
        let most = self.combinations.greatest(Rule::Characteristic, value) + settled;
        let least = self.combinations.least(Rule::Characteristic, value) + settled;
        let bearings = &self.job.beams[beam].bearings;
        most.max(-least) / (bearings[span + 1].at - bearings[span].at)
    }

    pub fn worst_tilt(&self, beam: usize) -> f64 {
        (0..self.job.beams[beam].bearings.len() - 1).map(|span| self.tilt(beam, span)).fold(0.0, f64::max)
    }

    /// The hand rule of every beam: the largest own movements down the worst route to the ground, added.
    pub fn hand_rules(&self) -> Vec<f64> {
        let own =
            |beam: usize| self.of_greatest_size(beam, |sample| self.own(Rule::Characteristic, sample)).0.abs();
        let mut sums: Vec<f64> = (0..self.job.beams.len()).map(own).collect();
        for &beam in self.frame.order.iter().rev() {
            let below = self.job.beams[beam].bearings.iter().map(|bearing| match bearing.on {
                Support::Beam(carrier, _) => sums[carrier],
                Support::Wall(_) => 0.0,
            });
            sums[beam] += below.fold(0.0, f64::max);
        }
        sums
    }

    /// The greatest upward pull that a bearing must resist, sets A and B; 0 where it never lifts.
    pub fn uplift(&self, beam: usize, bearing: usize) -> f64 {
        let reactions = self.reactions(beam, bearing);
        let least = |rule| self.combinations.least(rule, |index| reactions[index]);
        (-least(Rule::Strength)).max(-least(Rule::Equilibrium)).max(0.0)
    }

    /// Ordering length: half a seat more at each end that stands on a wall.
    pub fn cut_length(&self, beam: usize) -> f64 {
        let beam = &self.job.beams[beam];
        let seats = [(0, 0.0), (beam.bearings.len() - 1, beam.length)].map(|(index, end)| {
            let bearing = &beam.bearings[index];
            let stands = matches!(bearing.on, Support::Wall(_)) && (bearing.at - end).abs() < 1e-9;
            if stands { bearing.seat / 2.0 } else { 0.0 }
        });
        beam.length + seats[0] + seats[1]
    }
}

/// The results file as far as this road goes.
pub fn results(building: &Building) -> Value {
    let hand_rules = building.hand_rules();
    let beams: Vec<Value> =
        hand_rules.iter().enumerate().map(|(beam, hand_rule)| of_beam(building, beam, *hand_rule)).collect();
    let mut applied = Map::new();
    let mut to_supports = Map::new();
    let mut walls: Vec<Map<String, Value>> = building.job.walls.iter().map(|_| Map::new()).collect();
    for action in building.actions() {
        applied.insert(action.name(), json!(building.applied(&action) / 1e3));
        let mut total = 0.0;
        for (index, wall) in building.job.walls.iter().enumerate() {
            let here = building.to_wall(&action, wall);
            total += here;
            walls[index].insert(action.name(), json!(here / 1e3));
        }
        to_supports.insert(action.name(), json!(total / 1e3));
    }
    let named = building.job.walls.iter().zip(walls);
    json!({
        "beams": beams,
        "walls": named.map(|(name, total)| json!({"name": name, "total_kN": total})).collect::<Vec<Value>>(),
        "takedown": {"applied_kN": applied, "to_supports_kN": to_supports},
    })
}

fn of_beam(building: &Building, beam: usize, hand_rule: f64) -> Value {
    let typed = &building.job.beams[beam];
    let whole = |effect: &dyn Fn(&Sample) -> f64| building.peak(beam, 0.0, typed.length, effect);
    let most_moment = whole(&|sample| building.strength_moment(sample)[0]);
    let least_moment = whole(&|sample| -building.strength_moment(sample)[1]);
    let shear = whole(&|sample| building.strength_shear(sample));
    let own = |rule| building.of_greatest_size(beam, |sample| building.own(rule, sample)).0 * 1e3;
    let stacked = building.of_greatest_size(beam, |sample| building.stacked(sample));
    let parts = inherited_and_settled(building, beam, stacked);
    let bearings: Vec<Value> =
        (0..typed.bearings.len()).map(|bearing| of_bearing(building, beam, bearing)).collect();
    json!({
        "mark": typed.mark,
        "length_m": typed.length,
        "cut_length_m": building.cut_length(beam),
        "mass_kg": building.cut_length(beam) * typed.shape.area * 7850.0,
        "second_moment_cm4": {"provided": typed.shape.second_moment * 1e8},
        "bearings": bearings,
        "moment_kNm": {"max": most_moment.0 / 1e3, "at_m": most_moment.1, "min": -least_moment.0 / 1e3},
        "shear_kN": {"max": shear.0 / 1e3, "at_m": shear.1},
        "deflection_mm": {
            "own_total": own(Rule::Characteristic),
            "own_after": own(Rule::After),
            "own_variable": own(Rule::Variable),
            "stacked_total": stacked.0 * 1e3,
            "stacked_at_m": stacked.1,
            "inherited_there": parts[0].0 * 1e3,
            "settled_there": parts[0].1 * 1e3,
            "hand_rule": hand_rule * 1e3,
        },
        "tilt": building.worst_tilt(beam),
    })
}

fn of_bearing(building: &Building, beam: usize, bearing: usize) -> Value {
    let typed = &building.job.beams[beam].bearings[bearing];
    let reactions = building.reactions(beam, bearing);
    let value = |index: usize| reactions[index];
    let mut figures = Map::new();
    for action in building.actions() {
        let of_action = building.contributions.iter().zip(&reactions).filter(|(c, _)| c.action == action);
        figures.insert(action.name(), json!(of_action.map(|(_, reaction)| reaction).sum::<f64>() / 1e3));
    }
    let combinations = &building.combinations;
    figures.insert("design_max".into(), json!(combinations.greatest(Rule::Strength, value) / 1e3));
    figures.insert("design_min".into(), json!(combinations.least(Rule::Strength, value) / 1e3));
    figures.insert("uplift_max".into(), json!(building.uplift(beam, bearing) / 1e3));
    figures.insert("characteristic_max".into(), json!(combinations.greatest(Rule::Characteristic, value) / 1e3));
    let (on, lands) = match &typed.on {
        Support::Wall(name) => (name.clone(), Value::Null),
        Support::Beam(carrier, lands) => (building.job.beams[*carrier].mark.clone(), json!(lands)),
    };
    json!({"on": on, "at_m": typed.at, "lands_m": lands, "reaction_kN": figures})
}

/// Inherited and settled movement in the combinations that give the stacked movement at a place; m.
pub fn inherited_and_settled(building: &Building, beam: usize, stacked: (f64, f64)) -> Vec<(f64, f64)> {
    let (size, x) = stacked;
    let mut found = Vec::new();
    for sample in building.samples_at(beam, x) {
        let scale: f64 = sample.movement.iter().map(|movement| movement.abs()).sum();
        let value = |index: usize| sample.movement[index];
        let sign = if size >= 0.0 { 1.0 } else { -1.0 };
        for factors in building.combinations.characteristic_factors(sign, 1e-9 * scale, value) {
            let inherited: f64 = factors.iter().zip(&sample.chord).map(|(factor, chord)| factor * chord).sum();
            found.push((inherited, sample.settled));
        }
    }
    found
}
