//! The walk of an orbit from node to node of the star's track.

use super::orbit::{self, AfterSuddenLoss, Cohesion};
use super::orbit_history::{OrbitEnd, OrbitHistory, OrbitInput, OrbitNode};
use super::star_point::StarPoint;
use super::tides::{OrbitRates, TidalPair, Tides, equilibrium_tide, giant_drag};
use crate::units::constants::{EARTH_MASSES_PER_SOLAR_MASS, EARTH_RADIUS_AU, SOLAR_RADIUS_AU};

/// Change of ln a and of ln e in one step of the tides.
const AXIS_STEP: f64 = 0.02;
const ECCENTRICITY_STEP: f64 = 0.05;
/// Change of ln a over a whole interval that one step can carry, even if the star swells meanwhile.
const WEAK: f64 = 1e-3;
/// Eccentricity that counts as none.
const ROUND: f64 = 1e-5;
/// Change over a whole interval too small to be worth following.
const NEGLIGIBLE: f64 = 1e-9;

/// Walks checked input to the end of the track or of the orbit.
pub(super) fn walk(input: &OrbitInput, track: &[StarPoint], tides: &Tides) -> OrbitHistory {
    let mut walk = Walk::start(input, tides, &track[0], track.len());
    walk.note_track_node();
    for pair in track.windows(2) {
        if walk.history.end.is_some() {
            break;
        }
        walk.advance(&pair[0], &pair[1]);
        walk.note_track_node();
    }
    walk.history
}

/// The distance inside which the star ends the planet, au, and how: the photosphere or the fluid Roche limit
/// 2.44 R (M/m)^⅓, whichever is farther out.
fn reach_au(input: &OrbitInput, star: &StarPoint) -> (f64, OrbitEnd) {
    let photosphere_au = star.radius_rsun * SOLAR_RADIUS_AU;
    let mass_ratio = star.mass_msun * EARTH_MASSES_PER_SOLAR_MASS / input.mass_mearth;
    let roche_au = Cohesion::Fluid.factor() * input.radius_rearth * EARTH_RADIUS_AU * mass_ratio.cbrt();
    if photosphere_au >= roche_au { (photosphere_au, OrbitEnd::Engulfed) } else { (roche_au, OrbitEnd::TornApart) }
}

/// The walk in progress: where the planet is now and what has been written down.
struct Walk<'a> {
    input: &'a OrbitInput,
    tides: &'a Tides,
    history: OrbitHistory,
    now: OrbitNode,
    /// Periastron over the star's reach.
    ratio: f64,
}

impl<'a> Walk<'a> {
    fn start(input: &'a OrbitInput, tides: &'a Tides, star: &StarPoint, capacity: usize) -> Self {
        let now = OrbitNode {
            age_yr: star.age_yr,
            semi_major_axis_au: input.semi_major_axis_au,
            eccentricity: input.eccentricity,
        };
        let history = OrbitHistory {
            nodes: Vec::with_capacity(capacity),
            track_nodes: Vec::with_capacity(capacity),
            end: None,
            closest_ratio: f64::INFINITY,
            largest_adiabaticity_index: 0.0,
        };
        let mut walk = Self { input, tides, history, now, ratio: f64::INFINITY };
        walk.settle(now, star);
        walk
    }

    fn note_track_node(&mut self) {
        if self.history.end.is_none() {
            self.history.track_nodes.push(self.now);
        }
    }

