//! One statement: mark and word of the verdict, the line, the model's value, the sentence, and what can be done with it.

use super::statement_form::{LineEntry, line_field};
use crate::document::LONGEST_NOTE;
use crate::handover::{JudgedStatement, model_text};
use crate::system::statements::{Statement, Verdict};
use crate::window::command::{Command, TimeCommand};
use crate::window::system_panel::edit;
use crate::window::theme::{GRID, ROW, small, usual};
use crate::window::widgets::draft::keep_draft;
use crate::window::widgets::text_entry::text_entry;
use crate::window::widgets::verdict_mark;
use crate::window::workspace::Workspace;
use egui::{Align2, Button, Id, RichText, Role, Sense, Ui, WidgetInfo, pos2, vec2};

/// Width of mark and word, points.
const VERDICT_WIDTH: f32 = 138.0;

/// Draws a statement and returns what it was told.
pub(super) fn row(ui: &mut Ui, workspace: &Workspace, index: usize) -> Vec<Command> {
    let palette = workspace.palette();
    let Some(statement) = workspace.scenario().statements.get(index) else { return Vec::new() };
    let judged = workspace.checked.rows().get(index).filter(|row| row.statement == *statement);
    let mut commands = Vec::new();
    let number = index + 1;
    let line = statement.line();
    let editing = Id::unique(("edited_statement", index));
    let is_edited = ui.data(|data| data.get_temp::<bool>(editing)).unwrap_or_default();
    ui.add_space(GRID);
    if is_edited {
        match line_field(ui, workspace, &format!("Statement {number}"), Some(&line)) {
            LineEntry::Entered(changed) => {
                let note = statement.note.clone();
                keep_draft::<bool>(ui, editing, None);
                commands.push(change(workspace, index, "Change", move |row| *row = Statement { note, ..changed }));
            }
            LineEntry::GivenUp => keep_draft::<bool>(ui, editing, None),
            LineEntry::Nothing => {}
        }
        ui.horizontal(|ui| {
            ui.label(RichText::new("Remark").font(small()).color(palette.dim));
            let name = format!("Remark on statement {number}");
            let width = (ui.available_width() - 12.0).max(80.0);
            if let Some(note) = text_entry(ui, palette, &name, &statement.note, LONGEST_NOTE, width) {
                commands.push(change(workspace, index, "Change the remark on", move |row| row.note = note));
            }
        });
    } else {
        headline(ui, workspace, number, &line, judged);
        if !statement.note.is_empty() {
            ui.label(RichText::new(format!("Remark: {}", statement.note)).color(palette.text));
        }
    }
    if let Some(judged) = judged {
        ui.label(RichText::new(format!("Model: {}", model_text(judged))).color(palette.text));
        ui.label(RichText::new(&judged.judgement.sentence).font(small()).color(palette.dim));
        for note in &judged.judgement.notes {
            ui.label(RichText::new(format!("Note: {note}")).font(small()).color(palette.dim));
        }
    }
    ui.horizontal_wrapped(|ui| {
        let go = judged.and_then(|row| row.judgement.time_yr);
        if button(ui, "Go there", format!("Go to the moment of statement {number}"), go.is_some())
            && let Some(time_yr) = go
        {
            commands.push(Command::Time(TimeCommand::To(time_yr)));
        }
        if button(ui, "Copy", format!("Copy statement {number} with its verdict"), judged.is_some())
            && let Some(judged) = judged
        {
            commands.push(Command::Copy(format!(
                "{line}: {}. {}",
                judged.judgement.verdict.name(),
                judged.judgement.sentence
            )));
        }
        if button(ui, "Source", format!("Show the source of statement {number}"), judged.is_some())
            && let Some(judged) = judged
        {
            commands.push(Command::ShowSource(judged.judgement.method));
        }
        if button(ui, "Edit", format!("Edit statement {number}"), !is_edited) {
            keep_draft(ui, editing, Some(true));
        }
        commands.extend(places(ui, workspace, index));
    });
    ui.separator();
    commands
}

/// Buttons that move and remove a row.
fn places(ui: &mut Ui, workspace: &Workspace, index: usize) -> Option<Command> {
    let scenario = workspace.scenario();
    let (number, count) = (index + 1, scenario.statements.len());
    let mut command = None;
    if button(ui, "↑", format!("Move statement {number} up"), index > 0) {
        let label = format!("Move statement {number} up");
        command = Some(edit(label, scenario, |scenario| scenario.statements.swap(index, index - 1)));
    }
    if button(ui, "↓", format!("Move statement {number} down"), number < count) {
        let label = format!("Move statement {number} down");
        command = Some(edit(label, scenario, |scenario| scenario.statements.swap(index, index + 1)));
    }
    if button(ui, "Remove", format!("Remove statement {number}"), true) {
        command = Some(edit(format!("Remove statement {number}"), scenario, |scenario| {
            scenario.statements.remove(index);
        }));
    }
    command
}

fn change(workspace: &Workspace, index: usize, what: &str, change: impl FnOnce(&mut Statement)) -> Command {
    edit(format!("{what} statement {}", index + 1), workspace.scenario(), |scenario| {
        if let Some(row) = scenario.statements.get_mut(index) {
            change(row);
        }
    })
}

/// Mark, word and line.
fn headline(ui: &mut Ui, workspace: &Workspace, number: usize, line: &str, judged: Option<&JudgedStatement>) {
    let palette = workspace.palette();
    let verdict = judged.map(|row| row.judgement.verdict);
    let word = verdict.map_or("being judged", Verdict::name);
    let width = ui.available_width();
    let galley = ui.painter().layout(line.to_owned(), usual(), palette.text, (width - VERDICT_WIDTH).max(120.0));
    let (rect, response) = ui.allocate_exact_size(vec2(width, galley.size().y.max(ROW)), Sense::hover());
    response.widget_info(|| WidgetInfo::labeled(Role::ListItem, true, format!("Statement {number}, {word}: {line}")));
    let y = rect.top() + 0.5 * ROW - 2.0;
    if let Some(verdict) = verdict {
        let ink = verdict_mark::ink(palette, verdict);
        verdict_mark::draw(ui.painter(), pos2(rect.left() + 9.0, y), verdict, ink);
    }
    ui.painter().text(pos2(rect.left() + 22.0, y), Align2::LEFT_CENTER, word, usual(), palette.text);
    ui.painter().galley(pos2(rect.left() + VERDICT_WIDTH, rect.top()), galley, palette.text);
}

fn button(ui: &mut Ui, text: &str, name: String, is_enabled: bool) -> bool {
    ui.add_enabled(is_enabled, Button::new(text)).accessible_name(name.clone()).on_hover_text(name).clicked()
}
