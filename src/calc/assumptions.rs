//! What the calculation took for granted: every default that was taken and every simplification that it rests on.
//! Numbered in the order of [`assumptions`]; one line a kind, naming the marks that rely on it.

use crate::actions::{Action, Actions, Category};
use crate::building::{Building, Carrier, FlangeHold, Joint, Stage};
use crate::limits::Movement;

#[derive(Clone, Debug, PartialEq)]
pub struct Assumption {
    pub kind: AssumptionKind,
    /// Marks of the beams that rely on it; empty where the whole job does.
    pub marks: Vec<String>,
    /// One or two sentences, as printed.
    pub sentence: String,
}

#[derive(Clone, Debug, PartialEq)]
pub enum AssumptionKind {
    AsDrawn,
    ChoicesDefaulted,
    RuleDefaulted,
    GradeDefaulted,
    SteelQuality,
    LimitsDefaulted,
    NoLimit(Movement),
    ImposedArrangement,
    HWithoutSnowAndWind,
    OwnWeightBefore,
    StageDefaulted,
    FlangeHeld,
    RestraintDefaulted,
    EndRestraintDefaulted,
    BearingLengthDefaulted,
    JointDefaulted,
    InPlaneOfWeb,
    RigidWalls,
    ShearNotIncluded,
}

