//! The pages of light: spectrum and sky.

use crate::driver::{Driver, STRIP, label};
use egui::accesskit::Role;
use egui::{Color32, Key, Modifiers, Rect, Shape};
use egui_kittest::kittest::NodeT;
use longember::document::{Theme, built_in};
use longember::figure::spectrum::{Counted, DISTANCES_PC, Scaling};
use longember::physics::light::Viewing;
use longember::system::planet_light::USUAL_ALTITUDE_DEG;
use longember::system::{Body, LightReader, Starlight};
use longember::units::number_text::number;
use longember::window::{Command, Page, contrast};

const SLIDER: &str = "Altitude of the star, degrees";
const FIELD: &str = "Altitude of the star, typed";

/// The picture whose name starts like this: its whole name and its place.
fn picture(driver: &Driver, start: &str) -> (String, Rect) {
    let images = driver.harness.root().children_recursive().filter(|node| node.accesskit_node().role() == Role::Image);
    let mut found: Vec<(String, Rect)> = images.map(|node| (label(&node.accesskit_node()), node.rect())).collect();
    found.retain(|(name, _)| name.starts_with(start));
    assert_eq!(found.len(), 1, "{found:?} start with {start:?}:\n{}", driver.everything());
    found.remove(0)
}

fn sky_words(driver: &Driver) -> String {
    picture(driver, "Sky of ").0
}

fn starlight(driver: &Driver) -> Starlight {
    Starlight::of(&driver.workspace().moment().star).expect("it shines")
}

#[test]
fn the_spectrum_follows_the_moment() {
    let mut driver = Driver::demo();
    driver.click(Page::Spectrum.name());
    let mut told = Vec::new();
    for share in [0.1, 0.3, 0.45, 0.7] {
        let place = driver.on_strip(share);
        driver.click_at(place);
        let star = starlight(&driver);
        let (name, _) = picture(&driver, "Spectrum of the star");
        assert!(name.contains(&format!("{} K", number(star.temperature_k, 4))), "{name}");
        assert!(name.contains(&format!("visible {} per cent", number(100.0 * star.shares.visible, 3))), "{name}");
        let row = driver.name_of("Luminance: ");
        assert!(row.contains(&number(star.luminance_cd_m2, 4)), "{row}");
        told.push(name);
    }
    told.dedup();
    assert_eq!(told.len(), 4);
}

#[test]
fn the_spectrum_is_counted_and_measured_as_chosen() {
    let mut driver = Driver::demo();
    driver.click(Page::Spectrum.name());
    for (counted, scaling) in [
        (Counted::Photons, Scaling::OwnPeak),
        (Counted::Photons, Scaling::Absolute),
        (Counted::Energy, Scaling::Absolute),
        (Counted::Energy, Scaling::OwnPeak),
    ] {
        driver.click(counted.name());
        driver.click(scaling.name());
        let view = driver.workspace().spectrum_view;
        assert_eq!((view.counted, view.scaling), (counted, scaling));
        let texts = driver.drawn_texts();
        let unit = if scaling == Scaling::Absolute { "sr⁻¹ nm⁻¹" } else { "peak" };
        assert!(texts.iter().any(|(text, ..)| text.ends_with(unit)), "{counted:?} {scaling:?}: {texts:?}");
    }
}

#[test]
fn magnitudes_answer_to_the_distance() {
    let mut driver = Driver::demo();
    driver.click(Page::Spectrum.name());
    let absolute = starlight(&driver).magnitudes.expect("in range").absolute_visual_mag;
    for distance_pc in DISTANCES_PC {
        driver.click(&format!("{} pc", number(distance_pc, 1)));
        let row = driver.name_of(&format!("V from {} pc: ", number(distance_pc, 1)));
        let expected = absolute + 5.0 * (distance_pc / 10.0).log10();
        assert!(row.contains(&format!("{} mag", number(expected, 4))), "{row}");
    }
}

