//! A whole system: its inputs, its history computed once, its state at any moment, and where
//! every figure comes from.
//!
//! Nothing here knows a file, a screen or a clock.

pub mod air;
pub mod cues;
pub mod date_band;
pub mod events;
pub mod history;
mod light_notes;
pub mod light_quantities;
pub mod limits;
pub mod mild_spans;
pub mod moment;
pub mod moment_light;
pub mod moment_request;
mod neighbour_notes;
pub mod notes;
pub mod pacing;
pub mod planet_choices;
pub mod planet_climate;
mod planet_events;
pub mod planet_light;
pub mod planet_past;
pub mod provenance;
pub mod quantities;
pub mod specification;
mod star_bands;
mod star_colours;
pub mod starlight;
pub mod statements;
pub mod ticks;

pub use air::Air;
pub use date_band::DateBand;
pub use events::{Event, EventFilter, EventGroup, EventKind};
pub use history::{History, HistoryError};
pub use moment::{Moment, PlanetMoment, PlanetState, StarMoment};
pub use moment_light::{LightReader, MomentLight};
pub use moment_request::{MomentProblem, MomentRequest};
pub use notes::{Note, NoteKind};
pub use pacing::{TimeAxis, TimeScale};
pub use planet_choices::{Carbon, TidesChoice, Water};
pub use planet_climate::PlanetClimate;
pub use planet_light::PlanetLight;
pub use specification::{Body, Fault, PlanetSpecification, StarSpecification, System, SystemProblem};
pub use starlight::{StarColour, Starlight};
