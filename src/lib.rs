//! The rooms of sagledger, from job file to package. `main` is a thin door in front of them; tests and benchmarks
//! come in through here.

pub mod job;
pub mod program;
pub mod results_file;

use sagledger_calc::results::Results;

/// A job that was read and calculated.
pub struct Computed {
    pub job: job::Job,
    pub results: Results,
}

/// Calculates a job. Faults that only the calculation finds come back as faults of the file.
///
/// # Errors
/// The faults, in order of lines.
pub fn compute(job: job::Job) -> Result<Computed, (job::Job, Vec<job::Fault>)> {
    match sagledger_calc::calculate(&job.building) {
        Ok(results) => Ok(Computed { job, results }),
        Err(faults) => {
            let faults = faults.iter().map(|fault| job.explain_fault(fault)).collect();
            Err((job, faults))
        }
    }
}

/// The results file of a job's text, for tests and benchmarks that bring no files.
///
/// # Errors
/// The faults as a terminal would show them.
pub fn results_json(text: &str) -> Result<String, String> {
    let reading = job::read(text.as_bytes(), "job.toml");
    let shown = job::show::terminal(&reading.source, &reading.findings, job::show::Screen::PIPE);
    let job = reading.job.ok_or(shown)?;
    match compute(job) {
        Ok(computed) => computed.results_text().map_err(|e| e.to_string()),
        Err((job, faults)) => Err(job::show::terminal(job.source(), &faults, job::show::Screen::PIPE)),
    }
}

impl Computed {
    /// The text of the results file.
    ///
    /// # Errors
    /// Those of the serialiser, which this data never meets.
    pub fn results_text(&self) -> Result<String, serde_json::Error> {
        results_file::ResultsFile::new(&self.job.meta, &self.job.building, &self.results).text()
    }
}
