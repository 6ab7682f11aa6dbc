//! A whole life: phase after phase, step by step, with the wind.

use super::analytic::{CARBON_IGNITION_CORE_MSUN, CORE_COLLAPSE_CORE_MSUN, CoreGrowth, Fit, helium_star};
use super::burning::{Burning, HeliumStar, Look, helium_giant_end_msun};
use super::event::{StarEvent, StarEventKind};
use super::phase::Phase;
use super::remnant::Collapse;
use super::small_envelope::thin_envelope_measure;

const YR_PER_MYR: f64 = 1e6;

/// The envelope counts as gone when the star is heavier than its core by less than this fraction.
const GONE: f64 = 1e-4;
/// A burnt-out helium core counts as bare below this fraction of the measure at which it outshines its envelope.
const TRACE: f64 = 0.2;
/// Largest error of log luminosity and log radius halfway between two nodes if joined by a straight line.
const NODE_TOLERANCE: f64 = 2e-3;
/// Largest change of log luminosity and log radius between two nodes.
const NODE_CHANGE: f64 = 0.2;
/// Largest error of the mass lost in one step, as a fraction of the envelope.
const LOSS_TOLERANCE: f64 = 5e-4;
/// Longest step in units of the time of a phase, with wind.
const SPAN_STEP: f64 = 5e-3;
/// Longest step in units of the time of a phase, without noticeable wind.
const CALM_SPAN_STEP: f64 = 2e-2;
/// Longest step in units of the time left until core growth would run away.
const GROWTH_STEP: f64 = 1.5e-2;
/// Largest fraction of the envelope, and of the star, lost in one step.
const ENVELOPE_STEP: f64 = 2e-2;
const MASS_STEP: f64 = 1e-2;
/// Largest growth of the core in one step, as a fraction of the envelope.
const CORE_STEP: f64 = 5e-2;

/// The star at one node: what is interpolated.
#[derive(Clone, Copy, Debug)]
pub(super) struct Node {
    pub(super) age_yr: f64,
    pub(super) look: Look,
    pub(super) mass_msun: f64,
    pub(super) mass_loss_msun_yr: f64,
}

/// One phase with its nodes, first and last at its ends.
#[derive(Clone, Debug)]
pub(super) struct Chapter {
    pub(super) phase: Phase,
    pub(super) nodes: Vec<Node>,
}

/// What burning ends in.
#[derive(Clone, Copy, Debug)]
pub(super) struct End {
    pub(super) phase: Phase,
    pub(super) mass_msun: f64,
    pub(super) age_yr: f64,
    pub(super) collapse: Option<Collapse>,
}

/// A star's life up to the birth of its remnant.
#[derive(Clone, Debug)]
pub(super) struct Life {
    pub(super) chapters: Vec<Chapter>,
    pub(super) events: Vec<StarEvent>,
    pub(super) end: End,
    /// Age at which the centre has no hydrogen left, yr.
    pub(super) core_exhausted_yr: f64,
}

/// Why a phase ends.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
enum PhaseEnd {
    /// Its time is over: what burnt is spent, or the core explodes.
    Time,
    /// The envelope is gone.
    Bare,
}

/// What comes after a phase.
enum Next {
    Burning,
    Remnant(End),
}

/// Follows a star of `mass_msun` from birth to its remnant.
pub(super) fn follow(fit: &Fit, mass_msun: f64) -> Life {
    let mut walk = Walk {
        star: Burning::born(fit, mass_msun),
        age_myr: 0.0,
        events: vec![StarEvent { age_yr: 0.0, kind: StarEventKind::MainSequenceStart }],
        chapters: Vec::with_capacity(8),
        core_exhausted_yr: 0.0,
    };
    let end = loop {
        let reason = walk.walk_phase();
        if let Next::Remnant(end) = walk.pass_on(reason) {
            break end;
        }
    };
    Life { chapters: walk.chapters, events: walk.events, end, core_exhausted_yr: walk.core_exhausted_yr }
}

struct Walk<'a> {
    star: Burning<'a>,
    age_myr: f64,
    events: Vec<StarEvent>,
    chapters: Vec<Chapter>,
    core_exhausted_yr: f64,
}

