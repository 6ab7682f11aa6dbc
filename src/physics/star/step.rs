//! One step of a star through its phase, with the wind.

use super::burning::{Burning, HeliumStar, Look};
use super::pace::GONE;
use super::phase::Phase;

/// Years in the time unit of the fits.
pub(super) const YR_PER_MYR: f64 = 1e6;

/// Largest error of log luminosity and log radius halfway between two nodes if joined by a straight line.
const NODE_TOLERANCE: f64 = 2e-3;
/// Largest change of log luminosity and log radius between two nodes.
const NODE_CHANGE: f64 = 0.2;
/// Largest error of the mass lost in one step, as a fraction of the envelope.
const LOSS_TOLERANCE: f64 = 5e-4;
/// Largest fraction of the envelope, and of the star, lost in one step.
const ENVELOPE_STEP: f64 = 2e-2;
const MASS_STEP: f64 = 1e-2;
/// Largest growth of the core in one step, as a fraction of the envelope.
const CORE_STEP: f64 = 5e-2;

/// One step of the walk.
pub(super) struct Step {
    pub(super) length_myr: f64,
    pub(super) next_myr: f64,
    pub(super) mass_msun: f64,
    pub(super) look: Look,
    pub(super) rate_msun_yr: f64,
    /// The star has come to the track of another mass.
    pub(super) track_changed: bool,
    /// The course bends sharply where the step ends.
    pub(super) at_bend: bool,
}

impl Burning<'_> {
    /// One midpoint step, as long as accuracy allows.
    ///
    /// `rate` is the present mass loss in solar masses per Myr, `left_myr` the time left in the phase, `trusted_myr` what
    /// the last step found safe; below `least_myr` the age would not advance.
    pub(super) fn step(&self, look: &Look, rate: f64, left_myr: f64, trusted_myr: f64, least_myr: f64) -> Step {
        let envelope = look.envelope_msun;
        let mut length = self.course_step_myr(rate).min(trusted_myr);
        if rate > 0.0 {
            length = length.min(ENVELOPE_STEP * envelope / rate).min(MASS_STEP * self.mass_msun / rate);
        }
        let mut bend_myr = f64::INFINITY;
        for bend in self.bends_myr() {
            if bend > self.clock_myr * (1.0 + 1e-14) {
                bend_myr = bend_myr.min(bend - self.clock_myr);
            }
        }
        length = length.min(bend_myr);
        length = length.min(left_myr);
        loop {
            length = length.max(least_myr.min(left_myr));
            let middle_mass = (self.mass_msun - 0.5 * rate * length).max(0.5 * self.mass_msun);
            let middle = self.look_at(self.clock_myr + 0.5 * length, middle_mass);
            let middle_rate = self.wind_msun_yr(&middle, middle_mass) * YR_PER_MYR;
            if middle_rate * length > envelope && length > least_myr {
                length = 0.5 * envelope / middle_rate;
                continue;
            }
            let lost = (middle_rate * length).min(envelope.max(0.0));
            let mut mass = self.mass_msun - lost;
            let mut end = self.look_at(self.clock_myr + length, mass);
            if end.envelope_msun < 0.0 && end.core_msun < self.mass_msun {
                // The core has grown into the last of the envelope.
                mass = end.core_msun.max(mass);
                end = self.look_at(self.clock_myr + length, mass);
            }
            let end_rate_yr = self.wind_msun_yr(&end, mass);
            let bow = |middle: f64, start: f64, end: f64| (middle * middle / (start * end)).ln().abs() * 0.5;
            let surface = bow(middle.luminosity_lsun, look.luminosity_lsun, end.luminosity_lsun).max(bow(
                middle.radius_rsun,
                look.radius_rsun,
                end.radius_rsun,
            ));
            let room = envelope.clamp(GONE * self.mass_msun, self.mass_msun);
            let loss = (middle_rate - 0.5 * (rate + end_rate_yr * YR_PER_MYR)).abs() * length / room;
            let change = (end.luminosity_lsun / look.luminosity_lsun)
                .ln()
                .abs()
                .max((end.radius_rsun / look.radius_rsun).ln().abs());
            let error = (surface / NODE_TOLERANCE).max(loss / LOSS_TOLERANCE).max((change / NODE_CHANGE).powi(2));
            let growth = (end.eating_core_msun(self.phase) - look.eating_core_msun(self.phase)) / (CORE_STEP * room);
            if (error > 1.0 || growth > 1.0) && length > 4.0 * least_myr {
                length *= (0.9 / error.sqrt()).min(0.9 / growth.max(1e-9)).clamp(0.1, 0.7);
                continue;
            }
            return Step {
                length_myr: length,
                next_myr: length * (0.8 / error.max(1e-9).sqrt()).clamp(0.5, 2.0),
                mass_msun: mass,
                look: end,
                rate_msun_yr: end_rate_yr,
                track_changed: lost > 0.0 && matches!(self.phase, Phase::MainSequence | Phase::HeliumMainSequence),
                at_bend: length >= bend_myr,
            };
        }
    }

    /// Moves the star by a step.
    pub(super) fn take(&mut self, step: &Step, left_myr: f64) {
        let end_of_phase = step.length_myr >= left_myr;
        self.mass_msun = step.mass_msun;
        if !step.track_changed {
            self.clock_myr += if end_of_phase { left_myr } else { step.length_myr };
            return;
        }
        // The pace is the mean of that on the old and on the new track.
        let advance = |old: f64, new: f64| {
            let fraction = self.clock_myr / old + 0.5 * step.length_myr * (1.0 / old + 1.0 / new);
            if end_of_phase { new } else { fraction.min(1.0) * new }
        };
        if self.phase == Phase::MainSequence {
            let new = self.fit.main_sequence(self.mass_msun);
            self.clock_myr = advance(self.main_sequence.end_myr, new.end_myr);
            self.main_sequence = new;
        } else {
            let new = HeliumStar::new(self.mass_msun);
            self.clock_myr = advance(self.helium.burning_myr, new.burning_myr);
            self.helium = new;
        }
    }
}
