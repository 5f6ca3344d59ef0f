//! The rooms of sagledger, from job file to package. `main` is a thin door in front of them; tests and benchmarks
//! come in through here.

pub mod commands;
pub mod job;
pub mod package;
pub mod program;
pub mod results_file;
pub mod screen;

use sagledger_calc::results::Results;
use sha2::{Digest, Sha256};

/// A job that was read and calculated.
pub struct Computed {
    pub job: job::Job,
    pub results: Results,
}

/// A job with faults that only the calculation found, as faults of its file.
pub struct Refused {
    pub job: job::Job,
    pub faults: Vec<job::Fault>,
}

/// Calculates a job.
///
/// # Errors
/// The job with its faults.
pub fn compute(job: job::Job) -> Result<Computed, Box<Refused>> {
    match sagledger_calc::calculate(&job.building) {
        Ok(results) => Ok(Computed { job, results }),
        Err(faults) => {
            let faults = faults.iter().map(|fault| job.explain_fault(fault)).collect();
            Err(Box::new(Refused { job, faults }))
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
        Err(refused) => Err(job::show::terminal(refused.job.source(), &refused.faults, job::show::Screen::PIPE)),
    }
}

impl Computed {
    /// SHA-256 over job file, pictures and results, in hexadecimal digits.
    pub fn digest(&self, results_text: &str) -> String {
        let mut digest = Sha256::new();
        let mut take = |part: &[u8]| {
            digest.update((part.len() as u64).to_le_bytes());
            digest.update(part);
        };
        take(self.job.text().as_bytes());
        if let Some(picture) = self.job.meta.logo.as_ref().and_then(|logo| logo.picture.as_ref()) {
            take(&picture.bytes);
        }
        take(results_text.as_bytes());
        hexadecimal(&digest.finalize())
    }

    /// The first eight digits of [`Computed::digest`], in two groups.
    pub fn fingerprint(&self, results_text: &str) -> String {
        let digest = self.digest(results_text);
        format!("{} {}", &digest[..4], &digest[4..8])
    }

    /// The text of the results file.
    ///
    /// # Errors
    /// Those of the serialiser, which this data never meets.
    pub fn results_text(&self) -> Result<String, serde_json::Error> {
        results_file::ResultsFile::new(&self.job.meta, &self.job.building, &self.results).text()
    }
}

/// Bytes as hexadecimal digits.
pub fn hexadecimal(bytes: &[u8]) -> String {
    bytes.iter().map(|byte| format!("{byte:02x}")).collect()
}
