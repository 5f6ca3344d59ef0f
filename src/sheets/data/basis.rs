//! The basis of design: standards, factors, materials, limits, assumptions.

use sagledger_calc::actions::choices::{
    GAMMA_G_EQUILIBRIUM_FAVOURABLE, GAMMA_G_EQUILIBRIUM_UNFAVOURABLE, GAMMA_G_FAVOURABLE, GAMMA_G_UNFAVOURABLE,
    GAMMA_Q,
};
use sagledger_calc::actions::combinations::listed as listed_words;
use sagledger_calc::actions::{Action, Choices, StrengthRule};
use sagledger_calc::limits::{Bound, Limit, Movement};
use sagledger_calc::materials::{DENSITY, E, G, Grade};
use sagledger_calc::standards::STANDARDS;
use sagledger_calc::workings::decimal;
use sagledger_calc::workings::unit::Unit;
use serde::Serialize;

use super::text::{Run, Runs, keys, sentence, symbol, value, words};
use super::view::{View, limit_words};
use crate::package::Package;

#[derive(Debug, Serialize)]
pub(super) struct Basis {
    standards: Vec<(&'static str, &'static str)>,
    annex: &'static str,
    factors: Vec<(Runs, String)>,
    materials: Runs,
    limits: Vec<LimitRow>,
    /// Some members' marks are too long for their column.
    long: bool,
    assumptions: Vec<Assumption>,
}

#[derive(Debug, Serialize)]
struct LimitRow {
    members: String,
    movement: String,
    limit: String,
    reason: String,
    source: String,
}

#[derive(Debug, Serialize)]
struct Assumption {
    key: String,
    number: usize,
    sentence: Runs,
    /// Who relies on it; none where every sheet does.
    beside: Option<Run>,
}

pub(super) fn basis(package: &Package, view: View) -> Basis {
    let limits = limits(view);
    let long = limits.iter().any(|row| row.members.chars().count() > 24);
    Basis {
        standards: STANDARDS.iter().map(|s| (s.edition, s.about)).collect(),
        annex: match view.building.basis.choices {
            Choices::Uk => "each with its UK National Annex",
            Choices::Recommended => "with the values recommended in them; no National Annex",
        },
        factors: factors(view),
        materials: materials(package, view),
        limits,
        long,
        assumptions: assumptions(view),
    }
}

fn two(factor: f64) -> String {
    decimal::places(factor, 2, Unit::One)
}

fn factors(view: View) -> Vec<(Runs, String)> {
    let basis = &view.building.basis;
    let pair = |up: f64, down: f64| format!("{} or {}", two(up), two(down));
    let mut rows: Vec<(Runs, String)> =
        vec![(vec![words("permanent "), symbol("gamma_G")], pair(GAMMA_G_UNFAVOURABLE, GAMMA_G_FAVOURABLE))];
    match basis.rule {
        StrengthRule::Single => {}
        StrengthRule::Pair => {
            let xi = decimal::places(basis.choices.xi(), 3, Unit::One);
            rows.push((vec![symbol("xi"), words(" in (6.10b)")], xi));
        }
    }
    rows.push((vec![words("variable "), symbol("gamma_Q")], two(GAMMA_Q)));
    for &action in &view.results.actions.present {
        if action == Action::Permanent {
            continue;
        }
        let name = view.results.actions.name(action);
        rows.push((vec![words(format!("{name} ")), symbol("psi_0")], two(basis.choices.psi(action).psi_0)));
    }
    rows.push((
        vec![words("uplift "), symbol("gamma_G")],
        pair(GAMMA_G_EQUILIBRIUM_UNFAVOURABLE, GAMMA_G_EQUILIBRIUM_FAVOURABLE),
    ));
    rows.push((
        vec![words("steel "), symbol("gamma_M0"), words(", "), symbol("gamma_M1")],
        two(basis.choices.gamma_m()),
    ));
    rows
}

