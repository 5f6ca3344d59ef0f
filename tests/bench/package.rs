//! How long a cold package takes against compiling and exporting the same generated Typst source with nothing else,
//! and how long from an edit to the PDF in one process. Ratios are taken pair by pair within this run; absolute times
//! are this machine's and are asserted nowhere.

use std::time::{Duration, Instant};

use sagledger::{compute, job, package};
use sagledger_sheets::world::Files;
use sagledger_sheets::{Overrides, compile, source, typeset};

const ROUNDS: usize = 7;

fn main() {
    println!("sample              what                                   min    median       max");
    for name in ["weir-cottage", "packing-mezzanine", "garden-door"] {
        let path = format!("{}/sample-jobs/{name}/job.toml", env!("CARGO_MANIFEST_DIR"));
        let text = std::fs::read_to_string(path).unwrap();
        measure(name, &text);
    }
}

fn measure(name: &str, text: &str) {
    let files = files(text);
    let sheets = whole(text);
    let (mut cold, mut alone, mut laid_out, mut ratios, mut warm) = (vec![], vec![], vec![], vec![], vec![]);
    for round in 0..ROUNDS {
        comemo::evict(0);
        let start = Instant::now();
        whole(text);
        let whole_time = start.elapsed();

        comemo::evict(0);
        let start = Instant::now();
        let compiled = compile(&files).unwrap();
        laid_out.push(start.elapsed() / u32::try_from(sheets).unwrap());
        compiled.pdf("bench", "").unwrap();
        let alone_time = start.elapsed();
        ratios.push(whole_time.as_secs_f64() / alone_time.as_secs_f64());
        cold.push(whole_time);
        alone.push(alone_time);

        // An edit: one width changes by a centimetre; what the typesetter remembers is still there.
        let edited = text.replacen("width = \"2.", &format!("width = \"2.0{round}"), 1);
        compile(&files).unwrap();
        let start = Instant::now();
        compile(&self::files(&edited)).unwrap().pdf("bench", "").unwrap();
        warm.push(start.elapsed());
        comemo::evict(2);
    }
    row(name, &format!("cold, job file to PDF, {sheets} sheets"), cold);
    row(name, "compile and export of its source alone", alone);
    row(name, "compile alone, a sheet", laid_out);
    row(name, "edit to PDF in one process", warm);
    ratios.sort_by(f64::total_cmp);
    let (min, median, max) = (ratios[0], ratios[ROUNDS / 2], ratios[ROUNDS - 1]);
    println!("{name:<18}  {:<34} {min:>8.2}  {median:>8.2}  {max:>8.2}", "cold as a ratio to its source alone");
}

fn row(name: &str, what: &str, mut times: Vec<Duration>) {
    times.sort();
    let ms = |d: Duration| d.as_secs_f64() * 1e3;
    let (min, median, max) = (ms(times[0]), ms(times[times.len() / 2]), ms(times[times.len() - 1]));
    println!("{name:<18}  {what:<34} {min:>8.1}  {median:>8.1}  {max:>8.1} ms");
}

/// Job file to PDF; gives the number of sheets.
fn whole(text: &str) -> usize {
    let job = job::read(text.as_bytes(), "job.toml").job.unwrap();
    let computed = compute(job).map_err(|_| "faults").unwrap();
    let results = computed.results_text().unwrap();
    typeset(&package::draft(&computed, &results, Overrides::default())).unwrap().sheets
}

fn files(text: &str) -> Files {
    let job = job::read(text.as_bytes(), "job.toml").job.unwrap();
    let computed = compute(job).map_err(|_| "faults").unwrap();
    let results = computed.results_text().unwrap();
    source(&package::draft(&computed, &results, Overrides::default())).unwrap()
}
