//! How many molecules, atoms, ions and free electrons there are.
//!
//! With the electrons' degeneracy ψ known, the Saha equations are explicit. Pressure ionisation is made smooth:
//! each binding energy fades as 1/(1+(ρ/ρₚ)²) and a term (ρ/ρₚ)⁴ is added to each ratio; a term (T/5·10⁵ K)⁶
//! completes ionisation on the hot side, so that the joint with the fully ionised gas shows no step.
//!
//! # Source
//! Saha equations and H₂ dissociation: *common practice*; the pressure ionisation is our own smooth prescription.
//! # Accuracy
//! Schematic where density ionises (1 g cm⁻³), about a thousandth of a star's mass.

use super::super::cgs::{ATOMIC_MASS, BOLTZMANN, PLANCK};
use super::super::composition::METAL_CHARGE;
use super::super::numbers::Number;
use std::f64::consts::PI;

/// Hydrogen, first and second helium ionisation energies over Boltzmann's constant, K.
const BINDING_K: [f64; 3] = [157_821.0, 285_335.0, 631_515.0];
/// Statistical weights: twice the ratio of the partition functions of upper and lower stage.
const WEIGHT: [f64; 3] = [0.5, 2.0, 0.5];
/// Densities at which pressure ionises each stage, g cm⁻³.
const PRESSURE_IONISED_G_CM3: [f64; 3] = [0.6, 3.0, 8.0];
/// Temperature of thermal completion, K.
const COMPLETE_K: f64 = 5e5;
/// H₂ dissociation energy over Boltzmann's constant, K.
const DISSOCIATION_K: f64 = 51_966.0;
/// H₂ rotation constant times symmetry number, and vibration temperature, K.
const ROTATION_K: f64 = 170.8;
const VIBRATION_K: f64 = 6332.0;
/// Density at which pressure breaks H₂, g cm⁻³.
const PRESSURE_DISSOCIATED_G_CM3: f64 = 0.15;
/// Above this no molecules are counted, K.
const NO_MOLECULES_K: f64 = 2e5;
/// Above this temperature (K) or density (g cm⁻³) the gas is taken as fully ionised; both sides agree to 10⁻⁶.
const STRIPPED_K: f64 = 6e6;
const STRIPPED_G_CM3: f64 = 300.0;
/// Mass of one hydrogen atom, g.
const HYDROGEN_ATOM_G: f64 = 1.6735e-24;

/// Everything about a place in the star that does not depend on the electrons' degeneracy.
#[derive(Clone, Copy, Debug)]
pub(super) struct Site<N> {
    /// Nuclei per cm³: hydrogen, helium, metals.
    nuclei: [N; 3],
    /// Electrons that metals of low ionisation energy always give, per cm³ (keeps cold gas solvable).
    residual: N,
    /// Fading of each binding energy.
    fading: [N; 3],
    /// Binding energy over kT of each stage.
    binding: [N; 3],
    /// Pressure and thermal completion added to each ratio.
    completion: [N; 3],
    /// 2/(equilibrium constant n₀²/n₂), cm³; none where no molecules are counted.
    molecular: Option<N>,
    /// Hot or dense enough to be taken as fully ionised.
    stripped: bool,
}

/// Particles per cm³.
#[derive(Clone, Copy, Debug)]
pub(super) struct Populations<N> {
    /// H⁺, H, H₂.
    pub(super) hydrogen: [N; 3],
    /// He, He⁺, He⁺⁺.
    pub(super) helium: [N; 3],
    /// Metal nuclei.
    pub(super) metals: N,
    /// Share of the metals' eight outer electrons taken as stripped (that of He⁺⁺).
    pub(super) metals_stripped: N,
    /// Free electrons.
    pub(super) electrons: N,
}

/// Partition function of H₂ rotation and vibration.
#[inline]
pub(super) fn molecular_partition<N: Number>(temperature_k: N) -> N {
    let vibration = temperature_k.recip() * -VIBRATION_K;
    temperature_k * (1.0 / ROTATION_K) / (-vibration.exp() + 1.0)
}

/// Internal energy of rotation and vibration per molecule over kT.
#[inline]
pub(super) fn molecular_energy<N: Number>(temperature_k: N) -> N {
    let u = temperature_k.recip() * VIBRATION_K;
    u / (u.exp() - 1.0) + 1.0
}

