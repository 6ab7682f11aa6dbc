//! What a person may choose of a planet's climate and tides, and what it means to physics.

use super::limits::{self, Limit};
use crate::physics::planet::climate::ice_line_model::EARTH_HEAT_TRANSPORT_W_M2_K;
use crate::physics::planet::{CarbonCycle, Tides, WaterWorld, WaterWorldAir};

/// A rocky planet with surface water whose climate answers to the star by an energy balance of every latitude.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Water {
    /// What sets the carbon dioxide.
    pub carbon: Carbon,
    /// Water at the start, oceans of the Earth.
    pub water_oceans: f64,
    /// Tilt of the axis, degrees.
    pub obliquity_deg: f64,
    /// Heat carried by air and sea, W m⁻² K⁻¹.
    pub heat_transport_w_m2_k: f64,
    /// The planet starts frozen over where the starlight would allow either.
    pub starts_frozen: bool,
    /// Age of the star when the planet has its ocean, yr.
    pub ocean_after_yr: f64,
}

/// What sets the carbon dioxide of a planet with surface water.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Carbon {
    /// Rocks and volcanoes hold a mean temperature as long as they can.
    Regulated {
        /// The mean surface temperature that is held, K.
        mean_k: f64,
    },
    /// The pressure stays.
    Held {
        /// Partial pressure, bar.
        carbon_dioxide_bar: f64,
    },
}

impl Carbon {
    /// Each kind with its usual value: the Earth's.
    pub const KINDS: [Self; 2] = [Self::Regulated { mean_k: 288.0 }, Self::Held { carbon_dioxide_bar: 2.8e-4 }];

    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::Regulated { .. } => "regulated",
            Self::Held { .. } => "held",
        }
    }

    /// The kind in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Regulated { .. } => "rocks regulate",
            Self::Held { .. } => "held fixed",
        }
    }
}

impl Default for Water {
    fn default() -> Self {
        let usual = WaterWorld::default();
        Self {
            carbon: Carbon::KINDS[0],
            water_oceans: usual.water_oceans,
            obliquity_deg: usual.air.obliquity_deg,
            heat_transport_w_m2_k: EARTH_HEAT_TRANSPORT_W_M2_K,
            starts_frozen: usual.starts_frozen,
            ocean_after_yr: usual.ocean_after_yr,
        }
    }
}

impl Water {
    /// Every number with its limit.
    #[must_use]
    pub fn inputs(&self) -> [(&'static Limit, f64); 5] {
        let carbon = match self.carbon {
            Carbon::Regulated { mean_k } => (&limits::REGULATED_MEAN, mean_k),
            Carbon::Held { carbon_dioxide_bar } => (&limits::CARBON_DIOXIDE, carbon_dioxide_bar),
        };
        [
            carbon,
            (&limits::WATER, self.water_oceans),
            (&limits::OBLIQUITY, self.obliquity_deg),
            (&limits::HEAT_TRANSPORT, self.heat_transport_w_m2_k),
            (&limits::OCEAN_AFTER, self.ocean_after_yr),
        ]
    }

    /// The planet as the climate model takes it.
    #[must_use]
    pub fn world(&self) -> WaterWorld {
        let usual = WaterWorldAir::default();
        let (carbon, carbon_dioxide_bar) = match self.carbon {
            Carbon::Regulated { mean_k } => (CarbonCycle::Regulated { mean_k }, usual.carbon_dioxide_bar),
            Carbon::Held { carbon_dioxide_bar } => (CarbonCycle::Held, carbon_dioxide_bar),
        };
        WaterWorld {
            air: WaterWorldAir {
                carbon_dioxide_bar,
                obliquity_deg: self.obliquity_deg,
                heat_transport_w_m2_k: self.heat_transport_w_m2_k,
            },
            carbon,
            water_oceans: self.water_oceans,
            starts_frozen: self.starts_frozen,
            ocean_after_yr: self.ocean_after_yr,
        }
    }
}

/// Whether tides change a planet's orbit.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
pub enum TidesChoice {
    /// Tides act, with usual dissipation for the planet's mass.
    #[default]
    On,
    /// No tide acts.
    Off,
}

impl TidesChoice {
    /// Each choice.
    pub const ALL: [Self; 2] = [Self::On, Self::Off];

    /// The choice in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::On => "act on the orbit",
            Self::Off => "left out",
        }
    }

    /// The tides of a planet of this mass.
    #[must_use]
    pub fn tides(self, planet_mass_mearth: f64) -> Tides {
        match self {
            Self::On => Tides::usual(planet_mass_mearth),
            Self::Off => Tides::off(),
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_usual_water_is_that_of_the_climate_model() {
        assert_eq!(Water::default().world(), WaterWorld::default());
        for (limit, value) in Water::default().inputs() {
            assert_eq!(limit.check(value), Ok(value), "{}", limit.key);
        }
    }

    #[test]
    fn every_limit_can_be_walked() {
        for at in [|limit: &Limit| limit.lowest, |limit: &Limit| limit.highest] {
            let water = Water {
                carbon: Carbon::Held { carbon_dioxide_bar: at(&limits::CARBON_DIOXIDE) },
                water_oceans: at(&limits::WATER),
                obliquity_deg: at(&limits::OBLIQUITY),
                heat_transport_w_m2_k: at(&limits::HEAT_TRANSPORT),
                starts_frozen: true,
                ocean_after_yr: at(&limits::OCEAN_AFTER),
            };
            assert_eq!(water.world().air.check(), Ok(()));
            let mean_k = at(&limits::REGULATED_MEAN);
            assert_eq!(CarbonCycle::Regulated { mean_k }.check(), Ok(()));
        }
    }
}
