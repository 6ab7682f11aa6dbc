//! What the descriptions of the built-in scenarios promise is what the engine computes.

use longember::document::built_in;
use longember::system::{Body, Event, EventKind, History, PlanetState};

fn history(name: &str) -> Option<History> {
    let scenario = built_in::find(name)?.scenario().ok()?;
    History::compute(scenario.system).ok()
}

/// The planets that the star takes or lets go, and those that still orbit at the end, by name.
fn fates(history: &History) -> (Vec<&str>, Vec<&str>, Vec<&str>) {
    let end = history.moment(1e13);
    let of = |wanted: fn(PlanetState) -> bool| {
        let planets = history.system().planets.iter().zip(&end.planets);
        planets.filter(|(_, now)| wanted(now.state)).map(|(planet, _)| planet.name.as_str()).collect()
    };
    (of(|state| state == PlanetState::Engulfed), of(|state| state == PlanetState::Unbound), of(PlanetState::orbits))
}

/// When something first happens to a planet.
fn first(history: &History, planet: &str, kind: EventKind) -> Option<f64> {
    let index = history.system().planets.iter().position(|candidate| candidate.name == planet)?;
    let is_it = |event: &&Event| event.body == Body::Planet(index) && event.kind == kind;
    history.events().iter().find(is_it).map(|event| event.time_yr)
}

#[test]
fn every_built_in_can_be_computed() {
    for built_in in built_in::all() {
        let history = history(built_in.name);
        assert!(history.is_some_and(|history| !history.events().is_empty()), "{}", built_in.name);
    }
}

#[test]
fn planets_end_as_their_descriptions_say() {
    let none: [&str; 0] = [];
    for (name, engulfed, unbound, spared) in [
        ("sunlike_five_worlds", &["Cindrel", "Marrowick"][..], &none[..], &["Talune", "Ostavar", "Frimholt"][..]),
        ("eccentric_orbit", &["Hollisk"], &none, &["Dorrance", "Greatmoor"]),
        ("two_solar_masses_survivors", &["Torvane"], &none, &["Wick", "Auberle", "Stillwater"]),
        ("five_solar_masses_blue_loop", &["Rennock"], &none, &["Farrowby", "Lintel"]),
        ("twelve_solar_masses_supernova", &["Kestrow"], &["Ambrel", "Outmark"], &none),
    ] {
        let history = history(name).expect(name);
        assert_eq!(fates(&history), (engulfed.to_vec(), unbound.to_vec(), spared.to_vec()), "{name}");
    }
}

#[test]
fn the_demo_keeps_its_promises() {
    let history = history(built_in::demo().name).expect("computed");
    let main_sequence_end_yr = 9e9;
    let leaves_yr = first(&history, "Talune", EventKind::LeavesZone).expect("it grows too hot");
    assert!(leaves_yr > 4.6e9 && leaves_yr < main_sequence_end_yr, "{leaves_yr}");
    let thaws_yr = first(&history, "Frimholt", EventKind::Thaws).expect("it thaws");
    let freezes_yr = first(&history, "Frimholt", EventKind::Freezes).expect("it freezes again");
    assert!(main_sequence_end_yr < thaws_yr && thaws_yr < freezes_yr, "{thaws_yr} {freezes_yr}");
    let mut nearer = history.system().clone();
    nearer.planets[1].semi_major_axis_au += 0.1;
    let nearer = History::compute(nearer).expect("computed");
    assert!(fates(&nearer).2.contains(&"Marrowick"), "a tenth of an astronomical unit saves it");
}

#[test]
fn orbits_widen_as_the_descriptions_say() {
    for (name, planet, least, most) in
        [("two_solar_masses_survivors", "Wick", 2.7, 3.5), ("five_solar_masses_blue_loop", "Farrowby", 4.0, 6.0)]
    {
        let history = history(name).expect(name);
        let index = history.system().planets.iter().position(|candidate| candidate.name == planet).expect(planet);
        let end_au = history.planet_at(index, 1e13).and_then(|moment| moment.semi_major_axis_au).expect("it orbits");
        let widening = end_au / history.system().planets[index].semi_major_axis_au;
        assert!((least..most).contains(&widening), "{name}: {widening}");
    }
}
