//! The climates of one planet under every colour of starlight, worked out where they are needed.

use super::super::habitable_zone::runaway_insolation_earth;
use super::super::range::{OutOfRange, non_negative, positive};
use super::climate_curve::{ClimateCurve, mixed_profiles};
use super::ice_line_model::{Climate, Latitude, Latitudes, Profile, WaterWorldAir};
use super::infrared::OutgoingInfrared;
use super::reflection::Reflection;
use crate::units::constants::SOLAR_CONSTANT_W_M2;
use std::sync::OnceLock;

/// Effective temperatures for which the curve is followed, K; between them it is interpolated.
const TEFF_NODES_K: [f64; 13] =
    [2600.0, 2900.0, 3200.0, 3550.0, 3900.0, 4200.0, 4500.0, 4800.0, 5100.0, 5450.0, 5800.0, 6450.0, 7200.0];
/// How far beyond the heaviest planet's runaway limit a curve is followed, dimensionless.
const BEYOND_RUNAWAY: f64 = 1.02;

/// Insolations below and above which a planet is surely frozen and surely not, units of 1361.17 W m⁻².
///
/// The freeze of no planet in range lies lower, the thaw of none higher; inside, the curves decide.
pub(crate) const SURELY_FROZEN: f64 = 0.15;
pub(crate) const SURELY_THAWED: f64 = 3.0;

/// Where one planet's climate turns, under one colour of starlight, units of 1361.17 W m⁻².
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct ClimateLimits {
    /// Open water freezes over below this.
    pub freeze_insolation_earth: f64,
    /// A frozen planet thaws above this.
    pub thaw_insolation_earth: f64,
    /// The mean temperature reaches 340 K at this, where it does before the runaway limit.
    pub hot_insolation_earth: Option<f64>,
}

/// Curves of the climates under one air, tilt and heat transport, by the star's temperature.
///
/// Each curve is worked out when it is first read and kept: what is read never depends on what was asked before.
#[derive(Clone, Debug)]
pub struct ClimateTable {
    latitudes: Latitudes,
    infrared: OutgoingInfrared,
    curves: [OnceLock<ClimateCurve>; TEFF_NODES_K.len()],
}

impl ClimateTable {
    /// Prepares the table for a planet's air; curves follow when they are asked for.
    ///
    /// # Errors
    /// [`OutOfRange`] for a field of `air` out of its range.
    pub fn new(air: &WaterWorldAir) -> Result<Self, OutOfRange> {
        Ok(Self {
            latitudes: Latitudes::new(air)?,
            infrared: OutgoingInfrared::new(air.carbon_dioxide_bar)?,
            curves: [const { OnceLock::new() }; TEFF_NODES_K.len()],
        })
    }

    /// The same planet under another pressure of carbon dioxide.
    pub(crate) fn sharing(other: &Self, carbon_dioxide_bar: f64) -> Result<Self, OutOfRange> {
        let infrared = OutgoingInfrared::new(carbon_dioxide_bar)?;
        let latitudes = other.latitudes.breathing(infrared);
        Ok(Self { latitudes, infrared, curves: [const { OnceLock::new() }; TEFF_NODES_K.len()] })
    }

    pub(crate) fn latitudes(&self) -> &Latitudes {
        &self.latitudes
    }

    /// Works out the curves around a temperature ahead of their being read.
    pub(crate) fn prepare(&self, teff_k: f64) {
        self.around(teff_k);
    }

    /// Works out every curve ahead of its being read.
    pub fn prepare_all(&self) {
        for index in 0..TEFF_NODES_K.len() {
            self.curve(index);
        }
    }

    fn curve(&self, index: usize) -> &ClimateCurve {
        self.curves[index].get_or_init(|| {
            let teff_k = TEFF_NODES_K[index];
            let up_to = BEYOND_RUNAWAY * runaway_insolation_earth(teff_k, 5.0);
            ClimateCurve::follow(&self.latitudes.under(teff_k), up_to)
        })
    }

    /// The curves on both sides of a temperature, and the share of the upper one.
    fn around(&self, teff_k: f64) -> (&ClimateCurve, Option<&ClimateCurve>, f64, usize) {
        let (low, share) = bracket(teff_k);
        (self.curve(low), (share > 0.0).then(|| self.curve(low + 1)), share, low)
    }

