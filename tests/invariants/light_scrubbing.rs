//! What is read about light while the moment is dragged to and fro.

use longember::document::built_in;
use longember::physics::light::{
    Atmosphere, SkyScene, Viewing, blackbody_tristimulus, seen, sky, steady_colour_name, steady_colour_words,
};
use longember::system::planet_light::USUAL_ALTITUDE_DEG;
use longember::system::{History, LightReader};
use proptest::prelude::*;
use std::sync::LazyLock;

static HISTORY: LazyLock<History> =
    LazyLock::new(|| History::compute(built_in::demo().scenario().expect("sound").system).expect("a history"));

/// Every word about light at an age.
fn words(reader: &LightReader<'_>, age_yr: f64) -> Vec<String> {
    let moment = HISTORY.moment(age_yr);
    let light = reader.at(&moment);
    let skies = light.planets.iter().flat_map(|planet| {
        let sky = planet.as_ref().and_then(|planet| planet.sky.as_ref());
        Viewing::ALL.map(|viewing| {
            let seen = sky.and_then(|sky| seen(sky.dome, sky.star_above_air, viewing));
            seen.map_or_else(|| "black".to_owned(), |seen| seen.name.to_string())
        })
    });
    let notes = light.notes.iter().map(|note| note.text.clone());
    std::iter::once(moment.star.colour.to_owned()).chain(skies).chain(notes).collect()
}

/// How often a text changes in a row of them.
fn changes(texts: &[String]) -> usize {
    texts.windows(2).filter(|pair| pair[0] != pair[1]).count()
}

proptest! {
    #[test]
    fn words_do_not_depend_on_the_way_to_a_moment(places in prop::collection::vec(0.0..1.0_f64, 2..8)) {
        let reader = LightReader::new(&HISTORY, USUAL_ALTITUDE_DEG);
        let ages: Vec<f64> = places.iter().map(|place| place * HISTORY.shown_until_yr()).collect();
        let there: Vec<_> = ages.iter().map(|age_yr| words(&reader, *age_yr)).collect();
        let mut back: Vec<_> = ages.iter().rev().map(|age_yr| words(&reader, *age_yr)).collect();
        back.reverse();
        prop_assert_eq!(there, back);
    }

    #[test]
    fn a_shaking_hand_changes_a_word_at_most_once(
        temperature_k in 800.0..60_000.0_f64, shakes in prop::collection::vec(-5e-4..5e-4_f64, 3..40),
    ) {
        let mut shown: Option<&'static str> = None;
        let mut names = Vec::new();
        let mut skies = Vec::new();
        let (mut star_name, mut sky_name) = (None, None);
        let mut star_words = Vec::new();
        for shake in shakes {
            let temperature_k = temperature_k * (1.0 + shake);
            shown = Some(steady_colour_words(shown, temperature_k));
            star_words.extend(shown.map(str::to_owned));
            star_name = steady_colour_name(star_name, blackbody_tristimulus(temperature_k).expect("in range"));
            names.extend(star_name.map(|name| name.to_string()));
            let scene = SkyScene {
                star_temperature_k: temperature_k,
                irradiance_w_m2: 1000.0,
                altitude_deg: USUAL_ALTITUDE_DEG,
                atmosphere: Atmosphere::EARTH,
            };
            sky_name = steady_colour_name(sky_name, sky(&scene).expect("in range").dome);
            skies.extend(sky_name.map(|name| name.to_string()));
        }
        for texts in [&star_words, &names, &skies] {
            prop_assert!(changes(texts) <= 1, "{:?}", texts);
        }
    }

    #[test]
    fn every_figure_of_light_is_a_number_at_any_age(exponent in 0.0..14.0_f64) {
        let reader = LightReader::new(&HISTORY, USUAL_ALTITUDE_DEG);
        let light = reader.at(&HISTORY.moment(10.0_f64.powf(exponent)));
        if let Some(star) = &light.star {
            for quantity in longember::system::light_quantities::STAR_LIGHT {
                prop_assert!((quantity.value)(star).is_none_or(f64::is_finite), "{}", quantity.key);
            }
        }
        for planet in light.planets.iter().flatten() {
            for quantity in longember::system::light_quantities::PLANET_LIGHT {
                prop_assert!((quantity.value)(planet).is_none_or(f64::is_finite), "{}", quantity.key);
            }
        }
    }
}
