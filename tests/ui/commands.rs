//! Commands by list, key and menu: pages, panels, text size, the pinned reference, loops, the way back to the file.

use crate::driver::{CTRL, CTRL_SHIFT, Driver};
use egui::{Key, Modifiers, pos2};
use longember::window::{Menu, Page, offers};
use std::sync::Arc;

#[test]
fn the_list_of_commands_finds_and_does() {
    let mut driver = Driver::demo();
    driver.press(CTRL, Key::K);
    driver.type_over("Search all commands", "page hr");
    driver.press(Modifiers::NONE, Key::Enter);
    assert_eq!(driver.workspace().page, Page::HrDiagram);
    assert!(!driver.has("Search all commands"));
    driver.press(CTRL, Key::K);
    driver.type_over("Search all commands", "theme no such words");
    assert!(driver.shows("No command has these words."));
    driver.press(Modifiers::NONE, Key::Enter);
    driver.press(Modifiers::NONE, Key::Escape);
    assert!(!driver.has("Search all commands"));
}

#[test]
fn arrows_choose_in_the_list_of_commands() {
    let mut driver = Driver::demo();
    driver.press(CTRL, Key::K);
    driver.type_over("Search all commands", "page");
    driver.press(Modifiers::NONE, Key::ArrowDown);
    driver.press(Modifiers::NONE, Key::ArrowDown);
    driver.press(Modifiers::NONE, Key::ArrowUp);
    driver.press(Modifiers::NONE, Key::Enter);
    assert_eq!(driver.workspace().page, Page::ALL[1]);
}

#[test]
fn every_offer_stands_in_a_menu() {
    let mut driver = Driver::demo();
    let all = offers(driver.workspace());
    for menu in [Menu::Scenario, Menu::Edit, Menu::View, Menu::Page, Menu::Time, Menu::Help] {
        driver.click(menu.name());
        for offer in all.iter().filter(|offer| offer.menu == menu) {
            assert!(driver.names().iter().any(|name| name.starts_with(&offer.words)), "{menu:?}: {}", offer.words);
        }
        driver.press(Modifiers::NONE, Key::Escape);
    }
}

#[test]
fn pages_turn_by_key_and_come_round() {
    let mut driver = Driver::demo();
    for page in Page::ALL.into_iter().skip(1).chain([Page::ALL[0]]) {
        driver.press(CTRL, Key::Tab);
        assert_eq!(driver.workspace().page, page);
    }
    driver.press(CTRL_SHIFT, Key::Tab);
    assert_eq!(Some(&driver.workspace().page), Page::ALL.last());
}

#[test]
fn panels_are_put_away_and_the_stage_takes_their_room() {
    let mut driver = Driver::demo();
    let width = |driver: &Driver| driver.the(crate::driver::CHARTS).rect().width();
    let before = width(&driver);
    driver.press(CTRL, Key::B);
    assert!(!driver.has("Mass of Veldane"));
    assert!(width(&driver) > before + 200.0);
    driver.press(CTRL, Key::M);
    assert!(width(&driver) > before + 400.0 && !driver.shows("This moment"));
    driver.press(CTRL, Key::B);
    driver.press(CTRL, Key::M);
    assert_eq!(width(&driver), before);
}

#[test]
fn text_grows_and_shrinks_within_its_range() {
    let mut driver = Driver::demo();
    for _ in 0..20 {
        driver.press(CTRL, Key::Minus);
    }
    assert!((driver.harness.ctx.zoom_factor() - 0.75).abs() < 1e-6);
    driver.press(CTRL, Key::Num0);
    assert!((driver.harness.ctx.zoom_factor() - 1.0).abs() < 1e-6);
    driver.press(CTRL, Key::Plus);
    assert!((driver.harness.ctx.zoom_factor() - 1.1).abs() < 1e-6);
    assert!((driver.workspace().settings.text_scale - 1.1).abs() < 1e-6);
}

