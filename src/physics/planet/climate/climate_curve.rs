//! Every lasting climate a planet can have under one colour of starlight.

use super::continuation::{Point, at_starlight_of, of_mean, trace, turning_point};
use super::ice_line_model::{Climate, IceLineModel, Profile};

/// Warmest latitude of a frozen planet and of one with open water, K: the ice changes between them.
const FROZEN_BELOW_K: f64 = 265.15;
const OPEN_ABOVE_K: f64 = 263.15;
/// Uniform temperature of the frozen planet where its branch is taken up, K: far below any thaw.
const FROZEN_START_K: f64 = 228.0;
/// Means from which the open branch may be taken up, K: the first whose starlight is enough, else the last. Beyond
/// 345 K the infrared polynomial is no longer used in most of the globe.
const OPEN_STARTS_K: [f64; 6] = [300.0, 310.0, 318.0, 326.0, 335.0, 345.0];
/// Longest steps along the branches: far from the thaw, where the frozen one is all but straight; near it; and on the
/// open branch, off which figures are read.
const LONGEST_FROZEN_STEP: f64 = 2.5;
const LONGEST_THAWING_STEP: f64 = 1.0;
const THAWING_ABOVE_K: f64 = 249.0;
const LONGEST_OPEN_STEP: f64 = 1.8;
/// The open branch is given up where climates have needed so much more light again, and so much less warmth, than
/// the faintest yet: no further lasting climate with open water follows. Under a steep tilt, where ice comes in belts,
/// one may follow late.
const GIVE_UP_LIGHT: f64 = 1.02;
const GIVE_UP_COOLING_K: f64 = 7.0;
const GIVE_UP_LIGHT_BELTS: f64 = 1.1;
const GIVE_UP_COOLING_BELTS_K: f64 = 14.0;
/// Mean temperature at which water reaches the upper air in quantity, K. Kasting 1988, Kasting et al. 1993.
pub(crate) const HOT_MEAN_K: f64 = 340.0;

/// The climates of a planet: frozen up to the thaw, and open from the freeze upwards.
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
    /// Temperature of every cell, K, of each of them.
    open_profiles_k: Vec<Profile>,
}

impl ClimateCurve {
    /// Follows the frozen branch up to its thaw and the open one from an insolation, or 345 K, down to its freeze.
    ///
    /// # Source
    /// Pseudo-arclength continuation (Keller 1977): turning points are found as they are, without searching.
    #[must_use]
    pub fn follow(model: &IceLineModel, up_to_insolation_earth: f64) -> Self {
        let thaw_insolation_earth = follow_frozen(model);
        let (points, climates) = follow_open(model, up_to_insolation_earth);
        let freeze_insolation_earth =
            turning_point(model, &points, &climates, |climate| climate.warmest_k - OPEN_ABOVE_K, -1.0);
        let mut open: Vec<Climate> = Vec::with_capacity(climates.len());
        let mut open_profiles_k: Vec<Profile> = Vec::with_capacity(climates.len());
        // From the warm end down, keep what needs ever less starlight: the uppermost climate at each insolation.
        for (climate, point) in climates.into_iter().zip(&points) {
            if open.last().is_none_or(|last| climate.insolation_earth < last.insolation_earth)
                && climate.warmest_k >= OPEN_ABOVE_K
            {
                open.push(climate);
                open_profiles_k.push(point.t);
            }
        }
        open.reverse();
        open_profiles_k.reverse();
        let hot =
            open.windows(2).find(|pair| pair[0].mean_k < HOT_MEAN_K && pair[1].mean_k >= HOT_MEAN_K).map(|pair| {
                let share = (HOT_MEAN_K - pair[0].mean_k) / (pair[1].mean_k - pair[0].mean_k);
                pair[0].insolation_earth + share * (pair[1].insolation_earth - pair[0].insolation_earth)
            });
        Self { freeze_insolation_earth, thaw_insolation_earth, hot_insolation_earth: hot, open, open_profiles_k }
    }

