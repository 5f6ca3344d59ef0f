//! What the calculation found. Everything here is typed and SI; nothing here is written to a file as it is.

use crate::actions::combinations::Combination;
use crate::actions::{Action, Actions};
use crate::assumptions::Assumption;
use crate::building::{Carrier, Load, Stage};
use crate::checks::Inputs;
use crate::limits::Movement;
use crate::quantity::{Area, Force, Length, LineLoad, Moment, Q, SecondMoment};

/// Results of a whole building. Beams and walls stand in the order of the building's own lists.
#[derive(Clone, Debug)]
pub struct Results {
    pub actions: Actions,
    pub combinations: Combinations,
    pub beams: Vec<BeamResult>,
    pub walls: Vec<WallResult>,
    pub takedown: TakeDown,
    /// Indices of beams in the order in which loads travel: a beam comes after all that land on it.
    pub order: Vec<usize>,
    /// Connected beams, in the order of their first beam in `order`.
    pub chains: Vec<Chain>,
    pub assumptions: Vec<Assumption>,
    pub verdict: Verdict,
}

/// The combinations looked at, in a fixed order; [`Effect::combination`] counts in the list of its purpose.
#[derive(Clone, Debug)]
pub struct Combinations {
    pub strength: Vec<Combination>,
    pub equilibrium: Vec<Combination>,
    pub characteristic: Vec<Combination>,
}

#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord)]
pub enum Verdict {
    Met,
    NotVerified,
    NotMet,
}

impl Verdict {
    pub fn word(self) -> &'static str {
        match self {
            Verdict::Met => "met",
            Verdict::NotVerified => "not verified",
            Verdict::NotMet => "not met",
        }
    }
}

/// A value at one place under one combination and arrangement, with what each action contributes to it.
#[derive(Clone, Debug, PartialEq)]
pub struct Effect<const FORCE: i8, const LENGTH: i8> {
    /// The combined value: the sum of the parts, factored.
    pub value: Q<f64, FORCE, LENGTH>,
    /// Along the beam.
    pub at: Length,
    pub combination: CombinationId,
    /// Permanent first; actions that do not take part are left out.
    pub parts: Vec<Part<FORCE, LENGTH>>,
    pub arrangement: Arrangement,
}

/// Which combination: its purpose's list and the place in it.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum CombinationId {
    Strength(usize),
    Equilibrium(usize),
    Characteristic(usize),
}

impl Combinations {
    pub fn get(&self, id: CombinationId) -> Option<&Combination> {
        match id {
            CombinationId::Strength(n) => self.strength.get(n),
            CombinationId::Equilibrium(n) => self.equilibrium.get(n),
            CombinationId::Characteristic(n) => self.characteristic.get(n),
        }
    }
}

/// What one action contributes, before factors; the arrangement is already in it.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Part<const FORCE: i8, const LENGTH: i8> {
    pub action: Action,
    pub value: Q<f64, FORCE, LENGTH>,
    /// Partial factor.
    pub partial: f64,
    /// psi_0 of an accompanying action, xi of permanent actions in (6.10b), else 1.
    pub reduction: f64,
    pub leads: bool,
}

/// Which free rows of imposed load are absent because they would relieve the effect.
#[derive(Clone, Debug, PartialEq, Default)]
pub struct Arrangement {
    pub absent: Vec<AbsentRow>,
    /// Some free row is present (so that "everywhere" means something).
    pub any_present: bool,
}

/// An imposed row that is left out on one stretch (span or overhang) of a beam.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct AbsentRow {
    pub beam: usize,
    pub row: usize,
    pub stretch: usize,
}

/// A span between neighbouring bearings, or an end beyond the outermost one.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Stretch {
    pub kind: StretchKind,
    pub from: Length,
    pub to: Length,
}

impl Stretch {
    /// The span that a limit such as span/250 means: for an overhang twice its length.
    pub fn span_for_limits(&self) -> Length {
        let length = self.to.si() - self.from.si();
        match self.kind {
            StretchKind::Span => Length::from_si(length),
            StretchKind::Overhang | StretchKind::SeatEnd => Length::from_si(2.0 * length),
        }
    }
}

#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum StretchKind {
    Span,
    /// Beyond a bearing by at least the section's depth.
    Overhang,
    /// Beyond a bearing by less than the depth: bearing length, without a limit of its own.
    SeatEnd,
}

