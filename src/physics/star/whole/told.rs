//! A life told node by node, ready to be asked for any age.

use super::interior::Interior;
use super::moment::{Moment, thinned};
use crate::physics::star::caution::StarCaution;
use crate::physics::star::event::{StarEvent, StarEventKind};
use crate::physics::star::input::END_YR;
use crate::physics::star::interpolation::Curve;
use crate::physics::star::phase::{Phase, PhaseSpan};
use crate::physics::star::state::{StarState, effective_temperature_k};
use crate::physics::star::white_dwarf::BACKGROUND_TEMPERATURE_K;
use crate::units::constants::SOLAR_TEMPERATURE_K;

/// Surface temperature below which a white dwarf is called black, K. Common practice: no visible glow is left.
pub(super) const BLACK_BELOW_K: f64 = 1000.0;

/// A life with phases, events and everything in between.
#[derive(Clone, Debug)]
pub(super) struct Told {
    pub(super) spans: Vec<PhaseSpan>,
    pub(super) events: Vec<StarEvent>,
    /// What holds for the whole life.
    pub(super) cautions: Vec<StarCaution>,
    /// Logarithms of luminosity and radius, mass, core mass, mass loss, hydrogen at the centre.
    curve: Curve<6>,
    interiors: Vec<Interior>,
    node_ages: Vec<f64>,
    /// Ages at which the computed structure looks like the star at the nodes.
    structure_ages: Vec<f64>,
}

/// What a list of moments does not say itself.
#[derive(Clone, Debug)]
pub(super) struct Outline {
    /// Phases in order with the ages they start at; the last is the white dwarf.
    pub(super) phases: Vec<(Phase, f64)>,
    /// Age up to which the star burns, yr.
    pub(super) white_dwarf_yr: f64,
    /// Events besides the summits and the fading to black.
    pub(super) events: Vec<StarEvent>,
    /// What holds for the whole life.
    pub(super) cautions: Vec<StarCaution>,
}

impl Told {
    /// A life of moments in order of age, the first at age zero.
    pub(super) fn new(moments: &[Moment], outline: Outline) -> Self {
        let mut moments = thinned(moments);
        cool_to_the_sky(&mut moments);
        let node_ages: Vec<f64> = moments.iter().map(|moment| moment.age_yr).collect();
        let losses = mass_losses(&moments);
        let curve = Curve::new(moments.iter().zip(losses).map(|(moment, loss)| {
            let core = moment.core_mass_msun.min(moment.mass_msun);
            let columns =
                [moment.log_luminosity, moment.log_radius, moment.mass_msun, core, loss, moment.core_hydrogen_fraction];
            (moment.age_yr, columns)
        }));
        let Outline { mut phases, white_dwarf_yr, mut events, cautions } = outline;
        note_summits(&moments, white_dwarf_yr, &phases, &mut events);
        if let Some(black_yr) = black_from_yr(&moments, white_dwarf_yr) {
            phases.push((Phase::BlackDwarf, black_yr));
            events.push(StarEvent { age_yr: black_yr, kind: StarEventKind::BlackDwarfBirth });
        }
        events.sort_by(|first, second| first.age_yr.total_cmp(&second.age_yr));
        let ends = phases.iter().skip(1).map(|(_, from_yr)| *from_yr).chain([END_YR]);
        let spans = phases.iter().zip(ends).map(|(&(phase, from_yr), to_yr)| PhaseSpan { phase, from_yr, to_yr });
        Self {
            spans: spans.filter(|span| span.to_yr > span.from_yr).collect(),
            events,
            cautions,
            curve,
            interiors: moments.iter().map(|moment| moment.interior).collect(),
            node_ages,
            structure_ages: moments.iter().map(|moment| moment.structure_yr).collect(),
        }
    }

    /// Ages between which the life is smooth, yr, strictly rising from 0 to [`END_YR`].
    pub(super) fn node_ages(&self) -> &[f64] {
        &self.node_ages
    }

    /// The star at an age from 0 to [`END_YR`], yr.
    pub(super) fn state_at(&self, age_yr: f64) -> StarState {
        let index = self.spans.partition_point(|span| span.from_yr <= age_yr).saturating_sub(1);
        let phase = self.spans[index].phase;
        let [log_luminosity, log_radius, mass_msun, core_mass_msun, mass_loss_msun_yr, hydrogen] =
            self.curve.at(age_yr);
        let (luminosity_lsun, radius_rsun) = (log_luminosity.exp(), log_radius.exp());
        StarState {
            age_yr,
            phase,
            mass_msun,
            luminosity_lsun,
            radius_rsun,
            effective_temperature_k: effective_temperature_k(luminosity_lsun, radius_rsun),
            core_mass_msun: core_mass_msun.min(mass_msun),
            mass_loss_msun_yr,
            core_hydrogen_fraction: (!phase.is_remnant()).then_some(hydrogen),
        }
    }

