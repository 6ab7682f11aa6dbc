//! Themes.

use crate::driver::Driver;
use egui::{Color32, Shape};
use longember::document::Theme;
use longember::window::contrast;

/// The colour under everything: the first large rectangle that is drawn.
fn ground(driver: &Driver) -> Color32 {
    let fills = driver.harness.output().shapes.iter().filter_map(|clipped| match &clipped.shape {
        Shape::Rect(rect) if rect.fill.a() == 255 && rect.rect.area() > 50_000.0 => Some(rect.fill),
        _ => None,
    });
    fills.into_iter().next().expect("a ground")
}

#[test]
fn themes_change_the_ground_and_are_kept() {
    let mut driver = Driver::demo();
    let mut grounds = Vec::new();
    for theme in [Theme::Light, Theme::Dome, Theme::Dark] {
        driver.click("View");
        let item = driver.names().into_iter().find(|name| name.starts_with(first_word(theme))).expect("in the menu");
        driver.click(&item);
        assert_eq!((driver.workspace().theme(), driver.workspace().settings.theme), (theme, theme));
        grounds.push(ground(&driver));
    }
    let [light, dome, dark] = grounds[..] else { unreachable!("three themes") };
    assert!(contrast(light, Color32::BLACK) > 10.0, "{light:?}");
    assert!(contrast(dark, Color32::BLACK) < 2.0 && contrast(dome, Color32::BLACK) < 2.0, "{dark:?} {dome:?}");
}

fn first_word(theme: Theme) -> &'static str {
    match theme {
        Theme::Dark => "Dark",
        Theme::Light => "Light",
        Theme::Dome => "Dome",
    }
}

#[test]
fn every_drawn_text_can_be_read_on_its_ground() {
    for theme in Theme::ALL {
        let mut driver = Driver::demo();
        driver.click("View");
        let item = driver.names().into_iter().find(|name| name.starts_with(first_word(theme))).expect("in the menu");
        driver.click(&item);
        let ground = ground(&driver);
        let mut faint = Vec::new();
        for clipped in &driver.harness.output().shapes {
            if let Shape::Text(text) = &clipped.shape {
                let section = text.galley.job.sections.first().map(|section| section.format.color);
                let colour = text.override_text_color.or(section).filter(|colour| *colour != Color32::PLACEHOLDER);
                let colour = colour.unwrap_or(text.fallback_color);
                // What is drawn on the mid-grey bed of the disc has a ground of its own.
                if colour.a() == 255 && contrast(colour, ground) < 4.5 && !text.galley.text().contains("Sun") {
                    faint.push((text.galley.text().to_owned(), colour));
                }
            }
        }
        assert!(faint.is_empty(), "{theme:?} on {ground:?}: {faint:?}");
    }
}
