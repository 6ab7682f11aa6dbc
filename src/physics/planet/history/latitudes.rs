//! One planet's climate by latitude, and the starlight at which it turns.

use super::super::climate::{ClimateState, Latitude};
use super::super::irradiation::orbit_mean_insolation_earth;
use super::super::range::OutOfRange;
use super::super::star_point::{StarPoint, check_track};
use super::super::tides::LockLevel;
use super::planet_history::PlanetHistory;
use super::thresholds::LightThresholds;

/// Why a planet has no climate by latitude at a moment.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum NoLatitudes {
    /// It is no longer on an orbit.
    NoOrbit,
    /// Its greenhouse is held: one temperature stands for the whole globe.
    HeldGreenhouse,
    /// Its ocean, with which the climate begins, is not there yet.
    NoOceanYet,
    /// Its oceans are steam.
    Steam,
    /// Its water is gone.
    Dry,
    /// It keeps one face to its star.
    OneFace,
    /// The star gives no light that is modelled.
    NoLight,
}

impl NoLatitudes {
    /// The reason in one sentence for people.
    #[must_use]
    pub fn text(self) -> &'static str {
        match self {
            Self::NoOrbit => "It no longer orbits its star.",
            Self::HeldGreenhouse => {
                "Its greenhouse is held, so one temperature stands for the whole globe. Seas that answer to the star would give it latitudes."
            }
            Self::NoOceanYet => "Its ocean, with which the climate begins, is not there yet.",
            Self::Steam => "Its oceans are steam, which evens out all latitudes: hotter than 1400 K everywhere.",
            Self::Dry => {
                "Its water is gone, and with it ice and latitudes: one temperature stands for the whole globe."
            }
            Self::OneFace => "It keeps one face to its star: day and night part its climates, not latitudes.",
            Self::NoLight => "The light of its star is not modelled.",
        }
    }
}

impl PlanetHistory {
    /// The climate of every latitude at the age of a star, from the equator to a pole, or why there is none.
    ///
    /// # Source
    /// [`IceLineModel`](super::super::climate::IceLineModel), on the branch that the planet's history has led it to.
    /// # Accuracy
    /// As [`PlanetHistory::at`], whose mean surface temperature is the mean of these within 1 K.
    /// # Errors
    /// [`OutOfRange`] for a star that cannot be used.
    pub fn latitudes_at(&self, star: &StarPoint) -> Result<Result<Vec<Latitude>, NoLatitudes>, OutOfRange> {
        check_track(std::slice::from_ref(star))?;
        let age_yr = star.age_yr;
        let Some(place) = self.orbit.at(age_yr) else { return Ok(Err(NoLatitudes::NoOrbit)) };
        let Some(climate) = &self.climate else { return Ok(Err(NoLatitudes::HeldGreenhouse)) };
        let Some(state) = climate.state_at(age_yr) else { return Ok(Err(NoLatitudes::NoOceanYet)) };
        let teff_k = star.effective_temperature_k.max(1.0);
        let s = orbit_mean_insolation_earth(star.luminosity_lsun, place.semi_major_axis_au, place.eccentricity)?;
        let is_locked = self.lock_level_at(age_yr) == LockLevel::Locked;
        Ok(match state {
            ClimateState::Dry => Err(NoLatitudes::Dry),
            ClimateState::Runaway => Err(NoLatitudes::Steam),
            _ if is_locked => Err(NoLatitudes::OneFace),
            ClimateState::Temperate | ClimateState::Moist => Ok(climate.world.open_latitudes(s, teff_k)?),
            ClimateState::Frozen => {
                let (sky_k, other_w_m2) = self.other_heat(age_yr);
                let mut latitudes = climate.world.frozen_latitudes(s, teff_k, other_w_m2)?;
                for latitude in &mut latitudes {
                    latitude.temperature_k = latitude.temperature_k.max(sky_k);
                }
                Ok(latitudes)
            }
        })
    }

    /// The starlight at which the climate turns at the age of a star; `None` without the climate model, after the
    /// end of the orbit and once the water is gone.
    ///
    /// # Errors
    /// [`OutOfRange`] for a star that cannot be used.
    pub fn thresholds_at(&self, star: &StarPoint) -> Result<Option<LightThresholds>, OutOfRange> {
        check_track(std::slice::from_ref(star))?;
        let state = self.climate_state_at(star.age_yr).filter(|state| *state != ClimateState::Dry);
        let Some(climate) = self.climate.as_ref().filter(|_| state.is_some()) else { return Ok(None) };
        let is_locked = self.lock_level_at(star.age_yr) == LockLevel::Locked;
        let teff_k = star.effective_temperature_k.max(1.0);
        LightThresholds::of(&climate.world, teff_k, self.input.orbit.mass_mearth, is_locked).map(Some)
    }
}
