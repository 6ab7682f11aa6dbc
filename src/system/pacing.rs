//! Time as a person can see and drag it: three scales that map an age to a share of the width.
//!
//! Linear and logarithmic scales are what they say. The paced scale gives every visible change a
//! similar width: its coordinate is the length of the star's path,
//! s(t) = ∫ √((d lg L)² + (4 d lg T)² + (w d lg t)² + (u dt/t₀)²), t₀ the length of the shining life before
//! a remnant is left, squeezed so that no phase of life takes less than [`LEAST_SHARE`] or more than [`LARGEST_SHARE`] of the width. Our own choice.

use super::history::History;
use crate::physics::star::{PhaseSpan, StarState};

/// Least share of the width that a phase of life gets on the paced scale.
pub const LEAST_SHARE: f64 = 0.04;
/// Largest share of the width that a phase of life gets on the paced scale, when there are three or more.
pub const LARGEST_SHARE: f64 = 0.40;
/// Weight of a decade of time against a decade of luminosity: quiet ages keep some width.
const TIME_WEIGHT: f64 = 0.35;
/// Weight of the share of the shining life: long quiet ages, in which planets have their history, keep room.
const LIFE_WEIGHT: f64 = 8.0;
/// Decades of time that the logarithmic scale shows.
const LOG_DECADES: f64 = 5.0;
/// No single step counts for more than this, so that a collapse takes no width.
const LARGEST_STEP: f64 = 0.25;

/// How time is laid out.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
pub enum TimeScale {
    /// Every visible change gets a similar width.
    #[default]
    Paced,
    /// Equal ratios of age get equal widths.
    Log,
    /// Equal spans of time get equal widths.
    Linear,
}

impl TimeScale {
    /// Every scale, in the order they are offered.
    pub const ALL: [Self; 3] = [Self::Paced, Self::Log, Self::Linear];

    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::Paced => "paced",
            Self::Log => "log",
            Self::Linear => "linear",
        }
    }

    /// Finds a scale by its machine name.
    #[must_use]
    pub fn from_key(key: &str) -> Option<Self> {
        Self::ALL.into_iter().find(|scale| scale.key() == key)
    }
}

/// A monotone map between age and share of the width, 0 to 1.
#[derive(Clone, Debug, PartialEq)]
pub struct TimeAxis {
    scale: TimeScale,
    from_yr: f64,
    to_yr: f64,
    /// Age and fraction, both rising; used by the paced scale only.
    knots: Vec<(f64, f64)>,
}

impl TimeAxis {
    /// The axis of a history from birth to the end of what is shown.
    #[must_use]
    pub fn new(history: &History, scale: TimeScale) -> Self {
        Self::between(history, scale, 0.0, history.shown_until_yr())
    }

    /// The axis of a part of a history. A reversed or empty span is widened to a year.
    #[must_use]
    pub fn between(history: &History, scale: TimeScale, from_yr: f64, to_yr: f64) -> Self {
        let to_yr = to_yr.max(from_yr + 1.0);
        let from_yr = match scale {
            TimeScale::Log if from_yr <= 0.0 => to_yr * 10_f64.powf(-LOG_DECADES),
            _ => from_yr.max(0.0),
        };
        let knots = if scale == TimeScale::Paced { paced_knots(history, from_yr, to_yr) } else { Vec::new() };
        Self { scale, from_yr, to_yr, knots }
    }

    /// The scale of this axis.
    #[must_use]
    pub fn scale(&self) -> TimeScale {
        self.scale
    }

    /// The age at the left end, yr. The logarithmic scale cannot show birth and starts a little later.
    #[must_use]
    pub fn from_yr(&self) -> f64 {
        self.from_yr
    }

    /// The age at the right end, yr.
    #[must_use]
    pub fn to_yr(&self) -> f64 {
        self.to_yr
    }

    /// The place of an age, 0 at the left end, 1 at the right; ages beyond the ends stay at the ends.
    #[must_use]
    pub fn fraction_at(&self, age_yr: f64) -> f64 {
        let age_yr = age_yr.clamp(self.from_yr, self.to_yr);
        match self.scale {
            TimeScale::Linear => (age_yr - self.from_yr) / (self.to_yr - self.from_yr),
            TimeScale::Log => (age_yr / self.from_yr).ln() / (self.to_yr / self.from_yr).ln(),
            TimeScale::Paced => interpolate(&self.knots, age_yr, |knot| knot.0, |knot| knot.1),
        }
    }

