//! Carbon dioxide that rocks and volcanoes adjust: as much as holds the planet at one mean temperature.

use super::super::habitable_zone::runaway_insolation_earth;
use super::super::range::{OutOfRange, non_negative, positive, within};
use super::ice_line_model::{CELLS, Climate, IceLineModel, Latitude, Latitudes, Profile, WaterWorldAir};
use super::infrared::{LEAST_CARBON_DIOXIDE_BAR, MOST_CARBON_DIOXIDE_BAR, OutgoingInfrared};
use super::table::{ClimateLimits, ClimateTable};
use super::tables::ClimateTables;
use std::sync::Arc;

/// Starlight over the runaway limit from which the thinnest air may be too warm, and up to which the thickest may be
/// too cold or freeze: there moments read the curves of the thinnest and the thickest air.
const THIN_AIR_FROM: f64 = 0.78;
const THICK_AIR_UP_TO: f64 = 0.55;
/// Steps in succession that must ask for a pressure beyond the range before it is given up.
const TIMES_BEYOND: u32 = 4;
/// Newton's method ends when no cell changed by more, K.
const CLOSE_ENOUGH_K: f64 = 1e-3;

/// A climate and the carbon dioxide that makes it.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct AiredClimate {
    /// The climate.
    pub climate: Climate,
    /// Partial pressure of carbon dioxide, bar.
    pub carbon_dioxide_bar: f64,
}

/// The climates of a planet whose carbon dioxide holds its mean temperature while 10⁻⁴ to 3 bar can.
///
/// Weathering takes carbon dioxide out of warm, wet air and stops in the cold, while volcanoes go on: within a
/// million years the air has as much as balances the two. Under ice it gathers to the most, 3 bar.
///
/// # Source
/// Walker, Hays & Kasting 1981, J. Geophys. Res. 86, 9776 (idea); Kasting, Whitmire & Reynolds 1993 (use for
/// habitable zones). That the balance holds one temperature exactly is our own simplification: weathering that is
/// weaker lets a faint star's planet cool and, with little volcanism, freeze now and again (Menou 2015).
/// # Valid for
/// Planets with active volcanoes and both land and water, not locked to their star.
#[derive(Clone, Debug)]
pub struct RegulatedClimate {
    latitudes: Latitudes,
    mean_k: f64,
    thin: Arc<ClimateTable>,
    thick: Arc<ClimateTable>,
}

impl RegulatedClimate {
    /// Prepares the climates for a planet's tilt and heat transport and the mean temperature that is held; the carbon
    /// dioxide of `air` is not used.
    ///
    /// # Errors
    /// [`OutOfRange`] for a field of `air` or a mean temperature out of its range (275 to 310 K).
    pub fn new(air: &WaterWorldAir, mean_k: f64) -> Result<Self, OutOfRange> {
        Self::of_tables(air, mean_k, &mut ClimateTables::default())
    }

    /// [`RegulatedClimate::new`] with tables that other planets may share.
    pub(crate) fn of_tables(air: &WaterWorldAir, mean_k: f64, tables: &mut ClimateTables) -> Result<Self, OutOfRange> {
        let mean_k = checked_mean(mean_k)?;
        let with = |carbon_dioxide_bar| WaterWorldAir { carbon_dioxide_bar, ..*air };
        let thin = tables.of(&with(LEAST_CARBON_DIOXIDE_BAR))?;
        let thick = tables.of(&with(MOST_CARBON_DIOXIDE_BAR))?;
        Ok(Self { latitudes: thin.latitudes().clone(), mean_k, thin, thick })
    }

    /// Marks both tables as in use.
    pub(crate) fn keep_tables(&self, tables: &mut ClimateTables) {
        tables.keep(&self.thin);
        tables.keep(&self.thick);
    }

