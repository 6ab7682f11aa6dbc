//! The Sun: today, its past and its future.

use longember::physics::star::analytic::Fit;
use longember::physics::star::calibration::{SOLAR_AGE_YR, SOLAR_HEAVY_ELEMENTS};
use longember::physics::star::{Phase, StarEventKind, StarInput, Track};
use longember::units::constants::{LIGHT_SPEED_M_S, SOLAR_LUMINOSITY_W};

fn sun() -> Track {
    Track::compute(StarInput { mass_msun: 1.0, metallicity_dex: 0.0 }).unwrap()
}

#[test]
fn the_calibrated_sun_is_the_sun_of_today() {
    // IAU 2015 Resolution B3 nominal values.
    let today = sun().state_at(SOLAR_AGE_YR);
    assert_eq!(today.phase, Phase::MainSequence);
    assert!((today.luminosity_lsun - 1.0).abs() < 0.002, "{today:?}");
    assert!((today.radius_rsun - 1.0).abs() < 0.02, "{today:?}");
    assert!((today.effective_temperature_k - 5772.0).abs() < 60.0, "{today:?}");
}

#[test]
fn the_calibrated_composition_is_the_root_of_today_s_luminosity() {
    let luminosity = |z: f64| Fit::new(z).unwrap().main_sequence(1.0).at(SOLAR_AGE_YR / 1e6).0;
    let (mut low, mut high) = (0.015, 0.02);
    for _ in 0..60 {
        let middle = 0.5 * (low + high);
        if luminosity(middle) > 1.0 { low = middle } else { high = middle }
    }
    assert!((low - SOLAR_HEAVY_ELEMENTS).abs() < 2e-5, "root {low}");
}

#[test]
fn the_young_sun_was_as_faint_as_published() {
    // Gough 1981, Solar Physics 74, 21, eq. 1: L = 1 / [1 + 0.4 (1 − t/4.57 Gyr)].
    let sun = sun();
    for step in 0..=20 {
        let age = SOLAR_AGE_YR * f64::from(step) / 20.0;
        let gough = 1.0 / (1.0 + 0.4 * (1.0 - age / SOLAR_AGE_YR));
        let luminosity = sun.state_at(age).luminosity_lsun;
        assert!((luminosity / gough - 1.0).abs() < 0.03, "{age}: {luminosity} against {gough}");
    }
}

#[test]
fn the_core_has_burnt_half_of_its_hydrogen() {
    // Bahcall, Serenelli & Basu 2005, ApJ 621, L85: 0.35 at the centre today (from memory).
    let sun = sun();
    let left = sun.state_at(SOLAR_AGE_YR).core_hydrogen_fraction.unwrap();
    assert!((left - 0.35).abs() < 0.03, "{left}");
    // Common practice: hydrogen in the core lasts about five billion years more.
    let exhausted = (0..200)
        .map(|step| 5e7 * f64::from(step))
        .find(|since| sun.state_at(SOLAR_AGE_YR + since).core_hydrogen_fraction == Some(0.0));
    assert!((4e9..6e9).contains(&exhausted.unwrap()), "{exhausted:?}");
}

#[test]
fn the_sun_s_power_and_fuel_are_what_every_textbook_says() {
    // Common practice: about 4e26 W, for which about 6e11 kg of hydrogen fuse each second (0.7 % of it becomes light).
    let watts = sun().state_at(SOLAR_AGE_YR).luminosity_lsun * SOLAR_LUMINOSITY_W;
    assert!((3.7e26..4.0e26).contains(&watts));
    let hydrogen_kg_s = watts / (0.0071 * LIGHT_SPEED_M_S * LIGHT_SPEED_M_S);
    assert!((5.5e11..6.5e11).contains(&hydrogen_kg_s), "{hydrogen_kg_s}");
}

#[test]
fn the_sun_is_a_red_giant_twice() {
    // Common practice. Between the two it shrinks to some ten solar radii and burns helium for about 10⁸ yr.
    let sun = sun();
    let most = |phase: Phase| {
        let span = sun.spans().iter().find(|span| span.phase == phase).unwrap();
        let in_span = sun.node_ages_yr().iter().filter(|&&age| age >= span.from_yr && age < span.to_yr);
        in_span.map(|&age| sun.state_at(age).radius_rsun).fold(0.0, f64::max)
    };
    let flash = sun.age_of_yr(StarEventKind::HeliumIgnition { flash: true }).unwrap();
    let core_end = sun.age_of_yr(StarEventKind::CoreHeliumEnd).unwrap();
    assert!((0.9e8..1.6e8).contains(&(core_end - flash)));
    let between = sun.state_at(0.5 * (flash + core_end)).radius_rsun;
    assert!((5.0..20.0).contains(&between), "{between}");
    let first = most(Phase::FirstGiantBranch);
    let second = most(Phase::EarlyAsymptoticGiant).max(most(Phase::PulsingAsymptoticGiant));
    // Sackmann, Boothroyd & Kraemer 1993, ApJ 418, 457: 166 and 213 solar radii; Schröder & Smith 2008, MNRAS 386, 155:
    // 256 and 149.
    assert!((150.0..260.0).contains(&first) && (140.0..260.0).contains(&second), "{first} {second}");
}

#[test]
fn the_future_sun_keeps_the_published_times() {
    // Sackmann, Boothroyd & Kraemer 1993, ApJ 418, 457: main sequence to about 11 Gyr, end near 12.4 Gyr, white dwarf of
    // 0.54 solar masses; 2.2 solar luminosities at the end of the main sequence.
    let sun = sun();
    let main_sequence = sun.age_of_yr(StarEventKind::MainSequenceEnd).unwrap();
    assert!((9.5e9..11.5e9).contains(&main_sequence), "{main_sequence}");
    assert!((sun.state_at(main_sequence.next_down()).luminosity_lsun - 2.2).abs() < 0.3);
    let birth = sun.age_of_yr(StarEventKind::WhiteDwarfBirth).unwrap();
    assert!((11.2e9..13.0e9).contains(&birth), "{birth}");
    let end = sun.state_at(2e10);
    assert_eq!(end.phase, Phase::CarbonOxygenWhiteDwarf);
    assert!((0.50..0.56).contains(&end.mass_msun), "{end:?}");
}
