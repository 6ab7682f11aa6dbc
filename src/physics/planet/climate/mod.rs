//! Climate of planets with surface water: ice, open water, steam, and what moves between them.

pub mod carbon;
pub mod climate_curve;
mod continuation;
pub mod ice_line_model;
pub mod infrared;
pub mod reflection;
pub mod regulated;
pub mod state;
mod sunlight_by_latitude;
pub mod table;
pub mod tables;

pub use carbon::CarbonCycle;
pub use climate_curve::ClimateCurve;
pub use ice_line_model::{Climate, IceLineModel, Latitude, WaterWorldAir};
pub use infrared::OutgoingInfrared;
pub use regulated::RegulatedClimate;
pub use state::ClimateState;
pub use table::{ClimateLimits, ClimateTable};
pub use tables::ClimateTables;
