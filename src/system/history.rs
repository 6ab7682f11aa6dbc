//! The whole past and future of a system, computed once, read at any moment.

use super::events::{self, Event};
use super::moment::{Moment, PlanetMoment, StarMoment};
use super::neighbour_notes;
use super::notes::{self, Note};
use super::planet_past::PlanetPast;
use super::specification::{Body, PlanetSpecification, System, SystemProblem};
use crate::physics::light::DRAPER_POINT_K;
use crate::physics::planet::climate::ClimateTables;
use crate::physics::planet::{OutOfRange, StarPoint};
use crate::physics::star::convective::SurfaceOpacity;
use crate::physics::star::{END_YR, LifeOptions, PhaseSpan, StarCaution, StarError, StarInput, StarState, WholeLife};
use std::ops::ControlFlow;
use std::sync::Arc;
use thiserror::Error;

/// Why a system has no history.
#[derive(Clone, Debug, Error, PartialEq)]
pub enum HistoryError {
    /// Inputs outside their permitted ranges.
    #[error("{}", sentence(.0))]
    Inputs(Vec<SystemProblem>),
    /// The star is outside what can be computed.
    #[error("{0}")]
    Star(StarError),
    /// A planet cannot be carried along its star's life.
    #[error("planet \"{name}\": {refusal}")]
    Planet {
        /// Its name.
        name: String,
        /// What was refused.
        refusal: OutOfRange,
    },
    /// The computation was asked to stop.
    #[error("the computation was cancelled")]
    Cancelled,
}

impl From<StarError> for HistoryError {
    fn from(error: StarError) -> Self {
        match error {
            StarError::Cancelled => Self::Cancelled,
            other => Self::Star(other),
        }
    }
}

fn sentence(problems: &[SystemProblem]) -> String {
    let lines: Vec<String> = problems
        .iter()
        .map(|problem| match problem.body {
            Body::Star => format!("star: {}", problem.fault),
            Body::Planet(index) => format!("planet {}: {}", index + 1, problem.fault),
        })
        .collect();
    lines.join("; ")
}

/// Share of the time that goes into the star's life, where that takes seconds.
const STAR_SHARE: f64 = 0.98;

/// A system with everything that ever happens to it, from arrival on the main sequence to 10¹⁴ yr.
#[derive(Debug)]
pub struct History {
    system: System,
    life: Arc<WholeLife>,
    planets: Vec<Arc<PlanetPast>>,
    climates: ClimateTables,
    events: Vec<Event>,
    shown_until_yr: f64,
}

impl History {
    /// Computes the life of the star and carries the planets along.
    ///
    /// # Errors
    /// [`HistoryError`] when an input is outside its permitted range.
    pub fn compute(system: System) -> Result<Self, HistoryError> {
        Self::compute_with(system, &mut |_| ControlFlow::Continue(()))
    }

    /// Like [`History::compute`]; `progress` is told the share that is done, 0 to 1, and may stop the computation.
    ///
    /// # Errors
    /// As [`History::compute`], or [`HistoryError::Cancelled`].
    pub fn compute_with(
        system: System,
        progress: &mut dyn FnMut(f64) -> ControlFlow<()>,
    ) -> Result<Self, HistoryError> {
        Self::compute_after(None, system, progress)
    }

    /// Like [`History::compute_with`], taking over what an earlier history of nearly the same system has in common with
    /// it: the life of an unchanged star, unchanged planets beside it, thresholds of unchanged air. The result is the
    /// same with and without it.
    ///
    /// # Errors
    /// As [`History::compute_with`].
    pub fn compute_after(
        earlier: Option<&Self>,
        system: System,
        progress: &mut dyn FnMut(f64) -> ControlFlow<()>,
    ) -> Result<Self, HistoryError> {
        let input = checked_input(&system)?;
        let life = if let Some(life) = earlier.and_then(|earlier| earlier.life_of(&system)) {
            life
        } else {
            let mut star_progress = |share: f64| progress(STAR_SHARE * share);
            Arc::new(WholeLife::compute(input, life_options(&system), &mut star_progress)?)
        };
        Self::of_life(earlier, system, life, progress)
    }

