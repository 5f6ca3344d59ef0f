//! Arguments in, exit code out.

use std::process::ExitCode;

fn main() -> ExitCode {
    sagledger::commands::run(std::env::args_os()).into()
}
