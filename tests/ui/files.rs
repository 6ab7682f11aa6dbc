//! Opening and saving: what is wrong is told with its place, and nothing is lost.

use crate::driver::{CTRL, CTRL_SHIFT, Driver};
use egui::{DroppedFile, Key};
use longember::document::{built_in, read_scenario, scenario_text, write_scenario};
use std::fs;
use std::path::{Path, PathBuf};
use std::sync::Arc;

const PATH: &str = "Path of the file";

/// Types a path into the dialog that a key opens.
fn type_path(driver: &mut Driver, modifiers: egui::Modifiers, key: Key, path: &Path) {
    driver.press(modifiers, key);
    driver.enter(PATH, path.to_str().expect("UTF-8"));
}

/// A file that was dropped on the window.
#[derive(Debug)]
struct Dropped(PathBuf);

impl DroppedFile for Dropped {
    fn path(&self) -> &Path {
        &self.0
    }

    fn bytes(&self) -> Result<Vec<u8>, String> {
        fs::read(&self.0).map_err(|error| error.to_string())
    }
}

#[test]
fn a_bad_file_tells_every_problem_and_the_old_scenario_stays() {
    let folder = tempfile::tempdir().expect("a folder");
    let path = folder.path().join("faulty.ron");
    let text = scenario_text(&built_in::demo().scenario().expect("sound"));
    let text =
        text.replacen("mass_msun: 1,", "mass_msun: -1,", 1).replacen("bond_albedo: 0.1,", "bond_albedo: 1.4,", 1);
    fs::write(&path, text.replacen("emissivity: 1,", "emisivity: 1,", 1)).expect("written");
    let mut driver = Driver::demo();
    driver.enter("Moment", "7 Gyr");
    let before = driver.workspace().scenario().clone();
    type_path(&mut driver, CTRL, Key::O, &path);
    assert!(driver.shows("faulty.ron could not be opened"));
    let problems = longember::document::Session::open(&path).expect_err("faulty").to_string();
    assert!(problems.lines().count() >= 3, "{problems}");
    for problem in problems.lines() {
        assert!(driver.shows(problem), "{problem} is not shown:\n{}", driver.everything());
        let place = problem.rsplit("faulty.ron:").next().expect("a place").trim_end_matches(')');
        let numbers: Vec<u32> = place.split(':').map(|number| number.parse().expect("a number")).collect();
        assert!(numbers.len() == 2 && numbers[0] > 3 && numbers[1] > 0, "{problem}");
    }
    driver.click("Close");
    assert!(!driver.shows("could not be opened"));
    assert_eq!(*driver.workspace().scenario(), before);
    assert_eq!(driver.assert_one_instant(), 7e9);
    assert!(driver.workspace().settings.recent_files().is_empty());
}

#[test]
fn a_file_that_is_not_there_is_named() {
    let mut driver = Driver::demo();
    type_path(&mut driver, CTRL, Key::O, Path::new("/no/such/place/ember.ron"));
    assert!(driver.shows("ember.ron could not be opened"));
    driver.press(egui::Modifiers::NONE, Key::Escape);
    assert!(!driver.shows("could not be opened"));
}

#[test]
fn a_good_file_opens_and_is_remembered() {
    let folder = tempfile::tempdir().expect("a folder");
    let path = folder.path().join("eccentric.ron");
    let scenario = built_in::find("eccentric_orbit").expect("built in").scenario().expect("sound");
    write_scenario(&path, &scenario).expect("written");
    let mut driver = Driver::demo();
    type_path(&mut driver, CTRL, Key::O, &path);
    assert_eq!(*driver.workspace().scenario(), scenario);
    assert_eq!(driver.workspace().session.path(), Some(path.as_path()));
    assert_eq!(driver.assert_one_instant(), scenario.system.star.present_age_yr);
    assert!(!driver.workspace().session.is_dirty());
    driver.press(CTRL, Key::N);
    assert_eq!(driver.workspace().session.path(), None);
    driver.click("Scenario");
    driver.click("Open recent");
    driver.click("eccentric.ron");
    assert_eq!(*driver.workspace().scenario(), scenario);
}

