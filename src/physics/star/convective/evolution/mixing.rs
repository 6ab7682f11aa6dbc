//! Burning where nothing moves, burning and mixing where gas rises and sinks.

use super::super::burning::{Helium3, REACTIONS, Rates, burn};
use super::super::composition::Composition;
use super::super::structure::{Mesh, Model};

/// With less than this mass share above it, a convective zone's composition is that of the thin skin above, too.
const SKIN: f64 = 1e-6;

/// Burns for `step_s` seconds at these rates and mixes every convective zone thoroughly.
pub(super) fn burn_and_mix(model: &mut Model, mesh: &Mesh, rates: &[Rates<f64>], step_s: f64) {
    let count = mesh.len();
    let mut k = 0;
    while k < count {
        if !model.convective[k] {
            if rates[k][0] > 0.0 {
                let start = model.composition[k].helium3;
                model.composition[k] = burn(&model.composition[k], &rates[k], step_s);
                model.helium3[k] = Helium3::FromStep { start, step_s };
            } else {
                model.helium3[k] = Helium3::Given;
            }
            k += 1;
            continue;
        }
        let mut end = k + 1;
        while end < count && model.convective[end] {
            end += 1;
        }
        if mesh.above[end - 1] < SKIN {
            end = count;
        }
        let mixed = burn_zone(model, mesh, rates, k..end, step_s);
        model.composition[k..end].fill(mixed);
        model.helium3[k..end].fill(Helium3::Given);
        k = end;
    }
}

/// Composition of a zone that burns as one, at its mean rates.
fn burn_zone(
    model: &Model,
    mesh: &Mesh,
    rates: &[Rates<f64>],
    zone: std::ops::Range<usize>,
    step_s: f64,
) -> Composition {
    let mut mean_rates = [0.0; REACTIONS];
    let mut mean = Composition { hydrogen: 0.0, helium3: 0.0, metals: model.composition[zone.start].metals };
    let mut mass = 0.0;
    for k in zone {
        let weight = mesh.weight_g[k];
        mass += weight;
        mean.hydrogen += weight * model.composition[k].hydrogen;
        mean.helium3 += weight * model.composition[k].helium3;
        for (total, rate) in mean_rates.iter_mut().zip(&rates[k]) {
            *total += weight * rate;
        }
    }
    mean.hydrogen /= mass;
    mean.helium3 /= mass;
    for rate in &mut mean_rates {
        *rate /= mass;
    }
    burn(&mean, &mean_rates, step_s)
}
