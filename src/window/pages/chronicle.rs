//! Every dated event of star and planets, with a way there.

use crate::system::{Body, Event};
use crate::units::time_words::short_span;
use crate::window::command::{Command, TimeCommand};
use crate::window::theme::{GRID, Palette, ROW, usual};
use crate::window::workspace::Workspace;
use egui::{Align2, RichText, Role, ScrollArea, Sense, Ui, WidgetInfo, pos2, vec2};

/// Draws the list.
pub(super) fn show(ui: &mut Ui, workspace: &Workspace) -> Vec<Command> {
    let palette = workspace.palette();
    let mut commands = Vec::new();
    let only = workspace.selected;
    ui.horizontal(|ui| {
        let words = match only {
            Body::Star => "Events of the star and all planets. Choose a planet on the left to see its own.",
            Body::Planet(_) => "Events of the star and of the chosen planet.",
        };
        ui.label(RichText::new(words).color(palette.dim));
        if ui.button("Copy all").clicked() {
            commands.push(Command::Copy(as_text(workspace)));
        }
    });
    ui.add_space(GRID);
    ScrollArea::vertical().auto_shrink(false).show(ui, |ui| {
        for (index, event) in workspace.history.events().iter().enumerate() {
            let is_shown = only == Body::Star || event.body == Body::Star || event.body == only;
            if is_shown && row(ui, workspace, palette, event, index) {
                commands.push(Command::Time(TimeCommand::To(event.time_yr)));
            }
        }
    });
    commands
}

fn row(ui: &mut Ui, workspace: &Workspace, palette: &Palette, event: &Event, index: usize) -> bool {
    let (rect, response) = ui.allocate_exact_size(vec2(ui.available_width(), ROW), Sense::click());
    let when = short_span(event.time_yr);
    let label = event.label(&workspace.history);
    response.widget_info(|| WidgetInfo::labeled(Role::Button, true, format!("{when}: {label}")));
    let is_past = event.time_yr <= workspace.moment_yr;
    if response.hovered() || response.has_focus() {
        ui.painter().rect_filled(rect, 3.0, palette.chosen);
    }
    let y = rect.center().y;
    let ink = if is_past { palette.text } else { palette.dim };
    ui.painter().text(pos2(rect.left() + 92.0, y), Align2::RIGHT_CENTER, when, usual(), ink);
    ui.painter().text(pos2(rect.left() + 112.0, y), Align2::LEFT_CENTER, &label, usual(), ink);
    // A line between the last event before the moment and the first after it says where we are.
    let next = workspace.history.events().get(index + 1);
    if is_past && next.is_none_or(|next| next.time_yr > workspace.moment_yr) {
        ui.painter().hline(rect.x_range(), rect.bottom(), egui::Stroke::new(1.0, palette.accent));
    }
    response.on_hover_text("Go there").clicked()
}

fn as_text(workspace: &Workspace) -> String {
    let lines: Vec<String> = workspace
        .history
        .events()
        .iter()
        .map(|event| format!("{}\t{}", short_span(event.time_yr), event.label(&workspace.history)))
        .collect();
    lines.join("\n")
}