    /// The exact life of the star, if a system has the same one.
    #[must_use]
    pub fn life_of(&self, system: &System) -> Option<Arc<WholeLife>> {
        let is_same =
            star_input(&self.system) == star_input(system) && life_options(&self.system) == life_options(system);
        (is_same && !self.life.is_quick_look()).then(|| Arc::clone(&self.life))
    }

    /// A first look within milliseconds at a system whose exact history takes seconds, from lives computed in advance.
    ///
    /// Nothing for other systems, or outside those lives; [`WholeLife::is_quick_look`] tells it from an exact history.
    #[must_use]
    pub fn quick_look(system: System) -> Option<Self> {
        let life = WholeLife::quick_look(checked_input(&system).ok()?, life_options(&system))?;
        Self::of_life(None, system, Arc::new(life), &mut |_| ControlFlow::Continue(())).ok()
    }

    /// Carries the planets along a life of the star that is known already; `earlier` as in [`History::compute_after`].
    ///
    /// # Errors
    /// As [`History::compute_with`].
    pub fn of_life(
        earlier: Option<&Self>,
        system: System,
        life: Arc<WholeLife>,
        progress: &mut dyn FnMut(f64) -> ControlFlow<()>,
    ) -> Result<Self, HistoryError> {
        checked_input(&system)?;
        let points = star_points(&life);
        let count = system.planets.len();
        let mut planets: Vec<Arc<PlanetPast>> = Vec::with_capacity(count);
        let mut climates = earlier.map_or_else(ClimateTables::default, |earlier| earlier.climates.to_reuse());
        let beside_same_star = earlier.filter(|earlier| Arc::ptr_eq(&earlier.life, &life));
        for planet in &system.planets {
            let known = beside_same_star.and_then(|earlier| earlier.past_of(planet));
            let past = if let Some(past) = known {
                past.history().keep_tables(&mut climates);
                past
            } else {
                let walked = PlanetPast::walk(planet.clone(), &points, &mut climates);
                Arc::new(walked.map_err(|refusal| HistoryError::Planet { name: planet.name.clone(), refusal })?)
            };
            planets.push(past);
            let share = planets.len() as f64 / count as f64;
            if progress(STAR_SHARE + (1.0 - STAR_SHARE) * share).is_break() {
                return Err(HistoryError::Cancelled);
            }
        }
        climates.drop_unused();
        let shown_until_yr = shown_until_yr(&life);
        let mut history = Self { system, life, planets, climates, events: Vec::new(), shown_until_yr };
        history.events = events::of(&history);
        Ok(history)
    }

    fn past_of(&self, planet: &PlanetSpecification) -> Option<Arc<PlanetPast>> {
        self.planets.iter().find(|past| past.specification() == planet).map(Arc::clone)
    }

    /// Works out ahead every threshold of the planets' climates that has not been needed yet, so that none has to be
    /// waited for when it is shown.
    pub fn prepare_climates(&self) {
        self.climates.prepare_all();
    }

    /// The inputs this history was computed from.
    #[must_use]
    pub fn system(&self) -> &System {
        &self.system
    }

    /// The star's life.
    #[must_use]
    pub fn life(&self) -> &WholeLife {
        &self.life
    }

    /// The planets, in the order of the system.
    #[must_use]
    pub fn planets(&self) -> &[Arc<PlanetPast>] {
        &self.planets
    }

    /// Dated events of star and planets, oldest first.
    #[must_use]
    pub fn events(&self) -> &[Event] {
        &self.events
    }

    /// The phases of the star's life, in order.
    #[must_use]
    pub fn spans(&self) -> &[PhaseSpan] {
        self.life.spans()
    }

    /// The age up to which a whole life is shown, yr: a little beyond the last visible glow of a white
    /// dwarf, or three times the age at which a neutron star or black hole was left. Any age up to
    /// [`END_YR`] can still be asked for.
    #[must_use]
    pub fn shown_until_yr(&self) -> f64 {
        self.shown_until_yr
    }

