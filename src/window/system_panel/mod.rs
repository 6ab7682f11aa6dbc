//! The question panel: star and planets with units and permitted ranges.

mod planet_form;
mod planet_list;
mod star_form;

use super::command::{Command, Edit};
use super::theme::GRID;
use super::widgets::heading::section;
use super::widgets::text_entry::text_entry;
use super::widgets::value_entry;
use super::workspace::Workspace;
use crate::document::{LONGEST_TITLE, Scenario};
use crate::system::Body;
use egui::{RichText, ScrollArea, Ui};

/// Draws the panel and returns what it was told.
pub(super) fn show(ui: &mut Ui, workspace: &Workspace) -> Vec<Command> {
    let mut commands = Vec::new();
    let palette = workspace.palette();
    ScrollArea::vertical().auto_shrink(false).show(ui, |ui| {
        ui.set_width(ui.available_width());
        section(ui, palette, "Scenario");
        let scenario = workspace.scenario();
        let width = ui.available_width() - 2.0 * GRID;
        if let Some(title) = text_entry(ui, palette, "Title of the scenario", &scenario.title, LONGEST_TITLE, width) {
            commands.push(edit("Change title", scenario, |scenario| scenario.title = title));
        }
        commands.extend(star_form::show(ui, workspace));
        commands.extend(planet_list::show(ui, workspace));
        if let Body::Planet(index) = workspace.selected {
            commands.extend(planet_form::show(ui, workspace, index));
        }
        if let Some(trouble) = &workspace.trouble {
            ui.add_space(2.0 * GRID);
            ui.label(RichText::new(trouble).color(palette.error));
        }
        ui.add_space(4.0 * GRID);
    });
    if value_entry::take_nudge(ui.ctx()) {
        let joined = |command| if let Command::Edit(edit) = command { Command::JoinedEdit(edit) } else { command };
        commands = commands.into_iter().map(joined).collect();
    }
    commands
}

/// An edit of a copy of the scenario, with the words that undo will use.
pub(in crate::window) fn edit(
    label: impl Into<String>,
    scenario: &Scenario,
    change: impl FnOnce(&mut Scenario),
) -> Command {
    let mut changed = scenario.clone();
    change(&mut changed);
    Command::Edit(Edit { label: label.into(), scenario: Box::new(changed) })
}
