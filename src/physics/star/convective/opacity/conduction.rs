//! Heat carried by electrons, written as an opacity.
//!
//! `κ = 16σT³/(3ρλ)` with the conductivity λ = π²k²T nₑ/(3m*ν), electrons scattered by ions at the rate ν.
//! # Source
//! Yakovlev & Urpin 1980 (Soviet Astron. 24, 303) form, with a simple correction for electrons scattering each other.
//! # Accuracy
//! A factor of about two. Halving it changes lifetimes by 0.2 % and the cooling of the white dwarf by 20 %.

use super::super::cgs::{
    ATOMIC_MASS, BOLTZMANN, CHARGE_SQUARED, ELECTRON_MASS, ELECTRON_REST_ENERGY, LIGHT_SPEED, PLANCK, STEFAN_BOLTZMANN,
};
use super::super::composition::{Composition, METAL_CHARGE};
use super::super::numbers::{Dual, Number};
use std::f64::consts::PI;

/// Share of the electron–electron scattering per 1/Z.
const MUTUAL: f64 = 1.2;
/// Least Coulomb logarithm.
const LEAST_LOGARITHM: f64 = 0.3;

/// Conductive opacity, cm² g⁻¹.
pub(super) fn conductive_opacity(
    composition: &Composition,
    density_g_cm3: Dual<2>,
    temperature_k: Dual<2>,
    electrons_per_cm3: Dual<2>,
) -> Dual<2> {
    let reduced_planck = PLANCK / (2.0 * PI);
    let fermi = (electrons_per_cm3 * (3.0 * PI * PI)).cbrt() * (reduced_planck / (ELECTRON_MASS * LIGHT_SPEED));
    let energy_squared = fermi.square() + 1.0;
    let energy = energy_squared.sqrt();

    let [hydrogen, helium, metals] = composition.nuclei();
    let ions = hydrogen + helium + metals;
    let charge_squares = (hydrogen + 4.0 * helium + METAL_CHARGE * METAL_CHARGE * metals) / ions;
    let charge = electrons_per_cm3 / (density_g_cm3 * (ions / ATOMIC_MASS));
    let charge_root = charge.cbrt();
    let coupling =
        charge * charge_root.square() * (electrons_per_cm3 * (4.0 * PI / 3.0)).cbrt() * (CHARGE_SQUARED / BOLTZMANN)
            / temperature_k;

    let screened = (charge_root * (2.0 * PI / 3.0).cbrt() * (coupling.recip() * 3.0 + 1.5).sqrt()).ln();
    let bare = screened - (fermi.square() / energy_squared) * 0.5;
    let logarithm = (bare.square() + LEAST_LOGARITHM * LEAST_LOGARITHM).sqrt();

    let scattering = 4.0 * CHARGE_SQUARED * CHARGE_SQUARED * ELECTRON_MASS / (3.0 * PI * reduced_planck.powi(3));
    let mutual = charge.at_least(0.5).recip() * MUTUAL + 1.0;
    let rate = energy * logarithm * mutual * (charge_squares * scattering) / charge;
    // Kinetic Fermi energy, written without the cancellation of √(1+x²) − 1.
    let fermi_energy = fermi.square() / (energy + 1.0) * ELECTRON_REST_ENERGY;
    let thermal = temperature_k * BOLTZMANN / fermi_energy.at_least(1e-30);
    let conductivity = temperature_k * electrons_per_cm3 * (PI * PI * BOLTZMANN * BOLTZMANN / (3.0 * ELECTRON_MASS))
        / (energy * rate * (thermal * (PI * PI / 10.0) + 1.0));
    let cube = temperature_k.square() * temperature_k;
    cube * (16.0 * STEFAN_BOLTZMANN / 3.0) / (density_g_cm3 * conductivity)
}
