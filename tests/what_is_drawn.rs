//! What the sheets show beside the results file agrees with it, over buildings by chance: drawn curves, the parts of
//! a movement, the chain's governing beam, the hand check by textbook cases.

mod generate;

use generate::building::building;
use sagledger_calc::results::{BeamResult, CheckKind, Results};

/// Both sides come from one solution and differ by rounding alone.
const TOLERANCE: f64 = 1e-9;

fn results_of(seed: u64) -> Results {
    let text = building(seed).text;
    let read = sagledger::job::read(text.as_bytes(), "job.toml");
    let job = read.job.unwrap_or_else(|| panic!("seed {seed}: {:?}", read.findings));
    sagledger_calc::calculate(&job.building).unwrap_or_else(|faults| panic!("seed {seed}: {faults:?}"))
}

/// The greatest share of a stacked limit on a beam; none without one.
fn stacked_share(beam: &BeamResult) -> Option<f64> {
    let stacked = beam.checks.iter().filter(|check| check.kind == CheckKind::StackedDeflection);
    stacked.filter_map(|check| check.utilisation).reduce(f64::max)
}

#[test]
fn the_stretch_and_the_beam_nearest_to_their_limits_govern() {
    let mut among_several = 0;
    for seed in 8000..8060 {
        let results = results_of(seed);
        for beam in &results.beams {
            let Some(share) = stacked_share(beam) else {
                assert!(beam.movements.governing.is_none(), "seed {seed}");
                continue;
            };
            let governing = beam.movements.governing.as_ref().expect("a governing movement");
            let own = governing.total.value.si().abs() / governing.limit.expect("its limit").si();
            // Overhangs that only go up use nothing of their limit.
            assert!(
                (own - share).abs() <= TOLERANCE * (1.0 + share) || share == 0.0,
                "seed {seed}: {own}, {share}"
            );
            let shares = beam.checks.iter().filter(|check| check.kind == CheckKind::StackedDeflection);
            among_several += usize::from(shares.count() > 1);
        }
        for chain in &results.chains {
            let share = |beam: usize| stacked_share(&results.beams[beam]).unwrap_or(0.0);
            let most = chain.beams.iter().map(|beam| share(*beam)).fold(0.0, f64::max);
            let governing = share(chain.governing_beam);
            assert!(governing >= most * (1.0 - TOLERANCE), "seed {seed}: {governing} governs, not {most}");
        }
    }
    assert!(among_several >= 60, "only {among_several} beams have several stretches");
}

/// An absolute movement is its own, inherited and settled parts, and what each beam's bending brings.
#[test]
fn the_parts_of_a_movement_add_up_to_it() {
    for seed in 8100..8160 {
        for (index, beam) in results_of(seed).beams.iter().enumerate() {
            for movement in std::iter::once(&beam.movements.stacked).chain(&beam.movements.governing) {
                let [total, own, inherited, settled] =
                    [movement.total.value, movement.own, movement.inherited, movement.settled]
                        .map(|part| part.si());
                let shares: f64 = movement.shares.iter().map(|(_, share)| share.si()).sum();
                let sizes: f64 = movement.shares.iter().map(|(_, share)| share.si().abs()).sum();
                let scale = sizes + settled.abs() + own.abs() + inherited.abs();
                let same = |one: f64, other: f64| (one - other).abs() <= TOLERANCE * scale;
                assert!(
                    same(own + inherited + settled, total),
                    "seed {seed}: {own} + {inherited} + {settled}, {total}"
                );
                assert!(same(shares + settled, total), "seed {seed}: {shares} + {settled}, {total}");
                assert_eq!(movement.shares[0].0, index, "seed {seed}: this beam comes first");
                assert!(same(movement.shares[0].1.si(), own), "seed {seed}: {own} own");
            }
        }
    }
}

/// Curves have at their places the values that are printed beside them.
#[test]
fn curves_pass_through_the_figures() {
    for seed in 8200..8260 {
        let results = results_of(seed);
        for beam in &results.beams {
            let (drawn, moved) = (&beam.drawn, &beam.movements);
            let [most, least] = [&beam.moment_max, &beam.moment_min].map(|m| (m.value.si(), m.at.si()));
            let moment = if -least.0 > most.0 * (1.0 + 1e-12) { least } else { most };
            let movement = &moved.governing.as_ref().unwrap_or(&moved.stacked).total;
            let height = |curve: &sagledger_calc::results::Curve| {
                let ends = curve.pieces.iter().flat_map(|piece| [piece.at(piece.from), piece.at(piece.to)]);
                ends.map(f64::abs).fold(0.0, f64::max)
            };
            for (what, curve, value, at) in [
                ("moment", &drawn.moment, moment.0, moment.1),
                ("stacked", &drawn.stacked, movement.value.si(), movement.at.si()),
            ] {
                let off = (curve.at(at) - value).abs();
                assert!(
                    off <= 1e-8 * (height(curve) + value.abs()),
                    "seed {seed}: {what} {value}, {}",
                    curve.at(at)
                );
            }
        }
        for chain in &results.chains {
            let moved = &results.beams[chain.governing_beam].movements;
            let movement = &moved.governing.as_ref().unwrap_or(&moved.stacked).total;
            let curve = chain.curves.iter().find(|curve| curve.beam == chain.governing_beam).expect("its curve");
            let drawn = curve.stacked.at(movement.at.si());
            let off = (drawn - movement.value.si()).abs();
            assert!(off <= 1e-8 * (movement.value.si().abs() + 1e-6), "seed {seed}: {drawn} drawn");
        }
    }
}

/// Textbook cases on two bearings, superposed, give what the solver does.
#[test]
fn the_hand_check_meets_the_solver() {
    let mut checked = 0;
    for seed in 8300..8360 {
        for beam in &results_of(seed).beams {
            let Some(hand) = &beam.hand_check else { continue };
            let moments: f64 = hand.cases.iter().map(|case| case.moment.si().abs()).sum();
            let movements: f64 = hand.cases.iter().map(|case| case.own.si().abs()).sum();
            let (moment, own) = (hand.moment_by_hand - hand.moment_solved, hand.own_by_hand - hand.own_solved);
            assert!(moment.si().abs() <= 1e-8 * moments, "seed {seed}: {} Nm off of {moments}", moment.si());
            assert!(own.si().abs() <= 1e-8 * movements, "seed {seed}: {} m off of {movements}", own.si());
            let at = hand.at.si();
            let away = beam.bearings.iter().map(|seat| (seat.at.si() - at).abs()).fold(f64::INFINITY, f64::min);
            assert!(away > 1e-7, "seed {seed}: at a bearing, where nothing moves");
            checked += 1;
        }
    }
    assert!(checked > 100, "only {checked} beams");
}
