//! Generated inputs of every check, for tests that walk the registry: seeded, wide enough to take every branch.

use super::bending::Bending;
use super::bending_with_shear::BendingWithShear;
use super::deflection::{Deflection, SecondMomentInHand};
use super::lateral_torsional_buckling::LateralTorsionalBuckling;
use super::shear::Shear;
use super::stacked_deflection::{BearingMovement, HandRule, Inherited, StackedDeflection};
use super::tilt::TiltOfBearings;
use super::torsion::Torsion;
use super::uplift::Uplift;
use super::web_under_force::{StiffLength, Way, WebUnderForce};
use super::web_with_bending::WebWithBending;
use super::{Combined, Inputs, Steel};
use crate::actions::combinations::{Expression, Purpose};
use crate::actions::{Action, Category, Choices};
use crate::limits::{Bound, Limit, LimitFrom, LimitSet, Movement};
use crate::materials::Grade;
use crate::quantity::{Force, Length, Q, SecondMoment};
use crate::results::{Part, Stretch, StretchKind};
use crate::sections;

/// A source of numbers that is the same on every run.
#[derive(Clone, Debug)]
pub struct Dice(u64);

impl Dice {
    pub fn seeded(seed: u64) -> Dice {
        Dice(seed)
    }

    fn next(&mut self) -> u64 {
        // splitmix64: every seed gives a full sequence.
        self.0 = self.0.wrapping_add(0x9E37_79B9_7F4A_7C15);
        let mut z = self.0;
        z = (z ^ (z >> 30)).wrapping_mul(0xBF58_476D_1CE4_E5B9);
        z = (z ^ (z >> 27)).wrapping_mul(0x94D0_49BB_1331_11EB);
        z ^ (z >> 31)
    }

    pub fn unit(&mut self) -> f64 {
        (self.next() >> 11) as f64 / (1u64 << 53) as f64
    }

    pub fn between(&mut self, from: f64, to: f64) -> f64 {
        from + (to - from) * self.unit()
    }

    pub fn below(&mut self, n: usize) -> usize {
        usize::try_from(self.next() % n.max(1) as u64).unwrap_or(0)
    }

    pub fn chance(&mut self, of: f64) -> bool {
        self.unit() < of
    }

    fn pick<T: Copy>(&mut self, from: &[T]) -> T {
        from[self.below(from.len())]
    }

    /// A length as a drawing gives it, or as it comes.
    fn length(&mut self, from: f64, to: f64) -> Length {
        let metres = self.between(from, to);
        if self.chance(0.6) { Length::mm((metres * 1000.0).round()) } else { Length::m(metres) }
    }
}

pub(super) fn bending(dice: &mut Dice) -> Inputs {
    Inputs::Bending(Bending { steel: steel(dice), moment: strength(dice, 4e4) })
}

pub(super) fn shear(dice: &mut Dice) -> Inputs {
    Inputs::Shear(Shear { steel: steel(dice), shear: strength(dice, 1e5) })
}

pub(super) fn bending_with_shear(dice: &mut Dice) -> Inputs {
    let shear = dice.pick(&[2e4, 1e5, 5e5]);
    Inputs::BendingWithShear(BendingWithShear {
        steel: steel(dice),
        moment: strength(dice, 4e4),
        shear: strength(dice, shear),
    })
}

pub(super) fn lateral_torsional_buckling(dice: &mut Dice) -> Inputs {
    Inputs::LateralTorsionalBuckling(LateralTorsionalBuckling {
        steel: steel(dice),
        moment: strength(dice, 4e4),
        held: dice.chance(0.7),
    })
}

pub(super) fn web_under_force(dice: &mut Dice) -> Inputs {
    Inputs::WebUnderForce(web(dice))
}

pub(super) fn web_with_bending(dice: &mut Dice) -> Inputs {
    Inputs::WebWithBending(WebWithBending { web: web(dice), moment: strength(dice, 4e4) })
}

pub(super) fn uplift(dice: &mut Dice) -> Inputs {
    let held_down = dice.chance(0.6).then(|| Force::kn(dice.between(1.0, 40.0)));
    let downward = dice.between(0.0, 2e4);
    let upward = -dice.between(0.0, 3e4);
    let mut parts = vec![part(Action::Permanent, -downward * 0.2, 1.10, 1.0, false)];
    parts.push(part(Action::Permanent, downward, 0.90, 1.0, false));
    if dice.chance(0.8) {
        parts.push(part(Action::Wind(0), upward, 1.5, 1.0, true));
    }
    if dice.chance(0.3) {
        parts.push(part(Action::Imposed(Category::A), upward * 0.3, 1.5, 0.7, false));
    }
    let reaction = Combined { parts, purpose: Purpose::Equilibrium, expression: Expression::E610 };
    Inputs::Uplift(Uplift { reaction, held_down })
}

