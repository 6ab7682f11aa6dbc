//! What to keep in mind about a figure of the star.

/// A reason to trust one quantity of a star's state less.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash, PartialOrd, Ord)]
pub enum StarCaution {
    /// More than 50 solar masses.
    HeavierThanModels,
    /// Less than 0.5 solar masses.
    LighterThanModels,
    /// The late life of a star of less than 0.8 solar masses.
    UncheckedLongLife,
    /// Close to the mass at which helium ignites before the giant branch.
    NearBlueIgnition,
    /// The estimate of the hydrogen left in the core.
    CoreHydrogenEstimated,
    /// The luminosity is the mean over thermal pulses.
    PulsesAveraged,
    /// The size of a cool giant.
    GiantRadiusUncertain,
    /// A wind of a late phase.
    MassLossUncertain,
    /// Hotter than any white dwarf in the cooling tables.
    HotterThanModels,
    /// A white dwarf outside the masses of the cooling tables.
    CoolingMassOutsideTables,
    /// A white dwarf not of carbon and oxygen.
    CoolingCoreDiffers,
    /// A white dwarf older than its cooling table.
    CoolingOlderThanTables,
    /// A neutron star or black hole.
    RemnantMassUncertain,
    /// A neutron star's own faint light is left out.
    RemnantLightNotModelled,
    /// A red dwarf outside the masses the structure calculation was fitted to.
    LightRedDwarf,
    /// A red dwarf of a metallicity the structure calculation was not fitted to.
    UnusualMetals,
    /// The surface was asked to be as opaque as in calculations of 1997.
    OldSurface,
    /// Late hydrogen flashes are levelled off.
    ShellFlashes,
    /// A red dwarf that became a giant and lost mass.
    SmallGiantWind,
    /// Fewer metals than the opacity tables know.
    MetalPoorOpacity,
    /// The last cooling is begun earlier than usual.
    EarlyCrystal,
    /// Published lifetimes of red dwarfs differ.
    LifetimesDiffer,
    /// Between the structure calculation and the fits.
    BlendedWithFits,
    /// The structure of a giant could not be followed to its white dwarf.
    GiantNotFollowed,
    /// A quick look, interpolated between lives computed in advance.
    QuickLook,
}

impl StarCaution {
    /// Every caution.
    pub const ALL: [Self; 25] = [
        Self::HeavierThanModels,
        Self::LighterThanModels,
        Self::UncheckedLongLife,
        Self::NearBlueIgnition,
        Self::CoreHydrogenEstimated,
        Self::PulsesAveraged,
        Self::GiantRadiusUncertain,
        Self::MassLossUncertain,
        Self::HotterThanModels,
        Self::CoolingMassOutsideTables,
        Self::CoolingCoreDiffers,
        Self::CoolingOlderThanTables,
        Self::RemnantMassUncertain,
        Self::RemnantLightNotModelled,
        Self::LightRedDwarf,
        Self::UnusualMetals,
        Self::OldSurface,
        Self::ShellFlashes,
        Self::SmallGiantWind,
        Self::MetalPoorOpacity,
        Self::EarlyCrystal,
        Self::LifetimesDiffer,
        Self::BlendedWithFits,
        Self::GiantNotFollowed,
        Self::QuickLook,
    ];

