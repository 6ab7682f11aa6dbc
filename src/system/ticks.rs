//! Round ages for the marks of a time axis, on any scale.

use super::pacing::{TimeAxis, TimeScale};
use crate::units::number_text::fixed;

/// A mark on a time axis.
#[derive(Clone, Debug, PartialEq)]
pub struct TimeTick {
    /// Its age, yr.
    pub age_yr: f64,
    /// Its place on the whole axis, 0 to 1.
    pub fraction: f64,
    /// Its label, as short as it can be: `1 Gyr`, `12.3 Gyr`.
    pub label: String,
}

/// More digits than this make a label that nobody reads.
const MOST_DIGITS: u32 = 6;

/// About `count` marks on the part of an axis from one fraction to another, each at the roundest age near
/// an evenly spaced place. On a linear axis the steps are even.
#[must_use]
pub fn ticks(axis: &TimeAxis, from_fraction: f64, to_fraction: f64, count: usize) -> Vec<TimeTick> {
    let count = count.clamp(1, 100);
    let ages: Vec<f64> = if axis.scale() == TimeScale::Linear {
        even_ages(axis.age_at(from_fraction), axis.age_at(to_fraction), count)
    } else {
        let width = (to_fraction - from_fraction) / count as f64;
        (0..count)
            .filter_map(|index| {
                let middle = from_fraction + width * (index as f64 + 0.5);
                roundest(axis.age_at(middle - 0.28 * width), axis.age_at(middle + 0.28 * width))
            })
            .collect()
    };
    let mut ticks: Vec<TimeTick> = Vec::with_capacity(ages.len());
    for age_yr in ages {
        let fraction = axis.fraction_at(age_yr);
        let far_enough = ticks
            .last()
            .is_none_or(|last| fraction - last.fraction > 0.4 * (to_fraction - from_fraction) / count as f64);
        let label = age_label(age_yr);
        // Ages that differ only beyond the digits of a label would look like a mistake.
        let is_new = ticks.last().is_none_or(|last| last.label != label);
        if fraction >= from_fraction && fraction <= to_fraction && far_enough && is_new {
            ticks.push(TimeTick { age_yr, fraction, label });
        }
    }
    ticks
}

fn even_ages(from_yr: f64, to_yr: f64, count: usize) -> Vec<f64> {
    let rough_yr = (to_yr - from_yr) / count as f64;
    if rough_yr.is_nan() || rough_yr <= 0.0 {
        return vec![from_yr];
    }
    let decade = 10_f64.powf(rough_yr.log10().floor());
    let step_yr = [1.0, 2.0, 5.0, 10.0]
        .map(|factor| factor * decade)
        .into_iter()
        .find(|step| *step >= rough_yr)
        .unwrap_or(rough_yr);
    let first = (from_yr / step_yr).ceil();
    (0..=count + 1).map(|index| (first + index as f64) * step_yr).take_while(|age_yr| *age_yr <= to_yr).collect()
}

/// The age in an interval that needs the fewest digits, and of these the one nearest to the middle.
fn roundest(low_yr: f64, high_yr: f64) -> Option<f64> {
    if high_yr <= 0.0 || high_yr <= low_yr {
        return None;
    }
    let middle_yr = 0.5 * (low_yr + high_yr);
    let mut step_yr = 10_f64.powf(high_yr.log10().floor());
    for _ in 0..MOST_DIGITS {
        for factor in [1.0, 0.5, 0.2] {
            let nearest_yr = (middle_yr / (step_yr * factor)).round() * step_yr * factor;
            if nearest_yr >= low_yr && nearest_yr <= high_yr && nearest_yr > 0.0 {
                return Some(nearest_yr);
            }
        }
        step_yr /= 10.0;
    }
    None
}

/// A round age with no more digits than it has: `1.5 Gyr`, `250 Myr`, `0`.
#[must_use]
pub fn age_label(age_yr: f64) -> String {
    if age_yr == 0.0 {
        return "0".to_owned();
    }
    let units = [(1e12, "Tyr"), (1e9, "Gyr"), (1e6, "Myr"), (1e3, "kyr"), (1.0, "yr")];
    let (length_yr, unit) =
        units.into_iter().find(|(length_yr, _)| age_yr >= 0.999_999 * length_yr).unwrap_or((1.0, "yr"));
    let value = age_yr / length_yr;
    let decimals = (0..=9).find(|decimals| {
        let scaled = value * 10_f64.powi(*decimals);
        (scaled - scaled.round()).abs() < 1e-7 * scaled.abs().max(1e-3)
    });
    format!("{} {unit}", fixed(value, decimals.map_or(3, |decimals| decimals as usize)))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn round_ages_are_preferred() {
        assert_eq!(roundest(0.93e9, 1.2e9), Some(1e9));
        assert_eq!(roundest(12.31e9, 12.38e9).map(age_label).as_deref(), Some("12.35 Gyr"));
        assert_eq!(roundest(5.0, 5.0), None);
    }

    #[test]
    fn labels_are_as_short_as_the_age_is_round() {
        assert_eq!(age_label(1e9), "1 Gyr");
        assert_eq!(age_label(2.5e8), "250 Myr");
        assert_eq!(age_label(1.25e12), "1.25 Tyr");
        assert_eq!(age_label(0.0), "0");
    }

    #[test]
    fn even_steps_are_one_two_or_five() {
        let ages = even_ages(0.0, 13e9, 6);
        assert_eq!(ages[1] - ages[0], 5e9);
        assert_eq!(even_ages(3.0, 3.0, 5), [3.0]);
    }
}
