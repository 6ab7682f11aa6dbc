//! The daylight sky of a clear atmosphere: its dome, the star's disc in it, and how bright both are.

use super::caution::Caution;
use super::chromaticity::Tristimulus;
use super::clear_air::ClearAir;
use super::observer::tristimulus;
use super::planck::exitance_unchecked_w_m2_nm;
use super::range::{OutOfRange, amount, temperature, within};
use super::rayleigh::{Atmosphere, Gas, cross_section_unchecked_m2};
use super::visible_spectrum::VisibleSpectrum;
use crate::units::constants::STEFAN_BOLTZMANN_W_M2_K4;
use std::f64::consts::PI;

/// A star over a place with clear air.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct SkyScene {
    /// Effective temperature of the star, K.
    pub star_temperature_k: f64,
    /// Irradiance above the air on a plane facing the star, W m⁻².
    pub irradiance_w_m2: f64,
    /// Altitude of the star over the horizon, degrees.
    pub altitude_deg: f64,
    /// The air.
    pub atmosphere: Atmosphere,
}

/// The light of a daylight sky. The Y of every light is an illuminance in lx.
#[derive(Clone, Debug, PartialEq)]
pub struct Sky {
    /// The star above the air, on a plane facing it: the white of an eye adapted to it.
    pub star_above_air: Tristimulus,
    /// The star's disc through the air, on a plane facing it.
    pub disc: Tristimulus,
    /// The whole dome without the disc, on level ground.
    pub dome: Tristimulus,
    /// The zenith by scattering once, as luminance (Y in cd m⁻²); `None` in air too thick for it.
    pub zenith_scattered_once: Option<Tristimulus>,
    /// Vertical optical depth at 550 nm.
    pub optical_depth_550: f64,
    /// Relative optical air mass towards the star.
    pub air_mass: f64,
    /// Sine of the altitude: level ground gets this share of what faces the star.
    pub level_share: f64,
    /// What to bear in mind.
    pub cautions: Vec<Caution>,
}

impl Sky {
    /// Illuminance of level ground by the dome alone, lx.
    #[must_use]
    pub fn diffuse_lx(&self) -> f64 {
        self.dome.y
    }

    /// Illuminance of level ground by the star's disc alone, lx.
    #[must_use]
    pub fn direct_lx(&self) -> f64 {
        self.disc.y * self.level_share
    }

    /// Illuminance of level ground by disc and dome, lx.
    #[must_use]
    pub fn total_lx(&self) -> f64 {
        self.diffuse_lx() + self.direct_lx()
    }

    /// Mean luminance of the dome, cd m⁻²: its illuminance over π.
    #[must_use]
    pub fn dome_luminance_cd_m2(&self) -> f64 {
        self.dome.y / PI
    }

    /// Everything that falls on level ground: the light things are seen by.
    #[must_use]
    pub fn daylight(&self) -> Tristimulus {
        self.dome.plus(self.disc.scaled(self.level_share))
    }
}

/// The daylight sky over level ground.
///
/// The dome is the diffuse light of a layer that scatters without loss, by Eddington's two-stream solution:
/// T = ((⅔ + μ) + (⅔ − μ) e^(−τ/μ))/(4/3 + τ), dome = μ E (T/(1 − A s) − e^(−τ/μ)), s = 3τ/(4 + 3τ), with
/// ground albedo A. For μ stands one over the air mass (pseudo-spherical), so that a star on the horizon still
/// lights the sky. The disc is E e^(−τX).
///
/// # Source
/// Eddington (1916), MNRAS 77, 16, in the form of Shettle & Weinman (1970), J. Atmos. Sci. 27, 1048; scattering
/// by Bucholtz (1995) or Sneep & Ubachs (2005); air mass Kasten & Young (1989); pseudo-spherical path Dahlback &
/// Stamnes (1991), Planet. Space Sci. 39, 671.
///
/// # Valid for
/// Clean air of any depth without dust, cloud, ozone or other absorber, under a star that shines as a blackbody.
/// Against scattering of all orders the dome's x, y hold within 0.002 for the Earth's air. The zenith scattered
/// once is 0.01 to 0.02 too high in y.
///
/// # Errors
/// [`OutOfRange`] for a temperature outside 1 to 10⁹ K, an irradiance outside 0 to 10⁶⁰ W m⁻², an altitude
/// outside 0 to 90° (see [`twilight`](super::twilight()) below that) or an impossible atmosphere.
///
/// # Example
/// ```
/// use longember::physics::light::{Atmosphere, SkyScene, Viewing, seen, sky};
/// let scene = SkyScene {
///     star_temperature_k: 2600.0,
///     irradiance_w_m2: 1000.0,
///     altitude_deg: 30.0,
///     atmosphere: Atmosphere::EARTH,
/// };
/// let sky = sky(&scene)?;
/// let name = |viewing| seen(sky.dome, sky.star_above_air, viewing).map(|light| light.name.to_string());
/// assert_eq!(name(Viewing::Camera).as_deref(), Some("pale yellowish orange"));
/// assert_eq!(name(Viewing::AdaptedEye).as_deref(), Some("light blue"));
/// # Ok::<(), longember::physics::light::OutOfRange>(())
/// ```
pub fn sky(scene: &SkyScene) -> Result<Sky, OutOfRange> {
    let spectrum = VisibleSpectrum::of_blackbody(scene.star_temperature_k)?;
    ClearAir::new(&scene.atmosphere, scene.altitude_deg)?.sky(&spectrum, scene.irradiance_w_m2)
}

