//! Everything that happens to a planet in the life of its star, walked once and read back at any moment.

mod climate_walk;
pub mod event;
pub mod input;
pub mod latitudes;
pub mod moment;
mod passage;
pub mod planet_history;
mod surroundings;
pub mod thresholds;

pub use event::{PlanetEvent, PlanetEventKind};
pub use input::{PlanetInput, WaterWorld};
pub use latitudes::NoLatitudes;
pub use moment::{ClimateMoment, PlanetMoment, SurfaceTemperature};
pub use planet_history::PlanetHistory;
pub use thresholds::LightThresholds;
