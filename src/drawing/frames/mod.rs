//! Pictures of a moving show: star, sky or a plot at one moment after another, flat or for a dome.
//!
//! A frame depends on nothing but its moment and the choices made for the whole sequence, so that any frame can be made
//! anywhere, in any order, and comes out the same bit for bit.

mod encoding;
mod raster;
mod scene;
mod sequence;

pub use encoding::{FrameFormat, FrameProblem, encode, is_kept};
pub use raster::{Raster, Shape};
pub use scene::{FIELD_DEG, FrameSubject};
pub use sequence::{FRAME_SIZE_RANGE_PX, FrameSequence, SequenceChoices};
