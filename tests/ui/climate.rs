//! The page of one planet's climate.

use crate::driver::Driver;
use egui::vec2;
use longember::system::Body;
use longember::window::Page;

/// The words of the one picture that begin like this.
fn picture(driver: &Driver, start: &str) -> String {
    let all = driver.everything();
    let found: Vec<&str> = all
        .lines()
        .filter_map(|line| line.strip_prefix("Image "))
        .filter(|words| words.trim_start_matches('"').starts_with(start))
        .collect();
    assert_eq!(found.len(), 1, "{start} among {all}");
    found[0].trim_matches('"').to_owned()
}

const BY_LATITUDE: &str = "Surface temperature of Talune by latitude: ";

#[test]
fn a_climate_is_shown_by_latitude_and_between_its_thresholds() {
    let mut driver = Driver::demo();
    driver.click("Talune, temperate");
    driver.click(Page::Climate.name());
    let climate = driver.workspace().history.climate_at(2, driver.workspace().moment_yr).expect("a planet");
    assert!(climate.latitudes.is_ok() && climate.thresholds.is_some());
    let at_first = picture(&driver, BY_LATITUDE);
    assert!(at_first.contains("K at the equator") && at_first.contains("ice"), "{at_first}");
    let thresholds = picture(&driver, "Starlight on Talune: ");
    assert!(thresholds.contains("freezes below") && thresholds.ends_with("now it is temperate"), "{thresholds}");
    driver.the("Moment on the starlight, years");
    assert!(driver.shows("Talune: temperate, mean "));
}

#[test]
fn another_planet_is_chosen_on_the_page_and_says_why_it_has_no_latitudes() {
    let mut driver = Driver::demo();
    driver.click(Page::Climate.name());
    assert!(driver.has("Climate of Talune"));
    picture(&driver, BY_LATITUDE);
    driver.click("Climate of Cindrel");
    assert_eq!(driver.workspace().selected, Body::Planet(0));
    assert!(driver.shows("No climate by latitude. Its greenhouse is held"));
    for name in ["Talune", "Ostavar"] {
        driver.click(&format!("Climate of {name}"));
        assert!(driver.shows(&format!("{name}: ")));
    }
}

#[test]
fn the_page_follows_the_moment_and_fits_small_and_large_windows() {
    for size in [vec2(960.0, 600.0), vec2(1280.0, 800.0), vec2(1600.0, 1000.0)] {
        let scenario = longember::document::built_in::demo().scenario().expect("sound");
        let mut driver = Driver::sized(scenario, size, 1.0);
        driver.click(Page::Climate.name());
        let now = picture(&driver, BY_LATITUDE);
        driver.reach("Moment on the starlight, years");
        let place = driver.the("Moment on the starlight, years").rect();
        driver.click_at(place.left_center() + vec2(70.0, 0.0));
        let then_yr = driver.panel_time_yr();
        assert!(then_yr < 4.5e9, "{then_yr}");
        assert_ne!(picture(&driver, BY_LATITUDE), now, "another moment, another climate");
    }
}
