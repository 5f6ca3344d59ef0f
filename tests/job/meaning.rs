//! What good jobs mean: every key, every default, every flag.
//!
//! Expected values are the decimals of the job files themselves, turned into f64 by the compiler.

use std::fs;

use chrono::NaiveDate;
use sagledger::job::{Job, Lang, Paper, keys};
use sagledger_calc::actions::{Category, Choices, StrengthRule};
use sagledger_calc::building::{
    Carrier, EndRestraint, FlangeHold, Joint, LayerWeight, Load, LoadHeight, Stage, WindCase,
};
use sagledger_calc::fault::{Fault, LoopStep};
use sagledger_calc::limits::{Bound, LimitFrom, LimitSet, Movement};
use sagledger_calc::materials::Grade;
use sagledger_calc::quantity::Length;

use super::{folder, names, read};

fn good(name: &str) -> Job {
    let reading = read(fs::read(folder("jobs").join(name)).unwrap());
    assert!(names(&reading).is_empty(), "{}", super::shown(&reading));
    reading.job.unwrap()
}

/// A job of one line of text, with lines of one beam replaced.
fn small(lines: &[(&str, &str)]) -> Job {
    let mut text = fs::read_to_string(folder("jobs").join("smallest.toml")).unwrap();
    for (old, new) in lines {
        assert!(text.contains(old), "{old}");
        text = text.replacen(old, new, 1);
    }
    let reading = read(&text);
    reading.job.unwrap_or_else(|| panic!("{:?}", reading.findings))
}

fn m(si: f64) -> Length {
    Length::from_si(si)
}

#[test]
fn what_a_job_says_of_itself() {
    let meta = good("every-key.toml").meta;
    assert_eq!(meta.number, "4410-B");
    assert_eq!(meta.title, "Weaving mill to workshops");
    assert_eq!(meta.site.as_deref(), Some("Fuller's Yard, Harrowdene"));
    assert_eq!(meta.client.as_deref(), Some("The mill's owners"));
    assert_eq!(meta.practice.as_deref(), Some("Underhill & Marsh"));
    assert_eq!((meta.engineer.as_deref(), meta.checker.as_deref()), (Some("P. Ostrow"), Some("L. Quennell")));
    assert_eq!(meta.date, NaiveDate::from_ymd_opt(2028, 2, 29).unwrap());
    let logo = meta.logo.unwrap();
    assert_eq!((logo.path.as_str(), logo.picture), ("marks/mill.png", None));
    assert_eq!(meta.drawings, ["W-201 rev A", "W-204"]);
    assert_eq!(meta.accent.as_deref(), Some("#7a2e1f"));
    assert_eq!(meta.drawing_sheets, Paper::A3);
    assert_eq!(meta.lang, Lang { language: "en".into(), region: None });
}

#[test]
fn what_is_not_said_takes_its_default() {
    let job = good("smallest.toml");
    let meta = job.meta;
    assert_eq!(
        (meta.site, meta.client, meta.practice, meta.engineer, meta.checker),
        (None, None, None, None, None)
    );
    assert_eq!((meta.logo, meta.accent, meta.drawing_sheets, meta.lang), (None, None, Paper::A4, Lang::default()));
    assert!(meta.drawings.is_empty());
    let basis = job.building.basis;
    assert_eq!((basis.choices, basis.choices_defaulted), (Choices::Uk, true));
    assert_eq!((basis.rule, basis.rule_defaulted), (StrengthRule::Single, true));
    assert!(!basis.shear_flexibility);
    let beam = &job.building.beams[0];
    assert_eq!((beam.grade, beam.grade_defaulted, beam.existing), (Grade::S275, true, false));
    assert_eq!((&beam.restraint.top, &beam.restraint.bottom), (&FlangeHold::Ends, &FlangeHold::Ends));
    assert!(beam.restraint_defaulted && beam.title.is_none() && beam.loads.is_empty());
    assert_eq!(beam.load_height, LoadHeight::TopFlange);
    assert!(beam.limits.defaulted);
    let [first, last] = beam.bearings.as_slice() else { panic!() };
    assert_eq!((first.at, last.at), (m(0.0), m(2.1)));
    for bearing in [first, last] {
        assert_eq!(bearing.on, Carrier::Wall(0));
        assert_eq!((bearing.bearing_length, bearing.bearing_length_defaulted), (Some(m(0.1)), true));
        assert_eq!((bearing.end_restraint, bearing.end_restraint_defaulted), (EndRestraint::Resting, true));
        assert!(!bearing.joint_defaulted && bearing.held_down.is_none());
        assert_eq!((bearing.settles, bearing.offset), (m(0.0), m(0.0)));
    }
}

