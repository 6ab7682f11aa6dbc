//! What the descriptions of the red dwarfs promise is what the exact calculation computes.

use longember::document::{LifeStore, built_in};
use longember::physics::planet::PlanetEventKind;
use longember::physics::star::{Phase, StarEventKind};
use longember::system::EventKind::{FallsBelowBoiling, FallsBelowFreezing, RisesAboveBoiling, RisesAboveFreezing};
use longember::system::{Body, EventKind, History};
use std::ops::ControlFlow;

const SWALLOWED: EventKind = EventKind::Planet(PlanetEventKind::Engulfed);

fn history(name: &str) -> History {
    let scenario = built_in::find(name).expect(name).scenario().expect("sound");
    let history = LifeStore::default().history(None, scenario.system, &mut |_| ControlFlow::Continue(()));
    history.expect("a life")
}

/// Every time at which something happens to a planet.
fn times(history: &History, planet: &str, kind: EventKind) -> Vec<f64> {
    let index = history.system().planets.iter().position(|candidate| candidate.name == planet).expect(planet);
    let events = history.events().iter();
    let its = events.filter(|event| event.body == Body::Planet(index) && event.kind == kind);
    its.map(|event| event.time_yr).collect()
}

fn once(history: &History, planet: &str, kind: EventKind) -> f64 {
    let times = times(history, planet, kind);
    assert_eq!(times.len(), 1, "{planet}: {kind:?}");
    times[0]
}

fn star(history: &History, kind: StarEventKind) -> f64 {
    history.life().age_of_yr(kind).expect("it happens")
}

#[test]
fn close_worlds_of_a_tenth_of_a_sun() {
    let history = history("tenth_of_a_sun_close_worlds");
    let young = history.star_at(5e9);
    assert!((0.7e-3..1.3e-3).contains(&young.luminosity_lsun), "{young:?}");
    let spent_yr = star(&history, StarEventKind::MainSequenceEnd);
    assert!((3.5e12..4e12).contains(&spent_yr), "{spent_yr}");
    let bright = history.star_at(star(&history, StarEventKind::HighestLuminosity));
    assert!((8.0..13.0).contains(&(bright.luminosity_lsun / young.luminosity_lsun)), "{bright:?}");
    assert!(history.spans().iter().all(|span| !span.phase.is_giant()));
    assert!(times(&history, "Ashwick", RisesAboveFreezing).is_empty());
    assert!((3.4e12..3.7e12).contains(&once(&history, "Ashwick", RisesAboveBoiling)));
    assert!((1.8e12..2.4e12).contains(&once(&history, "Dunmere", RisesAboveFreezing)));
    let spring_yr = once(&history, "Farholt", FallsBelowFreezing) - once(&history, "Farholt", RisesAboveFreezing);
    assert!((3.5e10..5e10).contains(&spring_yr), "{spring_yr}");
    assert!(once(&history, "Pell", FallsBelowBoiling) > star(&history, StarEventKind::WhiteDwarfBirth));
}

#[test]
fn the_late_spring_of_frozen_worlds() {
    let history = history("late_spring_of_outer_worlds");
    let bright = history.star_at(star(&history, StarEventKind::HighestLuminosity));
    assert!((0.2..0.35).contains(&bright.luminosity_lsun) && bright.effective_temperature_k > 5772.0, "{bright:?}");
    let years = history
        .life()
        .node_ages_yr()
        .windows(2)
        .filter(|pair| history.star_at(pair[0]).luminosity_lsun > 0.5 * bright.luminosity_lsun && pair[1] < 3e12);
    let steady_yr: f64 = years.map(|pair| pair[1] - pair[0]).sum();
    assert!((4e9..6e9).contains(&steady_yr), "{steady_yr}");
    assert!(once(&history, "Brindle", RisesAboveBoiling) < once(&history, "Hallowmere", RisesAboveFreezing));
    assert!(once(&history, "Hallowmere", RisesAboveBoiling) < bright.age_yr);
    let thaw_yr = once(&history, "Icewold", RisesAboveFreezing);
    let spring_yr = once(&history, "Icewold", FallsBelowFreezing) - thaw_yr;
    assert!(thaw_yr > 2e12 && (3e9..4e9).contains(&spring_yr), "{thaw_yr} {spring_yr}");
    assert!(times(&history, "Lastmere", RisesAboveFreezing).is_empty());
}

#[test]
fn a_red_dwarf_that_becomes_a_giant_after_all() {
    let history = history("red_dwarf_that_becomes_a_giant");
    assert!(history.spans().iter().any(|span| span.phase == Phase::FirstGiantBranch));
    let spent_yr = star(&history, StarEventKind::MainSequenceEnd);
    assert!((7.5e11..8.5e11).contains(&spent_yr), "{spent_yr}");
    let largest = history.star_at(star(&history, StarEventKind::LargestRadius));
    assert!(largest.radius_rsun > 4.0 && (13.0..27.0).contains(&largest.luminosity_lsun), "{largest:?}");
    once(&history, "Scald", SWALLOWED);
    assert!((6.5e11..spent_yr).contains(&once(&history, "Hearthing", RisesAboveBoiling)));
    assert!(times(&history, "Hearthing", SWALLOWED).is_empty());
    let mild_yr =
        times(&history, "Midwinter", RisesAboveBoiling)[0] - times(&history, "Midwinter", RisesAboveFreezing)[0];
    assert!((2e9..4e9).contains(&mild_yr), "{mild_yr}");
    let spring_yr = once(&history, "Oldfrost", FallsBelowFreezing) - once(&history, "Oldfrost", RisesAboveFreezing);
    assert!((2e7..5e7).contains(&spring_yr), "{spring_yr}");
    assert!(times(&history, "Midwinter", RisesAboveFreezing).len() > 1, "the flares of the last hydrogen");
}
