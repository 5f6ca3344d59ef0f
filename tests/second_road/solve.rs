//! Every beam of the building in one stiffness system, and the answer of all beams to each contribution of load.

use super::element::{Element, Line, Part, Side};
use super::job::{Action, Job, Load, Support};
use super::profile_matrix::{Factor, ProfileMatrix};
use super::{SHEAR_MODULUS, YOUNG};

/// Places closer than this are one node, m.
const SAME_PLACE: f64 = 1e-9;

/// One action of one load row on one span or overhang of its beam: what free arrangement takes or leaves.
#[derive(Clone, Debug)]
pub struct Contribution {
    pub beam: usize,
    pub row: usize,
    /// 0 before the first bearing, n after the n-th.
    pub piece: usize,
    pub action: Action,
    pub before: bool,
    pub load: Load,
}

/// Answer of the whole building to one load: a line for each element of each beam, and each bearing's reaction.
#[derive(Clone, Debug)]
pub struct Answer {
    pub lines: Vec<Vec<Line>>,
    pub reactions: Vec<Vec<f64>>,
}

#[derive(Clone, Copy, Debug)]
enum Freedom {
    Free(usize),
    /// A bearing on a wall, which moves by as much as it settles, m.
    Held(f64),
}

pub struct Frame {
    /// Places of the nodes along each beam: bearings, landings, ends. Loads are
    /// exact inside an element, and a node close to another would cost figures.
    pub nodes: Vec<Vec<f64>>,
    pub elements: Vec<Vec<Element>>,
    freedoms: Vec<Vec<[Freedom; 2]>>,
    matrix: ProfileMatrix,
    factor: Factor,
    /// Beams, each after all that land on it.
    pub order: Vec<usize>,
}

/// The contributions of a job, each beam's own weight included.
pub fn contributions(job: &Job) -> Vec<Contribution> {
    let mut all = Vec::new();
    for (beam_index, beam) in job.beams.iter().enumerate() {
        let mut cuts = vec![f64::NEG_INFINITY];
        cuts.extend(beam.bearings.iter().map(|bearing| bearing.at));
        cuts.push(f64::INFINITY);
        for (row_index, row) in beam.rows.iter().enumerate() {
            for (action, load) in &row.loads {
                for piece in 0..cuts.len() - 1 {
                    if let Some(load) = load.within(cuts[piece], cuts[piece + 1]) {
                        all.push(Contribution {
                            beam: beam_index,
                            row: row_index,
                            piece,
                            action: action.clone(),
                            before: row.before && *action == Action::Permanent,
                            load,
                        });
                    }
                }
            }
        }
    }
    all
}

impl Frame {
    pub fn new(job: &Job) -> Frame {
        let nodes: Vec<Vec<f64>> = (0..job.beams.len()).map(|beam| nodes_of(job, beam)).collect();
        let elements = job.beams.iter().zip(&nodes).map(|(beam, nodes)| {
            let softness = 1.0 / (SHEAR_MODULUS * beam.shape.shear_area);
            let element = |ends: &[f64]| Element {
                length: ends[1] - ends[0],
                bending: YOUNG * beam.shape.second_moment,
                shear_softness: if job.shear_flexible { softness } else { 0.0 },
            };
            nodes.windows(2).map(element).collect::<Vec<Element>>()
        });
        let elements: Vec<Vec<Element>> = elements.collect();
        let order = carried_first(job);
        let (freedoms, size) = number_freedoms(job, &nodes, &order);
        let numbers = |beam: usize, element: usize| -> Vec<usize> {
            [freedoms[beam][element], freedoms[beam][element + 1]]
                .concat()
                .iter()
                .filter_map(|freedom| if let Freedom::Free(number) = freedom { Some(*number) } else { None })
                .collect()
        };
        let groups: Vec<Vec<usize>> = (0..nodes.len())
            .flat_map(|beam| (0..elements[beam].len()).map(move |element| (beam, element)))
            .map(|(beam, element)| numbers(beam, element))
            .collect();
        let mut matrix = ProfileMatrix::coupling(size, &groups);
        for beam in 0..nodes.len() {
            for (index, element) in elements[beam].iter().enumerate() {
                let places = [freedoms[beam][index], freedoms[beam][index + 1]].concat();
                let stiffness = element.stiffness();
                for (i, &row) in places.iter().enumerate() {
                    for (j, &column) in places.iter().enumerate() {
                        if let (Freedom::Free(row), Freedom::Free(column)) = (row, column) {
                            matrix.add(row, column, stiffness[i][j]);
                        }
                    }
                }
            }
        }
        let factor = matrix.factored();
        Frame { nodes, elements, freedoms, matrix, factor, order }
    }

