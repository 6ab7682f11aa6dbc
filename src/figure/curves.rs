//! The strip charts of the star's figures and of the planets' temperatures.

use super::chart::{Band, BandMeaning, Chart, Lane, Level, Owner, Run, Series, runs};
use super::samples::{Sample, Samples};
use super::value_axis::ValueAxis;
use crate::system::PlanetState;
use crate::system::planet_past::{BOILING_K, FREEZING_K};
use crate::system::quantities::{StarQuantity, star_quantity};

/// Decades shown below the largest value: a cold remnant's last decades would flatten all the rest.
const MOST_DECADES: f64 = 11.0;

/// Share of the height of a chart that one lane of climates takes.
const LANE_SHARE: f64 = 0.15;

/// The charts that can be shown, in their usual order.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Curve {
    /// Luminosity of the star.
    Luminosity,
    /// Radius of the star.
    Radius,
    /// Effective temperature of the star, drawn in its true colour.
    Temperature,
    /// Mass of the star.
    Mass,
    /// Surface temperatures of the planets.
    PlanetTemperatures,
    /// Habitable zone, orbits and the star's own radius.
    Distance,
}

impl Curve {
    /// Every chart.
    pub const ALL: [Self; 6] =
        [Self::Luminosity, Self::Radius, Self::Temperature, Self::Mass, Self::PlanetTemperatures, Self::Distance];

    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::Luminosity => "luminosity",
            Self::Radius => "radius",
            Self::Temperature => "temperature",
            Self::Mass => "mass",
            Self::PlanetTemperatures => "planet_temperatures",
            Self::Distance => "distance",
        }
    }

    /// Short name for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Luminosity => "Luminosity",
            Self::Radius => "Radius",
            Self::Temperature => "Temperature",
            Self::Mass => "Mass",
            Self::PlanetTemperatures => "Planet surfaces",
            Self::Distance => "Distances",
        }
    }

    /// The chart for these samples.
    #[must_use]
    pub fn chart(self, samples: &Samples) -> Chart {
        match self {
            Self::Luminosity => star_chart(samples, self, "luminosity_lsun", "Luminosity, L☉", true),
            Self::Radius => star_chart(samples, self, "radius_rsun", "Radius, R☉", true),
            Self::Temperature => star_chart(samples, self, "effective_temperature_k", "Effective temperature, K", true),
            Self::Mass => star_chart(samples, self, "mass_msun", "Mass, M☉", false),
            Self::PlanetTemperatures => planet_temperatures(samples),
            Self::Distance => super::distance::chart(samples),
        }
    }
}

fn star_chart(samples: &Samples, curve: Curve, quantity: &str, title: &str, is_log: bool) -> Chart {
    let Some(quantity) = star_quantity(quantity) else {
        return empty(curve, title);
    };
    let values = || samples.all.iter().filter_map(|sample| (quantity.value)(&sample.star));
    let axis = if is_log { ValueAxis::log(values(), MOST_DECADES) } else { ValueAxis::linear(values().chain([0.0])) };
    Chart {
        key: curve.key(),
        title: title.to_owned(),
        symbol: quantity.symbol,
        axis,
        series: vec![star_series(samples, quantity, curve == Curve::Temperature)],
        bands: vec![spread_band(samples, quantity)],
        levels: Vec::new(),
        lanes: Vec::new(),
    }
}

fn empty(curve: Curve, title: &str) -> Chart {
    Chart {
        key: curve.key(),
        title: title.to_owned(),
        symbol: "",
        axis: ValueAxis::linear(std::iter::empty()),
        series: Vec::new(),
        bands: Vec::new(),
        levels: Vec::new(),
        lanes: Vec::new(),
    }
}

fn star_series(samples: &Samples, quantity: &StarQuantity, in_true_colour: bool) -> Series {
    let points = samples.all.iter().map(|sample| {
        let value = (quantity.value)(&sample.star)?;
        let colour = sample.star.swatch.as_ref().map_or([0, 0, 0], |swatch| swatch.srgb);
        Some((sample.fraction, value, colour))
    });
    let runs = runs(points)
        .into_iter()
        .map(|points| Run {
            fractions: points.iter().map(|point| point.0).collect(),
            values: points.iter().map(|point| point.1).collect(),
            colours_srgb: if in_true_colour { points.iter().map(|point| point.2).collect() } else { Vec::new() },
        })
        .collect();
    Series { name: quantity.name.to_owned(), owner: Owner::Star, runs }
}

