//! Wrong words, wrong values, wrong files: told apart by exit code, told in a sentence.

use crate::program::{DEMO, edited_demo, refusal, run, run_with_input};
use std::fs;

#[test]
fn wrong_usage_is_2() {
    for words in [
        vec!["state"],
        vec!["state", DEMO],
        vec!["state", DEMO, "--at", "now", "--format", "xml"],
        vec!["state", DEMO, "--at", "now", "--colour"],
        vec!["state", DEMO, "extra", "--at", "now"],
        vec!["star", "--at", "1 Gyr"],
        vec!["star", "--mass", "heavy", "--at", "1 Gyr"],
        vec!["star", "--mass", "1,2", "--at", "1 Gyr"],
        vec!["star", "--mass", "--at", "1 Gyr"],
        vec!["table", DEMO, "--points", "many"],
        vec!["table", DEMO, "--points", "2.5"],
        vec!["table", DEMO, "--points", "-3"],
        vec!["table", DEMO, "--spacing", "random"],
        vec!["events", DEMO, "--format", "ecsv"],
        vec!["sources", "--format", "csv"],
        vec!["--nonsense"],
        vec![DEMO, "state"],
        vec!["a.ron", "b.ron"],
    ] {
        let finished = run(&words);
        assert_eq!((finished.code, finished.results.as_str()), (2, ""), "{words:?}: {}", finished.messages);
        assert!(finished.messages.starts_with("error: ") && !finished.messages.contains("panicked"), "{words:?}");
    }
}

#[test]
fn a_star_that_cannot_be_computed_is_refused_in_the_words_of_its_own_module() {
    let message = refusal(["star", "--mass", "0.05", "--at", "1 Gyr"], 3);
    assert!(message.contains("0.05") && message.contains("brown dwarf"), "{message}");
    for mass in ["0", "-1", "1e9", "nan", "inf", "-inf"] {
        let message = refusal(["star", "--mass", mass, "--at", "1 Gyr"], 3);
        assert!(message.contains("mass") && message.contains("100"), "{mass}: {message}");
    }
    for metallicity in ["0.5", "-3", "nan"] {
        let message = refusal(["star", "--mass", "1", "--metallicity", metallicity, "--at", "1 Gyr"], 3);
        assert!(message.contains("metallicity") && message.contains("-2 to 0.2"), "{message}");
    }
}

#[test]
fn a_file_that_is_not_there_is_4() {
    for command in ["events", "table"] {
        let message = refusal([command, "no/such/file.ron"], 4);
        assert!(message.contains("no/such/file.ron") && message.contains("check the name"), "{message}");
    }
    let folder = tempfile::tempdir().expect("a folder");
    refusal(["events", folder.path().to_str().expect("UTF-8")], 4);
}

#[test]
fn every_broken_number_is_3_and_has_its_place() {
    for broken in ["NaN", "inf", "1e999", "-1", "0", "1.0.0", "0x10", "\"1\"", "1,5", "()"] {
        let scenario = edited_demo("mass_msun: 1,", &format!("mass_msun: {broken},"));
        let finished = run_with_input(["state", "-", "--at", "now"], scenario.as_bytes());
        assert_eq!((finished.code, finished.results.as_str()), (3, ""), "{broken}: {}", finished.messages);
        assert!(finished.messages.contains("(standard input:"), "{broken}: {}", finished.messages);
    }
}

#[test]
fn every_problem_of_a_scenario_is_told_at_once() {
    let scenario = edited_demo("mass_msun: 1,", "mass_msun: -1,").replacen("bond_albedo: 0.1,", "bond_albedo: 1.4,", 1);
    let folder = tempfile::tempdir().expect("a folder");
    let path = folder.path().join("two faults.ron");
    fs::write(&path, scenario).expect("written");
    let finished = run(["events", path.to_str().expect("UTF-8")]);
    assert_eq!((finished.code, finished.results.as_str()), (3, ""));
    let lines: Vec<&str> = finished.messages.lines().collect();
    assert_eq!(lines.len(), 2, "{lines:?}");
    assert!(
        lines[0].contains("mass_msun is -1") && lines[1].contains("bond_albedo is 1.4, allowed 0 to 1"),
        "{lines:?}"
    );
    assert!(lines.iter().all(|line| line.contains("two faults.ron:")), "{lines:?}");
}

#[test]
fn what_is_no_scenario_is_3() {
    let deep = "(".repeat(100_000);
    for text in [&b""[..], b"hello", b"{}", b"\xff\xfe\x00", b"(", b"Longember(version: 99)", deep.as_bytes()] {
        let finished = run_with_input(["events", "-"], text);
        assert_eq!((finished.code, finished.results.as_str()), (3, ""), "{}", finished.messages);
        assert!(!finished.messages.contains("panicked"), "{}", finished.messages);
    }
    let huge = vec![b' '; 5 << 20];
    let finished = run_with_input(["events", "-"], &huge);
    assert_eq!(finished.code, 3, "{}", finished.messages);
    assert!(finished.messages.contains("allowed at most"), "{}", finished.messages);
}

#[cfg(unix)]
#[test]
fn words_that_are_not_unicode_are_no_panic() {
    use std::ffi::OsString;
    use std::os::unix::ffi::OsStringExt;
    let odd = || OsString::from_vec(b"caf\xe9.ron".to_vec());
    assert_eq!(run([OsString::from("events"), odd()]).code, 4);
    assert_eq!(run([odd()]).code, 4);
    let finished = run([OsString::from("state"), OsString::from(DEMO), OsString::from("--at"), odd()]);
    assert_eq!(finished.code, 2, "{}", finished.messages);
    let folder = tempfile::tempdir().expect("a folder");
    let mut path = folder.path().as_os_str().to_owned();
    path.push("/");
    path.push(odd());
    assert_eq!(run(["events".into(), DEMO.into(), "--out".into(), path.clone()]).code, 0);
    assert!(fs::read_to_string(path).expect("written").contains("largest radius"));
}
