//! Tristimulus values and the chromaticity diagrams drawn from them.

/// CIE 1931 tristimulus values; the unit is that of the spectrum times lm W⁻¹ nm.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct Tristimulus {
    /// X.
    pub x: f64,
    /// Y, the luminous quantity.
    pub y: f64,
    /// Z.
    pub z: f64,
}

/// A point of the CIE 1931 chromaticity diagram.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Chromaticity {
    /// x = X/(X+Y+Z).
    pub x: f64,
    /// y = Y/(X+Y+Z).
    pub y: f64,
}

/// CIE standard illuminant D65 as rounded for displays. ITU-R BT.709-6, item 1.4.
pub const WHITE_D65: Chromaticity = Chromaticity { x: 0.3127, y: 0.3290 };

impl Tristimulus {
    /// The chromaticity, or `None` where there is no light (or a sum that is no number).
    #[must_use]
    pub fn chromaticity(self) -> Option<Chromaticity> {
        // Dividing by the largest first keeps the sum away from overflow and from subnormal numbers.
        let largest = self.x.max(self.y).max(self.z);
        let sum = self.x / largest + self.y / largest + self.z / largest;
        let (x, y) = (self.x / largest / sum, self.y / largest / sum);
        (largest > 0.0 && x.is_finite() && y.is_finite()).then_some(Chromaticity { x, y })
    }

    /// All three values multiplied by a factor.
    #[must_use]
    pub fn scaled(self, factor: f64) -> Self {
        Self { x: self.x * factor, y: self.y * factor, z: self.z * factor }
    }

    /// The sum with another light.
    #[must_use]
    pub fn plus(self, other: Self) -> Self {
        Self { x: self.x + other.x, y: self.y + other.y, z: self.z + other.z }
    }

    /// The values as an array.
    #[must_use]
    pub fn to_array(self) -> [f64; 3] {
        [self.x, self.y, self.z]
    }
}

impl Chromaticity {
    /// Tristimulus values with Y = 1, or `None` for y ≤ 0 where no luminance fits the point.
    #[must_use]
    pub fn tristimulus(self) -> Option<Tristimulus> {
        let unit = Tristimulus { x: self.x / self.y, y: 1.0, z: (1.0 - self.x - self.y) / self.y };
        (self.y > 0.0 && unit.x.is_finite() && unit.z.is_finite()).then_some(unit)
    }

    /// CIE 1976 uniform chromaticity (u′, v′).
    ///
    /// # Source
    /// CIE 15:2018, equation 8.26: u′ = 4x/(−2x+12y+3), v′ = 9y/(−2x+12y+3). The denominator is positive
    /// everywhere in the diagram.
    #[must_use]
    pub fn u_v_prime(self) -> [f64; 2] {
        let denominator = -2.0 * self.x + 12.0 * self.y + 3.0;
        [4.0 * self.x / denominator, 9.0 * self.y / denominator]
    }

    /// CIE 1960 (u, v), used for correlated colour temperature only: u = u′, v = ⅔ v′.
    #[must_use]
    pub fn u_v_1960(self) -> [f64; 2] {
        let [u, v_prime] = self.u_v_prime();
        [u, v_prime * 2.0 / 3.0]
    }

    /// The point as (x, y).
    #[must_use]
    pub fn xy(self) -> [f64; 2] {
        [self.x, self.y]
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn d65_has_its_published_uniform_chromaticity() {
        // CIE 15:2018 lists u′ 0.1978, v′ 0.4683 for D65.
        let [u, v] = WHITE_D65.u_v_prime();
        assert!((u - 0.1978).abs() < 5e-5 && (v - 0.4683).abs() < 5e-5, "{u} {v}");
    }

    #[test]
    fn no_light_has_no_chromaticity() {
        assert_eq!(Tristimulus::default().chromaticity(), None);
        assert_eq!(Tristimulus { x: f64::NAN, y: 1.0, z: 1.0 }.chromaticity(), None);
        assert_eq!(Chromaticity { x: 0.3, y: 0.0 }.tristimulus(), None);
    }

    #[test]
    fn very_dim_and_very_bright_light_keep_their_colour() {
        let unit = WHITE_D65.tristimulus().expect("y is positive");
        for factor in [1e-300, 1.0, 1e300] {
            let back = unit.scaled(factor).chromaticity().expect("light");
            assert!((back.x - WHITE_D65.x).abs() < 1e-12 && (back.y - WHITE_D65.y).abs() < 1e-12);
        }
    }
}
