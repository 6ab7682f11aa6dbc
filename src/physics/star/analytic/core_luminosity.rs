//! Giants: luminosity from core mass, and the core's growth by burning.

/// Core mass – luminosity relation L = min(B Mᵠ, D Mᵖ), solar units.
///
/// # Source
/// Hurley, Pols & Tout 2000, MNRAS 315, 543, eqs. 31–38.
#[derive(Clone, Copy, Debug)]
pub struct CoreLuminosity {
    /// Exponent p of the lower branch.
    pub low_exponent: f64,
    /// Exponent q of the upper branch.
    pub high_exponent: f64,
    /// Factor D of the lower branch.
    pub low_factor: f64,
    /// Factor B of the upper branch.
    pub high_factor: f64,
    /// Luminosity at which the branches cross.
    pub crossing_lsun: f64,
}

impl CoreLuminosity {
    /// The relation L = min(B Mᵠ, D Mᵖ) from its exponents p, q and factors D, B.
    pub(super) fn new(p: f64, q: f64, d: f64, b: f64) -> Self {
        let crossing_core = (b / d).powf(1.0 / (p - q));
        Self {
            low_exponent: p,
            high_exponent: q,
            low_factor: d,
            high_factor: b,
            crossing_lsun: d * crossing_core.powf(p),
        }
    }

    /// Luminosity of a core mass, solar units (eq. 37).
    #[must_use]
    pub fn luminosity_lsun(&self, core_msun: f64) -> f64 {
        (self.high_factor * core_msun.powf(self.high_exponent)).min(self.low_factor * core_msun.powf(self.low_exponent))
    }

    /// Core mass of a luminosity, solar units: the inverse of [`CoreLuminosity::luminosity_lsun`].
    #[must_use]
    pub fn core_msun(&self, luminosity_lsun: f64) -> f64 {
        if luminosity_lsun <= self.crossing_lsun {
            (luminosity_lsun / self.low_factor).powf(1.0 / self.low_exponent)
        } else {
            (luminosity_lsun / self.high_factor).powf(1.0 / self.high_exponent)
        }
    }
}

/// Growth of a core that burns at dM/dt = A L(M), from a known start.
///
/// # Source
/// Hurley, Pols & Tout 2000, MNRAS 315, 543, eqs. 39–43.
#[derive(Clone, Copy, Debug)]
pub struct CoreGrowth {
    relation: CoreLuminosity,
    rate: f64,
    /// Time the lower branch would reach infinite mass, Myr.
    low_singular_myr: f64,
    /// Time the luminosity passes the crossing of the branches, Myr; the start when it is past it already.
    crossing_myr: f64,
    /// Time the upper branch would reach infinite mass, Myr.
    high_singular_myr: f64,
}

impl CoreGrowth {
    /// Growth from luminosity `start_lsun` at `start_myr` at `rate` A, solar masses per solar luminosity and Myr.
    pub(super) fn new(relation: CoreLuminosity, rate: f64, start_myr: f64, start_lsun: f64) -> Self {
        let CoreLuminosity { low_exponent: p, high_exponent: q, low_factor: d, high_factor: b, crossing_lsun } =
            relation;
        let (low_singular_myr, crossing_myr, upper_start_lsun) = if start_lsun <= crossing_lsun {
            let singular = start_myr + (d / start_lsun).powf((p - 1.0) / p) / ((p - 1.0) * rate * d);
            let crossing = singular - (singular - start_myr) * (start_lsun / crossing_lsun).powf((p - 1.0) / p);
            (singular, crossing, crossing_lsun)
        } else {
            (start_myr, start_myr, start_lsun)
        };
        let high_singular_myr = crossing_myr + (b / upper_start_lsun).powf((q - 1.0) / q) / ((q - 1.0) * rate * b);
        Self { relation, rate, low_singular_myr, crossing_myr, high_singular_myr }
    }

    /// The core mass – luminosity relation the core grows along.
    #[must_use]
    pub fn relation(&self) -> &CoreLuminosity {
        &self.relation
    }

    /// Core mass at a time in Myr, solar masses (eq. 39).
    #[must_use]
    pub fn core_msun(&self, time_myr: f64) -> f64 {
        let r = &self.relation;
        if time_myr <= self.crossing_myr && self.low_singular_myr > self.crossing_myr {
            let p = r.low_exponent;
            ((p - 1.0) * self.rate * r.low_factor * (self.low_singular_myr - time_myr)).powf(1.0 / (1.0 - p))
        } else {
            let q = r.high_exponent;
            ((q - 1.0) * self.rate * r.high_factor * (self.high_singular_myr - time_myr)).powf(1.0 / (1.0 - q))
        }
    }

    /// Time in Myr at which a luminosity is reached (eq. 43).
    #[must_use]
    pub fn time_at_myr(&self, luminosity_lsun: f64) -> f64 {
        let r = &self.relation;
        if luminosity_lsun <= r.crossing_lsun {
            let p = r.low_exponent;
            self.low_singular_myr
                - (r.low_factor / luminosity_lsun).powf((p - 1.0) / p) / ((p - 1.0) * self.rate * r.low_factor)
        } else {
            let q = r.high_exponent;
            self.high_singular_myr
                - (r.high_factor / luminosity_lsun).powf((q - 1.0) / q) / ((q - 1.0) * self.rate * r.high_factor)
        }
    }

    /// Time left until the branch in use would reach infinite mass, Myr: the natural unit of a step.
    pub(in crate::physics::star) fn left_myr(&self, time_myr: f64) -> f64 {
        if time_myr < self.crossing_myr { self.low_singular_myr - time_myr } else { self.high_singular_myr - time_myr }
    }

    /// Time the relation changes branch, Myr.
    pub(in crate::physics::star) fn bend_myr(&self) -> f64 {
        self.crossing_myr
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn time_and_luminosity_invert_each_other_on_both_branches() {
        let relation = CoreLuminosity::new(6.0, 3.0, 10.0_f64.powf(5.37), 3e4);
        for start in [2.5, 3000.0] {
            let growth = CoreGrowth::new(relation, 1.3e-5, 11_000.0, start);
            for factor in [1.0, 1.7, 40.0, 900.0] {
                let luminosity = start * factor;
                let time = growth.time_at_myr(luminosity);
                let back = relation.luminosity_lsun(growth.core_msun(time));
                assert!((back / luminosity - 1.0).abs() < 1e-6, "{luminosity} came back as {back}");
            }
        }
    }

    #[test]
    fn the_core_grows_by_the_burning_rate() {
        let relation = CoreLuminosity::new(6.0, 3.0, 10.0_f64.powf(5.37), 3e4);
        let growth = CoreGrowth::new(relation, 1.3e-5, 0.0, 2.5);
        let (time, step) = (0.5 * growth.left_myr(0.0), 1e-3);
        let slope = (growth.core_msun(time + step) - growth.core_msun(time - step)) / (2.0 * step);
        let rate = 1.3e-5 * relation.luminosity_lsun(growth.core_msun(time));
        assert!((slope / rate - 1.0).abs() < 1e-6);
    }
}
