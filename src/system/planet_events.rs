//! Dated events of one planet: its own history, and what can be read off it.

use super::date_band::{DateBand, LightHistory};
use super::events::{Event, EventKind};
use super::history::History;
use super::planet_past::{BOILING_K, FREEZING_K, PlanetPast};
use super::specification::Body;
use super::star_bands;
use crate::physics::planet::escape::{SHORELINE_KEPT_BELOW, SHORELINE_LOST_ABOVE};
use crate::physics::planet::{Caution, ClimateState, OrbitEnd, PlanetEvent, PlanetEventKind};
use crate::units::constants::SOLAR_RADIUS_AU;

/// Periastron over the giant's radius beyond which its nearness is not worth a date.
const NEAR_WITHIN: f64 = 5.0;

/// Appends every event of a planet.
pub(super) fn push(history: &History, index: usize, events: &mut Vec<Event>) {
    let past = &history.planets()[index];
    let body = Body::Planet(index);
    let light = LightHistory::of(history, past);
    let shown = past.history().events().iter().filter(|event| event.age_yr <= history.shown_until_yr());
    events.extend(shown.map(|event| {
        Event {
            time_yr: event.age_yr,
            body,
            kind: EventKind::Planet(event.kind),
            caution: event.caution,
            band: light
                .band(event.age_yr, event.kind)
                .or_else(|| shoreline_band(history, past, event))
                .or_else(|| clock_band(history, event)),
        }
    }));
    let until_yr = past.end().map_or(history.shown_until_yr(), |(time_yr, _)| time_yr);
    let ages: Vec<f64> = history.life().node_ages_yr().iter().copied().filter(|age_yr| *age_yr < until_yr).collect();
    push_lines(history, past, body, &ages, events);
    push_nearest_giant(history, past, body, &ages, events);
    push_hottest_climate(history, past, body, &ages, events);
    push_marked(history, past, body, &ages, events);
}

/// The band of an orbit's end that the star's own change decides: as wide as the length of its life is known. Where
/// something else is doubtful, the caution says so instead.
fn clock_band(history: &History, event: &PlanetEvent) -> Option<DateBand> {
    let ends = matches!(event.kind, PlanetEventKind::Engulfed | PlanetEventKind::TornApart | PlanetEventKind::Unbound);
    (ends && event.caution.is_none()).then(|| star_bands::of_life(history, event.age_yr)).flatten()
}

/// The hottest moment of a planet whose climate answers to the star: within one state of the climate more light is
/// warmer, so the brightest moment of each state is read. What is only known to be hotter counts with its bound.
fn push_hottest_climate(history: &History, past: &PlanetPast, body: Body, ages: &[f64], events: &mut Vec<Event>) {
    if past.specification().water.is_none() {
        return;
    }
    let orbit = past.history().orbit();
    let light = |age_yr: f64| {
        let place = orbit.at(age_yr)?;
        let star = history.star_at(age_yr);
        (!star.phase.is_dark()).then(|| star.luminosity_lsun / place.semi_major_axis_au.powi(2))
    };
    let mut brightest: Vec<(ClimateState, f64, f64)> = Vec::new();
    for &age_yr in ages {
        let Some((state, light)) = past.history().climate_state_at(age_yr).zip(light(age_yr)) else { continue };
        match brightest.last_mut().filter(|last| last.0 == state) {
            Some(last) if light > last.2 => *last = (state, age_yr, light),
            Some(_) => {}
            None => brightest.push((state, age_yr, light)),
        }
    }
    let read = |(_, age_yr, light): &(ClimateState, f64, f64)| {
        let now = past.moment(*age_yr, &history.star_at(*age_yr));
        let surface_k = now.surface_temperature_k.or(now.surface_hotter_than_k)?;
        Some((*age_yr, surface_k, *light))
    };
    let hottest = brightest
        .iter()
        .filter_map(read)
        .max_by(|first, second| first.1.total_cmp(&second.1).then(first.2.total_cmp(&second.2)));
    if let Some((time_yr, ..)) = hottest {
        let band = star_bands::of_life(history, time_yr);
        events.push(Event { time_yr, body, kind: EventKind::HottestSurface, caution: None, band });
    }
}

