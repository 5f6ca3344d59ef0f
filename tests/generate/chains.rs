//! Many chains of three beams that all differ, for benchmarks of scale.

use super::{on_grid, pick};
use fastrand::Rng;
use std::fmt::Write;

/// A job of `count` chains: a roof beam on a transfer beam on a transfer beam, each chain with sizes of its own.
pub fn chains(count: usize, seed: u64) -> String {
    let rng = &mut Rng::with_seed(seed);
    let mut text = String::from(
        "[job]\nnumber = \"C-1\"\ntitle = \"Chains\"\ndate = 2027-02-03\n\n\
         [[build-up]]\nname = \"roof\"\npitch = \"35 deg\"\nlayers = [ { what = \"slates\", load = \"0.65 kN/m2\" } ]\n\
         imposed = { category = \"H\", load = \"0.45 kN/m2\" }\nsnow = \"0.35 kN/m2\"\n\n\
         [[build-up]]\nname = \"floor\"\nlayers = [ { what = \"boards and joists\", load = \"0.55 kN/m2\" } ]\n\
         imposed = { category = \"A\", load = \"1.5 kN/m2\", partitions = \"0.5 kN/m2\" }\n\n\
         [[build-up]]\nname = \"brick\"\nlayers = [ { what = \"brickwork\", load = \"2.05 kN/m2\" } ]\n\n\
         [[wall]]\nname = \"north wall\"\n\n[[wall]]\nname = \"south wall\"\n",
    );
    for chain in 1..=count {
        let lengths = [(3.2, 5.0), (3.8, 5.4), (4.6, 6.4)].map(|(least, most)| on_grid(rng, least, most, 0.001));
        let sections = [
            pick(rng, &["203x102x23 UB", "203x133x25 UB", "203x133x30 UB"]),
            pick(rng, &["254x146x37 UB", "254x146x43 UB", "305x165x40 UB"]),
            pick(rng, &["305x165x54 UB", "356x171x57 UB", "406x178x60 UB"]),
        ];
        for level in 0..3 {
            let (section, along) = (sections[level], lengths[level]);
            let below = lengths.get(level + 1).map(|below| on_grid(rng, below * 0.3, below * 0.7, 0.001));
            let carried = match below {
                Some(lands) => format!("{{ on = \"C{chain}-{}\", lands = \"{lands} m\" }}", level + 2),
                None => "{ on = \"south wall\" }".to_string(),
            };
            let _ = write!(
                text,
                "\n[[beam]]\nmark = \"C{chain}-{}\"\nsection = \"{section}\"\nlength = \"{along} m\"\n\
                 bearings = [ {{ on = \"north wall\", bearing-length = \"150 mm\" }}, {carried} ]\n\
                 restraint = {{ top = \"continuous\", by = \"joists nailed to a plate\" }}\n",
                level + 1
            );
            let (build_up, key) = [("roof", "width"), ("floor", "width"), ("brick", "height")][level];
            let breadth = on_grid(rng, 1.0, 2.8, 0.001);
            let _ = write!(
                text,
                "\n  [[beam.load]]\n  what = \"{build_up}\"\n  build-up = \"{build_up}\"\n  {key} = \"{breadth} m\"\n"
            );
        }
    }
    text
}
