//! Every climate a planet can have under one colour of starlight, followed through both folds.

use super::ice_line_model::{CELLS, Climate, IceLineModel, Profile};
use crate::units::constants::SOLAR_CONSTANT_W_M2;

/// Lengths that make a kelvin and a unit of starlight comparable along the curve.
const STEP_K: f64 = 2.0;
const STEP_INSOLATION: f64 = 0.06;
/// Warmest latitude of a frozen planet and of one with open water, K: the ice changes between them.
const FROZEN_BELOW_K: f64 = 265.15;
const OPEN_ABOVE_K: f64 = 263.15;
/// Newton's method ends when no cell changed by more, K; being quadratic, it has then come a hundred times closer.
const CLOSE_ENOUGH_K: f64 = 0.01;
const MOST_POINTS: usize = 600;
/// Steps along the curve, in units of the two lengths above, and how straight the curve must be to lengthen them.
const LONGEST_STEP: f64 = 4.0;
const LONGEST_OPEN_STEP: f64 = 1.8;
/// Mean temperature below which a climate is frozen or does not last, K: nobody reads a figure off the curve there.
const MOSTLY_ICE_K: f64 = 258.0;
const SHORTEST_STEP: f64 = 1e-3;
const TOO_SHARP: f64 = 0.9;
const NEARLY_STRAIGHT: f64 = 0.985;
/// Mean temperature where the curve ends, K: the infrared polynomial is no longer used in most of the globe there.
const HOTTEST_MEAN_K: f64 = 345.0;
/// Mean temperature at which water reaches the upper air in quantity, K. Kasting 1988, Kasting et al. 1993.
pub(crate) const HOT_MEAN_K: f64 = 340.0;

/// One point of the curve.
#[derive(Clone, Copy)]
struct Point {
    t: Profile,
    s: f64,
}

/// The climates of a planet, from frozen over through the unstable ones to warm.
#[derive(Clone, Debug)]
pub struct ClimateCurve {
    /// Insolation below which open water cannot persist, units of 1361.17 W m⁻².
    pub freeze_insolation_earth: f64,
    /// Insolation above which a frozen planet thaws, units of 1361.17 W m⁻².
    pub thaw_insolation_earth: f64,
    /// Insolation at which the mean surface temperature reaches 340 K, units of 1361.17 W m⁻², where the curve gets
    /// that far.
    pub hot_insolation_earth: Option<f64>,
    /// Climates with open water, from least to most starlight.
    pub(crate) open: Vec<Climate>,
}

impl ClimateCurve {
    /// Follows the curve up to an insolation.
    ///
    /// # Source
    /// Pseudo-arclength continuation (Keller 1977): the starlight is solved for along with the temperatures, so that
    /// the turning points are found as they are, without searching.
    #[must_use]
    pub fn follow(model: &IceLineModel, up_to_insolation_earth: f64) -> Self {
        let mut points = Vec::with_capacity(96);
        let mut here = frozen_start(model);
        points.push(here);
        let (mut direction, mut length) = (first_direction(model, &here), 1.0);
        while points.len() < MOST_POINTS && length > SHORTEST_STEP {
            let Some(next) = step(model, &here, &direction, length) else {
                length *= 0.5;
                continue;
            };
            let new_direction = towards(&here, &next);
            let straightness = cosine(model, &direction, &new_direction);
            if straightness < TOO_SHARP && length > 2.0 * SHORTEST_STEP {
                length *= 0.5;
                continue;
            }
            (direction, here) = (new_direction, next);
            points.push(here);
            let mean_k = model.mean(&here.t);
            if mean_k > HOTTEST_MEAN_K || (here.s > up_to_insolation_earth && mean_k > OPEN_ABOVE_K) {
                break;
            }
            if straightness > NEARLY_STRAIGHT {
                length *= 1.5;
            }
            length = length.min(if mean_k < MOSTLY_ICE_K { LONGEST_STEP } else { LONGEST_OPEN_STEP });
        }
        Self::read_off(model, &points)
    }

    fn read_off(model: &IceLineModel, points: &[Point]) -> Self {
        let climates: Vec<Climate> = points.iter().map(|point| model.describe(&point.t, point.s)).collect();
        let freeze = turning_point(model, points, &climates, |climate| climate.warmest_k - OPEN_ABOVE_K, -1.0);
        let thaw = turning_point(model, points, &climates, |climate| FROZEN_BELOW_K - climate.warmest_k, 1.0);
        let mut open: Vec<Climate> = Vec::with_capacity(climates.len());
        // From the warm end down, keep what needs ever less starlight: the uppermost climate at each insolation.
        for climate in climates.iter().rev() {
            if climate.insolation_earth < freeze || climate.warmest_k < OPEN_ABOVE_K {
                break;
            }
            if open.last().is_none_or(|last| climate.insolation_earth < last.insolation_earth) {
                open.push(*climate);
            }
        }
        open.reverse();
        let hot =
            open.windows(2).find(|pair| pair[0].mean_k < HOT_MEAN_K && pair[1].mean_k >= HOT_MEAN_K).map(|pair| {
                let share = (HOT_MEAN_K - pair[0].mean_k) / (pair[1].mean_k - pair[0].mean_k);
                pair[0].insolation_earth + share * (pair[1].insolation_earth - pair[0].insolation_earth)
            });
        Self { freeze_insolation_earth: freeze, thaw_insolation_earth: thaw, hot_insolation_earth: hot, open }
    }

