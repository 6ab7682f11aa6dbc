//! The climate's states and the planet's water along the walk.

use super::super::caution::Caution;
use super::super::climate::ClimateState;
use super::super::climate::carbon::WorldClimate;
use super::super::climate::state::{Standing, next_change};
use super::super::escape;
use super::super::range::OutOfRange;
use super::event::{PlanetEvent, PlanetEventKind};
use super::input::{PlanetInput, WaterWorld};
use super::passage::w_m2;
use super::surroundings::Surroundings;
use super::thresholds::standing;
use crate::units::constants::YEAR_S;

/// Changes of state between two nodes after which something would be wrong with the thresholds.
const MOST_CHANGES: usize = 16;

/// The states of a climate and its water through a life.
#[derive(Clone, Debug)]
pub(super) struct ClimateHistory {
    pub(super) world: WorldClimate,
    /// Each state with the age it begins, yr.
    pub(super) states: Vec<(f64, ClimateState)>,
    /// Ages, yr, and water, oceans of the Earth; straight in between.
    pub(super) water: Vec<(f64, f64)>,
}

impl ClimateHistory {
    pub(super) fn state_at(&self, age_yr: f64) -> Option<ClimateState> {
        let after = self.states.partition_point(|(begins_yr, _)| *begins_yr <= age_yr);
        self.states.get(after.checked_sub(1)?).map(|(_, state)| *state)
    }

    pub(super) fn water_oceans_at(&self, age_yr: f64) -> Option<f64> {
        let after = self.water.partition_point(|(at_yr, _)| *at_yr <= age_yr);
        let (from_yr, from) = *self.water.get(after.checked_sub(1)?)?;
        let Some((to_yr, to)) = self.water.get(after) else { return Some(from) };
        Some(from + (age_yr - from_yr) / (to_yr - from_yr) * (to - from))
    }
}

/// The walk in progress.
pub(super) struct ClimateWalk<'a> {
    input: &'a PlanetInput,
    pub(super) history: ClimateHistory,
    state: ClimateState,
    water_oceans: f64,
}

/// Fastest water losses at one node, oceans of the Earth per year.
#[derive(Clone, Copy, Debug, Default)]
struct Losses {
    moist: f64,
    runaway: f64,
}

impl Losses {
    fn of(&self, state: ClimateState) -> f64 {
        match state {
            ClimateState::Moist => self.moist,
            ClimateState::Runaway => self.runaway,
            ClimateState::Frozen | ClimateState::Temperate | ClimateState::Dry => 0.0,
        }
    }
}

impl<'a> ClimateWalk<'a> {
    pub(super) fn start(
        input: &'a PlanetInput,
        water: &WaterWorld,
        first: &Standing,
        age_yr: f64,
        world: WorldClimate,
    ) -> Self {
        let water_oceans = water.water_oceans;
        let mut state = if water_oceans <= 0.0 {
            ClimateState::Dry
        } else if first.over_runaway > 0.0 {
            ClimateState::Runaway
        } else if first.over_freeze < 0.0 || water.starts_frozen {
            ClimateState::Frozen
        } else {
            ClimateState::Temperate
        };
        for _ in 0..MOST_CHANGES {
            let Some(next) = first.leads_from(state) else { break };
            state = next;
        }
        let history = ClimateHistory { world, states: vec![(age_yr, state)], water: vec![(age_yr, water_oceans)] };
        Self { input, history, state, water_oceans }
    }

    /// Whether the water is gone, after which nothing changes any more.
    pub(super) fn is_over(&self) -> bool {
        self.state == ClimateState::Dry
    }

    /// Where the starlight stands to the thresholds at one of the nodes.
    pub(super) fn standing(
        &self,
        met: &[Surroundings],
        at: usize,
        locked_yr: Option<f64>,
    ) -> Result<Standing, OutOfRange> {
        standing(met, at, &self.history.world, self.input.orbit.mass_mearth, locked_yr)
    }

    /// Runs from one node to the next.
    pub(super) fn advance(
        &mut self,
        before: (&Surroundings, &Standing),
        after: (&Surroundings, &Standing),
        events: &mut Vec<PlanetEvent>,
    ) -> Result<(), OutOfRange> {
        let (start_yr, span_yr) = (before.0.age_yr, after.0.age_yr - before.0.age_yr);
        let mut share = 0.0;
        let losses = match self.state {
            ClimateState::Dry => return Ok(()),
            _ => self.losses(before.0, after.0)?,
        };
        let mut from = self.state;
        for _ in 0..MOST_CHANGES {
            let change = next_change(self.state, share, before.1, after.1);
            let until = change.map_or(1.0, |(at, _)| at);
            let lost_oceans = losses.of(self.state) * (until - share) * span_yr;
            if lost_oceans > 0.0 && lost_oceans >= self.water_oceans {
                let dry_share = share + (until - share) * self.water_oceans / lost_oceans;
                self.report(from, self.state, start_yr + share * span_yr, before.1, after.1, events);
                self.run_dry(start_yr + dry_share * span_yr, events);
                return Ok(());
            }
            if until > share {
                self.report(from, self.state, start_yr + share * span_yr, before.1, after.1, events);
                from = self.state;
            }
            if lost_oceans > 0.0 {
                self.water_oceans -= lost_oceans;
                self.note_water(start_yr + until * span_yr);
            }
            let Some((at, next)) = change else {
                share = until;
                break;
            };
            (share, self.state) = (at, next);
        }
        self.report(from, self.state, start_yr + share * span_yr, before.1, after.1, events);
        Ok(())
    }

