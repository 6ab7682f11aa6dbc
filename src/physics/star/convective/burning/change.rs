//! What burning leaves of the nuclei.

use super::super::composition::{Composition, HELIUM3_MASS, HELIUM4_MASS, HYDROGEN_MASS};
use super::rates::Rates;

/// Share of the metals that takes part in the CN cycle, by mass. *Common practice*: solar C, N and O.
pub(super) const CN_SHARE: f64 = 0.7;
/// Mass of ¹⁴N, atomic mass units.
pub(super) const NITROGEN_MASS: f64 = 14.0;
/// Backward-Euler steps within one time step.
const SUBSTEPS: u32 = 20;

/// ³He moles after a backward-Euler step.
///
/// `source` is moles at the start plus those made; the root is written without cancellation.
fn helium3_root(source: f64, pair: f64, linear: f64) -> f64 {
    2.0 * source / (linear + (linear * linear + 4.0 * pair * source).sqrt())
}

/// Composition after burning for `step_s` seconds at unchanging rates.
///
/// ³He is made by two protons (with d+p, three in all), lost in pairs and with ⁴He; each turn of the CN cycle takes
/// four protons.
pub(in super::super) fn burn(composition: &Composition, rates: &Rates<f64>, step_s: f64) -> Composition {
    let [proton_proton, helium_pair, helium_alpha, nitrogen] = *rates;
    let cycle = CN_SHARE * composition.metals / NITROGEN_MASS * nitrogen;
    let mut protons = composition.hydrogen / HYDROGEN_MASS;
    let mut light = composition.helium3 / HELIUM3_MASS;
    let mut alphas = composition.helium4() / HELIUM4_MASS;
    let h = step_s / f64::from(SUBSTEPS);
    for _ in 0..SUBSTEPS {
        let made = 0.5 * protons * protons * proton_proton;
        light = helium3_root(light + h * made, h * helium_pair, 1.0 + h * alphas * helium_alpha);
        let pairs = 0.5 * light * light * helium_pair;
        let with_alpha = light * alphas * helium_alpha;
        let turns = protons * cycle;
        let loss = 3.0 * made - 2.0 * pairs + with_alpha + 4.0 * turns;
        protons = if loss > 0.0 { protons / (1.0 + h * loss / protons.max(1e-30)) } else { protons - h * loss };
        alphas += h * (pairs + with_alpha + turns);
    }
    let hydrogen = protons.max(0.0) * HYDROGEN_MASS;
    let room = (1.0 - composition.metals - hydrogen).max(0.0);
    Composition { hydrogen, helium3: (light * HELIUM3_MASS).min(room), metals: composition.metals }
}

/// ³He mass fraction that one backward-Euler step of `step_s` seconds leaves, begun with `start` (mass fraction).
pub(in super::super) fn helium3_after(composition: &Composition, rates: &Rates<f64>, start: f64, step_s: f64) -> f64 {
    let protons = composition.hydrogen / HYDROGEN_MASS;
    let alphas = composition.helium4() / HELIUM4_MASS;
    let source = start / HELIUM3_MASS + step_s * 0.5 * protons * protons * rates[0];
    HELIUM3_MASS * helium3_root(source, step_s * rates[1], 1.0 + step_s * alphas * rates[2])
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn helium3_settles_where_it_is_made_as_fast_as_lost() {
        let start = Composition { hydrogen: 0.7, helium3: 0.0, metals: 0.0153 };
        let rates = [1e-18, 1e-10, 0.0, 0.0];
        let after = burn(&start, &rates, 1e17);
        // Made: y₁² r_pp / 2. Lost, two at a time: y₃² r₃₃.
        let balance = (after.hydrogen / HYDROGEN_MASS) * (0.5_f64 * rates[0] / rates[1]).sqrt() * HELIUM3_MASS;
        assert!((after.helium3 / balance - 1.0).abs() < 1e-2, "{after:?} {balance}");
    }

    #[test]
    fn nothing_burns_without_rates_and_hydrogen_never_turns_negative() {
        let start = Composition { hydrogen: 0.3, helium3: 0.01, metals: 0.0153 };
        let idle = burn(&start, &[0.0; 4], 1e20);
        assert!((idle.hydrogen - start.hydrogen).abs() < 1e-14 && (idle.helium3 - start.helium3).abs() < 1e-14);
        let exhausted = burn(&start, &[1e-10, 1e-5, 1e-8, 1e-5], 1e25);
        assert!(exhausted.hydrogen >= 0.0 && exhausted.hydrogen < 1e-6 && exhausted.helium3 >= 0.0);
    }
}
