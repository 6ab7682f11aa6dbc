//! Clear air with the star at one altitude, made ready so that the skies of many stars are read from it quickly.

use super::air_mass::air_mass;
use super::caution::Caution;
use super::chromaticity::Tristimulus;
use super::observer::{PREPARED, observer_wavelengths_nm};
use super::observer_table::OBSERVER_ROWS;
use super::range::{OutOfRange, within};
use super::rayleigh::{Atmosphere, cross_section_unchecked_m2};
use super::sky::{Sky, spectral_scale};
use super::visible_spectrum::VisibleSpectrum;
use std::f64::consts::PI;

/// Optical depth at 550 nm beyond which the dome is an average of light scattered many times.
const THICK_AIR_DEPTH: f64 = 1.0;
/// Optical depth at 550 nm up to which scattering once describes the zenith.
const SINGLE_SCATTERING_DEPTH: f64 = 0.3;
/// Altitude below which the air mass is the Earth's own, degrees.
const LOW_STAR_DEG: f64 = 10.0;
/// Three values each for the star above the air, its disc, the dome, and the zenith.
const CHANNELS: usize = 12;

/// Everything about a clear sky that does not depend on the star: how each wavelength passes and scatters.
///
/// Air and altitude stay the same while a star ages, so that a whole life takes one of these for each planet.
#[derive(Clone, Debug)]
pub struct ClearAir {
    /// Observer times passage, for each wavelength and channel.
    weights: Box<[[f64; CHANNELS]; OBSERVER_ROWS]>,
    optical_depth_550: f64,
    air_mass: f64,
    level_share: f64,
    cautions: Vec<Caution>,
}

impl ClearAir {
    /// Clear air with a star at an altitude, degrees.
    ///
    /// # Source
    /// As [`sky`](super::sky()), which says what the model is.
    ///
    /// # Errors
    /// [`OutOfRange`] for an altitude outside 0 to 90° or an impossible atmosphere.
    pub fn new(atmosphere: &Atmosphere, altitude_deg: f64) -> Result<Self, OutOfRange> {
        let altitude_deg = within("altitude_deg", altitude_deg, 0.0, 90.0, "0 to 90 deg")?;
        let column_per_m2 = atmosphere.column_per_m2()?;
        let air_mass = air_mass(altitude_deg)?;
        let cosine = 1.0 / air_mass;
        let depth = |wavelength_nm| cross_section_unchecked_m2(wavelength_nm, atmosphere.gas) * column_per_m2;
        let mut weights = Box::new([[0.0; CHANNELS]; OBSERVER_ROWS]);
        for ((row, observer), wavelength_nm) in weights.iter_mut().zip(&PREPARED.weights).zip(observer_wavelengths_nm())
        {
            let depth = depth(wavelength_nm);
            let passages = [
                1.0,
                (-depth * air_mass).exp(),
                diffuse_share(depth, cosine, atmosphere.ground_albedo),
                zenith_once_per_sr(depth, cosine),
            ];
            for (channel, weight) in row.iter_mut().enumerate() {
                *weight = observer[channel % 3] * passages[channel / 3];
            }
        }
        let optical_depth_550 = depth(550.0);
        let mut cautions = vec![Caution::BlackbodyStandsIn, Caution::CleanAirOnly];
        if altitude_deg < LOW_STAR_DEG {
            cautions.push(Caution::LowStar);
        }
        if optical_depth_550 > THICK_AIR_DEPTH {
            cautions.push(Caution::ThickAir);
        }
        Ok(Self { weights, optical_depth_550, air_mass, level_share: altitude_deg.to_radians().sin(), cautions })
    }

