//! Light after the star has set: the phases of twilight and how dark they are.

use super::caution::Caution;
use super::photometry::SUN_ILLUMINANCE_LX;
use super::range::{OutOfRange, amount, within};

/// Altitude at which the upper limb of the Sun sets, degrees: refraction 34′ and half a disc of 32′.
pub const SUNSET_ALTITUDE_DEG: f64 = -50.0 / 60.0;

/// The phases of a day by the star's altitude.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord)]
pub enum DayPhase {
    /// The star is up.
    Day,
    /// Down to −6°: enough light to read by.
    CivilTwilight,
    /// Down to −12°: the horizon can still be made out.
    NauticalTwilight,
    /// Down to −18°: the last trace of light.
    AstronomicalTwilight,
    /// Below −18°: the star adds nothing to the night.
    Night,
}

impl DayPhase {
    /// The phase at an altitude; what is no number counts as night.
    ///
    /// # Source
    /// Limits −50′, −6°, −12°, −18°: Explanatory Supplement to the Astronomical Almanac (1992), section 9.3.
    #[must_use]
    pub fn at(altitude_deg: f64) -> Self {
        match altitude_deg {
            _ if altitude_deg >= SUNSET_ALTITUDE_DEG => Self::Day,
            _ if altitude_deg >= -6.0 => Self::CivilTwilight,
            _ if altitude_deg >= -12.0 => Self::NauticalTwilight,
            _ if altitude_deg >= -18.0 => Self::AstronomicalTwilight,
            _ => Self::Night,
        }
    }

    /// The phase in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Day => "day",
            Self::CivilTwilight => "civil twilight",
            Self::NauticalTwilight => "nautical twilight",
            Self::AstronomicalTwilight => "astronomical twilight",
            Self::Night => "night",
        }
    }
}

/// The light on level ground at some altitude of the star, above or below the horizon.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Twilight {
    /// The phase of the day.
    pub phase: DayPhase,
    /// Illuminance of level ground by the star, lx; `None` at night.
    pub illuminance_lx: Option<f64>,
    /// Set under a star or sky unlike the Sun's on Earth.
    pub caution: Caution,
}

/// log₁₀ of the Sun's illuminance, lx, as cubics in altitude/90°: lowest altitude in degrees, then coefficients.
const SUNLIGHT: [[f64; 5]; 6] = [
    [20.0, 3.74, 3.97, -4.07, 1.47],
    [5.0, 3.05, 13.28, -45.98, 64.33],
    [-0.8, 2.88, 22.26, -207.64, 1034.30],
    [-5.0, 2.88, 21.81, -258.11, -858.36],
    [-12.0, 2.70, 12.17, -431.69, -1899.83],
    [-18.0, 13.84, 262.72, 1447.42, 2797.93],
];

/// Illuminance of level ground through day and twilight, measured under the Sun and scaled to another star.
///
/// # Source
/// Janiczek & `DeYoung` (1987), US Naval Observatory Circular 171 (clear sky at sea level, within 0.02 in log₁₀),
/// times illuminance above the air over the Sun's 133 100 lx.
///
/// # Valid for
/// The Earth's air and radius and a star of the Sun's colour. For another star or another air it tells the order
/// of magnitude, since twilight is scattered light and its depth follows the height of the air.
///
/// # Errors
/// [`OutOfRange`] for an altitude outside −90 to 90° or an illuminance outside 0 to 10⁶⁰ lx.
///
/// # Example
/// ```
/// use longember::physics::light::{SUN_ILLUMINANCE_LX, twilight};
/// let end_of_civil = twilight(-6.0, SUN_ILLUMINANCE_LX)?;
/// assert!((end_of_civil.illuminance_lx.unwrap() - 3.4).abs() < 0.1);
/// # Ok::<(), longember::physics::light::OutOfRange>(())
/// ```
pub fn twilight(altitude_deg: f64, illuminance_above_air_lx: f64) -> Result<Twilight, OutOfRange> {
    let altitude_deg = within("altitude_deg", altitude_deg, -90.0, 90.0, "-90 to 90 deg")?;
    let scale = amount("illuminance_above_air_lx", illuminance_above_air_lx)? / SUN_ILLUMINANCE_LX;
    let illuminance_lx = SUNLIGHT.iter().find(|row| altitude_deg >= row[0]).map(|[_, a, b, c, d]| {
        let x = altitude_deg / 90.0;
        scale * 10.0_f64.powf(a + x * (b + x * (c + x * d)))
    });
    Ok(Twilight { phase: DayPhase::at(altitude_deg), illuminance_lx, caution: Caution::OrderOfMagnitude })
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn it_grows_darker_all_the_way_down() {
        let mut last_lx = f64::INFINITY;
        for step in 0..=1080 {
            let altitude_deg = 90.0 - 0.1 * f64::from(step);
            let lux = twilight(altitude_deg.max(-18.0), 1e5).expect("in range").illuminance_lx.expect("light");
            // The pieces of the published fit meet within its accuracy of 0.02 in the logarithm.
            assert!(lux < last_lx * 1.05, "{altitude_deg}: {lux} after {last_lx}");
            last_lx = lux;
        }
        assert_eq!(twilight(-18.1, 1e5).expect("in range").illuminance_lx, None);
    }

    #[test]
    fn phases_follow_the_altitude() {
        let names: Vec<_> = [10.0, -0.8, -3.0, -9.0, -15.0, -40.0, f64::NAN].map(|deg| DayPhase::at(deg).name()).into();
        assert_eq!(
            names,
            ["day", "day", "civil twilight", "nautical twilight", "astronomical twilight", "night", "night"]
        );
    }
}
