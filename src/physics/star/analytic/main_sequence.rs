//! The main sequence: zero-age star, lifetime, and the course in between.

use super::Fit;
use super::coefficients::{C1, C2, C3};
use super::piecewise::linear_through;
use crate::physics::star::calibration::hydrogen_at_birth;

/// Shift of ζ in eq. 6, as printed.
#[expect(clippy::approx_constant, reason = "the number the paper prints, close to log10 of 2")]
const SHIFT: f64 = 0.30103;
/// Last fraction of the time to the hook over which the core contracts.
const CONTRACTION: f64 = 0.01;

impl Fit {
    /// Zero-age luminosity, solar luminosities.
    ///
    /// # Source
    /// Tout, Pols, Eggleton & Han 1996, MNRAS 281, 257, eq. 1.
    #[must_use]
    pub fn zero_age_luminosity_lsun(&self, m: f64) -> f64 {
        let l = &self.c.zero_age_l;
        (l[1] * m.powf(5.5) + l[2] * m.powi(11))
            / (l[3] + m.powi(3) + l[4] * m.powi(5) + l[5] * m.powi(7) + l[6] * m.powi(8) + l[7] * m.powf(9.5))
    }

    /// Zero-age radius, solar radii.
    ///
    /// # Source
    /// Tout, Pols, Eggleton & Han 1996, MNRAS 281, 257, eq. 2.
    #[must_use]
    pub fn zero_age_radius_rsun(&self, m: f64) -> f64 {
        let r = &self.c.zero_age_r;
        (r[1] * m.powf(2.5) + r[2] * m.powf(6.5) + r[3] * m.powi(11) + r[4] * m.powi(19) + r[5] * m.powf(19.5))
            / (r[6] + r[7] * m * m + r[8] * m.powf(8.5) + m.powf(18.5) + r[9] * m.powf(19.5))
    }

    /// Time from the zero-age main sequence to the base of the giant branch, Myr (eq. 4).
    #[must_use]
    pub fn giant_branch_base_myr(&self, m: f64) -> f64 {
        let a = &self.c.a;
        (a[1] + a[2] * m.powi(4) + a[3] * m.powf(5.5) + m.powi(7)) / (a[4] * m * m + a[5] * m.powi(7))
    }

    /// Luminosity at the end of the main sequence, solar luminosities (eq. 8).
    #[must_use]
    pub fn main_sequence_end_luminosity_lsun(&self, m: f64) -> f64 {
        let a = &self.c.a;
        (a[11] * m.powi(3) + a[12] * m.powi(4) + a[13] * m.powf(a[16] + 1.8))
            / (a[14] + a[15] * m.powi(5) + m.powf(a[16]))
    }

    /// Radius at the end of the main sequence, solar radii (eq. 9).
    #[must_use]
    pub fn main_sequence_end_radius_rsun(&self, m: f64) -> f64 {
        let a = &self.c.a;
        let low = |m: f64| (a[18] + a[19] * m.powf(a[21])) / (a[20] + m.powf(a[22]));
        let high =
            |m: f64| (C1 * m.powi(3) + a[23] * m.powf(a[26]) + a[24] * m.powf(a[26] + 1.5)) / (a[25] + m.powi(5));
        let (from, to) = (a[17], a[17] + 0.1);
        let radius = if m <= from {
            low(m)
        } else if m >= to {
            high(m)
        } else {
            let weight = (m - from) / (to - from);
            low(from) * (1.0 - weight) + high(to) * weight
        };
        if m < 0.5 { radius.max(1.5 * self.zero_age_radius_rsun(m)) } else { radius }
    }

    /// Luminosity at the base of the giant branch, solar luminosities (eq. 10).
    #[must_use]
    pub fn giant_branch_base_luminosity_lsun(&self, m: f64) -> f64 {
        let a = &self.c.a;
        (a[27] * m.powf(a[31]) + a[28] * m.powf(C2)) / (a[29] + a[30] * m.powf(C3) + m.powf(a[32]))
    }

