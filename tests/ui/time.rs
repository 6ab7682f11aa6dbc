//! One instant, everywhere: pointer and keys move it, and every view follows.

use crate::driver::{CHARTS, Driver, STRIP};
use egui::{Key, Modifiers, pos2};
use longember::system::TimeScale;

const NONE: Modifiers = Modifiers::NONE;

#[test]
fn dragging_on_the_strip_moves_the_moment_everywhere() {
    let mut driver = Driver::demo();
    let mut before_yr = driver.assert_one_instant();
    let from = driver.on_strip(0.2);
    for share in [0.35, 0.6, 0.9] {
        driver.drag(from, &[driver.on_strip(0.5 * (0.2 + share)), driver.on_strip(share)]);
        let moment_yr = driver.assert_one_instant();
        assert!(moment_yr > before_yr, "{moment_yr} after {before_yr}");
        before_yr = moment_yr;
    }
    driver.drag(from, &[driver.on_strip(-0.5)]);
    assert_eq!(driver.assert_one_instant(), 0.0, "beyond the left end there is birth");
}

#[test]
fn a_drag_is_followed_while_it_goes_on() {
    let mut driver = Driver::demo();
    driver.harness.hover_at(driver.on_strip(0.2));
    driver.harness.drag_at(driver.on_strip(0.2));
    let mut seen_yr = Vec::new();
    for share in [0.3, 0.4, 0.5] {
        driver.harness.hover_at(driver.on_strip(share));
        driver.settle();
        seen_yr.push(driver.assert_one_instant());
    }
    assert!(seen_yr.is_sorted_by(|first, second| first < second), "{seen_yr:?}");
}

#[test]
fn strip_and_charts_share_one_axis() {
    let mut driver = Driver::demo();
    driver.click_at(driver.on_strip(0.5));
    let on_strip_yr = driver.assert_one_instant();
    let charts = driver.the(CHARTS).rect();
    // Half of the plotting area, which has room for labels on its left.
    let mut least = f64::INFINITY;
    for x in (0..=charts.width() as i32).map(|step| charts.left() + step as f32) {
        driver.harness.hover_at(pos2(x, charts.center().y));
        driver.harness.drag_at(pos2(x, charts.center().y));
        driver.harness.drop_at(pos2(x, charts.center().y));
        driver.harness.step();
        least = least.min((driver.workspace().moment_yr / on_strip_yr - 1.0).abs());
    }
    driver.settle();
    driver.assert_one_instant();
    assert!(least < 1e-2, "no place on the charts is the middle of the strip: {least}");
}

#[test]
fn arrows_step_and_shift_steps_finely() {
    let mut driver = Driver::demo();
    let present_yr = driver.assert_one_instant();
    driver.press(NONE, Key::ArrowRight);
    let forward_yr = driver.assert_one_instant();
    driver.press(NONE, Key::ArrowLeft);
    assert!((driver.assert_one_instant() / present_yr - 1.0).abs() < 1e-9);
    driver.press(Modifiers::SHIFT, Key::ArrowRight);
    let finely_yr = driver.assert_one_instant();
    assert!(
        present_yr < finely_yr && finely_yr < present_yr + 0.3 * (forward_yr - present_yr),
        "{finely_yr} and {forward_yr} from {present_yr}"
    );
    driver.press(Modifiers::SHIFT, Key::ArrowLeft);
    driver.press(NONE, Key::ArrowLeft);
    assert!(driver.assert_one_instant() < present_yr);
}

#[test]
fn home_and_end_go_to_the_ends_and_n_to_the_present() {
    let mut driver = Driver::demo();
    let present_yr = driver.assert_one_instant();
    driver.press(NONE, Key::End);
    assert_eq!(driver.assert_one_instant(), driver.workspace().history.shown_until_yr());
    driver.press(NONE, Key::Home);
    assert_eq!(driver.assert_one_instant(), 0.0);
    driver.press(NONE, Key::ArrowLeft);
    assert_eq!(driver.assert_one_instant(), 0.0, "there is nothing before birth");
    driver.press(NONE, Key::N);
    assert_eq!(driver.assert_one_instant(), present_yr);
}

#[test]
fn page_keys_and_buttons_walk_through_every_event() {
    let mut driver = Driver::demo();
    let mut times_yr: Vec<f64> = driver.workspace().history.events().iter().map(|event| event.time_yr).collect();
    times_yr.dedup();
    assert!(times_yr.len() > 20 && times_yr[0] == 0.0);
    driver.press(NONE, Key::Home);
    for (index, time_yr) in times_yr.iter().enumerate().skip(1) {
        if index % 2 == 0 {
            driver.press(NONE, Key::PageDown);
        } else {
            driver.click("Next event (Page Down)");
        }
        assert_eq!(driver.assert_one_instant(), *time_yr);
    }
    driver.press(NONE, Key::PageDown);
    assert_eq!(driver.workspace().moment_yr, times_yr[times_yr.len() - 1], "after the last event there is none");
    for (index, time_yr) in times_yr.iter().enumerate().rev().skip(1) {
        if index % 2 == 0 {
            driver.press(NONE, Key::PageUp);
        } else {
            driver.click("Previous event (Page Up)");
        }
        assert_eq!(driver.workspace().moment_yr, *time_yr);
    }
}

