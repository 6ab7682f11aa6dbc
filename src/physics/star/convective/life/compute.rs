//! From the inputs to the whole life.

use super::super::evolution::LateCooling;
use super::super::opacity::RadiativeOpacity;
use super::super::structure::{Mesh, Model};
use super::error::ConvectiveError;
use super::follow::{follow, stuck};
use super::input::{ConvectiveInput, Options, SurfaceOpacity};
use super::node::{Caution, Ending, Life, Node};
use super::profiles::profile;
use super::stage::assign;
use super::track::count_from_arrival;
use super::young_star::YoungStar;
use std::ops::ControlFlow;

/// Share of the mass below which a wind is worth a caution.
const WINDY: f64 = 0.995;
/// Surface temperature with which a life ends, K.
const END_K: f64 = 10.0;

/// The life of a red dwarf.
///
/// `progress` is told the share that is done (0 to 1, never falling) after each step, and may stop the computation.
///
/// # Source
/// Structure equations and relaxation: Henyey, Forbes & Gould 1964, Astrophys. J. 139, 306; Kippenhahn, Weigert & Weiss 2012,
/// *Stellar Structure and Evolution*. Calibrated to Baraffe et al. 2015, A&A 577, A42.
/// # Valid for
/// [`ConvectiveInput::MASS_RANGE_MSUN`], [`ConvectiveInput::METALLICITY_RANGE_DEX`].
/// # Errors
/// [`ConvectiveError`]: input out of range, a brown dwarf, a structure that cannot be followed, or cancelled.
/// # Example
/// ```no_run
/// use longember::physics::star::convective::{ConvectiveInput, compute};
/// use std::ops::ControlFlow;
/// let input = ConvectiveInput { mass_msun: 0.12, metallicity_dex: 0.0 };
/// let life = compute(input, &mut |_share| ControlFlow::Continue(()))?;
/// assert!(life.nodes.len() > 100);
/// # Ok::<(), longember::physics::star::convective::ConvectiveError>(())
/// ```
pub fn compute(
    input: ConvectiveInput,
    progress: &mut dyn FnMut(f64) -> ControlFlow<()>,
) -> Result<Life, ConvectiveError> {
    compute_with(input, Options::default(), progress)
}

/// The life of a red dwarf, computed with other than the usual options; otherwise like [`compute`].
///
/// # Errors
/// As [`compute`].
pub fn compute_with(
    input: ConvectiveInput,
    options: Options,
    progress: &mut dyn FnMut(f64) -> ControlFlow<()>,
) -> Result<Life, ConvectiveError> {
    let YoungStar { stepper, model } = YoungStar::new(input, options)?;
    let mass_msun = input.mass_msun;
    let followed = follow(stepper, model, mass_msun, progress)?;

    let mut cautions = cautions(input, options);
    let mut nodes = followed.nodes;
    let end = profile(&followed.model, &followed.mesh, nodes[nodes.len() - 1].age_yr);
    if nodes[nodes.len() - 1].mass_msun < WINDY * mass_msun {
        cautions.push(Caution::GiantWind);
    }
    if followed.levelled {
        cautions.push(Caution::ShellFlashes);
    }
    if followed.ending == Ending::BlackDwarf {
        if followed.stopped_early {
            cautions.push(Caution::EarlyCrystal);
        }
        cool_on(&mut nodes, &followed.model, &followed.mesh)
            .ok_or_else(|| stuck(mass_msun, &nodes[nodes.len() - 1]))?;
    }
    let contraction_yr = count_from_arrival(&mut nodes).ok_or(ConvectiveError::BrownDwarf { mass_msun })?;
    assign(&mut nodes, followed.ending);
    let profiles = followed.inside.finish(end, contraction_yr);
    Ok(Life { nodes, contraction_yr, ending: followed.ending, cautions, profiles })
}

/// Adds the moments of the crystal. Nothing if the structure did not cool at its end.
fn cool_on(nodes: &mut Vec<Node>, model: &Model, mesh: &Mesh) -> Option<()> {
    let track: Vec<[f64; 3]> =
        nodes.iter().map(|node| [node.age_yr, node.core_temperature_k, node.luminosity_lsun]).collect();
    let last = nodes[nodes.len() - 1];
    let density = mean_density(model, mesh);
    let end = last.luminosity_lsun * (END_K / last.effective_temperature_k).powi(4);
    let cooling = LateCooling::after(&track, density)?;
    nodes.extend(cooling.moments(end).map(|moment| Node {
        age_yr: last.age_yr + moment.time,
        luminosity_lsun: moment.luminosity,
        effective_temperature_k: last.effective_temperature_k
            * (moment.luminosity / last.luminosity_lsun).sqrt().sqrt(),
        core_temperature_k: moment.temperature_k,
        nuclear_luminosity_lsun: 0.0,
        still_core_mass_fraction: 1.0,
        ..last
    }));
    Some(())
}

/// Mean of the density over mass, g cm⁻³.
fn mean_density(model: &Model, mesh: &Mesh) -> f64 {
    let sum: f64 = model.unknowns.iter().zip(&mesh.weight_g).map(|(point, weight)| point[0].exp() * weight).sum();
    sum / mesh.star_g
}

/// What to know before trusting a life with these inputs.
fn cautions(input: ConvectiveInput, options: Options) -> Vec<Caution> {
    let mut cautions = Vec::new();
    if !(0.08..=0.30).contains(&input.mass_msun) {
        cautions.push(Caution::OutsideCalibratedMasses);
    }
    if input.metallicity_dex.abs() > 0.3 {
        cautions.push(Caution::OutsideCalibratedMetallicity);
    }
    if input.composition().metals < RadiativeOpacity::METALS_RANGE[0] {
        cautions.push(Caution::OpacityOfMoreMetals);
    }
    if options.surface == SurfaceOpacity::Of1997 {
        cautions.push(Caution::OutdatedSurface);
    }
    cautions
}
