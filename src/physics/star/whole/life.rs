//! A star's whole life, whatever its mass.

use super::blend;
use super::computed::Computed;
use super::fitted::Fitted;
use super::interior::Interior;
use super::no_profile::NoProfile;
use super::quick_look::quick_look;
use super::told::Told;
use crate::physics::star::caution::StarCaution;
use crate::physics::star::convective::{
    self, ConvectiveError, ConvectiveInput, Ending, Life, Options, Profile, Resolution, SurfaceOpacity,
};
use crate::physics::star::error::StarError;
use crate::physics::star::event::{StarEvent, StarEventKind};
use crate::physics::star::input::{END_YR, MASS_RANGE_MSUN, StarInput};
use crate::physics::star::phase::PhaseSpan;
use crate::physics::star::state::StarState;
use crate::physics::star::track::Track;
use std::ops::ControlFlow;

/// Mass up to which a life is that of the computed structure alone, solar masses.
pub const COMPUTED_BELOW_MSUN: f64 = 0.40;
/// Mass from which a life is that of the analytic fits alone, solar masses.
pub const FITTED_FROM_MSUN: f64 = 0.50;
/// Age of the universe, yr. Source: Planck Collaboration 2020, A&A 641, A6 (13.8 Gyr), rounded up.
const OLDEST_STAR_YR: f64 = 1.4e10;

/// Choices of how a life is computed.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
pub struct LifeOptions {
    /// How opaque the surface of a red dwarf is.
    pub surface: SurfaceOpacity,
}

/// A star's whole life, from arrival on the main sequence to [`END_YR`].
///
/// Below 0.40 solar masses the structure calculation of [`convective`], from 0.50 on the fits of [`Track`], between them
/// both at equal evolutionary points: the logarithms of luminosity, radius and of the length of every stretch of life
/// are blended with weight s = x² (3 − 2x), x = (M − 0.40)/0.10.
///
/// # Source
/// As [`convective::compute`] and [`Track`]; the blend is ours.
///
/// # Valid for
/// [`MASS_RANGE_MSUN`] and [`METALLICITY_RANGE_DEX`](crate::physics::star::METALLICITY_RANGE_DEX).
///
/// # Example
/// ```
/// use longember::physics::star::{Phase, StarInput, WholeLife};
/// use std::ops::ControlFlow;
/// let input = StarInput { mass_msun: 1.0, metallicity_dex: 0.0 };
/// let life = WholeLife::compute(input, Default::default(), &mut |_share| ControlFlow::Continue(()))?;
/// assert_eq!(life.state_at(4.57e9).phase, Phase::MainSequence);
/// # Ok::<(), longember::physics::star::StarError>(())
/// ```
#[derive(Clone, Debug)]
pub struct WholeLife {
    input: StarInput,
    course: Course,
    /// Of a life whose structure was computed.
    inside: Option<Inside>,
}

/// What a computed life knows beyond what is told of it.
#[derive(Clone, Debug)]
struct Inside {
    profiles: Vec<Profile>,
    ending: Ending,
    contraction_yr: f64,
}

#[derive(Clone, Debug)]
enum Course {
    Fitted(Box<Fitted>),
    Told(Box<Told>),
}

impl WholeLife {
    /// Computes a whole life.
    ///
    /// `progress` is told the share that is done and may stop the computation. Red dwarfs take seconds, other stars
    /// milliseconds.
    ///
    /// # Errors
    /// [`StarError`] when an input is out of range, the body a brown dwarf, its structure cannot be followed, or the
    /// computation was stopped.
    pub fn compute(
        input: StarInput,
        options: LifeOptions,
        progress: &mut dyn FnMut(f64) -> ControlFlow<()>,
    ) -> Result<Self, StarError> {
        let input = input.checked()?;
        if !Self::needs_structure(input.mass_msun) {
            return Self::fitted(input);
        }
        let life = Self::structure(input, options, progress)?;
        Self::of_structure(input, options, &life)
    }

