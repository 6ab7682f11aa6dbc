//! Files appear whole or not at all and are never replaced unasked.

use crate::program::{DEMO, command, names_in, refusal, result};
use std::fs;
use std::process::Stdio;

#[test]
fn an_existing_file_is_replaced_only_with_force() {
    let folder = tempfile::tempdir().expect("a folder");
    let path = folder.path().join("events.txt");
    let file = path.to_str().expect("UTF-8");
    fs::write(&path, "precious").expect("written");
    for words in [
        vec!["events", DEMO, "--out", file],
        vec!["table", DEMO, "--out", file],
        vec!["demo", "eccentric_orbit", "--out", file],
    ] {
        let message = refusal(words, 4);
        assert!(message.contains(file) && message.contains("--force"), "{message}");
    }
    assert_eq!(fs::read_to_string(&path).expect("there"), "precious");
    assert_eq!(result(["events", DEMO, "--out", file, "--force"]), "");
    assert_eq!(fs::read_to_string(&path).expect("there"), result(["events", DEMO]));
    assert_eq!(names_in(folder.path()), ["events.txt"]);
}

#[test]
fn the_extension_decides_where_no_format_is_named() {
    let folder = tempfile::tempdir().expect("a folder");
    let written = |command: &str, name: &str, more: &[&str]| {
        let path = folder.path().join(name);
        let words = [command, DEMO, "--out", path.to_str().expect("UTF-8")];
        assert_eq!(result(words.iter().chain(more)), "");
        fs::read_to_string(path).expect("written")
    };
    assert_eq!(written("events", "e.json", &[]), result(["events", DEMO, "--format", "json"]));
    assert_eq!(written("events", "e.CSV", &[]), result(["events", DEMO, "--format", "csv"]));
    assert_eq!(written("events", "e.csv", &["--format", "text"]), result(["events", DEMO]));
    assert!(written("table", "t.ecsv", &["--points", "2"]).starts_with("# %ECSV"));
    assert!(written("table", "t.json", &["--points", "2"]).starts_with('{'));
    assert!(written("table", "t.dat", &["--points", "2"]).starts_with("time_yr,phase,"));
}

#[test]
fn a_file_that_cannot_be_is_named_and_leaves_nothing() {
    let folder = tempfile::tempdir().expect("a folder");
    let missing = folder.path().join("no/such/folder/t.csv");
    let message = refusal(["table", DEMO, "--points", "2", "--out", missing.to_str().expect("UTF-8")], 4);
    assert!(message.contains("t.csv") && message.contains("folder"), "{message}");
    refusal(["table", DEMO, "--out", folder.path().to_str().expect("UTF-8"), "--force"], 4);
    // A refused value leaves no file either.
    let path = folder.path().join("t.csv");
    refusal(["table", DEMO, "--points", "1", "--out", path.to_str().expect("UTF-8")], 3);
    assert!(names_in(folder.path()).is_empty());
}

#[test]
fn options_that_need_another_one_say_so() {
    assert!(refusal(["events", DEMO, "--force"], 2).contains("--out"));
    assert!(refusal(["demo", "--out", "x.ron"], 2).contains("NAME"));
}

#[test]
fn a_reader_that_stops_listening_is_no_trouble() {
    let mut child = command()
        .args(["table", DEMO, "--points", "5000"])
        .stdin(Stdio::null())
        .stdout(Stdio::piped())
        .stderr(Stdio::piped())
        .spawn()
        .expect("starts");
    drop(child.stdout.take());
    let output = child.wait_with_output().expect("ends");
    assert_eq!((output.status.code(), output.stderr.as_slice()), (Some(0), b"".as_slice()));
}

#[cfg(target_os = "linux")]
#[test]
fn a_full_disk_is_told() {
    for words in [vec!["sources"], vec!["table", DEMO], vec!["--help"], vec!["demo"]] {
        let full = fs::OpenOptions::new().write(true).open("/dev/full").expect("there on Linux");
        let output = command().args(&words).stdin(Stdio::null()).stdout(full).output().expect("runs");
        let message = String::from_utf8(output.stderr).expect("UTF-8");
        assert_eq!(output.status.code(), Some(4), "{words:?}: {message}");
        assert!(message.contains("standard output") && !message.contains("panicked"), "{message}");
    }
}