fn materials(package: &Package, view: View) -> Runs {
    let mut runs = vec![words("Steel sections ")];
    let used: Vec<Grade> = Grade::ALL
        .into_iter()
        .filter(|grade| view.building.beams.iter().any(|beam| beam.grade == *grade))
        .collect();
    for (n, grade) in used.iter().enumerate() {
        if n > 0 {
            runs.push(words(if n + 1 == used.len() { " and " } else { ", " }));
        }
        runs.push(words(format!("in {} to {}", grade.name(), grade.product_standard())));
        if used.len() > 1 {
            let marks: Vec<String> =
                view.beams().filter(|(_, b, _)| b.grade == *grade).map(|(_, b, _)| b.mark.clone()).collect();
            runs.push(words(format!(" ({})", listed_words(&marks))));
        }
    }
    runs.push(words(", dimensions to EN 10365, properties computed from them with the root radii; "));
    runs.extend([symbol("E"), words(" ")]);
    runs.push(value(decimal::three_figures(E.si(), Unit::NPerMm2), "N/mm²"));
    runs.push(words(", shear modulus "));
    runs.push(value(decimal::places(G.si(), 0, Unit::NPerMm2), "N/mm²"));
    runs.push(words(", "));
    runs.push(value(decimal::places(DENSITY, 0, Unit::One), "kg/m³"));
    runs.push(words(". "));
    match package.meta.drawings.as_slice() {
        [] => runs.push(words("No drawings are named; sizes are those of the job file.")),
        [one] => runs.push(words(format!("Sizes are taken from drawing {one}."))),
        many => runs.push(words(format!("Sizes are taken from drawings {}.", listed_words(many)))),
    }
    runs
}

fn limits(view: View) -> Vec<LimitRow> {
    let mut groups: Vec<(&[Limit], Vec<String>)> = Vec::new();
    for (_, beam, _) in view.beams() {
        let limits = beam.limits.limits.as_slice();
        match groups.iter_mut().find(|(of, _)| *of == limits) {
            Some((_, marks)) => marks.push(beam.mark.clone()),
            None => groups.push((limits, vec![beam.mark.clone()])),
        }
    }
    let mut rows: Vec<LimitRow> = Vec::new();
    for (limits, marks) in groups {
        let first = rows.len();
        for limit in limits {
            let (reason, source) = limit_words(limit);
            let bounds: Vec<String> = limit.bounds.iter().map(bound).collect();
            let row = LimitRow {
                members: String::new(),
                movement: movement_name(limit.movement).into(),
                limit: bounds.join(", "),
                reason,
                source,
            };
            let same = |r: &&mut LimitRow| r.limit == row.limit && r.reason == row.reason && r.source == row.source;
            match rows.iter_mut().skip(first).find(same) {
                Some(earlier) => earlier.movement = format!("{}, {}", earlier.movement, row.movement),
                None => rows.push(row),
            }
        }
        if rows.len() == first {
            rows.push(LimitRow {
                members: String::new(),
                movement: "none".into(),
                limit: String::new(),
                reason: "reported only".into(),
                source: String::new(),
            });
        }
        if let Some(row) = rows.get_mut(first) {
            row.members = if marks.len() > 1 && marks.len() == view.building.beams.len() {
                "all".into()
            } else {
                marks.join(", ")
            };
        }
    }
    rows
}

fn movement_name(movement: Movement) -> &'static str {
    match movement {
        Movement::Total => "total",
        Movement::After => "after",
        Movement::Variable => "variable",
        Movement::Stacked => "stacked",
        Movement::Tilt => "tilt",
    }
}

fn bound(bound: &Bound) -> String {
    let number = |n: f64| match decimal::Decimal::as_typed(n, 6) {
        Some(typed) => typed.to_string(),
        None => decimal::three_figures(n, Unit::One),
    };
    match bound {
        Bound::SpanOver(n) => format!("span/{}", number(*n)),
        Bound::Length(length) => match decimal::Decimal::as_typed(length.si(), 6) {
            Some(typed) => format!("{} mm", typed.moved(3).without_trailing_zeros()),
            None => format!("{} mm", decimal::movement(length.si())),
        },
        Bound::OneIn(n) => format!("1/{}", number(*n)),
    }
}

fn assumptions(view: View) -> Vec<Assumption> {
    view.results
        .assumptions
        .iter()
        .enumerate()
        .map(|(n, assumption)| {
            let sheets: Vec<(String, String)> =
                assumption.marks.iter().filter_map(|m| view.by_mark(m)).map(keys::beam_sheets).collect();
            Assumption {
                key: keys::assumption(n + 1),
                number: n + 1,
                sentence: sentence(&assumption.sentence),
                beside: (!sheets.is_empty()).then_some(Run::Sheets { sheets }),
            }
        })
        .collect()
}

#[cfg(test)]
mod tests {
    use super::*;
    use sagledger_calc::quantity::Length;

    #[test]
    fn bounds_as_typed() {
        assert_eq!(bound(&Bound::SpanOver(250.0)), "span/250");
        assert_eq!(bound(&Bound::Length(Length::mm(10.0))), "10 mm");
        assert_eq!(bound(&Bound::Length(Length::mm(7.5))), "7.5 mm");
        assert_eq!(bound(&Bound::OneIn(500.0)), "1/500");
    }
}
