//! Cooling of a white dwarf, from birth to the temperature of the sky.

use super::cold_radius::cold_radius_rsun;
use super::table::{ROWS, Row};
use crate::physics::star::state::effective_temperature_k;
use crate::units::constants::SOLAR_TEMPERATURE_K;

/// Coldest a white dwarf gets: the present temperature of the background radiation, K.
///
/// # Source
/// Fixsen 2009, ApJ 707, 916: 2.72548 K.
pub const BACKGROUND_TEMPERATURE_K: f64 = 2.725;

/// Mass above which an oxygen–neon core collapses, so that there is no heavier cold white dwarf, solar masses.
///
/// # Source
/// Nomoto 1984, ApJ 277, 791: 1.37.
const HEAVIEST_MSUN: f64 = 1.37;

/// Rows of a mass from its end over which the late fall of temperature is measured.
const LATE_ROWS: usize = 5;

/// A white dwarf of one mass as it cools.
///
/// Luminosity and radius are those of a carbon–oxygen core under a thick hydrogen layer; helium and oxygen–neon white
/// dwarfs take them too. Between the masses of the tables the logarithms of temperature and radius are interpolated
/// linearly. Past the oldest node (11 to 16 Gyr) the temperature falls exponentially, as for a crystal in the Debye
/// regime, at the pace of the last nodes.
///
/// # Source
/// Bédard, Bergeron, Brassard & Fontaine 2020, ApJ 901, 93 (nodes); the exponential end is an extrapolation of ours.
///
/// # Valid for
/// 0.2 to 1.2 solar masses. Lighter ones take the curve of 0.2; heavier ones the temperature of 1.2, with the radius
/// scaled by the cold radius, to 1.37, where such a core collapses; heavier ones keep that radius.
#[derive(Clone, Copy, Debug)]
pub struct WhiteDwarf {
    mass_msun: f64,
    lighter: usize,
    weight: f64,
    log_radius_shift: f64,
}

impl WhiteDwarf {
    /// The white dwarf of a mass in solar masses.
    #[must_use]
    pub fn new(mass_msun: f64) -> Self {
        let last = ROWS.len() - 1;
        let heaviest = ROWS[last].mass_msun;
        let mass = mass_msun.clamp(ROWS[0].mass_msun, heaviest);
        let heavier = ROWS.partition_point(|row| row.mass_msun < mass).clamp(1, last);
        let (low, high) = (ROWS[heavier - 1].mass_msun, ROWS[heavier].mass_msun);
        let log_radius_shift = if mass_msun > heaviest {
            (cold_radius_rsun(mass_msun.min(HEAVIEST_MSUN)) / cold_radius_rsun(heaviest)).log10()
        } else {
            0.0
        };
        Self { mass_msun, lighter: heavier - 1, weight: (mass - low) / (high - low), log_radius_shift }
    }

    /// Mass, solar masses.
    #[must_use]
    pub fn mass_msun(&self) -> f64 {
        self.mass_msun
    }

    /// Natural logarithms of luminosity and radius, solar units, at a cooling age in yr.
    #[must_use]
    pub fn logarithms_at(&self, cooling_yr: f64) -> (f64, f64) {
        let log_age = cooling_yr.max(1e-9).log10();
        let (light_t, light_r) = ROWS[self.lighter].at(cooling_yr, log_age);
        let (heavy_t, heavy_r) = ROWS[self.lighter + 1].at(cooling_yr, log_age);
        let log_t = light_t + self.weight * (heavy_t - light_t);
        let log_r = light_r + self.weight * (heavy_r - light_r) + self.log_radius_shift;
        let log_l = 2.0 * log_r + 4.0 * (log_t - SOLAR_TEMPERATURE_K.log10());
        (log_l * std::f64::consts::LN_10, log_r * std::f64::consts::LN_10)
    }

    /// Luminosity (solar luminosities), radius (solar radii) and effective temperature (K) at a cooling age in yr.
    #[must_use]
    pub fn at(&self, cooling_yr: f64) -> (f64, f64, f64) {
        let (log_l, log_r) = self.logarithms_at(cooling_yr);
        let (luminosity, radius) = (log_l.exp(), log_r.exp());
        (luminosity, radius, effective_temperature_k(luminosity, radius))
    }

