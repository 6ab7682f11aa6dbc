//! The pages of the stage, and the way from a figure to its source.

use crate::driver::{CTRL, Driver};
use egui::{Key, Modifiers, OutputCommand};
use longember::system::provenance::METHODS;
use longember::system::{Body, quantities};
use longember::window::Page;

fn copied(driver: &Driver) -> Vec<String> {
    let commands = &driver.harness.output().platform_output.commands;
    commands
        .iter()
        .filter_map(|command| if let OutputCommand::CopyText(text) = command { Some(text.clone()) } else { None })
        .collect()
}

/// Clicks and returns what came to the clipboard.
fn click_to_copy(driver: &mut Driver, name: &str) -> String {
    driver.the(name).click();
    for _ in 0..8 {
        driver.harness.step();
        if let Some(text) = copied(driver).pop() {
            return text;
        }
    }
    String::new()
}

#[test]
fn a_figure_leads_to_its_source() {
    for quantity in
        quantities::STAR.iter().filter(|quantity| ["luminosity_lsun", "radius_rsun"].contains(&quantity.key))
    {
        let mut driver = Driver::demo();
        let row = driver.name_of(&format!("{}: ", quantity.name));
        driver.click(&row);
        assert_eq!(driver.workspace().page, Page::Sources);
        let method = METHODS.iter().find(|method| method.key == quantity.method).expect("every figure has a method");
        driver.harness.run_steps(30);
        let titles = driver.drawn_texts();
        let title =
            titles.iter().find(|(text, place, clip)| text == method.name && clip.contains_rect(place.shrink(2.0)));
        assert!(title.is_some(), "{} is not in view: {titles:?}", method.name);
    }
}

#[test]
fn every_method_stands_on_the_page_of_sources() {
    let mut driver = Driver::demo();
    driver.click("Sources");
    for method in METHODS {
        for text in [method.name, method.relation, method.source, method.valid_for, method.accuracy] {
            assert!(driver.shows(text), "{}: {text}", method.name);
        }
    }
}

#[test]
fn a_figure_can_be_copied() {
    let mut driver = Driver::demo();
    let row = driver.name_of("Luminosity: ");
    driver.the(&row).click_secondary();
    driver.settle();
    let text = click_to_copy(&mut driver, "Copy value");
    let value: f64 =
        text.split(' ').next().and_then(|number| number.replace('\u{2009}', "").parse().ok()).expect("a number");
    let luminosity = driver.workspace().moment().star.luminosity_lsun.expect("it shines");
    assert!((value / luminosity - 1.0).abs() < 1e-6 && text.ends_with("L☉"), "{text}");
}

#[test]
fn the_chronicle_lists_every_event_and_goes_there() {
    let mut driver = Driver::demo();
    driver.click("Chronicle");
    let history = std::sync::Arc::clone(&driver.workspace().history);
    for event in history.events() {
        assert!(driver.names().iter().any(|name| name.ends_with(&format!(": {}", event.label(&history)))), "{event:?}");
    }
    let spent = history.events().iter().find(|event| event.kind.key() == "main_sequence_end").expect("it ends");
    let row =
        driver.names().into_iter().find(|name| name.ends_with(&format!(": {}", spent.label(&history)))).expect("a row");
    driver.click(&row);
    assert_eq!(driver.workspace().moment_yr, spent.time_yr);
    let text = click_to_copy(&mut driver, "Copy all");
    assert_eq!(text.lines().count(), history.events().len(), "{text}");
    driver.click(&driver.name_of("Talune, "));
    assert_eq!(driver.workspace().selected, Body::Planet(2));
    // Marks on the strip have a dot between date and event, rows of the page have none.
    let rows: Vec<String> = driver.names().into_iter().filter(|name| !name.contains(" · ")).collect();
    assert!(rows.iter().any(|name| name.contains("Talune: ")));
    assert!(!rows.iter().any(|name| name.contains("Frimholt: ")), "only the star and the chosen planet: {rows:?}");
}

#[test]
fn the_introduction_can_be_read_and_written_over() {
    let mut driver = Driver::demo();
    driver.click("Introduction");
    let field = "What to look for in this scenario";
    assert_eq!(driver.text_in(field), driver.workspace().scenario().about);
    driver.the(field).click();
    driver.harness.run_steps(2);
    driver.harness.key_press_modifiers(CTRL, Key::A);
    driver.harness.event(egui::Event::Text("Watch the third world.".to_owned()));
    driver.harness.run_steps(2);
    driver.click("Curves");
    assert_eq!(driver.workspace().scenario().about, "Watch the third world.");
    driver.press(CTRL, Key::Z);
    assert!(driver.workspace().scenario().about.len() > 200);
    driver.press(Modifiers::NONE, Key::F1);
    driver.click("Close");
}