    /// Key of the quantity of the state the caution is about.
    #[must_use]
    pub fn about(&self) -> &'static str {
        match self {
            Self::HeavierThanModels
            | Self::LighterThanModels
            | Self::PulsesAveraged
            | Self::CoolingMassOutsideTables
            | Self::CoolingCoreDiffers
            | Self::CoolingOlderThanTables
            | Self::RemnantLightNotModelled
            | Self::LightRedDwarf
            | Self::UnusualMetals
            | Self::OldSurface
            | Self::ShellFlashes
            | Self::MetalPoorOpacity
            | Self::EarlyCrystal
            | Self::BlendedWithFits
            | Self::QuickLook => "luminosity_lsun",
            Self::UncheckedLongLife | Self::LifetimesDiffer => "age_yr",
            Self::NearBlueIgnition | Self::HotterThanModels => "effective_temperature_k",
            Self::CoreHydrogenEstimated => "core_hydrogen_fraction",
            Self::GiantRadiusUncertain => "radius_rsun",
            Self::MassLossUncertain => "mass_loss_msun_yr",
            Self::RemnantMassUncertain | Self::SmallGiantWind | Self::GiantNotFollowed => "mass_msun",
        }
    }

    /// The caution as a sentence for people.
    #[must_use]
    pub fn text(&self) -> &'static str {
        match self {
            Self::HeavierThanModels => {
                "The stellar models behind these formulas end at 50 solar masses; heavier stars are extrapolated."
            }
            Self::LighterThanModels => {
                "The stellar models behind these formulas start at 0.5 solar masses; lighter stars are extrapolated."
            }
            Self::UncheckedLongLife => {
                "No star this light has lived so long yet; this part of its life is an extrapolation nobody could check."
            }
            Self::NearBlueIgnition => {
                "Close to this mass the blue phase changes suddenly with mass; a slightly different star may look quite \
                 different here."
            }
            Self::CoreHydrogenEstimated => {
                "The hydrogen left in the core is an estimate: it is taken to fall evenly with time, as it does in the Sun."
            }
            Self::PulsesAveraged => {
                "Thermal pulses are averaged out; a real star dims and brightens by a factor of a few around this value."
            }
            Self::GiantRadiusUncertain => {
                "Radii of cool giants differ between models by up to half; whether they reach a nearby planet is uncertain."
            }
            Self::MassLossUncertain => "Winds of late phases are known to a factor of two or three only.",
            Self::HotterThanModels => {
                "The star is hotter here than the hottest white dwarf computed; the peak of its temperature is an estimate."
            }
            Self::CoolingMassOutsideTables => {
                "The cooling tables cover white dwarfs of 0.2 to 1.2 solar masses; outside them the nearest one is used."
            }
            Self::CoolingCoreDiffers => {
                "The cooling tables are for carbon–oxygen cores; a core of lighter nuclei holds more heat and cools up to \
                 three times as slowly, a heavier one somewhat faster."
            }
            Self::CoolingOlderThanTables => {
                "This white dwarf is older than the published cooling tables; its temperature is extrapolated."
            }
            Self::RemnantMassUncertain => {
                "How much of the star falls back onto its collapsed core is uncertain; so is the mass that is left."
            }
            Self::RemnantLightNotModelled => "The faint light of the collapsed remnant itself is left out.",
            Self::LightRedDwarf => "The red-dwarf model was fitted to stars of 0.08 to 0.30 solar masses.",
            Self::UnusualMetals => "The red-dwarf model was fitted to stars of the Sun's metallicity.",
            Self::OldSurface => {
                "The surface is as opaque as in calculations of 1997, by choice: today's stars are brighter, and \
                 live shorter by a factor of about 1.6."
            }
            Self::ShellFlashes => "Late hydrogen flashes of the contracting star are levelled off.",
            Self::SmallGiantWind => {
                "The wind of this small red giant, and so the mass of its white dwarf, is known to a factor of two \
                 only."
            }
            Self::MetalPoorOpacity => {
                "There are fewer heavy elements than the opacity tables know; those for a mass fraction of 0.001 \
                 are used."
            }
            Self::EarlyCrystal => {
                "The last cooling is that of a simple crystal, begun at an earlier moment than usual."
            }
            Self::LifetimesDiffer => {
                "Published lifetimes of red dwarfs differ: calculations of 1997 with more opaque surfaces give \
                 lives about 1.6 times as long."
            }
            Self::BlendedWithFits => {
                "Between 0.40 and 0.50 solar masses the computed structure passes over into the published fits."
            }
            Self::GiantNotFollowed => {
                "The structure of this small giant could not be followed to its end; the white dwarf of its core \
                 takes over."
            }
            Self::QuickLook => {
                "This is a quick look, interpolated between lives computed in advance; the exact life of this star \
                 is not computed yet."
            }
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn every_caution_is_a_sentence_of_its_own() {
        let texts: std::collections::HashSet<_> = StarCaution::ALL.iter().map(StarCaution::text).collect();
        assert_eq!(texts.len(), StarCaution::ALL.len());
        assert!(texts.iter().all(|text| text.ends_with('.')));
    }
}
