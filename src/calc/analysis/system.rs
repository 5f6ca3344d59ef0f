//! Solving a component for its unit loads.

use nalgebra::{Cholesky, DMatrix, DVector, Dyn};

use crate::analysis::contribution::UnitLoad;
use crate::analysis::polynomial::{Poly, ZERO};
use crate::analysis::profile::{Elastic, Forces, add_line, elastic_curve, moments, value_at};
use crate::building::{Building, Carrier};
use crate::fault::Fault;
use crate::materials::{E, G};

/// What one load does to one beam; positions of pieces are the component's breaks.
#[derive(Clone, Debug)]
pub struct Response {
    /// Sagging positive, Nm per unit; empty where the beam only moves with what carries it.
    pub moments: Vec<Poly>,
    /// Downward positive, m per unit.
    pub movement: Vec<Poly>,
    /// Upward positive, one a bearing, N per unit.
    pub reactions: Vec<f64>,
}

/// Responses of all beams of a component to one load; none for a beam that it does not reach.
pub type Responses = Vec<Option<Response>>;

/// How a system differs from the building as it is described.
#[derive(Clone, Copy, Debug, Default)]
pub struct Variant {
    /// Multiplies the second moment of area of one beam (local index), and its shear stiffness with it, so that its
    /// whole movement scales.
    pub scaled: Option<(usize, f64)>,
    /// Looks at shear deformation where the basis leaves it out, and the other way round.
    pub other_shear: bool,
}

/// A component ready to be solved: its system is factored once.
pub struct System<'a> {
    building: &'a Building,
    /// Indices into the building's beams, in the order in which loads travel.
    pub members: &'a [usize],
    pub breaks: &'a [Vec<f64>],
    elastic: Vec<Elastic>,
    /// Beams of the building with their local indices, sorted.
    local: Vec<(usize, usize)>,
    /// Inner bearings: (local beam, bearing).
    inner: Vec<(usize, usize)>,
    factored: Option<Cholesky<f64, Dyn>>,
}

/// Loads of one case: forces on each beam of the component, and whether supports settle.
struct Case<'a> {
    direct: &'a [(usize, Forces)],
    settles: bool,
}

