//! From one moment to the next: burning, mixing, and how long a step may be.

mod cooling;
mod mixing;
mod resolution;
mod start;
mod step;
mod wind;

pub(super) use cooling::LateCooling;
pub use resolution::Resolution;
pub(super) use start::contracting_star;
pub(super) use step::{Step, Stepper};
pub(super) use wind::blow;
