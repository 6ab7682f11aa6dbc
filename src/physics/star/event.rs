//! The turning points of a star's life.

/// What happens at one moment of a star's life.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash, PartialOrd, Ord)]
pub enum StarEventKind {
    /// Hydrogen starts to burn: age zero.
    MainSequenceStart,
    /// A star that was mixed throughout is so no longer.
    MixingEnds,
    /// Hydrogen in the core is spent.
    MainSequenceEnd,
    /// A red dwarf starts its last, bright time as a blue dwarf.
    BlueDwarfStart,
    /// The star starts its first climb as a red giant.
    GiantBranchBase,
    /// Helium starts to burn in the core.
    HeliumIgnition {
        /// The core is degenerate and lights in a flash.
        flash: bool,
    },
    /// Helium in the core is spent.
    CoreHeliumEnd,
    /// The two shells start to burn in turn, in thermal pulses.
    ThermalPulsesStart,
    /// The hydrogen envelope is gone; of a giant of low mass it shines on for a while as a planetary nebula.
    EnvelopeLost,
    /// The radius is the greatest of the whole life.
    LargestRadius,
    /// The luminosity is the greatest of the whole life.
    HighestLuminosity,
    /// The surface of a blue dwarf is the hottest of its whole life.
    HottestSurface,
    /// The core collapses and the star explodes as a supernova.
    SupernovaCollapse,
    /// Carbon burns explosively and nothing is left.
    ThermonuclearDisruption,
    /// A white dwarf is left to cool.
    WhiteDwarfBirth,
    /// A white dwarf is colder than 1000 K.
    BlackDwarfBirth,
    /// A neutron star is left.
    NeutronStarBirth,
    /// A black hole is left.
    BlackHoleBirth,
}

impl StarEventKind {
    /// Every kind, in order.
    pub const ALL: [Self; 19] = [
        Self::MainSequenceStart,
        Self::MixingEnds,
        Self::MainSequenceEnd,
        Self::BlueDwarfStart,
        Self::GiantBranchBase,
        Self::HeliumIgnition { flash: true },
        Self::HeliumIgnition { flash: false },
        Self::CoreHeliumEnd,
        Self::ThermalPulsesStart,
        Self::EnvelopeLost,
        Self::LargestRadius,
        Self::HighestLuminosity,
        Self::HottestSurface,
        Self::SupernovaCollapse,
        Self::ThermonuclearDisruption,
        Self::WhiteDwarfBirth,
        Self::BlackDwarfBirth,
        Self::NeutronStarBirth,
        Self::BlackHoleBirth,
    ];

    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::MainSequenceStart => "main_sequence_start",
            Self::MixingEnds => "mixing_ends",
            Self::MainSequenceEnd => "main_sequence_end",
            Self::BlueDwarfStart => "blue_dwarf_start",
            Self::GiantBranchBase => "giant_branch_base",
            Self::HeliumIgnition { flash: true } => "helium_flash",
            Self::HeliumIgnition { flash: false } => "helium_ignition",
            Self::CoreHeliumEnd => "core_helium_end",
            Self::ThermalPulsesStart => "thermal_pulses_start",
            Self::EnvelopeLost => "envelope_lost",
            Self::LargestRadius => "largest_radius",
            Self::HighestLuminosity => "highest_luminosity",
            Self::HottestSurface => "hottest_surface",
            Self::SupernovaCollapse => "supernova_collapse",
            Self::ThermonuclearDisruption => "thermonuclear_disruption",
            Self::WhiteDwarfBirth => "white_dwarf_birth",
            Self::BlackDwarfBirth => "black_dwarf_birth",
            Self::NeutronStarBirth => "neutron_star_birth",
            Self::BlackHoleBirth => "black_hole_birth",
        }
    }

    /// The event in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::MainSequenceStart => "hydrogen starts to burn",
            Self::MixingEnds => "core is no longer mixed with the rest",
            Self::MainSequenceEnd => "hydrogen in the core is spent",
            Self::BlueDwarfStart => "blue dwarf phase begins",
            Self::GiantBranchBase => "first climb as a giant begins",
            Self::HeliumIgnition { flash: true } => "helium ignites in a flash",
            Self::HeliumIgnition { flash: false } => "helium ignites",
            Self::CoreHeliumEnd => "helium in the core is spent",
            Self::ThermalPulsesStart => "thermal pulses begin",
            Self::EnvelopeLost => "hydrogen envelope lost",
            Self::LargestRadius => "largest radius",
            Self::HighestLuminosity => "highest luminosity",
            Self::HottestSurface => "hottest surface",
            Self::SupernovaCollapse => "core collapse, supernova",
            Self::ThermonuclearDisruption => "thermonuclear disruption",
            Self::WhiteDwarfBirth => "white dwarf is born",
            Self::BlackDwarfBirth => "white dwarf has faded to a black dwarf",
            Self::NeutronStarBirth => "neutron star is born",
            Self::BlackHoleBirth => "black hole is born",
        }
    }

    /// Mass is thrown off within days rather than blown away slowly.
    #[must_use]
    pub fn is_sudden(self) -> bool {
        matches!(self, Self::SupernovaCollapse | Self::ThermonuclearDisruption)
    }
}

/// An event with its age.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct StarEvent {
    /// Age it happens at, yr.
    pub age_yr: f64,
    /// What happens.
    pub kind: StarEventKind,
}
