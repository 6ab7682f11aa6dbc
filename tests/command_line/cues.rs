//! `cues`: one line for every frame, time codes, and warnings.

use crate::program::{DEMO, json, records, refusal, run, run_with_input};

fn column(header: &[String], key: &str) -> usize {
    header.iter().position(|name| name == key).unwrap_or_else(|| panic!("no column {key} in {header:?}"))
}

#[test]
fn every_frame_has_its_line() {
    let finished = run(["cues", DEMO, "--fps", "10", "--planet", "Talune"]);
    assert_eq!(finished.code, 0, "{}", finished.messages);
    let (header, rows) = records(&finished.results);
    assert_eq!(rows.len(), 1041);
    assert_eq!(header[..5], ["frame", "time_code", "show_time_s", "cue", "time_yr"]);
    for key in [
        "luminosity_lsun",
        "colour_x",
        "linear_rec709_red",
        "encoded_srgb_blue",
        "talune_surface_temperature_k",
        "talune_star_angular_diameter_deg",
    ] {
        column(&header, key);
    }
    assert!(!header.iter().any(|key| key.starts_with("frimholt_")), "{header:?}");
    let number = |row: &[String], key: &str| row[column(&header, key)].parse::<f64>().expect("a number");
    for (index, row) in rows.iter().enumerate() {
        assert_eq!(number(row, "frame"), index as f64);
        assert!((number(row, "show_time_s") - index as f64 / 10.0).abs() < 1e-9);
    }
    assert_eq!((rows[615][1].as_str(), number(&rows[80], "time_yr")), ("00:01:01:05", 4.6e9));
    // A frame tells what `state` tells of its moment.
    let state = json(["state", DEMO, "--at", "now", "--format", "json"]);
    assert_eq!(Some(number(&rows[80], "luminosity_lsun")), state["star"]["luminosity_lsun"].as_f64());
    assert_eq!(
        Some(number(&rows[80], "talune_star_angular_diameter_deg")),
        state["planets"][2]["star_angular_diameter_deg"].as_f64()
    );
    // The last cue is a cut, and it is told of.
    assert!(finished.messages.contains("note: 1:44.00: a cut"), "{}", finished.messages);
}

#[test]
fn a_rate_of_29_97_is_counted_with_dropped_frames() {
    let finished = run(["cues", DEMO, "--fps", "29.97", "--planet", "Talune"]);
    let (_, rows) = records(&finished.results);
    assert_eq!((rows[1799][1].as_str(), rows[1800][1].as_str()), ("00:00:59;29", "00:01:00;02"));
}

#[test]
fn a_show_that_flashes_is_warned_of() {
    let cues: Vec<String> = (0..40)
        .map(|index| {
            let moment = if index % 2 == 0 { "now" } else { "event 'largest radius'" };
            format!("(show_time_s: {}, moment: \"{moment}\", transition: Cut)", f64::from(index) / 10.0)
        })
        .collect();
    let scenario = format!(
        "(version: 1, title: \"T\", star: (name: \"A\", mass_msun: 1, metallicity_dex: 0, present_age_yr: 1e9), cues: [{}])",
        cues.join(", ")
    );
    let finished = run_with_input(["cues", "-", "--fps", "60"], scenario.as_bytes());
    assert_eq!(finished.code, 0, "{}", finished.messages);
    assert!(finished.messages.contains("warning: ") && finished.messages.contains("2.3.1"), "{}", finished.messages);
}

#[test]
fn what_makes_no_show_is_refused() {
    assert!(refusal(["cues", "demo:eccentric_orbit"], 3).contains("no cue"));
    let refused = run(["cues", DEMO, "--fps", "0"]);
    assert!(refused.code == 2 && refused.messages.contains("29.97"), "{}", refused.messages);
    assert!(refusal(["cues", DEMO, "--planet", "Earth"], 3).contains("Talune"));
}
