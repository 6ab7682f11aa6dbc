//! What keeps a planet from absolute zero when its star is gone: inner heat and the cosmic background.

use super::range::{OutOfRange, non_negative, within};
use crate::units::constants::{BOLTZMANN_J_K, PLANCK_J_S, STEFAN_BOLTZMANN_W_M2_K4};
use std::f64::consts::PI;

/// Temperature of the cosmic microwave background today, K. Fixsen 2009, `ApJ` 707, 916.
const CMB_TODAY_K: f64 = 2.7255;
/// Hubble constant, km s⁻¹ Mpc⁻¹, and dark-energy share of a flat universe. Planck Collaboration 2020, A&A 641, A6.
const HUBBLE_KM_S_MPC: f64 = 67.4;
const DARK_ENERGY_SHARE: f64 = 0.685;
/// Hubble time for 1 km s⁻¹ Mpc⁻¹, yr: one megaparsec over one kilometre per second.
const HUBBLE_TIME_UNIT_YR: f64 = 9.777_922_2e11;
/// Age of the universe at which a star like the Sun, 4.57 Gyr old today, was born, yr.
const DEFAULT_BIRTH_COSMIC_AGE_YR: f64 = 9.22e9;
/// Age at which the inner heat flow has the value given, yr: the Earth's age.
const HEAT_FLOW_REFERENCE_YR: f64 = 4.57e9;

/// The heat that does not come from the star.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct InnerHeat {
    /// Heat flow through the surface at an age of 4.57 Gyr, W m⁻². The Earth: 0.09.
    pub heat_flow_w_m2: f64,
    /// Time in which the heat flow falls by e, yr. Default 5 Gyr: our own choice, of the order of the
    /// half-lives of uranium and thorium. At least 0.5 Gyr, so that the heat at birth stays finite.
    pub decay_time_yr: f64,
    /// Age of the universe when the star was born, yr. Sets the cosmic background.
    pub birth_cosmic_age_yr: f64,
}

impl Default for InnerHeat {
    fn default() -> Self {
        Self { heat_flow_w_m2: 0.09, decay_time_yr: 5e9, birth_cosmic_age_yr: DEFAULT_BIRTH_COSMIC_AGE_YR }
    }
}

impl InnerHeat {
    /// Checks every field.
    ///
    /// # Errors
    /// [`OutOfRange`] naming the first field that cannot be used.
    pub fn check(&self) -> Result<(), OutOfRange> {
        within("heat_flow_w_m2", self.heat_flow_w_m2, 0.0, 1e4, "0 to 10 000 W/m2")?;
        within("decay_time_yr", self.decay_time_yr, 5e8, 1e15, "5e8 to 1e15 yr")?;
        within("birth_cosmic_age_yr", self.birth_cosmic_age_yr, 1e8, 1e15, "1e8 to 1e15 yr")?;
        Ok(())
    }

    /// The inner heat flow at an age, W m⁻²: F = F₀ exp(−(t − 4.57 Gyr)/τ), held at its value for t = 0 before.
    #[must_use]
    pub fn heat_flow_at_w_m2(&self, age_yr: f64) -> f64 {
        self.heat_flow_w_m2 * (-(age_yr.max(0.0) - HEAT_FLOW_REFERENCE_YR) / self.decay_time_yr).exp()
    }

    /// The temperature of a surface warmed by the star, from inside and by the sky, K:
    /// `T⁴ = T_star⁴ + F/σ + T_CMB⁴`.
    ///
    /// # Source
    /// Energy balance; [`background_temperature_k`] for the sky.
    /// # Valid for
    /// Any age. Tidal heating is not included.
    /// # Accuracy
    /// The Earth's inner heat alone sustains 35.5 K; its future decline is our own assumption.
    /// # Errors
    /// [`OutOfRange`] for a negative temperature, an age that is no number, or unusable fields.
    pub fn with_floor_k(&self, temperature_from_star_k: f64, age_yr: f64) -> Result<f64, OutOfRange> {
        self.check()?;
        let t_star = non_negative("temperature_from_star_k", temperature_from_star_k)?;
        let age = within("age_yr", age_yr, -1e12, 1e30, "-1e12 to 1e30 yr")?;
        let t_sky = background_temperature_k(self.birth_cosmic_age_yr + age.max(0.0));
        let from_inside = self.heat_flow_at_w_m2(age) / STEFAN_BOLTZMANN_W_M2_K4;
        // The root of tiny fourth powers underflows long before the horizon temperature is reached.
        Ok((t_star.powi(4) + from_inside + t_sky.powi(4)).powf(0.25).max(t_sky).max(t_star))
    }
}

