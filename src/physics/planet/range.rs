//! The one error of planetary physics: a quantity outside the range a relation is defined on.

use thiserror::Error;

/// A value that a relation cannot be asked about: what, how much, what would be allowed.
#[derive(Clone, Copy, Debug, Error, PartialEq)]
#[error("{what} is {value}, allowed {allowed}")]
pub struct OutOfRange {
    /// Name of the quantity with its unit suffix, such as `semi_major_axis_au`.
    pub what: &'static str,
    /// The value that was given, in the unit the name ends in.
    pub value: f64,
    /// The allowed range in words.
    pub allowed: &'static str,
}

/// Smallest and largest magnitude accepted anywhere: far beyond nature, yet powers up to the
/// tenth of such numbers stay finite in `f64`, so no formula can overflow into infinity.
const SMALLEST: f64 = 1e-30;
const LARGEST: f64 = 1e30;

/// Passes a positive finite value on.
pub(crate) fn positive(what: &'static str, value: f64) -> Result<f64, OutOfRange> {
    within(what, value, SMALLEST, LARGEST, "more than 0 (1e-30 to 1e30)")
}

/// Passes a finite value of zero or more on; what is below 1e-30 counts as zero.
pub(crate) fn non_negative(what: &'static str, value: f64) -> Result<f64, OutOfRange> {
    let kept = within(what, value, 0.0, LARGEST, "0 to 1e30")?;
    Ok(if kept < SMALLEST { 0.0 } else { kept })
}

/// Passes a share from 0 to 1 on.
pub(crate) fn fraction(what: &'static str, value: f64) -> Result<f64, OutOfRange> {
    within(what, value, 0.0, 1.0, "0 to 1")
}

/// Passes the eccentricity of a closed orbit on.
pub(crate) fn closed_eccentricity(value: f64) -> Result<f64, OutOfRange> {
    within("eccentricity", value, 0.0, LARGEST_ECCENTRICITY, "0 to 0.999")
}

/// Nearest to a parabola that an orbit may be given; beyond it the orbit mean loses meaning.
pub(crate) const LARGEST_ECCENTRICITY: f64 = 0.999;

/// Passes a value on when it lies in the closed range; NaN never does.
pub(crate) fn within(
    what: &'static str,
    value: f64,
    lowest: f64,
    highest: f64,
    allowed: &'static str,
) -> Result<f64, OutOfRange> {
    if value >= lowest && value <= highest { Ok(value) } else { Err(OutOfRange { what, value, allowed }) }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_message_says_what_how_much_and_what_is_allowed() {
        let error = fraction("bond_albedo", 1.4).expect_err("above one");
        assert_eq!(error.to_string(), "bond_albedo is 1.4, allowed 0 to 1");
    }

    #[test]
    fn neither_nan_nor_infinity_passes() {
        for value in [f64::NAN, f64::INFINITY, f64::NEG_INFINITY, -1.0] {
            assert!(positive("mass_mearth", value).is_err());
            assert!(non_negative("luminosity_lsun", value).is_err());
            assert!(closed_eccentricity(value).is_err());
        }
        assert_eq!(non_negative("luminosity_lsun", 1e-40), Ok(0.0));
    }
}
