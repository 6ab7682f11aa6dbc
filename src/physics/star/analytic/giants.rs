//! Giants with a hydrogen envelope: relations, radii and the growth of the core on the first branch.

use super::Fit;
use super::coefficients::{D1, D2};
use super::core_luminosity::CoreLuminosity;

/// Core growth by helium burning, solar masses per solar luminosity and Myr.
///
/// # Source
/// Hurley, Pols & Tout 2000, MNRAS 315, 543, eq. 68.
pub const HELIUM_BURNING_RATE: f64 = 7.66e-5;

/// Core growth by hydrogen and helium burning in turn, solar masses per solar luminosity and Myr.
///
/// # Source
/// Hurley, Pols & Tout 2000, MNRAS 315, 543, eq. 71.
pub const DOUBLE_SHELL_RATE: f64 = 1.27e-5;

impl Fit {
    /// Core mass – luminosity relation of the giants of mass `m` (eqs. 31–38).
    #[must_use]
    pub fn core_luminosity(&self, m: f64) -> CoreLuminosity {
        let flash = self.critical.flash_msun;
        let weight = ((m - flash) / (2.5 - flash)).clamp(0.0, 1.0);
        let d0 = 5.37 + 0.135 * self.zeta;
        let heavy = |m: f64| (0.975 * d0 - 0.18 * m).max(0.5 * d0 - 0.06 * m).max(-1.0);
        let log_d = if m <= flash {
            d0
        } else if m >= 2.5 {
            heavy(m)
        } else {
            d0 + (heavy(2.5) - d0) * weight
        };
        let b = (500.0 + 1.75e4 * m.powf(0.6)).max(3e4);
        CoreLuminosity::new(6.0 - weight, 3.0 - weight, 10.0_f64.powf(log_d), b)
    }

    /// Core growth by hydrogen burning on the first giant branch, solar masses per solar luminosity and Myr.
    #[must_use]
    pub fn hydrogen_burning_rate(&self, m: f64) -> f64 {
        10.0_f64.powf((-5.7 + 0.8 * m).min(-4.1 + 0.14 * m).max(-4.8))
    }

    /// Radius on the first giant branch at present mass `mt` and luminosity `l`, solar radii (eq. 46).
    #[must_use]
    pub fn giant_radius_rsun(&self, mt: f64, l: f64) -> f64 {
        let b = &self.c.b;
        (b[4] * mt.powf(-b[5])).min(b[6] * mt.powf(-b[7])) * (l.powf(b[1]) + b[2] * l.powf(b[3]))
    }

    /// Radius on the asymptotic giant branch at present mass `mt` and luminosity `l`, solar radii (eq. 74).
    #[must_use]
    pub fn asymptotic_radius_rsun(&self, mt: f64, l: f64) -> f64 {
        let b = &self.c.b;
        let flash = self.critical.flash_msun;
        let heavy = |m: f64| (b[51] * m.powf(-b[52])).min(b[53] * m.powf(-b[54]));
        let light = |m: f64| b[56] + b[57] * m;
        let (factor, exponent) = if mt >= flash {
            (heavy(mt), b[50])
        } else if mt <= flash - 0.2 {
            (light(mt), b[3])
        } else {
            let weight = (mt - flash + 0.2) / 0.2;
            (light(flash - 0.2) * (1.0 - weight) + heavy(flash) * weight, b[3] * (1.0 - weight) + b[50] * weight)
        };
        factor * (l.powf(b[1]) + b[2] * l.powf(exponent))
    }

    /// Helium core mass at the base of the giant branch, solar masses, for `m` above the flash mass (eq. 44).
    #[must_use]
    pub fn giant_branch_base_core_msun(&self, m: f64) -> f64 {
        self.non_degenerate_core_msun(m, self.base_core_constant)
    }

    /// Helium core mass at helium ignition, solar masses (eq. 44 with the ignition luminosity, and eq. 37 inverted).
    #[must_use]
    pub fn helium_ignition_core_msun(&self, m: f64) -> f64 {
        if m < self.critical.flash_msun {
            self.core_luminosity(m).core_msun(self.helium_ignition_luminosity_lsun(m))
        } else {
            self.non_degenerate_core_msun(m, self.ignition_core_constant)
        }
    }

    fn non_degenerate_core_msun(&self, m: f64, constant: f64) -> f64 {
        (constant + D1 * m.powf(D2)).sqrt().sqrt().min(0.95 * self.asymptotic_base_core_msun(m))
    }

    /// Constant C of eq. 44, from the luminosity at which a star of the flash mass has the core.
    pub(super) fn core_constant(&self, luminosity_at_flash_lsun: f64) -> f64 {
        let flash = self.critical.flash_msun;
        self.core_luminosity(flash).core_msun(luminosity_at_flash_lsun).powi(4) - D1 * flash.powf(D2)
    }

    /// Helium core mass at the base of the asymptotic giant branch, solar masses (eq. 66).
    #[must_use]
    pub fn asymptotic_base_core_msun(&self, m: f64) -> f64 {
        let b = &self.c.b;
        (b[36] * m.powf(b[37]) + b[38]).sqrt().sqrt()
    }
}
