//! The colour of a glowing body at a temperature.

use super::caution::Caution;
use super::chromaticity::Tristimulus;
use super::observer::blackbody_unchecked;
use super::screen::{ScreenColour, hex, screen_colour};
use std::f64::consts::PI;

/// Temperature at which a solid first glows to the eye in the dark, K.
///
/// # Source
/// Draper (1847), Philosophical Magazine 30, 345: 977 °F, which is 798 K.
pub const DRAPER_POINT_K: f64 = 798.0;

/// Luminance below which the eye sees colour only in part (mesopic vision), cd m⁻².
///
/// # Source
/// CIE 191:2010, upper end of the mesopic range.
pub const FULL_COLOUR_FROM_CD_M2: f64 = 5.0;

/// Temperature below which sodium, potassium and molecules take the colour away from a blackbody's, K.
///
/// # Source
/// Burrows, Hubbard, Lunine & Liebert (2001), Reviews of Modern Physics 73, 719.
const MOLECULES_BELOW_K: f64 = 2200.0;

/// Hottest temperature a swatch is computed for, K; hotter bodies share its colour to 10⁻⁵.
const HOTTEST_K: f64 = 1e9;

/// Whether a body at this temperature is seen to glow.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Glow {
    /// Below the Draper point: no visible glow.
    None,
    /// Glowing, but too dim for full colour vision: below 5 cd m⁻², about 1030 K.
    Faint,
    /// Bright enough for full colour.
    Full,
}

impl Glow {
    /// The glow in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::None => "no visible glow",
            Self::Faint => "faint glow",
            Self::Full => "full glow",
        }
    }
}

/// The colour of a blackbody on a screen, its brightness set aside.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Swatch {
    /// The temperature the colour belongs to, K.
    pub effective_temperature_k: f64,
    /// Whether it is seen to glow at all.
    pub glow: Glow,
    /// CIE 1931 (x, y); `None` where nothing glows.
    pub chromaticity: Option<[f64; 2]>,
    /// Linear Rec. 709 with the largest channel 1, not clipped; black where nothing glows.
    pub linear_rec709: [f64; 3],
    /// Encoded sRGB, the nearest colour a screen with D65 white can show; black where nothing glows.
    pub srgb: [u8; 3],
    /// Whether sRGB holds the colour itself. Blackbodies below 1900 K lie outside and are shown as nearest.
    pub in_srgb_gamut: bool,
}

impl Swatch {
    /// The colour as `#rrggbb`.
    #[must_use]
    pub fn hex(&self) -> String {
        hex(self.srgb)
    }

    /// What to bear in mind beside this colour.
    #[must_use]
    pub fn cautions(&self) -> Vec<Caution> {
        let mut cautions = vec![Caution::BlackbodyStandsIn];
        if self.effective_temperature_k < MOLECULES_BELOW_K {
            cautions.push(Caution::MolecularAbsorption);
        }
        if !self.in_srgb_gamut {
            cautions.push(Caution::OutsideSrgb);
        }
        cautions
    }
}

/// The colour of an ideal blackbody, for a screen with D65 white and an eye not adapted to the star.
///
/// # Source
/// Planck's law, the CIE 1931 2° observer, ITU-R BT.709-6 primaries, IEC 61966-2-1 encoding, W3C CSS Color 4
/// gamut mapping; glow threshold Draper (1847).
///
/// # Valid for
/// Any number. Below 798 K, and for what is no temperature (zero, negative, NaN), nothing glows; NaN is kept
/// as 0 K. Above 10⁹ K the colour no longer changes and the temperature is kept as 10⁹ K. A real star's colour
/// differs from a blackbody's: see [`measured_dwarf_colour`](super::measured_dwarf_colour).
///
/// # Example
/// ```
/// use longember::physics::light::{Glow, blackbody_swatch};
/// let sun = blackbody_swatch(5772.0);
/// assert_eq!((sun.hex().as_str(), sun.glow), ("#fff1ea", Glow::Full));
/// assert_eq!(blackbody_swatch(600.0).glow, Glow::None);
/// ```
#[must_use]
pub fn blackbody_swatch(effective_temperature_k: f64) -> Swatch {
    let effective_temperature_k =
        if effective_temperature_k.is_nan() { 0.0 } else { effective_temperature_k.clamp(0.0, HOTTEST_K) };
    if effective_temperature_k < DRAPER_POINT_K {
        return dark(effective_temperature_k);
    }
    let light = blackbody_unchecked(effective_temperature_k);
    match (light.chromaticity(), screen_colour(light)) {
        (Some(chromaticity), Some(ScreenColour { linear_rec709, srgb, in_srgb_gamut })) => Swatch {
            effective_temperature_k,
            glow: glow_of(light),
            chromaticity: Some(chromaticity.xy()),
            linear_rec709,
            srgb,
            in_srgb_gamut,
        },
        _ => dark(effective_temperature_k),
    }
}

fn glow_of(light: Tristimulus) -> Glow {
    let luminance_cd_m2 = light.y / PI;
    if luminance_cd_m2 < FULL_COLOUR_FROM_CD_M2 { Glow::Faint } else { Glow::Full }
}

fn dark(effective_temperature_k: f64) -> Swatch {
    Swatch {
        effective_temperature_k,
        glow: Glow::None,
        chromaticity: None,
        linear_rec709: [0.0; 3],
        srgb: [0; 3],
        in_srgb_gamut: true,
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn what_is_no_temperature_does_not_glow() {
        for odd in [f64::NAN, f64::NEG_INFINITY, -5.0, 0.0, 797.999] {
            let swatch = blackbody_swatch(odd);
            assert_eq!((swatch.glow, swatch.chromaticity, swatch.hex().as_str()), (Glow::None, None, "#000000"));
            assert!(swatch.effective_temperature_k.is_finite());
        }
    }

    #[test]
    fn the_glow_grows_with_temperature() {
        assert_eq!(blackbody_swatch(DRAPER_POINT_K).glow, Glow::Faint);
        assert_eq!(blackbody_swatch(1000.0).glow, Glow::Faint);
        assert_eq!(blackbody_swatch(1050.0).glow, Glow::Full);
        assert_eq!(blackbody_swatch(f64::INFINITY).glow, Glow::Full);
    }

    #[test]
    fn the_screen_holds_blackbodies_from_1900_kelvin_on() {
        assert!(!blackbody_swatch(1900.0).in_srgb_gamut);
        assert!(blackbody_swatch(1901.0).in_srgb_gamut);
        assert!(blackbody_swatch(2e5).in_srgb_gamut);
    }
}
