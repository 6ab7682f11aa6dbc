//! One strip chart: values against the shared time axis.

use super::value_axis::ValueAxis;
use crate::system::PlanetState;

/// Whose curve it is: decides colour and dash pattern.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Owner {
    /// The star.
    Star,
    /// The planet with this index.
    Planet(usize),
}

/// An unbroken stretch of a curve: place on the time axis (0 to 1), value, and true colour where it is data.
#[derive(Clone, Debug, Default, PartialEq)]
pub struct Run {
    /// Places on the time axis.
    pub fractions: Vec<f64>,
    /// Values in the chart's unit.
    pub values: Vec<f64>,
    /// True colour at every point, sRGB; empty when the curve has none.
    pub colours_srgb: Vec<[u8; 3]>,
}

/// A curve.
#[derive(Clone, Debug, PartialEq)]
pub struct Series {
    /// Name for people.
    pub name: String,
    /// Whose it is.
    pub owner: Owner,
    /// Its unbroken stretches.
    pub runs: Vec<Run>,
}

/// A filled stretch between two values at every place.
#[derive(Clone, Debug, PartialEq)]
pub struct Band {
    /// Name for people.
    pub name: String,
    /// What it stands for: decides its ink.
    pub meaning: BandMeaning,
    /// Unbroken stretches of (place, lower value, upper value).
    pub runs: Vec<Vec<[f64; 3]>>,
}

/// What a band stands for.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum BandMeaning {
    /// Liquid water could stand on a surface.
    LiquidWater,
    /// The habitable zone.
    HabitableZone,
    /// The star itself.
    StarBody,
    /// The spread of a curve.
    Spread,
    /// Nobody can say on which side of a border a planet ends.
    Undecided,
}

/// A value that matters, drawn across the chart.
#[derive(Clone, Debug, PartialEq)]
pub struct Level {
    /// Name for people.
    pub name: String,
    /// The value.
    pub value: f64,
}

/// The states of a planet's climate through time.
#[derive(Clone, Debug, PartialEq)]
pub struct Lane {
    /// The planet's name.
    pub name: String,
    /// Index of the planet in the system.
    pub planet: usize,
    /// Stretches of one state each, from left to right: start, end, state.
    pub spans: Vec<(f64, f64, PlanetState)>,
}

/// A chart against time.
#[derive(Clone, Debug, PartialEq)]
pub struct Chart {
    /// Stable machine name.
    pub key: &'static str,
    /// What it shows, with its unit: `Luminosity, L☉`.
    pub title: String,
    /// Unit symbol.
    pub symbol: &'static str,
    /// The value axis.
    pub axis: ValueAxis,
    /// Curves, drawn above bands.
    pub series: Vec<Series>,
    /// Bands, drawn first.
    pub bands: Vec<Band>,
    /// Levels worth a line.
    pub levels: Vec<Level>,
    /// Climates, drawn at the foot.
    pub lanes: Vec<Lane>,
}

impl Chart {
    /// The value of a series at a place, read between its points; `None` in a gap.
    #[must_use]
    pub fn value_at(&self, series: &Series, fraction: f64) -> Option<f64> {
        series.runs.iter().find_map(|run| {
            let after = run.fractions.partition_point(|place| *place < fraction);
            let next = run.fractions.get(after)?;
            if after == 0 {
                return (*next == fraction).then(|| run.values[0]);
            }
            let before = run.fractions[after - 1];
            let share = if *next > before { (fraction - before) / (next - before) } else { 0.0 };
            let (low, high) = (run.values[after - 1], run.values[after]);
            if self.axis.is_log && low > 0.0 && high > 0.0 {
                Some(low * (high / low).powf(share))
            } else {
                Some(low + share * (high - low))
            }
        })
    }
}

/// Cuts samples into unbroken stretches of what can be shown.
pub(super) fn runs<T>(items: impl Iterator<Item = Option<T>>) -> Vec<Vec<T>> {
    let mut found: Vec<Vec<T>> = Vec::new();
    let mut is_open = false;
    for item in items {
        match item {
            Some(item) => {
                if !is_open {
                    found.push(Vec::new());
                }
                if let Some(run) = found.last_mut() {
                    run.push(item);
                }
                is_open = true;
            }
            None => is_open = false,
        }
    }
    found
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn gaps_break_a_curve() {
        let found = runs([Some(1), Some(2), None, None, Some(3)].into_iter());
        assert_eq!(found, [vec![1, 2], vec![3]]);
    }

    #[test]
    fn a_value_is_read_between_points_and_not_in_gaps() {
        let run = |fractions: &[f64], values: &[f64]| Run {
            fractions: fractions.to_vec(),
            values: values.to_vec(),
            colours_srgb: Vec::new(),
        };
        let series = Series {
            name: "Luminosity".to_owned(),
            owner: Owner::Star,
            runs: vec![run(&[0.0, 0.5], &[1.0, 100.0]), run(&[0.8, 1.0], &[5.0, 5.0])],
        };
        let chart = Chart {
            key: "luminosity",
            title: String::new(),
            symbol: "L☉",
            axis: ValueAxis { is_log: true, lowest: 0.1, highest: 1000.0 },
            series: Vec::new(),
            bands: Vec::new(),
            levels: Vec::new(),
            lanes: Vec::new(),
        };
        assert!((chart.value_at(&series, 0.25).expect("inside") - 10.0).abs() < 1e-9);
        assert_eq!(chart.value_at(&series, 0.65), None);
        assert_eq!(chart.value_at(&series, 0.9), Some(5.0));
    }
}
