//! A beam's entry in the results file.

use sagledger_calc::actions::Actions;
use sagledger_calc::building::{Building, Carrier, Stage};
use sagledger_calc::limits::{Bound, LimitFrom, Movement};
use sagledger_calc::quantity::{Force, Length};
use sagledger_calc::results::{
    BeamResult, BearingResult, Check, CheckUnit, Effect, Place, Results, RowLoad, RowResult, StretchKind,
};
use sagledger_calc::words;
use serde::Serialize;
use serde_json::{Map, Value, json};

use super::Figure;
use super::parts::{PerAction, figures, per_action};

#[derive(Serialize)]
pub struct BeamEntry {
    mark: String,
    title: Option<String>,
    section: &'static str,
    count: u32,
    grade: &'static str,
    existing: bool,
    length_m: Figure,
    cut_length_m: Figure,
    mass_kg: Figure,
    second_moment_cm4: SecondMoment,
    stretches: Vec<StretchEntry>,
    limits: Vec<LimitEntry>,
    loads: Vec<RowEntry>,
    landings: Vec<LandingEntry>,
    bearings: Vec<BearingEntry>,
    #[serde(rename = "moment_kNm")]
    moment: Moment,
    #[serde(rename = "shear_kN")]
    shear: Shear,
    deflection_mm: Deflection,
    tilt: Figure,
    checks: Vec<CheckEntry>,
    verdict: &'static str,
}

#[derive(Serialize)]
struct SecondMoment {
    provided: Figure,
    required: Option<Figure>,
    governed_by: Option<&'static str>,
}

#[derive(Serialize)]
struct StretchEntry {
    kind: &'static str,
    from_m: Figure,
    to_m: Figure,
}

#[derive(Serialize)]
struct LimitEntry {
    movement: &'static str,
    limit: Vec<String>,
    from: String,
}

#[derive(Serialize)]
struct RowEntry {
    what: String,
    stage: &'static str,
    #[serde(flatten)]
    load: Map<String, Value>,
    area_m2: Option<Figure>,
    #[serde(rename = "total_kN")]
    total: PerAction,
}

#[derive(Serialize)]
struct LandingEntry {
    mark: String,
    at_m: Figure,
}

#[derive(Serialize)]
struct BearingEntry {
    on: String,
    at_m: Figure,
    lands_m: Option<Figure>,
    #[serde(rename = "reaction_kN")]
    reaction: Reaction,
}

#[derive(Serialize)]
struct Reaction {
    #[serde(flatten)]
    per_action: PerAction,
    design_max: Figure,
    design_min: Figure,
    uplift_max: Figure,
    characteristic_max: Figure,
}

#[derive(Serialize)]
struct Moment {
    max: Figure,
    at_m: Figure,
    min: Figure,
    min_at_m: Figure,
}

#[derive(Serialize)]
struct Shear {
    max: Figure,
    at_m: Figure,
}

#[derive(Serialize)]
struct Deflection {
    own_total: Figure,
    own_total_at_m: Figure,
    own_after: Figure,
    own_variable: Figure,
    stacked_total: Figure,
    stacked_at_m: Figure,
    own_there: Figure,
    inherited_there: Figure,
    settled_there: Figure,
    hand_rule: Figure,
    shear_movement: Figure,
}

#[derive(Serialize)]
struct CheckEntry {
    check: &'static str,
    #[serde(skip_serializing_if = "Option::is_none")]
    note: Option<&'static str>,
    clause: String,
    demand: Option<Figure>,
    capacity: Option<Figure>,
    unit: &'static str,
    utilisation: Option<Figure>,
    verdict: &'static str,
    #[serde(skip_serializing_if = "Option::is_none")]
    reason: Option<String>,
    combination: Option<String>,
    arrangement: Option<String>,
    place: Value,
    at_m: Figure,
    #[serde(skip_serializing_if = "std::ops::Not::not")]
    advice: bool,
}

