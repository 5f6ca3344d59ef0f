//! Reading, solving and checking 300 and 3,000 different beams in chains of three.

#[path = "../generate/mod.rs"]
mod generate;

use divan::Bencher;

fn main() {
    divan::main();
}

/// Chains of three beams; every beam differs from the others.
#[divan::bench(args = [100, 1000], sample_count = 5)]
fn check_chains(bencher: Bencher, chains: usize) {
    let text = generate::chains::chains(chains, 17);
    bencher.bench(|| sagledger::results_json(divan::black_box(&text)).unwrap().len());
}

#[divan::bench(args = [100, 1000], sample_count = 5)]
fn solve_chains(bencher: Bencher, chains: usize) {
    let text = generate::chains::chains(chains, 17);
    let job = sagledger::job::read(text.as_bytes(), "job.toml").job.unwrap();
    bencher.bench(|| sagledger_calc::calculate(divan::black_box(&job.building)).unwrap().beams.len());
}