#[test]
fn basis_and_build_ups() {
    let building = good("every-key.toml").building;
    assert_eq!((building.basis.choices, building.basis.rule), (Choices::Recommended, StrengthRule::Pair));
    assert!(building.basis.shear_flexibility);
    assert!(!building.basis.choices_defaulted && !building.basis.rule_defaulted);
    let [lights, floor, parapet] = building.build_ups.as_slice() else { panic!() };
    assert_eq!((lights.name.as_str(), lights.pitch), ("north lights", 32.5f64.to_radians()));
    assert_eq!(lights.layers[0].what, "patent glazing");
    assert!(matches!(lights.layers[0].weight, LayerWeight::Load(load) if load.si() == 380.0));
    assert!(matches!(lights.layers[1].weight, LayerWeight::Thick { thickness, density }
        if thickness.si() == 0.022 && density.si() == 6500.0));
    let imposed = lights.imposed.unwrap();
    assert_eq!((imposed.category, imposed.load.si(), imposed.partitions), (Category::H, 550.0, None));
    assert_eq!((lights.snow.unwrap().si(), lights.wind.unwrap().si()), (480.0, -720.0));
    let imposed = floor.imposed.unwrap();
    assert_eq!((imposed.category, imposed.load.si()), (Category::E, 7500.0));
    assert_eq!(imposed.partitions.unwrap().si(), 800.0);
    assert_eq!((floor.pitch, floor.snow, floor.wind), (0.0, None, None));
    assert!(matches!(parapet.layers[0].weight, LayerWeight::Thick { thickness, .. } if thickness.si() == 0.3275));
    let walls: Vec<&str> = building.walls.iter().map(|wall| wall.name.as_str()).collect();
    assert_eq!(walls, ["race wall", "engine house"]);
}

#[test]
fn beams_and_bearings() {
    let building = good("every-key.toml").building;
    let [valley, transfer] = building.beams.as_slice() else { panic!() };
    assert_eq!((valley.mark.as_str(), valley.title.as_deref()), ("K1", Some("Valley beam")));
    assert_eq!(valley.section.name, "457x191x67 UB");
    assert_eq!((valley.grade, valley.grade_defaulted, valley.existing), (Grade::S235, false, true));
    assert_eq!((transfer.grade, transfer.grade_defaulted, transfer.existing), (Grade::S355, false, false));
    assert_eq!((valley.length, transfer.length), (m(9.3), m(5.15)));
    let [wall, beam, last] = valley.bearings.as_slice() else { panic!() };
    assert_eq!((wall.on, wall.at), (Carrier::Wall(0), m(0.0)));
    assert_eq!((wall.bearing_length, wall.bearing_length_defaulted), (Some(m(0.215)), false));
    assert_eq!((wall.end_restraint, wall.end_restraint_defaulted), (EndRestraint::Fork, false));
    assert_eq!((wall.held_down.unwrap().si(), wall.settles), (12_500.0, m(0.003)));
    assert_eq!((beam.on, beam.at), (Carrier::Beam { beam: 1, lands: m(2.05) }, m(4.15)));
    assert_eq!((beam.joint, beam.joint_defaulted, beam.offset), (Joint::ToTheWeb, false, m(0.045)));
    assert_eq!((beam.end_restraint, beam.bearing_length), (EndRestraint::Resting, None));
    assert_eq!((last.on, last.at), (Carrier::Wall(1), m(8.7)));
    assert_eq!(last.end_restraint, EndRestraint::BottomFlangeHeld);
    assert_eq!(valley.restraint.top, FlangeHold::At(vec![m(1.5), m(3.0)]));
    assert_eq!(valley.restraint.bottom, FlangeHold::Continuous);
    assert_eq!(valley.restraint.by.as_deref(), Some("purlins, cleated"));
    assert!(!valley.restraint_defaulted && !transfer.restraint_defaulted);
    assert_eq!((valley.load_height, transfer.load_height), (LoadHeight::ShearCentre, LoadHeight::TopFlange));
}

