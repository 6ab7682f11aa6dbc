//! Runs the real binary in an empty environment.

use serde_json::Value;
use std::ffi::OsStr;
use std::io::Write;
use std::path::Path;
use std::process::{Command, Stdio};
use std::sync::LazyLock;

/// The scenario most tests look at.
pub(crate) const DEMO: &str = "demo:sunlike_five_worlds";

/// What a run left behind.
#[derive(Debug)]
pub(crate) struct Finished {
    pub(crate) code: i32,
    pub(crate) results: String,
    pub(crate) messages: String,
}

/// A folder for lives computed before, shared by the tests of one run and empty at its start.
fn cache_folder() -> &'static Path {
    static FOLDER: LazyLock<tempfile::TempDir> = LazyLock::new(|| tempfile::tempdir().expect("a folder"));
    FOLDER.path()
}

/// The command with nothing inherited from whoever runs the tests.
pub(crate) fn command() -> Command {
    let mut command = Command::new(env!("CARGO_BIN_EXE_longember"));
    command.env_clear().env("LONGEMBER_CACHE_DIR", cache_folder());
    command
}

/// Runs to the end with the given words.
pub(crate) fn run<S: AsRef<OsStr>>(words: impl IntoIterator<Item = S>) -> Finished {
    run_with_input(words, b"")
}

/// Runs to the end with the given words and standard input.
pub(crate) fn run_with_input<S: AsRef<OsStr>>(words: impl IntoIterator<Item = S>, input: &[u8]) -> Finished {
    let mut child = command()
        .args(words)
        .stdin(Stdio::piped())
        .stdout(Stdio::piped())
        .stderr(Stdio::piped())
        .spawn()
        .expect("the program starts");
    let mut stdin = child.stdin.take().expect("a pipe");
    // A program that does not read its input may be gone before all of it is written.
    let _ = stdin.write_all(input);
    drop(stdin);
    let output = child.wait_with_output().expect("the program ends");
    Finished {
        code: output.status.code().expect("ended by itself"),
        results: String::from_utf8(output.stdout).expect("UTF-8"),
        messages: String::from_utf8(output.stderr).expect("UTF-8"),
    }
}

/// The result of words that must succeed without any message.
pub(crate) fn result<S: AsRef<OsStr>>(words: impl IntoIterator<Item = S>) -> String {
    let finished = run(words);
    assert_eq!((finished.code, finished.messages.as_str()), (0, ""));
    finished.results
}

/// The result as JSON.
pub(crate) fn json<S: AsRef<OsStr>>(words: impl IntoIterator<Item = S>) -> Value {
    serde_json::from_str(&result(words)).expect("JSON")
}

/// The one-line message of words that must fail with this code, writing no result.
pub(crate) fn refusal<S: AsRef<OsStr>>(words: impl IntoIterator<Item = S>, code: i32) -> String {
    let finished = run(words);
    assert_eq!((finished.code, finished.results.as_str()), (code, ""), "{}", finished.messages);
    assert!(finished.messages.starts_with("longember: ") && !finished.messages.contains("panicked"), "{finished:?}");
    assert_eq!(finished.messages.trim_end().lines().count(), 1, "{}", finished.messages);
    finished.messages
}

/// Header and records of comma-separated values.
pub(crate) fn records(text: &str) -> (Vec<String>, Vec<Vec<String>>) {
    let mut reader = csv::Reader::from_reader(text.as_bytes());
    let header = reader.headers().expect("a header").iter().map(str::to_owned).collect();
    let rows = reader
        .records()
        .map(|record| record.expect("as many fields as the header").iter().map(str::to_owned).collect())
        .collect();
    (header, rows)
}

/// The text of a built-in scenario with one piece replaced.
pub(crate) fn edited_demo(from: &str, to: &str) -> String {
    let text = result(["demo", "sunlike_five_worlds"]);
    assert!(text.contains(from), "{from} is not in the demo");
    text.replacen(from, to, 1)
}

/// The names of everything in a folder.
pub(crate) fn names_in(folder: &Path) -> Vec<String> {
    let mut names: Vec<String> = std::fs::read_dir(folder)
        .expect("readable")
        .map(|entry| entry.expect("an entry").file_name().to_string_lossy().into_owned())
        .collect();
    names.sort();
    names
}
