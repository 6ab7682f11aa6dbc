//! The list of planets: add, copy, move, remove.

use crate::driver::Driver;
use egui_kittest::kittest::NodeT;
use longember::system::limits::MOST_PLANETS;
use longember::system::{Body, Carbon, EventGroup, Water};

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
    assert!(driver.has("Semi-major axis of Talune"));
    driver.click("Talune, temperate");
    assert_eq!(driver.workspace().selected, Body::Star);
    assert!(!driver.has("Semi-major axis of Talune"));
}

#[test]
fn seas_are_chosen_and_answer_to_the_star() {
    let mut driver = Driver::demo();
    driver.click("Ostavar, frozen");
    let water = |driver: &Driver| driver.workspace().scenario().system.planets[3].water;
    assert_eq!(water(&driver), None);
    driver.click("Surface");
    driver.click("seas answer to star");
    assert_eq!(water(&driver), Some(Water::default()));
    driver.enter("Held mean of Ostavar", "15 °C");
    assert_eq!(water(&driver).map(|water| water.carbon), Some(Carbon::Regulated { mean_k: 288.15 }));
    driver.click("CO₂ is set by");
    driver.click("held fixed");
    driver.enter("CO₂ of Ostavar", "300 mbar");
    let held = water(&driver).map(|water| water.carbon);
    assert!(matches!(held, Some(Carbon::Held { carbon_dioxide_bar }) if (carbon_dioxide_bar - 0.3).abs() < 1e-12));
    driver.enter("CO₂ of Ostavar", "100");
    assert!(driver.shows("allowed: 0.0001 to 3 bar"), "100 bar is refused with the range");
    assert_eq!(water(&driver).map(|water| water.carbon), held);
    driver.click("More");
    driver.enter("Axial tilt of Ostavar", "60");
    assert_eq!(water(&driver).map(|water| water.obliquity_deg), Some(60.0));
    let history = std::sync::Arc::clone(&driver.workspace().history);
    assert_eq!(*history.system(), driver.workspace().scenario().system);
    assert!(history.planet_at(3, 1e9).is_some_and(|planet| planet.ice_fraction == Some(1.0)));
    driver.name_of("Ice cover: ");
    driver.assert_one_instant();
}

#[test]
fn the_chronicle_is_filtered_by_kind_and_tells_mild_windows() {
    let mut driver = Driver::demo();
    driver.click("Chronicle");
    let rows = |driver: &Driver, of: &str| {
        driver.names().into_iter().filter(|name| !name.contains(" · ") && name.contains(of)).count()
    };
    let all = rows(&driver, "leaves the habitable zone");
    assert!(all > 0);
    driver.click("habitable zone");
    assert_eq!(driver.workspace().hidden_events, [EventGroup::Zone]);
    assert_eq!(rows(&driver, "leaves the habitable zone"), 0);
    assert!(rows(&driver, "runaway greenhouse begins") > 0);
    driver.click("habitable zone");
    assert_eq!(rows(&driver, "leaves the habitable zone"), all);
    let thaw = driver.names().into_iter().find(|name| !name.contains(" · ") && name.ends_with("Frimholt: thaws"));
    assert!(thaw.as_ref().is_some_and(|name| name.contains("between ")), "never one bare date: {thaw:?}");
    assert!(driver.shows("Windows of mild climate") && driver.shows("Talune: "));
}

fn plan_in_words(driver: &Driver) -> String {
    let everything = driver.everything();
    everything.lines().find(|line| line.contains("Plan of the orbits. ")).map(str::to_owned).expect("it is described")
}

#[test]
fn the_plan_of_orbits_shows_each_planet_and_what_became_of_the_lost() {
    let mut driver = Driver::demo();
    driver.click("Orbits");
    let plan = plan_in_words(&driver);
    for name in names(&driver) {
        assert!(plan.contains(&name), "{plan}");
    }
    driver.click("logarithmic");
    driver.press(egui::Modifiers::NONE, egui::Key::End);
    let plan = plan_in_words(&driver);
    assert!(plan.contains("Cindrel: engulfed") && plan.contains("Ostavar: frozen"), "{plan}");
    assert_eq!(driver.workspace().moment_yr, driver.workspace().history.shown_until_yr());
}
