//! What is to be calculated, as it is meant: no spelling of the job file survives here.
//!
//! Whoever makes a [`Building`] owes what the reader of a job checks: positions lie on their beams, bearings are
//! strictly increasing, spans, widths and heights are finite and positive, marks are unique. Loops of beams and
//! mechanisms are found by the calculation itself and come back as faults that carry the [`Origin`] of the part.

use crate::actions::{Category, Choices, StrengthRule};
use crate::limits::Limits;
use crate::materials::Grade;
use crate::quantity::{AreaLoad, Force, Length, LineLoad, WeightDensity};
use crate::sections::Section;

/// Where a part came from: a token that the calculation carries and never interprets.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord, Hash, Default)]
pub struct Origin(pub u32);

/// Everything one calculation needs.
#[derive(Clone, Debug)]
pub struct Building {
    pub basis: Basis,
    pub build_ups: Vec<BuildUp>,
    pub walls: Vec<Wall>,
    pub beams: Vec<Beam>,
}

/// The rules of the whole job. Fields that say `defaulted` were not typed and become numbered assumptions.
#[derive(Clone, Debug)]
pub struct Basis {
    pub choices: Choices,
    pub rule: StrengthRule,
    /// Adds shear deformation (shear area of EN 1993-1-1 6.2.6(3), G) to every movement.
    pub shear_flexibility: bool,
    pub choices_defaulted: bool,
    pub rule_defaulted: bool,
}

/// An area load made of layers (EN 1991-1-1); loads per area.
#[derive(Clone, Debug)]
pub struct BuildUp {
    pub name: String,
    /// Slope of the layers in radians, 0 where level. Layers lie on the slope, variable loads on plan.
    pub pitch: f64,
    pub layers: Vec<Layer>,
    pub imposed: Option<ImposedArea>,
    pub snow: Option<AreaLoad>,
    /// On plan, positive downward.
    pub wind: Option<AreaLoad>,
    pub origin: Origin,
}

#[derive(Clone, Debug)]
pub struct Layer {
    pub what: String,
    pub weight: LayerWeight,
}

#[derive(Clone, Copy, Debug)]
pub enum LayerWeight {
    Load(AreaLoad),
    Thick { thickness: Length, density: WeightDensity },
}

#[derive(Clone, Copy, Debug)]
pub struct ImposedArea {
    pub category: Category,
    pub load: AreaLoad,
    /// Movable partitions (EN 1991-1-1 6.3.1.2(8)); they join the imposed load.
    pub partitions: Option<AreaLoad>,
}

/// A wall that carries beams and does not move by itself.
#[derive(Clone, Debug)]
pub struct Wall {
    pub name: String,
    pub origin: Origin,
}

/// A prismatic steel beam; positions are measured along it from its first outermost analysed point.
#[derive(Clone, Debug)]
pub struct Beam {
    pub mark: String,
    pub title: Option<String>,
    pub section: Section,
    pub grade: Grade,
    pub grade_defaulted: bool,
    pub existing: bool,
    pub length: Length,
    /// Two or more, strictly increasing in `at`.
    pub bearings: Vec<Bearing>,
    pub restraint: Restraint,
    pub restraint_defaulted: bool,
    /// Where the beam's own weight acts.
    pub load_height: LoadHeight,
    pub loads: Vec<LoadRow>,
    pub limits: Limits,
    pub origin: Origin,
}

/// What a bearing stands on.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Carrier {
    /// Index into [`Building::walls`].
    Wall(usize),
    /// Index into [`Building::beams`], and the place along that beam.
    Beam { beam: usize, lands: Length },
}

#[derive(Clone, Debug)]
pub struct Bearing {
    pub on: Carrier,
    pub at: Length,
    /// Length of the seat along the beam; only on walls.
    pub bearing_length: Option<Length>,
    pub bearing_length_defaulted: bool,
    pub joint: Joint,
    pub joint_defaulted: bool,
    pub end_restraint: EndRestraint,
    pub end_restraint_defaulted: bool,
    /// Resistance to uplift, as a design value.
    pub held_down: Option<Force>,
    /// Movement of the support itself, downward; only on walls.
    pub settles: Length,
    /// Eccentricity of the reaction from the web of the carrying beam.
    pub offset: Length,
    pub origin: Origin,
}

#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Joint {
    OnTopFlange,
    ToTheWeb,
}

/// How a bearing holds the beam against lateral movement and twist.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum EndRestraint {
    Fork,
    BottomFlangeHeld,
    Resting,
}

#[derive(Clone, Debug, PartialEq)]
pub struct Restraint {
    pub top: FlangeHold,
    pub bottom: FlangeHold,
    /// What holds it, in the engineer's words.
    pub by: Option<String>,
}

#[derive(Clone, Debug, PartialEq)]
pub enum FlangeHold {
    Continuous,
    /// At the bearings only.
    Ends,
    /// At the bearings and at these places along the beam.
    At(Vec<Length>),
}

#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum LoadHeight {
    TopFlange,
    ShearCentre,
    BottomFlange,
}

/// Whether the permanent part stands before the element that could crack does.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Stage {
    Before,
    After,
}

/// One row of loads as the engineer described it.
#[derive(Clone, Debug)]
pub struct LoadRow {
    pub what: String,
    pub stage: Stage,
    pub stage_defaulted: bool,
    pub height: LoadHeight,
    /// Eccentricity from the web.
    pub offset: Length,
    pub load: Load,
    pub wind_case: WindCase,
    pub origin: Origin,
}

/// The name of a wind case; the empty name is the default case.
#[derive(Clone, Debug, PartialEq, Eq, PartialOrd, Ord, Hash, Default)]
pub struct WindCase(pub String);

/// Pairs are values at `from` and at `to`, straight between.
#[derive(Clone, Debug)]
pub enum Load {
    /// A build-up (index into [`Building::build_ups`]) over a tributary width.
    Area {
        build_up: usize,
        width: (Length, Length),
        from: Length,
        to: Length,
    },
    /// A build-up's layers over a height.
    Wall {
        build_up: usize,
        height: (Length, Length),
        from: Length,
        to: Length,
    },
    Line {
        direct: Direct<LineLoad>,
        from: Length,
        to: Length,
    },
    Point {
        direct: Direct<Force>,
        at: Length,
    },
}

/// Actions given directly; positive downward, only wind may be negative.
#[derive(Clone, Copy, Debug, Default)]
pub struct Direct<T> {
    pub permanent: Option<T>,
    pub imposed: Option<(Category, T)>,
    pub snow: Option<T>,
    pub wind: Option<T>,
}
