//! A star's whole life, ready to be asked for any age.

use super::analytic::{Fit, HEAVY_ELEMENTS_RANGE};
use super::calibration::{heavy_elements, hydrogen_at_birth, metallicity_dex};
use super::caution::StarCaution;
use super::course::{Course, Piece, node_ages, note_extremes, settle};
use super::error::StarError;
use super::event::{StarEvent, StarEventKind};
use super::input::{END_YR, StarInput};
use super::life::{Chapter, Life, follow};
use super::phase::{Phase, PhaseSpan};
use super::remnant::{Collapse, dark_radius_rsun};
use super::state::{StarState, effective_temperature_k};

/// A star's whole life by the analytic fits.
///
/// # Source
/// Tout, Pols, Eggleton & Han 1996, MNRAS 281, 257; Hurley, Pols & Tout 2000, MNRAS 315, 543 (burning);
/// Bédard et al. 2020, ApJ 901, 93 (white dwarfs); Fryer et al. 2012, ApJ 749, 91 (collapse).
///
/// # Valid for
/// Single, slowly rotating stars in [`FITTED_MASS_RANGE_MSUN`](super::FITTED_MASS_RANGE_MSUN) and
/// [`METALLICITY_RANGE_DEX`](super::METALLICITY_RANGE_DEX), from the zero-age main sequence to [`END_YR`].
///
/// # Example
/// ```
/// use longember::physics::star::{Phase, StarInput, Track};
/// let sun = Track::compute(StarInput { mass_msun: 1.0, metallicity_dex: 0.0 })?;
/// let today = sun.state_at(4.57e9);
/// assert_eq!(today.phase, Phase::MainSequence);
/// assert!((today.luminosity_lsun - 1.0).abs() < 0.01);
/// # Ok::<(), longember::physics::star::StarError>(())
/// ```
#[derive(Clone, Debug)]
pub struct Track {
    input: StarInput,
    spans: Vec<PhaseSpan>,
    pieces: Vec<Piece>,
    events: Vec<StarEvent>,
    node_ages: Vec<f64>,
    collapse: Option<Collapse>,
    hydrogen_at_birth: f64,
    core_exhausted_yr: f64,
    blue_ignition_msun: f64,
}

impl Track {
    /// Computes a whole life.
    ///
    /// # Errors
    /// [`StarError`] when mass or metallicity is outside the range of the fits.
    pub fn compute(input: StarInput) -> Result<Self, StarError> {
        let input = input.checked_for_fits()?;
        let (least, most) = HEAVY_ELEMENTS_RANGE;
        let fit = Fit::new(heavy_elements(input.metallicity_dex).clamp(least, most))?;
        Ok(Self::put_together(input, &fit))
    }

    /// Computes a whole life at a given heavy-element mass fraction instead of a metallicity.
    ///
    /// # Errors
    /// [`StarError`] when the mass is outside the range of the fits.
    pub fn compute_with(mass_msun: f64, fit: &Fit) -> Result<Self, StarError> {
        StarInput { mass_msun, metallicity_dex: 0.0 }.checked_for_fits()?;
        let input = StarInput { mass_msun, metallicity_dex: metallicity_dex(fit.heavy_elements()) };
        Ok(Self::put_together(input, fit))
    }

    fn put_together(input: StarInput, fit: &Fit) -> Self {
        let Life { chapters, mut events, end, core_exhausted_yr } = follow(fit, input.mass_msun);
        let mut spans: Vec<PhaseSpan> = chapters.iter().map(Chapter::span).collect();
        spans.push(PhaseSpan { phase: end.phase, from_yr: end.age_yr, to_yr: END_YR });
        let mut pieces: Vec<Piece> = chapters.iter().map(Piece::burning).collect();
        pieces.push(Piece::remnant(&end));
        settle(&spans, &mut pieces);
        let node_ages = node_ages(&spans, &pieces);
        note_extremes(&spans, &pieces, &node_ages, &mut events);
        Self {
            input,
            spans,
            pieces,
            events,
            node_ages,
            collapse: end.collapse,
            hydrogen_at_birth: hydrogen_at_birth(fit.heavy_elements()),
            core_exhausted_yr,
            blue_ignition_msun: fit.critical_masses().blue_ignition_msun,
        }
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
        let age_yr = held_age(age_yr);
        let index = self.span_index(age_yr);
        let span = self.spans[index];
        let piece = &self.pieces[index];
        let figures = piece.figures(span, age_yr);
        let hydrogen = match span.phase {
            Phase::MainSequence => {
                Some(self.hydrogen_at_birth * (1.0 - age_yr / self.core_exhausted_yr.max(1.0)).max(0.0))
            }
            phase if phase.is_remnant() => None,
            _ => Some(0.0),
        };
        let (luminosity_lsun, radius_rsun) = match piece.course {
            Course::Dark { mass_msun } => (0.0, dark_radius_rsun(span.phase, mass_msun)),
            _ => (figures.log_luminosity.exp(), figures.log_radius.exp()),
        };
        StarState {
            age_yr,
            phase: span.phase,
            mass_msun: figures.mass_msun,
            luminosity_lsun,
            radius_rsun,
            effective_temperature_k: effective_temperature_k(luminosity_lsun, radius_rsun),
            core_mass_msun: figures.core_mass_msun.min(figures.mass_msun),
            mass_loss_msun_yr: figures.mass_loss_msun_yr,
            core_hydrogen_fraction: hydrogen,
        }
    }