    /// Where the climate turns under a star's light.
    ///
    /// # Accuracy
    /// Interpolated between curves in units of the runaway limit: freeze and thaw within 0.2 % of the model itself.
    /// # Errors
    /// [`OutOfRange`] for a temperature that is not positive.
    pub fn limits(&self, effective_temperature_k: f64) -> Result<ClimateLimits, OutOfRange> {
        let teff_k = positive("effective_temperature_k", effective_temperature_k)?;
        let (low, high, share, index) = self.around(teff_k);
        let here = runaway_insolation_earth(teff_k, 1.0);
        let relative = |curve: &ClimateCurve, at: usize| {
            let runaway = runaway_insolation_earth(TEFF_NODES_K[at], 1.0);
            (
                curve.freeze_insolation_earth / runaway,
                curve.thaw_insolation_earth / runaway,
                curve.hot_insolation_earth.map(|hot| hot / runaway),
            )
        };
        let (freeze, thaw, hot) = relative(low, index);
        let (freeze, thaw, hot) = high.map_or((freeze, thaw, hot), |high| {
            let (next_freeze, next_thaw, next_hot) = relative(high, index + 1);
            let mix = |from: f64, to: f64| from + share * (to - from);
            // Where only one side gets hot before it runs away, the nearer side decides.
            let nearer = if share < 0.5 { hot } else { next_hot };
            let hot = hot.zip(next_hot).map_or(nearer, |(from, to)| Some(mix(from, to)));
            (mix(freeze, next_freeze), mix(thaw, next_thaw), hot)
        });
        Ok(ClimateLimits {
            freeze_insolation_earth: freeze * here,
            thaw_insolation_earth: thaw * here,
            hot_insolation_earth: hot.map(|hot| hot * here),
        })
    }

    /// The climate with open water at an insolation under a star's light.
    ///
    /// Held at the climate of the freeze below it, and at the end of the curve (345 K, or past the runaway limit) above.
    ///
    /// # Accuracy
    /// 0.7 K against the model itself.
    /// # Errors
    /// [`OutOfRange`] for a negative insolation or a temperature that is not positive.
    pub fn open_climate(&self, insolation_earth: f64, effective_temperature_k: f64) -> Result<Climate, OutOfRange> {
        let read = |curve: &ClimateCurve, s: f64| curve.open_climate(s);
        let climate = self.open(insolation_earth, effective_temperature_k, read, Climate::mixed)?;
        Ok(Climate { insolation_earth, ..climate })
    }

    /// The latitudes of [`ClimateTable::open_climate`].
    pub(crate) fn open_latitudes(&self, insolation_earth: f64, teff_k: f64) -> Result<Vec<Latitude>, OutOfRange> {
        let read = |curve: &ClimateCurve, s: f64| curve.open_profile_k(s);
        let profile_k: Profile = self.open(insolation_earth, teff_k, read, mixed_profiles)?;
        Ok(self.latitudes.under(teff_k).by_latitude(&profile_k, false))
    }

    /// Reads the curves on both sides of a temperature and mixes what they say.
    fn open<T>(
        &self,
        insolation_earth: f64,
        teff_k: f64,
        read: impl Fn(&ClimateCurve, f64) -> Option<T>,
        mix: impl Fn(&T, &T, f64) -> T,
    ) -> Result<T, OutOfRange> {
        let s = non_negative("insolation_earth", insolation_earth)?;
        let limits = self.limits(teff_k)?;
        let (low, high, share, _) = self.around(teff_k);
        // Climates correspond at the same multiple of the starlight that just keeps water open.
        let multiple = s / limits.freeze_insolation_earth;
        let missing = OutOfRange { what: "insolation_earth", value: s, allowed: "light that keeps water open" };
        let of = |curve: &ClimateCurve| read(curve, multiple * curve.freeze_insolation_earth).ok_or(missing);
        let first = of(low)?;
        Ok(match high {
            Some(high) => mix(&first, &of(high)?, share),
            None => first,
        })
    }

    /// The latitudes of [`ClimateTable::frozen_mean_k`].
    pub(crate) fn frozen_latitudes(
        &self,
        insolation_earth: f64,
        teff_k: f64,
        other_heat_w_m2: f64,
    ) -> Result<Vec<Latitude>, OutOfRange> {
        let mean_k = self.frozen_mean_k(insolation_earth, teff_k, other_heat_w_m2)?;
        let model = self.latitudes.under(teff_k);
        Ok(model.by_latitude(&model.all_ice(insolation_earth, other_heat_w_m2, mean_k), true))
    }

