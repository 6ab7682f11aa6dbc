//! Core helium burning: ignition, horizontal branch, blue loop.

use super::Fit;
use super::anchors::Anchors;
use super::helium_star;

impl Fit {
    /// Luminosity at helium ignition, solar luminosities (eq. 49).
    #[must_use]
    pub fn helium_ignition_luminosity_lsun(&self, m: f64) -> f64 {
        let b = &self.c.b;
        let flash = self.critical.flash_msun;
        if m >= flash {
            (b[11] + b[12] * m.powf(3.8)) / (b[13] + m * m)
        } else {
            b[9] * m.powf(b[10]) / (1.0 + self.ignition_alpha * (15.0 * (m - flash)).exp())
        }
    }

    /// Least luminosity of the blue phase, solar luminosities (eq. 51).
    #[must_use]
    pub fn blue_least_luminosity_lsun(&self, m: f64) -> f64 {
        let b = &self.c.b;
        let top = self.critical.blue_ignition_msun;
        let c = b[17] / top.powf(0.1) + (b[16] * b[17] - b[14]) / top.powf(b[15] + 0.1);
        self.helium_ignition_luminosity_lsun(m) * (b[14] + c * m.powf(b[15] + 0.1)) / (b[16] + m.powf(b[15]))
    }

    /// Place μ between a bare core and a star of the flash mass (eq. 52).
    fn envelope_place(&self, m: f64, core_msun: f64) -> f64 {
        ((m - core_msun) / (self.critical.flash_msun - core_msun)).clamp(0.0, 1.0)
    }

    /// Luminosity on the zero-age horizontal branch, solar luminosities (eq. 53).
    #[must_use]
    pub fn horizontal_branch_luminosity_lsun(&self, m: f64, core_msun: f64) -> f64 {
        let b = &self.c.b;
        let place = self.envelope_place(m, core_msun);
        let bare = helium_star::zero_age_luminosity_lsun(core_msun);
        let alpha = (b[18] + bare - self.flash_blue_least_lsun) / (self.flash_blue_least_lsun - bare);
        bare + (1.0 + b[20]) / (1.0 + b[20] * place.powf(1.6479)) * b[18] * place.powf(b[19])
            / (1.0 + alpha * (15.0 * (m - self.critical.flash_msun)).exp())
    }

    /// Radius on the zero-age horizontal branch, solar radii, at present mass `mt` (eq. 54).
    #[must_use]
    pub fn horizontal_branch_radius_rsun(&self, m: f64, mt: f64, core_msun: f64, l: f64) -> f64 {
        let b = &self.c.b;
        let place = self.envelope_place(m, core_msun);
        let f = (1.0 + b[21]) * place.powf(b[22]) / (1.0 + b[21] * place.powf(b[23]));
        (1.0 - f) * helium_star::zero_age_radius_rsun(core_msun) + f * self.giant_radius_rsun(mt, l)
    }

    /// Least radius during core helium burning above the flash mass, solar radii (eq. 55, first line).
    #[must_use]
    pub fn blue_least_radius_rsun(&self, m: f64) -> f64 {
        let b = &self.c.b;
        (b[24] * m + (b[25] * m).powf(b[26]) * m.powf(b[28])) / (b[27] + m.powf(b[28]))
    }

    /// Luminosity at the base of the asymptotic giant branch, solar luminosities (eq. 56).
    #[must_use]
    pub fn asymptotic_base_luminosity_lsun(&self, m: f64) -> f64 {
        let b = &self.c.b;
        let flash = self.critical.flash_msun;
        if m >= flash {
            (b[31] + b[32] * m.powf(b[33] + 1.8)) / (b[34] + m.powf(b[33]))
        } else {
            b[29] * m.powf(b[30]) / (1.0 + self.asymptotic_alpha * (15.0 * (m - flash)).exp())
        }
    }

    /// Time of core helium burning, Myr (eq. 57).
    #[must_use]
    pub fn core_helium_myr(&self, m: f64, core_msun: f64) -> f64 {
        let b = &self.c.b;
        let flash = self.critical.flash_msun;
        if m >= flash {
            self.giant_branch_base_myr(m) * (b[41] * m.powf(b[42]) + b[43] * m.powi(5)) / (b[44] + m.powi(5))
        } else {
            let place = self.envelope_place(m, core_msun);
            (b[39] + (helium_star::core_burning_myr(core_msun) - b[39]) * (1.0 - place).powf(b[40]))
                * (1.0 + self.burning_alpha * (15.0 * (m - flash)).exp())
        }
    }

    /// Fraction of core helium burning spent away from the giant branches (eq. 58).
    ///
    /// Less than a hundred-thousandth counts as none: it would be over within the years a supergiant takes to fall freely.
    #[must_use]
    pub fn blue_fraction(&self, m: f64) -> f64 {
        let b = &self.c.b;
        let (flash, top) = (self.critical.flash_msun, self.critical.blue_ignition_msun);
        let fraction = if m < flash {
            1.0
        } else if m < top {
            b[45] * (m / top).powf(0.414)
                + (1.0 - b[45] * (flash / top).powf(0.414)) * ((m / top).log10() / (flash / top).log10()).powf(b[46])
        } else {
            (1.0 - b[47]) * self.blue_extent(m) / self.blue_extent_at_ignition
        };
        if fraction < 1e-5 { 0.0 } else { fraction.min(1.0) }
    }

