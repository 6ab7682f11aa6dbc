//! Dialogs: each waits for one answer.

mod about;
mod changed_elsewhere;
pub(super) mod command_list;
mod keys;
mod load_problems;
mod path_entry;
mod recovered;
mod unsaved;

use super::command::Command;
use super::file_dialogs::Asked;
use super::theme::GRID;
use super::workspace::Workspace;
use crate::document::recovery::Recovered;
use egui::{Context, Id, Key, Modal, Ui};

/// A dialog with what it needs to know.
#[derive(Debug)]
pub(super) enum Dialog {
    /// A scenario has unsaved changes and something is about to replace it.
    Unsaved {
        /// What to do once that is settled.
        then: Command,
    },
    /// A path is wanted; the system's own dialog may be open at the same time.
    Path(Asked),
    /// A file could not be opened.
    LoadProblems {
        /// Name of the file.
        file: String,
        /// Every problem, one sentence each.
        problems: Vec<String>,
    },
    /// Unsaved work of an earlier run was found.
    Recovered {
        /// The work; taken out once it is settled.
        found: Option<Box<Recovered>>,
    },
    /// Another program wrote the file.
    ChangedElsewhere,
    /// Every command, with a field to search.
    Commands(command_list::Search),
    /// Every key.
    Keys,
    /// What this program is.
    About,
}

/// What a dialog was told.
pub(super) enum Answer {
    /// Nothing yet.
    Wait,
    /// Close it and do this.
    Close(Vec<Reply>),
}

/// A thing to do after a dialog.
pub(super) enum Reply {
    /// A command, after asking about unsaved work if need be.
    Do(Command),
    /// A command, although there is unsaved work.
    DoAnyway(Command),
    /// Save, then do this.
    SaveThen(Command),
    /// Take the recovered work up.
    Recover(Box<Recovered>),
    /// Forget the recovered work.
    Forget(Box<Recovered>),
}

/// Draws the open dialog.
pub(super) fn show(context: &Context, workspace: &mut Workspace) -> Answer {
    let Some(mut dialog) = workspace.dialog.take() else { return Answer::Wait };
    let (name, width) = match &dialog {
        Dialog::Unsaved { .. } => ("unsaved", 380.0),
        Dialog::Path(_) => ("path", 460.0),
        Dialog::LoadProblems { .. } => ("load_problems", 560.0),
        Dialog::Recovered { .. } => ("recovered", 420.0),
        Dialog::ChangedElsewhere => ("changed_elsewhere", 440.0),
        Dialog::Commands(_) => ("commands", 520.0),
        Dialog::Keys => ("keys", 560.0),
        Dialog::About => ("about", 440.0),
    };
    let frame = egui::Frame::popup(&context.global_style()).inner_margin(5.0 * GRID);
    let response = Modal::new(Id::unique(name)).frame(frame).show(context, |ui| {
        ui.set_width(width);
        ui.spacing_mut().item_spacing.y = 2.0 * GRID;
        match &mut dialog {
            Dialog::Unsaved { then } => unsaved::show(ui, workspace, then),
            Dialog::Path(asked) => path_entry::show(ui, workspace, asked),
            Dialog::LoadProblems { file, problems } => load_problems::show(ui, workspace, file, problems),
            Dialog::Recovered { found } => recovered::show(ui, found),
            Dialog::ChangedElsewhere => changed_elsewhere::show(ui, workspace),
            Dialog::Commands(search) => command_list::show(ui, workspace, search),
            Dialog::Keys => keys::show(ui, workspace),
            Dialog::About => about::show(ui, workspace),
        }
    });
    let escapes = context.input(|input| input.key_pressed(Key::Escape));
    match response.inner {
        Answer::Wait if escapes && !matches!(dialog, Dialog::Recovered { .. }) => Answer::Close(Vec::new()),
        Answer::Wait => {
            workspace.dialog = Some(dialog);
            Answer::Wait
        }
        answer @ Answer::Close(_) => answer,
    }
}

/// A row of buttons at the end of a dialog; the index of the one that was clicked.
fn buttons(ui: &mut Ui, names: &[&str]) -> Option<usize> {
    ui.horizontal(|ui| {
        let clicked: Vec<bool> = names.iter().map(|name| ui.button(*name).clicked()).collect();
        clicked.into_iter().position(|is_clicked| is_clicked)
    })
    .inner
}