impl BeamEntry {
    pub fn new(building: &Building, results: &Results, index: usize) -> BeamEntry {
        let beam = &building.beams[index];
        let result = &results.beams[index];
        let actions = &results.actions;
        let m = &result.movements;
        BeamEntry {
            mark: beam.mark.clone(),
            title: beam.title.clone(),
            section: beam.section.name,
            count: 1,
            grade: beam.grade.name(),
            existing: beam.existing,
            length_m: metres(beam.length),
            cut_length_m: metres(result.cut_length),
            mass_kg: Figure(result.mass),
            second_moment_cm4: SecondMoment {
                provided: Figure(result.second_moment.provided.to_cm4()),
                required: result.second_moment.required.map(|r| Figure(r.to_cm4())),
                governed_by: result.second_moment.governed_by.map(movement_name),
            },
            stretches: result
                .stretches
                .iter()
                .map(|s| StretchEntry { kind: kind_name(s.kind), from_m: metres(s.from), to_m: metres(s.to) })
                .collect(),
            limits: beam
                .limits
                .limits
                .iter()
                .map(|l| LimitEntry {
                    movement: movement_name(l.movement),
                    limit: l.bounds.iter().map(bound).collect(),
                    from: from_words(&l.from),
                })
                .collect(),
            loads: result.rows.iter().map(|row| row_entry(actions, row)).collect(),
            landings: result
                .landings
                .iter()
                .map(|l| LandingEntry { mark: building.beams[l.beam].mark.clone(), at_m: metres(l.at) })
                .collect(),
            bearings: result.bearings.iter().map(|b| bearing_entry(building, actions, b)).collect(),
            moment: Moment {
                max: Figure(result.moment_max.value.to_knm()),
                at_m: metres(result.moment_max.at),
                min: Figure(result.moment_min.value.to_knm()),
                min_at_m: metres(result.moment_min.at),
            },
            shear: Shear { max: Figure(result.shear.value.to_kn().abs()), at_m: metres(result.shear.at) },
            deflection_mm: Deflection {
                own_total: movement(&m.own_total),
                own_total_at_m: metres(m.own_total.at),
                own_after: movement(&m.own_after),
                own_variable: movement(&m.own_variable),
                stacked_total: movement(&m.stacked.total),
                stacked_at_m: metres(m.stacked.total.at),
                own_there: millimetres(m.stacked.own),
                inherited_there: millimetres(m.stacked.inherited),
                settled_there: millimetres(m.stacked.settled),
                hand_rule: millimetres(m.hand_rule),
                shear_movement: millimetres(result.shear_movement),
            },
            tilt: Figure(m.tilt.ratio()),
            checks: result.checks.iter().map(|c| check_entry(building, results, result, c)).collect(),
            verdict: result.verdict.word(),
        }
    }
}

fn metres(length: Length) -> Figure {
    Figure(length.to_m())
}

fn millimetres(length: Length) -> Figure {
    Figure(length.si() * 1e3)
}

fn movement(effect: &Effect<0, 1>) -> Figure {
    millimetres(effect.value)
}

fn movement_name(movement: Movement) -> &'static str {
    match movement {
        Movement::Total => "total deflection",
        Movement::After => "after deflection",
        Movement::Variable => "variable deflection",
        Movement::Stacked => "stacked deflection",
        Movement::Tilt => "tilt",
    }
}

fn kind_name(kind: StretchKind) -> &'static str {
    match kind {
        StretchKind::Span => "span",
        StretchKind::Overhang => "overhang",
        StretchKind::SeatEnd => "seat end",
    }
}

fn bound(bound: &Bound) -> String {
    match bound {
        Bound::SpanOver(n) => format!("span/{n}"),
        Bound::Length(length) => format!("{} mm", (length.si() * 1e6).round() / 1e3),
        Bound::OneIn(n) => format!("1/{n}"),
    }
}

fn from_words(from: &LimitFrom) -> String {
    match from {
        LimitFrom::Given { reason: None } => "given".into(),
        LimitFrom::Given { reason: Some(reason) } => format!("given: {reason}"),
        LimitFrom::Set(set) => set.name().into(),
        LimitFrom::SameAsTotal(of) => format!("as total: {}", from_words(of)),
    }
}