/// A star's light after a number of air masses; Y in lx on a plane facing it.
///
/// # Source
/// Beer–Lambert law with the cross-sections of [`rayleigh_cross_section_m2`](super::rayleigh_cross_section_m2).
///
/// # Errors
/// As [`sky`], and for a number of air masses outside 0 to 1000.
pub fn light_through_air(
    star_temperature_k: f64,
    irradiance_w_m2: f64,
    atmosphere: &Atmosphere,
    air_masses: f64,
) -> Result<Tristimulus, OutOfRange> {
    let scale = spectral_scale(star_temperature_k, irradiance_w_m2)?;
    let path_per_m2 = atmosphere.column_per_m2()? * within("air_masses", air_masses, 0.0, 1000.0, "0 to 1000")?;
    let gas: Gas = atmosphere.gas;
    Ok(tristimulus(|wavelength_nm| {
        exitance_unchecked_w_m2_nm(wavelength_nm, star_temperature_k)
            * scale
            * (-cross_section_unchecked_m2(wavelength_nm, gas) * path_per_m2).exp()
    }))
}

/// Irradiance over the star's own exitance: what a spectrum at its surface is multiplied by.
pub(super) fn spectral_scale(star_temperature_k: f64, irradiance_w_m2: f64) -> Result<f64, OutOfRange> {
    let exitance_w_m2 = STEFAN_BOLTZMANN_W_M2_K4 * temperature(star_temperature_k)?.powi(4);
    Ok(amount("irradiance_w_m2", irradiance_w_m2)? / exitance_w_m2)
}

#[cfg(test)]
mod tests {
    use super::*;

    const NOON: SkyScene = SkyScene {
        star_temperature_k: 5772.0,
        irradiance_w_m2: 1361.0,
        altitude_deg: 90.0,
        atmosphere: Atmosphere::EARTH,
    };

    #[test]
    fn no_air_means_a_black_sky_and_an_undimmed_star() {
        let bare = Atmosphere { surface_pressure_bar: 0.0, ..Atmosphere::EARTH };
        let sky = sky(&SkyScene { atmosphere: bare, ..NOON }).expect("in range");
        assert_eq!((sky.dome.y, sky.optical_depth_550), (0.0, 0.0));
        assert_eq!(sky.disc, sky.star_above_air);
        assert_eq!(sky.dome.chromaticity(), None);
    }

    #[test]
    fn cautions_are_raised_where_they_belong() {
        let cautions = |scene: &SkyScene| sky(scene).expect("in range").cautions;
        assert!(!cautions(&NOON).contains(&Caution::LowStar));
        assert!(cautions(&SkyScene { altitude_deg: 2.0, ..NOON }).contains(&Caution::LowStar));
        let thick = Atmosphere { surface_pressure_bar: 90.0, ..Atmosphere::EARTH };
        let thick = SkyScene { atmosphere: thick, ..NOON };
        assert!(cautions(&thick).contains(&Caution::ThickAir));
        assert_eq!(sky(&thick).expect("in range").zenith_scattered_once, None);
        assert!(sky(&SkyScene { altitude_deg: -1.0, ..NOON }).is_err());
    }
}