    /// Works out and keeps the curves that a moment with this starlight needs.
    pub(crate) fn prepare(&self, insolation_earth: f64, teff_k: f64) {
        let runaway = runaway_insolation_earth(teff_k, 1.0);
        if insolation_earth >= THIN_AIR_FROM * runaway {
            self.thin.prepare(teff_k);
        }
        if insolation_earth <= THICK_AIR_UP_TO * runaway {
            self.thick.prepare(teff_k);
        }
    }

    /// Where the climate turns: ice comes and goes under the thickest air.
    ///
    /// # Errors
    /// [`OutOfRange`] for a temperature that is not positive.
    pub fn limits(&self, effective_temperature_k: f64) -> Result<ClimateLimits, OutOfRange> {
        let thick = self.thick.limits(effective_temperature_k)?;
        Ok(ClimateLimits { hot_insolation_earth: None, ..thick })
    }

    /// The climate with open water at an insolation, and its carbon dioxide.
    ///
    /// # Accuracy
    /// Where the mean temperature is held, the model's own solution; elsewhere that of [`ClimateTable::open_climate`].
    /// # Errors
    /// [`OutOfRange`] for a negative insolation or a temperature that is not positive.
    pub fn open_climate(
        &self,
        insolation_earth: f64,
        effective_temperature_k: f64,
    ) -> Result<AiredClimate, OutOfRange> {
        let s = non_negative("insolation_earth", insolation_earth)?;
        let teff_k = positive("effective_temperature_k", effective_temperature_k)?;
        let (thin, thick) = (LEAST_CARBON_DIOXIDE_BAR, MOST_CARBON_DIOXIDE_BAR);
        match self.hold(s, teff_k, &mut [0.0; CELLS])? {
            Held::At(aired) => Ok(aired),
            Held::TooWarm => Ok(AiredClimate { climate: self.thin.open_climate(s, teff_k)?, carbon_dioxide_bar: thin }),
            Held::TooCold => {
                Ok(AiredClimate { climate: self.thick.open_climate(s, teff_k)?, carbon_dioxide_bar: thick })
            }
        }
    }

    /// The latitudes of [`RegulatedClimate::open_climate`].
    pub(crate) fn open_latitudes(&self, insolation_earth: f64, teff_k: f64) -> Result<Vec<Latitude>, OutOfRange> {
        let mut t = [0.0; CELLS];
        match self.hold(insolation_earth, teff_k, &mut t)? {
            Held::At(_) => Ok(self.latitudes.under(teff_k).by_latitude(&t, false)),
            Held::TooWarm => self.thin.open_latitudes(insolation_earth, teff_k),
            Held::TooCold => self.thick.open_latitudes(insolation_earth, teff_k),
        }
    }

    /// The latitudes of [`RegulatedClimate::frozen_climate`].
    pub(crate) fn frozen_latitudes(
        &self,
        insolation_earth: f64,
        teff_k: f64,
        other_heat_w_m2: f64,
    ) -> Result<Vec<Latitude>, OutOfRange> {
        let (_, carbon_dioxide_bar) = self.frozen_climate(insolation_earth, teff_k, other_heat_w_m2)?;
        let is_thick = carbon_dioxide_bar >= MOST_CARBON_DIOXIDE_BAR;
        let table = if is_thick { &self.thick } else { &self.thin };
        table.frozen_latitudes(insolation_earth, teff_k, other_heat_w_m2)
    }

    /// The mean temperature under ice, K. Carbon dioxide gathers to 3 bar unless it is cold enough to freeze out.
    ///
    /// # Errors
    /// [`OutOfRange`] for a negative flux or a temperature that is not positive.
    pub fn frozen_climate(
        &self,
        insolation_earth: f64,
        effective_temperature_k: f64,
        other_heat_w_m2: f64,
    ) -> Result<(f64, f64), OutOfRange> {
        let thick_k = self.thick.frozen_mean_k(insolation_earth, effective_temperature_k, other_heat_w_m2)?;
        if carbon_dioxide_frost_bar(thick_k) >= MOST_CARBON_DIOXIDE_BAR {
            return Ok((thick_k, MOST_CARBON_DIOXIDE_BAR));
        }
        let thin_k = self.thin.frozen_mean_k(insolation_earth, effective_temperature_k, other_heat_w_m2)?;
        Ok((thin_k, LEAST_CARBON_DIOXIDE_BAR))
    }