pub(super) fn deflection(dice: &mut Dice) -> Inputs {
    let movement = dice.pick(&[Movement::Total, Movement::After, Movement::Variable]);
    Inputs::Deflection(Deflection {
        limit: limit(dice, movement),
        stretch: stretch(dice),
        movement: characteristic(dice, 4e-3),
        second_moment: second_moment(dice),
    })
}

pub(super) fn stacked_deflection(dice: &mut Dice) -> Inputs {
    let stretch = stretch(dice);
    let overhang = stretch.kind == StretchKind::Overhang;
    let beside = Stretch { kind: StretchKind::Span, from: Length::m(0.0), to: dice.length(1.0, 9.0) };
    let span = if overhang { beside.to } else { Length::from_si(stretch.to.si() - stretch.from.si()) };
    let to_place = match overhang {
        true => Length::from_si(span.si() + dice.between(0.1, 1.0)),
        false => Length::from_si(span.si() * dice.unit()),
    };
    let settled = if dice.chance(0.3) { dice.length(0.0005, 0.004) } else { Length::from_si(0.0) };
    let beams = 1 + dice.below(3);
    let route = (0..beams).map(|n| (format!("B{n}"), Length::from_si(dice.between(-1e-3, 1e-2)))).collect();
    let exact = Length::from_si(dice.between(1e-3, 2e-2));
    let hand_rule = dice.chance(0.6).then_some(HandRule { route, exact });
    Inputs::StackedDeflection(StackedDeflection {
        limit: limit(dice, Movement::Stacked),
        stretch,
        beside: overhang.then_some(beside),
        own: characteristic(dice, 3e-3),
        inherited: Inherited { left: bearing(dice, "B7"), right: bearing(dice, "B8"), span, to_place },
        settled,
        second_moment: second_moment(dice),
        hand_rule,
    })
}

pub(super) fn tilt(dice: &mut Dice) -> Inputs {
    let from = if dice.chance(0.5) {
        LimitFrom::Set(LimitSet::Masonry)
    } else {
        LimitFrom::Given { reason: Some("tiled floor".into()) }
    };
    let n = if dice.chance(0.7) { 500.0 } else { dice.between(200.0, 900.0) };
    Inputs::Tilt(TiltOfBearings {
        limit: Limit { movement: Movement::Tilt, bounds: vec![Bound::OneIn(n)], from },
        left: bearing(dice, "B7"),
        right: bearing(dice, "B8"),
        span: dice.length(0.8, 9.0),
    })
}

pub(super) fn torsion(dice: &mut Dice) -> Inputs {
    Inputs::Torsion(Torsion { what: "tank beside the beam".into(), offset: dice.length(0.01, 0.2) })
}

/// A rolled section, or one whose thicknesses no mill rolls: classes 3 and 4, slender webs, thick plates.
fn steel(dice: &mut Dice) -> Steel {
    let catalogue = sections::catalogue();
    let mut section = catalogue[dice.below(catalogue.len())];
    match dice.below(12) {
        0 => section.t_f = Length::mm((section.b.to_mm() / dice.between(18.0, 40.0)).ceil()),
        1 => section.t_w = Length::mm((section.h.to_mm() / dice.between(60.0, 140.0) * 10.0).ceil() / 10.0),
        2 if dice.chance(0.5) => section.t_f = Length::mm(dice.between(101.0, 140.0).round()),
        3 => section.r = Length::mm(2.0),
        4 => section.area = Q::from_si(section.area.si() * 0.6),
        _ => {}
    }
    Steel { section, grade: dice.pick(&Grade::ALL), choices: dice.pick(&Choices::ALL) }
}

fn web(dice: &mut Dice) -> WebUnderForce {
    let steel = steel(dice);
    let size = dice.pick(&[2e4, 1e5, 6e5]);
    let way = match dice.below(3) {
        0 => Way::Within,
        1 => Way::AtEnd { c: Length::mm(0.0) },
        _ => Way::AtEnd { c: dice.length(0.0, steel.section.h.to_m()) },
    };
    let stiff = match dice.below(4) {
        0 => StiffLength::Unknown,
        1 => {
            let above = sections::catalogue()[dice.below(sections::catalogue().len())];
            StiffLength::Crossing { mark: "B1".into(), t_f: above.t_f, t_w: above.t_w, r: above.r }
        }
        _ => StiffLength::Seat(dice.length(0.05, 0.4)),
    };
    let a = if dice.chance(0.1) { dice.length(0.1, 0.3) } else { dice.length(1.0, 9.0) };
    WebUnderForce { steel, force: strength(dice, size), way, stiff, a }
}

