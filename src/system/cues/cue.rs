//! One row of a cue sheet.

use crate::system::moment_request::MomentRequest;
use crate::system::pacing::TimeScale;

/// Longest show, seconds: a time code counts one day.
pub const LONGEST_SHOW_S: f64 = 86_399.0;
/// Most cues of a sheet.
pub const MOST_CUES: usize = 500;

/// A moment of the show at which a moment of the star's life is reached.
#[derive(Clone, Debug, PartialEq)]
pub struct Cue {
    /// Time since the start of the show, s.
    pub show_time_s: f64,
    /// The moment of the star's life.
    pub moment: MomentRequest,
    /// How the show comes here from the cue before; of no account for the first one.
    pub transition: Transition,
    /// For the people at the desk; may be empty.
    pub note: String,
}

/// How the show comes from one cue to the next.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
pub enum Transition {
    /// The moment before is held, then there is a jump.
    Cut,
    /// Equal spans of show time are equal spans of time.
    Steady,
    /// Equal spans of show time are equal ratios of age.
    SteadyLog,
    /// Every visible change takes a similar span of show time.
    #[default]
    Paced,
}

impl Transition {
    /// Every transition, in the order they are offered.
    pub const ALL: [Self; 4] = [Self::Cut, Self::Steady, Self::SteadyLog, Self::Paced];

    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::Cut => "cut",
            Self::Steady => "steady",
            Self::SteadyLog => "steady_log",
            Self::Paced => "paced",
        }
    }

    /// The transition in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Cut => "cut",
            Self::Steady => "steady in time",
            Self::SteadyLog => "steady in log time",
            Self::Paced => "paced",
        }
    }

    /// The scale of time on which it moves evenly; none for a cut.
    #[must_use]
    pub fn scale(self) -> Option<TimeScale> {
        match self {
            Self::Cut => None,
            Self::Steady => Some(TimeScale::Linear),
            Self::SteadyLog => Some(TimeScale::Log),
            Self::Paced => Some(TimeScale::Paced),
        }
    }
}