    /// Ages between which the life is smooth, yr, strictly rising from 0 to [`END_YR`].
    ///
    /// Just before each change of phase there is a node too, so that a sudden change keeps both of its sides.
    #[must_use]
    pub fn node_ages_yr(&self) -> &[f64] {
        &self.node_ages
    }

    /// The phases in order, without gaps, from age 0 to [`END_YR`].
    #[must_use]
    pub fn spans(&self) -> &[PhaseSpan] {
        &self.spans
    }

    /// The turning points in order of age.
    #[must_use]
    pub fn events(&self) -> &[StarEvent] {
        &self.events
    }

    /// Age of an event, yr, if it happens.
    #[must_use]
    pub fn age_of_yr(&self, kind: StarEventKind) -> Option<f64> {
        self.events.iter().find(|event| event.kind == kind).map(|event| event.age_yr)
    }

    /// The star at the moment its core collapses, if it does.
    #[must_use]
    pub fn collapse(&self) -> Option<&Collapse> {
        self.collapse.as_ref()
    }

    /// Mass of the convective envelope at an age, solar masses.
    ///
    /// On the main sequence 0.35 \[(1.25 − M)/0.9\]² (1 − τ)^¼ between 0.35 and 1.25 solar masses, nothing above; it
    /// grows through the Hertzsprung gap to the whole envelope of a giant. Giants hotter than 6500 K have none, cooler
    /// than 5400 K all of it.
    ///
    /// # Source
    /// Hurley, Tout & Pols 2002, MNRAS 329, 897, section 2.3 (from memory); limit of convective envelopes
    /// log T = 3.73 after Belczynski et al. 2008, ApJS 174, 223, softened by us.
    #[must_use]
    pub fn convective_envelope_msun(&self, age_yr: f64) -> f64 {
        let state = self.state_at(age_yr);
        let span = self.spans[self.span_index(state.age_yr)];
        let place = (state.age_yr - span.from_yr) / (span.to_yr - span.from_yr);
        let at_birth = if state.mass_msun >= 1.25 {
            0.0
        } else if state.mass_msun <= 0.35 {
            state.mass_msun
        } else {
            0.35 * ((1.25 - state.mass_msun) / 0.9).powi(2)
        };
        match state.phase {
            Phase::MainSequence => at_birth * (1.0 - place).max(0.0).powf(0.25),
            phase if phase.is_giant() || phase == Phase::HertzsprungGap => {
                let cool = ((6500.0 - state.effective_temperature_k) / 1100.0).clamp(0.0, 1.0);
                let grown = if phase == Phase::HertzsprungGap { place } else { 1.0 };
                cool * grown * state.envelope_mass_msun()
            }
            _ => 0.0,
        }
    }

    /// What to keep in mind about the state at an age.
    #[must_use]
    pub fn cautions_at(&self, age_yr: f64) -> Vec<StarCaution> {
        let state = self.state_at(age_yr);
        let (phase, born_msun) = (state.phase, self.input.mass_msun);
        let index = self.span_index(state.age_yr);
        let mut cautions = Vec::new();
        let mut add = |applies: bool, caution: StarCaution| {
            if applies {
                cautions.push(caution);
            }
        };
        add(born_msun > 50.0, StarCaution::HeavierThanModels);
        add(born_msun < 0.5, StarCaution::LighterThanModels);
        add(born_msun < 0.8 && state.age_yr > 1.4e10, StarCaution::UncheckedLongLife);
        let near = (born_msun / self.blue_ignition_msun - 1.0).abs() < 0.05;
        add(near && (phase.is_giant() || phase == Phase::HertzsprungGap), StarCaution::NearBlueIgnition);
        add(phase == Phase::MainSequence, StarCaution::CoreHydrogenEstimated);
        add(phase == Phase::PulsingAsymptoticGiant, StarCaution::PulsesAveraged);
        add(phase.is_giant() && state.effective_temperature_k < 5400.0, StarCaution::GiantRadiusUncertain);
        add(state.mass_loss_msun_yr > 0.0, StarCaution::MassLossUncertain);
        add(!phase.is_dark() && state.effective_temperature_k > 1.2e5, StarCaution::HotterThanModels);
        if let Course::Cooling(curve) = &self.pieces[index].course {
            let dwarf = curve.dwarf();
            add(!(0.2..=1.2).contains(&dwarf.mass_msun()), StarCaution::CoolingMassOutsideTables);
            add(phase != Phase::CarbonOxygenWhiteDwarf, StarCaution::CoolingCoreDiffers);
            let cooling_yr = state.age_yr - self.spans[index].from_yr;
            add(cooling_yr > dwarf.oldest_tabulated_yr(), StarCaution::CoolingOlderThanTables);
        }
        let collapsed = matches!(phase, Phase::NeutronStar | Phase::BlackHole);
        add(collapsed, StarCaution::RemnantMassUncertain);
        add(phase == Phase::NeutronStar, StarCaution::RemnantLightNotModelled);
        cautions
    }

    fn span_index(&self, age_yr: f64) -> usize {
        self.spans.partition_point(|span| span.from_yr <= age_yr).saturating_sub(1)
    }
}

fn held_age(age_yr: f64) -> f64 {
    if age_yr.is_nan() { 0.0 } else { age_yr.clamp(0.0, END_YR) }
}
