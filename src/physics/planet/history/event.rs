//! Dated events in the life of a planet.

use super::super::caution::Caution;
use super::super::orbit_history::OrbitEnd;

/// What happens to a planet.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum PlanetEventKind {
    /// It enters the conservative habitable zone.
    EntersHabitableZone,
    /// It leaves the conservative habitable zone because the starlight grew.
    TooMuchLight,
    /// It leaves the conservative habitable zone because the starlight fell.
    TooLittleLight,
    /// Its open water freezes over.
    Freezes,
    /// Its ice melts to open water.
    Thaws,
    /// Its ice melts under so much light that the water turns to steam at once.
    ThawsToSteam,
    /// Its upper air turns wet and hydrogen leaks away.
    MoistGreenhouse,
    /// Its upper air dries again.
    MoistEnds,
    /// Its oceans begin to evaporate without end.
    RunawayGreenhouse,
    /// Its steam rains out to oceans.
    Condenses,
    /// Its water is gone.
    WaterGone,
    /// Its air has met as much high-energy light as bodies that kept none.
    AtmosphereLost,
    /// Its day has become its year if it dissipates strongly.
    ProbablyLocked,
    /// Its day has become its year even if it dissipates weakly.
    Locked,
    /// It enters the star.
    Engulfed,
    /// The star's tide tears it apart.
    TornApart,
    /// It leaves the star.
    Unbound,
}

impl PlanetEventKind {
    /// Every kind.
    pub const ALL: [Self; 17] = [
        Self::EntersHabitableZone,
        Self::TooMuchLight,
        Self::TooLittleLight,
        Self::Freezes,
        Self::Thaws,
        Self::ThawsToSteam,
        Self::MoistGreenhouse,
        Self::MoistEnds,
        Self::RunawayGreenhouse,
        Self::Condenses,
        Self::WaterGone,
        Self::AtmosphereLost,
        Self::ProbablyLocked,
        Self::Locked,
        Self::Engulfed,
        Self::TornApart,
        Self::Unbound,
    ];

    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::EntersHabitableZone => "enters_habitable_zone",
            Self::TooMuchLight => "too_much_light",
            Self::TooLittleLight => "too_little_light",
            Self::Freezes => "freezes",
            Self::Thaws => "thaws",
            Self::ThawsToSteam => "thaws_to_steam",
            Self::MoistGreenhouse => "moist_greenhouse",
            Self::MoistEnds => "moist_ends",
            Self::RunawayGreenhouse => "runaway_greenhouse",
            Self::Condenses => "condenses",
            Self::WaterGone => "water_gone",
            Self::AtmosphereLost => "atmosphere_lost",
            Self::ProbablyLocked => "probably_locked",
            Self::Locked => "locked",
            Self::Engulfed => "engulfed",
            Self::TornApart => "torn_apart",
            Self::Unbound => "unbound",
        }
    }

    /// The event in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::EntersHabitableZone => "enters the habitable zone",
            Self::TooMuchLight => "leaves the habitable zone, too much light",
            Self::TooLittleLight => "leaves the habitable zone, too little light",
            Self::Freezes => "freezes over",
            Self::Thaws => "thaws",
            Self::ThawsToSteam => "thaws straight to steam",
            Self::MoistGreenhouse => "moist greenhouse begins",
            Self::MoistEnds => "moist greenhouse ends",
            Self::RunawayGreenhouse => "runaway greenhouse begins",
            Self::Condenses => "steam rains out",
            Self::WaterGone => "last water lost",
            Self::AtmosphereLost => "air probably lost",
            Self::ProbablyLocked => "probably locked to the star",
            Self::Locked => "locked to the star",
            Self::Engulfed => "engulfed by the star",
            Self::TornApart => "torn apart by the star's tide",
            Self::Unbound => "unbound, drifts free",
        }
    }
}

impl From<OrbitEnd> for PlanetEventKind {
    fn from(end: OrbitEnd) -> Self {
        match end {
            OrbitEnd::Engulfed => Self::Engulfed,
            OrbitEnd::TornApart => Self::TornApart,
            OrbitEnd::Unbound => Self::Unbound,
        }
    }
}

/// One event.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct PlanetEvent {
    /// Age of the star, yr.
    pub age_yr: f64,
    /// What happens.
    pub kind: PlanetEventKind,
    /// How far the date can be trusted, where it is more than a plain result.
    pub caution: Option<Caution>,
}
