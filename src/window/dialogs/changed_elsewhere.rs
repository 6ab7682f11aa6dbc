//! Another program wrote the file that is open.

use super::{Answer, Reply, buttons};
use crate::window::command::Command;
use crate::window::workspace::Workspace;
use egui::{RichText, Ui};

/// Draws the question.
pub(super) fn show(ui: &mut Ui, workspace: &mut Workspace) -> Answer {
    let Some(path) = workspace.session.path().map(std::path::Path::to_path_buf) else {
        return Answer::Close(Vec::new());
    };
    ui.label(RichText::new("The file was changed by another program").heading());
    ui.label(path.to_string_lossy());
    let what = if workspace.session.is_dirty() {
        "Opening it again loses what was changed here since the last saving; keeping yours replaces the file when you save."
    } else {
        "Nothing was changed here since the last saving."
    };
    ui.label(RichText::new(what).color(workspace.palette().dim));
    match buttons(ui, &["Open it again", "Keep mine"]) {
        Some(0) => Answer::Close(vec![Reply::DoAnyway(Command::Open(path))]),
        Some(_) => {
            workspace.session.accept_file();
            Answer::Close(Vec::new())
        }
        None => Answer::Wait,
    }
}
