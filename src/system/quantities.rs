//! Every figure of a moment as one row: key, name, unit, digits, method, and how to read it.
//!
//! Panels, tables, curves and files walk these rows, so that a figure has one name, one unit and
//! one source everywhere.

use super::light_quantities::{PLANET_LIGHT, STAR_LIGHT};
use super::moment::{PlanetMoment, StarMoment};

/// One figure of the star.
#[derive(Debug)]
pub struct StarQuantity {
    /// Key with unit suffix, for files.
    pub key: &'static str,
    /// Name for people.
    pub name: &'static str,
    /// Unit symbol; empty when dimensionless.
    pub symbol: &'static str,
    /// Significant digits for people.
    pub digits: usize,
    /// Key of the method in [`super::provenance::METHODS`].
    pub method: &'static str,
    /// Reads the value.
    pub value: fn(&StarMoment) -> Option<f64>,
    /// Typical spread of the method as a fraction of the value at this moment, where one is published.
    pub spread: fn(&StarMoment) -> Option<f64>,
}

/// One figure of a planet.
#[derive(Debug)]
pub struct PlanetQuantity {
    /// Key with unit suffix, for files.
    pub key: &'static str,
    /// Name for people.
    pub name: &'static str,
    /// Unit symbol; empty when dimensionless.
    pub symbol: &'static str,
    /// Significant digits for people.
    pub digits: usize,
    /// Key of the method in [`super::provenance::METHODS`].
    pub method: &'static str,
    /// Reads the value.
    pub value: fn(&PlanetMoment) -> Option<f64>,
}

/// Published agreement of the fits with the models they were made from: 5 % in luminosity and radius
/// (Hurley, Pols & Tout 2000, section 5). White dwarfs and dark remnants have no such figure.
const FIT_SPREAD: f64 = 0.05;

/// Agreement of computed red dwarfs with Baraffe et al. 2015 (A&A 577, A42) at 5 Gyr: luminosity, radius, temperature.
const RED_DWARF_SPREADS: [f64; 3] = [0.06, 0.02, 0.02];

/// The same where surfaces are as opaque as in 1997: how far Laughlin, Bodenheimer & Adams 1997 (Astrophys. J. 482, 420)
/// are from Baraffe et al. 2015 for 0.10 solar masses: log L −3.38 and −3.06, temperature 2228 K and 2811 K.
const OLD_SURFACE_SPREADS: [f64; 3] = [0.52, 0.11, 0.21];

/// Spread of luminosity (0), radius (1) or temperature (2).
fn spread(star: &StarMoment, of_fits: f64, figure: usize) -> Option<f64> {
    let spread = match star.interior {
        None => of_fits,
        Some(_) if star.has_old_surface => OLD_SURFACE_SPREADS[figure],
        Some(_) => RED_DWARF_SPREADS[figure],
    };
    (!star.phase.is_remnant()).then_some(spread)
}

fn luminosity_spread(star: &StarMoment) -> Option<f64> {
    spread(star, FIT_SPREAD, 0)
}

fn radius_spread(star: &StarMoment) -> Option<f64> {
    spread(star, FIT_SPREAD, 1)
}

/// T goes as L^¼ R^−½, so two independent spreads of 5 % make 2.8 %.
fn temperature_spread(star: &StarMoment) -> Option<f64> {
    spread(star, FIT_SPREAD * (1.0_f64 / 16.0 + 1.0 / 4.0).sqrt(), 2)
}

fn no_spread(_: &StarMoment) -> Option<f64> {
    None
}

