//! `check`: verdicts, sentences and exit codes.

use crate::program::{DEMO, refusal, run, run_with_input};
use serde_json::Value;

fn check(lines: &[&str]) -> (i32, Value) {
    let mut words = vec!["check", DEMO, "--format", "json"];
    words.extend(lines.iter().flat_map(|line| ["--statement", *line]));
    let finished = run(words);
    assert_eq!(finished.messages, "");
    (finished.code, serde_json::from_str(&finished.results).expect("JSON"))
}

#[test]
fn the_exit_code_says_whether_one_fails() {
    let (code, found) =
        check(&["star luminosity at now is about 1.0 Lsun", "star radius at now is at least 0.95 Rsun"]);
    assert_eq!(code, 0, "{found}");
    assert_eq!((found["holds"].as_u64(), found["does_not_hold"].as_u64()), (Some(1), Some(0)), "{found}");
    let (code, found) = check(&["star luminosity at now is about 1 Lsun", "star luminosity at now is about 3 Lsun"]);
    assert_eq!(code, 1);
    assert_eq!(found["statements"][1]["verdict"], "does_not_hold");
    let factor = found["statements"][1]["factor"].as_f64().expect("a number");
    assert!((factor - 1.0 / 3.0).abs() < 0.02, "{factor}");
    // The model's value is the one that `state` tells.
    let state = crate::program::json(["state", DEMO, "--at", "now", "--format", "json"]);
    assert_eq!(found["statements"][0]["value"], state["star"]["luminosity_lsun"]);
    let (code, found) = check(&["Cindrel surface temperature at 1 Tyr is about 300 K"]);
    assert_eq!((code, found["statements"][0]["verdict"].as_str()), (1, Some("not_judged")), "{found}");
}

#[test]
fn the_demo_has_claims_that_fail_and_the_page_fits_a_terminal() {
    let finished = run(["check", DEMO]);
    assert_eq!((finished.code, finished.messages.as_str()), (1, ""));
    assert!(finished.results.lines().all(|line| line.chars().count() <= 80), "{}", finished.results);
    for words in ["holds", "does not hold", "Model: ", "Stated is ", "Method: ", "Remark: ", "statements: "] {
        assert!(finished.results.contains(words), "{words}: {}", finished.results);
    }
    let without = run(["check"]);
    assert_eq!(without.results, finished.results, "the demo stands in where none is named");
}

#[test]
fn what_is_no_statement_is_refused_with_its_column() {
    let message = refusal(["check", DEMO, "--statement", "star lumosity at now is 1 Lsun"], 3);
    assert!(message.contains("column 6") && message.contains("did you mean luminosity?"), "{message}");
    let message = refusal(["check", DEMO, "--statement", "Talun radius at now is 1 Rearth"], 3);
    assert!(message.contains("did you mean Talune?"), "{message}");
    let message = refusal(["check", "demo:eccentric_orbit"], 3);
    assert!(message.contains("--statement"), "{message}");
}

#[test]
fn a_file_with_a_bad_line_is_refused_with_line_and_column() {
    let scenario = "(version: 1, title: \"T\", star: (name: \"A\", mass_msun: 1, metallicity_dex: 0, present_age_yr: 1e9),\n\
        statements: [(claim: \"star luminosity at now is about 1 Lsun\"), (claim: \"star weight at now is 1 kg\")])";
    let finished = run_with_input(["check", "-"], scenario.as_bytes());
    assert_eq!((finished.code, finished.results.as_str()), (3, ""));
    let message = &finished.messages;
    assert!(message.contains("statement 2: column 6") && message.contains("(standard input:2:"), "{message}");
}
