//! What the scenario is about, in the author's words, and the built-in scenarios to try.

use crate::document::{LONGEST_ABOUT, built_in};
use crate::window::command::{Command, Edit};
use crate::window::theme::GRID;
use crate::window::widgets::draft::keep_draft;
use crate::window::widgets::heading::section;
use crate::window::workspace::Workspace;
use egui::{Id, RichText, ScrollArea, TextEdit, Ui};

/// Draws the page.
pub(super) fn show(ui: &mut Ui, workspace: &Workspace) -> Vec<Command> {
    let palette = workspace.palette();
    let mut commands = Vec::new();
    ScrollArea::vertical().auto_shrink(false).show(ui, |ui| {
        let width = ui.available_width().min(620.0);
        ui.set_max_width(width);
        ui.label(RichText::new(&workspace.scenario().title).heading());
        ui.add_space(GRID);
        commands.extend(about(ui, workspace, width));
        section(ui, palette, "Other scenarios to look at");
        for scenario in built_in::all() {
            let Ok(sheet) = scenario.scenario() else { continue };
            if sheet.title == workspace.scenario().title {
                continue;
            }
            ui.add_space(GRID);
            if ui.link(RichText::new(&sheet.title).color(palette.accent)).on_hover_text("Open this scenario").clicked()
            {
                commands.push(Command::OpenBuiltIn(scenario.name));
            }
            ui.label(RichText::new(&sheet.about).color(palette.dim));
        }
    });
    commands
}

/// The paragraph, which can be written over; the change is taken when the field is left.
fn about(ui: &mut Ui, workspace: &Workspace, width: f32) -> Option<Command> {
    let palette = workspace.palette();
    let scenario = workspace.scenario();
    let id = Id::unique("about");
    let mut text = ui.data(|data| data.get_temp::<String>(id)).unwrap_or_else(|| scenario.about.clone());
    let field = TextEdit::multiline(&mut text)
        .id(id.with("field"))
        .desired_width(width)
        .desired_rows(4)
        .char_limit(LONGEST_ABOUT)
        .text_color(palette.text)
        .hint_text("Write here what to look for in this scenario.");
    let response = ui.add(field).accessible_name("What to look for in this scenario");
    let is_editing = response.has_focus();
    keep_draft(ui, id, is_editing.then(|| text.clone()));
    (response.lost_focus() && text != scenario.about).then(|| {
        let mut changed = scenario.clone();
        changed.about = text;
        Command::Edit(Edit { label: "Change the introduction".to_owned(), scenario: Box::new(changed) })
    })
}
