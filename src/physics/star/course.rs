//! What is evaluated during each span of a life, and the steps between spans.

use super::event::{StarEvent, StarEventKind};
use super::input::END_YR;
use super::interpolation::Curve;
use super::life::{Chapter, End, Node};
use super::phase::PhaseSpan;
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

/// What to evaluate during one span.
#[derive(Clone, Debug)]
pub(super) struct Piece {
    pub(super) course: Course,
    settling: Option<Settling>,
}

#[derive(Clone, Debug)]
pub(super) enum Course {
    /// Logarithms of luminosity and radius, mass, core mass, mass-loss rate.
    Burning(Curve<5>),
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

/// Luminosity, radius, mass, core mass and mass loss in the units of [`StarState`](super::StarState).
pub(super) struct Figures {
    pub(super) log_luminosity: f64,
    pub(super) log_radius: f64,
    pub(super) mass_msun: f64,
    pub(super) core_mass_msun: f64,
    pub(super) mass_loss_msun_yr: f64,
}

impl Piece {
    /// The course of a phase the star burns through.
    pub(super) fn burning(chapter: &Chapter) -> Self {
        Self { course: Course::Burning(Curve::new(chapter.nodes.iter().map(columns))), settling: None }
    }

    /// The course of a remnant.
    pub(super) fn remnant(end: &End) -> Self {
        let course = if end.phase.is_white_dwarf() {
            Course::Cooling(WhiteDwarf::new(end.mass_msun).curve())
        } else {
            Course::Dark { mass_msun: end.mass_msun }
        };
        Self { course, settling: None }
    }

    pub(super) fn figures(&self, span: PhaseSpan, age_yr: f64) -> Figures {
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
pub(super) fn settle(spans: &[PhaseSpan], pieces: &mut [Piece]) {
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
pub(super) fn note_extremes(spans: &[PhaseSpan], pieces: &[Piece], node_ages: &[f64], events: &mut Vec<StarEvent>) {
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

pub(super) fn node_ages(spans: &[PhaseSpan], pieces: &[Piece]) -> Vec<f64> {
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
