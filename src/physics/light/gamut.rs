//! Bringing a colour that the screen cannot show to the nearest one it can.

use super::rgb::{RgbSpace, apply, inverse, to_f32};
use color::{ColorSpace, LinearSrgb, Oklab};

/// Difference in Oklab that the eye just notices. CSS Color 4, section 13.2.
pub const JUST_NOTICEABLE: f32 = 0.02;
/// How close the search comes to that difference. CSS Color 4, section 13.2.
const SEARCH_END: f32 = 1e-4;

/// Maps linear sRGB into the gamut, keeping lightness and hue and giving up chroma only as far as needed.
///
/// A plain clip is taken where it is not noticeable; otherwise the chroma is bisected in Oklch, and each
/// trial may be clipped as long as that clip stays below the just noticeable difference.
///
/// # Source
/// W3C CSS Color Module Level 4, section 13.2 (binary search with local minimum-difference clipping), in Oklab
/// (Ottosson 2020) through the crate `color`.
///
/// # Valid for
/// Any finite colour; one in the gamut comes back unchanged.
#[must_use]
pub fn into_srgb_gamut(linear: [f32; 3]) -> [f32; 3] {
    into_gamut(linear, &Oklab::from_linear_srgb, &Oklab::to_linear_srgb)
}

/// [`into_srgb_gamut`] for linear P3-D65 and its wider gamut.
///
/// # Source
/// As [`into_srgb_gamut`]; the primaries of [`RgbSpace::P3D65`].
#[must_use]
pub fn into_p3_gamut(linear: [f32; 3]) -> [f32; 3] {
    const TO_709: [[f64; 3]; 3] = inverse(&RgbSpace::P3D65.matrix_from_xyz());
    let to_lab = |p3: [f32; 3]| {
        let xyz = apply(&TO_709, p3.map(f64::from));
        Oklab::from_linear_srgb(apply(&RgbSpace::Rec709.matrix_from_xyz(), xyz).map(to_f32))
    };
    let from_lab = |lab: [f32; 3]| {
        const TO_XYZ: [[f64; 3]; 3] = inverse(&RgbSpace::Rec709.matrix_from_xyz());
        let xyz = apply(&TO_XYZ, Oklab::to_linear_srgb(lab).map(f64::from));
        apply(&RgbSpace::P3D65.matrix_from_xyz(), xyz).map(to_f32)
    };
    into_gamut(linear, &to_lab, &from_lab)
}

/// The mapping for any space that knows its way to Oklab and back.
fn into_gamut(
    linear: [f32; 3],
    to_lab: &impl Fn([f32; 3]) -> [f32; 3],
    from_lab: &impl Fn([f32; 3]) -> [f32; 3],
) -> [f32; 3] {
    if in_gamut(linear) {
        return linear;
    }
    let difference = |linear, lab| distance(to_lab(linear), lab);
    let lab = to_lab(linear);
    if lab[0] >= 1.0 {
        return [1.0; 3];
    }
    if lab[0] <= 0.0 {
        return [0.0; 3];
    }
    let mut clipped = LinearSrgb::clip(linear);
    if difference(clipped, lab) < JUST_NOTICEABLE {
        return clipped;
    }
    // `low` and `high` are shares of the original chroma.
    let (mut low, mut high) = (0.0_f32, 1.0_f32);
    let mut low_is_in_gamut = true;
    let chroma = lab[1].hypot(lab[2]);
    while (high - low) * chroma > SEARCH_END {
        let share = 0.5 * (low + high);
        let trial_lab = [lab[0], lab[1] * share, lab[2] * share];
        let trial = from_lab(trial_lab);
        if low_is_in_gamut && in_gamut(trial) {
            low = share;
            continue;
        }
        clipped = LinearSrgb::clip(trial);
        let error = difference(clipped, trial_lab);
        if error < JUST_NOTICEABLE {
            if JUST_NOTICEABLE - error < SEARCH_END {
                return clipped;
            }
            low_is_in_gamut = false;
            low = share;
        } else {
            high = share;
        }
    }
    clipped
}

/// Whether all channels lie between 0 and 1.
#[must_use]
pub fn in_gamut(linear: [f32; 3]) -> bool {
    linear.iter().all(|channel| (0.0..=1.0).contains(channel))
}

/// Distance of two points of Oklab.
fn distance([l, a, b]: [f32; 3], lab: [f32; 3]) -> f32 {
    ((l - lab[0]).powi(2) + (a - lab[1]).powi(2) + (b - lab[2]).powi(2)).sqrt()
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_colour_the_screen_can_show_is_left_alone() {
        assert_eq!(into_srgb_gamut([0.2, 1.0, 0.0]), [0.2, 1.0, 0.0]);
    }

    #[test]
    fn a_far_colour_keeps_its_lightness_within_the_just_noticeable() {
        for far in [[1.0, -0.3, -0.1], [-0.4, 0.8, 0.1], [0.1, 0.0, 1.4], [1.0, 0.9, -0.6]] {
            let mapped = into_srgb_gamut(far);
            assert!(in_gamut(mapped));
            let (before, after) = (Oklab::from_linear_srgb(far), Oklab::from_linear_srgb(mapped));
            assert!((before[0] - after[0]).abs() < 0.0202, "{far:?}: {before:?} {after:?}");
        }
    }

    #[test]
    fn the_wider_gamut_holds_what_the_narrow_one_holds_and_more() {
        // The reddest of Rec. 709, in P3: inside. A red beyond P3: mapped to its edge.
        let xyz = apply(&inverse(&RgbSpace::Rec709.matrix_from_xyz()), [1.0, 0.0, 0.0]);
        let red_709 = RgbSpace::P3D65.linear(super::super::Tristimulus { x: xyz[0], y: xyz[1], z: xyz[2] }).map(to_f32);
        assert!(in_gamut(red_709));
        assert_eq!(into_p3_gamut(red_709), red_709);
        let mapped = into_p3_gamut([1.0, -0.1, -0.02]);
        assert!(in_gamut(mapped) && mapped[0] > mapped[1] + 0.7, "{mapped:?}");
    }

    #[test]
    fn beyond_white_is_white_and_below_black_is_black() {
        assert_eq!(into_srgb_gamut([3.0, 3.0, 3.0]), [1.0; 3]);
        assert_eq!(into_srgb_gamut([-1.0, -1.0, -1.0]), [0.0; 3]);
    }
}
