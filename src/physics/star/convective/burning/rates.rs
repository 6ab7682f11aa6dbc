//! Reaction rates of the proton–proton chains and of the slowest step of the CN cycle.
//!
//! # Source
//! Caughlan & Fowler 1988, At. Data Nucl. Data Tables 40, 283 (coefficients *from memory*); ¹⁴N(p,γ) at half its rate
//! as later measured (LUNA, Formicola et al. 2004, Phys. Lett. B 591, 61). All rates times the calibrated 0.90.

use super::super::calibration::RATE_FACTOR;
use super::super::composition::Composition;
use super::super::numbers::{Dual, Number};
use super::screening::Screening;

/// Number of reactions followed.
pub(in super::super) const REACTIONS: usize = 4;

/// `ρ N_A⟨σv⟩` (s⁻¹ mol⁻¹ g) of p+p, ³He+³He, ³He+⁴He and ¹⁴N+p.
pub(in super::super) type Rates<N> = [N; REACTIONS];

/// Sharpness with which the CN cycle's temperature levels off at a ceiling.
const CEILING_SHARPNESS: i32 = 20;

/// A temperature that levels off at a ceiling: T/(1 + (T/T₀)²⁰)^(1/20).
fn level_off(temperature: Dual<2>, ceiling_k: f64) -> Dual<2> {
    let sharpness = f64::from(CEILING_SHARPNESS);
    let relative = temperature * ceiling_k.recip();
    let power = relative.value.powi(CEILING_SHARPNESS);
    let value = temperature.value * (1.0 + power).powf(-sharpness.recip());
    temperature.chain(value, value / (temperature.value * (1.0 + power)), 0.0)
}

/// Rates at one place; `psi` is the electrons' degeneracy, `cn_ceiling_k` the highest temperature the CN cycle feels.
pub(super) fn rates(
    composition: &Composition,
    density: Dual<2>,
    temperature: Dual<2>,
    psi: Dual<2>,
    cn_ceiling_k: Option<f64>,
) -> Rates<Dual<2>> {
    let t9 = temperature * 1e-9;
    let third = t9.cbrt();
    let inverse_third = third.recip();
    let two_thirds = third.square();
    let inverse_two_thirds = inverse_third.square();
    let four_thirds = t9 * third;
    let five_thirds = t9 * two_thirds;

    let proton_proton = (inverse_third * -3.380).exp()
        * 4.01e-15
        * inverse_two_thirds
        * (third * 0.123 + two_thirds * 1.09 + t9 * 0.938 + 1.0);
    let helium_pair = (inverse_third * -12.276).exp()
        * 6.04e10
        * inverse_two_thirds
        * (third * 0.034 - two_thirds * 0.522 - t9 * 0.124 + four_thirds * 0.353 + five_thirds * 0.213 + 1.0);
    let reduced = t9 / (t9 * 4.95e-2 + 1.0);
    let reduced_third = reduced.cbrt();
    let reduced_five_sixths = reduced_third.square() * reduced_third.sqrt();
    let helium_alpha = (reduced_third.recip() * -12.826).exp() * 5.61e6 * reduced_five_sixths / (t9 * t9.sqrt());
    let nitrogen = nitrogen(cn_ceiling_k.map_or(temperature, |ceiling_k| level_off(temperature, ceiling_k)) * 1e-9);

    let screening = Screening::new(composition, density, temperature, psi);
    let scale = density * RATE_FACTOR;
    let helium_factor = scale * screening.factor(4.0, 3.729_764_191_286_187);
    [
        proton_proton * scale * screening.factor(1.0, 1.174_802_103_936_399),
        helium_pair * helium_factor,
        helium_alpha * helium_factor,
        nitrogen * scale * screening.factor(7.0, 5.384_860_029_839_203),
    ]
}

/// `N_A⟨σv⟩` of ¹⁴N+p without screening, at a temperature in 10⁹ K.
fn nitrogen(t9: Dual<2>) -> Dual<2> {
    let third = t9.cbrt();
    let inverse_third = third.recip();
    let two_thirds = third.square();
    (inverse_third * -15.228 - (t9 * (1.0 / 3.294)).square()).exp()
        * (0.5 * 4.90e7)
        * inverse_third.square()
        * (third * 0.027 - two_thirds * 0.778 - t9 * 0.149 + t9 * third * 0.261 + t9 * two_thirds * 0.127 + 1.0)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn below_the_ceiling_nothing_changes_and_above_it_little() {
        let at = |kelvin: f64| level_off(Dual { value: kelvin, slope: [0.0, kelvin] }, 2.8e7);
        assert!((at(1.5e7).value / 1.5e7 - 1.0).abs() < 1e-6);
        assert!((at(9e7).value / 2.8e7 - 1.0).abs() < 1e-6 && at(9e7).slope[1] < 1e-3 * 2.8e7);
        let (h, here) = (1e-6_f64, at(2.7e7));
        let difference = (at(2.7e7 * h.exp()).value - at(2.7e7 * (-h).exp()).value) / (2.0 * h);
        assert!((here.slope[1] / difference - 1.0).abs() < 1e-6);
    }
}
