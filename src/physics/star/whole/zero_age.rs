//! The zero-age main sequence: where stars of every mass begin.

use super::quick_look::quick_look;
use crate::physics::star::analytic::{Fit, HEAVY_ELEMENTS_RANGE};
use crate::physics::star::calibration::heavy_elements;
use crate::physics::star::convective::{ConvectiveInput, SurfaceOpacity};
use crate::physics::star::error::StarError;
use crate::physics::star::state::effective_temperature_k;

/// A star at its arrival on the main sequence.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct ZeroAgeStar {
    /// Mass, solar masses.
    pub mass_msun: f64,
    /// Luminosity, solar luminosities.
    pub luminosity_lsun: f64,
    /// Effective temperature, K.
    pub effective_temperature_k: f64,
}

/// Masses of the line whose structure was computed in advance, solar masses.
const COMPUTED_MSUN: [f64; 9] = [0.08, 0.09, 0.10, 0.12, 0.15, 0.20, 0.25, 0.30, 0.40];
/// Masses of the line from the fits, solar masses.
const FITTED_MSUN: [f64; 22] = [
    0.5, 0.6, 0.7, 0.8, 0.9, 1.0, 1.15, 1.3, 1.5, 1.75, 2.0, 2.5, 3.0, 4.0, 5.0, 7.0, 10.0, 15.0, 20.0, 30.0, 50.0,
    100.0,
];

/// Stars of all masses at the beginning of the main sequence, lightest first.
///
/// # Source
/// From 0.5 solar masses on Tout, Pols, Eggleton & Han 1996, MNRAS 281, 257, eq. 1 and 2; below, lives computed in
/// advance by the structure calculation.
///
/// # Errors
/// [`StarError`] where the composition is outside the fits.
pub fn zero_age_line(metallicity_dex: f64) -> Result<Vec<ZeroAgeStar>, StarError> {
    let (least, most) = HEAVY_ELEMENTS_RANGE;
    let fit = Fit::new(heavy_elements(metallicity_dex).clamp(least, most))?;
    let computed = COMPUTED_MSUN.into_iter().filter_map(|mass_msun| {
        let life = quick_look(ConvectiveInput { mass_msun, metallicity_dex }, SurfaceOpacity::Modern)?;
        let first = life.nodes.first()?;
        Some(ZeroAgeStar {
            mass_msun,
            luminosity_lsun: first.luminosity_lsun,
            effective_temperature_k: effective_temperature_k(first.luminosity_lsun, first.radius_rsun),
        })
    });
    let fitted = FITTED_MSUN.into_iter().map(|mass_msun| {
        let luminosity_lsun = fit.zero_age_luminosity_lsun(mass_msun);
        let radius_rsun = fit.zero_age_radius_rsun(mass_msun);
        ZeroAgeStar {
            mass_msun,
            luminosity_lsun,
            effective_temperature_k: effective_temperature_k(luminosity_lsun, radius_rsun),
        }
    });
    Ok(computed.chain(fitted).collect())
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn heavier_stars_begin_hotter_and_brighter() {
        for metallicity_dex in [-1.5, -0.3, 0.0, 0.2] {
            let line = zero_age_line(metallicity_dex).expect("in range");
            assert!(line.len() > 25, "{}", line.len());
            for pair in line.windows(2) {
                assert!(pair[1].luminosity_lsun > pair[0].luminosity_lsun, "{metallicity_dex}: {pair:?}");
                assert!(
                    pair[1].effective_temperature_k > pair[0].effective_temperature_k,
                    "{metallicity_dex}: {pair:?}"
                );
            }
        }
    }
}
