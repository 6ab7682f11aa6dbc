//! The star while it burns: luminosity, radius and core on the track it follows at its present mass.

use super::analytic::helium_star::HeliumGiant;
use super::analytic::{
    Anchors, CARBON_IGNITION_CORE_MSUN, CoreGrowth, Fit, MainSequence, explosive_core_msun, helium_star,
};
use super::mass_loss::WindSource;
use super::phase::Phase;
use super::small_envelope::{Surface, envelope_measure, helium_envelope_measure, shown_through};
use super::white_dwarf::WhiteDwarf;

/// What a burning star looks like at one moment.
#[derive(Clone, Copy, Debug)]
pub(super) struct Look {
    /// Luminosity, solar luminosities.
    pub(super) luminosity_lsun: f64,
    /// Radius, solar radii.
    pub(super) radius_rsun: f64,
    /// Hydrogen-exhausted core, solar masses.
    pub(super) core_msun: f64,
    /// Carbon–oxygen core of the late branches; before them the hydrogen-exhausted core again, solar masses.
    pub(super) inner_core_msun: f64,
    /// Mass still to be lost or burnt before the phase ends bare, solar masses; infinite where it cannot.
    pub(super) envelope_msun: f64,
    /// The small-envelope measure; below one the core shows through.
    pub(super) envelope_measure: f64,
}

impl Look {
    /// The core that eats into the envelope, solar masses.
    pub(super) fn eating_core_msun(&self, phase: Phase) -> f64 {
        if phase == Phase::HeliumGiant { self.inner_core_msun } else { self.core_msun }
    }
}

/// A burning star: the track it is on and how far it has come.
#[derive(Clone, Copy, Debug)]
pub(super) struct Burning<'a> {
    pub(super) fit: &'a Fit,
    pub(super) phase: Phase,
    /// Present mass, solar masses.
    pub(super) mass_msun: f64,
    /// Time on the clock of the track, Myr.
    pub(super) clock_myr: f64,
    /// The main sequence the star is on; after it, the one it left.
    pub(super) main_sequence: MainSequence,
    /// Fixed points of the track after the main sequence.
    pub(super) anchors: Anchors,
    /// The helium star it has become, if it has.
    pub(super) helium: HeliumStar,
}

/// The track of a bare helium star.
#[derive(Clone, Copy, Debug)]
pub(super) struct HeliumStar {
    /// Mass that fixes the track, solar masses.
    pub(super) mass_msun: f64,
    /// Time of core burning, Myr.
    pub(super) burning_myr: f64,
    /// Its course as a giant.
    pub(super) giant: HeliumGiant,
    /// Growth of its core as a giant.
    pub(super) growth: CoreGrowth,
    /// Core at which it explodes, solar masses.
    pub(super) explosive_core_msun: f64,
}

impl HeliumStar {
    /// The helium star of a mass, its giant starting where core burning ends.
    pub(super) fn new(mass_msun: f64) -> Self {
        let giant = HeliumGiant::new(mass_msun);
        Self {
            mass_msun,
            burning_myr: helium_star::core_burning_myr(mass_msun),
            giant,
            growth: giant.growth(giant.start_luminosity_lsun),
            explosive_core_msun: explosive_core_msun(mass_msun),
        }
    }

    /// The helium giant of a mass whose core has been burning in a shell already.
    pub(super) fn with_core(mass_msun: f64, core_msun: f64) -> Self {
        let star = Self::new(mass_msun);
        Self { growth: star.giant.growth(star.giant.relation.luminosity_lsun(core_msun)), ..star }
    }
}

/// Mass of the white dwarf a helium giant ends as, solar masses: all of its helium that can burn has burnt.
///
/// # Source
/// Inverse of Hurley, Pols & Tout 2000, MNRAS 315, 543, eq. 89, so that no mass is lost.
pub(super) fn helium_giant_end_msun(mass_msun: f64, core_msun: f64) -> f64 {
    mass_msun.min(core_msun.max((core_msun + 0.31) / 1.45))
}

impl<'a> Burning<'a> {
    /// The star at birth.
    pub(super) fn born(fit: &'a Fit, mass_msun: f64) -> Self {
        let anchors = fit.anchors(mass_msun);
        Self {
            fit,
            phase: Phase::MainSequence,
            mass_msun,
            clock_myr: 0.0,
            main_sequence: anchors.main_sequence,
            anchors,
            helium: HeliumStar::new(anchors.ignition_core_msun),
        }
    }

    /// The star as it is.
    pub(super) fn look(&self) -> Look {
        self.look_at(self.clock_myr, self.mass_msun)
    }