    /// What to know about every date of this history, one sentence: published lifetimes of red dwarfs differ.
    #[must_use]
    pub fn dates_remark(&self) -> Option<&'static str> {
        let star = &self.system.star;
        WholeLife::needs_structure(star.mass_msun).then(|| match star.red_dwarf_surface {
            SurfaceOpacity::Modern => StarCaution::LifetimesDiffer.text(),
            SurfaceOpacity::Of1997 => StarCaution::OldSurface.text(),
        })
    }

    /// The star alone at an age, yr (held within 0 to [`END_YR`]).
    #[must_use]
    pub fn star_at(&self, age_yr: f64) -> StarState {
        self.life.state_at(age_yr)
    }

    /// Everything at one moment, yr (held within 0 to [`END_YR`]).
    #[must_use]
    pub fn moment(&self, age_yr: f64) -> Moment {
        let time_yr = held(age_yr);
        let state = self.life.state_at(time_yr);
        let mut notes: Vec<Note> = notes::of_star(&self.life, time_yr, &state);
        let mut planets = Vec::with_capacity(self.planets.len());
        for (index, past) in self.planets.iter().enumerate() {
            let planet = past.moment(time_yr, &state);
            notes.extend(notes::of_planet(index, past.specification(), &planet, &state));
            planets.push(planet);
        }
        notes.extend(neighbour_notes::of_neighbours(&self.planets, &planets, state.mass_msun));
        Moment { time_yr, star: self.star_moment(&state), planets, notes }
    }

    /// The figures of star and planets at an age without the notes: what plots and tables read in bulk.
    #[must_use]
    pub fn figures_at(&self, age_yr: f64) -> (StarMoment, Vec<PlanetMoment>) {
        let time_yr = held(age_yr);
        let state = self.life.state_at(time_yr);
        (self.star_moment(&state), self.planets.iter().map(|past| past.moment(time_yr, &state)).collect())
    }

    fn star_moment(&self, state: &StarState) -> StarMoment {
        let surface = self.system.star.red_dwarf_surface;
        let interior = self.life.interior_at(state.age_yr);
        StarMoment {
            contraction_yr: self.life.contraction_yr(),
            has_old_surface: interior.is_some() && surface == SurfaceOpacity::Of1997,
            ..StarMoment::new(state, interior)
        }
    }

    /// One planet at one moment.
    #[must_use]
    pub fn planet_at(&self, index: usize, age_yr: f64) -> Option<PlanetMoment> {
        let time_yr = held(age_yr);
        self.planets.get(index).map(|past| past.moment(time_yr, &self.life.state_at(time_yr)))
    }
}

/// Holds an age within what is computed; what is no number counts as birth.
#[must_use]
pub fn held(age_yr: f64) -> f64 {
    if age_yr.is_nan() { 0.0 } else { age_yr.clamp(0.0, END_YR) }
}

/// The star of a system without problems.
fn checked_input(system: &System) -> Result<StarInput, HistoryError> {
    let input = star_input(system);
    let problems = system.problems();
    if problems.is_empty() {
        return Ok(input);
    }
    // A star outside the computed masses gets the sentence that says why; ranges alone do not.
    input.checked()?;
    Err(HistoryError::Inputs(problems))
}

/// What the life of a system's star follows from.
#[must_use]
pub fn star_input(system: &System) -> StarInput {
    StarInput { mass_msun: system.star.mass_msun, metallicity_dex: system.star.metallicity_dex }
}

/// The user's choices of how the life of the star is computed.
#[must_use]
pub fn life_options(system: &System) -> LifeOptions {
    LifeOptions { surface: system.star.red_dwarf_surface }
}

/// The star's nodes as planets feel them.
fn star_points(life: &WholeLife) -> Vec<StarPoint> {
    let mut points: Vec<StarPoint> = Vec::with_capacity(life.node_ages_yr().len());
    let mut was_remnant = false;
    for &age_yr in life.node_ages_yr() {
        let state = life.state_at(age_yr);
        let is_remnant = state.phase.is_remnant();
        let collapses = is_remnant && !was_remnant && !state.phase.is_white_dwarf();
        if collapses {
            // The last moment before the collapse, so that the mass is lost at once and not over the last step.
            let before = life.state_at(age_yr.next_down());
            points.push(star_point(&before, false));
        }
        points.push(star_point(&state, collapses));
        was_remnant = is_remnant;
    }
    points.sort_by(|first, second| first.age_yr.total_cmp(&second.age_yr));
    points
}

