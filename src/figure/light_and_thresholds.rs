//! A planet's starlight through time against the thresholds of its climate, with the states it went through.

use super::chart::{Band, BandMeaning, Chart, runs};
use super::curves::{lane, planet_series};
use super::samples::{Sample, Samples};
use super::value_axis::ValueAxis;
use crate::physics::planet::history::LightThresholds;
use crate::system::History;

/// How far beyond the thresholds the chart reaches, as factors below and above: the light of a giant or of a white dwarf
/// leaves it, so that the thresholds do not shrink to a line.
const ROOM: [f64; 2] = [6.0, 30.0];
/// Half width of the line of the thaw, as a factor.
const LINE: f64 = 1.02;
/// Share of the height of the chart that the lane of states takes.
const LANE_SHARE: f64 = 0.2;

/// The chart of one planet.
#[must_use]
pub fn chart(history: &History, samples: &Samples, index: usize) -> Chart {
    let light = |sample: &Sample| {
        let planet = sample.planets.get(index).filter(|planet| planet.state.orbits())?;
        planet.insolation_earth.filter(|light_earth| *light_earth > 0.0)
    };
    let thresholds: Vec<(f64, Option<LightThresholds>)> =
        samples.all.iter().map(|sample| (sample.fraction, history.thresholds_at(index, sample.age_yr))).collect();
    let band = |name: &str, meaning, edges: fn(&LightThresholds) -> [f64; 2]| {
        let places = thresholds.iter().map(|(fraction, thresholds)| {
            let [low, high] = edges(thresholds.as_ref()?);
            Some([*fraction, low, high])
        });
        Band { name: name.to_owned(), meaning, runs: runs(places) }
    };
    let limits = thresholds.iter().filter_map(|(_, thresholds)| *thresholds).flat_map(|thresholds| {
        [thresholds.freeze_insolation_earth, thresholds.thaw_insolation_earth, thresholds.runaway_insolation_earth]
    });
    let mut axis = reach(limits).unwrap_or_else(|| ValueAxis::log(samples.all.iter().filter_map(light), 5.0));
    let lanes: Vec<_> = lane(samples, index).into_iter().collect();
    if !lanes.is_empty() {
        axis.lowest *= (axis.lowest / axis.highest).powf(LANE_SHARE / (1.0 - LANE_SHARE));
    }
    Chart {
        key: "light_and_thresholds",
        title: "Starlight over the Earth's: open water lasts where shaded, ice thaws at the line".to_owned(),
        symbol: "S⊕",
        axis,
        series: vec![planet_series(samples, index, light)],
        bands: vec![
            band("open water lasts", BandMeaning::HabitableZone, |thresholds| {
                [thresholds.freeze_insolation_earth, thresholds.runaway_insolation_earth]
            }),
            band("ice thaws", BandMeaning::Undecided, |thresholds| {
                [thresholds.thaw_insolation_earth / LINE, thresholds.thaw_insolation_earth * LINE]
            }),
        ],
        levels: Vec::new(),
        lanes,
    }
}

/// An axis about thresholds, if there are any.
fn reach(limits: impl Iterator<Item = f64>) -> Option<ValueAxis> {
    let (mut least, mut most) = (f64::INFINITY, 0.0_f64);
    for limit in limits {
        (least, most) = (least.min(limit), most.max(limit));
    }
    (least < most).then(|| ValueAxis { is_log: true, lowest: least / ROOM[0], highest: most * ROOM[1] })
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::physics::planet::Greenhouse;
    use crate::system::{PlanetSpecification, PlanetState, StarSpecification, System, TimeAxis, TimeScale, Water};

    #[test]
    fn states_turn_where_the_light_passes_the_thresholds() {
        let wet = PlanetSpecification {
            semi_major_axis_au: 4.0,
            water: Some(Water::default()),
            ..PlanetSpecification::default()
        };
        let bare = PlanetSpecification {
            name: "Bare".to_owned(),
            greenhouse: Greenhouse::None,
            ..PlanetSpecification::default()
        };
        let history = History::compute(System { star: StarSpecification::default(), planets: vec![wet, bare] })
            .expect("computed");
        let axis = TimeAxis::new(&history, TimeScale::Paced);
        let samples = Samples::new(&history, &axis, 0.0, 1.0, 300);
        let chart_of_wet = chart(&history, &samples, 0);
        assert!(chart_of_wet.axis.lowest > 0.0 && chart_of_wet.bands.iter().all(|band| !band.runs.is_empty()));
        let states: Vec<PlanetState> = chart_of_wet.lanes[0].spans.iter().map(|span| span.2).collect();
        assert_eq!(states[0], PlanetState::Frozen);
        assert!(states.len() > 1, "it thaws: {states:?}");
        let chart_of_bare = chart(&history, &samples, 1);
        assert!(chart_of_bare.lanes.is_empty() && chart_of_bare.bands.iter().all(|band| band.runs.is_empty()));
        assert_eq!(chart_of_bare.series[0].runs.len(), 1);
    }
}
