//! Correlated temperature, adaptation and real dwarfs' colours against published and outside values.

use super::light_dwarf_rows::COLOURS;
use colorimetry::illuminant::CCT;
use colorimetry::xyz::XYZ;
use longember::physics::light::{
    Chromaticity, WHITE_D65, adapted, blackbody_tristimulus, correlated_temperature, measured_dwarf_colour,
};

/// CIE 15:2018, table of illuminants: A 2856 K (x 0.44758, y 0.40745), D50 5003 K (0.34567, 0.35851), D65 6504 K
/// (0.31272, 0.32903), D75 7504 K (0.29903, 0.31488). Duv of daylight +0.003: Ohno (2014), LEUKOS 10, 47.
#[test]
fn standard_illuminants_have_their_correlated_temperature() {
    for (x, y, expected_k, expected_duv) in [
        (0.447_58, 0.407_45, 2856.0, 0.0),
        (0.345_67, 0.358_51, 5003.0, 0.003_2),
        (0.312_72, 0.329_03, 6504.0, 0.003_2),
        (0.299_03, 0.314_88, 7504.0, 0.003_1),
    ] {
        let found = correlated_temperature(Chromaticity { x, y }).expect("near the locus");
        assert!((found.temperature_k / expected_k - 1.0).abs() < 1e-3, "{found:?}");
        assert!((found.duv - expected_duv).abs() < 2e-4, "{found:?}");
    }
}

/// The crate `colorimetry` (Robertson's method with 4096 lines, its own observer table cut at 380 and 780 nm).
#[test]
fn an_independent_crate_finds_the_same_temperature() {
    for (temperature_k, shift) in [(1500.0, 0.0), (2856.0, 0.01), (4000.0, -0.01), (5772.0, 0.006), (9000.0, 0.0)] {
        let on_locus = blackbody_tristimulus(temperature_k).expect("in range").chromaticity().expect("light");
        let colour = Chromaticity { x: on_locus.x, y: on_locus.y + shift };
        let ours = correlated_temperature(colour).expect("near the locus");
        let unit = colour.tristimulus().expect("y is positive");
        let theirs = CCT::from_xyz(XYZ::new(unit.to_array(), colorimetry::observer::Observer::Cie1931)).expect("near");
        assert!((ours.temperature_k / theirs.t() - 1.0).abs() < 2e-3, "{ours:?} {}", theirs.t());
        assert!((ours.duv - theirs.d()).abs() < 2e-4, "{ours:?} {}", theirs.d());
    }
}

/// Real spectra (Pickles 1998), their chromaticity, nearest sRGB, difference from the blackbody and correlated
/// temperature as computed outside this program.
#[test]
fn measured_dwarfs_have_their_colours() {
    for (spectral_type, temperature_k, [x, y], hex, [bb_x, bb_y], difference, cct_k, duv) in COLOURS {
        let found = measured_dwarf_colour(*temperature_k).expect("in range");
        assert_eq!(found.nearest_type, *spectral_type);
        assert!((found.chromaticity.x - x).abs() < 1e-9 && (found.chromaticity.y - y).abs() < 1e-9);
        let blackbody = found.blackbody_chromaticity;
        assert!((blackbody.x - bb_x).abs() < 6e-5 && (blackbody.y - bb_y).abs() < 6e-5, "{spectral_type}");
        assert!((found.difference_de00 - difference).abs() < 0.1, "{spectral_type}: {}", found.difference_de00);
        for start in [1, 3, 5] {
            let channel = |text: &str| i32::from_str_radix(&text[start..start + 2], 16).expect("hexadecimal");
            // Four decimals of x, y are worth one or two steps of blue.
            assert!((channel(&found.screen.hex()) - channel(hex)).abs() <= 2, "{spectral_type} {}", found.screen.hex());
        }
        if *cct_k < 20_000.0 {
            let near = correlated_temperature(found.chromaticity).expect("near the locus");
            assert!((near.temperature_k / cct_k - 1.0).abs() < 3e-3, "{spectral_type}: {near:?}");
            assert!((near.duv - duv).abs() < 1e-4, "{spectral_type}: {near:?}");
        }
    }
}

/// Harre & Heller (2021), Astronomische Nachrichten 342, 578, abstract: no star is yellow, green, cyan or purple.
#[test]
fn no_dwarf_is_green_or_purple() {
    for (_, _, [x, y], ..) in COLOURS {
        let light = Chromaticity { x: *x, y: *y }.tristimulus().expect("y is positive");
        let name = longember::physics::light::colour_name(light).expect("light").to_string();
        assert!(!["green", "purple", "violet"].iter().any(|hue| name.contains(hue)), "{name}");
    }
}

/// Clear-sky zenith colours before and after full CAT16 adaptation (Li et al. 2017) to the star, computed outside.
#[test]
fn adaptation_moves_the_sky_as_computed_outside() {
    for (star_k, zenith, expected) in [
        (2600.0, [0.3721, 0.3795], [0.2189, 0.2354]),
        (4000.0, [0.2807, 0.2977], [0.2221, 0.2315]),
        (5772.0, [0.2380, 0.2407], [0.2269, 0.2313]),
        (10_000.0, [0.2087, 0.1903], [0.2336, 0.2317]),
    ] {
        let star = blackbody_tristimulus(star_k).expect("in range").chromaticity().expect("light");
        let light = Chromaticity { x: zenith[0], y: zenith[1] }.tristimulus().expect("y is positive");
        let found = adapted(light, star, 1.0).chromaticity().expect("light");
        assert!((found.x - expected[0]).abs() < 3e-4 && (found.y - expected[1]).abs() < 3e-4, "{star_k} K: {found:?}");
    }
}

/// A blackbody of the temperature of D65 is faintly lilac on a D65 screen, since daylight is no blackbody.
#[test]
fn a_blackbody_is_never_exactly_the_display_white() {
    let nearest = correlated_temperature(WHITE_D65).expect("near the locus");
    let hex = longember::physics::light::blackbody_swatch(nearest.temperature_k).hex();
    assert_eq!(hex, "#fff9fe");
}

/// CIE 15, spectral locus of the 1931 observer: 460 nm (0.1440, 0.0297), 520 nm (0.0743, 0.8338), 580 nm (0.5125,
/// 0.4866), 700 nm (0.7347, 0.2653).
#[test]
fn spectral_colours_lie_on_the_locus() {
    for (wavelength_nm, [x, y]) in
        [(460.0, [0.1440, 0.0297]), (520.0, [0.0743, 0.8338]), (580.0, [0.5125, 0.4866]), (700.0, [0.7347, 0.2653])]
    {
        let light = longember::physics::light::monochromatic(wavelength_nm).expect("in range");
        let found = light.chromaticity().expect("light");
        assert!((found.x - x).abs() < 6e-5 && (found.y - y).abs() < 6e-5, "{wavelength_nm}: {found:?}");
    }
}
