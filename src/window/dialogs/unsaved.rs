//! Asks what to do with unsaved changes.

use super::{Answer, Reply, buttons};
use crate::window::command::Command;
use crate::window::workspace::Workspace;
use egui::{RichText, Ui};

/// Draws the question.
pub(super) fn show(ui: &mut Ui, workspace: &Workspace, then: &Command) -> Answer {
    ui.label(RichText::new("Save the changes?").heading());
    ui.label(format!("\"{}\" has changes that are not in a file yet.", workspace.scenario().title));
    match buttons(ui, &["Save", "Discard changes", "Cancel"]) {
        Some(0) => Answer::Close(vec![Reply::SaveThen(then.clone())]),
        Some(1) => Answer::Close(vec![Reply::DoAnyway(then.clone())]),
        Some(_) => Answer::Close(Vec::new()),
        None => Answer::Wait,
    }
}
