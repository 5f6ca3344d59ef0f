//! Resistances by a second road: the expressions of EN 1993-1-1 and EN 1993-1-5 written out in N and mm on bare
//! numbers, swept over the catalogue. They share neither code nor units with the checks.

use sagledger_calc::actions::combinations::{Expression, Purpose};
use sagledger_calc::actions::{Action, Choices};
use sagledger_calc::checks::bending::Bending;
use sagledger_calc::checks::generated::Dice;
use sagledger_calc::checks::shear::Shear;
use sagledger_calc::checks::web_under_force::{StiffLength, Way, WebUnderForce};
use sagledger_calc::checks::{Combined, Inputs, Reduced, Steel, run};
use sagledger_calc::materials::Grade;
use sagledger_calc::quantity::{Force, Length, Q};
use sagledger_calc::results::Part;
use sagledger_calc::sections::{Section, catalogue};

fn alone<const F: i8, const L: i8>(value: f64) -> Combined<F, L> {
    let part =
        Part { action: Action::Permanent, value: Q::from_si(value), partial: 1.35, reduction: 1.0, leads: false };
    Combined { parts: vec![part], purpose: Purpose::Strength, expression: Expression::E610 }
}

/// EN 10025-2 Table 6 for S275 and S355, N/mm2, by the thicker plate.
fn yield_strength(grade: Grade, t: f64) -> Option<f64> {
    let row = [16.0, 40.0, 63.0, 80.0, 100.0].iter().position(|up_to| t <= *up_to)?;
    Some(match grade {
        Grade::S275 => [275.0, 265.0, 255.0, 245.0, 235.0][row],
        Grade::S355 => [355.0, 345.0, 335.0, 325.0, 315.0][row],
        Grade::S235 | Grade::S460 => panic!("not swept here"),
    })
}

struct Plain {
    h: f64,
    b: f64,
    tw: f64,
    tf: f64,
    r: f64,
    fy: f64,
}

impl Plain {
    /// None where the table ends below its thickness.
    fn of(section: &Section, grade: Grade) -> Option<Plain> {
        let (tw, tf) = (section.t_w.to_mm(), section.t_f.to_mm());
        let fy = yield_strength(grade, tw.max(tf))?;
        Some(Plain { h: section.h.to_mm(), b: section.b.to_mm(), tw, tf, r: section.r.to_mm(), fy })
    }

    fn hw(&self) -> f64 {
        self.h - 2.0 * self.tf
    }

    fn eps(&self) -> f64 {
        (235.0 / self.fy).sqrt()
    }

    /// Table 5.2: the class of the worse plate.
    fn class(&self) -> u8 {
        let flange = (self.b / 2.0 - self.tw / 2.0 - self.r) / self.tf / self.eps();
        let web = (self.h - 2.0 * (self.tf + self.r)) / self.tw / self.eps();
        let by = |value: f64, limits: [f64; 3]| 1 + limits.iter().filter(|limit| value > **limit).count() as u8;
        by(flange, [9.0, 10.0, 14.0]).max(by(web, [72.0, 83.0, 124.0]))
    }

    /// 6.2.6(3)a from the area of the plates and the roots (1 - pi/4 of a square each).
    fn av(&self) -> f64 {
        let roots = 4.0 * (1.0 - std::f64::consts::FRAC_PI_4) * self.r * self.r;
        let area = 2.0 * self.b * self.tf + self.hw() * self.tw + roots;
        (area - 2.0 * self.b * self.tf + (self.tw + 2.0 * self.r) * self.tf).max(self.hw() * self.tw)
    }

    fn v(&self) -> f64 {
        self.av() * self.fy / 3f64.sqrt()
    }

    /// EN 1993-1-5 6.2 to 6.5; and whether m_2 stayed.
    fn web(&self, ss: f64, end: Option<f64>, a: f64) -> (f64, bool) {
        let hw = self.hw();
        let ss = ss.min(hw);
        let m1 = self.b / self.tw;
        let with = |m2: f64| {
            let spread = (m1 + m2).sqrt();
            let within = ss + 2.0 * self.tf * (1.0 + spread);
            let (kf, ly) = match end {
                None => (6.0 + 2.0 * (hw / a).powi(2), within),
                Some(c) => {
                    let kf = (2.0 + 6.0 * (ss + c) / hw).min(6.0);
                    let le = (kf * 210_000.0 * self.tw.powi(2) / (2.0 * self.fy * hw)).min(ss + c);
                    let eleven = le + self.tf * (m1 / 2.0 + (le / self.tf).powi(2) + m2).sqrt();
                    let twelve = le + self.tf * spread;
                    (kf, within.min(eleven).min(twelve))
                }
            };
            let ly = ly.min(a);
            let fcr = 0.9 * kf * 210_000.0 * self.tw.powi(3) / hw;
            (ly, (ly * self.tw * self.fy / fcr).sqrt())
        };
        let (mut ly, mut slenderness) = with(0.02 * (hw / self.tf).powi(2));
        let slender = slenderness > 0.5;
        if !slender {
            (ly, slenderness) = with(0.0);
        }
        (self.fy * ly * self.tw * (0.5 / slenderness).min(1.0), slender)
    }
}

