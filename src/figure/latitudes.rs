//! A planet's surface temperature from pole to pole, with its ice.

use super::chart::Level;
use super::value_axis::ValueAxis;
use crate::physics::planet::climate::Latitude;
use crate::system::PlanetClimate;
use crate::system::planet_past::FREEZING_K;
use crate::units::number_text::number;

/// Temperature at which half the surface is ice, K: where the model puts the ice line. Budyko 1969.
const ICE_LINE_K: f64 = 263.15;
/// A level is shown while the profile comes this near to it, K.
const NEAR_K: f64 = 45.0;

/// Half of the least span of the axis, K.
const LEAST_SPAN_K: f64 = 12.0;

/// Temperature against latitude; the hemispheres mirror each other, as annual means do.
#[derive(Clone, Debug, PartialEq)]
pub struct LatitudeFigure {
    /// What it shows, with its unit.
    pub title: &'static str,
    /// The axis of temperature.
    pub axis: ValueAxis,
    /// Latitude, degrees, from −90 to 90, and temperature, K.
    pub profile: Vec<[f64; 2]>,
    /// Stretches of latitude, degrees, that are mostly ice.
    pub ice_deg: Vec<[f64; 2]>,
    /// Latitudes of the edges of the ice, degrees.
    pub ice_edges_deg: Vec<f64>,
    /// Temperatures worth a line.
    pub levels: Vec<Level>,
    /// Everything in words.
    pub description: String,
}

impl LatitudeFigure {
    /// The figure of belts that run from the equator to a pole.
    #[must_use]
    pub fn new(name: &str, climate: &PlanetClimate, belts: &[Latitude]) -> Self {
        let north = belts.iter().map(|belt| [belt.latitude_deg, belt.temperature_k]);
        let south = north.clone().map(|[latitude_deg, local_k]| [-latitude_deg, local_k]).rev();
        let profile: Vec<[f64; 2]> = south.chain(north).collect();
        let warmest_k = profile.iter().map(|point| point[1]).fold(f64::NEG_INFINITY, f64::max);
        let coldest_k = profile.iter().map(|point| point[1]).fold(f64::INFINITY, f64::min);
        let levels: Vec<Level> = [("freezing", FREEZING_K), ("ice line, −10 °C", ICE_LINE_K)]
            .into_iter()
            .filter(|(_, value)| (coldest_k - NEAR_K..warmest_k + NEAR_K).contains(value))
            .map(|(name, value)| Level { name: name.to_owned(), value })
            .collect();
        // A nearly even temperature shall look even.
        let middle_k = 0.5 * (coldest_k + warmest_k);
        let least = [middle_k - LEAST_SPAN_K, middle_k + LEAST_SPAN_K];
        let shown = profile.iter().map(|point| point[1]).chain(levels.iter().map(|level| level.value)).chain(least);
        let ice_deg = ice_stretches(belts);
        let ice_edges_deg = ice_deg.iter().flatten().copied().filter(|edge_deg| edge_deg.abs() < 90.0).collect();
        Self {
            title: "Surface temperature by latitude, K",
            axis: ValueAxis::linear(shown),
            description: description(name, climate, belts, &ice_deg),
            profile,
            ice_deg,
            ice_edges_deg,
            levels,
        }
    }

    /// The temperature at a latitude, K, read between belts and held at the poles.
    #[must_use]
    pub fn temperature_at_k(&self, latitude_deg: f64) -> Option<f64> {
        let after =
            self.profile.partition_point(|point| point[0] < latitude_deg).min(self.profile.len().checked_sub(1)?);
        let (before, next) = (self.profile[after.saturating_sub(1)], self.profile[after]);
        if next[0] <= before[0] {
            return Some(next[1]);
        }
        let share = ((latitude_deg - before[0]) / (next[0] - before[0])).clamp(0.0, 1.0);
        Some(before[1] + share * (next[1] - before[1]))
    }
}

