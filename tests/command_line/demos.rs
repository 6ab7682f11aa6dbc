//! `demo` and `sources`.

use crate::program::{json, names_in, refusal, result, run_with_input};
use std::fs;

fn names() -> Vec<String> {
    result(["demo"]).lines().filter_map(|line| line.split_whitespace().next()).map(str::to_owned).collect()
}

#[test]
fn every_built_in_scenario_is_listed_with_a_line_and_works() {
    let list = result(["demo"]);
    assert!(list.lines().count() >= 6, "{list}");
    for line in list.lines() {
        assert!(line.split_whitespace().count() > 2 && line.chars().count() <= 80, "{line}");
    }
    for name in names() {
        let state = json(["state", &format!("demo:{name}"), "--at", "now", "--format", "json"]);
        assert!(state["star"]["mass_msun"].as_f64().is_some(), "{name}");
    }
}

#[test]
fn a_demo_written_out_is_the_same_scenario() {
    for name in names() {
        let text = result(["demo", &name]);
        let piped = run_with_input(["events", "-", "--format", "json"], text.as_bytes());
        assert_eq!((piped.code, piped.messages.as_str()), (0, ""));
        assert_eq!(piped.results, result(["events", &format!("demo:{name}"), "--format", "json"]));
    }
}

#[test]
fn a_demo_becomes_a_file() {
    let folder = tempfile::tempdir().expect("a folder");
    let path = folder.path().join("mine.ron");
    let file = path.to_str().expect("UTF-8");
    assert_eq!(result(["demo", "eccentric_orbit", "--out", file]), "");
    assert_eq!(fs::read_to_string(&path).expect("written"), result(["demo", "eccentric_orbit"]));
    assert_eq!(names_in(folder.path()), ["mine.ron"]);
    json(["state", file, "--at", "now", "--format", "json"]);
}

#[test]
fn an_unknown_demo_brings_the_known_ones() {
    for words in [vec!["demo", "nosuch"], vec!["state", "demo:nosuch", "--at", "now"], vec!["demo:nosuch"]] {
        let message = refusal(words, 3);
        assert!(message.contains("nosuch") && message.contains("sunlike_five_worlds"), "{message}");
    }
}

#[test]
fn every_source_is_told_in_both_forms() {
    let methods = json(["sources", "--format", "json"]);
    let methods = methods["methods"].as_array().expect("methods").clone();
    let page = result(["sources"]);
    assert!(methods.len() > 10 && page.lines().all(|line| line.chars().count() <= 80));
    for method in &methods {
        for key in ["method", "name", "relation", "source", "valid_for", "accuracy"] {
            assert!(method[key].as_str().is_some_and(|text| !text.is_empty()), "{method}");
        }
        assert!(page.contains(method["name"].as_str().expect("a name")));
    }
}
