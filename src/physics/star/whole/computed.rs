//! From a computed structure to a whole life.

use super::moment::{Moment, at_age};
use super::told::{Outline, Told};
use crate::physics::star::caution::StarCaution;
use crate::physics::star::convective::{Caution, Ending, Life, Node, Stage, SurfaceOpacity};
use crate::physics::star::event::{StarEvent, StarEventKind};
use crate::physics::star::input::END_YR;
use crate::physics::star::phase::Phase;
use crate::physics::star::white_dwarf::WhiteDwarf;

/// Hydrogen at the centre below which it counts as spent, mass fraction.
const SPENT: f64 = 0.01;
/// Difference of hydrogen between surface and centre up to which the star counts as mixed throughout, mass fraction.
const MIXED: f64 = 0.01;
/// A star that was mixed throughout for a shorter share of its core burning than this is not named after it.
///
/// The share falls from a third at 0.34 solar masses to a tenth at 0.36: the edge of full convection.
const SHORTLY_MIXED: f64 = 0.1;
/// Share of the star in its helium core at the base of the giant branch: as in the fits at 0.4 solar masses.
const CORE_AT_GIANT_BASE: f64 = 0.22;
/// Years in which a giant whose structure could not be followed settles as a white dwarf.
const SETTLING_YR: f64 = 1e5;

/// Ages between which two lives are compared, yr: birth, spent core, base of the giant branch, largest radius, white
/// dwarf.
pub(super) type Landmarks = [f64; 5];

/// A computed life from its arrival on the main sequence on.
#[derive(Clone, Debug)]
pub(super) struct Computed {
    pub(super) moments: Vec<Moment>,
    pub(super) landmarks: Landmarks,
    pub(super) cautions: Vec<StarCaution>,
    mixing_ends_yr: Option<f64>,
    blue_dwarf_yr: Option<f64>,
    is_giant: bool,
}

impl Computed {
    /// Reads a computed life.
    pub(super) fn new(life: &Life, surface: SurfaceOpacity) -> Self {
        let nodes: Vec<&Node> = life.nodes.iter().filter(|node| node.age_yr >= 0.0).collect();
        let birth_msun = nodes.first().map_or(0.0, |node| node.mass_msun);
        let mut moments: Vec<Moment> = nodes.iter().map(|node| Moment::of(node)).collect();
        if let Some(first) = moments.first_mut() {
            first.age_yr = 0.0;
        }
        let end_yr = moments.last().map_or(0.0, |moment| moment.age_yr);
        let spent_yr = moments
            .windows(2)
            .find(|pair| pair[1].core_hydrogen_fraction < SPENT)
            .map_or(end_yr, |pair| crossing_yr(&pair[0], &pair[1], SPENT));
        let is_giant = nodes.iter().any(|node| node.stage == Stage::GiantBranch);
        let start_of = |stage: Stage| nodes.iter().find(|node| node.stage == stage).map(|node| node.age_yr);
        let white_dwarf_yr = start_of(Stage::HeliumWhiteDwarf).unwrap_or(end_yr).max(spent_yr);
        let late = moments.iter().filter(|moment| (spent_yr..=white_dwarf_yr).contains(&moment.age_yr));
        let largest_yr =
            late.clone().max_by(|a, b| a.log_radius.total_cmp(&b.log_radius)).map_or(spent_yr, |moment| moment.age_yr);
        let base_yr = late
            .clone()
            .find(|moment| moment.core_mass_msun > CORE_AT_GIANT_BASE * birth_msun)
            .map_or(largest_yr, |moment| moment.age_yr.min(largest_yr));
        let mixed = |node: &Node| node.surface_hydrogen_fraction - node.core_hydrogen_fraction < MIXED;
        let mixing_ends_yr = nodes.iter().find(|node| !mixed(node)).map(|node| node.age_yr);
        let mut cautions: Vec<StarCaution> = life.cautions.iter().map(|caution| caution_of(*caution)).collect();
        if surface == SurfaceOpacity::Modern {
            cautions.push(StarCaution::LifetimesDiffer);
        }
        if life.ending == Ending::GiantBranch {
            cautions.push(StarCaution::GiantNotFollowed);
            cool_the_core(&mut moments);
        }
        Self {
            moments,
            landmarks: [0.0, spent_yr, base_yr, largest_yr, white_dwarf_yr],
            cautions,
            mixing_ends_yr: mixing_ends_yr.filter(|age_yr| *age_yr > SHORTLY_MIXED * spent_yr),
            blue_dwarf_yr: start_of(Stage::BlueDwarf),
            is_giant,
        }
    }

