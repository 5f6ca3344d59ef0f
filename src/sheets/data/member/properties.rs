//! The section's properties, and what stiffness the limits ask for.

use sagledger_calc::building::Beam;
use sagledger_calc::checks::places;
use sagledger_calc::checks::{Class, Steel, class_in_bending};
use sagledger_calc::materials::yield_strength;
use sagledger_calc::results::BeamResult;
use sagledger_calc::workings::decimal::three_figures;
use sagledger_calc::workings::unit::Unit;
use serde::Serialize;

use crate::data::text::{Runs, symbol, words};
use crate::data::view::View;

#[derive(Debug, Serialize)]
pub(super) struct Properties {
    rows: Vec<Row>,
    /// Under the table.
    note: Option<Runs>,
    /// In the outer column, paragraph by paragraph.
    beside: Vec<Runs>,
}

#[derive(Debug, Serialize)]
struct Row {
    what: Runs,
    value: String,
    unit: &'static str,
}

pub(super) fn properties(view: View, beam: &Beam, result: &BeamResult) -> Properties {
    let s = &beam.section;
    let row = |what: &str, sym: &'static str, si: f64, unit: Unit| Row {
        what: if sym.is_empty() { vec![words(what)] } else { vec![words(format!("{what} ")), symbol(sym)] },
        value: three_figures(si, unit),
        unit: unit.name(),
    };
    let steel = Steel { section: *s, grade: beam.grade, choices: view.building.basis.choices };
    let f_y = yield_strength(beam.grade, s.thickest());
    let second = &result.second_moment;
    let mut rows = vec![
        row("depth over width", "", s.h.si() / s.b.si(), Unit::One),
        Row { what: vec![words("mass")], value: three_figures(s.mass, Unit::One), unit: "kg/m" },
        row("area", "A", s.area.si(), Unit::Cm2),
        row("shear area", "A_v", s.a_v.si(), Unit::Cm2),
        row("second moment", "I_y", s.i_y.si(), Unit::Cm4),
        row("second moment", "I_z", s.i_z.si(), Unit::Cm4),
        row("elastic modulus", "W_el,y", s.w_el_y.si(), Unit::Cm3),
        row("plastic modulus", "W_pl,y", s.w_pl_y.si(), Unit::Cm3),
        row("torsion constant", "I_T", s.i_t.si(), Unit::Cm4),
        row("warping constant", "I_w", s.i_w.si(), Unit::Dm6),
        Row { what: vec![words("class in bending")], value: class(&steel).into(), unit: "" },
    ];
    if let Some(f_y) = f_y {
        rows.push(row("yield strength", "f_y", f_y.si(), Unit::NPerMm2));
    }
    if let Some(required) = second.required {
        rows.push(Row {
            what: vec![symbol("I_y"), words(" required")],
            value: three_figures(required.si(), Unit::Cm4),
            unit: Unit::Cm4.name(),
        });
    }
    Properties { rows, note: note(result), beside: beside(beam) }
}

fn class(steel: &Steel) -> &'static str {
    match class_in_bending(steel) {
        Ok(Class::One) => "1",
        Ok(Class::Two) => "2",
        Ok(Class::Three) => "3",
        Ok(Class::Four) => "4",
        Err(_) => "none",
    }
}

fn note(result: &BeamResult) -> Option<Runs> {
    let second = &result.second_moment;
    let provided = three_figures(second.provided.si(), Unit::Cm4);
    if second.budget_used {
        return Some(vec![words(
            "The supports have used the whole stacked limit at the governing point: no beam here, however stiff, keeps it.",
        )]);
    }
    let (required, movement) = (second.required?, second.governed_by?);
    let name = places::of_movement(movement).name();
    let times = second.provided.si() / required.si();
    if !times.is_finite() {
        return None;
    }
    Some(vec![words(format!(
        "Required by the limit on the {name}, own weight as it is; {provided} is provided, {} times as much.",
        three_figures(times, Unit::One)
    ))])
}

fn beside(beam: &Beam) -> Vec<Runs> {
    let thickness = sagledger_calc::workings::decimal::movement(beam.section.thickest().si());
    vec![
        vec![words("Properties computed from these dimensions, root radii included.")],
        vec![
            words("EN 10365; "),
            symbol("f_y"),
            words(format!(" from {} for {thickness} mm.", beam.grade.product_standard())),
        ],
    ]
}
