//! The tide in a giant's convective envelope, which draws planets in.

use super::super::range::{OutOfRange, non_negative, positive};
use super::equilibrium_tide::TidalPair;
use super::law::GiantDrag;
use crate::units::constants::{
    EARTH_MASSES_PER_SOLAR_MASS, SOLAR_LUMINOSITY_W, SOLAR_MASS_KG, SOLAR_RADIUS_AU, SOLAR_RADIUS_M, YEAR_S,
};
use std::f64::consts::PI;

/// Apsidal constant of a deeply convective giant. Schröder & Smith 2008 (recalled).
const ZAHN_LAMBDA: f64 = 0.038;
/// Factor before the reduction for slow eddies. Mustill & Villaver 2012.
const FREQUENCY_FACTOR: f64 = 4.5;

/// The relative rate at which a giant's envelope draws a planet in, (da/dt)/a, yr⁻¹; zero or negative.
///
/// Zahn: `−12 λ₂/t_f (m/M)(R/a)⁸`, `t_f = (M R²/L)^⅓`, λ₂ = 0.038.
/// Frequency-limited: `−(2f/9t)(M_env/M)(m/M)(1 + m/M)(R/a)⁸`, `t = (M_env R²/3L)^⅓`, f = 4.5 min(1, (π/n t)²).
///
/// # Source
/// Schröder & Smith 2008, MNRAS 386, 155, after Zahn 1989 (recalled); Mustill & Villaver 2012, `ApJ` 761, 121.
/// # Valid for
/// Circular orbits round a giant that does not rotate.
/// # Accuracy
/// Order of magnitude; the two forms put the closest survivor of the Sun's giant phase at 1.1 and 1.2 au.
/// # Errors
/// [`OutOfRange`] for values that describe no star, planet or closed orbit.
pub fn axis_rate_per_yr(
    pair: &TidalPair,
    luminosity_lsun: f64,
    envelope_mass_msun: f64,
    drag: GiantDrag,
) -> Result<f64, OutOfRange> {
    pair.check()?;
    let l = non_negative("luminosity_lsun", luminosity_lsun)?;
    let envelope = non_negative("envelope_mass_msun", envelope_mass_msun)?;
    positive("star_mass_msun", pair.star_mass_msun - envelope + 1e-9)?;
    Ok(rate_per_yr(pair, l, envelope, drag))
}

/// [`axis_rate_per_yr`] for checked input.
pub(crate) fn rate_per_yr(pair: &TidalPair, luminosity_lsun: f64, envelope_mass_msun: f64, drag: GiantDrag) -> f64 {
    if luminosity_lsun <= 0.0 || envelope_mass_msun <= 0.0 {
        return 0.0;
    }
    let mass_ratio = pair.planet_mass_mearth / (pair.star_mass_msun * EARTH_MASSES_PER_SOLAR_MASS);
    let reach = (pair.star_radius_rsun * SOLAR_RADIUS_AU / pair.semi_major_axis_au).powi(8);
    let r_m = pair.star_radius_rsun * SOLAR_RADIUS_M;
    // Time in which the luminosity could carry away the kinetic energy of the eddies, s.
    let turnover_s =
        |mass_msun: f64| (mass_msun * SOLAR_MASS_KG * r_m * r_m / (luminosity_lsun * SOLAR_LUMINOSITY_W)).cbrt();
    let per_s = match drag {
        GiantDrag::Off => 0.0,
        GiantDrag::Zahn => 12.0 * ZAHN_LAMBDA / turnover_s(pair.star_mass_msun) * mass_ratio * reach,
        GiantDrag::FrequencyLimited => {
            let t = turnover_s(envelope_mass_msun / 3.0);
            let slow = (PI / (pair.mean_motion_per_s() * t)).powi(2).min(1.0);
            2.0 * FREQUENCY_FACTOR * slow / (9.0 * t)
                * (envelope_mass_msun / pair.star_mass_msun)
                * mass_ratio
                * (1.0 + mass_ratio)
                * reach
        }
    };
    -per_s * YEAR_S
}
