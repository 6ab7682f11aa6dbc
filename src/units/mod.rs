//! Constants, units and their text: the bottom layer, which knows nothing else of this crate.
//!
//! One convention holds everywhere: a bare `f64` names its unit in its own name
//! (`mass_msun`, `time_yr`, `effective_temperature_k`); a name without a unit is dimensionless.

pub mod constants;
pub mod entry;
pub mod likeness;
pub mod number_text;
pub mod show_time;
pub mod time_words;
