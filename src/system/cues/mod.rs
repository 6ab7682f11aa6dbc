//! Show time against cosmic time: cues, what lies between them, one moment for every frame, and what could go wrong.

mod cue;
mod flashes;
mod frame_rate;
mod frames;
mod schedule;
mod time_code;
mod warnings;

pub use cue::{Cue, LONGEST_SHOW_S, MOST_CUES, Transition};
pub use flashes::{
    DARKER_BELOW, FlashKind, Flashing, LEAST_CHANGE, Light, MOST_FLASHES, RED_DISTANCE, RED_SHARE, flashing,
};
pub use frame_rate::{FrameRate, NoFrameRate};
pub use frames::{MOST_FRAMES, ShowFrame, frames};
pub use schedule::{CueProblem, Schedule, Stop};
pub use time_code::time_code;
pub use warnings::{Picture, ShowWarning, warnings};