#[test]
fn a_file_dropped_on_the_window_opens() {
    let folder = tempfile::tempdir().expect("a folder");
    let path = folder.path().join("dropped.ron");
    let scenario = built_in::find("eccentric_orbit").expect("built in").scenario().expect("sound");
    write_scenario(&path, &scenario).expect("written");
    let mut driver = Driver::demo();
    driver.harness.input_mut().dropped_files.push(Arc::new(Dropped(path)));
    driver.settle();
    assert_eq!(*driver.workspace().scenario(), scenario);
}

#[test]
fn what_is_saved_is_read_back() {
    let folder = tempfile::tempdir().expect("a folder");
    let path = folder.path().join("mine.ron");
    let mut driver = Driver::demo();
    driver.enter("Mass of Veldane", "1.2");
    type_path(&mut driver, CTRL, Key::S, &path);
    assert!(!driver.workspace().session.is_dirty() && driver.shows("Saved ") && !driver.has(PATH));
    assert_eq!(read_scenario(&path).expect("sound"), *driver.workspace().scenario());
    driver.enter("Mass of Veldane", "1.4");
    assert!(driver.workspace().session.is_dirty());
    driver.press(CTRL, Key::S);
    assert!(!driver.has(PATH), "it has a place now");
    assert_eq!(read_scenario(&path).expect("sound").system.star.mass_msun, 1.4);
    let names: Vec<_> =
        fs::read_dir(folder.path()).expect("readable").map(|entry| entry.expect("one").file_name()).collect();
    assert_eq!(names, ["mine.ron"], "nothing else is left");
}

#[test]
fn save_as_writes_another_file_and_goes_on_there() {
    let folder = tempfile::tempdir().expect("a folder");
    let (first, second) = (folder.path().join("first.ron"), folder.path().join("second"));
    let mut driver = Driver::demo();
    type_path(&mut driver, CTRL_SHIFT, Key::S, &first);
    driver.enter("Mass of Veldane", "1.3");
    type_path(&mut driver, CTRL_SHIFT, Key::S, &second);
    let second = second.with_extension("ron");
    assert_eq!(driver.workspace().session.path(), Some(second.as_path()));
    assert_eq!(read_scenario(&first).expect("sound").system.star.mass_msun, 1.0);
    assert_eq!(read_scenario(&second).expect("sound").system.star.mass_msun, 1.3);
}

#[test]
fn replacing_a_file_is_said_before() {
    let folder = tempfile::tempdir().expect("a folder");
    let path = folder.path().join("there.ron");
    fs::write(&path, "precious").expect("written");
    let mut driver = Driver::demo();
    driver.press(CTRL_SHIFT, Key::S);
    assert!(!driver.shows("will be replaced"));
    driver.type_over(PATH, path.to_str().expect("UTF-8"));
    assert!(driver.shows("will be replaced"));
    driver.click("Cancel");
    assert_eq!(fs::read_to_string(&path).expect("there"), "precious");
}

#[test]
fn a_file_that_someone_else_changed_is_not_overwritten_unasked() {
    let folder = tempfile::tempdir().expect("a folder");
    let path = folder.path().join("shared.ron");
    let mut driver = Driver::demo();
    type_path(&mut driver, CTRL, Key::S, &path);
    let theirs = scenario_text(&built_in::find("eccentric_orbit").expect("built in").scenario().expect("sound"));
    fs::write(&path, &theirs).expect("written");
    driver.enter("Mass of Veldane", "1.2");
    driver.press(CTRL, Key::S);
    assert!(driver.workspace().notice.as_ref().is_some_and(|notice| notice.is_error));
    assert!(driver.has(PATH), "it asks for a place");
    driver.click("Cancel");
    assert_eq!(fs::read_to_string(&path).expect("there"), theirs);
    assert!(driver.workspace().session.is_dirty());
}

#[test]
fn a_place_that_cannot_be_written_is_said_and_nothing_is_lost() {
    let folder = tempfile::tempdir().expect("a folder");
    let mut driver = Driver::demo();
    driver.enter("Mass of Veldane", "1.2");
    type_path(&mut driver, CTRL, Key::S, &folder.path().join("no/such/folder/mine.ron"));
    let notice = driver.workspace().notice.clone().expect("said");
    assert!(notice.is_error && notice.text.contains("mine.ron"), "{notice:?}");
    assert!(driver.workspace().session.is_dirty());
    assert_eq!(driver.workspace().scenario().system.star.mass_msun, 1.2);
}
