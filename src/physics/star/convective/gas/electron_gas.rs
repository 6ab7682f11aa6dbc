//! Pressure and energy of electrons at any degeneracy and any speed.
//!
//! With β = kT/mc², g = β√(1+f) and ψ = 2√(1+f) + ln[f/(√(1+f)+1)²], every Fermi integral is
//! f/(1+f) · [powers of g and 1+g] · Σ aᵢⱼ gⁱ fʲ / [(1+f)(1+g)]³.
//!
//! # Source
//! Eggleton, Faulkner & Flannery 1973, A&A 23, 325 (fourth-order fit).
//! # Accuracy
//! 0.25 % for β 10⁻⁶–0.1, f 10⁻⁴–10⁵, by our own quadrature of the Fermi integrals (see the test).

use super::super::cgs::{BOLTZMANN, ELECTRON_REST_ENERGY, ELECTRON_STATES};
use super::super::numbers::{Dual, Number, Partials};

type Coefficients = [[f64; 4]; 4];

/// Rows: power of g; columns: power of f.
const DENSITY: Coefficients = [
    [2.315_472, 7.128_660, 7.504_998, 2.665_350],
    [7.837_752, 23.507_934, 23.311_317, 7.987_465],
    [9.215_560, 26.834_068, 25.082_745, 8.020_509],
    [3.693_280, 10.333_176, 9.168_960, 2.668_248],
];
const PRESSURE: Coefficients = [
    [2.315_472, 6.748_104, 6.564_912, 2.132_280],
    [7.837_752, 21.439_740, 19.080_088, 5.478_100],
    [9.215_560, 23.551_504, 19.015_888, 4.679_944],
    [3.693_280, 8.859_868, 6.500_712, 1.334_124],
];
const ENERGY: Coefficients = [
    [3.473_208, 10.122_156, 9.847_368, 3.198_420],
    [16.121_172, 43.477_194, 37.852_852, 10.496_830],
    [23.971_040, 60.392_810, 47.782_844, 11.361_074],
    [11.079_840, 26.579_604, 19.501_136, 4.002_372],
];

/// The double polynomial in f and g, with its partial derivatives (a = f, b = g).
#[inline]
fn polynomial<N: Number>(coefficients: &Coefficients, f: N, g: N) -> N {
    let (fv, gv) = (f.value(), g.value());
    let mut p = Partials { value: 0.0, a: 0.0, b: 0.0, aa: 0.0, ab: 0.0, bb: 0.0 };
    for row in coefficients.iter().rev() {
        let value = row[0] + fv * (row[1] + fv * (row[2] + fv * row[3]));
        let first = row[1] + fv * (2.0 * row[2] + 3.0 * fv * row[3]);
        let second = 2.0 * row[2] + 6.0 * fv * row[3];
        p.bb = p.bb * gv + 2.0 * p.b;
        p.ab = p.ab * gv + p.a;
        p.aa = p.aa * gv + second;
        p.b = p.b * gv + p.value;
        p.a = p.a * gv + first;
        p.value = p.value * gv + value;
    }
    f.chain_two(g, &p)
}

/// Free electrons per cm³ whose degeneracy variable is given by its logarithm, at a temperature (K).
pub(in super::super) fn electrons_per_cm3(ln_f: f64, temperature_k: f64) -> f64 {
    let [ln_f, temperature_k] = [ln_f, temperature_k].map(Dual::<1>::constant);
    ElectronGas::new(ln_f, temperature_k).density_per_cm3().value
}

/// The electron gas at one degeneracy and temperature.
#[derive(Clone, Copy, Debug)]
pub(in super::super) struct ElectronGas<N> {
    f: N,
    root: N,
    g: N,
    /// f/(1+f) / [(1+f)(1+g)]³.
    common: N,
    ln_f: N,
}

impl<N: Number> ElectronGas<N> {
    /// The gas whose degeneracy variable f and temperature are given by their logarithms.
    #[inline]
    pub(in super::super) fn new(ln_f: N, temperature_k: N) -> Self {
        let f = ln_f.exp();
        let one_f = f + 1.0;
        let root = one_f.sqrt();
        let g = root * temperature_k * (BOLTZMANN / ELECTRON_REST_ENERGY);
        let denominator = one_f * (g + 1.0);
        let common = f / (one_f * denominator * denominator.square());
        Self { f, root, g, common, ln_f }
    }

    /// Degeneracy parameter ψ = chemical potential / kT (without rest energy).
    #[inline]
    pub(in super::super) fn psi(&self) -> N {
        self.root * 2.0 + self.ln_f - (self.root + 1.0).ln() * 2.0
    }

    /// Electrons per cm³.
    #[inline]
    pub(in super::super) fn density_per_cm3(&self) -> N {
        let q = self.g * (self.g + 1.0);
        self.common * q * q.sqrt() * polynomial(&DENSITY, self.f, self.g) * ELECTRON_STATES
    }

    /// Pressure and kinetic energy density, erg cm⁻³.
    #[inline]
    pub(in super::super) fn pressure_and_energy(&self) -> (N, N) {
        let q = self.g * (self.g + 1.0);
        let scale = self.common * q * q.sqrt() * self.g * (ELECTRON_STATES * ELECTRON_REST_ENERGY);
        (scale * polynomial(&PRESSURE, self.f, self.g), scale * polynomial(&ENERGY, self.f, self.g))
    }
}

#[cfg(test)]
mod tests {
    use super::super::super::numbers::Jet;
    use super::*;

    /// Fermi integrals by the trapezium rule in a variable that crowds points at the Fermi edge:
    /// number, pressure and energy in units of 8π/λ³ and mc².
    fn quadrature(psi: f64, beta: f64) -> [f64; 3] {
        let top = (psi.max(0.0) + 60.0) * beta;
        let steps = 200_000;
        let mut sums = [0.0; 3];
        for i in 1..steps {
            // Kinetic energy e = top·u², so that √e is smooth at zero.
            let u = f64::from(i) / f64::from(steps);
            let (e, weight) = (top * u * u, 2.0 * top * u / f64::from(steps));
            let momentum = (e * (e + 2.0)).sqrt();
            let occupied = 1.0 / ((e / beta - psi).exp() + 1.0);
            sums[0] += weight * occupied * momentum * (e + 1.0);
            sums[1] += weight * occupied * momentum.powi(3) / 3.0;
            sums[2] += weight * occupied * momentum * (e + 1.0) * e;
        }
        sums
    }

    #[test]
    fn fit_matches_fermi_integrals() {
        for beta in [1e-6_f64, 1e-4, 1e-3, 1e-2, 0.1] {
            for ln_f in [-9.2_f64, -4.0, -1.0, 0.0, 1.0, 3.0, 6.0, 11.5] {
                let temperature = beta * ELECTRON_REST_ENERGY / BOLTZMANN;
                let gas = ElectronGas::new(Jet::constant(ln_f), Jet::constant(temperature));
                let (pressure, energy) = gas.pressure_and_energy();
                let exact = quadrature(gas.psi().value, beta);
                let ours = [
                    gas.density_per_cm3().value / ELECTRON_STATES,
                    pressure.value / (ELECTRON_STATES * ELECTRON_REST_ENERGY),
                    energy.value / (ELECTRON_STATES * ELECTRON_REST_ENERGY),
                ];
                for (fit, integral) in ours.iter().zip(exact) {
                    assert!((fit / integral - 1.0).abs() < 0.0025, "beta {beta} ln f {ln_f}: {fit} {integral}");
                }
            }
        }
    }
}