impl<'a> System<'a> {
    /// Assembles and factors.
    pub fn new(
        building: &'a Building,
        members: &'a [usize],
        breaks: &'a [Vec<f64>],
        variant: Variant,
    ) -> Result<System<'a>, Fault> {
        let mut local: Vec<(usize, usize)> = members.iter().enumerate().map(|(n, &beam)| (beam, n)).collect();
        local.sort_unstable();
        let elastic = members.iter().enumerate().map(|(n, &beam)| {
            let factor = variant.scaled.filter(|s| s.0 == n).map_or(1.0, |s| s.1);
            elastic_of(building, beam, factor, building.basis.shear_flexibility != variant.other_shear)
        });
        let mut inner = Vec::new();
        for (n, &beam) in members.iter().enumerate() {
            let count = building.beams[beam].bearings.len();
            if count < 2 {
                return Err(Fault::Mechanism { beam: building.beams[beam].origin });
            }
            inner.extend((1..count - 1).map(|bearing| (n, bearing)));
        }
        let mut system =
            System { building, members, breaks, elastic: elastic.collect(), local, inner, factored: None };
        system.factored = system.factor()?;
        Ok(system)
    }

    /// The matrix of the system: how far each inner bearing and what carries it come together under a unit force
    /// between the two of another inner bearing. Symmetric (reciprocity) and positive definite.
    fn factor(&self) -> Result<Option<Cholesky<f64, Dyn>>, Fault> {
        let count = self.inner.len();
        if count == 0 {
            return Ok(None);
        }
        let mut matrix = DMatrix::<f64>::zeros(count, count);
        let nothing = Case { direct: &[], settles: false };
        for column in 0..count {
            let mut forces = vec![0.0; count];
            forces[column] = 1.0;
            let gaps = self.gaps(&nothing, &self.respond(&nothing, &forces));
            for (row, gap) in gaps.into_iter().enumerate() {
                matrix[(row, column)] = -gap;
            }
        }
        let symmetric = (&matrix + matrix.transpose()) * 0.5;
        let beam = self.inner[0].0;
        let fault = Fault::Mechanism { beam: self.building.beams[self.members[beam]].origin };
        Cholesky::new(symmetric).map(Some).ok_or(fault)
    }

    /// Local index of a beam of the building.
    fn local(&self, beam: usize) -> Option<usize> {
        let found = self.local.binary_search_by_key(&beam, |(beam, _)| *beam).ok()?;
        Some(self.local[found].1)
    }

    /// Responses to a unit load.
    pub fn unit(&self, unit: &UnitLoad) -> Responses {
        let direct = [(unit.beam, Forces::of(&unit.shape))];
        self.solve(&Case { direct: &direct, settles: false })
    }

    /// Responses to all settlements of supports together; none where nothing settles.
    pub fn settlement(&self) -> Option<Responses> {
        let settles = |&beam: &usize| self.building.beams[beam].bearings.iter().any(|b| b.settles.si() != 0.0);
        self.members.iter().any(settles).then(|| self.solve(&Case { direct: &[], settles: true }))
    }

    fn solve(&self, case: &Case) -> Responses {
        let none = vec![0.0; self.inner.len()];
        let released = self.respond(case, &none);
        let Some(factored) = &self.factored else { return released };
        let gaps = self.gaps(case, &released);
        if gaps.iter().all(|gap| *gap == 0.0) {
            return released;
        }
        let mut forces = factored.solve(&DVector::from_vec(gaps));
        // One step of refinement takes out what rounding left in the first solution.
        let again = self.gaps(case, &self.respond(case, forces.as_slice()));
        forces += factored.solve(&DVector::from_vec(again));
        self.respond(case, forces.as_slice())
    }

    /// How far each inner bearing is below what carries it.
    fn gaps(&self, case: &Case, responses: &Responses) -> Vec<f64> {
        let at = |beam: usize, x: f64| {
            responses[beam].as_ref().map_or(0.0, |r| value_at(&self.breaks[beam], &r.movement, x))
        };
        let gap = |&(beam, bearing): &(usize, usize)| {
            let seat = &self.building.beams[self.members[beam]].bearings[bearing];
            let carrier = match seat.on {
                Carrier::Wall(_) if case.settles => seat.settles.si(),
                Carrier::Wall(_) => 0.0,
                Carrier::Beam { beam, lands } => self.local(beam).map_or(0.0, |local| at(local, lands.si())),
            };
            at(beam, seat.at.si()) - carrier
        };
        self.inner.iter().map(gap).collect()
    }

    /// Takes loads down with given forces at the inner bearings (upward on the beam, downward on what carries it),
    /// then movements up.
    fn respond(&self, case: &Case, inner: &[f64]) -> Responses {
        let count = self.members.len();
        let mut forces: Vec<Forces> = vec![Forces::default(); count];
        for (beam, direct) in case.direct {
            forces[*beam] = direct.clone();
        }
        let mut reactions: Vec<Option<Vec<f64>>> = vec![None; count];
        for local in 0..count {
            let b = &self.building.beams[self.members[local]];
            let mut upward = vec![0.0; b.bearings.len()];
            for (force, &(beam, bearing)) in inner.iter().zip(&self.inner) {
                if beam == local && *force != 0.0 {
                    upward[bearing] = *force;
                    forces[local].points.push((b.bearings[bearing].at.si(), -force));
                }
            }
            if forces[local].is_empty() {
                continue;
            }
            let last = b.bearings.len() - 1;
            let (first_at, last_at) = (b.bearings[0].at.si(), b.bearings[last].at.si());
            let span = last_at - first_at;
            upward[0] = -forces[local].resultant(last_at).1 / span;
            upward[last] = forces[local].resultant(first_at).1 / span;
            for (bearing, force) in upward.iter().enumerate() {
                if bearing == 0 || bearing == last {
                    forces[local].points.push((b.bearings[bearing].at.si(), -force));
                }
                if let Carrier::Beam { beam, lands } = b.bearings[bearing].on
                    && *force != 0.0
                    && let Some(carrier) = self.local(beam)
                {
                    forces[carrier].points.push((lands.si(), *force));
                }
            }
            reactions[local] = Some(upward);
        }
        self.move_up(case, &forces, reactions)
    }

    fn move_up(&self, case: &Case, forces: &[Forces], mut reactions: Vec<Option<Vec<f64>>>) -> Responses {
        let mut responses: Responses = vec![None; self.members.len()];
        for local in (0..self.members.len()).rev() {
            let b = &self.building.beams[self.members[local]];
            let breaks = &self.breaks[local];
            let supports = [0, b.bearings.len() - 1].map(|bearing| {
                let seat = &b.bearings[bearing];
                let movement = match seat.on {
                    Carrier::Wall(_) if case.settles => seat.settles.si(),
                    Carrier::Wall(_) => 0.0,
                    Carrier::Beam { beam, lands } => self
                        .local(beam)
                        .and_then(|c| {
                            responses[c].as_ref().map(|r| value_at(&self.breaks[c], &r.movement, lands.si()))
                        })
                        .unwrap_or(0.0),
                };
                (seat.at.si(), movement)
            });
            let bends = reactions[local].is_some();
            if !bends && supports.iter().all(|(_, movement)| *movement == 0.0) {
                continue;
            }
            let moments = if bends { moments(breaks, &forces[local]) } else { Vec::new() };
            let mut movement = if bends {
                elastic_curve(breaks, &moments, self.elastic[local], (supports[0].0, supports[1].0))
            } else {
                vec![ZERO; breaks.len().saturating_sub(1)]
            };
            let slope = (supports[1].1 - supports[0].1) / (supports[1].0 - supports[0].0);
            add_line(breaks, &mut movement, supports[0].0, supports[0].1, slope);
            let reactions = reactions[local].take().unwrap_or_else(|| vec![0.0; b.bearings.len()]);
            responses[local] = Some(Response { moments, movement, reactions });
        }
        responses
    }
}

/// Elastic properties of a beam of the building, its second moment of area (and shear area) scaled.
fn elastic_of(building: &Building, beam: usize, factor: f64, shear: bool) -> Elastic {
    let section = &building.beams[beam].section;
    let bending = E.si() * section.i_y.si() * factor;
    let shear_flexibility = if shear { 1.0 / (G.si() * section.a_v.si() * factor) } else { 0.0 };
    Elastic { bending, shear_flexibility }
}
