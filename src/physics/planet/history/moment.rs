//! One planet at one moment.

use super::super::caution::Caution;
use super::super::climate::ClimateState;
use super::super::climate::reflection::ice_albedo;
use super::super::deep_time::background_temperature_k;
use super::super::habitable_zone::{ZonePlace, is_extrapolated, zone_place};
use super::super::irradiation::{
    DayNight, ExtremeInsolation, day_night_k, equilibrium_temperature_k, extreme_insolation_earth,
    orbit_mean_insolation_earth,
};
use super::super::orbit::period_yr;
use super::super::range::OutOfRange;
use super::super::star_point::{StarPoint, check_track};
use super::super::tides::LockLevel;
use super::super::tides::locking::RESONANCE_ECCENTRICITY;
use super::planet_history::PlanetHistory;
use crate::units::constants::{SOLAR_CONSTANT_W_M2, STEFAN_BOLTZMANN_W_M2_K4};

/// Surface temperature of a steam atmosphere where its heat escapes in the near infrared, K. Goldblatt & Watson 2012.
const STEAM_K: f64 = 1400.0;

/// A surface temperature, as far as it is known.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum SurfaceTemperature {
    /// A figure, K.
    Known(f64),
    /// No figure, only that it is hotter than this, K.
    HotterThan(f64),
}

impl SurfaceTemperature {
    /// The figure or the bound, K.
    #[must_use]
    pub fn value_k(self) -> f64 {
        match self {
            Self::Known(value_k) | Self::HotterThan(value_k) => value_k,
        }
    }
}

/// The climate of a planet with surface water at one moment.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct ClimateMoment {
    /// What the water is doing.
    pub state: ClimateState,
    /// Water left, oceans of the Earth.
    pub water_oceans: f64,
    /// Share of the surface that is ice; `None` where there is no water to freeze.
    pub ice_fraction: Option<f64>,
    /// Latitude of the ice line, degrees; `None` where there is none to speak of.
    pub ice_line_deg: Option<f64>,
    /// Temperature at the equator and at the poles, K; `None` where only a mean is known.
    pub equator_pole_k: Option<(f64, f64)>,
    /// Partial pressure of carbon dioxide, bar; `None` under steam and without water.
    pub carbon_dioxide_bar: Option<f64>,
    /// Share of the starlight that the planet reflects, dimensionless; `None` under steam and without water.
    pub planetary_albedo: Option<f64>,
}

/// One planet at one moment.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct PlanetMoment {
    /// Age of the star, yr.
    pub age_yr: f64,
    /// Semi-major axis, au.
    pub semi_major_axis_au: f64,
    /// Eccentricity, dimensionless.
    pub eccentricity: f64,
    /// Orbital period, yr.
    pub period_yr: f64,
    /// Starlight averaged over the orbit, units of 1361.17 W m⁻².
    pub mean_insolation_earth: f64,
    /// Brightest and faintest starlight of the orbit.
    pub extremes: ExtremeInsolation,
    /// Temperature at which the planet radiates what it absorbs, K, with heat from inside and from the sky.
    pub equilibrium_temperature_k: f64,
    /// Mean surface temperature.
    pub surface: SurfaceTemperature,
    /// How far the surface temperature can be trusted.
    pub surface_caution: Option<Caution>,
    /// Climate, for planets with the climate model.
    pub climate: Option<ClimateMoment>,
    /// Place in the habitable zone.
    pub zone: ZonePlace,
    /// How far the place in the zone can be trusted.
    pub zone_caution: Option<Caution>,
    /// Whether the planet keeps one face to the star; always an order of magnitude.
    pub lock: LockLevel,
    /// The orbit is eccentric enough that the day settles in a resonance such as 3:2 rather than 1:1.
    pub resonance_likely: bool,
    /// Temperatures of both faces without any transport of heat, for a planet that keeps one face to the star.
    pub bare_faces: Option<DayNight>,
    /// High-energy light, W m⁻²; `None` for giants and remnants.
    pub high_energy_w_m2: Option<f64>,
    /// Place against the shoreline of air, 1 for the Earth today; always an order of magnitude.
    pub shoreline_ratio: f64,
}

