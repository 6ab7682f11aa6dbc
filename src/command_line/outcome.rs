//! What a command line comes to.

use super::scenario_source::ScenarioSource;

/// Who is asked to draw the window.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq)]
pub enum GraphicsChoice {
    /// OpenGL where it works, the processor where it does not.
    #[default]
    Auto,
    /// OpenGL and nothing else.
    OpenGl,
    /// The processor, without OpenGL.
    Processor,
}

impl GraphicsChoice {
    /// Every choice, as it is written on the command line.
    pub const ALL: [(&str, Self); 3] = [("auto", Self::Auto), ("opengl", Self::OpenGl), ("processor", Self::Processor)];

    /// The choice of this name.
    #[must_use]
    pub fn from_name(name: &str) -> Option<Self> {
        Self::ALL.into_iter().find(|(its, _)| *its == name).map(|(_, choice)| choice)
    }
}

/// What is to be done after the command line has run.
#[derive(Clone, Debug, PartialEq, Eq)]
pub enum Outcome {
    /// There was no sub-command: the window opens, with this scenario or with the demo.
    OpenWindow {
        /// The scenario asked for; a demo that is named exists, and so does a file.
        scenario: Option<ScenarioSource>,
        /// Who draws it.
        graphics: GraphicsChoice,
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