#[test]
fn a_pinned_system_stays_while_the_star_changes() {
    let mut driver = Driver::demo();
    driver.press(CTRL, Key::P);
    let title = driver.workspace().scenario().title.clone();
    driver.enter("Mass of Veldane", "1.2");
    let workspace = driver.workspace();
    let pinned = workspace.pinned.as_ref().expect("pinned");
    assert_eq!(pinned.label, title);
    assert!(!Arc::ptr_eq(&pinned.history, &workspace.history));
    assert!(driver.shows(&format!("Against {title} at the same age")));
    assert!(driver.shows("Mass × 1.20"));
    driver.click("HR diagram");
    assert!(driver.drawn_texts().iter().any(|(text, ..)| *text == format!("dashed: {title}")));
    driver.press(CTRL_SHIFT, Key::P);
    assert!(driver.workspace().pinned.is_none() && !driver.shows("Against "));
}

#[test]
fn a_loop_goes_round() {
    let mut driver = Driver::demo();
    let place = driver.on_strip(0.2);
    driver.click_at(place);
    let begin_yr = driver.workspace().moment_yr;
    driver.press(Modifiers::NONE, Key::OpenBracket);
    let place = driver.on_strip(0.25);
    driver.click_at(place);
    driver.press(Modifiers::NONE, Key::CloseBracket);
    let end_yr = driver.workspace().moment_yr;
    assert!(begin_yr < end_yr);
    driver.harness.key_press(Key::Space);
    let mut has_come_round = false;
    let mut last_yr = driver.workspace().moment_yr;
    for _ in 0..200 {
        driver.harness.run_steps(1);
        let moment_yr = driver.workspace().moment_yr;
        assert!(moment_yr >= 0.999 * begin_yr && moment_yr <= 1.05 * end_yr, "{moment_yr}");
        has_come_round |= moment_yr < last_yr;
        last_yr = moment_yr;
    }
    assert!(has_come_round && driver.workspace().playback.is_running);
    driver.harness.key_press(Key::Backslash);
    driver.harness.run_steps(2);
    assert!(driver.workspace().playback.loop_fractions.is_none());
}

#[test]
fn reverting_brings_the_saved_scenario_back_and_can_be_undone() {
    let mut driver = Driver::demo();
    driver.enter("Mass of Veldane", "1.2");
    driver.choose("Scenario", "Revert to saved");
    assert_eq!(driver.workspace().scenario().system.star.mass_msun, 1.0);
    assert!(!driver.workspace().session.is_dirty());
    driver.press(CTRL, Key::Z);
    assert_eq!(driver.workspace().scenario().system.star.mass_msun, 1.2);
}

#[test]
fn a_file_written_by_another_program_is_noticed_on_coming_back() {
    let folder = tempfile::tempdir().expect("a folder");
    let path = folder.path().join("shared.ron");
    let mut driver = Driver::demo();
    driver.press(CTRL, Key::S);
    driver.enter("Path of the file", path.to_str().expect("UTF-8"));
    let text = std::fs::read_to_string(&path).expect("saved");
    driver.harness.event(egui::Event::WindowFocused(true));
    driver.settle();
    assert!(!driver.has("Open it again"), "nothing happened to the file");
    std::fs::write(&path, text.replace("Veldane", "Orrim")).expect("written");
    driver.harness.event(egui::Event::WindowFocused(true));
    driver.settle();
    driver.click("Keep mine");
    assert_eq!(driver.workspace().scenario().system.star.name, "Veldane");
    driver.harness.event(egui::Event::WindowFocused(true));
    driver.settle();
    assert!(!driver.has("Open it again"), "it was answered");
    std::fs::write(&path, text.replace("Veldane", "Ashild")).expect("written");
    driver.harness.event(egui::Event::WindowFocused(true));
    driver.settle();
    driver.click("Open it again");
    assert_eq!(driver.workspace().scenario().system.star.name, "Ashild");
}

#[test]
fn a_drag_along_the_track_of_the_diagram_sets_the_moment() {
    let mut driver = Driver::demo();
    driver.click("HR diagram");
    let before_yr = driver.workspace().moment_yr;
    let charts = driver.diagram();
    let from = pos2(charts.center().x, charts.center().y);
    driver.drag(from, &[from + egui::vec2(0.0, 60.0)]);
    let after_yr = driver.workspace().moment_yr;
    assert!(after_yr != before_yr, "the nearest point of the track is another age");
    assert!(driver.workspace().history.shown_until_yr() >= after_yr);
}
