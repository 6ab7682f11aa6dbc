//! A figure of one body at any age.

use super::quantity::FigureKey;
use crate::physics::light::{ClearAir, VisibleSpectrum};
use crate::system::history::{History, held};
use crate::system::light_quantities::{PLANET_LIGHT, STAR_LIGHT};
use crate::system::moment::{PlanetMoment, StarMoment};
use crate::system::planet_light::{PlanetLight, USUAL_ALTITUDE_DEG, clear_air};
use crate::system::quantities::{planet_quantity, star_quantity};
use crate::system::specification::Body;
use crate::system::starlight::Starlight;

/// A figure that was read.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct Reading {
    /// Its value, in the unit of its key.
    pub(super) value: f64,
    /// Only this is known: the figure is above the value.
    pub(super) is_bound: bool,
}

/// Reads figures of one body.
pub(super) struct Reader<'h> {
    pub(super) history: &'h History,
    pub(super) body: Body,
    air: Option<ClearAir>,
}

impl<'h> Reader<'h> {
    pub(super) fn new(history: &'h History, body: Body) -> Self {
        let air = match body {
            Body::Star => None,
            Body::Planet(index) => {
                history.system().planets.get(index).and_then(|planet| clear_air(planet, USUAL_ALTITUDE_DEG, true))
            }
        };
        Self { history, body, air }
    }

    /// The star at an age.
    pub(super) fn star(&self, age_yr: f64) -> StarMoment {
        let time_yr = held(age_yr);
        StarMoment::new(&self.history.star_at(time_yr), self.history.life().interior_at(time_yr))
    }

    /// The body at an age, where it is a planet.
    pub(super) fn planet(&self, age_yr: f64) -> Option<PlanetMoment> {
        match self.body {
            Body::Star => None,
            Body::Planet(index) => self.history.planet_at(index, age_yr),
        }
    }

    /// The figure at an age; none where it does not apply or is not modelled.
    pub(super) fn at(&self, key: FigureKey, age_yr: f64) -> Option<Reading> {
        let value = match self.body {
            Body::Star => self.star_value(key, age_yr),
            Body::Planet(_) => {
                let planet = self.planet(age_yr)?;
                if key == "surface_temperature_k" && planet.surface_temperature_k.is_none() {
                    return planet.surface_hotter_than_k.map(|value| Reading { value, is_bound: true });
                }
                self.planet_value(key, age_yr, &planet)
            }
        };
        value.filter(|value| value.is_finite()).map(|value| Reading { value, is_bound: false })
    }

    fn star_value(&self, key: FigureKey, age_yr: f64) -> Option<f64> {
        let star = self.star(age_yr);
        if let Some(quantity) = star_quantity(key) {
            return (quantity.value)(&star);
        }
        let chromaticity = || star.swatch.as_ref()?.chromaticity;
        match key {
            "colour_x" => chromaticity().map(|[x, _]| x),
            "colour_y" => chromaticity().map(|[_, y]| y),
            _ => {
                let quantity = STAR_LIGHT.iter().find(|quantity| quantity.key == key)?;
                (quantity.value)(&Starlight::of(&star)?)
            }
        }
    }

    fn planet_value(&self, key: FigureKey, age_yr: f64, planet: &PlanetMoment) -> Option<f64> {
        if let Some(quantity) = planet_quantity(key) {
            return (quantity.value)(planet);
        }
        let quantity = PLANET_LIGHT.iter().find(|quantity| quantity.key == key)?;
        let star = self.star(age_yr);
        let starlight = Starlight::of(&star)?;
        let spectrum = VisibleSpectrum::of_blackbody(starlight.temperature_k).ok()?;
        (quantity.value)(&PlanetLight::of(&star, &starlight, &spectrum, planet, self.air.as_ref())?)
    }

    /// Why there is no figure at an age, as a clause.
    pub(super) fn why_none(&self, age_yr: f64) -> String {
        match self.planet(age_yr) {
            Some(planet) if !planet.state.orbits() => {
                format!("{} is {} then", planet.name, planet.state.name())
            }
            Some(planet) => {
                format!("the model has no such figure then, when {} is {}", planet.name, planet.state.name())
            }
            None => {
                let phase = self.history.star_at(held(age_yr)).phase.name();
                format!("the model has no such figure then, in the phase \"{phase}\"")
            }
        }
    }
}
