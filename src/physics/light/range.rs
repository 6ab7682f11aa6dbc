//! The one error of light: a quantity outside the range a relation is defined on.

use thiserror::Error;

/// A value that a relation cannot be asked about: what, how much, what would be allowed.
#[derive(Clone, Copy, Debug, Error, PartialEq)]
#[error("{what} is {value}, allowed {allowed}")]
pub struct OutOfRange {
    /// Name of the quantity with its unit suffix, such as `temperature_k`.
    pub what: &'static str,
    /// The value that was given, in the unit the name ends in.
    pub value: f64,
    /// The allowed range in words.
    pub allowed: &'static str,
}

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

/// Passes a blackbody temperature on: from 1 K to 10⁹ K every sum in this module stays finite.
pub(crate) fn temperature(temperature_k: f64) -> Result<f64, OutOfRange> {
    within("temperature_k", temperature_k, 1.0, 1e9, "1 to 1e9 K")
}

/// Passes a wavelength on, gamma rays to long radio waves.
pub(crate) fn wavelength(wavelength_nm: f64) -> Result<f64, OutOfRange> {
    within("wavelength_nm", wavelength_nm, 1e-3, 1e12, "0.001 to 1e12 nm")
}

/// Passes a power, flux or similar amount on that may be zero.
pub(crate) fn amount(what: &'static str, value: f64) -> Result<f64, OutOfRange> {
    within(what, value, 0.0, 1e60, "0 to 1e60")
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_message_says_what_how_much_and_what_is_allowed() {
        let error = temperature(0.5).expect_err("below one kelvin");
        assert_eq!(error.to_string(), "temperature_k is 0.5, allowed 1 to 1e9 K");
    }

    #[test]
    fn neither_nan_nor_infinity_passes() {
        for value in [f64::NAN, f64::INFINITY, f64::NEG_INFINITY, -1.0] {
            assert!(temperature(value).is_err());
            assert!(wavelength(value).is_err());
            assert!(amount("irradiance_w_m2", value).is_err());
        }
    }
}
