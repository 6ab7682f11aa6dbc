//! The program: a command line, or the window when no sub-command is given.

use longember::command_line::{self, GraphicsChoice, Outcome, ScenarioSource};
use longember::document::built_in;
use longember::window::{self, Graphics, NoWindow, Opening};
use std::env;
use std::io::{self, Write};
use std::process::{self, ExitCode};

/// Exit code for trouble with a file or the system.
const SYSTEM_TROUBLE: u8 = 4;
/// Who draws the window, where the command line leaves it open: for drivers that crash instead of saying no.
const GRAPHICS: &str = "LONGEMBER_GRAPHICS";

fn main() -> ExitCode {
    let (scenario, asked) = match command_line::run(env::args_os()) {
        Outcome::Done(code) => return ExitCode::from(code),
        Outcome::OpenWindow { scenario, graphics } => (scenario, graphics),
    };
    let of_user = env::var(GRAPHICS).ok().and_then(|name| GraphicsChoice::from_name(&name)).unwrap_or_default();
    let choice = if asked == GraphicsChoice::Auto { of_user } else { asked };
    let graphics = if choice == GraphicsChoice::Processor { Graphics::Processor } else { Graphics::OpenGl };
    match window::run(opening(scenario), graphics) {
        Ok(()) => ExitCode::SUCCESS,
        // An event loop cannot be made twice in one process: a new one draws without OpenGL.
        Err(NoWindow::NoOpenGl { .. }) if choice == GraphicsChoice::Auto => again_without_opengl(),
        Err(error) => failed(&error.to_string()),
    }
}

fn again_without_opengl() -> ExitCode {
    let started = env::current_exe().and_then(|program| {
        process::Command::new(program).args(env::args_os().skip(1)).env(GRAPHICS, "processor").status()
    });
    match started {
        Ok(status) => status.code().and_then(|code| u8::try_from(code).ok()).map_or(ExitCode::FAILURE, ExitCode::from),
        Err(error) => failed(&format!("the window cannot be drawn without OpenGL: {error}")),
    }
}

fn failed(sentence: &str) -> ExitCode {
    // Nothing is left to try when even standard error is closed.
    let _ = writeln!(io::stderr(), "longember: {sentence}");
    ExitCode::from(SYSTEM_TROUBLE)
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
