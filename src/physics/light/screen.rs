//! A light as a screen with a D65 white can show it, brightness set aside.

use super::chromaticity::Tristimulus;
use super::gamut::{in_gamut, into_p3_gamut, into_srgb_gamut};
use super::rgb::{RgbSpace, encode_srgb, largest_channel_one, to_f32};

/// The colour of a light on a screen: its largest channel is one, its brightness is reported elsewhere.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct ScreenColour {
    /// Linear Rec. 709 with the largest channel 1, not clipped: a negative channel lies outside sRGB.
    pub linear_rec709: [f64; 3],
    /// Encoded sRGB, the nearest colour the screen can show.
    pub srgb: [u8; 3],
    /// Whether the screen shows the colour itself.
    pub in_srgb_gamut: bool,
}

/// The screen colour of a light, or `None` where there is none.
///
/// # Source
/// Linear Rec. 709 (ITU-R BT.709-6), largest channel set to one, mapped by [`into_srgb_gamut`] and encoded by
/// IEC 61966-2-1. No adaptation: this is the light as a camera balanced for D65 takes it.
#[must_use]
pub fn screen_colour(light: Tristimulus) -> Option<ScreenColour> {
    let linear_rec709 = largest_channel_one(RgbSpace::Rec709.linear(light))?;
    let (shown, in_srgb_gamut) = shown(linear_rec709, into_srgb_gamut);
    Some(ScreenColour { linear_rec709, srgb: encode_srgb(shown), in_srgb_gamut })
}

/// A light as a wide-gamut screen can show it.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct WideColour {
    /// Encoded Display P3, the nearest colour the screen can show.
    pub display_p3: [u8; 3],
    /// Whether the screen shows the colour itself.
    pub in_gamut: bool,
}

/// The colour of a light on a Display P3 screen, or `None` where there is none.
///
/// # Source
/// Linear P3-D65 (SMPTE EG 432-1), largest channel set to one, mapped by [`into_p3_gamut`] and
/// encoded with the sRGB curve, as W3C CSS Color 4 defines `display-p3`.
#[must_use]
pub fn wide_colour(light: Tristimulus) -> Option<WideColour> {
    let linear = largest_channel_one(RgbSpace::P3D65.linear(light))?;
    let (shown, in_gamut) = shown(linear, into_p3_gamut);
    Some(WideColour { display_p3: encode_srgb(shown), in_gamut })
}

/// What is shown of a linear colour, and whether it is the colour itself.
fn shown(linear: [f64; 3], map: fn([f32; 3]) -> [f32; 3]) -> ([f64; 3], bool) {
    let single = linear.map(to_f32);
    if in_gamut(single) {
        return (linear, true);
    }
    let mapped = map(single).map(f64::from);
    (largest_channel_one(mapped).unwrap_or(mapped), false)
}

impl ScreenColour {
    /// The colour as `#rrggbb`.
    #[must_use]
    pub fn hex(&self) -> String {
        hex(self.srgb)
    }

    /// The encoded sRGB of the same colour at a share of its brightness, 0 to 1; what is no number counts as 0.
    #[must_use]
    pub fn dimmed(&self, share: f64) -> [u8; 3] {
        encode_srgb(self.shown_linear(share))
    }

    /// The same before it is encoded: linear Rec. 709 within what the screen can show.
    #[must_use]
    pub fn shown_linear(&self, share: f64) -> [f64; 3] {
        let share = if share.is_nan() { 0.0 } else { share.clamp(0.0, 1.0) };
        let (shown, _) = shown(self.linear_rec709, into_srgb_gamut);
        shown.map(|channel| channel * share)
    }
}

/// Writes an encoded colour as `#rrggbb`.
#[must_use]
pub fn hex(srgb: [u8; 3]) -> String {
    format!("#{:02x}{:02x}{:02x}", srgb[0], srgb[1], srgb[2])
}

#[cfg(test)]
mod tests {
    use super::super::blackbody_tristimulus;
    use super::*;

    #[test]
    fn a_wide_screen_shows_redder_stars_than_a_narrow_one() {
        let at = |temperature_k| blackbody_tristimulus(temperature_k).expect("in range");
        let (narrow, wide) = (screen_colour(at(1700.0)).expect("light"), wide_colour(at(1700.0)).expect("light"));
        assert!(!narrow.in_srgb_gamut && wide.in_gamut);
        assert!(!wide_colour(at(800.0)).expect("light").in_gamut);
        // A grey is the same in both.
        let white = super::super::WHITE_D65.tristimulus().expect("a colour");
        assert_eq!(wide_colour(white).expect("light").display_p3, [255; 3]);
    }

    #[test]
    fn dimming_keeps_the_hue_and_ends_in_black() {
        let colour = screen_colour(blackbody_tristimulus(1500.0).expect("in range")).expect("light");
        assert_eq!(colour.dimmed(1.0), colour.srgb);
        assert_eq!((colour.dimmed(0.0), colour.dimmed(f64::NAN), colour.dimmed(7.0)), ([0; 3], [0; 3], colour.srgb));
        let [red, green, _] = colour.dimmed(0.2);
        assert!(red > green && red < 140, "{red} {green}");
    }
}
