//! `events`.

use crate::program::{DEMO, edited_demo, json, records, result, run_with_input};

#[test]
fn three_forms_tell_the_same_events() {
    let list = json(["events", DEMO, "--format", "json"]);
    let list = list["events"].as_array().expect("events");
    let (header, rows) = records(&result(["events", DEMO, "--format", "csv"]));
    assert_eq!(header[..5], ["time_yr", "body", "planet_index", "event", "description"]);
    assert_eq!(header[5..], ["group", "earliest_yr", "latest_yr", "caution", "method"]);
    assert_eq!(rows.len(), list.len());
    let page = result(["events", DEMO]);
    let mut before_yr = 0.0;
    for (row, event) in rows.iter().zip(list) {
        let time_yr: f64 = row[0].parse().expect("a number");
        assert_eq!(Some(time_yr), event["time_yr"].as_f64());
        assert!(time_yr >= before_yr, "oldest first");
        before_yr = time_yr;
        assert_eq!((event["body"].as_str(), event["event"].as_str()), (Some(row[1].as_str()), Some(row[3].as_str())));
        assert!(page.lines().any(|line| line.contains(&row[1]) && line.ends_with(&row[4])), "{row:?}");
    }
    assert!(page.lines().all(|line| line.chars().count() <= 80));
    let keys: Vec<&str> = rows.iter().map(|row| row[3].as_str()).collect();
    assert!(keys.contains(&"main_sequence_end") && keys.contains(&"engulfed"), "{keys:?}");
}

#[test]
fn events_can_be_chosen_by_body_and_kind() {
    let list = json(["events", DEMO, "--format", "json", "--body", "Talune", "--kind", "zone", "--kind", "climate"]);
    let list = list["events"].as_array().expect("events").clone();
    assert!(!list.is_empty());
    for event in &list {
        assert_eq!(event["body"], "Talune");
        assert!(event["group"] == "zone" || event["group"] == "climate", "{event}");
        let (time, earliest, latest) =
            (event["time_yr"].as_f64(), event["earliest_yr"].as_f64(), event["latest_yr"].as_f64());
        assert!(earliest.is_none() || earliest <= time, "{event}");
        assert!(latest.is_none() || latest >= time, "{event}");
    }
    assert!(list.iter().any(|event| event["group"] == "zone" && event["earliest_yr"].is_number()));
    let refused = run_with_input(["events", DEMO, "--body", "Talun"], b"");
    assert_eq!(refused.code, 3);
    assert!(refused.messages.contains("Talune") && refused.messages.contains("star"), "{}", refused.messages);
}

#[test]
fn a_name_with_commas_and_quotes_comes_back_whole() {
    let scenario = edited_demo("\"Cindrel\"", r#""Cindrel, the \"hot\" one""#);
    let finished = run_with_input(["events", "-", "--format", "csv"], scenario.as_bytes());
    assert_eq!(finished.code, 0, "{}", finished.messages);
    let (_, rows) = records(&finished.results);
    assert!(rows.iter().any(|row| row[1] == "Cindrel, the \"hot\" one" && row[3] == "engulfed" && row[2] == "0"));
}

#[test]
fn a_planet_named_star_is_told_apart_by_its_index() {
    let scenario = edited_demo("\"Cindrel\"", "\"star\"");
    let finished = run_with_input(["events", "-", "--format", "json"], scenario.as_bytes());
    let list: serde_json::Value = serde_json::from_str(&finished.results).expect("JSON");
    let engulfed = list["events"].as_array().expect("events").iter().find(|event| event["event"] == "engulfed");
    assert_eq!(engulfed.expect("happens")["planet_index"], 0);
}