    /// The sky under a star of this spectrum that gives this irradiance above the air, W m⁻².
    ///
    /// # Source
    /// As [`sky`](super::sky()).
    ///
    /// # Errors
    /// [`OutOfRange`] for an irradiance outside 0 to 10⁶⁰ W m⁻².
    pub fn sky(&self, spectrum: &VisibleSpectrum, irradiance_w_m2: f64) -> Result<Sky, OutOfRange> {
        let scale = spectral_scale(spectrum.temperature_k(), irradiance_w_m2)?;
        let mut sums = [0.0; CHANNELS];
        for (occupation, row) in spectrum.occupations().iter().zip(self.weights.iter()) {
            for (sum, weight) in sums.iter_mut().zip(row) {
                *sum += occupation * weight;
            }
        }
        let light = |first: usize| Tristimulus { x: sums[first], y: sums[first + 1], z: sums[first + 2] }.scaled(scale);
        Ok(Sky {
            star_above_air: light(0),
            disc: light(3),
            dome: light(6),
            zenith_scattered_once: (self.optical_depth_550 <= SINGLE_SCATTERING_DEPTH).then(|| light(9)),
            optical_depth_550: self.optical_depth_550,
            air_mass: self.air_mass,
            level_share: self.level_share,
            cautions: self.cautions.clone(),
        })
    }
}

/// Share of the irradiance facing the star that reaches level ground by way of the dome.
fn diffuse_share(depth: f64, cosine: f64, ground_albedo: f64) -> f64 {
    let direct = (-depth / cosine).exp();
    let total = ((2.0 / 3.0 + cosine) + (2.0 / 3.0 - cosine) * direct) / (4.0 / 3.0 + depth);
    let back = 3.0 * depth / (4.0 + 3.0 * depth);
    // Bright ground under thick air throws light to and fro; both below one keeps the sum finite.
    let passes = (1.0 - ground_albedo * back).max(f64::EPSILON);
    (cosine * (total / passes - direct)).max(0.0)
}

/// Radiance of the zenith by scattering once, per unit irradiance, sr⁻¹.
fn zenith_once_per_sr(depth: f64, cosine: f64) -> f64 {
    let phase = 0.75 * (1.0 + cosine * cosine);
    let gap = 1.0 - cosine;
    // exp_m1 keeps the digits of the difference when the star nears the zenith.
    let slant = if gap < 1e-9 {
        depth * (-depth).exp()
    } else {
        -cosine / gap * (-depth).exp() * (-depth * gap / cosine).exp_m1()
    };
    phase / (4.0 * PI) * slant
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_zenith_formula_is_smooth_where_the_star_stands_overhead() {
        let overhead = zenith_once_per_sr(0.1, 1.0);
        let nearly = zenith_once_per_sr(0.1, 1.0 - 1e-7);
        assert!((nearly / overhead - 1.0).abs() < 1e-6, "{overhead} {nearly}");
    }

    #[test]
    fn what_scatters_without_loss_is_neither_made_nor_lost() {
        // Over black ground, light reaching the ground and light going back add up to the light coming in.
        for depth in [1e-6, 0.1, 1.0, 30.0] {
            for cosine in [0.03, 0.5, 1.0] {
                let down = diffuse_share(depth, cosine, 0.0) / cosine + (-depth / cosine).exp();
                assert!((0.0..=1.0 + 1e-12).contains(&down), "{depth} {cosine}: {down}");
            }
        }
    }

    #[test]
    fn a_sum_over_prepared_weights_is_the_sum_over_the_spectrum() {
        use super::super::observer::tristimulus;
        use super::super::planck::exitance_unchecked_w_m2_nm;
        let (temperature_k, irradiance_w_m2) = (3300.0, 700.0);
        let air = ClearAir::new(&Atmosphere::EARTH, 20.0).expect("in range");
        let spectrum = VisibleSpectrum::of_blackbody(temperature_k).expect("in range");
        let sky = air.sky(&spectrum, irradiance_w_m2).expect("in range");
        let scale = spectral_scale(temperature_k, irradiance_w_m2).expect("in range");
        let disc = tristimulus(|wavelength_nm| {
            let depth = Atmosphere::EARTH.optical_depth(wavelength_nm).expect("in range");
            exitance_unchecked_w_m2_nm(wavelength_nm, temperature_k) * scale * (-depth * sky.air_mass).exp()
        });
        for (found, expected) in sky.disc.to_array().into_iter().zip(disc.to_array()) {
            assert!((found / expected - 1.0).abs() < 1e-12, "{found} {expected}");
        }
    }
}
