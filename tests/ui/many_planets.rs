//! A full system is edited live: no frame computes a history, the old curves stay, dimmed, until the new ones are there.

use crate::driver::Driver;
use longember::document::{Scenario, built_in};
use longember::system::{PlanetSpecification, Water};
use longember::window::{Command, Edit};
use std::sync::Arc;

/// Twenty planets with seas, from scorched to frozen.
fn twenty_worlds() -> Scenario {
    let mut scenario = built_in::demo().scenario().expect("the demo is sound");
    let planet = |index: i32| PlanetSpecification {
        name: format!("World {index}"),
        semi_major_axis_au: 0.3 * 1.25_f64.powi(index),
        water: Some(Water::default()),
        ..PlanetSpecification::default()
    };
    scenario.system.planets = (0..20).map(planet).collect();
    scenario
}

/// The edit that a field of a planet makes.
fn edit(driver: &Driver, mass_mearth: f64) -> Command {
    let mut scenario = driver.workspace().scenario().clone();
    scenario.system.planets[7].mass_mearth = mass_mearth;
    Command::Edit(Edit { label: "Change Mass of World 7".to_owned(), scenario: Box::new(scenario) })
}

#[test]
fn no_frame_computes_the_history_of_twenty_planets() {
    let mut driver = Driver::of(twenty_worlds());
    let fresh = driver.opaque_lines();
    assert!(fresh > 0);
    for step in 0..25 {
        let shown = Arc::clone(&driver.workspace().history);
        let (context, command) = (driver.harness.ctx.clone(), edit(&driver, 1.01 + 0.01 * f64::from(step)));
        driver.harness.state_mut().perform(&context, command);
        // What the edit asks for is left to another thread: the window still shows what it showed.
        assert!(Arc::ptr_eq(&driver.workspace().history, &shown) && driver.workspace().is_stale());
        driver.harness.step();
        let workspace = driver.workspace();
        if workspace.is_stale() {
            assert!(driver.opaque_lines() < fresh, "the old curves are dimmed");
        } else {
            assert!(!Arc::ptr_eq(&workspace.history, &shown));
        }
    }
    driver.settle();
    let workspace = driver.workspace();
    assert_eq!(workspace.history.system().planets[7].mass_mearth, 1.25, "the last edit wins");
    assert_eq!(workspace.history.planets().len(), 20);
    assert_eq!(driver.opaque_lines(), fresh);
}
