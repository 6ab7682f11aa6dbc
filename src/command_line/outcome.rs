//! What a command line comes to.

use super::scenario_source::ScenarioSource;

/// What is to be done after the command line has run.
#[derive(Clone, Debug, PartialEq, Eq)]
pub enum Outcome {
    /// There was no sub-command: the window opens, with this scenario or with the demo.
    OpenWindow {
        /// The scenario asked for; a demo that is named exists, and so does a file.
        scenario: Option<ScenarioSource>,
    },
    /// Everything is done; the process ends with this exit code.
    Done(u8),
}

/// Exit code: done.
pub(super) const DONE: u8 = 0;
/// Exit code: the answer is "does not hold".
pub(super) const DOES_NOT_HOLD: u8 = 1;
/// Exit code: the command line itself is wrong.
pub(super) const WRONG_USAGE: u8 = 2;
/// Exit code: a scenario or a value is not allowed.
pub(super) const BAD_VALUE: u8 = 3;
/// Exit code: a file or the system makes trouble.
pub(super) const SYSTEM_TROUBLE: u8 = 4;