    /// Luminosity and radius at birth, solar units.
    #[must_use]
    pub fn newborn(&self) -> (f64, f64) {
        let (luminosity, radius, _) = self.at(0.0);
        (luminosity, radius)
    }

    /// The course as nodes of its own, for many look-ups.
    #[must_use]
    pub fn curve(&self) -> CoolingCurve {
        let rows = [&ROWS[self.lighter], &ROWS[self.lighter + 1]];
        let end = self.oldest_tabulated_yr().log10();
        let mut ages: Vec<f64> = rows.iter().flat_map(|row| row.nodes.iter().map(|node| node.1)).collect();
        ages.retain(|&age| age <= end);
        ages.sort_by(f64::total_cmp);
        ages.dedup();
        let nodes = ages.into_iter().map(|log_age| {
            let (log_l, log_r) = self.logarithms_at(10.0_f64.powf(log_age));
            (log_age, log_l, log_r)
        });
        CoolingCurve { dwarf: *self, nodes: nodes.collect() }
    }

    /// Oldest cooling age the tables cover at this mass, yr.
    #[must_use]
    pub fn oldest_tabulated_yr(&self) -> f64 {
        let end = |row: &Row| row.nodes.last().map_or(0.0, |node| node.1);
        10.0_f64.powf(end(&ROWS[self.lighter]).min(end(&ROWS[self.lighter + 1])))
    }

    /// Cooling ages in rising order up to `end_yr`, yr, so close that the luminosity falls by less than a quarter between.
    #[must_use]
    pub fn node_ages_yr(&self, end_yr: f64) -> Vec<f64> {
        const STEP: f64 = 0.25;
        let last = end_yr.max(1.0).log10();
        let mut logs = vec![0.0];
        for row in [&ROWS[self.lighter], &ROWS[self.lighter + 1]] {
            logs.extend(row.nodes.iter().map(|node| node.1).filter(|&log| log < last));
        }
        logs.push(last);
        logs.sort_by(f64::total_cmp);
        let log_luminosity = |log: f64| self.logarithms_at(10.0_f64.powf(log)).0;
        let mut ages = vec![1.0];
        for pair in logs.windows(2) {
            let (mut from, to) = (pair[0], pair[1]);
            while to - from > 1e-4 {
                let mut next = to.min(from + STEP);
                while log_luminosity(from) - log_luminosity(next) > STEP && next - from > 1e-4 {
                    next = 0.5 * (from + next);
                }
                from = next;
                ages.push(10.0_f64.powf(from));
            }
        }
        ages.retain(|&age| age < end_yr);
        ages.push(end_yr);
        ages
    }
}

/// A white dwarf with its course worked out: the nodes of both neighbouring masses together.
///
/// Between nodes the logarithms run straight, so the curve is the same as [`WhiteDwarf::logarithms_at`], only faster.
#[derive(Clone, Debug)]
pub struct CoolingCurve {
    dwarf: WhiteDwarf,
    nodes: Vec<(f64, f64, f64)>,
}

impl CoolingCurve {
    /// The white dwarf the course belongs to.
    #[must_use]
    pub fn dwarf(&self) -> &WhiteDwarf {
        &self.dwarf
    }

    /// Natural logarithms of luminosity and radius, solar units, at a cooling age in yr.
    #[must_use]
    pub fn logarithms_at(&self, cooling_yr: f64) -> (f64, f64) {
        let log_age = cooling_yr.max(1e-9).log10();
        let after = self.nodes.partition_point(|node| node.0 <= log_age);
        if after == 0 || after == self.nodes.len() {
            return self.dwarf.logarithms_at(cooling_yr);
        }
        let ((from, l0, r0), (to, l1, r1)) = (self.nodes[after - 1], self.nodes[after]);
        let place = (log_age - from) / (to - from);
        (l0 + place * (l1 - l0), r0 + place * (r1 - r0))
    }
}

