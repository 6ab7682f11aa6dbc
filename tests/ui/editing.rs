//! Editing star and planets: what is typed, what is refused, what follows.

use crate::driver::{CTRL, Driver};
use egui::{Key, Modifiers};
use longember::physics::planet::{Greenhouse, Redistribution};
use longember::system::Body;

#[test]
fn a_new_mass_of_the_star_changes_its_life() {
    let mut driver = Driver::demo();
    let before = driver.workspace().history.moment(4.6e9).star;
    let spent_yr = driver.workspace().history.shown_until_yr();
    driver.enter("Mass of Veldane", "1.2");
    let workspace = driver.workspace();
    assert_eq!(workspace.scenario().system.star.mass_msun, 1.2);
    assert_eq!(workspace.history.system().star.mass_msun, 1.2);
    assert!(workspace.session.is_dirty() && workspace.moment_yr == 4.6e9);
    let after = workspace.moment().star;
    assert!(after.luminosity_lsun > before.luminosity_lsun && after.mass_msun > 1.19, "{after:?}");
    assert!(workspace.history.shown_until_yr() != spent_yr);
    driver.assert_one_instant();
    assert!(driver.shows("unsaved"));
}

#[test]
fn values_are_taken_with_their_units() {
    let mut driver = Driver::demo();
    for (field, text, read) in [
        ("Mass of Veldane", "2.4e30 kg", 2.4e30 / 1.988_416e30),
        ("Mass of Veldane", "1.1 Msun", 1.1),
        ("Metallicity of Veldane", "-0.25", -0.25),
        ("Present age of Veldane", "2 billion years", 2e9),
    ] {
        driver.enter(field, text);
        let star = &driver.workspace().scenario().system.star;
        let now = [star.mass_msun, star.metallicity_dex, star.present_age_yr];
        assert!(now.iter().any(|value| (value / read - 1.0).abs() < 1e-4), "{text}: {now:?}");
        assert!(!driver.shows("is not understood"), "{text}");
    }
}

#[test]
fn a_new_albedo_changes_the_planet_s_temperature() {
    let mut driver = Driver::demo();
    driver.click("Ostavar, frozen");
    assert_eq!(driver.workspace().selected, Body::Planet(3));
    let temperature_k =
        |driver: &Driver| driver.workspace().moment().planets[3].surface_temperature_k.expect("it orbits");
    let before_k = temperature_k(&driver);
    let row = driver.name_of("Surface: ");
    driver.enter("Bond albedo of Ostavar", "0.9");
    assert_eq!(driver.workspace().scenario().system.planets[3].bond_albedo, 0.9);
    assert!(temperature_k(&driver) < before_k - 50.0, "{} from {before_k}", temperature_k(&driver));
    assert_ne!(driver.name_of("Surface: "), row);
    driver.name_of("Ostavar, frozen");
}

#[test]
fn what_is_out_of_range_stays_with_the_reason_and_the_model_keeps_its_value() {
    let mut driver = Driver::demo();
    driver.click("Ostavar, frozen");
    for (field, text, reason) in [
        ("Bond albedo of Ostavar", "1.4", "allowed: 0 to 1"),
        ("Eccentricity of Ostavar", "1", "allowed: 0 to 0.99"),
        ("Mass of Veldane", "1000", "allowed: "),
        ("Mass of Veldane", "heavy", "is not understood"),
        ("Semi-major axis of Ostavar", "", "type a number"),
        ("Radius of Ostavar", "nan", "is not understood"),
    ] {
        let scenario = driver.workspace().scenario().clone();
        let value = driver.text_in(field);
        driver.enter(field, &value);
        let outlines = driver.outlines(field);
        assert!(!driver.shows(reason));
        driver.enter(field, text);
        assert_eq!(driver.text_in(field), text);
        assert!(driver.shows(reason), "{field} {text}:\n{}", driver.everything());
        assert!(driver.outlines(field).iter().any(|colour| !outlines.contains(colour)), "{field} is not outlined");
        assert_eq!(*driver.workspace().scenario(), scenario);
        assert!(!driver.workspace().session.is_dirty());
        driver.click(field);
        driver.press(Modifiers::NONE, Key::Escape);
        assert_eq!(driver.text_in(field), value, "Escape brings the value back");
        assert!(!driver.shows(reason));
    }
}