    /// The course of the main sequence of one mass.
    #[must_use]
    pub fn main_sequence(&self, m: f64) -> MainSequence {
        let a = &self.c.a;
        let base_myr = self.giant_branch_base_myr(m);
        let mu = 0.5_f64.max(1.0 - 0.01 * (a[6] / m.powf(a[7])).max(a[8] + a[9] / m.powf(a[10])));
        let hook_myr = mu * base_myr;
        let x = (0.95 - 0.03 * (self.zeta + SHIFT)).clamp(0.95, 0.99);
        let (l0, r0) = (self.zero_age_luminosity_lsun(m), self.zero_age_radius_rsun(m));
        let (l1, r1) = (self.main_sequence_end_luminosity_lsun(m), self.main_sequence_end_radius_rsun(m));
        let (alpha_l, beta_l, delta_l) = (self.alpha_l(m), self.beta_l(m), self.delta_l(m));
        let (alpha_r, beta_r, gamma, delta_r) = (self.alpha_r(m), self.beta_r(m), self.gamma(m), self.delta_r(m));
        MainSequence {
            mass_msun: m,
            hook_myr,
            end_myr: hook_myr.max(x * base_myr),
            base_myr,
            zero_age_luminosity_lsun: l0,
            zero_age_radius_rsun: r0,
            end_luminosity_lsun: l1,
            end_radius_rsun: r1,
            eta: self.eta(m),
            alpha_l,
            beta_l,
            rest_l: (l1 / l0).log10() - alpha_l - beta_l,
            delta_l,
            alpha_r,
            beta_r,
            gamma,
            rest_r: (r1 / r0).log10() - alpha_r - beta_r - gamma,
            delta_r,
            degenerate_radius_rsun: 0.0258 * (1.0 + hydrogen_at_birth(self.z)).powf(5.0 / 3.0) / m.cbrt(),
        }
    }

    /// Exponent of the second luminosity term (eq. 18).
    fn eta(&self, m: f64) -> f64 {
        if self.z <= 0.0009 { linear_through(m, &[(1.0, 10.0), (1.1, 20.0)]) } else { 10.0 }
    }

    /// Luminosity dip of the hook (eq. 16).
    fn delta_l(&self, m: f64) -> f64 {
        let a = &self.c.a;
        let high = |m: f64| (a[34] / m.powf(a[35])).min(a[36] / m.powf(a[37]));
        let hook = self.critical.hook_msun;
        if m <= hook {
            0.0
        } else if m < a[33] {
            high(a[33]) * ((m - hook) / (a[33] - hook)).powf(0.4)
        } else {
            high(m)
        }
    }

    /// Radius dip of the hook (eq. 17).
    fn delta_r(&self, m: f64) -> f64 {
        let a = &self.c.a;
        let high = |m: f64| (a[38] + a[39] * m.powf(3.5)) / (a[40] * m.powi(3) + m.powf(a[41])) - 1.0;
        let hook = self.critical.hook_msun;
        if m <= hook {
            0.0
        } else if m <= a[42] {
            a[43] * ((m - hook) / (a[42] - hook)).sqrt()
        } else if m < 2.0 {
            a[43] + (high(2.0) - a[43]) * ((m - a[42]) / (2.0 - a[42])).powf(a[44])
        } else {
            high(m)
        }
    }

    /// First luminosity coefficient (eq. 19).
    fn alpha_l(&self, m: f64) -> f64 {
        let a = &self.c.a;
        let high = |m: f64| (a[45] + a[46] * m.powf(a[48])) / (m.powf(0.4) + a[47] * m.powf(1.9));
        if m >= 2.0 {
            high(m)
        } else {
            linear_through(m, &[(0.5, a[49]), (0.7, 0.3), (a[52], a[50]), (a[53], a[51]), (2.0, high(2.0))])
        }
    }

    /// Second luminosity coefficient (eq. 20).
    fn beta_l(&self, m: f64) -> f64 {
        let a = &self.c.a;
        let full = |m: f64| (a[54] - a[55] * m.powf(a[56])).max(0.0);
        let value = full(m);
        if m > a[57] && value > 0.0 {
            let start = full(a[57]);
            (start - 10.0 * (m - a[57]) * start).max(0.0)
        } else {
            value
        }
    }

    /// First radius coefficient (eq. 21).
    fn alpha_r(&self, m: f64) -> f64 {
        let a = &self.c.a;
        let middle = |m: f64| a[58] * m.powf(a[60]) / (a[59] + m.powf(a[61]));
        if m > a[67] {
            middle(a[67]) + a[65] * (m - a[67])
        } else if m >= a[66] {
            middle(m)
        } else {
            linear_through(m, &[(0.5, a[62]), (0.65, a[63]), (a[68], a[64]), (a[66], middle(a[66]))])
        }
    }