    /// The age at a place, yr; places beyond the ends give the ends.
    #[must_use]
    pub fn age_at(&self, fraction: f64) -> f64 {
        let fraction = if fraction.is_nan() { 0.0 } else { fraction.clamp(0.0, 1.0) };
        let age_yr = match self.scale {
            TimeScale::Linear => self.from_yr + fraction * (self.to_yr - self.from_yr),
            TimeScale::Log => self.from_yr * (self.to_yr / self.from_yr).powf(fraction),
            TimeScale::Paced => interpolate(&self.knots, fraction, |knot| knot.1, |knot| knot.0),
        };
        age_yr.clamp(self.from_yr, self.to_yr)
    }
}

/// Piecewise linear reading of rising knots.
fn interpolate(
    knots: &[(f64, f64)],
    x: f64,
    from: impl Fn(&(f64, f64)) -> f64,
    to: impl Fn(&(f64, f64)) -> f64,
) -> f64 {
    let after = knots.partition_point(|knot| from(knot) <= x);
    match (after.checked_sub(1).and_then(|before| knots.get(before)), knots.get(after)) {
        (Some(before), Some(next)) => {
            let share = (x - from(before)) / (from(next) - from(before));
            to(before) + share * (to(next) - to(before))
        }
        (Some(end), None) | (None, Some(end)) => to(end),
        (None, None) => 0.0,
    }
}

fn paced_knots(history: &History, from_yr: f64, to_yr: f64) -> Vec<(f64, f64)> {
    let ages = sample_ages(history, from_yr, to_yr);
    let states: Vec<StarState> = ages.iter().map(|age_yr| history.star_at(*age_yr)).collect();
    // The offset makes lg t harmless at birth; a hundredth of the first phase is early enough to matter to nobody.
    let first_phase_yr = history.spans().first().map_or(to_yr, |span| span.to_yr - span.from_yr);
    let offset_yr = 0.01 * first_phase_yr.min(to_yr);
    let shining_yr = history.spans().iter().find(|span| span.phase.is_remnant()).map_or(to_yr, |span| span.from_yr);
    let steps: Vec<f64> = (1..ages.len())
        .map(|index| {
            let decades = ((ages[index] + offset_yr) / (ages[index - 1] + offset_yr)).log10();
            let shining = (ages[index].min(shining_yr) - ages[index - 1].min(shining_yr)) / shining_yr;
            let pace = (TIME_WEIGHT * decades).hypot(LIFE_WEIGHT * shining);
            path_length(&states[index - 1], &states[index]).hypot(pace)
        })
        .collect();
    let widths = bounded_widths(history.spans(), &ages, &steps);
    let mut knots = Vec::with_capacity(ages.len());
    let mut fraction = 0.0;
    knots.push((ages[0], 0.0));
    for (index, width) in widths.iter().enumerate() {
        fraction += width;
        let last = knots.last().copied().unwrap_or((0.0, 0.0));
        // Both coordinates must rise, or the way back from a place to an age is lost.
        if ages[index + 1] > last.0 && fraction > last.1 {
            knots.push((ages[index + 1], fraction));
        }
    }
    let total = knots.last().map_or(1.0, |knot| knot.1);
    for knot in &mut knots {
        knot.1 /= total;
    }
    knots
}

fn path_length(before: &StarState, after: &StarState) -> f64 {
    if before.phase.is_dark() || after.phase.is_dark() {
        return 0.0;
    }
    let decades = |from: f64, to: f64| if from > 0.0 && to > 0.0 { (to / from).log10() } else { 0.0 };
    let luminosity = decades(before.luminosity_lsun, after.luminosity_lsun);
    let temperature = 4.0 * decades(before.effective_temperature_k, after.effective_temperature_k);
    luminosity.hypot(temperature).min(LARGEST_STEP)
}

