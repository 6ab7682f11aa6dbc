//! Figures are held to their promises here: sound XML, text as text, pictures of the same SVG, nothing from outside.

use super::canvas::{Area, Canvas};
use super::interior;
use super::picture::{Size, pdf, pixels, png};
use super::plot::{Plot, Subject, figure_svg};
use super::{Look, PictureProblem};
use crate::figure::InteriorPicture;
use crate::figure::interior::{LayerFigure, LayerScale};
use crate::physics::star::convective::{Layer, Profile};
use crate::system::{History, PlanetSpecification, StarSpecification, System, Water};
use resvg::usvg::roxmltree::Document;

const HOSTILE: &str = "\"/><script>alert(1)</script>&amp;]]>\u{202e}<!--";

fn history(star_name: &str, planet_name: &str) -> History {
    let star = StarSpecification { name: star_name.to_owned(), ..StarSpecification::default() };
    let planet = |name: String, semi_major_axis_au| PlanetSpecification {
        name,
        semi_major_axis_au,
        water: (semi_major_axis_au > 0.7).then(Water::default),
        ..PlanetSpecification::default()
    };
    let planets = vec![planet(planet_name.to_owned(), 0.4), planet(format!("{planet_name} 2"), 1.0)];
    History::compute(System { star, planets }).expect("computed")
}

fn svg(history: &History, title: &str, plot: &Plot, moment_yr: f64, look: Look, size: Size) -> String {
    figure_svg(&Subject::new(history, title, moment_yr), plot, size, look, "figure")
}

/// All text of an SVG, as a reader of XML finds it.
fn texts(svg: &str) -> Vec<String> {
    let document = Document::parse(svg).expect("well formed");
    let texts = document.descendants().filter(|node| node.has_tag_name("text"));
    texts.map(|node| node.text().unwrap_or_default().to_owned()).collect()
}

#[test]
fn every_plot_is_sound_at_every_stage_of_a_life_in_each_look_and_shape() {
    let history = history("Ember", "Kell");
    let end_yr = history.shown_until_yr();
    for (key, plot) in Plot::all() {
        for moment_yr in [0.0, 4.57e9, 1.22e10, end_yr, 1e14] {
            for (look, sides) in [(Look::Light, [960, 600]), (Look::Dark, [200, 200]), (Look::Light, [3000, 400])] {
                let size = Size::new(sides[0], sides[1]).expect("allowed");
                let svg = svg(&history, "A test", &plot, moment_yr, look, size);
                let found = texts(&svg);
                assert!(found.iter().any(|text| text.starts_with("A test · ")), "{key}: {found:?}");
                assert!(found.iter().any(|text| text.starts_with("Longember ")), "{key}: {found:?}");
                for foreign in ["NaN", "\"inf", " inf\"", "<script", "href", "<image", "<style"] {
                    assert!(!svg.contains(foreign), "{key} at {moment_yr} holds {foreign}");
                }
            }
        }
    }
}

#[test]
fn labels_stay_on_the_page() {
    let history = history("Ember", "Kell");
    for (key, plot) in Plot::all() {
        let svg = svg(&history, "A test", &plot, 4.57e9, Look::Light, Size::default());
        let document = Document::parse(&svg).expect("well formed");
        for node in document.descendants().filter(|node| node.has_tag_name("text")) {
            let number = |name| node.attribute(name).and_then(|text| text.parse::<f64>().ok()).expect("a number");
            let words = node.text().unwrap_or_default();
            if node.attribute("transform").is_some() {
                continue;
            }
            let wide = super::fonts::width(words, number("font-size"), node.attribute("font-weight").is_some());
            let left = match node.attribute("text-anchor") {
                Some("middle") => number("x") - 0.5 * wide,
                Some("end") => number("x") - wide,
                _ => number("x"),
            };
            assert!(left >= 0.0 && left + wide <= 960.0, "{key}: {words} from {left} to {}", left + wide);
            assert!((8.0..=600.0).contains(&number("y")), "{key}: {words}");
        }
    }
}

/// A star with a mixed envelope about a core at rest.
fn layers() -> Profile {
    let layer = |place: f64| Layer {
        mass_above_fraction: 1.0 - place,
        radius_fraction: place.cbrt(),
        temperature_k: 4e6 * (1.001 - place),
        density_g_cm3: 400.0 * (1.001 - place),
        pressure_bar: 1e11 * (1.001 - place),
        luminosity_fraction: place,
        hydrogen_fraction: 0.7,
        helium3_fraction: 0.01,
        helium4_fraction: 0.27,
        degeneracy_ratio: 3.0 * (1.001 - place),
        is_convective: place > 0.4,
    };
    Profile { age_yr: 1e9, layers: (0..=60).map(|step| layer(f64::from(step) / 60.0)).collect() }
}

