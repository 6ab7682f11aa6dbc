//! Every scenario that comes with the program: sound, in the form that saving gives it, and listed.

#![expect(clippy::expect_used, reason = "a test that cannot go on has failed")]

mod fates;
mod red_dwarfs;
mod shows;
mod statements;

use longember::document::{built_in, parse_scenario_text, scenario_text, sound_text};
use std::collections::HashSet;
use std::fs;
use std::path::{Path, PathBuf};

fn scenario_files() -> Vec<PathBuf> {
    let entries = fs::read_dir(built_in_folder()).into_iter().flatten().filter_map(Result::ok);
    let mut files: Vec<_> = entries
        .map(|entry| entry.path())
        .filter(|path| path.extension().is_some_and(|extension| extension == "ron"))
        .collect();
    files.sort();
    files
}

fn built_in_folder() -> PathBuf {
    Path::new(env!("CARGO_MANIFEST_DIR")).join("scenarios")
}

#[test]
fn every_built_in_is_sound() {
    for built_in in built_in::all() {
        let problems: Vec<_> =
            built_in.scenario().err().into_iter().flatten().map(|problem| problem.to_string()).collect();
        assert_eq!(problems, Vec::<String>::new(), "{}", built_in.name);
    }
}

#[test]
fn every_file_is_a_built_in_of_its_name() {
    let in_folder: Vec<_> =
        scenario_files().iter().map(|path| path.file_stem().expect("a name").to_string_lossy().into_owned()).collect();
    let mut listed: Vec<_> = built_in::all().iter().map(|built_in| built_in.name.to_owned()).collect();
    listed.sort();
    assert_eq!(in_folder, listed);
    assert!(listed.len() >= 7);
    for built_in in built_in::all() {
        assert_eq!(built_in::find(built_in.name), Some(built_in));
    }
    assert_eq!(built_in::find("no_such_scenario"), None);
    assert_eq!(built_in::demo().name, "sunlike_five_worlds");
}

#[test]
fn every_file_is_as_saving_would_write_it() {
    for path in scenario_files() {
        let text = fs::read_to_string(&path).expect("readable");
        let read = parse_scenario_text(&text, "file").expect("sound");
        assert_eq!(read.inner_comments, 0, "{}", path.display());
        assert_eq!(sound_text(&read.scenario, &read.header).expect("sound"), text, "{}", path.display());
        assert!(scenario_text(&read.scenario).lines().all(|line| line.chars().count() <= 100), "{}", path.display());
    }
}

#[test]
fn every_built_in_says_what_to_look_for_and_shares_no_name() {
    let mut names = HashSet::new();
    for built_in in built_in::all() {
        let scenario = built_in.scenario().expect("sound");
        assert!(scenario.about.chars().count() > 200, "{}", built_in.name);
        assert!(scenario.about.contains("Look ") || scenario.about.contains("Follow "), "{}", built_in.name);
        assert!(names.insert(scenario.title.clone()), "{}", built_in.name);
        assert!(names.insert(scenario.system.star.name.clone()), "{}", built_in.name);
        for planet in &scenario.system.planets {
            assert!(names.insert(planet.name.clone()), "{}: {}", built_in.name, planet.name);
            assert!(scenario.about.contains(&planet.name), "{}: {}", built_in.name, planet.name);
        }
    }
}

#[test]
fn the_reference_names_every_key_and_its_examples_hold() {
    let reference = fs::read_to_string(built_in_folder().join("README.md")).expect("the reference");
    for limit in longember::system::limits::ALL {
        let row = reference
            .lines()
            .find(|line| line.starts_with("| `") && line.contains(&format!("`{}`", limit.key)))
            .unwrap_or_else(|| panic!("{} has no row", limit.key));
        assert!(row.contains(&limit.allowed()), "{}: {} is not in {row}", limit.key, limit.allowed());
    }
    let blocks: Vec<_> = reference.split("```").collect();
    let examples: Vec<_> = blocks.iter().filter_map(|block| block.strip_prefix("ron\n")).collect();
    assert!(!examples.is_empty());
    for example in examples {
        let problems: Vec<_> = parse_scenario_text(example, "example.ron")
            .err()
            .into_iter()
            .flatten()
            .map(|problem| problem.to_string())
            .collect();
        assert_eq!(problems, Vec::<String>::new(), "{example}");
    }
    let faulty: Vec<_> = blocks.iter().filter_map(|block| block.strip_prefix("text\n")).collect();
    let [wrong, messages] = faulty[..] else { panic!("a faulty example and its messages") };
    let problems = parse_scenario_text(wrong, "scenario.ron").expect_err("faulty");
    let lines: Vec<_> = problems.iter().map(ToString::to_string).collect();
    assert_eq!(lines.join("\n"), messages.trim_end());
}
