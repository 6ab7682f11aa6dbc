//! What stands there when the window opens.

use crate::driver::Driver;
use longember::document::built_in;
use longember::system::{Body, TimeScale};
use longember::window::Page;

#[test]
fn the_demo_stands_there_at_its_present() {
    let driver = Driver::demo();
    let workspace = driver.workspace();
    let demo = built_in::demo().scenario().expect("sound");
    assert_eq!(*workspace.scenario(), demo);
    assert!(!workspace.session.is_dirty() && workspace.notice.is_none());
    assert_eq!((workspace.page, workspace.selected, workspace.scale), (Page::Curves, Body::Star, TimeScale::Paced));
    assert_eq!(driver.assert_one_instant(), demo.system.star.present_age_yr);
    for planet in &demo.system.planets {
        driver.name_of(&format!("{}, ", planet.name));
    }
    assert!(driver.shows(&demo.title) && driver.has("Nothing to undo") && driver.has("Nothing to redo"));
}

#[test]
fn every_built_in_scenario_opens_and_every_page_of_it_draws() {
    let mut driver = Driver::demo();
    for built_in in built_in::all() {
        let scenario = built_in.scenario().expect("sound");
        driver.click("Scenario");
        driver.click("Built-in scenarios");
        driver.click(&scenario.title);
        assert_eq!(*driver.workspace().scenario(), scenario);
        assert_eq!(driver.workspace().trouble, None, "{}", built_in.name);
        assert_eq!(driver.assert_one_instant(), scenario.system.star.present_age_yr, "{}", built_in.name);
        for page in Page::ALL {
            driver.click(page.name());
            assert_eq!(driver.workspace().page, page);
        }
        driver.click(Page::Curves.name());
    }
}
