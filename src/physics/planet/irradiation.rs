//! Starlight received and the temperature it sustains.

use super::range::{OutOfRange, closed_eccentricity, fraction, non_negative, positive, within};
use crate::units::constants::{SOLAR_CONSTANT_W_M2, STEFAN_BOLTZMANN_W_M2_K4};
use std::f64::consts::PI;

/// How absorbed starlight spreads before it is radiated away.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
pub enum Redistribution {
    /// Evenly over the whole planet, f = 1/4: air, oceans or fast rotation.
    #[default]
    WholePlanet,
    /// Evenly over the day side only, f = 1/2.
    DaySide,
    /// No transport, seen with the day side full, f = 2/3.
    DaySideFullPhase,
    /// The point with the star overhead, no transport, f = 1.
    SubStellar,
}

impl Redistribution {
    /// Every choice, coolest first.
    pub const ALL: [Self; 4] = [Self::WholePlanet, Self::DaySide, Self::DaySideFullPhase, Self::SubStellar];

    /// The factor f in σ T⁴ = f (1 − A) S.
    #[must_use]
    pub fn factor(self) -> f64 {
        match self {
            Self::WholePlanet => 0.25,
            Self::DaySide => 0.5,
            Self::DaySideFullPhase => 2.0 / 3.0,
            Self::SubStellar => 1.0,
        }
    }

    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::WholePlanet => "whole_planet",
            Self::DaySide => "day_side",
            Self::DaySideFullPhase => "day_side_full_phase",
            Self::SubStellar => "sub_stellar",
        }
    }

    /// The choice in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::WholePlanet => "whole planet",
            Self::DaySide => "day side only",
            Self::DaySideFullPhase => "day side seen full",
            Self::SubStellar => "sub-stellar point",
        }
    }
}

/// The flux at a distance from a star, W m⁻²: S = L / (4π d²).
///
/// # Source
/// Inverse-square law with the nominal solar values of IAU 2015 Resolution B3.
/// # Valid for
/// Any luminosity and distance well outside the star.
/// # Accuracy
/// Exact; 1361.17 W m⁻² for 1 L☉ at 1 au.
/// # Errors
/// [`OutOfRange`] for a negative luminosity or a distance that is not positive.
///
/// # Example
/// ```
/// use longember::physics::planet::irradiation::flux_w_m2;
/// assert!((flux_w_m2(1.0, 1.0).unwrap() - 1361.17).abs() < 0.01);
/// ```
pub fn flux_w_m2(luminosity_lsun: f64, distance_au: f64) -> Result<f64, OutOfRange> {
    Ok(insolation_earth(luminosity_lsun, distance_au)? * SOLAR_CONSTANT_W_M2)
}

/// The flux at a distance from a star in units of the flux of 1 L☉ at 1 au (1361.17 W m⁻²).
///
/// # Source
/// Inverse-square law.
/// # Errors
/// [`OutOfRange`] for a negative luminosity or a distance that is not positive.
pub fn insolation_earth(luminosity_lsun: f64, distance_au: f64) -> Result<f64, OutOfRange> {
    let l = non_negative("luminosity_lsun", luminosity_lsun)?;
    let d = positive("distance_au", distance_au)?;
    Ok(l / (d * d))
}

/// The flux averaged over time along an eccentric orbit, units of 1361.17 W m⁻²:
/// ⟨S⟩ = S(a) / √(1 − e²).
///
/// # Source
/// Exact integral of the inverse square over a Kepler orbit.
/// # Errors
/// [`OutOfRange`] for values that describe no closed orbit.
pub fn orbit_mean_insolation_earth(
    luminosity_lsun: f64,
    semi_major_axis_au: f64,
    eccentricity: f64,
) -> Result<f64, OutOfRange> {
    let e = closed_eccentricity(eccentricity)?;
    let a = positive("semi_major_axis_au", semi_major_axis_au)?;
    Ok(insolation_earth(luminosity_lsun, a)? / (1.0 - e * e).sqrt())
}

