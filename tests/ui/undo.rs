//! Taking edits back and doing them again, by key, button and menu.

use crate::driver::{CTRL, CTRL_SHIFT, Driver};
use egui::Key;

#[test]
fn keys_take_back_and_do_again() {
    let mut driver = Driver::demo();
    let demo = driver.workspace().scenario().clone();
    driver.enter("Mass of Veldane", "1.2");
    driver.click("Add planet");
    let edited = driver.workspace().scenario().clone();
    driver.press(CTRL, Key::Z);
    assert_eq!(driver.workspace().scenario().system.planets.len(), 5);
    assert_eq!(driver.workspace().scenario().system.star.mass_msun, 1.2);
    driver.press(CTRL, Key::Z);
    assert_eq!(*driver.workspace().scenario(), demo);
    assert_eq!(driver.workspace().history.system().star.mass_msun, 1.0);
    assert!(!driver.workspace().session.is_dirty(), "back at what was opened");
    driver.press(CTRL, Key::Z);
    assert_eq!(*driver.workspace().scenario(), demo, "there is nothing more to take back");
    driver.press(CTRL_SHIFT, Key::Z);
    driver.press(CTRL_SHIFT, Key::Z);
    assert_eq!(*driver.workspace().scenario(), edited);
    assert_eq!(driver.workspace().history.planets().len(), 6);
}

#[test]
fn the_button_says_what_it_will_take_back() {
    let mut driver = Driver::demo();
    driver.enter("Mass of Veldane", "1.2");
    driver.click("Undo: Change Mass of Veldane");
    assert_eq!(driver.workspace().scenario().system.star.mass_msun, 1.0);
    assert!(driver.has("Nothing to undo") && driver.shows("Undone: Change Mass of Veldane"));
    driver.click("Redo: Change Mass of Veldane");
    assert_eq!(driver.workspace().scenario().system.star.mass_msun, 1.2);
    assert!(driver.has("Nothing to redo"));
}

#[test]
fn the_menu_does_the_same() {
    let mut driver = Driver::demo();
    driver.click("Ostavar, frozen");
    driver.enter("Bond albedo of Ostavar", "0.5");
    driver.click("Edit");
    let items = driver.names();
    assert_eq!(
        items.iter().filter(|name| name.starts_with("Undo: Change Bond albedo of Ostavar")).count(),
        2,
        "{items:?}"
    );
    // In the menu the name carries its key, on the button it does not.
    let item =
        items.into_iter().find(|name| name.starts_with("Undo: ") && name.contains("Ctrl+Z")).expect("in the menu");
    driver.click(&item);
    assert_eq!(driver.workspace().scenario().system.planets[3].bond_albedo, 0.27);
}

#[test]
fn a_new_edit_forgets_what_was_taken_back() {
    let mut driver = Driver::demo();
    driver.enter("Mass of Veldane", "1.2");
    driver.press(CTRL, Key::Z);
    driver.enter("Mass of Veldane", "1.3");
    assert!(driver.has("Nothing to redo"));
    driver.press(CTRL, Key::Z);
    assert_eq!(driver.workspace().scenario().system.star.mass_msun, 1.0);
}

#[test]
fn an_edit_while_the_last_one_is_computed_wins() {
    let mut driver = Driver::demo();
    driver.type_over("Mass of Veldane", "1.5");
    driver.harness.key_press(Key::Enter);
    driver.harness.step();
    driver.type_over("Mass of Veldane", "0.9");
    driver.press(egui::Modifiers::NONE, Key::Enter);
    assert_eq!(driver.workspace().scenario().system.star.mass_msun, 0.9);
    assert_eq!(driver.workspace().history.system().star.mass_msun, 0.9);
}
