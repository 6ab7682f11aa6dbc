//! Pressure, heat capacity and adiabatic gradient of the gas, with their slopes.
//!
//! Pressure and entropy are summed over electrons, ions, atoms, molecules, radiation and Coulomb forces; everything
//! else follows from their derivatives: `χ_ρ = ∂lnP/∂lnρ`, `χ_T = ∂lnP/∂lnT`, `δ = χ_T/χ_ρ`, `c_P = S_T − S_ρ δ`,
//! `∇_ad = −S_ρ/(χ_ρ c_P)` with `S_x = ∂S/∂ln x`.

use super::super::cgs::{ATOMIC_MASS, BOLTZMANN, PLANCK, RADIATION_DENSITY};
use super::super::composition::{Composition, HELIUM4_MASS, HYDROGEN_MASS, METAL_MASS};
use super::super::numbers::{Dual, Jet, Number};
use super::coulomb;
use super::electron_gas::ElectronGas;
use super::equilibrium::Neutral;
use super::ionisation::{Populations, Site, molecular_energy, molecular_partition};
use std::f64::consts::PI;

/// Bounds that keep slopes usable where the pressure-ionisation prescription is not quite consistent.
const LEAST_CHI_DENSITY: f64 = 0.02;
const LEAST_CHI_TEMPERATURE: f64 = 1e-6;
const LEAST_HEAT_CAPACITY: f64 = 1e5;
const GRADIENT_RANGE: [f64; 2] = [0.02, 0.45];
/// Particles rarer than this share of all ions add no entropy worth counting.
const RARE: f64 = 1e-13;

/// The gas at one density and temperature. Slopes are with respect to ln ρ and ln T.
#[derive(Clone, Copy, Debug, Default)]
pub(in super::super) struct Gas {
    /// ln pressure, erg cm⁻³.
    pub(in super::super) ln_pressure: Dual<2>,
    /// ∂lnP/∂lnρ.
    pub(in super::super) chi_density: Dual<2>,
    /// −∂lnρ/∂lnT at constant pressure.
    pub(in super::super) expansion: Dual<2>,
    /// Heat capacity at constant pressure, erg g⁻¹ K⁻¹.
    pub(in super::super) heat_capacity: Dual<2>,
    /// Adiabatic gradient dlnT/dlnP.
    pub(in super::super) adiabatic_gradient: Dual<2>,
    /// Free electrons, cm⁻³.
    pub(in super::super) electrons_per_cm3: Dual<2>,
    /// Electron degeneracy ψ.
    pub(in super::super) psi: Dual<2>,
    /// Degeneracy variable, from which the next solution starts.
    pub(in super::super) ln_f: Dual<2>,
}

/// Entropy density over k of `count` free particles per cm³ of given mass (units) and statistical weight.
#[inline]
fn translation<N: Number>(count: N, mass: f64, weight: N, phase_space: N) -> N {
    count * ((weight * (mass * mass.sqrt()) / count).ln() + phase_space + 2.5)
}

/// Pressure (erg cm⁻³) and entropy density (erg cm⁻³ K⁻¹) of all constituents together.
fn pressure_and_entropy<N: Number>(
    electrons: &ElectronGas<N>,
    particles: &Populations<N>,
    density: N,
    temperature: N,
    ln_temperature: N,
) -> (N, N) {
    let [protons, atoms, molecules] = particles.hydrogen;
    let [neutral, once, twice] = particles.helium;
    let ions = protons + atoms + molecules + neutral + once + twice + particles.metals;
    let (electron_pressure, electron_energy) = electrons.pressure_and_energy();
    let cube = temperature.square() * temperature * RADIATION_DENSITY;
    let ideal = ions * temperature * BOLTZMANN + electron_pressure + cube * temperature * (1.0 / 3.0);

    let phase_space = (ln_temperature + (2.0 * PI * ATOMIC_MASS * BOLTZMANN / (PLANCK * PLANCK)).ln()) * 1.5;
    let floor = ions.value() * RARE;
    let mut particles_entropy = electrons.psi() * electrons.density_per_cm3() * -1.0;
    let kinds = [
        (protons, HYDROGEN_MASS, 1.0),
        (atoms, HYDROGEN_MASS, 2.0),
        (neutral, HELIUM4_MASS, 1.0),
        (once, HELIUM4_MASS, 2.0),
        (twice, HELIUM4_MASS, 1.0),
        (particles.metals, METAL_MASS, 1.0),
    ];
    for (count, mass, weight) in kinds {
        if count.value() > floor {
            particles_entropy = particles_entropy + translation(count, mass, N::constant(weight), phase_space);
        }
    }
    if molecules.value() > floor {
        let moving = translation(molecules, 2.0 * HYDROGEN_MASS, molecular_partition(temperature), phase_space);
        particles_entropy = particles_entropy + moving + molecules * molecular_energy(temperature);
    }
    let (coulomb_pressure, coulomb_entropy) = coulomb::pressure_and_entropy(particles, density, temperature, ideal);
    let entropy = (electron_energy + electron_pressure) / temperature
        + particles_entropy * BOLTZMANN
        + cube * (4.0 / 3.0)
        + coulomb_entropy;
    (ideal + coulomb_pressure, entropy)
}