/// The flux at the nearest and the farthest point of an orbit, units of 1361.17 W m⁻²: S(a) / (1 ∓ e)².
///
/// # Source
/// Inverse-square law.
/// # Errors
/// [`OutOfRange`] for values that describe no closed orbit.
pub fn extreme_insolation_earth(
    luminosity_lsun: f64,
    semi_major_axis_au: f64,
    eccentricity: f64,
) -> Result<ExtremeInsolation, OutOfRange> {
    let e = closed_eccentricity(eccentricity)?;
    let a = positive("semi_major_axis_au", semi_major_axis_au)?;
    let s = insolation_earth(luminosity_lsun, a)?;
    Ok(ExtremeInsolation {
        periastron_insolation_earth: s / (1.0 - e).powi(2),
        apastron_insolation_earth: s / (1.0 + e).powi(2),
    })
}

/// The brightest and the faintest starlight along one orbit.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct ExtremeInsolation {
    /// Flux at the nearest point, units of 1361.17 W m⁻².
    pub periastron_insolation_earth: f64,
    /// Flux at the farthest point, units of 1361.17 W m⁻².
    pub apastron_insolation_earth: f64,
}

/// The temperature at which a planet radiates what it absorbs, K: T = [f (1 − A) S / (ε σ)]^¼.
///
/// `redistribution_factor` is f, see [`Redistribution::factor`].
///
/// # Source
/// Energy balance with the Stefan–Boltzmann law; reproduces published fact-sheet values to 0.2 K.
/// # Valid for
/// Any flux; the Bond albedo is a property of planet and star's colour together.
/// # Accuracy
/// Exact for a uniformly radiating surface; 1 % in the albedo term moves T by 0.25 %.
/// # Errors
/// [`OutOfRange`] for an albedo or factor outside 0 to 1, an emissivity outside 0.01 to 1, a negative flux.
pub fn equilibrium_temperature_k(
    mean_flux_w_m2: f64,
    bond_albedo: f64,
    redistribution_factor: f64,
    emissivity: f64,
) -> Result<f64, OutOfRange> {
    let s = non_negative("mean_flux_w_m2", mean_flux_w_m2)?;
    let albedo = fraction("bond_albedo", bond_albedo)?;
    let f = within("redistribution_factor", redistribution_factor, 0.01, 1.0, "0.01 to 1")?;
    let eps = checked_emissivity(emissivity)?;
    Ok((f * (1.0 - albedo) * s / (eps * STEFAN_BOLTZMANN_W_M2_K4)).powf(0.25))
}

/// Passes an infrared emissivity on; below 0.01 nothing of ours radiates.
pub(crate) fn checked_emissivity(emissivity: f64) -> Result<f64, OutOfRange> {
    within("emissivity", emissivity, 0.01, 1.0, "0.01 to 1")
}

/// Temperatures of the two faces of a planet, K.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct DayNight {
    /// Mean emission temperature of the day side, K.
    pub day_k: f64,
    /// Mean emission temperature of the night side, K.
    pub night_k: f64,
}

/// Day and night temperatures for a given strength of heat transport, K.
///
/// `T_day⁴ = T₀⁴ (1 − A)(2/3 − 5E/12)`, `T_night⁴ = T₀⁴ (1 − A) E/4`, `T₀⁴ = S/σ`, E from 0 (none) to 1 (complete).
///
/// # Source
/// Cowan & Agol 2011, `ApJ` 729, 54, equations 4 and 5 (recalled).
/// # Accuracy
/// A two-number description: the faces are not uniform.
/// # Errors
/// [`OutOfRange`] for an albedo or efficiency outside 0 to 1 or a negative flux.
pub fn day_night_k(flux_w_m2: f64, bond_albedo: f64, transport_efficiency: f64) -> Result<DayNight, OutOfRange> {
    let s = non_negative("flux_w_m2", flux_w_m2)?;
    let absorbed = 1.0 - fraction("bond_albedo", bond_albedo)?;
    let e = fraction("transport_efficiency", transport_efficiency)?;
    let t0_4 = s / STEFAN_BOLTZMANN_W_M2_K4;
    Ok(DayNight {
        day_k: (t0_4 * absorbed * (2.0 / 3.0 - 5.0 * e / 12.0)).powf(0.25),
        night_k: (t0_4 * absorbed * e / 4.0).powf(0.25),
    })
}

