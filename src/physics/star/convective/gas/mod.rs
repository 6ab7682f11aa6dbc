//! Equation of state: pressure and entropy of the stellar gas, with slopes.

mod coulomb;
mod degeneracy;
mod electron_gas;
mod equilibrium;
mod ionisation;
mod pressure;

pub(super) use degeneracy::fermi_temperature_k;
pub(super) use electron_gas::electrons_per_cm3;
pub(super) use pressure::{Gas, gas, gas_pressure};
