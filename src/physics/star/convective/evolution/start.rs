//! The young star with which a life begins.

use super::super::cgs::SOLAR_MASS;
use super::super::composition::Composition;
use super::super::matter::Microphysics;
use super::super::structure::{Isentrope, Mesh, Model, Past};

/// Central density (g cm⁻³) and temperature (K) on the main sequence at 0.1 solar masses.
const MAIN_SEQUENCE: [f64; 2] = [400.0, 4.6e6];
/// Powers of mass with which they change.
const MASS_POWERS: [f64; 2] = [-1.3, 0.33];
/// Central density of the young star over that on the main sequence: its radius is some nine times larger.
const EXPANDED: f64 = 1.5e-3;
/// First step, of the thermal time.
const FIRST_STEP: f64 = 0.02;
/// Newton iterations granted to the first structure.
const FIRST_ITERATIONS: usize = 80;

/// A star of this composition contracting from some nine times its later size, relaxed on the mesh.
///
/// Nothing if no such star is found.
pub(in super::super) fn contracting_star(laws: &Microphysics, mesh: &Mesh, composition: Composition) -> Option<Model> {
    let relative = mesh.star_g / SOLAR_MASS / 0.1;
    let density = MAIN_SEQUENCE[0] * relative.powf(MASS_POWERS[0]) * EXPANDED;
    let temperature = MAIN_SEQUENCE[1] * relative.powf(MASS_POWERS[1]) * EXPANDED.cbrt();
    let star = [1.0, 0.8, 1.25]
        .into_iter()
        .find_map(|factor| Isentrope::of_mass(laws, &composition, mesh.star_g, density, factor * temperature))?;
    let mut model = Model::from_isentrope(mesh, &star, composition);
    model.settle(laws)?;
    let ln_temperature: Vec<f64> = model.unknowns.iter().map(|point| point[1]).collect();
    let ln_pressure: Vec<f64> = model.settled.iter().map(|point| point.ln_pressure).collect();
    let past = Past {
        step_s: FIRST_STEP * model.thermal_time_s(mesh),
        ln_temperature: &ln_temperature,
        ln_pressure: &ln_pressure,
    };
    model.relax(laws, mesh, &past, FIRST_ITERATIONS)?;
    Some(model)
}
