//! Deflection limits: what was asked for, the named sets, and which limit is in force.
//!
//! Named sets and their reasons are common practice except span/360, span/200 for variable actions and the half
//! value for cantilevers (UK National Annex to EN 1993-1-1, NA.2.23).

use crate::quantity::Length;

/// The movements that can be limited.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Movement {
    /// Own movement under all characteristic actions.
    Total,
    /// Own movement less what loads of stage "before" cause.
    After,
    /// Own movement under variable actions alone.
    Variable,
    /// Absolute movement, all it inherits included.
    Stacked,
    /// Difference of two neighbouring bearings over their distance.
    Tilt,
}

/// One bound; a movement may have several, the tightest governs.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Bound {
    /// span / n; for an overhang the span is twice its length.
    SpanOver(f64),
    Length(Length),
    /// 1 / n, for tilt only.
    OneIn(f64),
}

/// A named set of limits.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum LimitSet {
    BrittleFinish,
    Masonry,
    GlazedDoors,
    TimberFloor,
    NoFinish,
}

/// Where a limit in force came from; it decides the reason and the source that are printed.
#[derive(Clone, Debug, PartialEq)]
pub enum LimitFrom {
    /// Typed, with the engineer's own reason if one was given.
    Given {
        reason: Option<String>,
    },
    Set(LimitSet),
    /// `stacked` without a limit of its own takes the beam's total limit.
    SameAsTotal(Box<LimitFrom>),
}

/// A limit in force for one movement of one beam.
#[derive(Clone, Debug, PartialEq)]
pub struct Limit {
    pub movement: Movement,
    pub bounds: Vec<Bound>,
    pub from: LimitFrom,
}

/// The limits in force for a beam, one entry a limited movement, in the order of [`Movement`].
#[derive(Clone, Debug, PartialEq, Default)]
pub struct Limits {
    pub limits: Vec<Limit>,
    /// Neither the job nor the beam said anything, so that "brittle finish" was taken.
    pub defaulted: bool,
}

/// What one table of limits (a beam's or the job's) says.
#[derive(Clone, Debug, PartialEq, Default)]
pub struct LimitTable {
    pub set: Option<LimitSet>,
    /// Single limits, in any order.
    pub single: Vec<(Movement, Vec<Bound>)>,
    pub reason: Option<String>,
}

impl LimitSet {
    pub const ALL: [LimitSet; 5] = [
        LimitSet::BrittleFinish,
        LimitSet::Masonry,
        LimitSet::GlazedDoors,
        LimitSet::TimberFloor,
        LimitSet::NoFinish,
    ];

    /// The name it has in a job file.
    pub fn name(self) -> &'static str {
        match self {
            LimitSet::BrittleFinish => "brittle finish",
            LimitSet::Masonry => "masonry",
            LimitSet::GlazedDoors => "glazed doors",
            LimitSet::TimberFloor => "timber floor",
            LimitSet::NoFinish => "no finish",
        }
    }

    /// The bounds of the set, by movement.
    pub fn limits(self) -> Vec<(Movement, Vec<Bound>)> {
        use Bound::{Length as Of, OneIn, SpanOver};
        use Movement::{After, Tilt, Total, Variable};
        match self {
            LimitSet::BrittleFinish => vec![(Total, vec![SpanOver(250.0)]), (Variable, vec![SpanOver(360.0)])],
            LimitSet::Masonry => vec![
                (Total, vec![SpanOver(250.0)]),
                (After, vec![SpanOver(500.0), Of(Length::mm(10.0))]),
                (Variable, vec![SpanOver(360.0)]),
                (Tilt, vec![OneIn(500.0)]),
            ],
            LimitSet::GlazedDoors => vec![(After, vec![SpanOver(500.0), Of(Length::mm(5.0))])],
            LimitSet::TimberFloor => {
                vec![(Total, vec![SpanOver(250.0), Of(Length::mm(14.0))]), (Variable, vec![SpanOver(360.0)])]
            }
            LimitSet::NoFinish => vec![(Total, vec![SpanOver(200.0)]), (Variable, vec![SpanOver(200.0)])],
        }
    }

    /// Why the set limits this movement, as printed beside it.
    pub fn reason(self, movement: Movement) -> &'static str {
        match (self, movement) {
            (LimitSet::BrittleFinish, Movement::Variable) => "plaster and other brittle finishes",
            (LimitSet::Masonry, Movement::After) => "masonry could crack once it stands",
            (LimitSet::Masonry, Movement::Variable) => "masonry and plaster",
            (LimitSet::Masonry, Movement::Tilt) => "masonry on a leaning bearing",
            (LimitSet::GlazedDoors, _) => "glazed doors must keep moving; the maker's figure comes first",
            (LimitSet::TimberFloor, Movement::Total) => "a floor that feels level",
            (LimitSet::TimberFloor, _) => "ceilings below the floor",
            (LimitSet::NoFinish, Movement::Variable) => "no finish that could crack",
            (_, Movement::Stacked) => "the same eye sees what it inherits",
            _ => "what the eye sees",
        }
    }

    /// Where the bound comes from.
    pub fn source(self, movement: Movement) -> &'static str {
        match (self, movement) {
            (LimitSet::GlazedDoors, _) => "common practice",
            (_, Movement::Variable) => "EN 1993-1-1, UK NA.2.23",
            _ => "common practice",
        }
    }
}

