//! Beams that carry each other in a ring.
//!
//! Calc finds loops too, for whoever makes a building without a job file. Here they are looked for among what was
//! typed, so that a loop is told together with all other faults of the file; both are put in words by
//! [`explain`](crate::job::explain).

use sagledger_calc::fault::LoopStep;

use super::names::{Names, Support};
use crate::job::explain;
use crate::job::findings::Findings;
use crate::job::origins::Origins;
use crate::job::tables::Typed;

/// More loops than this in one file are not worth telling one by one.
const MOST_LOOPS: usize = 60;

/// A bearing on another beam.
struct Edge {
    bearing: usize,
    carrier: usize,
}

#[derive(Clone, Copy, PartialEq)]
enum Seen {
    Not,
    OnTheWay,
    Done,
}

pub(super) fn find(typed: &Typed, names: &Names, found: &mut Findings) {
    let edges: Vec<Vec<Edge>> = typed
        .beams
        .iter()
        .map(|beam| {
            let on_beams =
                beam.bearings.iter().enumerate().filter_map(|(bearing, b)| match names.support(b.on.value()?)? {
                    Support::Beam(carrier) => Some(Edge { bearing, carrier }),
                    Support::Wall(_) | Support::Later => None,
                });
            on_beams.collect()
        })
        .collect();
    let mut seen = vec![Seen::Not; edges.len()];
    let mut told: Vec<Vec<usize>> = Vec::new();
    for start in 0..edges.len() {
        if seen[start] == Seen::Not {
            search(start, &edges, &mut seen, &mut |ring| {
                let mut members: Vec<usize> = ring.iter().map(|(beam, _)| *beam).collect();
                members.sort_unstable();
                if told.len() < MOST_LOOPS && !told.contains(&members) {
                    told.push(members);
                    tell(ring, &edges, typed, found);
                }
            });
        }
    }
}

/// Goes down from a beam to what carries it, without recursion: chains may be long. A ring is given as beams with
/// the number of their edge.
fn search(start: usize, edges: &[Vec<Edge>], seen: &mut [Seen], ring: &mut impl FnMut(&[(usize, usize)])) {
    // Each beam on the way with the edge that is followed from it.
    let mut way: Vec<(usize, usize)> = vec![(start, 0)];
    seen[start] = Seen::OnTheWay;
    while let Some(&(beam, edge)) = way.last() {
        let Some(next) = edges[beam].get(edge).map(|edge| edge.carrier) else {
            seen[beam] = Seen::Done;
            way.pop();
            if let Some(last) = way.last_mut() {
                last.1 += 1;
            }
            continue;
        };
        match seen[next] {
            Seen::Not => {
                seen[next] = Seen::OnTheWay;
                way.push((next, 0));
                continue;
            }
            Seen::OnTheWay => {
                let from = way.iter().position(|(beam, _)| *beam == next).unwrap_or(0);
                ring(&way[from..]);
            }
            Seen::Done => {}
        }
        if let Some(last) = way.last_mut() {
            last.1 += 1;
        }
    }
}

fn tell(ring: &[(usize, usize)], edges: &[Vec<Edge>], typed: &Typed, found: &mut Findings) {
    let mut origins = Origins::default();
    let steps: Vec<LoopStep> = ring
        .iter()
        .filter_map(|(beam, edge)| {
            let edge = &edges[*beam][*edge];
            let on = typed.beams[*beam].bearings[edge.bearing].on.given()?;
            Some(LoopStep {
                mark: typed.beams[*beam].called.clone(),
                on: typed.beams[edge.carrier].called.clone(),
                bearing: origins.mark(&on.span),
            })
        })
        .collect();
    found.add(explain::carriers_loop(&steps, &origins, found.source));
}
