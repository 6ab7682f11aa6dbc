//! The star's disc in the sky of one of its planets.

use super::range::{OutOfRange, within};
use crate::units::constants::SOLAR_RADIUS_AU;
use std::f64::consts::PI;

/// The disc as it stands in the sky.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Disc {
    /// Apparent diameter, degrees.
    pub diameter_deg: f64,
    /// Solid angle, sr.
    pub solid_angle_sr: f64,
    /// Diameter over that of the Sun seen from one au (0.533°).
    pub diameter_over_sun: f64,
}

/// The apparent size of a star from a distance to its centre.
///
/// Diameter 2 arcsin(R/d); solid angle 2π(1 − cos).
///
/// # Source
/// Geometry of a sphere. The Sun from 1 au is 0.533° wide.
///
/// # Errors
/// [`OutOfRange`] for a radius outside 10⁻⁹ to 10⁶ R☉, or a distance that does not lie outside the star or
/// exceeds 10¹² au.
///
/// # Example
/// ```
/// use longember::physics::light::disc;
/// assert!((disc(1.0, 1.0)?.diameter_deg - 0.533).abs() < 1e-3);
/// # Ok::<(), longember::physics::light::OutOfRange>(())
/// ```
pub fn disc(radius_rsun: f64, distance_au: f64) -> Result<Disc, OutOfRange> {
    let radius_au = within("radius_rsun", radius_rsun, 1e-9, 1e6, "1e-9 to 1e6 Rsun")? * SOLAR_RADIUS_AU;
    let distance_au = within("distance_au", distance_au, radius_au, 1e12, "outside the star, up to 1e12 au")?;
    let half_rad = (radius_au / distance_au).clamp(0.0, 1.0).asin();
    let half_of_half_sine = (half_rad / 2.0).sin();
    Ok(Disc {
        diameter_deg: 2.0 * half_rad.to_degrees(),
        solid_angle_sr: 4.0 * PI * half_of_half_sine * half_of_half_sine,
        diameter_over_sun: half_rad / SOLAR_RADIUS_AU.asin(),
    })
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_star_that_touches_fills_half_the_sky() {
        let touching = disc(1.0, SOLAR_RADIUS_AU).expect("at the surface");
        assert!((touching.diameter_deg - 180.0).abs() < 1e-4);
        assert!((touching.solid_angle_sr / (2.0 * PI) - 1.0).abs() < 1e-6);
        assert!(disc(300.0, 1.0).is_err());
    }

    #[test]
    fn a_small_disc_keeps_its_digits() {
        let tiny = disc(0.01, 1e6).expect("in range");
        let expected_sr = PI * (0.01 * SOLAR_RADIUS_AU / 1e6).powi(2);
        assert!((tiny.solid_angle_sr / expected_sr - 1.0).abs() < 1e-12);
    }
}
