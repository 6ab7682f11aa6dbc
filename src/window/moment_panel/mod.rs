//! The answer panel: the star's disc in its true colour, then figures in aligned columns.

mod against;
mod disc;
mod figures;

use super::command::{Command, TimeCommand};
use super::theme::{GRID, LARGE_SIZE, small};
use super::widgets::heading::section;
use super::workspace::Workspace;
use crate::system::{Body, Moment};
use crate::units::number_text::number;
use crate::units::time_words::{SpanStyle, span};
use egui::{RichText, ScrollArea, Ui};

/// Draws the panel and returns what it was told.
pub(super) fn show(ui: &mut Ui, workspace: &Workspace) -> Vec<Command> {
    let palette = workspace.palette();
    let moment = workspace.moment();
    let mut commands = Vec::new();
    ScrollArea::vertical().auto_shrink(false).show(ui, |ui| {
        ui.set_width(ui.available_width());
        section(ui, palette, "This moment");
        let time = RichText::new(span(moment.time_yr, 4, SpanStyle::Words)).size(LARGE_SIZE).color(palette.text);
        ui.label(time);
        ui.label(RichText::new(moment.star.phase.name()).color(palette.dim));
        ui.label(RichText::new(beside_now(workspace, &moment)).font(small()).color(palette.dim));
        if workspace.history.life().is_quick_look() {
            let words = workspace.job.percent().map_or_else(
                || "quick look; the exact life is not computed".to_owned(),
                |percent| format!("quick look; exact life {percent} % computed"),
            );
            ui.label(RichText::new(words).font(small()).color(palette.accent));
        }
        ui.add_space(GRID);
        disc::show(ui, workspace, &moment);
        section(ui, palette, &workspace.scenario().system.star.name);
        commands.extend(figures::star(ui, palette, &workspace.scenario().system.star.name, &moment));
        against::show(ui, workspace, &moment);
        if let Body::Planet(index) = workspace.selected
            && let Some(planet) = moment.planets.get(index)
        {
            section(ui, palette, &planet.name);
            commands.extend(figures::planet(ui, palette, moment.time_yr, planet));
        }
        notes(ui, workspace, &moment);
        commands.extend(next_event(ui, workspace));
        ui.add_space(4.0 * GRID);
    });
    commands
}

/// `3.2 Gyr after now`, so that a reader knows on which side of the present a moment lies.
fn beside_now(workspace: &Workspace, moment: &Moment) -> String {
    let present_yr = workspace.history.system().star.present_age_yr;
    let distance_yr = moment.time_yr - present_yr;
    if distance_yr == 0.0 {
        "now".to_owned()
    } else if distance_yr > 0.0 {
        format!("{} after now", workspace.time_text(distance_yr))
    } else {
        format!("{} before now", workspace.time_text(-distance_yr))
    }
}

/// Remarks about star and chosen planet: the kind as a word, then the sentence.
fn notes(ui: &mut Ui, workspace: &Workspace, moment: &Moment) {
    let palette = workspace.palette();
    let shown = moment.notes.iter().filter(|note| note.body == Body::Star || note.body == workspace.selected);
    for (index, note) in shown.enumerate() {
        if index == 0 {
            section(ui, palette, "Notes");
        }
        ui.label(RichText::new(format!("{}: {}.", note.kind.name(), note.text)).font(small()).color(palette.dim));
    }
}

fn next_event(ui: &mut Ui, workspace: &Workspace) -> Option<Command> {
    let palette = workspace.palette();
    let event = workspace.history.events().iter().find(|event| event.time_yr > workspace.moment_yr)?;
    section(ui, palette, "Next");
    let ahead = workspace.time_text(event.time_yr - workspace.moment_yr);
    let text = format!("{} in {ahead}", event.label(&workspace.history));
    let response = ui.link(RichText::new(text).color(palette.accent));
    response
        .on_hover_text(format!("at {} yr; click to go there", number(event.time_yr, 5)))
        .clicked()
        .then_some(Command::Time(TimeCommand::To(event.time_yr)))
}
