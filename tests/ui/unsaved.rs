//! Unsaved work is never dropped unasked.

use crate::driver::{CTRL, Driver};
use egui::{Event, Key, ViewportCommand, ViewportEvent, ViewportId};
use longember::document::read_scenario;

const DISCARD: &str = "Discard changes";

fn edited() -> Driver {
    let mut driver = Driver::demo();
    driver.enter("Mass of Veldane", "1.2");
    driver
}

/// What the window asked of the desktop in the last frame.
fn asked_of_desktop(driver: &Driver) -> Vec<ViewportCommand> {
    driver.harness.output().viewport_output[&ViewportId::ROOT].commands.clone()
}

#[test]
fn new_asks_first_and_each_answer_is_kept() {
    let mut driver = edited();
    driver.press(CTRL, Key::N);
    assert!(driver.has("Save") && driver.has(DISCARD));
    assert_eq!(driver.workspace().scenario().system.star.mass_msun, 1.2);
    driver.click("Cancel");
    assert!(!driver.has(DISCARD));
    assert_eq!(driver.workspace().scenario().system.star.mass_msun, 1.2);
    driver.press(CTRL, Key::N);
    driver.press(egui::Modifiers::NONE, Key::Escape);
    assert!(!driver.has(DISCARD) && driver.workspace().session.is_dirty());
    driver.press(CTRL, Key::N);
    driver.click(DISCARD);
    assert!(!driver.workspace().session.is_dirty());
    assert_ne!(driver.workspace().scenario().system.star.name, "Veldane");
    driver.assert_one_instant();
}

#[test]
fn save_then_new_writes_the_file_first() {
    let folder = tempfile::tempdir().expect("a folder");
    let path = folder.path().join("kept.ron");
    let mut driver = edited();
    driver.press(CTRL, Key::N);
    driver.click("Save");
    driver.enter("Path of the file", path.to_str().expect("UTF-8"));
    assert_eq!(read_scenario(&path).expect("sound").system.star.mass_msun, 1.2);
    assert_ne!(driver.workspace().scenario().system.star.name, "Veldane", "the new one is open");
    assert_eq!(driver.workspace().session.path(), None);
}

#[test]
fn without_changes_nothing_is_asked() {
    let mut driver = Driver::demo();
    driver.press(CTRL, Key::N);
    assert!(!driver.has(DISCARD));
    assert_ne!(driver.workspace().scenario().system.star.name, "Veldane");
}

#[test]
fn closing_the_window_waits_for_an_answer() {
    let mut driver = edited();
    let viewport = driver.harness.input_mut().viewports.entry(ViewportId::ROOT).or_default();
    viewport.events.push(ViewportEvent::Close);
    driver.harness.step();
    assert!(asked_of_desktop(&driver).contains(&ViewportCommand::CancelClose));
    driver.settle();
    assert!(driver.has(DISCARD));
    driver.the(DISCARD).click();
    let mut closes = false;
    for _ in 0..8 {
        driver.harness.step();
        closes |= asked_of_desktop(&driver).contains(&ViewportCommand::Close);
    }
    assert!(closes, "discarding closes the window");
}

#[test]
fn quit_closes_at_once_when_everything_is_saved() {
    let mut driver = Driver::demo();
    driver.harness.event(Event::Key { key: Key::Q, physical_key: None, pressed: true, repeat: false, modifiers: CTRL });
    driver.harness.step();
    assert!(asked_of_desktop(&driver).contains(&ViewportCommand::Close) && !driver.has(DISCARD));
    let mut driver = edited();
    driver.press(CTRL, Key::Q);
    assert!(driver.has(DISCARD));
}

#[test]
fn a_demo_from_the_menu_asks_too() {
    let mut driver = edited();
    driver.click("Introduction");
    let scenario = longember::document::built_in::find("eccentric_orbit").expect("built in").scenario().expect("sound");
    driver.the(&scenario.title).scroll_to_me();
    driver.settle();
    driver.click(&scenario.title);
    assert!(driver.has(DISCARD));
    driver.click(DISCARD);
    assert_eq!(*driver.workspace().scenario(), scenario);
}
