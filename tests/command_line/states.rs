//! `state` and `star`.

use crate::program::{DEMO, edited_demo, json, result, run_with_input};
use serde_json::Value;

const STAR_KEYS: [&str; 9] = [
    "phase",
    "mass_msun",
    "luminosity_lsun",
    "radius_rsun",
    "effective_temperature_k",
    "core_hydrogen_fraction",
    "colour_srgb_hex",
    "colour_x",
    "colour_y",
];
const PLANET_KEYS: [&str; 6] =
    ["name", "semi_major_axis_au", "insolation_earth", "equilibrium_temperature_k", "surface_temperature_k", "state"];

fn keys(object: &Value) -> Vec<&str> {
    object.as_object().expect("an object").keys().map(String::as_str).collect()
}

/// The object a note is about.
fn subject<'a>(state: &'a Value, note: &Value) -> &'a Value {
    match &note["planet_index"] {
        Value::Null => &state["star"],
        index => &state["planets"][usize::try_from(index.as_u64().expect("a number")).expect("small")],
    }
}

fn check_notes(state: &Value) {
    let notes = state["notes"].as_array().expect("notes");
    for note in notes {
        let about = note["about"].as_str().expect("a key");
        assert!(about == "time_yr" || subject(state, note).get(about).is_some(), "{note}");
        let body = note["body"].as_str().expect("a body");
        assert!(body == "star" || subject(state, note)["name"] == body, "{note}");
        assert!(
            !note["kind"].as_str().expect("a kind").is_empty() && !note["text"].as_str().expect("a text").is_empty()
        );
    }
    let has_note = |index: Value, key: &str| {
        notes.iter().any(|note| note["planet_index"] == index && note["about"] == key && note["kind"] != "spread")
    };
    let missing = |object: &Value| -> Vec<String> {
        object.as_object().expect("an object").iter().filter(|(_, v)| v.is_null()).map(|(key, _)| key.clone()).collect()
    };
    for key in missing(&state["star"]) {
        assert!(has_note(Value::Null, &key), "star: {key} is null without a note");
    }
    for (index, planet) in state["planets"].as_array().expect("planets").iter().enumerate() {
        for key in missing(planet) {
            assert!(has_note(Value::from(index), &key), "{}: {key} is null without a note", planet["name"]);
        }
    }
}

#[test]
fn json_has_the_names_that_other_programs_rely_on() {
    let state = json(["state", DEMO, "--at", "4.57Gyr", "--format", "json"]);
    assert_eq!(keys(&state), ["time_yr", "star", "planets", "notes"]);
    assert_eq!(state["time_yr"].as_f64(), Some(4.57e9));
    for key in STAR_KEYS {
        assert!(!state["star"][key].is_null(), "{key}");
    }
    assert_eq!(state["star"]["phase"], "main_sequence");
    let hex = state["star"]["colour_srgb_hex"].as_str().expect("a colour");
    assert!(hex.len() == 7 && hex.starts_with('#') && u32::from_str_radix(&hex[1..], 16).is_ok(), "{hex}");
    let planets = state["planets"].as_array().expect("planets");
    assert_eq!(planets.len(), 5);
    for key in PLANET_KEYS {
        assert!(planets.iter().all(|planet| !planet[key].is_null()), "{key}");
    }
    let kinds: Vec<_> = state["notes"].as_array().expect("notes").iter().map(|note| note["kind"].clone()).collect();
    assert!(kinds.contains(&Value::from("held_fixed")) && kinds.contains(&Value::from("spread")), "{kinds:?}");
}

