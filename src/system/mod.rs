//! A whole system: its inputs, its history computed once, its state at any moment, and where
//! every figure comes from.
//!
//! Nothing here knows a file, a screen or a clock.

pub mod air;
pub mod events;
pub mod history;
pub mod limits;
pub mod moment;
pub mod notes;
pub mod pacing;
pub mod planet_past;
pub mod provenance;
pub mod quantities;
pub mod specification;
pub mod ticks;

pub use air::Air;
pub use events::{Event, EventKind};
pub use history::{History, HistoryError};
pub use moment::{Moment, PlanetMoment, PlanetState, StarMoment};
pub use notes::{Note, NoteKind};
pub use pacing::{TimeAxis, TimeScale};
pub use specification::{Body, Fault, PlanetSpecification, StarSpecification, System, SystemProblem};
