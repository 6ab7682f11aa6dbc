//! Where the starlight stands to the thresholds of one planet's climate.

use super::super::climate::carbon::WorldClimate;
use super::super::climate::state::Standing;
use super::super::climate::table::SURELY_FROZEN;
use super::super::habitable_zone::{moist_insolation_earth, runaway_insolation_earth};
use super::super::range::OutOfRange;
use super::surroundings::Surroundings;

/// The starlight at which a planet's climate turns, units of 1361.17 W m⁻².
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct LightThresholds {
    /// Open water freezes over below this.
    pub freeze_insolation_earth: f64,
    /// A frozen planet thaws above this; as the freeze on a planet that keeps one face to its star.
    pub thaw_insolation_earth: f64,
    /// The upper air turns wet above this.
    pub moist_insolation_earth: f64,
    /// The oceans turn to steam above this.
    pub runaway_insolation_earth: f64,
}

impl LightThresholds {
    /// The thresholds under a star's light for a planet of a mass.
    pub(super) fn of(
        world: &WorldClimate,
        teff_k: f64,
        planet_mass_mearth: f64,
        is_locked: bool,
    ) -> Result<Self, OutOfRange> {
        let limits = world.limits(teff_k)?;
        let freeze = limits.freeze_insolation_earth;
        let moist = moist_insolation_earth(teff_k);
        Ok(Self {
            freeze_insolation_earth: freeze,
            // A planet that always shows one face has a single climate at each starlight.
            thaw_insolation_earth: if is_locked { freeze } else { limits.thaw_insolation_earth.max(freeze) },
            moist_insolation_earth: limits.hot_insolation_earth.map_or(moist, |hot| hot.min(moist)),
            runaway_insolation_earth: runaway_insolation_earth(teff_k, planet_mass_mearth),
        })
    }
}

/// Where the starlight stands at one node.
///
/// Curves are only worked out where the starlight is near enough to matter: at such nodes and their neighbours.
pub(super) fn standing(
    met: &[Surroundings],
    at: usize,
    world: &WorldClimate,
    planet_mass_mearth: f64,
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
        let is_locked = locked_yr.is_some_and(|age_yr| age_yr <= node.age_yr);
        let limits = LightThresholds::of(world, teff_k, planet_mass_mearth, is_locked)?;
        (freeze, thaw) = (limits.freeze_insolation_earth, limits.thaw_insolation_earth);
        moist = limits.moist_insolation_earth;
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