/// Where ice covers more than half, from south to north.
fn ice_stretches(belts: &[Latitude]) -> Vec<[f64; 2]> {
    // On one hemisphere, from the equator to the pole.
    let mut half: Vec<[f64; 2]> = Vec::new();
    let mut begun = belts.first().filter(|belt| belt.ice_fraction > 0.5).map(|_| 0.0);
    for pair in belts.windows(2) {
        let (low, high) = (pair[0], pair[1]);
        if (low.ice_fraction > 0.5) == (high.ice_fraction > 0.5) {
            continue;
        }
        // Ice is half where the temperature passes its line, and the temperature runs straighter than the ice does.
        let share = ((low.temperature_k - ICE_LINE_K) / (low.temperature_k - high.temperature_k)).clamp(0.0, 1.0);
        let edge_deg = low.latitude_deg + share * (high.latitude_deg - low.latitude_deg);
        match begun.take() {
            Some(from_deg) => half.push([from_deg, edge_deg]),
            None => begun = Some(edge_deg),
        }
    }
    half.extend(begun.map(|from_deg| [from_deg, 90.0]));
    let mut all: Vec<[f64; 2]> = half.iter().rev().map(|[from_deg, to_deg]| [-to_deg, -from_deg]).collect();
    for [from_deg, to_deg] in half {
        match all.last_mut() {
            Some(last) if last[1] == 0.0 && from_deg == 0.0 => last[1] = to_deg,
            _ => all.push([from_deg, to_deg]),
        }
    }
    all
}

fn description(name: &str, climate: &PlanetClimate, belts: &[Latitude], ice_deg: &[[f64; 2]]) -> String {
    let ends = belts.first().zip(belts.last());
    let ends = ends.map_or_else(String::new, |(equator, pole)| {
        format!(
            "{} K at the equator, {} K at the poles",
            number(equator.temperature_k, 4),
            number(pole.temperature_k, 4)
        )
    });
    let ice = match (climate.ice_line_deg, ice_deg) {
        (_, []) => "no ice".to_owned(),
        (_, [only]) if only[1] - only[0] >= 180.0 => "ice from pole to pole".to_owned(),
        (Some(line_deg), _) => format!("ice beyond {}° of latitude", number(line_deg, 3)),
        (None, stretches) => {
            let belts = stretches.iter().map(|[from, to]| format!("{}° to {}°", number(*from, 3), number(*to, 3)));
            format!("ice from {}", belts.collect::<Vec<_>>().join(" and from "))
        }
    };
    format!("Surface temperature of {name} by latitude: {ends}; {ice}")
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::system::{History, PlanetSpecification, StarSpecification, System, Water};

    fn figure(water: Water, age_yr: f64, semi_major_axis_au: f64) -> (LatitudeFigure, PlanetClimate) {
        let planet = PlanetSpecification { semi_major_axis_au, water: Some(water), ..PlanetSpecification::default() };
        let history =
            History::compute(System { star: StarSpecification::default(), planets: vec![planet] }).expect("computed");
        let climate = history.climate_at(0, age_yr).expect("a planet");
        let belts = climate.latitudes.clone().expect("a climate by latitude");
        (LatitudeFigure::new("Ember", &climate, &belts), climate)
    }

    #[test]
    fn the_edges_of_the_ice_are_its_line() {
        let (figure, climate) = figure(Water::default(), 4.57e9, 1.0);
        let line_deg = climate.ice_line_deg.expect("a line");
        assert!((figure.ice_edges_deg[1] - line_deg).abs() < 0.5, "{:?} {line_deg}", figure.ice_edges_deg);
        assert_eq!(figure.ice_edges_deg[0], -figure.ice_edges_deg[1]);
        assert_eq!(figure.ice_deg.len(), 2);
        assert!(figure.description.contains("ice beyond"), "{}", figure.description);
        assert!(figure.profile.windows(2).all(|pair| pair[0][0] < pair[1][0]), "from south to north");
        let (equator_k, pole_k) =
            (figure.temperature_at_k(0.0).expect("read"), figure.temperature_at_k(90.0).expect("read"));
        assert!(equator_k > 295.0 && pole_k < 263.0, "{equator_k} {pole_k}");
        assert_eq!(figure.levels.len(), 2);
    }

    #[test]
    fn a_frozen_world_is_one_stretch_of_ice() {
        let (figure, _) = figure(Water::default(), 4.57e9, 4.0);
        assert_eq!(figure.ice_deg, [[-90.0, 90.0]]);
        assert!(figure.ice_edges_deg.is_empty() && figure.description.ends_with("ice from pole to pole"));
    }

    #[test]
    fn under_a_steep_tilt_ice_may_lie_around_the_equator() {
        let belt = |latitude_deg, temperature_k: f64| Latitude {
            latitude_deg,
            temperature_k,
            ice_fraction: f64::from(u8::from(temperature_k < ICE_LINE_K)),
            albedo: 0.3,
        };
        assert_eq!(ice_stretches(&[belt(15.0, 258.15), belt(45.0, 268.15), belt(75.0, 280.0)]), [[-30.0, 30.0]]);
        assert_eq!(ice_stretches(&[]), [[0.0; 2]; 0]);
    }
}