    /// Follows the orbit from one node of the star to the next.
    fn advance(&mut self, before: &StarPoint, after: &StarPoint) {
        if after.mass_msun <= 0.0 {
            self.finish(after.age_yr, OrbitEnd::Unbound);
        } else if after.lost_mass_suddenly && after.mass_msun < before.mass_msun {
            let (a, e) = (self.now.semi_major_axis_au, self.now.eccentricity);
            match orbit::sudden_loss(a, e, before.mass_msun, after.mass_msun) {
                AfterSuddenLoss::Unbound => self.finish(after.age_yr, OrbitEnd::Unbound),
                AfterSuddenLoss::Bound { semi_major_axis_au, eccentricity } => {
                    self.settle(OrbitNode { age_yr: after.age_yr, semi_major_axis_au, eccentricity }, after);
                }
            }
        } else {
            self.note_mass_loss_rate(before, after);
            let mut next = OrbitNode { age_yr: after.age_yr, ..self.now };
            next.semi_major_axis_au *= before.mass_msun / after.mass_msun;
            if self.tides_matter(before, after) {
                self.advance_under_tides(before, after);
            } else {
                self.settle(next, after);
            }
        }
    }

    /// Whether tides may change the orbit noticeably between two nodes.
    fn tides_matter(&self, before: &StarPoint, after: &StarPoint) -> bool {
        let span_yr = after.age_yr - before.age_yr;
        span_yr > 0.0 && !self.tides.is_off() && (after.is_giant || !self.is_too_far_for_tides(before, after, span_yr))
    }

    /// A quick look before the full rates: whether even rates far above both forms' would change nothing.
    fn is_too_far_for_tides(&self, before: &StarPoint, after: &StarPoint, span_yr: f64) -> bool {
        let OrbitNode { semi_major_axis_au: a, eccentricity: e, .. } = self.now;
        let nearest = a * (1.0 - e);
        let mass_ratio = self.input.mass_mearth / (before.mass_msun * EARTH_MASSES_PER_SOLAR_MASS);
        let on_planet = (self.input.radius_rearth * EARTH_RADIUS_AU / nearest).powi(5) / mass_ratio;
        let on_star = (before.radius_rsun.max(after.radius_rsun) * SOLAR_RADIUS_AU / nearest).powi(5) * mass_ratio;
        let dissipation = on_planet / self.tides.planet_quality + on_star / self.tides.star_quality;
        // Mean motion at the nearest point, with room for a lag that dissipates more on orbits inside the reference.
        let turns_per_yr = 10.0 * (before.mass_msun / (nearest * nearest * nearest)).sqrt();
        let faster_than_reference = (turns_per_yr * 0.02).max(1.0);
        1000.0 * dissipation * turns_per_yr * faster_than_reference * span_yr < NEGLIGIBLE
    }

    /// Integrates the tides by the midpoint rule, the star's values running straight between its nodes.
    fn advance_under_tides(&mut self, before: &StarPoint, after: &StarPoint) {
        let span_yr = after.age_yr - before.age_yr;
        let end_of_interval_yr = after.age_yr;
        let start_yr = before.age_yr;
        let mut elapsed_yr = 0.0;
        let mut star = *before;
        // A star that swells between the nodes pulls hardest at the second.
        let final_pull = self.rates(&self.now, after, after).axis_per_yr.abs();
        while elapsed_yr < span_yr && self.history.end.is_none() {
            let rates = self.rates(&self.now, &star, after);
            let longest_yr =
                if rates.axis_per_yr.abs().max(final_pull) * span_yr < WEAK { span_yr } else { 0.25 * span_yr };
            let mut step_yr = longest_yr.min(AXIS_STEP / rates.axis_per_yr.abs().max(1e-300));
            if self.now.eccentricity > ROUND {
                step_yr = step_yr.min(ECCENTRICITY_STEP / rates.eccentricity_per_yr.abs().max(1e-300));
            }
            // Ten thousand steps an interval are plenty: every step moves the orbit by its share or ends the interval.
            step_yr = step_yr.max(span_yr * 1e-4).min(span_yr - elapsed_yr);
            let is_last = span_yr - elapsed_yr - step_yr <= span_yr * 1e-12;
            let middle_star = before.towards(after, (elapsed_yr + 0.5 * step_yr) / span_yr);
            let end_star = if is_last { *after } else { before.towards(after, (elapsed_yr + step_yr) / span_yr) };
            let middle = self.moved(rates, 0.5 * step_yr, star.mass_msun / middle_star.mass_msun);
            let rates = self.rates(&middle, &middle_star, after);
            let mut next = self.moved(rates, step_yr, star.mass_msun / end_star.mass_msun);
            elapsed_yr = if is_last { span_yr } else { elapsed_yr + step_yr };
            next.age_yr = if is_last { end_of_interval_yr } else { start_yr + elapsed_yr };
            self.settle(next, &end_star);
            star = end_star;
        }
    }

