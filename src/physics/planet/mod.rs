//! Planets: light received, temperature, climate, orbit, tides, escape, size.
//!
//! Everything here is a pure function or a walk along the star's own time nodes
//! ([`StarPoint`]). Quantities with memory (orbit, water, ice) are computed once for a whole
//! life and read back at any moment, so that a moment never depends on how it was reached.

pub mod bulk;
pub mod caution;
pub mod climate;
pub mod deep_time;
pub mod escape;
pub mod greenhouse;
pub mod habitable_zone;
pub mod high_energy;
pub mod history;
pub mod irradiation;
pub mod orbit;
pub mod orbit_history;
mod orbit_walk;
pub mod range;
pub mod star_point;
pub mod tides;
pub mod transit;

pub use caution::Caution;
pub use climate::{CarbonCycle, ClimateState, WaterWorldAir};
pub use greenhouse::Greenhouse;
pub use history::{PlanetEvent, PlanetEventKind, PlanetHistory, PlanetInput, PlanetMoment, WaterWorld};
pub use irradiation::Redistribution;
pub use orbit_history::{OrbitEnd, OrbitHistory, OrbitInput};
pub use range::OutOfRange;
pub use star_point::StarPoint;
pub use tides::Tides;