    /// The star at another time on its clock and another mass.
    ///
    /// While its core burns in the open (both main sequences) it changes to the track of that mass at the same fraction
    /// of its burning time; later the track is fixed.
    pub(super) fn look_at(&self, clock_myr: f64, mass_msun: f64) -> Look {
        match self.phase {
            Phase::MainSequence => bare(self.main_sequence_at(clock_myr, mass_msun), 0.0, f64::INFINITY),
            Phase::HertzsprungGap => self.hertzsprung_gap(clock_myr, mass_msun),
            Phase::FirstGiantBranch => self.first_giant_branch(clock_myr, mass_msun),
            Phase::CoreHeliumBurning => self.core_helium_burning(clock_myr, mass_msun),
            Phase::EarlyAsymptoticGiant => self.early_asymptotic_giant(clock_myr, mass_msun),
            Phase::PulsingAsymptoticGiant => self.pulsing_asymptotic_giant(clock_myr, mass_msun),
            Phase::HeliumMainSequence => {
                let fraction = (clock_myr / self.helium.burning_myr).min(1.0);
                bare(helium_star::burning(mass_msun, fraction), mass_msun, f64::INFINITY)
            }
            _ => self.helium_giant(clock_myr, mass_msun),
        }
    }

    fn main_sequence_at(&self, clock_myr: f64, mass_msun: f64) -> Surface {
        let here = &self.main_sequence;
        if mass_msun == here.mass_msun {
            return here.at(clock_myr);
        }
        let there = self.fit.main_sequence(mass_msun);
        there.at(clock_myr * (there.end_myr / here.end_myr))
    }

    /// Rate of mass loss of the star as it looks, solar masses per year.
    pub(super) fn wind_msun_yr(&self, look: &Look, mass_msun: f64) -> f64 {
        WindSource {
            phase: self.phase,
            mass_msun,
            luminosity_lsun: look.luminosity_lsun,
            radius_rsun: look.radius_rsun,
            heavy_elements: self.fit.z,
            envelope_measure: look.envelope_measure,
        }
        .rate_msun_yr()
    }

    /// White dwarf the core would be without its envelope.
    fn degenerate_core(core_msun: f64) -> Surface {
        WhiteDwarf::new(core_msun).newborn()
    }

    /// Bare core of a star before helium burning.
    fn unlit_core(&self, core_msun: f64) -> Surface {
        if self.anchors.mass_msun < self.fit.critical.flash_msun {
            Self::degenerate_core(core_msun)
        } else {
            (helium_star::zero_age_luminosity_lsun(core_msun), helium_star::zero_age_radius_rsun(core_msun))
        }
    }

    /// Hurley, Pols & Tout 2000, eqs. 26–30.
    fn hertzsprung_gap(&self, clock_myr: f64, mass_msun: f64) -> Look {
        let a = &self.anchors;
        let ms = &a.main_sequence;
        let tau = ((clock_myr - ms.end_myr) / (ms.base_myr - ms.end_myr)).clamp(0.0, 1.0);
        let (l_end, r_end, core_end) = if a.giant_growth.is_some() {
            (a.base_lsun, self.fit.giant_radius_rsun(mass_msun, a.base_lsun), a.base_core_msun)
        } else {
            (a.ignition_lsun, self.fit.helium_ignition_radius_rsun(a, mass_msun), a.ignition_core_msun)
        };
        let luminosity = ms.end_luminosity_lsun * (l_end / ms.end_luminosity_lsun).powf(tau);
        let radius = ms.end_radius_rsun * (r_end / ms.end_radius_rsun).powf(tau);
        let m525 = a.mass_msun.powf(5.25);
        let start = (1.586 + m525) / (2.434 + 1.02 * m525);
        let core = ((1.0 - tau) * start + tau) * core_end;
        self.enveloped((luminosity, radius), core, core, mass_msun, |star| star.unlit_core(core))
    }

    /// Hurley, Pols & Tout 2000, eqs. 37–46.
    fn first_giant_branch(&self, clock_myr: f64, mass_msun: f64) -> Look {
        let a = &self.anchors;
        let Some(growth) = &a.giant_growth else { return self.core_helium_burning(clock_myr, mass_msun) };
        let burnt = growth.core_msun(clock_myr);
        let luminosity = growth.relation().luminosity_lsun(burnt);
        let radius = self.fit.giant_radius_rsun(mass_msun, luminosity);
        let core = if a.mass_msun < self.fit.critical.flash_msun {
            burnt
        } else {
            let base_myr = a.main_sequence.base_myr;
            let place = ((clock_myr - base_myr) / (a.ignition_myr - base_myr)).clamp(0.0, 1.0);
            a.base_core_msun + place * (a.ignition_core_msun - a.base_core_msun)
        };
        self.enveloped((luminosity, radius), core, core, mass_msun, |star| star.unlit_core(core))
    }

    /// Fraction of core helium burning at a time on the clock.
    pub(super) fn helium_fraction(&self, clock_myr: f64) -> f64 {
        ((clock_myr - self.anchors.ignition_myr) / self.anchors.core_helium_myr).clamp(0.0, 1.0)
    }