    /// The inside of the star at an age from 0 to [`END_YR`], yr.
    pub(super) fn interior_at(&self, age_yr: f64) -> Interior {
        let (next, share) = self.place(age_yr);
        self.interiors[next - 1].towards(&self.interiors[next], share)
    }

    /// The age at which the computed structure looks like the star at an age from 0 to [`END_YR`], yr.
    pub(super) fn structure_yr(&self, age_yr: f64) -> f64 {
        let (next, share) = self.place(age_yr);
        let [before, after] = [self.structure_ages[next - 1], self.structure_ages[next]];
        before + share * (after - before)
    }

    /// The node after an age, and how far the age lies between the node before and this one.
    fn place(&self, age_yr: f64) -> (usize, f64) {
        let last = self.interiors.len() - 1;
        let next = self.node_ages.partition_point(|node| *node <= age_yr).clamp(1, last);
        let (from, to) = (self.node_ages[next - 1], self.node_ages[next]);
        (next, ((age_yr - from) / (to - from)).clamp(0.0, 1.0))
    }
}

fn temperature_k(moment: &Moment) -> f64 {
    SOLAR_TEMPERATURE_K * (0.25 * moment.log_luminosity - 0.5 * moment.log_radius).exp()
}

/// Carries the last moments on to [`END_YR`]: the temperature falls exponentially, as for a crystal whose heat capacity
/// vanishes, at the pace of the last two moments, down to that of the sky.
fn cool_to_the_sky(moments: &mut Vec<Moment>) {
    moments.retain(|moment| moment.age_yr < END_YR);
    let [.., before, last] = moments[..] else { return };
    let excess = (temperature_k(&last) / BACKGROUND_TEMPERATURE_K).ln();
    let pace = (temperature_k(&before) / temperature_k(&last)).ln() / (last.age_yr - before.age_yr);
    let colder = |age_yr: f64, fall: f64| Moment {
        age_yr,
        structure_yr: last.structure_yr + age_yr - last.age_yr,
        log_luminosity: last.log_luminosity - 4.0 * fall,
        ..last
    };
    let mut fallen = 0.0;
    if pace > 0.0 && excess > 0.0 {
        const STEP: f64 = 0.06;
        while fallen < excess {
            fallen = (fallen + STEP).min(excess);
            let age_yr = last.age_yr + fallen / pace;
            if age_yr >= END_YR {
                fallen -= (age_yr - END_YR) * pace;
                break;
            }
            moments.push(colder(age_yr, fallen));
        }
    }
    moments.push(colder(END_YR, fallen));
}

/// Mass lost a year at each moment, from the moments beside it.
fn mass_losses(moments: &[Moment]) -> Vec<f64> {
    (0..moments.len())
        .map(|index| {
            let before = &moments[index.saturating_sub(1)];
            let after = &moments[(index + 1).min(moments.len() - 1)];
            let time_yr = after.age_yr - before.age_yr;
            if time_yr > 0.0 { ((before.mass_msun - after.mass_msun) / time_yr).max(0.0) } else { 0.0 }
        })
        .collect()
}

/// Adds the moments of largest radius and highest luminosity, and of the hottest surface of a blue dwarf.
fn note_summits(moments: &[Moment], white_dwarf_yr: f64, phases: &[(Phase, f64)], events: &mut Vec<StarEvent>) {
    let highest = |value: fn(&Moment) -> f64, until_yr: f64| {
        let burning = moments.iter().filter(|moment| moment.age_yr <= until_yr);
        burning.max_by(|a, b| value(a).total_cmp(&value(b))).map_or(0.0, |moment| moment.age_yr)
    };
    let mut add = |age_yr, kind| events.push(StarEvent { age_yr, kind });
    add(highest(|moment| moment.log_radius, white_dwarf_yr), StarEventKind::LargestRadius);
    add(highest(|moment| moment.log_luminosity, white_dwarf_yr), StarEventKind::HighestLuminosity);
    if phases.iter().any(|(phase, _)| *phase == Phase::BlueDwarf) {
        add(highest(temperature_k, END_YR), StarEventKind::HottestSurface);
    }
}

/// Age from which the white dwarf is too cold to glow, yr.
fn black_from_yr(moments: &[Moment], white_dwarf_yr: f64) -> Option<f64> {
    let cold =
        moments.iter().position(|moment| moment.age_yr > white_dwarf_yr && temperature_k(moment) < BLACK_BELOW_K)?;
    let (after, before) = (&moments[cold], &moments[cold.checked_sub(1)?]);
    let share = (temperature_k(before) / BLACK_BELOW_K).ln() / (temperature_k(before) / temperature_k(after)).ln();
    let age_yr = before.age_yr + share.clamp(0.0, 1.0) * (after.age_yr - before.age_yr);
    Some(age_yr.max(white_dwarf_yr))
}
