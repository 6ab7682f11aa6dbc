//! What ice and open surfaces reflect of a star's light, by the star's colour.

use super::super::habitable_zone::runaway_insolation_earth;
use super::super::range::{OutOfRange, positive};
use std::f64::consts::PI;

/// Reflectivity of ice and snow below 0.7, between 0.7 and 1.4, and above 1.4 µm (our own choice, see below).
const ICE_BANDS: [f64; 3] = [0.75, 0.50, 0.10];
/// Temperature of the Sun, for which the open surface was calibrated, K.
const SUN_K: f64 = 5772.0;
/// Second radiation constant hc/k, µm K.
const SECOND_RADIATION_UM_K: f64 = 14_387.768_775;
const COOLEST_STAR_K: f64 = 2600.0;
const HOTTEST_STAR_K: f64 = 7200.0;

/// Temperature where half the surface is ice, K, and the width of the change, K.
const HALF_ICE_K: f64 = 263.15;
pub(crate) const ICE_WIDTH_K: f64 = 2.0;
/// Distance from the change, in half widths, beyond which less than 10⁻¹¹ of the surface is in doubt.
const SURE_ICE: f64 = 26.0;
/// Albedo of an open surface under the Sun: mean, and change towards the poles with (3 sin²φ − 1)/2.
/// The mean is fitted so that the Earth has 288.0 K and its ice line at 72°.
const OPEN_MEAN: f64 = 0.31002;
const OPEN_POLEWARD: f64 = 0.078;
/// Largest share of light that an open surface may absorb.
const MOST_ABSORBED: f64 = 0.98;

/// The share of a black body's light below a wavelength, dimensionless:
/// `15/π⁴ Σ e^(−nx)/n (x³ + 3x²/n + 6x/n² + 6/n³)`, x = hc/λkT.
///
/// # Source
/// Planck's law integrated term by term (Chang & Rhee 1984).
/// # Errors
/// [`OutOfRange`] for values that are not positive.
pub fn black_body_share_below(wavelength_um: f64, temperature_k: f64) -> Result<f64, OutOfRange> {
    let lt = positive("wavelength_um", wavelength_um)? * positive("temperature_k", temperature_k)?;
    Ok(share_below(SECOND_RADIATION_UM_K / lt))
}

fn share_below(x: f64) -> f64 {
    if x > 700.0 {
        return 0.0;
    }
    if x < 1e-3 {
        // The series converges too slowly here; the long-wave tail left out is x³/3 to first order.
        return (1.0 - 15.0 / PI.powi(4) * x.powi(3) / 3.0).clamp(0.0, 1.0);
    }
    let mut sum = 0.0;
    let mut n = 1.0;
    loop {
        let term = (-n * x).exp() / n * (x * x * x + 3.0 * x * x / n + 6.0 * x / (n * n) + 6.0 / (n * n * n));
        sum += term;
        if term < 1e-13 * sum || n > 4000.0 {
            break;
        }
        n += 1.0;
    }
    (15.0 / PI.powi(4) * sum).min(1.0)
}

/// The albedo of ice and snow under a star's light, dimensionless: 0.75, 0.50 and 0.10 below 0.7, up to 1.4 and
/// above 1.4 µm, weighted by a black body's light. Held outside 2600 to 7200 K.
///
/// # Source
/// Bands: our own choice, made so that the Sun's light gives 0.57; the trend with colour follows Joshi & Haberle
/// 2012 and Shields et al. 2013.
/// # Accuracy
/// The thaw of a frozen planet moves from 1.0 to 1.7 times the Earth's sunlight as this goes from 0.50 to 0.70.
/// # Errors
/// [`OutOfRange`] for a temperature that is not positive.
pub fn ice_albedo(effective_temperature_k: f64) -> Result<f64, OutOfRange> {
    Ok(ice_albedo_of(positive("effective_temperature_k", effective_temperature_k)?))
}

