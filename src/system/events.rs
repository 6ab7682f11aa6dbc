//! Dated events of the star and its planets.

use super::date_band::DateBand;
use super::history::History;
use super::planet_events;
use super::specification::Body;
use super::{star_bands, star_colours};
use crate::physics::planet::{Caution, PlanetEventKind};
use crate::physics::star::StarEventKind;
use crate::units::number_text::number;
use crate::units::time_words::{SpanStyle, span};
use std::borrow::Cow;

/// Digits of the time that a young star contracted: more would mean nothing.
const CONTRACTION_DIGITS: usize = 2;

/// Something that happens at one time.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Event {
    /// When, yr since the star reached the main sequence.
    pub time_yr: f64,
    /// To whom.
    pub body: Body,
    /// What.
    pub kind: EventKind,
    /// How far the date can be trusted, where it is more than a plain result.
    pub caution: Option<Caution>,
    /// Between which dates it falls as far as its rule is known, where that can be said.
    pub band: Option<DateBand>,
}

/// What can happen.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum EventKind {
    /// Something in the star's own life.
    Star(StarEventKind),
    /// The star's light takes on another colour word.
    Colour(&'static str),
    /// Something in a planet's own life.
    Planet(PlanetEventKind),
    /// The mean surface temperature under a held greenhouse rises above the freezing point of water.
    RisesAboveFreezing,
    /// The mean surface temperature under a held greenhouse falls below the freezing point of water.
    FallsBelowFreezing,
    /// The mean surface temperature under a held greenhouse rises above the boiling point of water at 1 bar.
    RisesAboveBoiling,
    /// The mean surface temperature under a held greenhouse falls below the boiling point of water at 1 bar.
    FallsBelowBoiling,
    /// The mean surface temperature is the highest of the planet's life.
    HottestSurface,
    /// The mean surface temperature is above the one that the user marked for the first time.
    FirstAbove {
        /// The marked temperature, K.
        marked_k: f64,
    },
    /// The mean surface temperature is above the one that the user marked for the last time.
    LastAbove {
        /// The marked temperature, K.
        marked_k: f64,
    },
    /// The surface of the giant star comes nearest to the planet without reaching it.
    GiantNearest,
}

/// Kinds of event that belong together.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum EventGroup {
    /// Turning points in the star's life.
    Star,
    /// Changes of the star's colour word.
    Colour,
    /// Crossings of the habitable zone's limits.
    Zone,
    /// Ice, open water, steam, and crossings of freezing and boiling.
    Climate,
    /// Engulfment, disruption, escape, near misses.
    Orbit,
    /// Loss of air, locking of the day.
    Air,
}

impl EventGroup {
    /// Every group.
    pub const ALL: [Self; 6] = [Self::Star, Self::Colour, Self::Zone, Self::Climate, Self::Orbit, Self::Air];

    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::Star => "star",
            Self::Colour => "colour",
            Self::Zone => "zone",
            Self::Climate => "climate",
            Self::Orbit => "orbit",
            Self::Air => "air",
        }
    }

    /// The group in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Star => "life of the star",
            Self::Colour => "colour of its light",
            Self::Zone => "habitable zone",
            Self::Climate => "climate",
            Self::Orbit => "orbit and fate",
            Self::Air => "air and rotation",
        }
    }
}

/// Which events are wanted.
#[derive(Clone, Debug, Default, PartialEq, Eq)]
pub struct EventFilter {
    /// Only those of this body; of all where there is none.
    pub body: Option<Body>,
    /// Groups that are left out.
    pub hidden: Vec<EventGroup>,
}

impl EventFilter {
    /// Whether an event is wanted.
    #[must_use]
    pub fn shows(&self, event: &Event) -> bool {
        self.body.is_none_or(|body| body == event.body) && !self.hidden.contains(&event.kind.group())
    }
}