fn part<const F: i8, const L: i8>(
    action: Action,
    value: f64,
    partial: f64,
    reduction: f64,
    leads: bool,
) -> Part<F, L> {
    Part { action, value: Q::from_si(value), partial, reduction, leads }
}

fn strength<const F: i8, const L: i8>(dice: &mut Dice, size: f64) -> Combined<F, L> {
    let expression = dice.pick(&[Expression::E610, Expression::E610, Expression::E610a, Expression::E610b]);
    let xi = if expression == Expression::E610b { 0.925 } else { 1.0 };
    combined(dice, size, Purpose::Strength, expression, (1.35, xi), 1.5)
}

fn characteristic(dice: &mut Dice, size: f64) -> Combined<0, 1> {
    combined(dice, size, Purpose::Characteristic, Expression::E614b, (1.0, 1.0), 1.0)
}

fn combined<const F: i8, const L: i8>(
    dice: &mut Dice,
    size: f64,
    purpose: Purpose,
    expression: Expression,
    (permanent, xi): (f64, f64),
    variable: f64,
) -> Combined<F, L> {
    let sign = if dice.chance(0.3) { -1.0 } else { 1.0 };
    let value = |dice: &mut Dice| {
        let value = sign * size * dice.between(0.05, 1.0);
        // Some values are typed: point loads, reactions of them.
        if dice.chance(0.2) { (value * 1e3 / size).round() * size * 1e-3 } else { value }
    };
    let mut parts = Vec::new();
    if dice.chance(0.95) {
        let relieves = purpose == Purpose::Strength && dice.chance(0.1);
        let own = value(dice);
        parts.push(match relieves {
            true => part(Action::Permanent, -0.1 * own, 1.0, 1.0, false),
            false => part(Action::Permanent, own, permanent, xi, false),
        });
    }
    let all_accompany = expression == Expression::E610a;
    let leading = dice.below(4);
    let actions = [
        (Action::Imposed(Category::A), 0.7),
        (Action::Imposed(Category::C), 0.7),
        (Action::Imposed(Category::G), 0.7),
        (Action::Snow, 0.5),
        (Action::Wind(0), 0.5),
    ];
    for (place, (action, psi)) in actions.into_iter().enumerate() {
        if dice.chance(0.4) {
            let leads = place == leading && !all_accompany;
            parts.push(part(action, value(dice), variable, if leads { 1.0 } else { psi }, leads));
        }
    }
    Combined { parts, purpose, expression }
}

fn limit(dice: &mut Dice, movement: Movement) -> Limit {
    let bounds = match dice.below(4) {
        0 => vec![Bound::SpanOver(250.0)],
        1 => vec![Bound::SpanOver(500.0), Bound::Length(Length::mm(10.0))],
        2 => vec![Bound::Length(dice.length(0.004, 0.03))],
        _ => vec![Bound::SpanOver(dice.between(150.0, 900.0))],
    };
    let from = match dice.below(3) {
        0 => LimitFrom::Given { reason: None },
        1 => LimitFrom::Set(LimitSet::TimberFloor),
        _ => LimitFrom::SameAsTotal(Box::new(LimitFrom::Set(LimitSet::Masonry))),
    };
    Limit { movement, bounds, from }
}

fn stretch(dice: &mut Dice) -> Stretch {
    if dice.chance(0.25) {
        let from = dice.length(2.0, 6.0);
        Stretch { kind: StretchKind::Overhang, from, to: Length::from_si(from.si() + dice.length(0.4, 2.0).si()) }
    } else {
        Stretch { kind: StretchKind::Span, from: Length::m(0.0), to: dice.length(1.0, 9.0) }
    }
}

fn second_moment(dice: &mut Dice) -> SecondMomentInHand {
    let provided = sections::catalogue()[dice.below(sections::catalogue().len())].i_y;
    if dice.chance(0.7) {
        return SecondMomentInHand::Scales { provided };
    }
    let factor = dice.between(0.2, 2.0);
    let required = dice.chance(0.8).then(|| SecondMoment::from_si(provided.si() * factor));
    SecondMomentInHand::Resolved { provided, required }
}

fn bearing(dice: &mut Dice, mark: &str) -> BearingMovement {
    if dice.chance(0.4) {
        let settles = dice.chance(0.2);
        let movement = if settles { dice.length(0.001, 0.004) } else { Length::from_si(0.0) };
        return BearingMovement { on: "spine wall".into(), wall: true, movement };
    }
    BearingMovement { on: mark.into(), wall: false, movement: Length::from_si(dice.between(-1e-3, 1.2e-2)) }
}
