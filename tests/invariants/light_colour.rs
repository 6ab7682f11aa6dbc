//! What holds for the colour of any temperature and any light.

use longember::physics::light::{
    Glow, Strength, Tristimulus, adapted, band_shares, blackbody_swatch, blackbody_tristimulus, colour_name,
    colour_words, correlated_temperature, energy_share, in_gamut, into_srgb_gamut, luminance_cd_m2,
    measured_dwarf_colour, photon_share, screen_colour, steady_colour_words,
};
use proptest::prelude::*;

proptest! {
    #[test]
    fn any_number_has_a_swatch(temperature_k in prop_oneof![any::<f64>(), 0.0..3e5_f64]) {
        let swatch = blackbody_swatch(temperature_k);
        prop_assert!(swatch.effective_temperature_k.is_finite());
        prop_assert!(swatch.linear_rec709.iter().all(|channel| channel.is_finite()));
        prop_assert_eq!(swatch.hex().len(), 7);
        prop_assert!(!colour_words(temperature_k).is_empty());
        if swatch.glow == Glow::None {
            prop_assert!(swatch.chromaticity.is_none() && swatch.srgb == [0, 0, 0]);
            prop_assert_eq!(colour_words(temperature_k), "no visible glow");
        } else {
            let [x, y] = swatch.chromaticity.expect("what glows has a colour");
            prop_assert!(x > 0.2 && y > 0.2 && x + y < 1.0);
            let largest = swatch.linear_rec709.iter().copied().fold(f64::MIN, f64::max);
            prop_assert!((largest - 1.0).abs() < 1e-12);
            prop_assert_eq!(swatch.srgb.into_iter().max(), Some(255));
        }
    }

    #[test]
    fn hotter_is_bluer_and_brighter(temperature_k in 800.0..3e5_f64, factor in 1.01..2.0_f64) {
        let (cool, hot) = (blackbody_swatch(temperature_k), blackbody_swatch(temperature_k * factor));
        let ratio = |linear: [f64; 3]| linear[2] / linear[0];
        prop_assert!(ratio(hot.linear_rec709) > ratio(cool.linear_rec709) || temperature_k < 1300.0);
        prop_assert!(hot.chromaticity.expect("glows")[0] < cool.chromaticity.expect("glows")[0]);
        let luminance = |temperature_k| luminance_cd_m2(temperature_k).expect("in range");
        prop_assert!(luminance(temperature_k * factor) > luminance(temperature_k));
    }

    #[test]
    fn shares_add_up_and_lie_between_zero_and_one(temperature_k in 1.0..1e9_f64) {
        let shares = band_shares(temperature_k).expect("in range");
        for share in [shares.ultraviolet, shares.visible, shares.infrared] {
            prop_assert!((0.0..=1.0).contains(&share));
        }
        prop_assert!((shares.ultraviolet + shares.visible + shares.infrared - 1.0).abs() < 1e-12);
    }

    #[test]
    fn a_band_is_the_sum_of_its_parts(
        temperature_k in 100.0..1e6_f64, from_nm in 10.0..1000.0_f64, first in 1.01..5.0_f64, second in 1.01..5.0_f64,
    ) {
        let (middle_nm, to_nm) = (from_nm * first, from_nm * first * second);
        for share in [energy_share, photon_share] {
            let parts = share(from_nm, middle_nm, temperature_k).expect("in range")
                + share(middle_nm, to_nm, temperature_k).expect("in range");
            let whole = share(from_nm, to_nm, temperature_k).expect("in range");
            prop_assert!((parts - whole).abs() < 1e-13, "{} {}", parts, whole);
        }
    }

    #[test]
    fn mapping_ends_inside_the_gamut(linear in prop::array::uniform3(-2.0..3.0_f32)) {
        let mapped = into_srgb_gamut(linear);
        prop_assert!(in_gamut(mapped), "{:?}", mapped);
        prop_assert_eq!(into_srgb_gamut(mapped), mapped);
    }

    #[test]
    fn any_light_is_named_and_shown_alike_at_any_exposure(
        xyz in prop::array::uniform3(0.01..1.0_f64), exposure in -30_i32..30,
    ) {
        let [x, y, z] = xyz;
        let light = Tristimulus { x, y, z };
        // A power of two changes no digit, so that not even a light on the edge of a word may change.
        let exposed = light.scaled(2.0_f64.powi(exposure));
        prop_assert_eq!(screen_colour(light), screen_colour(exposed));
        prop_assert_eq!(colour_name(light), colour_name(exposed));
        if let Some(name) = colour_name(light) {
            prop_assert_eq!(name.to_string() == "white", name.strength == Strength::White);
        }
    }

    #[test]
    fn any_tristimulus_is_taken_without_complaint(xyz in prop::array::uniform3(any::<f64>()), degree in any::<f64>()) {
        let [x, y, z] = xyz;
        let light = Tristimulus { x, y, z };
        if let Some(shown) = screen_colour(light) {
            prop_assert!(shown.linear_rec709.iter().all(|channel| channel.is_finite()));
        }
        let _ = colour_name(light);
        if let Some(colour) = light.chromaticity() {
            prop_assert!(colour.x.is_finite() && colour.y.is_finite());
            let _ = correlated_temperature(colour);
            if let Some(unit) = colour.tristimulus() {
                let _ = adapted(unit, colour, degree);
            }
        }
    }

    #[test]
    fn a_point_beside_the_locus_finds_its_foot(inverse in 20.0..700.0_f64, duv in -0.0495..0.0495_f64) {
        let temperature_k = 1e6 / inverse;
        let uv = |temperature_k: f64| {
            blackbody_tristimulus(temperature_k).expect("in range").chromaticity().expect("light").u_v_1960()
        };
        let (here, hotter) = (uv(temperature_k), uv(temperature_k * 1.0001));
        let tangent = [hotter[0] - here[0], hotter[1] - here[1]];
        let length = tangent[0].hypot(tangent[1]);
        // The locus runs to smaller u as it grows hotter, so that this normal points up.
        let normal = [tangent[1] / length, -tangent[0] / length];
        let (u, v) = (here[0] + duv * normal[0], here[1] + duv * normal[1]);
        let colour = Tristimulus { x: 1.5 * u, y: v, z: 2.0 - 0.5 * u - 5.0 * v }.chromaticity().expect("light");
        // Deep red lies close to the spectrum's edge, beyond which there is no light.
        if colour.x + colour.y > 1.0 {
            return Ok(());
        }
        let found = correlated_temperature(colour).expect("near the locus");
        prop_assert!((found.temperature_k / temperature_k - 1.0).abs() < 2e-3, "{:?} {}", found, temperature_k);
        prop_assert!((found.duv - duv).abs() < 1e-5, "{:?} {}", found, duv);
    }

    #[test]
    fn measured_colours_are_real_or_refused(temperature_k in prop_oneof![any::<f64>(), 2000.0..5e4_f64]) {
        match measured_dwarf_colour(temperature_k) {
            Ok(found) => {
                prop_assert!((2850.0..=41_500.0).contains(&temperature_k));
                prop_assert!((0.0..12.0).contains(&found.difference_de00));
            }
            Err(refused) => prop_assert!(refused.to_string().contains("effective_temperature_k")),
        }
    }

    #[test]
    fn a_steady_word_is_at_most_one_cut_away(temperature_k in 798.0..5e4_f64, step in -0.001..0.001_f64) {
        let shown = colour_words(temperature_k);
        let next_k = temperature_k * (1.0 + step);
        if next_k >= 798.0 {
            prop_assert_eq!(steady_colour_words(Some(shown), next_k), shown);
        }
        prop_assert_eq!(steady_colour_words(None, next_k), colour_words(next_k));
    }
}