impl PlanetHistory {
    /// The planet at the age of a star; `None` outside the track and after the end of the orbit.
    ///
    /// `star` may lie between the nodes of the track: light and colour are taken from it, all that has memory from the
    /// history.
    ///
    /// # Errors
    /// [`OutOfRange`] for a star that cannot be used.
    pub fn at(&self, star: &StarPoint) -> Result<Option<PlanetMoment>, OutOfRange> {
        check_track(std::slice::from_ref(star))?;
        let Some((place, shoreline_ratio)) = self.orbit.at(star.age_yr).zip(self.shoreline_ratio_at(star.age_yr))
        else {
            return Ok(None);
        };
        let (a, e) = (place.semi_major_axis_au, place.eccentricity);
        let input = &self.input;
        let mass = input.orbit.mass_mearth;
        let teff_k = star.effective_temperature_k.max(1.0);
        let mean_insolation_earth = orbit_mean_insolation_earth(star.luminosity_lsun, a, e)?;
        let flux_w_m2 = mean_insolation_earth * SOLAR_CONSTANT_W_M2;
        let from_star_k =
            equilibrium_temperature_k(flux_w_m2, input.bond_albedo, input.redistribution.factor(), input.emissivity)?;
        let equilibrium_k = input.inner_heat.with_floor_k(from_star_k, star.age_yr)?;
        let (surface, surface_caution, climate) =
            self.surface(star.age_yr, mean_insolation_earth, teff_k, equilibrium_k)?;
        let lock = self.lock_level_at(star.age_yr);
        let bare_faces =
            (lock == LockLevel::Locked).then(|| day_night_k(flux_w_m2, input.bond_albedo, 0.0)).transpose()?;
        Ok(Some(PlanetMoment {
            age_yr: star.age_yr,
            semi_major_axis_au: a,
            eccentricity: e,
            period_yr: period_yr(a, star.mass_msun, mass)?,
            mean_insolation_earth,
            extremes: extreme_insolation_earth(star.luminosity_lsun, a, e)?,
            equilibrium_temperature_k: equilibrium_k,
            surface,
            surface_caution,
            climate,
            zone: zone_place(mean_insolation_earth, teff_k, mass)?,
            zone_caution: is_extrapolated(teff_k).then_some(Caution::Extrapolated),
            lock,
            resonance_likely: lock != LockLevel::Free && e > RESONANCE_ECCENTRICITY,
            bare_faces,
            high_energy_w_m2: self
                .high_energy
                .luminosity_lsun(star)
                .map(|l| l / (a * a * (1.0 - e * e).sqrt()) * SOLAR_CONSTANT_W_M2),
            shoreline_ratio,
        }))
    }

    /// Temperature of the sky, K, and heat from it and from inside, W m⁻².
    pub(super) fn other_heat(&self, age_yr: f64) -> (f64, f64) {
        let heat = &self.input.inner_heat;
        let sky_k = background_temperature_k(heat.birth_cosmic_age_yr + age_yr.max(0.0));
        (sky_k, heat.heat_flow_at_w_m2(age_yr) + STEFAN_BOLTZMANN_W_M2_K4 * sky_k.powi(4))
    }

    fn surface(
        &self,
        age_yr: f64,
        insolation_earth: f64,
        teff_k: f64,
        equilibrium_k: f64,
    ) -> Result<(SurfaceTemperature, Option<Caution>, Option<ClimateMoment>), OutOfRange> {
        let held = self.input.greenhouse.surface_temperature_k(equilibrium_k)?;
        let held_caution =
            (self.input.greenhouse != super::super::greenhouse::Greenhouse::None).then_some(Caution::HeldByUser);
        let Some((climate, state, water_oceans)) = self
            .climate
            .as_ref()
            .and_then(|climate| Some((climate, climate.state_at(age_yr)?, climate.water_oceans_at(age_yr)?)))
        else {
            return Ok((SurfaceTemperature::Known(held), held_caution, None));
        };
        let mut moment = ClimateMoment {
            state,
            water_oceans,
            ice_fraction: None,
            ice_line_deg: None,
            equator_pole_k: None,
            carbon_dioxide_bar: None,
            planetary_albedo: None,
        };
        let (surface, caution) = match state {
            ClimateState::Dry => (SurfaceTemperature::Known(held), held_caution),
            ClimateState::Runaway => (SurfaceTemperature::HotterThan(equilibrium_k.max(STEAM_K)), None),
            ClimateState::Frozen => {
                moment.ice_fraction = Some(1.0);
                moment.ice_line_deg = Some(0.0);
                let (sky_k, other_w_m2) = self.other_heat(age_yr);
                let (mean_k, carbon_dioxide_bar) =
                    climate.world.frozen_climate(insolation_earth, teff_k, other_w_m2)?;
                moment.carbon_dioxide_bar = Some(carbon_dioxide_bar);
                moment.planetary_albedo = Some(ice_albedo(teff_k)?);
                (SurfaceTemperature::Known(mean_k.max(sky_k)), None)
            }
            ClimateState::Temperate | ClimateState::Moist => {
                let aired = climate.world.open_climate(insolation_earth, teff_k)?;
                let open = aired.climate;
                moment.carbon_dioxide_bar = Some(aired.carbon_dioxide_bar);
                moment.ice_fraction = Some(open.ice_fraction);
                moment.planetary_albedo = Some(open.planetary_albedo);
                moment.ice_line_deg = open.ice_line_deg;
                moment.equator_pole_k = Some((open.equator_k, open.pole_k));
                if open.is_end_of_curve {
                    (SurfaceTemperature::HotterThan(open.mean_k), None)
                } else {
                    (SurfaceTemperature::Known(open.mean_k), None)
                }
            }
        };
        let caution =
            if is_extrapolated(teff_k) && state != ClimateState::Dry { Some(Caution::Extrapolated) } else { caution };
        // The bands of latitude mean nothing on a planet that always shows one face.
        if self.lock_level_at(age_yr) == LockLevel::Locked {
            moment.ice_line_deg = None;
            moment.equator_pole_k = None;
            return Ok((surface, caution.or(Some(Caution::OrderOfMagnitude)), Some(moment)));
        }
        Ok((surface, caution, Some(moment)))
    }
}
