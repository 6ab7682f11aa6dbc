//! The columns of a history table and their unique names.

use super::figures::{planet_figures, star_figures, unit_of};
use crate::system::System;
use crate::system::light_quantities::{PLANET_LIGHT, STAR_LIGHT};
use crate::system::quantities::{PLANET, STAR};
use std::collections::HashSet;
use thiserror::Error;

/// Name of the column that gathers the remarks about a row.
const NOTES: &str = "notes";

/// A column of a history table.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct Column {
    /// Unique name; carries the unit as a suffix.
    pub key: String,
    /// The unit as table readers spell it; empty where there is none.
    pub unit: &'static str,
    /// Whether the column holds numbers.
    pub is_number: bool,
    /// What it holds, for people.
    pub meaning: String,
    /// Key of the method it comes from, if it is a figure.
    pub method: Option<&'static str>,
}

/// The key of the method behind a figure of the tables.
fn method_of(key: &str) -> Option<&'static str> {
    let star = STAR.iter().map(|quantity| (quantity.key, quantity.method));
    let planet = PLANET.iter().map(|quantity| (quantity.key, quantity.method));
    let star_light = STAR_LIGHT.iter().map(|quantity| (quantity.key, quantity.method));
    let planet_light = PLANET_LIGHT.iter().map(|quantity| (quantity.key, quantity.method));
    let mut quantities = star.chain(planet).chain(star_light).chain(planet_light);
    quantities.find(|(known, _)| *known == key).map(|(_, method)| method).or(match key {
        "phase" => Some("star_life"),
        "habitable_zone_place" => Some("habitable_zone"),
        "tidal_lock" => Some("tidal_lock"),
        "state" => Some("surface_temperature"),
        _ if key.starts_with("dwarf_") => Some("measured_dwarfs"),
        _ if key.starts_with("sky_adapted_") => Some("adapted_eye"),
        _ if key.starts_with("sky_") || key.starts_with("disc_") => Some("clear_sky"),
        _ if key.starts_with("colour") => Some("blackbody"),
        _ => None,
    })
}

/// Why columns can't be chosen.
#[derive(Clone, Debug, Error, PartialEq, Eq)]
pub enum ColumnsProblem {
    /// There is no column of that name.
    #[error(
        "the column \"{name}\" does not exist, allowed are those of this system{}; the first line of longember table SCENARIO --points 2 names all",
        like(similar)
    )]
    NoSuchColumn {
        /// The name asked for.
        name: String,
        /// Columns of similar names.
        similar: Vec<String>,
    },
    /// A column is named more than once.
    #[error("the column \"{name}\" is named twice, allowed once; leave one out")]
    Twice {
        /// The name.
        name: String,
    },
}

fn like(similar: &[String]) -> String {
    if similar.is_empty() { String::new() } else { format!(", such as {}", similar.join(", ")) }
}

/// Columns of similar names that an error shows at most.
const MOST_SIMILAR: usize = 6;

/// The places in [`table_columns`] of the columns named.
///
/// # Errors
/// [`ColumnsProblem`] for a name that there is not, or twice.
pub fn chosen_columns(system: &System, names: &[String]) -> Result<Vec<usize>, ColumnsProblem> {
    let columns = table_columns(system);
    let mut chosen = Vec::with_capacity(names.len());
    for name in names.iter().map(|name| name.trim()) {
        let Some(place) = columns.iter().position(|column| column.key == name) else {
            let part = name.to_lowercase().replace([' ', '-'], "_");
            let stem = part.split('_').next().unwrap_or_default();
            let holds = |wanted: &str| {
                let keys = columns.iter().filter(|column| !wanted.is_empty() && column.key.contains(wanted));
                keys.map(|column| column.key.clone()).take(MOST_SIMILAR).collect::<Vec<_>>()
            };
            let whole = holds(&part);
            let similar = if whole.is_empty() { holds(stem) } else { whole };
            return Err(ColumnsProblem::NoSuchColumn { name: name.to_owned(), similar });
        };
        if chosen.contains(&place) {
            return Err(ColumnsProblem::Twice { name: name.to_owned() });
        }
        chosen.push(place);
    }
    Ok(chosen)
}

