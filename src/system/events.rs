//! Dated events of the star and its planets.

use super::history::History;
use super::moment::PlanetMoment;
use super::planet_past::{BOILING_K, FREEZING_K};
use super::specification::Body;
use crate::physics::planet::OrbitEnd;
use crate::physics::planet::habitable_zone::ZonePlace;
use crate::physics::star::StarEventKind;

/// Something that happens at one time.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Event {
    /// When, yr since the star reached the main sequence.
    pub time_yr: f64,
    /// To whom.
    pub body: Body,
    /// What.
    pub kind: EventKind,
}

/// What can happen.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum EventKind {
    /// Something in the star's own life.
    Star(StarEventKind),
    /// The star's surface reaches the planet's periastron.
    Engulfed,
    /// The planet is set free.
    Unbound,
    /// The mean surface temperature rises above the freezing point of water.
    Thaws,
    /// The mean surface temperature falls below the freezing point of water.
    Freezes,
    /// The mean surface temperature rises above the boiling point of water at 1 bar.
    TooHot,
    /// The mean surface temperature falls below the boiling point of water at 1 bar.
    CoolsBelowBoiling,
    /// The planet enters the conservative habitable zone.
    EntersZone,
    /// The planet leaves the conservative habitable zone.
    LeavesZone,
}

impl EventKind {
    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::Star(kind) => kind.key(),
            Self::Engulfed => "engulfed",
            Self::Unbound => "unbound",
            Self::Thaws => "thaws",
            Self::Freezes => "freezes",
            Self::TooHot => "too_hot",
            Self::CoolsBelowBoiling => "cools_below_boiling",
            Self::EntersZone => "enters_habitable_zone",
            Self::LeavesZone => "leaves_habitable_zone",
        }
    }

    /// What happens, in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Star(kind) => kind.name(),
            Self::Engulfed => "swallowed by the star",
            Self::Unbound => "set free from the star",
            Self::Thaws => "surface rises above freezing",
            Self::Freezes => "surface falls below freezing",
            Self::TooHot => "surface rises above boiling",
            Self::CoolsBelowBoiling => "surface falls below boiling",
            Self::EntersZone => "enters the habitable zone",
            Self::LeavesZone => "leaves the habitable zone",
        }
    }
}

impl Event {
    /// The event with its body: `Hearth: swallowed by the star`; a star's event stands alone.
    #[must_use]
    pub fn label(&self, history: &History) -> String {
        match self.body {
            Body::Star => self.kind.name().to_owned(),
            Body::Planet(index) => match history.system().planets.get(index) {
                Some(planet) => format!("{}: {}", planet.name, self.kind.name()),
                None => self.kind.name().to_owned(),
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
        .map(|event| Event { time_yr: event.age_yr, body: Body::Star, kind: EventKind::Star(event.kind) })
        .collect();
    for index in 0..history.planets().len() {
        planet_events(history, index, &mut events);
    }
    events.sort_by(|first, second| first.time_yr.total_cmp(&second.time_yr));
    events
}

fn planet_events(history: &History, index: usize, events: &mut Vec<Event>) {
    let body = Body::Planet(index);
    let past = &history.planets()[index];
    let end = past.end();
    if let Some((time_yr, end)) = end {
        let kind = if end == OrbitEnd::Unbound { EventKind::Unbound } else { EventKind::Engulfed };
        events.push(Event { time_yr, body, kind });
    }
    let until_yr = end.map_or(history.shown_until_yr(), |(time_yr, _)| time_yr);
    let reading = |time_yr: f64| Reading::of(&past.moment(time_yr, &history.star_at(time_yr)));
    let ages: Vec<f64> = history.life().node_ages_yr().iter().copied().filter(|age_yr| *age_yr < until_yr).collect();
    for pair in ages.windows(2) {
        let (before, after) = (reading(pair[0]), reading(pair[1]));
        for crossing in Crossing::ALL {
            let (Some(was), Some(is)) = (crossing.side(&before), crossing.side(&after)) else { continue };
            if was != is {
                let time_yr = halve(pair[0], pair[1], |time_yr| crossing.side(&reading(time_yr)) == Some(was));
                events.push(Event { time_yr, body, kind: crossing.event(is) });
            }
        }
    }
}

/// What crossings are looked for in.
struct Reading {
    surface_temperature_k: Option<f64>,
    zone: Option<ZonePlace>,
}

impl Reading {
    fn of(moment: &PlanetMoment) -> Self {
        Self { surface_temperature_k: moment.surface_temperature_k, zone: moment.zone }
    }
}

/// A line a planet can cross both ways.
#[derive(Clone, Copy)]
enum Crossing {
    Freezing,
    Boiling,
    Zone,
}

impl Crossing {
    const ALL: [Self; 3] = [Self::Freezing, Self::Boiling, Self::Zone];

    /// On which side the planet is: above, or inside the zone.
    fn side(self, reading: &Reading) -> Option<bool> {
        match self {
            Self::Freezing => reading.surface_temperature_k.map(|surface_k| surface_k >= FREEZING_K),
            Self::Boiling => reading.surface_temperature_k.map(|surface_k| surface_k > BOILING_K),
            Self::Zone => reading.zone.map(|zone| zone == ZonePlace::Conservative),
        }
    }

    fn event(self, is_above: bool) -> EventKind {
        match (self, is_above) {
            (Self::Freezing, true) => EventKind::Thaws,
            (Self::Freezing, false) => EventKind::Freezes,
            (Self::Boiling, true) => EventKind::TooHot,
            (Self::Boiling, false) => EventKind::CoolsBelowBoiling,
            (Self::Zone, true) => EventKind::EntersZone,
            (Self::Zone, false) => EventKind::LeavesZone,
        }
    }
}

/// The time at which a condition that holds at the start stops holding, by halving.
fn halve(mut start_yr: f64, mut end_yr: f64, holds: impl Fn(f64) -> bool) -> f64 {
    for _ in 0..48 {
        let middle_yr = 0.5 * (start_yr + end_yr);
        if holds(middle_yr) { start_yr = middle_yr } else { end_yr = middle_yr }
    }
    end_yr
}
