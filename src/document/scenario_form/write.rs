//! Scenario to text.

use super::keys::{
    AIRS, CARBONS, CURRENT_VERSION, REDISTRIBUTIONS, SCENARIO, SURFACES, TIDES, TRANSITIONS, WATER_WORLD,
};
use crate::document::ron_text::{Writer, number_text};
use crate::document::scenario::Scenario;
use crate::physics::planet::{Greenhouse, Redistribution};
use crate::physics::star::convective::SurfaceOpacity;
use crate::system::cues::{Cue, Transition};
use crate::system::specification::{PlanetSpecification, StarSpecification};
use crate::system::statements::Statement;
use crate::system::{Air, Carbon, TidesChoice, Water};

/// Writes a scenario in its file form, every key in a fixed order, one a line.
///
/// A scenario without [problems](Scenario::problems) reads back to the same value.
#[must_use]
pub fn scenario_text(scenario: &Scenario) -> String {
    let mut writer = Writer::new();
    write_scenario_member(&mut writer, "", scenario);
    writer.finish()
}

/// Writes a scenario as a member of something larger.
pub(in crate::document) fn write_scenario_member(writer: &mut Writer, key: &str, scenario: &Scenario) {
    writer.open(key, SCENARIO, '(');
    writer.field("version", &CURRENT_VERSION.to_string());
    writer.string("title", &scenario.title);
    writer.paragraph("about", &scenario.about);
    write_star(writer, &scenario.system.star);
    writer.open("planets", "", '[');
    for planet in &scenario.system.planets {
        write_planet(writer, planet);
    }
    writer.close(']');
    write_statements(writer, &scenario.statements);
    write_cues(writer, &scenario.cues);
    writer.close(')');
}

/// Where nothing is stated, nothing is written.
fn write_statements(writer: &mut Writer, statements: &[Statement]) {
    if statements.is_empty() {
        return;
    }
    writer.open("statements", "", '[');
    for statement in statements {
        writer.open("", "", '(');
        writer.paragraph("claim", &statement.line());
        writer.paragraph("note", &statement.note);
        writer.close(')');
    }
    writer.close(']');
}

/// A show that has no cue yet takes no line.
fn write_cues(writer: &mut Writer, cues: &[Cue]) {
    if cues.is_empty() {
        return;
    }
    writer.open("cues", "", '[');
    for cue in cues {
        writer.open("", "", '(');
        writer.number("show_time_s", cue.show_time_s);
        writer.string("moment", &cue.moment.text());
        writer.field("transition", transition_text(cue.transition));
        writer.paragraph("note", &cue.note);
        writer.close(')');
    }
    writer.close(']');
}

fn transition_text(transition: Transition) -> &'static str {
    match transition {
        Transition::Cut => TRANSITIONS[0],
        Transition::Steady => TRANSITIONS[1],
        Transition::SteadyLog => TRANSITIONS[2],
        Transition::Paced => TRANSITIONS[3],
    }
}

fn write_star(writer: &mut Writer, star: &StarSpecification) {
    writer.open("star", "", '(');
    writer.string("name", &star.name);
    writer.number("mass_msun", star.mass_msun);
    writer.number("metallicity_dex", star.metallicity_dex);
    writer.number("present_age_yr", star.present_age_yr);
    writer.field("red_dwarf_surface", surface_text(star.red_dwarf_surface));
    writer.close(')');
}

fn write_planet(writer: &mut Writer, planet: &PlanetSpecification) {
    writer.open("", "", '(');
    writer.string("name", &planet.name);
    writer.number("semi_major_axis_au", planet.semi_major_axis_au);
    writer.number("eccentricity", planet.eccentricity);
    writer.number("mass_mearth", planet.mass_mearth);
    writer.number("radius_rearth", planet.radius_rearth);
    writer.number("bond_albedo", planet.bond_albedo);
    writer.field("redistribution", redistribution_text(planet.redistribution));
    writer.number("emissivity", planet.emissivity);
    writer.field("greenhouse", &greenhouse_text(planet.greenhouse));
    writer.field("air", &air_text(planet.air));
    match &planet.water {
        None => writer.field("climate", "None"),
        Some(water) => write_water(writer, water),
    }
    writer.field("tides", tides_text(planet.tides));
    writer.field("initial_day_h", &given_text(planet.initial_day_h));
    writer.field("marked_temperature_k", &given_text(planet.marked_temperature_k));
    writer.close(')');
}

fn write_water(writer: &mut Writer, water: &Water) {
    writer.open("climate", WATER_WORLD, '(');
    writer.field("carbon_dioxide", &carbon_text(water.carbon));
    writer.number("water_oceans", water.water_oceans);
    writer.number("obliquity_deg", water.obliquity_deg);
    writer.number("heat_transport_w_m2_k", water.heat_transport_w_m2_k);
    writer.field("starts_frozen", if water.starts_frozen { "true" } else { "false" });
    writer.number("ocean_after_yr", water.ocean_after_yr);
    writer.close(')');
}

fn surface_text(surface: SurfaceOpacity) -> &'static str {
    match surface {
        SurfaceOpacity::Modern => SURFACES[0],
        SurfaceOpacity::Of1997 => SURFACES[1],
    }
}

fn carbon_text(carbon: Carbon) -> String {
    match carbon {
        Carbon::Regulated { mean_k } => format!("{}(mean_k: {})", CARBONS[0], number_text(mean_k)),
        Carbon::Held { carbon_dioxide_bar } => {
            format!("{}(carbon_dioxide_bar: {})", CARBONS[1], number_text(carbon_dioxide_bar))
        }
    }
}

/// A number that may be left out, in the form that other readers of RON take as well.
fn given_text(number: Option<f64>) -> String {
    number.map_or_else(|| "None".to_owned(), |number| format!("Some({})", number_text(number)))
}

fn tides_text(tides: TidesChoice) -> &'static str {
    match tides {
        TidesChoice::On => TIDES[0],
        TidesChoice::Off => TIDES[1],
    }
}

fn redistribution_text(redistribution: Redistribution) -> &'static str {
    match redistribution {
        Redistribution::WholePlanet => REDISTRIBUTIONS[0],
        Redistribution::DaySide => REDISTRIBUTIONS[1],
        Redistribution::DaySideFullPhase => REDISTRIBUTIONS[2],
        Redistribution::SubStellar => REDISTRIBUTIONS[3],
    }
}

fn greenhouse_text(greenhouse: Greenhouse) -> String {
    match greenhouse {
        Greenhouse::None => "None".to_owned(),
        Greenhouse::FixedIncrement { increment_k } => {
            format!("FixedIncrement(increment_k: {})", number_text(increment_k))
        }
        Greenhouse::Grey { optical_depth } => format!("Grey(optical_depth: {})", number_text(optical_depth)),
    }
}

fn air_text(air: Air) -> String {
    let of = |name: &str, pressure_bar| format!("{name}(surface_pressure_bar: {})", number_text(pressure_bar));
    match air {
        Air::None => AIRS[0].to_owned(),
        Air::EarthLike { surface_pressure_bar } => of(AIRS[1], surface_pressure_bar),
        Air::CarbonDioxide { surface_pressure_bar } => of(AIRS[2], surface_pressure_bar),
    }
}
