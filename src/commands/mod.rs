//! One file a command, each a short story in calls to the other rooms.

pub mod check;
pub mod draft;
mod files;

use std::path::{Path, PathBuf};
use std::process::ExitCode;

use clap::{Args, Parser, Subcommand, ValueEnum};
use sagledger_calc::results::Verdict;

use crate::job::{self, Fault, Job, Source};
use crate::screen::{Screen, Weights};
use crate::{Computed, compute};

/// Takes loads down through beams that carry beams, checks every member to the Eurocodes, and typesets the numbered
/// calculation package.
///
/// Exit codes: 0 done and every requirement met; 1 done, some requirement not met or not verified; 2 the input or the
/// command line is at fault; 3 the machine is.
#[derive(Parser)]
#[command(name = crate::program::NAME, version = crate::program::VERSION)]
pub struct Cli {
    #[command(subcommand)]
    command: Command,
    #[command(flatten)]
    shared: Shared,
}

/// Switches of every command.
#[derive(Args, Clone)]
pub struct Shared {
    /// Bold and dim print; the program uses no colour
    #[arg(long, global = true, value_enum, default_value = "auto", value_name = "WHEN")]
    color: Weights,
    /// Plain ASCII instead of marks and lines
    #[arg(long, global = true)]
    ascii: bool,
    /// Say only what was asked for; faults are always said
    #[arg(long, short, global = true)]
    quiet: bool,
}

#[derive(Subcommand)]
enum Command {
    /// Computes a job and prints its ledger
    Check(check::Arguments),
    /// Typesets the calculation package, every sheet marked as a draft
    Draft(draft::Arguments),
}

/// How results and faults are said.
#[derive(Clone, Copy, PartialEq, Eq, ValueEnum)]
pub enum Format {
    Text,
    Json,
}

/// How a command ended.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord)]
pub enum Ending {
    /// Done, and every requirement met.
    Met,
    /// Done, some requirement not met or not verified.
    NotWhollyMet,
    /// The input or the command line is at fault.
    Input,
    /// The machine is.
    Machine,
}

impl Ending {
    fn of(verdict: Verdict) -> Ending {
        match verdict {
            Verdict::Met => Ending::Met,
            Verdict::NotMet | Verdict::NotVerified => Ending::NotWhollyMet,
        }
    }

    pub fn code(self) -> u8 {
        match self {
            Ending::Met => 0,
            Ending::NotWhollyMet => 1,
            Ending::Input => 2,
            Ending::Machine => 3,
        }
    }
}

impl From<Ending> for ExitCode {
    fn from(ending: Ending) -> ExitCode {
        ExitCode::from(ending.code())
    }
}

/// Runs the command that the arguments ask for.
pub fn run(arguments: impl Iterator<Item = std::ffi::OsString>) -> Ending {
    let cli = match Cli::try_parse_from(arguments) {
        Ok(cli) => cli,
        Err(error) => {
            // Help and version are answers, everything else is a fault of the command line.
            let ending = if error.use_stderr() { Ending::Input } else { Ending::Met };
            return if error.print().is_err() { Ending::Machine } else { ending };
        }
    };
    match &cli.command {
        Command::Check(arguments) => check::run(arguments, &cli.shared),
        Command::Draft(arguments) => draft::run(arguments, &cli.shared),
    }
}

impl Shared {
    pub fn output(&self) -> Screen {
        Screen::detect(false, self.ascii, self.color)
    }

    pub fn errors(&self) -> Screen {
        Screen::detect(true, self.ascii, self.color)
    }

    pub fn quiet(&self) -> bool {
        self.quiet
    }
}

/// Writes to standard output; a reader that has gone away is no fault.
pub fn say(text: &str) -> Result<(), Ending> {
    use std::io::Write;
    match std::io::stdout().lock().write_all(text.as_bytes()) {
        Ok(()) => Ok(()),
        Err(error) if error.kind() == std::io::ErrorKind::BrokenPipe => Ok(()),
        Err(error) => {
            complain(&format!("standard output: {error}"));
            Err(Ending::Machine)
        }
    }
}

/// Writes a line to standard error.
pub fn complain(text: &str) {
    use std::io::Write;
    // Nothing is left to tell where standard error itself cannot be written.
    let _ = writeln!(std::io::stderr().lock(), "{text}");
}

/// Opens, reads and calculates a job, and says its faults and warnings.
///
/// # Errors
/// How the command ends where there is nothing to go on with.
pub fn read_and_compute(path: &Path, format: Format, shared: &Shared) -> Result<Computed, Ending> {
    let reading = job::open(path).map_err(|machine| {
        complain(&format!("{}: {}", machine.path.display(), machine.error));
        Ending::Machine
    })?;
    let Some(job) = reading.job else {
        tell(&reading.source, &reading.findings, format, shared)?;
        return Err(Ending::Input);
    };
    let warnings = reading.findings;
    match compute(job) {
        Ok(computed) => {
            if !shared.quiet {
                tell(&reading.source, &warnings, format, shared)?;
            }
            Ok(computed)
        }
        Err(refused) => {
            let all = in_order(&refused.job, warnings, refused.faults);
            tell(&reading.source, &all, format, shared)?;
            Err(Ending::Input)
        }
    }
}

fn in_order(job: &Job, mut warnings: Vec<Fault>, faults: Vec<Fault>) -> Vec<Fault> {
    warnings.extend(faults);
    warnings.sort_by_key(|fault| fault.span.as_ref().map_or(0, |span| job.source().line_of(span.start)));
    warnings
}

fn tell(source: &Source, findings: &[Fault], format: Format, shared: &Shared) -> Result<(), Ending> {
    if findings.is_empty() {
        return Ok(());
    }
    match format {
        Format::Text => {
            complain(job::show::terminal(source, findings, shared.errors().cells()).trim_end());
        }
        Format::Json => {
            let faults = job::show::json(source, findings);
            complain(&serde_json::to_string_pretty(&faults).unwrap_or_else(|error| error.to_string()));
        }
    }
    Ok(())
}

/// The folder of a job, given it or its file.
pub fn folder_of(path: &Path) -> PathBuf {
    if path.is_dir() {
        return path.to_path_buf();
    }
    match path.parent() {
        Some(parent) if !parent.as_os_str().is_empty() => parent.to_path_buf(),
        _ => PathBuf::from("."),
    }
}