    /// The life of a star that needs nothing but its computed structure.
    pub(super) fn told(self) -> Told {
        let [_, spent_yr, base_yr, _, white_dwarf_yr] = self.landmarks;
        let event = |age_yr, kind| StarEvent { age_yr, kind };
        let mut events = vec![event(0.0, StarEventKind::MainSequenceStart)];
        let mut phases = match self.mixing_ends_yr {
            Some(age_yr) => {
                events.push(event(age_yr, StarEventKind::MixingEnds));
                vec![(Phase::FullyMixedMainSequence, 0.0), (Phase::RadiativeCore, age_yr)]
            }
            None => vec![(Phase::MainSequence, 0.0)],
        };
        events.push(event(spent_yr, StarEventKind::MainSequenceEnd));
        if self.is_giant {
            phases.extend([(Phase::HertzsprungGap, spent_yr), (Phase::FirstGiantBranch, base_yr)]);
            events.push(event(base_yr, StarEventKind::GiantBranchBase));
            events.push(event(white_dwarf_yr, StarEventKind::EnvelopeLost));
        } else if let Some(age_yr) = self.blue_dwarf_yr {
            phases.push((Phase::BlueDwarf, age_yr));
            events.push(event(age_yr, StarEventKind::BlueDwarfStart));
        }
        phases.push((Phase::HeliumWhiteDwarf, white_dwarf_yr));
        events.push(event(white_dwarf_yr, StarEventKind::WhiteDwarfBirth));
        Told::new(&self.moments, Outline { phases, white_dwarf_yr, events, cautions: self.cautions })
    }

    /// The moment at an age, yr.
    pub(super) fn at_age(&self, age_yr: f64) -> Option<Moment> {
        at_age(&self.moments, age_yr)
    }
}

/// Age at which the hydrogen at the centre falls below a share, between two moments.
fn crossing_yr(before: &Moment, after: &Moment, share: f64) -> f64 {
    let fall = before.core_hydrogen_fraction - after.core_hydrogen_fraction;
    let place = if fall > 0.0 { (before.core_hydrogen_fraction - share) / fall } else { 1.0 };
    before.age_yr + place.clamp(0.0, 1.0) * (after.age_yr - before.age_yr)
}

/// Carries a giant on as the cooling white dwarf of its core, settling smoothly from the giant's size.
fn cool_the_core(moments: &mut Vec<Moment>) {
    let Some(last) = moments.last().copied() else { return };
    let dwarf = WhiteDwarf::new(last.core_mass_msun);
    let (log_luminosity, log_radius) = dwarf.logarithms_at(0.0);
    let (brighter, larger) = (last.log_luminosity - log_luminosity, last.log_radius - log_radius);
    let mut ages: Vec<f64> = dwarf.node_ages_yr(END_YR - last.age_yr);
    ages.extend((1..64).map(|step| SETTLING_YR * f64::from(step) / 64.0));
    ages.sort_by(f64::total_cmp);
    ages.dedup();
    for cooling_yr in ages {
        let (log_luminosity, log_radius) = dwarf.logarithms_at(cooling_yr);
        let x = (cooling_yr / SETTLING_YR).min(1.0);
        let left = (1.0 - x) * (1.0 - x) * (1.0 + 2.0 * x);
        moments.push(Moment {
            age_yr: last.age_yr + cooling_yr,
            structure_yr: last.age_yr + cooling_yr,
            log_luminosity: log_luminosity + left * brighter,
            log_radius: log_radius + left * larger,
            mass_msun: last.core_mass_msun + left * (last.mass_msun - last.core_mass_msun),
            ..last
        });
    }
}

fn caution_of(caution: Caution) -> StarCaution {
    match caution {
        Caution::OutsideCalibratedMasses => StarCaution::LightRedDwarf,
        Caution::OutsideCalibratedMetallicity => StarCaution::UnusualMetals,
        Caution::OutdatedSurface => StarCaution::OldSurface,
        Caution::ShellFlashes => StarCaution::ShellFlashes,
        Caution::GiantWind => StarCaution::SmallGiantWind,
        Caution::OpacityOfMoreMetals => StarCaution::MetalPoorOpacity,
        Caution::EarlyCrystal => StarCaution::EarlyCrystal,
    }
}
