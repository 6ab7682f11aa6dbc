//! One moment of a life, and the life as the line of its moments.

use super::super::cgs::ATOMIC_MASS;
use super::super::gas::fermi_temperature_k;
use super::profile::Profile;
use super::stage::Stage;

/// The star at one moment.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Node {
    /// Age, yr; zero on arrival on the main sequence (99 % of the light comes from burning), negative before.
    pub age_yr: f64,
    /// Mass, solar masses; less than at birth once a giant has blown off a wind.
    pub mass_msun: f64,
    /// Luminosity, solar luminosities.
    pub luminosity_lsun: f64,
    /// Radius of the photosphere, solar radii.
    pub radius_rsun: f64,
    /// Effective temperature, K.
    pub effective_temperature_k: f64,
    /// Heat set free by burning, solar luminosities.
    pub nuclear_luminosity_lsun: f64,
    /// Temperature of the centre, K.
    pub core_temperature_k: f64,
    /// Density of the centre, g cm⁻³.
    pub core_density_g_cm3: f64,
    /// Hydrogen mass fraction of the centre.
    pub core_hydrogen_fraction: f64,
    /// ³He mass fraction of the centre.
    pub core_helium3_fraction: f64,
    /// Hydrogen mass fraction of the whole star.
    pub mean_hydrogen_fraction: f64,
    /// Hydrogen mass fraction of the surface.
    pub surface_hydrogen_fraction: f64,
    /// Mass share of the centre in which nothing mixes; zero while the centre is convective.
    pub still_core_mass_fraction: f64,
    /// Mass of the core with less than 1 % hydrogen, solar masses.
    pub helium_core_mass_msun: f64,
    /// What the star is doing.
    pub stage: Stage,
}

/// How the computed life ends.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Ending {
    /// As a helium white dwarf, cold and dark.
    BlackDwarf,
    /// On the giant branch, where the structure could not be followed further.
    GiantBranch,
}

/// Something to know before trusting a life.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
#[non_exhaustive]
pub enum Caution {
    /// The mass lies outside 0.08–0.30 solar masses, to which the four fitted numbers were fitted.
    OutsideCalibratedMasses,
    /// The metallicity differs from that of the fit's models by more than 0.3 dex.
    OutsideCalibratedMetallicity,
    /// Surfaces as opaque as in 1997 were asked for: luminosities of today's stars are too low by half.
    OutdatedSurface,
    /// Late hydrogen burns in flashes, of which only the first, or none, is followed.
    ShellFlashes,
    /// The star was a giant and lost mass in a wind, known to a factor of two.
    GiantWind,
    /// Fewer metals than the opacity tables know: the opacity is that of Z = 0.001.
    OpacityOfMoreMetals,
    /// Cold cooling was begun early because the structure could not be followed to 1000 K.
    EarlyCrystal,
}

/// A life from birth to its end.
#[derive(Clone, Debug, PartialEq)]
pub struct Life {
    /// Moments in order of age.
    pub nodes: Vec<Node>,
    /// Time from birth (some nine times the later radius) to age zero, yr.
    pub contraction_yr: f64,
    /// How it ends.
    pub ending: Ending,
    /// What to know before trusting it.
    pub cautions: Vec<Caution>,
    /// The inside at some of the moments, in order of age; none where it was not computed.
    pub profiles: Vec<Profile>,
}

impl Caution {
    /// One sentence for users.
    #[must_use]
    pub fn text(self) -> &'static str {
        match self {
            Self::OutsideCalibratedMasses => "The red-dwarf model was fitted to stars of 0.08 to 0.30 solar masses.",
            Self::OutsideCalibratedMetallicity => "The red-dwarf model was fitted to stars of solar metallicity.",
            Self::OutdatedSurface => "The surface is as opaque as in calculations of 1997; today's are brighter.",
            Self::ShellFlashes => "Late hydrogen flashes of the contracting star are not followed in detail.",
            Self::GiantWind => "The wind of the red giant, and so the white dwarf's mass, is uncertain.",
            Self::OpacityOfMoreMetals => {
                "There are fewer metals than the opacity tables know; those of Z = 0.001 are used."
            }
            Self::EarlyCrystal => "The last cooling is that of a simple crystal from an earlier moment than usual.",
        }
    }
}

impl Life {
    /// The star at an age (yr since arrival on the main sequence), interpolated between the two nodes around it.
    ///
    /// Nothing before birth and after the end.
    #[must_use]
    pub fn at_age(&self, age_yr: f64) -> Option<Node> {
        let next = self.nodes.partition_point(|node| node.age_yr < age_yr);
        let later = self.nodes.get(next)?;
        if later.age_yr <= age_yr {
            return Some(*later);
        }
        let earlier = self.nodes.get(next.checked_sub(1)?)?;
        let share = (age_yr - earlier.age_yr) / (later.age_yr - earlier.age_yr);
        Some(earlier.towards(later, share))
    }
}

impl Node {
    /// Fermi energy of the electrons at the centre over kT.
    ///
    /// # Valid for
    /// Centres, where nothing keeps its electrons: half an electron per nucleon, a whole one in hydrogen.
    #[must_use]
    pub fn core_degeneracy_ratio(&self) -> f64 {
        let electrons_per_nucleon = 0.5 * (1.0 + self.core_hydrogen_fraction);
        let electrons_per_cm3 = self.core_density_g_cm3 / ATOMIC_MASS * electrons_per_nucleon;
        fermi_temperature_k(electrons_per_cm3) / self.core_temperature_k
    }

    /// The moment a share of the way from this to a later one: positive quantities in their logarithms.
    pub(super) fn towards(&self, later: &Self, share: f64) -> Self {
        let even = |a: f64, b: f64| a + (b - a) * share;
        let log = |a: f64, b: f64| if a > 0.0 && b > 0.0 { even(a.ln(), b.ln()).exp() } else { even(a, b) };
        Self {
            age_yr: even(self.age_yr, later.age_yr),
            mass_msun: even(self.mass_msun, later.mass_msun),
            luminosity_lsun: log(self.luminosity_lsun, later.luminosity_lsun),
            radius_rsun: log(self.radius_rsun, later.radius_rsun),
            effective_temperature_k: log(self.effective_temperature_k, later.effective_temperature_k),
            nuclear_luminosity_lsun: log(self.nuclear_luminosity_lsun, later.nuclear_luminosity_lsun),
            core_temperature_k: log(self.core_temperature_k, later.core_temperature_k),
            core_density_g_cm3: log(self.core_density_g_cm3, later.core_density_g_cm3),
            core_hydrogen_fraction: even(self.core_hydrogen_fraction, later.core_hydrogen_fraction),
            core_helium3_fraction: even(self.core_helium3_fraction, later.core_helium3_fraction),
            mean_hydrogen_fraction: even(self.mean_hydrogen_fraction, later.mean_hydrogen_fraction),
            surface_hydrogen_fraction: even(self.surface_hydrogen_fraction, later.surface_hydrogen_fraction),
            still_core_mass_fraction: even(self.still_core_mass_fraction, later.still_core_mass_fraction),
            helium_core_mass_msun: even(self.helium_core_mass_msun, later.helium_core_mass_msun),
            stage: self.stage,
        }
    }
}
