//! What a star's life follows from: its mass at birth and its composition.

use super::error::StarError;

/// Masses whose lives can be computed, solar masses: the structure calculation below, the fits above.
///
/// Lighter bodies never burn hydrogen for long; the fits were made from models up to 50 solar masses and run on smoothly.
pub const MASS_RANGE_MSUN: (f64, f64) = (0.07, 100.0);

/// Masses the analytic fits can follow from birth to remnant, solar masses.
///
/// The published fits were made from models between 0.5 and 50 solar masses. Below 0.35 solar masses a star is mixed to
/// its centre and the fits give it a life several times too short.
pub const FITTED_MASS_RANGE_MSUN: (f64, f64) = (0.35, 100.0);

/// Metallicities \[Fe/H\] the fits cover with the calibrated solar composition, dex.
pub const METALLICITY_RANGE_DEX: (f64, f64) = (-2.0, 0.2);

/// Last age a life is followed to, yr.
pub const END_YR: f64 = 1e14;

/// A star at birth.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct StarInput {
    /// Mass on the zero-age main sequence, solar masses.
    pub mass_msun: f64,
    /// Metallicity \[Fe/H\], dex: zero is the calibrated Sun.
    pub metallicity_dex: f64,
}

impl StarInput {
    /// The star itself when both values are in range.
    ///
    /// # Errors
    /// [`StarError`] naming the value that cannot be used and what is allowed.
    pub fn checked(self) -> Result<Self, StarError> {
        let (least, most) = MASS_RANGE_MSUN;
        if !self.mass_msun.is_finite() || self.mass_msun <= 0.0 || self.mass_msun > most {
            return Err(StarError::Mass { value_msun: self.mass_msun, least_msun: least, most_msun: most });
        }
        if self.mass_msun < least {
            return Err(StarError::BrownDwarf { value_msun: self.mass_msun, least_msun: least });
        }
        let (least, most) = METALLICITY_RANGE_DEX;
        if !(least..=most).contains(&self.metallicity_dex) {
            return Err(StarError::Metallicity { value_dex: self.metallicity_dex, least_dex: least, most_dex: most });
        }
        Ok(self)
    }

    /// The star itself when both values are in range of the analytic fits.
    ///
    /// # Errors
    /// [`StarError`] naming the value that cannot be used and what is allowed.
    pub(super) fn checked_for_fits(self) -> Result<Self, StarError> {
        let star = self.checked()?;
        let (least, _) = FITTED_MASS_RANGE_MSUN;
        if star.mass_msun < least {
            return Err(StarError::BelowFits { value_msun: star.mass_msun, least_msun: least });
        }
        Ok(star)
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn star(mass_msun: f64, metallicity_dex: f64) -> StarInput {
        StarInput { mass_msun, metallicity_dex }
    }

    #[test]
    fn both_ends_of_both_ranges_are_allowed() {
        for mass in [MASS_RANGE_MSUN.0, MASS_RANGE_MSUN.1] {
            for metallicity in [METALLICITY_RANGE_DEX.0, METALLICITY_RANGE_DEX.1] {
                assert!(star(mass, metallicity).checked().is_ok());
            }
        }
    }

    #[test]
    fn each_wrong_value_is_named() {
        assert!(matches!(star(0.05, 0.0).checked(), Err(StarError::BrownDwarf { .. })));
        assert!(matches!(star(0.2, 0.0).checked_for_fits(), Err(StarError::BelowFits { .. })));
        for mass in [0.0, -1.0, 100.1, f64::NAN, f64::INFINITY] {
            assert!(matches!(star(mass, 0.0).checked(), Err(StarError::Mass { .. })));
        }
        for metallicity in [-2.1, 0.3, f64::NAN, f64::NEG_INFINITY] {
            assert!(matches!(star(1.0, metallicity).checked(), Err(StarError::Metallicity { .. })));
        }
    }
}