/// The star as planets feel it.
pub(super) fn star_point(state: &StarState, lost_mass_suddenly: bool) -> StarPoint {
    StarPoint {
        age_yr: state.age_yr,
        mass_msun: state.mass_msun,
        luminosity_lsun: state.luminosity_lsun,
        radius_rsun: state.radius_rsun,
        effective_temperature_k: state.effective_temperature_k,
        envelope_mass_msun: if state.phase.is_giant() {
            (state.mass_msun - state.core_mass_msun).max(0.0)
        } else {
            0.0
        },
        is_giant: state.phase.is_giant(),
        is_remnant: state.phase.is_remnant(),
        lost_mass_suddenly,
    }
}

fn shown_until_yr(life: &WholeLife) -> f64 {
    let Some(last) = life.spans().last() else { return END_YR };
    if !last.phase.is_white_dwarf() {
        return if last.phase.is_remnant() { (3.0 * last.from_yr).min(END_YR) } else { END_YR };
    }
    let glows = |age_yr: f64| life.state_at(age_yr).effective_temperature_k > DRAPER_POINT_K;
    if glows(END_YR) {
        return END_YR;
    }
    // A cooling white dwarf only dims, so halving the logarithm of its age finds the end of the glow.
    let (mut early, mut late) = (last.from_yr.max(1.0).ln(), END_YR.ln());
    for _ in 0..60 {
        let middle = 0.5 * (early + late);
        if glows(middle.exp()) { early = middle } else { late = middle }
    }
    (1.15 * late.exp()).min(END_YR)
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::system::{StarSpecification, Water};

    fn system() -> System {
        let planet = |name: &str, semi_major_axis_au| PlanetSpecification {
            name: name.to_owned(),
            semi_major_axis_au,
            water: Some(Water::default()),
            ..PlanetSpecification::default()
        };
        System { star: StarSpecification::default(), planets: vec![planet("Near", 1.0), planet("Far", 4.0)] }
    }

    fn after(earlier: &History, system: &System) -> History {
        History::compute_after(Some(earlier), system.clone(), &mut |_| ControlFlow::Continue(())).expect("computed")
    }

    #[test]
    fn what_did_not_change_is_taken_over_and_nothing_else() {
        let first = History::compute(system()).expect("computed");
        let mut edited = system();
        edited.planets[1].mass_mearth = 2.0;
        let second = after(&first, &edited);
        assert!(Arc::ptr_eq(&first.life, &second.life));
        assert!(Arc::ptr_eq(&first.planets[0], &second.planets[0]), "untouched");
        assert_eq!(second.planets[1].specification().mass_mearth, 2.0);
        edited.star.mass_msun = 1.1;
        let third = after(&second, &edited);
        assert!(!Arc::ptr_eq(&second.life, &third.life));
        assert!(!Arc::ptr_eq(&second.planets[0], &third.planets[0]), "its star is another one");
    }

    #[test]
    fn a_history_does_not_depend_on_the_one_before() {
        let first = History::compute(system()).expect("computed");
        first.prepare_climates();
        let mut edited = system();
        edited.planets[0].semi_major_axis_au = 1.05;
        edited.planets.swap(0, 1);
        let (reused, alone) = (after(&first, &edited), History::compute(edited).expect("computed"));
        assert_eq!(reused.events(), alone.events());
        for age_yr in [0.0, 1e9, 4.57e9, 1.05e10, 1.1e10, 1.23e10, 1e12] {
            assert_eq!(reused.moment(age_yr), alone.moment(age_yr), "{age_yr}");
            assert_eq!(reused.climate_at(0, age_yr), alone.climate_at(0, age_yr), "{age_yr}");
        }
    }
}