impl Walk<'_> {
    fn age_yr(&self) -> f64 {
        self.age_myr * YR_PER_MYR
    }

    fn note(&mut self, kind: StarEventKind) {
        self.events.push(StarEvent { age_yr: self.age_yr(), kind });
    }

    fn node(&self, look: Look, mass_loss_msun_yr: f64) -> Node {
        Node { age_yr: self.age_yr(), look, mass_msun: self.star.mass_msun, mass_loss_msun_yr }
    }

    /// Time on the clock at which the phase is over, Myr: burning ends, or the core is massive enough to explode.
    fn phase_end_myr(&self) -> f64 {
        let (star, a) = (&self.star, &self.star.anchors);
        match star.phase {
            Phase::MainSequence => star.main_sequence.end_myr,
            Phase::HertzsprungGap => a.main_sequence.base_myr,
            Phase::FirstGiantBranch => a.ignition_myr,
            Phase::CoreHeliumBurning => a.asymptotic_base_myr(),
            Phase::EarlyAsymptoticGiant => a.early_end_myr(),
            Phase::PulsingAsymptoticGiant => a.pulses_explosion_myr(),
            Phase::HeliumMainSequence => star.helium.burning_myr,
            _ => {
                let growth = &star.helium.growth;
                growth.time_at_myr(growth.relation().luminosity_lsun(star.helium.explosive_core_msun))
            }
        }
    }

    /// Longest step the course itself allows, Myr.
    fn course_step_myr(&self, rate_msun_myr: f64) -> f64 {
        let (star, a) = (&self.star, &self.star.anchors);
        let growth = |growth: &CoreGrowth| GROWTH_STEP * growth.left_myr(star.clock_myr);
        let span = |span_myr: f64| {
            let calm = rate_msun_myr * span_myr < 1e-3 * star.mass_msun;
            span_myr * if calm { CALM_SPAN_STEP } else { SPAN_STEP }
        };
        match star.phase {
            Phase::MainSequence => span(star.main_sequence.end_myr),
            Phase::HertzsprungGap => span(a.main_sequence.base_myr - a.main_sequence.end_myr),
            Phase::FirstGiantBranch => a.giant_growth.as_ref().map_or(f64::INFINITY, growth),
            Phase::CoreHeliumBurning => span(a.core_helium_myr),
            Phase::EarlyAsymptoticGiant => growth(&a.early_growth),
            Phase::PulsingAsymptoticGiant => growth(a.pulse_growth.as_ref().unwrap_or(&a.early_growth)),
            Phase::HeliumMainSequence => span(star.helium.burning_myr),
            _ => growth(&star.helium.growth),
        }
    }

    /// Times on the clock at which the course bends sharply; nodes are put there.
    fn bends_myr(&self) -> [f64; 2] {
        let (star, a) = (&self.star, &self.star.anchors);
        let none = f64::NEG_INFINITY;
        match star.phase {
            Phase::MainSequence => star.main_sequence.bends_myr(),
            Phase::FirstGiantBranch => [a.giant_growth.as_ref().map_or(none, CoreGrowth::bend_myr), none],
            Phase::CoreHeliumBurning => {
                star.fit.blue_phase(a).map(|fraction| a.ignition_myr + fraction * a.core_helium_myr)
            }
            Phase::EarlyAsymptoticGiant => [a.early_growth.bend_myr(), none],
            Phase::PulsingAsymptoticGiant => [a.pulse_growth.as_ref().map_or(none, CoreGrowth::bend_myr), none],
            Phase::HeliumGiant => [star.helium.growth.bend_myr(), none],
            _ => [none, none],
        }
    }

    /// Whether the star has nothing left around its core, so that the phase cannot go on.
    fn is_bare(&self, look: &Look) -> bool {
        let (star, a) = (&self.star, &self.star.anchors);
        match star.phase {
            Phase::MainSequence | Phase::HeliumMainSequence => false,
            // A core that explodes does so with or without its envelope.
            Phase::HeliumGiant => look.envelope_msun <= 0.0 && look.inner_core_msun < star.helium.explosive_core_msun,
            Phase::PulsingAsymptoticGiant if look.core_msun >= a.explosive_core_msun => false,
            // Under the last trace of envelope the helium star inside has burnt out: it cools from now on.
            Phase::EarlyAsymptoticGiant
                if look.envelope_measure < TRACE * thin_envelope_measure(star.mass_msun)
                    && look.inner_core_msun >= helium_star::largest_core_msun(look.core_msun)
                    && look.inner_core_msun < a.explosive_core_msun =>
            {
                true
            }
            _ => look.envelope_msun <= GONE * look.core_msun,
        }
    }

    /// Walks through the present phase and adds its chapter.
    fn walk_phase(&mut self) -> PhaseEnd {
        let phase = self.star.phase;
        let end_myr = self.phase_end_myr();
        let mut nodes = Vec::with_capacity(256);
        let mut look = self.star.look();
        let mut rate_yr = self.star.wind_msun_yr(&look, self.star.mass_msun);
        let mut trusted_step_myr = f64::INFINITY;
        let reason = loop {
            nodes.push(self.node(look, rate_yr));
            if self.is_bare(&look) {
                break PhaseEnd::Bare;
            }
            // With wind the main sequence changes and its end with it.
            let end_myr = if phase == Phase::MainSequence || phase == Phase::HeliumMainSequence {
                self.phase_end_myr()
            } else {
                end_myr
            };
            let left_myr = end_myr - self.star.clock_myr;
            if left_myr <= 0.0 {
                break PhaseEnd::Time;
            }
            let step = self.step(&look, rate_yr * YR_PER_MYR, left_myr, trusted_step_myr);
            trusted_step_myr = step.next_myr;
            self.take(&step, left_myr);
            (look, rate_yr) = (step.look, step.rate_msun_yr);
            if step.track_changed {
                look = self.star.look();
                rate_yr = self.star.wind_msun_yr(&look, self.star.mass_msun);
            }
            if step.at_bend {
                // A node twice tells the interpolation that the course bends here.
                nodes.push(self.node(look, rate_yr));
            }
        };
        let lasted = nodes.last().zip(nodes.first()).is_some_and(|(last, first)| last.age_yr > first.age_yr);
        if lasted {
            self.chapters.push(Chapter { phase, nodes });
        }
        reason
    }

    /// One midpoint step, as long as accuracy allows.
    fn step(&self, look: &Look, rate: f64, left_myr: f64, trusted_myr: f64) -> Step {
        let star = &self.star;
        let envelope = look.envelope_msun;
        let mut length = self.course_step_myr(rate).min(trusted_myr);
        if rate > 0.0 {
            length = length.min(ENVELOPE_STEP * envelope / rate).min(MASS_STEP * star.mass_msun / rate);
        }
        let mut bend_myr = f64::INFINITY;
        for bend in self.bends_myr() {
            if bend > star.clock_myr * (1.0 + 1e-14) {
                bend_myr = bend_myr.min(bend - star.clock_myr);
            }
        }
        length = length.min(bend_myr);
        length = length.min(left_myr);
        // Below this the age would not advance.
        let least = 8.0 * f64::EPSILON * self.age_myr.max(star.clock_myr);
        loop {
            length = length.max(least.min(left_myr));
            let middle_mass = (star.mass_msun - 0.5 * rate * length).max(0.5 * star.mass_msun);
            let middle = star.look_at(star.clock_myr + 0.5 * length, middle_mass);
            let middle_rate = star.wind_msun_yr(&middle, middle_mass) * YR_PER_MYR;
            if middle_rate * length > envelope && length > least {
                length = 0.5 * envelope / middle_rate;
                continue;
            }
            let lost = (middle_rate * length).min(envelope.max(0.0));
            let mut mass = star.mass_msun - lost;
            let mut end = star.look_at(star.clock_myr + length, mass);
            if end.envelope_msun < 0.0 && end.core_msun < star.mass_msun {
                // The core has grown into the last of the envelope.
                mass = end.core_msun.max(mass);
                end = star.look_at(star.clock_myr + length, mass);
            }
            let end_rate_yr = star.wind_msun_yr(&end, mass);
            let bow = |middle: f64, start: f64, end: f64| (middle * middle / (start * end)).ln().abs() * 0.5;
            let surface = bow(middle.luminosity_lsun, look.luminosity_lsun, end.luminosity_lsun).max(bow(
                middle.radius_rsun,
                look.radius_rsun,
                end.radius_rsun,
            ));
            let room = envelope.clamp(GONE * star.mass_msun, star.mass_msun);
            let loss = (middle_rate - 0.5 * (rate + end_rate_yr * YR_PER_MYR)).abs() * length / room;
            let change = (end.luminosity_lsun / look.luminosity_lsun)
                .ln()
                .abs()
                .max((end.radius_rsun / look.radius_rsun).ln().abs());
            let error = (surface / NODE_TOLERANCE).max(loss / LOSS_TOLERANCE).max((change / NODE_CHANGE).powi(2));
            let growth = (end.eating_core_msun(star.phase) - look.eating_core_msun(star.phase)) / (CORE_STEP * room);
            if (error > 1.0 || growth > 1.0) && length > 4.0 * least {
                length *= (0.9 / error.sqrt()).min(0.9 / growth.max(1e-9)).clamp(0.1, 0.7);
                continue;
            }
            return Step {
                length_myr: length,
                next_myr: length * (0.8 / error.max(1e-9).sqrt()).clamp(0.5, 2.0),
                mass_msun: mass,
                look: end,
                rate_msun_yr: end_rate_yr,
                track_changed: lost > 0.0 && matches!(star.phase, Phase::MainSequence | Phase::HeliumMainSequence),
                at_bend: length >= bend_myr,
            };
        }
    }

    /// Moves the star by a step.
    fn take(&mut self, step: &Step, left_myr: f64) {
        let end_of_phase = step.length_myr >= left_myr;
        self.age_myr += step.length_myr;
        let star = &mut self.star;
        star.mass_msun = step.mass_msun;
        if !step.track_changed {
            star.clock_myr += if end_of_phase { left_myr } else { step.length_myr };
            return;
        }
        // The pace is the mean of that on the old and on the new track.
        let advance = |old: f64, new: f64| {
            let fraction = star.clock_myr / old + 0.5 * step.length_myr * (1.0 / old + 1.0 / new);
            if end_of_phase { new } else { fraction.min(1.0) * new }
        };
        if star.phase == Phase::MainSequence {
            let new = star.fit.main_sequence(star.mass_msun);
            star.clock_myr = advance(star.main_sequence.end_myr, new.end_myr);
            star.main_sequence = new;
        } else {
            let new = HeliumStar::new(star.mass_msun);
            star.clock_myr = advance(star.helium.burning_myr, new.burning_myr);
            star.helium = new;
        }
    }

    /// Starts what comes after the phase.
    fn pass_on(&mut self, reason: PhaseEnd) -> Next {
        match (self.star.phase, reason) {
            (Phase::MainSequence, _) => {
                let star = &mut self.star;
                star.anchors = star.fit.anchors(star.main_sequence.mass_msun);
                let ms = star.anchors.main_sequence;
                star.clock_myr = ms.end_myr;
                star.phase = Phase::HertzsprungGap;
                self.core_exhausted_yr = self.age_yr() * core_exhausted_fraction(ms.hook_myr / ms.end_myr);
                self.note(StarEventKind::MainSequenceEnd);
                Next::Burning
            }
            (Phase::HertzsprungGap, PhaseEnd::Time) if self.star.anchors.giant_growth.is_some() => {
                self.star.phase = Phase::FirstGiantBranch;
                self.star.clock_myr = self.star.anchors.main_sequence.base_myr;
                self.note(StarEventKind::GiantBranchBase);
                Next::Burning
            }
            (Phase::HertzsprungGap | Phase::FirstGiantBranch, PhaseEnd::Time) => self.ignite_helium(),
            (Phase::HertzsprungGap | Phase::FirstGiantBranch, _) => {
                self.note(StarEventKind::EnvelopeLost);
                let core = self.bare_core();
                if self.star.anchors.mass_msun < self.star.fit.critical.flash_msun {
                    self.white_dwarf(Phase::HeliumWhiteDwarf, core)
                } else {
                    self.note(StarEventKind::HeliumIgnition { flash: false });
                    self.helium_star(core, 0.0)
                }
            }
            (Phase::CoreHeliumBurning, PhaseEnd::Time) => {
                self.star.phase = Phase::EarlyAsymptoticGiant;
                self.star.clock_myr = self.star.anchors.asymptotic_base_myr();
                self.note(StarEventKind::CoreHeliumEnd);
                Next::Burning
            }
            (Phase::CoreHeliumBurning, _) => {
                self.note(StarEventKind::EnvelopeLost);
                let fraction = self.star.helium_fraction(self.star.clock_myr);
                let core = self.bare_core();
                self.helium_star(core, fraction)
            }
            (Phase::EarlyAsymptoticGiant, PhaseEnd::Time) => {
                if let Some(pulses_myr) = self.star.anchors.pulses_myr {
                    self.star.phase = Phase::PulsingAsymptoticGiant;
                    self.star.clock_myr = pulses_myr;
                    self.note(StarEventKind::ThermalPulsesStart);
                    return Next::Burning;
                }
                let a = self.star.anchors;
                let inner = self.star.look().inner_core_msun.max(a.explosive_core_msun);
                self.collapse(
                    inner.min(a.asymptotic_base_core_msun),
                    a.explosive_core_msun,
                    a.asymptotic_base_core_msun,
                )
            }
            (Phase::EarlyAsymptoticGiant, _) => {
                self.note(StarEventKind::EnvelopeLost);
                let inner = self.star.look().inner_core_msun;
                let core = self.bare_core();
                self.star.helium = HeliumStar::with_core(core, inner);
                self.star.phase = Phase::HeliumGiant;
                self.star.clock_myr = 0.0;
                Next::Burning
            }
            (Phase::PulsingAsymptoticGiant, PhaseEnd::Time) => {
                let a = self.star.anchors;
                self.collapse(self.star.look().inner_core_msun, a.explosive_core_msun, a.asymptotic_base_core_msun)
            }
            (Phase::PulsingAsymptoticGiant, _) => {
                self.note(StarEventKind::EnvelopeLost);
                let core = self.bare_core();
                let phase = Burning::white_dwarf_phase(self.star.anchors.asymptotic_base_core_msun);
                self.white_dwarf(phase, core)
            }
            (Phase::HeliumMainSequence, _) => {
                self.note(StarEventKind::CoreHeliumEnd);
                self.star.helium = HeliumStar::new(self.star.mass_msun);
                self.star.phase = Phase::HeliumGiant;
                self.star.clock_myr = 0.0;
                Next::Burning
            }
            (_, PhaseEnd::Time) => {
                let helium = self.star.helium.mass_msun;
                // A helium giant above the carbon-ignition mass collapses; below it its carbon burns explosively.
                let class = if helium < CARBON_IGNITION_CORE_MSUN { helium } else { CORE_COLLAPSE_CORE_MSUN };
                let inner = self.star.look().inner_core_msun;
                self.collapse(inner, self.star.helium.explosive_core_msun, class)
            }
            (_, _) => {
                let inner = self.star.look().inner_core_msun;
                let mass = helium_giant_end_msun(self.star.mass_msun, inner);
                let phase = Burning::white_dwarf_phase(self.star.helium.mass_msun);
                self.white_dwarf(phase, mass)
            }
        }
    }

    /// Takes the last of the envelope off and gives the mass of the bare core, solar masses.
    fn bare_core(&mut self) -> f64 {
        let core = self.star.look().core_msun.min(self.star.mass_msun);
        self.star.mass_msun = core;
        core
    }

    fn ignite_helium(&mut self) -> Next {
        let flash = self.star.anchors.mass_msun < self.star.fit.critical.flash_msun;
        self.note(StarEventKind::HeliumIgnition { flash });
        let star = &mut self.star;
        if flash {
            star.anchors = star.fit.anchors(star.mass_msun);
        }
        star.clock_myr = star.anchors.ignition_myr;
        star.phase = Phase::CoreHeliumBurning;
        Next::Burning
    }

    fn helium_star(&mut self, mass_msun: f64, fraction: f64) -> Next {
        self.star.helium = HeliumStar::new(mass_msun);
        self.star.phase = Phase::HeliumMainSequence;
        self.star.clock_myr = fraction * helium_star::core_burning_myr(mass_msun);
        Next::Burning
    }

    fn white_dwarf(&mut self, phase: Phase, mass_msun: f64) -> Next {
        self.note(StarEventKind::WhiteDwarfBirth);
        Next::Remnant(End { phase, mass_msun, age_yr: self.age_yr(), collapse: None })
    }

    /// The core explodes or collapses. `helium_core_msun` tells which: below the carbon-ignition mass nothing is left.
    fn collapse(&mut self, carbon_oxygen_core_msun: f64, explosive_core_msun: f64, helium_core_msun: f64) -> Next {
        let age_yr = self.age_yr();
        if helium_core_msun < CARBON_IGNITION_CORE_MSUN {
            self.note(StarEventKind::ThermonuclearDisruption);
            return Next::Remnant(End { phase: Phase::NoRemnant, mass_msun: 0.0, age_yr, collapse: None });
        }
        let collapse = Collapse {
            age_yr,
            mass_msun: self.star.mass_msun,
            carbon_oxygen_core_msun: carbon_oxygen_core_msun.min(self.star.mass_msun),
            explosive_core_msun,
            by_electron_capture: helium_core_msun < CORE_COLLAPSE_CORE_MSUN,
        };
        let (phase, mass_msun) = collapse.remnant();
        self.note(StarEventKind::SupernovaCollapse);
        self.note(if phase == Phase::NeutronStar {
            StarEventKind::NeutronStarBirth
        } else {
            StarEventKind::BlackHoleBirth
        });
        Next::Remnant(End { phase, mass_msun, age_yr, collapse: Some(collapse) })
    }
}

/// Fraction of the main sequence after which the centre has no hydrogen left.
///
/// Stars with a hook exhaust it there. Below, the fits stretch the main sequence past it; the Sun's own ratio is kept.
fn core_exhausted_fraction(hook_fraction: f64) -> f64 {
    hook_fraction.clamp(0.847, 1.0)
}

/// One step of the walk.
struct Step {
    length_myr: f64,
    next_myr: f64,
    mass_msun: f64,
    look: Look,
    rate_msun_yr: f64,
    /// The star has come to the track of another mass.
    track_changed: bool,
    /// The course bends sharply where the step ends.
    at_bend: bool,
}
