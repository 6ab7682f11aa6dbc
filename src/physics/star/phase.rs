//! The phases of a star's life.

/// What a star is doing, in the order lives can pass through.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash, PartialOrd, Ord)]
pub enum Phase {
    /// Hydrogen burns in a star that is stirred from centre to surface.
    FullyMixedMainSequence,
    /// Hydrogen burns in the core.
    MainSequence,
    /// Hydrogen burns in and around a core that is no longer stirred, in a star that used to be mixed throughout.
    RadiativeCore,
    /// A red dwarf that is bright and ever hotter while its last hydrogen burns, and never becomes a giant.
    BlueDwarf,
    /// The core is spent and shrinks; hydrogen burns in a shell.
    HertzsprungGap,
    /// First ascent as a red giant, over an inert helium core.
    FirstGiantBranch,
    /// Helium burns in the core, hydrogen in a shell.
    CoreHeliumBurning,
    /// Second ascent: helium burns in a shell.
    EarlyAsymptoticGiant,
    /// Second ascent, hydrogen and helium shells burn in turn.
    PulsingAsymptoticGiant,
    /// A bare helium star that burns helium in its core.
    HeliumMainSequence,
    /// A bare helium star that burns helium in a shell.
    HeliumGiant,
    /// White dwarf of helium.
    HeliumWhiteDwarf,
    /// White dwarf of carbon and oxygen.
    CarbonOxygenWhiteDwarf,
    /// White dwarf of oxygen and neon.
    OxygenNeonWhiteDwarf,
    /// White dwarf of any kind, colder than 1000 K.
    BlackDwarf,
    /// Neutron star.
    NeutronStar,
    /// Black hole.
    BlackHole,
    /// Nothing is left.
    NoRemnant,
}

impl Phase {
    /// Every phase, in order.
    pub const ALL: [Self; 18] = [
        Self::FullyMixedMainSequence,
        Self::MainSequence,
        Self::RadiativeCore,
        Self::BlueDwarf,
        Self::HertzsprungGap,
        Self::FirstGiantBranch,
        Self::CoreHeliumBurning,
        Self::EarlyAsymptoticGiant,
        Self::PulsingAsymptoticGiant,
        Self::HeliumMainSequence,
        Self::HeliumGiant,
        Self::HeliumWhiteDwarf,
        Self::CarbonOxygenWhiteDwarf,
        Self::OxygenNeonWhiteDwarf,
        Self::BlackDwarf,
        Self::NeutronStar,
        Self::BlackHole,
        Self::NoRemnant,
    ];

    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::FullyMixedMainSequence => "fully_mixed_main_sequence",
            Self::MainSequence => "main_sequence",
            Self::RadiativeCore => "radiative_core",
            Self::BlueDwarf => "blue_dwarf",
            Self::HertzsprungGap => "hertzsprung_gap",
            Self::FirstGiantBranch => "first_giant_branch",
            Self::CoreHeliumBurning => "core_helium_burning",
            Self::EarlyAsymptoticGiant => "early_asymptotic_giant",
            Self::PulsingAsymptoticGiant => "pulsing_asymptotic_giant",
            Self::HeliumMainSequence => "helium_main_sequence",
            Self::HeliumGiant => "helium_giant",
            Self::HeliumWhiteDwarf => "helium_white_dwarf",
            Self::CarbonOxygenWhiteDwarf => "carbon_oxygen_white_dwarf",
            Self::OxygenNeonWhiteDwarf => "oxygen_neon_white_dwarf",
            Self::BlackDwarf => "black_dwarf",
            Self::NeutronStar => "neutron_star",
            Self::BlackHole => "black_hole",
            Self::NoRemnant => "no_remnant",
        }
    }

    /// The phase in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::FullyMixedMainSequence => "fully mixed main sequence",
            Self::MainSequence => "main sequence",
            Self::RadiativeCore => "radiative core",
            Self::BlueDwarf => "blue dwarf",
            Self::HertzsprungGap => "Hertzsprung gap (subgiant)",
            Self::FirstGiantBranch => "first giant branch",
            Self::CoreHeliumBurning => "core helium burning",
            Self::EarlyAsymptoticGiant => "early asymptotic giant branch",
            Self::PulsingAsymptoticGiant => "thermally pulsing asymptotic giant branch",
            Self::HeliumMainSequence => "helium main sequence (bare helium star)",
            Self::HeliumGiant => "helium giant",
            Self::HeliumWhiteDwarf => "helium white dwarf",
            Self::CarbonOxygenWhiteDwarf => "carbon–oxygen white dwarf",
            Self::OxygenNeonWhiteDwarf => "oxygen–neon white dwarf",
            Self::BlackDwarf => "black dwarf",
            Self::NeutronStar => "neutron star",
            Self::BlackHole => "black hole",
            Self::NoRemnant => "no remnant",
        }
    }

    /// The star has ended: a white dwarf, a neutron star, a black hole or nothing.
    #[must_use]
    pub fn is_remnant(self) -> bool {
        self >= Self::HeliumWhiteDwarf
    }

    /// A white dwarf of any kind, however cold.
    #[must_use]
    pub fn is_white_dwarf(self) -> bool {
        (Self::HeliumWhiteDwarf..=Self::BlackDwarf).contains(&self)
    }

    /// A giant with a hydrogen envelope: either ascent, or core helium burning.
    #[must_use]
    pub fn is_giant(self) -> bool {
        (Self::FirstGiantBranch..=Self::PulsingAsymptoticGiant).contains(&self)
    }

    /// A star stripped to its helium.
    #[must_use]
    pub fn is_helium_star(self) -> bool {
        matches!(self, Self::HeliumMainSequence | Self::HeliumGiant)
    }

    /// Neutron star, black hole or nothing: no thermal light is modelled.
    #[must_use]
    pub fn is_dark(self) -> bool {
        self >= Self::NeutronStar
    }
}

/// A phase with the ages it lasts from and to.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct PhaseSpan {
    /// The phase.
    pub phase: Phase,
    /// Age it starts at, yr.
    pub from_yr: f64,
    /// Age it ends at, yr; the next phase starts at this age.
    pub to_yr: f64,
}

#[cfg(test)]
mod tests {
    use super::*;
    use std::collections::HashSet;

    #[test]
    fn keys_and_names_are_all_different() {
        let keys: HashSet<_> = Phase::ALL.iter().map(|phase| phase.key()).collect();
        let names: HashSet<_> = Phase::ALL.iter().map(|phase| phase.name()).collect();
        assert_eq!((keys.len(), names.len()), (Phase::ALL.len(), Phase::ALL.len()));
        assert!(keys.iter().all(|key| key.chars().all(|c| c.is_ascii_lowercase() || c == '_')));
    }

    #[test]
    fn groups_do_not_overlap() {
        for phase in Phase::ALL {
            assert!(!(phase.is_giant() && phase.is_remnant()));
            assert!(!(phase.is_white_dwarf() && phase.is_dark()));
            assert_eq!(phase.is_remnant(), phase.is_white_dwarf() || phase.is_dark());
        }
        assert_eq!(Phase::ALL.iter().filter(|phase| phase.is_giant()).count(), 4);
    }

    #[test]
    fn the_list_is_in_order() {
        assert!(Phase::ALL.is_sorted());
    }
}
