//! A beam as it is meant.

use sagledger_calc::building::{Beam, Bearing, LoadHeight, LoadRow};
use sagledger_calc::limits;
use sagledger_calc::materials::Grade;
use sagledger_calc::quantity::Length;

use super::names::Names;
use super::{bearings, loads};
use crate::job::findings::Findings;
use crate::job::origins::Origins;
use crate::job::registry::Name;
use crate::job::tables::beam::{TypedBeam, beyond};
use crate::job::tables::restraint::TypedRestraint;
use crate::job::tables::{self, Typed};
use crate::job::view::Field;

/// Grade of open sections where neither the beam nor the job gives one.
const GRADE: Grade = Grade::S275;

pub(super) fn meant(
    beam: &TypedBeam,
    typed: &Typed,
    names: &Names,
    origins: &mut Origins,
    found: &mut Findings,
) -> Option<Beam> {
    let origin = origins.mark(&tables::place_of(&beam.mark, &beam.place));
    places_of_restraint(beam, found);
    let bearings = bearings::meant(beam, typed, names, origins, found);
    let height = beam.load_height.unwrap_or(LoadHeight::TopFlange);
    let loads: Vec<Option<LoadRow>> =
        beam.loads.iter().map(|row| loads::meant(row, beam, height, typed, names, origins, found)).collect();
    let (restraint, restraint_defaulted) = match &beam.restraint {
        Field::Absent => (TypedRestraint::default().meant(), true),
        Field::Faulty => return None,
        Field::Given(at) => (at.value.meant(), at.value.top.is_none() && at.value.bottom.is_none()),
    };
    let grade = match &beam.grade {
        Field::Absent => None,
        Field::Faulty => return None,
        Field::Given(at) => Some(at.value),
    };
    let bearings: Vec<Bearing> = bearings.into_iter().collect::<Option<_>>()?;
    Some(Beam {
        mark: beam.mark.value()?.clone(),
        title: beam.title.clone(),
        section: **beam.section.value()?,
        grade: grade.or(typed.basis.grade).unwrap_or(GRADE),
        grade_defaulted: grade.or(typed.basis.grade).is_none(),
        existing: beam.existing,
        length: Length::from_si(beam.length.value()?.si),
        bearings,
        restraint,
        restraint_defaulted,
        load_height: height,
        loads: loads.into_iter().collect::<Option<_>>()?,
        limits: limits::in_force(&beam.limits, &typed.limits),
        origin,
    })
}

fn places_of_restraint(beam: &TypedBeam, found: &mut Findings) {
    let (Some(restraint), Some(length)) = (beam.restraint.value(), beam.length.value()) else { return };
    for place in restraint.places().flatten() {
        if place.value.si > length.si {
            found.add(beyond(Name::OutsideBeam, &place.span, &beam.called, length));
        }
    }
}
