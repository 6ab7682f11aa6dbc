//! The system's own file dialog, on a thread of its own: it may be missing, hang, or never answer.

use super::command::Command;
use super::exports::Export;
use std::path::PathBuf;
use std::sync::mpsc::{Receiver, TryRecvError, channel};
use std::thread;

/// What a path is wanted for.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) enum Purpose {
    /// To open.
    Open,
    /// To save.
    Save,
    /// To hand something over.
    Export(Export),
}

/// A path that is being asked for.
#[derive(Debug)]
pub(super) struct Asked {
    /// What for.
    pub purpose: Purpose,
    /// The path as typed so far.
    pub typed: String,
    /// What to do afterwards.
    pub then: Option<Command>,
    /// Whether the field has not been shown yet.
    pub is_new: bool,
    answer: Option<Receiver<Option<PathBuf>>>,
}

/// What the system's dialog says.
pub(super) enum Chosen {
    /// This file.
    Path(PathBuf),
    /// It is still open.
    Waiting,
    /// It was cancelled, or there is none on this machine.
    None,
}

impl Asked {
    /// Asks for a path; the system's dialog opens only when it may.
    pub(super) fn new(
        purpose: Purpose,
        typed: String,
        then: Option<Command>,
        with_system: Option<&egui::Context>,
    ) -> Self {
        let answer = with_system.and_then(|context| system_dialog(purpose, &typed, context));
        Self { purpose, typed, then, is_new: true, answer }
    }

    /// Looks whether the system's dialog has answered.
    pub(super) fn poll(&mut self) -> Chosen {
        let Some(answer) = &self.answer else { return Chosen::None };
        match answer.try_recv() {
            Ok(Some(path)) => Chosen::Path(path),
            Err(TryRecvError::Empty) => Chosen::Waiting,
            Ok(None) | Err(TryRecvError::Disconnected) => {
                self.answer = None;
                Chosen::None
            }
        }
    }

    /// What a chosen path means.
    pub(super) fn command(&self, path: PathBuf) -> Command {
        match self.purpose {
            Purpose::Open => Command::Open(path),
            Purpose::Save if path.extension().is_none() => Command::SaveAs(path.with_extension("ron")),
            Purpose::Save => Command::SaveAs(path),
            Purpose::Export(export) => Command::Export(export, path),
        }
    }
}

fn system_dialog(purpose: Purpose, typed: &str, context: &egui::Context) -> Option<Receiver<Option<PathBuf>>> {
    let (sender, receiver) = channel();
    let context = context.clone();
    let mut dialog = rfd::FileDialog::new();
    dialog = match purpose {
        Purpose::Open | Purpose::Save => dialog.add_filter("Longember scenario", &["ron"]),
        Purpose::Export(export) => dialog.add_filter(export.name(), export.extensions()),
    };
    let typed = PathBuf::from(typed);
    if let Some(name) = typed.file_name() {
        dialog = dialog.set_file_name(name.to_string_lossy());
    }
    if let Some(folder) = typed.parent().filter(|folder| folder.is_dir()) {
        dialog = dialog.set_directory(folder);
    }
    let spawned = thread::Builder::new().name("file dialog".to_owned()).spawn(move || {
        let path = match purpose {
            Purpose::Open => dialog.pick_file(),
            Purpose::Save | Purpose::Export(_) => dialog.save_file(),
        };
        // Nobody listens any more when a typed path was quicker.
        let _ = sender.send(path);
        context.request_repaint();
    });
    spawned.ok().map(|_| receiver)
}