#[test]
fn a_refused_value_can_be_put_right() {
    let mut driver = Driver::demo();
    driver.enter("Mass of Veldane", "1000");
    driver.enter("Mass of Veldane", "2");
    assert!(!driver.shows("allowed: "));
    assert_eq!(driver.workspace().scenario().system.star.mass_msun, 2.0);
}

#[test]
fn names_and_title_can_be_changed() {
    let mut driver = Driver::demo();
    driver.enter("Name of the star", "Ashwin's Lamp");
    assert_eq!(driver.workspace().scenario().system.star.name, "Ashwin's Lamp");
    assert!(driver.has("Mass of Ashwin's Lamp"));
    driver.click("Talune, temperate");
    driver.enter("Name of the planet", "Third");
    driver.name_of("Third, temperate");
    driver.enter("Title of the scenario", "Another title");
    assert_eq!(driver.workspace().scenario().title, "Another title");
    driver.enter("Title of the scenario", "   ");
    assert_eq!(driver.workspace().scenario().title, "Another title", "a title is never empty");
    driver.enter("Name of the planet", "Ostavar");
    let names: Vec<&str> =
        driver.workspace().scenario().system.planets.iter().map(|planet| planet.name.as_str()).collect();
    assert_eq!(names.iter().filter(|name| **name == "Ostavar").count(), 1, "{names:?}");
}

#[test]
fn greenhouse_and_redistribution_are_chosen_from_lists() {
    let mut driver = Driver::demo();
    driver.click("Ostavar, frozen");
    let planet = |driver: &Driver| driver.workspace().scenario().system.planets[3].clone();
    driver.click("Greenhouse");
    driver.click(Greenhouse::Grey { optical_depth: 1.0 }.name());
    assert!(matches!(planet(&driver).greenhouse, Greenhouse::Grey { .. }));
    driver.enter("Optical depth of Ostavar", "3");
    assert_eq!(planet(&driver).greenhouse, Greenhouse::Grey { optical_depth: 3.0 });
    driver.click("Greenhouse");
    driver.click(Greenhouse::None.name());
    assert_eq!(planet(&driver).greenhouse, Greenhouse::None);
    assert!(!driver.has("Optical depth of Ostavar"));
    driver.click("More");
    driver.click("Redistribution");
    driver.click(Redistribution::SubStellar.name());
    assert_eq!(planet(&driver).redistribution, Redistribution::SubStellar);
    assert_eq!(*driver.workspace().history.system(), driver.workspace().scenario().system);
}

#[test]
fn arrows_in_a_field_change_its_value_in_one_step_of_undo() {
    let mut driver = Driver::demo();
    driver.the("Mass of Veldane").click();
    driver.harness.run_steps(3);
    for _ in 0..3 {
        driver.harness.key_press(Key::ArrowUp);
        driver.harness.run_steps(2);
    }
    driver.settle();
    let mass_msun = driver.workspace().scenario().system.star.mass_msun;
    assert!((mass_msun - 1.03).abs() < 1e-9, "{mass_msun}");
    assert_eq!(driver.text_in("Mass of Veldane"), "1.03");
    driver.harness.key_press_modifiers(Modifiers::SHIFT, Key::ArrowDown);
    driver.settle();
    assert!(driver.workspace().scenario().system.star.mass_msun < mass_msun);
    driver.press(Modifiers::NONE, Key::Enter);
    driver.press(CTRL, Key::Z);
    assert_eq!(driver.workspace().scenario().system.star.mass_msun, 1.0);
}

#[test]
fn a_drag_on_the_name_of_a_field_is_one_step_of_undo() {
    let mut driver = Driver::demo();
    let field = driver.the("Mass of Veldane").rect();
    let name = egui::pos2(30.0, field.center().y);
    driver.drag(name, &[name + egui::vec2(20.0, 0.0), name + egui::vec2(40.0, 0.0), name + egui::vec2(80.0, 0.0)]);
    assert!(driver.workspace().scenario().system.star.mass_msun > 1.1);
    driver.press(CTRL, Key::Z);
    assert_eq!(driver.workspace().scenario().system.star.mass_msun, 1.0);
}
