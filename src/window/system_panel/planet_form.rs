//! The inputs of the chosen planet.

use super::edit;
use crate::physics::planet::{Greenhouse, Redistribution};
use crate::system::limits::{
    BOND_ALBEDO, ECCENTRICITY, EMISSIVITY, GREENHOUSE_INCREMENT, LONGEST_NAME, Limit, OPTICAL_DEPTH, PLANET_MASS,
    PLANET_RADIUS, SEMI_MAJOR_AXIS, SURFACE_PRESSURE,
};
use crate::system::{Air, PlanetSpecification};
use crate::window::command::Command;
use crate::window::theme::{GRID, usual};
use crate::window::widgets::heading::section;
use crate::window::widgets::text_entry::text_entry;
use crate::window::widgets::value_entry::value_entry;
use crate::window::workspace::Workspace;
use egui::{Align, Align2, ComboBox, Layout, Sense, Ui, pos2, vec2};

/// A number of a planet: its limit, and how to read and write it.
type Field = (&'static Limit, fn(&PlanetSpecification) -> f64, fn(&mut PlanetSpecification, f64));

const FIELDS: [Field; 6] = [
    (&SEMI_MAJOR_AXIS, |planet| planet.semi_major_axis_au, |planet, value| planet.semi_major_axis_au = value),
    (&ECCENTRICITY, |planet| planet.eccentricity, |planet, value| planet.eccentricity = value),
    (&PLANET_MASS, |planet| planet.mass_mearth, |planet, value| planet.mass_mearth = value),
    (&PLANET_RADIUS, |planet| planet.radius_rearth, |planet, value| planet.radius_rearth = value),
    (&BOND_ALBEDO, |planet| planet.bond_albedo, |planet, value| planet.bond_albedo = value),
    (&EMISSIVITY, |planet| planet.emissivity, |planet, value| planet.emissivity = value),
];

/// Draws the form of a planet.
pub(super) fn show(ui: &mut Ui, workspace: &Workspace, index: usize) -> Option<Command> {
    let palette = workspace.palette();
    let scenario = workspace.scenario();
    let planet = scenario.system.planets.get(index)?;
    section(ui, palette, &planet.name);
    let change = |what: &str, change: &dyn Fn(&mut PlanetSpecification)| {
        Some(edit(format!("Change {what} of {}", planet.name), scenario, |scenario| {
            if let Some(planet) = scenario.system.planets.get_mut(index) {
                change(planet);
            }
        }))
    };
    let mut command = None;
    let width = ui.available_width() - 2.0 * GRID;
    if let Some(name) = text_entry(ui, palette, "Name of the planet", &planet.name, LONGEST_NAME, width) {
        let name = if scenario.system.planets.iter().any(|other| other.name == name) {
            scenario.system.free_planet_name(&name)
        } else {
            name
        };
        command = change("name", &|planet| planet.name.clone_from(&name));
    }
    ui.add_space(GRID);
    for (limit, read, write) in FIELDS {
        if let Some(value) = value_entry(ui, palette, &planet.name, limit, read(planet)) {
            command = change(limit.name, &|planet| write(planet, value));
        }
    }
    if let Some(redistribution) = redistribution_row(ui, workspace, planet.redistribution) {
        command = change("redistribution", &|planet| planet.redistribution = redistribution);
    }
    if let Some(greenhouse) = greenhouse_row(ui, workspace, planet.greenhouse) {
        command = change("greenhouse", &|planet| planet.greenhouse = greenhouse);
    }
    match planet.greenhouse {
        Greenhouse::None => {}
        Greenhouse::FixedIncrement { increment_k } => {
            if let Some(value) = value_entry(ui, palette, &planet.name, &GREENHOUSE_INCREMENT, increment_k) {
                let greenhouse = Greenhouse::FixedIncrement { increment_k: value };
                command = change("greenhouse increment", &|planet| planet.greenhouse = greenhouse);
            }
        }
        Greenhouse::Grey { optical_depth } => {
            if let Some(value) = value_entry(ui, palette, &planet.name, &OPTICAL_DEPTH, optical_depth) {
                let greenhouse = Greenhouse::Grey { optical_depth: value };
                command = change("optical depth", &|planet| planet.greenhouse = greenhouse);
            }
        }
    }
    if let Some(air) = air_row(ui, workspace, planet.air) {
        command = change("air", &|planet| planet.air = air);
    }
    if let Some(current_bar) = planet.air.surface_pressure_bar()
        && let Some(value) = value_entry(ui, palette, &planet.name, &SURFACE_PRESSURE, current_bar)
    {
        command = change("pressure of the air", &|planet| planet.air = planet.air.at_pressure(value));
    }
    command
}

fn redistribution_row(ui: &mut Ui, workspace: &Workspace, current: Redistribution) -> Option<Redistribution> {
    let mut chosen = None;
    choice_row(ui, workspace, "Redistribution", "How absorbed light spreads over the globe.", current.name(), |ui| {
        for option in Redistribution::ALL {
            if ui.selectable_label(option == current, option.name()).clicked() && option != current {
                chosen = Some(option);
            }
        }
    });
    chosen
}

/// Kinds of greenhouse with the value each starts from: the Earth's own.
const GREENHOUSES: [Greenhouse; 3] =
    [Greenhouse::None, Greenhouse::FixedIncrement { increment_k: 33.0 }, Greenhouse::Grey { optical_depth: 0.87 }];

fn greenhouse_row(ui: &mut Ui, workspace: &Workspace, current: Greenhouse) -> Option<Greenhouse> {
    let mut chosen = None;
    choice_row(ui, workspace, "Greenhouse", "Warming by the air, held fixed.", current.name(), |ui| {
        for option in GREENHOUSES {
            let is_current = option.key() == current.key();
            if ui.selectable_label(is_current, option.name()).clicked() && !is_current {
                chosen = Some(option);
            }
        }
    });
    chosen
}

/// The pressure is kept when only the gas changes.
fn air_row(ui: &mut Ui, workspace: &Workspace, current: Air) -> Option<Air> {
    let mut chosen = None;
    choice_row(
        ui,
        workspace,
        "Air",
        "Clear air that makes the sky; it does not warm the ground.",
        current.name(),
        |ui| {
            for option in Air::KINDS {
                let is_current = option.key() == current.key();
                if ui.selectable_label(is_current, option.name()).clicked() && !is_current {
                    chosen = Some(
                        current.surface_pressure_bar().map_or(option, |pressure_bar| option.at_pressure(pressure_bar)),
                    );
                }
            }
        },
    );
    chosen
}

fn choice_row(
    ui: &mut Ui,
    workspace: &Workspace,
    name: &str,
    hint: &str,
    current: &str,
    options: impl FnOnce(&mut Ui),
) {
    let palette = workspace.palette();
    ui.horizontal(|ui| {
        let (rect, _) = ui.allocate_exact_size(vec2(92.0, 22.0), Sense::hover());
        ui.painter().text(pos2(rect.left(), rect.center().y), Align2::LEFT_CENTER, name, usual(), palette.text);
        ui.with_layout(Layout::right_to_left(Align::Center), |ui| {
            let response = ComboBox::from_id_salt(name).width(118.0).selected_text(current).show_ui(ui, options);
            response.response.accessible_name(name).on_hover_text(hint);
        });
    });
}
