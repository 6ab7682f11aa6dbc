//! The star's life, from the zero-age main sequence to a cold remnant.
//!
//! A [`WholeLife`] is computed once from a [`StarInput`] and then answers for any age: [`WholeLife::state_at`]. Red dwarfs
//! come from the equations of stellar structure ([`convective`]), heavier stars as a [`Track`] of published fits
//! ([`analytic`], white dwarfs in [`white_dwarf`], collapses in [`remnant`]).

pub mod analytic;
mod burning;
pub mod calibration;
mod caution;
pub mod convective;
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
mod whole;

pub use caution::StarCaution;
pub use error::StarError;
pub use event::{StarEvent, StarEventKind};
pub use input::{END_YR, FITTED_MASS_RANGE_MSUN, MASS_RANGE_MSUN, METALLICITY_RANGE_DEX, StarInput};
pub use mass_loss::WindSource;
pub use phase::{Phase, PhaseSpan};
pub use state::{StarState, effective_temperature_k};
pub use track::Track;
pub use whole::{
    COMPUTED_BELOW_MSUN, FITTED_FROM_MSUN, Interior, LifeOptions, NoProfile, STRUCTURE_VERSION, WholeLife, ZeroAgeStar,
    quick_look, zero_age_line,
};
