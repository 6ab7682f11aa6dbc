//! How steeply temperature falls outwards.
//!
//! Where the radiative gradient ∇_r exceeds the adiabatic ∇_ad (Schwarzschild), gas rises and sinks. With
//! `U = 3acT³/(c_P ρ² κ l²) √(8 H_P/(g δ))`, `l = α H_P`, and `ξ = s + U`, the gradient `∇ = ∇_ad + s² + 2Us` solves
//! `(ξ − U)³ + (8U/9)(ξ² − U² − (∇_r − ∇_ad)) = 0`.
//!
//! # Source
//! Kippenhahn, Weigert & Weiss 2012, *Stellar Structure and Evolution*, section 7.2 (Böhm-Vitense 1958).
//! # Accuracy
//! The corner where convection sets in is rounded over 0.01 in gradient, without which Newton's method cycles. Scale
//! heights larger than the radius are cut to the radius.

use super::super::calibration::MIXING_LENGTH;
use super::super::cgs::{GRAVITATION, LIGHT_SPEED, RADIATION_DENSITY};
use super::super::matter::Matter;
use super::super::numbers::{Dual, Number};
use std::f64::consts::PI;

/// Width of the rounded corner, in gradient.
const ROUNDING: f64 = 0.01;

/// Temperature gradient dlnT/dlnP at one place; slopes with ln ρ, ln T, ln r and the luminosity variable.
#[derive(Clone, Copy, Debug)]
pub(super) struct Gradient {
    /// That of the star.
    pub(super) actual: Dual<4>,
    /// That needed to carry everything by radiation.
    pub(super) radiative: Dual<4>,
}

/// The excess s of ξ over U: s³ + a s² + 2aU s − aD = 0 with a = 8U/9.
///
/// The left side grows and bends upwards, so Newton's method from above falls straight to the root.
fn excess(velocity_loss: f64, drive: f64) -> f64 {
    let a = 8.0 / 9.0 * velocity_loss;
    let mut s = (a * drive).cbrt().min(drive.sqrt()).min(0.5 * drive / velocity_loss);
    for _ in 0..60 {
        let value = ((s + a) * s + 2.0 * a * velocity_loss) * s - a * drive;
        let slope = (3.0 * s + 2.0 * a) * s + 2.0 * a * velocity_loss;
        let step = value / slope;
        s -= step;
        if step.abs() <= 1e-13 * s {
            break;
        }
    }
    s
}

/// Superadiabatic excess ∇ − ∇_ad for U and D = ∇_r − ∇_ad, with slopes from the implicit equation.
fn superadiabaticity(u: Dual<4>, drive: Dual<4>) -> Dual<4> {
    let s = excess(u.value, drive.value);
    let a = 8.0 / 9.0 * u.value;
    let by_s = (3.0 * s + 2.0 * a) * s + 2.0 * a * u.value;
    let by_u = 8.0 / 9.0 * (s * s + 4.0 * u.value * s - drive.value);
    let root = Dual { value: s, slope: std::array::from_fn(|i| (a * drive.slope[i] - by_u * u.slope[i]) / by_s) };
    root * (root + u * 2.0)
}

