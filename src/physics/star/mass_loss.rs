//! Winds.

use super::phase::Phase;

/// Efficiency of the cool-giant wind.
///
/// # Source
/// Hurley, Pols & Tout 2000, MNRAS 315, 543, section 7.1: 0.5 for the horizontal branches of globular clusters.
const REIMERS_EFFICIENCY: f64 = 0.5;

/// Greatest rate of an eruption of a luminous blue variable, solar masses per year.
///
/// The published term grows without bound (hundreds of solar masses per year at 90 solar masses); the greatest eruption
/// observed threw off more than ten solar masses in about ten years.
///
/// # Source
/// Smith & Owocki 2006, ApJ 645, L45.
const ERUPTION_LIMIT_MSUN_YR: f64 = 1.0;

/// A star as its wind feels it.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct WindSource {
    /// What the star is doing.
    pub phase: Phase,
    /// Mass, solar masses.
    pub mass_msun: f64,
    /// Luminosity, solar luminosities.
    pub luminosity_lsun: f64,
    /// Radius, solar radii.
    pub radius_rsun: f64,
    /// Heavy-element mass fraction.
    pub heavy_elements: f64,
    /// How far the envelope is from vanishing: below one it is thin (see the small-envelope correction).
    pub envelope_measure: f64,
}

impl WindSource {
    /// Rate of mass loss, solar masses per year.
    ///
    /// The largest of the winds that apply, plus eruptions near the luminosity limit:
    /// * giants: Reimers 1975 (4·10⁻¹³ η L R / M) and Kudritzki & Reimers 1978;
    /// * asymptotic giants: Vassiliadis & Wood 1993, ApJ 413, 641, with its superwind limit;
    /// * luminous stars (L > 4000): Nieuwenhuijzen & de Jager 1990, A&A 231, 134, times √(Z/0.02);
    /// * stars with thin or no hydrogen envelopes: Hamann & Koesterke 1998, A&A 335, 1003 (10⁻¹³ L^1.5), times
    ///   (Z/0.02)^0.86 after Vink & de Koter 2005, A&A 442, 587, which the other authors leave out;
    /// * luminous blue variables: Humphreys & Davidson 1994 limit.
    ///
    /// # Source
    /// As put together by Hurley, Pols & Tout 2000, MNRAS 315, 543, section 7.1.
    #[must_use]
    pub fn rate_msun_yr(&self) -> f64 {
        let Self { phase, mass_msun: m, luminosity_lsun: l, radius_rsun: r, .. } = *self;
        if phase.is_remnant() {
            return 0.0;
        }
        let mut rate = 0.0_f64;
        if l > 4000.0 {
            rate = 9.6e-15 * r.powf(0.81) * l.powf(1.24) * m.powf(0.16) * (self.heavy_elements / 0.02).sqrt();
        }
        if phase == Phase::MainSequence {
            return rate;
        }
        if phase.is_giant() || phase == Phase::HeliumGiant {
            rate = rate.max(4e-13 * REIMERS_EFFICIENCY * l * r / m);
        }
        if matches!(phase, Phase::EarlyAsymptoticGiant | Phase::PulsingAsymptoticGiant) {
            rate = rate.max(pulsation_wind_msun_yr(m, l, r));
        }
        let bareness = if phase.is_helium_star() { 1.0 } else { 1.0 - self.envelope_measure.max(0.0) };
        if bareness > 0.0 {
            let wolf_rayet = 1e-13 * l * l.sqrt() * (self.heavy_elements / 0.02).powf(0.86);
            rate = rate.max(wolf_rayet * bareness);
        }
        let limit = 1e-5 * r * l.sqrt();
        if l > 6e5 && limit > 1.0 {
            rate += (0.1 * (limit - 1.0).powi(3) * (l / 6e5 - 1.0)).min(ERUPTION_LIMIT_MSUN_YR);
        }
        rate
    }
}

/// Wind driven by pulsation on the asymptotic giant branch, solar masses per year.
///
/// # Source
/// Vassiliadis & Wood 1993, ApJ 413, 641, in the form of Hurley, Pols & Tout 2000, section 7.1: period
/// log P = −2.07 − 0.9 log M + 1.94 log R (at most 3.3), log rate = −11.4 + 0.0125 [P − 100 max(M − 2.5, 0)], at most
/// 1.36·10⁻⁹ L.
fn pulsation_wind_msun_yr(m: f64, l: f64, r: f64) -> f64 {
    let period_days = 10.0_f64.powf((-2.07 - 0.9 * m.log10() + 1.94 * r.log10()).min(3.3));
    10.0_f64.powf(-11.4 + 0.0125 * (period_days - 100.0 * (m - 2.5).max(0.0))).min(1.36e-9 * l)
}

#[cfg(test)]
mod tests {
    use super::*;

    fn source(phase: Phase, mass_msun: f64, luminosity_lsun: f64, radius_rsun: f64) -> WindSource {
        WindSource { phase, mass_msun, luminosity_lsun, radius_rsun, heavy_elements: 0.02, envelope_measure: 5.0 }
    }

    #[test]
    fn the_sun_has_no_wind_here_and_a_red_giant_the_reimers_wind() {
        assert_eq!(source(Phase::MainSequence, 1.0, 1.0, 1.0).rate_msun_yr(), 0.0);
        let tip = source(Phase::FirstGiantBranch, 0.8, 2500.0, 170.0).rate_msun_yr();
        assert!((tip / (2e-13 * 2500.0 * 170.0 / 0.8) - 1.0).abs() < 1e-12);
    }

    #[test]
    fn the_superwind_is_limited_by_the_light_that_drives_it() {
        let star = source(Phase::PulsingAsymptoticGiant, 0.7, 6000.0, 450.0);
        assert!((star.rate_msun_yr() / (1.36e-9 * 6000.0) - 1.0).abs() < 1e-12);
    }

    #[test]
    fn remnants_lose_nothing() {
        for phase in Phase::ALL.into_iter().filter(|phase| phase.is_remnant()) {
            assert_eq!(source(phase, 1.0, 1e6, 1.0).rate_msun_yr(), 0.0);
        }
    }
}
