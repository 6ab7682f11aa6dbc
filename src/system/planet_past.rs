//! One planet carried along its star's life.

use super::history::star_point;
use super::moment::{PlanetMoment, PlanetState};
use super::specification::PlanetSpecification;
use crate::physics::planet::bulk::{escape_speed_km_s, gravity_m_s2, jeans_parameter};
use crate::physics::planet::climate::ClimateTables;
use crate::physics::planet::deep_time::InnerHeat;
use crate::physics::planet::history::SurfaceTemperature;
use crate::physics::planet::tides::Spin;
use crate::physics::planet::{
    ClimateState, OrbitEnd, OrbitInput, OutOfRange, PlanetHistory, PlanetInput, PlanetMoment as Reading, StarPoint,
    escape, irradiation, transit,
};
use crate::physics::star::StarState;
use crate::units::constants::SOLAR_CONSTANT_W_M2;

/// Freezing point of water at 1 bar, K. Common practice.
pub const FREEZING_K: f64 = 273.15;
/// Boiling point of water at 1 bar, K. Common practice.
pub const BOILING_K: f64 = 373.15;

/// Temperature of the upper air for the Jeans parameters, K: that of the Earth's exosphere under a middling Sun. Recalled.
const UPPER_AIR_K: f64 = 1000.0;
/// Masses of a hydrogen atom and of a nitrogen molecule over the proton's. IUPAC 2021 standard atomic weights.
const HYDROGEN_ATOM: f64 = 1.0007;
const NITROGEN_MOLECULE: f64 = 27.81;

/// A planet with its whole history: orbit, climate, water, rotation, air.
#[derive(Debug)]
pub struct PlanetPast {
    specification: PlanetSpecification,
    history: PlanetHistory,
}

impl PlanetPast {
    /// Carries a planet along the star's nodes; thresholds of its climate are taken from `tables` and kept there.
    ///
    /// # Errors
    /// [`OutOfRange`] for a planet outside what can be walked, which the limits of a checked system exclude.
    pub fn walk(
        specification: PlanetSpecification,
        points: &[StarPoint],
        tables: &mut ClimateTables,
    ) -> Result<Self, OutOfRange> {
        let history = PlanetHistory::walk_with(&input(&specification), points, tables)?;
        Ok(Self { specification, history })
    }

    /// The planet's inputs.
    #[must_use]
    pub fn specification(&self) -> &PlanetSpecification {
        &self.specification
    }

    /// Everything that has memory, as it was walked.
    #[must_use]
    pub fn history(&self) -> &PlanetHistory {
        &self.history
    }

    /// When and how the orbit ends, if it does.
    #[must_use]
    pub fn end(&self) -> Option<(f64, OrbitEnd)> {
        self.history.orbit().end()
    }

    /// The mean surface temperature under the greenhouse that the user holds, K, for a star at an age: what a planet
    /// without a climate of its own has. `None` after the end of the orbit and beside a star whose light is not known.
    #[must_use]
    pub fn held_surface_k(&self, star: &StarState) -> Option<f64> {
        let place = self.history.orbit().at(star.age_yr).filter(|_| !star.phase.is_dark())?;
        let planet = &self.specification;
        let insolation = irradiation::orbit_mean_insolation_earth(
            star.luminosity_lsun,
            place.semi_major_axis_au,
            place.eccentricity,
        )
        .ok()?;
        let from_star_k = irradiation::equilibrium_temperature_k(
            insolation * SOLAR_CONSTANT_W_M2,
            planet.bond_albedo,
            planet.redistribution.factor(),
            planet.emissivity,
        );
        let equilibrium_k = floor_k(from_star_k.ok()?, star.age_yr)?;
        planet.greenhouse.surface_temperature_k(equilibrium_k).ok()
    }

    /// Whether the surface at an age answers to the climate model rather than to a greenhouse that is held.
    #[must_use]
    pub fn has_climate_at(&self, age_yr: f64) -> bool {
        self.history.climate_state_at(age_yr).is_some_and(|state| state != ClimateState::Dry)
    }

    /// The orbit under every assumption on tides at an age: least and greatest semi-major axis, au, of those that
    /// still have the planet on an orbit.
    #[must_use]
    pub fn orbit_range_au(&self, age_yr: f64) -> Option<[f64; 2]> {
        let histories =
            [self.history.orbit(), self.history.orbit_without_tides(), self.history.orbit_by_second_opinion()];
        histories.into_iter().filter_map(|orbit| orbit.semi_major_axis_au_at(age_yr)).fold(None, |range, axis_au| {
            let [low, high] = range.unwrap_or([axis_au, axis_au]);
            Some([low.min(axis_au), high.max(axis_au)])
        })
    }

