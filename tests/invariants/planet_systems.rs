//! What must hold for a whole system, however odd: a history or a clear refusal, and moments that do not depend on
//! how they were reached.

use longember::system::{
    Carbon, History, HistoryError, Moment, PlanetSpecification, StarSpecification, System, TidesChoice, Water,
};
use proptest::prelude::*;

fn planet() -> impl Strategy<Value = PlanetSpecification> {
    let orbit = (-3.9_f64..4.9, prop_oneof![Just(0.0), 0.0_f64..0.99], -5.9_f64..3.6, -1.9_f64..1.4);
    let carbon = prop_oneof![
        (275.0_f64..310.0).prop_map(|mean_k| Carbon::Regulated { mean_k }),
        (-4.0_f64..0.47).prop_map(|log_bar| Carbon::Held { carbon_dioxide_bar: 10.0_f64.powf(log_bar) }),
    ];
    let water = (carbon, -3.0_f64..3.0, 0.0_f64..90.0, any::<bool>()).prop_map(
        |(carbon, log_oceans, obliquity_deg, starts_frozen)| Water {
            carbon,
            water_oceans: 10.0_f64.powf(log_oceans),
            obliquity_deg,
            starts_frozen,
            ..Water::default()
        },
    );
    let marked = prop::option::of(3.0_f64..5000.0);
    let day = prop::option::of(1.0_f64..1e5);
    (orbit, prop::option::of(water), any::<bool>(), marked, day).prop_map(|(orbit, water, tides, marked, day)| {
        let (log_a, eccentricity, log_m, log_r) = orbit;
        PlanetSpecification {
            marked_temperature_k: marked,
            initial_day_h: day,
            semi_major_axis_au: 10.0_f64.powf(log_a),
            eccentricity,
            mass_mearth: 10.0_f64.powf(log_m),
            radius_rearth: 10.0_f64.powf(log_r),
            water,
            tides: if tides { TidesChoice::On } else { TidesChoice::Off },
            ..PlanetSpecification::default()
        }
    })
}

fn system() -> impl Strategy<Value = System> {
    // Fitted stars only: the life of a red dwarf takes seconds and is tried elsewhere.
    (-0.2_f64..2.0, -2.0_f64..0.2, prop::collection::vec(planet(), 1..4)).prop_map(|(log_mass, metals, mut planets)| {
        for (index, planet) in planets.iter_mut().enumerate() {
            planet.name = format!("Planet {index}");
        }
        let star = StarSpecification {
            mass_msun: 10.0_f64.powf(log_mass).min(100.0),
            metallicity_dex: metals,
            ..StarSpecification::default()
        };
        System { star, planets }
    })
}

fn check(moment: &Moment) -> Result<(), TestCaseError> {
    for planet in &moment.planets {
        for quantity in longember::system::quantities::PLANET {
            let value = (quantity.value)(planet);
            prop_assert!(value.is_none_or(f64::is_finite), "{}: {planet:?}", quantity.key);
        }
        prop_assert!(planet.surface_temperature_k.is_none() || planet.surface_hotter_than_k.is_none());
    }
    Ok(())
}

proptest! {
    #![proptest_config(ProptestConfig { cases: 48, failure_persistence: None, ..ProptestConfig::default() })]

    #[test]
    fn every_system_in_range_has_a_history_of_finite_figures_up_to_the_last_age(
        system in system(), logs in prop::collection::vec(0.0_f64..14.0, 5),
    ) {
        let history = History::compute(system).unwrap();
        for log_age in logs.into_iter().chain([14.0]) {
            check(&history.moment(10.0_f64.powf(log_age)))?;
        }
        for event in history.events() {
            prop_assert!(event.time_yr.is_finite() && event.time_yr >= 0.0, "{event:?}");
            if let Some(band) = event.band {
                prop_assert!(band.earliest_yr.is_none_or(|date_yr| date_yr <= event.time_yr), "{event:?}");
                prop_assert!(band.latest_yr.is_none_or(|date_yr| date_yr >= event.time_yr), "{event:?}");
            }
        }
        prop_assert!(history.events().windows(2).all(|pair| pair[0].time_yr <= pair[1].time_yr));
    }

    #[test]
    fn moving_the_moment_back_and_forth_changes_nothing(
        system in system(), ages in prop::collection::vec(0.0_f64..1.3e10, 4),
    ) {
        let history = History::compute(system.clone()).unwrap();
        let forth: Vec<Moment> = ages.iter().map(|age_yr| history.moment(*age_yr)).collect();
        let back: Vec<Moment> = ages.iter().rev().map(|age_yr| history.moment(*age_yr)).collect();
        prop_assert!(forth.iter().eq(back.iter().rev()));
        let anew = History::compute(system).unwrap();
        prop_assert!(forth.iter().zip(&ages).all(|(moment, age_yr)| *moment == anew.moment(*age_yr)));
        prop_assert_eq!(history.events(), anew.events());
    }
}

#[test]
fn bad_input_is_refused_with_every_reason() {
    let usual = PlanetSpecification::default;
    let thick = Water { carbon: Carbon::Held { carbon_dioxide_bar: 100.0 }, ..Water::default() };
    for (planet, reason) in [
        (PlanetSpecification { eccentricity: 1.0, ..usual() }, "eccentricity is 1"),
        (PlanetSpecification { mass_mearth: 0.0, ..usual() }, "mass_mearth is 0"),
        (PlanetSpecification { water: Some(thick), ..usual() }, "carbon_dioxide_bar is 100, allowed 0.0001 to 3 bar"),
    ] {
        let refused = History::compute(System { star: StarSpecification::default(), planets: vec![planet] });
        let refusal = refused.expect_err(reason);
        assert!(matches!(refusal, HistoryError::Inputs(_)) && refusal.to_string().contains(reason), "{refusal}");
    }
}

#[test]
fn a_planet_inside_its_star_at_birth_and_crossing_orbits_are_answered() {
    let planet = |name: &str, semi_major_axis_au, eccentricity| PlanetSpecification {
        name: name.to_owned(),
        semi_major_axis_au,
        eccentricity,
        ..PlanetSpecification::default()
    };
    let planets = vec![planet("Inside", 1e-3, 0.0), planet("Long", 2.0, 0.7), planet("Crossed", 1.0, 0.0)];
    let history = History::compute(System { star: StarSpecification::default(), planets }).expect("answered");
    let birth = history.moment(0.0);
    assert!(!birth.planets[0].state.orbits(), "{:?}", birth.planets[0].state);
    assert!(history.planets()[0].end().is_some_and(|(age_yr, _)| age_yr == 0.0));
    let crossing: Vec<_> = birth.notes.iter().filter(|note| note.text.contains("cross")).collect();
    assert_eq!(crossing.len(), 2, "both planets are told about it: {:?}", birth.notes);
}