/// The first and the last moment above the temperature that the user marked; none where it is never reached, and no
/// last one where it is never left. Steam counts as above what it is surely hotter than.
fn push_marked(history: &History, past: &PlanetPast, body: Body, ages: &[f64], events: &mut Vec<Event>) {
    let Some(marked_k) = past.specification().marked_temperature_k else { return };
    let now = |age_yr: f64| past.moment(age_yr, &history.star_at(age_yr));
    let is_above = |age_yr: f64| {
        let now = now(age_yr);
        now.surface_temperature_k.or(now.surface_hotter_than_k).is_some_and(|surface_k| surface_k > marked_k)
    };
    // A change of the climate may lift the surface above and drop it again between two nodes.
    let changes = past.history().climate_states().iter().map(|(age_yr, _)| *age_yr);
    let end_yr = past.end().map_or(f64::INFINITY, |(end_yr, _)| end_yr).min(history.shown_until_yr());
    let mut ages: Vec<f64> = ages.iter().copied().chain(changes).filter(|age_yr| *age_yr < end_yr).collect();
    ages.push(end_yr.next_down());
    ages.sort_by(f64::total_cmp);
    let above: Vec<bool> = ages.iter().map(|age_yr| is_above(*age_yr)).collect();
    let mut push = |time_yr: f64, kind: EventKind| {
        let caution = now(time_yr).surface_caution;
        events.push(Event { time_yr, body, kind, caution, band: None });
    };
    let (Some(first), Some(last)) = (above.iter().position(|now| *now), above.iter().rposition(|now| *now)) else {
        return;
    };
    let rises_yr = first.checked_sub(1).map_or(ages[0], |before| halve(ages[before], ages[first], |at| !is_above(at)));
    push(rises_yr, EventKind::FirstAbove { marked_k });
    if let Some(after_yr) = ages.get(last + 1) {
        push(halve(ages[last], *after_yr, is_above), EventKind::LastAbove { marked_k });
    } else if past.end().is_some_and(|(end_yr, _)| end_yr <= history.shown_until_yr()) {
        push(ages[last], EventKind::LastAbove { marked_k });
    }
}

