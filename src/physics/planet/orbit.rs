//! Two-body orbits: period, reach, spheres of influence, slow and sudden loss of the star's mass.

use super::range::{LARGEST_ECCENTRICITY, OutOfRange, closed_eccentricity, non_negative, positive};
use crate::units::constants::{AU_M, EARTH_MASSES_PER_SOLAR_MASS, SOLAR_GM_M3_S2, YEAR_S};
use std::f64::consts::TAU;

/// Separation in mutual Hill radii beyond which two planets on circular orbits never meet: 2√3.
///
/// # Source
/// Gladman 1993, Icarus 106, 247 (recalled).
pub const TWO_PLANET_STABILITY: f64 = 3.464_101_615_137_754_6;
/// Separation in mutual Hill radii below which three or more planets seldom last 10⁹ orbits.
///
/// # Source
/// Chambers, Wetherill & Boss 1996, Icarus 119, 261 (recalled).
pub const MANY_PLANET_STABILITY: f64 = 8.0;
/// Mass-loss index above which an orbit no longer widens adiabatically.
///
/// # Source
/// Veras et al. 2011, MNRAS 417, 2104 (recalled).
pub const ADIABATIC_INDEX_LIMIT: f64 = 0.01;

/// The orbital period, yr: P = 2π √(a³ / (G (M + m))).
///
/// # Source
/// Kepler's third law with the nominal solar GM of IAU 2015 Resolution B3.
/// # Accuracy
/// Exact for two bodies.
/// # Errors
/// [`OutOfRange`] for values that are not positive (the planet's mass may be zero).
pub fn period_yr(semi_major_axis_au: f64, star_mass_msun: f64, planet_mass_mearth: f64) -> Result<f64, OutOfRange> {
    let a_m = positive("semi_major_axis_au", semi_major_axis_au)? * AU_M;
    let mass = positive("star_mass_msun", star_mass_msun)?
        + non_negative("planet_mass_mearth", planet_mass_mearth)? / EARTH_MASSES_PER_SOLAR_MASS;
    Ok(TAU * (a_m / (SOLAR_GM_M3_S2 * mass) * a_m * a_m).sqrt() / YEAR_S)
}

/// The semi-major axis after slow mass loss, au: a M stays constant, the eccentricity too.
///
/// # Source
/// Jeans's adiabatic invariant (textbook form).
/// # Valid for
/// Mass loss slow against the period, see [`adiabaticity_index`].
/// # Errors
/// [`OutOfRange`] for values that are not positive.
pub fn widened_au(semi_major_axis_au: f64, mass_before_msun: f64, mass_after_msun: f64) -> Result<f64, OutOfRange> {
    Ok(positive("semi_major_axis_au", semi_major_axis_au)? * positive("mass_before_msun", mass_before_msun)?
        / positive("mass_after_msun", mass_after_msun)?)
}

/// The nearest distance to the star, au: a (1 − e).
///
/// # Errors
/// [`OutOfRange`] for values that describe no closed orbit.
pub fn periastron_au(semi_major_axis_au: f64, eccentricity: f64) -> Result<f64, OutOfRange> {
    Ok(positive("semi_major_axis_au", semi_major_axis_au)? * (1.0 - closed_eccentricity(eccentricity)?))
}

/// The farthest distance from the star, au: a (1 + e).
///
/// # Errors
/// [`OutOfRange`] for values that describe no closed orbit.
pub fn apastron_au(semi_major_axis_au: f64, eccentricity: f64) -> Result<f64, OutOfRange> {
    Ok(positive("semi_major_axis_au", semi_major_axis_au)? * (1.0 + closed_eccentricity(eccentricity)?))
}

/// How fast the star loses mass against the orbit, dimensionless: Ψ = Ṁ a^1.5 M^−1.5 / 2π (M☉ yr⁻¹, au, M☉).
///
/// Below 0.01 ([`ADIABATIC_INDEX_LIMIT`]) the orbit widens as [`widened_au`] says.
///
/// # Source
/// Veras et al. 2011, MNRAS 417, 2104 (recalled).
/// # Errors
/// [`OutOfRange`] for negative values.
pub fn adiabaticity_index(
    mass_loss_msun_yr: f64,
    semi_major_axis_au: f64,
    star_mass_msun: f64,
) -> Result<f64, OutOfRange> {
    let rate = non_negative("mass_loss_msun_yr", mass_loss_msun_yr)?;
    let a = positive("semi_major_axis_au", semi_major_axis_au)?;
    Ok(mass_loss_index(rate, a, positive("star_mass_msun", star_mass_msun)?))
}

