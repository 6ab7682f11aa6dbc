//! What a person says about a system: the inputs, and what can be wrong with them.

use super::air::Air;
use super::limits::{self, Limit, OutOfLimit};
use super::planet_choices::{TidesChoice, Water};
use crate::physics::planet::{Greenhouse, Redistribution};
use crate::physics::star::convective::SurfaceOpacity;
use thiserror::Error;

/// A star with its planets, as the user describes them at the star's arrival on the main sequence.
#[derive(Clone, Debug, PartialEq)]
pub struct System {
    /// The star.
    pub star: StarSpecification,
    /// The planets, in the user's order.
    pub planets: Vec<PlanetSpecification>,
}

/// The inputs of a star.
#[derive(Clone, Debug, PartialEq)]
pub struct StarSpecification {
    /// Name for people.
    pub name: String,
    /// Mass on arrival at the main sequence, solar masses.
    pub mass_msun: f64,
    /// Metallicity [Fe/H], dex.
    pub metallicity_dex: f64,
    /// Age at the moment called now, yr since arrival on the main sequence.
    pub present_age_yr: f64,
    /// How opaque the surface is, if the star is a red dwarf.
    pub red_dwarf_surface: SurfaceOpacity,
}

/// Every surface a red dwarf can be given, in the order they are offered.
pub const RED_DWARF_SURFACES: [SurfaceOpacity; 2] = [SurfaceOpacity::Modern, SurfaceOpacity::Of1997];

/// A surface in words for people.
#[must_use]
pub fn surface_name(surface: SurfaceOpacity) -> &'static str {
    match surface {
        SurfaceOpacity::Modern => "modern",
        SurfaceOpacity::Of1997 => "as in 1997",
    }
}

/// The inputs of a planet.
#[derive(Clone, Debug, PartialEq)]
pub struct PlanetSpecification {
    /// Name for people, unique in its system.
    pub name: String,
    /// Semi-major axis at the star's arrival on the main sequence, au.
    pub semi_major_axis_au: f64,
    /// Orbital eccentricity, dimensionless.
    pub eccentricity: f64,
    /// Mass, Earth masses.
    pub mass_mearth: f64,
    /// Radius, Earth radii.
    pub radius_rearth: f64,
    /// Bond albedo, dimensionless.
    pub bond_albedo: f64,
    /// How the absorbed light is spread over the globe.
    pub redistribution: Redistribution,
    /// Infrared emissivity, dimensionless.
    pub emissivity: f64,
    /// Greenhouse effect, held fixed; of a planet with a climate, the one it has when its water is gone.
    pub greenhouse: Greenhouse,
    /// Clear air that makes the sky, held fixed.
    pub air: Air,
    /// Surface water whose climate answers to the star; `None` where the greenhouse effect alone counts.
    pub water: Option<Water>,
    /// Whether tides change the orbit.
    pub tides: TidesChoice,
    /// Length of the first day, h; the usual one for the planet's mass where nothing is said.
    pub initial_day_h: Option<f64>,
    /// A mean surface temperature whose first and last moment are dated, K.
    pub marked_temperature_k: Option<f64>,
}

/// Where in a system a problem sits.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Body {
    /// The star.
    Star,
    /// The planet with this index, counted from 0.
    Planet(usize),
}

/// Something a system may not hold.
#[derive(Clone, Debug, PartialEq)]
pub struct SystemProblem {
    /// The body it is about.
    pub body: Body,
    /// The key of the field it is about, such as `bond_albedo`.
    pub key: &'static str,
    /// What is wrong.
    pub fault: Fault,
}

/// What can be wrong with one input.
#[derive(Clone, Debug, Error, PartialEq)]
pub enum Fault {
    /// A number outside its range.
    #[error(transparent)]
    OutOfLimit(#[from] OutOfLimit),
    /// A body without a name.
    #[error("name is empty, allowed 1 to {} characters", limits::LONGEST_NAME)]
    NoName,
    /// A name too long or with a control character in it.
    #[error(
        "name is {length} characters long or holds control characters, allowed 1 to {} printable characters",
        limits::LONGEST_NAME
    )]
    BadName {
        /// Its length in characters.
        length: usize,
    },
    /// Two planets of one name.
    #[error("name is \"{name}\" a second time, allowed once; give each planet a name of its own")]
    NameTwice {
        /// The name.
        name: String,
    },
    /// More planets than a system may hold.
    #[error("there are {count} planets, allowed at most {}", limits::MOST_PLANETS)]
    TooManyPlanets {
        /// How many there are.
        count: usize,
    },
}

impl System {
    /// Everything that is wrong, in reading order; empty for a system that can be computed.
    #[must_use]
    pub fn problems(&self) -> Vec<SystemProblem> {
        let mut found = Vec::new();
        let mut note = |body, key, fault| found.push(SystemProblem { body, key, fault });
        let star = &self.star;
        if let Some(fault) = name_fault(&star.name) {
            note(Body::Star, "name", fault);
        }
        for (limit, value) in star.inputs() {
            if let Err(error) = limit.check(value) {
                note(Body::Star, limit.key, error.into());
            }
        }
        if self.planets.len() > limits::MOST_PLANETS {
            note(Body::Star, "planets", Fault::TooManyPlanets { count: self.planets.len() });
        }
        for (index, planet) in self.planets.iter().enumerate() {
            let body = Body::Planet(index);
            if let Some(fault) = name_fault(&planet.name) {
                note(body, "name", fault);
            } else if self.planets[..index].iter().any(|earlier| earlier.name == planet.name) {
                note(body, "name", Fault::NameTwice { name: planet.name.clone() });
            }
            for (limit, value) in planet.inputs() {
                if let Err(error) = limit.check(value) {
                    note(body, limit.key, error.into());
                }
            }
        }
        found
    }