    /// Whether a star of this mass needs its structure computed, which takes seconds.
    #[must_use]
    pub fn needs_structure(mass_msun: f64) -> bool {
        mass_msun < FITTED_FROM_MSUN
    }

    /// Computes the structure of a red dwarf through its life.
    ///
    /// # Errors
    /// As [`WholeLife::compute`].
    pub fn structure(
        input: StarInput,
        options: LifeOptions,
        progress: &mut dyn FnMut(f64) -> ControlFlow<()>,
    ) -> Result<Life, StarError> {
        let StarInput { mass_msun, metallicity_dex } = input.checked()?;
        let options = Options { resolution: Resolution::Standard, surface: options.surface };
        convective::compute_with(ConvectiveInput { mass_msun, metallicity_dex }, options, progress).map_err(|error| {
            match error {
                ConvectiveError::Cancelled => StarError::Cancelled,
                ConvectiveError::BrownDwarf { .. } => {
                    StarError::BrownDwarf { value_msun: mass_msun, least_msun: MASS_RANGE_MSUN.0 }
                }
                other => StarError::Structure(other),
            }
        })
    }

    /// The whole life of a star whose structure was computed.
    ///
    /// # Errors
    /// [`StarError`] when an input is out of range, or the life holds too few moments to be one.
    pub fn of_structure(input: StarInput, options: LifeOptions, life: &Life) -> Result<Self, StarError> {
        let input = input.checked()?;
        if !Self::needs_structure(input.mass_msun) {
            return Self::fitted(input);
        }
        let computed = Computed::new(life, options.surface);
        if computed.moments.len() < 3 {
            return Err(StarError::Structure(ConvectiveError::NoStart { mass_msun: input.mass_msun }));
        }
        let x = ((input.mass_msun - COMPUTED_BELOW_MSUN) / (FITTED_FROM_MSUN - COMPUTED_BELOW_MSUN)).clamp(0.0, 1.0);
        let share = x * x * (3.0 - 2.0 * x);
        let told = if share > 0.0 {
            let track = Track::compute(input)?;
            match blend::landmarks(&track) {
                Some(landmarks) => blend::blended(&computed, &track, landmarks, share),
                None => computed.told(),
            }
        } else {
            computed.told()
        };
        let inside =
            Inside { profiles: life.profiles.clone(), ending: life.ending, contraction_yr: life.contraction_yr };
        Ok(Self { input, course: Course::Told(Box::new(told)), inside: Some(inside) })
    }

    /// A first look at the life of a red dwarf within milliseconds, marked as such by its cautions.
    ///
    /// Nothing for other stars, which need none, and outside the grid of lives computed in advance.
    #[must_use]
    pub fn quick_look(input: StarInput, options: LifeOptions) -> Option<Self> {
        let StarInput { mass_msun, metallicity_dex } = input.checked().ok()?;
        if !Self::needs_structure(mass_msun) {
            return None;
        }
        let life = quick_look(ConvectiveInput { mass_msun, metallicity_dex }, options.surface)?;
        let mut whole = Self::of_structure(input, options, &life).ok()?;
        if let Course::Told(told) = &mut whole.course {
            told.cautions.insert(0, StarCaution::QuickLook);
        }
        Some(whole)
    }

    /// Whether this is only a first look, interpolated between lives computed in advance.
    #[must_use]
    pub fn is_quick_look(&self) -> bool {
        matches!(&self.course, Course::Told(told) if told.cautions.contains(&StarCaution::QuickLook))
    }

    fn fitted(input: StarInput) -> Result<Self, StarError> {
        Ok(Self { input, course: Course::Fitted(Box::new(Fitted::new(Track::compute(input)?))), inside: None })
    }

    /// The star the life belongs to.
    #[must_use]
    pub fn input(&self) -> StarInput {
        self.input
    }

    /// The star at an age in yr, held within 0 to [`END_YR`].
    ///
    /// At the very age of a change the new phase has begun.
    #[must_use]
    pub fn state_at(&self, age_yr: f64) -> StarState {
        match &self.course {
            Course::Fitted(fitted) => fitted.state_at(age_yr),
            Course::Told(told) => told.state_at(held(age_yr)),
        }
    }

