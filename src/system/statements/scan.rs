//! A figure over a stretch of time: its extremes, and where it comes nearest to a range.

use super::quantity::FigureKey;
use super::reading::{Reader, Reading};
use crate::system::pacing::{TimeAxis, TimeScale};

/// Places on the paced axis that are read beside the nodes of the star's life.
const FILL: usize = 240;
/// Halvings of the stretch about an extreme.
const REFINEMENTS: usize = 48;

/// A figure and when it was read.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct Timed {
    pub(super) time_yr: f64,
    pub(super) reading: Reading,
}

/// A figure read all over a stretch of time.
pub(super) struct Scan {
    rows: Vec<Timed>,
    /// At some of the ages there was no figure.
    pub(super) has_gaps: bool,
}

impl Scan {
    /// Reads a figure from one age to another, both included.
    pub(super) fn new(reader: &Reader<'_>, key: FigureKey, from_yr: f64, to_yr: f64) -> Self {
        let ages = ages(reader, from_yr, to_yr);
        let read = |time_yr: &f64| Some(Timed { time_yr: *time_yr, reading: reader.at(key, *time_yr)? });
        let rows: Vec<Timed> = ages.iter().filter_map(read).collect();
        Self { has_gaps: rows.len() < ages.len(), rows }
    }

    /// The highest value and when it is reached.
    pub(super) fn highest(&self, reader: &Reader<'_>, key: FigureKey) -> Option<Timed> {
        self.extreme(reader, key, |value| value)
    }

    /// The lowest value and when it is reached.
    pub(super) fn lowest(&self, reader: &Reader<'_>, key: FigureKey) -> Option<Timed> {
        self.extreme(reader, key, |value| -value)
    }

    /// The value that comes nearest to a range and when.
    pub(super) fn nearest(&self, reader: &Reader<'_>, key: FigureKey, low: f64, high: f64) -> Option<Timed> {
        let nearest = self.extreme(reader, key, |value| -beyond(value, low, high))?;
        let middle = 0.5 * (low + high);
        // Between two readings on either side of the range the figure passes it, unless it jumps.
        let crossing = self.rows.windows(2).find(|pair| {
            let values = [pair[0].reading.value, pair[1].reading.value];
            (values[0] < low && values[1] > high) || (values[0] > high && values[1] < low)
        });
        match crossing {
            Some(pair) if beyond(nearest.reading.value, low, high) > 0.0 => {
                Some(halve(reader, key, pair[0], pair[1], middle))
                    .filter(|found| beyond(found.reading.value, low, high) < beyond(nearest.reading.value, low, high))
                    .or(Some(nearest))
            }
            _ => Some(nearest),
        }
    }

    /// The value that lies farthest out of a range and when; inside it, any.
    pub(super) fn farthest(&self, reader: &Reader<'_>, key: FigureKey, low: f64, high: f64) -> Option<Timed> {
        self.extreme(reader, key, |value| beyond(value, low, high))
    }

    /// The reading of the greatest merit, refined between its neighbours.
    fn extreme(&self, reader: &Reader<'_>, key: FigureKey, merit: impl Fn(f64) -> f64) -> Option<Timed> {
        let best = (0..self.rows.len()).reduce(|best, next| {
            if merit(self.rows[next].reading.value) > merit(self.rows[best].reading.value) { next } else { best }
        })?;
        let mut found = self.rows[best];
        let mut low_yr = self.rows[best.saturating_sub(1)].time_yr;
        let mut high_yr = self.rows[(best + 1).min(self.rows.len() - 1)].time_yr;
        let mut take = |time_yr: f64| -> f64 {
            let Some(reading) = reader.at(key, time_yr) else { return f64::MIN };
            if merit(reading.value) > merit(found.reading.value) {
                found = Timed { time_yr, reading };
            }
            merit(reading.value)
        };
        for _ in 0..REFINEMENTS {
            let third_yr = (high_yr - low_yr) / 3.0;
            if third_yr <= 1e-12 * high_yr {
                break;
            }
            let (early_yr, late_yr) = (low_yr + third_yr, high_yr - third_yr);
            if take(early_yr) >= take(late_yr) { high_yr = late_yr } else { low_yr = early_yr }
        }
        Some(found)
    }
}

/// How far a value lies outside a range; zero inside it.
fn beyond(value: f64, low: f64, high: f64) -> f64 {
    (low - value).max(value - high).max(0.0)
}

/// Where a figure passes a value between two readings on either side of it.
fn halve(reader: &Reader<'_>, key: FigureKey, before: Timed, after: Timed, wanted: f64) -> Timed {
    let (mut before, mut after) = (before, after);
    for _ in 0..60 {
        let time_yr = 0.5 * (before.time_yr + after.time_yr);
        let Some(reading) = reader.at(key, time_yr) else { break };
        let middle = Timed { time_yr, reading };
        if (reading.value < wanted) == (before.reading.value < wanted) { before = middle } else { after = middle }
    }
    let off = |timed: &Timed| (timed.reading.value - wanted).abs();
    if off(&before) < off(&after) { before } else { after }
}

/// The ages that are read: nodes of the star's life, both sides of every event, and the paced axis.
fn ages(reader: &Reader<'_>, from_yr: f64, to_yr: f64) -> Vec<f64> {
    let history = reader.history;
    let mut ages = vec![from_yr, to_yr];
    ages.extend(history.life().node_ages_yr());
    ages.extend(history.events().iter().flat_map(|event| [event.time_yr.next_down(), event.time_yr]));
    let axis = TimeAxis::between(history, TimeScale::Paced, from_yr, to_yr);
    ages.extend((1..FILL).map(|place| axis.age_at(place as f64 / FILL as f64)));
    ages.retain(|age_yr| (from_yr..=to_yr).contains(age_yr));
    ages.sort_by(f64::total_cmp);
    ages.dedup();
    ages
}
