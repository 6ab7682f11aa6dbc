//! Equation of state: pressure and entropy of the stellar gas, with slopes.

mod coulomb;
mod electron_gas;
mod equilibrium;
mod ionisation;
mod pressure;

pub(super) use pressure::{Gas, gas, gas_pressure};
