//! `table`.

use crate::program::{DEMO, edited_demo, json, records, refusal, result, run_with_input};
use serde_json::Value;
use std::collections::HashSet;

fn column(header: &[String], name: &str) -> usize {
    header.iter().position(|key| key == name).unwrap_or_else(|| panic!("{name} is not in {header:?}"))
}

#[test]
fn csv_has_one_header_and_a_row_per_point() {
    let (header, rows) = records(&result(["table", DEMO, "--points", "50"]));
    assert_eq!(rows.len(), 50);
    assert_eq!(header.iter().collect::<HashSet<_>>().len(), header.len());
    for name in [
        "time_yr",
        "phase",
        "mass_msun",
        "luminosity_lsun",
        "radius_rsun",
        "effective_temperature_k",
        "core_hydrogen_fraction",
        "colour_srgb_hex",
        "colour_x",
        "colour_y",
        "talune_semi_major_axis_au",
        "talune_insolation_earth",
        "talune_equilibrium_temperature_k",
        "talune_surface_temperature_k",
        "talune_state",
    ] {
        column(&header, name);
    }
    let times: Vec<f64> = rows.iter().map(|row| row[0].parse().expect("a number")).collect();
    assert!(times[0] == 0.0 && times.windows(2).all(|pair| pair[0] < pair[1]));
}

#[test]
fn numbers_come_back_with_the_same_bits_from_csv_and_json() {
    let words = ["table", DEMO, "--points", "40", "--from", "9 Gyr", "--to", "14Gyr"];
    let (header, rows) = records(&result(words));
    let table = json(words.iter().copied().chain(["--format", "json"]));
    let objects = table["rows"].as_array().expect("rows");
    assert_eq!(objects.len(), rows.len());
    let mut missing = 0;
    for (row, object) in rows.iter().zip(objects) {
        assert_eq!(object.as_object().expect("an object").len(), header.len());
        for (key, cell) in header.iter().zip(row) {
            match &object[key] {
                Value::Null => {
                    assert_eq!(cell, "", "{key}");
                    missing += 1;
                }
                Value::Number(number) => {
                    let (json, csv) = (number.as_f64().expect("finite"), cell.parse::<f64>().expect("a number"));
                    assert!(csv.is_finite());
                    assert_eq!(json.to_bits(), csv.to_bits(), "{key}");
                }
                Value::String(text) => assert_eq!(text, cell, "{key}"),
                other => panic!("{key}: {other}"),
            }
        }
    }
    // Cindrel is swallowed within this span, so something must be missing.
    assert!(missing > 0);
}

#[test]
fn a_row_is_the_state_at_its_time() {
    let (header, rows) = records(&result(["table", DEMO, "--points", "9"]));
    for row in &rows {
        let state = json(["state", DEMO, "--at", &format!("{} yr", row[0]), "--format", "json"]);
        assert_eq!(state["time_yr"].as_f64(), row[0].parse().ok());
        for key in ["luminosity_lsun", "radius_rsun", "mass_msun"] {
            assert_eq!(state["star"][key].as_f64(), row[column(&header, key)].parse().ok(), "{key}");
        }
        let talune = state["planets"].as_array().expect("planets").iter().find(|planet| planet["name"] == "Talune");
        let talune = talune.expect("there");
        assert_eq!(talune["state"].as_str(), Some(row[column(&header, "talune_state")].as_str()));
        let surface = &row[column(&header, "talune_surface_temperature_k")];
        assert_eq!(talune["surface_temperature_k"].as_f64(), surface.parse().ok());
    }
}

#[test]
fn every_empty_cell_is_named_in_the_notes_of_its_row() {
    let (header, rows) = records(&result(["table", "demo:twelve_solar_masses_supernova", "--points", "60"]));
    let notes = column(&header, "notes");
    let mut empty = 0;
    for row in &rows {
        let named: HashSet<&str> = row[notes].split(' ').filter_map(|word| word.split(':').next()).collect();
        for (index, key) in header.iter().enumerate().filter(|(index, _)| *index != notes) {
            if row[index].is_empty() {
                empty += 1;
                assert!(named.contains(key.as_str()), "{key} at {} yr: {}", row[0], row[notes]);
            }
        }
    }
    assert!(empty > 0);
}