    /// Hurley, Pols & Tout 2000, eqs. 61–67.
    fn core_helium_burning(&self, clock_myr: f64, mass_msun: f64) -> Look {
        let a = &self.anchors;
        let fraction = self.helium_fraction(clock_myr);
        let surface = self.fit.core_helium_burning(a, mass_msun, fraction);
        let core = a.ignition_core_msun + fraction * (a.asymptotic_base_core_msun - a.ignition_core_msun).max(0.0);
        self.enveloped(surface, core, core, mass_msun, |_| helium_star::burning(core, fraction))
    }

    /// Hurley, Pols & Tout 2000, section 5.4, with the bare core a helium giant.
    fn early_asymptotic_giant(&self, clock_myr: f64, mass_msun: f64) -> Look {
        let a = &self.anchors;
        let core = a.asymptotic_base_core_msun;
        let inner = a.early_growth.core_msun(clock_myr).min(core);
        let luminosity = a.early_growth.relation().luminosity_lsun(inner);
        let radius = self.fit.asymptotic_radius_rsun(mass_msun, luminosity);
        self.enveloped((luminosity, radius), core, inner, mass_msun, |_| {
            let giant = HeliumGiant::new(core);
            helium_giant_surface(&giant, inner, core).0
        })
    }

    /// Hurley, Pols & Tout 2000, section 5.4: thermal pulses with third dredge-up.
    fn pulsing_asymptotic_giant(&self, clock_myr: f64, mass_msun: f64) -> Look {
        let a = &self.anchors;
        let growth = a.pulse_growth.as_ref().unwrap_or(&a.early_growth);
        let undredged = growth.core_msun(clock_myr);
        let luminosity = growth.relation().luminosity_lsun(undredged);
        let radius = self.fit.asymptotic_radius_rsun(mass_msun, luminosity);
        let core = a.pulsing_core_msun(undredged);
        self.enveloped((luminosity, radius), core, core, mass_msun, |_| Self::degenerate_core(core))
    }

    /// Hurley, Pols & Tout 2000, eqs. 84–89.
    fn helium_giant(&self, clock_myr: f64, mass_msun: f64) -> Look {
        let inner = self.helium.growth.core_msun(clock_myr);
        let ((luminosity_lsun, radius_rsun), envelope_measure) =
            helium_giant_surface(&self.helium.giant, inner, mass_msun);
        Look {
            luminosity_lsun,
            radius_rsun,
            core_msun: mass_msun,
            inner_core_msun: inner,
            envelope_msun: helium_star::largest_core_msun(mass_msun) - inner,
            envelope_measure,
        }
    }

    /// A star with a hydrogen envelope, its core showing through where the envelope is thin.
    fn enveloped(
        &self,
        surface: Surface,
        core_msun: f64,
        inner_core_msun: f64,
        mass_msun: f64,
        bare_core: impl Fn(&Self) -> Surface,
    ) -> Look {
        let measure = envelope_measure(mass_msun, core_msun, surface.0);
        let (luminosity_lsun, radius_rsun) =
            if measure < 1.0 { shown_through(surface, bare_core(self), measure, mass_msun) } else { surface };
        Look {
            luminosity_lsun,
            radius_rsun,
            core_msun,
            inner_core_msun,
            envelope_msun: mass_msun - core_msun,
            envelope_measure: measure,
        }
    }

    /// White dwarf left when the envelope over a carbon–oxygen core is gone.
    pub(super) fn white_dwarf_phase(helium_mass_msun: f64) -> Phase {
        if helium_mass_msun < CARBON_IGNITION_CORE_MSUN {
            Phase::CarbonOxygenWhiteDwarf
        } else {
            Phase::OxygenNeonWhiteDwarf
        }
    }
}

/// A star without hydrogen envelope to lose.
fn bare((luminosity_lsun, radius_rsun): Surface, core_msun: f64, envelope_msun: f64) -> Look {
    Look {
        luminosity_lsun,
        radius_rsun,
        core_msun,
        inner_core_msun: core_msun,
        envelope_msun,
        envelope_measure: f64::INFINITY,
    }
}

/// Luminosity and radius of a helium giant with its core showing through, and its envelope measure.
fn helium_giant_surface(giant: &HeliumGiant, inner_msun: f64, mass_msun: f64) -> (Surface, f64) {
    let luminosity = giant.relation.luminosity_lsun(inner_msun);
    let surface = (luminosity, giant.radius_rsun(luminosity));
    let measure = helium_envelope_measure(helium_star::largest_core_msun(mass_msun), inner_msun);
    if measure >= 1.0 {
        return (surface, measure);
    }
    let core = WhiteDwarf::new(helium_giant_end_msun(mass_msun, inner_msun)).newborn();
    (shown_through(surface, core, measure, mass_msun), measure)
}
