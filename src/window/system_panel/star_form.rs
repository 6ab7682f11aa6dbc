//! The inputs of the star.

use super::edit;
use super::planet_form::choice_row;
use crate::physics::star::WholeLife;
use crate::physics::star::convective::SurfaceOpacity;
use crate::system::limits::{LONGEST_NAME, METALLICITY, PRESENT_AGE, STAR_MASS};
use crate::system::specification::{RED_DWARF_SURFACES, surface_name};
use crate::window::command::Command;
use crate::window::theme::GRID;
use crate::window::widgets::heading::section;
use crate::window::widgets::text_entry::text_entry;
use crate::window::widgets::value_entry::value_entry;
use crate::window::workspace::Workspace;
use egui::Ui;

/// Draws name, mass, metallicity and present age; of a red dwarf its surface.
pub(super) fn show(ui: &mut Ui, workspace: &Workspace) -> Option<Command> {
    let palette = workspace.palette();
    let scenario = workspace.scenario();
    let star = &scenario.system.star;
    section(ui, palette, "Star");
    let mut command = None;
    let width = ui.available_width() - 2.0 * GRID;
    if let Some(name) = text_entry(ui, palette, "Name of the star", &star.name, LONGEST_NAME, width) {
        command = Some(edit("Rename the star", scenario, |scenario| scenario.system.star.name = name));
    }
    ui.add_space(GRID);
    let label = |what: &str| format!("Change {what} of {}", star.name);
    if let Some(value) = value_entry(ui, palette, &star.name, &STAR_MASS, star.mass_msun) {
        command = Some(edit(label(STAR_MASS.name), scenario, |scenario| scenario.system.star.mass_msun = value));
    }
    if let Some(value) = value_entry(ui, palette, &star.name, &METALLICITY, star.metallicity_dex) {
        command =
            Some(edit(label(METALLICITY.name), scenario, |scenario| scenario.system.star.metallicity_dex = value));
    }
    if let Some(value) = value_entry(ui, palette, &star.name, &PRESENT_AGE, star.present_age_yr) {
        command = Some(edit(label(PRESENT_AGE.name), scenario, |scenario| scenario.system.star.present_age_yr = value));
    }
    if WholeLife::needs_structure(star.mass_msun)
        && let Some(surface) = surface_row(ui, workspace, star.red_dwarf_surface)
    {
        command = Some(edit(label("red-dwarf surface"), scenario, |scenario| {
            scenario.system.star.red_dwarf_surface = surface;
        }));
    }
    command
}

fn surface_row(ui: &mut Ui, workspace: &Workspace, current: SurfaceOpacity) -> Option<SurfaceOpacity> {
    let mut chosen = None;
    let hint =
        "How opaque the surface of a red dwarf is. With that of 1997 it is fainter and lives about 1.6 times as long.";
    choice_row(ui, workspace, "Surface", hint, surface_name(current), |ui| {
        for option in RED_DWARF_SURFACES {
            if ui.selectable_label(option == current, surface_name(option)).clicked() && option != current {
                chosen = Some(option);
            }
        }
    });
    chosen
}
