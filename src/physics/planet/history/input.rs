//! What has to be known of a planet before its history can be walked.

use super::super::climate::{CarbonCycle, WaterWorldAir};
use super::super::deep_time::InnerHeat;
use super::super::greenhouse::Greenhouse;
use super::super::irradiation::{Redistribution, checked_emissivity};
use super::super::orbit_history::OrbitInput;
use super::super::range::{OutOfRange, fraction, within};
use super::super::tides::{Spin, Tides};

/// A rocky planet whose surface water answers to the star: ice, open water, steam, loss.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct WaterWorld {
    /// Air and tilt of the axis.
    pub air: WaterWorldAir,
    /// What sets the carbon dioxide; `air.carbon_dioxide_bar` counts where it is held.
    pub carbon: CarbonCycle,
    /// Water at the start, in oceans of the Earth (1.4 × 10²¹ kg).
    pub water_oceans: f64,
    /// The planet starts frozen over where the starlight would allow either.
    pub starts_frozen: bool,
    /// Time after the star's birth when the planet has its ocean, yr; climate and loss of water begin then.
    pub ocean_after_yr: f64,
}

impl Default for WaterWorld {
    fn default() -> Self {
        // Rocky planets are put together within 30 to 100 Myr (recalled); the early end is our own choice.
        Self {
            air: WaterWorldAir::default(),
            carbon: CarbonCycle::default(),
            water_oceans: 1.0,
            starts_frozen: false,
            ocean_after_yr: 3e7,
        }
    }
}

/// A planet at the first node of its star's track.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct PlanetInput {
    /// Orbit, mass and radius.
    pub orbit: OrbitInput,
    /// Share of the starlight reflected, for the equilibrium temperature.
    pub bond_albedo: f64,
    /// Infrared emissivity, dimensionless, 0.01 to 1.
    pub emissivity: f64,
    /// How the absorbed light spreads.
    pub redistribution: Redistribution,
    /// Greenhouse of a planet without the climate model, or of one that has lost its water.
    pub greenhouse: Greenhouse,
    /// Heat from inside and the age of the universe at birth.
    pub inner_heat: InnerHeat,
    /// The climate model, for rocky planets with surface water.
    pub water: Option<WaterWorld>,
    /// Rotation, for tidal locking.
    pub spin: Spin,
    /// Tides on the orbit.
    pub tides: Tides,
    /// Share of the high-energy light that lifts gas, dimensionless.
    pub escape_efficiency: f64,
}

impl PlanetInput {
    /// A planet on an orbit with usual values for all the rest: the Earth's albedo, no greenhouse, no water.
    #[must_use]
    pub fn usual(orbit: OrbitInput) -> Self {
        Self {
            orbit,
            bond_albedo: 0.306,
            emissivity: 1.0,
            redistribution: Redistribution::WholePlanet,
            greenhouse: Greenhouse::None,
            inner_heat: InnerHeat::default(),
            water: None,
            spin: Spin::usual(orbit.mass_mearth),
            tides: Tides::usual(orbit.mass_mearth),
            escape_efficiency: super::super::escape::USUAL_EFFICIENCY,
        }
    }

    /// Checks every field.
    ///
    /// # Errors
    /// [`OutOfRange`] naming the first field that cannot be used.
    pub fn check(&self) -> Result<(), OutOfRange> {
        self.orbit.check()?;
        fraction("bond_albedo", self.bond_albedo)?;
        checked_emissivity(self.emissivity)?;
        self.greenhouse.check()?;
        self.inner_heat.check()?;
        self.spin.check()?;
        self.tides.check()?;
        fraction("escape_efficiency", self.escape_efficiency)?;
        if let Some(water) = &self.water {
            water.air.check()?;
            water.carbon.check()?;
            within("ocean_after_yr", water.ocean_after_yr, 0.0, 1e12, "0 to 1e12 yr")?;
            within("water_oceans", water.water_oceans, 0.0, 1e4, "0 to 10 000 oceans")?;
        }
        Ok(())
    }
}
