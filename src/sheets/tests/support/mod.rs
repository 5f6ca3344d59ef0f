//! Buildings to set sheets of, with their results and the words around them. Names are invented.
#![allow(dead_code)]

use chrono::NaiveDate;
use sagledger_calc::actions::{Category, Choices, StrengthRule};
use sagledger_calc::building::*;
use sagledger_calc::limits::{LimitSet, LimitTable, in_force};
use sagledger_calc::materials::Grade;
use sagledger_calc::quantity::{AreaLoad, Force, Length, LineLoad, WeightDensity};
use sagledger_calc::results::Results;
use sagledger_calc::sections;
use sagledger_sheets::{Draft, Meta, Overrides, Package, Paper, Record};

pub fn m(metres: f64) -> Length {
    Length::m(metres)
}

pub fn wall(name: &str) -> Wall {
    Wall { name: name.into(), origin: Origin(0) }
}

/// A bearing on a wall.
pub fn on_wall(wall: usize, at: f64, seat: f64) -> Bearing {
    Bearing {
        on: Carrier::Wall(wall),
        at: m(at),
        bearing_length: Some(m(seat)),
        bearing_length_defaulted: false,
        joint: Joint::OnTopFlange,
        joint_defaulted: false,
        end_restraint: EndRestraint::Resting,
        end_restraint_defaulted: true,
        held_down: None,
        settles: m(0.0),
        offset: m(0.0),
        origin: Origin(0),
    }
}

/// A bearing on a beam.
pub fn on_beam(beam: usize, at: f64, lands: f64) -> Bearing {
    Bearing {
        on: Carrier::Beam { beam, lands: m(lands) },
        bearing_length: None,
        end_restraint: EndRestraint::BottomFlangeHeld,
        joint_defaulted: true,
        ..on_wall(0, at, 0.1)
    }
}

pub fn row(what: &str, load: Load) -> LoadRow {
    LoadRow {
        what: what.into(),
        stage: Stage::After,
        stage_defaulted: true,
        height: LoadHeight::TopFlange,
        offset: m(0.0),
        load,
        wind_case: WindCase::default(),
        origin: Origin(0),
    }
}

pub fn area(build_up: usize, width: f64, from: f64, to: f64) -> Load {
    Load::Area { build_up, width: (m(width), m(width)), from: m(from), to: m(to) }
}

pub fn beam(
    mark: &str,
    title: &str,
    section: &str,
    length: f64,
    bearings: Vec<Bearing>,
    loads: Vec<LoadRow>,
) -> Beam {
    Beam {
        mark: mark.into(),
        title: Some(title.into()),
        section: *sections::find(section).unwrap(),
        grade: Grade::S275,
        grade_defaulted: true,
        existing: false,
        length: m(length),
        bearings,
        restraint: Restraint { top: FlangeHold::Ends, bottom: FlangeHold::Ends, by: None },
        restraint_defaulted: true,
        load_height: LoadHeight::TopFlange,
        loads,
        limits: in_force(&LimitTable::default(), &LimitTable::default()),
        origin: Origin(0),
    }
}

fn held(mut beam: Beam, by: &str) -> Beam {
    beam.restraint = Restraint { top: FlangeHold::Continuous, bottom: FlangeHold::Ends, by: Some(by.into()) };
    beam.restraint_defaulted = false;
    beam
}

fn masonry(mut beam: Beam) -> Beam {
    let table = LimitTable { set: Some(LimitSet::Masonry), ..LimitTable::default() };
    beam.limits = in_force(&table, &LimitTable::default());
    beam
}

fn basis() -> Basis {
    Basis {
        choices: Choices::Uk,
        rule: StrengthRule::Single,
        shear_flexibility: false,
        choices_defaulted: true,
        rule_defaulted: true,
    }
}

fn kn_m2(load: f64) -> AreaLoad {
    AreaLoad::kn_per_m2(load)
}