/// The temperature of the cosmic microwave background at an age of the universe, K.
///
/// T = 2.7255 K / a(t) with the exact scale factor of a flat universe of matter and dark energy,
/// `a(t) = (Ω_m/Ω_Λ)^⅓ sinh^⅔(t/t_Λ)`, `t_Λ = 2/(3 H₀ √Ω_Λ)`. In the far future it falls by e every
/// 17.5 Gyr and ends at the temperature of the cosmic horizon, `ħ H_Λ/(2π k)` = 2.2 × 10⁻³⁰ K.
///
/// # Source
/// Planck Collaboration 2020, A&A 641, A6 (H₀, Ω); Fixsen 2009 (2.7255 K); Gibbons & Hawking 1977 (horizon).
/// # Valid for
/// 10⁸ yr onwards, if dark energy stays constant; ages below are answered with 10⁸ yr.
/// # Accuracy
/// 1 % over the past 13 Gyr, as good as constant dark energy afterwards.
#[must_use]
pub fn background_temperature_k(cosmic_age_yr: f64) -> f64 {
    let hubble_time_yr = HUBBLE_TIME_UNIT_YR / HUBBLE_KM_S_MPC;
    let t_lambda_yr = 2.0 / 3.0 * hubble_time_yr / DARK_ENERGY_SHARE.sqrt();
    let x = cosmic_age_yr.max(1e8) / t_lambda_yr;
    // ln sinh x, written so that it does not overflow for the ages that matter here.
    let ln_sinh = x + (0.5 * (1.0 - (-2.0 * x).exp())).ln();
    let ln_a = (((1.0 - DARK_ENERGY_SHARE) / DARK_ENERGY_SHARE).ln() + 2.0 * ln_sinh) / 3.0;
    CMB_TODAY_K * (-ln_a).exp() + horizon_temperature_k()
}

/// Temperature of the horizon of a universe that only dark energy fills, K.
fn horizon_temperature_k() -> f64 {
    let year_s = crate::units::constants::YEAR_S;
    let expansion_per_s = DARK_ENERGY_SHARE.sqrt() * HUBBLE_KM_S_MPC / (HUBBLE_TIME_UNIT_YR * year_s);
    PLANCK_J_S / (2.0 * PI) * expansion_per_s / (2.0 * PI * BOLTZMANN_J_K)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_background_has_its_present_value_and_fades_as_dark_energy_dictates() {
        assert!((background_temperature_k(13.79e9) - 2.7255).abs() < 0.01);
        let per_fold = background_temperature_k(200e9) / background_temperature_k(217.5e9);
        assert!((per_fold.ln() - 1.0).abs() < 0.01, "{per_fold}");
        assert!(background_temperature_k(1e14) > 1e-30);
        assert!(background_temperature_k(1e14) < 1e-29);
    }

    #[test]
    fn inner_heat_of_the_earth_alone_keeps_35_kelvin() {
        // 0.09 W/m2 over sigma, fourth root; the sky adds nothing visible.
        let alone_k = InnerHeat::default().with_floor_k(0.0, 4.57e9).expect("in range");
        assert!((alone_k - 35.5).abs() < 0.1, "{alone_k}");
    }

    #[test]
    fn the_floor_never_cools_and_never_reaches_zero() {
        let heat = InnerHeat::default();
        for age_yr in [0.0, 1e9, 1e11, 1e13, 1e15, 1e20] {
            for star_k in [0.0, 1e-3, 5.0, 254.0, 3000.0] {
                let warmed_k = heat.with_floor_k(star_k, age_yr).expect("in range");
                assert!(warmed_k >= star_k && warmed_k > 0.0 && warmed_k.is_finite());
            }
        }
        assert!(InnerHeat { heat_flow_w_m2: -1.0, ..heat }.with_floor_k(1.0, 0.0).is_err());
    }
}
