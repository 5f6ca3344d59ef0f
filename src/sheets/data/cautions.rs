//! What whoever uses the package has to know, and what it does not cover.

use sagledger_calc::outside::outside;
use serde::Serialize;

use super::text::{Runs, keys, sheet, words};
use super::view::View;
use crate::package::Package;

#[derive(Debug, Serialize)]
pub(super) struct Cautions {
    cautions: Vec<Runs>,
    outside: Vec<String>,
}

pub(super) fn cautions(package: &Package, view: View) -> Cautions {
    let walls = !view.building.walls.is_empty();
    let existing = view.building.beams.iter().any(|beam| beam.existing);
    let to_order = view.building.beams.iter().any(|beam| !beam.existing);
    let sizes = if package.meta.drawings.is_empty() {
        vec![
            words("Sizes, spans, loads and materials come from the job file on "),
            sheet(keys::RECORD),
            words("; check them on site before ordering and report any difference first."),
        ]
    } else {
        vec![
            words("Sizes, spans, loads and materials come from the drawings named on "),
            sheet(keys::MATERIALS),
            words("; check them on site before ordering and report any difference first."),
        ]
    };
    let say = |text: &str| vec![words(text)];
    let list: [(bool, Runs); 12] = [
        (
            true,
            vec![
                words("These calculations follow the standards named on "),
                sheet(keys::BASIS),
                words(". Local building regulations and the judgement of a locally licensed engineer come first."),
            ],
        ),
        (
            true,
            say(
                "They must be reviewed and signed by a person qualified and authorised where the building stands before \
                 anyone relies on them.",
            ),
        ),
        (
            true,
            say(
                "Only the items listed as verified have been verified. Everything listed as outside this calculation \
                 needs its own design.",
            ),
        ),
        (true, sizes),
        (
            walls || existing,
            say(
                "Existing masonry, timber, steel and foundations are assumed as stated; expose and inspect them before \
                 work relies on them.",
            ),
        ),
        (
            walls,
            say(
                "The calculations cover the finished state. Propping, needling and sequence need a temporary works \
                 design by a competent person.",
            ),
        ),
        (
            walls,
            say(
                "Do not remove any wall, chimney breast or prop until the beams below are bedded, fixed and able to \
                 take load.",
            ),
        ),
        (walls, say("Lateral stability of the building with walls removed is outside this calculation.")),
        (
            to_order,
            say(
                "Connections, welds, bolts, splices and end restraints appear as design forces only; others design and \
                 check them.",
            ),
        ),
        (
            to_order,
            say("Fire and corrosion protection follow the local requirements for the building’s height and use."),
        ),
        (
            true,
            vec![
                words("Foundations and ground are not verified; the loads on "),
                sheet(keys::LOAD_PATH),
                words(" are given for that purpose."),
            ],
        ),
        (
            to_order,
            say("Steel weights are for planning lifts; the lifting plan and a safe method are the contractor’s."),
        ),
    ];
    Cautions {
        cautions: list.into_iter().filter(|(applies, _)| *applies).map(|(_, text)| text).collect(),
        outside: outside(view.building),
    }
}