#[test]
fn bearings_on_beams_take_their_defaults() {
    let building = good("odd-but-right.toml").building;
    for (bearing, lands) in building.beams[1].bearings.iter().zip([0.1, 0.0]) {
        assert_eq!(bearing.on, Carrier::Beam { beam: 0, lands: m(lands) });
        assert_eq!((bearing.joint, bearing.joint_defaulted), (Joint::OnTopFlange, true));
        assert_eq!(
            (bearing.end_restraint, bearing.end_restraint_defaulted),
            (EndRestraint::BottomFlangeHeld, true)
        );
        assert_eq!((bearing.bearing_length, bearing.bearing_length_defaulted), (None, false));
    }
}

#[test]
fn rows_of_loads() {
    let building = good("every-key.toml").building;
    let [lights, parapet, gutter, hanger] = building.beams[0].loads.as_slice() else { panic!() };
    assert_eq!(
        (lights.what.as_str(), lights.stage, lights.stage_defaulted),
        ("north lights, both sides", Stage::Before, false)
    );
    assert_eq!((lights.height, &lights.wind_case), (LoadHeight::ShearCentre, &WindCase("from the race".into())));
    assert!(matches!(lights.load, Load::Area { build_up: 0, width, from, to }
        if width == (m(2.6), m(0.0)) && from == m(0.45) && to == m(8.7)));
    assert_eq!((parapet.stage, parapet.stage_defaulted), (Stage::After, true));
    assert!(matches!(parapet.load, Load::Wall { build_up: 2, height, from, to }
        if height == (m(1.05), m(1.05)) && from == m(0.0) && to == m(3.0)));
    assert_eq!((gutter.offset, &gutter.wind_case), (m(0.06), &WindCase::default()));
    let Load::Line { direct, from, to } = &gutter.load else { panic!() };
    assert_eq!((*from, *to), (m(0.0), m(9.3)));
    assert_eq!(
        (direct.permanent.unwrap().si(), direct.snow.unwrap().si(), direct.wind.unwrap().si()),
        (350.0, 1100.0, -250.0)
    );
    assert!(matches!(direct.imposed, Some((Category::C, load)) if load.si() == 900.0));
    assert_eq!(hanger.height, LoadHeight::BottomFlange);
    let Load::Point { direct, at } = &hanger.load else { panic!() };
    assert_eq!(*at, m(6.2));
    assert_eq!(
        (direct.permanent.unwrap().si(), direct.snow.unwrap().si(), direct.wind.unwrap().si()),
        (2750.0, 0.0, 400.0)
    );
    assert!(matches!(direct.imposed, Some((Category::G, load)) if load.si() == 3200.0));
}

