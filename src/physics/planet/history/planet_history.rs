//! The whole history of one planet.

use super::super::caution::Caution;
use super::super::climate::carbon::WorldClimate;
use super::super::climate::{ClimateState, ClimateTables};
use super::super::orbit_history::OrbitHistory;
use super::super::range::OutOfRange;
use super::super::star_point::{StarPoint, check_track};
use super::super::tides::{LockLevel, Tides};
use super::climate_walk::{ClimateHistory, ClimateWalk};
use super::event::{PlanetEvent, PlanetEventKind};
use super::input::PlanetInput;
use super::passage::{Accumulated, Passage};
use super::surroundings::{HighEnergyHistory, Surroundings};
use super::thresholds::standing;

/// Periastron over the star's reach within which nobody can say whether a planet survives: 15 % either way.
const UNDECIDED_WITHIN: f64 = 1.15;

/// The history of one planet along its star's track: orbit, climate, water, rotation, air, and dated events.
///
/// It is computed once; every moment is read from it, so that a moment never depends on how it was reached.
#[derive(Clone, Debug)]
pub struct PlanetHistory {
    pub(super) input: PlanetInput,
    pub(super) high_energy: HighEnergyHistory,
    pub(super) orbit: OrbitHistory,
    without_tides: OrbitHistory,
    second_opinion: OrbitHistory,
    pub(super) climate: Option<ClimateHistory>,
    pub(super) accumulated: Vec<Accumulated>,
    probable_lock_yr: Option<f64>,
    locked_yr: Option<f64>,
    events: Vec<PlanetEvent>,
}

impl PlanetHistory {
    /// Walks a planet along the star's nodes.
    ///
    /// # Source
    /// Each part names its own: [`OrbitHistory`], [`climate`](super::super::climate),
    /// [`tides`](super::super::tides), [`escape`](super::super::escape) and
    /// [`high_energy`](super::super::high_energy).
    /// # Valid for
    /// One planet that does not feel its neighbours. Melting and freezing are instantaneous (they take centuries).
    /// Carbon dioxide stays as it was given. Water is lost while the star is neither giant nor remnant, because their
    /// high-energy light is not known.
    /// # Accuracy
    /// Between nodes, logarithms of the starlight over each threshold run straight with age.
    /// # Errors
    /// [`OutOfRange`] for a planet or track that cannot be used.
    pub fn walk(input: &PlanetInput, track: &[StarPoint]) -> Result<Self, OutOfRange> {
        Self::walk_with(input, track, &mut ClimateTables::default())
    }

    /// [`PlanetHistory::walk`] with thresholds of the climate that are known already, or will be wanted again.
    ///
    /// # Errors
    /// As [`PlanetHistory::walk`].
    pub fn walk_with(input: &PlanetInput, track: &[StarPoint], tables: &mut ClimateTables) -> Result<Self, OutOfRange> {
        input.check()?;
        check_track(track)?;
        let orbit = OrbitHistory::walk_with_tides(&input.orbit, track, &input.tides)?;
        let without_tides = OrbitHistory::walk_with_tides(&input.orbit, track, &Tides::off())?;
        let second_opinion = OrbitHistory::walk_with_tides(&input.orbit, track, &input.tides.second_opinion())?;
        let high_energy = HighEnergyHistory::of(track)?;
        let met = Surroundings::along(input, &high_energy, &orbit, track);
        let mut history = Self {
            input: *input,
            high_energy,
            orbit,
            without_tides,
            second_opinion,
            climate: None,
            accumulated: Vec::with_capacity(met.len()),
            probable_lock_yr: None,
            locked_yr: None,
            events: Vec::new(),
        };
        history.pass_marks(&met)?;
        history.walk_climate(&met, tables)?;
        history.close_events();
        Ok(history)
    }

    /// Keeps the thresholds of this history's climate for a later one.
    pub fn keep_tables(&self, tables: &mut ClimateTables) {
        if let Some(climate) = &self.climate {
            climate.world.keep_tables(tables);
        }
    }

    fn pass_marks(&mut self, met: &[Surroundings]) -> Result<(), OutOfRange> {
        let Some(first) = met.first() else { return Ok(()) };
        let input = self.input;
        let mut passage = Passage::start(&input, first)?;
        self.accumulated.push(passage.now);
        for pair in met.windows(2) {
            passage.advance(&pair[0], &pair[1], &mut self.events);
            self.accumulated.push(passage.now);
        }
        (self.probable_lock_yr, self.locked_yr) = (passage.probable_yr, passage.locked_yr);
        Ok(())
    }

