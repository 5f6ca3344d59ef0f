//! The combinations of EN 1990 for sets of actions, worked out by hand from its clauses and those of EN 1991-1-1 3.3.

use std::collections::BTreeSet;

use sagledger_calc::actions::combinations::{Combination, Leading, Purpose, combinations};
use sagledger_calc::actions::{Action, Actions, Category, Choices, StrengthRule};

/// "A C H snow wind:west", permanent first of all.
fn actions(spelled: &str) -> Actions {
    let mut actions = Actions { present: vec![Action::Permanent], wind_cases: Vec::new() };
    for word in spelled.split_whitespace() {
        let action = match word.split_once(':') {
            None if word == "snow" => Action::Snow,
            Some(("wind", case)) => {
                actions.wind_cases.push(case.to_string());
                Action::Wind(actions.wind_cases.len() - 1)
            }
            _ => Action::Imposed(
                Category::ALL.into_iter().find(|c| word == c.letter().to_string()).expect("a category"),
            ),
        };
        actions.present.push(action);
    }
    actions
}

/// "6.10 1.350/1.000 *imposed A 1.500 snow 0.750": permanent where it worsens and relieves, then the variable actions,
/// a star before those that lead.
fn spelled(combination: &Combination, actions: &Actions) -> String {
    let (worsens, relieves) = (combination.permanent_factor(true), combination.permanent_factor(false));
    let mut text = format!("{} {worsens:.5}/{relieves:.2}", combination.expression.number());
    for variable in &combination.variable {
        let star = if variable.leads { "*" } else { "" };
        text += &format!(" {star}{} {:.2}", actions.name(variable.action), variable.factor());
    }
    text
}

struct Case {
    actions: &'static str,
    purpose: Purpose,
    rule: StrengthRule,
    choices: Choices,
    expected: &'static [&'static str],
}

use Purpose::{Characteristic, Equilibrium, Frequent, QuasiPermanent, Strength};
use StrengthRule::{Pair, Single};

