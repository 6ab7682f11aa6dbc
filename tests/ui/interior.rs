//! The page of the star's layers.

use crate::driver::{Driver, label};
use egui::accesskit::Role;
use egui::{Key, Modifiers};
use egui_kittest::kittest::NodeT;
use longember::document::built_in;
use longember::figure::interior::{LayerFigure, LayerScale};
use longember::window::Page;

fn pictures(driver: &Driver) -> Vec<String> {
    let images = driver.harness.root().children_recursive().filter(|node| node.accesskit_node().role() == Role::Image);
    images.map(|node| label(&node.accesskit_node())).filter(|name| name.contains("through the star")).collect()
}

/// What the page says when there are no layers.
fn excuse(driver: &Driver) -> String {
    let texts = driver.drawn_texts().into_iter().map(|(text, ..)| text);
    texts.filter(|text| text.starts_with("No layers to show: ")).collect()
}

#[test]
fn a_red_dwarf_shows_its_layers_as_soon_as_they_are_computed() {
    let mut driver =
        Driver::of(built_in::find("tenth_of_a_sun_close_worlds").expect("built in").scenario().expect("sound"));
    driver.click(Page::Interior.name());
    let mut steps = 0;
    while driver.workspace().history.life().is_quick_look() {
        assert!(pictures(&driver).is_empty() && excuse(&driver).contains("quick look"));
        driver.harness.run_steps(3);
        steps += 1;
        assert!(steps < 20_000, "the exact life never comes");
        std::thread::sleep(std::time::Duration::from_millis(2));
    }
    driver.settle();
    let young = pictures(&driver);
    assert_eq!(young.len(), LayerFigure::ALL.len(), "{young:?}");
    for (name, figure) in young.iter().zip(LayerFigure::ALL) {
        assert!(name.starts_with(figure.title()), "{name}");
        assert!(name.contains("at the centre") && name.contains("at the surface"), "{name}");
        assert!(name.contains("the whole star is mixed"), "{name}");
    }
    assert!(driver.drawn_texts().iter().any(|(text, ..)| text == "mixed"), "the word stands in the zone");
    for scale in LayerScale::ALL {
        driver.click(scale.name());
        assert_eq!(driver.workspace().layer_scale, scale);
        assert_eq!(pictures(&driver), young, "the layers are the same whatever they are laid out against");
    }
    // A cold ember has no layers, and the page says so.
    driver.press(Modifiers::NONE, Key::End);
    assert!(excuse(&driver).contains("one crystal"));
}

#[test]
fn without_layers_the_page_says_why_in_one_sentence() {
    let mut driver = Driver::demo();
    driver.click(Page::Interior.name());
    assert!(pictures(&driver).is_empty());
    assert!(excuse(&driver).contains("published fits"), "{}", driver.everything());
}