impl Movement {
    pub const ALL: [Movement; 5] =
        [Movement::Total, Movement::After, Movement::Variable, Movement::Stacked, Movement::Tilt];
}

/// The limits in force for a beam: its own single limits, then its own set, then the job's single limits, then the
/// job's set, which counts only if the beam names none; "brittle finish" where neither says anything at all.
/// A stacked limit that nobody gave is the beam's total limit.
pub fn in_force(beam: &LimitTable, job: &LimitTable) -> Limits {
    let silent = |table: &LimitTable| table.set.is_none() && table.single.is_empty();
    let defaulted = silent(beam) && silent(job);
    let job_set = match (defaulted, beam.set) {
        (true, _) => Some(LimitSet::BrittleFinish),
        (false, Some(_)) => None,
        (false, None) => job.set,
    };
    let find = |movement| {
        given(beam, movement)
            .or_else(|| from_set(beam.set, movement))
            .or_else(|| given(job, movement))
            .or_else(|| from_set(job_set, movement))
    };
    let mut limits: Vec<Limit> = Movement::ALL.into_iter().filter_map(find).collect();
    let has_stacked = limits.iter().any(|l| l.movement == Movement::Stacked);
    if let (false, Some(total)) = (has_stacked, limits.iter().find(|l| l.movement == Movement::Total)) {
        let stacked = Limit {
            movement: Movement::Stacked,
            bounds: total.bounds.clone(),
            from: LimitFrom::SameAsTotal(Box::new(total.from.clone())),
        };
        limits.push(stacked);
        limits.sort_by_key(|l| l.movement);
    }
    Limits { limits, defaulted }
}

fn given(table: &LimitTable, movement: Movement) -> Option<Limit> {
    let (_, bounds) = table.single.iter().find(|(m, _)| *m == movement)?;
    Some(Limit { movement, bounds: bounds.clone(), from: LimitFrom::Given { reason: table.reason.clone() } })
}

fn from_set(set: Option<LimitSet>, movement: Movement) -> Option<Limit> {
    let set = set?;
    let (_, bounds) = set.limits().into_iter().find(|(m, _)| *m == movement)?;
    Some(Limit { movement, bounds, from: LimitFrom::Set(set) })
}

/// The tightest of some bounds as a length, for a span; none where no bound is a length (tilt).
pub fn tightest(bounds: &[Bound], span: Length) -> Option<Length> {
    let lengths = bounds.iter().filter_map(|bound| match bound {
        Bound::SpanOver(n) => Some(span.si() / n),
        Bound::Length(length) => Some(length.si()),
        Bound::OneIn(_) => None,
    });
    lengths.min_by(f64::total_cmp).map(Length::from_si)
}

impl Limits {
    /// The limit in force for a movement.
    pub fn of(&self, movement: Movement) -> Option<&Limit> {
        self.limits.iter().find(|l| l.movement == movement)
    }
}