    /// Solves for the carbon dioxide that holds the mean temperature: Newton's method in all latitudes and ln p at
    /// once, then, should it fail, a search with climates relaxing from warm. `t` receives the temperatures.
    fn hold(&self, s: f64, teff_k: f64, t: &mut Profile) -> Result<Held, OutOfRange> {
        let mut model = self.latitudes.under(teff_k);
        *t = model.warm_start();
        let offset_k = self.mean_k - model.mean(t);
        for local_k in t.iter_mut() {
            *local_k += offset_k;
        }
        let (low, high) = (LEAST_CARBON_DIOXIDE_BAR.ln(), MOST_CARBON_DIOXIDE_BAR.ln());
        let mut log_p = 0.5 * (low + high);
        let mut times_beyond = 0;
        for _ in 0..40 {
            model.infrared =
                OutgoingInfrared::new(log_p.exp().clamp(LEAST_CARBON_DIOXIDE_BAR, MOST_CARBON_DIOXIDE_BAR))?;
            let Some((largest_k, step)) = newton_step(&model, t, s, log_p, self.mean_k) else { break };
            let wanted = log_p + step;
            times_beyond = if (low..=high).contains(&wanted) { 0 } else { times_beyond + 1 };
            if times_beyond > TIMES_BEYOND {
                return Ok(if wanted < low { Held::TooWarm } else { Held::TooCold });
            }
            log_p = wanted.clamp(low, high);
            if times_beyond == 0 && largest_k < CLOSE_ENOUGH_K && step.abs() < 1e-4 {
                let carbon_dioxide_bar = log_p.exp();
                return Ok(Held::At(AiredClimate { climate: model.describe(t, s), carbon_dioxide_bar }));
            }
        }
        self.search(s, teff_k, (low, high), t)
    }

    fn search(
        &self,
        s: f64,
        teff_k: f64,
        (mut low, mut high): (f64, f64),
        t: &mut Profile,
    ) -> Result<Held, OutOfRange> {
        let mut model: IceLineModel = self.latitudes.under(teff_k);
        let mut climate_at = |log_p: f64| {
            model.infrared =
                OutgoingInfrared::new(log_p.exp().clamp(LEAST_CARBON_DIOXIDE_BAR, MOST_CARBON_DIOXIDE_BAR))?;
            *t = model.warm_start();
            model.relax(s.max(0.01), t)
        };
        if climate_at(low)?.mean_k >= self.mean_k {
            return Ok(Held::TooWarm);
        }
        if climate_at(high)?.mean_k <= self.mean_k {
            return Ok(Held::TooCold);
        }
        for _ in 0..30 {
            let middle = 0.5 * (low + high);
            if climate_at(middle)?.mean_k < self.mean_k { low = middle } else { high = middle }
        }
        Ok(Held::At(AiredClimate { climate: climate_at(high)?, carbon_dioxide_bar: high.exp() }))
    }
}

/// Whether carbon dioxide can hold the mean temperature.
enum Held {
    At(AiredClimate),
    /// Even the thinnest air is warmer.
    TooWarm,
    /// Even the thickest air is colder.
    TooCold,
}

/// Passes a mean temperature that rocks can hold on.
pub(crate) fn checked_mean(mean_k: f64) -> Result<f64, OutOfRange> {
    within("mean_k", mean_k, 275.0, 310.0, "275 to 310 K")
}

