//! The distance chart: habitable zone, orbits and the star's own radius on one logarithmic axis.

use super::chart::{Band, BandMeaning, Chart, runs};
use super::curves::{Curve, planet_series};
use super::samples::Samples;
use super::value_axis::ValueAxis;
use crate::units::constants::SOLAR_RADIUS_AU;

/// Decades of distance shown below the farthest orbit.
const MOST_DECADES: f64 = 6.0;
/// The smallest distance worth showing when there is no planet, au.
const LEAST_AU: f64 = 0.003;

/// The chart for these samples.
pub(super) fn chart(samples: &Samples) -> Chart {
    let count = samples.planet_names.len();
    let orbits =
        samples.all.iter().flat_map(|sample| sample.planets.iter().filter_map(|planet| planet.semi_major_axis_au));
    let largest_star =
        samples.all.iter().filter_map(|sample| sample.star.radius_rsun).fold(0.0, f64::max) * SOLAR_RADIUS_AU;
    let zone_now = samples.all.first().and_then(|sample| sample.star.habitable_zone_au).unwrap_or([LEAST_AU, 10.0]);
    let wanted =
        orbits.flat_map(|axis_au| [axis_au / 2.0, axis_au * 1.5]).chain([LEAST_AU, zone_now[1] * 3.0, largest_star]);
    let axis = ValueAxis::log(wanted, MOST_DECADES);
    let zone = samples.all.iter().map(|sample| {
        let [inner_au, outer_au] = sample.star.habitable_zone_au?;
        Some([sample.fraction, inner_au, outer_au])
    });
    let body = samples.all.iter().map(|sample| {
        let radius_au = sample.star.radius_rsun? * SOLAR_RADIUS_AU;
        Some([sample.fraction, axis.lowest, radius_au.max(axis.lowest)])
    });
    Chart {
        key: Curve::Distance.key(),
        title: "Distance, au: habitable zone, orbits, the star itself".to_owned(),
        symbol: "au",
        axis,
        series: (0..count)
            .map(|index| {
                planet_series(samples, index, |sample| {
                    sample.planets.get(index).and_then(|planet| planet.semi_major_axis_au)
                })
            })
            .collect(),
        bands: vec![
            Band { name: "habitable zone".to_owned(), meaning: BandMeaning::HabitableZone, runs: runs(zone) },
            Band { name: "the star itself".to_owned(), meaning: BandMeaning::StarBody, runs: runs(body) },
        ],
        levels: Vec::new(),
    }
}