/// The order of engineering.md: the beam's own single limits, its set, the job's single limits, the job's set.
#[test]
fn limits_in_force() {
    let building = good("every-key.toml").building;
    let [valley, transfer] = building.beams.as_slice() else { panic!() };
    let of = |beam: &sagledger_calc::building::Beam, movement| beam.limits.of(movement).cloned().unwrap();
    let given = LimitFrom::Given { reason: Some("looms stand level".into()) };
    assert_eq!(of(valley, Movement::Tilt).bounds, [Bound::OneIn(600.0)]);
    assert_eq!(of(valley, Movement::Tilt).from, LimitFrom::Given { reason: None });
    assert_eq!(of(valley, Movement::After).from, LimitFrom::Set(LimitSet::GlazedDoors));
    assert_eq!(
        (of(valley, Movement::Total).bounds, of(valley, Movement::Total).from),
        (vec![Bound::SpanOver(300.0)], given.clone())
    );
    assert_eq!(of(transfer, Movement::After).bounds, [Bound::Length(m(0.0095))]);
    assert_eq!(of(transfer, Movement::Variable).bounds, [Bound::SpanOver(400.0), Bound::Length(m(0.012))]);
    assert_eq!(of(transfer, Movement::Stacked).bounds, [Bound::SpanOver(250.0), Bound::Length(m(0.022))]);
    assert_eq!(of(transfer, Movement::Tilt).bounds, [Bound::OneIn(450.0)]);
    assert!(!valley.limits.defaulted && !transfer.limits.defaulted);
    let silent = good("odd-but-right.toml").building;
    assert!(silent.beams[0].limits.defaulted, "an empty table says nothing");
}

#[test]
fn odd_writing_means_the_same() {
    let job = good("odd-but-right.toml");
    assert_eq!(job.meta.title, "#panic(\"x\") $a$ *b* <c> @d [e] \\ {{ f }}");
    let building = &job.building;
    assert_eq!(building.build_ups[0].name, "straße №7");
    assert!(matches!(building.build_ups[0].layers[0].weight, LayerWeight::Load(load) if load.si() == 500.0));
    let beam = &building.beams[0];
    // 20 mm apart exactly, though 0.1 - 0.08 is less than 0.02 in f64.
    assert_eq!((beam.bearings[0].at, beam.bearings[1].at), (m(0.08), m(0.1)));
    assert!(matches!(beam.loads[0].load, Load::Wall { height, .. } if height == (m(0.0), m(0.5))));
    assert!(
        matches!(&beam.loads[1].load, Load::Point { direct, at } if *at == m(0.1) && direct.permanent.is_none())
    );
    assert!(matches!(&beam.loads[2].load, Load::Line { direct, .. } if direct.permanent.unwrap().si() == 0.0));
}

/// A BOM, line ends of either kind and tabs change nothing that is meant.
#[test]
fn bom_line_ends_and_tabs() {
    let text = fs::read_to_string(folder("jobs").join("every-key.toml")).unwrap();
    let plain = read(&text).job.unwrap();
    let other = read(format!("\u{feff}{}", text.replace('\n', "\r\n").replace("  ", "\t"))).job.unwrap();
    assert_eq!(format!("{:?}", plain.building), format!("{:?}", other.building));
    assert_eq!(plain.meta, other.meta);
    assert_eq!(other.text().chars().next(), Some('#'), "the BOM is no part of the text");
}

/// Every key of every table stands in a good job, so that none is known to the language and read by nobody.
#[test]
fn every_key_is_exercised() {
    let text = fs::read_to_string(folder("jobs").join("every-key.toml")).unwrap();
    for table in keys::TABLES {
        for (key, _) in table.now {
            let written = text.contains(&format!("{key} ")) || text.contains(&format!("{key}]"));
            assert!(written, "{} {key}", table.title);
        }
    }
}

