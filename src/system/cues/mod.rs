//! Show time against cosmic time: cues, what lies between them, one moment for every frame, and what could go wrong.

mod cue;
mod frame_rate;
mod frames;
mod schedule;

pub use cue::{Cue, LONGEST_SHOW_S, MOST_CUES, Transition};
pub use frame_rate::{FrameRate, NoFrameRate};
pub use frames::{MOST_FRAMES, ShowFrame, frames};
pub use schedule::{CueProblem, Schedule, Stop};