    /// Second radius coefficient (eq. 22).
    ///
    /// The slope between one solar mass and a74 divides by a74 − 1, which makes it meet the next branch.
    fn beta_r(&self, m: f64) -> f64 {
        let a = &self.c.a;
        let high = |m: f64| a[69] * m.powf(3.5) / (a[70] + m.powf(a[71]));
        let full = if m < 2.0 {
            linear_through(m, &[(1.0, 1.06), (a[74], a[72]), (2.0, high(2.0))])
        } else if m <= 16.0 {
            high(m)
        } else {
            high(16.0) + a[73] * (m - 16.0)
        };
        full - 1.0
    }

    /// Third radius coefficient (eq. 23), never below zero.
    fn gamma(&self, m: f64) -> f64 {
        let a = &self.c.a;
        let low = |m: f64| a[76] + a[77] * (m - a[78]).abs().powf(a[79]);
        let at_one = low(1.0).max(0.0);
        let top = if a[75] <= 1.0 { at_one } else { a[80] };
        let value = if m <= 1.0 {
            low(m)
        } else if m <= a[75] {
            at_one + (a[80] - at_one) * ((m - 1.0) / (a[75] - 1.0)).powf(a[81])
        } else if m < a[75] + 0.1 {
            top * (1.0 - 10.0 * (m - a[75]))
        } else {
            0.0
        };
        value.max(0.0)
    }
}

/// The main sequence of one mass and composition.
///
/// # Source
/// Hurley, Pols & Tout 2000, MNRAS 315, 543, eqs. 4–24.
#[derive(Clone, Copy, Debug)]
pub struct MainSequence {
    /// Mass, solar masses.
    pub mass_msun: f64,
    /// Time to the hook, where the core has no hydrogen left, Myr (eqs. 5, 7).
    pub hook_myr: f64,
    /// End of the main sequence, Myr (eq. 5).
    pub end_myr: f64,
    /// Base of the giant branch, or helium ignition where there is none, Myr (eq. 4).
    pub base_myr: f64,
    /// Zero-age luminosity, solar luminosities.
    pub zero_age_luminosity_lsun: f64,
    /// Zero-age radius, solar radii.
    pub zero_age_radius_rsun: f64,
    /// Luminosity at the end, solar luminosities.
    pub end_luminosity_lsun: f64,
    /// Radius at the end, solar radii.
    pub end_radius_rsun: f64,
    eta: f64,
    alpha_l: f64,
    beta_l: f64,
    rest_l: f64,
    delta_l: f64,
    alpha_r: f64,
    beta_r: f64,
    gamma: f64,
    rest_r: f64,
    delta_r: f64,
    degenerate_radius_rsun: f64,
}

impl MainSequence {
    /// Luminosity and radius, solar units, at an age in Myr (eqs. 12, 13, 24).
    #[must_use]
    pub fn at(&self, age_myr: f64) -> (f64, f64) {
        let tau = age_myr / self.end_myr;
        let hook = (age_myr / self.hook_myr).min(1.0);
        let contracted =
            ((age_myr - (1.0 - CONTRACTION) * self.hook_myr) / (CONTRACTION * self.hook_myr)).clamp(0.0, 1.0);
        let tau3 = tau.powi(3);
        let tau10 = tau.powi(10);
        let log_l = self.alpha_l * tau + self.beta_l * tau.powf(self.eta) + self.rest_l * tau * tau
            - self.delta_l * (hook.powi(2) - contracted.powi(2));
        let log_r = self.alpha_r * tau + self.beta_r * tau10 + self.gamma * tau10.powi(4) + self.rest_r * tau3
            - self.delta_r * (hook.powi(3) - contracted.powi(3));
        (
            self.zero_age_luminosity_lsun * 10.0_f64.powf(log_l),
            (self.zero_age_radius_rsun * 10.0_f64.powf(log_r)).max(self.degenerate_radius_rsun),
        )
    }

    /// Ages in Myr at which the course bends sharply: start and end of the last core contraction.
    pub(in crate::physics::star) fn bends_myr(&self) -> [f64; 2] {
        [(1.0 - CONTRACTION) * self.hook_myr, self.hook_myr]
    }
}