    /// The mass dependence f of eq. 58.
    pub(super) fn blue_extent(&self, m: f64) -> f64 {
        let b = &self.c.b;
        let red = self.asymptotic_radius_rsun(m, self.helium_ignition_luminosity_lsun(m));
        m.powf(b[48]) * (1.0 - self.blue_least_radius_rsun(m) / red).max(0.0).powf(b[49])
    }

    /// Least radius during core helium burning at present mass `mt`, solar radii (eq. 55).
    ///
    /// Never beyond the asymptotic giant branch: the formula runs away for the heaviest stars.
    fn least_radius_rsun(&self, anchors: &Anchors, mt: f64) -> f64 {
        let flash = self.critical.flash_msun;
        let radius = if anchors.mass_msun >= flash {
            self.blue_least_radius_rsun(mt)
        } else {
            let place = self.envelope_place(anchors.mass_msun, anchors.ignition_core_msun);
            let at_flash =
                self.blue_least_radius_rsun(flash) / self.giant_radius_rsun(flash, self.flash_blue_least_lsun);
            self.giant_radius_rsun(mt, anchors.horizontal_branch_lsun) * at_flash.powf(place)
        };
        radius.min(self.asymptotic_radius_rsun(mt, anchors.ignition_lsun))
    }

    /// Radius at helium ignition at present mass `mt`, solar radii (eq. 50).
    ///
    /// Where there is no blue phase the star lights its helium as a red supergiant.
    #[must_use]
    pub fn helium_ignition_radius_rsun(&self, anchors: &Anchors, mt: f64) -> f64 {
        let (m, top) = (anchors.mass_msun, self.critical.blue_ignition_msun);
        if m < top {
            return self.giant_radius_rsun(mt, anchors.ignition_lsun);
        }
        if anchors.blue_fraction <= 0.0 {
            return self.asymptotic_radius_rsun(mt, anchors.ignition_lsun);
        }
        let least = self.least_radius_rsun(anchors, mt);
        if m >= top.max(12.0) {
            return least;
        }
        let red = self.giant_radius_rsun(mt, anchors.ignition_lsun);
        least * (red / least).powf((m / 12.0).log10() / (top / 12.0).log10())
    }

    /// Fraction of core helium burning at which the star reaches its blue phase.
    fn blue_start(&self, anchors: &Anchors) -> f64 {
        let m = anchors.mass_msun;
        if m < self.critical.flash_msun || m >= self.critical.blue_ignition_msun {
            0.0
        } else {
            1.0 - anchors.blue_fraction
        }
    }

    /// Fractions of core helium burning at which the star reaches and leaves its blue phase.
    pub(in crate::physics::star) fn blue_phase(&self, anchors: &Anchors) -> [f64; 2] {
        [self.blue_start(anchors), self.blue_end(anchors)]
    }

    /// Fraction of core helium burning at which the star leaves its blue phase.
    fn blue_end(&self, anchors: &Anchors) -> f64 {
        if anchors.mass_msun < self.critical.blue_ignition_msun { 1.0 } else { anchors.blue_fraction }
    }

    /// Luminosity and radius, solar units, at a fraction of core helium burning and present mass `mt` (eqs. 61–65).
    #[must_use]
    pub fn core_helium_burning(&self, anchors: &Anchors, mt: f64, fraction: f64) -> (f64, f64) {
        let m = anchors.mass_msun;
        let least = self.least_radius_rsun(anchors, mt);
        let (start, end) = (self.blue_start(anchors), self.blue_end(anchors));
        let (l_start, r_start) = if m < self.critical.flash_msun {
            let l = anchors.horizontal_branch_lsun;
            (l, self.horizontal_branch_radius_rsun(m, mt, anchors.ignition_core_msun, l))
        } else if m < self.critical.blue_ignition_msun {
            let l = anchors.blue_least_lsun;
            (l, self.giant_radius_rsun(mt, l))
        } else {
            (anchors.ignition_lsun, self.helium_ignition_radius_rsun(anchors, mt))
        };
        let xi = (least / r_start).clamp(0.4, 2.5);
        let luminosity = |fraction: f64| {
            if fraction < start {
                l_start * (anchors.ignition_lsun / l_start).powf(((start - fraction) / start).powi(3))
            } else if start >= 1.0 {
                l_start
            } else {
                let place = ((fraction - start) / (1.0 - start)).powf(xi);
                l_start * (anchors.asymptotic_base_lsun / l_start).powf(place)
            }
        };
        let l = luminosity(fraction);
        if fraction < start {
            return (l, self.giant_radius_rsun(mt, l));
        }
        if end <= start || fraction > end {
            return (l, self.asymptotic_radius_rsun(mt, l));
        }
        let l_end = if end >= 1.0 { anchors.asymptotic_base_lsun } else { luminosity(end) };
        let r_end = self.asymptotic_radius_rsun(mt, l_end);
        let r_least = least.min(r_start);
        let rho = ((r_end / r_least).ln().cbrt() * (fraction - start)
            - (r_start / r_least).ln().cbrt() * (end - fraction))
            / (end - start);
        (l, r_least * rho.abs().powi(3).exp())
    }
}
