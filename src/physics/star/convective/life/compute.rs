//! From the inputs to the whole life.

use super::super::cgs::SOLAR_MASS;
use super::super::evolution::{LateCooling, Step, Stepper, contracting_star};
use super::super::matter::Microphysics;
use super::super::opacity::{Opacity, RadiativeOpacity};
use super::super::structure::{Mesh, Model};
use super::error::ConvectiveError;
use super::input::{ConvectiveInput, Options, SurfaceOpacity};
use super::node::{Caution, Ending, Life, Node};
use super::stage::{BLACK_BELOW_K, assign};
use super::track::{count_from_arrival, node, shines_by_burning};
use std::ops::ControlFlow;

/// Change, over that aimed at, above which a step is taken again with half its length.
const REJECTED_ABOVE: f64 = 2.5;
/// Shortening of a step after which no structure was found.
const SHORTENED: f64 = 0.35;
/// Lengthening of steps from one to the next.
const LENGTHENED: [f64; 2] = [0.5, 1.4];
/// Steps that took more iterations than this are followed by shorter ones.
const MANY_ITERATIONS: usize = 12;
/// Shortenings of one step before it is begun afresh.
const SHORTENINGS: usize = 9;
/// Lengths of these fresh starts. Very small steps are not safer, since a tolerance of temperature is a luminosity over
/// a time; but where Newton's method cycles about a kink another length often does not.
const FRESH_STARTS: [f64; 5] = [1.0, 1.6, 0.8, 2.7, 4.0];
/// First step, of the thermal time.
const FIRST_STEP: f64 = 0.01;
/// Burning over light beyond which late hydrogen flashes; on the main sequence it never exceeds 1.05.
///
/// A flash (decades long, a few in a life) is then levelled off: the CN cycle feels no higher temperature than that of
/// the burning shell at this moment, so that the same hydrogen burns steadily.
const FLASHING: f64 = 1.5;
/// Radius at which a giant is handed over, solar radii.
const GIANT_RSUN: f64 = 3.0;
/// Below this temperature a white dwarf whose structure cannot be followed becomes a simple crystal, K.
const CRYSTAL_BELOW_K: f64 = 1700.0;
/// Surface temperature with which a life ends, K.
const END_K: f64 = 10.0;
/// Steps after which a life is given up.
const MOST_STEPS: usize = 6000;

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
    input.check()?;
    let composition = input.composition();
    let tables = RadiativeOpacity::new(composition.metals).ok_or(ConvectiveError::DamagedTable)?;
    let opacity = Opacity::new(tables, options.surface.molecules());
    let laws = Microphysics { opacity, cn_ceiling_k: None };
    let mesh = Mesh::new(input.mass_msun * SOLAR_MASS, options.resolution.spacing());
    let mass_msun = input.mass_msun;
    let model = contracting_star(&laws, &mesh, composition).ok_or(ConvectiveError::NoStart { mass_msun })?;
    let stepper = Stepper { laws, mesh: &mesh, stride: options.resolution.stride() };
    let followed = follow(stepper, model, mass_msun, progress)?;

    let mut cautions = cautions(input, options);
    let mut nodes = followed.nodes;
    if followed.levelled {
        cautions.push(Caution::ShellFlashes);
    }
    if followed.ending == Ending::BlackDwarf {
        if followed.stopped_early {
            cautions.push(Caution::EarlyCrystal);
        }
        cool_on(&mut nodes, &followed.model, &mesh);
    }
    let contraction_yr = count_from_arrival(&mut nodes).ok_or(ConvectiveError::BrownDwarf { mass_msun })?;
    assign(&mut nodes, followed.ending);
    Ok(Life { nodes, contraction_yr, ending: followed.ending, cautions })
}

/// The part of a life of which the structure was computed.
struct Followed {
    nodes: Vec<Node>,
    model: Model,
    ending: Ending,
    stopped_early: bool,
    levelled: bool,
}

impl Followed {
    fn new(nodes: Vec<Node>, model: Model, ending: Ending, stopped_early: bool, stepper: &Stepper) -> Self {
        Self { nodes, model, ending, stopped_early, levelled: stepper.laws.cn_ceiling_k.is_some() }
    }
}