#[test]
fn the_spacing_is_what_was_asked_for() {
    let times = |spacing: &str| -> Vec<f64> {
        let words = ["table", DEMO, "--points", "11", "--from", "1 Gyr", "--to", "11 Gyr", "--spacing", spacing];
        records(&result(words)).1.iter().map(|row| row[0].parse().expect("a number")).collect()
    };
    let linear = times("linear");
    assert!(linear.iter().enumerate().all(|(index, time_yr)| (time_yr - 1e9 * (index as f64 + 1.0)).abs() < 1e-3));
    let log = times("log");
    let ratios: Vec<f64> = log.windows(2).map(|pair| pair[1] / pair[0]).collect();
    assert!(ratios.iter().all(|ratio| (ratio / ratios[0] - 1.0).abs() < 1e-9), "{ratios:?}");
    let paced = times("paced");
    assert!(paced != linear && paced != log);
    for times in [linear, log, paced] {
        assert_eq!((times[0], times[10]), (1e9, 11e9));
    }
}

#[test]
fn the_ends_may_be_events() {
    let words =
        ["table", DEMO, "--from", "event:main_sequence_end", "--to", "event:white dwarf is born", "--points", "5"];
    let (header, rows) = records(&result(words));
    assert!(rows.iter().take(4).all(|row| !row[column(&header, "phase")].contains("main_sequence")), "{rows:?}");
}

#[test]
fn a_long_table_is_whole() {
    let (_, rows) = records(&result(["table", "demo:eccentric_orbit", "--points", "20000", "--spacing", "log"]));
    assert_eq!(rows.len(), 20000);
}

#[test]
fn names_that_fold_together_keep_columns_of_their_own() {
    let scenario = edited_demo("\"Marrowick\"", "\"TALUNE!\"");
    let finished = run_with_input(["table", "-", "--points", "2"], scenario.as_bytes());
    assert_eq!(finished.code, 0, "{}", finished.messages);
    let (header, _) = records(&finished.results);
    assert_eq!(header.iter().collect::<HashSet<_>>().len(), header.len());
    column(&header, "talune_state");
    column(&header, "talune_2_state");
}

#[test]
fn the_enhanced_form_describes_every_column_once() {
    let text = result(["table", DEMO, "--points", "3", "--format", "ecsv"]);
    assert!(text.starts_with("# %ECSV 1.0\n# ---\n"), "{text}");
    let described: Vec<&str> = text
        .lines()
        .filter_map(|line| line.strip_prefix("# - {name: \""))
        .filter_map(|rest| rest.split('"').next())
        .collect();
    let body = text.lines().filter(|line| !line.starts_with('#')).collect::<Vec<_>>().join("\n");
    let (header, rows) = records(&body);
    assert_eq!(described, header);
    assert_eq!(rows.len(), 3);
    assert!(text.contains("{name: \"luminosity_lsun\", unit: \"solLum\", datatype: float64"), "{text}");
}

#[test]
fn tables_that_cannot_be_are_refused_with_what_can() {
    for points in ["0", "1", "100001"] {
        let message = refusal(["table", DEMO, "--points", points], 3);
        assert!(message.contains(points) && message.contains("2 to 100000"), "{message}");
    }
    let message = refusal(["table", DEMO, "--from", "5 Gyr", "--to", "4 Gyr"], 3);
    assert!(message.contains("5000000000 yr to 4000000000 yr"), "{message}");
    let message = refusal(["table", DEMO, "--from", "0", "--spacing", "log"], 3);
    assert!(message.contains("logarithmic"), "{message}");
    let message = refusal(["table", DEMO, "--from", "-1 Gyr"], 3);
    assert!(message.contains("--from") && message.contains("0 to 100000000000000 yr"), "{message}");
    let message = refusal(["table", DEMO, "--to", "event:nothing"], 3);
    assert!(message.contains("--to") && message.contains("largest radius"), "{message}");
    let dense = [
        "table",
        DEMO,
        "--from",
        "9.9e13 yr",
        "--to",
        "99000000000002 yr",
        "--points",
        "100000",
        "--spacing",
        "linear",
    ];
    assert!(refusal(dense, 3).contains("share a time"));
}