    /// Writes down a change of state, however many states were passed in the same instant.
    fn report(
        &mut self,
        from: ClimateState,
        to: ClimateState,
        age_yr: f64,
        before: &Standing,
        after: &Standing,
        events: &mut Vec<PlanetEvent>,
    ) {
        use ClimateState::{Dry, Frozen, Moist, Runaway, Temperate};
        use PlanetEventKind as Kind;
        if from == to {
            return;
        }
        let kinds: &[Kind] = match (from, to) {
            (Frozen, Temperate) => &[Kind::Thaws],
            (Frozen, Moist) => &[Kind::Thaws, Kind::MoistGreenhouse],
            (Frozen, Runaway) => &[Kind::ThawsToSteam],
            (Temperate, Moist) => &[Kind::MoistGreenhouse],
            (Temperate | Moist, Runaway) => &[Kind::RunawayGreenhouse],
            (Temperate, Frozen) => &[Kind::Freezes],
            (Moist, Temperate) => &[Kind::MoistEnds],
            (Moist, Frozen) => &[Kind::MoistEnds, Kind::Freezes],
            (Runaway, Moist | Temperate) => &[Kind::Condenses],
            (Runaway, Frozen) => &[Kind::Condenses, Kind::Freezes],
            (_, Dry) | (Dry, _) | (Frozen, Frozen) | (Temperate, Temperate) | (Moist, Moist) | (Runaway, Runaway) => {
                &[]
            }
        };
        for kind in kinds {
            let caution = match kind {
                // The moist limit of one-dimensional models is disputed; the ice albedo moves the thaw by 20 %.
                Kind::MoistGreenhouse | Kind::MoistEnds | Kind::Thaws | Kind::ThawsToSteam => Some(Caution::Undecided),
                _ if before.extrapolated || after.extrapolated => Some(Caution::Extrapolated),
                _ => None,
            };
            events.push(PlanetEvent { age_yr, kind: *kind, caution });
        }
        self.begin(age_yr, to);
    }

    fn begin(&mut self, age_yr: f64, state: ClimateState) {
        self.history.states.push((age_yr, state));
    }

    fn run_dry(&mut self, age_yr: f64, events: &mut Vec<PlanetEvent>) {
        self.water_oceans = 0.0;
        self.state = ClimateState::Dry;
        self.note_water(age_yr);
        self.begin(age_yr, ClimateState::Dry);
        let caution = Some(Caution::OrderOfMagnitude);
        events.push(PlanetEvent { age_yr, kind: PlanetEventKind::WaterGone, caution });
    }

    fn note_water(&mut self, age_yr: f64) {
        self.history.water.push((age_yr, self.water_oceans));
    }

    /// How fast water goes between two nodes, at the mean of the high-energy light at both.
    fn losses(&self, before: &Surroundings, after: &Surroundings) -> Result<Losses, OutOfRange> {
        let flux_w_m2 = w_m2(0.5 * (before.high_energy_earth + after.high_energy_earth));
        if flux_w_m2 <= 0.0 {
            return Ok(Losses::default());
        }
        let orbit = &self.input.orbit;
        let (m, r) = (orbit.mass_mearth, orbit.radius_rearth);
        // A planet that fills its Roche lobe has been torn apart before it gets here.
        let lobe = escape::roche_lobe_factor(m, r, before.semi_major_axis_au, before.star_mass_msun)?;
        let by_energy = escape::energy_limited_kg_s(flux_w_m2, self.input.escape_efficiency, m, r, lobe)?;
        let oceans_per_yr =
            |hydrogen_kg_s: f64| hydrogen_kg_s * escape::WATER_PER_HYDROGEN * YEAR_S / escape::EARTH_OCEAN_KG;
        Ok(Losses {
            moist: oceans_per_yr(by_energy.min(escape::moist_hydrogen_leak_kg_s(r)?)),
            runaway: oceans_per_yr(by_energy.min(escape::hydrogen_through_oxygen_kg_s(m, r)?)),
        })
    }
}
