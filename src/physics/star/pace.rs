//! How fast the star may be walked through its phase, and where the phase ends.

use super::analytic::{CoreGrowth, helium_star};
use super::burning::{Burning, Look};
use super::phase::Phase;
use super::small_envelope::thin_envelope_measure;

/// The envelope counts as gone when the star is heavier than its core by less than this fraction.
pub(super) const GONE: f64 = 1e-4;
/// A burnt-out helium core counts as bare below this fraction of the measure at which it outshines its envelope.
const TRACE: f64 = 0.2;
/// Longest step in units of the time of a phase, with wind.
const SPAN_STEP: f64 = 5e-3;
/// Longest step in units of the time of a phase, without noticeable wind.
const CALM_SPAN_STEP: f64 = 2e-2;
/// Longest step in units of the time left until core growth would run away.
const GROWTH_STEP: f64 = 1.5e-2;

impl Burning<'_> {
    /// Time on the clock at which the phase is over, Myr: burning ends, or the core is massive enough to explode.
    pub(super) fn phase_end_myr(&self) -> f64 {
        let a = &self.anchors;
        match self.phase {
            Phase::MainSequence => self.main_sequence.end_myr,
            Phase::HertzsprungGap => a.main_sequence.base_myr,
            Phase::FirstGiantBranch => a.ignition_myr,
            Phase::CoreHeliumBurning => a.asymptotic_base_myr(),
            Phase::EarlyAsymptoticGiant => a.early_end_myr(),
            Phase::PulsingAsymptoticGiant => a.pulses_explosion_myr(),
            Phase::HeliumMainSequence => self.helium.burning_myr,
            _ => {
                let growth = &self.helium.growth;
                growth.time_at_myr(growth.relation().luminosity_lsun(self.helium.explosive_core_msun))
            }
        }
    }

    /// Longest step the course itself allows, Myr.
    pub(super) fn course_step_myr(&self, rate_msun_myr: f64) -> f64 {
        let a = &self.anchors;
        let growth = |growth: &CoreGrowth| GROWTH_STEP * growth.left_myr(self.clock_myr);
        let span = |span_myr: f64| {
            let calm = rate_msun_myr * span_myr < 1e-3 * self.mass_msun;
            span_myr * if calm { CALM_SPAN_STEP } else { SPAN_STEP }
        };
        match self.phase {
            Phase::MainSequence => span(self.main_sequence.end_myr),
            Phase::HertzsprungGap => span(a.main_sequence.base_myr - a.main_sequence.end_myr),
            Phase::FirstGiantBranch => a.giant_growth.as_ref().map_or(f64::INFINITY, growth),
            Phase::CoreHeliumBurning => span(a.core_helium_myr),
            Phase::EarlyAsymptoticGiant => growth(&a.early_growth),
            Phase::PulsingAsymptoticGiant => growth(a.pulse_growth.as_ref().unwrap_or(&a.early_growth)),
            Phase::HeliumMainSequence => span(self.helium.burning_myr),
            _ => growth(&self.helium.growth),
        }
    }

    /// Times on the clock at which the course bends sharply; nodes are put there.
    pub(super) fn bends_myr(&self) -> [f64; 2] {
        let a = &self.anchors;
        let none = f64::NEG_INFINITY;
        match self.phase {
            Phase::MainSequence => self.main_sequence.bends_myr(),
            Phase::FirstGiantBranch => [a.giant_growth.as_ref().map_or(none, CoreGrowth::bend_myr), none],
            Phase::CoreHeliumBurning => {
                self.fit.blue_phase(a).map(|fraction| a.ignition_myr + fraction * a.core_helium_myr)
            }
            Phase::EarlyAsymptoticGiant => [a.early_growth.bend_myr(), none],
            Phase::PulsingAsymptoticGiant => [a.pulse_growth.as_ref().map_or(none, CoreGrowth::bend_myr), none],
            Phase::HeliumGiant => [self.helium.growth.bend_myr(), none],
            _ => [none, none],
        }
    }

    /// Whether the star has nothing left around its core, so that the phase cannot go on.
    pub(super) fn is_bare(&self, look: &Look) -> bool {
        let a = &self.anchors;
        match self.phase {
            Phase::MainSequence | Phase::HeliumMainSequence => false,
            // A core that explodes does so with or without its envelope.
            Phase::HeliumGiant => look.envelope_msun <= 0.0 && look.inner_core_msun < self.helium.explosive_core_msun,
            Phase::PulsingAsymptoticGiant if look.core_msun >= a.explosive_core_msun => false,
            // Under the last trace of envelope the helium star inside has burnt out: it cools from now on.
            Phase::EarlyAsymptoticGiant
                if look.envelope_measure < TRACE * thin_envelope_measure(self.mass_msun)
                    && look.inner_core_msun >= helium_star::largest_core_msun(look.core_msun)
                    && look.inner_core_msun < a.explosive_core_msun =>
            {
                true
            }
            _ => look.envelope_msun <= GONE * look.core_msun,
        }
    }
}
