//! What a collapse leaves: neutron star or black hole.

use super::phase::Phase;
use crate::units::constants::{LIGHT_SPEED_M_S, SOLAR_GM_M3_S2, SOLAR_RADIUS_M};

/// Radius of a neutron star, km.
///
/// # Source
/// Raaijmakers et al. 2021, ApJ 918, L29: 12.2 (+0.6, −0.8) km at 1.4 solar masses; nearly independent of mass.
pub const NEUTRON_STAR_RADIUS_KM: f64 = 12.0;

/// Greatest mass of a neutron star, solar masses.
///
/// # Source
/// Fryer et al. 2012, ApJ 749, 91 (from memory).
pub const NEUTRON_STAR_LIMIT_MSUN: f64 = 2.5;

/// Baryonic mass of the core that collapses by electron capture, solar masses.
///
/// # Source
/// Fryer et al. 2012, ApJ 749, 91 (after Nomoto 1984).
const ELECTRON_CAPTURE_CORE_MSUN: f64 = 1.38;

/// A star at the moment its core collapses.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Collapse {
    /// Age, yr.
    pub age_yr: f64,
    /// Mass of the whole star, solar masses.
    pub mass_msun: f64,
    /// Mass of its carbon–oxygen core, solar masses.
    pub carbon_oxygen_core_msun: f64,
    /// Core mass at which the explosion sets in, solar masses.
    pub explosive_core_msun: f64,
    /// The core is of oxygen and neon and collapses because electrons are captured.
    pub by_electron_capture: bool,
}

impl Collapse {
    /// The remnant and its gravitational mass in solar masses.
    ///
    /// A proto-neutron star forms, and part of the star falls back on it: the delayed explosion.
    ///
    /// # Source
    /// Fryer et al. 2012, ApJ 749, 91, section 4 (from memory).
    ///
    /// # Valid for
    /// Single stars below the pair-instability range (helium cores below about 35 solar masses).
    #[must_use]
    pub fn remnant(&self) -> (Phase, f64) {
        let baryonic = if self.by_electron_capture {
            ELECTRON_CAPTURE_CORE_MSUN
        } else {
            delayed_baryonic_mass_msun(self.mass_msun, self.carbon_oxygen_core_msun)
        };
        let baryonic = baryonic.min(self.mass_msun);
        let gravitational = neutron_star_mass_msun(baryonic);
        if gravitational <= NEUTRON_STAR_LIMIT_MSUN {
            (Phase::NeutronStar, gravitational)
        } else {
            (Phase::BlackHole, 0.9 * baryonic)
        }
    }
}

/// Baryonic mass left by a delayed explosion, from total and carbon–oxygen core mass, solar masses.
///
/// # Source
/// Fryer et al. 2012, ApJ 749, 91, eqs. 18–20 (from memory).
#[must_use]
pub fn delayed_baryonic_mass_msun(mass_msun: f64, core_msun: f64) -> f64 {
    let proto = match core_msun {
        core if core < 3.5 => 1.2,
        core if core < 6.0 => 1.3,
        core if core < 11.0 => 1.4,
        _ => 1.6,
    };
    let above = (mass_msun - proto).max(0.0);
    let fallback = if core_msun < 2.5 {
        0.2
    } else if core_msun < 3.5 {
        0.5 * core_msun - 1.05
    } else if core_msun < 11.0 {
        let slope = 0.133 - 0.093 / above.max(1e-3);
        (slope * core_msun + 1.0 - 11.0 * slope).clamp(0.0, 1.0) * above
    } else {
        above
    };
    proto + fallback.min(above)
}

/// Gravitational mass of a neutron star of a baryonic mass: `M_b` − `M_g` = 0.075 `M_g`², solar masses.
///
/// # Source
/// Lattimer & Yahil 1989, ApJ 340, 426, as used by Fryer et al. 2012.
#[must_use]
pub fn neutron_star_mass_msun(baryonic_msun: f64) -> f64 {
    ((1.0 + 0.3 * baryonic_msun).sqrt() - 1.0) / 0.15
}

/// Remnant mass by the older linear relation, 1.17 + 0.09 `M_core`, solar masses. For comparison only: it makes no black
/// hole heavier than 2.4 solar masses.
///
/// # Source
/// Hurley, Pols & Tout 2000, MNRAS 315, 543, eq. 92.
#[must_use]
pub fn linear_remnant_mass_msun(explosive_core_msun: f64) -> f64 {
    1.17 + 0.09 * explosive_core_msun
}

/// Radius of a dark remnant, solar radii: 12 km, 2 G M / c², or zero where nothing is left.
#[must_use]
pub fn dark_radius_rsun(phase: Phase, mass_msun: f64) -> f64 {
    match phase {
        Phase::NeutronStar => NEUTRON_STAR_RADIUS_KM * 1000.0 / SOLAR_RADIUS_M,
        Phase::BlackHole => 2.0 * mass_msun * SOLAR_GM_M3_S2 / (LIGHT_SPEED_M_S * LIGHT_SPEED_M_S * SOLAR_RADIUS_M),
        _ => 0.0,
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn remnants_grow_without_gaps_in_the_fallback_formulae() {
        // Within each proto-neutron-star mass the fallback joins; the steps are those of the proto-neutron star.
        for core in [2.5, 11.0] {
            let (below, above) =
                (delayed_baryonic_mass_msun(20.0, core - 1e-9), delayed_baryonic_mass_msun(20.0, core + 1e-9));
            assert!((below - above).abs() < 0.21, "{core}: {below} {above}");
        }
        assert_eq!(delayed_baryonic_mass_msun(20.0, 12.0), 20.0);
    }

    #[test]
    fn a_collapse_never_leaves_more_than_there_was() {
        for core_tenths in 14..400 {
            let core = f64::from(core_tenths) / 10.0;
            for envelope in [0.0, 0.1, 1.0, 10.0] {
                let collapse = Collapse {
                    age_yr: 0.0,
                    mass_msun: core + envelope,
                    carbon_oxygen_core_msun: core,
                    explosive_core_msun: core,
                    by_electron_capture: false,
                };
                let (_, mass) = collapse.remnant();
                assert!(mass > 1.0 && mass <= collapse.mass_msun);
            }
        }
    }

    #[test]
    fn sizes_of_dark_remnants() {
        // Schwarzschild radius of one solar mass: 2.953 km (common practice).
        let km = dark_radius_rsun(Phase::BlackHole, 1.0) * SOLAR_RADIUS_M / 1000.0;
        assert!((km - 2.953).abs() < 0.001);
        assert!((dark_radius_rsun(Phase::NeutronStar, 1.4) * SOLAR_RADIUS_M - 12_000.0).abs() < 1e-6);
        // Electron capture leaves 1.26 solar masses (Fryer et al. 2012, from memory).
        assert!((neutron_star_mass_msun(ELECTRON_CAPTURE_CORE_MSUN) - 1.26).abs() < 0.01);
    }
}
