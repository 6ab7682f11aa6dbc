//! The light a planet receives at one moment, and the clear sky it makes.

use super::moment::{PlanetMoment, StarMoment};
use super::specification::PlanetSpecification;
use super::starlight::Starlight;
use crate::physics::light::{
    Atmosphere, ClearAir, Disc, PhotosyntheticLight, Sky, UltravioletLight, VisibleSpectrum,
    apparent_magnitude_from_planet, disc, illuminance_lx, photosynthetic_light, ultraviolet_light,
};
use crate::physics::planet::bulk::gravity_m_s2;
use crate::units::constants::SOLAR_CONSTANT_W_M2;

/// Altitude of the star that figures of a sky hold for unless another one is chosen, degrees: half of the full light.
pub const USUAL_ALTITUDE_DEG: f64 = 30.0;
/// Width of the disc that a star's is held against, degrees: nearly that of the Sun and the Moon from the Earth.
pub const REFERENCE_DISC_DEG: f64 = 0.5;

/// What falls on a planet above its air, mean over the orbit, and what its sky makes of it.
#[derive(Clone, Debug, PartialEq)]
pub struct PlanetLight {
    /// Irradiance facing the star, W m⁻².
    pub irradiance_w_m2: f64,
    /// Illuminance facing the star, lx.
    pub illuminance_lx: f64,
    /// Light that photosynthesis as on Earth can use.
    pub photosynthetic: PhotosyntheticLight,
    /// Ultraviolet in three bands.
    pub ultraviolet: UltravioletLight,
    /// The star's disc at the mean distance.
    pub disc: Option<Disc>,
    /// The star's V magnitude, where it has one.
    pub star_visual_mag: Option<f64>,
    /// The sky; `None` where the planet cannot hold the air it was given.
    pub sky: Option<Sky>,
}

impl PlanetLight {
    /// The light on a planet at a moment; `None` where it does not orbit a star whose light is modelled.
    ///
    /// `starlight` and `spectrum` belong to that star, `air` to the planet; see [`clear_air`].
    #[must_use]
    pub fn of(
        star: &StarMoment,
        starlight: &Starlight,
        spectrum: &VisibleSpectrum,
        planet: &PlanetMoment,
        air: Option<&ClearAir>,
    ) -> Option<Self> {
        let distance_au = planet.semi_major_axis_au?;
        let irradiance_w_m2 = planet.insolation_earth? * SOLAR_CONSTANT_W_M2;
        let temperature_k = starlight.temperature_k;
        let magnitude = |absolute_mag| apparent_magnitude_from_planet(absolute_mag, distance_au).ok();
        Some(Self {
            irradiance_w_m2,
            illuminance_lx: illuminance_lx(irradiance_w_m2, temperature_k).ok()?,
            photosynthetic: photosynthetic_light(irradiance_w_m2, temperature_k).ok()?,
            ultraviolet: ultraviolet_light(irradiance_w_m2, temperature_k).ok()?,
            disc: star.radius_rsun.and_then(|radius_rsun| disc(radius_rsun, distance_au).ok()),
            star_visual_mag: starlight.magnitudes.as_ref().and_then(|known| magnitude(known.absolute_visual_mag)),
            sky: air.and_then(|air| air.sky(spectrum, irradiance_w_m2).ok()),
        })
    }

    /// How many reference discs of half a degree fit side by side across the star.
    #[must_use]
    pub fn star_over_half_degree(&self) -> Option<f64> {
        self.disc.map(|disc| disc.diameter_deg / REFERENCE_DISC_DEG)
    }

    /// Luminance of the star's disc through the air, cd m⁻².
    #[must_use]
    pub fn disc_luminance_cd_m2(&self) -> Option<f64> {
        let solid_angle_sr = self.disc?.solid_angle_sr;
        let luminance = self.sky.as_ref()?.disc.y / solid_angle_sr;
        luminance.is_finite().then_some(luminance)
    }
}

/// A planet's air with the star at an altitude, degrees, as given or taken away; `None` where gravity is too weak or
/// the altitude outside 0 to 90°.
///
/// No air is clear air of no pressure: a black sky and a star that nothing dims.
#[must_use]
pub fn clear_air(planet: &PlanetSpecification, altitude_deg: f64, with_air: bool) -> Option<ClearAir> {
    let bare = Atmosphere { surface_pressure_bar: 0.0, ..Atmosphere::EARTH };
    let gravity_m_s2 = gravity_m_s2(planet.mass_mearth, planet.radius_rearth).ok()?;
    let atmosphere = if with_air { planet.air.atmosphere(gravity_m_s2) } else { None };
    ClearAir::new(&atmosphere.unwrap_or(bare), altitude_deg).ok()
}
