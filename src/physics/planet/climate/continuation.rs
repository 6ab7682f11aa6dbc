//! Following the climates that balance as the starlight changes, through the folds where they turn back.

use super::ice_line_model::{CELLS, Climate, IceLineModel, Profile};
use crate::units::constants::SOLAR_CONSTANT_W_M2;

/// Lengths that make a kelvin and a unit of starlight comparable along the curve.
const STEP_K: f64 = 2.0;
const STEP_INSOLATION: f64 = 0.06;
/// Newton's method ends when no cell changed by more, K; being quadratic, it has then come a hundred times closer.
const CLOSE_ENOUGH_K: f64 = 0.01;
const MOST_POINTS: usize = 300;
/// Steps along the curve, in units of the two lengths above, and how straight the curve must be to lengthen them.
const SHORTEST_STEP: f64 = 1e-3;
const TOO_SHARP: f64 = 0.9;
const NEARLY_STRAIGHT: f64 = 0.985;

/// One point of the curve: the temperature of every cell, K, and the starlight that balances it.
#[derive(Clone, Copy)]
pub(super) struct Point {
    pub(super) t: Profile,
    pub(super) s: f64,
}

/// Follows the curve from a point towards more (`sign` 1) or less (−1) starlight, for as long as `next_longest`
/// gives the longest step from each new point.
///
/// # Source
/// Pseudo-arclength continuation (Keller 1977): the starlight is solved for along with the temperatures.
pub(super) fn trace(
    model: &IceLineModel,
    start: &Point,
    sign: f64,
    mut next_longest: impl FnMut(&Point) -> Option<f64>,
) -> Vec<Point> {
    let mut points = Vec::with_capacity(48);
    points.push(*start);
    let mut here = *start;
    let mut direction = light_direction(model, &here, sign);
    let mut length = 1.0_f64;
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
        let Some(longest) = next_longest(&here) else { break };
        if straightness > NEARLY_STRAIGHT {
            length *= 1.5;
        }
        length = length.min(longest);
    }
    points
}

/// A planet of a uniform temperature, relaxed to its own profile at the starlight that balances the uniform one.
pub(super) fn at_starlight_of(model: &IceLineModel, uniform_k: f64) -> Point {
    let absorbed = model.mean(&model.balance(&[uniform_k; CELLS], 1.0).absorbed);
    let s = model.infrared.flux_w_m2(uniform_k) / absorbed;
    let mut t = [uniform_k; CELLS];
    // All ice or none is nearly linear: Newton's method at fixed starlight settles in a few steps.
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

/// The balanced profile of a mean temperature, and the starlight that makes it.
pub(super) fn of_mean(model: &IceLineModel, mean_k: f64) -> Option<Point> {
    let mut t = model.warm_start();
    let offset_k = mean_k - model.mean(&t);
    for local_k in &mut t {
        *local_k += offset_k;
    }
    let s = model.infrared.flux_w_m2(mean_k) / model.mean(&model.balance(&t, 1.0).absorbed);
    // At right angles to a uniform warming the mean stays as it is.
    corrected(model, Point { t, s }, &Point { t: [1.0; CELLS], s: 0.0 }, 30)
}

/// The largest (`sign` 1) or smallest (−1) insolation where `margin` is not negative.
pub(super) fn turning_point(
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

/// Product of two directions in units of the step lengths: root mean square over the globe, plus starlight.
fn product(model: &IceLineModel, a: &Point, b: &Point) -> f64 {
    let squares: Profile = std::array::from_fn(|i| a.t[i] * b.t[i]);
    model.mean(&squares) / (STEP_K * STEP_K) + a.s * b.s / (STEP_INSOLATION * STEP_INSOLATION)
}

fn cosine(model: &IceLineModel, a: &Point, b: &Point) -> f64 {
    product(model, a, b) / (product(model, a, a) * product(model, b, b)).sqrt()
}

/// The direction of the curve where the starlight grows (`sign` 1) or fades (−1).
fn light_direction(model: &IceLineModel, here: &Point, sign: f64) -> Point {
    let balance = model.balance(&here.t, here.s);
    let (mut t, mut unused) = (balance.absorbed, [0.0; CELLS]);
    model.solve(&balance.slope, &mut t, &mut unused);
    Point { t: t.map(|change| -sign * change), s: sign }
}

fn towards(from: &Point, to: &Point) -> Point {
    Point { t: std::array::from_fn(|i| to.t[i] - from.t[i]), s: to.s - from.s }
}

/// One step along the curve: ahead in the direction of the last one, then back onto the curve at right angles.
/// `None` when it does not find back.
fn step(model: &IceLineModel, here: &Point, direction: &Point, length: f64) -> Option<Point> {
    let norm = size(model, direction);
    let tangent = Point { t: direction.t.map(|change| change / norm), s: direction.s / norm };
    let ahead = Point { t: std::array::from_fn(|i| here.t[i] + length * tangent.t[i]), s: here.s + length * tangent.s };
    corrected(model, ahead, &tangent, 8)
}

/// Newton's method onto the curve at right angles to a tangent.
fn corrected(model: &IceLineModel, mut next: Point, tangent: &Point, rounds: u32) -> Option<Point> {
    for _ in 0..rounds {
        let balance = model.balance(&next.t, next.s);
        // J δT + absorbed δs = −excess and tangent · (δT, δs) = 0 eliminate to two solutions of J.
        let (mut by_excess, mut by_light) = (balance.excess, balance.absorbed);
        model.solve(&balance.slope, &mut by_excess, &mut by_light);
        let along_excess = product(model, tangent, &Point { t: by_excess, s: 0.0 });
        let along_light = product(model, tangent, &Point { t: by_light, s: -1.0 });
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
        if largest.is_nan() || largest > 100.0 || next.s <= 0.0 {
            return None;
        }
        if largest < CLOSE_ENOUGH_K {
            return Some(next);
        }
    }
    None
}