/// The star's figures, in reading order.
pub const STAR: &[StarQuantity] = &[
    StarQuantity {
        key: "luminosity_lsun",
        name: "Luminosity",
        symbol: "L☉",
        digits: 4,
        method: "star_life",
        value: |star| star.luminosity_lsun,
        spread: luminosity_spread,
    },
    StarQuantity {
        key: "radius_rsun",
        name: "Radius",
        symbol: "R☉",
        digits: 4,
        method: "star_life",
        value: |star| star.radius_rsun,
        spread: radius_spread,
    },
    StarQuantity {
        key: "effective_temperature_k",
        name: "Temperature",
        symbol: "K",
        digits: 4,
        method: "effective_temperature",
        value: |star| star.effective_temperature_k,
        spread: temperature_spread,
    },
    StarQuantity {
        key: "mass_msun",
        name: "Mass",
        symbol: "M☉",
        digits: 4,
        method: "star_winds",
        value: |star| Some(star.mass_msun),
        spread: no_spread,
    },
    StarQuantity {
        key: "core_mass_msun",
        name: "Core mass",
        symbol: "M☉",
        digits: 4,
        method: "star_life",
        value: |star| star.core_mass_msun.filter(|mass_msun| *mass_msun > 0.0),
        spread: no_spread,
    },
    StarQuantity {
        key: "core_hydrogen_fraction",
        name: "Core hydrogen",
        symbol: "",
        digits: 3,
        method: "core_hydrogen",
        value: |star| star.core_hydrogen_fraction,
        spread: no_spread,
    },
    StarQuantity {
        key: "mean_hydrogen_fraction",
        name: "Mean hydrogen",
        symbol: "",
        digits: 3,
        method: "red_dwarf",
        value: |star| star.interior.map(|interior| interior.mean_hydrogen_fraction),
        spread: no_spread,
    },
    StarQuantity {
        key: "core_helium3_fraction",
        name: "Core He-3",
        symbol: "",
        digits: 2,
        method: "red_dwarf",
        value: |star| star.interior.map(|interior| interior.core_helium3_fraction),
        spread: no_spread,
    },
    StarQuantity {
        key: "core_temperature_k",
        name: "Core temp.",
        symbol: "K",
        digits: 3,
        method: "red_dwarf",
        value: |star| star.interior.map(|interior| interior.core_temperature_k),
        spread: no_spread,
    },
    StarQuantity {
        key: "core_density_g_cm3",
        name: "Core density",
        symbol: "g/cm³",
        digits: 3,
        method: "red_dwarf",
        value: |star| star.interior.map(|interior| interior.core_density_g_cm3),
        spread: no_spread,
    },
    StarQuantity {
        key: "core_degeneracy_ratio",
        name: "Degeneracy",
        symbol: "",
        digits: 3,
        method: "degeneracy",
        value: |star| star.interior.map(|interior| interior.core_degeneracy_ratio),
        spread: no_spread,
    },
    StarQuantity {
        key: "mixed_mass_fraction",
        name: "Mixed share",
        symbol: "",
        digits: 2,
        method: "red_dwarf",
        value: |star| star.interior.map(|interior| interior.mixed_mass_fraction),
        spread: no_spread,
    },
    StarQuantity {
        key: "contraction_yr",
        name: "Contraction",
        symbol: "yr",
        digits: 2,
        method: "contraction",
        value: |star| star.contraction_yr,
        spread: no_spread,
    },
    StarQuantity {
        key: "mass_loss_msun_yr",
        name: "Wind",
        symbol: "M☉/yr",
        digits: 2,
        method: "star_winds",
        value: |star| Some(star.mass_loss_msun_yr),
        spread: no_spread,
    },
    StarQuantity {
        key: "peak_wavelength_nm",
        name: "Peak of light",
        symbol: "nm",
        digits: 3,
        method: "blackbody",
        value: |star| star.peak_wavelength_nm,
        spread: no_spread,
    },
    StarQuantity {
        key: "habitable_zone_inner_au",
        name: "Habitable from",
        symbol: "au",
        digits: 3,
        method: "habitable_zone",
        value: |star| star.habitable_zone_au.map(|zone_au| zone_au[0]),
        spread: no_spread,
    },
    StarQuantity {
        key: "habitable_zone_outer_au",
        name: "Habitable to",
        symbol: "au",
        digits: 3,
        method: "habitable_zone",
        value: |star| star.habitable_zone_au.map(|zone_au| zone_au[1]),
        spread: no_spread,
    },
];

