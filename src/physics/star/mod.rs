//! The star's life, from the zero-age main sequence to a cold remnant.
//!
//! A [`Track`] is computed once from a [`StarInput`] and then answers for any age: [`Track::state_at`]. The published
//! formulas it is put together from are in [`analytic`], white dwarfs in [`white_dwarf`], collapses in [`remnant`].

pub mod analytic;
mod burning;
pub mod calibration;
mod caution;
mod course;
mod error;
mod event;
mod input;
mod interpolation;
mod life;
mod mass_loss;
mod pace;
mod phase;
pub mod remnant;
mod small_envelope;
mod state;
mod step;
mod track;
pub mod white_dwarf;

pub use caution::StarCaution;
pub use error::StarError;
pub use event::{StarEvent, StarEventKind};
pub use input::{END_YR, MASS_RANGE_MSUN, METALLICITY_RANGE_DEX, StarInput};
pub use mass_loss::WindSource;
pub use phase::{Phase, PhaseSpan};
pub use state::{StarState, effective_temperature_k};
pub use track::Track;