/// Gradient at ln ρ, ln T, ln r and luminosity `unit` × l (erg s⁻¹), with mass `inside_g` inside.
pub(super) fn gradient(matter: &Matter, unknowns: &[f64; 4], unit: f64, inside_g: f64) -> Gradient {
    let gas = &matter.gas;
    let [ln_density, ln_temperature] = [Dual::variable(unknowns[0], 0), Dual::variable(unknowns[1], 1)];
    let ln_radius = Dual::variable(unknowns[2], 2);
    let ln_opacity = matter.ln_opacity.widen();
    let ln_pressure = gas.ln_pressure.widen();
    let luminosity = Dual::variable(unknowns[3], 3) * unit;

    let flux = 3.0 / (16.0 * PI * RADIATION_DENSITY * LIGHT_SPEED * GRAVITATION * inside_g);
    let radiative = (ln_opacity + ln_pressure - ln_temperature * 4.0).exp() * luminosity * flux;
    let adiabatic = gas.adiabatic_gradient.widen();
    let drive = radiative - adiabatic;
    let corner = (drive.square() + ROUNDING * ROUNDING).sqrt();
    if drive.value <= 0.0 {
        return Gradient { actual: radiative - (corner + drive) * 0.5, radiative };
    }
    let ln_gravity = ln_radius * -2.0 + (GRAVITATION * inside_g).ln();
    let free_height = ln_pressure - ln_density - ln_gravity;
    let ln_height = if free_height.value < unknowns[2] { free_height } else { ln_radius };
    let ln_loss = ln_temperature * 3.0
        - gas.heat_capacity.widen().ln()
        - ln_density * 2.0
        - ln_opacity
        - ln_height * 1.5
        - (ln_gravity + gas.expansion.widen().ln()) * 0.5
        + (3.0 * RADIATION_DENSITY * LIGHT_SPEED * 8_f64.sqrt() / (MIXING_LENGTH * MIXING_LENGTH)).ln();
    let actual = adiabatic + superadiabaticity(ln_loss.exp(), drive) - (corner - drive) * 0.5;
    Gradient { actual, radiative }
}

#[cfg(test)]
mod tests {
    use super::super::super::burning::Helium3;
    use super::super::super::calibration::MODERN_SURFACE;
    use super::super::super::composition::Composition;
    use super::super::super::matter::Microphysics;
    use super::super::super::opacity::{Opacity, RadiativeOpacity};
    use super::*;

    #[test]
    fn the_cubic_is_solved_from_efficient_to_useless_convection() {
        for u in [1e-9, 1e-4, 1e-2, 1.0, 1e3, 1e9] {
            for drive in [1e-12, 1e-3, 0.3, 20.0, 1e5] {
                let s = excess(u, drive);
                let a = 8.0 / 9.0 * u;
                let terms = [s * s * s, a * s * s, 2.0 * a * u * s];
                let left: f64 = terms.iter().sum();
                assert!((left / (a * drive) - 1.0).abs() < 1e-10, "{u} {drive}");
            }
        }
    }

    #[test]
    fn efficient_convection_is_adiabatic_and_useless_convection_radiative() {
        let at = |u: f64, drive: f64| superadiabaticity(Dual::constant(u), Dual::constant(drive)).value;
        assert!(at(1e-9, 1.0) < 1e-5);
        assert!((at(1e6, 1.0) - 1.0).abs() < 1e-5);
    }

    #[test]
    fn slopes_match_differences() {
        let composition = Composition { hydrogen: 0.711, helium3: 3e-5, metals: 0.0153 };
        let opacity = Opacity::new(RadiativeOpacity::new(0.0153).expect("whole table"), MODERN_SURFACE);
        let laws = Microphysics { opacity, cn_ceiling_k: None };
        let at = |y: [f64; 4]| {
            let matter = Matter::at(&laws, &composition, Helium3::Given, [y[0], y[1]], 0.0).expect("a state");
            gradient(&matter, &y, 3.8e30, 2e32).actual
        };
        let r = 8.6e9_f64.ln();
        for y in [
            [1e-5_f64.ln(), 2900_f64.ln(), r, 1.0],
            [1e-4_f64.ln(), 4000_f64.ln(), r, 1.0],
            [1.0_f64.ln(), 1e5_f64.ln(), r - 0.01, 1.0],
            [300_f64.ln(), 4e6_f64.ln(), r - 3.0, 0.01],
        ] {
            let here = at(y);
            for i in 0..4 {
                let h = 1e-5;
                let (mut up, mut down) = (y, y);
                up[i] += h;
                down[i] -= h;
                let difference = (at(up).value - at(down).value) / (2.0 * h);
                assert!(
                    (here.slope[i] - difference).abs() < 2e-3 * (0.1 + difference.abs()),
                    "{y:?} {i}: {} {difference}",
                    here.slope[i]
                );
            }
        }
    }
}
