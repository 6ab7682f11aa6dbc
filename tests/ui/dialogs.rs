//! Keys, help and what this is.

use crate::driver::Driver;
use egui::{Key, Modifiers};
use longember::window::key_bindings;

#[test]
fn f1_lists_every_key() {
    let mut driver = Driver::demo();
    driver.press(Modifiers::NONE, Key::F1);
    let context = driver.harness.ctx.clone();
    for binding in key_bindings() {
        assert!(driver.shows(binding.words), "{}", binding.words);
        assert!(driver.shows(&context.format_shortcut(&binding.shortcut)), "{}", binding.words);
    }
    driver.press(Modifiers::NONE, Key::Home);
    assert_eq!(driver.workspace().moment_yr, 4.6e9, "keys wait while a dialog is open");
    driver.press(Modifiers::NONE, Key::Escape);
    assert!(!driver.shows("previous event"));
    driver.press(Modifiers::NONE, Key::Home);
    assert_eq!(driver.workspace().moment_yr, 0.0);
}

#[test]
fn help_opens_from_the_menu_too() {
    let mut driver = Driver::demo();
    driver.choose("Help", "All keys");
    assert!(driver.shows("previous event"));
    driver.click("Close");
    driver.choose("Help", "About Longember");
    assert!(driver.shows(concat!("Longember ", env!("CARGO_PKG_VERSION"))));
    driver.click("Close");
    assert!(!driver.has("Close"));
}

#[test]
fn no_two_keys_are_the_same_and_each_says_what_it_does() {
    let bindings = key_bindings();
    for (index, binding) in bindings.iter().enumerate() {
        assert!(!binding.words.is_empty());
        assert!(bindings[index + 1..].iter().all(|other| other.shortcut != binding.shortcut), "{}", binding.words);
    }
    assert!(bindings.len() > 20);
}