#[test]
fn nodes_are_the_moments_that_the_life_was_computed_at() {
    let words = ["table", DEMO, "--spacing", "nodes", "--from", "1 Gyr", "--to", "13 Gyr"];
    let (_, rows) = records(&result(words));
    let times: Vec<f64> = rows.iter().map(|row| row[0].parse().expect("a number")).collect();
    assert!(times.len() > 50 && times.windows(2).all(|pair| pair[0] < pair[1]), "{}", times.len());
    assert_eq!((times[0], times[times.len() - 1]), (1e9, 13e9));
    // The end of the main sequence is a node of every life, to the last bit.
    let events = json(["events", DEMO, "--format", "json"]);
    let events = events["events"].as_array().expect("events");
    let end = events.iter().find(|event| event["event"] == "main_sequence_end").expect("an end");
    assert!(times.contains(&end["time_yr"].as_f64().expect("a number")));
    assert!(refusal([&words[..], &["--points", "5"]].concat(), 2).contains("nodes"));
}

#[test]
fn columns_are_chosen_in_the_order_asked_for() {
    let words = ["table", DEMO, "--points", "3", "--columns", "talune_state,time_yr,notes"];
    let (header, rows) = records(&result(words));
    assert_eq!(header, ["talune_state", "time_yr", "notes"]);
    assert!(rows.iter().all(|row| row.len() == 3 && !row[2].contains("cindrel")));
    let whole = records(&result(["table", DEMO, "--points", "3"]));
    let state = column(&whole.0, "talune_state");
    assert!(rows.iter().zip(&whole.1).all(|(row, whole)| row[0] == whole[state] && row[1] == whole[0]));
    let message = refusal(["table", DEMO, "--columns", "luminosity"], 3);
    assert!(message.contains("luminosity_lsun"), "{message}");
    assert!(refusal(["table", DEMO, "--columns", "time_yr,time_yr"], 3).contains("twice"));
}

#[test]
fn headers_name_scenario_program_and_methods() {
    let text = result(["table", DEMO, "--points", "2", "--format", "ecsv", "--columns", "time_yr,luminosity_lsun"]);
    for words in ["Five worlds of a star like the Sun", "Longember ", "Hurley, Pols & Tout 2000", "Bédard"] {
        assert!(text.lines().any(|line| line.starts_with("# ") && line.contains(words)), "{words}: {text}");
    }
    assert!(!text.contains("Bucholtz"), "no column of a sky, no method of skies");
    let table = json(["table", DEMO, "--points", "2", "--format", "json"]);
    assert!(table["program"].as_str().is_some_and(|program| program.starts_with("Longember ")));
    assert!(table["methods"].as_array().is_some_and(|methods| methods.len() > 10));
}

#[test]
fn no_name_becomes_a_formula_of_a_spreadsheet() {
    for name in ["=cmd|' /C calc'!A0", "+1+1", "@SUM(A1)", "-2+3", "../../x", "a, b = c"] {
        let scenario = edited_demo("\"Talune\"", &format!("{name:?}"));
        for words in [&["table", "-", "--points", "2"][..], &["events", "-", "--format", "csv"]] {
            let finished = run_with_input(words, scenario.as_bytes());
            assert_eq!(finished.code, 0, "{}", finished.messages);
            let (header, rows) = records(&finished.results);
            for cell in header.iter().chain(rows.iter().flatten()) {
                let is_number = cell.parse::<f64>().is_ok();
                assert!(is_number || !cell.starts_with(['=', '+', '-', '@']), "{cell}");
            }
        }
    }
}
