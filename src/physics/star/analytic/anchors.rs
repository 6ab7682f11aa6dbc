//! The fixed points of one track after the main sequence.

use super::Fit;
use super::core_luminosity::CoreGrowth;
use super::giants::{DOUBLE_SHELL_RATE, HELIUM_BURNING_RATE};
use super::main_sequence::MainSequence;

/// Helium cores at the base of the asymptotic giant branch at least this massive burn on to a collapse, solar masses.
pub const CORE_COLLAPSE_CORE_MSUN: f64 = 2.25;
/// Helium cores at the base of the asymptotic giant branch at least this massive light their carbon, solar masses.
pub const CARBON_IGNITION_CORE_MSUN: f64 = 1.6;
/// Limiting mass of a cold degenerate star, solar masses.
pub const CHANDRASEKHAR_MSUN: f64 = 1.44;

/// Everything about one track that does not change with time. Times are Myr on the track's own clock.
///
/// # Source
/// Hurley, Pols & Tout 2000, MNRAS 315, 543, sections 5.2–5.4 and 6.
#[derive(Clone, Copy, Debug)]
pub struct Anchors {
    /// Mass that fixes the track, solar masses.
    pub mass_msun: f64,
    /// The main sequence of that mass.
    pub main_sequence: MainSequence,
    /// Luminosity at the base of the giant branch, solar luminosities.
    pub base_lsun: f64,
    /// Helium core at the base of the giant branch, solar masses.
    pub base_core_msun: f64,
    /// Growth on the first giant branch; none where helium lights before it.
    pub giant_growth: Option<CoreGrowth>,
    /// Time of helium ignition, Myr.
    pub ignition_myr: f64,
    /// Luminosity at helium ignition, solar luminosities.
    pub ignition_lsun: f64,
    /// Helium core at ignition, solar masses.
    pub ignition_core_msun: f64,
    /// Time of core helium burning, Myr.
    pub core_helium_myr: f64,
    /// Fraction of core helium burning in the blue.
    pub blue_fraction: f64,
    /// Least luminosity of the blue phase, solar luminosities; zero below the flash mass.
    pub blue_least_lsun: f64,
    /// Luminosity on the zero-age horizontal branch, solar luminosities; zero above the flash mass.
    pub horizontal_branch_lsun: f64,
    /// Luminosity at the base of the asymptotic giant branch, solar luminosities.
    pub asymptotic_base_lsun: f64,
    /// Helium core at the base of the asymptotic giant branch, solar masses.
    pub asymptotic_base_core_msun: f64,
    /// Growth of the carbon–oxygen core on the early asymptotic giant branch.
    pub early_growth: CoreGrowth,
    /// Helium core after the second dredge-up, solar masses.
    pub dredged_core_msun: f64,
    /// Start of the thermal pulses, Myr; none where the core collapses first.
    pub pulses_myr: Option<f64>,
    /// Luminosity at the start of the thermal pulses, solar luminosities.
    pub pulses_lsun: f64,
    /// Growth during the thermal pulses.
    pub pulse_growth: Option<CoreGrowth>,
    /// Carbon–oxygen core at which the star explodes, solar masses (eq. 75).
    pub explosive_core_msun: f64,
}

impl Anchors {
    /// Start of the asymptotic giant branch, Myr.
    #[must_use]
    pub fn asymptotic_base_myr(&self) -> f64 {
        self.ignition_myr + self.core_helium_myr
    }

    /// End of the early asymptotic giant branch, Myr: thermal pulses or core collapse.
    #[must_use]
    pub fn early_end_myr(&self) -> f64 {
        self.pulses_myr.unwrap_or_else(|| {
            let luminosity = self.early_growth.relation().luminosity_lsun(self.explosive_core_msun);
            // Cores of very massive stars are past the limit at once.
            self.early_growth.time_at_myr(luminosity).max(self.asymptotic_base_myr())
        })
    }

    /// Fraction of the core's growth that the third dredge-up leaves (eq. 73).
    fn kept_growth(&self) -> f64 {
        1.0 - (0.3 + 0.001 * self.mass_msun.powi(5)).min(0.9)
    }

