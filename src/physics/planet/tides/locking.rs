//! When a planet's day becomes as long as its year.

use super::super::range::{OutOfRange, positive, within};
use crate::units::constants::{AU_M, EARTH_GM_M3_S2, EARTH_RADIUS_M, GRAVITATION_M3_KG_S2, SOLAR_GM_M3_S2, YEAR_S};
use std::f64::consts::TAU;

/// Eccentricity above which a planet rather settles in a 3:2 or similar resonance, as Mercury did (recalled).
pub const RESONANCE_ECCENTRICITY: f64 = 0.1;

/// What is known of a planet's rotation and how it dissipates.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Spin {
    /// Length of the day when the walk starts, h.
    pub initial_day_h: f64,
    /// Moment of inertia over m R², dimensionless; 0.33 for the Earth, 0.4 for a uniform sphere.
    pub inertia_factor: f64,
    /// Love number k₂, dimensionless; about 0.3 for the Earth.
    pub love_number: f64,
    /// Quality factor Q of a strongly dissipating planet, dimensionless; 12 for the Earth with its oceans.
    pub quality_low: f64,
    /// Quality factor Q of a weakly dissipating planet, dimensionless; 100 for dry rock.
    pub quality_high: f64,
}

impl Spin {
    /// Usual values for a planet of a mass: rocky below 10 Earth masses, gaseous above (our own choice).
    ///
    /// # Source
    /// Rock: Kasting, Whitmire & Reynolds 1993, Barnes 2017 (Q 12 to 100); giants: Goldreich & Soter 1966 (recalled).
    #[must_use]
    pub fn usual(planet_mass_mearth: f64) -> Self {
        if planet_mass_mearth > 10.0 {
            Self { initial_day_h: 10.0, inertia_factor: 0.25, love_number: 0.4, quality_low: 1e4, quality_high: 1e6 }
        } else {
            Self { initial_day_h: 24.0, inertia_factor: 0.33, love_number: 0.3, quality_low: 12.0, quality_high: 100.0 }
        }
    }

    /// Checks every field.
    ///
    /// # Errors
    /// [`OutOfRange`] naming the first field that cannot be used.
    pub fn check(&self) -> Result<(), OutOfRange> {
        within("initial_day_h", self.initial_day_h, 1.0, 1e6, "1 to 1e6 h")?;
        within("inertia_factor", self.inertia_factor, 0.01, 0.67, "0.01 to 0.67")?;
        within("love_number", self.love_number, 1e-4, 1.5, "0.0001 to 1.5")?;
        within("quality_low", self.quality_low, 1.0, 1e9, "1 to 1e9")?;
        within("quality_high", self.quality_high, self.quality_low, 1e9, "quality_low to 1e9")?;
        Ok(())
    }
}

/// How sure it is that a planet keeps one face to its star.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash, PartialOrd, Ord)]
pub enum LockLevel {
    /// Even strong dissipation has not had the time.
    #[default]
    Free,
    /// Strong dissipation has had the time, weak has not.
    Probable,
    /// Even weak dissipation has had the time.
    Locked,
}

impl LockLevel {
    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::Free => "free",
            Self::Probable => "probable",
            Self::Locked => "locked",
        }
    }

    /// The level in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Free => "turns freely",
            Self::Probable => "probably locked",
            Self::Locked => "locked to the star",
        }
    }
}

/// The time a planet takes to lock on an orbit that stays as it is, yr:
/// `t = |ω₀ − n| a⁶ α m R² Q / (3 G M² k₂ R⁵)`.
///
/// # Source
/// Gladman et al. 1996, Icarus 122, 166, after Peale 1977 (recalled).
/// # Valid for
/// Circular orbits; air can prevent locking (Leconte et al. 2015), eccentricity leads to a resonance instead.
/// # Accuracy
/// Order of magnitude: Q, k₂ and the first day are each uncertain by several.
/// # Errors
/// [`OutOfRange`] for values that describe no star, planet or orbit.
pub fn locking_time_yr(
    spin: &Spin,
    quality: f64,
    semi_major_axis_au: f64,
    star_mass_msun: f64,
    planet_mass_mearth: f64,
    planet_radius_rearth: f64,
) -> Result<f64, OutOfRange> {
    spin.check()?;
    let q = positive("quality", quality)?;
    let a = positive("semi_major_axis_au", semi_major_axis_au)?;
    let mass = positive("star_mass_msun", star_mass_msun)?;
    let m = positive("planet_mass_mearth", planet_mass_mearth)?;
    let r = positive("planet_radius_rearth", planet_radius_rearth)?;
    let torque_per_s2 = unit_braking_per_s2(spin, a, mass, m, r);
    let n = mean_motion_per_s(a, mass);
    Ok((initial_spin_per_s(spin) - n).abs() * q / torque_per_s2 / YEAR_S)
}

/// Rotation of the planet at the start of the walk, rad s⁻¹.
pub(crate) fn initial_spin_per_s(spin: &Spin) -> f64 {
    TAU / (spin.initial_day_h * 3600.0)
}

/// Mean motion of a light planet, rad s⁻¹.
pub(crate) fn mean_motion_per_s(semi_major_axis_au: f64, star_mass_msun: f64) -> f64 {
    let a_m = semi_major_axis_au * AU_M;
    (SOLAR_GM_M3_S2 * star_mass_msun / a_m).sqrt() / a_m
}

/// Rate at which rotation slows for Q = 1, rad s⁻²: 3 G M² k₂ R³ / (α m a⁶).
pub(crate) fn unit_braking_per_s2(
    spin: &Spin,
    semi_major_axis_au: f64,
    star_mass_msun: f64,
    planet_mass_mearth: f64,
    planet_radius_rearth: f64,
) -> f64 {
    let gm_star = SOLAR_GM_M3_S2 * star_mass_msun;
    let gm_planet = EARTH_GM_M3_S2 * planet_mass_mearth;
    let r_m = planet_radius_rearth * EARTH_RADIUS_M;
    let a_m = semi_major_axis_au * AU_M;
    // G cancels: G M²/m = (G M)²/(G m); the ratio of lengths is formed first so that nothing overflows.
    3.0 * spin.love_number * (gm_star / a_m) * (gm_star / a_m) * (r_m / a_m).powi(3)
        / (spin.inertia_factor * gm_planet * a_m)
}

/// The distance within which a planet locks in a given time, au: `0.027 (P₀ t/Q)^(1/6) M^(1/3)` in cm, g, s.
///
/// # Source
/// Kasting, Whitmire & Reynolds 1993, Icarus 101, 108 (recalled).
/// # Valid for
/// Planets like the Earth.
/// # Errors
/// [`OutOfRange`] for values that are not positive.
pub fn lock_radius_au(initial_day_h: f64, time_yr: f64, quality: f64, star_mass_msun: f64) -> Result<f64, OutOfRange> {
    let p_s = positive("initial_day_h", initial_day_h)? * 3600.0;
    let t_s = positive("time_yr", time_yr)? * YEAR_S;
    let m_g = positive("star_mass_msun", star_mass_msun)? * SOLAR_GM_M3_S2 / GRAVITATION_M3_KG_S2 * 1000.0;
    let radius_cm = 0.027 * (p_s * t_s / positive("quality", quality)?).powf(1.0 / 6.0) * m_g.cbrt();
    Ok(radius_cm / 100.0 / AU_M)
}
