//! Any size and scale: everything stays inside the window, nothing covers anything, everything has a name.

use crate::driver::{CHARTS, Driver, STRIP, USUAL, is_used, label};
use egui::accesskit::Role;
use egui::{Key, Modifiers, Rect, Vec2, pos2, vec2};
use egui_kittest::kittest::NodeT;
use longember::document::built_in;
use longember::window::Page;
use std::collections::BTreeSet;

/// Sizes of the window with their scales: the smallest, the usual, a large one, a dense screen.
const WINDOWS: [(Vec2, f32); 5] = [
    (vec2(960.0, 600.0), 1.0),
    (vec2(960.0, 600.0), 2.0),
    (USUAL, 1.0),
    (vec2(1600.0, 1000.0), 1.0),
    (vec2(1600.0, 1000.0), 2.0),
];

fn demo(size: Vec2, scale: f32) -> Driver {
    Driver::sized(built_in::demo().scenario().expect("sound"), size, scale)
}

/// Places of the things that stand at a fixed place: not in a list that scrolls, not a mark on the strip.
fn fixed(driver: &Driver) -> Vec<(String, Rect)> {
    let names = ["Scenario", "Edit", "View", "Help", "Nothing to undo", "Nothing to redo", "Moment", "Speed of play"];
    let more = ["Previous event (Page Up)", "Play (Space)", "Next event (Page Down)", "paced", "log", "linear"];
    let pages = Page::ALL.map(Page::name);
    names.into_iter().chain(more).chain(pages).map(|name| (name.to_owned(), driver.the(name).rect())).collect()
}

#[test]
fn every_panel_stays_inside_the_window() {
    for (size, scale) in WINDOWS {
        let driver = demo(size, scale);
        let window = Rect::from_min_size(pos2(0.0, 0.0), size);
        let places = fixed(&driver);
        for (name, place) in &places {
            assert!(window.contains_rect(*place) && place.width() > 10.0, "{name} at {place:?} in {size:?} at {scale}");
        }
        for (index, (name, place)) in places.iter().enumerate() {
            for (other, its) in &places[index + 1..] {
                assert!(
                    !place.intersects(its.shrink(1.0)),
                    "{name} at {place:?} covers {other} at {its:?} in {size:?}"
                );
            }
        }
        let strip = driver.the(STRIP).rect();
        let charts = driver.the(CHARTS).rect();
        assert!(window.contains_rect(strip) && strip.width() > 0.9 * size.x, "{strip:?} in {size:?}");
        assert!(charts.left() > 0.0 && charts.right() < size.x && charts.width() > 300.0, "{charts:?} in {size:?}");
    }
}

#[test]
fn no_text_runs_out_of_its_place_sideways() {
    let mut complaints = BTreeSet::new();
    for (size, scale) in WINDOWS {
        let mut driver = demo(size, scale);
        driver.click("Talune, temperate");
        for page in Page::ALL {
            driver.click(page.name());
            driver.harness.remove_cursor();
            driver.settle();
            let texts = driver.drawn_texts();
            assert!(texts.len() > 60);
            for (text, place, clip) in texts {
                let is_seen = place.intersects(clip) && place.width() > 1.0;
                let is_cut = place.left() < clip.left() - 1.0 || place.right() > clip.right() + 1.0;
                if is_seen && is_cut {
                    complaints
                        .insert(format!("{text:?} at {place:?} is cut by {clip:?} on {} in {size:?}", page.name()));
                }
            }
        }
    }
    assert!(complaints.is_empty(), "{complaints:#?}");
}

#[test]
fn panels_keep_their_size_while_figures_change() {
    let mut driver = demo(USUAL, 1.0);
    let before = fixed(&driver);
    for key in [Key::Home, Key::PageDown, Key::PageDown, Key::End, Key::N] {
        driver.press(Modifiers::NONE, key);
        let charts = driver.the(CHARTS).rect();
        assert_eq!(fixed(&driver), before, "{key:?}");
        assert_eq!((charts.left(), charts.right()), (264.0, 1016.0), "{key:?}");
    }
}

#[test]
fn the_script_for_the_real_window_knows_its_places() {
    let script = include_str!("../real_window/drive.sh");
    let place = |name: &str| {
        let line = script.lines().find_map(|line| line.strip_prefix(&format!("{name}=\""))).expect("a place");
        let (x, y) = line.trim_end_matches('"').split_once(' ').expect("two numbers");
        pos2(x.parse().expect("a number"), y.parse().expect("a number"))
    };
    let driver = demo(USUAL, 1.0);
    let window = include_str!("../real_window/window.sh").lines().find_map(|line| line.strip_prefix("WINDOW="));
    assert_eq!(window, Some(format!("\"{} {}\"", USUAL.x, USUAL.y).as_str()));
    assert!(driver.the("Mass of Veldane").rect().shrink(4.0).contains(place("MASS_FIELD")));
    let strip = driver.the(STRIP).rect();
    assert!(strip.contains(place("STRIP_FROM")) && strip.contains(place("STRIP_TO")));
    for name in driver.names().into_iter().filter(|name| name.contains(" · ")) {
        assert!(!driver.the(&name).rect().contains(place("STRIP_FROM")), "{name}");
    }
}

#[test]
fn the_story_for_the_real_window_knows_its_places() {
    let story = include_str!("../real_window/story.sh");
    let place = |name: &str| {
        let line = story.lines().find_map(|line| line.strip_prefix(&format!("{name}=\""))).expect("a place");
        let (x, y) = line.trim_end_matches('"').split_once(' ').expect("two numbers");
        pos2(x.parse().expect("a number"), y.parse().expect("a number"))
    };
    let mut driver = demo(USUAL, 1.0);
    for (row, planet) in [("FIRST_PLANET", "Cindrel"), ("LAST_PLANET", "Frimholt")] {
        let name = driver.name_of(&format!("{planet}, "));
        assert!(driver.the(&name).rect().shrink(4.0).contains(place(row)));
        driver.click(&name);
        let field = driver.the(&format!("Semi-major axis of {planet}")).rect();
        assert!(field.shrink(4.0).contains(place("DISTANCE_FIELD")), "{field:?}");
    }
}

#[test]
fn everything_to_use_has_a_name_that_is_its_own() {
    let mut driver = demo(USUAL, 1.0);
    driver.click("Talune, temperate");
    let mut complaints = BTreeSet::new();
    let mut check = |driver: &Driver, place: &str| {
        let mut seen = Vec::new();
        for node in driver.harness.root().children_recursive() {
            let node = node.accesskit_node();
            if !is_used(node.role()) || matches!(node.role(), Role::ScrollBar | Role::Pane | Role::Menu) {
                continue;
            }
            let name = label(&node);
            if name.trim().is_empty() || name.trim() != name || seen.contains(&(node.role(), name.clone())) {
                complaints.insert(format!("{:?} {name:?} on {place}", node.role()));
            }
            seen.push((node.role(), name));
        }
        assert!(seen.len() > 20, "{place}");
    };
    for page in Page::ALL {
        driver.click(page.name());
        check(&driver, page.name());
    }
    for menu in ["Scenario", "Edit", "View", "Help"] {
        driver.click(menu);
        check(&driver, menu);
        driver.press(Modifiers::NONE, Key::Escape);
    }
    assert!(complaints.is_empty(), "without a name, with a ragged one, or twice: {complaints:#?}");
}
