//! Every way to name a moment.

use crate::program::{DEMO, json, refusal};

fn time_yr(time: &str) -> f64 {
    json(["state", DEMO, "--at", time, "--format", "json"])["time_yr"].as_f64().expect("a number")
}

#[test]
fn spans_of_time_are_read_in_every_form() {
    assert_eq!(time_yr("4.57Gyr"), 4.57e9);
    assert_eq!(time_yr("2.1e12yr"), 2.1e12);
    assert_eq!(time_yr("3 trillion years"), 3e12);
    assert_eq!(time_yr("1e14 yr"), 1e14);
    assert_eq!(time_yr("0"), 0.0);
    assert_eq!(time_yr("now"), 4.6e9);
}

#[test]
fn an_event_is_found_by_name_or_key_in_any_case() {
    let end = time_yr("event:hydrogen in the core is spent");
    assert!(end > 8e9 && end < 13e9, "{end}");
    for name in [
        "event:\"Hydrogen in the CORE is spent\"",
        "event:main_sequence_end",
        "event:\"end of core hydrogen burning\"",
        "EVENT:'hydrogen in the  core is spent'",
    ] {
        assert_eq!(time_yr(name), end, "{name}");
    }
    let swallowed = time_yr("event:\"Cindrel: swallowed by the star\"");
    assert_eq!(time_yr("event:\"cindrel: engulfed\""), swallowed);
    assert!(swallowed > end);
}

#[test]
fn a_bare_star_has_events_but_no_present() {
    let state = json(["star", "--mass", "3", "--at", "event:largest radius", "--format", "json"]);
    assert!(state["star"]["radius_rsun"].as_f64().expect("a number") > 100.0);
    let message = refusal(["star", "--mass", "3", "--at", "now"], 3);
    assert!(message.contains("4.57Gyr"), "{message}");
}

#[test]
fn an_event_that_does_not_happen_brings_the_list_of_those_that_do() {
    let message = refusal(["state", DEMO, "--at", "event:\"core collapse, supernova\""], 3);
    assert!(message.contains("core collapse, supernova") && message.contains("\"largest radius\" at "), "{message}");
    assert!(message.contains("\"Cindrel: engulfed by the star\" at "), "{message}");
}

#[test]
fn an_event_that_happens_more_than_once_brings_its_times() {
    let message = refusal(["state", DEMO, "--at", "event:\"enters the habitable zone\""], 3);
    assert!(message.contains("times") && message.contains("\"Ostavar: enters the habitable zone\" at "), "{message}");
    assert!(!message.contains("largest radius"), "{message}");
}

#[test]
fn times_out_of_range_bring_the_range() {
    for time in ["-5Gyr", "-1", "1.01e14 yr", "200 trillion years", "1e300 yr"] {
        let message = refusal(["state", DEMO, "--at", time], 3);
        assert!(message.contains("0 to 100000000000000 yr"), "{message}");
    }
}

#[test]
fn what_is_no_time_brings_examples() {
    for time in ["soon", "", "nan", "inf yr", "4,57 Gyr", "7 parsecs", "Gyr", "--format"] {
        let message = refusal(["state", DEMO, "--at", time], 3);
        assert!(message.contains("7.6 Gyr") && message.contains("event:NAME"), "{message}");
    }
}