#[derive(Clone, Debug)]
pub struct BeamResult {
    /// From the first end to the last: an optional end, the spans, an optional end.
    pub stretches: Vec<Stretch>,
    /// Distance from the top of the chain: 0 where nothing lands on the beam.
    pub level: usize,
    pub rows: Vec<RowResult>,
    /// Beams that land on this one, by place along it.
    pub landings: Vec<Landing>,
    pub bearings: Vec<BearingResult>,
    pub cut_length: Length,
    /// Mass of one section of the ordering length, kg.
    pub mass: f64,
    /// Greatest and least moment over the beam, strength combinations.
    pub moment_max: Effect<1, 1>,
    pub moment_min: Effect<1, 1>,
    /// Shear of greatest size.
    pub shear: Effect<1, 0>,
    pub movements: Movements,
    pub second_moment: RequiredSecondMoment,
    /// In the order of the check names; within one name by place.
    pub checks: Vec<Check>,
    pub drawn: Drawn,
    pub hand_check: Option<HandCheck>,
    /// Moment that `settles` would cause on a continuous beam, greatest in size; outside this calculation.
    pub settlement_moment: Option<Moment>,
    /// Shear flexibility: what it would add to (false) or has added to (true) the greatest own total deflection.
    pub shear_movement: Length,
    pub verdict: Verdict,
}

/// One row of the load table: own weight first, then the rows as typed.
#[derive(Clone, Debug)]
pub struct RowResult {
    /// Index into the beam's `loads`; none for own weight.
    pub row: Option<usize>,
    pub what: String,
    pub stage: Stage,
    pub load: RowLoad,
    /// Loaded area, for area and wall loads.
    pub area: Option<Area>,
    /// Total of each action over the row (area × load as typed, not from the solve).
    pub totals: Vec<(Action, Force)>,
}

#[derive(Clone, Debug)]
pub enum RowLoad {
    /// Intensity of each action at `from` and at `to`, straight between.
    Line {
        from: Length,
        to: Length,
        intensities: Vec<(Action, LineLoad, LineLoad)>,
    },
    Point {
        at: Length,
        forces: Vec<(Action, Force)>,
    },
}

/// A beam that lands on this one.
#[derive(Clone, Debug)]
pub struct Landing {
    pub beam: usize,
    pub bearing: usize,
    pub at: Length,
}

#[derive(Clone, Debug)]
pub struct BearingResult {
    pub on: Carrier,
    pub at: Length,
    /// Reaction per action with all loads of the action present everywhere, upward positive.
    pub reactions: Vec<(Action, Force)>,
    /// Set B.
    pub design_max: Effect<1, 0>,
    pub design_min: Effect<1, 0>,
    /// Least reaction over sets A and B: negative where the beam lifts.
    pub least: Effect<1, 0>,
    pub characteristic_max: Effect<1, 0>,
}

impl BearingResult {
    /// The greatest uplift, 0 where the bearing never lifts.
    pub fn uplift_max(&self) -> Force {
        Force::from_si(f64::max(0.0, -self.least.value.si()))
    }
}

/// Movements of a beam under characteristic combinations; downward positive, greatest in size.
#[derive(Clone, Debug)]
pub struct Movements {
    pub own_total: Effect<0, 1>,
    pub own_after: Effect<0, 1>,
    pub own_variable: Effect<0, 1>,
    /// At the place of the greatest stacked movement.
    pub stacked: Stacked,
    /// At the place of the greatest ratio to its limit; none without a limit.
    pub governing: Option<Stacked>,
    /// Largest own deflections down the worst route to the ground, simply added.
    pub hand_rule: Length,
    /// Beams of that route, this one first.
    pub hand_route: Vec<usize>,
    /// Greatest tilt (size) over the spans.
    pub tilt: Tilt,
}

/// An absolute movement and the parts that add up to it, all of one combination, arrangement and place.
#[derive(Clone, Debug)]
pub struct Stacked {
    pub total: Effect<0, 1>,
    pub own: Length,
    pub inherited: Length,
    pub settled: Length,
    pub limit: Option<Length>,
    /// What each beam's bending adds to the movement at this place: (beam, movement), this beam first.
    pub shares: Vec<(usize, Length)>,
}

