//! The wind of a small red giant.
//!
//! Ṁ = 4·10⁻¹³ η L R/M solar masses per year with L, R and M in solar units.
//!
//! # Source
//! Reimers 1975, Mem. Soc. R. Sci. Liège 8, 369; η = 0.5 as in Hurley, Pols & Tout 2000, MNRAS 315, 543, section 7.1.
//! # Accuracy
//! A factor of two. Dwarfs are given none: the formula holds for giants, and fades in between these radii.

use super::super::cgs::{SOLAR_LUMINOSITY, SOLAR_MASS, SOLAR_RADIUS, YEAR};
use super::super::structure::{Mesh, Model};

/// 4·10⁻¹³ η.
const REIMERS: f64 = 4e-13 * 0.5;
/// Radii between which the wind fades in, solar radii.
const FADES_IN_RSUN: [f64; 2] = [1.0, 3.0];
/// Largest share of the envelope lost in one step.
const LARGEST_LOSS: f64 = 0.02;

/// Mass loss, g s⁻¹.
fn loss_g_s(model: &Model, mesh: &Mesh) -> f64 {
    let radius = model.radius_cm() / SOLAR_RADIUS;
    let share = ((radius - FADES_IN_RSUN[0]) / (FADES_IN_RSUN[1] - FADES_IN_RSUN[0])).clamp(0.0, 1.0);
    let luminosity = model.luminosity_erg_s() / SOLAR_LUMINOSITY;
    share * REIMERS * luminosity * radius / (mesh.star_g / SOLAR_MASS) * SOLAR_MASS / YEAR
}

/// Takes from the envelope what the wind carried off in `step_s` seconds; returns the longest step that should follow,
/// s.
pub(in super::super) fn blow(model: &Model, mesh: &mut Mesh, step_s: f64) -> f64 {
    let rate = loss_g_s(model, mesh);
    if rate <= 0.0 {
        return f64::INFINITY;
    }
    let base = model.envelope_base();
    let envelope_g = mesh.star_g * mesh.above[base];
    mesh.shed(base, rate * step_s);
    LARGEST_LOSS * envelope_g / rate
}
