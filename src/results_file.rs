//! The results file: what `check --format json` prints and every package carries. Its structs are its own, so that
//! the calculation can change without changing files that were written years ago. Keys carry their units.

mod beams;
mod figure;
mod parts;

use sagledger_calc::actions::{Choices, StrengthRule};
use sagledger_calc::building::Building;
use sagledger_calc::outside::outside;
use sagledger_calc::results::Results;
use sagledger_calc::standards::STANDARDS;
use serde::Serialize;

pub use beams::BeamEntry;
pub use figure::Figure;
use parts::{PerAction, per_action};

use crate::job::Meta;
use crate::program;

/// Version of this format. Readers ignore keys that they do not know and refuse a higher version.
pub const FORMAT: u32 = 1;

#[derive(Serialize)]
pub struct ResultsFile {
    format: u32,
    program: Program,
    job: JobEntry,
    verdict: &'static str,
    outside: Vec<String>,
    basis: Basis,
    assumptions: Vec<AssumptionEntry>,
    beams: Vec<BeamEntry>,
    walls: Vec<WallEntry>,
    takedown: TakeDownEntry,
}

#[derive(Serialize)]
struct Program {
    name: &'static str,
    version: &'static str,
    identity: &'static str,
}

#[derive(Serialize)]
struct JobEntry {
    number: String,
    title: String,
}

#[derive(Serialize)]
struct Basis {
    national_choices: &'static str,
    combination: &'static str,
    shear_flexibility: bool,
    editions: Vec<&'static str>,
    combinations: Vec<String>,
}

#[derive(Serialize)]
struct AssumptionEntry {
    number: usize,
    text: String,
    members: Vec<String>,
}

#[derive(Serialize)]
struct WallEntry {
    name: String,
    #[serde(rename = "total_kN")]
    total: PerAction,
    #[serde(rename = "design_max_kN")]
    design_max: Figure,
    #[serde(rename = "characteristic_max_kN")]
    characteristic_max: Figure,
}

#[derive(Serialize)]
struct TakeDownEntry {
    #[serde(rename = "applied_kN")]
    applied: PerAction,
    #[serde(rename = "to_supports_kN")]
    to_supports: PerAction,
}

impl ResultsFile {
    pub fn new(meta: &Meta, building: &Building, results: &Results) -> ResultsFile {
        let actions = &results.actions;
        ResultsFile {
            format: FORMAT,
            program: Program { name: program::NAME, version: program::VERSION, identity: program::IDENTITY },
            job: JobEntry { number: meta.number.clone(), title: meta.title.clone() },
            verdict: results.verdict.word(),
            outside: outside(building),
            basis: Basis {
                national_choices: match building.basis.choices {
                    Choices::Uk => "UK",
                    Choices::Recommended => "recommended",
                },
                combination: match building.basis.rule {
                    StrengthRule::Single => "6.10",
                    StrengthRule::Pair => "6.10a/b",
                },
                shear_flexibility: building.basis.shear_flexibility,
                editions: STANDARDS.iter().map(|s| s.edition).collect(),
                combinations: results.combinations.strength.iter().map(|c| c.name(actions)).collect(),
            },
            assumptions: results
                .assumptions
                .iter()
                .enumerate()
                .map(|(n, a)| AssumptionEntry { number: n + 1, text: a.sentence.clone(), members: a.marks.clone() })
                .collect(),
            beams: (0..results.beams.len()).map(|n| BeamEntry::new(building, results, n)).collect(),
            walls: building
                .walls
                .iter()
                .zip(&results.walls)
                .map(|(wall, result)| WallEntry {
                    name: wall.name.clone(),
                    total: per_action(actions, &result.totals),
                    design_max: Figure(result.design_max.to_kn()),
                    characteristic_max: Figure(result.characteristic_max.to_kn()),
                })
                .collect(),
            takedown: TakeDownEntry {
                applied: per_action(actions, &results.takedown.applied),
                to_supports: per_action(actions, &results.takedown.to_supports),
            },
        }
    }

    /// The file's text: one key a line, a line end at the end.
    ///
    /// # Errors
    /// Those of the serialiser, which this data never meets.
    pub fn text(&self) -> Result<String, serde_json::Error> {
        serde_json::to_string_pretty(self).map(|text| text + "\n")
    }
}