#[derive(Clone, Debug)]
pub struct Tilt {
    pub stretch: usize,
    /// Movement of the right bearing less that of the left one, over the span (`value` is that difference).
    pub difference: Effect<0, 1>,
    pub span: Length,
    /// Movements of the two bearings in that combination and arrangement.
    pub left: Length,
    pub right: Length,
}

impl Tilt {
    pub fn ratio(&self) -> f64 {
        self.difference.value.si() / self.span.si()
    }
}

#[derive(Clone, Debug)]
pub struct RequiredSecondMoment {
    pub provided: SecondMoment,
    /// None where no movement is limited or where the supports have used the whole budget.
    pub required: Option<SecondMoment>,
    pub governed_by: Option<Movement>,
    /// The stacked limit is used up by the supports alone.
    pub budget_used: bool,
}

/// One requirement, or one piece of advice.
#[derive(Clone, Debug)]
pub struct Check {
    pub kind: CheckKind,
    pub place: Place,
    pub at: Length,
    pub demand: Option<f64>,
    pub capacity: Option<f64>,
    pub unit: CheckUnit,
    pub utilisation: Option<f64>,
    pub verdict: Verdict,
    /// Why it is not verified.
    pub reason: Option<String>,
    /// The clause or the limit as the clause column prints it: "EN 1993-1-1 6.2.5", "span/250".
    pub clause: String,
    pub combination: Option<CombinationId>,
    pub arrangement: Option<Arrangement>,
    /// Printed as the check's name instead of its kind.
    pub note: Option<&'static str>,
    /// Never part of the verdict.
    pub advice: bool,
    /// What the check was computed from: running it again on traced numbers gives its workings.
    pub inputs: Option<Inputs>,
}

/// SI unit of demand and capacity.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum CheckUnit {
    Force,
    Moment,
    Length,
    Ratio,
}

/// In the order in which rows stand in every table.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum CheckKind {
    Bending,
    Shear,
    BendingWithShear,
    LateralTorsionalBuckling,
    WebUnderForce,
    WebWithBending,
    Uplift,
    TotalDeflection,
    AfterDeflection,
    VariableDeflection,
    StackedDeflection,
    Tilt,
    Torsion,
}

impl CheckKind {
    pub const ALL: [CheckKind; 13] = [
        CheckKind::Bending,
        CheckKind::Shear,
        CheckKind::BendingWithShear,
        CheckKind::LateralTorsionalBuckling,
        CheckKind::WebUnderForce,
        CheckKind::WebWithBending,
        CheckKind::Uplift,
        CheckKind::TotalDeflection,
        CheckKind::AfterDeflection,
        CheckKind::VariableDeflection,
        CheckKind::StackedDeflection,
        CheckKind::Tilt,
        CheckKind::Torsion,
    ];

    pub fn name(self) -> &'static str {
        match self {
            CheckKind::Bending => "bending",
            CheckKind::Shear => "shear",
            CheckKind::BendingWithShear => "bending with shear",
            CheckKind::LateralTorsionalBuckling => "lateral-torsional buckling",
            CheckKind::WebUnderForce => "web under concentrated force",
            CheckKind::WebWithBending => "web with bending",
            CheckKind::Uplift => "uplift",
            CheckKind::TotalDeflection => "total deflection",
            CheckKind::AfterDeflection => "after deflection",
            CheckKind::VariableDeflection => "variable deflection",
            CheckKind::StackedDeflection => "stacked deflection",
            CheckKind::Tilt => "tilt",
            CheckKind::Torsion => "torsion",
        }
    }
}

/// Where a check looks.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Place {
    Point {
        at: Length,
    },
    /// A span or overhang, by index into the beam's stretches.
    Stretch {
        index: usize,
    },
    /// A piece between restraints.
    Segment {
        from: Length,
        to: Length,
    },
    Bearing {
        index: usize,
    },
    /// Under a landing: index into [`BeamResult::landings`].
    Landing {
        index: usize,
    },
    /// Under a point load: index into [`BeamResult::rows`].
    Load {
        row: usize,
    },
}

#[derive(Clone, Debug)]
pub struct WallResult {
    pub totals: Vec<(Action, Force)>,
    pub design_max: Force,
    pub characteristic_max: Force,
}

/// Load taken down: from the loads as typed, and from the solve; per action.
#[derive(Clone, Debug)]
pub struct TakeDown {
    pub applied: Vec<(Action, Force)>,
    pub to_supports: Vec<(Action, Force)>,
    /// Sum of the sizes of all loads, the measure for the difference.
    pub absolute: Vec<(Action, Force)>,
}

