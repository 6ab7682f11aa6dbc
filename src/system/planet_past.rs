//! One planet carried along its star's life.

use super::moment::{PlanetMoment, PlanetState};
use super::specification::PlanetSpecification;
use crate::physics::planet::deep_time::InnerHeat;
use crate::physics::planet::habitable_zone::zone_place;
use crate::physics::planet::{OrbitEnd, OrbitHistory, OrbitInput, StarPoint, irradiation, orbit, transit};
use crate::physics::star::StarState;
use crate::units::constants::SOLAR_CONSTANT_W_M2;

/// Freezing point of water at 1 bar, K. Common practice.
pub const FREEZING_K: f64 = 273.15;
/// Boiling point of water at 1 bar, K. Common practice.
pub const BOILING_K: f64 = 373.15;

/// A planet with its whole orbit history.
#[derive(Debug)]
pub struct PlanetPast {
    specification: PlanetSpecification,
    /// `None` only when the walk refused its input, which checked systems never cause.
    orbit: Option<OrbitHistory>,
}

impl PlanetPast {
    /// Carries a planet along the star's nodes.
    #[must_use]
    pub fn walk(specification: PlanetSpecification, points: &[StarPoint]) -> Self {
        let input = OrbitInput {
            semi_major_axis_au: specification.semi_major_axis_au,
            eccentricity: specification.eccentricity,
            mass_mearth: specification.mass_mearth,
            radius_rearth: specification.radius_rearth,
        };
        Self { orbit: OrbitHistory::walk(&input, points).ok(), specification }
    }

    /// The planet's inputs.
    #[must_use]
    pub fn specification(&self) -> &PlanetSpecification {
        &self.specification
    }

    /// When and how the orbit ends, if it does.
    #[must_use]
    pub fn end(&self) -> Option<(f64, OrbitEnd)> {
        self.orbit.as_ref().and_then(OrbitHistory::end)
    }

    /// The planet's state at an age for the star's state at that age.
    #[must_use]
    pub fn moment(&self, time_yr: f64, star: &StarState) -> PlanetMoment {
        let axis_au = self.orbit.as_ref().and_then(|orbit| orbit.semi_major_axis_au_at(time_yr));
        let eccentricity = self.orbit.as_ref().and_then(|orbit| orbit.eccentricity_at(time_yr));
        let mut moment = PlanetMoment {
            name: self.specification.name.clone(),
            state: PlanetState::Dark,
            semi_major_axis_au: axis_au,
            eccentricity,
            period_yr: axis_au.and_then(|axis_au| {
                orbit::period_yr(axis_au, star.mass_msun, self.specification.mass_mearth).ok()
            }),
            insolation_earth: None,
            equilibrium_temperature_k: None,
            surface_temperature_k: None,
            star_angular_diameter_deg: None,
            zone: None,
        };
        match (axis_au, eccentricity, self.end()) {
            (Some(axis_au), Some(eccentricity), _) => self.light_the_planet(&mut moment, axis_au, eccentricity, star),
            (_, _, Some((_, OrbitEnd::Unbound))) => {
                moment.state = PlanetState::Unbound;
                moment.equilibrium_temperature_k = Some(0.0);
                moment.surface_temperature_k = floor_k(0.0, time_yr);
                moment.insolation_earth = Some(0.0);
            }
            _ => moment.state = PlanetState::Engulfed,
        }
        moment
    }

    fn light_the_planet(&self, moment: &mut PlanetMoment, axis_au: f64, eccentricity: f64, star: &StarState) {
        moment.star_angular_diameter_deg = transit::angular_diameter_deg(star.radius_rsun, axis_au).ok();
        if star.phase.is_dark() {
            return;
        }
        let planet = &self.specification;
        let insolation = irradiation::orbit_mean_insolation_earth(star.luminosity_lsun, axis_au, eccentricity).ok();
        moment.insolation_earth = insolation;
        moment.equilibrium_temperature_k = insolation.and_then(|insolation| {
            irradiation::equilibrium_temperature_k(
                insolation * SOLAR_CONSTANT_W_M2,
                planet.bond_albedo,
                planet.redistribution.factor(),
                planet.emissivity,
            )
            .ok()
        });
        moment.surface_temperature_k = moment
            .equilibrium_temperature_k
            .and_then(|equilibrium_k| planet.greenhouse.surface_temperature_k(equilibrium_k).ok())
            .and_then(|surface_k| floor_k(surface_k, star.age_yr));
        moment.zone = insolation.and_then(|insolation| {
            zone_place(insolation, star.effective_temperature_k, planet.mass_mearth).ok()
        });
        moment.state = match moment.surface_temperature_k {
            Some(surface_k) if surface_k < FREEZING_K => PlanetState::Frozen,
            Some(surface_k) if surface_k <= BOILING_K => PlanetState::Temperate,
            Some(_) => PlanetState::TooHot,
            None => PlanetState::Dark,
        };
    }
}

/// Adds inner heat and the cosmic background.
fn floor_k(from_star_k: f64, time_yr: f64) -> Option<f64> {
    InnerHeat::default().with_floor_k(from_star_k, time_yr).ok()
}
