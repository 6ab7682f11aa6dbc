//! Claims about the system and what the model says to them: verdict, value, factor, a sentence to paste.

use super::{statement_form, statement_rows};
use crate::handover::checked_text;
use crate::system::statements::{MOST_STATEMENTS, Statement};
use crate::window::command::Command;
use crate::window::system_panel::edit;
use crate::window::theme::{GRID, small};
use crate::window::workspace::Workspace;
use egui::{RichText, ScrollArea, Ui};
use std::sync::Arc;

/// Draws the page: rows with their verdicts, then a line and a form to add to them.
pub(super) fn show(ui: &mut Ui, workspace: &mut Workspace) -> Vec<Command> {
    let palette = workspace.palette();
    let history = Arc::clone(&workspace.history);
    let statements = workspace.session.scenario().statements.clone();
    if !workspace.checked.update(&history, &statements) {
        ui.ctx().request_repaint();
    }
    let mut commands = Vec::new();
    ui.horizontal_wrapped(|ui| {
        let words = "Write a claim as one line, or put it together below. It is held against the model and its spread.";
        ui.label(RichText::new(words).font(small()).color(palette.dim));
        if !statements.is_empty()
            && ui.button("Copy all").on_hover_text("Copy every statement with its verdict").clicked()
        {
            let title = &workspace.scenario().title;
            commands.push(Command::Copy(checked_text(title, workspace.checked.rows())));
        }
    });
    let added = statement_form::typed(ui, workspace).or_else(|| statement_form::by_form(ui, workspace));
    if let Some(statement) = added {
        if statements.len() < MOST_STATEMENTS {
            commands.push(add(workspace, statement));
        } else {
            workspace.say_error(format!("A scenario holds at most {MOST_STATEMENTS} statements."));
        }
    }
    ui.add_space(GRID);
    ScrollArea::vertical().auto_shrink(false).show(ui, |ui| {
        if statements.is_empty() {
            let words =
                "Nothing is stated yet. A scenario can carry the claims of a draft, to be judged anew at every change.";
            ui.label(RichText::new(words).color(palette.dim));
        }
        for index in 0..statements.len() {
            commands.extend(statement_rows::row(ui, workspace, index));
        }
        ui.add_space(4.0 * GRID);
    });
    commands
}

fn add(workspace: &Workspace, statement: Statement) -> Command {
    edit("Add a statement", workspace.scenario(), |scenario| scenario.statements.push(statement))
}
