//! Where a planet's carbon dioxide comes from: held by the user or adjusted by rocks and volcanoes.

use super::super::habitable_zone::runaway_insolation_earth;
use super::super::range::OutOfRange;
use super::ice_line_model::{Latitude, WaterWorldAir};
use super::regulated::{AiredClimate, RegulatedClimate, checked_mean};
use super::table::{ClimateLimits, ClimateTable, SURELY_THAWED};
use super::tables::ClimateTables;
use std::sync::Arc;

/// What sets the carbon dioxide in a planet's air.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum CarbonCycle {
    /// The pressure stays as given.
    Held,
    /// Weathering and volcanoes hold one mean temperature as long as 10⁻⁴ to 3 bar can.
    Regulated {
        /// The mean surface temperature that is held, K, 275 to 310; 288 for the Earth.
        mean_k: f64,
    },
}

impl Default for CarbonCycle {
    fn default() -> Self {
        Self::Regulated { mean_k: 288.0 }
    }
}

impl CarbonCycle {
    /// Stable machine name of the kind.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::Held => "held",
            Self::Regulated { .. } => "regulated",
        }
    }

    /// The kind in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Held => "carbon dioxide stays",
            Self::Regulated { .. } => "rocks and volcanoes adjust carbon dioxide",
        }
    }

    /// Checks the parameter.
    ///
    /// # Errors
    /// [`OutOfRange`] for a mean temperature outside 275 to 310 K.
    pub fn check(self) -> Result<(), OutOfRange> {
        match self {
            Self::Held => Ok(()),
            Self::Regulated { mean_k } => checked_mean(mean_k).map(|_| ()),
        }
    }
}

/// The climates of one planet, whichever way its carbon dioxide is set.
#[derive(Clone, Debug)]
pub(crate) enum WorldClimate {
    Held { table: Arc<ClimateTable>, carbon_dioxide_bar: f64 },
    Regulated(Box<RegulatedClimate>),
}

/// Starlight over the runaway limit above which no planet under 3 bar of carbon dioxide stays frozen.
const SURELY_THAWED_UNDER_THICK_AIR: f64 = 0.6;

impl WorldClimate {
    pub(crate) fn new(air: &WaterWorldAir, cycle: CarbonCycle, tables: &mut ClimateTables) -> Result<Self, OutOfRange> {
        Ok(match cycle {
            CarbonCycle::Held => Self::Held { table: tables.of(air)?, carbon_dioxide_bar: air.carbon_dioxide_bar },
            CarbonCycle::Regulated { mean_k } => {
                Self::Regulated(Box::new(RegulatedClimate::of_tables(air, mean_k, tables)?))
            }
        })
    }

    /// Marks the tables as in use.
    pub(crate) fn keep_tables(&self, tables: &mut ClimateTables) {
        match self {
            Self::Held { table, .. } => tables.keep(table),
            Self::Regulated(regulated) => regulated.keep_tables(tables),
        }
    }

    /// Works out the curves that this starlight needs.
    pub(crate) fn prepare(&self, insolation_earth: f64, teff_k: f64) {
        match self {
            Self::Held { table, .. } => table.prepare(teff_k),
            Self::Regulated(regulated) => regulated.prepare(insolation_earth, teff_k),
        }
    }

    /// Starlight above which the planet is surely not frozen.
    pub(crate) fn surely_thawed(&self, teff_k: f64) -> f64 {
        match self {
            Self::Held { .. } => SURELY_THAWED,
            Self::Regulated(_) => SURELY_THAWED_UNDER_THICK_AIR * runaway_insolation_earth(teff_k, 1.0),
        }
    }

    /// Where the climate turns.
    pub(crate) fn limits(&self, teff_k: f64) -> Result<ClimateLimits, OutOfRange> {
        match self {
            Self::Held { table, .. } => table.limits(teff_k),
            Self::Regulated(regulated) => regulated.limits(teff_k),
        }
    }

    /// The latitudes of [`WorldClimate::open_climate`].
    pub(crate) fn open_latitudes(&self, insolation_earth: f64, teff_k: f64) -> Result<Vec<Latitude>, OutOfRange> {
        match self {
            Self::Held { table, .. } => table.open_latitudes(insolation_earth, teff_k),
            Self::Regulated(regulated) => regulated.open_latitudes(insolation_earth, teff_k),
        }
    }

    /// The latitudes of [`WorldClimate::frozen_climate`].
    pub(crate) fn frozen_latitudes(
        &self,
        insolation_earth: f64,
        teff_k: f64,
        other_heat_w_m2: f64,
    ) -> Result<Vec<Latitude>, OutOfRange> {
        match self {
            Self::Held { table, .. } => table.frozen_latitudes(insolation_earth, teff_k, other_heat_w_m2),
            Self::Regulated(regulated) => regulated.frozen_latitudes(insolation_earth, teff_k, other_heat_w_m2),
        }
    }

    pub(crate) fn open_climate(&self, insolation_earth: f64, teff_k: f64) -> Result<AiredClimate, OutOfRange> {
        match self {
            Self::Held { table, carbon_dioxide_bar } => Ok(AiredClimate {
                climate: table.open_climate(insolation_earth, teff_k)?,
                carbon_dioxide_bar: *carbon_dioxide_bar,
            }),
            Self::Regulated(regulated) => regulated.open_climate(insolation_earth, teff_k),
        }
    }

    /// Mean temperature under ice, K, and carbon dioxide, bar.
    pub(crate) fn frozen_climate(
        &self,
        insolation_earth: f64,
        teff_k: f64,
        other_heat_w_m2: f64,
    ) -> Result<(f64, f64), OutOfRange> {
        match self {
            Self::Held { table, carbon_dioxide_bar } => {
                Ok((table.frozen_mean_k(insolation_earth, teff_k, other_heat_w_m2)?, *carbon_dioxide_bar))
            }
            Self::Regulated(regulated) => regulated.frozen_climate(insolation_earth, teff_k, other_heat_w_m2),
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn no_planet_under_thick_air_stays_frozen_at_much_light() {
        for obliquity_deg in [0.0, 45.0, 90.0] {
            for heat_transport_w_m2_k in [0.3, 3.0] {
                let air = WaterWorldAir { carbon_dioxide_bar: 3.0, obliquity_deg, heat_transport_w_m2_k };
                for teff_k in [2600.0, 4500.0, 7200.0] {
                    let limits = ClimateTable::new(&air).and_then(|table| table.limits(teff_k)).expect("in range");
                    let relative = limits.thaw_insolation_earth / runaway_insolation_earth(teff_k, 1.0);
                    assert!(relative < SURELY_THAWED_UNDER_THICK_AIR, "{air:?} {teff_k} {relative}");
                }
            }
        }
    }
}
