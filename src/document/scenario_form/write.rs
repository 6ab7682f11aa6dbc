//! Scenario to text.

use super::keys::{AIRS, CURRENT_VERSION, REDISTRIBUTIONS, SCENARIO};
use crate::document::ron_text::{Writer, number_text};
use crate::document::scenario::Scenario;
use crate::physics::planet::{Greenhouse, Redistribution};
use crate::system::Air;
use crate::system::specification::{PlanetSpecification, StarSpecification};

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
    writer.close(')');
}

fn write_star(writer: &mut Writer, star: &StarSpecification) {
    writer.open("star", "", '(');
    writer.string("name", &star.name);
    writer.number("mass_msun", star.mass_msun);
    writer.number("metallicity_dex", star.metallicity_dex);
    writer.number("present_age_yr", star.present_age_yr);
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
    writer.close(')');
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
