//! Every key, made from the same list that handles them.

use super::{Answer, buttons};
use crate::window::command::key_bindings;
use crate::window::workspace::Workspace;
use egui::{Grid, RichText, Ui};

/// Draws the list.
pub(super) fn show(ui: &mut Ui, workspace: &Workspace) -> Answer {
    let palette = workspace.palette();
    ui.label(RichText::new("Keys").heading());
    Grid::new("keys").num_columns(2).spacing([24.0, 4.0]).show(ui, |ui| {
        for binding in key_bindings() {
            ui.label(RichText::new(ui.ctx().format_shortcut(&binding.shortcut)).color(palette.accent));
            ui.label(binding.words);
            ui.end_row();
        }
        for (gesture, words) in [
            ("Drag", "move the moment, on strip and curves"),
            ("Wheel", "zoom about the pointer"),
            ("Double click", "show the whole life"),
        ] {
            ui.label(RichText::new(gesture).color(palette.accent));
            ui.label(words);
            ui.end_row();
        }
    });
    match buttons(ui, &["Close"]) {
        Some(_) => Answer::Close(Vec::new()),
        None => Answer::Wait,
    }
}