/// Every column of a system's table: time, star, planets in order, remarks.
///
/// A planet's columns begin with its name in `lower_snake` form; where two names fold to one, a number follows.
#[must_use]
pub fn table_columns(system: &System) -> Vec<Column> {
    let mut columns = vec![Column {
        key: "time_yr".to_owned(),
        unit: "yr",
        is_number: true,
        meaning: "Time since the star reached the main sequence".to_owned(),
        method: None,
    }];
    columns.extend(star_figures().map(|figure| Column {
        key: figure.key.to_owned(),
        unit: unit_of(figure.key),
        is_number: figure.is_number,
        meaning: format!("Star: {}", figure.name),
        method: method_of(figure.key),
    }));
    for (prefix, planet) in planet_prefixes(system).iter().zip(&system.planets) {
        columns.extend(planet_figures().map(|figure| Column {
            key: format!("{prefix}_{}", figure.key),
            unit: unit_of(figure.key),
            is_number: figure.is_number,
            meaning: format!("{}: {}", planet.name, figure.name),
            method: method_of(figure.key),
        }));
    }
    columns.push(Column {
        key: NOTES.to_owned(),
        unit: "",
        is_number: false,
        meaning: "Remarks on this row, as column:kind, parted by spaces".to_owned(),
        method: None,
    });
    columns
}

/// The prefix of each planet's columns, so that no two columns of the table share a name.
pub(super) fn planet_prefixes(system: &System) -> Vec<String> {
    let mut taken: HashSet<String> = star_figures().map(|figure| figure.key.to_owned()).collect();
    taken.extend(["time_yr".to_owned(), NOTES.to_owned()]);
    let mut prefixes = Vec::with_capacity(system.planets.len());
    for planet in &system.planets {
        let stem = lower_snake(&planet.name);
        let mut prefix = stem.clone();
        let mut count = 1;
        while planet_figures().any(|figure| taken.contains(&format!("{prefix}_{}", figure.key))) {
            count += 1;
            prefix = format!("{stem}_{count}");
        }
        taken.extend(planet_figures().map(|figure| format!("{prefix}_{}", figure.key)));
        prefixes.push(prefix);
    }
    prefixes
}

/// Letters and digits in lower case, everything between them as one underscore.
fn lower_snake(name: &str) -> String {
    let mut folded = String::with_capacity(name.len());
    for character in name.chars().flat_map(char::to_lowercase) {
        if character.is_alphanumeric() {
            folded.push(character);
        } else if !folded.is_empty() && !folded.ends_with('_') {
            folded.push('_');
        }
    }
    let trimmed = folded.trim_end_matches('_');
    if trimmed.is_empty() { "planet".to_owned() } else { trimmed.to_owned() }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::system::{PlanetSpecification, StarSpecification};

    fn system(names: &[&str]) -> System {
        let planet = |name: &&str| PlanetSpecification { name: (*name).to_owned(), ..PlanetSpecification::default() };
        System { star: StarSpecification::default(), planets: names.iter().map(planet).collect() }
    }

    #[test]
    fn every_figure_has_a_method_with_a_source() {
        for column in table_columns(&system(&["Ember"])) {
            let is_figure = column.key != "time_yr" && column.key != NOTES;
            let is_known = column.method.is_some_and(|key| crate::system::provenance::method(key).is_some());
            assert_eq!(is_known, is_figure, "{}", column.key);
        }
    }

    #[test]
    fn columns_are_chosen_by_name_and_unknown_ones_get_a_hint() {
        let system = system(&["Ember"]);
        let names = |text: &str| text.split(',').map(str::to_owned).collect::<Vec<_>>();
        let chosen = chosen_columns(&system, &names("luminosity_lsun,time_yr")).expect("there");
        assert!(chosen[0] > chosen[1]);
        let problem = chosen_columns(&system, &names("luminosity")).expect_err("no unit").to_string();
        assert!(problem.contains("such as luminosity_lsun"), "{problem}");
        let problem = chosen_columns(&system, &names("time_yr, time_yr")).expect_err("twice");
        assert_eq!(problem, ColumnsProblem::Twice { name: "time_yr".to_owned() });
    }

    #[test]
    fn names_fold_to_lower_snake() {
        for (name, folded) in [
            ("Hearth", "hearth"),
            ("Far  Cinder-2", "far_cinder_2"),
            (" (b) ", "b"),
            ("Überall", "überall"),
            ("☉!?", "planet"),
        ] {
            assert_eq!(lower_snake(name), folded);
        }
    }

    #[test]
    fn columns_stay_unique_when_names_fold_together() {
        let colliding = system(&["Ember", "ember", "EMBER!", "ember 2", "…", "planet", "Ember surface temperature"]);
        let columns = table_columns(&colliding);
        let keys: HashSet<_> = columns.iter().map(|column| &column.key).collect();
        assert_eq!(keys.len(), columns.len());
        assert_eq!(
            planet_prefixes(&colliding),
            ["ember", "ember_2", "ember_3", "ember_2_2", "planet", "planet_2", "ember_surface_temperature"]
        );
    }

    #[test]
    fn a_planet_cannot_take_a_column_of_the_star() {
        let planets = system(&["core", "habitable zone", "time", "colour"]);
        let columns = table_columns(&planets);
        let keys: HashSet<_> = columns.iter().map(|column| &column.key).collect();
        assert_eq!(keys.len(), columns.len());
    }
}