/// The gas of a composition at ln density (g cm⁻³) and ln temperature (K).
///
/// `ln_f_guess` is the degeneracy variable of a similar state. Nothing when no neutral state exists there.
pub(in super::super) fn gas(
    composition: &Composition,
    ln_density: f64,
    ln_temperature: f64,
    ln_f_guess: f64,
) -> Option<Gas> {
    let nuclei = composition.nuclei();
    let neutral = Neutral::find(nuclei, ln_density, ln_temperature, ln_f_guess)?;
    let ln_density = Jet::variable_x(ln_density);
    let ln_temperature = Jet::variable_y(ln_temperature);
    let (density, temperature) = (ln_density.exp(), ln_temperature.exp());
    let site = Site::new(nuclei, density, temperature);
    let (electrons, particles) = neutral.second_order(&site, temperature);
    let (pressure, entropy_density) =
        pressure_and_entropy(&electrons, &particles, density, temperature, ln_temperature);
    let entropy = entropy_density / density;
    let ln_pressure = pressure.ln();

    let chi_density = ln_pressure.derivative_x().at_least(LEAST_CHI_DENSITY);
    let expansion = ln_pressure.derivative_y().at_least(LEAST_CHI_TEMPERATURE) / chi_density;
    let by_density = entropy.derivative_x();
    let heat_capacity = (entropy.derivative_y() - by_density * expansion).at_least(LEAST_HEAT_CAPACITY);
    let gradient = -by_density / (chi_density * heat_capacity);
    let state = Gas {
        ln_pressure: ln_pressure.first_order(),
        chi_density,
        expansion,
        heat_capacity,
        adiabatic_gradient: gradient.at_least(GRADIENT_RANGE[0]).at_most(GRADIENT_RANGE[1]),
        electrons_per_cm3: electrons.density_per_cm3().first_order(),
        psi: electrons.psi().first_order(),
        ln_f: Dual { value: neutral.ln_f, slope: neutral.ln_f_slope },
    };
    state.ln_pressure.value.is_finite().then_some(state)
}

/// Only ln pressure (erg cm⁻³) of a composition at ln density (g cm⁻³) and ln temperature (K).
pub(in super::super) fn gas_pressure(
    composition: &Composition,
    ln_density: f64,
    ln_temperature: f64,
    ln_f_guess: f64,
) -> Option<f64> {
    let nuclei = composition.nuclei();
    let neutral = Neutral::find(nuclei, ln_density, ln_temperature, ln_f_guess)?;
    let constant = |ln: f64| Dual::<0>::constant(ln);
    let (density, temperature) = (constant(ln_density).exp(), constant(ln_temperature).exp());
    let electrons = ElectronGas::new(constant(neutral.ln_f), temperature);
    let particles = Site::new(nuclei, density, temperature).populations(electrons.psi());
    let (pressure, _) = pressure_and_entropy(&electrons, &particles, density, temperature, constant(ln_temperature));
    Some(pressure.value.ln())
}

#[cfg(test)]
mod tests {
    use super::*;