fn row_entry(actions: &Actions, row: &RowResult) -> RowEntry {
    let mut load = Map::new();
    match &row.load {
        RowLoad::Line { from, to, intensities } => {
            let side = |second: bool| {
                let list = intensities.iter().map(|(a, start, end)| (*a, if second { end } else { start }));
                figures(actions, list.map(|(a, q)| (a, q.to_kn_per_m())))
            };
            load.insert("from_m".into(), json!(metres(*from)));
            load.insert("to_m".into(), json!(metres(*to)));
            load.insert("start_kN_per_m".into(), json!(side(false)));
            load.insert("end_kN_per_m".into(), json!(side(true)));
        }
        RowLoad::Point { at, forces } => {
            load.insert("at_m".into(), json!(metres(*at)));
            load.insert("force_kN".into(), json!(per_action(actions, forces)));
        }
    }
    RowEntry {
        what: row.what.clone(),
        stage: match row.stage {
            Stage::Before => "before",
            Stage::After => "after",
        },
        load,
        area_m2: row.area.map(|a| Figure(a.to_m2())),
        total: per_action(actions, &row.totals),
    }
}

fn bearing_entry(building: &Building, actions: &Actions, bearing: &BearingResult) -> BearingEntry {
    let (on, lands_m) = match bearing.on {
        Carrier::Wall(wall) => (building.walls[wall].name.clone(), None),
        Carrier::Beam { beam, lands } => (building.beams[beam].mark.clone(), Some(metres(lands))),
    };
    let kn = |force: Force| Figure(force.to_kn());
    let reaction = Reaction {
        per_action: per_action(actions, &bearing.reactions),
        design_max: kn(bearing.design_max.value),
        design_min: kn(bearing.design_min.value),
        uplift_max: kn(bearing.uplift_max()),
        characteristic_max: kn(bearing.characteristic_max.value),
    };
    BearingEntry { on, at_m: metres(bearing.at), lands_m, reaction }
}

fn check_entry(building: &Building, results: &Results, beam: &BeamResult, check: &Check) -> CheckEntry {
    let (unit, factor) = match check.unit {
        CheckUnit::Force => ("kN", 1e-3),
        CheckUnit::Moment => ("kNm", 1e-3),
        CheckUnit::Length => ("mm", 1e3),
        CheckUnit::Ratio => ("1", 1.0),
    };
    let combination = check.combination.and_then(|id| results.combinations.get(id));
    let arrangement = check.arrangement.as_ref().map(|a| words::arrangement(building, results, a));
    CheckEntry {
        check: check.kind.name(),
        note: check.note,
        clause: check.clause.clone(),
        demand: check.demand.map(|d| Figure(d * factor)),
        capacity: check.capacity.map(|c| Figure(c * factor)),
        unit,
        utilisation: check.utilisation.map(Figure),
        verdict: check.verdict.word(),
        reason: check.reason.clone(),
        combination: combination.map(|c| c.name(&results.actions)),
        arrangement: arrangement.filter(|words| !words.is_empty()),
        place: place(building, beam, &check.place),
        at_m: metres(check.at),
        advice: check.advice,
    }
}

fn place(building: &Building, beam: &BeamResult, place: &Place) -> Value {
    match *place {
        Place::Point { at } => json!({ "kind": "point", "at_m": metres(at) }),
        Place::Segment { from, to } => json!({ "kind": "segment", "from_m": metres(from), "to_m": metres(to) }),
        Place::Stretch { index } => match beam.stretches.get(index) {
            Some(s) => json!({ "kind": kind_name(s.kind), "from_m": metres(s.from), "to_m": metres(s.to) }),
            None => Value::Null,
        },
        Place::Bearing { index } => match beam.bearings.get(index) {
            Some(b) => {
                let on = match b.on {
                    Carrier::Wall(wall) => &building.walls[wall].name,
                    Carrier::Beam { beam, .. } => &building.beams[beam].mark,
                };
                json!({ "kind": "bearing", "on": on, "at_m": metres(b.at) })
            }
            None => Value::Null,
        },
        Place::Landing { index } => match beam.landings.get(index) {
            Some(l) => json!({ "kind": "landing", "of": building.beams[l.beam].mark, "at_m": metres(l.at) }),
            None => Value::Null,
        },
        Place::Load { row } => match beam.rows.get(row) {
            Some(r) => json!({ "kind": "load", "what": r.what }),
            None => Value::Null,
        },
    }
}