/// Connected beams, moved together under one combination and arrangement.
#[derive(Clone, Debug)]
pub struct Chain {
    /// In the order in which loads travel.
    pub beams: Vec<usize>,
    /// The beam whose stacked movement is closest to its limit (without limits: the greatest); its governing
    /// combination and arrangement are those of the chain.
    pub governing_beam: usize,
    pub characteristic: CombinationId,
    pub arrangement: Arrangement,
    /// One a beam, in the order of `beams`.
    pub curves: Vec<ChainCurve>,
}

#[derive(Clone, Debug)]
pub struct ChainCurve {
    pub beam: usize,
    pub own: Curve,
    /// Absolute, `settles` included.
    pub stacked: Curve,
    /// Absolute movement of each bearing.
    pub bearings: Vec<Length>,
}

/// Curves to draw, each exact: polynomials between breaks.
#[derive(Clone, Debug)]
pub struct Drawn {
    /// Under the combination and arrangement of the moment of greatest size.
    pub strength: CombinationId,
    pub strength_arrangement: Arrangement,
    /// Line loads by row (in the order of `rows`), factored.
    pub line_loads: Vec<DrawnLoad>,
    pub point_loads: Vec<DrawnForce>,
    pub shear: Curve,
    pub moment: Curve,
    /// Under the combination and arrangement of `movements.governing` (or `.stacked` without a limit).
    pub characteristic: CombinationId,
    pub characteristic_arrangement: Arrangement,
    pub own: Curve,
    pub stacked: Curve,
}

#[derive(Clone, Debug)]
pub struct DrawnLoad {
    pub row: usize,
    pub from: Length,
    pub to: Length,
    pub intensity: (LineLoad, LineLoad),
}

#[derive(Clone, Debug)]
pub struct DrawnForce {
    pub at: Length,
    pub force: Force,
    pub source: ForceSource,
}

#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum ForceSource {
    Row(usize),
    Landing(usize),
}

/// A curve along the beam: on each piece a polynomial in the distance from the piece's start (SI coefficients, lowest
/// power first).
#[derive(Clone, Debug, Default)]
pub struct Curve {
    pub pieces: Vec<Piece>,
}

#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Piece {
    pub from: f64,
    pub to: f64,
    pub coefficients: [f64; 6],
}

/// A beam on two bearings recomputed from textbook cases on its reactions and loads.
#[derive(Clone, Debug)]
pub struct HandCheck {
    /// Where the moment and the own deflection are looked at.
    pub at: Length,
    pub span: Length,
    pub cases: Vec<HandCase>,
    pub moment_by_hand: Moment,
    pub moment_solved: Moment,
    pub own_by_hand: Length,
    pub own_solved: Length,
}

/// One textbook case on a simply supported span; design load for the moment, characteristic load for the movement.
#[derive(Clone, Debug)]
pub struct HandCase {
    pub what: String,
    pub case: TextbookCase,
    pub moment: Moment,
    pub own: Length,
}

#[derive(Clone, Debug)]
pub enum TextbookCase {
    /// Straight-sided load over part of the span.
    Line {
        from: Length,
        to: Length,
        design: (LineLoad, LineLoad),
        characteristic: (LineLoad, LineLoad),
    },
    Point {
        at: Length,
        design: Force,
        characteristic: Force,
    },
    /// Moment applied at a bearing by an overhang, sagging positive.
    EndMoment {
        at_left: bool,
        design: Moment,
        characteristic: Moment,
    },
}

impl Load {
    pub fn is_point(&self) -> bool {
        matches!(self, Load::Point { .. })
    }
}

impl Curve {
    /// Value at a place along the beam; at a step that of the piece before it.
    pub fn at(&self, x: f64) -> f64 {
        let k = self.pieces.partition_point(|p| p.to < x).min(self.pieces.len().saturating_sub(1));
        self.pieces.get(k).map_or(0.0, |p| p.at(x))
    }
}

impl Piece {
    /// Value at a place along the beam by this piece's polynomial.
    pub fn at(&self, x: f64) -> f64 {
        let t = x - self.from;
        self.coefficients.iter().rev().fold(0.0, |sum, c| sum * t + c)
    }
}