/// EN 1990 Table A1.2(B) (1.35, 1.00, 1.5; xi UK 0.925, recommended 0.85: 1.24875 and 1.1475), A1.2(A) (1.10, 0.90, 1.5)
/// and A1.4 (1.0), with psi of Table A1.1 and UK NA.A1.1.
const CASES: &[Case] = &[
    Case { actions: "", purpose: Strength, rule: Single, choices: Choices::Uk, expected: &["6.10 1.35000/1.00"] },
    Case {
        actions: "",
        purpose: Strength,
        rule: Pair,
        choices: Choices::Uk,
        expected: &["6.10b 1.24875/1.00", "6.10a 1.35000/1.00"],
    },
    Case {
        actions: "A",
        purpose: Strength,
        rule: Pair,
        choices: Choices::Recommended,
        expected: &["6.10b 1.14750/1.00 *imposed A 1.50", "6.10a 1.35000/1.00 imposed A 1.05"],
    },
    // EN 1991-1-1 3.3.1: one action, so that both enter in full.
    Case {
        actions: "A C",
        purpose: Strength,
        rule: Single,
        choices: Choices::Uk,
        expected: &["6.10 1.35000/1.00 *imposed A 1.50 *imposed C 1.50"],
    },
    // Accompanying, each with its own psi_0: A 0.7, E 1.0, snow 0.5.
    Case {
        actions: "A E snow",
        purpose: Strength,
        rule: Single,
        choices: Choices::Uk,
        expected: &[
            "6.10 1.35000/1.00 *imposed A 1.50 *imposed E 1.50 snow 0.75",
            "6.10 1.35000/1.00 imposed A 1.05 imposed E 1.50 *snow 1.50",
        ],
    },
    // EN 1991-1-1 3.3.2: category H never with snow or wind; each wind case alone.
    Case {
        actions: "A H snow wind:west wind:north",
        purpose: Strength,
        rule: Single,
        choices: Choices::Uk,
        expected: &[
            "6.10 1.35000/1.00 *imposed A 1.50 imposed H 1.05",
            "6.10 1.35000/1.00 imposed A 1.05 *imposed H 1.50",
            "6.10 1.35000/1.00 *imposed A 1.50 snow 0.75 wind west 0.75",
            "6.10 1.35000/1.00 imposed A 1.05 *snow 1.50 wind west 0.75",
            "6.10 1.35000/1.00 imposed A 1.05 snow 0.75 *wind west 1.50",
            "6.10 1.35000/1.00 *imposed A 1.50 snow 0.75 wind north 0.75",
            "6.10 1.35000/1.00 imposed A 1.05 *snow 1.50 wind north 0.75",
            "6.10 1.35000/1.00 imposed A 1.05 snow 0.75 *wind north 1.50",
        ],
    },
    // Recommended: psi_0 of H is 0, that of wind 0.6.
    Case {
        actions: "A H snow wind:",
        purpose: Strength,
        rule: Pair,
        choices: Choices::Recommended,
        expected: &[
            "6.10b 1.14750/1.00 *imposed A 1.50",
            "6.10b 1.14750/1.00 imposed A 1.05 *imposed H 1.50",
            "6.10a 1.35000/1.00 imposed A 1.05",
            "6.10b 1.14750/1.00 *imposed A 1.50 snow 0.75 wind 0.90",
            "6.10b 1.14750/1.00 imposed A 1.05 *snow 1.50 wind 0.90",
            "6.10b 1.14750/1.00 imposed A 1.05 snow 0.75 *wind 1.50",
            "6.10a 1.35000/1.00 imposed A 1.05 snow 0.75 wind 0.90",
        ],
    },
    // Set A knows (6.10) alone, whatever strength uses.
    Case {
        actions: "B snow",
        purpose: Equilibrium,
        rule: Pair,
        choices: Choices::Uk,
        expected: &["6.10 1.10000/0.90 *imposed B 1.50 snow 0.75", "6.10 1.10000/0.90 imposed B 1.05 *snow 1.50"],
    },
    Case {
        actions: "A H snow",
        purpose: Characteristic,
        rule: Single,
        choices: Choices::Uk,
        expected: &[
            "6.14b 1.00000/1.00 *imposed A 1.00 imposed H 0.70",
            "6.14b 1.00000/1.00 imposed A 0.70 *imposed H 1.00",
            "6.14b 1.00000/1.00 *imposed A 1.00 snow 0.50",
            "6.14b 1.00000/1.00 imposed A 0.70 *snow 1.00",
        ],
    },
    // psi_1 for the leading one, psi_2 for the others; what is 0 takes no part, and no combination comes twice.
    Case {
        actions: "A H snow wind:west wind:north",
        purpose: Frequent,
        rule: Single,
        choices: Choices::Uk,
        expected: &[
            "6.15b 1.00000/1.00 *imposed A 0.50",
            "6.15b 1.00000/1.00 imposed A 0.30",
            "6.15b 1.00000/1.00 imposed A 0.30 *snow 0.20",
            "6.15b 1.00000/1.00 imposed A 0.30 *wind west 0.20",
            "6.15b 1.00000/1.00 imposed A 0.30 *wind north 0.20",
        ],
    },
    Case {
        actions: "A E H snow wind:west wind:north",
        purpose: QuasiPermanent,
        rule: Single,
        choices: Choices::Uk,
        expected: &["6.16b 1.00000/1.00 imposed A 0.30 imposed E 0.80"],
    },
    Case {
        actions: "H",
        purpose: QuasiPermanent,
        rule: Single,
        choices: Choices::Uk,
        expected: &["6.16b 1.00000/1.00"],
    },
];

#[test]
fn combinations_are_those_of_the_clauses() {
    for case in CASES {
        let actions = actions(case.actions);
        let found: Vec<String> = combinations(case.purpose, case.rule, case.choices, &actions)
            .iter()
            .map(|combination| spelled(combination, &actions))
            .collect();
        assert_eq!(found, case.expected, "{:?} of {:?}, {:?}", case.purpose, case.actions, case.choices);
    }
}

/// The greatest effect of loads that all worsen it, for an influence of 1: permanent, then variable, in `unit`.
fn greatest(loads: &[f64], spelled: &str, rule: StrengthRule, choices: Choices, number: &str) -> f64 {
    let actions = actions(spelled);
    let list = combinations(Purpose::Strength, rule, choices, &actions);
    let of_expression = list.iter().filter(|combination| combination.expression.number() == number);
    let effects = of_expression.map(|combination| {
        let variable = combination.variable.iter().map(|v| {
            let place = actions.present.iter().position(|action| *action == v.action).expect("present");
            v.factor() * loads[place]
        });
        combination.permanent_factor(true) * loads[0] + variable.sum::<f64>()
    });
    effects.fold(f64::NEG_INFINITY, f64::max)
}

