//! Beams that have to be solved together, in the order in which loads travel.

use std::collections::BTreeSet;

use crate::building::{Building, Carrier};
use crate::fault::{Fault, LoopStep};

/// Beams in the order in which loads travel: a beam comes after all that land on it. The first in the file that is
/// ready comes first, then what carries it, as far as that is ready.
pub fn order(building: &Building) -> Result<Vec<usize>, Vec<Fault>> {
    let count = building.beams.len();
    let mut waiting = vec![0usize; count];
    for carrier in building.beams.iter().flat_map(carriers) {
        waiting[carrier] += 1;
    }
    let mut ready: BTreeSet<usize> = (0..count).filter(|&b| waiting[b] == 0).collect();
    let mut done = vec![false; count];
    let mut order = Vec::with_capacity(count);
    while let Some(start) = ready.pop_first() {
        let mut next = Some(start);
        while let Some(beam) = next {
            ready.remove(&beam);
            done[beam] = true;
            order.push(beam);
            next = None;
            for carrier in carriers(&building.beams[beam]) {
                waiting[carrier] -= 1;
                if waiting[carrier] == 0 {
                    ready.insert(carrier);
                    next = next.or(Some(carrier));
                }
            }
        }
    }
    if order.len() == count { Ok(order) } else { Err(loops(building, &done)) }
}

/// The beams that carry a beam, one entry a bearing.
pub fn carriers(beam: &crate::building::Beam) -> impl Iterator<Item = usize> + '_ {
    beam.bearings.iter().filter_map(|bearing| match bearing.on {
        Carrier::Beam { beam, .. } => Some(beam),
        Carrier::Wall(_) => None,
    })
}

/// One fault for every ring among the beams that could not be put in order.
fn loops(building: &Building, done: &[bool]) -> Vec<Fault> {
    let mut faults = Vec::new();
    let mut told = vec![false; done.len()];
    for start in 0..done.len() {
        if done[start] || told[start] {
            continue;
        }
        // Follow bearings that stand on beams of the rest; every such walk ends in a ring or in what was told.
        let mut path: Vec<(usize, usize)> = Vec::new();
        let mut at = start;
        loop {
            if let Some(first) = path.iter().position(|(beam, _)| *beam == at) {
                let mut ring: Vec<(usize, usize)> = path[first..].to_vec();
                // Begin with the beam that stands first in the file, so that the last bearing closes the ring.
                let least = (0..ring.len()).min_by_key(|&k| ring[k].0).unwrap_or(0);
                ring.rotate_left(least);
                let bearings = ring.iter().map(|&(beam, bearing)| step(building, beam, bearing)).collect();
                faults.push(Fault::CarriersLoop { bearings });
                break;
            }
            if told[at] {
                break;
            }
            let next = building.beams[at].bearings.iter().enumerate().find_map(|(n, bearing)| match bearing.on {
                Carrier::Beam { beam, .. } if !done[beam] => Some((n, beam)),
                _ => None,
            });
            let Some((bearing, carrier)) = next else { break };
            path.push((at, bearing));
            at = carrier;
        }
        told[start] = true;
        for (beam, _) in path {
            told[beam] = true;
        }
    }
    faults
}

fn step(building: &Building, beam: usize, bearing: usize) -> LoopStep {
    let b = &building.beams[beam];
    let seat = &b.bearings[bearing];
    let on = match seat.on {
        Carrier::Beam { beam, .. } => building.beams[beam].mark.clone(),
        Carrier::Wall(wall) => building.walls[wall].name.clone(),
    };
    LoopStep { mark: b.mark.clone(), on, bearing: seat.origin }
}

/// Connected beams, each list in the order of `order`; lists in the order of their first beam there.
pub fn components(building: &Building, order: &[usize]) -> Vec<Vec<usize>> {
    let mut parent: Vec<usize> = (0..building.beams.len()).collect();
    fn root(parent: &mut [usize], mut at: usize) -> usize {
        while parent[at] != at {
            parent[at] = parent[parent[at]];
            at = parent[at];
        }
        at
    }
    for (beam, b) in building.beams.iter().enumerate() {
        for carrier in carriers(b) {
            let (one, other) = (root(&mut parent, beam), root(&mut parent, carrier));
            parent[one] = other;
        }
    }
    let mut place: Vec<Option<usize>> = vec![None; building.beams.len()];
    let mut lists: Vec<Vec<usize>> = Vec::new();
    for &beam in order {
        let of = root(&mut parent, beam);
        match place[of] {
            Some(list) => lists[list].push(beam),
            None => {
                place[of] = Some(lists.len());
                lists.push(vec![beam]);
            }
        }
    }
    lists
}