fn spread_band(samples: &Samples, quantity: &StarQuantity) -> Band {
    let edges = samples.all.iter().map(|sample| {
        let value = (quantity.value)(&sample.star)?;
        let spread = (quantity.spread)(&sample.star)?;
        Some([sample.fraction, value * (1.0 - spread), value * (1.0 + spread)])
    });
    Band { name: format!("spread of {}", quantity.name), meaning: BandMeaning::Spread, runs: runs(edges) }
}

fn planet_temperatures(samples: &Samples) -> Chart {
    let temperature_k = |sample: &Sample, index: usize| {
        sample.planets.get(index).filter(|planet| planet.state.orbits()).and_then(|planet| planet.surface_temperature_k)
    };
    let count = samples.planet_names.len();
    let all = samples.all.iter().flat_map(|sample| (0..count).filter_map(move |index| temperature_k(sample, index)));
    // The giant's glare would flatten the range in which life has a say, so the axis is logarithmic.
    let mut axis = ValueAxis::log(all.chain([FREEZING_K, BOILING_K]), 3.0);
    let lanes: Vec<Lane> = (0..count).filter_map(|index| lane(samples, index)).collect();
    // Room at the foot, so that lanes cover no curve.
    let share = (LANE_SHARE * lanes.len() as f64).min(0.45);
    axis.lowest *= (axis.lowest / axis.highest).powf(share / (1.0 - share));
    let series = (0..count).map(|index| planet_series(samples, index, |sample| temperature_k(sample, index))).collect();
    let edge = |fraction: f64| [fraction, FREEZING_K, BOILING_K];
    let ends = [samples.all.first(), samples.all.last()];
    let water = ends.into_iter().flatten().map(|sample| edge(sample.fraction)).collect();
    Chart {
        key: Curve::PlanetTemperatures.key(),
        title: "Planet surfaces, K".to_owned(),
        symbol: "K",
        axis,
        series,
        bands: vec![Band {
            name: "liquid water at 1 bar".to_owned(),
            meaning: BandMeaning::LiquidWater,
            runs: vec![water],
        }],
        levels: vec![
            Level { name: "freezing".to_owned(), value: FREEZING_K },
            Level { name: "boiling".to_owned(), value: BOILING_K },
        ],
        lanes,
    }
}

/// The climate of a planet that has one, as stretches of one state each.
pub(super) fn lane(samples: &Samples, index: usize) -> Option<Lane> {
    let mut spans: Vec<(f64, f64, PlanetState)> = Vec::new();
    let mut last: Option<f64> = None;
    for sample in &samples.all {
        let state = sample.planets.get(index).filter(|planet| planet.water_oceans.is_some()).map(|planet| planet.state);
        let starts = last.unwrap_or(sample.fraction);
        last = Some(sample.fraction);
        let Some(state) = state else { continue };
        match spans.last_mut() {
            Some(span) if span.2 == state && span.1 >= starts => span.1 = sample.fraction,
            Some(span) if span.1 >= starts => {
                // The change lies between two samples: their middle is as good as any.
                let middle = 0.5 * (starts + sample.fraction);
                span.1 = middle;
                spans.push((middle, sample.fraction, state));
            }
            _ => spans.push((sample.fraction, sample.fraction, state)),
        }
    }
    let name = samples.planet_names.get(index).cloned().unwrap_or_default();
    (!spans.is_empty()).then_some(Lane { name, planet: index, spans })
}

/// A planet's curve from what a closure reads at every sample.
pub(super) fn planet_series(samples: &Samples, index: usize, value: impl Fn(&Sample) -> Option<f64>) -> Series {
    let points = samples.all.iter().map(|sample| Some((sample.fraction, value(sample)?)));
    let runs = runs(points)
        .into_iter()
        .map(|points| Run {
            fractions: points.iter().map(|point| point.0).collect(),
            values: points.iter().map(|point| point.1).collect(),
            colours_srgb: Vec::new(),
        })
        .collect();
    let name = samples.planet_names.get(index).cloned().unwrap_or_default();
    Series { name, owner: Owner::Planet(index), runs }
}
