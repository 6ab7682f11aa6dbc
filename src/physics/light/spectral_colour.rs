//! The colour of light of a single wavelength, for the band below a spectrum.

use super::chromaticity::Tristimulus;
use super::observer_table::{OBSERVER, OBSERVER_FROM_NM, OBSERVER_ROWS, OBSERVER_STEP_NM};
use super::range::{OutOfRange, within};
use super::screen::{ScreenColour, screen_colour};

/// The colour of one wavelength.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct SpectralColour {
    /// The nearest colour of the screen; every spectral colour lies outside sRGB.
    pub screen: ScreenColour,
    /// V(λ): how bright a watt of it looks, as a share of the brightest wavelength, 555 nm.
    pub relative_brightness: f64,
}

/// The colour of light of a single wavelength, its brightness set aside.
///
/// # Source
/// CIE 1931 2° observer (ISO/CIE 11664-1:2019), linear between rows of 5 nm.
///
/// # Valid for
/// 360 to 830 nm. Toward both ends the eye sees next to nothing: multiply by the brightness to show that.
///
/// # Errors
/// [`OutOfRange`] for a wavelength outside 360 to 830 nm.
///
/// # Example
/// ```
/// use longember::physics::light::spectral_colour;
/// let [red, green, blue] = spectral_colour(630.0)?.screen.srgb;
/// assert!(red == 255 && green < 100 && blue < 100);
/// # Ok::<(), longember::physics::light::OutOfRange>(())
/// ```
pub fn spectral_colour(wavelength_nm: f64) -> Result<SpectralColour, OutOfRange> {
    let light = monochromatic(wavelength_nm)?;
    let refused = OutOfRange { what: "wavelength_nm", value: wavelength_nm, allowed: ALLOWED };
    Ok(SpectralColour { screen: screen_colour(light).ok_or(refused)?, relative_brightness: light.y })
}

/// Tristimulus values of one wavelength: x̄, ȳ, z̄, linear between rows of 5 nm.
///
/// # Source
/// As [`spectral_colour`].
///
/// # Errors
/// [`OutOfRange`] for a wavelength outside 360 to 830 nm.
pub fn monochromatic(wavelength_nm: f64) -> Result<Tristimulus, OutOfRange> {
    let place = (within("wavelength_nm", wavelength_nm, OBSERVER_FROM_NM, LAST_NM, ALLOWED)? - OBSERVER_FROM_NM)
        / OBSERVER_STEP_NM;
    #[expect(clippy::cast_possible_truncation, clippy::cast_sign_loss, reason = "0 to 94, checked above")]
    let row = (place as usize).min(OBSERVER_ROWS - 2);
    let share = place - row as f64;
    let [x, y, z] =
        [0, 1, 2].map(|channel| OBSERVER[row][channel] + share * (OBSERVER[row + 1][channel] - OBSERVER[row][channel]));
    Ok(Tristimulus { x, y, z })
}

const LAST_NM: f64 = OBSERVER_FROM_NM + OBSERVER_STEP_NM * (OBSERVER_ROWS - 1) as f64;
const ALLOWED: &str = "360 to 830 nm";

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn both_ends_belong_to_the_range() {
        for end_nm in [360.0, 830.0] {
            assert!(spectral_colour(end_nm).expect("in range").relative_brightness < 1e-5);
        }
        for outside_nm in [359.9, 830.1, f64::NAN] {
            assert!(spectral_colour(outside_nm).is_err());
        }
        assert_eq!(spectral_colour(555.0).expect("in range").relative_brightness, 1.0);
    }

    #[test]
    fn no_spectral_colour_fits_the_screen() {
        for wavelength_nm in (360..=830).map(f64::from) {
            assert!(!spectral_colour(wavelength_nm).expect("in range").screen.in_srgb_gamut, "{wavelength_nm}");
        }
    }
}
