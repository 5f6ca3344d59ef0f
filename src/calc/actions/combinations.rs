//! The combinations of EN 1990 6.4.3 and 6.5.3 for the actions that a building has.
//!
//! Imposed loads of categories A to G are one action (EN 1991-1-1 3.3.1(2)); category H never acts together with
//! snow or wind (3.3.2(1)); one wind case acts at a time, on the whole building.

use super::choices::{
    Choices, GAMMA_G_EQUILIBRIUM_FAVOURABLE, GAMMA_G_EQUILIBRIUM_UNFAVOURABLE, GAMMA_G_FAVOURABLE,
    GAMMA_G_UNFAVOURABLE, GAMMA_Q,
};
use super::{Action, Actions, Category, StrengthRule};

/// What a combination is for, which decides how permanent actions enter.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Purpose {
    /// Set B: permanent actions are one source, factored up or down as a whole for each effect.
    Strength,
    /// Set A: each permanent contribution factored by the sign of its own effect.
    Equilibrium,
    Characteristic,
    Frequent,
    QuasiPermanent,
}

/// The expression a combination follows.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Expression {
    E610,
    E610a,
    E610b,
    E614b,
    E615b,
    E616b,
}

impl Expression {
    /// "6.10", "6.10a", … as the standard numbers them.
    pub fn number(self) -> &'static str {
        match self {
            Expression::E610 => "6.10",
            Expression::E610a => "6.10a",
            Expression::E610b => "6.10b",
            Expression::E614b => "6.14b",
            Expression::E615b => "6.15b",
            Expression::E616b => "6.16b",
        }
    }
}

/// The group that leads: all imposed loads of categories A to G count as one.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Leading {
    None,
    ImposedAToG,
    ImposedH,
    Snow,
    Wind(usize),
}

/// One combination: a factor for every action that takes part. A variable action enters only where it worsens the
/// effect looked at; so does each free row of imposed load.
#[derive(Clone, Debug, PartialEq)]
pub struct Combination {
    pub purpose: Purpose,
    pub expression: Expression,
    pub leading: Leading,
    /// Partial factor on permanent effects where they worsen, and where they relieve, the effect looked at.
    pub permanent: (f64, f64),
    /// Reduction of unfavourable permanent actions, (6.10b); else 1.
    pub xi: f64,
    /// Variable actions with the factor each enters with (partial factor times psi), in the order of the actions;
    /// those whose factor is zero take no part and are left out.
    pub variable: Vec<Variable>,
}

/// A variable action's part in a combination; its factor is `partial × psi`.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Variable {
    pub action: Action,
    pub partial: f64,
    /// 1 for a leading action.
    pub psi: f64,
    pub leads: bool,
}

impl Variable {
    pub fn factor(self) -> f64 {
        self.partial * self.psi
    }
}

impl Combination {
    /// The factor with which permanent effects enter, by whether they worsen the effect looked at.
    pub fn permanent_factor(&self, worsens: bool) -> f64 {
        if worsens { self.xi * self.permanent.0 } else { self.permanent.1 }
    }

    /// "6.10, imposed A leading, imposed H with it"; characteristic ones begin "characteristic".
    pub fn name(&self, actions: &Actions) -> String {
        let head = match self.purpose {
            Purpose::Strength => self.expression.number().to_string(),
            Purpose::Equilibrium => "set A".to_string(),
            Purpose::Characteristic => "characteristic".to_string(),
            Purpose::Frequent => "frequent".to_string(),
            Purpose::QuasiPermanent => "quasi-permanent".to_string(),
        };
        let names = |leads: bool| -> Vec<String> {
            let chosen = self.variable.iter().filter(|v| v.leads == leads);
            chosen.map(|v| actions.name(v.action)).collect()
        };
        let mut parts = vec![head];
        let (led, with) = (names(true), names(false));
        match (led.is_empty(), with.is_empty()) {
            (true, true) => parts.push("permanent alone".into()),
            (true, false) => parts.push(format!("permanent with {}", listed(&with))),
            (false, _) => parts.push(format!("{} leading", listed(&led))),
        }
        if !led.is_empty() && !with.is_empty() {
            parts.push(format!("{} with it", listed(&with)));
        }
        parts.join(", ")
    }

    /// "imposed A leads", as narrow tables print it.
    pub fn short_name(&self, actions: &Actions) -> String {
        let led: Vec<String> = self.variable.iter().filter(|v| v.leads).map(|v| actions.name(v.action)).collect();
        match led.as_slice() {
            [] if self.variable.is_empty() => "permanent".into(),
            [] if self.expression == Expression::E610a => "6.10a".into(),
            [] => "none leads".into(),
            [one] => format!("{one} leads"),
            [_, _, ..] => "imposed leads".into(),
        }
    }
}

/// "a", "a and b", "a, b and c".
pub fn listed(words: &[String]) -> String {
    match words {
        [] => String::new(),
        [one] => one.clone(),
        [head @ .., last] => format!("{} and {last}", head.join(", ")),
    }
}