pub fn build_ups() -> Vec<BuildUp> {
    let layer = |what: &str, load: f64| Layer { what: what.into(), weight: LayerWeight::Load(kn_m2(load)) };
    let thick = |what: &str, mm: f64, density: f64| Layer {
        what: what.into(),
        weight: LayerWeight::Thick { thickness: Length::mm(mm), density: WeightDensity::kn_per_m3(density) },
    };
    let build_up = |name: &str, pitch: f64, layers, imposed, snow: Option<f64>| BuildUp {
        name: name.into(),
        pitch: f64::to_radians(pitch),
        layers,
        imposed,
        snow: snow.map(kn_m2),
        wind: None,
        origin: Origin(0),
    };
    let imposed = |category, load: f64, partitions: Option<f64>| {
        Some(ImposedArea { category, load: kn_m2(load), partitions: partitions.map(kn_m2) })
    };
    vec![
        build_up(
            "tiled roof",
            35.0,
            vec![
                layer("plain tiles and battens", 0.68),
                layer("rafters and insulation", 0.24),
                thick("plasterboard and skim", 15.0, 9.0),
            ],
            imposed(Category::H, 0.6, None),
            Some(0.4),
        ),
        build_up(
            "joisted floor",
            0.0,
            vec![layer("boards, joists, ceiling", 0.62)],
            imposed(Category::A, 1.5, Some(0.5)),
            None,
        ),
        build_up("brick leaf", 0.0, vec![thick("brickwork", 102.5, 20.0), layer("plaster", 0.25)], None, None),
    ]
}

/// Three levels: a roof beam on a transfer beam on a transfer beam.
pub fn three_deep() -> Building {
    let gable = Load::Wall { build_up: 2, height: (m(2.4), m(0.3)), from: m(0.0), to: m(3.1) };
    let chimney = Direct { permanent: Some(Force::kn(6.5)), ..Direct::default() };
    let parapet = Direct { permanent: Some(LineLoad::kn_per_m(1.2)), ..Direct::default() };
    Building {
        basis: basis(),
        build_ups: build_ups(),
        walls: vec![wall("street wall"), wall("party wall"), wall("garden wall"), wall("stair wall")],
        beams: vec![
            held(
                beam(
                    "R1",
                    "Purlin beam at the ridge",
                    "203x133x30 UB",
                    4.9,
                    vec![on_wall(0, 0.0, 0.15), on_beam(1, 4.9, 1.85)],
                    vec![row("roof, both slopes", area(0, 3.1, 0.0, 4.9))],
                ),
                "the rafters, strapped to a bolted plate,",
            ),
            masonry(held(
                beam(
                    "T1",
                    "Transfer beam at the attic floor",
                    "254x146x43 UB",
                    4.4,
                    vec![on_wall(1, 0.0, 0.2), on_beam(2, 4.4, 2.35)],
                    vec![
                        row("attic floor", area(1, 1.7, 0.0, 4.4)),
                        row("gable above", gable),
                        row("parapet", Load::Line { direct: parapet, from: m(3.1), to: m(4.4) }),
                    ],
                ),
                "joists nailed to a bolted plate",
            )),
            beam(
                "T2",
                "Transfer beam at the first floor",
                "356x171x57 UB",
                5.8,
                vec![on_wall(2, 0.0, 0.2), on_wall(3, 5.8, 0.2)],
                vec![
                    row("first floor", area(1, 2.2, 0.0, 5.8)),
                    row("chimney on its gather", Load::Point { direct: chimney, at: m(4.15) }),
                ],
            ),
        ],
    }
}

/// One beam that is held along its length: everything can be met.
pub fn single() -> Building {
    Building {
        basis: basis(),
        build_ups: vec![build_ups()[1].clone()],
        walls: vec![wall("left pier"), wall("right pier")],
        beams: vec![held(
            beam(
                "L1",
                "Lintel over the kitchen opening",
                "203x133x25 UB",
                3.35,
                vec![on_wall(0, 0.0, 0.1), on_wall(1, 3.35, 0.1)],
                vec![row("bedroom floor", area(0, 2.4, 0.0, 3.35))],
            ),
            "the floor joists",
        )],
    }
}

