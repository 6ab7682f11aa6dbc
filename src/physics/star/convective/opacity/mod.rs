//! How hard it is for heat to pass through the gas: radiation and conducting electrons together.

mod conduction;
mod radiative;
mod spline;
mod total;

pub(super) use radiative::RadiativeOpacity;
pub(super) use total::Opacity;
