//! The part of a life of which the structure is computed, step by step.

use super::super::evolution::{Step, Stepper, blow};
use super::super::structure::{Mesh, Model, Unknowns};
use super::error::ConvectiveError;
use super::node::{Ending, Node};
use super::profiles::Collector;
use super::stage::BLACK_BELOW_K;
use super::track::{node, shines_by_burning};
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
/// Below this temperature a white dwarf whose structure cannot be followed becomes a simple crystal, K.
const CRYSTAL_BELOW_K: f64 = 1700.0;
/// Share of the star that is spent before shells are refined and winds blow.
const SHELL_FROM: f64 = 0.05;
/// A star larger than this whose structure cannot be followed is handed over as a giant, solar radii.
const GIANT_RSUN: f64 = 1.5;
/// A helium core this heavy would soon ignite, which is not followed, solar masses.
const CORE_IGNITES_MSUN: f64 = 0.45;
/// Steep layers that cannot be followed are looked at this many times as closely at most, …
const CLOSEST: f64 = 8.0;
/// … with shells halved so often at once.
const REFINEMENTS: usize = 3;
/// Steps after which a life is given up.
const MOST_STEPS: usize = 6000;

/// What was followed.
pub(super) struct Followed {
    /// Moments in order, their ages counted from birth.
    pub(super) nodes: Vec<Node>,
    /// The inside at some of them.
    pub(super) inside: Collector,
    /// The last structure.
    pub(super) model: Model,
    /// Its mesh.
    pub(super) mesh: Mesh,
    /// How it ended.
    pub(super) ending: Ending,
    /// Whether it ended before the surface was as cold as meant.
    pub(super) stopped_early: bool,
    /// Whether late flashes were levelled off.
    pub(super) levelled: bool,
}

/// What is kept on the way.
struct Seen {
    nodes: Vec<Node>,
    inside: Collector,
}

impl Followed {
    fn new(seen: Seen, model: Model, ending: Ending, stopped_early: bool, stepper: Stepper) -> Self {
        let levelled = stepper.laws.cn_ceiling_k.is_some();
        let Seen { nodes, inside } = seen;
        Self { nodes, inside, model, mesh: stepper.mesh, ending, stopped_early, levelled }
    }
}

/// Follows a young star until it is a cold white dwarf or a giant that cannot be followed further.
pub(super) fn follow(
    mut stepper: Stepper,
    mut model: Model,
    mass_msun: f64,
    progress: &mut dyn FnMut(f64) -> ControlFlow<()>,
) -> Result<Followed, ConvectiveError> {
    let mut step_s = FIRST_STEP * model.thermal_time_s(&stepper.mesh);
    let mut age_s = 0.0;
    let first = node(&model, &stepper.mesh, age_s);
    let mut done = Progress::new(&first);
    let mut seen = Seen { nodes: vec![first], inside: Collector::default() };
    let mut arrived = false;
    let mut trend: Option<Vec<Unknowns>> = None;
    let mut closeness = 1.0;
    for _ in 0..MOST_STEPS {
        let last = seen.nodes[seen.nodes.len() - 1];
        let Some((step, taken_s)) = attempt(&stepper, &model, trend.as_deref(), step_s) else {
            // Steep layers may still be too coarse: look again more closely before giving up.
            if arrived && last.effective_temperature_k > CRYSTAL_BELOW_K && closeness < CLOSEST {
                closeness *= 2.0;
                for _ in 0..REFINEMENTS {
                    model.refine(&stepper.laws, &mut stepper.mesh, closeness);
                }
                trend = None;
                continue;
            }
            let ending = match last {
                _ if !arrived => break,
                Node { effective_temperature_k, .. } if effective_temperature_k < CRYSTAL_BELOW_K => Ending::BlackDwarf,
                Node { radius_rsun, .. } if radius_rsun > GIANT_RSUN => Ending::GiantBranch,
                _ => break,
            };
            return Ok(Followed::new(seen, model, ending, true, stepper));
        };
        age_s += taken_s;
        let stretch = (0.9 / step.change.max(0.05)).clamp(LENGTHENED[0], LENGTHENED[1]);
        step_s = taken_s * stretch * if step.iterations > MANY_ITERATIONS { 0.7 } else { 1.0 };
        let new_trend = step.model.trend_since(&model, taken_s);
        model = step.model;
        if arrived && model.helium_core_share(&stepper.mesh) > SHELL_FROM {
            step_s = step_s.min(blow(&model, &mut stepper.mesh, taken_s));
            let Some(changed) = model.refine(&stepper.laws, &mut stepper.mesh, closeness) else { break };
            trend = (!changed).then_some(new_trend);
        } else {
            trend = Some(new_trend);
        }
        let now = node(&model, &stepper.mesh, age_s);
        seen.nodes.push(now);
        arrived |= shines_by_burning(&now);
        seen.inside.note(&now, &model, &stepper.mesh, arrived);
        if arrived && stepper.laws.cn_ceiling_k.is_none() && runs_away(&now) {
            stepper.laws.cn_ceiling_k = Some(model.shell_temperature_k(&stepper.mesh));
        }
        if progress(done.after(&now)).is_break() {
            return Err(ConvectiveError::Cancelled);
        }
        if now.effective_temperature_k < BLACK_BELOW_K {
            if !arrived {
                return Err(ConvectiveError::BrownDwarf { mass_msun });
            }
            return Ok(Followed::new(seen, model, Ending::BlackDwarf, false, stepper));
        }
        if arrived && now.helium_core_mass_msun > CORE_IGNITES_MSUN && now.radius_rsun > GIANT_RSUN {
            return Ok(Followed::new(seen, model, Ending::GiantBranch, false, stepper));
        }
    }
    Err(stuck(mass_msun, &seen.nodes[seen.nodes.len() - 1]))
}

/// The error of a life that could not be followed beyond a moment.
pub(super) fn stuck(mass_msun: f64, last: &Node) -> ConvectiveError {
    ConvectiveError::NotConverged {
        mass_msun,
        age_yr: last.age_yr,
        effective_temperature_k: last.effective_temperature_k,
    }
}

/// Whether hydrogen burns so much faster than the star shines that it will flash.
fn runs_away(node: &Node) -> bool {
    node.nuclear_luminosity_lsun > FLASHING * node.luminosity_lsun
}

/// The next step and its length, from the longest that succeeds.
fn attempt(stepper: &Stepper, model: &Model, trend: Option<&[Unknowns]>, first_s: f64) -> Option<(Step, f64)> {
    for stretch in FRESH_STARTS {
        let mut step_s = stretch * first_s;
        for _ in 0..SHORTENINGS {
            match stepper.advance(model, trend, step_s) {
                Some(step) if step.change <= REJECTED_ABOVE => return Some((step, step_s)),
                Some(_) => step_s *= 0.5,
                None => step_s *= SHORTENED,
            }
        }
    }
    None
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