#[test]
fn design_values_of_simple_loads() {
    // 5 m span, G 6, Q 4 kN/m, category A: EN 1990, in kNm at midspan (L²/8 = 3.125 m²).
    let moment = |rule, choices, number| 3.125 * greatest(&[6.0, 4.0], "A", rule, choices, number);
    let cases = [
        (moment(Single, Choices::Uk, "6.10"), 44.1),
        (moment(Pair, Choices::Uk, "6.10a"), 38.4),
        (moment(Pair, Choices::Uk, "6.10b"), 42.2),
        (moment(Pair, Choices::Recommended, "6.10a"), 38.4),
        (moment(Pair, Choices::Recommended, "6.10b"), 40.3),
    ];
    for (found, expected) in cases {
        assert!((found - expected).abs() <= 0.05, "{found} kNm against {expected} kNm");
    }
    // Two imposed categories together, G 5, A 4, C 4 kN/m: EN 1991-1-1 3.3.1.
    let line = greatest(&[5.0, 4.0, 4.0], "A C", Single, Choices::Uk, "6.10");
    assert!((line - 18.75).abs() < 1e-12, "{line} kN/m");
}

#[test]
fn names_tell_what_leads_and_what_comes_with_it() {
    let name_cases = [
        ("", Strength, Single, vec!["6.10, permanent alone"], vec!["permanent"]),
        (
            "A H",
            Strength,
            Single,
            vec!["6.10, imposed A leading, imposed H with it", "6.10, imposed H leading, imposed A with it"],
            vec!["imposed A leads", "imposed H leads"],
        ),
        (
            "A C",
            Strength,
            Pair,
            vec!["6.10b, imposed A and imposed C leading", "6.10a, permanent with imposed A and imposed C"],
            vec!["imposed leads", "6.10a"],
        ),
        (
            "B wind:",
            Equilibrium,
            Single,
            vec!["set A, imposed B leading, wind with it", "set A, wind leading, imposed B with it"],
            vec!["imposed B leads", "wind leads"],
        ),
        (
            "A snow wind:west",
            Characteristic,
            Single,
            vec![
                "characteristic, imposed A leading, snow and wind west with it",
                "characteristic, snow leading, imposed A and wind west with it",
                "characteristic, wind west leading, imposed A and snow with it",
            ],
            vec!["imposed A leads", "snow leads", "wind west leads"],
        ),
        ("A", Frequent, Single, vec!["frequent, imposed A leading"], vec!["imposed A leads"]),
        ("A", QuasiPermanent, Single, vec!["quasi-permanent, permanent with imposed A"], vec!["none leads"]),
        ("H", QuasiPermanent, Single, vec!["quasi-permanent, permanent alone"], vec!["permanent"]),
    ];
    for (spelled, purpose, rule, names, short_names) in name_cases {
        let actions = actions(spelled);
        let list = combinations(purpose, rule, Choices::Uk, &actions);
        assert_eq!(list.iter().map(|c| c.name(&actions)).collect::<Vec<_>>(), names);
        assert_eq!(list.iter().map(|c| c.short_name(&actions)).collect::<Vec<_>>(), short_names);
    }
}

/// Every set of actions there can be, with two wind cases at most: 2048.
fn every_set() -> Vec<Actions> {
    let all = actions("A B C D E F G H snow wind:west wind:north");
    let sets = 0..1_u32 << (all.present.len() - 1);
    sets.map(|set| {
        let chosen = all.present.iter().enumerate().filter(|(i, _)| *i == 0 || set >> (i - 1) & 1 == 1);
        Actions { present: chosen.map(|(_, action)| *action).collect(), wind_cases: all.wind_cases.clone() }
    })
    .collect()
}

#[test]
fn every_set_of_actions_keeps_the_rules() {
    for actions in every_set() {
        for purpose in [Strength, Equilibrium, Characteristic, Frequent, QuasiPermanent] {
            for (rule, choices) in [(Single, Choices::Uk), (Pair, Choices::Uk), (Pair, Choices::Recommended)] {
                let list = combinations(purpose, rule, choices, &actions);
                assert!(!list.is_empty());
                let names: BTreeSet<String> = list.iter().map(|c| c.name(&actions)).collect();
                assert_eq!(names.len(), list.len(), "{names:?}");
                for combination in &list {
                    keeps_the_rules(combination);
                }
                if matches!(purpose, Strength | Equilibrium | Characteristic) {
                    let led: BTreeSet<Action> =
                        list.iter().flat_map(|c| &c.variable).filter(|v| v.leads).map(|v| v.action).collect();
                    assert_eq!(led, actions.present[1..].iter().copied().collect(), "each takes its turn");
                }
            }
        }
    }
}