    const SOLAR: Composition = Composition { hydrogen: 0.711, helium3: 3e-5, metals: 0.0153 };

    /// States met in a red dwarf's life: photospheres, envelopes, burning cores, white-dwarf interiors.
    const VISITED: [[f64; 2]; 12] = [
        [1e-5, 2800.0],
        [1e-5, 4500.0],
        [1e-3, 6000.0],
        [1e-7, 9000.0],
        [0.1, 3e4],
        [1.0, 1e5],
        [10.0, 4e5],
        [150.0, 1.57e7],
        [400.0, 4.57e6],
        [1e3, 1e5],
        [3e4, 1e6],
        [1e5, 1e4],
    ];

    fn at(state: [f64; 2]) -> Gas {
        gas(&SOLAR, state[0].ln(), state[1].ln(), 0.0).expect("a state met in stars")
    }

    #[test]
    fn slopes_match_differences() {
        let h = 1e-5_f64;
        for [density, temperature] in VISITED {
            let here = at([density, temperature]);
            let pairs = [
                (at([density * h.exp(), temperature]), at([density * (-h).exp(), temperature]), 0),
                (at([density, temperature * h.exp()]), at([density, temperature * (-h).exp()]), 1),
            ];
            for (above, below, index) in pairs {
                let pick = |f: fn(&Gas) -> Dual<2>, name: &str| {
                    let difference = (f(&above).value - f(&below).value) / (2.0 * h);
                    let (slope, size) = (f(&here).slope[index], f(&here).value.abs());
                    assert!(
                        (slope - difference).abs() < 2e-4 * (size + difference.abs()),
                        "{name} at {density} {temperature}: {slope} {difference}"
                    );
                };
                pick(|g| g.ln_pressure, "pressure");
                pick(|g| g.expansion, "expansion");
                pick(|g| g.heat_capacity, "heat capacity");
                pick(|g| g.adiabatic_gradient, "gradient");
                pick(|g| g.psi, "degeneracy");
                pick(|g| g.ln_f, "ln f");
            }
        }
    }

    #[test]
    fn pressure_alone_agrees() {
        for [density, temperature] in VISITED {
            let alone = gas_pressure(&SOLAR, density.ln(), temperature.ln(), 0.0).expect("a state met in stars");
            assert!((alone - at([density, temperature]).ln_pressure.value).abs() < 1e-9);
        }
    }

    #[test]
    fn ideal_gas_and_cold_electrons_are_recovered() {
        // A thin hot plasma: P = ρkT/(μ mᵤ), ∇ad = 0.4.
        let thin = at([1e-4, 3e6]);
        let nuclei = SOLAR.nuclei();
        let per_unit = 2.0 * nuclei[0] + 3.0 * nuclei[1] + 9.0 * nuclei[2];
        let ideal = per_unit * 1e-4 / ATOMIC_MASS * BOLTZMANN * 3e6 + RADIATION_DENSITY * 3e6_f64.powi(4) / 3.0;
        assert!((thin.ln_pressure.value.exp() / ideal - 1.0).abs() < 2e-3);
        // Electrons at zero temperature give 1.54e21 at 1e5 g cm⁻³; Coulomb forces take a few per cent.
        let cold = at([1e5, 1e4]).ln_pressure.value.exp();
        assert!((cold / 1.5209e21 - 1.0).abs() < 2e-3, "{cold}");
        // Neutral warm gas between ionisation and dissociation: ∇ad between 0.1 and 0.4.
        let convective = at([1e-3, 6000.0]);
        assert!((convective.adiabatic_gradient.value - 0.156).abs() < 0.002);
    }

    #[test]
    fn no_step_where_the_gas_is_taken_as_stripped() {
        for [density, temperature] in [[1.0, 6e6], [100.0, 6e6], [300.0, 3e6], [300.0, 1e5]] {
            let below = at([density * 0.999_999, temperature * 0.999_999]);
            let above = at([density * 1.000_001, temperature * 1.000_001]);
            assert!((above.ln_pressure.value - below.ln_pressure.value).abs() < 2e-5);
            assert!((above.adiabatic_gradient.value - below.adiabatic_gradient.value).abs() < 1e-4);
        }
    }
}
