//! What a reader must know about planets that stand too near to each other: their pull is not followed.

use super::moment::PlanetMoment;
use super::notes::{Note, NoteKind};
use super::planet_past::PlanetPast;
use super::specification::Body;
use crate::physics::planet::orbit::{MANY_PLANET_STABILITY, Neighbour, TWO_PLANET_STABILITY, hill_separation};
use std::sync::Arc;

/// Remarks about neighbours whose orbits cross or stand so close that they seldom last.
pub(super) fn of_neighbours(pasts: &[Arc<PlanetPast>], planets: &[PlanetMoment], star_mass_msun: f64) -> Vec<Note> {
    let mut orbits: Vec<(usize, Neighbour)> = planets
        .iter()
        .zip(pasts)
        .enumerate()
        .filter_map(|(index, (planet, past))| {
            let neighbour = Neighbour {
                semi_major_axis_au: planet.semi_major_axis_au?,
                eccentricity: planet.eccentricity?,
                mass_mearth: past.specification().mass_mearth,
            };
            Some((index, neighbour))
        })
        .collect();
    orbits.sort_by(|first, second| first.1.semi_major_axis_au.total_cmp(&second.1.semi_major_axis_au));
    let needed = if orbits.len() > 2 { MANY_PLANET_STABILITY } else { TWO_PLANET_STABILITY };
    let mut notes = Vec::new();
    for pair in orbits.windows(2) {
        let Ok(separation) = hill_separation(pair[0].1, pair[1].1, star_mass_msun) else { continue };
        if separation >= needed {
            continue;
        }
        for (this, other) in [(pair[0].0, pair[1].0), (pair[1].0, pair[0].0)] {
            let (name, neighbour) = (&planets[this].name, &planets[other].name);
            let text = if separation < 0.0 {
                format!("{name}: its orbit crosses that of {neighbour}; planets do not pull on each other here")
            } else {
                format!("{name}: so near to {neighbour} it would seldom last; planets do not pull on each other here")
            };
            notes.push(Note { body: Body::Planet(this), about: "semi_major_axis_au", kind: NoteKind::Limited, text });
        }
    }
    notes
}
