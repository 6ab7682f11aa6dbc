//! The opacity that the structure equations see.

use super::super::calibration::MolecularOpacity;
use super::super::composition::Composition;
use super::super::numbers::{Dual, Number, smoothstep};
use super::conduction::conductive_opacity;
use super::radiative::RadiativeOpacity;
use std::f64::consts::LN_10;

/// The condensates' slope begins below this log T.
const CONDENSATES_BELOW: f64 = 3.46;
/// Conduction fades in between these log T.
const CONDUCTION_FADE: [f64; 2] = [3.9, 4.1];

/// Radiation and conduction together, for one metal mass fraction and one kind of surface.
#[derive(Clone, Debug)]
pub(in super::super) struct Opacity {
    radiative: RadiativeOpacity,
    molecular: MolecularOpacity,
}

impl Opacity {
    /// Joins the radiative tables with the calibration of the molecules.
    pub(in super::super) fn new(radiative: RadiativeOpacity, molecular: MolecularOpacity) -> Self {
        Self { radiative, molecular }
    }

    /// ln κ (cm² g⁻¹), slopes with respect to ln density (g cm⁻³) and ln temperature (K).
    pub(in super::super) fn ln_opacity(
        &self,
        composition: &Composition,
        ln_density: f64,
        ln_temperature: f64,
        electrons_per_cm3: Dual<2>,
    ) -> Dual<2> {
        let (log_t, log_density) = (ln_temperature / LN_10, ln_density / LN_10);
        let table = self.radiative.log_opacity(log_t, log_density - 3.0 * log_t + 18.0, composition.hydrogen);
        let radiative = Dual { value: table.value * LN_10, slope: [table.r, table.t - 3.0 * table.r] };
        let ln_t = Dual::variable(ln_temperature, 1);
        let radiative = radiative + self.molecular_factor(ln_t);
        if log_t <= CONDUCTION_FADE[0] {
            return radiative;
        }
        let conductive =
            conductive_opacity(composition, Dual::variable(ln_density, 0).exp(), ln_t.exp(), electrons_per_cm3);
        let share = fade(ln_t, CONDUCTION_FADE);
        // 1/κ = 1/κ_r + s/κ_c
        radiative - (radiative.exp() * share / conductive + 1.0).ln()
    }

    /// ln of the calibrated factor on molecular opacity.
    fn molecular_factor(&self, ln_temperature: Dual<2>) -> Dual<2> {
        let log_t = ln_temperature.value / LN_10;
        let [whole, gone] = self.molecular.fades;
        if log_t >= gone {
            return Dual::constant(0.0);
        }
        let share = fade(ln_temperature, [gone, whole]);
        let below = (-ln_temperature + CONDENSATES_BELOW * LN_10).at_least(0.0);
        share * (below * self.molecular.slope + self.molecular.factor.ln())
    }
}

/// Smooth rise from 0 at the first to 1 at the second log T.
fn fade(ln_temperature: Dual<2>, from_to: [f64; 2]) -> Dual<2> {
    let [from, to] = from_to;
    smoothstep((ln_temperature - from * LN_10) * (1.0 / ((to - from) * LN_10)))
}

#[cfg(test)]
mod tests {
    use super::super::super::calibration::MODERN_SURFACE;
    use super::super::super::gas::gas;
    use super::*;

    #[test]
    fn slopes_match_differences() {
        let opacity = Opacity::new(RadiativeOpacity::new(0.0153).expect("whole table"), MODERN_SURFACE);
        let composition = Composition { hydrogen: 0.5, helium3: 0.01, metals: 0.0153 };
        let at = |x: f64, y: f64| {
            let electrons = gas(&composition, x, y, 0.0).expect("a state met in stars").electrons_per_cm3;
            opacity.ln_opacity(&composition, x, y, electrons)
        };
        for [density, temperature] in
            [[1e-5, 2500.0], [1e-5, 4000.0], [1e-5, 9000.0], [1e3, 1.1e4], [400.0, 4e6], [1e5, 1e7], [1e-3, 1e5]]
        {
            let (x, y, h) = (f64::ln(density), f64::ln(temperature), 1e-5);
            let here = at(x, y);
            let by_density = (at(x + h, y).value - at(x - h, y).value) / (2.0 * h);
            let by_temperature = (at(x, y + h).value - at(x, y - h).value) / (2.0 * h);
            assert!((here.slope[0] - by_density).abs() < 1e-4, "{density} {temperature}: {here:?} {by_density}");
            assert!(
                (here.slope[1] - by_temperature).abs() < 1e-3,
                "{density} {temperature}: {here:?} {by_temperature}"
            );
        }
    }

    #[test]
    fn electrons_take_over_in_a_degenerate_core() {
        let composition = Composition { hydrogen: 0.0, helium3: 0.0, metals: 0.0153 };
        let opacity = Opacity::new(RadiativeOpacity::new(0.0153).expect("whole table"), MODERN_SURFACE);
        let electrons = gas(&composition, 1e5_f64.ln(), 1e7_f64.ln(), 0.0).expect("a degenerate core");
        let kappa = opacity.ln_opacity(&composition, 1e5_f64.ln(), 1e7_f64.ln(), electrons.electrons_per_cm3);
        assert!(kappa.value.exp() < 0.1, "{kappa:?}");
    }
}
