//! Linear RGB of three display and projector standards, and the sRGB encoding.

use super::chromaticity::{Chromaticity, Tristimulus, WHITE_D65};
use color::{ColorSpace, Srgb};

/// An additive colour space by its primaries; the white is D65 for all three.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum RgbSpace {
    /// ITU-R BT.709, whose primaries are also those of sRGB.
    Rec709,
    /// P3 primaries with a D65 white, SMPTE EG 432-1 (Display P3).
    P3D65,
    /// ITU-R BT.2020, wide gamut.
    Rec2020,
}

impl RgbSpace {
    /// All spaces, narrow to wide.
    pub const ALL: [Self; 3] = [Self::Rec709, Self::P3D65, Self::Rec2020];

    /// Chromaticities of the red, green and blue primary.
    ///
    /// # Source
    /// ITU-R BT.709-6 item 1.3; SMPTE EG 432-1:2010; ITU-R BT.2020-2 table 3.
    #[must_use]
    pub const fn primaries(self) -> [Chromaticity; 3] {
        let [red, green, blue] = match self {
            Self::Rec709 => [[0.64, 0.33], [0.30, 0.60], [0.15, 0.06]],
            Self::P3D65 => [[0.680, 0.320], [0.265, 0.690], [0.150, 0.060]],
            Self::Rec2020 => [[0.708, 0.292], [0.170, 0.797], [0.131, 0.046]],
        };
        [
            Chromaticity { x: red[0], y: red[1] },
            Chromaticity { x: green[0], y: green[1] },
            Chromaticity { x: blue[0], y: blue[1] },
        ]
    }

    /// The space's name as standards print it.
    #[must_use]
    pub const fn name(self) -> &'static str {
        match self {
            Self::Rec709 => "Rec. 709",
            Self::P3D65 => "P3-D65",
            Self::Rec2020 => "Rec. 2020",
        }
    }

    /// The matrix from XYZ to linear RGB.
    #[must_use]
    pub const fn matrix_from_xyz(self) -> [[f64; 3]; 3] {
        match self {
            Self::Rec709 => FROM_XYZ_709,
            Self::P3D65 => FROM_XYZ_P3,
            Self::Rec2020 => FROM_XYZ_2020,
        }
    }

    /// Linear RGB, unclipped: components may be negative or above one.
    ///
    /// # Source
    /// SMPTE RP 177:1993, derivation from primaries and white.
    #[must_use]
    pub fn linear(self, light: Tristimulus) -> [f64; 3] {
        apply(&self.matrix_from_xyz(), light.to_array())
    }
}

const FROM_XYZ_709: [[f64; 3]; 3] = matrix_from_xyz(RgbSpace::Rec709.primaries());
const FROM_XYZ_P3: [[f64; 3]; 3] = matrix_from_xyz(RgbSpace::P3D65.primaries());
const FROM_XYZ_2020: [[f64; 3]; 3] = matrix_from_xyz(RgbSpace::Rec2020.primaries());

/// Scales a colour so that its largest channel is one, or `None` where nothing shines.
#[must_use]
pub fn largest_channel_one(linear: [f64; 3]) -> Option<[f64; 3]> {
    let largest = linear[0].max(linear[1]).max(linear[2]);
    let scaled = linear.map(|channel| channel / largest);
    (largest > 0.0 && scaled.iter().all(|channel| channel.is_finite())).then_some(scaled)
}

/// Encodes linear Rec. 709 as 8-bit sRGB; channels outside 0 to 1 are clipped.
///
/// # Source
/// IEC 61966-2-1:1999 transfer curve, through the crate `color`; rounded to the nearest of 256 steps.
#[must_use]
pub fn encode_srgb(linear: [f64; 3]) -> [u8; 3] {
    let single = linear.map(to_f32);
    Srgb::clip(Srgb::from_linear_srgb(single)).map(|encoded| {
        #[expect(clippy::cast_possible_truncation, clippy::cast_sign_loss, reason = "0.5 to 255.5 after clipping")]
        let step = (255.0 * encoded + 0.5) as u8;
        step
    })
}

/// Encodes linear Rec. 709 as 16-bit sRGB; channels outside 0 to 1 are clipped.
///
/// # Source
/// As [`encode_srgb`], rounded to the nearest of 65 536 steps.
#[must_use]
pub fn encode_srgb_16(linear: [f64; 3]) -> [u16; 3] {
    let single = linear.map(to_f32);
    Srgb::clip(Srgb::from_linear_srgb(single)).map(|encoded| {
        #[expect(clippy::cast_possible_truncation, clippy::cast_sign_loss, reason = "0.5 to 65535.5 after clipping")]
        let step = (65_535.0 * f64::from(encoded) + 0.5) as u16;
        step
    })
}

