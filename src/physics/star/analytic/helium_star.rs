//! Bare helium stars: core burning and helium giants.

use super::core_luminosity::{CoreGrowth, CoreLuminosity};
use super::giants::HELIUM_BURNING_RATE;

/// Zero-age luminosity of a helium star, solar luminosities.
///
/// # Source
/// Hurley, Pols & Tout 2000, MNRAS 315, 543, eq. 77.
#[must_use]
pub fn zero_age_luminosity_lsun(m: f64) -> f64 {
    15_262.0 * m.powf(10.25) / (m.powi(9) + 29.54 * m.powf(7.5) + 31.18 * m.powi(6) + 0.0469)
}

/// Zero-age radius of a helium star, solar radii (eq. 78).
#[must_use]
pub fn zero_age_radius_rsun(m: f64) -> f64 {
    0.2391 * m.powf(4.6) / (m.powi(4) + 0.162 * m.powi(3) + 0.0065)
}

/// Time a helium star burns helium in its core, Myr (eq. 79).
#[must_use]
pub fn core_burning_myr(m: f64) -> f64 {
    (0.4129 + 18.81 * m.powi(4) + 1.853 * m.powi(6)) / m.powf(6.5)
}

fn alpha(m: f64) -> f64 {
    (0.85 - 0.08 * m).max(0.0)
}

/// Luminosity and radius, solar units, of a burning helium star at a fraction of its burning time (eqs. 80–83).
#[must_use]
pub fn burning(m: f64, fraction: f64) -> (f64, f64) {
    let beta = (0.4 - 0.22 * m.log10()).max(0.0);
    (
        zero_age_luminosity_lsun(m) * (1.0 + 0.45 * fraction + alpha(m) * fraction * fraction),
        zero_age_radius_rsun(m) * (1.0 + beta * fraction - beta * fraction.powi(6)),
    )
}

/// A helium giant of one mass.
///
/// # Source
/// Hurley, Pols & Tout 2000, MNRAS 315, 543, eqs. 84–89.
#[derive(Clone, Copy, Debug)]
pub struct HeliumGiant {
    /// Mass when the giant phase starts; it fixes the course, solar masses.
    pub mass_msun: f64,
    /// Core mass – luminosity relation (eq. 84).
    pub relation: CoreLuminosity,
    /// Luminosity at the end of core helium burning, solar luminosities.
    pub start_luminosity_lsun: f64,
    zero_age_radius_rsun: f64,
    expansion_lsun: f64,
}

impl HeliumGiant {
    /// The giant of a helium star of mass `m`, solar masses.
    #[must_use]
    pub fn new(m: f64) -> Self {
        Self {
            mass_msun: m,
            relation: CoreLuminosity::new(5.0, 3.0, 5.5e4 / (1.0 + 0.4 * m.powi(4)), 4.1e4),
            start_luminosity_lsun: zero_age_luminosity_lsun(m) * (1.45 + alpha(m)),
            zero_age_radius_rsun: zero_age_radius_rsun(m),
            expansion_lsun: 500.0 * (2.0 + m.powi(5)) / m.powf(2.5),
        }
    }

    /// Radius at a luminosity, solar units (eqs. 85–88).
    #[must_use]
    pub fn radius_rsun(&self, luminosity_lsun: f64) -> f64 {
        // The exponential passes the upper limit long before it could overflow.
        let swell = |l: f64| (l / self.expansion_lsun).min(300.0).exp();
        let compact = self.zero_age_radius_rsun * (luminosity_lsun / self.start_luminosity_lsun).powf(0.2)
            + 0.02 * (swell(luminosity_lsun) - swell(self.start_luminosity_lsun));
        compact.min(0.08 * luminosity_lsun.powf(0.75)).max(self.zero_age_radius_rsun * 1e-3)
    }

    /// Growth of the carbon–oxygen core from a start luminosity, with the clock at zero there.
    #[must_use]
    pub fn growth(&self, start_lsun: f64) -> CoreGrowth {
        CoreGrowth::new(self.relation, HELIUM_BURNING_RATE, 0.0, start_lsun)
    }
}

/// Core mass a helium giant of mass `m` can reach before its helium is spent, solar masses (eq. 89).
#[must_use]
pub fn largest_core_msun(m: f64) -> f64 {
    m.min(1.45 * m - 0.31)
}
