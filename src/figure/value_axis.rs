//! The vertical axis of a plot: linear or logarithmic, with round marks.

use crate::units::number_text::{fixed, superscript};

/// A mark on a value axis.
#[derive(Clone, Debug, PartialEq)]
pub struct ValueTick {
    /// Height of the mark, 0 at the bottom to 1 at the top.
    pub height: f64,
    /// Its label; empty for a mark that only helps the eye.
    pub label: String,
}

/// A monotone map from values to heights between 0 and 1.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct ValueAxis {
    /// Equal ratios get equal heights.
    pub is_log: bool,
    /// Value at the bottom.
    pub lowest: f64,
    /// Value at the top.
    pub highest: f64,
}

impl ValueAxis {
    /// A linear axis that holds all finite values with a little air.
    #[must_use]
    pub fn linear(values: impl Iterator<Item = f64>) -> Self {
        let (low, high) = span(values.filter(|value| value.is_finite())).unwrap_or((0.0, 1.0));
        let air = 0.06 * (high - low).max(0.02 * high.abs()).max(1e-12);
        Self { is_log: false, lowest: low - air, highest: high + air }
    }

    /// A logarithmic axis that holds all positive values, at most `most_decades` below the largest.
    #[must_use]
    pub fn log(values: impl Iterator<Item = f64>, most_decades: f64) -> Self {
        let (low, high) = span(values.filter(|value| value.is_finite() && *value > 0.0)).unwrap_or((0.1, 10.0));
        let low = low.max(high * 10_f64.powf(-most_decades));
        let air = (0.06 * (high / low).log10()).max(0.04);
        Self { is_log: true, lowest: low * 10_f64.powf(-air), highest: high * 10_f64.powf(air) }
    }

    /// The height of a value; beyond 0 to 1 outside the axis, `None` where the axis knows no place for it.
    #[must_use]
    pub fn height(&self, value: f64) -> Option<f64> {
        let height = if self.is_log {
            if value <= 0.0 {
                return None;
            }
            (value / self.lowest).ln() / (self.highest / self.lowest).ln()
        } else {
            (value - self.lowest) / (self.highest - self.lowest)
        };
        height.is_finite().then_some(height)
    }

    /// The value at a height.
    #[must_use]
    pub fn value(&self, height: f64) -> f64 {
        if self.is_log {
            self.lowest * (self.highest / self.lowest).powf(height)
        } else {
            self.lowest + height * (self.highest - self.lowest)
        }
    }

    /// At most about `count` labelled marks at round values.
    #[must_use]
    pub fn ticks(&self, count: usize) -> Vec<ValueTick> {
        let count = count.clamp(1, 40);
        let values = if self.is_log { self.log_marks(count) } else { self.even_marks(count) };
        values
            .into_iter()
            .filter_map(|(value, label)| {
                self.height(value)
                    .filter(|height| (0.0..=1.0).contains(height))
                    .map(|height| ValueTick { height, label })
            })
            .collect()
    }

    fn even_marks(&self, count: usize) -> Vec<(f64, String)> {
        let rough = (self.highest - self.lowest) / count as f64;
        let decade = 10_f64.powf(rough.log10().floor());
        let step = [1.0, 2.0, 5.0, 10.0]
            .map(|factor| factor * decade)
            .into_iter()
            .find(|step| *step >= rough)
            .unwrap_or(rough);
        let decimals = (-step.log10().floor()).clamp(0.0, 12.0) as usize;
        let first = (self.lowest / step).ceil();
        (0..=count + 1)
            .map(|index| (first + index as f64) * step)
            .take_while(|value| *value <= self.highest)
            .map(|value| (value, fixed(value, decimals)))
            .collect()
    }

    fn log_marks(&self, count: usize) -> Vec<(f64, String)> {
        let (low, high) = (self.lowest.log10(), self.highest.log10());
        let decades = high - low;
        if decades < 0.7 {
            // Less than a factor of five: even steps read better than ones and twos.
            return self.even_marks(count);
        }
        let factors: &[f64] = if decades * 3.0 < count as f64 {
            &[1.0, 2.0, 5.0]
        } else if decades * 1.6 < count as f64 {
            &[1.0, 3.0]
        } else {
            &[1.0]
        };
        let every = (decades / count as f64).ceil().max(1.0) as i32;
        (low.floor() as i32..=high.ceil() as i32)
            .filter(|exponent| exponent.rem_euclid(every) == 0)
            .flat_map(|exponent| {
                factors.iter().map(move |factor| (factor * 10_f64.powi(exponent), power_label(*factor, exponent)))
            })
            .collect()
    }
}

/// `1000` and `0.01` near one, `10⁻⁴` farther away.
fn power_label(factor: f64, exponent: i32) -> String {
    if (-3..=4).contains(&exponent) {
        return fixed(factor * 10_f64.powi(exponent), usize::try_from(-exponent).unwrap_or(0));
    }
    let power = format!("10{}", superscript(exponent));
    if factor == 1.0 { power } else { format!("{factor} × {power}") }
}

fn span(values: impl Iterator<Item = f64>) -> Option<(f64, f64)> {
    values.fold(None, |found, value| match found {
        None => Some((value, value)),
        Some((low, high)) => Some((low.min(value), high.max(value))),
    })
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn marks_are_round_and_on_the_axis() {
        let axis = ValueAxis::log([1e-6, 3000.0].into_iter(), 12.0);
        let ticks = axis.ticks(5);
        assert!((3..=6).contains(&ticks.len()), "{ticks:?}");
        assert!(ticks.iter().any(|tick| tick.label == "0.001"), "{ticks:?}");
        let axis = ValueAxis::linear([3.0, 412.0].into_iter());
        assert!(axis.ticks(5).iter().any(|tick| tick.label == "200"));
    }

    #[test]
    fn heights_are_read_both_ways() {
        for axis in [ValueAxis::log([0.01, 100.0].into_iter(), 12.0), ValueAxis::linear([-5.0, 5.0].into_iter())] {
            let height = axis.height(0.5).expect("on the axis");
            assert!((axis.value(height) - 0.5).abs() < 1e-12);
        }
        assert_eq!(ValueAxis::log([1.0].into_iter(), 3.0).height(0.0), None);
    }

    #[test]
    fn an_empty_or_flat_set_still_makes_an_axis() {
        for axis in [
            ValueAxis::linear(std::iter::empty()),
            ValueAxis::linear([2.0, 2.0].into_iter()),
            ValueAxis::log(std::iter::empty(), 5.0),
        ] {
            assert!(axis.lowest < axis.highest);
            assert!(!axis.ticks(4).is_empty(), "{axis:?}");
        }
    }
}
