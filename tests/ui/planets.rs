//! The list of planets: add, copy, move, remove.

use crate::driver::Driver;
use egui_kittest::kittest::NodeT;
use longember::system::Body;
use longember::system::limits::MOST_PLANETS;

fn names(driver: &Driver) -> Vec<String> {
    driver.workspace().scenario().system.planets.iter().map(|planet| planet.name.clone()).collect()
}

#[test]
fn a_planet_is_added_copied_moved_and_removed() {
    let mut driver = Driver::demo();
    let at_first = names(&driver);
    driver.click("Add planet");
    let added = names(&driver).last().cloned().expect("one more");
    assert_eq!((names(&driver).len(), driver.workspace().selected), (6, Body::Planet(5)));
    assert!(!at_first.contains(&added));
    driver.name_of(&format!("{added}, "));
    driver.click(&format!("Move {added} up"));
    assert_eq!((names(&driver)[4].as_str(), driver.workspace().selected), (added.as_str(), Body::Planet(4)));
    driver.click(&format!("Move {added} down"));
    assert_eq!(names(&driver)[5], added);
    driver.click(&format!("Copy {added}"));
    let planets = &driver.workspace().scenario().system.planets;
    assert_eq!((planets.len(), driver.workspace().selected), (7, Body::Planet(6)));
    assert!(planets[6].name != planets[5].name && planets[6].semi_major_axis_au == planets[5].semi_major_axis_au);
    let copy = planets[6].name.clone();
    driver.click(&format!("Remove {copy}"));
    driver.click(&driver.name_of(&format!("{added}, ")));
    driver.click(&format!("Remove {added}"));
    assert_eq!((names(&driver), driver.workspace().selected), (at_first, Body::Star));
    assert_eq!(driver.workspace().history.planets().len(), 5);
}

#[test]
fn an_empty_system_invites_to_add_a_planet() {
    let mut driver = Driver::demo();
    for name in names(&driver) {
        driver.click(&driver.name_of(&format!("{name}, ")));
        driver.click(&format!("Remove {name}"));
    }
    assert!(names(&driver).is_empty() && driver.shows("Add one"));
    driver.assert_one_instant();
    driver.click("Add planet");
    assert_eq!(names(&driver).len(), 1);
    driver.assert_one_instant();
}

#[test]
fn a_full_system_takes_no_more() {
    let mut driver = Driver::demo();
    while names(&driver).len() < MOST_PLANETS {
        let before = names(&driver).len();
        driver.the("Add planet").scroll_to_me();
        driver.settle();
        driver.click("Add planet");
        assert_eq!(names(&driver).len(), before + 1);
    }
    assert!(driver.the("Add planet").accesskit_node().is_disabled());
    driver.the("Add planet").scroll_to_me();
    driver.settle();
    driver.click("Add planet");
    assert_eq!(names(&driver).len(), MOST_PLANETS);
}

#[test]
fn a_second_click_on_a_row_turns_back_to_the_star() {
    let mut driver = Driver::demo();
    driver.click("Talune, temperate");
    assert_eq!(driver.workspace().selected, Body::Planet(2));
    assert!(driver.has("Bond albedo of Talune"));
    driver.click("Talune, temperate");
    assert_eq!(driver.workspace().selected, Body::Star);
    assert!(!driver.has("Bond albedo of Talune"));
}
