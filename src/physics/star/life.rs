//! A whole life: phase after phase, and what each passes on to the next.

use super::analytic::{CARBON_IGNITION_CORE_MSUN, CORE_COLLAPSE_CORE_MSUN, Fit, helium_star};
use super::burning::{Burning, HeliumStar, Look, helium_giant_end_msun};
use super::event::{StarEvent, StarEventKind};
use super::phase::{Phase, PhaseSpan};
use super::remnant::Collapse;
use super::step::YR_PER_MYR;

/// The star at one node: what is interpolated.
#[derive(Clone, Copy, Debug)]
pub(super) struct Node {
    pub(super) age_yr: f64,
    pub(super) look: Look,
    pub(super) mass_msun: f64,
    pub(super) mass_loss_msun_yr: f64,
}

impl Node {
    /// Whether the star looks the same at both nodes, far within the accuracy of the interpolation.
    fn is_like(&self, other: &Self) -> bool {
        let close = |a: f64, b: f64, tolerance: f64| (a - b).abs() <= tolerance * a.abs();
        close(self.look.luminosity_lsun, other.look.luminosity_lsun, 1e-4)
            && close(self.look.radius_rsun, other.look.radius_rsun, 1e-4)
            && close(self.mass_msun, other.mass_msun, 1e-5)
            && close(self.look.core_msun, other.look.core_msun, 1e-5)
            && close(self.mass_loss_msun_yr, other.mass_loss_msun_yr, 1e-2)
    }
}

/// The nodes without those at which nothing has changed, which a stiff wind leaves by the thousand.
///
/// Ends and bends stay, and so does the last node before a change, so that the change keeps its pace.
fn thinned(nodes: &[Node]) -> Vec<Node> {
    let mut kept: Vec<Node> = Vec::with_capacity(nodes.len());
    for (index, node) in nodes.iter().enumerate() {
        let before = index.checked_sub(1).and_then(|index| nodes.get(index));
        let stays = match (before, nodes.get(index + 1), kept.last()) {
            (Some(before), Some(next), Some(last)) => {
                before.age_yr == node.age_yr || next.age_yr == node.age_yr || !last.is_like(next)
            }
            _ => true,
        };
        if stays {
            kept.push(*node);
        }
    }
    kept
}

/// One phase with its nodes, first and last at its ends.
#[derive(Clone, Debug)]
pub(super) struct Chapter {
    pub(super) phase: Phase,
    pub(super) nodes: Vec<Node>,
}

impl Chapter {
    /// The phase with the ages of the first and last node.
    pub(super) fn span(&self) -> PhaseSpan {
        let age = |node: Option<&Node>| node.map_or(0.0, |node| node.age_yr);
        PhaseSpan { phase: self.phase, from_yr: age(self.nodes.first()), to_yr: age(self.nodes.last()) }
    }
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

    /// Walks through the present phase and adds its chapter.
    fn walk_phase(&mut self) -> PhaseEnd {
        let phase = self.star.phase;
        let end_myr = self.star.phase_end_myr();
        let mut nodes = Vec::with_capacity(256);
        let mut look = self.star.look();
        let mut rate_yr = self.star.wind_msun_yr(&look, self.star.mass_msun);
        let mut trusted_step_myr = f64::INFINITY;
        let reason = loop {
            nodes.push(self.node(look, rate_yr));
            if self.star.is_bare(&look) {
                break PhaseEnd::Bare;
            }
            // With wind the main sequence changes and its end with it.
            let end_myr = if phase == Phase::MainSequence || phase == Phase::HeliumMainSequence {
                self.star.phase_end_myr()
            } else {
                end_myr
            };
            let left_myr = end_myr - self.star.clock_myr;
            if left_myr <= 0.0 {
                break PhaseEnd::Time;
            }
            let least_myr = 8.0 * f64::EPSILON * self.age_myr.max(self.star.clock_myr);
            let step = self.star.step(&look, rate_yr * YR_PER_MYR, left_myr, trusted_step_myr, least_myr);
            trusted_step_myr = step.next_myr;
            self.age_myr += step.length_myr;
            self.star.take(&step, left_myr);
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
        let chapter = Chapter { phase, nodes: thinned(&nodes) };
        let span = chapter.span();
        if span.to_yr > span.from_yr {
            self.chapters.push(chapter);
        }
        reason
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

#[cfg(test)]
mod tests {
    use super::*;

    /// A helium giant of a mass at the moment its core explodes, and what it leaves.
    fn exploded(helium_msun: f64) -> (End, Vec<StarEvent>) {
        let fit = Fit::new(0.02).unwrap();
        let mut star = Burning::born(&fit, 12.0);
        star.phase = Phase::HeliumGiant;
        star.mass_msun = helium_msun;
        star.helium = HeliumStar::new(helium_msun);
        star.clock_myr = star.phase_end_myr();
        let mut walk = Walk { star, age_myr: 20.0, events: Vec::new(), chapters: Vec::new(), core_exhausted_yr: 0.0 };
        match walk.pass_on(PhaseEnd::Time) {
            Next::Remnant(end) => (end, walk.events),
            Next::Burning => unreachable!("an exploded star does not burn on"),
        }
    }

    #[test]
    fn a_light_helium_giant_that_explodes_leaves_nothing() {
        let (end, events) = exploded(1.55);
        assert_eq!((end.phase, end.mass_msun), (Phase::NoRemnant, 0.0));
        assert_eq!(events.last().map(|event| event.kind), Some(StarEventKind::ThermonuclearDisruption));
    }

    #[test]
    fn a_heavy_helium_giant_that_explodes_leaves_its_core() {
        for (mass, phase) in [(3.0, Phase::NeutronStar), (15.0, Phase::BlackHole)] {
            let (end, events) = exploded(mass);
            assert_eq!(end.phase, phase);
            assert!(end.mass_msun > 1.0 && end.mass_msun < mass);
            assert!(events.iter().any(|event| event.kind == StarEventKind::SupernovaCollapse));
        }
    }

    #[test]
    fn the_chapters_of_a_life_follow_without_gaps() {
        let life = follow(&Fit::new(0.02).unwrap(), 1.0);
        let spans: Vec<PhaseSpan> = life.chapters.iter().map(Chapter::span).collect();
        assert_eq!(spans.len(), 6);
        assert!(spans.windows(2).all(|pair| pair[0].to_yr == pair[1].from_yr));
        assert_eq!(spans.last().map(|span| span.to_yr), Some(life.end.age_yr));
    }
}
