//! The constants of nature in centimetre–gram–second units, as the stellar-structure equations use them.

use crate::units::constants as si;
use std::f64::consts::PI;

/// Newtonian constant, cm³ g⁻¹ s⁻².
pub(super) const GRAVITATION: f64 = si::GRAVITATION_M3_KG_S2 * 1e3;
/// Solar mass, g.
pub(super) const SOLAR_MASS: f64 = si::SOLAR_MASS_KG * 1e3;
/// Solar radius, cm.
pub(super) const SOLAR_RADIUS: f64 = si::SOLAR_RADIUS_M * 1e2;
/// Solar luminosity, erg s⁻¹.
pub(super) const SOLAR_LUMINOSITY: f64 = si::SOLAR_LUMINOSITY_W * 1e7;
/// Boltzmann constant, erg K⁻¹.
pub(super) const BOLTZMANN: f64 = si::BOLTZMANN_J_K * 1e7;
/// Atomic mass constant, g.
pub(super) const ATOMIC_MASS: f64 = si::ATOMIC_MASS_KG * 1e3;
/// Electron mass, g.
pub(super) const ELECTRON_MASS: f64 = si::ELECTRON_MASS_KG * 1e3;
/// Speed of light, cm s⁻¹.
pub(super) const LIGHT_SPEED: f64 = si::LIGHT_SPEED_M_S * 1e2;
/// Planck constant, erg s.
pub(super) const PLANCK: f64 = si::PLANCK_J_S * 1e7;
/// Stefan–Boltzmann constant, erg cm⁻² s⁻¹ K⁻⁴.
pub(super) const STEFAN_BOLTZMANN: f64 = si::STEFAN_BOLTZMANN_W_M2_K4 * 1e3;
/// Radiation density constant 4σ/c, erg cm⁻³ K⁻⁴.
pub(super) const RADIATION_DENSITY: f64 = 4.0 * STEFAN_BOLTZMANN / LIGHT_SPEED;
/// Elementary charge squared, erg cm (Gaussian units).
pub(super) const CHARGE_SQUARED: f64 =
    si::ELEMENTARY_CHARGE_C * si::ELEMENTARY_CHARGE_C * LIGHT_SPEED * LIGHT_SPEED * 1e-2;
/// Electron rest energy, erg.
pub(super) const ELECTRON_REST_ENERGY: f64 = ELECTRON_MASS * LIGHT_SPEED * LIGHT_SPEED;
/// 8π over the cube of the Compton wavelength, cm⁻³.
pub(super) const ELECTRON_STATES: f64 = {
    let compton = PLANCK / (ELECTRON_MASS * LIGHT_SPEED);
    8.0 * PI / (compton * compton * compton)
};
/// Julian year, s.
pub(super) const YEAR: f64 = si::YEAR_S;
/// Energy of a million electronvolts per reaction, for a rate in moles of reactions: erg mol⁻¹.
pub(super) const MEV_PER_MOLE: f64 = si::ELEMENTARY_CHARGE_C * 1e13 * si::AVOGADRO_PER_MOL;
