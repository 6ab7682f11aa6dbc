//! Every key, made from the same list that handles them.

use super::{Answer, buttons};
use crate::window::command::key_bindings;
use crate::window::workspace::Workspace;
use egui::{Grid, RichText, Ui};

/// What the pointer does.
const GESTURES: [(&str, &str); 3] =
    [("Drag", "move the moment"), ("Wheel", "zoom about the pointer"), ("Double click", "show the whole life")];

/// Draws the list.
pub(super) fn show(ui: &mut Ui, workspace: &Workspace) -> Answer {
    let palette = workspace.palette();
    ui.label(RichText::new("Keys").heading());
    let mut rows: Vec<(String, &str)> = key_bindings()
        .into_iter()
        .map(|binding| (ui.ctx().format_shortcut(&binding.shortcut), binding.words))
        .collect();
    rows.extend(GESTURES.map(|(gesture, words)| (gesture.to_owned(), words)));
    // Two columns of rows, read downwards: one alone would not fit a small window.
    let half = rows.len().div_ceil(2);
    Grid::new("keys").num_columns(4).spacing([20.0, 4.0]).show(ui, |ui| {
        for index in 0..half {
            for (key, words) in [rows.get(index), rows.get(index + half)].into_iter().flatten() {
                ui.label(RichText::new(key).color(palette.accent));
                ui.label(*words);
            }
            ui.end_row();
        }
    });
    match buttons(ui, &["Close"]) {
        Some(_) => Answer::Close(Vec::new()),
        None => Answer::Wait,
    }
}