    /// The building under one load on one beam, its supports unmoved.
    pub fn under(&self, job: &Job, beam: usize, load: Load) -> Answer {
        let (parts, nodal) = self.split(beam, load);
        let mut right = vec![0.0; self.size()];
        for (node, force) in nodal.iter().enumerate() {
            self.put(&mut right, beam, node, 0, *force);
        }
        for (index, parts) in parts.iter().enumerate().filter(|(_, parts)| !parts.is_empty()) {
            let element = &self.elements[beam][index];
            let fixed = element.forces(&element.line([0.0; 2], [0.0; 2], parts.clone()));
            for (place, force) in fixed.iter().enumerate() {
                self.put(&mut right, beam, index + place / 2, place % 2, -force);
            }
        }
        let solution = self.solved(&right);
        self.answer(job, &solution, false, Some((beam, parts, nodal)))
    }

    /// The building without load, its walls settled.
    pub fn settled(&self, job: &Job) -> Answer {
        let mut right = vec![0.0; self.size()];
        for beam in 0..self.nodes.len() {
            for (index, element) in self.elements[beam].iter().enumerate() {
                let [start, end] = [index, index + 1].map(|node| self.moved(beam, node, None, true));
                for (place, force) in element.forces(&element.line(start, end, Vec::new())).iter().enumerate() {
                    self.put(&mut right, beam, index + place / 2, place % 2, -force);
                }
            }
        }
        let solution = self.solved(&right);
        self.answer(job, &solution, true, None)
    }

    fn size(&self) -> usize {
        self.freedoms
            .iter()
            .flatten()
            .flatten()
            .filter_map(|freedom| if let Freedom::Free(number) = freedom { Some(number + 1) } else { None })
            .max()
            .unwrap_or(0)
    }

    fn put(&self, right: &mut [f64], beam: usize, node: usize, place: usize, force: f64) {
        if let Freedom::Free(number) = self.freedoms[beam][node][place] {
            right[number] += force;
        }
    }

    /// The system solved, and once more for what rounding left.
    fn solved(&self, right: &[f64]) -> Vec<f64> {
        let mut solution = self.factor.solve(right);
        let product = self.matrix.times(&solution);
        let rest: Vec<f64> = right.iter().zip(&product).map(|(right, product)| right - product).collect();
        for (value, correction) in solution.iter_mut().zip(self.factor.solve(&rest)) {
            *value += correction;
        }
        solution
    }

    /// Movement and rotation of a node; without a solution, of the held freedoms alone.
    fn moved(&self, beam: usize, node: usize, solution: Option<&[f64]>, settles: bool) -> [f64; 2] {
        self.freedoms[beam][node].map(|freedom| match freedom {
            Freedom::Free(number) => solution.map_or(0.0, |solution| solution[number]),
            Freedom::Held(movement) => {
                if settles {
                    movement
                } else {
                    0.0
                }
            }
        })
    }

    /// What a load is to each element, or to the node where it stands.
    fn split(&self, beam: usize, load: Load) -> (Vec<Vec<Part>>, Vec<f64>) {
        let nodes = &self.nodes[beam];
        let mut parts = vec![Vec::new(); nodes.len() - 1];
        let mut nodal = vec![0.0; nodes.len()];
        if let Load::Point { at, force } = load
            && let Some(node) = nodes.iter().position(|node| (node - at).abs() <= SAME_PLACE)
        {
            nodal[node] = force;
            return (parts, nodal);
        }
        for (index, ends) in nodes.windows(2).enumerate() {
            match load.within(ends[0], ends[1]) {
                Some(Load::Line { from, to, start, end }) => {
                    parts[index].push(Part::Line { from: from - ends[0], to: to - ends[0], start, end });
                }
                Some(Load::Point { at, force }) => parts[index].push(Part::Point { at: at - ends[0], force }),
                None => {}
            }
        }
        (parts, nodal)
    }

