//! A light as a screen with a D65 white can show it, brightness set aside.

use super::chromaticity::Tristimulus;
use super::gamut::{in_gamut, into_srgb_gamut};
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
    let single = linear_rec709.map(to_f32);
    let in_srgb_gamut = in_gamut(single);
    let shown = if in_srgb_gamut {
        linear_rec709
    } else {
        let mapped = into_srgb_gamut(single).map(f64::from);
        largest_channel_one(mapped).unwrap_or(mapped)
    };
    Some(ScreenColour { linear_rec709, srgb: encode_srgb(shown), in_srgb_gamut })
}

impl ScreenColour {
    /// The colour as `#rrggbb`.
    #[must_use]
    pub fn hex(&self) -> String {
        hex(self.srgb)
    }
}

/// Writes an encoded colour as `#rrggbb`.
#[must_use]
pub fn hex(srgb: [u8; 3]) -> String {
    format!("#{:02x}{:02x}{:02x}", srgb[0], srgb[1], srgb[2])
}
