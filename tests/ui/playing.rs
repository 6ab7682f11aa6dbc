//! Playing a life.

use crate::driver::Driver;
use egui::{Key, Modifiers};

/// Plays some frames and tells how far the moment went.
fn frames(driver: &mut Driver, count: usize) -> f64 {
    let before_yr = driver.workspace().moment_yr;
    driver.harness.run_steps(count);
    driver.workspace().moment_yr - before_yr
}

#[test]
fn space_plays_and_space_pauses() {
    let mut driver = Driver::demo();
    assert_eq!(frames(&mut driver, 10), 0.0);
    driver.harness.key_press(Key::Space);
    driver.harness.run_steps(1);
    assert!(driver.workspace().playback.is_running && driver.has("Pause (Space)"));
    assert!(frames(&mut driver, 10) > 0.0);
    driver.assert_one_instant();
    driver.harness.key_press(Key::Space);
    driver.harness.run_steps(1);
    assert!(!driver.workspace().playback.is_running && driver.has("Play (Space)"));
    assert_eq!(frames(&mut driver, 10), 0.0);
}

#[test]
fn the_button_plays_to_the_end_and_then_begins_anew() {
    let mut driver = Driver::demo();
    driver.click("Speed of play");
    driver.click("life in 15 s");
    assert_eq!(driver.workspace().playback.life_seconds, 15.0);
    driver.the("Play (Space)").click();
    driver.harness.run_steps(6);
    let mut count = 0;
    while driver.workspace().playback.is_running {
        assert!(frames(&mut driver, 1) >= 0.0, "time does not run back");
        count += 1;
        assert!(count < 2000, "no end after {count} frames of 50 ms");
    }
    assert!(count > 100, "the most of a life of 15 seconds took {count} frames of 50 ms");
    assert_eq!(driver.assert_one_instant(), driver.workspace().history.shown_until_yr());
    driver.harness.key_press_modifiers(Modifiers::NONE, Key::Space);
    driver.harness.run_steps(8);
    assert!(driver.workspace().playback.is_running);
    assert!(driver.workspace().moment_yr < 0.5 * driver.workspace().history.shown_until_yr());
}

#[test]
fn a_faster_pace_goes_farther() {
    let mut way_yr = [0.0; 2];
    for (way_yr, pace) in way_yr.iter_mut().zip(["life in 5 min", "life in 30 s"]) {
        let mut driver = Driver::demo();
        driver.click("Speed of play");
        driver.click(pace);
        driver.harness.key_press(Key::Space);
        *way_yr = frames(&mut driver, 12);
    }
    assert!(way_yr[1] > 5.0 * way_yr[0] && way_yr[0] > 0.0, "{way_yr:?}");
}
