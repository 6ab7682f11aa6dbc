//! Planck's law by wavelength, in energy and in photons, and Wien's displacement.

use super::range::{OutOfRange, temperature, wavelength, within};
use crate::units::constants::{
    BOLTZMANN_J_K, LIGHT_SPEED_M_S, PLANCK_J_S, STEFAN_BOLTZMANN_W_M2_K4, WIEN_HZ_K, WIEN_M_K,
};
use std::f64::consts::PI;

/// First radiation constant c₁ = 2πhc², W m². Exact combination of SI constants, to f64.
pub const FIRST_RADIATION_W_M2: f64 = 2.0 * PI * PLANCK_J_S * LIGHT_SPEED_M_S * LIGHT_SPEED_M_S;
/// Second radiation constant c₂ = hc/k, m K. Exact combination of SI constants, to f64.
pub const SECOND_RADIATION_M_K: f64 = PLANCK_J_S * LIGHT_SPEED_M_S / BOLTZMANN_J_K;

/// Exponent beyond which a spectrum is reported as zero: e⁷⁰⁰ is close to the largest f64.
pub(crate) const LARGEST_EXPONENT: f64 = 700.0;

/// Spectral radiance of a blackbody at one wavelength, W m⁻² sr⁻¹ nm⁻¹.
///
/// B(λ) = (c₁/π) λ⁻⁵ / (exp(c₂/λT) − 1), with `exp_m1` so that the Rayleigh–Jeans side keeps its digits.
///
/// # Source
/// Planck (1901), Annalen der Physik 309, 553; constants SI 2019.
///
/// # Valid for
/// Vacuum wavelengths. Where c₂/λT exceeds 700 the answer is 0 (it would be below 10⁻²⁸⁰).
///
/// # Errors
/// [`OutOfRange`] for a wavelength outside 0.001 to 10¹² nm or a temperature outside 1 to 10⁹ K.
///
/// # Example
/// ```
/// use longember::physics::light::spectral_radiance_w_m2_sr_nm;
/// let at_500_nm = spectral_radiance_w_m2_sr_nm(500.0, 5772.0)?;
/// assert!((at_500_nm / 26_240.0 - 1.0).abs() < 1e-3);
/// # Ok::<(), longember::physics::light::OutOfRange>(())
/// ```
pub fn spectral_radiance_w_m2_sr_nm(wavelength_nm: f64, temperature_k: f64) -> Result<f64, OutOfRange> {
    Ok(spectral_exitance_w_m2_nm(wavelength_nm, temperature_k)? / PI)
}

/// Spectral exitance of a blackbody, W m⁻² nm⁻¹: π times the radiance.
///
/// # Source
/// As [`spectral_radiance_w_m2_sr_nm`]; a blackbody radiates equally into all directions (Lambert), hence π.
///
/// # Errors
/// As [`spectral_radiance_w_m2_sr_nm`].
pub fn spectral_exitance_w_m2_nm(wavelength_nm: f64, temperature_k: f64) -> Result<f64, OutOfRange> {
    Ok(exitance_unchecked_w_m2_nm(wavelength(wavelength_nm)?, temperature(temperature_k)?))
}

/// Photon spectral radiance of a blackbody, photons s⁻¹ m⁻² sr⁻¹ nm⁻¹.
///
/// The energy radiance divided by the energy hc/λ of one photon.
///
/// # Source
/// As [`spectral_radiance_w_m2_sr_nm`].
///
/// # Errors
/// As [`spectral_radiance_w_m2_sr_nm`].
pub fn photon_radiance_per_s_m2_sr_nm(wavelength_nm: f64, temperature_k: f64) -> Result<f64, OutOfRange> {
    Ok(spectral_radiance_w_m2_sr_nm(wavelength_nm, temperature_k)? / photon_energy_j(wavelength_nm)?)
}

/// Energy of one photon, J: hc/λ.
///
/// # Errors
/// [`OutOfRange`] for a wavelength outside 0.001 to 10¹² nm.
pub fn photon_energy_j(wavelength_nm: f64) -> Result<f64, OutOfRange> {
    Ok(PLANCK_J_S * LIGHT_SPEED_M_S / (wavelength(wavelength_nm)? * 1e-9))
}

/// Wavelength of the peak of the spectrum per unit wavelength, nm: b/T.
///
/// # Source
/// Wien's displacement law; b exact in SI 2019 to f64 (CODATA 2022).
///
/// # Errors
/// [`OutOfRange`] for a temperature outside 1 to 10⁹ K.
pub fn wien_peak_nm(temperature_k: f64) -> Result<f64, OutOfRange> {
    Ok(WIEN_M_K / temperature(temperature_k)? * 1e9)
}

/// Frequency of the peak of the spectrum per unit frequency, THz: b′T.
///
/// It is not the frequency of the peak per unit wavelength: equal steps of frequency are unequal steps of wavelength, and
/// this peak lies at a wavelength 1.76 times as long.
///
/// # Source
/// Wien's displacement law; b′ exact in SI 2019 to f64 (CODATA 2022).
///
/// # Errors
/// [`OutOfRange`] for a temperature outside 1 to 10⁹ K.
pub fn wien_peak_thz(temperature_k: f64) -> Result<f64, OutOfRange> {
    Ok(WIEN_HZ_K * temperature(temperature_k)? * 1e-12)
}

/// Wavelength of the peak of the photon spectrum per unit wavelength, nm: c₂/(xT) with x = 4 (1 − e⁻ˣ).
///
/// # Source
/// Maximum of the photon radiance, whose condition has the root x = 3.920 690 394 872 886.
///
/// # Errors
/// [`OutOfRange`] for a temperature outside 1 to 10⁹ K.
pub fn photon_peak_nm(temperature_k: f64) -> Result<f64, OutOfRange> {
    Ok(SECOND_RADIATION_M_K / (3.920_690_394_872_886 * temperature(temperature_k)?) * 1e9)
}

