//! Blackbody light against an outside computation and two public crates.

use super::light_blackbody_rows::{ROWS, Row};
use color::ColorSpace;
use colorimetry::observer::Observer::Cie1931;
use longember::physics::light::{
    Chromaticity, Glow, OBSERVER, RgbSpace, Tristimulus, band_shares, blackbody_swatch, blackbody_tristimulus,
    colour_words, energy_share, largest_channel_one, luminance_cd_m2, luminous_efficacy_lm_w, observer_wavelengths_nm,
    screen_colour, spectral_exitance_w_m2_nm, spectral_radiance_w_m2_sr_nm, total_exitance_w_m2, wien_peak_nm,
};

fn light(row: &Row) -> Tristimulus {
    blackbody_tristimulus(row.temperature_k).expect("in range")
}

fn channels(hex: &str) -> [i32; 3] {
    [1, 3, 5].map(|start| i32::from_str_radix(&hex[start..start + 2], 16).expect("two hexadecimal digits"))
}

fn within_one_step(found: &str, expected: &str) -> bool {
    channels(found).iter().zip(channels(expected)).all(|(found, expected)| (found - expected).abs() <= 1)
}

#[test]
fn chromaticity_agrees_to_a_hundred_thousandth() {
    for row in &ROWS {
        let found = light(row).chromaticity().expect("light");
        let [u, v] = found.u_v_prime();
        for (found, expected) in
            [(found.x, row.xy[0]), (found.y, row.xy[1]), (u, row.uv_prime[0]), (v, row.uv_prime[1])]
        {
            // Below the Draper point nothing is seen, and the steep spectrum asks more of 5 nm steps.
            let tolerance = if row.temperature_k < 798.0 { 2e-5 } else { 1e-5 };
            assert!((found - expected).abs() < tolerance, "{} K: {found} {expected}", row.temperature_k);
        }
    }
}

#[test]
fn linear_rgb_agrees_in_three_spaces() {
    for row in &ROWS {
        for (space, expected) in RgbSpace::ALL.into_iter().zip([row.rec709, row.p3, row.rec2020]) {
            let found = largest_channel_one(space.linear(light(row))).expect("light");
            for channel in 0..3 {
                let gap = (found[channel] - expected[channel]).abs();
                assert!(gap < 3e-5, "{} K, {}: {found:?} {expected:?}", row.temperature_k, space.name());
            }
        }
    }
}

#[test]
fn screen_colours_agree_to_one_step() {
    for row in &ROWS {
        let found = screen_colour(light(row)).expect("light");
        assert!(within_one_step(&found.hex(), row.hex), "{} K: {} {}", row.temperature_k, found.hex(), row.hex);
        assert_eq!(found.in_srgb_gamut, row.in_srgb, "{} K", row.temperature_k);
        let swatch = blackbody_swatch(row.temperature_k);
        if row.temperature_k < 798.0 {
            assert_eq!((swatch.glow, swatch.srgb), (Glow::None, [0, 0, 0]));
        } else {
            assert_eq!(swatch.srgb, found.srgb);
        }
    }
}

#[test]
fn shares_luminance_and_efficacy_agree() {
    for row in &ROWS {
        let shares = band_shares(row.temperature_k).expect("in range");
        for (found, expected) in [shares.ultraviolet, shares.visible, shares.infrared].into_iter().zip(row.shares) {
            assert!((found / expected - 1.0).abs() < 2e-6, "{} K: {found} {expected}", row.temperature_k);
        }
        // At 300 K, 500 K below any glow, 5 nm steps are 1.5 % off.
        let relative = if row.temperature_k < 798.0 { 2e-2 } else { 2e-5 };
        let luminance = luminance_cd_m2(row.temperature_k).expect("in range");
        assert!((luminance / row.luminance_cd_m2 - 1.0).abs() < relative, "{} K: {luminance}", row.temperature_k);
        // The table's efficacies have seven digits, but no more than five decimals from 0.01 on.
        let rounding = if row.efficacy_lm_w > 0.01 { 5e-6 } else { 0.0 };
        let efficacy = luminous_efficacy_lm_w(row.temperature_k).expect("in range");
        let gap = (efficacy - row.efficacy_lm_w).abs();
        assert!(gap < relative * row.efficacy_lm_w + rounding, "{} K: {efficacy}", row.temperature_k);
        let peak_nm = wien_peak_nm(row.temperature_k).expect("in range");
        assert!((peak_nm - row.wien_nm).abs() < 6e-4, "{peak_nm} {}", row.wien_nm);
    }
}

/// Chang & Rhee (1984), International Communications in Heat and Mass Transfer 11, 451, and the tables of any
/// heat-transfer textbook: F(0..λT) at λT = 2000, 2898, 4000, 6000, 10 000 µm K (common practice).
#[test]
fn cumulative_shares_are_the_textbook_ones() {
    for (product_um_k, expected) in
        [(2000.0, 0.066_728), (2898.0, 0.250_108), (4000.0, 0.480_877), (6000.0, 0.737_818), (10_000.0, 0.914_199)]
    {
        let found = energy_share(1e-3, product_um_k, 1000.0).expect("in range");
        assert!((found - expected).abs() < 2e-4, "{product_um_k}: {found}");
    }
}

