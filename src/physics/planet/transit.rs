//! What an observer sees of star and planet together: transits and the star's disc in the planet's sky.

use super::range::{OutOfRange, positive};
use crate::units::constants::{AU_M, EARTH_RADIUS_M, SOLAR_RADIUS_AU, SOLAR_RADIUS_M, YEAR_S};
use std::f64::consts::PI;

/// The share of starlight a planet blocks in transit, dimensionless: `(R_p/R★)²`, at most 1.
///
/// # Source
/// Geometry; limb darkening ignored.
/// # Errors
/// [`OutOfRange`] for radii that are not positive.
pub fn transit_depth(planet_radius_rearth: f64, star_radius_rsun: f64) -> Result<f64, OutOfRange> {
    let planet_m = positive("planet_radius_rearth", planet_radius_rearth)? * EARTH_RADIUS_M;
    let star_m = positive("star_radius_rsun", star_radius_rsun)? * SOLAR_RADIUS_M;
    Ok((planet_m / star_m).powi(2).min(1.0))
}

/// The chance that a randomly turned circular orbit shows transits, dimensionless: R★/a, at most 1.
///
/// # Source
/// Geometry; circular orbit, small planet.
/// # Errors
/// [`OutOfRange`] for values that are not positive.
pub fn transit_probability(star_radius_rsun: f64, semi_major_axis_au: f64) -> Result<f64, OutOfRange> {
    let star_au = positive("star_radius_rsun", star_radius_rsun)? * SOLAR_RADIUS_AU;
    Ok((star_au / positive("semi_major_axis_au", semi_major_axis_au)?).min(1.0))
}

/// How long a central transit takes, s: P R★/(π a), from mid-entry to mid-exit.
///
/// # Source
/// Geometry; circular orbit, planet small against the star, star small against the orbit.
/// # Errors
/// [`OutOfRange`] for values that are not positive or an orbit inside the star.
pub fn transit_duration_s(period_yr: f64, star_radius_rsun: f64, semi_major_axis_au: f64) -> Result<f64, OutOfRange> {
    let ratio = transit_probability(star_radius_rsun, semi_major_axis_au)?;
    Ok(positive("period_yr", period_yr)? * YEAR_S * ratio / PI)
}

/// The diameter of the star's disc in the planet's sky, degrees: 2 asin(R★/d); 180 at the surface and below.
///
/// # Source
/// Geometry of a sphere.
/// # Errors
/// [`OutOfRange`] for values that are not positive.
///
/// # Example
/// ```
/// use longember::physics::planet::transit::angular_diameter_deg;
/// let sun_deg = angular_diameter_deg(1.0, 1.0).unwrap();
/// assert!((sun_deg * 60.0 - 31.97).abs() < 0.02);
/// ```
pub fn angular_diameter_deg(star_radius_rsun: f64, distance_au: f64) -> Result<f64, OutOfRange> {
    let star_m = positive("star_radius_rsun", star_radius_rsun)? * SOLAR_RADIUS_M;
    let distance_m = positive("distance_au", distance_au)? * AU_M;
    Ok((2.0 * (star_m / distance_m).min(1.0).asin()).to_degrees())
}
