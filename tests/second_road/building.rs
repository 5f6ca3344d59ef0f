//! A job solved: the answers of the building to every contribution, and the effects at any place of any beam.

use super::actions::Combinations;
use super::element::Side;
use super::job::{Action, Job, Load, Support};
use super::search::{Sample, Stretch};
use super::solve::{Answer, Contribution, Frame, contributions};
use std::cell::OnceCell;

/// Movement of a bearing under each contribution, and from settlement, m.
pub struct BearingMovement {
    pub under: Vec<f64>,
    pub settled: f64,
}

pub struct Building {
    pub job: Job,
    pub contributions: Vec<Contribution>,
    pub combinations: Combinations,
    pub answers: Vec<Answer>,
    pub settled: Answer,
    /// Movement of each bearing of each beam.
    pub bearings: Vec<Vec<BearingMovement>>,
    pub(super) frame: Frame,
    /// Samples along each beam, in order; made when first wanted, searched for every effect.
    pub(super) stretches: Vec<OnceCell<Vec<Stretch>>>,
}

impl Building {
    pub fn new(text: &str) -> Building {
        Building::of(Job::read(text))
    }

    pub fn of(job: Job) -> Building {
        let contributions = contributions(&job);
        let combinations = Combinations::new(&job, &contributions);
        let frame = Frame::new(&job);
        let under = |contribution: &Contribution| frame.under(&job, contribution.beam, contribution.load);
        let answers = contributions.iter().map(under).collect();
        let settled = frame.settled(&job);
        let stretches = job.beams.iter().map(|_| OnceCell::new()).collect();
        let bearings = Vec::new();
        let mut building =
            Building { job, contributions, combinations, answers, settled, bearings, frame, stretches };
        let of_beam = |beam: usize| {
            let count = building.job.beams[beam].bearings.len();
            (0..count).map(|bearing| building.movements_of_bearing(beam, bearing)).collect()
        };
        building.bearings = (0..building.job.beams.len()).map(of_beam).collect();
        building
    }

    /// Names of the actions that the job has, in order.
    pub fn actions(&self) -> Vec<Action> {
        let mut actions: Vec<Action> =
            self.contributions.iter().map(|contribution| contribution.action.clone()).collect();
        actions.sort();
        actions.dedup();
        actions
    }

    /// Reaction of a bearing under each contribution, N.
    pub fn reactions(&self, beam: usize, bearing: usize) -> Vec<f64> {
        self.answers.iter().map(|answer| answer.reactions[beam][bearing]).collect()
    }

    fn movements_of_bearing(&self, beam: usize, bearing: usize) -> BearingMovement {
        let node = self.frame.node(beam, self.job.beams[beam].bearings[bearing].at);
        let of = |answer: &Answer| match answer.lines[beam].get(node) {
            Some(line) => line.movement,
            None => {
                let element = &self.frame.elements[beam][node - 1];
                element.at(&answer.lines[beam][node - 1], element.length, Side::Before)[2]
            }
        };
        BearingMovement { under: self.answers.iter().map(of).collect(), settled: of(&self.settled) }
    }

    /// All effects at one place, seen from the element given.
    pub(super) fn sample(&self, beam: usize, element: usize, x: f64, side: Side) -> Sample {
        let bearings = &self.job.beams[beam].bearings;
        let within = x - self.frame.nodes[beam][element];
        let span = self.span_at(beam, x);
        let share = (x - bearings[span].at) / (bearings[span + 1].at - bearings[span].at);
        let [left, right] = [&self.bearings[beam][span], &self.bearings[beam][span + 1]];
        let chord = |left: f64, right: f64| (1.0 - share) * left + share * right;
        let shape = &self.frame.elements[beam][element];
        let count = self.answers.len();
        let mut sample = Sample {
            x,
            shear: Vec::with_capacity(count),
            moment: Vec::with_capacity(count),
            movement: Vec::with_capacity(count),
            chord: Vec::with_capacity(count),
            settled: shape.at(&self.settled.lines[beam][element], within, side)[2],
        };
        for (index, answer) in self.answers.iter().enumerate() {
            let [shear, moment, movement] = shape.at(&answer.lines[beam][element], within, side);
            sample.shear.push(shear);
            sample.moment.push(moment);
            sample.movement.push(movement);
            sample.chord.push(chord(left.under[index], right.under[index]));
        }
        sample
    }

    /// The span whose two bearings a place refers to: the one it lies in, for an overhang the adjacent one.
    pub fn span_at(&self, beam: usize, x: f64) -> usize {
        let bearings = &self.job.beams[beam].bearings;
        let passed = bearings[1..bearings.len() - 1].iter().filter(|bearing| bearing.at <= x).count();
        passed.min(bearings.len() - 2)
    }

    /// Where the line of a beam may have a kink or a jump: nodes and edges of loads.
    pub(super) fn breaks(&self, beam: usize) -> Vec<f64> {
        let mut breaks = self.frame.nodes[beam].clone();
        for contribution in self.contributions.iter().filter(|contribution| contribution.beam == beam) {
            match contribution.load {
                Load::Line { from, to, .. } => breaks.extend([from, to]),
                Load::Point { at, .. } => breaks.push(at),
            }
        }
        breaks.sort_by(f64::total_cmp);
        breaks.dedup_by(|later, earlier| *later - *earlier < 1e-9);
        breaks
    }

    /// Sum of the loads of an action as they were typed, and of their sizes, N.
    pub fn applied(&self, action: &Action) -> f64 {
        let loads = self.job.beams.iter().flat_map(|beam| &beam.rows).flat_map(|row| &row.loads);
        loads.filter(|(kind, _)| kind == action).map(|(_, load)| load.total()).sum()
    }

    /// What an action brings to one wall, N.
    pub fn to_wall(&self, action: &Action, wall: &str) -> f64 {
        let mut total = 0.0;
        for (contribution, answer) in self.contributions.iter().zip(&self.answers) {
            if contribution.action != *action {
                continue;
            }
            for (beam, reactions) in self.job.beams.iter().zip(&answer.reactions) {
                let on_wall = |on: &Support| matches!(on, Support::Wall(name) if name == wall);
                let here = beam.bearings.iter().zip(reactions).filter(|(bearing, _)| on_wall(&bearing.on));
                total += here.map(|(_, reaction)| reaction).sum::<f64>();
            }
        }
        total
    }
}
