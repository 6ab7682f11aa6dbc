//! Every dated event of star and planets, with a way there.

use crate::system::{Body, Event};
use crate::units::time_words::spans_apart;
use crate::window::command::{Command, TimeCommand};
use crate::window::theme::{GRID, ROW, usual};
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
        let events = shown(workspace);
        let dates = dates(workspace, &events);
        for (index, (event, when)) in events.iter().zip(&dates).enumerate() {
            let is_last_past = events.get(index + 1).is_none_or(|next| next.time_yr > workspace.moment_yr);
            if row(ui, workspace, event, when, is_last_past) {
                commands.push(Command::Time(TimeCommand::To(event.time_yr)));
            }
        }
    });
    commands
}

/// Events of the chosen body and of the star; of everyone when the star is chosen.
fn shown(workspace: &Workspace) -> Vec<&Event> {
    let only = workspace.selected;
    let is_shown = |event: &&Event| only == Body::Star || event.body == Body::Star || event.body == only;
    workspace.history.events().iter().filter(is_shown).collect()
}

/// Dates with as many digits as tell neighbours apart.
fn dates(workspace: &Workspace, events: &[&Event]) -> Vec<String> {
    let times_yr: Vec<f64> = events.iter().map(|event| event.time_yr).collect();
    spans_apart(&times_yr, workspace.settings.span_style)
}

fn row(ui: &mut Ui, workspace: &Workspace, event: &Event, when: &str, is_last_past: bool) -> bool {
    let palette = workspace.palette();
    let (rect, response) = ui.allocate_exact_size(vec2(ui.available_width(), ROW), Sense::click());
    let label = event.label(&workspace.history);
    response.widget_info(|| WidgetInfo::labeled(Role::Button, true, format!("{when}: {label}")));
    let is_past = event.time_yr <= workspace.moment_yr;
    if response.hovered() || response.has_focus() {
        ui.painter().rect_filled(rect, 3.0, palette.chosen);
    }
    let y = rect.center().y;
    let ink = if is_past { palette.text } else { palette.dim };
    ui.painter().text(pos2(rect.left() + 128.0, y), Align2::RIGHT_CENTER, when, usual(), ink);
    ui.painter().text(pos2(rect.left() + 146.0, y), Align2::LEFT_CENTER, &label, usual(), ink);
    // A line between the last event before the moment and the first after it says where we are.
    if is_past && is_last_past {
        ui.painter().hline(rect.x_range(), rect.bottom(), egui::Stroke::new(1.0, palette.accent));
    }
    response.on_hover_text("Go there").clicked()
}

fn as_text(workspace: &Workspace) -> String {
    let events = shown(workspace);
    let line = |(event, when): (&&Event, String)| format!("{when}\t{}", event.label(&workspace.history));
    let lines: Vec<String> = events.iter().zip(dates(workspace, &events)).map(line).collect();
    lines.join("\n")
}