/// One step of Newton's method for temperatures and ln p at a given mean; changes `t`, returns the largest change of
/// temperature and the step in ln p.
fn newton_step(model: &IceLineModel, t: &mut Profile, s: f64, log_p: f64, mean_k: f64) -> Option<(f64, f64)> {
    const NUDGE: f64 = 1e-3;
    // The nudge stays inside the polynomial's pressures.
    let nudge = if log_p > 0.0 { -NUDGE } else { NUDGE };
    let nudged = OutgoingInfrared::new((log_p + nudge).exp()).ok()?;
    let balance = model.balance(t, s);
    let mut by_excess = balance.excess;
    let mut by_air: Profile =
        std::array::from_fn(|i| (nudged.flux_w_m2(t[i]) - model.infrared.flux_w_m2(t[i])) / nudge);
    model.solve(&balance.slope, &mut by_excess, &mut by_air);
    let step = ((mean_k - model.mean(t) + model.mean(&by_excess)) / model.mean(&by_air)).clamp(-1.5, 1.5);
    let mut largest_k = 0.0_f64;
    for i in 0..CELLS {
        let change = (by_air[i] * step - by_excess[i]).clamp(-15.0, 15.0);
        t[i] += change;
        largest_k = largest_k.max(change.abs());
    }
    (largest_k.is_finite() && step.is_finite()).then_some((largest_k, step))
}

/// Pressure of carbon dioxide over its frost, bar: log p = 6.81228 − 1301.679/(T − 3.494).
///
/// # Source
/// Giauque & Egan 1937 as tabulated by NIST (154 to 196 K), carried on to 3 bar at 205 K.
fn carbon_dioxide_frost_bar(temperature_k: f64) -> f64 {
    10.0_f64.powf(6.81228 - 1301.679 / (temperature_k - 3.494).max(1.0))
}

#[cfg(test)]
mod tests {
    use super::*;

    fn regulated() -> RegulatedClimate {
        RegulatedClimate::new(&WaterWorldAir::default(), 288.0).expect("in range")
    }

    #[test]
    fn the_earths_air_is_found_again() {
        // At today's sunlight 288 K needs the carbon dioxide the model was fitted with.
        let found = regulated().open_climate(1.0, 5772.0).expect("in range");
        assert!((found.climate.mean_k - 288.0).abs() < 0.01, "{found:?}");
        assert!((found.carbon_dioxide_bar / 2.8e-4).ln().abs() < 0.1, "{found:?}");
    }

    #[test]
    fn fainter_light_needs_more_and_the_mean_never_jumps() {
        let regulated = regulated();
        let mut previous = regulated.open_climate(1.09, 5772.0).expect("in range");
        for step in 1..140 {
            let s = 1.09 - 0.005 * f64::from(step);
            let next = regulated.open_climate(s, 5772.0).expect("in range");
            assert!(next.carbon_dioxide_bar >= previous.carbon_dioxide_bar * 0.999, "{s}: {next:?}");
            let change_k = next.climate.mean_k - previous.climate.mean_k;
            assert!(change_k < 0.5 && change_k > -4.0, "{s}: {change_k}");
            previous = next;
        }
        assert!((previous.carbon_dioxide_bar - MOST_CARBON_DIOXIDE_BAR).abs() < 1e-9);
    }

    #[test]
    fn between_the_limits_no_curve_is_needed() {
        for teff_k in [2600.0, 3900.0, 5800.0, 7200.0] {
            let regulated = regulated();
            let runaway = runaway_insolation_earth(teff_k, 1.0);
            for share in [THICK_AIR_UP_TO, 0.65, THIN_AIR_FROM] {
                let held = regulated.hold(share * runaway, teff_k, &mut [0.0; CELLS]).expect("in range");
                assert!(matches!(held, Held::At(_)), "{teff_k} {share}");
            }
            let limits = regulated.limits(teff_k).expect("in range");
            assert!(limits.thaw_insolation_earth < THICK_AIR_UP_TO * runaway, "{teff_k}: {limits:?}");
        }
    }

    #[test]
    fn frost_lies_where_it_does_on_mars() {
        // 6 mbar over frost at 148 K, 1 atm at 194.7 K.
        assert!((carbon_dioxide_frost_bar(148.0) / 6.4e-3).ln().abs() < 0.2);
        assert!((carbon_dioxide_frost_bar(194.7) / 1.01).ln().abs() < 0.03);
    }
}