#[test]
fn a_star_like_the_sun_is_like_the_sun() {
    // IAU 2015 Resolution B3: the nominal Sun has L = R = 1 and 5772 K; age 4.57 Gyr from meteorites, common practice.
    let star = &json(["star", "--mass", "1", "--at", "4.57Gyr", "--format", "json"])["star"];
    let figure = |key: &str| star[key].as_f64().expect("a number");
    assert!((figure("luminosity_lsun") - 1.0).abs() < 0.02, "{star}");
    assert!((figure("effective_temperature_k") - 5772.0).abs() < 60.0, "{star}");
    assert!((figure("radius_rsun") - 1.0).abs() < 0.03, "{star}");
}

#[test]
fn every_missing_value_has_a_note_at_every_stage_of_life() {
    let scenarios = ["sunlike_five_worlds", "twelve_solar_masses_supernova", "two_solar_masses_survivors"];
    for scenario in scenarios {
        for time in ["0", "1 Myr", "17 Myr", "1 Gyr", "12.1737 Gyr", "15 Gyr", "1e13 yr", "1e14 yr"] {
            let text = result(["state", &format!("demo:{scenario}"), "--at", time, "--format", "json"]);
            for odd in ["NaN", "nan", "inf", "Infinity"] {
                assert!(!text.contains(&format!(": {odd}")), "{scenario} at {time}");
            }
            check_notes(&serde_json::from_str(&text).expect("JSON"));
        }
    }
}

#[test]
fn the_page_for_people_fits_into_80_columns() {
    for (scenario, time) in [(DEMO, "now"), (DEMO, "13 Gyr"), ("demo:twelve_solar_masses_supernova", "1e14yr")] {
        let page = result(["state", scenario, "--at", time]);
        for line in page.lines() {
            assert!(line.chars().count() <= 80 && line.trim_end() == line, "{line:?}");
        }
        assert!(page.contains("\nNotes\n") && !page.contains("NaN") && !page.contains("inf"), "{page}");
    }
    let page = result(["state", DEMO, "--at", "4.57 Gyr"]);
    for expected in ["4.570 billion years after", "main sequence", "Luminosity", "L☉", "Talune", "temperate", "Notes"]
    {
        assert!(page.contains(expected), "{expected} is not in\n{page}");
    }
}

#[test]
fn the_longest_names_keep_the_page_readable() {
    let long = "W".repeat(60);
    let scenario = edited_demo("\"Talune\"", &format!("\"{long}\""));
    let finished = run_with_input(["state", "-", "--at", "now"], scenario.as_bytes());
    assert_eq!(finished.code, 0, "{}", finished.messages);
    // Labels and a name of the greatest length together are three columns over; nothing else may be.
    for line in finished.results.lines() {
        assert!(line.chars().count() <= 80 || line.contains(&long), "{line:?}");
    }
}

#[test]
fn a_bare_star_is_the_star_of_a_scenario() {
    let bare = json(["star", "--mass", "1", "--metallicity", "0", "--at", "8 Gyr", "--format", "json"]);
    let whole = json(["state", DEMO, "--at", "8 Gyr", "--format", "json"]);
    assert_eq!(bare["planets"], Value::Array(Vec::new()));
    for key in STAR_KEYS {
        assert_eq!(bare["star"][key], whole["star"][key], "{key}");
    }
    let poor = json(["star", "--mass", "1", "--metallicity", "-1.5", "--at", "1 Gyr", "--format", "json"]);
    assert_eq!(poor["star"]["metallicity_dex"].as_f64(), Some(-1.5));
    let rich = json(["star", "--mass=1", "--at=1 Gyr", "--format=json"]);
    assert!(poor["star"]["luminosity_lsun"].as_f64() > rich["star"]["luminosity_lsun"].as_f64());
}

#[test]
fn a_scenario_comes_from_standard_input_as_from_a_file() {
    let scenario = result(["demo", "sunlike_five_worlds"]);
    let piped = run_with_input(["state", "-", "--at", "now", "--format", "json"], scenario.as_bytes());
    assert_eq!((piped.code, piped.messages.as_str()), (0, ""));
    assert_eq!(piped.results, result(["state", DEMO, "--at", "now", "--format", "json"]));
}
