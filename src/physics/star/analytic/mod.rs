//! Published analytic fits of stellar models: every fixed point and course a life is put together from.
//!
//! Times here are in Myr, masses, luminosities and radii in solar units. [`Fit`] holds one composition. Function names
//! say what they give; the equation number is that of Hurley, Pols & Tout 2000, MNRAS 315, 543 unless another paper is
//! named.

mod anchors;
mod coefficients;
mod composition;
mod core_helium;
mod core_luminosity;
mod critical_mass;
mod fit;
mod giants;
pub mod helium_star;
mod main_sequence;
mod piecewise;

pub use anchors::{
    Anchors, CARBON_IGNITION_CORE_MSUN, CHANDRASEKHAR_MSUN, CORE_COLLAPSE_CORE_MSUN, explosive_core_msun,
};
pub use core_luminosity::{CoreGrowth, CoreLuminosity};
pub use critical_mass::CriticalMasses;
pub use fit::{Fit, HEAVY_ELEMENTS_RANGE};
pub use giants::{DOUBLE_SHELL_RATE, HELIUM_BURNING_RATE};
pub use main_sequence::MainSequence;