/// Each key that a later version brings is refused by its name, wherever it belongs.
#[test]
fn every_later_key_is_refused_by_name() {
    let text = fs::read_to_string(folder("jobs").join("smallest.toml")).unwrap();
    for table in keys::TABLES {
        for key in table.later {
            let with = match table.title {
                "the job file" => format!("{key} = 1\n{text}"),
                "[[wall]]" => text.replace("name = \"gable\"", &format!("name = \"gable\"\n{key} = 1")),
                "[[beam]]" => text.replace("mark = \"L1\"", &format!("mark = \"L1\"\n{key} = 1")),
                "a bearing" => text.replacen("{ on = \"gable\" }", &format!("{{ on = \"gable\", {key} = 1 }}"), 1),
                other => panic!("{other} has later keys and no test"),
            };
            let reading = read(&with);
            assert_eq!(names(&reading), ["not-in-this-version"], "{} {key}", table.title);
            assert!(reading.findings[0].fact.starts_with(key), "{key}");
        }
    }
    for (old, new) in [
        ("\"152x89x16 UB\"", "\"150x75x18 PFC\""),
        ("\"152x89x16 UB\"", "\"ipe 240\""),
        ("\"152x89x16 UB\"", "\"HEA200\""),
        ("\"152x89x16 UB\"", "\"HE B 200\""),
        ("\"152x89x16 UB\"", "\"120×120×6.3 shs\""),
        ("\"152x89x16 UB\"", "\"RHS 180x100x8\""),
        ("\"152x89x16 UB\"", "{ choose = [\"UB\"], max-depth = \"260 mm\" }"),
        ("{ on = \"gable\" }", "{ on = \"gable\", joint = \"to its side\" }"),
    ] {
        let said = names(&read(text.replacen(old, new, 1)));
        assert!(said.contains(&"not-in-this-version") && said.len() <= 2, "{new}: {said:?}");
    }
}

#[test]
fn the_same_number_in_other_units() {
    for (typed, si) in
        [("2.10 m", 2.1), ("2100mm", 2.1), ("2.1e3 mm", 2.1), ("0.1 m", 0.1), ("60 m", 60.0), ("3.7 m", 3.7)]
    {
        let beam = &small(&[("2.10 m", typed)]).building.beams[0];
        assert_eq!((beam.length, beam.bearings[1].at), (m(si), m(si)), "{typed}");
    }
}

/// The two facts that calc can return find their lines; a loop is marked where it closes whatever bearing comes first.
#[test]
fn facts_of_calc_find_their_place() {
    let job = good("every-key.toml");
    let [valley, transfer] = job.building.beams.as_slice() else { panic!() };
    let mechanism = job.explain_fault(&Fault::Mechanism { beam: transfer.origin });
    assert_eq!(job.source().slice(mechanism.span.as_ref().unwrap()), "\"K2\"");
    let step = |mark: &str, on: &str, bearing| LoopStep { mark: mark.into(), on: on.into(), bearing };
    let one = step("K1", "K2", valley.bearings[1].origin);
    let other = step("K2", "K1", transfer.bearings[0].origin);
    let line = job.line_of(valley.bearings[1].origin).unwrap();
    for bearings in [vec![one.clone(), other.clone()], vec![other, one]] {
        let told = job.explain_fault(&Fault::CarriersLoop { bearings });
        assert_eq!(told.fact, format!("a loop: K1 on K2 ({line}), K2 on K1"));
        assert_eq!(told.remedy, "let one of the two stand on a wall or a post");
        assert_eq!(told.span, job.span_of(transfer.bearings[0].origin).cloned());
        assert_eq!(told.also, [job.span_of(valley.bearings[1].origin).cloned().unwrap()]);
    }
}

pub fn names_that_calc_says() -> Vec<&'static str> {
    let job = good("smallest.toml");
    vec![job.explain_fault(&Fault::Mechanism { beam: job.building.beams[0].origin }).name.text()]
}

/// Every part of a building knows the text that it came from.
#[test]
fn origins_point_at_the_text() {
    let job = good("every-key.toml");
    let text = |origin| job.source().slice(job.span_of(origin).unwrap()).to_string();
    let building = &job.building;
    for build_up in &building.build_ups {
        assert_eq!(text(build_up.origin), format!("{:?}", build_up.name));
    }
    for wall in &building.walls {
        assert_eq!(text(wall.origin), format!("{:?}", wall.name));
    }
    for beam in &building.beams {
        assert_eq!(text(beam.origin), format!("{:?}", beam.mark));
        for row in &beam.loads {
            assert_eq!(text(row.origin), format!("{:?}", row.what));
        }
        for bearing in &beam.bearings {
            let on = match bearing.on {
                Carrier::Wall(wall) => &building.walls[wall].name,
                Carrier::Beam { beam, .. } => &building.beams[beam].mark,
            };
            assert_eq!(text(bearing.origin), format!("{on:?}"));
        }
    }
}
