//! A history read at the places a plot needs, once for all plots of one time axis.

use crate::system::{History, PlanetMoment, StarMoment, TimeAxis};

/// The system at one place of the time axis.
#[derive(Clone, Debug)]
pub struct Sample {
    /// Place on the whole axis, 0 to 1.
    pub fraction: f64,
    /// Age, yr.
    pub age_yr: f64,
    /// The star there.
    pub star: StarMoment,
    /// The planets there.
    pub planets: Vec<PlanetMoment>,
    /// Each planet's orbit under every assumption on tides: least and greatest semi-major axis, au.
    pub orbit_ranges_au: Vec<Option<[f64; 2]>>,
}

/// Samples of a part of a time axis, from left to right.
#[derive(Clone, Debug)]
pub struct Samples {
    /// The samples, with rising fractions.
    pub all: Vec<Sample>,
    /// Names of the planets, in the order of the system.
    pub planet_names: Vec<String>,
}

impl Samples {
    /// Reads a history at `count` even places between two fractions of an axis, and just before and
    /// at every change of phase between them, so that no jump is drawn as a slope.
    #[must_use]
    pub fn new(history: &History, axis: &TimeAxis, from_fraction: f64, to_fraction: f64, count: usize) -> Self {
        let steps = count.clamp(2, 20_000) - 1;
        let mut places: Vec<(f64, f64)> = (0..=steps)
            .map(|step| {
                let fraction = from_fraction + (to_fraction - from_fraction) * step as f64 / steps as f64;
                (fraction, axis.age_at(fraction))
            })
            .collect();
        for span in history.spans().iter().skip(1) {
            let fraction = axis.fraction_at(span.from_yr);
            let is_inside = span.from_yr > axis.from_yr() && span.from_yr < axis.to_yr();
            if is_inside && fraction > from_fraction && fraction < to_fraction {
                places.push((fraction, span.from_yr.next_down()));
                places.push((fraction, span.from_yr));
            }
        }
        places.sort_by(|first, second| first.0.total_cmp(&second.0).then(first.1.total_cmp(&second.1)));
        let all = places
            .into_iter()
            .map(|(fraction, age_yr)| {
                let (star, planets) = history.figures_at(age_yr);
                let orbit_ranges_au = history.planets().iter().map(|past| past.orbit_range_au(age_yr)).collect();
                Sample { fraction, age_yr, star, planets, orbit_ranges_au }
            })
            .collect();
        let planet_names = history.system().planets.iter().map(|planet| planet.name.clone()).collect();
        Self { all, planet_names }
    }
}