    /// The climate with open water at an insolation, held at its end values outside the curve.
    #[must_use]
    pub fn open_climate(&self, insolation_earth: f64) -> Option<Climate> {
        let (first, last) = (self.open.first()?, self.open.last()?);
        let after = self.open.partition_point(|climate| climate.insolation_earth <= insolation_earth);
        if after == 0 {
            return Some(Climate { insolation_earth, ..*first });
        }
        if after == self.open.len() {
            return Some(Climate { insolation_earth, is_end_of_curve: true, ..*last });
        }
        let (low, high) = (&self.open[after - 1], &self.open[after]);
        let share = (insolation_earth - low.insolation_earth) / (high.insolation_earth - low.insolation_earth);
        Some(low.mixed(high, share))
    }
}

impl Climate {
    /// The climate part of the way to another.
    pub(crate) fn mixed(&self, other: &Self, share: f64) -> Self {
        let mix = |from: f64, to: f64| from + share * (to - from);
        Self {
            insolation_earth: mix(self.insolation_earth, other.insolation_earth),
            mean_k: mix(self.mean_k, other.mean_k),
            equator_k: mix(self.equator_k, other.equator_k),
            pole_k: mix(self.pole_k, other.pole_k),
            warmest_k: mix(self.warmest_k, other.warmest_k),
            ice_fraction: mix(self.ice_fraction, other.ice_fraction),
            planetary_albedo: mix(self.planetary_albedo, other.planetary_albedo),
            ice_line_deg: self.ice_line_deg.zip(other.ice_line_deg).map(|(from, to)| mix(from, to)),
            is_end_of_curve: self.is_end_of_curve || other.is_end_of_curve,
        }
    }
}

/// The largest (`sign` 1) or smallest (−1) insolation where `margin` is not negative.
fn turning_point(
    model: &IceLineModel,
    points: &[Point],
    climates: &[Climate],
    margin: impl Fn(&Climate) -> f64,
    sign: f64,
) -> f64 {
    let mut best = f64::NEG_INFINITY;
    for (at, here) in climates.iter().enumerate() {
        let inside = margin(here) >= 0.0;
        if inside {
            best = best.max(sign * here.insolation_earth);
        }
        let Some(next) = climates.get(at + 1) else { continue };
        if inside != (margin(next) >= 0.0) {
            let share = margin(here) / (margin(here) - margin(next));
            best = best.max(sign * (here.insolation_earth + share * (next.insolation_earth - here.insolation_earth)));
        }
        if inside && at > 0 {
            best = best.max(sign * refined(model, [points[at - 1], points[at], points[at + 1]], sign));
        }
    }
    if best.is_finite() { sign * best } else { 0.0 }
}

/// The insolation at the turning point near the middle of three points, or that of the middle one if the curve does
/// not turn there: steps to the crown of the parabola through the three, each time back onto the curve.
fn refined(model: &IceLineModel, [mut before, mut middle, mut after]: [Point; 3], sign: f64) -> f64 {
    for _ in 0..4 {
        let (down, up) = (towards(&middle, &before), towards(&middle, &after));
        if down.s * sign >= 0.0 || up.s * sign >= 0.0 {
            break;
        }
        let (length_down, length_up) = (size(model, &down), size(model, &up));
        let curvature = (up.s / length_up + down.s / length_down) / (length_up + length_down);
        let crown = -(up.s / length_up - curvature * length_up) / (2.0 * curvature);
        let (direction, length) = if crown > 0.0 { (up, crown) } else { (down, -crown) };
        if length.is_nan() || length < 1e-3 * length_up.min(length_down) {
            break;
        }
        let Some(next) = step(model, &middle, &direction, length) else { break };
        let is_higher = next.s * sign > middle.s * sign;
        (before, middle, after) = match (crown > 0.0, is_higher) {
            (true, true) => (middle, next, after),
            (true, false) => (before, middle, next),
            (false, true) => (before, next, middle),
            (false, false) => (next, middle, after),
        };
        if (next.s - middle.s).abs() < 1e-5 && !is_higher {
            break;
        }
    }
    middle.s
}

fn size(model: &IceLineModel, direction: &Point) -> f64 {
    product(model, direction, direction).sqrt()
}