impl Row {
    /// log10 of temperature (K) and radius (solar radii) at a cooling age.
    fn at(&self, cooling_yr: f64, log_age: f64) -> (f64, f64) {
        let node = |index: usize| {
            let (temperature, age, log_l) = self.nodes[index];
            let log_t = temperature.log10();
            (age, log_t, 0.5 * log_l - 2.0 * (log_t - SOLAR_TEMPERATURE_K.log10()))
        };
        let last = self.nodes.len() - 1;
        let after = self.nodes.partition_point(|node| node.1 <= log_age);
        if after == 0 {
            let (_, log_t, log_r) = node(0);
            return (log_t, log_r);
        }
        if after > last {
            let (end_log_age, log_t, log_r) = node(last);
            let (early_log_age, early_log_t, _) = node(last + 1 - LATE_ROWS);
            let end_yr = 10.0_f64.powf(end_log_age);
            let fall_per_yr = (early_log_t - log_t) / (end_yr - 10.0_f64.powf(early_log_age));
            let faded = log_t - fall_per_yr * (cooling_yr - end_yr);
            return (faded.max(BACKGROUND_TEMPERATURE_K.log10()), log_r);
        }
        let ((from, t0, r0), (to, t1, r1)) = (node(after - 1), node(after));
        let place = (log_age - from) / (to - from);
        (t0 + place * (t1 - t0), r0 + place * (r1 - r0))
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn it_never_brightens_and_ends_at_the_background() {
        for hundredth in 12..=143 {
            let dwarf = WhiteDwarf::new(f64::from(hundredth) / 100.0);
            let mut before = (f64::INFINITY, f64::INFINITY);
            for step in 0..=1500 {
                let (luminosity, radius, temperature) = dwarf.at(10.0_f64.powf(-1.0 + 0.01 * f64::from(step)));
                assert!(luminosity > 0.0 && luminosity.is_finite() && radius > 0.0);
                assert!(luminosity <= before.0 * (1.0 + 1e-12) && temperature <= before.1 * (1.0 + 1e-12));
                before = (luminosity, temperature);
            }
            assert!((dwarf.at(1e14).2 / BACKGROUND_TEMPERATURE_K - 1.0).abs() < 1e-9);
        }
    }

    #[test]
    fn the_course_is_continuous_in_mass() {
        for step in 0..13_300 {
            let mass = 0.1 + 1e-4 * f64::from(step);
            for age in [0.0, 1e5, 1e8, 1e9, 8e9, 2e10] {
                let (a, b) = (WhiteDwarf::new(mass).at(age), WhiteDwarf::new(mass + 1e-4).at(age));
                assert!((a.2 / b.2).ln().abs() < 0.03, "temperature at {mass} {age}");
                assert!((a.1 / b.1).ln().abs() < if mass > 1.3 { 0.2 } else { 0.01 }, "radius at {mass} {age}");
            }
        }
    }

    #[test]
    fn the_worked_out_curve_is_the_same() {
        for mass in [0.15, 0.2, 0.37, 0.6, 1.15, 1.35] {
            let dwarf = WhiteDwarf::new(mass);
            let curve = dwarf.curve();
            for step in 0..2000 {
                let age = 10.0_f64.powf(0.007 * f64::from(step));
                let ((l, r), (fast_l, fast_r)) = (dwarf.logarithms_at(age), curve.logarithms_at(age));
                assert!((l - fast_l).abs() < 1e-9 && (r - fast_r).abs() < 1e-9);
            }
        }
    }

    #[test]
    fn node_ages_rise_and_end_where_asked() {
        let ages = WhiteDwarf::new(0.55).node_ages_yr(1e14);
        assert!(ages.windows(2).all(|pair| pair[0] < pair[1]));
        let dwarf = WhiteDwarf::new(0.55);
        let logs: Vec<f64> = ages.iter().map(|&age| dwarf.logarithms_at(age).0).collect();
        assert!(logs.windows(2).all(|pair| (0.0..0.26).contains(&(pair[0] - pair[1]))));
        assert_eq!(ages.last(), Some(&1e14));
    }
}
