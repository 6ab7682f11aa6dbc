//! A star's whole life, ready to be asked for any age.

use super::analytic::{Fit, HEAVY_ELEMENTS_RANGE};
use super::calibration::{heavy_elements, hydrogen_at_birth, metallicity_dex};
use super::caution::StarCaution;
use super::error::StarError;
use super::event::{StarEvent, StarEventKind};
use super::input::{END_YR, StarInput};
use super::interpolation::Curve;
use super::life::{Life, Node, follow};
use super::phase::{Phase, PhaseSpan};
use super::remnant::{Collapse, dark_radius_rsun};
use super::state::{StarState, effective_temperature_k};
use super::white_dwarf::{CoolingCurve, WhiteDwarf};

/// Time in which a star settles after a sudden turn of its core, yr.
///
/// The fits step from one phase to the next in no time at all where a real star takes some thousand years, above all
/// from the tip of the giant branch down to the horizontal branch after the helium flash. Such steps are spread over
/// this time, or a tenth of the new phase where that is shorter.
///
/// # Source
/// Fall of the luminosity after the flash: about 10⁴ yr, Bildsten, Paxton, Moore & Macias 2012, ApJ 744, L6 (from
/// memory). The shape is ours.
const SETTLING_YR: f64 = 1e4;

/// Largest change of log luminosity and log radius between two node ages of a settling.
const SETTLING_STEP: f64 = 0.15;

/// A star's whole life.
///
/// # Source
/// Tout, Pols, Eggleton & Han 1996, MNRAS 281, 257; Hurley, Pols & Tout 2000, MNRAS 315, 543 (burning);
/// Bédard et al. 2020, ApJ 901, 93 (white dwarfs); Fryer et al. 2012, ApJ 749, 91 (collapse).
///
/// # Valid for
/// Single, slowly rotating stars in [`MASS_RANGE_MSUN`](super::MASS_RANGE_MSUN) and
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

/// What to evaluate during one span.
#[derive(Clone, Debug)]
struct Piece {
    course: Course,
    settling: Option<Settling>,
}

#[derive(Clone, Debug)]
enum Course {
    /// Logarithms of luminosity and radius, mass, core mass, mass-loss rate.
    Burning(Curve),
    Cooling(CoolingCurve),
    Dark {
        mass_msun: f64,
    },
}

/// A step at the start of a span, spread over some time.
#[derive(Clone, Copy, Debug)]
struct Settling {
    log_luminosity: f64,
    log_radius: f64,
    lasts_yr: f64,
}

impl Settling {
    /// What is left of the step after a time: all of it at first, then smoothly less.
    fn left(&self, since_yr: f64) -> f64 {
        let x = (since_yr / self.lasts_yr).clamp(0.0, 1.0);
        (1.0 - x) * (1.0 - x) * (1.0 + 2.0 * x)
    }

    /// Times since the start between which it is nearly straight, yr.
    fn node_times_yr(&self) -> impl Iterator<Item = f64> {
        // The middle of the settling is half again as steep as its mean.
        let wanted = 1.5 * self.log_luminosity.abs().max(self.log_radius.abs()) / SETTLING_STEP;
        let count = (8_u32..=128).find(|&count| f64::from(count) >= wanted).unwrap_or(128);
        let lasts_yr = self.lasts_yr;
        (1..=count).map(move |step| lasts_yr * f64::from(step) / f64::from(count))
    }
}

/// Luminosity, radius, mass, core mass and mass loss in the units of [`StarState`].
struct Figures {
    log_luminosity: f64,
    log_radius: f64,
    mass_msun: f64,
    core_mass_msun: f64,
    mass_loss_msun_yr: f64,
}

impl Track {
    /// Computes a whole life.
    ///
    /// # Errors
    /// [`StarError`] when mass or metallicity is outside the range of the fits.
    pub fn compute(input: StarInput) -> Result<Self, StarError> {
        let input = input.checked()?;
        let (least, most) = HEAVY_ELEMENTS_RANGE;
        let fit = Fit::new(heavy_elements(input.metallicity_dex).clamp(least, most))?;
        Ok(Self::put_together(input, &fit))
    }

    /// Computes a whole life at a given heavy-element mass fraction instead of a metallicity.
    ///
    /// # Errors
    /// [`StarError`] when the mass is outside the range of the fits.
    pub fn compute_with(mass_msun: f64, fit: &Fit) -> Result<Self, StarError> {
        StarInput { mass_msun, metallicity_dex: 0.0 }.checked()?;
        let input = StarInput { mass_msun, metallicity_dex: metallicity_dex(fit.heavy_elements()) };
        Ok(Self::put_together(input, fit))
    }

