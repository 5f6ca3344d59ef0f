//! Calculated buildings to draw.

use sagledger_calc::actions::{Category, Choices, StrengthRule};
use sagledger_calc::building::{
    Basis, Beam, Bearing, Building, Carrier, Direct, EndRestraint, FlangeHold, Joint, Load, LoadHeight, LoadRow,
    Origin, Restraint, Stage, Wall, WindCase,
};
use sagledger_calc::limits::{LimitSet, LimitTable, in_force};
use sagledger_calc::materials::Grade;
use sagledger_calc::quantity::{Force, Length, LineLoad};
use sagledger_calc::results::Results;
use sagledger_calc::sections;

use super::random::Random;

/// What a bearing stands on, by name.
#[derive(Clone)]
pub enum On {
    Wall(&'static str),
    /// Mark and place, m.
    Beam(String, f64),
}

pub fn on(mark: &str, lands: f64) -> On {
    On::Beam(mark.to_string(), lands)
}

#[derive(Clone)]
pub struct Spec {
    pub mark: String,
    pub section: &'static str,
    pub length: f64,
    pub bearings: Vec<(f64, On)>,
    /// Permanent and imposed, kN/m, over the whole length; the name of the row.
    pub load: (&'static str, f64, f64),
    /// Place, permanent and imposed, kN.
    pub points: Vec<(f64, f64, f64)>,
}

pub fn spec(mark: &str, section: &'static str, length: f64, bearings: Vec<(f64, On)>) -> Spec {
    Spec { mark: mark.to_string(), section, length, bearings, load: ("floor", 2.4, 4.1), points: vec![] }
}

pub fn building(specs: &[Spec]) -> Building {
    let mut walls: Vec<Wall> = Vec::new();
    for (_, on) in specs.iter().flat_map(|s| &s.bearings) {
        if let On::Wall(name) = on
            && !walls.iter().any(|w| w.name == *name)
        {
            walls.push(Wall { name: name.to_string(), origin: Origin(0) });
        }
    }
    let carrier = |on: &On| match on {
        On::Wall(name) => Carrier::Wall(walls.iter().position(|w| w.name == *name).unwrap()),
        On::Beam(mark, lands) => {
            Carrier::Beam { beam: specs.iter().position(|s| s.mark == *mark).unwrap(), lands: Length::m(*lands) }
        }
    };
    let bearing = |(at, on): &(f64, On)| Bearing {
        on: carrier(on),
        at: Length::m(*at),
        bearing_length: matches!(on, On::Wall(_)).then(|| Length::mm(150.0)),
        bearing_length_defaulted: false,
        joint: Joint::OnTopFlange,
        joint_defaulted: false,
        end_restraint: EndRestraint::Fork,
        end_restraint_defaulted: false,
        held_down: None,
        settles: Length::m(0.0),
        offset: Length::m(0.0),
        origin: Origin(0),
    };
    let row = |what: &str, load: Load| LoadRow {
        what: what.to_string(),
        stage: Stage::After,
        stage_defaulted: false,
        height: LoadHeight::TopFlange,
        offset: Length::m(0.0),
        load,
        wind_case: WindCase::default(),
        origin: Origin(0),
    };
    let table = LimitTable { set: Some(LimitSet::BrittleFinish), ..LimitTable::default() };
    let beams = specs.iter().map(|s| {
        let (what, permanent, imposed) = s.load;
        let mut loads = Vec::new();
        if permanent > 0.0 {
            let direct = Direct {
                permanent: Some(LineLoad::kn_per_m(permanent)),
                imposed: (imposed > 0.0).then(|| (Category::A, LineLoad::kn_per_m(imposed))),
                ..Direct::default()
            };
            loads.push(row(what, Load::Line { direct, from: Length::m(0.0), to: Length::m(s.length) }));
        }
        for (at, permanent, imposed) in &s.points {
            let direct = Direct {
                permanent: Some(Force::kn(*permanent)),
                imposed: (*imposed > 0.0).then(|| (Category::A, Force::kn(*imposed))),
                ..Direct::default()
            };
            loads.push(row("post above", Load::Point { direct, at: Length::m(*at) }));
        }
        Beam {
            mark: s.mark.clone(),
            title: None,
            section: *sections::find(s.section).unwrap(),
            grade: Grade::S355,
            grade_defaulted: false,
            existing: false,
            length: Length::m(s.length),
            bearings: s.bearings.iter().map(bearing).collect(),
            restraint: Restraint { top: FlangeHold::Continuous, bottom: FlangeHold::Ends, by: None },
            restraint_defaulted: false,
            load_height: LoadHeight::TopFlange,
            loads,
            limits: in_force(&table, &LimitTable::default()),
            origin: Origin(0),
        }
    });
    let beams = beams.collect();
    Building {
        basis: Basis {
            choices: Choices::Uk,
            rule: StrengthRule::Single,
            shear_flexibility: false,
            choices_defaulted: false,
            rule_defaulted: false,
        },
        build_ups: vec![],
        beams,
        walls,
    }
}

pub fn solved(specs: &[Spec]) -> (Building, Results) {
    let building = building(specs);
    let results = sagledger_calc::calculate(&building).unwrap();
    (building, results)
}

/// Three deep, landings off the middle.
pub fn three_deep() -> Vec<Spec> {
    vec![
        spec("R1", "203x133x25 UB", 4.9, vec![(0.0, On::Wall("mill gable")), (4.9, on("T1", 1.7))]),
        spec("T1", "254x146x31 UB", 4.3, vec![(0.0, On::Wall("stair wall")), (4.3, on("T2", 3.1))]),
        spec("T2", "305x165x46 UB", 5.8, vec![(0.0, On::Wall("river wall")), (5.8, On::Wall("lane wall"))]),
    ]
}

/// Joists between two girders that stand on walls: landings on both, which one flat layout cannot align.
pub fn grid() -> Vec<Spec> {
    let mut list: Vec<Spec> = (0..4)
        .map(|n| {
            let lands = 0.9 + 1.3 * f64::from(n);
            spec(&format!("J{}", n + 1), "203x133x25 UB", 3.8, vec![(0.0, on("G1", lands)), (3.8, on("G2", lands))])
        })
        .collect();
    list.push(spec("G1", "356x171x51 UB", 5.9, vec![(0.0, On::Wall("north wall")), (5.9, On::Wall("south wall"))]));
    list.push(spec("G2", "356x171x51 UB", 5.9, vec![(0.0, On::Wall("north wall")), (5.9, On::Wall("south wall"))]));
    list
}

/// Eight beams on one carrier, six from one side and two from the other.
pub fn eight_on_one() -> Vec<Spec> {
    let mut list: Vec<Spec> = (0..8)
        .map(|n| {
            let lands = 0.5 + 0.9 * f64::from(n);
            let mark = format!("S{}", n + 1);
            let ends = if n < 6 {
                vec![(0.0, on("C1", lands)), (3.1, On::Wall("yard wall"))]
            } else {
                vec![(0.0, On::Wall("orchard wall")), (3.1, on("C1", lands))]
            };
            spec(&mark, "152x89x16 UB", 3.1, ends)
        })
        .collect();
    list.push(spec("C1", "533x210x92 UB", 7.6, vec![(0.0, On::Wall("west wall")), (7.6, On::Wall("east wall"))]));
    list
}

/// A continuous beam with an overhang on another beam, and a beam that stands on the overhang's tip.
pub fn continuous() -> Vec<Spec> {
    vec![
        spec("B1", "203x133x25 UB", 3.6, vec![(0.0, On::Wall("back wall")), (3.6, on("M1", 9.3))]),
        spec(
            "M1",
            "406x178x60 UB",
            9.4,
            vec![(0.0, On::Wall("front wall")), (4.2, on("M2", 2.2)), (7.7, On::Wall("pier"))],
        ),
        spec("M2", "406x178x74 UB", 6.3, vec![(0.0, On::Wall("east pier")), (6.3, On::Wall("west pier"))]),
    ]
}

/// Marks and names of 24 characters.
pub fn long_names() -> Vec<Spec> {
    let mut list = three_deep();
    let long = ["Roof beam over the study", "Transfer beam at floor 1", "WWWWWWWWWWWWWWWWWWWWWWWW"];
    for (n, s) in list.iter_mut().enumerate() {
        s.mark = long[n].to_string();
        s.load.0 = "tank room, attic storage";
        for (_, on) in &mut s.bearings {
            match on {
                On::Wall(name) => {
                    *name = ["wall of the north stair A", "party wall beside no. 14", "MMMMMMMMMMMMMMMMMMMMMMMM"][n]
                }
                On::Beam(mark, _) => *mark = long[n + 1].to_string(),
            }
        }
    }
    list
}

/// Beams of random length on walls and on each other, later ones lower.
pub fn tangle(random: &mut Random, count: usize) -> Vec<Spec> {
    let lengths: Vec<f64> = (0..count).map(|_| random.between(1.5, 7.5)).collect();
    let walls = ["north wall", "south wall", "spine wall", "pier"];
    let mut list = Vec::new();
    for n in 0..count {
        let mut ends: Vec<f64> = vec![0.0, lengths[n]];
        if random.share() < 0.2 {
            ends.insert(1, lengths[n] * random.between(0.3, 0.7));
        }
        if random.share() < 0.2 {
            let last = ends.len() - 1;
            ends[last] *= 0.85;
        }
        let bearings = ends.into_iter().map(|at| {
            let carrier = n + 1 + random.below(6);
            if carrier < count && random.share() < 0.55 {
                let lands = lengths[carrier] * random.between(0.05, 0.95);
                (at, on(&format!("B{}", carrier + 1), lands))
            } else {
                (at, On::Wall(walls[random.below(4)]))
            }
        });
        let bearings = bearings.collect();
        list.push(spec(&format!("B{}", n + 1), "457x191x82 UB", lengths[n], bearings));
    }
    list
}
