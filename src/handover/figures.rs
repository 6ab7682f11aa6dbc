//! The figures of a star and of a planet as keyed values, in the one order that every file uses.

use super::cell::Cell;
use super::light_figures::{planet_light_cells, planet_light_figures, star_light_cells, star_light_figures};
use crate::physics::light::Swatch;
use crate::physics::planet::habitable_zone::ZonePlace;
use crate::physics::planet::tides::LockLevel;
use crate::system::quantities::{PLANET, STAR};
use crate::system::{PlanetLight, PlanetMoment, StarMoment, Starlight};
use std::borrow::Cow;

/// A keyed figure: what it is called in files, its unit for table readers, and what it means.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) struct Figure {
    /// Key with unit suffix.
    pub(super) key: &'static str,
    /// Name for people.
    pub(super) name: &'static str,
    /// Whether it is a number.
    pub(super) is_number: bool,
}

pub(super) const fn word(key: &'static str, name: &'static str) -> Figure {
    Figure { key, name, is_number: false }
}

pub(super) const fn number(key: &'static str, name: &'static str) -> Figure {
    Figure { key, name, is_number: true }
}

/// What the star has besides its quantities: before them its phase, after them its colour.
const PHASE: Figure = word("phase", "Phase of life");
const COLOURS: [Figure; 4] = [
    word("colour_srgb_hex", "Colour on an sRGB display, black where there is no visible glow"),
    number("colour_x", "Colour, CIE 1931 x"),
    number("colour_y", "Colour, CIE 1931 y"),
    word("colour", "Colour in words"),
];
/// What a planet has besides its quantities.
const ZONE: Figure = word("habitable_zone_place", "Place in the habitable zone");
const LOCK: Figure = word("tidal_lock", "Whether it keeps one face to the star");
const STATE: Figure = word("state", "State");

/// The star's figures.
pub(super) fn star_figures() -> impl Iterator<Item = Figure> {
    std::iter::once(PHASE)
        .chain(STAR.iter().map(|quantity| number(quantity.key, quantity.name)))
        .chain(COLOURS)
        .chain(star_light_figures())
}

/// The star's values, in the order of [`star_figures`].
pub(super) fn star_cells(star: &StarMoment, light: Option<&Starlight>) -> impl Iterator<Item = Cell> {
    let chromaticity = star.swatch.as_ref().and_then(|swatch| swatch.chromaticity);
    let colours = [
        star.swatch.as_ref().map_or(Cell::Missing, |swatch: &Swatch| Cell::Text(Cow::Owned(swatch.hex()))),
        Cell::number(chromaticity.map(|[x, _]| x)),
        Cell::number(chromaticity.map(|[_, y]| y)),
        Cell::word(Some(star.colour)),
    ];
    std::iter::once(Cell::word(Some(star.phase.key())))
        .chain(STAR.iter().map(|quantity| Cell::number((quantity.value)(star))))
        .chain(colours)
        .chain(star_light_cells(light))
}

/// A planet's figures.
pub(super) fn planet_figures() -> impl Iterator<Item = Figure> {
    let words = [ZONE, LOCK, STATE];
    PLANET.iter().map(|quantity| number(quantity.key, quantity.name)).chain(words).chain(planet_light_figures())
}

/// A planet's values, in the order of [`planet_figures`].
pub(super) fn planet_cells(planet: &PlanetMoment, light: Option<&PlanetLight>) -> impl Iterator<Item = Cell> {
    let words = [
        Cell::word(planet.zone.map(ZonePlace::key)),
        Cell::word(planet.lock.map(LockLevel::key)),
        Cell::word(Some(planet.state.key())),
    ];
    PLANET.iter().map(|quantity| Cell::number((quantity.value)(planet))).chain(words).chain(planet_light_cells(light))
}

/// The unit of a key by its suffix, spelled as readers of astronomical tables expect it; empty where there is none.
///
/// # Source
/// IVOA Recommendation "Units in the VO" 1.0 (2014), from memory.
pub(super) fn unit_of(key: &str) -> &'static str {
    // Longer suffixes first: "_msun_yr" also ends in "_yr".
    const UNITS: [(&str, &str); 20] = [
        ("_msun_yr", "solMass/yr"),
        ("_msun", "solMass"),
        ("_lsun", "solLum"),
        ("_rsun", "solRad"),
        ("_nm", "nm"),
        ("_au", "AU"),
        ("_yr", "yr"),
        ("_deg", "deg"),
        ("_thz", "THz"),
        ("_umol_m2_s", "umol/(m2 s)"),
        ("_cd_m2", "cd/m2"),
        ("_g_cm3", "g/cm3"),
        ("_lm_w", "lm/W"),
        ("_km_s", "km/s"),
        ("_m_s2", "m/s2"),
        ("_w_m2", "W/m2"),
        ("_lm", "lm"),
        ("_lx", "lx"),
        ("_mag", "mag"),
        ("_bar", "bar"),
    ];
    if key.ends_with("_k") {
        return "K";
    }
    UNITS.iter().find(|(suffix, _)| key.ends_with(suffix)).map_or("", |(_, unit)| unit)
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::system::light_quantities::{PLANET_LIGHT, STAR_LIGHT};

    #[test]
    fn the_names_that_other_programs_rely_on_are_there() {
        let star: Vec<_> = star_figures().map(|figure| figure.key).collect();
        for key in [
            "phase",
            "mass_msun",
            "luminosity_lsun",
            "radius_rsun",
            "effective_temperature_k",
            "core_hydrogen_fraction",
            "colour_srgb_hex",
            "colour_x",
            "colour_y",
        ] {
            assert!(star.contains(&key), "{key}");
        }
        let planet: Vec<_> = planet_figures().map(|figure| figure.key).collect();
        for key in
            ["semi_major_axis_au", "insolation_earth", "equilibrium_temperature_k", "surface_temperature_k", "state"]
        {
            assert!(planet.contains(&key), "{key}");
        }
    }

    #[test]
    fn every_quantity_with_a_unit_has_one_in_files() {
        for (key, symbol) in STAR
            .iter()
            .map(|quantity| (quantity.key, quantity.symbol))
            .chain(PLANET.iter().map(|quantity| (quantity.key, quantity.symbol)))
            .chain(STAR_LIGHT.iter().map(|quantity| (quantity.key, quantity.symbol)))
            .chain(PLANET_LIGHT.iter().map(|quantity| (quantity.key, quantity.symbol)))
        {
            // Insolation is a ratio to the Earth's and carries no unit of its own.
            assert_eq!(unit_of(key).is_empty(), symbol.is_empty() || symbol == "S⊕", "{key}");
        }
        assert_eq!(unit_of("mass_loss_msun_yr"), "solMass/yr");
        assert_eq!(unit_of("period_yr"), "yr");
    }
}