#[test]
fn a_star_without_light_leaves_the_reference() {
    let mut driver =
        Driver::of(built_in::find("twelve_solar_masses_supernova").expect("there").scenario().expect("sound"));
    driver.click(Page::Spectrum.name());
    driver.press(Modifiers::NONE, Key::End);
    assert!(picture(&driver, "Spectrum of").0.contains("the star gives no light"));
    assert!(driver.name_of("Luminance: ").ends_with('–'));
}

#[test]
fn a_figure_of_light_leads_to_its_source() {
    let mut driver = Driver::demo();
    driver.click(Page::Spectrum.name());
    let row = driver.name_of("Luminous flux: ");
    driver.click(&row);
    assert_eq!(driver.workspace().page, Page::Sources);
    assert!(driver.shows("Brightness to the eye"));
}

#[test]
fn the_sky_is_that_of_the_chosen_planet_as_it_is_looked_at() {
    let mut driver = Driver::demo();
    driver.click(Page::Sky.name());
    assert!(sky_words(&driver).starts_with("Sky of Cindrel, as emitted: black"), "{}", sky_words(&driver));
    driver.click("Talune");
    assert_eq!(driver.workspace().selected, Body::Planet(2));
    assert!(sky_words(&driver).starts_with("Sky of Talune, as emitted: light blue"), "{}", sky_words(&driver));
    driver.click("no air");
    assert!(!driver.workspace().sky_view.with_air);
    assert!(sky_words(&driver).contains(": black; the star 30.0 degrees up"), "{}", sky_words(&driver));
    driver.click("air");
    driver.click("adapted eye");
    assert_eq!(driver.workspace().sky_view.viewing, Viewing::AdaptedEye);
    assert!(sky_words(&driver).contains("as an adapted eye sees it"), "{}", sky_words(&driver));
    assert!(driver.shows("Looking at a star is dangerous"));
}

#[test]
fn the_sky_of_a_red_dwarf_is_told_both_ways() {
    let scenario = built_in::find("red_dwarf_trillions_of_years").expect("there").scenario().expect("sound");
    let mut driver = Driver::of(scenario);
    driver.click(Page::Sky.name());
    let light = LightReader::new(&driver.workspace().history, USUAL_ALTITUDE_DEG).at(&driver.workspace().moment());
    let temperature_k = light.star.expect("it shines").temperature_k;
    assert!((2500.0..3400.0).contains(&temperature_k), "{temperature_k}");
    let emitted = driver.name_of("Sky as emitted: ");
    let adapted = driver.name_of("Sky to an adapted eye: ");
    assert!(!emitted.contains("blue") && !emitted.contains("red") && adapted.contains("blue"), "{emitted}; {adapted}");
}

#[test]
fn the_altitude_is_dragged_stepped_and_typed() {
    let mut driver = Driver::demo();
    driver.click(Page::Sky.name());
    driver.click("Talune");
    let altitude = |driver: &Driver| driver.workspace().sky_view.altitude_deg;
    assert_eq!(altitude(&driver), USUAL_ALTITUDE_DEG);
    driver.enter(FIELD, "12.5");
    assert_eq!(altitude(&driver), 12.5);
    driver.enter(FIELD, "95");
    assert_eq!(
        (altitude(&driver), driver.text_in(FIELD).as_str()),
        (12.5, "95"),
        "what is out of range stays to be mended"
    );
    driver.enter(FIELD, "3 deg");
    assert_eq!(altitude(&driver), 3.0);
    let before_yr = driver.workspace().moment_yr;
    driver.the(SLIDER).focus();
    driver.settle();
    driver.press(Modifiers::NONE, Key::ArrowUp);
    driver.press(Modifiers::NONE, Key::ArrowUp);
    driver.press(Modifiers::NONE, Key::ArrowDown);
    assert_eq!((altitude(&driver), driver.workspace().moment_yr), (4.0, before_yr));
    driver.press(Modifiers::NONE, Key::ArrowRight);
    assert!(altitude(&driver) == 4.0 && driver.workspace().moment_yr > before_yr, "arrows to the side move the moment");
    let rail = driver.the(SLIDER).rect();
    driver.drag(rail.center(), &[rail.right_center()]);
    assert!(altitude(&driver) > 80.0, "{}", altitude(&driver));
    let disc = |driver: &Driver| driver.name_of("Brightness of the disc: ");
    let high = disc(&driver);
    driver.enter(FIELD, "0");
    assert_ne!(disc(&driver), high);
}