    /// The climate with open water at an insolation, held at its end values outside the curve.
    #[must_use]
    pub fn open_climate(&self, insolation_earth: f64) -> Option<Climate> {
        let (low, high, share) = self.place(insolation_earth)?;
        let is_end_of_curve = self.open.last().is_some_and(|last| last.insolation_earth <= insolation_earth);
        Some(Climate { insolation_earth, is_end_of_curve, ..self.open[low].mixed(&self.open[high], share) })
    }

    /// The temperatures of [`ClimateCurve::open_climate`], K.
    pub(crate) fn open_profile_k(&self, insolation_earth: f64) -> Option<Profile> {
        let (low, high, share) = self.place(insolation_earth)?;
        Some(mixed_profiles(&self.open_profiles_k[low], &self.open_profiles_k[high], share))
    }

    /// The open climates on both sides of an insolation and the share of the second; the same one twice beyond the ends.
    fn place(&self, insolation_earth: f64) -> Option<(usize, usize, f64)> {
        let last = self.open.len().checked_sub(1)?;
        let after = self.open.partition_point(|climate| climate.insolation_earth <= insolation_earth);
        if after == 0 || after > last {
            let end = after.min(last);
            return Some((end, end, 0.0));
        }
        let (low, high) = (self.open[after - 1].insolation_earth, self.open[after].insolation_earth);
        Some((after - 1, after, (insolation_earth - low) / (high - low)))
    }
}

/// Temperatures part of the way from one profile to another.
pub(crate) fn mixed_profiles(from: &Profile, to: &Profile, share: f64) -> Profile {
    std::array::from_fn(|i| from[i] + share * (to[i] - from[i]))
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

/// The insolation at which a frozen planet thaws.
fn follow_frozen(model: &IceLineModel) -> f64 {
    let mut most = 0.0_f64;
    let start = at_starlight_of(model, FROZEN_START_K);
    let points = trace(model, &start, 1.0, |point| {
        most = most.max(point.s);
        // A little beyond the fold, so that it lies between three points.
        let warmest_k = point.t.iter().copied().fold(0.0, f64::max);
        let goes_on = point.s > 0.995 * most && warmest_k < FROZEN_BELOW_K + 5.0;
        goes_on.then_some(if warmest_k < THAWING_ABOVE_K { LONGEST_FROZEN_STEP } else { LONGEST_THAWING_STEP })
    });
    let climates: Vec<Climate> = points.iter().map(|point| model.describe(&point.t, point.s)).collect();
    turning_point(model, &points, &climates, |climate| FROZEN_BELOW_K - climate.warmest_k, 1.0)
}

/// The branch with open water from the warm end down to past its last fold, and the figures of its climates.
fn follow_open(model: &IceLineModel, up_to_insolation_earth: f64) -> (Vec<Point>, Vec<Climate>) {
    let mut start = None;
    for mean_k in OPEN_STARTS_K {
        start = of_mean(model, mean_k).or(start);
        if start.is_some_and(|point| point.s >= up_to_insolation_earth) {
            break;
        }
    }
    let start = start.unwrap_or_else(|| at_starlight_of(model, OPEN_STARTS_K[1]));
    let (give_up_light, give_up_cooling_k) = if model.has_ice_line {
        (GIVE_UP_LIGHT, GIVE_UP_COOLING_K)
    } else {
        (GIVE_UP_LIGHT_BELTS, GIVE_UP_COOLING_BELTS_K)
    };
    let (mut least, mut mean_there_k) = (f64::INFINITY, 0.0);
    let points = trace(model, &start, -1.0, |point| {
        let mean_k = model.mean(&point.t);
        if point.s < least {
            (least, mean_there_k) = (point.s, mean_k);
        }
        let given_up = point.s > give_up_light * least || mean_k < mean_there_k - give_up_cooling_k;
        let goes_on = !given_up && point.t.iter().any(|local_k| *local_k >= OPEN_ABOVE_K - 2.0);
        goes_on.then_some(LONGEST_OPEN_STEP)
    });
    let climates = points.iter().map(|point| model.describe(&point.t, point.s)).collect();
    (points, climates)
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