#[test]
fn a_click_on_a_mark_goes_to_the_event() {
    let mut driver = Driver::demo();
    let events = driver.workspace().history.events().to_vec();
    let mark = driver.name_of_first("hydrogen in the core is spent");
    driver.click(&mark);
    let moment_yr = driver.assert_one_instant();
    let event = events.iter().find(|event| event.time_yr == moment_yr).expect("an event");
    assert!(mark.contains(&event.label(&driver.workspace().history)), "{mark}");
}

#[test]
fn the_panel_leads_to_what_comes_next() {
    let mut driver = Driver::demo();
    let next = driver.workspace().history.events().iter().find(|event| event.time_yr > 4.6e9).copied().expect("one");
    let link = driver.name_of_first(&format!("{} in ", next.label(&driver.workspace().history)));
    driver.click(&link);
    assert_eq!(driver.assert_one_instant(), next.time_yr);
}

#[test]
fn three_scales_lay_the_same_life_out_differently() {
    let mut driver = Driver::demo();
    let end_yr = driver.workspace().history.shown_until_yr();
    let mut middles_yr = Vec::new();
    for (scale, key) in TimeScale::ALL.into_iter().zip([Key::Num1, Key::Num2, Key::Num3]) {
        let before_yr = driver.workspace().moment_yr;
        driver.press(NONE, key);
        assert_eq!(driver.workspace().scale, scale);
        assert_eq!(driver.assert_one_instant(), before_yr, "a scale moves nothing");
        driver.click_at(driver.on_strip(0.5));
        middles_yr.push(driver.assert_one_instant());
    }
    let [paced_yr, log_yr, linear_yr] = middles_yr[..] else { unreachable!("three scales") };
    assert!((linear_yr / end_yr - 0.5).abs() < 2e-3, "{linear_yr} of {end_yr}");
    assert!(log_yr < 0.1 * linear_yr, "{log_yr}");
    assert!(log_yr < paced_yr && paced_yr < linear_yr, "{paced_yr}");
    for scale in TimeScale::ALL {
        driver.click(scale.key());
        assert_eq!(driver.workspace().scale, scale);
        assert_eq!(driver.workspace().settings.time_scale, scale.key());
    }
}

#[test]
fn the_wheel_zooms_about_the_pointer() {
    for (name, share) in [(STRIP, 0.3), (CHARTS, 0.6)] {
        let mut driver = Driver::demo();
        let rect = driver.the(name).rect();
        let place = pos2(rect.left() + share * rect.width(), rect.center().y + 10.0);
        driver.click_at(place);
        let moment_yr = driver.assert_one_instant();
        driver.wheel(place, 400.0);
        let near = driver.workspace().view;
        assert!(near.width() < 0.3, "{name}: {near:?}");
        driver.click_at(place);
        let there_yr = driver.assert_one_instant();
        assert!((there_yr / moment_yr - 1.0).abs() < 1e-3, "{name}: {there_yr} was {moment_yr}");
        driver.wheel(place, -200.0);
        assert!(driver.workspace().view.width() > 1.5 * near.width());
        driver.wheel(place, -4000.0);
        assert_eq!(driver.workspace().view.width(), 1.0);
    }
}

#[test]
fn the_whole_life_comes_back_by_key_button_and_double_click() {
    let mut driver = Driver::demo();
    let zoom = |driver: &mut Driver| {
        driver.press(NONE, Key::Plus);
        driver.press(NONE, Key::Plus);
        assert!(driver.workspace().view.width() < 0.5);
        assert_eq!(driver.assert_one_instant(), 4.6e9, "zooming moves nothing");
    };
    zoom(&mut driver);
    driver.press(NONE, Key::Num0);
    assert_eq!(driver.workspace().view.width(), 1.0);
    zoom(&mut driver);
    driver.click("Whole life");
    assert_eq!(driver.workspace().view.width(), 1.0);
    driver.press(NONE, Key::Plus);
    driver.press(NONE, Key::Minus);
    assert!(driver.workspace().view.width() > 0.999);
    driver.press(NONE, Key::Plus);
    let place = driver.on_strip(0.4);
    for _ in 0..2 {
        driver.harness.hover_at(place);
        driver.harness.drag_at(place);
        driver.harness.drop_at(place);
    }
    driver.settle();
    assert_eq!(driver.workspace().view.width(), 1.0);
}

#[test]
fn a_zoomed_view_follows_the_moment() {
    let mut driver = Driver::demo();
    for _ in 0..6 {
        driver.press(NONE, Key::Plus);
    }
    let view = driver.workspace().view;
    driver.press(NONE, Key::End);
    driver.assert_one_instant();
    let followed = driver.workspace().view;
    assert!(followed != view && (followed.to - 1.0).abs() < 1e-9, "{followed:?}");
    assert!((followed.width() - view.width()).abs() < 1e-9, "the zoom stays");
}