    /// A name for one more planet that no planet bears yet.
    #[must_use]
    pub fn free_planet_name(&self, wanted: &str) -> String {
        let taken = |name: &str| self.planets.iter().any(|planet| planet.name == name);
        if !taken(wanted) {
            return wanted.to_owned();
        }
        let stem: String = wanted.chars().take(limits::LONGEST_NAME - 4).collect();
        let stem = stem.trim_end_matches(|character: char| character.is_ascii_digit()).trim_end();
        let stem = if stem.is_empty() { "Planet" } else { stem };
        // One of these is free: there are more of them than planets.
        (2..=self.planets.len() + 2)
            .map(|count| format!("{stem} {count}"))
            .find(|name| !taken(name))
            .unwrap_or_else(|| wanted.to_owned())
    }
}

impl StarSpecification {
    /// Every number of the star with its limit.
    #[must_use]
    pub fn inputs(&self) -> [(&'static Limit, f64); 3] {
        [
            (&limits::STAR_MASS, self.mass_msun),
            (&limits::METALLICITY, self.metallicity_dex),
            (&limits::PRESENT_AGE, self.present_age_yr),
        ]
    }
}

impl Default for StarSpecification {
    fn default() -> Self {
        Self {
            name: "Star".to_owned(),
            mass_msun: 1.0,
            metallicity_dex: 0.0,
            present_age_yr: 4.57e9,
            red_dwarf_surface: SurfaceOpacity::Modern,
        }
    }
}

impl PlanetSpecification {
    /// Every number of the planet with its limit; those of greenhouse, air and water only where there is one.
    #[must_use]
    pub fn inputs(&self) -> Vec<(&'static Limit, f64)> {
        let mut inputs = vec![
            (&limits::SEMI_MAJOR_AXIS, self.semi_major_axis_au),
            (&limits::ECCENTRICITY, self.eccentricity),
            (&limits::PLANET_MASS, self.mass_mearth),
            (&limits::PLANET_RADIUS, self.radius_rearth),
            (&limits::BOND_ALBEDO, self.bond_albedo),
            (&limits::EMISSIVITY, self.emissivity),
        ];
        match self.greenhouse {
            Greenhouse::None => {}
            Greenhouse::FixedIncrement { increment_k } => inputs.push((&limits::GREENHOUSE_INCREMENT, increment_k)),
            Greenhouse::Grey { optical_depth } => inputs.push((&limits::OPTICAL_DEPTH, optical_depth)),
        }
        inputs.extend(self.air.surface_pressure_bar().map(|pressure_bar| (&limits::SURFACE_PRESSURE, pressure_bar)));
        inputs.extend(self.water.iter().flat_map(Water::inputs));
        inputs.extend(self.initial_day_h.map(|day_h| (&limits::INITIAL_DAY, day_h)));
        inputs.extend(self.marked_temperature_k.map(|marked_k| (&limits::MARKED_TEMPERATURE, marked_k)));
        inputs
    }
}

impl Default for PlanetSpecification {
    fn default() -> Self {
        Self {
            name: "Planet".to_owned(),
            semi_major_axis_au: 1.0,
            eccentricity: 0.0,
            mass_mearth: 1.0,
            radius_rearth: 1.0,
            bond_albedo: 0.3,
            redistribution: Redistribution::WholePlanet,
            emissivity: 1.0,
            greenhouse: Greenhouse::None,
            air: Air::default(),
            water: None,
            tides: TidesChoice::On,
            initial_day_h: None,
            marked_temperature_k: None,
        }
    }
}

fn name_fault(name: &str) -> Option<Fault> {
    let length = name.chars().count();
    if name.trim().is_empty() {
        Some(Fault::NoName)
    } else if length > limits::LONGEST_NAME || name.chars().any(char::is_control) {
        Some(Fault::BadName { length })
    } else {
        None
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn system() -> System {
        System { star: StarSpecification::default(), planets: vec![PlanetSpecification::default()] }
    }

    #[test]
    fn the_defaults_are_sound() {
        assert!(system().problems().is_empty());
    }

    #[test]
    fn every_problem_is_found_at_once() {
        let mut bad = system();
        bad.star.mass_msun = -1.0;
        bad.star.name = String::new();
        bad.planets[0].bond_albedo = 1.4;
        bad.planets.push(bad.planets[0].clone());
        let keys: Vec<_> = bad.problems().iter().map(|problem| (problem.body, problem.key)).collect();
        let second = Body::Planet(1);
        assert_eq!(
            keys,
            [
                (Body::Star, "name"),
                (Body::Star, "mass_msun"),
                (Body::Planet(0), "bond_albedo"),
                (second, "name"),
                (second, "bond_albedo"),
            ]
        );
    }

    #[test]
    fn a_free_name_counts_on() {
        let mut system = system();
        assert_eq!(system.free_planet_name("Planet"), "Planet 2");
        system.planets.push(PlanetSpecification { name: "Planet 2".to_owned(), ..PlanetSpecification::default() });
        assert_eq!(system.free_planet_name("Planet 2"), "Planet 3");
        assert_eq!(system.free_planet_name("Ember"), "Ember");
    }
}
