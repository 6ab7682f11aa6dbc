//! Where the starlight stands to the thresholds of one planet's climate.

use super::super::climate::carbon::WorldClimate;
use super::super::climate::state::Standing;
use super::super::climate::table::SURELY_FROZEN;
use super::super::habitable_zone::moist_insolation_earth;
use super::super::range::OutOfRange;
use super::surroundings::Surroundings;

/// Where the starlight stands at one node.
///
/// Curves are only worked out where the starlight is near enough to matter: at such nodes and their neighbours.
pub(super) fn standing(
    met: &[Surroundings],
    at: usize,
    world: &mut WorldClimate,
    locked_yr: Option<f64>,
) -> Result<Standing, OutOfRange> {
    let node = &met[at];
    let (s, teff_k) = (node.insolation_earth, node.effective_temperature_k);
    let surely_thawed = world.surely_thawed(teff_k);
    let (mut freeze, mut thaw) =
        if s < surely_thawed { (SURELY_FROZEN, SURELY_FROZEN) } else { (surely_thawed, surely_thawed) };
    // Moments up to the runaway limit read curves too; they are kept for them.
    if s >= SURELY_FROZEN && node.over_inner < 0.05 {
        world.prepare(s, teff_k);
    }
    let mut moist = moist_insolation_earth(teff_k);
    let neighbours = &met[at.saturating_sub(1)..(at + 2).min(met.len())];
    if neighbours.iter().any(|near| {
        (SURELY_FROZEN..=world.surely_thawed(near.effective_temperature_k)).contains(&near.insolation_earth)
    }) {
        let limits = world.prepared_limits(teff_k)?;
        (freeze, thaw) = (limits.freeze_insolation_earth, limits.thaw_insolation_earth);
        moist = limits.hot_insolation_earth.map_or(moist, |hot| hot.min(moist));
        // A planet that always shows one face has a single climate at each starlight.
        if locked_yr.is_some_and(|age_yr| age_yr <= node.age_yr) {
            thaw = freeze;
        }
    }
    let log_light = s.ln();
    Ok(Standing {
        over_freeze: log_light - freeze.ln(),
        over_thaw: log_light - thaw.max(freeze).ln(),
        over_moist: log_light - moist.ln(),
        over_runaway: node.over_inner,
        extrapolated: node.zone_extrapolated,
    })
}