/// Spectrum against its own integral by Stefan and Boltzmann.
#[test]
fn the_spectrum_integrates_to_sigma_t_to_the_fourth() {
    let temperature_k = 5772.0;
    // Even steps in the logarithm of wavelength from 50 nm to 1 mm: the trapezoidal rule converges geometrically.
    let step = 1e-3;
    let integral: f64 = (0..9900)
        .map(|index| {
            let wavelength_nm = 50.0 * (step * f64::from(index)).exp();
            step * wavelength_nm * spectral_exitance_w_m2_nm(wavelength_nm, temperature_k).expect("in range")
        })
        .sum();
    let expected = total_exitance_w_m2(temperature_k).expect("in range");
    assert!((integral / expected - 1.0).abs() < 1e-9, "{integral} {expected}");
}

/// ISO/CIE 11664-1:2019: the maximum of ȳ is 1 at 555 nm and the three functions enclose equal areas.
#[test]
fn the_observer_is_the_standard_one() {
    let at = |wavelength_nm: f64| {
        observer_wavelengths_nm().position(|row| row == wavelength_nm).map(|row| OBSERVER[row]).expect("a row")
    };
    assert_eq!(at(555.0), [0.512_050_1, 1.0, 0.005_749_999]);
    assert_eq!(at(445.0), [0.348_06, 0.029_8, 1.782_6]);
    assert_eq!(at(600.0), [1.062_2, 0.631, 0.000_8]);
    assert_eq!((observer_wavelengths_nm().last(), OBSERVER.len()), (Some(830.0), 95));
    // The sums over the abridged range 380 to 780 nm are 21.3714, 21.3711 and 21.3715 (CIE 15, from memory).
    for channel in 0..3 {
        let sum: f64 = OBSERVER[4..85].iter().map(|row| row[channel]).sum();
        assert!((sum - 21.371_3).abs() < 5e-4, "{channel}: {sum}");
    }
}

/// The crate `colorimetry` with our Planck function: its table ends at 380 and 780 nm, which moves y by 1.3e-4.
#[test]
fn an_independent_observer_table_agrees() {
    for row in ROWS.iter().filter(|row| row.temperature_k >= 798.0) {
        let theirs = Cie1931
            .xyz_from_fn(|unit| {
                spectral_radiance_w_m2_sr_nm(380.0 + 400.0 * unit, row.temperature_k).expect("in range")
            })
            .chromaticity();
        let ours = light(row).chromaticity().expect("light");
        assert!(
            (theirs.x() - ours.x).abs() < 1.5e-4 && (theirs.y() - ours.y).abs() < 1.5e-4,
            "{} K",
            row.temperature_k
        );
    }
}

/// The crate `color` carries its own f32 matrix from XYZ (D65) to linear sRGB.
#[test]
fn an_independent_matrix_agrees() {
    for row in &ROWS {
        let unit = light(row).chromaticity().and_then(Chromaticity::tristimulus).expect("light");
        #[expect(clippy::cast_possible_truncation, reason = "the crate computes in f32")]
        let theirs = color::XyzD65::to_linear_srgb(unit.to_array().map(|value| value as f32));
        let ours = RgbSpace::Rec709.linear(unit);
        for channel in 0..3 {
            assert!((f64::from(theirs[channel]) - ours[channel]).abs() < 2e-6 * ours[0].abs().max(1.0));
        }
    }
}

/// The luminous efficacy of a blackbody peaks at 95 lm/W near 6640 K: Murphy (2012), Journal of Applied
/// Physics 111, 104909 (95 lm/W at 6640 K).
#[test]
fn efficacy_peaks_where_published() {
    let at = |temperature_k| luminous_efficacy_lm_w(temperature_k).expect("in range");
    let peak_k = (6000..7200).map(f64::from).max_by(|one, other| at(*one).total_cmp(&at(*other))).expect("a peak");
    assert!((peak_k - 6630.0).abs() < 15.0, "{peak_k}");
    assert!((at(peak_k) - 95.43).abs() < 0.01, "{}", at(peak_k));
}

/// The lamp trade calls light below 3300 K warm and above 5300 K cool (ISO/CIE 8995-1:2013).
#[test]
fn words_do_not_contradict_the_lamp_trade() {
    for temperature_k in [1600.0, 2700.0, 3299.0] {
        assert!(colour_words(temperature_k).contains("orange"));
    }
    for temperature_k in [5800.0, 6500.0, 7000.0] {
        assert_eq!(colour_words(temperature_k), "white");
    }
    for temperature_k in [7200.0, 12_000.0, 100_000.0] {
        assert!(colour_words(temperature_k).contains("blu"));
    }
}
