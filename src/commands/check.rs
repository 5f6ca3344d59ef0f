//! `check`: computes a job and prints its ledger.

use std::io::IsTerminal;
use std::path::PathBuf;

use clap::Args;

use super::{Ending, Format, Shared, complain, read_and_compute, say};
use crate::Computed;
use crate::screen::{ledger, summary, verdict};

#[derive(Args)]
pub struct Arguments {
    /// A job folder or its job.toml; several print one line each
    #[arg(default_value = ".", value_name = "JOB")]
    jobs: Vec<PathBuf>,
    /// "json" prints the results file
    #[arg(long, value_enum, default_value = "text")]
    format: Format,
    /// Keep only the rows of this verdict
    #[arg(long, value_name = "VERDICT", value_parser = ["not met"])]
    only: Option<String>,
}

pub fn run(arguments: &Arguments, shared: &Shared) -> Ending {
    let mut ending = Ending::Met;
    let mut all = Vec::new();
    let several = arguments.jobs.len() > 1;
    for job in &arguments.jobs {
        match read_and_compute(job, arguments.format, shared) {
            Ok(computed) => {
                ending = ending.max(Ending::of(computed.results.verdict));
                if several && arguments.format == Format::Text {
                    all.push(computed);
                } else if let Err(ended) = one(&computed, arguments, shared) {
                    return ended;
                }
            }
            Err(ended) => ending = ending.max(ended),
        }
    }
    if several && !all.is_empty() {
        let jobs: Vec<summary::Line> = all
            .iter()
            .map(|c| summary::Line {
                number: &c.job.meta.number,
                title: &c.job.meta.title,
                building: &c.job.building,
                results: &c.results,
            })
            .collect();
        if let Err(ended) = say(&summary::text(&shared.output(), &jobs)) {
            return ended;
        }
    }
    ending
}

fn one(computed: &Computed, arguments: &Arguments, shared: &Shared) -> Result<(), Ending> {
    let screen = shared.output();
    let (building, results) = (&computed.job.building, &computed.results);
    if shared.quiet() && arguments.format == Format::Text {
        return say(&(verdict::lines(&screen, building, results).join("\n") + "\n"));
    }
    let results_text = computed.results_text().map_err(|error| {
        complain(&format!("results: {error}"));
        Ending::Machine
    })?;
    if arguments.format == Format::Json {
        return say(&results_text);
    }
    let fingerprint = computed.fingerprint(&results_text);
    let heading = ledger::Heading {
        number: &computed.job.meta.number,
        title: &computed.job.meta.title,
        fingerprint: &fingerprint,
    };
    say(&ledger::text(&screen, &heading, building, results, arguments.only.is_some()))?;
    if std::io::stdout().is_terminal() && std::io::stderr().is_terminal() {
        complain(&shared.errors().dim("next: sagledger draft"));
    }
    Ok(())
}