/// [`adiabaticity_index`] for checked input.
pub(crate) fn mass_loss_index(mass_loss_msun_yr: f64, semi_major_axis_au: f64, star_mass_msun: f64) -> f64 {
    mass_loss_msun_yr * (semi_major_axis_au / star_mass_msun).powf(1.5) / TAU
}

/// The radius of the sphere in which a planet rules over its star, au: a (1 − e) (m/3M)^⅓.
///
/// # Source
/// Hill sphere; the factor (1 − e) for eccentric orbits: Hamilton & Burns 1992 (recalled).
/// # Errors
/// [`OutOfRange`] for values that are not positive.
pub fn hill_radius_au(
    semi_major_axis_au: f64,
    eccentricity: f64,
    planet_mass_mearth: f64,
    star_mass_msun: f64,
) -> Result<f64, OutOfRange> {
    let ratio = positive("planet_mass_mearth", planet_mass_mearth)?
        / (EARTH_MASSES_PER_SOLAR_MASS * positive("star_mass_msun", star_mass_msun)?);
    Ok(periastron_au(semi_major_axis_au, eccentricity)? * (ratio / 3.0).cbrt())
}

/// One planet's orbit and mass, for separations between neighbours.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Neighbour {
    /// Semi-major axis, au.
    pub semi_major_axis_au: f64,
    /// Eccentricity, dimensionless.
    pub eccentricity: f64,
    /// Mass, Earth masses.
    pub mass_mearth: f64,
}

/// The separation of two neighbours in mutual Hill radii, dimensionless; negative when the orbits cross.
///
/// K = [a₂ (1 − e₂) − a₁ (1 + e₁)] / R, R = ((m₁ + m₂)/3M)^⅓ (a₁ + a₂)/2. Compare with
/// [`TWO_PLANET_STABILITY`] and [`MANY_PLANET_STABILITY`]; K falls as M^⅓ when the star loses mass.
///
/// # Source
/// Gladman 1993; Chambers, Wetherill & Boss 1996 (recalled); the gap of eccentric orbits is our own choice.
/// # Errors
/// [`OutOfRange`] for values that are not positive or orbits that are not closed.
pub fn hill_separation(first: Neighbour, second: Neighbour, star_mass_msun: f64) -> Result<f64, OutOfRange> {
    let star = positive("star_mass_msun", star_mass_msun)? * EARTH_MASSES_PER_SOLAR_MASS;
    let (inner, outer) =
        if first.semi_major_axis_au <= second.semi_major_axis_au { (first, second) } else { (second, first) };
    let masses = positive("mass_mearth", inner.mass_mearth)? + positive("mass_mearth", outer.mass_mearth)?;
    let gap_au = periastron_au(outer.semi_major_axis_au, outer.eccentricity)?
        - apastron_au(inner.semi_major_axis_au, inner.eccentricity)?;
    let hill_au = (masses / (3.0 * star)).cbrt() * 0.5 * (inner.semi_major_axis_au + outer.semi_major_axis_au);
    Ok(gap_au / hill_au)
}

/// How a body holds together against tides.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Cohesion {
    /// A liquid or a heap of rubble, factor 2.44.
    Fluid,
    /// One solid block that does not deform, factor 1.26.
    Rigid,
}

impl Cohesion {
    /// The factor k of the Roche limit, dimensionless.
    #[must_use]
    pub fn factor(self) -> f64 {
        match self {
            Self::Fluid => 2.44,
            Self::Rigid => 1.26,
        }
    }
}

/// The distance inside which the star tears a planet apart, solar radii: d = k R (ρ★/ρ)^⅓, k = 2.44 or 1.26.
///
/// Below one stellar radius the planet reaches the star whole.
///
/// # Source
/// Roche limit (textbook factors 2.44 for a fluid, 1.26 for a rigid body).
/// # Errors
/// [`OutOfRange`] for values that are not positive.
pub fn roche_limit_rsun(
    star_radius_rsun: f64,
    star_density_kg_m3: f64,
    planet_density_kg_m3: f64,
    cohesion: Cohesion,
) -> Result<f64, OutOfRange> {
    let factor = cohesion.factor();
    let ratio =
        positive("star_density_kg_m3", star_density_kg_m3)? / positive("planet_density_kg_m3", planet_density_kg_m3)?;
    Ok(factor * positive("star_radius_rsun", star_radius_rsun)? * ratio.cbrt())
}

