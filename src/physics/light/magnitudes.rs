//! Magnitudes: bolometric, visual, absolute, apparent.

use super::range::{OutOfRange, within};
use crate::units::constants::{AU_M, BOLOMETRIC_ZERO_W, PARSEC_M, SOLAR_LUMINOSITY_W};
use std::f64::consts::PI;

/// Irradiance of apparent bolometric magnitude zero, W m⁻²: 2.518021…·10⁻⁸. IAU 2015 Resolution B2.
pub const BOLOMETRIC_ZERO_W_M2: f64 = BOLOMETRIC_ZERO_W / (4.0 * PI * 100.0 * PARSEC_M * PARSEC_M);

/// Illuminance of a star of visual magnitude zero, lx.
///
/// Chosen so that V = −26.74 for the Sun goes with 133 100 lx (ASTM G173 spectrum).
pub const MAGNITUDE_ZERO_LX: f64 = 2.68e-6;

/// Absolute bolometric magnitude, mag: −2.5 log₁₀(L / 3.0128·10²⁸ W).
///
/// # Source
/// IAU 2015 Resolution B2. The nominal Sun has 4.740.
///
/// # Errors
/// [`OutOfRange`] for a luminosity outside 10⁻³⁰ to 10³⁰ L☉.
pub fn absolute_bolometric_magnitude(luminosity_lsun: f64) -> Result<f64, OutOfRange> {
    let luminosity_lsun = within("luminosity_lsun", luminosity_lsun, 1e-30, 1e30, "1e-30 to 1e30 Lsun")?;
    Ok(-2.5 * (luminosity_lsun * SOLAR_LUMINOSITY_W / BOLOMETRIC_ZERO_W).log10())
}

/// Apparent bolometric magnitude, mag: −2.5 log₁₀(irradiance / 2.518·10⁻⁸ W m⁻²).
///
/// # Source
/// IAU 2015 Resolution B2. 1361 W m⁻² is −26.832.
///
/// # Errors
/// [`OutOfRange`] for an irradiance outside 10⁻⁶⁰ to 10⁶⁰ W m⁻².
pub fn apparent_bolometric_magnitude(irradiance_w_m2: f64) -> Result<f64, OutOfRange> {
    let irradiance_w_m2 = within("irradiance_w_m2", irradiance_w_m2, 1e-60, 1e60, "1e-60 to 1e60 W/m2")?;
    Ok(-2.5 * (irradiance_w_m2 / BOLOMETRIC_ZERO_W_M2).log10())
}

/// Absolute visual magnitude, mag: `M_V = M_bol − BC_V`.
///
/// # Errors
/// [`OutOfRange`] for a magnitude or correction outside −100 to 100.
pub fn absolute_visual_magnitude(
    absolute_bolometric_mag: f64,
    bolometric_correction_mag: f64,
) -> Result<f64, OutOfRange> {
    Ok(magnitude("absolute_bolometric_mag", absolute_bolometric_mag)?
        - magnitude("bolometric_correction_mag", bolometric_correction_mag)?)
}

/// Apparent magnitude at a distance, mag: m = M + 5 log₁₀(d / 10 pc), without extinction by dust.
///
/// # Errors
/// [`OutOfRange`] for a magnitude outside −100 to 100 or a distance outside 10⁻¹² to 10¹² pc.
///
/// # Example
/// ```
/// use longember::physics::light::apparent_magnitude;
/// assert_eq!(apparent_magnitude(4.83, 10.0), Ok(4.83));
/// ```
pub fn apparent_magnitude(absolute_mag: f64, distance_pc: f64) -> Result<f64, OutOfRange> {
    let distance_pc = within("distance_pc", distance_pc, 1e-12, 1e12, "1e-12 to 1e12 pc")?;
    Ok(magnitude("absolute_mag", absolute_mag)? + 5.0 * (distance_pc / 10.0).log10())
}

/// Apparent magnitude of a star from one of its planets, mag. One au is −31.572 mag of distance.
///
/// # Errors
/// As [`apparent_magnitude`].
pub fn apparent_magnitude_from_planet(absolute_mag: f64, distance_au: f64) -> Result<f64, OutOfRange> {
    let distance_au = within("distance_au", distance_au, 1e-6, 1e15, "1e-6 to 1e15 au")?;
    apparent_magnitude(absolute_mag, distance_au * (AU_M / PARSEC_M))
}

/// Illuminance from a star of a given visual magnitude, lx.
///
/// # Source
/// Zero point 2.68·10⁻⁶ lx from the Sun: V = −26.74 (Torres 2010, AJ 140, 1158: −26.76 ± 0.03) and 133 100 lx
/// (ASTM G173). Good to a few per cent; the effective wavelengths of V and V(λ) differ.
///
/// # Errors
/// [`OutOfRange`] for a magnitude outside −100 to 100.
pub fn illuminance_of_magnitude_lx(visual_mag: f64) -> Result<f64, OutOfRange> {
    Ok(MAGNITUDE_ZERO_LX * 10.0_f64.powf(-0.4 * magnitude("visual_mag", visual_mag)?))
}

fn magnitude(what: &'static str, value: f64) -> Result<f64, OutOfRange> {
    within(what, value, -100.0, 100.0, "-100 to 100 mag")
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_zero_points_are_the_resolutions() {
        // IAU 2015 Resolution B2 prints 2.518021002e-8 W m⁻², 4.74 and -26.832.
        assert!((BOLOMETRIC_ZERO_W_M2 / 2.518_021_002e-8 - 1.0).abs() < 1e-9);
        assert!((absolute_bolometric_magnitude(1.0).expect("in range") - 4.74).abs() < 1e-4);
        assert!((apparent_bolometric_magnitude(1361.0).expect("in range") + 26.832).abs() < 1e-3);
        assert!((apparent_magnitude_from_planet(0.0, 1.0).expect("in range") + 31.572_1).abs() < 1e-4);
    }

    #[test]
    fn a_dead_star_has_no_magnitude() {
        assert!(absolute_bolometric_magnitude(0.0).is_err());
        assert!(apparent_magnitude(f64::NAN, 10.0).is_err());
        assert!(apparent_magnitude(4.8, 0.0).is_err());
    }
}
