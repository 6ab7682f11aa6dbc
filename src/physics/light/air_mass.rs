//! How much more air a slanting ray crosses than an upright one.

use super::range::{OutOfRange, within};

/// Relative optical air mass towards a star at an apparent altitude: 1 overhead, 38 at the horizon.
///
/// X = 1/(sin h + 0.50572 (h + 6.07995°)^−1.6364), never below 1.
///
/// # Source
/// Kasten & Young (1989), Applied Optics 28, 4735, table of coefficients on page 4737.
///
/// # Valid for
/// The Earth. Above 10° of altitude it is close to 1/sin h for any planet; closer to the horizon it holds the
/// Earth's radius and scale height.
///
/// # Errors
/// [`OutOfRange`] for an altitude outside 0 to 90°.
///
/// # Example
/// ```
/// use longember::physics::light::air_mass;
/// assert!((air_mass(30.0)? - 1.994).abs() < 1e-3);
/// # Ok::<(), longember::physics::light::OutOfRange>(())
/// ```
pub fn air_mass(altitude_deg: f64) -> Result<f64, OutOfRange> {
    let altitude_deg = within("altitude_deg", altitude_deg, 0.0, 90.0, "0 to 90 deg")?;
    let sine = altitude_deg.to_radians().sin();
    Ok((1.0 / (sine + 0.50572 * (altitude_deg + 6.07995).powf(-1.6364))).max(1.0))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn published_air_masses_are_met() {
        // Kasten & Young (1989), table: zenith distance 60, 80, 85, 90 deg.
        for (altitude_deg, expected) in [(30.0, 1.994), (10.0, 5.586), (5.0, 10.31), (0.0, 37.92)] {
            let found = air_mass(altitude_deg).expect("in range");
            assert!((found / expected - 1.0).abs() < 1e-3, "{altitude_deg}: {found}");
        }
        assert_eq!(air_mass(90.0), Ok(1.0));
        assert!(air_mass(-0.1).is_err());
    }
}
