//! A star at one moment.

use super::phase::Phase;
use crate::units::constants::{SOLAR_GM_M3_S2, SOLAR_RADIUS_M, SOLAR_TEMPERATURE_K};

/// Everything the model knows of a star at one age.
///
/// A neutron star, a black hole and an empty place have no light here: their luminosity and temperature are zero. Their
/// radius is the object's own (12 km, the Schwarzschild radius, zero).
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct StarState {
    /// Age since the zero-age main sequence, yr.
    pub age_yr: f64,
    /// What the star is doing.
    pub phase: Phase,
    /// Mass, solar masses.
    pub mass_msun: f64,
    /// Bolometric luminosity, solar luminosities.
    pub luminosity_lsun: f64,
    /// Photospheric radius, solar radii.
    pub radius_rsun: f64,
    /// Effective temperature, K.
    pub effective_temperature_k: f64,
    /// Mass inside which all hydrogen is burnt, solar masses: zero on the main sequence, the whole star once the
    /// envelope is gone.
    pub core_mass_msun: f64,
    /// Rate at which the wind carries mass away, solar masses per year.
    pub mass_loss_msun_yr: f64,
    /// Mass fraction of hydrogen at the centre, an estimate; nothing once the star is a remnant.
    pub core_hydrogen_fraction: Option<f64>,
}

impl StarState {
    /// Mass outside the hydrogen-exhausted core, solar masses.
    #[must_use]
    pub fn envelope_mass_msun(&self) -> f64 {
        (self.mass_msun - self.core_mass_msun).max(0.0)
    }

    /// Surface gravity G M / R², m s⁻²; zero for a body without a surface.
    #[must_use]
    pub fn surface_gravity_m_s2(&self) -> f64 {
        if self.radius_rsun <= 0.0 || self.phase == Phase::BlackHole {
            return 0.0;
        }
        self.mass_msun * SOLAR_GM_M3_S2 / (self.radius_rsun * SOLAR_RADIUS_M).powi(2)
    }
}

/// Effective temperature T = 5772 K (L / R²)^(1/4) of a luminosity and radius in solar units, K.
#[must_use]
pub fn effective_temperature_k(luminosity_lsun: f64, radius_rsun: f64) -> f64 {
    if luminosity_lsun <= 0.0 || radius_rsun <= 0.0 {
        return 0.0;
    }
    SOLAR_TEMPERATURE_K * (luminosity_lsun.sqrt() / radius_rsun).sqrt()
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_star_with_the_sun_s_figures_has_its_temperature_and_gravity() {
        assert_eq!(effective_temperature_k(1.0, 1.0), SOLAR_TEMPERATURE_K);
        assert_eq!(effective_temperature_k(0.0, 0.0), 0.0);
        let sun = StarState {
            age_yr: 4.57e9,
            phase: Phase::MainSequence,
            mass_msun: 1.0,
            luminosity_lsun: 1.0,
            radius_rsun: 1.0,
            effective_temperature_k: SOLAR_TEMPERATURE_K,
            core_mass_msun: 0.0,
            mass_loss_msun_yr: 0.0,
            core_hydrogen_fraction: None,
        };
        assert!((sun.surface_gravity_m_s2() - 274.2).abs() < 0.1);
        assert_eq!(sun.envelope_mass_msun(), 1.0);
    }
}