    fn answer(
        &self,
        job: &Job,
        solution: &[f64],
        settles: bool,
        load: Option<(usize, Vec<Vec<Part>>, Vec<f64>)>,
    ) -> Answer {
        let mut lines = Vec::with_capacity(self.nodes.len());
        for beam in 0..self.nodes.len() {
            let mut of_beam = Vec::with_capacity(self.elements[beam].len());
            for (index, element) in self.elements[beam].iter().enumerate() {
                let parts = match &load {
                    Some((loaded, parts, _)) if *loaded == beam => parts[index].clone(),
                    _ => Vec::new(),
                };
                let [start, end] = [index, index + 1].map(|node| self.moved(beam, node, Some(solution), settles));
                of_beam.push(element.line(start, end, parts));
            }
            lines.push(of_beam);
        }
        // A bearing's reaction is the jump of shear there and what else comes down on the node. Beams come after
        // all that land on them, so landings are known when they are needed.
        let mut onto: Vec<Vec<f64>> = self.nodes.iter().map(|nodes| vec![0.0; nodes.len()]).collect();
        if let Some((beam, _, nodal)) = &load {
            onto[*beam].clone_from(nodal);
        }
        let mut reactions = vec![Vec::new(); self.nodes.len()];
        for &beam in &self.order {
            for bearing in &job.beams[beam].bearings {
                let node = self.node(beam, bearing.at);
                let after = lines[beam].get(node).map_or(0.0, |line| line.shear);
                let before = match node {
                    0 => 0.0,
                    _ => {
                        let element = &self.elements[beam][node - 1];
                        element.at(&lines[beam][node - 1], element.length, Side::Before)[0]
                    }
                };
                let reaction = after - before + onto[beam][node];
                reactions[beam].push(reaction);
                if let Support::Beam(carrier, lands) = bearing.on {
                    let node = self.node(carrier, lands);
                    onto[carrier][node] += reaction;
                }
            }
        }
        Answer { lines, reactions }
    }

    /// The node of a beam at a bearing or landing.
    pub fn node(&self, beam: usize, at: f64) -> usize {
        self.nodes[beam].iter().position(|node| (node - at).abs() <= SAME_PLACE).expect("a node")
    }
}

fn nodes_of(job: &Job, beam: usize) -> Vec<f64> {
    let mut nodes = vec![0.0, job.beams[beam].length];
    nodes.extend(job.beams[beam].bearings.iter().map(|bearing| bearing.at));
    for other in &job.beams {
        for bearing in &other.bearings {
            if let Support::Beam(carrier, lands) = bearing.on
                && carrier == beam
            {
                nodes.push(lands);
            }
        }
    }
    nodes.sort_by(f64::total_cmp);
    nodes.dedup_by(|later, earlier| *later - *earlier <= SAME_PLACE);
    nodes
}

fn carried_first(job: &Job) -> Vec<usize> {
    let mut order = Vec::new();
    while order.len() < job.beams.len() {
        let waits = |beam: usize| {
            job.beams.iter().enumerate().any(|(other, carried)| {
                !order.contains(&other)
                    && carried
                        .bearings
                        .iter()
                        .any(|bearing| matches!(bearing.on, Support::Beam(on, _) if on == beam))
            })
        };
        let ready: Vec<usize> =
            (0..job.beams.len()).filter(|beam| !order.contains(beam) && !waits(*beam)).collect();
        assert!(!ready.is_empty(), "beams carry each other in a loop");
        order.extend(ready);
    }
    order
}

/// Numbers for the free movements and rotations. A bearing on a beam moves as that beam does where it lands.
fn number_freedoms(job: &Job, nodes: &[Vec<f64>], order: &[usize]) -> (Vec<Vec<[Freedom; 2]>>, usize) {
    let place =
        |beam: usize, at: f64| nodes[beam].iter().position(|node| (node - at).abs() <= SAME_PLACE).expect("a node");
    let mut vertical: Vec<Vec<Option<Freedom>>> = nodes.iter().map(|nodes| vec![None; nodes.len()]).collect();
    let mut rotation: Vec<Vec<usize>> = nodes.iter().map(|nodes| vec![0; nodes.len()]).collect();
    let mut size = 0;
    for &beam in order.iter() {
        for node in 0..nodes[beam].len() {
            // Down the bearings to whoever owns this movement.
            let (mut owner, mut at) = (beam, node);
            let mut held = None;
            while let Some(bearing) =
                job.beams[owner].bearings.iter().find(|bearing| place(owner, bearing.at) == at)
            {
                match bearing.on {
                    Support::Wall(_) => {
                        held = Some(Freedom::Held(bearing.settles));
                        break;
                    }
                    Support::Beam(carrier, lands) => (owner, at) = (carrier, place(carrier, lands)),
                }
            }
            let freedom = held.or(vertical[owner][at]).unwrap_or_else(|| {
                size += 1;
                Freedom::Free(size - 1)
            });
            vertical[owner][at] = Some(freedom);
            vertical[beam][node] = Some(freedom);
            rotation[beam][node] = size;
            size += 1;
        }
    }
    let freedoms = vertical.iter().zip(&rotation).map(|(vertical, rotation)| {
        let both = vertical.iter().zip(rotation);
        both.map(|(vertical, rotation)| [vertical.expect("numbered"), Freedom::Free(*rotation)]).collect()
    });
    (freedoms.collect(), size)
}
