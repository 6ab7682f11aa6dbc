//! What the electric forces between ions change.
//!
//! Excess free energy of a one-component plasma on a rigid electron background, mixed linearly over the ions.
//! # Source
//! Potekhin & Chabrier 2000, Phys. Rev. E 62, 8554, eq. 16 (leading terms).
//! # Accuracy
//! Multiplied by a calibrated 2.2 below 3000 g cm⁻³, which stands for electron screening and exchange (see
//! `calibration`).

use super::super::calibration::COULOMB_FACTOR;
use super::super::cgs::{BOLTZMANN, CHARGE_SQUARED};
use super::super::numbers::Number;
use super::ionisation::Populations;
use std::f64::consts::PI;

const A1: f64 = -0.9052;
const A2: f64 = 0.6322;
/// −√3/2 − A1/√A2.
const A3: f64 = -0.866_025_403_784_438_6 - A1 / 0.795_110_055_275_369_3;
/// Density above which the calibrated factor fades, g cm⁻³.
const FADING_G_CM3: f64 = 3000.0;
/// Z^(5/3) of singly charged ions, helium nuclei and metal nuclei.
const CHARGE_FACTOR: [f64; 3] = [1.0, 3.174_802_103_936_399, 32.0];

/// Free energy and internal energy per ion over kT at coupling Γ.
#[inline]
fn excess<N: Number>(coupling: N) -> (N, N) {
    let gamma = coupling.value();
    let root = gamma.sqrt();
    let free = A1 * ((gamma * (A2 + gamma)).sqrt() - A2 * ((gamma / A2).sqrt() + (1.0 + gamma / A2).sqrt()).ln())
        + 2.0 * A3 * (root - root.atan());
    // u = Γ df/dΓ and its first two derivatives with respect to ln Γ.
    let (near, far) = (gamma / (A2 + gamma), gamma / (1.0 + gamma));
    let (u1, u2) = (A1 * gamma * near.sqrt(), A3 * root * far);
    let (s1, s2) = (1.5 - 0.5 * near, 1.5 - far);
    let energy = u1 + u2;
    let first = u1 * s1 + u2 * s2;
    let second = u1 * (s1 * s1 - 0.5 * near * (1.0 - near)) + u2 * (s2 * s2 - far * (1.0 - far));
    let per = gamma.recip();
    (
        coupling.chain(free, energy * per, (first - energy) * per * per),
        coupling.chain(energy, first * per, (second - first) * per * per),
    )
}

/// Pressure (erg cm⁻³) and entropy density (erg cm⁻³ K⁻¹) of the Coulomb forces, both negative.
///
/// `ideal_pressure` caps the loss of pressure at half its value, so that cold dense gas keeps a positive pressure.
pub(super) fn pressure_and_entropy<N: Number>(
    particles: &Populations<N>,
    density_g_cm3: N,
    temperature_k: N,
    ideal_pressure: N,
) -> (N, N) {
    let singly = particles.hydrogen[0] + particles.helium[1];
    let metals = particles.metals * particles.metals_stripped;
    let ions = [singly, particles.helium[2], metals];
    let charges = singly + particles.helium[2] * 2.0 + metals * 8.0;
    if charges.value() <= 0.0 {
        return (N::constant(0.0), N::constant(0.0));
    }
    let electron_coupling = (charges * (4.0 * PI / 3.0)).cbrt() * (CHARGE_SQUARED / BOLTZMANN) / temperature_k;
    let floor = charges.value() * 1e-14;
    let mut pressure = N::constant(0.0);
    let mut entropy = N::constant(0.0);
    for (count, factor) in ions.into_iter().zip(CHARGE_FACTOR) {
        if count.value() > floor {
            let (free, energy) = excess(electron_coupling * factor);
            pressure = pressure + count * energy;
            entropy = entropy + count * (energy - free);
        }
    }
    let fading = (density_g_cm3 * (1.0 / FADING_G_CM3)).square() + 1.0;
    let factor = fading.recip() * (COULOMB_FACTOR - 1.0) + 1.0;
    let pressure = pressure * factor * temperature_k * (BOLTZMANN / 3.0);
    let limit = ideal_pressure * 0.5;
    let capped = limit * ((pressure / limit).exp() - 1.0);
    (capped, entropy * factor * BOLTZMANN)
}
