//! Everything that can end a command early, with its sentence and its exit code.

use super::outcome::{BAD_VALUE, SYSTEM_TROUBLE, WRONG_USAGE};
use crate::document::{LoadError, Problem, WriteError, built_in};
use crate::drawing::PictureProblem;
use crate::drawing::frames::FrameProblem;
use crate::handover::{ColumnsProblem, TableAgesProblem};
use crate::system::cues::CueProblem;
use crate::system::statements::LineProblem;
use crate::system::{HistoryError, MomentProblem};
use std::io;
use std::path::PathBuf;
use thiserror::Error;

/// Why a command could not be carried out.
#[derive(Debug, Error)]
pub(super) enum Trouble {
    /// The scenario can't be read.
    #[error(transparent)]
    Load(#[from] LoadError),
    /// A built-in scenario is not sound.
    #[error("a built-in scenario is faulty; please report it: {}", lines(problems))]
    BuiltIn {
        /// Everything that is wrong with it.
        problems: Vec<Problem>,
    },
    /// There is no built-in scenario of that name.
    #[error("the demo \"{name}\" does not exist, allowed {}; name one of these", demo_names())]
    NoSuchDemo {
        /// The name asked for.
        name: String,
    },
    /// There is no body of that name in the scenario.
    #[error("the body \"{name}\" does not exist, allowed {allowed}; name one of these")]
    NoSuchBody {
        /// The name asked for.
        name: String,
        /// The names there are.
        allowed: String,
    },
    /// Standard input can't be read.
    #[error("standard input can't be read: {0}; name a file instead")]
    StandardInput(io::Error),
    /// The window opens files, not streams.
    #[error("the window can't open standard input, allowed a file or demo:NAME; save the scenario to a file first")]
    WindowFromStandardInput,
    /// The file named for the window does not exist.
    #[error("{} does not exist, allowed a scenario file, demo:NAME or a sub-command; see longember --help", path.display())]
    NothingToOpen {
        /// The path.
        path: PathBuf,
    },
    /// The system has no history.
    #[error(transparent)]
    History(#[from] HistoryError),
    /// The time asked for is no moment of this history.
    #[error(transparent)]
    Moment(#[from] MomentProblem),
    /// One end of a table's span is no moment.
    #[error("--{end}: {problem}")]
    TableEnd {
        /// Which end: `from` or `to`.
        end: &'static str,
        /// What is wrong with it.
        problem: MomentProblem,
    },
    /// A line that is no statement.
    #[error("the statement \"{line}\": {problem}")]
    Statement {
        /// The line.
        line: String,
        /// What is wrong with it.
        problem: LineProblem,
    },
    /// There is nothing to judge.
    #[error(
        "the scenario states nothing, allowed one statement or more; add statements to it, or give --statement LINE"
    )]
    NothingStated,
    /// No such table.
    #[error(transparent)]
    TableAges(#[from] TableAgesProblem),
    /// No such columns.
    #[error(transparent)]
    Columns(#[from] ColumnsProblem),
    /// A number outside its range.
    #[error("{option} is {value}, allowed {allowed}; choose a value in that range")]
    OutOfRange {
        /// The option.
        option: &'static str,
        /// Its value.
        value: f64,
        /// What is allowed.
        allowed: &'static str,
    },
    /// A width of frames that is none.
    #[error("--size is {size} pixels, allowed {least} to {most}; choose a width in that range")]
    FrameSize {
        /// The width asked for.
        size: u32,
        /// Narrowest.
        least: u32,
        /// Widest.
        most: u32,
    },
    /// A sky without a planet.
    #[error(
        "the scenario has no planet, allowed one or more for the subject sky; add a planet or choose another subject"
    )]
    NoPlanet,
    /// The cues make no show.
    #[error(transparent)]
    Cues(#[from] CueProblem),
    /// A frame of another sequence, or a spoilt one, is in the way.
    #[error("{} is no frame of this sequence; add --force to replace such files, or choose another folder", path.display())]
    OtherFrame {
        /// The file.
        path: PathBuf,
    },
    /// The folder for frames can't be made.
    #[error("the folder {} can't be made: {source}; choose another one", path.display())]
    Folder {
        /// The folder.
        path: PathBuf,
        /// What the system says.
        source: io::Error,
    },
    /// A frame is no file.
    #[error(transparent)]
    Frame(#[from] FrameProblem),
    /// No such picture.
    #[error(transparent)]
    Picture(#[from] PictureProblem),
    /// More moments than a page holds.
    #[error("--at is given {count} times, allowed 1 to {most}; make several sheets")]
    TooManyMoments {
        /// How many were given.
        count: usize,
        /// How many a sheet holds.
        most: usize,
    },
    /// The name of a result file names no format.
    #[error("{} names no format by its end, allowed {allowed}; rename it or say --format", path.display())]
    NoSuchFormat {
        /// The file.
        path: PathBuf,
        /// The ends there are.
        allowed: &'static str,
    },
    /// A file is in the way.
    #[error("{} exists already; add --force to replace it, or choose another name", path.display())]
    FileExists {
        /// The file.
        path: PathBuf,
    },
    /// A result file can't be written.
    #[error(transparent)]
    Write(WriteError),
    /// Standard output can't be written.
    #[error("standard output can't be written: {0}; write to a file with --out instead")]
    StandardOutput(io::Error),
    /// An option that needs another one.
    #[error("{option} is given without {needs}, allowed together with it only; add {needs} or leave {option} out")]
    OptionNeeds {
        /// The option given.
        option: &'static str,
        /// What it needs.
        needs: &'static str,
    },
}

impl From<WriteError> for Trouble {
    fn from(error: WriteError) -> Self {
        match error {
            WriteError::Exists { path } => Self::FileExists { path },
            other => Self::Write(other),
        }
    }
}

impl Trouble {
    /// The exit code it ends the process with.
    pub(super) fn exit_code(&self) -> u8 {
        match self {
            Self::OptionNeeds { .. }
            | Self::WindowFromStandardInput
            | Self::NoSuchFormat { .. }
            | Self::TooManyMoments { .. } => WRONG_USAGE,
            Self::Load(LoadError::Unsound { .. })
            | Self::BuiltIn { .. }
            | Self::NoSuchDemo { .. }
            | Self::NoSuchBody { .. }
            | Self::History(_)
            | Self::Moment(_)
            | Self::TableEnd { .. }
            | Self::Statement { .. }
            | Self::NothingStated
            | Self::TableAges(_)
            | Self::Picture(_)
            | Self::OutOfRange { .. }
            | Self::FrameSize { .. }
            | Self::NoPlanet
            | Self::Cues(_)
            | Self::Frame(_)
            | Self::Columns(_)
            | Self::Write(WriteError::Unsound { .. }) => BAD_VALUE,
            Self::Load(LoadError::Unreadable { .. })
            | Self::StandardInput(_)
            | Self::NothingToOpen { .. }
            | Self::FileExists { .. }
            | Self::OtherFrame { .. }
            | Self::Folder { .. }
            | Self::Write(_)
            | Self::StandardOutput(_) => SYSTEM_TROUBLE,
        }
    }
}

fn demo_names() -> String {
    built_in::all().iter().map(|built_in| built_in.name).collect::<Vec<_>>().join(", ")
}

fn lines(problems: &[Problem]) -> String {
    problems.iter().map(ToString::to_string).collect::<Vec<_>>().join("; ")
}