    /// Helium core on the thermally pulsing branch, from the core a star without dredge-up would have.
    pub(in crate::physics::star) fn pulsing_core_msun(&self, undredged_msun: f64) -> f64 {
        self.dredged_core_msun + self.kept_growth() * (undredged_msun - self.dredged_core_msun)
    }

    /// Time at which the core would explode during the thermal pulses, Myr.
    pub(in crate::physics::star) fn pulses_explosion_myr(&self) -> f64 {
        self.pulse_growth.map_or(f64::INFINITY, |growth| {
            let grown = (self.explosive_core_msun - self.dredged_core_msun) / self.kept_growth();
            growth.time_at_myr(growth.relation().luminosity_lsun(self.dredged_core_msun + grown))
        })
    }
}

impl Fit {
    /// The fixed points of the track of mass `m`, solar masses.
    #[must_use]
    pub fn anchors(&self, m: f64) -> Anchors {
        let critical = &self.critical;
        let relation = self.core_luminosity(m);
        let main_sequence = self.main_sequence(m);
        let base_lsun = self.giant_branch_base_luminosity_lsun(m);
        let ignition_lsun = self.helium_ignition_luminosity_lsun(m);
        let below_flash = m < critical.flash_msun;
        let giant_growth = (m < critical.blue_ignition_msun)
            .then(|| CoreGrowth::new(relation, self.hydrogen_burning_rate(m), main_sequence.base_myr, base_lsun));
        let ignition_myr = giant_growth.map_or(main_sequence.base_myr, |growth| growth.time_at_myr(ignition_lsun));
        let ignition_core_msun =
            if below_flash { relation.core_msun(ignition_lsun) } else { self.helium_ignition_core_msun(m) };
        let base_core_msun =
            if below_flash { relation.core_msun(base_lsun) } else { self.giant_branch_base_core_msun(m) };
        let core_helium_myr = self.core_helium_myr(m, ignition_core_msun);
        let asymptotic_base_lsun = self.asymptotic_base_luminosity_lsun(m);
        let asymptotic_base_core_msun = self.asymptotic_base_core_msun(m);
        let asymptotic_base_myr = ignition_myr + core_helium_myr;
        let early_growth = CoreGrowth::new(relation, HELIUM_BURNING_RATE, asymptotic_base_myr, asymptotic_base_lsun);
        let dredged_core_msun = if asymptotic_base_core_msun <= 0.8 {
            asymptotic_base_core_msun
        } else {
            0.44 * asymptotic_base_core_msun + 0.448
        };
        let pulses_lsun = relation.luminosity_lsun(dredged_core_msun);
        let pulses_myr = (asymptotic_base_core_msun < CORE_COLLAPSE_CORE_MSUN)
            .then(|| early_growth.time_at_myr(pulses_lsun).max(asymptotic_base_myr));
        Anchors {
            mass_msun: m,
            main_sequence,
            base_lsun,
            base_core_msun,
            giant_growth,
            ignition_myr,
            ignition_lsun,
            ignition_core_msun,
            core_helium_myr,
            blue_fraction: self.blue_fraction(m),
            blue_least_lsun: if below_flash { 0.0 } else { self.blue_least_luminosity_lsun(m) },
            horizontal_branch_lsun: if below_flash {
                self.horizontal_branch_luminosity_lsun(m, ignition_core_msun)
            } else {
                0.0
            },
            asymptotic_base_lsun,
            asymptotic_base_core_msun,
            early_growth,
            dredged_core_msun,
            pulses_myr,
            pulses_lsun,
            pulse_growth: pulses_myr.map(|start| CoreGrowth::new(relation, DOUBLE_SHELL_RATE, start, pulses_lsun)),
            explosive_core_msun: explosive_core_msun(asymptotic_base_core_msun),
        }
    }
}

/// Carbon–oxygen core mass at which a star with helium core or helium mass `m` explodes, solar masses (eq. 75).
#[must_use]
pub fn explosive_core_msun(m: f64) -> f64 {
    CHANDRASEKHAR_MSUN.max(0.773 * m - 0.35)
}
