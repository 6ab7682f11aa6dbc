//! The whole past and future of a system, computed once, read at any moment.

use super::events::{self, Event};
use super::moment::{Moment, PlanetMoment, StarMoment};
use super::neighbour_notes;
use super::notes::{self, Note};
use super::planet_past::PlanetPast;
use super::specification::{Body, System, SystemProblem};
use crate::physics::light::DRAPER_POINT_K;
use crate::physics::planet::{OutOfRange, StarPoint};
use crate::physics::star::convective::SurfaceOpacity;
use crate::physics::star::{END_YR, LifeOptions, PhaseSpan, StarCaution, StarError, StarInput, StarState, WholeLife};
use std::ops::ControlFlow;
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
    life: WholeLife,
    planets: Vec<PlanetPast>,
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
        let input = checked_input(&system)?;
        let mut star_progress = |share: f64| progress(STAR_SHARE * share);
        let life = WholeLife::compute(input, life_options(&system), &mut star_progress)?;
        Self::of_life(system, life, progress)
    }

    /// A first look within milliseconds at a system whose exact history takes seconds, from lives computed in advance.
    ///
    /// Nothing for other systems, or outside those lives; [`WholeLife::is_quick_look`] tells it from an exact history.
    #[must_use]
    pub fn quick_look(system: System) -> Option<Self> {
        let life = WholeLife::quick_look(checked_input(&system).ok()?, life_options(&system))?;
        Self::of_life(system, life, &mut |_| ControlFlow::Continue(())).ok()
    }

    /// Carries the planets along a life of the star that is known already.
    ///
    /// # Errors
    /// As [`History::compute_with`].
    pub fn of_life(
        system: System,
        life: WholeLife,
        progress: &mut dyn FnMut(f64) -> ControlFlow<()>,
    ) -> Result<Self, HistoryError> {
        checked_input(&system)?;
        let points = star_points(&life);
        let count = system.planets.len();
        let mut planets: Vec<PlanetPast> = Vec::with_capacity(count);
        for planet in &system.planets {
            let walked = PlanetPast::walk(planet.clone(), &points);
            planets.push(walked.map_err(|refusal| HistoryError::Planet { name: planet.name.clone(), refusal })?);
            let share = planets.len() as f64 / count as f64;
            if progress(STAR_SHARE + (1.0 - STAR_SHARE) * share).is_break() {
                return Err(HistoryError::Cancelled);
            }
        }
        let shown_until_yr = shown_until_yr(&life);
        let mut history = Self { system, life, planets, events: Vec::new(), shown_until_yr };
        history.events = events::of(&history);
        Ok(history)
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
    pub fn planets(&self) -> &[PlanetPast] {
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
