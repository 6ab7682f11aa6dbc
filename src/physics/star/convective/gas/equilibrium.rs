//! The electron degeneracy at which the gas is neutral.

use super::super::numbers::{Dual, Jet, Number};
use super::electron_gas::ElectronGas;
use super::ionisation::{Populations, Site};

/// Widest range of ln f that is searched.
const LN_F_RANGE: [f64; 2] = [-200.0, 60.0];
/// Charge imbalance below which one last Newton step is exact to rounding.
const BALANCED: f64 = 1e-6;
/// Largest change of ln f in one step.
const LARGEST_STEP: f64 = 5.0;

/// The neutral state at one density and temperature, with first derivatives.
///
/// The three variables of its derivatives are ln f, ln ρ and ln T.
pub(super) struct Neutral {
    /// Degeneracy variable.
    pub(super) ln_f: f64,
    /// Its change with ln ρ and ln T along neutrality.
    pub(super) ln_f_slope: [f64; 2],
    /// Slope of the logarithmic charge imbalance with ln f.
    imbalance_slope: f64,
    populations: Populations<Dual<3>>,
}

impl Neutral {
    /// Finds ln f for nuclei per atomic mass unit, ln density (g cm⁻³) and ln temperature (K), from a first guess.
    ///
    /// Newton's method, bisecting whenever a step would leave the bracket. Nothing when no neutral state exists.
    pub(super) fn find(nuclei: [f64; 3], ln_density: f64, ln_temperature: f64, guess: f64) -> Option<Self> {
        let density = Dual::variable(ln_density, 1).exp();
        let temperature = Dual::variable(ln_temperature, 2).exp();
        let site = Site::new(nuclei, density, temperature);
        let [mut low, mut high] = LN_F_RANGE;
        let mut ln_f = guess.clamp(low, high);
        for _ in 0..100 {
            let electrons = ElectronGas::new(Dual::variable(ln_f, 0), temperature);
            let populations = site.populations(electrons.psi());
            let imbalance = (electrons.density_per_cm3() / populations.electrons).ln();
            let [slope, by_density, by_temperature] = imbalance.slope;
            if !imbalance.value.is_finite() || !slope.is_finite() || slope <= 0.0 {
                return None;
            }
            let step = -imbalance.value / slope;
            if imbalance.value.abs() < BALANCED {
                return Some(Self {
                    ln_f: ln_f + step,
                    ln_f_slope: [-by_density / slope, -by_temperature / slope],
                    imbalance_slope: slope,
                    populations,
                });
            }
            if imbalance.value > 0.0 {
                high = ln_f;
            } else {
                low = ln_f;
            }
            ln_f += step.clamp(-LARGEST_STEP, LARGEST_STEP);
            if ln_f <= low || ln_f >= high {
                ln_f = 0.5 * (low + high);
            }
        }
        None
    }

    /// The electrons and the particles with first and second derivatives along neutrality.
    ///
    /// The first derivatives of ln f are known, so the imbalance that is left is of second order; removing it with
    /// the known slope gives the second derivatives of ln f and of every population.
    pub(super) fn second_order(&self, site: &Site<Jet>, temperature: Jet) -> (ElectronGas<Jet>, Populations<Jet>) {
        let [x, y] = self.ln_f_slope;
        let first = Jet { x, y, ..Jet::constant(self.ln_f) };
        let trial = ElectronGas::new(first, temperature);
        let populations = site.populations(trial.psi());
        let left = (trial.density_per_cm3() / populations.electrons).ln();
        let correction = left * -self.imbalance_slope.recip();
        let ln_f = first + correction;
        let exact = populations.join(&self.populations, |jet, dual| jet + correction * dual.slope[0]);
        (ElectronGas::new(ln_f, temperature), exact)
    }
}
