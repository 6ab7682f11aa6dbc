//! The sky's colour and brightness against published scattering and an outside computation.

use super::light_sky_rows::{DISCS, DOMES, ZENITHS};
use longember::physics::light::{
    Atmosphere, Gas, Sky, SkyScene, Tristimulus, Viewing, air_mass, light_through_air, rayleigh_cross_section_m2,
    screen_colour, seen, sky, twilight,
};

const ONE_BAR: Atmosphere =
    Atmosphere { gas: Gas::Air, surface_pressure_bar: 1.0, surface_gravity_m_s2: 9.80665, ground_albedo: 0.2 };

fn sky_under(star_temperature_k: f64, altitude_deg: f64, atmosphere: Atmosphere) -> Sky {
    sky(&SkyScene { star_temperature_k, irradiance_w_m2: 1361.0, altitude_deg, atmosphere }).expect("in range")
}

fn assert_at(light: Tristimulus, [x, y]: [f64; 2], tolerance: f64, what: &str) {
    let found = light.chromaticity().expect("light");
    assert!((found.x - x).abs() < tolerance && (found.y - y).abs() < tolerance, "{what}: {found:?}, not {x} {y}");
}

/// Bodhaine, Wood, Dutton & Slusser (1999), J. Atmos. Oceanic Technol. 16, 1854, equation 29 (360 ppm CO₂): an
/// independent fit to the same physics.
#[test]
fn air_scatters_as_bodhaine_and_others_found() {
    for wavelength_nm in (380..=780).step_by(5).map(f64::from) {
        let squared = (wavelength_nm * 1e-3_f64).powi(2);
        let expected_cm2 = 1e-28 * (1.045_599_6 - 341.290_61 / squared - 0.902_308_50 * squared)
            / (1.0 + 0.002_705_988_9 / squared - 85.968_563 * squared);
        let found_cm2 = rayleigh_cross_section_m2(wavelength_nm, Gas::Air).expect("in range") * 1e4;
        assert!((found_cm2 / expected_cm2 - 1.0).abs() < 3.5e-3, "{wavelength_nm}: {found_cm2} {expected_cm2}");
    }
}

/// Optical depths of the Earth's air, 1013.25 hPa, by the constants of Bucholtz (1995), computed outside.
#[test]
fn the_earths_air_has_its_optical_depth() {
    for (wavelength_nm, expected) in [(400.0, 0.3596), (500.0, 0.1427), (550.0, 0.0968), (700.0, 0.0364)] {
        let found = Atmosphere::EARTH.optical_depth(wavelength_nm).expect("in range");
        assert!((found - expected).abs() < 1.5e-4, "{wavelength_nm}: {found}");
    }
    assert!((Atmosphere::EARTH.column_per_m2().expect("in range") / 2.148e29 - 1.0).abs() < 1e-3);
}

/// Carbon dioxide scatters 2.4 to 2.6 times as much as air per molecule in the visible (common practice, after
/// Sneep & Ubachs 2005).
#[test]
fn carbon_dioxide_scatters_more() {
    for wavelength_nm in [400.0, 532.0, 700.0] {
        let ratio = rayleigh_cross_section_m2(wavelength_nm, Gas::CarbonDioxide).expect("in range")
            / rayleigh_cross_section_m2(wavelength_nm, Gas::Air).expect("in range");
        assert!((2.35..2.7).contains(&ratio), "{wavelength_nm}: {ratio}");
    }
}

#[test]
fn the_dome_agrees_with_plane_parallel_two_streams_and_all_orders() {
    for (star_k, altitude_deg, ground_albedo, expected, two_streams) in DOMES {
        let found = sky_under(*star_k, *altitude_deg, Atmosphere { ground_albedo: *ground_albedo, ..ONE_BAR });
        let tolerance = if *two_streams { 4e-4 } else { 2.2e-3 };
        assert_at(found.dome, *expected, tolerance, &format!("{star_k} K at {altitude_deg}, A {ground_albedo}"));
    }
}

#[test]
fn the_zenith_scattered_once_agrees() {
    for (star_k, altitude_deg, expected) in ZENITHS {
        let found = sky_under(*star_k, *altitude_deg, ONE_BAR).zenith_scattered_once.expect("thin air");
        assert_at(found, *expected, 4e-4, &format!("{star_k} K at {altitude_deg}"));
    }
}

