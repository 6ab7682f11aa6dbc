//! The command line: arguments to a typed command, the command to text, the outcome to an exit code.
//!
//! Standard output carries only the result; every message goes to standard error. Exit codes: 0 done, 1 a
//! statement does not hold, 2 wrong usage, 3 a bad scenario or value, 4 trouble with a file or the system.

mod arguments;
mod check;
mod cues;
mod destination;
mod figure_run;
mod frame_crew;
mod frame_run;
mod outcome;
mod run;
mod scenario_source;
mod streams;
mod trouble;

pub use outcome::{GraphicsChoice, Outcome};
pub use run::{run, run_with};
pub use scenario_source::ScenarioSource;
pub use streams::Streams;
