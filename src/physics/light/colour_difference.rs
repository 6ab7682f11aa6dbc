//! How different two lights look.

use super::chromaticity::{Tristimulus, WHITE_D65};

/// CIE 1976 L*a*b* of a light against D65 with Y = 1 as white.
///
/// # Source
/// ISO/CIE 11664-4:2019.
#[must_use]
pub fn cielab(light: Tristimulus) -> [f64; 3] {
    let root = |ratio: f64| {
        if ratio > (6.0_f64 / 29.0).powi(3) {
            ratio.cbrt()
        } else {
            ratio * (29.0_f64 / 6.0).powi(2) / 3.0 + 4.0 / 29.0
        }
    };
    let (white_x, white_z) = (WHITE_D65.x / WHITE_D65.y, (1.0 - WHITE_D65.x - WHITE_D65.y) / WHITE_D65.y);
    let (x, y, z) = (root(light.x / white_x), root(light.y), root(light.z / white_z));
    [116.0 * y - 16.0, 500.0 * (x - y), 200.0 * (y - z)]
}

/// Colour difference CIEDE2000 of two lights whose Y is relative to a D65 white of 1; about 1 is just noticeable.
///
/// # Source
/// CIE 142-2001; Sharma, Wu & Dalal (2005), Color Research & Application 30, 21 (implementation notes, test data).
#[must_use]
pub fn ciede2000(one: Tristimulus, other: Tristimulus) -> f64 {
    ciede2000_of_lab(cielab(one), cielab(other))
}

/// CIEDE2000 of two L*a*b* colours with all weights 1.
pub(super) fn ciede2000_of_lab([l1, a1, b1]: [f64; 3], [l2, a2, b2]: [f64; 3]) -> f64 {
    let grey_shift = |chroma: f64| (chroma.powi(7) / (chroma.powi(7) + 25.0_f64.powi(7))).sqrt();
    let hue = |a: f64, b: f64| if a == 0.0 && b == 0.0 { 0.0 } else { b.atan2(a).to_degrees().rem_euclid(360.0) };

    let stretch = 1.0 + 0.5 * (1.0 - grey_shift(f64::midpoint(a1.hypot(b1), a2.hypot(b2))));
    let (a1, a2) = (a1 * stretch, a2 * stretch);
    let (c1, c2) = (a1.hypot(b1), a2.hypot(b2));
    let (h1, h2) = (hue(a1, b1), hue(a2, b2));
    let one_is_grey = c1 * c2 == 0.0;

    let turn = match h2 - h1 {
        _ if one_is_grey => 0.0,
        turn if turn > 180.0 => turn - 360.0,
        turn if turn < -180.0 => turn + 360.0,
        turn => turn,
    };
    let mean_hue = if one_is_grey {
        h1 + h2
    } else if (h1 - h2).abs() <= 180.0 {
        f64::midpoint(h1, h2)
    } else if h1 + h2 < 360.0 {
        f64::midpoint(h1, h2) + 180.0
    } else {
        f64::midpoint(h1, h2) - 180.0
    };
    let (mean_l, mean_c) = (f64::midpoint(l1, l2), f64::midpoint(c1, c2));
    let cosine = |degrees: f64| degrees.to_radians().cos();
    let t = 1.0 - 0.17 * cosine(mean_hue - 30.0) + 0.24 * cosine(2.0 * mean_hue) + 0.32 * cosine(3.0 * mean_hue + 6.0)
        - 0.20 * cosine(4.0 * mean_hue - 63.0);
    let s_l = 1.0 + 0.015 * (mean_l - 50.0).powi(2) / (20.0 + (mean_l - 50.0).powi(2)).sqrt();
    let s_c = 1.0 + 0.045 * mean_c;
    let s_h = 1.0 + 0.015 * mean_c * t;
    let rotation = -(60.0 * (-((mean_hue - 275.0) / 25.0).powi(2)).exp()).to_radians().sin() * 2.0 * grey_shift(mean_c);

    let delta_l = (l2 - l1) / s_l;
    let delta_c = (c2 - c1) / s_c;
    let delta_h = 2.0 * (c1 * c2).sqrt() * (turn / 2.0).to_radians().sin() / s_h;
    (delta_l * delta_l + delta_c * delta_c + delta_h * delta_h + rotation * delta_c * delta_h).max(0.0).sqrt()
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn published_pairs_are_met() {
        // Sharma, Wu & Dalal (2005), table 1, pairs 1, 7, 17, 25 (from memory).
        for (one, other, expected) in [
            ([50.0, 2.6772, -79.7751], [50.0, 0.0, -82.7485], 2.0425),
            ([50.0, 0.0, 0.0], [50.0, -1.0, 2.0], 2.3669),
            ([50.0, 2.5, 0.0], [73.0, 25.0, -18.0], 27.1492),
            ([60.2574, -34.0099, 36.2677], [60.4626, -34.1751, 39.4387], 1.2644),
        ] {
            let found = ciede2000_of_lab(one, other);
            assert!((found - expected).abs() < 1e-4, "{found} {expected}");
            assert!((ciede2000_of_lab(other, one) - found).abs() < 1e-12);
        }
    }

    #[test]
    fn the_white_is_a_hundred_and_grey() {
        let [l, a, b] = cielab(WHITE_D65.tristimulus().expect("y is positive"));
        assert!((l - 100.0).abs() < 1e-12 && a.abs() < 1e-12 && b.abs() < 1e-12);
    }
}