/// Ages at which the path is measured: the star's nodes, the ends, and fill-ins where nodes are far apart.
fn sample_ages(history: &History, from_yr: f64, to_yr: f64) -> Vec<f64> {
    let mut coarse = vec![from_yr];
    coarse.extend(history.life().node_ages_yr().iter().copied().filter(|age_yr| *age_yr > from_yr && *age_yr < to_yr));
    coarse.push(to_yr);
    coarse.dedup();
    let largest_gap_yr = (to_yr - from_yr) / 400.0;
    let mut ages = Vec::with_capacity(2 * coarse.len());
    for pair in coarse.windows(2) {
        ages.push(pair[0]);
        let gap_yr = pair[1] - pair[0];
        // A step is small enough when it is short against the whole or against its own age.
        let pieces = (gap_yr / largest_gap_yr.min(0.1 * pair[1])).ceil().clamp(1.0, 64.0);
        let ratio = pair[1] / pair[0];
        for piece in 1..pieces as u32 {
            let share = f64::from(piece) / pieces;
            let age_yr =
                if pair[0] > 0.0 && ratio > 1.5 { pair[0] * ratio.powf(share) } else { pair[0] + share * gap_yr };
            ages.push(age_yr);
        }
    }
    ages.push(to_yr);
    ages
}

/// Rescales steps so that every phase's share of the width stays within its bounds.
fn bounded_widths(spans: &[PhaseSpan], ages: &[f64], steps: &[f64]) -> Vec<f64> {
    let phase_of = |index: usize| {
        let middle_yr = 0.5 * (ages[index] + ages[index + 1]);
        spans.partition_point(|span| span.to_yr <= middle_yr).min(spans.len().saturating_sub(1))
    };
    let phases: Vec<usize> = (0..steps.len()).map(phase_of).collect();
    let mut shares = vec![0.0; spans.len().max(1)];
    for (step, phase) in steps.iter().zip(&phases) {
        shares[*phase] += step;
    }
    let totals = shares.clone();
    bound_shares(&mut shares);
    steps.iter().zip(&phases).map(|(step, phase)| step * shares[*phase] / totals[*phase]).collect()
}

/// Brings shares to a sum of one with every present one within the bounds, keeping the free ones in proportion.
fn bound_shares(shares: &mut [f64]) {
    let present: Vec<usize> = (0..shares.len()).filter(|index| shares[*index] > 0.0).collect();
    let count = present.len() as f64;
    let least = LEAST_SHARE.min(0.5 / count);
    let largest = LARGEST_SHARE.max(1.2 / count).min(1.0);
    let natural = shares.to_vec();
    // The common scale of the free shares is the one root of a rising function: halve for it.
    let sum_at = |scale: f64| present.iter().map(|index| (natural[*index] * scale).clamp(least, largest)).sum::<f64>();
    let smallest = present.iter().map(|index| natural[*index]).fold(f64::INFINITY, f64::min);
    let (mut low, mut high) = (0.0, largest / smallest);
    for _ in 0..200 {
        let middle = 0.5 * (low + high);
        if sum_at(middle) < 1.0 { low = middle } else { high = middle }
    }
    for index in present {
        shares[index] = (natural[index] * high).clamp(least, largest);
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn shares_keep_their_bounds_and_sum_to_one() {
        for natural in [vec![1.0], vec![1.0, 100.0], vec![5.0, 0.01, 0.2, 80.0, 3.0, 0.0, 0.001]] {
            let mut shares = natural.clone();
            bound_shares(&mut shares);
            let sum: f64 = shares.iter().sum();
            assert!((sum - 1.0).abs() < 1e-9, "{natural:?}: {shares:?}");
            if natural.len() > 3 {
                assert!(
                    shares.iter().all(|share| *share == 0.0 || (LEAST_SHARE..=LARGEST_SHARE + 1e-9).contains(share))
                );
            }
        }
    }

    #[test]
    fn knots_are_read_both_ways() {
        let knots = [(0.0, 0.0), (10.0, 0.25), (40.0, 1.0)];
        let fraction = interpolate(&knots, 25.0, |knot| knot.0, |knot| knot.1);
        assert!((fraction - 0.625).abs() < 1e-12);
        assert!((interpolate(&knots, fraction, |knot| knot.1, |knot| knot.0) - 25.0).abs() < 1e-12);
    }
}