#[test]
fn the_disc_reddens_as_computed_outside() {
    for (star_k, air_masses, expected, hex) in DISCS {
        let found = light_through_air(*star_k, 1361.0, &ONE_BAR, *air_masses).expect("in range");
        assert_at(found, *expected, 1.5e-4, &format!("{star_k} K through {air_masses}"));
        let shown = screen_colour(found).expect("light").hex();
        for start in [1, 3, 5] {
            let channel = |text: &str| i32::from_str_radix(&text[start..start + 2], 16).expect("hexadecimal");
            assert!((channel(&shown) - channel(hex)).abs() <= 1, "{star_k} K through {air_masses}: {shown} {hex}");
        }
    }
}

/// Two streams at 1013.25 hPa over black ground, computed outside in plane-parallel air: at 5° of altitude the
/// curved path used here differs by 0.005.
#[test]
fn low_and_thick_skies_agree() {
    let black = Atmosphere { ground_albedo: 0.0, ..Atmosphere::EARTH };
    assert_at(sky_under(5772.0, 45.0, black).dome, [0.2414, 0.2461], 5e-4, "45 deg");
    assert_at(sky_under(3000.0, 45.0, black).dome, [0.3409, 0.3571], 5e-4, "3000 K");
    assert_at(sky_under(5772.0, 5.0, black).dome, [0.2819, 0.3063], 6e-3, "5 deg");
    let bars = |surface_pressure_bar| Atmosphere { surface_pressure_bar, ..black };
    assert_at(sky_under(5772.0, 45.0, bars(10.0)).dome, [0.306, 0.338], 2e-3, "10 bar: white");
    assert_at(sky_under(5772.0, 45.0, bars(90.0)).dome, [0.420, 0.395], 1e-3, "90 bar: orange");
}

/// A clean sky under the Sun at 30°: 6700 lx from the dome and 55 300 lx from the disc of 133 100 lx above the air
/// (all orders of scattering, computed outside). Shares, because our blackbody Sun is 6 % dimmer.
#[test]
fn the_earths_sky_is_as_bright_as_it_should_be() {
    let found = sky_under(5772.0, 30.0, ONE_BAR);
    let above = found.star_above_air.y;
    assert!((above / 125_250.0 - 1.0).abs() < 2e-3, "{above}");
    assert!((found.direct_lx() / above / (55_300.0 / 133_100.0) - 1.0).abs() < 0.01, "{}", found.direct_lx());
    assert!((found.diffuse_lx() / above / (6700.0 / 133_100.0) - 1.0).abs() < 0.05, "{}", found.diffuse_lx());
}

/// Measured daylight (Janiczek & `DeYoung` 1987) carries dust and haze: a clean sky is brighter, the more so the longer
/// the path.
#[test]
fn clean_air_is_somewhat_brighter_than_measured_daylight() {
    for altitude_deg in [10.0, 30.0, 60.0, 90.0] {
        let clean = sky_under(5772.0, altitude_deg, Atmosphere::EARTH);
        let measured_lx =
            twilight(altitude_deg, clean.star_above_air.y).expect("in range").illuminance_lx.expect("daylight");
        let ratio = clean.total_lx() / measured_lx;
        assert!((0.9..1.75).contains(&ratio), "{altitude_deg}: {ratio}");
    }
}

/// Twilight ends at 3.4 lx (civil), 0.008 lx (nautical) and 6e-4 lx (astronomical): Explanatory Supplement to the
/// Astronomical Almanac (1992), section 9.3.
#[test]
fn twilight_is_as_dark_as_tabulated() {
    for (altitude_deg, expected_lx, tolerance) in
        [(0.0, 759.0, 0.01), (-6.0, 3.4, 0.05), (-12.0, 0.008, 0.06), (-18.0, 6.5e-4, 0.1)]
    {
        let found_lx = twilight(altitude_deg, 133_100.0).expect("in range").illuminance_lx.expect("light");
        assert!((found_lx / expected_lx - 1.0).abs() < tolerance, "{altitude_deg}: {found_lx}");
    }
}

/// The honest headline: to a daylight camera the sky of a red dwarf is beige, to an eye adapted to it blue.
#[test]
fn a_red_dwarfs_sky_has_two_true_colours() {
    let found = sky_under(2600.0, 30.0, ONE_BAR);
    let camera = seen(found.dome, found.star_above_air, Viewing::Camera).expect("light");
    let eye = seen(found.dome, found.star_above_air, Viewing::AdaptedEye).expect("light");
    assert!(camera.screen.srgb[0] > camera.screen.srgb[2] && eye.screen.srgb[2] > eye.screen.srgb[0]);
    assert_eq!((camera.name.hue, eye.name.hue), ("yellowish orange", "blue"));
    assert!((air_mass(30.0).expect("in range") - 1.994).abs() < 1e-3);
}