/// A planet's figures, in reading order.
pub const PLANET: &[PlanetQuantity] = &[
    PlanetQuantity {
        key: "surface_temperature_k",
        name: "Surface",
        symbol: "K",
        digits: 4,
        method: "surface_temperature",
        value: |planet| planet.surface_temperature_k,
    },
    PlanetQuantity {
        key: "surface_hotter_than_k",
        name: "Surface above",
        symbol: "K",
        digits: 4,
        method: "steam",
        value: |planet| planet.surface_hotter_than_k,
    },
    PlanetQuantity {
        key: "ice_fraction",
        name: "Ice cover",
        symbol: "",
        digits: 2,
        method: "climate",
        value: |planet| planet.ice_fraction,
    },
    PlanetQuantity {
        key: "ice_line_deg",
        name: "Ice line",
        symbol: "°",
        digits: 3,
        method: "climate",
        value: |planet| planet.ice_line_deg,
    },
    PlanetQuantity {
        key: "carbon_dioxide_bar",
        name: "CO₂",
        symbol: "bar",
        digits: 2,
        method: "carbon_dioxide",
        value: |planet| planet.carbon_dioxide_bar,
    },
    PlanetQuantity {
        key: "planetary_albedo",
        name: "Climate albedo",
        symbol: "",
        digits: 3,
        method: "climate",
        value: |planet| planet.planetary_albedo,
    },
    PlanetQuantity {
        key: "water_oceans",
        name: "Water, oceans",
        symbol: "",
        digits: 2,
        method: "water_loss",
        value: |planet| planet.water_oceans,
    },
    PlanetQuantity {
        key: "equilibrium_temperature_k",
        name: "Equilibrium",
        symbol: "K",
        digits: 4,
        method: "equilibrium_temperature",
        value: |planet| planet.equilibrium_temperature_k,
    },
    PlanetQuantity {
        key: "insolation_earth",
        name: "Insolation",
        symbol: "S⊕",
        digits: 4,
        method: "insolation",
        value: |planet| planet.insolation_earth,
    },
    PlanetQuantity {
        key: "semi_major_axis_au",
        name: "Semi-major axis",
        symbol: "au",
        digits: 4,
        method: "orbit",
        value: |planet| planet.semi_major_axis_au,
    },
    PlanetQuantity {
        key: "eccentricity",
        name: "Eccentricity",
        symbol: "",
        digits: 3,
        method: "orbit",
        value: |planet| planet.eccentricity,
    },
    PlanetQuantity {
        key: "period_yr",
        name: "Period",
        symbol: "yr",
        digits: 4,
        method: "period",
        value: |planet| planet.period_yr,
    },
    PlanetQuantity {
        key: "star_angular_diameter_deg",
        name: "Star in its sky",
        symbol: "°",
        digits: 3,
        method: "angular_diameter",
        value: |planet| planet.star_angular_diameter_deg,
    },
    PlanetQuantity {
        key: "high_energy_w_m2",
        name: "X-ray and EUV",
        symbol: "W/m²",
        digits: 2,
        method: "high_energy",
        value: |planet| planet.high_energy_w_m2,
    },
    PlanetQuantity {
        key: "shoreline_ratio",
        name: "Air shoreline",
        symbol: "",
        digits: 2,
        method: "shoreline",
        value: |planet| planet.shoreline_ratio,
    },
    PlanetQuantity {
        key: "surface_gravity_m_s2",
        name: "Gravity",
        symbol: "m/s²",
        digits: 3,
        method: "gravity",
        value: |planet| planet.surface_gravity_m_s2,
    },
    PlanetQuantity {
        key: "escape_speed_km_s",
        name: "Escape speed",
        symbol: "km/s",
        digits: 3,
        method: "escape_speed",
        value: |planet| planet.escape_speed_km_s,
    },
    PlanetQuantity {
        key: "jeans_hydrogen_ratio",
        name: "Hold on H",
        symbol: "",
        digits: 3,
        method: "jeans",
        value: |planet| planet.jeans_hydrogen_ratio,
    },
    PlanetQuantity {
        key: "jeans_nitrogen_ratio",
        name: "Hold on N₂",
        symbol: "",
        digits: 3,
        method: "jeans",
        value: |planet| planet.jeans_nitrogen_ratio,
    },
];

/// A star's quantity by key.
#[must_use]
pub fn star_quantity(key: &str) -> Option<&'static StarQuantity> {
    STAR.iter().find(|quantity| quantity.key == key)
}

/// A planet's quantity by key.
#[must_use]
pub fn planet_quantity(key: &str) -> Option<&'static PlanetQuantity> {
    PLANET.iter().find(|quantity| quantity.key == key)
}

/// The name for people of any figure of the star, those of its light included.
#[must_use]
pub fn star_figure_name(key: &str) -> Option<&'static str> {
    let light = || STAR_LIGHT.iter().find(|quantity| quantity.key == key).map(|quantity| quantity.name);
    star_quantity(key).map(|quantity| quantity.name).or_else(light)
}

/// The name for people of any figure of a planet, those of its light included.
#[must_use]
pub fn planet_figure_name(key: &str) -> Option<&'static str> {
    let light = || PLANET_LIGHT.iter().find(|quantity| quantity.key == key).map(|quantity| quantity.name);
    planet_quantity(key).map(|quantity| quantity.name).or_else(light)
}

/// Key and name of every figure that a method gives.
pub fn figures_of(method: &'static str) -> impl Iterator<Item = (&'static str, &'static str)> {
    let star = STAR.iter().map(|row| (row.method, row.key, row.name));
    let star_light = STAR_LIGHT.iter().map(|row| (row.method, row.key, row.name));
    let planet = PLANET.iter().map(|row| (row.method, row.key, row.name));
    let planet_light = PLANET_LIGHT.iter().map(|row| (row.method, row.key, row.name));
    let all = star.chain(star_light).chain(planet).chain(planet_light);
    all.filter(move |(of, _, _)| *of == method).map(|(_, key, name)| (key, name))
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::system::provenance::method;

    #[test]
    fn every_figure_has_a_method_with_a_source() {
        for key in STAR.iter().map(|quantity| quantity.method).chain(PLANET.iter().map(|quantity| quantity.method)) {
            assert!(method(key).is_some_and(|method| !method.source.is_empty()), "{key}");
        }
    }

    #[test]
    fn keys_are_found_and_unique() {
        for (index, quantity) in STAR.iter().enumerate() {
            assert!(STAR[..index].iter().all(|other| other.key != quantity.key));
            assert!(star_quantity(quantity.key).is_some());
        }
        assert!(planet_quantity("insolation_earth").is_some());
        assert!(planet_quantity("luminosity_lsun").is_none());
    }
}
