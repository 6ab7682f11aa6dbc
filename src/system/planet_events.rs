//! Dated events of one planet: its own history, and what can be read off it.

use super::date_band::LightHistory;
use super::events::{Event, EventKind};
use super::history::History;
use super::planet_past::{BOILING_K, FREEZING_K, PlanetPast};
use super::specification::Body;
use crate::physics::planet::{Caution, OrbitEnd};
use crate::units::constants::SOLAR_RADIUS_AU;

/// Periastron over the giant's radius beyond which its nearness is not worth a date.
const NEAR_WITHIN: f64 = 5.0;

/// Appends every event of a planet.
pub(super) fn push(history: &History, index: usize, events: &mut Vec<Event>) {
    let past = &history.planets()[index];
    let body = Body::Planet(index);
    let light = LightHistory::of(history, past);
    let shown = past.history().events().iter().filter(|event| event.age_yr <= history.shown_until_yr());
    events.extend(shown.map(|event| Event {
        time_yr: event.age_yr,
        body,
        kind: EventKind::Planet(event.kind),
        caution: event.caution,
        band: light.band(event.age_yr, event.kind),
    }));
    let until_yr = past.end().map_or(history.shown_until_yr(), |(time_yr, _)| time_yr);
    let ages: Vec<f64> = history.life().node_ages_yr().iter().copied().filter(|age_yr| *age_yr < until_yr).collect();
    push_lines(history, past, body, &ages, events);
    push_nearest_giant(history, past, body, &ages, events);
}

/// Crossings of freezing and boiling, and the hottest moment, under a greenhouse that the user holds.
fn push_lines(history: &History, past: &PlanetPast, body: Body, ages: &[f64], events: &mut Vec<Event>) {
    let held_k = |age_yr: f64| {
        if past.has_climate_at(age_yr) { None } else { past.held_surface_k(&history.star_at(age_yr)) }
    };
    let caution = Some(Caution::HeldByUser);
    let mut hottest: Option<(f64, f64)> = None;
    let mut before: Option<(f64, f64)> = None;
    for &age_yr in ages {
        let now = held_k(age_yr).map(|surface_k| (age_yr, surface_k));
        if let (Some((from_yr, was_k)), Some((_, is_k))) = (before, now) {
            for (line_k, rises, falls) in [
                (FREEZING_K, EventKind::RisesAboveFreezing, EventKind::FallsBelowFreezing),
                (BOILING_K, EventKind::RisesAboveBoiling, EventKind::FallsBelowBoiling),
            ] {
                let was_above = was_k > line_k;
                if was_above != (is_k > line_k) {
                    let holds = |age_yr| held_k(age_yr).is_some_and(|surface_k| (surface_k > line_k) == was_above);
                    let time_yr = halve(from_yr, age_yr, holds);
                    let kind = if was_above { falls } else { rises };
                    events.push(Event { time_yr, body, kind, caution, band: None });
                }
            }
        }
        if now.is_some_and(|(_, surface_k)| hottest.is_none_or(|(_, most_k)| surface_k > most_k)) {
            hottest = now;
        }
        before = now;
    }
    if let Some((time_yr, _)) = hottest.filter(|_| past.specification().water.is_none()) {
        events.push(Event { time_yr, body, kind: EventKind::HottestSurface, caution, band: None });
    }
}

/// The nearest miss of the giant, for planets that it does not take.
fn push_nearest_giant(history: &History, past: &PlanetPast, body: Body, ages: &[f64], events: &mut Vec<Event>) {
    if past.end().is_some_and(|(_, end)| end != OrbitEnd::Unbound) {
        return;
    }
    let orbit = past.history().orbit();
    let ratio = |age_yr: f64| {
        let star = history.star_at(age_yr);
        let place = orbit.at(age_yr).filter(|_| star.phase.is_giant())?;
        Some(place.semi_major_axis_au * (1.0 - place.eccentricity) / (star.radius_rsun * SOLAR_RADIUS_AU))
    };
    let nearest = ages
        .iter()
        .filter_map(|age_yr| Some((*age_yr, ratio(*age_yr)?)))
        .min_by(|first, second| first.1.total_cmp(&second.1));
    if let Some((time_yr, _)) = nearest.filter(|(_, ratio)| *ratio < NEAR_WITHIN) {
        let caution = past.history().orbit_caution();
        events.push(Event { time_yr, body, kind: EventKind::GiantNearest, caution, band: None });
    }
}

/// The time at which a condition that holds at the start stops holding, by halving.
pub(super) fn halve(mut start_yr: f64, mut end_yr: f64, holds: impl Fn(f64) -> bool) -> f64 {
    for _ in 0..48 {
        let middle_yr = 0.5 * (start_yr + end_yr);
        if holds(middle_yr) { start_yr = middle_yr } else { end_yr = middle_yr }
    }
    end_yr
}