fn ice_albedo_of(teff_k: f64) -> f64 {
    let teff_k = teff_k.clamp(COOLEST_STAR_K, HOTTEST_STAR_K);
    let blue = share_below(SECOND_RADIATION_UM_K / (0.7 * teff_k));
    let red = share_below(SECOND_RADIATION_UM_K / (1.4 * teff_k));
    ICE_BANDS[0] * blue + ICE_BANDS[1] * (red - blue) + ICE_BANDS[2] * (1.0 - red)
}

/// How much more of a star's light an open, wet surface absorbs than of the Sun's, dimensionless.
///
/// The ratio of the runaway limits, `S_RG(5772 K)/S_RG(T★)`: 1.21 at 2600 K, 0.91 at 6600 K.
///
/// # Source
/// Kopparapu et al. 2014, whose limits differ between stars for this reason alone.
/// # Errors
/// [`OutOfRange`] for a temperature that is not positive.
pub fn open_surface_gain(effective_temperature_k: f64) -> Result<f64, OutOfRange> {
    Ok(gain_of(positive("effective_temperature_k", effective_temperature_k)?))
}

fn gain_of(teff_k: f64) -> f64 {
    runaway_insolation_earth(SUN_K, 1.0) / runaway_insolation_earth(teff_k, 1.0)
}

/// The reflection of one latitude under one star's light: open surface, ice, and the change between them.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(crate) struct Reflection {
    gain: f64,
    pub(crate) ice: f64,
}

impl Reflection {
    pub(crate) fn new(teff_k: f64) -> Self {
        Self { gain: gain_of(teff_k), ice: ice_albedo_of(teff_k) }
    }

    /// Albedo of the open surface at the sine of a latitude.
    pub(crate) fn open(&self, sine: f64) -> f64 {
        let absorbed = self.gain * (1.0 - (OPEN_MEAN + OPEN_POLEWARD * 0.5 * (3.0 * sine * sine - 1.0)));
        1.0 - absorbed.min(MOST_ABSORBED)
    }
}

/// The share of a surface that is ice at a temperature, and its slope, K⁻¹, for a width of the change, K.
#[inline]
pub(crate) fn ice_share(t: f64, width_k: f64) -> (f64, f64) {
    // (1 − tanh y)/2 = 1/(1 + e^(2y)); the logistic form needs one exponential.
    let y = 2.0 * (t - HALF_ICE_K) / width_k;
    if y.abs() > SURE_ICE {
        return (if y > 0.0 { 0.0 } else { 1.0 }, 0.0);
    }
    let share = 1.0 / (1.0 + y.exp());
    (share, -2.0 / width_k * share * (1.0 - share))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn black_body_shares_match_the_textbook_table() {
        // Textbook table of the black-body fractional function: λT = 2898 µm K 0.2501, 5000 0.6337, 10 000 0.9142.
        for (product, share) in [(2897.77, 0.2501), (5000.0, 0.6337), (10_000.0, 0.9142), (100_000.0, 0.9999)] {
            assert!((black_body_share_below(1.0, product).expect("in range") - share).abs() < 2e-4, "{product}");
        }
        let near = share_below(0.999e-3) - share_below(1.001e-3);
        assert!(near.abs() < 1e-9);
    }

    #[test]
    fn ice_reflects_less_of_redder_light() {
        // Computed independently from the same bands.
        for (teff_k, albedo) in [(6600.0, 0.604), (5772.0, 0.566), (4500.0, 0.481), (3400.0, 0.375), (2600.0, 0.275)] {
            assert!((ice_albedo(teff_k).expect("in range") - albedo).abs() < 1e-3, "{teff_k}");
        }
    }

    #[test]
    fn half_the_surface_is_ice_at_minus_ten_degrees() {
        assert!((ice_share(263.15, ICE_WIDTH_K).0 - 0.5).abs() < 1e-15);
        let slope = (ice_share(264.0, ICE_WIDTH_K).0 - ice_share(263.9, ICE_WIDTH_K).0) / 0.1;
        assert!((slope - ice_share(263.95, ICE_WIDTH_K).1).abs() < 1e-3);
    }
}