    /// The inside of the star at an age in yr, where its structure was computed.
    #[must_use]
    pub fn interior_at(&self, age_yr: f64) -> Option<Interior> {
        match &self.course {
            Course::Fitted(_) => None,
            Course::Told(told) => Some(told.interior_at(held(age_yr))),
        }
    }

    /// The inside of the star at an age in yr, layer by layer.
    ///
    /// # Errors
    /// [`NoProfile`] says why there is none.
    pub fn profile_at(&self, age_yr: f64) -> Result<Profile, NoProfile> {
        let (Course::Told(told), Some(inside)) = (&self.course, &self.inside) else { return Err(NoProfile::Fitted) };
        if self.is_quick_look() {
            return Err(NoProfile::QuickLook);
        }
        let of_core = if inside.ending == Ending::GiantBranch { NoProfile::CoreAlone } else { NoProfile::Crystal };
        let structure_yr = told.structure_yr(held(age_yr));
        let profile = convective::profile_at(&inside.profiles, structure_yr).ok_or(of_core)?;
        Ok(Profile { age_yr, ..profile })
    }

    /// How long the young star contracted before its hydrogen burnt steadily, yr, where that was computed.
    #[must_use]
    pub fn contraction_yr(&self) -> Option<f64> {
        self.inside.as_ref().map(|inside| inside.contraction_yr)
    }

    /// Ages between which the life is smooth, yr, strictly rising from 0 to [`END_YR`].
    #[must_use]
    pub fn node_ages_yr(&self) -> &[f64] {
        match &self.course {
            Course::Fitted(fitted) => fitted.track.node_ages_yr(),
            Course::Told(told) => told.node_ages(),
        }
    }

    /// The phases in order, without gaps, from age 0 to [`END_YR`].
    #[must_use]
    pub fn spans(&self) -> &[PhaseSpan] {
        match &self.course {
            Course::Fitted(fitted) => &fitted.spans,
            Course::Told(told) => &told.spans,
        }
    }

    /// The turning points in order of age.
    #[must_use]
    pub fn events(&self) -> &[StarEvent] {
        match &self.course {
            Course::Fitted(fitted) => &fitted.events,
            Course::Told(told) => &told.events,
        }
    }

    /// Age of an event, yr, if it happens.
    #[must_use]
    pub fn age_of_yr(&self, kind: StarEventKind) -> Option<f64> {
        self.events().iter().find(|event| event.kind == kind).map(|event| event.age_yr)
    }

    /// Mass of the convective envelope at an age, solar masses; of a star mixed throughout, the whole mass.
    #[must_use]
    pub fn convective_envelope_msun(&self, age_yr: f64) -> f64 {
        match &self.course {
            Course::Fitted(fitted) => fitted.track.convective_envelope_msun(age_yr),
            Course::Told(told) => {
                let state = told.state_at(held(age_yr));
                if state.phase.is_remnant() {
                    0.0
                } else {
                    told.interior_at(held(age_yr)).mixed_mass_fraction * state.mass_msun
                }
            }
        }
    }

    /// What to keep in mind about the state at an age.
    #[must_use]
    pub fn cautions_at(&self, age_yr: f64) -> Vec<StarCaution> {
        let told = match &self.course {
            Course::Fitted(fitted) => return fitted.track.cautions_at(age_yr),
            Course::Told(told) => told,
        };
        let state = told.state_at(held(age_yr));
        let mut cautions = told.cautions.clone();
        let mut add = |applies: bool, caution: StarCaution| {
            if applies {
                cautions.push(caution);
            }
        };
        add(state.age_yr > OLDEST_STAR_YR, StarCaution::UncheckedLongLife);
        add(state.phase.is_giant() && state.effective_temperature_k < 5400.0, StarCaution::GiantRadiusUncertain);
        cautions
    }
}

fn held(age_yr: f64) -> f64 {
    if age_yr.is_nan() { 0.0 } else { age_yr.clamp(0.0, END_YR) }
}
