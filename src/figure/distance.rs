//! The distance chart: habitable zone, orbits and the star's own radius on one logarithmic axis.

use super::chart::{Band, BandMeaning, Chart, runs};
use super::curves::{Curve, planet_series};
use super::samples::Samples;
use super::value_axis::ValueAxis;
use crate::system::PlanetState;
use crate::units::constants::SOLAR_RADIUS_AU;

/// Decades of distance shown below the farthest orbit.
const MOST_DECADES: f64 = 6.0;
/// The smallest distance worth showing when there is no planet, au.
const LEAST_AU: f64 = 0.003;

/// Beyond the giant's surface by this factor a planet is surely spared; below, undecided.
const UNDECIDED_WITHIN: f64 = 1.15;
/// Orbits nearer to each other than this are one line.
const TOLD_APART: f64 = 1.01;
/// Half width of the line of an orbit that another tide would leave, as a factor.
const LINE: f64 = 1.012;

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
    // Giant radii are not known better than this, so nobody can say what becomes of a planet within it.
    let doubt = samples.all.iter().map(|sample| {
        let radius_au = sample.star.radius_rsun.filter(|_| sample.star.phase.is_giant())? * SOLAR_RADIUS_AU;
        Some([sample.fraction, radius_au.max(axis.lowest), (UNDECIDED_WITHIN * radius_au).max(axis.lowest)])
    });
    let mut bands = vec![
        Band { name: "habitable zone".to_owned(), meaning: BandMeaning::HabitableZone, runs: runs(zone) },
        Band { name: "undecided".to_owned(), meaning: BandMeaning::Undecided, runs: runs(doubt) },
        Band { name: "the star itself".to_owned(), meaning: BandMeaning::StarBody, runs: runs(body) },
    ];
    bands.extend((0..count).map(|index| tide_band(samples, index)));
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
        bands,
        levels: Vec::new(),
        lanes: Vec::new(),
    }
}

/// Where a planet's orbit depends on the form of the tide, or on whether there is any: the band between them; the
/// orbit it would have, as a thin one, where the tide has taken the planet.
fn tide_band(samples: &Samples, index: usize) -> Band {
    let edges = samples.all.iter().map(|sample| {
        let [low, high] = sample.orbit_ranges_au.get(index).copied().flatten()?;
        let planet = sample.planets.get(index)?;
        if planet.semi_major_axis_au.is_some() {
            return (high > TOLD_APART * low).then_some([sample.fraction, low, high]);
        }
        (planet.state != PlanetState::Unbound).then_some([sample.fraction, low / LINE, high * LINE])
    });
    let name = samples.planet_names.get(index).map_or_else(String::new, |name| format!("{name} under other tides"));
    Band { name, meaning: BandMeaning::Undecided, runs: runs(edges) }
}
