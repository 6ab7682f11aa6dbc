//! Colour indices, bolometric corrections and magnitudes against published and outside values.

use super::light_dwarf_rows::PHOTOMETRY;
use longember::physics::light::{
    FlowerClass, PhotometricRelation, SUN_ILLUMINANCE_LX, absolute_bolometric_magnitude, absolute_visual_magnitude,
    apparent_magnitude_from_planet, ballesteros_colour_mag, ballesteros_temperature_k, flower_colour_mag,
    flower_temperature_k, illuminance_of_magnitude_lx, photosynthetic_light, torres_correction_mag, ultraviolet_light,
    visual_photometry,
};

#[test]
fn published_relations_give_their_rows() {
    for (temperature_k, flower, ballesteros, torres, _, _) in PHOTOMETRY {
        let found = flower_colour_mag(*temperature_k).expect("in range");
        assert!((found - flower).abs() < 1e-4, "{temperature_k}: {found} {flower}");
        let found = torres_correction_mag(*temperature_k).expect("in range");
        assert!((found - torres).abs() < 1e-4, "{temperature_k}: {found} {torres}");
        if (4000.0..=10_000.0).contains(temperature_k) {
            let found = ballesteros_colour_mag(*temperature_k).expect("in range");
            assert!((found - ballesteros).abs() < 1e-4, "{temperature_k}: {found} {ballesteros}");
        }
    }
}

/// Flower (1996) with the coefficients of Torres (2010), evaluated outside this program.
#[test]
fn flowers_relation_at_round_colours() {
    for (colour, expected_k) in [(0.653, 5708.0), (0.0, 9531.1), (1.0, 4843.9), (1.5, 3982.8)] {
        let found_k = flower_temperature_k(colour, FlowerClass::DwarfsAndGiants).expect("in range");
        assert!((found_k - expected_k).abs() < 0.5, "{colour}: {found_k}");
    }
    for (temperature_k, expected) in [(5772.0, -0.0810), (10_000.0, -0.249), (30_000.0, -2.891)] {
        assert!((torres_correction_mag(temperature_k).expect("in range") - expected).abs() < 6e-4);
    }
    // Supergiants: log T at B−V = 0 is the first coefficient, 4.01256.
    let hot_k = flower_temperature_k(0.0, FlowerClass::Supergiants).expect("in range");
    assert!((hot_k - 10_293.4).abs() < 0.5, "{hot_k}");
}

/// Ballesteros (2012), EPL 97, 34008: the Sun, B−V = 0.653 (Ramírez et al. 2012), comes out near 5767 K.
#[test]
fn ballesteros_gives_the_sun() {
    assert!((ballesteros_temperature_k(0.653).expect("in range") - 5767.5).abs() < 0.5);
    assert!((ballesteros_colour_mag(5772.0).expect("in range") - 0.651_8).abs() < 1e-4);
}

/// The Sun: V = −26.76 ± 0.03 (Torres 2010), B−V = 0.653 ± 0.005 (Ramírez et al. 2012).
#[test]
fn the_sun_has_its_magnitudes() {
    let sun = visual_photometry(5772.0, 4.438).expect("in range");
    assert_eq!(sun.relation, PhotometricRelation::DwarfTable);
    assert!((sun.b_minus_v_mag - 0.65).abs() < 0.01, "{sun:?}");
    let bolometric_mag = absolute_bolometric_magnitude(1.0).expect("in range");
    let absolute_mag = absolute_visual_magnitude(bolometric_mag, sun.bolometric_correction_mag).expect("in range");
    assert!((absolute_mag - 4.825).abs() < 0.005, "{absolute_mag}");
    let apparent_mag = apparent_magnitude_from_planet(absolute_mag, 1.0).expect("in range");
    assert!((apparent_mag + 26.75).abs() < 0.03, "{apparent_mag}");
    let lux = illuminance_of_magnitude_lx(-26.74).expect("in range");
    assert!((lux / SUN_ILLUMINANCE_LX - 1.0).abs() < 2e-3, "{lux}");
}

