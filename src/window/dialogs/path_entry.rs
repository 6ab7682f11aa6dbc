//! A path to type, beside the system's own dialog, which may be missing or hang.

use super::{Answer, Reply, buttons};
use crate::window::file_dialogs::{Asked, Chosen, Purpose};
use crate::window::theme::small;
use crate::window::workspace::Workspace;
use egui::{Key, RichText, TextEdit, Ui};
use std::path::PathBuf;

/// Draws the field and watches the system's dialog.
pub(super) fn show(ui: &mut Ui, workspace: &Workspace, asked: &mut Asked) -> Answer {
    let palette = workspace.palette();
    let (heading, verb) = match asked.purpose {
        Purpose::Open => ("Open a scenario".to_owned(), "Open"),
        Purpose::Save => ("Save the scenario as".to_owned(), "Save"),
        Purpose::Export(export) => (format!("Export the {} as", export.name()), "Export"),
    };
    ui.label(RichText::new(heading).heading());
    match asked.poll() {
        Chosen::Path(path) => return done(asked, path),
        Chosen::Waiting => {
            ui.label(
                RichText::new("The system's file dialog is open. You can also type a path here.").color(palette.dim),
            );
        }
        Chosen::None => {
            let words = match asked.purpose {
                Purpose::Open | Purpose::Save => "Type a path; a scenario file ends in .ron.".to_owned(),
                Purpose::Export(export) => {
                    format!("Type a path; its end says the form: .{}.", export.extensions().join(", ."))
                }
            };
            ui.label(RichText::new(words).color(palette.dim));
        }
    }
    let field = TextEdit::singleline(&mut asked.typed).desired_width(f32::INFINITY).hint_text("/home/me/ember.ron");
    let response = ui.add(field).accessible_name("Path of the file");
    if asked.is_new {
        response.request_focus();
        asked.is_new = false;
    }
    let enters = response.lost_focus() && ui.input(|input| input.key_pressed(Key::Enter));
    let path = PathBuf::from(asked.typed.trim());
    if asked.purpose != Purpose::Open && path.is_file() {
        ui.label(RichText::new("This file exists and will be replaced.").font(small()).color(palette.error));
    }
    let choice = buttons(ui, &[verb, "Cancel"]);
    if choice == Some(1) {
        return Answer::Close(Vec::new());
    }
    if (enters || choice == Some(0)) && !asked.typed.trim().is_empty() {
        return done(asked, path);
    }
    Answer::Wait
}

fn done(asked: &Asked, path: PathBuf) -> Answer {
    let command = asked.command(path);
    Answer::Close(match (&asked.then, asked.purpose) {
        (Some(then), Purpose::Save) => vec![Reply::DoAnyway(command), Reply::Do(then.clone())],
        _ => vec![Reply::DoAnyway(command)],
    })
}