/// What sudden mass loss leaves of an orbit.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum AfterSuddenLoss {
    /// The planet stays, on a wider and rounder or longer orbit.
    Bound {
        /// New semi-major axis, au.
        semi_major_axis_au: f64,
        /// New eccentricity, dimensionless.
        eccentricity: f64,
    },
    /// The planet is set free: half the mass or more was lost.
    Unbound,
}

/// The orbit after the star lost mass within much less than a period (a supernova).
///
/// With β = `M_before/M_after`: 1/a' = (2 − β)/a and 1 − e'² = β (2 − β)(1 − e²), taken at the distance r = a,
/// where an orbit spends its mean time; a circular orbit has no other distance. Bound only while β < 2.
///
/// # Source
/// Blaauw 1961 (recalled): conservation of position and velocity. Exact for circular orbits without a kick.
/// # Valid for
/// No kick to the remnant; an eccentric orbit keeps or loses its planet by where it happens to be.
/// # Errors
/// [`OutOfRange`] for values that describe no closed orbit.
pub fn after_sudden_loss(
    semi_major_axis_au: f64,
    eccentricity: f64,
    mass_before_msun: f64,
    mass_after_msun: f64,
) -> Result<AfterSuddenLoss, OutOfRange> {
    let a = positive("semi_major_axis_au", semi_major_axis_au)?;
    let e = closed_eccentricity(eccentricity)?;
    let before = positive("mass_before_msun", mass_before_msun)?;
    let after = non_negative("mass_after_msun", mass_after_msun)?;
    Ok(sudden_loss(a, e, before, after))
}

/// [`after_sudden_loss`] for checked input.
pub(crate) fn sudden_loss(a: f64, e: f64, before: f64, after: f64) -> AfterSuddenLoss {
    if after <= 0.5 * before {
        return AfterSuddenLoss::Unbound;
    }
    let beta = (before / after).max(1.0);
    let new_a = a / (2.0 - beta);
    let new_e = (1.0 - beta * (2.0 - beta) * (1.0 - e * e)).max(0.0).sqrt();
    // So near to a parabola the orbit reaches far beyond any neighbour star: it counts as free.
    if new_e > LARGEST_ECCENTRICITY || !new_a.is_finite() {
        return AfterSuddenLoss::Unbound;
    }
    AfterSuddenLoss::Bound { semi_major_axis_au: new_a, eccentricity: new_e }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_quarter_lost_at_once_leaves_an_eccentric_orbit() {
        let AfterSuddenLoss::Bound { semi_major_axis_au, eccentricity } =
            after_sudden_loss(1.0, 0.0, 1.0, 0.75).expect("in range")
        else {
            unreachable!("less than half was lost")
        };
        // beta = 4/3: a' = 1/(2 - 4/3) = 1.5, e' = beta - 1 = 1/3; the periastron stays at 1 au.
        assert!((semi_major_axis_au - 1.5).abs() < 1e-12);
        assert!((eccentricity - 1.0 / 3.0).abs() < 1e-12);
        assert_eq!(after_sudden_loss(1.0, 0.0, 1.0, 0.5), Ok(AfterSuddenLoss::Unbound));
        assert_eq!(after_sudden_loss(1.0, 0.0, 1.0, 0.0), Ok(AfterSuddenLoss::Unbound));
    }

    #[test]
    fn neighbours_may_be_named_in_either_order() {
        let inner = Neighbour { semi_major_axis_au: 0.723, eccentricity: 0.0, mass_mearth: 0.815 };
        let outer = Neighbour { semi_major_axis_au: 1.0, eccentricity: 0.0, mass_mearth: 1.0 };
        let separation = hill_separation(inner, outer, 1.0).expect("in range");
        assert_eq!(hill_separation(outer, inner, 1.0), Ok(separation));
        // Venus and the Earth stand 26 mutual Hill radii apart (computed).
        assert!((separation - 26.3).abs() < 0.5, "{separation}");
    }
}
