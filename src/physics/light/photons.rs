//! Light as plants and molecules count it: photosynthetic photons and ultraviolet bands.

use super::bands::{energy_share, photon_share};
use super::range::{OutOfRange, amount, temperature};
use crate::units::constants::{AVOGADRO_PER_MOL, BOLTZMANN_J_K};

/// Mean energy of a blackbody's photons in units of kT: π⁴/(30 ζ(3)).
pub const MEAN_PHOTON_ENERGY_KT: f64 = 2.701_178_032_919_064;

/// Photosynthetically active radiation, nm. `McCree` (1972), Agricultural Meteorology 9, 191.
pub const PHOTOSYNTHETIC_NM: [f64; 2] = [400.0, 700.0];
/// Far-red light that some cyanobacteria still use, nm. Nürnberg et al. (2018), Science 360, 1210.
pub const FAR_RED_NM: [f64; 2] = [700.0, 750.0];

/// Light that photosynthesis as on Earth can use.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct PhotosyntheticLight {
    /// Share of the irradiance between 400 and 700 nm.
    pub energy_share: f64,
    /// Irradiance between 400 and 700 nm, W m⁻².
    pub irradiance_w_m2: f64,
    /// Photons between 400 and 700 nm, µmol m⁻² s⁻¹.
    pub photon_flux_umol_m2_s: f64,
    /// Photons of far-red light between 700 and 750 nm, µmol m⁻² s⁻¹.
    pub far_red_photon_flux_umol_m2_s: f64,
}

/// Ultraviolet irradiance in the three usual bands, W m⁻².
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct UltravioletLight {
    /// 315 to 400 nm.
    pub uva_w_m2: f64,
    /// 280 to 315 nm.
    pub uvb_w_m2: f64,
    /// 100 to 280 nm.
    pub uvc_w_m2: f64,
}

/// Photosynthetically active light in the irradiance of a blackbody.
///
/// # Source
/// Band 400 to 700 nm: `McCree` (1972); far red to 750 nm: Nürnberg et al. (2018); Planck's law.
///
/// # Valid for
/// Light that reaches the place unfiltered.
///
/// # Errors
/// [`OutOfRange`] for a temperature outside 1 to 10⁹ K or an irradiance outside 0 to 10⁶⁰ W m⁻².
///
/// # Example
/// ```
/// use longember::physics::light::photosynthetic_light;
/// let sun = photosynthetic_light(1361.0, 5772.0)?;
/// assert!((sun.energy_share - 0.367).abs() < 1e-3);
/// # Ok::<(), longember::physics::light::OutOfRange>(())
/// ```
pub fn photosynthetic_light(irradiance_w_m2: f64, temperature_k: f64) -> Result<PhotosyntheticLight, OutOfRange> {
    let photons = photon_flux_umol_m2_s(irradiance_w_m2, temperature_k)?;
    let energy_share = energy_share(PHOTOSYNTHETIC_NM[0], PHOTOSYNTHETIC_NM[1], temperature_k)?;
    Ok(PhotosyntheticLight {
        energy_share,
        irradiance_w_m2: irradiance_w_m2 * energy_share,
        photon_flux_umol_m2_s: photons * photon_share(PHOTOSYNTHETIC_NM[0], PHOTOSYNTHETIC_NM[1], temperature_k)?,
        far_red_photon_flux_umol_m2_s: photons * photon_share(FAR_RED_NM[0], FAR_RED_NM[1], temperature_k)?,
    })
}

/// All photons in the irradiance of a blackbody, µmol m⁻² s⁻¹.
///
/// # Source
/// Mean photon energy π⁴/(30 ζ(3)) kT = 2.7012 kT from Planck's law.
///
/// # Errors
/// As [`photosynthetic_light`].
pub fn photon_flux_umol_m2_s(irradiance_w_m2: f64, temperature_k: f64) -> Result<f64, OutOfRange> {
    let mean_energy_j = MEAN_PHOTON_ENERGY_KT * BOLTZMANN_J_K * temperature(temperature_k)?;
    Ok(amount("irradiance_w_m2", irradiance_w_m2)? / mean_energy_j / AVOGADRO_PER_MOL * 1e6)
}

/// Ultraviolet in the irradiance of a blackbody.
///
/// # Source
/// Bands UVA, UVB and UVC of ISO 21348:2007; Planck's law.
///
/// # Valid for
/// Photospheric light above the air. Cool stars have an active chromosphere whose far ultraviolet exceeds their
/// blackbody by orders of magnitude; hot stars lose far ultraviolet to line blanketing.
///
/// # Errors
/// As [`photosynthetic_light`].
pub fn ultraviolet_light(irradiance_w_m2: f64, temperature_k: f64) -> Result<UltravioletLight, OutOfRange> {
    let irradiance = amount("irradiance_w_m2", irradiance_w_m2)?;
    let band = |from_nm, to_nm| energy_share(from_nm, to_nm, temperature_k).map(|share| share * irradiance);
    Ok(UltravioletLight { uva_w_m2: band(315.0, 400.0)?, uvb_w_m2: band(280.0, 315.0)?, uvc_w_m2: band(100.0, 280.0)? })
}

#[cfg(test)]
mod tests {
    use super::super::planck::{exitance_unchecked_w_m2_nm, photon_energy_j, total_exitance_w_m2};
    use super::*;

    #[test]
    fn counted_photons_are_the_integral_of_the_photon_spectrum() {
        let temperature_k = 4000.0;
        let exitance = total_exitance_w_m2(temperature_k).expect("in range");
        // Midpoint rule in steps of 0.1 nm.
        let direct: f64 = (0..3000)
            .map(|step| {
                let wavelength_nm = 400.05 + 0.1 * f64::from(step);
                let energy_j = photon_energy_j(wavelength_nm).expect("in range");
                0.1 * exitance_unchecked_w_m2_nm(wavelength_nm, temperature_k) / energy_j
            })
            .sum();
        let light = photosynthetic_light(exitance, temperature_k).expect("in range");
        assert!((light.photon_flux_umol_m2_s * 1e-6 * AVOGADRO_PER_MOL / direct - 1.0).abs() < 1e-8);
    }

    #[test]
    fn a_red_dwarf_gives_far_less_ultraviolet_at_equal_irradiance() {
        let sun = ultraviolet_light(1361.0, 5772.0).expect("in range");
        let dwarf = ultraviolet_light(1361.0, 2800.0).expect("in range");
        assert!(dwarf.uvb_w_m2 < 0.01 * sun.uvb_w_m2);
        assert!(ultraviolet_light(f64::INFINITY, 5772.0).is_err());
    }
}