fn follow(
    mut stepper: Stepper,
    mut model: Model,
    mass_msun: f64,
    progress: &mut dyn FnMut(f64) -> ControlFlow<()>,
) -> Result<Followed, ConvectiveError> {
    let mesh = stepper.mesh;
    let mut step_s = FIRST_STEP * model.thermal_time_s(mesh);
    let mut age_s = 0.0;
    let mut nodes = vec![node(&model, mesh, age_s)];
    let mut done = Progress::new(&nodes[0]);
    let mut arrived = false;
    let stuck = |node: &Node| ConvectiveError::NotConverged {
        mass_msun,
        age_yr: node.age_yr,
        effective_temperature_k: node.effective_temperature_k,
    };
    for _ in 0..MOST_STEPS {
        let last = nodes[nodes.len() - 1];
        let Some((step, taken_s)) = attempt(&stepper, &model, step_s) else {
            if arrived && last.effective_temperature_k < CRYSTAL_BELOW_K {
                return Ok(Followed::new(nodes, model, Ending::BlackDwarf, true, &stepper));
            }
            return Err(stuck(&last));
        };
        age_s += taken_s;
        let stretch = (0.9 / step.change.max(0.05)).clamp(LENGTHENED[0], LENGTHENED[1]);
        step_s = taken_s * stretch * if step.iterations > MANY_ITERATIONS { 0.7 } else { 1.0 };
        model = step.model;
        let now = node(&model, mesh, age_s);
        nodes.push(now);
        arrived |= shines_by_burning(&now);
        if arrived && stepper.laws.cn_ceiling_k.is_none() && runs_away(&now) {
            stepper.laws.cn_ceiling_k = Some(model.shell_temperature_k(mesh));
        }
        if progress(done.after(&now)).is_break() {
            return Err(ConvectiveError::Cancelled);
        }
        if now.effective_temperature_k < BLACK_BELOW_K {
            if !arrived {
                return Err(ConvectiveError::BrownDwarf { mass_msun });
            }
            return Ok(Followed::new(nodes, model, Ending::BlackDwarf, false, &stepper));
        }
        if arrived && now.radius_rsun > GIANT_RSUN {
            return Ok(Followed::new(nodes, model, Ending::GiantBranch, false, &stepper));
        }
    }
    Err(stuck(&nodes[nodes.len() - 1]))
}

/// Whether hydrogen burns so much faster than the star shines that it will flash.
fn runs_away(node: &Node) -> bool {
    node.nuclear_luminosity_lsun > FLASHING * node.luminosity_lsun
}

/// The next step and its length, from the longest that succeeds.
fn attempt(stepper: &Stepper, model: &Model, first_s: f64) -> Option<(Step, f64)> {
    for stretch in FRESH_STARTS {
        let mut step_s = stretch * first_s;
        for _ in 0..SHORTENINGS {
            match stepper.advance(model, step_s) {
                Some(step) if step.change <= REJECTED_ABOVE => return Some((step, step_s)),
                Some(_) => step_s *= 0.5,
                None => step_s *= SHORTENED,
            }
        }
    }
    None
}

/// Adds the moments of the crystal.
fn cool_on(nodes: &mut Vec<Node>, model: &Model, mesh: &Mesh) {
    let track: Vec<[f64; 3]> =
        nodes.iter().map(|node| [node.age_yr, node.core_temperature_k, node.luminosity_lsun]).collect();
    let last = nodes[nodes.len() - 1];
    let density = mean_density(model, mesh);
    let end = last.luminosity_lsun * (END_K / last.effective_temperature_k).powi(4);
    let Some(cooling) = LateCooling::after(&track, density) else { return };
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
    if options.surface == SurfaceOpacity::Of1997 {
        cautions.push(Caution::OutdatedSurface);
    }
    cautions
}

/// How much of a life is done, from what the star looks like.
struct Progress {
    hydrogen_at_birth: f64,
    hottest_k: f64,
    share: f64,
}

impl Progress {
    fn new(first: &Node) -> Self {
        Self { hydrogen_at_birth: first.mean_hydrogen_fraction, hottest_k: 0.0, share: 0.0 }
    }

    /// Shares of the steps, measured: a seventh contracting, half burning, the rest cooling.
    fn after(&mut self, node: &Node) -> f64 {
        let burnt = 1.0 - node.mean_hydrogen_fraction / self.hydrogen_at_birth;
        let contracted = (node.nuclear_luminosity_lsun / node.luminosity_lsun).clamp(0.0, 1.0);
        self.hottest_k = self.hottest_k.max(node.effective_temperature_k);
        let cooled = if burnt > 0.9 {
            (self.hottest_k / node.effective_temperature_k).ln() / (self.hottest_k / BLACK_BELOW_K).ln()
        } else {
            0.0
        };
        let share = 0.15 * contracted + 0.5 * burnt + 0.35 * cooled;
        self.share = self.share.max(share.clamp(0.0, 1.0));
        self.share
    }
}