    fn put_together(input: StarInput, fit: &Fit) -> Self {
        let Life { chapters, mut events, end, core_exhausted_yr } = follow(fit, input.mass_msun);
        let mut spans = Vec::with_capacity(chapters.len() + 1);
        let mut pieces: Vec<Piece> = Vec::with_capacity(chapters.len() + 1);
        for chapter in chapters {
            let curve = Curve::new(chapter.nodes.iter().map(columns));
            let from_yr = curve.ages().first().copied().unwrap_or(0.0);
            let to_yr = curve.ages().last().copied().unwrap_or(0.0);
            spans.push(PhaseSpan { phase: chapter.phase, from_yr, to_yr });
            pieces.push(Piece { course: Course::Burning(curve), settling: None });
        }
        spans.push(PhaseSpan { phase: end.phase, from_yr: end.age_yr, to_yr: END_YR });
        let course = if end.phase.is_white_dwarf() {
            Course::Cooling(WhiteDwarf::new(end.mass_msun).curve())
        } else {
            Course::Dark { mass_msun: end.mass_msun }
        };
        pieces.push(Piece { course, settling: None });
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

impl Piece {
    fn figures(&self, span: PhaseSpan, age_yr: f64) -> Figures {
        let since_yr = age_yr - span.from_yr;
        let mut figures = match &self.course {
            Course::Burning(curve) => {
                let [log_luminosity, log_radius, mass_msun, core_mass_msun, mass_loss_msun_yr] = curve.at(age_yr);
                Figures { log_luminosity, log_radius, mass_msun, core_mass_msun, mass_loss_msun_yr }
            }
            Course::Cooling(curve) => {
                let (log_luminosity, log_radius) = curve.logarithms_at(since_yr);
                let mass = curve.dwarf().mass_msun();
                Figures { log_luminosity, log_radius, mass_msun: mass, core_mass_msun: mass, mass_loss_msun_yr: 0.0 }
            }
            Course::Dark { mass_msun } => Figures {
                log_luminosity: 0.0,
                log_radius: 0.0,
                mass_msun: *mass_msun,
                core_mass_msun: *mass_msun,
                mass_loss_msun_yr: 0.0,
            },
        };
        if let Some(settling) = &self.settling
            && since_yr < settling.lasts_yr
        {
            let left = settling.left(since_yr);
            figures.log_luminosity += left * settling.log_luminosity;
            figures.log_radius += left * settling.log_radius;
        }
        figures
    }
}

fn held_age(age_yr: f64) -> f64 {
    if age_yr.is_nan() { 0.0 } else { age_yr.clamp(0.0, END_YR) }
}

fn columns(node: &Node) -> (f64, [f64; 5]) {
    let look = &node.look;
    (
        node.age_yr,
        [
            look.luminosity_lsun.ln(),
            look.radius_rsun.ln(),
            node.mass_msun,
            look.core_msun.min(node.mass_msun),
            node.mass_loss_msun_yr,
        ],
    )
}

/// Spreads steps between phases over the settling time, except where the star explodes.
fn settle(spans: &[PhaseSpan], pieces: &mut [Piece]) {
    for index in 1..pieces.len() {
        let span = spans[index];
        if span.phase.is_dark() {
            continue;
        }
        let before = pieces[index - 1].figures(spans[index - 1], span.from_yr);
        let after = pieces[index].figures(span, span.from_yr);
        let log_luminosity = before.log_luminosity - after.log_luminosity;
        let log_radius = before.log_radius - after.log_radius;
        if log_luminosity.abs().max(log_radius.abs()) > 1e-9 {
            let lasts_yr = SETTLING_YR.min(0.1 * (span.to_yr - span.from_yr));
            pieces[index].settling = Some(Settling { log_luminosity, log_radius, lasts_yr });
        }
    }
}

/// Adds the moments of largest radius and highest luminosity, and puts all events in order of age.
fn note_extremes(spans: &[PhaseSpan], pieces: &[Piece], node_ages: &[f64], events: &mut Vec<StarEvent>) {
    let mut largest = (f64::NEG_INFINITY, 0.0);
    let mut brightest = (f64::NEG_INFINITY, 0.0);
    for (span, piece) in spans.iter().zip(pieces).filter(|(span, _)| !span.phase.is_remnant()) {
        let from = node_ages.partition_point(|&age| age < span.from_yr);
        for &age in node_ages[from..].iter().take_while(|&&age| age < span.to_yr) {
            let figures = piece.figures(*span, age);
            if figures.log_radius > largest.0 {
                largest = (figures.log_radius, age);
            }
            if figures.log_luminosity > brightest.0 {
                brightest = (figures.log_luminosity, age);
            }
        }
    }
    // First in the list, so that of equal ages the summit comes before what ends it.
    events.splice(
        0..0,
        [
            StarEvent { age_yr: largest.1, kind: StarEventKind::LargestRadius },
            StarEvent { age_yr: brightest.1, kind: StarEventKind::HighestLuminosity },
        ],
    );
    events.sort_by(|a, b| a.age_yr.total_cmp(&b.age_yr));
}

fn node_ages(spans: &[PhaseSpan], pieces: &[Piece]) -> Vec<f64> {
    let mut ages = Vec::new();
    for (span, piece) in spans.iter().zip(pieces) {
        let last = span.to_yr >= END_YR;
        let start = ages.len();
        match &piece.course {
            Course::Burning(curve) => ages.extend_from_slice(curve.ages()),
            Course::Cooling(curve) => {
                ages.push(span.from_yr);
                ages.extend(
                    curve.dwarf().node_ages_yr(END_YR - span.from_yr).into_iter().map(|age| span.from_yr + age),
                );
            }
            Course::Dark { .. } => ages.extend([span.from_yr, END_YR]),
        }
        if let Some(settling) = &piece.settling {
            ages.extend(settling.node_times_yr().map(|since_yr| span.from_yr + since_yr));
        }
        // The last node of a phase stands just before the first of the next.
        let end = if last { END_YR } else { span.to_yr.next_down() };
        for age in &mut ages[start..] {
            *age = age.min(end);
        }
        ages.push(end);
        ages[start..].sort_by(f64::total_cmp);
    }
    ages.dedup_by(|next, kept| *next <= *kept);
    ages
}