/// Twelve beams with long names, two bays of two chains, overhangs, continuous beams, uplift, wind.
pub fn twelve() -> Building {
    let mut building = Building {
        basis: Basis { rule: StrengthRule::Pair, rule_defaulted: false, ..basis() },
        build_ups: build_ups(),
        walls: vec![wall("north-west gable wall 12"), wall("W2"), wall("spine"), wall("garden room outer leaf")],
        beams: vec![],
    };
    let wind = Direct { wind: Some(LineLoad::kn_per_m(-1.1)), ..Direct::default() };
    for n in 0..4usize {
        let base = 3 * n;
        let name = |level: &str| format!("MEZZANINE-{level}-{n}-GRID-{n}-X");
        let mut top = beam(
            &name("R"),
            "Upper cross beam between the two frames of the hall",
            "152x89x16 UB",
            3.6 + 0.3 * n as f64,
            vec![on_wall(0, 0.0, 0.1), on_beam(base + 1, 3.6 + 0.3 * n as f64, 1.2 + 0.35 * n as f64)],
            vec![
                row("roof over the upper hall and its lantern", area(0, 1.6, 0.0, 3.6 + 0.3 * n as f64)),
                row("wind on the lantern", Load::Line { direct: wind, from: m(0.5), to: m(2.5) }),
            ],
        );
        top.loads[1].wind_case = WindCase("from the west".into());
        let middle = beam(
            &name("M"),
            "Middle beam, continuous over the spine",
            "254x102x28 UB",
            6.8,
            vec![on_wall(1, 0.0, 0.15), on_wall(2, 3.0, 0.2), on_beam(base + 2, 5.9, 2.0 + 0.25 * n as f64)],
            vec![row("hall floor", area(1, 1.9, 0.0, 6.8))],
        );
        let low = beam(
            &name("G"),
            "Lower beam",
            "305x165x46 UB",
            6.2,
            vec![on_wall(2, 0.0, 0.2), on_wall(3, 6.2, 0.2)],
            vec![row("ground floor", area(1, 1.4, 0.0, 6.2))],
        );
        building.beams.extend([top, middle, low]);
    }
    building
}

pub const JOB: &str = include_str!("job.toml");

pub fn meta(number: &str, title: &str) -> Meta {
    Meta {
        number: number.into(),
        title: title.into(),
        site: Some("Upper Sluice Lane, Wexholm".into()),
        client: Some("Private client".into()),
        practice: Some("Fennimore and Oake Structures".into()),
        engineer: Some("A. Nyberg".into()),
        checker: Some("J. Castellan".into()),
        date: NaiveDate::from_ymd_opt(2027, 3, 9).unwrap(),
        drawings: vec!["21-104 rev B".into(), "21-110 rev A".into()],
        accent: Some([0x1f, 0x3b, 0x57]),
        logo: None,
        lang: "en-GB".into(),
        drawing_sheets: Paper::A4,
    }
}

pub fn record() -> Record {
    Record {
        program_version: "0.1.0".into(),
        program_identity: "5d0c".repeat(16),
        catalogue_version: "1".into(),
        job_sha256: "a1b2".repeat(16),
        results_sha256: "c3d4".repeat(16),
        fingerprint: "9e2b77d0".into(),
    }
}

pub fn package<'a>(building: &'a Building, results: &'a Results, meta: Meta) -> Package<'a> {
    Package {
        meta,
        building,
        results,
        job_text: JOB,
        results_json: "{\"format\": 1}\n",
        record: record(),
        draft: Some(Draft { after: None }),
        templates: Overrides::default(),
    }
}
