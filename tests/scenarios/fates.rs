//! What the descriptions of the built-in scenarios promise is what the engine computes.

use longember::document::built_in;
use longember::physics::planet::PlanetEventKind;
use longember::physics::star::StarEventKind;
use longember::system::mild_spans::mild_spans;
use longember::system::{Body, Carbon, Event, EventKind, History, PlanetState};

fn history(name: &str) -> Option<History> {
    let scenario = built_in::find(name)?.scenario().ok()?;
    // Red dwarfs take seconds; what their descriptions promise is held to the exact lives in a file of its own.
    History::quick_look(scenario.system.clone()).or_else(|| History::compute(scenario.system).ok())
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
fn first(history: &History, planet: &str, kind: PlanetEventKind) -> Option<f64> {
    let index = history.system().planets.iter().position(|candidate| candidate.name == planet)?;
    let is_it = |event: &&Event| event.body == Body::Planet(index) && event.kind == EventKind::Planet(kind);
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
    let main_sequence_end_yr = history.life().age_of_yr(StarEventKind::MainSequenceEnd).expect("it ends");
    let steam_yr = first(&history, "Talune", PlanetEventKind::RunawayGreenhouse).expect("its seas turn to steam");
    let dry_yr = first(&history, "Talune", PlanetEventKind::WaterGone).expect("it loses its water");
    assert!(4.6e9 < steam_yr && steam_yr < dry_yr && dry_yr < main_sequence_end_yr, "{steam_yr} {dry_yr}");
    let mild_k = history.planet_at(2, 4.6e9).and_then(|planet| planet.surface_temperature_k).expect("mild now");
    assert!((mild_k - 288.0).abs() < 1.0, "{mild_k}");
    let thaws_yr = first(&history, "Frimholt", PlanetEventKind::Thaws).expect("it thaws");
    let freezes_yr = first(&history, "Frimholt", PlanetEventKind::Freezes).expect("it freezes again");
    assert!(main_sequence_end_yr < thaws_yr && thaws_yr < freezes_yr, "{thaws_yr} {freezes_yr}");
    let is_spared_from = |factor: f64| {
        let mut system = history.system().clone();
        system.planets[1].semi_major_axis_au *= factor;
        fates(&History::compute(system).expect("computed")).2.contains(&"Marrowick")
    };
    assert!(!is_spared_from(1.5), "the tide draws it in even from half as far out again");
    assert!(is_spared_from(1.75), "but not from much farther");
}

#[test]
fn frozen_worlds_wait_for_the_giant() {
    let history = history("frozen_worlds_and_the_giant").expect("computed");
    let end_yr = history.life().age_of_yr(StarEventKind::MainSequenceEnd).expect("it leaves the main sequence");
    for index in [0, 1] {
        for age_yr in [1e9, 4.6e9, 1e10, end_yr] {
            assert_eq!(history.planet_at(index, age_yr).map(|planet| planet.state), Some(PlanetState::Frozen));
        }
    }
    assert_eq!(first(&history, "Rimefall", PlanetEventKind::Thaws), None, "straight from ice to steam");
    let steam_yr = first(&history, "Rimefall", PlanetEventKind::ThawsToSteam).expect("it thaws in the end");
    assert!(steam_yr > end_yr);
    let is_thaw = |event: &&Event| event.kind == EventKind::Planet(PlanetEventKind::ThawsToSteam);
    let band = history.events().iter().find(is_thaw).and_then(|event| event.band).expect("never one bare date");
    assert!(band.earliest_yr.is_some_and(|date_yr| date_yr < steam_yr), "{band:?}");
    assert!(band.latest_yr.is_some_and(|date_yr| date_yr > steam_yr), "{band:?}");
    let mild = mild_spans(&history, 1);
    let length_yr = mild.first().map(|span| span.until_yr - span.from_yr).expect("a mild spell");
    assert!((1e7..3e7).contains(&length_yr), "some twenty million years: {length_yr}");
    assert!(mild.len() >= 2, "and a second one: {mild:?}");
    let mut system = history.system().clone();
    if let Some(water) = &mut system.planets[0].water {
        water.carbon = Carbon::Held { carbon_dioxide_bar: 0.3 };
    }
    let thick = History::compute(system).expect("computed");
    assert_eq!(first(&thick, "Rimefall", PlanetEventKind::ThawsToSteam), None);
    assert!(!mild_spans(&thick, 0).is_empty(), "0.3 bar of carbon dioxide gives it a mild spell as well");
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