impl<N: Copy> Populations<N> {
    /// Every population joined with the same one of another set.
    #[inline]
    pub(super) fn join<M: Copy>(&self, other: &Populations<M>, f: impl Fn(N, M) -> N) -> Self {
        Self {
            hydrogen: std::array::from_fn(|i| f(self.hydrogen[i], other.hydrogen[i])),
            helium: std::array::from_fn(|i| f(self.helium[i], other.helium[i])),
            metals: self.metals,
            metals_stripped: f(self.metals_stripped, other.metals_stripped),
            electrons: f(self.electrons, other.electrons),
        }
    }
}

impl<N: Number> Site<N> {
    /// The site of given nuclei per atomic mass unit, density (g cm⁻³) and temperature (K).
    pub(super) fn new(nuclei_per_unit: [f64; 3], density_g_cm3: N, temperature_k: N) -> Self {
        let per_unit = density_g_cm3 * (1.0 / ATOMIC_MASS);
        let nuclei = nuclei_per_unit.map(|count| per_unit * count);
        let inverse_temperature = temperature_k.recip();
        let thermal = {
            let cube = (temperature_k * (1.0 / COMPLETE_K)).square() * temperature_k * (1.0 / COMPLETE_K);
            cube.square()
        };
        let squeezed = PRESSURE_IONISED_G_CM3.map(|limit| (density_g_cm3 * (1.0 / limit)).square());
        Self {
            nuclei,
            residual: nuclei[0] * 1e-7 + per_unit * 1e-9,
            fading: squeezed.map(|s| (s + 1.0).recip()),
            binding: BINDING_K.map(|energy| inverse_temperature * -energy),
            completion: squeezed.map(|s| s.square() + thermal),
            molecular: (temperature_k.value() < NO_MOLECULES_K)
                .then(|| molecular_constant(density_g_cm3, temperature_k)),
            stripped: temperature_k.value() > STRIPPED_K || density_g_cm3.value() > STRIPPED_G_CM3,
        }
    }

    /// The particles in equilibrium with electrons of degeneracy ψ.
    pub(super) fn populations(&self, psi: N) -> Populations<N> {
        if self.stripped {
            return self.fully_ionised();
        }
        let ratio = |stage: usize| {
            let exponent = (self.binding[stage] - psi) * self.fading[stage];
            exponent.at_most(60.0).exp() * WEIGHT[stage] + self.completion[stage]
        };
        let [hydrogen, helium, metals] = self.nuclei;
        let protons_per_atom = ratio(0);
        let one = protons_per_atom + 1.0;
        let (atoms, molecules) = match self.molecular {
            Some(q) if hydrogen.value() > 0.0 => {
                let atoms = hydrogen * 2.0 / (one + (one.square() + q * hydrogen * 4.0).sqrt());
                (atoms, atoms.square() * q * 0.5)
            }
            _ => (hydrogen / one, N::constant(0.0)),
        };
        let protons = protons_per_atom * atoms;
        let (first, second) = (ratio(1), ratio(2));
        let once_per_atom = first;
        let twice_per_atom = first * second;
        let share = (once_per_atom + twice_per_atom + 1.0).recip();
        let (once, twice) = (once_per_atom * share, twice_per_atom * share);
        let helium_atoms = [helium * share, helium * once, helium * twice];
        let metal_electrons = metals * METAL_CHARGE * (once * 0.25 + twice);
        Populations {
            hydrogen: [protons, atoms, molecules],
            helium: helium_atoms,
            metals,
            metals_stripped: twice,
            electrons: protons + helium_atoms[1] + helium_atoms[2] * 2.0 + metal_electrons + self.residual,
        }
    }

    /// The particles of a fully ionised gas.
    fn fully_ionised(&self) -> Populations<N> {
        let [hydrogen, helium, metals] = self.nuclei;
        let none = N::constant(0.0);
        Populations {
            hydrogen: [hydrogen, none, none],
            helium: [none, none, helium],
            metals,
            metals_stripped: N::constant(1.0),
            electrons: hydrogen + helium * 2.0 + metals * METAL_CHARGE,
        }
    }
}

/// 2 n₂/n₀² of molecular equilibrium, cm³.
fn molecular_constant<N: Number>(density_g_cm3: N, temperature_k: N) -> N {
    let squeezed = (density_g_cm3 * (1.0 / PRESSURE_DISSOCIATED_G_CM3)).square();
    let phase = temperature_k * (PI * HYDROGEN_ATOM_G * BOLTZMANN / (PLANCK * PLANCK));
    let bound = (temperature_k.recip() * DISSOCIATION_K / (squeezed + 1.0)).at_most(650.0);
    let per_state = bound.exp() * molecular_partition(temperature_k) * 0.25 / (phase * phase.sqrt());
    per_state * 2.0 / (squeezed.square() * 1e3 + 1.0)
}