#[test]
fn a_lost_planet_has_no_sky_and_says_why() {
    let mut driver = Driver::demo();
    driver.click(Page::Sky.name());
    let place = picture(&driver, "Sky of ").1;
    driver.press(Modifiers::NONE, Key::End);
    let (words, its) = picture(&driver, "The star has swallowed Cindrel");
    assert!(!words.is_empty());
    assert_eq!(its, place, "the place of the picture stays");
    let mut scenario = built_in::demo().scenario().expect("sound");
    scenario.system.planets.clear();
    let mut driver = Driver::of(scenario);
    driver.click(Page::Sky.name());
    assert!(driver.shows("No planet to stand on yet"));
}

#[test]
fn scrubbing_to_and_fro_tells_the_same_words() {
    let mut driver = Driver::demo();
    driver.click(Page::Sky.name());
    driver.click("Talune");
    let mut seen: Vec<(f32, String)> = Vec::new();
    for share in [0.05, 0.2, 0.35, 0.2, 0.05, 0.35, 0.05] {
        let place = driver.on_strip(share);
        driver.click_at(place);
        let words =
            driver.names().into_iter().filter(|name| name.contains("as emitted") || name.contains("adapted eye"));
        let words = format!("{} {}", sky_words_or_reason(&driver), words.collect::<Vec<_>>().join("; "));
        match seen.iter().find(|(known, _)| *known == share) {
            Some((_, before)) => assert_eq!(*before, words, "at {share}"),
            None => seen.push((share, words)),
        }
    }
    assert_eq!(seen.len(), 3);
    assert!(driver.has(STRIP));
}

fn sky_words_or_reason(driver: &Driver) -> String {
    let images = driver.harness.root().children_recursive().filter(|node| node.accesskit_node().role() == Role::Image);
    images.map(|node| label(&node.accesskit_node())).filter(|name| name.contains("Talune")).collect()
}

#[test]
fn every_text_of_the_pages_can_be_read() {
    for theme in Theme::ALL {
        let mut driver = Driver::demo();
        let context = driver.harness.ctx.clone();
        driver.harness.state_mut().perform(&context, Command::SetTheme(theme));
        driver.click(Page::Spectrum.name());
        assert_eq!(faint(&driver, Rect::NOTHING), Vec::<String>::new(), "{theme:?}");
        driver.click(Page::Sky.name());
        driver.click("Talune");
        // What is drawn into the sky has the sky for its ground, which the picture sees to.
        let sky = picture(&driver, "Sky of ").1;
        assert_eq!(faint(&driver, sky), Vec::<String>::new(), "{theme:?}");
    }
}

/// Texts of the stage with less contrast than 4.5 to its ground, outside of a picture.
fn faint(driver: &Driver, besides: Rect) -> Vec<String> {
    let shapes = &driver.harness.output().shapes;
    let stage = shapes.iter().filter_map(|clipped| match &clipped.shape {
        Shape::Rect(rect) if rect.fill.a() == 255 && rect.rect.area() > 50_000.0 => Some(rect.fill),
        _ => None,
    });
    let ground: Color32 = stage.into_iter().next().expect("a ground");
    let mut faint = Vec::new();
    for clipped in shapes {
        let Shape::Text(text) = &clipped.shape else { continue };
        let place = text.visual_bounding_rect();
        let is_on_stage =
            place.left() > 252.0 && place.right() < 1028.0 && place.top() > 38.0 && place.bottom() < 630.0;
        if !is_on_stage || besides.contains_rect(place) {
            continue;
        }
        let section = text.galley.job.sections.first().map(|section| section.format.color);
        let colour = text.override_text_color.or(section).filter(|colour| *colour != Color32::PLACEHOLDER);
        let colour = colour.unwrap_or(text.fallback_color);
        if contrast(colour, ground) < 4.5 {
            faint.push(format!("{:?} {colour:?} on {ground:?}", text.galley.text()));
        }
    }
    faint
}