/// Rows of the dwarf table (Pecaut & Mamajek 2013, BC version 2022.04.16) come back as they are.
#[test]
fn the_dwarf_table_is_met() {
    for (temperature_k, correction) in
        [(3210.0, -2.51), (3850.0, -1.15), (5660.0, -0.105), (9700.0, -0.21), (29_000.0, -2.83)]
    {
        let found = visual_photometry(temperature_k, 4.5).expect("in range").bolometric_correction_mag;
        assert!((found - correction).abs() < 1e-9, "{temperature_k}: {found}");
    }
    for (temperature_k, colour) in [(2500.0, 2.2), (2850.0, 2.0), (5280.0, 0.816), (9700.0, 0.0), (41_500.0, -0.32)] {
        let found = visual_photometry(temperature_k, 4.5).expect("in range").b_minus_v_mag;
        assert!((found - colour).abs() < 1e-9, "{temperature_k}: {found}");
    }
}

/// Blackbodies through the passbands of Bessell (1990): the thinned table stays within 0.01 mag of every row
/// computed outside, and meets the hot rows.
#[test]
#[expect(clippy::approx_constant, reason = "a correction that happens to look like 2π")]
fn blackbody_photometry_agrees() {
    for (temperature_k, _, _, _, colour, correction) in PHOTOMETRY {
        let found = visual_photometry(*temperature_k, 8.0).expect("in range");
        assert_eq!(found.relation, PhotometricRelation::SyntheticBlackbody);
        assert!((found.b_minus_v_mag - colour).abs() < 0.01, "{temperature_k}: {found:?} {colour}");
        assert!((found.bolometric_correction_mag - correction).abs() < 0.03, "{temperature_k}: {found:?} {correction}");
    }
    for (temperature_k, colour, correction) in
        [(20_000.0, -0.137, -1.69), (50_000.0, -0.285, -4.18), (1e5, -0.328, -6.28), (2e5, -0.348, -8.47)]
    {
        let found = visual_photometry(temperature_k, 7.5).expect("in range");
        assert!(
            (found.b_minus_v_mag - colour).abs() < 1e-9 && (found.bolometric_correction_mag - correction).abs() < 1e-9
        );
    }
}

/// A red dwarf as a blackbody would be half a magnitude to two too bright in V; the table knows better.
#[test]
fn a_red_dwarf_is_fainter_than_its_blackbody() {
    let dwarf = visual_photometry(3200.0, 5.0).expect("in range").bolometric_correction_mag;
    let blackbody = visual_photometry(3200.0, 7.0).expect("in range").bolometric_correction_mag;
    assert!((-1.5..-0.5).contains(&(dwarf - blackbody)), "{dwarf} {blackbody}");
}

/// Sunlight above the air holds about 39 % of its energy in 400 to 700 nm and 6.2 % of ultraviolet A, 1.3 % of B
/// (ASTM E490, from memory); a blackbody of 5772 K comes within a few per cent of the first, and above the
/// ultraviolet because it lacks the absorption lines.
#[test]
fn sunlight_splits_as_measured() {
    let plants = photosynthetic_light(1361.0, 5772.0).expect("in range");
    assert!((plants.energy_share - 0.39).abs() < 0.03, "{plants:?}");
    // 4.57 µmol/J of photosynthetic daylight (Thimijan & Heins 1983, HortScience 18, 818).
    assert!((plants.photon_flux_umol_m2_s / plants.irradiance_w_m2 - 4.57).abs() < 0.06, "{plants:?}");
    let burn = ultraviolet_light(1361.0, 5772.0).expect("in range");
    assert!(
        (0.06..0.10).contains(&(burn.uva_w_m2 / 1361.0)) && (0.012..0.03).contains(&(burn.uvb_w_m2 / 1361.0)),
        "{burn:?}"
    );
}
