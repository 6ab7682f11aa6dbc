//! White dwarfs: radius of the cold star, and cooling.

mod cold_radius;
mod cooling;
mod table;

pub use cold_radius::cold_radius_rsun;
pub use cooling::{BACKGROUND_TEMPERATURE_K, CoolingCurve, WhiteDwarf};