    /// The mean temperature of a planet that is ice all over, K: its infrared balances the absorbed starlight and
    /// `other_heat_w_m2` from inside and from the sky.
    ///
    /// # Errors
    /// [`OutOfRange`] for a negative flux or a temperature that is not positive.
    pub fn frozen_mean_k(
        &self,
        insolation_earth: f64,
        effective_temperature_k: f64,
        other_heat_w_m2: f64,
    ) -> Result<f64, OutOfRange> {
        let s = non_negative("insolation_earth", insolation_earth)?;
        let heat = non_negative("other_heat_w_m2", other_heat_w_m2)?;
        let ice = Reflection::new(positive("effective_temperature_k", effective_temperature_k)?).ice;
        self.infrared.temperature_k((0.25 * s * SOLAR_CONSTANT_W_M2 * (1.0 - ice) + heat).min(1e4))
    }
}

/// The node at or below a temperature and the share of the next one.
fn bracket(teff_k: f64) -> (usize, f64) {
    let last = TEFF_NODES_K.len() - 1;
    let clamped_k = teff_k.clamp(TEFF_NODES_K[0], TEFF_NODES_K[last]);
    let low = TEFF_NODES_K.partition_point(|&node_k| node_k <= clamped_k).clamp(1, last) - 1;
    (low, (clamped_k - TEFF_NODES_K[low]) / (TEFF_NODES_K[low + 1] - TEFF_NODES_K[low]))
}

#[cfg(test)]
mod tests {
    use super::super::ice_line_model::IceLineModel;
    use super::*;

    #[test]
    fn between_the_nodes_the_table_follows_the_model() {
        let air = WaterWorldAir::default();
        let table = ClimateTable::new(&air).expect("in range");
        for teff_k in [2750.0, 3050.0, 3375.0, 3725.0, 4050.0, 4350.0, 4650.0, 4950.0, 5275.0, 5625.0, 6125.0, 6825.0] {
            let model = IceLineModel::new(&air, teff_k).expect("in range");
            let exact = ClimateCurve::follow(&model, 1.4);
            let read = table.limits(teff_k).expect("in range");
            let freeze_ratio = read.freeze_insolation_earth / exact.freeze_insolation_earth;
            let thaw_ratio = read.thaw_insolation_earth / exact.thaw_insolation_earth;
            assert!((freeze_ratio - 1.0).abs() < 0.003, "{teff_k}: {freeze_ratio}");
            assert!((thaw_ratio - 1.0).abs() < 0.003, "{teff_k}: {thaw_ratio}");
            let s = 1.05 * exact.freeze_insolation_earth;
            let relaxed = model.from_warm(s).expect("in range");
            let climate = table.open_climate(s, teff_k).expect("in range");
            assert!((climate.mean_k - relaxed.mean_k).abs() < 0.7, "{teff_k}: {climate:?} {relaxed:?}");
        }
    }

    #[test]
    fn what_is_kept_and_what_is_worked_out_anew_agree() {
        let fresh = ClimateTable::new(&WaterWorldAir::default()).expect("in range");
        let kept = fresh.clone();
        kept.prepare(5772.0);
        assert_eq!(fresh.limits(5772.0), kept.limits(5772.0));
    }

    #[test]
    fn no_planet_in_range_turns_outside_the_sure_limits() {
        for carbon_dioxide_bar in [1e-4, 3.0] {
            for obliquity_deg in [0.0, 90.0] {
                for heat_transport_w_m2_k in [0.3, 3.0] {
                    let air = WaterWorldAir { carbon_dioxide_bar, obliquity_deg, heat_transport_w_m2_k };
                    let table = ClimateTable::new(&air).expect("in range");
                    for teff_k in [2600.0, 7200.0] {
                        let limits = table.limits(teff_k).expect("in range");
                        assert!(limits.freeze_insolation_earth > SURELY_FROZEN, "{air:?} {limits:?}");
                        assert!(limits.thaw_insolation_earth < SURELY_THAWED, "{air:?} {limits:?}");
                        assert!(
                            limits.thaw_insolation_earth >= limits.freeze_insolation_earth - 1e-3,
                            "{air:?} {limits:?}"
                        );
                    }
                }
            }
        }
    }
}
