//! A planet's size, gravity and hold on its air.

use super::range::{OutOfRange, positive, within};
use crate::units::constants::{
    BOLTZMANN_J_K, EARTH_GM_M3_S2, EARTH_MASS_KG, EARTH_MASSES_PER_SOLAR_MASS, EARTH_RADIUS_M, PROTON_MASS_KG,
};
use std::f64::consts::PI;

/// Core mass fraction of an Earth-like rocky planet. Zeng, Sasselov & Jacobsen 2016.
pub const EARTH_CORE_FRACTION: f64 = 0.325;
/// Mass where planets with deep envelopes take over, Earth masses. Chen & Kipping 2017.
const NEPTUNIAN_FROM_MEARTH: f64 = 2.04;
/// Mass where planets stop growing with mass, Earth masses (0.414 Jupiter masses). Chen & Kipping 2017.
const JOVIAN_FROM_MEARTH: f64 = 131.6;
/// Mass where hydrogen burns, Earth masses (0.0800 M☉). Chen & Kipping 2017.
const STELLAR_FROM_MEARTH: f64 = 0.08 * EARTH_MASSES_PER_SOLAR_MASS;
/// Radius of a cold giant such as Jupiter, Earth radii.
const COLD_GIANT_RADIUS_REARTH: f64 = 11.2;

/// Which relation gave a radius from a mass.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum RadiusModel {
    /// Iron core and rock mantle in Earth's proportions. Zeng, Sasselov & Jacobsen 2016.
    Rocky,
    /// What most planets of this mass are like. Chen & Kipping 2017.
    Population,
    /// A giant that has cooled, held at 11.2 Earth radii (our own choice; the population is inflated by hot planets).
    ColdGiant,
}

impl RadiusModel {
    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::Rocky => "rocky",
            Self::Population => "population",
            Self::ColdGiant => "cold_giant",
        }
    }

    /// The relation in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Rocky => "rocky, Earth's composition",
            Self::Population => "typical planet of this mass",
            Self::ColdGiant => "cold giant",
        }
    }
}

/// A radius worked out from a mass.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct RadiusFromMass {
    /// Radius, Earth radii (6378.1 km).
    pub radius_rearth: f64,
    /// One-sigma scatter of real planets about it, as a share of the radius, dimensionless.
    pub scatter_fraction: f64,
    /// The relation used.
    pub model: RadiusModel,
    /// The relation was asked outside the masses it was made for.
    pub extrapolated: bool,
}

/// The radius of a rocky planet, Earth radii: R = (1.07 − 0.21 CMF) M^(1/3.7).
///
/// # Source
/// Zeng, Sasselov & Jacobsen 2016, `ApJ` 819, 127, equation 2.
/// # Valid for
/// 1 to 8 M⊕, core mass fraction 0 to 0.4; flagged above 8. Below 1 it still meets Venus to 0.3 %.
/// # Accuracy
/// 1 % against its models; real rocky planets scatter by about 4 %.
/// # Errors
/// [`OutOfRange`] for a mass that is not positive or a core fraction outside 0 to 1.
pub fn rocky_radius_rearth(mass_mearth: f64, core_mass_fraction: f64) -> Result<RadiusFromMass, OutOfRange> {
    let m = positive("mass_mearth", mass_mearth)?;
    let cmf = within("core_mass_fraction", core_mass_fraction, 0.0, 1.0, "0 to 1")?;
    Ok(RadiusFromMass {
        radius_rearth: (1.07 - 0.21 * cmf) * m.powf(1.0 / 3.7),
        scatter_fraction: 0.04,
        model: RadiusModel::Rocky,
        extrapolated: !(0.1..=8.0).contains(&m) || cmf > 0.4,
    })
}

/// The radius of a typical planet of a mass, Earth radii: four power laws, joined continuously.
///
/// 1.008 M^0.279 below 2.04 M⊕, then exponents 0.589, −0.044 (from 131.6 M⊕) and 0.881 (from 0.08 M☉).
///
/// # Source
/// Chen & Kipping 2017, `ApJ` 834, 17, table 1.
/// # Valid for
/// Dwarf planets to stars. Reads cold giants too large (Jupiter 13.8 against 11.2).
/// # Accuracy
/// Scatter of real planets 4, 15, 7 and 4 % in the four classes.
/// # Errors
/// [`OutOfRange`] for a mass that is not positive.
pub fn population_radius_rearth(mass_mearth: f64) -> Result<RadiusFromMass, OutOfRange> {
    let m = positive("mass_mearth", mass_mearth)?;
    let terran = |m: f64| 1.008 * m.powf(0.279);
    let neptunian = |m: f64| terran(NEPTUNIAN_FROM_MEARTH) * (m / NEPTUNIAN_FROM_MEARTH).powf(0.589);
    let jovian = |m: f64| neptunian(JOVIAN_FROM_MEARTH) * (m / JOVIAN_FROM_MEARTH).powf(-0.044);
    let (radius_rearth, scatter_fraction) = if m < NEPTUNIAN_FROM_MEARTH {
        (terran(m), 0.04)
    } else if m < JOVIAN_FROM_MEARTH {
        (neptunian(m), 0.15)
    } else if m < STELLAR_FROM_MEARTH {
        (jovian(m), 0.07)
    } else {
        (jovian(STELLAR_FROM_MEARTH) * (m / STELLAR_FROM_MEARTH).powf(0.881), 0.04)
    };
    let extrapolated = !(1e-4..=0.87 * EARTH_MASSES_PER_SOLAR_MASS).contains(&m);
    Ok(RadiusFromMass { radius_rearth, scatter_fraction, model: RadiusModel::Population, extrapolated })
}