fn keeps_the_rules(combination: &Combination) {
    let taking_part: Vec<Action> = combination.variable.iter().map(|v| v.action).collect();
    assert!(taking_part.is_sorted(), "the order of actions: {taking_part:?}");
    assert!(!taking_part.contains(&Action::Permanent), "{taking_part:?}");
    let winds = taking_part.iter().filter(|action| matches!(action, Action::Wind(_))).count();
    let roof = taking_part.contains(&Action::Imposed(Category::H));
    let weather = winds > 0 || taking_part.contains(&Action::Snow);
    assert!(winds <= 1 && !(roof && weather), "{taking_part:?}");
    assert!(combination.variable.iter().all(|v| v.factor() > 0.0 && v.factor() <= 1.5));
    let leading: Vec<Action> = combination.variable.iter().filter(|v| v.leads).map(|v| v.action).collect();
    let is_floor = |action: &Action| matches!(action, Action::Imposed(category) if *category != Category::H);
    let agrees = match combination.leading {
        Leading::None => leading.is_empty(),
        Leading::ImposedAToG => !leading.is_empty() && leading.iter().all(is_floor),
        Leading::ImposedH => leading == [Action::Imposed(Category::H)],
        Leading::Snow => leading == [Action::Snow],
        Leading::Wind(case) => leading == [Action::Wind(case)],
    };
    assert!(agrees, "{:?} and {leading:?}", combination.leading);
    if combination.leading == Leading::ImposedAToG {
        assert!(taking_part.iter().filter(|a| is_floor(a)).all(|a| leading.contains(a)), "one action leads whole");
    }
}

#[test]
fn factors_are_those_of_the_tables() {
    // psi_0, psi_1, psi_2: EN 1990 Table A1.1 and UK NA Table NA.A1.1 (snow for altitudes up to 1000 m); from memory.
    let imposed = Action::Imposed;
    let cases = [
        (imposed(Category::A), [0.7, 0.5, 0.3], [0.7, 0.5, 0.3]),
        (imposed(Category::B), [0.7, 0.5, 0.3], [0.7, 0.5, 0.3]),
        (imposed(Category::C), [0.7, 0.7, 0.6], [0.7, 0.7, 0.6]),
        (imposed(Category::D), [0.7, 0.7, 0.6], [0.7, 0.7, 0.6]),
        (imposed(Category::E), [1.0, 0.9, 0.8], [1.0, 0.9, 0.8]),
        (imposed(Category::F), [0.7, 0.7, 0.6], [0.7, 0.7, 0.6]),
        (imposed(Category::G), [0.7, 0.5, 0.3], [0.7, 0.5, 0.3]),
        (imposed(Category::H), [0.7, 0.0, 0.0], [0.0, 0.0, 0.0]),
        (Action::Snow, [0.5, 0.2, 0.0], [0.5, 0.2, 0.0]),
        (Action::Wind(0), [0.5, 0.2, 0.0], [0.6, 0.2, 0.0]),
        (Action::Wind(3), [0.5, 0.2, 0.0], [0.6, 0.2, 0.0]),
        (Action::Permanent, [1.0, 1.0, 1.0], [1.0, 1.0, 1.0]),
    ];
    for (action, uk, recommended) in cases {
        for (choices, expected) in [(Choices::Uk, uk), (Choices::Recommended, recommended)] {
            let psi = choices.psi(action);
            assert_eq!([psi.psi_0, psi.psi_1, psi.psi_2], expected, "{action:?}, {}", choices.name());
        }
    }
    // xi: EN 1990 Table A1.2(B) and UK NA.A1.2(B); gamma_M: EN 1993-1-1 6.1 and UK NA.2.15.
    assert_eq!(Choices::ALL.map(Choices::name), ["UK", "recommended"]);
    assert_eq!(Choices::ALL.map(Choices::xi), [0.925, 0.85]);
    assert_eq!(Choices::ALL.map(Choices::gamma_m), [1.0, 1.0]);
}
