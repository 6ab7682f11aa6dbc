//! Moments as they are computed, their ages counted from birth.

use super::super::cgs::{SOLAR_LUMINOSITY, SOLAR_MASS, SOLAR_RADIUS, YEAR};
use super::super::structure::{Mesh, Model};
use super::node::Node;
use super::stage::Stage;

/// Share of the light that comes from burning on arrival on the main sequence.
const SHINES_BY_BURNING: f64 = 0.99;

/// The moment that a model shows, `age_s` seconds after birth.
pub(super) fn node(model: &Model, mesh: &Mesh, age_s: f64) -> Node {
    let centre = model.unknowns[0];
    let inner = model.composition[0];
    let outer = model.composition[mesh.len() - 1];
    let mass_msun = mesh.star_g / SOLAR_MASS;
    Node {
        age_yr: age_s / YEAR,
        mass_msun,
        luminosity_lsun: model.luminosity_erg_s() / SOLAR_LUMINOSITY,
        radius_rsun: model.radius_cm() / SOLAR_RADIUS,
        effective_temperature_k: model.effective_temperature_k(),
        nuclear_luminosity_lsun: model.nuclear_erg_s(mesh) / SOLAR_LUMINOSITY,
        core_temperature_k: centre[1].exp(),
        core_density_g_cm3: centre[0].exp(),
        core_hydrogen_fraction: inner.hydrogen,
        core_helium3_fraction: inner.helium3,
        mean_hydrogen_fraction: model.mean_hydrogen(mesh),
        surface_hydrogen_fraction: outer.hydrogen,
        still_core_mass_fraction: model.still_core_share(mesh),
        helium_core_mass_msun: model.helium_core_share(mesh) * mass_msun,
        stage: Stage::Contraction,
    }
}

/// Whether the star shines by burning at this moment.
pub(super) fn shines_by_burning(node: &Node) -> bool {
    node.nuclear_luminosity_lsun >= SHINES_BY_BURNING * node.luminosity_lsun
}

/// Makes arrival on the main sequence age zero, with a node of its own; returns the years before it.
///
/// Nothing if the star never shines by burning.
pub(super) fn count_from_arrival(nodes: &mut Vec<Node>) -> Option<f64> {
    let place = nodes.iter().position(shines_by_burning)?;
    let mut zero_yr = nodes[place].age_yr;
    if place > 0 {
        let [before, after] = [nodes[place - 1], nodes[place]];
        let [low, high] = [before, after].map(|n| n.nuclear_luminosity_lsun / n.luminosity_lsun - SHINES_BY_BURNING);
        let share = -low / (high - low);
        let arrival = before.towards(&after, share);
        if share > 1e-6 && share < 1.0 - 1e-6 {
            zero_yr = arrival.age_yr;
            nodes.insert(place, arrival);
        }
    }
    for node in nodes.iter_mut() {
        node.age_yr -= zero_yr;
    }
    Some(zero_yr)
}
