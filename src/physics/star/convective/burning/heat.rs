//! Heat set free by burning.
//!
//! Energies per reaction without neutrinos: p+p with the following d+p 6.67 `MeV`, ³He+³He 12.86, ³He+⁴He to the end of
//! the second chain 18.98, one turn of the CN cycle 24.97. *Common practice.*

use super::super::cgs::MEV_PER_MOLE;
use super::super::composition::{Composition, HELIUM3_MASS, HELIUM4_MASS, HYDROGEN_MASS};
use super::super::numbers::{Dual, Number};
use super::change::{CN_SHARE, NITROGEN_MASS};
use super::rates::{REACTIONS, Rates, rates};

/// Below this ln temperature (1 million K) nothing burns.
const BURNS_ABOVE_LN_K: f64 = 13.815_510_557_964_274;

/// Which ³He abundance the heat is worked out with.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(in super::super) enum Helium3 {
    /// That of the composition (mixed zones).
    Given,
    /// That which the rates leave after a step begun with `start` (mass fraction): ³He keeps up with the
    /// temperature while the structure is being solved. Frozen ³He makes the luminosity rattle by 15 %.
    FromStep {
        /// Mass fraction when the step began.
        start: f64,
        /// Length of the step, s.
        step_s: f64,
    },
}

/// Rates and heat at one place.
#[derive(Clone, Copy, Debug, Default)]
pub(in super::super) struct Burning {
    /// Reaction rates.
    pub(in super::super) rates: Rates<Dual<2>>,
    /// Heat, erg g⁻¹ s⁻¹.
    pub(in super::super) heat: Dual<2>,
}

/// Burning at ln density (g cm⁻³) and ln temperature (K); `psi` is the electrons' degeneracy, `cn_ceiling_k` the
/// highest temperature that the CN cycle feels.
pub(in super::super) fn burning(
    composition: &Composition,
    helium3: Helium3,
    ln_density: f64,
    ln_temperature: f64,
    psi: Dual<2>,
    cn_ceiling_k: Option<f64>,
) -> Burning {
    if ln_temperature <= BURNS_ABOVE_LN_K {
        return Burning::default();
    }
    let density = Dual::variable(ln_density, 0).exp();
    let temperature = Dual::variable(ln_temperature, 1).exp();
    let rates = rates(composition, density, temperature, psi, cn_ceiling_k);
    Burning { rates, heat: heat(composition, helium3, &rates) }
}

fn heat(composition: &Composition, helium3: Helium3, rates: &Rates<Dual<2>>) -> Dual<2> {
    let protons = composition.hydrogen / HYDROGEN_MASS;
    let alphas = composition.helium4() / HELIUM4_MASS;
    let [proton_proton, helium_pair, helium_alpha, nitrogen]: [Dual<2>; REACTIONS] = *rates;
    let light = match helium3 {
        Helium3::Given => Dual::constant(composition.helium3 / HELIUM3_MASS),
        Helium3::FromStep { start, step_s } => {
            // Backward Euler: h r₃₃ y² + (1 + h r₃₄ y₄) y − (y₀ + h r_pp) = 0, root without cancellation.
            let quadratic = helium_pair * step_s;
            let linear = helium_alpha * (step_s * alphas) + 1.0;
            let constant = proton_proton * (0.5 * protons * protons * step_s) + start / HELIUM3_MASS;
            constant * 2.0 / (linear + (linear.square() + quadratic * constant * 4.0).sqrt())
        }
    };
    let first = proton_proton * (0.5 * protons * protons * 6.67);
    let second = light.square() * helium_pair * (0.5 * 12.86);
    let third = light * helium_alpha * (alphas * 18.98);
    let cycle = nitrogen * (protons * CN_SHARE * composition.metals / NITROGEN_MASS * 24.97);
    (first + second + third + cycle) * MEV_PER_MOLE
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn slopes_match_differences() {
        let composition = Composition { hydrogen: 0.5, helium3: 1e-3, metals: 0.0153 };
        let step = Helium3::FromStep { start: 1e-3, step_s: 1e17 };
        for [density, temperature] in [[400.0, 4.5e6], [1e4, 1.5e7], [10.0, 8e6], [3e4, 2.5e7]] {
            for helium3 in [Helium3::Given, step] {
                let (x, y, h) = (f64::ln(density), f64::ln(temperature), 1e-5);
                let psi = |x: f64, y: f64| Dual { value: x - 1.5 * y + 17.0, slope: [1.0, -1.5] };
                let at = |x: f64, y: f64| burning(&composition, helium3, x, y, psi(x, y), Some(2e7)).heat;
                let here = at(x, y);
                let by_density = (at(x + h, y).value - at(x - h, y).value) / (2.0 * h);
                let by_temperature = (at(x, y + h).value - at(x, y - h).value) / (2.0 * h);
                assert!((here.slope[0] / by_density - 1.0).abs() < 1e-5);
                assert!((here.slope[1] / by_temperature - 1.0).abs() < 1e-5);
            }
        }
    }

    #[test]
    fn the_centre_of_the_sun_sets_free_the_known_heat() {
        // Standard solar models: about 16–17 erg g⁻¹ s⁻¹ at 150 g cm⁻³, 15.7 million K, X = 0.34 (*common practice*).
        let composition = Composition { hydrogen: 0.34, helium3: 8e-6, metals: 0.02 };
        let centre = burning(&composition, Helium3::Given, 150_f64.ln(), 15.7e6_f64.ln(), Dual::constant(-1.4), None);
        assert!((13.0..20.0).contains(&centre.heat.value), "{:?}", centre.heat);
    }
}
