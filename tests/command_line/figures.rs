//! `figure`: plots as SVG, PNG and PDF.

use crate::program::{DEMO, command, names_in, refusal, result};
use std::path::Path;

fn write(words: &[&str], out: &Path) {
    let output = command().args(words).arg("--out").arg(out).output().expect("the program runs");
    let messages = String::from_utf8(output.stderr).expect("UTF-8");
    assert_eq!((output.status.code(), messages.as_str(), output.stdout.len()), (Some(0), "", 0));
}

#[test]
fn a_figure_goes_to_standard_output_as_svg() {
    let svg = result(["figure", DEMO, "--plot", "distance", "--at", "4.57Gyr"]);
    assert!(svg.starts_with("<svg ") && svg.ends_with("</svg>\n"));
    for words in ["Distances from Veldane", "Five worlds of a star like the Sun · 4.570 Gyr", "habitable zone"] {
        assert!(svg.contains(words), "{words}");
    }
    assert_eq!(svg, result(["figure", DEMO, "--plot", "distance", "--at", "4.57Gyr"]), "stable from run to run");
}

#[test]
fn the_end_of_a_file_s_name_decides_its_form_and_existing_files_stay() {
    let folder = tempfile::tempdir().expect("a folder");
    let words = ["figure", DEMO, "--plot", "life_strip", "--size", "640x400"];
    for (name, start) in [("a.svg", &b"<svg "[..]), ("a.png", b"\x89PNG\r\n"), ("a.PDF", b"%PDF-")] {
        let out = folder.path().join(name);
        write(&words, &out);
        assert!(std::fs::read(&out).expect("written").starts_with(start), "{name}");
    }
    let picture = image::open(folder.path().join("a.png")).expect("a picture");
    assert_eq!((picture.width(), picture.height()), (640, 400));
    let there = folder.path().join("a.png");
    let before = std::fs::read(&there).expect("there");
    let out = there.to_str().expect("UTF-8");
    assert!(refusal([&words[..], &["--out", out]].concat(), 4).contains("--force"));
    assert_eq!(std::fs::read(&there).expect("there"), before);
    assert_eq!(names_in(folder.path()), ["a.PDF", "a.png", "a.svg"]);
    assert!(refusal([&words[..], &["--out", "figure.bmp"]].concat(), 2).contains(".svg, .pdf and .png"));
}

#[test]
fn what_can_t_be_drawn_is_refused_with_what_can() {
    let finished = crate::program::run(["figure", DEMO, "--plot", "pie"]);
    assert_eq!(finished.code, 2);
    for name in ["curves", "distance", "spectrum", "life_strip", "orbits_log", "sky", "climate", "interior"] {
        assert!(finished.messages.contains(name), "{}", finished.messages);
    }
    let words = ["figure", DEMO, "--plot", "sky"];
    assert!(refusal([&words[..], &["--planet", "Nobody"]].concat(), 3).contains("Talune"));
    assert!(refusal([&words[..], &["--size", "60000x60000"]].concat(), 3).contains("16384"));
    assert!(refusal([&words[..], &["--at", "-1Gyr"]].concat(), 3).contains("allowed 0 to"));
}

#[test]
fn a_climate_is_that_of_the_planet_named() {
    let words = ["figure", DEMO, "--plot", "climate", "--at", "4.57Gyr"];
    let usual = result(words);
    for part in ["The climate of ", "Surface temperature by latitude, K", "from open water", "ice thaws"] {
        assert!(usual.contains(part), "{part}");
    }
    let named = result([&words[..], &["--planet", "Talune"]].concat());
    assert!(named.contains("The climate of Talune"));
    assert!(refusal([&words[..], &["--planet", "Nobody"]].concat(), 3).contains("Talune"));
}

#[test]
fn a_star_without_layers_says_why() {
    let svg = result(["figure", DEMO, "--plot", "interior"]);
    assert!(svg.contains("No layers to show: this star follows published fits"), "{svg}");
}

#[test]
fn every_plot_of_every_built_in_scenario_is_drawn() {
    // Red dwarfs take seconds to compute; the drawing of their plots is the same.
    let quick = result(["demo"]);
    let names = quick.lines().filter_map(|line| line.split_whitespace().next());
    let names: Vec<&str> =
        names.filter(|name| !name.contains("dwarf") && !name.contains("tenth") && !name.contains("late")).collect();
    assert!(names.len() >= 8, "{names:?}");
    for name in names {
        for plot in ["curves", "mass", "life_strip", "spectrum", "orbits", "sky", "climate", "interior"] {
            let svg = result(["figure", &format!("demo:{name}"), "--plot", plot, "--at", "event:\"largest radius\""]);
            assert!(svg.ends_with("</svg>\n") && svg.len() > 1000, "{name} {plot}");
        }
    }
}