impl EventKind {
    /// Every kind that a star or a planet can have, changes of colour aside, which are as many as there are words.
    #[must_use]
    pub fn all_of(body: Body) -> Vec<Self> {
        match body {
            Body::Star => StarEventKind::ALL.map(Self::Star).to_vec(),
            Body::Planet(_) => {
                let mut kinds = PlanetEventKind::ALL.map(Self::Planet).to_vec();
                kinds.extend([
                    Self::RisesAboveFreezing,
                    Self::FallsBelowFreezing,
                    Self::RisesAboveBoiling,
                    Self::FallsBelowBoiling,
                    Self::HottestSurface,
                    Self::GiantNearest,
                ]);
                kinds
            }
        }
    }

    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::Star(kind) => kind.key(),
            Self::Colour(_) => "colour_changes",
            Self::Planet(kind) => kind.key(),
            Self::RisesAboveFreezing => "rises_above_freezing",
            Self::FallsBelowFreezing => "falls_below_freezing",
            Self::RisesAboveBoiling => "rises_above_boiling",
            Self::FallsBelowBoiling => "falls_below_boiling",
            Self::HottestSurface => "surface_hottest",
            Self::FirstAbove { .. } => "first_above_marked",
            Self::LastAbove { .. } => "last_above_marked",
            Self::GiantNearest => "giant_nearest",
        }
    }

    /// What happens, in words for people.
    #[must_use]
    pub fn name(self) -> Cow<'static, str> {
        Cow::Borrowed(match self {
            Self::Star(kind) => kind.name(),
            Self::Colour("no visible glow") => return Cow::Borrowed("no visible glow any more"),
            Self::Colour(word) => return Cow::Owned(format!("light turns {word}")),
            Self::Planet(kind) => kind.name(),
            Self::RisesAboveFreezing => "surface rises above freezing",
            Self::FallsBelowFreezing => "surface falls below freezing",
            Self::RisesAboveBoiling => "surface rises above boiling",
            Self::FallsBelowBoiling => "surface falls below boiling",
            Self::HottestSurface => "surface at its hottest",
            Self::FirstAbove { marked_k } => {
                return Cow::Owned(format!("surface first above {} K", number(marked_k, 5)));
            }
            Self::LastAbove { marked_k } => return Cow::Owned(format!("surface last above {} K", number(marked_k, 5))),
            Self::GiantNearest => "the giant's surface comes nearest",
        })
    }

    /// The group it belongs to.
    #[must_use]
    pub fn group(self) -> EventGroup {
        use PlanetEventKind as Planet;
        match self {
            Self::Star(_) => EventGroup::Star,
            Self::Colour(_) => EventGroup::Colour,
            Self::Planet(kind) => match kind {
                Planet::EntersHabitableZone | Planet::TooMuchLight | Planet::TooLittleLight => EventGroup::Zone,
                Planet::Freezes
                | Planet::Thaws
                | Planet::ThawsToSteam
                | Planet::MoistGreenhouse
                | Planet::MoistEnds
                | Planet::RunawayGreenhouse
                | Planet::Condenses
                | Planet::WaterGone => EventGroup::Climate,
                Planet::AtmosphereLost | Planet::ProbablyLocked | Planet::Locked => EventGroup::Air,
                Planet::Engulfed | Planet::TornApart | Planet::Unbound => EventGroup::Orbit,
            },
            Self::RisesAboveFreezing
            | Self::FallsBelowFreezing
            | Self::RisesAboveBoiling
            | Self::FallsBelowBoiling
            | Self::FirstAbove { .. }
            | Self::LastAbove { .. }
            | Self::HottestSurface => EventGroup::Climate,
            Self::GiantNearest => EventGroup::Orbit,
        }
    }

    /// The key of the method in [`METHODS`](super::provenance::METHODS) whose rule fires it.
    #[must_use]
    pub fn method(self) -> &'static str {
        use PlanetEventKind as Planet;
        match self {
            Self::Star(_) => "star_life",
            Self::Colour(_) => "blackbody",
            Self::Planet(kind) => match kind {
                Planet::EntersHabitableZone
                | Planet::TooMuchLight
                | Planet::TooLittleLight
                | Planet::RunawayGreenhouse
                | Planet::Condenses => "habitable_zone",
                Planet::Freezes | Planet::Thaws | Planet::ThawsToSteam => "climate",
                Planet::MoistGreenhouse | Planet::MoistEnds => "moist_greenhouse",
                Planet::WaterGone => "water_loss",
                Planet::AtmosphereLost => "shoreline",
                Planet::ProbablyLocked | Planet::Locked => "tidal_lock",
                Planet::Engulfed | Planet::TornApart | Planet::Unbound => "orbit",
            },
            Self::RisesAboveFreezing
            | Self::FallsBelowFreezing
            | Self::RisesAboveBoiling
            | Self::FallsBelowBoiling
            | Self::FirstAbove { .. }
            | Self::LastAbove { .. }
            | Self::HottestSurface => "surface_temperature",
            Self::GiantNearest => "orbit",
        }
    }
}

impl Event {
    /// The event with its body: `Hearth: engulfed by the star`; a star's event stands alone, and its start says how long a
    /// red dwarf contracted before.
    #[must_use]
    pub fn label(&self, history: &History) -> String {
        match self.body {
            Body::Star => match (self.kind, history.life().contraction_yr()) {
                (EventKind::Star(StarEventKind::MainSequenceStart), Some(contraction_yr)) => {
                    let contracted = span(contraction_yr, CONTRACTION_DIGITS, SpanStyle::Words);
                    format!("{}, after {contracted} of contraction", self.kind.name())
                }
                _ => self.kind.name().into_owned(),
            },
            Body::Planet(index) => match history.system().planets.get(index) {
                Some(planet) => format!("{}: {}", planet.name, self.kind.name()),
                None => self.kind.name().into_owned(),
            },
        }
    }
}

/// Every event of a history, oldest first.
pub(super) fn of(history: &History) -> Vec<Event> {
    let mut events: Vec<Event> = history
        .life()
        .events()
        .iter()
        .map(|event| Event {
            time_yr: event.age_yr,
            body: Body::Star,
            kind: EventKind::Star(event.kind),
            caution: None,
            band: star_bands::of_life(history, event.age_yr),
        })
        .collect();
    events.extend(star_colours::changes(history));
    for index in 0..history.planets().len() {
        planet_events::push(history, index, &mut events);
    }
    events.sort_by(|first, second| first.time_yr.total_cmp(&second.time_yr));
    events
}
