//! Everything the structure equations need to know of the gas at one place.

use super::burning::{Burning, Helium3, burning};
use super::composition::Composition;
use super::gas::{Gas, gas};
use super::numbers::Dual;
use super::opacity::Opacity;

/// The laws of matter that hold in one star.
#[derive(Clone, Debug)]
pub(super) struct Microphysics {
    /// Opacity of matter with the star's metals.
    pub(super) opacity: Opacity,
    /// The highest temperature that the CN cycle feels, K; set when late hydrogen would burn in flashes.
    pub(super) cn_ceiling_k: Option<f64>,
}

/// Gas, opacity and burning at one density and temperature. Slopes are with respect to ln ρ and ln T.
#[derive(Clone, Copy, Debug, Default)]
pub(super) struct Matter {
    /// Equation of state.
    pub(super) gas: Gas,
    /// ln opacity, cm² g⁻¹.
    pub(super) ln_opacity: Dual<2>,
    /// Reaction rates and heat.
    pub(super) burning: Burning,
}

impl Matter {
    /// Matter of a composition at ln density (g cm⁻³) and ln temperature (K).
    ///
    /// `ln_f_guess` is the degeneracy variable of a similar state. Nothing where the gas has no neutral state.
    pub(super) fn at(
        laws: &Microphysics,
        composition: &Composition,
        helium3: Helium3,
        [ln_density, ln_temperature]: [f64; 2],
        ln_f_guess: f64,
    ) -> Option<Self> {
        let gas = gas(composition, ln_density, ln_temperature, ln_f_guess)?;
        Some(Self {
            ln_opacity: laws.opacity.ln_opacity(composition, ln_density, ln_temperature, gas.electrons_per_cm3),
            burning: burning(composition, helium3, ln_density, ln_temperature, gas.psi, laws.cn_ceiling_k),
            gas,
        })
    }
}
