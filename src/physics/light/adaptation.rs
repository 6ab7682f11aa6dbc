//! The same light as a camera takes it and as an eye sees it that has grown used to the star.

use super::chromaticity::{Chromaticity, Tristimulus, WHITE_D65};
use super::colour_words::{ColourName, colour_name};
use super::range::{OutOfRange, within};
use super::rgb::{apply, inverse};
use super::screen::{ScreenColour, screen_colour};

/// Who looks.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
pub enum Viewing {
    /// A camera balanced for daylight (D65): the light as it is emitted.
    #[default]
    Camera,
    /// An eye fully adapted to the star's light, for which the star itself is white.
    AdaptedEye,
}

impl Viewing {
    /// Both ways of looking.
    pub const ALL: [Self; 2] = [Self::Camera, Self::AdaptedEye];

    /// The way of looking in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Camera => "as a daylight camera",
            Self::AdaptedEye => "as the adapted eye",
        }
    }
}

/// A light as it looks: where it lies, what the screen shows, and its name.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct SeenLight {
    /// CIE 1931 chromaticity, after adaptation where the eye is adapted.
    pub chromaticity: Chromaticity,
    /// The colour on a screen with D65 white.
    pub screen: ScreenColour,
    /// The colour in words.
    pub name: ColourName,
}

/// XYZ to the sharpened cone responses of CAT16.
const CAT16: [[f64; 3]; 3] =
    [[0.401288, 0.650173, -0.051461], [-0.250268, 1.204414, 0.045854], [-0.002079, 0.048952, 0.953127]];
const CAT16_INVERSE: [[f64; 3]; 3] = inverse(&CAT16);

/// Surroundings of a picture, which set how far the eye adapts.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Surround {
    /// Daylight or a lit room.
    Average,
    /// A dim room.
    Dim,
    /// A dark room, such as a planetarium.
    Dark,
}

/// How a light looks beside the star, or `None` where there is no light.
///
/// # Source
/// Camera: no adaptation. Adapted eye: [`adapted`] with degree 1, which full daylight reaches.
#[must_use]
pub fn seen(light: Tristimulus, star: Tristimulus, viewing: Viewing) -> Option<SeenLight> {
    let light = match viewing {
        Viewing::Camera => light,
        Viewing::AdaptedEye => adapted(light, star.chromaticity()?, 1.0),
    };
    Some(SeenLight { chromaticity: light.chromaticity()?, screen: screen_colour(light)?, name: colour_name(light)? })
}

/// A light after the eye has adapted from a D65 white to another one.
///
/// Each cone response is multiplied by D · (response to D65)/(response to the white) + 1 − D. A degree outside
/// 0 to 1 counts as the nearer end (a NaN as 0); for a white whose cone response is not positive, which no
/// star has, that channel is left as it is.
///
/// # Source
/// CAT16: Li, Li, Wang, Xu, Luo, Cui, Melgosa, Brill & Pointer (2017), Color Research & Application 42, 703.
#[must_use]
pub fn adapted(light: Tristimulus, white: Chromaticity, degree: f64) -> Tristimulus {
    let degree = if degree.is_nan() { 0.0 } else { degree.clamp(0.0, 1.0) };
    let (Some(from), Some(to)) = (white.tristimulus(), WHITE_D65.tristimulus()) else { return light };
    let from = apply(&CAT16, from.to_array());
    let to = apply(&CAT16, to.to_array());
    let mut cones = apply(&CAT16, light.to_array());
    for channel in 0..3 {
        if from[channel] > 0.0 {
            cones[channel] *= degree * to[channel] / from[channel] + 1.0 - degree;
        }
    }
    let [x, y, z] = apply(&CAT16_INVERSE, cones);
    Tristimulus { x, y, z }
}

/// How completely the eye adapts, 0 to 1.
///
/// `D = F (1 − exp(−(L_A + 42)/92)/3.6)`, F = 1, 0.9 or 0.8 by surround.
///
/// # Source
/// CIECAM02 (CIE 159:2004), taken over by CAM16 (Li et al. 2017).
///
/// # Errors
/// [`OutOfRange`] for an adapting luminance outside 0 to 10¹² cd m⁻².
pub fn degree_of_adaptation(adapting_luminance_cd_m2: f64, surround: Surround) -> Result<f64, OutOfRange> {
    let luminance = within("adapting_luminance_cd_m2", adapting_luminance_cd_m2, 0.0, 1e12, "0 to 1e12 cd/m2")?;
    let factor = match surround {
        Surround::Average => 1.0,
        Surround::Dim => 0.9,
        Surround::Dark => 0.8,
    };
    Ok(factor * (1.0 - (-(luminance + 42.0) / 92.0).exp() / 3.6))
}

#[cfg(test)]
mod tests {
    use super::super::observer::blackbody_unchecked;
    use super::*;

    #[test]
    fn a_star_is_white_to_the_eye_adapted_to_it() {
        for temperature_k in [1200.0, 2600.0, 5772.0, 40_000.0] {
            let star = blackbody_unchecked(temperature_k);
            let white = seen(star, star, Viewing::AdaptedEye).expect("light");
            assert!((white.chromaticity.x - 0.3127).abs() < 1e-10 && (white.chromaticity.y - 0.3290).abs() < 1e-10);
            assert_eq!(white.screen.hex(), "#ffffff");
            assert_eq!(white.name.to_string(), "white");
        }
    }

    #[test]
    fn no_adaptation_changes_nothing() {
        let star = blackbody_unchecked(3000.0);
        let colour = star.chromaticity().expect("light");
        for degree in [0.0, -4.0, f64::NAN] {
            let same = adapted(star, colour, degree).chromaticity().expect("light");
            assert!((same.x - colour.x).abs() < 1e-12 && (same.y - colour.y).abs() < 1e-12);
        }
    }

    #[test]
    fn the_degree_follows_its_formula() {
        // Full daylight leaves nothing to adapt; 0 cd/m2 leaves exp(-42/92)/3.6.
        assert!((degree_of_adaptation(1000.0, Surround::Average).expect("in range") - 1.0).abs() < 1e-5);
        assert!((degree_of_adaptation(0.0, Surround::Dark).expect("in range") - 0.659_2).abs() < 1e-4);
        assert!(degree_of_adaptation(-1.0, Surround::Dim).is_err());
    }
}