/// Exitance of a blackbody over all wavelengths, W m⁻²: σT⁴.
///
/// # Source
/// Stefan–Boltzmann law; σ exact in SI 2019 to f64 (CODATA 2022).
///
/// # Errors
/// [`OutOfRange`] for a temperature outside 1 to 10⁹ K.
pub fn total_exitance_w_m2(temperature_k: f64) -> Result<f64, OutOfRange> {
    Ok(STEFAN_BOLTZMANN_W_M2_K4 * temperature(temperature_k)?.powi(4))
}

/// The spectral radiance on an even grid of wavelengths: (wavelength in nm, W m⁻² sr⁻¹ nm⁻¹).
///
/// # Errors
/// [`OutOfRange`] for a temperature or wavelength as in [`spectral_radiance_w_m2_sr_nm`], for an end
/// that does not lie above the start, and for fewer than 2 or more than 100 000 points.
pub fn sampled_radiance(
    temperature_k: f64,
    from_nm: f64,
    to_nm: f64,
    points: usize,
) -> Result<Vec<[f64; 2]>, OutOfRange> {
    temperature(temperature_k)?;
    wavelength(from_nm)?;
    wavelength(to_nm)?;
    if to_nm <= from_nm {
        return Err(OutOfRange { what: "to_nm", value: to_nm, allowed: "more than from_nm" });
    }
    within("points", points as f64, 2.0, 1e5, "2 to 100 000")?;
    let step_nm = (to_nm - from_nm) / (points - 1) as f64;
    Ok((0..points)
        .map(|index| {
            let wavelength_nm = (from_nm + step_nm * index as f64).min(to_nm);
            [wavelength_nm, exitance_unchecked_w_m2_nm(wavelength_nm, temperature_k) / PI]
        })
        .collect())
}

/// Spectral exitance for arguments already known to be in range, W m⁻² nm⁻¹.
pub(crate) fn exitance_unchecked_w_m2_nm(wavelength_nm: f64, temperature_k: f64) -> f64 {
    let wavelength_m = wavelength_nm * 1e-9;
    let exponent = SECOND_RADIATION_M_K / (wavelength_m * temperature_k);
    if exponent > LARGEST_EXPONENT {
        return 0.0;
    }
    FIRST_RADIATION_W_M2 / wavelength_m.powi(5) / exponent.exp_m1() * 1e-9
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_peak_stands_where_wien_says() {
        for temperature_k in [300.0, 2700.0, 5772.0, 40_000.0] {
            let peak_nm = wien_peak_nm(temperature_k).expect("in range");
            let at = |wavelength_nm| spectral_radiance_w_m2_sr_nm(wavelength_nm, temperature_k).expect("in range");
            assert!(at(peak_nm) > at(peak_nm * 0.999) && at(peak_nm) > at(peak_nm * 1.001));
        }
    }

    #[test]
    fn the_peak_of_photons_stands_where_they_are_most() {
        let at = |wavelength_nm| photon_radiance_per_s_m2_sr_nm(wavelength_nm, 5772.0).expect("in range");
        let peak_nm = photon_peak_nm(5772.0).expect("in range");
        assert!(at(peak_nm) > at(peak_nm * 0.999) && at(peak_nm) > at(peak_nm * 1.001));
    }

    #[test]
    fn the_peak_by_frequency_stands_at_a_longer_wave() {
        // Per unit frequency: the wavelength form times λ²/c.
        let at = |frequency_thz: f64| {
            let wavelength_nm = LIGHT_SPEED_M_S / frequency_thz * 1e-3;
            spectral_radiance_w_m2_sr_nm(wavelength_nm, 5772.0).expect("in range") * wavelength_nm * wavelength_nm
        };
        let peak_thz = wien_peak_thz(5772.0).expect("in range");
        assert!(at(peak_thz) > at(peak_thz * 0.999) && at(peak_thz) > at(peak_thz * 1.001));
        let peak_nm = LIGHT_SPEED_M_S / peak_thz * 1e-3;
        assert!((peak_nm / wien_peak_nm(5772.0).expect("in range") - 1.7600).abs() < 1e-3, "{peak_nm}");
    }

    #[test]
    fn the_long_wave_side_keeps_its_digits() {
        // Rayleigh–Jeans: 2ckT/λ⁴ for λT far above c₂.
        let (wavelength_nm, temperature_k) = (1e9, 1e5);
        let jeans = 2.0 * LIGHT_SPEED_M_S * BOLTZMANN_J_K * temperature_k / 1.0_f64 * 1e-9;
        let planck = spectral_radiance_w_m2_sr_nm(wavelength_nm, temperature_k).expect("in range");
        assert!((planck / jeans - 1.0).abs() < 1e-7, "{planck} {jeans}");
    }

    #[test]
    fn a_sampled_spectrum_holds_both_ends_and_refuses_a_reversed_range() {
        let samples = sampled_radiance(5772.0, 100.0, 3000.0, 30).expect("in range");
        assert_eq!((samples.len(), samples[0][0], samples[29][0]), (30, 100.0, 3000.0));
        assert!(sampled_radiance(5772.0, 500.0, 500.0, 30).is_err());
        assert!(sampled_radiance(5772.0, 500.0, 600.0, 1).is_err());
    }

    #[test]
    fn a_cold_body_gives_zero_light_and_no_error() {
        assert_eq!(spectral_radiance_w_m2_sr_nm(400.0, 3.0), Ok(0.0));
    }
}