/// The time average of the temperature along an eccentric orbit for a body without heat storage, K.
///
/// T(a, e = 0) · (2 √(1+e) / π) · E(m = 2e/(1+e)), E the complete elliptic integral of the second kind.
/// It falls with eccentricity, while the flux average rises: airless bodies only.
///
/// # Source
/// Méndez & Rivera-Valentín 2017, `ApJL` 837, L1.
/// # Accuracy
/// Exact for a body that answers at once; checked here against direct integration over the orbit.
/// # Errors
/// [`OutOfRange`] as for [`equilibrium_temperature_k`] and for a parabolic orbit.
pub fn time_mean_temperature_k(
    flux_at_semi_major_axis_w_m2: f64,
    bond_albedo: f64,
    redistribution_factor: f64,
    emissivity: f64,
    eccentricity: f64,
) -> Result<f64, OutOfRange> {
    let e = closed_eccentricity(eccentricity)?;
    let circular_k =
        equilibrium_temperature_k(flux_at_semi_major_axis_w_m2, bond_albedo, redistribution_factor, emissivity)?;
    Ok(circular_k * 2.0 * (1.0 + e).sqrt() / PI * complete_elliptic_e(2.0 * e / (1.0 + e)))
}

/// The complete elliptic integral of the second kind for a parameter m from 0 to 1,
/// by the arithmetic–geometric mean (Abramowitz & Stegun 17.6): exact to rounding in six steps.
fn complete_elliptic_e(m: f64) -> f64 {
    let (mut a, mut b, mut c) = (1.0_f64, (1.0 - m).sqrt(), m.sqrt());
    let (mut sum, mut power) = (0.5 * c * c, 0.5);
    for _ in 0..12 {
        (a, b, c) = (0.5 * (a + b), (a * b).sqrt(), 0.5 * (a - b));
        power *= 2.0;
        sum += power * c * c;
        if c.abs() < 1e-16 {
            break;
        }
    }
    PI / (2.0 * a) * (1.0 - sum)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn elliptic_integral_reproduces_tabulated_values() {
        // Abramowitz & Stegun, table 17.1.
        assert!((complete_elliptic_e(0.0) - PI / 2.0).abs() < 1e-14);
        assert!((complete_elliptic_e(0.5) - 1.350_643_881_047_675_5).abs() < 1e-13);
        assert!((complete_elliptic_e(0.9) - 1.104_774_732_704_073_5).abs() < 1e-12);
    }

    #[test]
    fn time_mean_agrees_with_integration_over_the_orbit() {
        for e in [0.0, 0.1, 0.4, 0.8] {
            // dt = (1 - e cos E) dE, T ~ (1 - e cos E)^(-1/2).
            let steps = 4000;
            let mean: f64 = (0..steps)
                .map(|i| (1.0 - e * ((f64::from(i) + 0.5) * 2.0 * PI / f64::from(steps)).cos()).sqrt())
                .sum::<f64>()
                / f64::from(steps);
            let circular = equilibrium_temperature_k(1361.0, 0.3, 0.25, 1.0).expect("in range");
            let closed = time_mean_temperature_k(1361.0, 0.3, 0.25, 1.0, e).expect("in range");
            assert!((closed / circular - mean).abs() < 1e-9, "e = {e}");
        }
    }

    #[test]
    fn complete_transport_makes_both_faces_alike() {
        let faces = day_night_k(1361.0, 0.3, 1.0).expect("in range");
        assert!((faces.day_k - faces.night_k).abs() < 1e-9);
        let bare = day_night_k(1361.0, 0.3, 0.0).expect("in range");
        assert!(bare.night_k.abs() < 1e-12);
    }

    #[test]
    fn impossible_input_is_refused() {
        assert!(flux_w_m2(1.0, 0.0).is_err());
        assert!(flux_w_m2(-1.0, 1.0).is_err());
        assert!(equilibrium_temperature_k(1361.0, 1.1, 0.25, 1.0).is_err());
        assert!(equilibrium_temperature_k(1361.0, 0.3, 0.25, 0.0).is_err());
        assert!(orbit_mean_insolation_earth(1.0, 1.0, 1.0).is_err());
    }
}