    /// The planet's state at an age for the star's state at that age.
    #[must_use]
    pub fn moment(&self, time_yr: f64, star: &StarState) -> PlanetMoment {
        let mut moment = PlanetMoment::nothing(self.specification.name.clone());
        if !matches!(self.end(), Some((end_yr, end)) if end != OrbitEnd::Unbound && time_yr >= end_yr) {
            self.fill_body(&mut moment);
        }
        // The walk has accepted every node, so a star between two of them is accepted too.
        match (self.history.at(&star_point(star, false)).ok().flatten(), self.end()) {
            (Some(reading), _) => self.fill(&mut moment, &reading, star),
            (None, Some((_, OrbitEnd::Unbound))) => {
                moment.state = PlanetState::Unbound;
                moment.equilibrium_temperature_k = Some(0.0);
                moment.surface_temperature_k = floor_k(0.0, time_yr);
                moment.insolation_earth = Some(0.0);
            }
            (None, Some((_, OrbitEnd::TornApart))) => moment.state = PlanetState::TornApart,
            (None, Some((_, OrbitEnd::Engulfed))) => moment.state = PlanetState::Engulfed,
            (None, None) => {}
        }
        moment
    }

    /// What mass and radius alone decide.
    fn fill_body(&self, moment: &mut PlanetMoment) {
        let (mass_mearth, radius_rearth) = (self.specification.mass_mearth, self.specification.radius_rearth);
        let jeans = |molecular_mass| jeans_parameter(mass_mearth, radius_rearth, molecular_mass, UPPER_AIR_K).ok();
        moment.surface_gravity_m_s2 = gravity_m_s2(mass_mearth, radius_rearth).ok();
        moment.escape_speed_km_s = escape_speed_km_s(mass_mearth, radius_rearth).ok();
        moment.jeans_hydrogen_ratio = jeans(HYDROGEN_ATOM);
        moment.jeans_nitrogen_ratio = jeans(NITROGEN_MOLECULE);
    }

    fn fill(&self, moment: &mut PlanetMoment, reading: &Reading, star: &StarState) {
        moment.semi_major_axis_au = Some(reading.semi_major_axis_au);
        moment.eccentricity = Some(reading.eccentricity);
        moment.period_yr = Some(reading.period_yr);
        moment.star_angular_diameter_deg =
            transit::angular_diameter_deg(star.radius_rsun, reading.semi_major_axis_au).ok();
        moment.lock = Some(reading.lock);
        moment.orbit_caution = self.history.orbit_caution();
        if star.phase.is_dark() {
            return;
        }
        moment.insolation_earth = Some(reading.mean_insolation_earth);
        moment.equilibrium_temperature_k = Some(reading.equilibrium_temperature_k);
        moment.zone = Some(reading.zone);
        moment.high_energy_w_m2 = reading.high_energy_w_m2;
        moment.shoreline_ratio = Some(reading.shoreline_ratio);
        moment.surface_caution = reading.surface_caution;
        match reading.surface {
            SurfaceTemperature::Known(surface_k) => moment.surface_temperature_k = Some(surface_k),
            SurfaceTemperature::HotterThan(bound_k) => moment.surface_hotter_than_k = Some(bound_k),
        }
        if let Some(climate) = &reading.climate {
            moment.water_oceans = Some(climate.water_oceans);
            moment.ice_fraction = climate.ice_fraction;
            moment.ice_line_deg = climate.ice_line_deg;
            moment.equator_pole_k = climate.equator_pole_k;
            moment.carbon_dioxide_bar = climate.carbon_dioxide_bar;
            moment.planetary_albedo = climate.planetary_albedo;
        }
        moment.state = match (reading.climate.as_ref().map(|climate| climate.state), reading.surface.value_k()) {
            (Some(ClimateState::Frozen), _) => PlanetState::Frozen,
            (Some(ClimateState::Temperate), _) => PlanetState::Temperate,
            (Some(ClimateState::Moist), _) => PlanetState::Moist,
            (Some(ClimateState::Runaway), _) => PlanetState::Runaway,
            (Some(ClimateState::Dry), _) => PlanetState::Dry,
            (None, surface_k) if surface_k < FREEZING_K => PlanetState::Frozen,
            (None, surface_k) if surface_k <= BOILING_K => PlanetState::Temperate,
            (None, _) => PlanetState::TooHot,
        };
    }
}

/// The planet as physics takes it: what nobody is asked about has its usual value.
fn input(planet: &PlanetSpecification) -> PlanetInput {
    let spin = Spin::usual(planet.mass_mearth);
    PlanetInput {
        orbit: OrbitInput {
            semi_major_axis_au: planet.semi_major_axis_au,
            eccentricity: planet.eccentricity,
            mass_mearth: planet.mass_mearth,
            radius_rearth: planet.radius_rearth,
        },
        bond_albedo: planet.bond_albedo,
        emissivity: planet.emissivity,
        redistribution: planet.redistribution,
        greenhouse: planet.greenhouse,
        inner_heat: InnerHeat::default(),
        water: planet.water.map(|water| water.world()),
        spin: Spin { initial_day_h: planet.initial_day_h.unwrap_or(spin.initial_day_h), ..spin },
        tides: planet.tides.tides(planet.mass_mearth),
        escape_efficiency: escape::USUAL_EFFICIENCY,
    }
}

/// Adds inner heat and the cosmic background.
fn floor_k(from_star_k: f64, time_yr: f64) -> Option<f64> {
    InnerHeat::default().with_floor_k(from_star_k, time_yr).ok()
}
