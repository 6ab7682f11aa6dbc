//! The program: a command line, or the window when no sub-command is given.

use longember::command_line::{self, Outcome, ScenarioSource};
use longember::document::built_in;
use longember::window::{self, Opening};
use std::io::Write;
use std::process::ExitCode;

/// Exit code for trouble with a file or the system.
const SYSTEM_TROUBLE: u8 = 4;

fn main() -> ExitCode {
    let scenario = match command_line::run(std::env::args_os()) {
        Outcome::Done(code) => return ExitCode::from(code),
        Outcome::OpenWindow { scenario } => scenario,
    };
    match window::run(opening(scenario)) {
        Ok(()) => ExitCode::SUCCESS,
        Err(error) => {
            // Nothing is left to try when even standard error is closed.
            let _ = writeln!(std::io::stderr(), "longember: {error}");
            ExitCode::from(SYSTEM_TROUBLE)
        }
    }
}

fn opening(scenario: Option<ScenarioSource>) -> Opening {
    match scenario {
        Some(ScenarioSource::File(path)) => Opening::File(path),
        Some(ScenarioSource::Demo(name)) => built_in::find(&name)
            .and_then(|built_in| built_in.scenario().ok())
            .map_or(Opening::Demo, |scenario| Opening::Scenario(Box::new(scenario))),
        // The command line refuses standard input for a window before it comes here.
        Some(ScenarioSource::StandardInput) | None => Opening::Demo,
    }
}
