//! Shares of a blackbody's energy and photons in a band of wavelengths.

use super::planck::SECOND_RADIATION_M_K;
use super::range::{OutOfRange, temperature, wavelength};

/// Short end of the visible band, nm; shorter waves are counted as ultraviolet.
pub const VISIBLE_FROM_NM: f64 = 380.0;
/// Long end of the visible band, nm; longer waves are counted as infrared.
pub const VISIBLE_TO_NM: f64 = 780.0;

/// Shares of the radiated energy, which add up to one.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct BandShares {
    /// Below 380 nm.
    pub ultraviolet: f64,
    /// From 380 to 780 nm.
    pub visible: f64,
    /// Above 780 nm.
    pub infrared: f64,
}

/// What is counted: joules or photons.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
enum Counted {
    Energy,
    Photons,
}

/// 15/π⁴: one over the integral of x³/(eˣ−1).
const ENERGY_NORM: f64 = 0.153_989_733_820_265_03;
/// 1/(2ζ(3)): one over the integral of x²/(eˣ−1).
const PHOTON_NORM: f64 = 0.415_953_686_290_353_9;

/// Bₖ/k! for even k from 2, the coefficients of x/(eˣ−1) after 1 − x/2.
const BERNOULLI_OVER_FACTORIAL: [f64; 10] = [
    1.0 / 12.0,
    -1.0 / 720.0,
    1.0 / 30_240.0,
    -1.0 / 1_209_600.0,
    1.0 / 47_900_160.0,
    -691.0 / 1_307_674_368_000.0,
    1.0 / 74_724_249_600.0,
    -3617.0 / 10_670_622_842_880_000.0,
    43_867.0 / 5_109_094_217_170_944_000.0,
    -174_611.0 / 802_857_662_698_291_200_000.0,
];

/// Shares of ultraviolet, visible and infrared energy of a blackbody (cuts at 380 and 780 nm).
///
/// # Source
/// Integral of Planck's law as a series: Wiebelt (1966), Engineering Radiation Heat Transfer; cuts as CIE 15.
///
/// # Errors
/// [`OutOfRange`] for a temperature outside 1 to 10⁹ K.
///
/// # Example
/// ```
/// use longember::physics::light::band_shares;
/// let sun = band_shares(5772.0)?;
/// assert!((sun.visible - 0.4650).abs() < 1e-4);
/// # Ok::<(), longember::physics::light::OutOfRange>(())
/// ```
pub fn band_shares(temperature_k: f64) -> Result<BandShares, OutOfRange> {
    let short = split(VISIBLE_FROM_NM, temperature(temperature_k)?, Counted::Energy);
    let long = split(VISIBLE_TO_NM, temperature_k, Counted::Energy);
    Ok(BandShares { ultraviolet: short.below, visible: between(short, long), infrared: long.above })
}

/// Share of a blackbody's energy between two wavelengths.
///
/// # Source
/// As [`band_shares`].
///
/// # Errors
/// [`OutOfRange`] for a wavelength outside 0.001 to 10¹² nm, a temperature outside 1 to 10⁹ K or an
/// end below the start.
pub fn energy_share(from_nm: f64, to_nm: f64, temperature_k: f64) -> Result<f64, OutOfRange> {
    share(from_nm, to_nm, temperature_k, Counted::Energy)
}

/// Share of a blackbody's photons between two wavelengths.
///
/// # Source
/// As [`band_shares`], with x²/(eˣ−1) for the photon number.
///
/// # Errors
/// As [`energy_share`].
pub fn photon_share(from_nm: f64, to_nm: f64, temperature_k: f64) -> Result<f64, OutOfRange> {
    share(from_nm, to_nm, temperature_k, Counted::Photons)
}

fn share(from_nm: f64, to_nm: f64, temperature_k: f64, counted: Counted) -> Result<f64, OutOfRange> {
    temperature(temperature_k)?;
    wavelength(from_nm)?;
    wavelength(to_nm)?;
    if to_nm < from_nm {
        return Err(OutOfRange { what: "to_nm", value: to_nm, allowed: "at least from_nm" });
    }
    Ok(between(split(from_nm, temperature_k, counted), split(to_nm, temperature_k, counted)))
}

/// The two parts of a spectrum cut at one wavelength, each computed without cancellation where it is small.
#[derive(Clone, Copy)]
struct Split {
    below: f64,
    above: f64,
}

fn between(short: Split, long: Split) -> f64 {
    // Subtracting the smaller pair keeps the digits on either wing.
    if short.below < short.above { long.below - short.below } else { short.above - long.above }.max(0.0)
}

fn split(wavelength_nm: f64, temperature_k: f64, counted: Counted) -> Split {
    let z = SECOND_RADIATION_M_K / (wavelength_nm * 1e-9 * temperature_k);
    if z < 1.0 {
        let above = series_from_zero(z, counted);
        Split { below: 1.0 - above, above }
    } else {
        let below = series_to_infinity(z, counted);
        Split { below, above: 1.0 - below }
    }
}

/// Normalised integral from 0 to z: the waves longer than the cut, by the Bernoulli series (|z| < 2π).
fn series_from_zero(z: f64, counted: Counted) -> f64 {
    let (norm, lowest_power) = match counted {
        Counted::Energy => (ENERGY_NORM, 3.0),
        Counted::Photons => (PHOTON_NORM, 2.0),
    };
    let mut sum = 1.0 / lowest_power - z / (2.0 * (lowest_power + 1.0));
    let mut power = 1.0;
    for (index, coefficient) in BERNOULLI_OVER_FACTORIAL.iter().enumerate() {
        power *= z * z;
        sum += coefficient * power / (lowest_power + 2.0 * (index + 1) as f64);
    }
    norm * sum * if counted == Counted::Energy { z * z * z } else { z * z }
}

/// Normalised integral from z to infinity: the waves shorter than the cut, by the exponential series.
fn series_to_infinity(z: f64, counted: Counted) -> f64 {
    let step = (-z).exp();
    let mut weight = 1.0;
    let mut sum = 0.0;
    for index in 1..=48_u32 {
        weight *= step;
        let n = f64::from(index);
        let term = match counted {
            Counted::Energy => (z * z * z + 3.0 * z * z / n + 6.0 * z / (n * n) + 6.0 / (n * n * n)) / n,
            Counted::Photons => (z * z + 2.0 * z / n + 2.0 / (n * n)) / n,
        };
        sum += weight * term;
        if weight < 1e-19 {
            break;
        }
    }
    sum * if counted == Counted::Energy { ENERGY_NORM } else { PHOTON_NORM }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn both_series_meet_at_their_border() {
        for counted in [Counted::Energy, Counted::Photons] {
            for z in [0.6, 0.8, 1.0, 1.2] {
                let sum = series_from_zero(z, counted) + series_to_infinity(z, counted);
                let tolerance = if z < 1.0 { 1e-12 } else { 3e-14 };
                assert!((sum - 1.0).abs() < tolerance, "{z}: {sum}");
            }
        }
    }

    #[test]
    fn a_quarter_of_the_energy_lies_below_the_wien_peak() {
        // Classical: F(λ_peak) = 0.25005 whatever the temperature.
        let below = energy_share(1e-3, 2.897_771_955e6 / 4321.0, 4321.0).expect("in range");
        assert!((below - 0.250_05).abs() < 1e-5, "{below}");
    }

    #[test]
    fn a_reversed_band_is_refused() {
        assert!(energy_share(700.0, 400.0, 5772.0).is_err());
        assert_eq!(photon_share(500.0, 500.0, 5772.0), Ok(0.0));
    }
}