fn near(found: f64, expected: f64, what: &str) {
    assert!((found - expected).abs() <= 1e-9 * expected.abs(), "{what}: {found} is not {expected}");
}

#[test]
fn bending_shear_and_their_interaction_over_the_catalogue() {
    let (mut classes, mut refused) = ([0; 5], 0);
    for grade in [Grade::S275, Grade::S355] {
        for section in catalogue() {
            let steel = Steel { section: *section, grade, choices: Choices::Uk };
            let outcome = run(&Inputs::Bending(Bending { steel, moment: alone(1e4) }));
            let Some(plain) = Plain::of(section, grade) else {
                assert_eq!(outcome.capacity, None, "{}", section.name);
                continue;
            };
            let slender = plain.hw() / plain.tw > 72.0 * plain.eps();
            classes[usize::from(plain.class())] += 1;
            if slender || plain.class() == 4 {
                refused += 1;
                assert_eq!(outcome.capacity, None, "{}", section.name);
                assert!(Reduced::of(&steel).is_none());
                continue;
            }
            let modulus = if plain.class() < 3 { section.w_pl_y } else { section.w_el_y }.to_cm3() * 1e3;
            near(outcome.capacity.unwrap(), modulus * plain.fy * 1e-3, section.name);
            let outcome = run(&Inputs::Shear(Shear { steel, shear: alone(1e4) }));
            near(outcome.capacity.unwrap(), plain.v(), section.name);

            // (6.30), at 0.3, 0.5, 0.8 and 1.0 of the shear resistance.
            let reduced = Reduced::of(&steel).unwrap();
            for share in [0.3, 0.5, 0.8, 1.0] {
                let rho = if share <= 0.5 { 0.0 } else { (2.0 * share - 1.0f64).powi(2) };
                let aw = plain.hw() * plain.tw;
                let left = (modulus - rho * aw * aw / (4.0 * plain.tw)) * plain.fy * 1e-3;
                near(reduced.under(Force::from_si(-share * plain.v() * (1.0 - 1e-14))).si(), left, section.name);
            }
        }
    }
    // The sweep meets classes 1, 2 and 3, and webs too slender for it.
    assert!(classes[1] > 50 && classes[2] > 0 && classes[3] > 0 && refused > 0, "{classes:?} {refused}");
}

#[test]
fn webs_under_force_over_the_catalogue() {
    let mut dice = Dice::seeded(5);
    let (mut stocky, mut slender) = (0, 0);
    for grade in [Grade::S275, Grade::S355] {
        for section in catalogue() {
            let steel = Steel { section: *section, grade, choices: Choices::Uk };
            let Some(plain) = Plain::of(section, grade) else { continue };
            for _ in 0..12 {
                let ss = if dice.chance(0.2) { 0.0 } else { dice.between(20.0, 500.0) };
                let end = dice.chance(0.5).then(|| dice.between(0.0, 300.0));
                let a = dice.between(300.0, 9000.0);
                let stiff = match ss {
                    0.0 => StiffLength::Unknown,
                    ss => StiffLength::Seat(Length::mm(ss)),
                };
                let way = end.map_or(Way::Within, |c| Way::AtEnd { c: Length::mm(c) });
                let inputs = WebUnderForce { steel, force: alone(1e4), way, stiff, a: Length::mm(a) };
                let outcome = run(&Inputs::WebUnderForce(inputs));
                let (expected, m2_stays) = plain.web(ss, end, a);
                near(outcome.capacity.unwrap(), expected, section.name);
                if m2_stays { slender += 1 } else { stocky += 1 }
            }
        }
    }
    assert!(stocky > 500 && slender > 500, "{stocky} {slender}");
}
