//! How bright a star's light is to the eye: luminance, efficacy, illuminance, luminous flux.

use super::observer::blackbody_unchecked;
use super::range::{OutOfRange, amount, temperature};
use crate::units::constants::{SOLAR_LUMINOSITY_W, STEFAN_BOLTZMANN_W_M2_K4};
use std::f64::consts::PI;

/// Illuminance of the real Sun at 1 au above the air, lx.
///
/// A blackbody of 5772 K gives 125 300 lx, 6 % less, because the real spectrum holds less infrared.
///
/// # Source
/// Extraterrestrial spectrum of ASTM G173-03 weighted with the CIE 1931 observer.
pub const SUN_ILLUMINANCE_LX: f64 = 133_100.0;

/// Luminous exitance of a blackbody, lm m⁻².
///
/// # Source
/// Planck's law weighted with V(λ) (CIE 1924), 683 lm/W.
///
/// # Errors
/// [`OutOfRange`] for a temperature outside 1 to 10⁹ K.
pub fn luminous_exitance_lm_m2(temperature_k: f64) -> Result<f64, OutOfRange> {
    Ok(blackbody_unchecked(temperature(temperature_k)?).y)
}

/// Luminance of a blackbody's surface, cd m⁻²: luminous exitance over π (Lambert).
///
/// It belongs to each patch of the surface: a red giant is dim per area, however luminous it is.
///
/// # Source
/// As [`luminous_exitance_lm_m2`].
///
/// # Errors
/// [`OutOfRange`] for a temperature outside 1 to 10⁹ K.
pub fn luminance_cd_m2(temperature_k: f64) -> Result<f64, OutOfRange> {
    Ok(luminous_exitance_lm_m2(temperature_k)? / PI)
}

/// Luminous efficacy of a blackbody's radiation, lm W⁻¹: luminous exitance over σT⁴.
///
/// # Source
/// As [`luminous_exitance_lm_m2`]. The largest value is 95.4 lm/W near 6630 K.
///
/// # Errors
/// [`OutOfRange`] for a temperature outside 1 to 10⁹ K.
///
/// # Example
/// ```
/// use longember::physics::light::luminous_efficacy_lm_w;
/// assert!((luminous_efficacy_lm_w(5772.0)? - 92.03).abs() < 0.01);
/// # Ok::<(), longember::physics::light::OutOfRange>(())
/// ```
pub fn luminous_efficacy_lm_w(temperature_k: f64) -> Result<f64, OutOfRange> {
    Ok(luminous_exitance_lm_m2(temperature_k)? / (STEFAN_BOLTZMANN_W_M2_K4 * temperature_k.powi(4)))
}

/// Illuminance, lx, that goes with an irradiance from a blackbody.
///
/// # Source
/// Irradiance times [`luminous_efficacy_lm_w`].
///
/// # Valid for
/// Light that reaches the place unfiltered; for a Sun-like star the real spectrum gives 6 % more.
///
/// # Errors
/// [`OutOfRange`] for a temperature outside 1 to 10⁹ K or an irradiance outside 0 to 10⁶⁰ W m⁻².
pub fn illuminance_lx(irradiance_w_m2: f64, temperature_k: f64) -> Result<f64, OutOfRange> {
    Ok(amount("irradiance_w_m2", irradiance_w_m2)? * luminous_efficacy_lm_w(temperature_k)?)
}

/// Luminous flux of a whole star, lm.
///
/// # Source
/// Luminosity times [`luminous_efficacy_lm_w`].
///
/// # Errors
/// [`OutOfRange`] for a temperature outside 1 to 10⁹ K or a luminosity outside 0 to 10⁶⁰ L☉.
pub fn luminous_flux_lm(luminosity_lsun: f64, temperature_k: f64) -> Result<f64, OutOfRange> {
    Ok(amount("luminosity_lsun", luminosity_lsun)? * SOLAR_LUMINOSITY_W * luminous_efficacy_lm_w(temperature_k)?)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_sun_lights_the_earth() {
        let lux = illuminance_lx(1361.0, 5772.0).expect("in range");
        assert!((lux / 125_250.0 - 1.0).abs() < 1e-3, "{lux}");
        assert!((SUN_ILLUMINANCE_LX / lux - 1.063).abs() < 2e-3);
    }

    #[test]
    fn darkness_is_zero_and_nonsense_an_error() {
        assert_eq!(luminance_cd_m2(3.0), Ok(0.0));
        assert!(illuminance_lx(-1.0, 5772.0).is_err());
        assert!(luminous_flux_lm(1.0, f64::NAN).is_err());
    }
}
