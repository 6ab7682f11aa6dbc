//! What high-energy light takes from an atmosphere.

use super::bulk::{escape_speed_km_s, gravity_m_s2};
use super::range::{OutOfRange, non_negative, positive, within};
use crate::units::constants::{
    ATOMIC_MASS_KG, AU_M, BOLTZMANN_J_K, EARTH_GM_M3_S2, EARTH_MASSES_PER_SOLAR_MASS, EARTH_RADIUS_M,
    GRAVITATION_M3_KG_S2, PROTON_MASS_KG,
};
use std::f64::consts::PI;

/// Share of the high-energy light that lifts gas; 0.1 to 0.3 are in print. Luger & Barnes 2015 and others.
pub const USUAL_EFFICIENCY: f64 = 0.15;
/// Mass of the Earth's oceans, kg (common value).
pub const EARTH_OCEAN_KG: f64 = 1.4e21;
/// Mass of water that goes with a mass of hydrogen, dimensionless: 18/2.
pub const WATER_PER_HYDROGEN: f64 = 9.0;
/// Temperature of the upper air of steam that loses hydrogen, K. Luger & Barnes 2015 (recalled).
const UPPER_AIR_K: f64 = 400.0;
/// Mixing ratio of water in the upper air of a moist greenhouse. Kasting, Whitmire & Reynolds 1993.
const MOIST_MIXING_RATIO: f64 = 3e-3;
/// Escape of hydrogen per unit of its mixing ratio through the air below, m⁻² s⁻¹. Walker 1977 (recalled).
const DIFFUSION_THROUGH_AIR_M2_S: f64 = 2e17;
/// Escape speed of the Earth in the shoreline, km s⁻¹ (mean radius 6371 km).
const EARTH_ESCAPE_KM_S: f64 = 11.19;

/// The ratio of shoreline numbers that separates planets with air from those without (our own choice), and the band
/// in which either is found: Mars and Ganymede at about 10 have almost none, Pluto at 5 has some.
pub const SHORELINE: f64 = 10.0;
/// Below this planets keep air.
pub const SHORELINE_KEPT_BELOW: f64 = 5.0;
/// Above this planets have lost it.
pub const SHORELINE_LOST_ABOVE: f64 = 20.0;

/// How much the star's gravity eases escape, dimensionless: K = 1 − 3/(2ξ) + 1/(2ξ³), ξ = a (m/3M)^⅓ / R.
///
/// # Source
/// Erkaev et al. 2007, A&A 472, 329.
/// # Errors
/// [`OutOfRange`] for values that are not positive or a planet that fills its Roche lobe (ξ ≤ 1).
pub fn roche_lobe_factor(
    planet_mass_mearth: f64,
    planet_radius_rearth: f64,
    semi_major_axis_au: f64,
    star_mass_msun: f64,
) -> Result<f64, OutOfRange> {
    let ratio = positive("planet_mass_mearth", planet_mass_mearth)?
        / (3.0 * EARTH_MASSES_PER_SOLAR_MASS * positive("star_mass_msun", star_mass_msun)?);
    let r_m = positive("planet_radius_rearth", planet_radius_rearth)? * EARTH_RADIUS_M;
    let xi = positive("semi_major_axis_au", semi_major_axis_au)? * AU_M * ratio.cbrt() / r_m;
    let xi = within("roche_lobe_over_radius", xi, 1.0 + 1e-9, 1e30, "more than 1")?;
    Ok(1.0 - 1.5 / xi + 0.5 / (xi * xi * xi))
}

/// The mass a planet loses when a share of the high-energy light lifts its gas, kg s⁻¹: Ṁ = η π F R³/(G m K).
///
/// # Source
/// Watson, Donahue & Walker 1981; Erkaev et al. 2007.
/// # Valid for
/// Hydrogen-rich or steam atmospheres.
/// # Accuracy
/// Order of magnitude: the efficiency is known to a factor of three.
/// # Errors
/// [`OutOfRange`] for a negative flux, an efficiency or a Roche factor outside 0 to 1, values that are not positive.
pub fn energy_limited_kg_s(
    high_energy_flux_w_m2: f64,
    efficiency: f64,
    planet_mass_mearth: f64,
    planet_radius_rearth: f64,
    roche_lobe_factor: f64,
) -> Result<f64, OutOfRange> {
    let flux = non_negative("high_energy_flux_w_m2", high_energy_flux_w_m2)?;
    let eta = within("efficiency", efficiency, 0.0, 1.0, "0 to 1")?;
    let k = within("roche_lobe_factor", roche_lobe_factor, 1e-3, 1.0, "0.001 to 1")?;
    let r_m = positive("planet_radius_rearth", planet_radius_rearth)? * EARTH_RADIUS_M;
    let mass_kg = positive("planet_mass_mearth", planet_mass_mearth)? * EARTH_GM_M3_S2 / GRAVITATION_M3_KG_S2;
    Ok(eta * PI * flux * r_m / (GRAVITATION_M3_KG_S2 * mass_kg * k) * r_m * r_m)
}

