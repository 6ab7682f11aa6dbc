//! Says everything that is wrong with a file, with lines and columns.

use super::{Answer, buttons};
use crate::window::workspace::Workspace;
use egui::{RichText, ScrollArea, Ui};

/// Draws the list.
pub(super) fn show(ui: &mut Ui, workspace: &Workspace, file: &str, problems: &[String]) -> Answer {
    let palette = workspace.palette();
    ui.label(RichText::new(format!("{file} could not be opened")).heading());
    ui.label(RichText::new("The scenario you had is still open.").color(palette.dim));
    ScrollArea::vertical().max_height(260.0).show(ui, |ui| {
        for problem in problems {
            ui.add(egui::Label::new(RichText::new(problem).color(palette.text)).wrap().selectable(true));
        }
    });
    match buttons(ui, &["Close"]) {
        Some(_) => Answer::Close(Vec::new()),
        None => Answer::Wait,
    }
}
