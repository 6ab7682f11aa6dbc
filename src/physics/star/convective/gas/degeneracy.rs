//! How degenerate electrons are: their Fermi energy against the heat.

use super::super::cgs::{BOLTZMANN, ELECTRON_REST_ENERGY, LIGHT_SPEED, PLANCK};
use std::f64::consts::PI;

/// Fermi energy of electrons (without their rest energy) over k, K: mc² (√(1+x²) − 1)/k with x = `p_F`/mc and
/// `p_F` = ħ (3π² n)^⅓.
///
/// # Source
/// Chandrasekhar 1939, *An Introduction to the Study of Stellar Structure*, chapter X.
/// # Valid for
/// Any density, relativistic or not.
pub(in super::super) fn fermi_temperature_k(electrons_per_cm3: f64) -> f64 {
    let reduced_planck = PLANCK / (2.0 * PI);
    let momentum = reduced_planck * (3.0 * PI * PI * electrons_per_cm3).cbrt();
    let relative = momentum * LIGHT_SPEED / ELECTRON_REST_ENERGY;
    ELECTRON_REST_ENERGY * relative * relative / ((1.0 + relative * relative).sqrt() + 1.0) / BOLTZMANN
}

#[cfg(test)]
mod tests {
    use super::super::super::cgs::ATOMIC_MASS;
    use super::*;

    #[test]
    fn the_fermi_temperature_is_the_published_one() {
        // Chabrier & Baraffe 2000, ARA&A 38, 337, section 2: T/T_F = 3.314 × 10⁻⁶ T (μ_e/ρ)^⅔.
        for over_mu in [10.0, 350.0, 2000.0] {
            let ratio = 3.314e-6 * fermi_temperature_k(over_mu / ATOMIC_MASS) / over_mu.powf(2.0 / 3.0);
            assert!((ratio - 1.0).abs() < 6e-3, "{over_mu}: {ratio}");
        }
    }
}
