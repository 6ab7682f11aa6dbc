//! The columns of a history table and their unique names.

use super::figures::{planet_figures, star_figures, unit_of};
use crate::system::System;
use std::collections::HashSet;

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
    }];
    columns.extend(star_figures().map(|figure| Column {
        key: figure.key.to_owned(),
        unit: unit_of(figure.key),
        is_number: figure.is_number,
        meaning: format!("Star: {}", figure.name),
    }));
    for (prefix, planet) in planet_prefixes(system).iter().zip(&system.planets) {
        columns.extend(planet_figures().map(|figure| Column {
            key: format!("{prefix}_{}", figure.key),
            unit: unit_of(figure.key),
            is_number: figure.is_number,
            meaning: format!("{}: {}", planet.name, figure.name),
        }));
    }
    columns.push(Column {
        key: NOTES.to_owned(),
        unit: "",
        is_number: false,
        meaning: "Remarks on this row, as column:kind, parted by spaces".to_owned(),
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