#[test]
fn the_inside_of_a_star_has_six_panels_and_says_what_is_mixed_in_every_shape() {
    for scale in LayerScale::ALL {
        let picture = InteriorPicture::new(&layers(), scale, &LayerFigure::ALL);
        for sides in [[560.0, 430.0], [960.0, 700.0], [3000.0, 430.0]] {
            let mut canvas = Canvas::new("figure");
            let area = Area { left: 24.0, top: 60.0, right: sides[0] - 24.0, bottom: sides[1] - 80.0 };
            interior::draw(&mut canvas, area, &picture, Look::Light.palette());
            let svg = canvas.document(sides, [960, 600], "Inside", "A test");
            let found = texts(&svg);
            assert!(!svg.contains("NaN"), "{scale:?} {sides:?}");
            assert!(found.iter().any(|text| text.contains(scale.title())), "{found:?}");
            let panels = LayerFigure::ALL.iter().filter(|figure| found.iter().any(|text| text == figure.title()));
            assert!(panels.count() == 6 || sides[0] < 700.0, "{found:?}");
            let drawn = pixels(&svg, Size::new(960, 600).expect("allowed")).expect("drawn");
            assert!(drawn.chunks_exact(3).any(|pixel| pixel.iter().all(|part| *part < 60)), "ink");
        }
        let words: Vec<String> = interior::entries(&picture).into_iter().map(|entry| entry.words).collect();
        assert_eq!(
            words,
            [
                "mixed: gas rises and sinks",
                "Composition: hydrogen",
                "helium",
                "helium-3, ten times",
                "degenerate above"
            ]
        );
    }
}

#[test]
fn a_climate_has_its_parts_and_words_stand_where_there_is_none() {
    let history = history("Ember", "Kell");
    let drawn = |planet| {
        let subject = Subject { planet: Some(planet), ..Subject::new(&history, "A test", 4.57e9) };
        texts(&figure_svg(&subject, &Plot::Climate, Plot::Climate.usual_size(), Look::Dark, "figure"))
    };
    let wet = drawn(1);
    for part in
        ["The climate of Kell 2", "Surface temperature by latitude, K", "equator", "from ice", "open water lasts"]
    {
        assert!(wet.iter().any(|text| text == part), "{part}: {wet:?}");
    }
    let dry = drawn(0);
    assert!(dry.iter().any(|text| text.starts_with("No climate by latitude.")), "{dry:?}");
    assert!(!dry.iter().any(|text| text == "from ice"), "{dry:?}");
    let usual =
        figure_svg(&Subject::new(&history, "A test", 4.57e9), &Plot::Climate, Size::default(), Look::Light, "f");
    assert!(usual.contains("The climate of Kell 2"), "the first with water");
}

#[test]
fn hostile_names_stay_text() {
    let history = history(HOSTILE, HOSTILE);
    for (key, plot) in Plot::all() {
        let svg = svg(&history, HOSTILE, &plot, 4.57e9, Look::Light, Size::new(3000, 1200).expect("allowed"));
        let document = Document::parse(&svg).expect("well formed");
        assert!(document.descendants().all(|node| !node.has_tag_name("script") && !node.is_comment()), "{key}");
        let shown = HOSTILE.replace('\u{202e}', "");
        assert!(texts(&svg).iter().any(|text| text.contains(&shown)), "{key}");
        assert!(pixels(&svg, Size::default()).is_ok(), "{key}");
    }
}

#[test]
fn signs_of_any_script_are_drawn_without_trouble() {
    let history = history(&"\u{1F600}".repeat(60), "\u{661F}");
    let svg = svg(&history, &"\u{1FA90}".repeat(120), &Plot::LifeStrip, 4.57e9, Look::Dark, Size::default());
    assert!(pixels(&svg, Size::default()).is_ok() && pdf(&svg).is_ok());
}

#[test]
fn a_png_holds_what_is_drawn_of_the_svg_and_says_it_is_srgb() {
    let history = history("Ember", "Kell");
    let size = Size::new(700, 450).expect("allowed");
    let svg = svg(&history, "A test", &Plot::Spectrum, 4.57e9, Look::Light, size);
    let bytes = png(&svg, size).expect("drawn");
    assert!(bytes.windows(4).any(|window| window == b"sRGB"));
    let picture = image::load_from_memory(&bytes).expect("a PNG");
    assert_eq!((picture.width(), picture.height(), picture.color()), (700, 450, image::ColorType::Rgb8));
    let frame = picture.into_bytes();
    assert_eq!(frame, pixels(&svg, size).expect("drawn"));
    // Something is drawn: white paper, dark text, and the colours of the visible band.
    let has = |wanted: fn(&[u8]) -> bool| frame.chunks_exact(3).any(wanted);
    assert!(has(|pixel| pixel == [255, 255, 255]) && has(|pixel| pixel.iter().all(|part| *part < 60)));
    assert!(has(|pixel| pixel[2] > 200 && pixel[0] < 80) && has(|pixel| pixel[0] > 200 && pixel[2] < 40));
}

#[test]
fn a_pdf_is_one_page_that_carries_its_fonts() {
    let history = history("Ember", "Kell");
    let svg = svg(&history, "A test", &Plot::Spectrum, 4.57e9, Look::Light, Size::default());
    let bytes = pdf(&svg).expect("written");
    assert!(bytes.starts_with(b"%PDF-1.") && bytes.trim_ascii_end().ends_with(b"%%EOF"));
    let has = |name: &[u8]| bytes.windows(name.len()).any(|window| window == name);
    // 960 and 600 pixels at 96 an inch are 720 and 450 points; a map to Unicode makes the text searchable.
    assert!(has(b"/MediaBox [0 0 720 450]") && has(b"NotoSans-Regular") && has(b"/ToUnicode"));
}

#[test]
fn sizes_beyond_what_can_be_drawn_are_refused_with_the_range() {
    for sides in [[99, 600], [600, 0], [16_385, 600], [16_384, 16_384]] {
        let problem = Size::new(sides[0], sides[1]).expect_err("refused");
        assert!(matches!(problem, PictureProblem::Size { .. }));
        assert!(problem.to_string().contains("allowed sides of 100 to 16384"), "{problem}");
    }
    assert!(Size::new(16_384, 6000).is_ok());
}
