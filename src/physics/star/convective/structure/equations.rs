//! The structure equations between neighbouring points, and their slopes.
//!
//! With ln means between two points k and k+1 and Δm between them:
//! - balance: Δ ln P + G m Δm/(4π r⁴ P) = 0
//! - mass: (r'³ − r³)/r̄³ − 3Δm/(4π ρ r̄³) = 0
//! - temperature: Δ ln T − ∇ Δ ln P = 0
//! - energy: Δl − ε Δm = 0 with `ε = ε_nuclear − c_P T [d ln T − ∇_ad d ln P]/dt`
//!
//! At the centre r³ = 3m/(4πρ) and l = εm; at the surface L = 4πR²σT⁴ and P = (2/3) g/κ.

use super::super::cgs::{GRAVITATION, STEFAN_BOLTZMANN};
use super::super::matter::Matter;
use super::super::numbers::{Dual, Number};
use super::banded::Banded;
use super::mesh::Mesh;
use super::mixing_length::{Gradient, gradient};
use super::model::Unknowns;
use super::relaxation::Past;
use std::f64::consts::PI;

/// One point with everything that enters the equations.
#[derive(Clone, Copy, Debug)]
pub(super) struct Point {
    pub(super) unknowns: Unknowns,
    pub(super) matter: Matter,
    pub(super) gradient: Gradient,
    /// ε, erg g⁻¹ s⁻¹.
    heat: Dual<2>,
}

impl Point {
    /// Point number `k` of a mesh, its matter already worked out.
    pub(super) fn new(mesh: &Mesh, k: usize, unknowns: Unknowns, unit: f64, matter: &Matter, past: &Past) -> Self {
        let gas = &matter.gas;
        let ln_temperature = Dual::variable(unknowns[1], 1);
        let warming =
            ln_temperature - past.ln_temperature[k] - gas.adiabatic_gradient * (gas.ln_pressure - past.ln_pressure[k]);
        let stored = gas.heat_capacity * ln_temperature.exp() * warming * past.step_s.recip();
        Self {
            gradient: gradient(matter, &unknowns, unit, mesh.inside_g[k]),
            heat: matter.burning.heat - stored,
            unknowns,
            matter: *matter,
        }
    }
}

/// Writes all equations, linearised about the points, into an emptied system for the corrections.
pub(super) fn write(system: &mut Banded, mesh: &Mesh, points: &[Point], unit: f64) {
    let centre = &points[0];
    let inner = mesh.inside_g[0] / unit;
    let [ln_density, _, ln_radius, luminosity] = centre.unknowns;
    system.set_right(0, -(3.0 * ln_radius + ln_density - (3.0 * mesh.inside_g[0] / (4.0 * PI)).ln()));
    system.add(0, 0, 1.0);
    system.add(0, 2, 3.0);
    system.set_right(1, -(luminosity - inner * centre.heat.value));
    system.add(1, 0, -inner * centre.heat.slope[0]);
    system.add(1, 1, -inner * centre.heat.slope[1]);
    system.add(1, 3, 1.0);

    for (k, pair) in points.windows(2).enumerate() {
        write_shell(system, mesh, k, [&pair[0], &pair[1]], unit);
    }

    let last = points.len() - 1;
    write_surface(system, &points[last], 4 * last, unit, mesh.star_g);
}

fn write_shell(system: &mut Banded, mesh: &Mesh, k: usize, [a, b]: [&Point; 2], unit: f64) {
    let (row, left, right) = (2 + 4 * k, 4 * k, 4 * k + 4);
    let shell = mesh.shell_g[k];
    let inside = 0.5 * (mesh.inside_g[k] + mesh.inside_g[k + 1]);
    let (pa, pb) = (a.matter.gas.ln_pressure, b.matter.gas.ln_pressure);
    let ln_radius = 0.5 * (a.unknowns[2] + b.unknowns[2]);
    let rise = pb.value - pa.value;

    let ln_pressure = 0.5 * (pa.value + pb.value);
    let weight = GRAVITATION * inside * shell / (4.0 * PI) * (-4.0 * ln_radius - ln_pressure).exp();
    system.set_right(row, -(rise + weight));
    for j in 0..2 {
        system.add(row, left + j, pa.slope[j] * (-1.0 - 0.5 * weight));
        system.add(row, right + j, pb.slope[j] * (1.0 - 0.5 * weight));
    }
    system.add(row, left + 2, -2.0 * weight);
    system.add(row, right + 2, -2.0 * weight);

    let half = 0.5 * (b.unknowns[2] - a.unknowns[2]);
    let (outer, inner) = ((3.0 * half).exp(), (-3.0 * half).exp());
    let ln_density = 0.5 * (a.unknowns[0] + b.unknowns[0]);
    let volume = 3.0 * shell / (4.0 * PI) * (-3.0 * ln_radius - ln_density).exp();
    system.set_right(row + 1, -(outer - inner - volume));
    system.add(row + 1, left, 0.5 * volume);
    system.add(row + 1, right, 0.5 * volume);
    system.add(row + 1, left + 2, 1.5 * (volume - outer - inner));
    system.add(row + 1, right + 2, 1.5 * (volume + outer + inner));

    let (ga, gb) = (a.gradient.actual, b.gradient.actual);
    let steepness = 0.5 * (ga.value + gb.value);
    system.set_right(row + 2, -(b.unknowns[1] - a.unknowns[1] - steepness * rise));
    system.add(row + 2, left + 1, -1.0);
    system.add(row + 2, right + 1, 1.0);
    for j in 0..4 {
        system.add(row + 2, left + j, -0.5 * ga.slope[j] * rise);
        system.add(row + 2, right + j, -0.5 * gb.slope[j] * rise);
    }
    for j in 0..2 {
        system.add(row + 2, left + j, steepness * pa.slope[j]);
        system.add(row + 2, right + j, -steepness * pb.slope[j]);
    }

    let part = 0.5 * shell / unit;
    system.set_right(row + 3, -(b.unknowns[3] - a.unknowns[3] - part * (a.heat.value + b.heat.value)));
    system.add(row + 3, left + 3, -1.0);
    system.add(row + 3, right + 3, 1.0);
    for j in 0..2 {
        system.add(row + 3, left + j, -part * a.heat.slope[j]);
        system.add(row + 3, right + j, -part * b.heat.slope[j]);
    }
}

fn write_surface(system: &mut Banded, surface: &Point, column: usize, unit: f64, star_g: f64) {
    let row = column + 2;
    let [_, ln_temperature, ln_radius, luminosity] = surface.unknowns;
    let emitted = 4.0 * PI * STEFAN_BOLTZMANN * (2.0 * ln_radius + 4.0 * ln_temperature).exp() / unit;
    system.set_right(row, -(luminosity - emitted));
    system.add(row, column + 1, -4.0 * emitted);
    system.add(row, column + 2, -2.0 * emitted);
    system.add(row, column + 3, 1.0);
    let condition = surface.matter.gas.ln_pressure + surface.matter.ln_opacity;
    let photosphere = (2.0 / 3.0 * GRAVITATION * star_g).ln() - 2.0 * ln_radius;
    system.set_right(row + 1, -(condition.value - photosphere));
    system.add(row + 1, column, condition.slope[0]);
    system.add(row + 1, column + 1, condition.slope[1]);
    system.add(row + 1, column + 2, 2.0);
}