    /// The orbit after rates have acted for a while and the star's mass has fallen by a factor.
    fn moved(&self, rates: OrbitRates, step_yr: f64, mass_factor: f64) -> OrbitNode {
        let e = self.now.eccentricity * (rates.eccentricity_per_yr * step_yr).exp();
        OrbitNode {
            age_yr: self.now.age_yr + step_yr,
            semi_major_axis_au: (self.now.semi_major_axis_au * mass_factor * (rates.axis_per_yr * step_yr).exp())
                .max(1e-9),
            eccentricity: if e > ROUND { e } else { 0.0 },
        }
    }

    /// All tides on an orbit; `phase` tells what kind of star it is in this interval.
    fn rates(&self, node: &OrbitNode, star: &StarPoint, phase: &StarPoint) -> OrbitRates {
        let pair = TidalPair {
            star_mass_msun: star.mass_msun,
            star_radius_rsun: star.radius_rsun,
            planet_mass_mearth: self.input.mass_mearth,
            planet_radius_rearth: self.input.radius_rearth,
            semi_major_axis_au: node.semi_major_axis_au,
            eccentricity: node.eccentricity,
        };
        let star_dissipates = !phase.is_giant && !phase.is_remnant;
        let mut rates = equilibrium_tide::rates(&pair, self.tides, star_dissipates);
        if phase.is_giant {
            let drag =
                giant_drag::rate_per_yr(&pair, star.luminosity_lsun, star.envelope_mass_msun, self.tides.giant_drag);
            rates = rates.plus(OrbitRates { axis_per_yr: drag, eccentricity_per_yr: 0.0 });
        }
        rates
    }

    /// Takes the planet to a new place, or to its end if the star reached it on the way there.
    fn settle(&mut self, next: OrbitNode, star: &StarPoint) {
        let (reach_au, kind) = reach_au(self.input, star);
        let ratio = next.semi_major_axis_au * (1.0 - next.eccentricity) / reach_au;
        self.history.closest_ratio = self.history.closest_ratio.min(ratio);
        if ratio <= 1.0 {
            // The logarithm of the ratio is taken to run straight between the two places.
            let share = if self.ratio.is_finite() { self.ratio.ln() / (self.ratio / ratio).ln() } else { 1.0 };
            let contact_yr = self.now.age_yr + share.clamp(0.0, 1.0) * (next.age_yr - self.now.age_yr);
            self.history.nodes.push(next);
            self.history.end = Some((contact_yr, kind));
            return;
        }
        self.history.nodes.push(next);
        self.now = next;
        self.ratio = ratio;
    }

    fn finish(&mut self, age_yr: f64, kind: OrbitEnd) {
        self.history.nodes.push(OrbitNode { age_yr, ..self.now });
        self.history.end = Some((age_yr, kind));
    }

    fn note_mass_loss_rate(&mut self, before: &StarPoint, after: &StarPoint) {
        let span_yr = after.age_yr - before.age_yr;
        let lost_msun = before.mass_msun - after.mass_msun;
        // Two nodes at one age stand for a change too quick to be resolved on the track, such as the last
        // envelope going; how quick it was is not known there.
        if span_yr > 0.0 && lost_msun > 0.0 {
            let index = orbit::mass_loss_index(lost_msun / span_yr, self.now.semi_major_axis_au, after.mass_msun);
            self.history.largest_adiabaticity_index = self.history.largest_adiabaticity_index.max(index);
        }
    }
}