/// All combinations of one purpose, each once, in a fixed order. Without variable actions there is permanent alone.
pub fn combinations(purpose: Purpose, rule: StrengthRule, choices: Choices, actions: &Actions) -> Vec<Combination> {
    let mut list: Vec<Combination> = Vec::new();
    let mut add = |expression, leading, world: &[Action]| {
        let combination = combine(purpose, expression, leading, world, choices);
        // Where what tells two worlds apart has psi = 0, both give the same.
        if !list.contains(&combination) {
            list.push(combination);
        }
    };
    for world in worlds(actions) {
        for leading in leaders(purpose, &world) {
            add(expression_with_leader(purpose, rule), leading, &world);
        }
        if (purpose, rule) == (Purpose::Strength, StrengthRule::Pair) {
            add(Expression::E610a, Leading::None, &world);
        }
    }
    list
}

/// The expression in which each variable action takes its turn as the leading one (none leads in 6.16b).
fn expression_with_leader(purpose: Purpose, rule: StrengthRule) -> Expression {
    match (purpose, rule) {
        (Purpose::Strength, StrengthRule::Single) | (Purpose::Equilibrium, _) => Expression::E610,
        (Purpose::Strength, StrengthRule::Pair) => Expression::E610b,
        (Purpose::Characteristic, _) => Expression::E614b,
        (Purpose::Frequent, _) => Expression::E615b,
        (Purpose::QuasiPermanent, _) => Expression::E616b,
    }
}

/// Sets of variable actions that can act together: with category H, or with snow and one wind case.
fn worlds(actions: &Actions) -> Vec<Vec<Action>> {
    let imposed = |h: bool| move |a: &Action| matches!(a, Action::Imposed(c) if (*c == Category::H) == h);
    let present = &actions.present;
    let a_to_g: Vec<Action> = present.iter().copied().filter(imposed(false)).collect();
    let h: Vec<Action> = present.iter().copied().filter(imposed(true)).collect();
    let snow: Vec<Action> = present.iter().copied().filter(|a| *a == Action::Snow).collect();
    let winds: Vec<Action> = present.iter().copied().filter(|a| matches!(a, Action::Wind(_))).collect();
    let mut worlds = Vec::new();
    if !h.is_empty() {
        worlds.push([a_to_g.clone(), h].concat());
    }
    if winds.is_empty() {
        if !snow.is_empty() || worlds.is_empty() {
            worlds.push([a_to_g, snow].concat());
        }
    } else {
        for wind in winds {
            worlds.push([a_to_g.clone(), snow.clone(), vec![wind]].concat());
        }
    }
    worlds
}

fn leaders(purpose: Purpose, world: &[Action]) -> Vec<Leading> {
    if purpose == Purpose::QuasiPermanent {
        return vec![Leading::None];
    }
    let mut leaders: Vec<Leading> = Vec::new();
    for action in world {
        let leading = match action {
            Action::Permanent => continue,
            Action::Imposed(Category::H) => Leading::ImposedH,
            Action::Imposed(_) => Leading::ImposedAToG,
            Action::Snow => Leading::Snow,
            Action::Wind(case) => Leading::Wind(*case),
        };
        if !leaders.contains(&leading) {
            leaders.push(leading);
        }
    }
    if leaders.is_empty() {
        leaders.push(Leading::None);
    }
    leaders
}

fn leads(leading: Leading, action: Action) -> bool {
    match action {
        Action::Permanent => false,
        Action::Imposed(Category::H) => leading == Leading::ImposedH,
        Action::Imposed(_) => leading == Leading::ImposedAToG,
        Action::Snow => leading == Leading::Snow,
        Action::Wind(case) => leading == Leading::Wind(case),
    }
}

fn combine(
    purpose: Purpose,
    expression: Expression,
    leading: Leading,
    world: &[Action],
    choices: Choices,
) -> Combination {
    let permanent = match (purpose, expression) {
        (Purpose::Strength, _) => (GAMMA_G_UNFAVOURABLE, GAMMA_G_FAVOURABLE),
        (Purpose::Equilibrium, _) => (GAMMA_G_EQUILIBRIUM_UNFAVOURABLE, GAMMA_G_EQUILIBRIUM_FAVOURABLE),
        (Purpose::Characteristic | Purpose::Frequent | Purpose::QuasiPermanent, _) => (1.0, 1.0),
    };
    let partial = match purpose {
        Purpose::Strength | Purpose::Equilibrium => GAMMA_Q,
        Purpose::Characteristic | Purpose::Frequent | Purpose::QuasiPermanent => 1.0,
    };
    let variable: Vec<Variable> = world
        .iter()
        .map(|&action| {
            let factors = choices.psi(action);
            let leads = leads(leading, action);
            let psi = match purpose {
                Purpose::Strength | Purpose::Equilibrium | Purpose::Characteristic if leads => 1.0,
                Purpose::Strength | Purpose::Equilibrium | Purpose::Characteristic => factors.psi_0,
                Purpose::Frequent if leads => factors.psi_1,
                Purpose::Frequent | Purpose::QuasiPermanent => factors.psi_2,
            };
            Variable { action, partial, psi, leads }
        })
        .filter(|variable| variable.factor() != 0.0)
        .collect();
    // A leading action with psi_1 = 0 leads nothing.
    let leading = if variable.iter().any(|variable| variable.leads) { leading } else { Leading::None };
    let xi = if expression == Expression::E610b { choices.xi() } else { 1.0 };
    Combination { purpose, expression, leading, permanent, xi, variable }
}
