//! What is commonly said of red dwarfs, each with the program's own figure.
//!
//! Common practice: none of these sentences has a single source. The energy per gram is that of four protons to ⁴He
//! without neutrinos, 6.27 × 10¹⁸ erg per gram of hydrogen.

use crate::red_dwarf_lives::{M010, M015, brightest, hottest_k, since_birth};
use longember::physics::star::convective::{Life, Node, Stage};

const ERG_PER_G: f64 = 6.27e18;
const YEAR_S: f64 = 3.155_76e7;
const SUN_ERG_S: f64 = 3.828e33;
const SUN_G: f64 = 1.988_41e33;

fn adult(life: &Life) -> impl Iterator<Item = &Node> {
    life.nodes.iter().filter(|node| node.age_yr >= 0.0)
}

#[test]
fn a_tenth_of_the_sun_s_mass_gives_a_thousandth_of_its_light() {
    let light = since_birth(&M010, 5e9).luminosity_lsun;
    assert!((0.8e-3..1.2e-3).contains(&light), "{light}");
}

#[test]
fn it_has_as_much_usable_hydrogen_as_the_sun() {
    // The Sun burns about a tenth of its own; this star nearly all.
    let [first, last] = [M010.nodes[0], M010.nodes[M010.nodes.len() - 1]];
    let burnt_msun = first.mass_msun * (first.mean_hydrogen_fraction - last.mean_hydrogen_fraction);
    let burnt_by_the_sun_msun = 0.1 * first.mean_hydrogen_fraction;
    assert!((0.9..1.1).contains(&(burnt_msun / burnt_by_the_sun_msun)), "{burnt_msun}");
}

#[test]
fn its_life_is_shorter_than_its_present_light_suggests() {
    // At constant output some 10 trillion years, in truth a few, since it brightens tenfold.
    let [first, last] = [M010.nodes[0], M010.nodes[M010.nodes.len() - 1]];
    let burnt_g = SUN_G * first.mass_msun * (first.mean_hydrogen_fraction - last.mean_hydrogen_fraction);
    let present = since_birth(&M010, 5e9).luminosity_lsun;
    let at_constant_output_yr = burnt_g * ERG_PER_G / (present * SUN_ERG_S) / YEAR_S;
    assert!((7e12..11e12).contains(&at_constant_output_yr), "{at_constant_output_yr}");
    let peak = brightest(&M010);
    assert!((3e12..5e12).contains(&peak.age_yr), "{}", peak.age_yr);
    assert!(peak.luminosity_lsun > 9.5 * present, "{} of {present}", peak.luminosity_lsun);
}

#[test]
fn it_hardly_swells_while_it_brightens() {
    let young = M010.at_age(5e9).expect("a young star").radius_rsun;
    let largest = adult(&M010).map(|node| node.radius_rsun).fold(0.0, f64::max);
    assert!((1.1..1.3).contains(&(largest / young)), "{}", largest / young);
}

#[test]
fn its_light_is_infrared_for_most_of_its_life_and_turns_white_and_bluish() {
    // Wien: the radiance peaks beyond 700 nm below 4140 K. White begins near 5500 K, a bluish tinge near 7000 K.
    let end_yr = adult(&M010).find(|node| node.stage == Stage::HeliumWhiteDwarf).expect("a white dwarf").age_yr;
    let turned_yr = adult(&M010).find(|node| node.effective_temperature_k > 4140.0).expect("it warms").age_yr;
    assert!(turned_yr > 0.9 * end_yr, "{turned_yr} of {end_yr}");
    assert!(hottest_k(&M010) > 5500.0 && hottest_k(&M015) > 7000.0);
}

#[test]
fn its_white_dwarf_takes_billions_of_years_to_fade() {
    let at = |stage| adult(&M010).find(|node| node.stage == stage).expect("a stage").age_yr;
    let fading_yr = at(Stage::BlackDwarf) - at(Stage::HeliumWhiteDwarf);
    assert!((1e10..3e11).contains(&fading_yr), "{fading_yr}");
}