/// Decodes 8-bit sRGB to linear Rec. 709.
///
/// # Source
/// As [`encode_srgb`].
#[must_use]
pub fn decode_srgb(encoded: [u8; 3]) -> [f64; 3] {
    Srgb::to_linear_srgb(encoded.map(|step| f32::from(step) / 255.0)).map(f64::from)
}

/// The crate `color` computes in `f32`: one part in ten million, a hundred times finer than an 8-bit step needs.
#[expect(clippy::cast_possible_truncation, reason = "rounding to the nearest f32 is meant")]
pub(crate) fn to_f32(value: f64) -> f32 {
    value as f32
}

/// A matrix times a column.
pub(crate) const fn apply(matrix: &[[f64; 3]; 3], column: [f64; 3]) -> [f64; 3] {
    let mut product = [0.0; 3];
    let mut row = 0;
    while row < 3 {
        product[row] = matrix[row][0] * column[0] + matrix[row][1] * column[1] + matrix[row][2] * column[2];
        row += 1;
    }
    product
}

/// The inverse of a regular matrix by cofactors.
pub(crate) const fn inverse(m: &[[f64; 3]; 3]) -> [[f64; 3]; 3] {
    let mut cofactors = [[0.0; 3]; 3];
    let mut row = 0;
    while row < 3 {
        let mut column = 0;
        while column < 3 {
            let (r1, r2, c1, c2) = ((row + 1) % 3, (row + 2) % 3, (column + 1) % 3, (column + 2) % 3);
            cofactors[row][column] = m[r1][c1] * m[r2][c2] - m[r1][c2] * m[r2][c1];
            column += 1;
        }
        row += 1;
    }
    let determinant = m[0][0] * cofactors[0][0] + m[0][1] * cofactors[0][1] + m[0][2] * cofactors[0][2];
    let mut inverse = [[0.0; 3]; 3];
    row = 0;
    while row < 3 {
        let mut column = 0;
        while column < 3 {
            inverse[row][column] = cofactors[column][row] / determinant;
            column += 1;
        }
        row += 1;
    }
    inverse
}

/// The matrix for given primaries, scaled so that D65 with Y = 1 becomes (1, 1, 1).
const fn matrix_from_xyz(primaries: [Chromaticity; 3]) -> [[f64; 3]; 3] {
    let mut columns = [[0.0; 3]; 3];
    let mut index = 0;
    while index < 3 {
        let Chromaticity { x, y } = primaries[index];
        columns[0][index] = x / y;
        columns[1][index] = 1.0;
        columns[2][index] = (1.0 - x - y) / y;
        index += 1;
    }
    let mut rows = inverse(&columns);
    let white = [WHITE_D65.x / WHITE_D65.y, 1.0, (1.0 - WHITE_D65.x - WHITE_D65.y) / WHITE_D65.y];
    let of_white = apply(&rows, white);
    index = 0;
    while index < 3 {
        let mut column = 0;
        while column < 3 {
            rows[index][column] /= of_white[index];
            column += 1;
        }
        index += 1;
    }
    rows
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_display_white_is_one_one_one_in_every_space() {
        let white = WHITE_D65.tristimulus().expect("y is positive");
        for space in RgbSpace::ALL {
            for channel in space.linear(white) {
                assert!((channel - 1.0).abs() < 1e-14, "{}: {channel}", space.name());
            }
        }
    }

    #[test]
    fn encoding_has_its_ends_and_its_middle() {
        assert_eq!(encode_srgb([0.0, 1.0, -0.5]), [0, 255, 0]);
        // IEC 61966-2-1: code 128 of 255 decodes to linear 0.215 861.
        assert_eq!(encode_srgb([0.215_861, 7.0, 0.003_130_8]), [128, 255, 10]);
    }

    #[test]
    fn no_light_has_no_scale() {
        assert_eq!(largest_channel_one([0.0, -1.0, 0.0]), None);
        assert_eq!(largest_channel_one([f64::INFINITY, 1.0, 0.0]), None);
        assert_eq!(largest_channel_one([4.0, 2.0, -1.0]), Some([1.0, 0.5, -0.25]));
    }
}