/// The most hydrogen that can rise through the oxygen it leaves behind, kg s⁻¹ from the whole planet:
/// `φ = b g (m_O − m_H)/(1.5 k T)`, b = 4.8 × 10¹⁷ T^0.75 cm⁻¹ s⁻¹, T = 400 K.
///
/// # Source
/// Luger & Barnes 2015 after Hunten, Pepin & Walker 1987 (recalled).
/// # Errors
/// [`OutOfRange`] for values that are not positive.
pub fn hydrogen_through_oxygen_kg_s(planet_mass_mearth: f64, planet_radius_rearth: f64) -> Result<f64, OutOfRange> {
    let g = gravity_m_s2(planet_mass_mearth, planet_radius_rearth)?;
    let diffusion_m_s = 4.8e19 * UPPER_AIR_K.powf(0.75);
    let per_m2_s = diffusion_m_s * g * 15.0 * ATOMIC_MASS_KG / (BOLTZMANN_J_K * UPPER_AIR_K) / 1.5;
    Ok(per_m2_s * PROTON_MASS_KG * surface_m2(planet_radius_rearth))
}

/// The hydrogen that leaks from a moist greenhouse, kg s⁻¹ from the whole planet: 2 × 10¹³ cm⁻² s⁻¹ times the mixing
/// ratio of hydrogen, with 0.3 % of water in the upper air.
///
/// It empties the Earth's oceans in 4.7 Gyr.
///
/// # Source
/// Walker 1977 (rate, recalled); Kasting, Whitmire & Reynolds 1993 (mixing ratio at the moist limit).
/// # Accuracy
/// Order of magnitude: the mixing ratio climbs steeply beyond the limit.
/// # Errors
/// [`OutOfRange`] for a radius that is not positive.
pub fn moist_hydrogen_leak_kg_s(planet_radius_rearth: f64) -> Result<f64, OutOfRange> {
    let r = positive("planet_radius_rearth", planet_radius_rearth)?;
    Ok(DIFFUSION_THROUGH_AIR_M2_S * 2.0 * MOIST_MIXING_RATIO * PROTON_MASS_KG * surface_m2(r))
}

fn surface_m2(planet_radius_rearth: f64) -> f64 {
    let r_m = planet_radius_rearth * EARTH_RADIUS_M;
    4.0 * PI * r_m * r_m
}

/// Where a planet stands to the shoreline between bodies with and without air, dimensionless, 1 for the Earth:
/// c = X/(v/11.19 km s⁻¹)⁴, X the high-energy light received over the Earth's, estimated as s L^−0.6.
///
/// Compare with [`SHORELINE`], [`SHORELINE_KEPT_BELOW`] and [`SHORELINE_LOST_ABOVE`].
///
/// # Source
/// Zahnle & Catling 2017, `ApJ` 843, 122 (the power −0.6 is recalled).
/// # Accuracy
/// Order of magnitude; a later fit finds v^6.1 and a different power of L (Berta-Thompson et al. 2025).
/// # Errors
/// [`OutOfRange`] for a negative insolation or values that are not positive.
pub fn shoreline_ratio(
    insolation_earth: f64,
    luminosity_lsun: f64,
    planet_mass_mearth: f64,
    planet_radius_rearth: f64,
) -> Result<f64, OutOfRange> {
    let s = non_negative("insolation_earth", insolation_earth)?;
    let light = s * positive("luminosity_lsun", luminosity_lsun)?.powf(-0.6);
    Ok(light / escape_speed_ratio_4(planet_mass_mearth, planet_radius_rearth)?)
}

/// (v/11.19 km s⁻¹)⁴ of a planet's escape speed.
pub(crate) fn escape_speed_ratio_4(planet_mass_mearth: f64, planet_radius_rearth: f64) -> Result<f64, OutOfRange> {
    Ok((escape_speed_km_s(planet_mass_mearth, planet_radius_rearth)? / EARTH_ESCAPE_KM_S).powi(4))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_star_eases_escape_until_the_lobe_is_full() {
        let near = roche_lobe_factor(1.0, 1.0, 0.01, 1.0).expect("within its lobe");
        let far = roche_lobe_factor(1.0, 1.0, 10.0, 1.0).expect("within its lobe");
        assert!(near < far && far < 1.0 && near > 0.0);
        assert!(roche_lobe_factor(1.0, 1.0, 0.003, 1.0).is_err());
    }

    #[test]
    fn a_moist_earth_dries_in_five_billion_years() {
        // Kasting, Whitmire & Reynolds 1993: 0.3 % of water in the stratosphere empties the oceans in about 4.6 Gyr.
        let water_kg_s = WATER_PER_HYDROGEN * moist_hydrogen_leak_kg_s(1.0).expect("in range");
        let dry_yr = EARTH_OCEAN_KG / water_kg_s / 3.15576e7;
        assert!((dry_yr / 4.7e9 - 1.0).abs() < 0.1, "{dry_yr}");
    }
}