/// The radius to assume when only the mass is known, Earth radii.
///
/// Rocky below 2.04 M⊕, the typical planet above it, and never more than a cold giant's 11.2 R⊕.
///
/// # Source
/// [`rocky_radius_rearth`], [`population_radius_rearth`]; the choice between them is our own.
/// # Accuracy
/// The scatter returned; at 2.04 M⊕ the two relations differ by 1.3 %.
/// # Errors
/// [`OutOfRange`] for a mass that is not positive.
pub fn default_radius_rearth(mass_mearth: f64) -> Result<RadiusFromMass, OutOfRange> {
    if mass_mearth < NEPTUNIAN_FROM_MEARTH {
        return rocky_radius_rearth(mass_mearth, EARTH_CORE_FRACTION);
    }
    let typical = population_radius_rearth(mass_mearth)?;
    if typical.radius_rearth > COLD_GIANT_RADIUS_REARTH && mass_mearth < STELLAR_FROM_MEARTH {
        return Ok(RadiusFromMass {
            radius_rearth: COLD_GIANT_RADIUS_REARTH,
            model: RadiusModel::ColdGiant,
            scatter_fraction: 0.15,
            ..typical
        });
    }
    Ok(typical)
}

/// The gravity at the surface, m s⁻²: g = G m/R².
///
/// # Source
/// Newton, with the nominal GM of the Earth (IAU 2015 Resolution B3).
/// # Errors
/// [`OutOfRange`] for values that are not positive.
pub fn gravity_m_s2(mass_mearth: f64, radius_rearth: f64) -> Result<f64, OutOfRange> {
    let r_m = positive("radius_rearth", radius_rearth)? * EARTH_RADIUS_M;
    Ok(positive("mass_mearth", mass_mearth)? * EARTH_GM_M3_S2 / (r_m * r_m))
}

/// The speed needed to leave the surface for good, km s⁻¹: v = √(2 G m/R).
///
/// # Source
/// Newton, with the nominal GM of the Earth (IAU 2015 Resolution B3).
/// # Errors
/// [`OutOfRange`] for values that are not positive.
pub fn escape_speed_km_s(mass_mearth: f64, radius_rearth: f64) -> Result<f64, OutOfRange> {
    let r_m = positive("radius_rearth", radius_rearth)? * EARTH_RADIUS_M;
    Ok((2.0 * positive("mass_mearth", mass_mearth)? * EARTH_GM_M3_S2 / r_m).sqrt() / 1000.0)
}

/// The mean density, kg m⁻³: m / (4π R³/3).
///
/// # Errors
/// [`OutOfRange`] for values that are not positive.
pub fn density_kg_m3(mass_mearth: f64, radius_rearth: f64) -> Result<f64, OutOfRange> {
    let r_m = positive("radius_rearth", radius_rearth)? * EARTH_RADIUS_M;
    Ok(positive("mass_mearth", mass_mearth)? * EARTH_MASS_KG / (4.0 / 3.0 * PI * r_m * r_m * r_m))
}

/// How firmly gravity holds a gas against its heat, dimensionless: `λ = G m μ m_H/(k T R)`.
///
/// Below about 3 the gas flows off, above about 15 it stays (recalled).
///
/// # Source
/// Jeans parameter (textbook form), with the proton's mass as the unit of `molecular_mass`.
/// # Errors
/// [`OutOfRange`] for values that are not positive.
pub fn jeans_parameter(
    mass_mearth: f64,
    radius_rearth: f64,
    molecular_mass: f64,
    exosphere_temperature_k: f64,
) -> Result<f64, OutOfRange> {
    let r_m = positive("radius_rearth", radius_rearth)? * EARTH_RADIUS_M;
    let potential = positive("mass_mearth", mass_mearth)? * EARTH_GM_M3_S2 / r_m;
    let particle_kg = positive("molecular_mass", molecular_mass)? * PROTON_MASS_KG;
    Ok(potential * particle_kg / (BOLTZMANN_J_K * positive("exosphere_temperature_k", exosphere_temperature_k)?))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_population_relation_is_continuous() {
        for joint in [NEPTUNIAN_FROM_MEARTH, JOVIAN_FROM_MEARTH, STELLAR_FROM_MEARTH] {
            let below = population_radius_rearth(joint * (1.0 - 1e-9)).expect("in range").radius_rearth;
            let above = population_radius_rearth(joint * (1.0 + 1e-9)).expect("in range").radius_rearth;
            assert!((below / above - 1.0).abs() < 1e-6);
        }
    }

    #[test]
    fn the_default_follows_the_mass() {
        let model = |mass_mearth| default_radius_rearth(mass_mearth).expect("in range").model;
        assert_eq!(model(1.0), RadiusModel::Rocky);
        assert_eq!(model(17.1), RadiusModel::Population);
        assert_eq!(model(317.8), RadiusModel::ColdGiant);
        assert!(default_radius_rearth(f64::NAN).is_err());
    }
}
