//! The air over a planet's ground, as far as it makes a sky.

use crate::physics::light::{Atmosphere, Gas};

/// Clear air that scatters starlight. It is held fixed and does not warm the ground: that is the greenhouse's part.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Air {
    /// No air: the sky is black and the stars are out all day.
    None,
    /// Nitrogen and oxygen as on Earth.
    EarthLike {
        /// Pressure at the ground, bar.
        surface_pressure_bar: f64,
    },
    /// Carbon dioxide.
    CarbonDioxide {
        /// Pressure at the ground, bar.
        surface_pressure_bar: f64,
    },
}

/// Pressure of air that nothing else is said about, bar.
pub const USUAL_PRESSURE_BAR: f64 = 1.0;

impl Air {
    /// Each kind with its usual pressure.
    pub const KINDS: [Self; 3] = [
        Self::None,
        Self::EarthLike { surface_pressure_bar: USUAL_PRESSURE_BAR },
        Self::CarbonDioxide { surface_pressure_bar: USUAL_PRESSURE_BAR },
    ];

    /// Air of a gas, or none.
    #[must_use]
    pub fn new(gas: Gas, surface_pressure_bar: f64) -> Self {
        match gas {
            Gas::Air => Self::EarthLike { surface_pressure_bar },
            Gas::CarbonDioxide => Self::CarbonDioxide { surface_pressure_bar },
        }
    }

    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self.gas() {
            None => "none",
            Some(Gas::Air) => "earth_like",
            Some(Gas::CarbonDioxide) => "carbon_dioxide",
        }
    }

    /// Name for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        self.gas().map_or("no air", Gas::name)
    }

    /// The gas, if there is any.
    #[must_use]
    pub fn gas(self) -> Option<Gas> {
        match self {
            Self::None => None,
            Self::EarthLike { .. } => Some(Gas::Air),
            Self::CarbonDioxide { .. } => Some(Gas::CarbonDioxide),
        }
    }

    /// The pressure at the ground, bar, if there is air.
    #[must_use]
    pub fn surface_pressure_bar(self) -> Option<f64> {
        match self {
            Self::None => None,
            Self::EarthLike { surface_pressure_bar } | Self::CarbonDioxide { surface_pressure_bar } => {
                Some(surface_pressure_bar)
            }
        }
    }

    /// The same gas at another pressure; no air stays no air.
    #[must_use]
    pub fn at_pressure(self, surface_pressure_bar: f64) -> Self {
        self.gas().map_or(Self::None, |gas| Self::new(gas, surface_pressure_bar))
    }

    /// The air over ground of the usual grey albedo, under a gravity in m s⁻².
    #[must_use]
    pub fn atmosphere(self, surface_gravity_m_s2: f64) -> Option<Atmosphere> {
        Some(Atmosphere {
            gas: self.gas()?,
            surface_pressure_bar: self.surface_pressure_bar()?,
            surface_gravity_m_s2,
            ground_albedo: Atmosphere::EARTH.ground_albedo,
        })
    }
}

impl Default for Air {
    fn default() -> Self {
        Self::EarthLike { surface_pressure_bar: USUAL_PRESSURE_BAR }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_change_of_pressure_keeps_the_gas() {
        for air in Air::KINDS {
            let thick = air.at_pressure(90.0);
            assert_eq!(thick.key(), air.key());
            assert_eq!(thick.surface_pressure_bar(), air.gas().map(|_| 90.0));
            assert_eq!(thick.atmosphere(9.8).map(|atmosphere| atmosphere.gas), air.gas());
        }
    }
}