/// The loss of air falls between the dates at which bodies may have lost theirs and surely have.
fn shoreline_band(history: &History, past: &PlanetPast, event: &PlanetEvent) -> Option<DateBand> {
    let until_yr = past.end().map_or(history.shown_until_yr(), |(end_yr, _)| end_yr.next_down());
    let is_below = |age_yr: f64, line: f64| past.history().shoreline_ratio_at(age_yr).is_some_and(|ratio| ratio < line);
    (event.kind == PlanetEventKind::AtmosphereLost).then(|| DateBand {
        earliest_yr: is_below(0.0, SHORELINE_KEPT_BELOW)
            .then(|| halve(0.0, event.age_yr, |age_yr| is_below(age_yr, SHORELINE_KEPT_BELOW))),
        latest_yr: (!is_below(until_yr, SHORELINE_LOST_ABOVE))
            .then(|| halve(event.age_yr, until_yr, |age_yr| is_below(age_yr, SHORELINE_LOST_ABOVE))),
    })
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
        let band = if caution.is_none() { star_bands::of_life(history, time_yr) } else { None };
        events.push(Event { time_yr, body, kind: EventKind::GiantNearest, caution, band });
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

#[cfg(test)]
mod tests {
    use super::*;
    use crate::system::{PlanetSpecification, StarSpecification, System, Water};

    fn events(planet: PlanetSpecification) -> (History, Vec<Event>) {
        let history =
            History::compute(System { star: StarSpecification::default(), planets: vec![planet] }).expect("computed");
        let events = history.events().iter().filter(|event| event.body == Body::Planet(0)).copied().collect();
        (history, events)
    }

    fn surface_k(history: &History, age_yr: f64) -> f64 {
        let now = history.planet_at(0, age_yr).expect("a planet");
        now.surface_temperature_k.or(now.surface_hotter_than_k).unwrap_or(0.0)
    }

    #[test]
    fn the_first_and_the_last_moment_above_a_marked_temperature_are_just_that() {
        for (water, semi_major_axis_au, marked_k) in [
            (None, 3.0, 250.0),
            (None, 1.5, 230.0),
            (Some(Water::default()), 4.0, 250.0),
            (Some(Water::default()), 1.4, 289.0),
        ] {
            let (history, events) = events(PlanetSpecification {
                semi_major_axis_au,
                water,
                marked_temperature_k: Some(marked_k),
                ..PlanetSpecification::default()
            });
            let dated = |kind| events.iter().find(|event| event.kind == kind).expect("dated").time_yr;
            let (first_yr, last_yr) =
                (dated(EventKind::FirstAbove { marked_k }), dated(EventKind::LastAbove { marked_k }));
            assert!(first_yr < last_yr, "{first_yr} {last_yr}");
            assert!(surface_k(&history, first_yr * (1.0 + 1e-9)) > marked_k);
            assert!(surface_k(&history, last_yr * (1.0 - 1e-9)) > marked_k);
            for share in 0..400 {
                let share = f64::from(share) / 400.0;
                assert!(surface_k(&history, share * 0.999_999 * first_yr) <= marked_k + 1e-6, "{first_yr} {share}");
                let after_yr = last_yr * 1.000_001 * (history.shown_until_yr() / last_yr).powf(share);
                assert!(surface_k(&history, after_yr) <= marked_k + 1e-6, "{last_yr} {share}");
            }
        }
    }

    #[test]
    fn a_temperature_that_is_never_reached_or_not_marked_is_not_dated() {
        let is_dated = |planet| {
            let (_, events) = events(planet);
            events.iter().any(|event| matches!(event.kind, EventKind::FirstAbove { .. } | EventKind::LastAbove { .. }))
        };
        assert!(!is_dated(PlanetSpecification::default()));
        let cold = PlanetSpecification { semi_major_axis_au: 300.0, ..PlanetSpecification::default() };
        assert!(!is_dated(PlanetSpecification { marked_temperature_k: Some(5000.0), ..cold }));
    }

    #[test]
    fn the_hottest_moment_is_hotter_than_any_other() {
        for (semi_major_axis_au, water) in [(4.0, Some(Water::default())), (20.0, Some(Water::default())), (4.0, None)]
        {
            let (history, events) =
                events(PlanetSpecification { semi_major_axis_au, water, ..PlanetSpecification::default() });
            let hottest = events.iter().filter(|event| event.kind == EventKind::HottestSurface).collect::<Vec<_>>();
            assert_eq!(hottest.len(), 1);
            let most_k = surface_k(&history, hottest[0].time_yr);
            for &age_yr in history.life().node_ages_yr().iter().step_by(7) {
                assert!(surface_k(&history, age_yr) < most_k + 2.0, "{semi_major_axis_au}: {age_yr} {most_k}");
            }
        }
    }

    #[test]
    fn air_is_lost_between_the_lines_of_bodies_that_kept_and_lost_it() {
        let small = PlanetSpecification {
            mass_mearth: 0.1,
            radius_rearth: 0.53,
            semi_major_axis_au: 1.4,
            ..PlanetSpecification::default()
        };
        let (history, events) = events(small);
        let lost =
            events.iter().find(|event| event.kind == EventKind::Planet(PlanetEventKind::AtmosphereLost)).expect("lost");
        let band = lost.band.expect("a band");
        let ratio = |age_yr| history.planets()[0].history().shoreline_ratio_at(age_yr).expect("on its orbit");
        for (date_yr, line) in [(band.earliest_yr, 5.0), (band.latest_yr, 20.0)] {
            if let Some(date_yr) = date_yr {
                assert!((ratio(date_yr) / line - 1.0).abs() < 1e-3, "{line}: {}", ratio(date_yr));
            }
        }
        assert!(band.earliest_yr.is_some() || band.latest_yr.is_some(), "{band:?}");
    }

    #[test]
    fn a_planet_that_turns_fast_at_first_locks_later() {
        let locked_yr = |initial_day_h| {
            let near = PlanetSpecification { semi_major_axis_au: 0.3, initial_day_h, ..PlanetSpecification::default() };
            let (_, events) = events(near);
            let locked = |event: &&Event| event.kind == EventKind::Planet(PlanetEventKind::Locked);
            events.iter().find(locked).expect("locks").time_yr
        };
        assert!(locked_yr(Some(5.0)) > locked_yr(None) && locked_yr(None) > locked_yr(Some(200.0)));
        assert_eq!(locked_yr(None), locked_yr(Some(24.0)));
    }

    #[test]
    fn a_planet_s_end_by_the_giant_is_dated_as_well_as_the_giant() {
        let star = crate::system::StarSpecification::default();
        let planet = PlanetSpecification { semi_major_axis_au: 0.25, ..PlanetSpecification::default() };
        let history = History::compute(crate::system::System { star, planets: vec![planet] }).expect("computed");
        let engulfed = EventKind::Planet(PlanetEventKind::Engulfed);
        let event = history.events().iter().find(|event| event.kind == engulfed).expect("it is swallowed");
        assert_eq!(event.band.is_some(), event.caution.is_none());
        if let Some(DateBand { earliest_yr: Some(earliest_yr), latest_yr: Some(latest_yr) }) = event.band {
            assert!(earliest_yr < event.time_yr && latest_yr > event.time_yr, "{event:?}");
        }
    }
}
