//! The page of cues: rows, the show clock that moves the one moment, warnings.

use crate::driver::{CTRL, Driver};
use egui::{Key, Modifiers};
use longember::document::Scenario;
use longember::system::MomentRequest;
use longember::system::cues::{Schedule, Transition};

fn page() -> Driver {
    let mut driver = Driver::of(Scenario::new_untitled());
    driver.click("Cues");
    driver
}

#[test]
fn the_moment_shown_becomes_a_cue() {
    let mut driver = page();
    assert!(driver.shows("No cue yet"));
    driver.click("Add the moment shown");
    driver.press(Modifiers::NONE, Key::End);
    driver.click("Add the moment shown");
    let end_yr = driver.workspace().history.shown_until_yr();
    let cues = driver.workspace().scenario().cues.clone();
    assert_eq!((cues[0].show_time_s, cues[1].show_time_s), (0.0, 10.0));
    assert_eq!(
        (cues[0].moment.clone(), cues[1].moment.clone()),
        (MomentRequest::Time(4.57e9), MomentRequest::Time(end_yr))
    );
    driver.press(CTRL, Key::Z);
    assert_eq!(driver.workspace().scenario().cues.len(), 1);
}

#[test]
fn rows_are_edited_and_stand_in_the_order_of_the_show() {
    let mut driver = page();
    driver.click("Add the moment shown");
    driver.click("Add the moment shown");
    driver.enter("Moment of cue 2", "event 'largest radius'");
    driver.enter("Note of cue 2", "music starts");
    driver.click("Transition of cue 2");
    driver.click("steady in log time");
    driver.enter("Show time of cue 1", "1:02.50");
    let cues = driver.workspace().scenario().cues.clone();
    assert_eq!((cues[0].show_time_s, cues[1].show_time_s), (10.0, 62.5));
    assert_eq!((cues[0].transition, cues[0].note.as_str()), (Transition::SteadyLog, "music starts"));
    assert_eq!(cues[0].moment, MomentRequest::Event("largest radius".to_owned()));
    driver.enter("Moment of cue 1", "event 'picnic'");
    assert!(driver.shows("does not happen here"));
    assert_eq!(driver.workspace().scenario().cues[0].moment, cues[0].moment);
    driver.type_over("Moment of cue 1", "");
    driver.press(Modifiers::NONE, Key::Escape);
    driver.click("Remove cue 1");
    assert_eq!(driver.workspace().scenario().cues.len(), 1);
}

#[test]
fn the_preview_keeps_time_and_moves_the_one_moment() {
    let mut driver = Driver::demo();
    driver.click("Cues");
    let workspace = driver.workspace();
    let schedule = Schedule::new(&workspace.scenario().cues, &workspace.history).expect("a show");
    driver.the("Play the show").click();
    driver.harness.run_steps(4);
    let before_s = driver.number("Show time, seconds");
    driver.harness.run_steps(40);
    let after_s = driver.number("Show time, seconds");
    // Forty frames of a twentieth of a second each.
    assert!((after_s - before_s - 2.0).abs() < 0.11, "{before_s} {after_s}");
    driver.click("Pause the show");
    let clock_s = driver.number("Show time, seconds");
    let moment_yr = driver.workspace().moment_yr;
    assert!((moment_yr - schedule.time_yr(clock_s)).abs() <= 1e-6 * moment_yr, "{moment_yr} at {clock_s}");
    assert!(moment_yr > 0.0 && moment_yr < 4.6e9);
    driver.click("Go to the moment of cue 4");
    let spent = schedule.stops()[3].time_yr;
    assert_eq!(driver.workspace().moment_yr, spent);
}

#[test]
fn cuts_and_flashes_are_told() {
    let mut driver = Driver::demo();
    driver.click("Cues");
    assert!(driver.shows("a cut; the star is"));
    assert!(!driver.shows("seizures"));
    let mut scenario = Scenario::new_untitled();
    for index in 0..30 {
        let moment =
            if index % 2 == 0 { MomentRequest::Now } else { MomentRequest::Event("largest radius".to_owned()) };
        let show_time_s = f64::from(index) / 10.0;
        scenario.cues.push(longember::system::cues::Cue {
            show_time_s,
            moment,
            transition: Transition::Cut,
            note: String::new(),
        });
    }
    let mut driver = Driver::of(scenario);
    driver.click("Cues");
    assert!(driver.shows("seizures"));
}