/// A planet that is ice all over, well below its thaw.
fn frozen_start(model: &IceLineModel) -> Point {
    let uniform_k = 228.0;
    let absorbed = model.mean(&model.balance(&[uniform_k; CELLS], 1.0).absorbed);
    let s = model.infrared.flux_w_m2(uniform_k) / absorbed;
    let mut t = [uniform_k; CELLS];
    // All ice is nearly linear: Newton's method at fixed starlight settles in a few steps.
    for _ in 0..30 {
        let balance = model.balance(&t, s);
        let (mut change, mut unused) = (balance.excess, [0.0; CELLS]);
        model.solve(&balance.slope, &mut change, &mut unused);
        let mut largest = 0.0_f64;
        for i in 0..CELLS {
            t[i] -= change[i].clamp(-10.0, 10.0);
            largest = largest.max(change[i].abs());
        }
        if largest < CLOSE_ENOUGH_K {
            break;
        }
    }
    Point { t, s }
}

/// Product of two directions in units of the step lengths: root mean square over the globe, plus starlight.
fn product(model: &IceLineModel, a: &Point, b: &Point) -> f64 {
    let squares: Profile = std::array::from_fn(|i| a.t[i] * b.t[i]);
    model.mean(&squares) / (STEP_K * STEP_K) + a.s * b.s / (STEP_INSOLATION * STEP_INSOLATION)
}

fn cosine(model: &IceLineModel, a: &Point, b: &Point) -> f64 {
    product(model, a, b) / (product(model, a, a) * product(model, b, b)).sqrt()
}

fn first_direction(model: &IceLineModel, here: &Point) -> Point {
    let balance = model.balance(&here.t, here.s);
    let (mut t, mut unused) = (balance.absorbed, [0.0; CELLS]);
    model.solve(&balance.slope, &mut t, &mut unused);
    Point { t: t.map(|change| -change), s: 1.0 }
}

fn towards(from: &Point, to: &Point) -> Point {
    Point { t: std::array::from_fn(|i| to.t[i] - from.t[i]), s: to.s - from.s }
}

/// One step along the curve: ahead in the direction of the last one, then back onto the curve at right angles.
/// `None` when it does not find back.
fn step(model: &IceLineModel, here: &Point, direction: &Point, length: f64) -> Option<Point> {
    let norm = size(model, direction);
    let tangent = Point { t: direction.t.map(|change| change / norm), s: direction.s / norm };
    let mut next =
        Point { t: std::array::from_fn(|i| here.t[i] + length * tangent.t[i]), s: here.s + length * tangent.s };
    for _ in 0..8 {
        let balance = model.balance(&next.t, next.s);
        // J δT + absorbed δs = −excess and tangent · (δT, δs) = 0 eliminate to two solutions of J.
        let (mut by_excess, mut by_light) = (balance.excess, balance.absorbed);
        model.solve(&balance.slope, &mut by_excess, &mut by_light);
        let along_excess = product(model, &tangent, &Point { t: by_excess, s: 0.0 });
        let along_light = product(model, &tangent, &Point { t: by_light, s: -1.0 });
        let light_change = -along_excess / along_light;
        if !light_change.is_finite() {
            return None;
        }
        next.s += light_change;
        let mut largest = light_change.abs() * SOLAR_CONSTANT_W_M2 / 4.0;
        for i in 0..CELLS {
            let change = -by_excess[i] - by_light[i] * light_change;
            next.t[i] += change;
            largest = largest.max(change.abs());
        }
        if largest.is_nan() || largest > 60.0 || next.s <= 0.0 {
            return None;
        }
        if largest < CLOSE_ENOUGH_K {
            return Some(next);
        }
    }
    None
}

#[cfg(test)]
mod tests {
    use super::super::ice_line_model::WaterWorldAir;
    use super::*;

    #[test]
    fn the_folds_lie_where_a_relaxing_climate_falls_over() {
        for (carbon_dioxide_bar, teff_k) in [(2.8e-4, 5772.0), (0.3, 2600.0)] {
            let air = WaterWorldAir { carbon_dioxide_bar, ..WaterWorldAir::default() };
            let model = IceLineModel::new(&air, teff_k).expect("in range");
            let curve = ClimateCurve::follow(&model, 1.1);
            let (freeze, thaw) = (curve.freeze_insolation_earth, curve.thaw_insolation_earth);
            assert!(model.from_warm(freeze + 0.002).expect("in range").warmest_k > OPEN_ABOVE_K);
            assert!(model.from_warm(freeze - 0.002).expect("in range").warmest_k < OPEN_ABOVE_K);
            assert!(model.from_frozen(thaw + 0.002).expect("in range").warmest_k > FROZEN_BELOW_K);
            assert!(model.from_frozen(thaw - 0.002).expect("in range").warmest_k < FROZEN_BELOW_K);
        }
    }

    #[test]
    fn a_read_climate_is_the_relaxed_one() {
        let model = IceLineModel::new(&WaterWorldAir::default(), 5772.0).expect("in range");
        let curve = ClimateCurve::follow(&model, 1.15);
        for insolation_earth in [0.93, 0.97, 1.0, 1.05, 1.1] {
            let read = curve.open_climate(insolation_earth).expect("open water");
            let relaxed = model.from_warm(insolation_earth).expect("in range");
            assert!((read.mean_k - relaxed.mean_k).abs() < 0.4, "{insolation_earth}: {read:?} {relaxed:?}");
        }
        assert!(curve.hot_insolation_earth.is_none());
    }
}
