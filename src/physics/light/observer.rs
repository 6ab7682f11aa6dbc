//! What the standard observer sees: tristimulus values of a spectrum or of a blackbody.

use super::chromaticity::Tristimulus;
use super::observer_table::{OBSERVER, OBSERVER_FROM_NM, OBSERVER_ROWS, OBSERVER_STEP_NM};
use super::occupation::occupations;
use super::planck::{FIRST_RADIATION_W_M2, SECOND_RADIATION_M_K};
use super::range::{OutOfRange, temperature};

/// Maximum luminous efficacy of radiation, lm W⁻¹.
///
/// The SI fixes 683 lm/W at 540 THz; the value at 555 nm in standard air is 683.002, which the CIE rounds to 683.
pub const MAXIMUM_EFFICACY_LM_W: f64 = 683.0;

/// The wavelengths of the observer's table, nm: 360, 365 … 830.
pub fn observer_wavelengths_nm() -> impl Iterator<Item = f64> {
    (0..OBSERVER_ROWS).map(|row| OBSERVER_FROM_NM + OBSERVER_STEP_NM * row as f64)
}

/// Tristimulus values of a spectrum given per nanometre.
///
/// X, Y, Z = 683 lm/W Σ S(λ) (x̄, ȳ, z̄)(λ) · 5 nm over 360 to 830 nm. With S in W m⁻² nm⁻¹ (a flux density)
/// Y is an illuminance or luminous exitance in lm m⁻²; with S in W m⁻² sr⁻¹ nm⁻¹ it is a luminance in cd m⁻².
///
/// # Source
/// CIE 15:2018, section 7 (summation in steps of 5 nm).
///
/// # Valid for
/// Spectra smooth over 5 nm; for a blackbody the sum is within 4·10⁻⁶ in x, y of the 1 nm one.
#[must_use]
pub fn tristimulus(spectrum_per_nm: impl Fn(f64) -> f64) -> Tristimulus {
    let mut sum = [0.0; 3];
    for (row, wavelength_nm) in OBSERVER.iter().zip(observer_wavelengths_nm()) {
        let power = spectrum_per_nm(wavelength_nm);
        for (total, response) in sum.iter_mut().zip(row) {
            *total += power * response;
        }
    }
    let [x, y, z] = sum.map(|total| total * MAXIMUM_EFFICACY_LM_W * OBSERVER_STEP_NM);
    Tristimulus { x, y, z }
}

/// Tristimulus values of a blackbody's surface; Y is its luminous exitance, lm m⁻².
///
/// # Source
/// Planck's law and [`tristimulus`].
///
/// # Valid for
/// 1 to 10⁹ K. Below about 25 K the answer underflows to zero light.
///
/// # Errors
/// [`OutOfRange`] for a temperature outside 1 to 10⁹ K.
pub fn blackbody_tristimulus(temperature_k: f64) -> Result<Tristimulus, OutOfRange> {
    Ok(blackbody_unchecked(temperature(temperature_k)?))
}

/// The table with everything multiplied in that does not depend on temperature.
pub(super) struct Prepared {
    /// c₂/λ, K.
    pub(super) exponents_k: [f64; OBSERVER_ROWS],
    /// 683 c₁ λ⁻⁵ (x̄, ȳ, z̄) · 5 nm.
    pub(super) weights: [[f64; 3]; OBSERVER_ROWS],
}

pub(super) static PREPARED: Prepared = prepared();

const fn prepared() -> Prepared {
    let mut table = Prepared { exponents_k: [0.0; OBSERVER_ROWS], weights: [[0.0; 3]; OBSERVER_ROWS] };
    let mut row = 0;
    while row < OBSERVER_ROWS {
        let wavelength_m = (OBSERVER_FROM_NM + OBSERVER_STEP_NM * row as f64) * 1e-9;
        let squared_m2 = wavelength_m * wavelength_m;
        let weight = MAXIMUM_EFFICACY_LM_W * FIRST_RADIATION_W_M2 / (squared_m2 * squared_m2 * wavelength_m)
            * OBSERVER_STEP_NM
            * 1e-9;
        let [x, y, z] = OBSERVER[row];
        table.exponents_k[row] = SECOND_RADIATION_M_K / wavelength_m;
        table.weights[row] = [weight * x, weight * y, weight * z];
        row += 1;
    }
    table
}

/// [`blackbody_tristimulus`] for a temperature known to be in range.
pub(crate) fn blackbody_unchecked(temperature_k: f64) -> Tristimulus {
    let (mut x, mut y, mut z) = (0.0, 0.0, 0.0);
    let occupations = occupations(&PREPARED.exponents_k, temperature_k);
    for (occupation, weights) in occupations.iter().zip(&PREPARED.weights) {
        x += weights[0] * occupation;
        y += weights[1] * occupation;
        z += weights[2] * occupation;
    }
    Tristimulus { x, y, z }
}

/// [`blackbody_unchecked`] with its derivative by temperature (per kelvin).
pub(crate) fn blackbody_with_slope(temperature_k: f64) -> (Tristimulus, Tristimulus) {
    let mut value = [0.0; 3];
    let mut slope = [0.0; 3];
    let occupations = occupations(&PREPARED.exponents_k, temperature_k);
    for ((occupation, weights), exponent_k) in occupations.iter().zip(&PREPARED.weights).zip(&PREPARED.exponents_k) {
        let by_kelvin = occupation * (1.0 + occupation) * exponent_k / (temperature_k * temperature_k);
        for channel in 0..3 {
            value[channel] += weights[channel] * occupation;
            slope[channel] += weights[channel] * by_kelvin;
        }
    }
    let pack = |[x, y, z]: [f64; 3]| Tristimulus { x, y, z };
    (pack(value), pack(slope))
}

#[cfg(test)]
mod tests {
    use super::super::planck::exitance_unchecked_w_m2_nm;
    use super::*;

    #[test]
    fn the_prepared_rows_give_what_the_plain_sum_gives() {
        for temperature_k in [300.0, 1000.0, 5772.0, 2e5, 1e9] {
            let fast = blackbody_unchecked(temperature_k);
            let plain = tristimulus(|wavelength_nm| exitance_unchecked_w_m2_nm(wavelength_nm, temperature_k));
            for (one, other) in [(fast.x, plain.x), (fast.y, plain.y), (fast.z, plain.z)] {
                assert!((one / other - 1.0).abs() < 1e-12, "{temperature_k}: {one} {other}");
            }
        }
    }

    #[test]
    fn the_slope_is_the_difference_quotient() {
        let (value, slope) = blackbody_with_slope(4000.0);
        let (low, high) = (blackbody_unchecked(3999.0), blackbody_unchecked(4001.0));
        assert!((slope.y / ((high.y - low.y) / 2.0) - 1.0).abs() < 1e-5);
        assert_eq!(value, blackbody_unchecked(4000.0));
    }

    #[test]
    fn an_equal_energy_spectrum_is_the_point_one_third() {
        let white = tristimulus(|_| 1.0).chromaticity().expect("light");
        assert!((white.x - 1.0 / 3.0).abs() < 5e-5 && (white.y - 1.0 / 3.0).abs() < 5e-5, "{white:?}");
    }
}
