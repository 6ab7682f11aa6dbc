//! `--help`, `--version`, and the words that choose between window and sub-command.

use crate::program::{command, names_in, refusal, result, run};
use std::path::Path;

const COMMANDS: [&str; 9] = ["state", "star", "table", "events", "figure", "sheet", "frames", "demo", "sources"];

fn command_in(folder: &Path) -> std::process::Command {
    let mut command = command();
    command.current_dir(folder);
    command
}

#[test]
fn the_version_is_named() {
    for word in ["--version", "-V"] {
        let text = result([word]);
        assert!(text.starts_with(concat!("longember ", env!("CARGO_PKG_VERSION"))), "{text}");
        assert_eq!(text.lines().count(), 1);
    }
}

#[test]
fn help_lists_every_sub_command_and_the_exit_codes() {
    let text = result(["--help"]);
    for command in COMMANDS {
        assert!(text.lines().any(|line| line.trim_start().starts_with(command)), "{command}");
    }
    assert!(text.contains("Exit codes") && text.contains("[SCENARIO]"));
    assert!(text.lines().all(|line| line.chars().count() <= 80));
}

#[test]
fn the_example_of_each_sub_command_works_as_it_stands() {
    for command in COMMANDS {
        let help = result([command, "--help"]);
        let example = help.split("Example:\n").nth(1).unwrap_or_else(|| panic!("{command} shows no example: {help}"));
        let words: Vec<&str> = example.split_whitespace().collect();
        assert_eq!(words[..2], ["longember", command]);
        // Some write a file or a folder where they stand.
        let folder = tempfile::tempdir().expect("a folder");
        let output = command_in(folder.path()).args(&words[1..]).output().expect("the program runs");
        assert_eq!(output.status.code(), Some(0), "{example}");
        assert!(!output.stdout.is_empty() || !names_in(folder.path()).is_empty(), "{example}");
    }
}

#[test]
fn there_are_no_sub_commands_but_those() {
    for word in ["movie", "export"] {
        assert_eq!(run([word, "demo:sunlike_five_worlds"]).code, 2, "{word}");
        let message = refusal([word], 4);
        assert!(message.contains(word) && message.contains("sub-command"), "{message}");
    }
}

#[test]
fn the_window_is_refused_what_it_could_not_open() {
    assert!(refusal(["no_such_file.ron"], 4).contains("no_such_file.ron"));
    assert!(refusal(["-"], 2).contains("standard input"));
}
