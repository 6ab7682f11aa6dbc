//! The light of star and planets in `state` and `table`.

use crate::program::{DEMO, json, records, result};
use serde_json::Value;

const STAR_KEYS: [&str; 22] = [
    "peak_frequency_thz",
    "ultraviolet_fraction",
    "visible_fraction",
    "infrared_fraction",
    "exitance_w_m2",
    "luminous_efficacy_lm_w",
    "luminance_cd_m2",
    "luminous_flux_lm",
    "colour_u_prime",
    "colour_v_prime",
    "correlated_temperature_k",
    "colour_duv",
    "linear_rec709_red",
    "linear_p3_green",
    "linear_rec2020_blue",
    "colour_display_p3_hex",
    "dwarf_x",
    "dwarf_srgb_hex",
    "dwarf_difference_de00",
    "b_minus_v_mag",
    "bolometric_correction_mag",
    "absolute_visual_mag",
];
const PLANET_KEYS: [&str; 15] = [
    "illuminance_lx",
    "star_visual_mag",
    "star_over_half_degree",
    "par_photon_flux_umol_m2_s",
    "ultraviolet_a_w_m2",
    "ultraviolet_b_w_m2",
    "ultraviolet_c_w_m2",
    "ground_illuminance_lx",
    "sky_illuminance_lx",
    "sky_luminance_cd_m2",
    "sky_x",
    "sky_srgb_hex",
    "sky_colour",
    "sky_adapted_srgb_hex",
    "disc_srgb_hex",
];

fn planet<'a>(state: &'a Value, name: &str) -> &'a Value {
    let planets = state["planets"].as_array().expect("planets");
    planets.iter().find(|planet| planet["name"] == name).expect("there")
}

#[test]
fn state_tells_the_light_of_star_and_planets() {
    let state = json(["state", DEMO, "--at", "4.57Gyr", "--format", "json"]);
    for key in STAR_KEYS {
        assert!(!state["star"][key].is_null(), "{key}");
    }
    let talune = planet(&state, "Talune");
    for key in PLANET_KEYS {
        assert!(!talune[key].is_null(), "{key}");
    }
    let star = |key: &str| state["star"][key].as_f64().expect("a number");
    assert!((star("ultraviolet_fraction") + star("visible_fraction") + star("infrared_fraction") - 1.0).abs() < 1e-12);
    // The nominal Sun as a blackbody gives 125.3 klx at 1 au; this star is within a few per cent of it.
    let lux = talune["illuminance_lx"].as_f64().expect("a number");
    assert!((lux / 125_300.0 - 1.0).abs() < 0.03, "{lux}");
    // Torres 2010, AJ 140, 1158: V = −26.76 ± 0.03 for the Sun from 1 au.
    let visual_mag = talune["star_visual_mag"].as_f64().expect("a number");
    assert!((visual_mag + 26.76).abs() < 0.06, "{visual_mag}");
    assert_eq!(talune["sky_colour"], "light blue");
    // No air, no sky: black, with the reason in a note.
    let cindrel = planet(&state, "Cindrel");
    assert_eq!((cindrel["sky_luminance_cd_m2"].as_f64(), &cindrel["sky_colour"]), (Some(0.0), &Value::Null));
}

#[test]
fn no_figure_of_light_is_ever_no_number() {
    let ends = ["0", "5 Gyr", "1e12 yr", "1e14 yr"];
    for scenario in ["sunlike_five_worlds", "twelve_solar_masses_supernova", "two_solar_masses_survivors"] {
        for time in ends {
            let text = result(["state", &format!("demo:{scenario}"), "--at", time, "--format", "json"]);
            for odd in ["NaN", "nan", "inf", "Infinity"] {
                assert!(!text.contains(&format!(": {odd}")), "{scenario} at {time}: {odd}");
            }
        }
        let (header, rows) = records(&result(["table", &format!("demo:{scenario}"), "--points", "150"]));
        for row in &rows {
            for (key, cell) in header.iter().zip(row) {
                let is_number = cell.parse::<f64>().map_or(true, f64::is_finite);
                assert!(is_number, "{scenario}: {key} is {cell} at {} yr", row[0]);
            }
        }
    }
}

#[test]
fn a_table_tells_the_sky_with_its_units() {
    let text = result(["table", DEMO, "--points", "20", "--format", "ecsv"]);
    for described in [
        "{name: \"luminous_flux_lm\", unit: \"lm\", datatype: float64",
        "{name: \"talune_ground_illuminance_lx\", unit: \"lx\", datatype: float64",
        "{name: \"talune_par_photon_flux_umol_m2_s\", unit: \"umol/(m2 s)\", datatype: float64",
        "{name: \"talune_sky_adapted_colour\", datatype: string",
    ] {
        assert!(text.contains(described), "{described} is not in\n{text}");
    }
}

#[test]
fn along_a_life_hotter_is_bluer_and_radiates_as_the_fourth_power() {
    // Facts of the trade, common practice.
    let (header, rows) = records(&result(["table", DEMO, "--to", "8 Gyr", "--points", "30"]));
    let column = |name: &str| header.iter().position(|key| key == name).expect("a column");
    let figure = |row: &[String], name: &str| row[column(name)].parse::<f64>().expect("a number");
    for row in &rows {
        let temperature_k = figure(row, "effective_temperature_k");
        let exitance = figure(row, "exitance_w_m2");
        // All radiation of a square metre grows as the fourth power of temperature; σ of CODATA 2022.
        assert!((exitance / (5.670_374_419e-8 * temperature_k.powi(4)) - 1.0).abs() < 1e-9);
        let reference = (5806.0, 0.3259);
        let bluer = figure(row, "colour_x") < reference.1;
        assert!(
            (temperature_k - reference.0).abs() < 10.0 || bluer == (temperature_k > reference.0),
            "{temperature_k}"
        );
    }
}
