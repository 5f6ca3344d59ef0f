//! Which actions act together, with what factors: EN 1990 and the two sets of national choices.

use super::job::{Action, Job};
use super::solve::Contribution;

/// psi_0 of an action: EN 1990 Table A1.1; UK: NA.2.2 Table NA.A1.1.
fn psi_0(action: &Action, uk: bool) -> f64 {
    match action {
        Action::Permanent => 1.0,
        Action::Imposed('E') => 1.0,
        Action::Imposed('H') => {
            if uk {
                0.7
            } else {
                0.0
            }
        }
        Action::Imposed(_) => 0.7,
        Action::Snow => 0.5,
        Action::Wind(_) => {
            if uk {
                0.5
            } else {
                0.6
            }
        }
    }
}

#[derive(Clone, Copy, Debug, PartialEq)]
enum Level {
    Out,
    Full,
    Reduced,
}

/// Which variable actions act, at what level.
#[derive(Clone, Copy, Debug)]
struct Mix {
    floors: Level,
    roof: Level,
    snow: Level,
    wind: (Level, usize),
}

/// A rule of combination, for the greatest value of an effect. The least is minus the greatest of its negative.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Rule {
    /// EN 1990 6.4.3.2, set B.
    Strength,
    /// EN 1990 6.4.3.2 (6.10), set A: every permanent contribution by its own sign.
    Equilibrium,
    /// EN 1990 6.5.3 (6.14b).
    Characteristic,
    /// The characteristic combination less what stood before.
    After,
    /// Its variable part.
    Variable,
}

/// What a contribution is to the rules of combination.
#[derive(Clone, Copy, Debug)]
enum Kind {
    Permanent { before: bool },
    Floor,
    Roof,
    Snow,
    Wind(usize),
}

/// The factors for the contributions of one job.
pub struct Combinations {
    kinds: Vec<Kind>,
    psi: Vec<f64>,
    wind_cases: usize,
    xi: f64,
    two_expressions: bool,
    leading: Vec<Mix>,
    accompanying: Vec<Mix>,
}

/// An effect's value from each kind of action, the free ones with only what adds to it.
struct Sums {
    permanent: f64,
    permanent_after: f64,
    permanent_set_a: f64,
    floors: [f64; 2],
    roof: [f64; 2],
    snow: [f64; 2],
    winds: Vec<[f64; 2]>,
}

impl Combinations {
    pub fn new(job: &Job, contributions: &[Contribution]) -> Combinations {
        use Level::{Full, Out, Reduced};
        let mut winds: Vec<&Action> = contributions.iter().map(|contribution| &contribution.action).collect();
        winds.retain(|action| matches!(action, Action::Wind(_)));
        winds.sort();
        winds.dedup();
        let kind = |contribution: &Contribution| match &contribution.action {
            Action::Permanent => Kind::Permanent { before: contribution.before },
            Action::Imposed('H') => Kind::Roof,
            Action::Imposed(_) => Kind::Floor,
            Action::Snow => Kind::Snow,
            wind => Kind::Wind(winds.iter().position(|known| *known == wind).expect("a case")),
        };
        let wind_cases = winds.len().max(1);
        let (mut leading, mut accompanying) = (Vec::new(), Vec::new());
        // Either the imposed load of the whole roof ...
        for (floors, roof) in [(Full, Reduced), (Reduced, Full)] {
            leading.push(Mix { floors, roof, snow: Out, wind: (Out, 0) });
        }
        accompanying.push(Mix { floors: Reduced, roof: Reduced, snow: Out, wind: (Out, 0) });
        // ... or snow, and one wind case if there is any (EN 1991-1-1 3.3.2).
        for case in 0..wind_cases {
            for (floors, snow, wind) in
                [(Full, Reduced, Reduced), (Reduced, Full, Reduced), (Reduced, Reduced, Full)]
            {
                leading.push(Mix { floors, roof: Out, snow, wind: (wind, case) });
            }
            accompanying.push(Mix { floors: Reduced, roof: Out, snow: Reduced, wind: (Reduced, case) });
        }
        Combinations {
            psi: contributions.iter().map(|contribution| psi_0(&contribution.action, job.uk)).collect(),
            kinds: contributions.iter().map(kind).collect(),
            wind_cases,
            // EN 1990 Table A1.2(B); UK: NA.2.2.3.2.
            xi: if job.uk { 0.925 } else { 0.85 },
            two_expressions: job.two_expressions,
            leading,
            accompanying,
        }
    }

