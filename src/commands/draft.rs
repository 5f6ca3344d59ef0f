//! `draft`: typesets the package, every sheet marked as a draft.

use std::path::{Path, PathBuf};

use clap::Args;
use sagledger_calc::results::Verdict;
use sagledger_sheets::{Overrides, Typeset};

use super::{Ending, Format, Shared, complain, files, folder_of, read_and_compute, say};
use crate::Computed;
use crate::package;
use crate::screen::verdict;

/// The folder of a job that holds a practice's own templates.
const TEMPLATES: &str = "templates";
/// Bytes of one template.
const LARGEST_TEMPLATE: u64 = 1024 * 1024;

#[derive(Args)]
pub struct Arguments {
    /// A job folder or its job.toml
    #[arg(default_value = ".", value_name = "JOB")]
    job: PathBuf,
    /// Where the package goes; default: draft.pdf in the job folder
    #[arg(short, long, value_name = "FILE")]
    output: Option<PathBuf>,
    /// Folder of templates that stand in for ours; default: templates in the job folder
    #[arg(long, value_name = "DIR")]
    templates: Option<PathBuf>,
    /// Write nothing unless every requirement is met
    #[arg(long)]
    only_if_met: bool,
}

pub fn run(arguments: &Arguments, shared: &Shared) -> Ending {
    match draft(arguments, shared) {
        Ok(ending) | Err(ending) => ending,
    }
}

fn draft(arguments: &Arguments, shared: &Shared) -> Result<Ending, Ending> {
    let computed = read_and_compute(&arguments.job, Format::Text, shared)?;
    let ending = Ending::of(computed.results.verdict);
    let screen = shared.output();
    let lines = verdict::lines(&screen, &computed.job.building, &computed.results);
    if arguments.only_if_met && computed.results.verdict != Verdict::Met {
        complain(&lines.join("\n"));
        complain("not written: --only-if-met was asked for");
        return Ok(ending);
    }
    let folder = folder_of(&arguments.job);
    let templates = overrides(arguments, &folder)?;
    let typeset = typeset(&computed, templates)?;
    let target = arguments.output.clone().unwrap_or_else(|| folder.join("draft.pdf"));
    files::write_whole(&target, &typeset.pdf).map_err(|error| {
        complain(&format!("{}: {error}", target.display()));
        Ending::Machine
    })?;
    if !shared.quiet() {
        let sheets = match typeset.sheets {
            1 => "1 sheet, marked: draft".to_string(),
            n => format!("{n} sheets, each marked: draft"),
        };
        let first = lines.first().cloned().unwrap_or_default();
        say(&format!("{first}\nwrote {}   {sheets}\n", target.display()))?;
    }
    Ok(ending)
}

fn typeset(computed: &Computed, templates: Overrides) -> Result<Typeset, Ending> {
    let results_text = computed.results_text().map_err(|error| {
        complain(&format!("results: {error}"));
        Ending::Machine
    })?;
    let package = package::draft(computed, &results_text, templates);
    sagledger_sheets::typeset(&package).map_err(|fault| {
        complain(&fault.to_string());
        Ending::Input
    })
}

/// Templates of the practice: single files that stand in for ours.
fn overrides(arguments: &Arguments, folder: &Path) -> Result<Overrides, Ending> {
    let (folder, asked) = match &arguments.templates {
        Some(folder) => (folder.clone(), true),
        None => (folder.join(TEMPLATES), false),
    };
    let mut overrides = Overrides::default();
    if !folder.is_dir() {
        if asked {
            complain(&format!("{}: there is no such folder of templates", folder.display()));
            return Err(Ending::Input);
        }
        return Ok(overrides);
    }
    collect(&folder, "", &mut overrides)?;
    Ok(overrides)
}

fn collect(folder: &Path, prefix: &str, overrides: &mut Overrides) -> Result<(), Ending> {
    let machine = |path: &Path, error: std::io::Error| {
        complain(&format!("{}: {error}", path.display()));
        Ending::Machine
    };
    let entries = std::fs::read_dir(folder).map_err(|error| machine(folder, error))?;
    for entry in entries {
        let entry = entry.map_err(|error| machine(folder, error))?;
        let path = entry.path();
        let kind = entry.file_type().map_err(|error| machine(&path, error))?;
        let name = format!("{prefix}{}", entry.file_name().to_string_lossy());
        if kind.is_dir() && prefix.is_empty() {
            collect(&path, &format!("{name}/"), overrides)?;
        } else if kind.is_file() && name.ends_with(".typ") {
            let size = entry.metadata().map_err(|error| machine(&path, error))?.len();
            if size > LARGEST_TEMPLATE {
                complain(&format!("{}: a template of more than 1 MiB", path.display()));
                return Err(Ending::Input);
            }
            let text = std::fs::read_to_string(&path).map_err(|error| match error.kind() {
                std::io::ErrorKind::InvalidData => {
                    complain(&format!("{}: not UTF-8", path.display()));
                    Ending::Input
                }
                _ => machine(&path, error),
            })?;
            overrides.0.insert(name, text);
        }
    }
    Ok(())
}
