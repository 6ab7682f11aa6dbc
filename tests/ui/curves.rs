//! Which curves are shown.

use crate::driver::{CHARTS, Driver};
use egui::accesskit::Toggled;
use egui_kittest::kittest::NodeT;
use longember::figure::curves::Curve;

fn is_ticked(driver: &Driver, curve: Curve) -> bool {
    driver.the(curve.name()).accesskit_node().toggled() == Some(Toggled::True)
}

#[test]
fn every_curve_can_be_shown_and_hidden() {
    let mut driver = Driver::demo();
    for curve in Curve::ALL {
        let was_shown = driver.workspace().curves.contains(&curve);
        assert_eq!(is_ticked(&driver, curve), was_shown);
        driver.click(curve.name());
        assert_eq!(driver.workspace().curves.contains(&curve), !was_shown);
        assert_eq!(is_ticked(&driver, curve), !was_shown);
        driver.click(curve.name());
        assert_eq!(driver.workspace().curves.contains(&curve), was_shown);
    }
}

#[test]
fn what_is_ticked_is_drawn() {
    let mut driver = Driver::demo();
    for curve in Curve::ALL.into_iter().filter(|curve| !driver.workspace().curves.contains(curve)).collect::<Vec<_>>() {
        driver.click(curve.name());
    }
    let many = driver.drawn_texts().len();
    for curve in Curve::ALL {
        driver.click(curve.name());
    }
    assert!(driver.workspace().curves.is_empty() && driver.shows("No curve is chosen") && !driver.has(CHARTS));
    let few = driver.drawn_texts().len();
    assert!(few + 15 < many, "the labels of six charts are gone: {few} of {many} texts are left");
    driver.click(Curve::Radius.name());
    assert!(driver.has(CHARTS));
    driver.assert_one_instant();
}

#[test]
fn a_curve_is_read_off_under_the_pointer() {
    let mut driver = Driver::demo();
    let reading = |driver: &Driver| {
        driver.drawn_texts().iter().filter(|(text, ..)| text.contains(" · ") && text.contains("L☉")).count()
    };
    let before = reading(&driver);
    driver.harness.hover_at(driver.the(CHARTS).rect().center());
    driver.settle();
    assert_eq!(reading(&driver), before + 1);
}