    /// The greatest value of an effect under a rule, from its value under each contribution alone.
    pub fn greatest(&self, rule: Rule, values: impl Fn(usize) -> f64) -> f64 {
        let sums = self.sums(values);
        let most = |mixes: &[Mix]| mixes.iter().map(|mix| sums.of(mix)).fold(0.0, f64::max);
        let lead = most(&self.leading);
        match rule {
            Rule::Strength => {
                let unfavourable = sums.permanent > 0.0;
                let gamma = if unfavourable { 1.35 } else { 1.0 };
                let reduced = if unfavourable { self.xi * 1.35 } else { 1.0 };
                if self.two_expressions {
                    let all_accompany = gamma * sums.permanent + 1.5 * most(&self.accompanying);
                    all_accompany.max(reduced * sums.permanent + 1.5 * lead)
                } else {
                    gamma * sums.permanent + 1.5 * lead
                }
            }
            Rule::Equilibrium => sums.permanent_set_a + 1.5 * lead,
            Rule::Characteristic => sums.permanent + lead,
            Rule::After => sums.permanent_after + lead,
            Rule::Variable => lead,
        }
    }

    pub fn least(&self, rule: Rule, values: impl Fn(usize) -> f64) -> f64 {
        -self.greatest(rule, |index| -values(index))
    }

    /// The value of greater size, with its sign.
    pub fn governing(&self, rule: Rule, values: impl Fn(usize) -> f64) -> f64 {
        let (most, least) = (self.greatest(rule, &values), self.least(rule, &values));
        if most >= -least { most } else { least }
    }

    /// Factors on the contributions in each characteristic combination and arrangement whose value is within
    /// `slack` of the greatest (`sign` 1) or the least (`sign` -1). Several where they tie.
    pub fn characteristic_factors(&self, sign: f64, slack: f64, values: impl Fn(usize) -> f64) -> Vec<Vec<f64>> {
        let signed = |index: usize| sign * values(index);
        let sums = self.sums(signed);
        let most = self.leading.iter().map(|mix| sums.of(mix)).fold(0.0, f64::max);
        let close = self.leading.iter().filter(|mix| sums.of(mix) >= most - slack);
        close.map(|mix| self.factors(mix, &sums, signed)).collect()
    }

    fn factors(&self, mix: &Mix, sums: &Sums, signed: impl Fn(usize) -> f64) -> Vec<f64> {
        let factor = |level: Level, index: usize, adds: bool| match level {
            _ if !adds => 0.0,
            Level::Out => 0.0,
            Level::Full => 1.0,
            Level::Reduced => self.psi[index],
        };
        let one = |index: usize| match self.kinds[index] {
            Kind::Permanent { .. } => 1.0,
            Kind::Roof => factor(mix.roof, index, signed(index) > 0.0),
            Kind::Floor => factor(mix.floors, index, signed(index) > 0.0),
            Kind::Snow => factor(mix.snow, index, sums.snow[0] > 0.0),
            Kind::Wind(case) if case == mix.wind.1 => factor(mix.wind.0, index, sums.winds[case][0] > 0.0),
            Kind::Wind(_) => 0.0,
        };
        (0..self.kinds.len()).map(one).collect()
    }

    fn sums(&self, values: impl Fn(usize) -> f64) -> Sums {
        let mut sums = Sums {
            permanent: 0.0,
            permanent_after: 0.0,
            permanent_set_a: 0.0,
            floors: [0.0; 2],
            roof: [0.0; 2],
            snow: [0.0; 2],
            winds: vec![[0.0; 2]; self.wind_cases],
        };
        for (index, kind) in self.kinds.iter().enumerate() {
            let value = values(index);
            let sum = match *kind {
                Kind::Permanent { before } => {
                    sums.permanent += value;
                    sums.permanent_after += if before { 0.0 } else { value };
                    sums.permanent_set_a += if value > 0.0 { 1.10 * value } else { 0.90 * value };
                    continue;
                }
                Kind::Floor | Kind::Roof if value <= 0.0 => continue, // free: away where it relieves
                Kind::Floor => &mut sums.floors,
                Kind::Roof => &mut sums.roof,
                Kind::Snow => &mut sums.snow,
                Kind::Wind(case) => &mut sums.winds[case],
            };
            sum[0] += value;
            sum[1] += self.psi[index] * value;
        }
        sums
    }
}

impl Sums {
    fn of(&self, mix: &Mix) -> f64 {
        let part = |level: Level, sum: [f64; 2]| match level {
            Level::Out => 0.0,
            Level::Full => sum[0].max(0.0),
            Level::Reduced => sum[1].max(0.0),
        };
        part(mix.floors, self.floors)
            + part(mix.roof, self.roof)
            + part(mix.snow, self.snow)
            + part(mix.wind.0, self.winds[mix.wind.1])
    }
}
