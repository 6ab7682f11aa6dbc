//! One planet's climate at one moment: by latitude, and where its starlight stands to the thresholds.

use super::history::{History, held, star_point};
use super::moment::PlanetState;
use crate::physics::planet::climate::Latitude;
use crate::physics::planet::history::{LightThresholds, NoLatitudes};
use crate::units::number_text::number;

/// What there is to say about a planet's climate at a moment.
#[derive(Clone, Debug, PartialEq)]
pub struct PlanetClimate {
    /// The planet's state in one word.
    pub state: PlanetState,
    /// Mean surface temperature, K, where it is known.
    pub mean_k: Option<f64>,
    /// Latitude of the ice line, degrees, where there is one to speak of.
    pub ice_line_deg: Option<f64>,
    /// Share of the surface under ice.
    pub ice_fraction: Option<f64>,
    /// Share of the starlight that is reflected.
    pub planetary_albedo: Option<f64>,
    /// Starlight received, mean over the orbit, in units of the Earth's.
    pub insolation_earth: Option<f64>,
    /// Every belt of latitude from the equator to a pole, or why there is none.
    pub latitudes: Result<Vec<Latitude>, NoLatitudes>,
    /// The starlight at which the climate turns.
    pub thresholds: Option<LightThresholds>,
}

impl PlanetClimate {
    /// State and figures in one line, under a planet's name.
    #[must_use]
    pub fn in_words(&self, name: &str) -> String {
        let mut words = vec![format!("{name}: {}", self.state.name())];
        words.extend(self.mean_k.map(|mean_k| format!("mean {} K", number(mean_k, 4))));
        if let Some(line_deg) = self.ice_line_deg.filter(|line_deg| (0.5..89.5).contains(line_deg)) {
            words.push(format!("ice edge {}°", number(line_deg, 3)));
        }
        words.extend(self.ice_fraction.map(|share| format!("ice cover {} %", number(100.0 * share, 2))));
        words.extend(self.planetary_albedo.map(|share| format!("reflects {} %", number(100.0 * share, 3))));
        words.join(", ")
    }
}

impl History {
    /// The climate of one planet at a moment, yr; `None` for a planet that is not there.
    #[must_use]
    pub fn climate_at(&self, index: usize, age_yr: f64) -> Option<PlanetClimate> {
        let past = self.planets().get(index)?;
        let time_yr = held(age_yr);
        let star = self.star_at(time_yr);
        let moment = past.moment(time_yr, &star);
        let point = star_point(&star, false);
        let shines = !star.phase.is_dark();
        let read = past.history().latitudes_at(&point).unwrap_or(Err(NoLatitudes::NoLight));
        let latitudes = match read {
            Err(NoLatitudes::NoOrbit) => Err(NoLatitudes::NoOrbit),
            read => {
                if shines {
                    read
                } else {
                    Err(NoLatitudes::NoLight)
                }
            }
        };
        Some(PlanetClimate {
            state: moment.state,
            mean_k: moment.surface_temperature_k,
            ice_line_deg: moment.ice_line_deg,
            ice_fraction: moment.ice_fraction,
            planetary_albedo: moment.planetary_albedo,
            insolation_earth: moment.insolation_earth,
            latitudes,
            thresholds: self.thresholds_at(index, time_yr),
        })
    }

    /// The starlight at which a planet's climate turns at a moment, yr; `None` where it has none.
    #[must_use]
    pub fn thresholds_at(&self, index: usize, age_yr: f64) -> Option<LightThresholds> {
        let star = self.star_at(held(age_yr));
        let past = self.planets().get(index).filter(|_| !star.phase.is_dark())?;
        past.history().thresholds_at(&star_point(&star, false)).ok().flatten()
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::system::{PlanetSpecification, StarSpecification, System, Water};

    fn history(planets: Vec<PlanetSpecification>) -> History {
        History::compute(System { star: StarSpecification::default(), planets }).expect("computed")
    }

    fn wet(semi_major_axis_au: f64) -> PlanetSpecification {
        let name = format!("At {semi_major_axis_au}");
        PlanetSpecification {
            name,
            semi_major_axis_au,
            water: Some(Water::default()),
            ..PlanetSpecification::default()
        }
    }

    /// The mean over the globe of what stands in belts of equal width.
    fn mean(latitudes: &[Latitude], read: fn(&Latitude) -> f64) -> f64 {
        let half_rad = (0.5 * 90.0 / latitudes.len() as f64).to_radians();
        let weight = |belt: &Latitude| {
            let middle_rad = belt.latitude_deg.to_radians();
            (middle_rad + half_rad).sin() - (middle_rad - half_rad).sin()
        };
        latitudes.iter().map(|belt| weight(belt) * read(belt)).sum()
    }

    #[test]
    fn the_belts_add_up_to_the_figures_of_the_globe() {
        let history = history(vec![wet(1.0), wet(3.0)]);
        for (index, state) in [(0, PlanetState::Temperate), (1, PlanetState::Frozen)] {
            let climate = history.climate_at(index, 4.57e9).expect("a planet");
            assert_eq!(climate.state, state);
            let latitudes = climate.latitudes.expect("a climate by latitude");
            let off_k = mean(&latitudes, |belt| belt.temperature_k) - climate.mean_k.expect("known");
            assert!(off_k.abs() < 1.5, "{index}: {off_k}");
            let ice = mean(&latitudes, |belt| belt.ice_fraction);
            assert!((ice - climate.ice_fraction.expect("known")).abs() < 0.01, "{index}: {ice}");
            let thresholds = climate.thresholds.expect("a climate");
            assert!(thresholds.freeze_insolation_earth <= thresholds.thaw_insolation_earth);
            let s = climate.insolation_earth.expect("light");
            assert_eq!(s > thresholds.freeze_insolation_earth, state == PlanetState::Temperate);
        }
    }

    #[test]
    fn where_there_are_no_latitudes_it_is_said_why() {
        let bare = PlanetSpecification { name: "Bare".to_owned(), ..PlanetSpecification::default() };
        let deep = Water { water_oceans: 300.0, ..Water::default() };
        let steaming = PlanetSpecification { water: Some(deep), ..wet(0.5) };
        let history = history(vec![bare, steaming, wet(1.0)]);
        let why = |index, age_yr| history.climate_at(index, age_yr).expect("a planet").latitudes.err();
        assert_eq!(why(0, 4.57e9), Some(NoLatitudes::HeldGreenhouse));
        assert_eq!(why(1, 1e9), Some(NoLatitudes::Steam));
        assert_eq!(why(2, 0.0), Some(NoLatitudes::NoOceanYet));
        assert_eq!(why(1, 1e11), Some(NoLatitudes::NoOrbit));
        assert_eq!(history.thresholds_at(0, 4.57e9), None);
        assert_eq!(history.climate_at(3, 4.57e9), None);
    }
}
