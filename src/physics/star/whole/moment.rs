//! One moment of a life that is told node by node.

use super::interior::{Interior, traceless};
use crate::physics::star::convective::Node;

/// The star at one node.
#[derive(Clone, Copy, Debug)]
pub(super) struct Moment {
    pub(super) age_yr: f64,
    /// Age at which the computed structure looks like this; another one where lives are blended.
    pub(super) structure_yr: f64,
    /// Natural logarithm of the luminosity, solar units.
    pub(super) log_luminosity: f64,
    /// Natural logarithm of the radius, solar units.
    pub(super) log_radius: f64,
    pub(super) mass_msun: f64,
    pub(super) core_mass_msun: f64,
    pub(super) core_hydrogen_fraction: f64,
    pub(super) interior: Interior,
}

/// Shortest time between two moments that are kept, as a share of the age: some hundred years of a giant's life.
const SHORTEST: f64 = 2e-9;
/// Most moments that are left out in a row.
const LONGEST_GAP: usize = 48;
/// How far a moment left out may lie from the straight line between its neighbours, in units of [`Moment::scaled`].
const TOLERANCE: f64 = 1.0;

impl Moment {
    /// A moment of a computed life.
    pub(super) fn of(node: &Node) -> Self {
        Self {
            age_yr: node.age_yr,
            structure_yr: node.age_yr,
            log_luminosity: node.luminosity_lsun.ln(),
            log_radius: node.radius_rsun.ln(),
            mass_msun: node.mass_msun,
            core_mass_msun: node.helium_core_mass_msun.min(node.mass_msun),
            core_hydrogen_fraction: traceless(node.core_hydrogen_fraction),
            interior: Interior::of(node),
        }
    }

    /// The moment a share of the way to a later one.
    pub(super) fn towards(&self, later: &Self, share: f64) -> Self {
        let even = |a: f64, b: f64| a + share * (b - a);
        Self {
            age_yr: even(self.age_yr, later.age_yr),
            structure_yr: even(self.structure_yr, later.structure_yr),
            log_luminosity: even(self.log_luminosity, later.log_luminosity),
            log_radius: even(self.log_radius, later.log_radius),
            mass_msun: even(self.mass_msun, later.mass_msun),
            core_mass_msun: even(self.core_mass_msun, later.core_mass_msun),
            core_hydrogen_fraction: even(self.core_hydrogen_fraction, later.core_hydrogen_fraction),
            interior: self.interior.towards(&later.interior, share),
        }
    }

    /// The quantities in units of the error that nobody sees.
    fn scaled(&self) -> [f64; 7] {
        let inside = &self.interior;
        [
            self.log_luminosity / 1e-3,
            self.log_radius / 1e-3,
            self.mass_msun / 1e-5,
            self.core_mass_msun / 1e-4,
            self.core_hydrogen_fraction / 1e-3,
            inside.core_temperature_k.ln() / 2e-3,
            inside.mixed_mass_fraction / 5e-3,
        ]
    }
}

/// The moment of a list at an age, on the straight line between its neighbours; held at the ends.
pub(super) fn at_age(moments: &[Moment], age_yr: f64) -> Option<Moment> {
    let next = moments.partition_point(|moment| moment.age_yr <= age_yr);
    let before = moments.get(next.saturating_sub(1))?;
    let Some(after) = moments.get(next) else { return Some(*before) };
    if next == 0 {
        return Some(*after);
    }
    Some(before.towards(after, (age_yr - before.age_yr) / (after.age_yr - before.age_yr)))
}

/// The moments without those that say nothing new.
pub(super) fn thinned(moments: &[Moment]) -> Vec<Moment> {
    let mut apart: Vec<Moment> = Vec::with_capacity(moments.len());
    for moment in moments {
        if apart.last().is_none_or(|last| moment.age_yr - last.age_yr > SHORTEST * moment.age_yr) {
            apart.push(*moment);
        }
    }
    let mut kept: Vec<Moment> = Vec::with_capacity(apart.len());
    let mut from = 0;
    while let Some(start) = apart.get(from) {
        kept.push(*start);
        let mut to = from + 1;
        while to + 1 < apart.len() && to - from < LONGEST_GAP && runs_straight(&apart[from..=to + 1]) {
            to += 1;
        }
        from = to;
    }
    kept
}

/// Whether all moments lie close to the straight line from the first to the last.
fn runs_straight(moments: &[Moment]) -> bool {
    let [first, inner @ .., last] = moments else { return true };
    inner.iter().all(|moment| {
        let share = (moment.age_yr - first.age_yr) / (last.age_yr - first.age_yr);
        let line = first.towards(last, share);
        moment.scaled().iter().zip(line.scaled()).all(|(is, straight)| (is - straight).abs() < TOLERANCE)
    })
}