    fn walk_climate(&mut self, met: &[Surroundings], tables: &mut ClimateTables) -> Result<(), OutOfRange> {
        let (Some(water), Some(birth)) = (self.input.water, met.first()) else { return Ok(()) };
        // The birth of a star whose track starts on the main sequence is taken at age zero.
        let ocean_yr = birth.age_yr.min(0.0) + water.ocean_after_yr;
        let met = &met[met.partition_point(|node| node.age_yr < ocean_yr)..];
        let Some(first) = met.first() else { return Ok(()) };
        let world = WorldClimate::new(&water.air, water.carbon, tables)?;
        let mut before = standing(met, 0, &world, self.input.orbit.mass_mearth, self.locked_yr)?;
        let mut walk = ClimateWalk::start(&self.input, &water, &before, first.age_yr, world);
        for at in 1..met.len() {
            if walk.is_over() {
                break;
            }
            let after = walk.standing(met, at, self.locked_yr)?;
            walk.advance((&met[at - 1], &before), (&met[at], &after), &mut self.events)?;
            before = after;
        }
        self.climate = Some(walk.history);
        Ok(())
    }

    fn close_events(&mut self) {
        if let Some((end_yr, end)) = self.orbit.end() {
            self.events.retain(|event| event.age_yr < end_yr);
            let caution = self.orbit_caution();
            self.events.push(PlanetEvent { age_yr: end_yr, kind: PlanetEventKind::from(end), caution });
        }
        self.events.sort_by(|a, b| a.age_yr.total_cmp(&b.age_yr));
    }

    /// What the planet was at the start.
    #[must_use]
    pub fn input(&self) -> &PlanetInput {
        &self.input
    }

    /// Every dated event, in order.
    #[must_use]
    pub fn events(&self) -> &[PlanetEvent] {
        &self.events
    }

    /// The orbit that everything else follows.
    #[must_use]
    pub fn orbit(&self) -> &OrbitHistory {
        &self.orbit
    }

    /// The orbit if no tide acted.
    #[must_use]
    pub fn orbit_without_tides(&self) -> &OrbitHistory {
        &self.without_tides
    }

    /// The orbit under the other published form of the tides.
    #[must_use]
    pub fn orbit_by_second_opinion(&self) -> &OrbitHistory {
        &self.second_opinion
    }

    /// How far the end of the orbit can be trusted: undecided where the forms of the tides disagree on it or the star
    /// comes within 15 % of taking or sparing the planet; not applicable where mass loss outran the orbit.
    #[must_use]
    pub fn orbit_caution(&self) -> Option<Caution> {
        if !self.orbit.is_adiabatic() {
            return Some(Caution::NotApplicable);
        }
        let kind = |orbit: &OrbitHistory| orbit.end().map(|(_, end)| end);
        let disagree =
            kind(&self.orbit) != kind(&self.without_tides) || kind(&self.orbit) != kind(&self.second_opinion);
        let ratio = self.orbit.closest_ratio();
        let near = ratio > 1.0 && ratio < UNDECIDED_WITHIN;
        (disagree || near).then_some(Caution::Undecided)
    }

    /// How sure it is that the planet keeps one face to the star at an age.
    #[must_use]
    pub fn lock_level_at(&self, age_yr: f64) -> LockLevel {
        let since = |date: Option<f64>| date.is_some_and(|locked_yr| locked_yr <= age_yr);
        if since(self.locked_yr) {
            LockLevel::Locked
        } else if since(self.probable_lock_yr) {
            LockLevel::Probable
        } else {
            LockLevel::Free
        }
    }

    /// The climate's state at an age, for planets with the climate model.
    #[must_use]
    pub fn climate_state_at(&self, age_yr: f64) -> Option<ClimateState> {
        self.orbit.at(age_yr)?;
        self.climate.as_ref()?.state_at(age_yr)
    }

    /// Each state of the climate with the age it begins, yr; empty without the climate model.
    #[must_use]
    pub fn climate_states(&self) -> &[(f64, ClimateState)] {
        self.climate.as_ref().map_or(&[], |climate| &climate.states)
    }

    /// The planet's place against the shoreline of air at an age, from the high-energy light it has received, 1 for
    /// the Earth today. Compare with [`SHORELINE`](super::super::escape::SHORELINE).
    #[must_use]
    pub fn shoreline_ratio_at(&self, age_yr: f64) -> Option<f64> {
        let after = self.accumulated.partition_point(|sum| sum.age_yr <= age_yr);
        let from = self.accumulated.get(after.checked_sub(1)?)?;
        let Some(to) = self.accumulated.get(after) else { return Some(from.shoreline_ratio) };
        let share = (age_yr - from.age_yr) / (to.age_yr - from.age_yr);
        Some(from.shoreline_ratio + share * (to.shoreline_ratio - from.shoreline_ratio))
    }
}