/// The assumptions of a building, in a fixed order.
pub fn assumptions(building: &Building, actions: &Actions) -> Vec<Assumption> {
    let mut list = Vec::new();
    let mut say = |kind, marks: Vec<String>, sentence: String| list.push(Assumption { kind, marks, sentence });
    let marks = |chosen: &dyn Fn(&crate::building::Beam) -> bool| -> Vec<String> {
        building.beams.iter().filter(|b| chosen(b)).map(|b| b.mark.clone()).collect()
    };

    say(
        AssumptionKind::AsDrawn,
        vec![],
        "Sizes, spans, supports and loads are as the job file gives them; the building stands as it is described there."
            .into(),
    );
    if building.basis.choices_defaulted {
        say(
            AssumptionKind::ChoicesDefaulted,
            vec![],
            "The UK National Annexes apply; nothing else was asked for.".into(),
        );
    }
    if building.basis.rule_defaulted {
        say(
            AssumptionKind::RuleDefaulted,
            vec![],
            "Strength is combined by expression (6.10); nothing else was asked for.".into(),
        );
    }
    let grade = marks(&|b| b.grade_defaulted);
    if !grade.is_empty() {
        say(
            AssumptionKind::GradeDefaulted,
            grade,
            "Open sections are in grade S275, since no grade was given.".into(),
        );
    }
    let new = marks(&|b| !b.existing);
    if !new.is_empty() {
        say(
            AssumptionKind::SteelQuality,
            new,
            "Steel is of sub-grade JR (S460: N), fabricated and erected to execution class EXC2 of EN 1090-2."
                .into(),
        );
    }
    let limits = marks(&|b| b.limits.defaulted);
    if !limits.is_empty() {
        say(
            AssumptionKind::LimitsDefaulted,
            limits,
            "Movements are limited as for brittle finishes, since no limits were given.".into(),
        );
    }
    for (movement, words) in [
        (Movement::Total, "The total deflection has no limit."),
        (Movement::After, "The deflection after what could crack is there has no limit of its own."),
        (Movement::Variable, "The deflection under variable actions alone has no limit."),
        (Movement::Stacked, "The stacked deflection has no limit."),
        (Movement::Tilt, "The tilt between neighbouring bearings has no limit; it is reported."),
    ] {
        let unlimited = marks(&|b| !b.limits.limits.iter().any(|l| l.movement == movement));
        if !unlimited.is_empty() {
            say(AssumptionKind::NoLimit(movement), unlimited, words.into());
        }
    }
    let imposed = |a: &Action| matches!(a, Action::Imposed(_));
    if actions.present.iter().any(imposed) {
        say(
            AssumptionKind::ImposedArrangement,
            vec![],
            "Imposed loads stand wherever they make an effect worse; no reduction is taken for area or storeys, and the \
             concentrated load Q_k is not looked at."
                .into(),
        );
    }
    let has_h = actions.present.contains(&Action::Imposed(Category::H));
    let has_weather = actions.present.iter().any(|a| matches!(a, Action::Snow | Action::Wind(_)));
    if has_h && has_weather {
        say(
            AssumptionKind::HWithoutSnowAndWind,
            vec![],
            "The imposed load of category H never acts together with snow or wind.".into(),
        );
    }
    let after = marks(&|b| b.limits.limits.iter().any(|l| l.movement == Movement::After));
    if !after.is_empty() {
        say(
            AssumptionKind::OwnWeightBefore,
            after,
            "The steel's own weight is there before what could crack is built, and so are the loads of stage \u{201c}before\u{201d}."
                .into(),
        );
    }
    let staged = marks(&|b| {
        b.limits.limits.iter().any(|l| l.movement == Movement::After)
            && b.loads.iter().any(|r| r.stage_defaulted && r.stage == Stage::After)
    });
    if !staged.is_empty() {
        say(
            AssumptionKind::StageDefaulted,
            staged,
            "Loads whose stage was not given come after what could crack is there.".into(),
        );
    }
    for beam in &building.beams {
        let side = match (&beam.restraint.top, &beam.restraint.bottom) {
            (FlangeHold::Continuous, FlangeHold::Continuous) => "both flanges",
            (FlangeHold::Continuous, _) => "the top flange",
            (_, FlangeHold::Continuous) => "the bottom flange",
            _ => continue,
        };
        let (is, mark) = (if side == "both flanges" { "are" } else { "is" }, &beam.mark);
        let held = format!("On {mark}, {side} {is} held along the whole length");
        let sentence = match &beam.restraint.by {
            Some(by) => format!("{held} by {by}."),
            None => format!("{held}."),
        };
        say(AssumptionKind::FlangeHeld, vec![beam.mark.clone()], sentence);
    }
    let free = marks(&|b| b.restraint_defaulted);
    if !free.is_empty() {
        say(
            AssumptionKind::RestraintDefaulted,
            free,
            "Flanges are held at the bearings only, since no other restraint was given.".into(),
        );
    }
    let bearing = |chosen: &dyn Fn(&crate::building::Bearing) -> bool| marks(&|b| b.bearings.iter().any(chosen));
    let ends = bearing(&|b| b.end_restraint_defaulted);
    if !ends.is_empty() {
        say(
            AssumptionKind::EndRestraintDefaulted,
            ends,
            "Ends on walls rest on their seats; ends on beams have their bottom flange held.".into(),
        );
    }
    let seats = bearing(&|b| b.bearing_length_defaulted && matches!(b.on, Carrier::Wall(_)));
    if !seats.is_empty() {
        say(
            AssumptionKind::BearingLengthDefaulted,
            seats,
            "Seats on walls are 100 mm long where no length was given.".into(),
        );
    }
    let joints =
        bearing(&|b| b.joint_defaulted && b.joint == Joint::OnTopFlange && matches!(b.on, Carrier::Beam { .. }));
    if !joints.is_empty() {
        say(
            AssumptionKind::JointDefaulted,
            joints,
            "Beams that land on beams sit on the top flange where no joint was given.".into(),
        );
    }
    say(AssumptionKind::InPlaneOfWeb, vec![], "Loads act in the plane of the webs.".into());
    say(
        AssumptionKind::RigidWalls,
        vec![],
        "Walls do not move, except where a bearing says that it settles.".into(),
    );
    if !building.basis.shear_flexibility {
        say(
            AssumptionKind::ShearNotIncluded,
            vec![],
            "Movements are those of bending alone; each member\u{2019}s sheet says what shear would add.".into(),
        );
    }
    list
}
