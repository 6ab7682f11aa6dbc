//! Infrared that leaves an atmosphere of nitrogen, water vapour and carbon dioxide.

use super::super::range::{OutOfRange, within};
use crate::units::constants::STEFAN_BOLTZMANN_W_M2_K4;

/// Temperatures between which the polynomial is used, K. Its authors give 190 to 370; the upper end is cut where
/// steam takes over.
const COLDEST_K: f64 = 190.0;
const HOTTEST_K: f64 = 330.0;
/// Temperature below which the air is as good as transparent (our own choice), K.
const TRANSPARENT_K: f64 = 140.0;
/// Slope above the hottest temperature (our own choice: it only keeps the solver finite), W m⁻² K⁻¹.
const HOT_SLOPE: f64 = 0.1;

/// Carbon-dioxide pressures the climate model accepts, bar.
pub const LEAST_CARBON_DIOXIDE_BAR: f64 = 1e-4;
/// Highest pressure: above about 5 bar the polynomial stops rising with temperature.
pub const MOST_CARBON_DIOXIDE_BAR: f64 = 3.0;

/// Passes a carbon-dioxide pressure on.
pub(crate) fn checked_carbon_dioxide(carbon_dioxide_bar: f64) -> Result<f64, OutOfRange> {
    within(
        "carbon_dioxide_bar",
        carbon_dioxide_bar,
        LEAST_CARBON_DIOXIDE_BAR,
        MOST_CARBON_DIOXIDE_BAR,
        "0.0001 to 3 bar",
    )
}

/// The infrared leaving a surface of a temperature under a fixed pressure of carbon dioxide.
///
/// For one pressure the two-dimensional polynomial is a cubic in temperature.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct OutgoingInfrared {
    cubic: [f64; 4],
    at_coldest_w_m2: f64,
    at_hottest_w_m2: f64,
}

impl OutgoingInfrared {
    /// Prepares the curve for a pressure of carbon dioxide.
    ///
    /// # Source
    /// Williams & Kasting 1997, Icarus 129, 254, polynomial in T and φ = ln(p/3.3 × 10⁻⁴ bar), clouds included.
    /// # Valid for
    /// 190 to 370 K, 10⁻⁵ to 10 bar; used here up to 330 K and from 10⁻⁴ to 3 bar. Colder surfaces radiate more and
    /// more like black bodies down to 140 K, hotter ones hardly more than at 330 K (our own continuations).
    /// # Accuracy
    /// 4.6 W m⁻² (root mean square). Understates a doubling of today's carbon dioxide, 1.7 against 3.7 W m⁻²
    /// (Myhre et al. 1998): made for deep time, not for statements about present warming.
    /// # Errors
    /// [`OutOfRange`] for a pressure outside 10⁻⁴ to 3 bar.
    pub fn new(carbon_dioxide_bar: f64) -> Result<Self, OutOfRange> {
        let f = (checked_carbon_dioxide(carbon_dioxide_bar)? / 3.3e-4).ln();
        let cubic = [
            9.468980 + f * (-7.714727e-5 + f * (-3.547406e-4 + f * (-3.442973e-3 - 3.367567e-2 * f))),
            -2.794778 + f * (-3.244753e-3 + f * (2.229142e-3 + f * (9.173169e-3 - 1.631909e-4 * f))),
            2.212108e-2 + f * (3.088497e-5 + f * (-2.789815e-5 + f * (-7.775195e-5 + 3.663871e-6 * f))),
            -3.361939e-5 + f * (-1.679112e-7 + f * (6.590999e-8 + f * (1.528125e-7 - 9.255646e-9 * f))),
        ];
        let mut curve = Self { cubic, at_coldest_w_m2: 0.0, at_hottest_w_m2: 0.0 };
        curve.at_coldest_w_m2 = curve.polynomial(COLDEST_K).0;
        curve.at_hottest_w_m2 = curve.polynomial(HOTTEST_K).0;
        Ok(curve)
    }

    /// A straight line in temperature, as of simpler models, for holding this one against theirs.
    #[cfg(test)]
    pub(crate) fn linear(at_zero_w_m2: f64, slope_w_m2_k: f64) -> Self {
        let mut curve =
            Self { cubic: [at_zero_w_m2, slope_w_m2_k, 0.0, 0.0], at_coldest_w_m2: 0.0, at_hottest_w_m2: 0.0 };
        curve.at_coldest_w_m2 = curve.polynomial(COLDEST_K).0;
        curve.at_hottest_w_m2 = curve.polynomial(HOTTEST_K).0;
        curve
    }

    fn polynomial(&self, t: f64) -> (f64, f64) {
        let [c0, c1, c2, c3] = self.cubic;
        (c0 + t * (c1 + t * (c2 + t * c3)), c1 + t * (2.0 * c2 + t * 3.0 * c3))
    }

    /// The infrared, W m⁻², for a surface temperature of zero or more, K.
    #[must_use]
    pub fn flux_w_m2(&self, surface_temperature_k: f64) -> f64 {
        self.flux_and_slope(surface_temperature_k.max(0.0)).0
    }

    /// The infrared, W m⁻², and its slope with temperature, W m⁻² K⁻¹.
    #[inline]
    pub(crate) fn flux_and_slope(&self, t: f64) -> (f64, f64) {
        if t > HOTTEST_K {
            (self.at_hottest_w_m2 + HOT_SLOPE * (t - HOTTEST_K), HOT_SLOPE)
        } else if t >= COLDEST_K {
            self.polynomial(t)
        } else {
            let black_w_m2 = STEFAN_BOLTZMANN_W_M2_K4 * t * t * t * t;
            let coldest_black_w_m2 = STEFAN_BOLTZMANN_W_M2_K4 * COLDEST_K.powi(4);
            let emissivity = self.at_coldest_w_m2 / coldest_black_w_m2;
            let rise_per_k = (1.0 - emissivity) / (COLDEST_K - TRANSPARENT_K);
            let share = emissivity + rise_per_k * (COLDEST_K - t);
            // The emissivity may lie on either side of one at 190 K; it stops at one.
            if t <= TRANSPARENT_K {
                (black_w_m2, 4.0 * STEFAN_BOLTZMANN_W_M2_K4 * t * t * t)
            } else {
                (share * black_w_m2, 4.0 * share * STEFAN_BOLTZMANN_W_M2_K4 * t * t * t - rise_per_k * black_w_m2)
            }
        }
    }

    /// The uniform surface temperature that radiates a flux, K.
    ///
    /// # Errors
    /// [`OutOfRange`] for a flux outside 0 to 10⁴ W m⁻².
    pub fn temperature_k(&self, flux_w_m2: f64) -> Result<f64, OutOfRange> {
        let target = within("flux_w_m2", flux_w_m2, 0.0, 1e4, "0 to 10 000 W/m2")?;
        let black_k = (target / STEFAN_BOLTZMANN_W_M2_K4).powf(0.25);
        if black_k <= TRANSPARENT_K {
            return Ok(black_k);
        }
        let (mut low, mut high) = (TRANSPARENT_K, HOTTEST_K + target / HOT_SLOPE);
        // Bisection: the join at 190 K has a kink that a derivative would trip over.
        for _ in 0..60 {
            let middle = 0.5 * (low + high);
            if self.flux_and_slope(middle).0 < target {
                low = middle;
            } else {
                high = middle;
            }
        }
        Ok(0.5 * (low + high))
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn more_warmth_radiates_more_everywhere() {
        for carbon_dioxide_bar in [1e-4, 2.8e-4, 1e-3, 0.01, 0.1, 0.3, 1.0, 3.0] {
            let curve = OutgoingInfrared::new(carbon_dioxide_bar).expect("in range");
            let mut previous = 0.0;
            for step in 1..800 {
                let flux = curve.flux_w_m2(f64::from(step) * 0.5);
                assert!(flux >= previous, "{carbon_dioxide_bar} bar, {} K", f64::from(step) * 0.5);
                previous = flux;
            }
        }
    }

    #[test]
    fn the_inverse_finds_its_temperature() {
        let curve = OutgoingInfrared::new(2.8e-4).expect("in range");
        for t in [3.0, 100.0, 150.0, 200.0, 240.0, 288.0, 320.0] {
            let found = curve.temperature_k(curve.flux_w_m2(t)).expect("in range");
            assert!((found - t).abs() < 1e-6, "{t}: {found}");
        }
        assert!(OutgoingInfrared::new(5.0).is_err());
    }
}
