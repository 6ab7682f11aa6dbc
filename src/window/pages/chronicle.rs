//! Every dated event of star and planets, how well its date is known, and a way there; windows of mild climate.

use crate::handover::doubt;
use crate::system::date_band::RULE;
use crate::system::mild_spans::mild_spans;
use crate::system::{Body, Event, EventGroup};
use crate::units::time_words::{span, spans_apart};
use crate::window::command::{Command, TimeCommand};
use crate::window::theme::{GRID, ROW, small, usual};
use crate::window::widgets::heading::section;
use crate::window::workspace::Workspace;
use egui::{Align2, RichText, Role, ScrollArea, Sense, Ui, WidgetInfo, pos2, vec2};

/// Digits of a span's length.
const LENGTH_DIGITS: usize = 3;

/// Draws the filter, the list and the windows of mild climate.
pub(super) fn show(ui: &mut Ui, workspace: &mut Workspace) -> Vec<Command> {
    let palette = workspace.palette();
    let mut commands = Vec::new();
    filter(ui, workspace);
    let events: Vec<Event> = shown(workspace).into_iter().copied().collect();
    let dates = dates(workspace, &events);
    ui.horizontal_wrapped(|ui| {
        let words = match workspace.selected {
            Body::Star => "Events of the star and all planets. Choose a planet on the left to see its own.",
            Body::Planet(_) => "Events of the star and of the chosen planet.",
        };
        ui.label(RichText::new(words).color(palette.dim));
        if ui.button("Copy all").clicked() {
            let lines: Vec<String> =
                events.iter().zip(&dates).map(|(event, when)| line(workspace, event, when)).collect();
            commands.push(Command::Copy(lines.join("\n")));
        }
    });
    ui.label(RichText::new(RULE).font(small()).color(palette.dim));
    if let Some(remark) = workspace.history.dates_remark() {
        ui.label(RichText::new(remark).font(small()).color(palette.dim));
    }
    ui.add_space(GRID);
    ScrollArea::vertical().auto_shrink(false).show(ui, |ui| {
        if events.is_empty() {
            ui.label(RichText::new("Nothing of the chosen kinds happens.").color(palette.dim));
        }
        for (index, (event, when)) in events.iter().zip(&dates).enumerate() {
            let is_last_past = events.get(index + 1).is_none_or(|next| next.time_yr > workspace.moment_yr);
            commands.extend(row(ui, workspace, event, when, is_last_past));
        }
        mild(ui, workspace);
        ui.add_space(4.0 * GRID);
    });
    commands
}

/// One word for every kind of event; a tick says whether it is listed.
fn filter(ui: &mut Ui, workspace: &mut Workspace) {
    ui.horizontal_wrapped(|ui| {
        ui.spacing_mut().item_spacing.x = 3.0 * GRID;
        for group in EventGroup::ALL {
            let mut is_shown = !workspace.hidden_events.contains(&group);
            if ui.checkbox(&mut is_shown, RichText::new(group.name()).font(small())).changed() {
                if is_shown {
                    workspace.hidden_events.retain(|hidden| *hidden != group);
                } else {
                    workspace.hidden_events.push(group);
                }
            }
        }
    });
}

/// Events of the chosen kinds: of the chosen body and of the star, or of everyone when the star is chosen.
fn shown(workspace: &Workspace) -> Vec<&Event> {
    let only = workspace.selected;
    let is_shown = |event: &&Event| {
        (only == Body::Star || event.body == Body::Star || event.body == only)
            && !workspace.hidden_events.contains(&event.kind.group())
    };
    workspace.history.events().iter().filter(is_shown).collect()
}

/// Dates with as many digits as tell neighbours apart.
fn dates(workspace: &Workspace, events: &[Event]) -> Vec<String> {
    let times_yr: Vec<f64> = events.iter().map(|event| event.time_yr).collect();
    spans_apart(&times_yr, workspace.settings.span_style)
}

/// An event as a line of text.
fn line(workspace: &Workspace, event: &Event, when: &str) -> String {
    let doubt = doubt(event, workspace.settings.span_style).map_or_else(String::new, |doubt| format!("\t{doubt}"));
    format!("{when}\t{}{doubt}", event.label(&workspace.history))
}

fn row(ui: &mut Ui, workspace: &Workspace, event: &Event, when: &str, is_last_past: bool) -> Option<Command> {
    let palette = workspace.palette();
    let (rect, response) = ui.allocate_exact_size(vec2(ui.available_width(), ROW), Sense::click());
    let label = event.label(&workspace.history);
    let doubt = doubt(event, workspace.settings.span_style);
    let said = doubt.as_ref().map_or_else(String::new, |doubt| format!(", {doubt}"));
    response.widget_info(|| WidgetInfo::labeled(Role::Button, true, format!("{when}{said}: {label}")));
    let is_past = event.time_yr <= workspace.moment_yr;
    if response.hovered() || response.has_focus() {
        ui.painter().rect_filled(rect, 3.0, palette.chosen);
    }
    let y = rect.center().y;
    let ink = if is_past { palette.text } else { palette.dim };
    let painter = ui.painter();
    painter.text(pos2(rect.left() + 128.0, y), Align2::RIGHT_CENTER, when, usual(), ink);
    let words = painter.text(pos2(rect.left() + 146.0, y), Align2::LEFT_CENTER, &label, usual(), ink);
    if let Some(doubt) = &doubt {
        let galley = painter.layout_no_wrap(doubt.clone(), small(), palette.dim);
        let left = (rect.left() + 440.0).max(words.right() + 12.0).min(rect.right() - galley.size().x - 8.0);
        // What has no room beside the words is said by the tooltip.
        if left >= words.right() + 8.0 {
            painter.galley(pos2(left, y - 0.5 * galley.size().y), galley, palette.dim);
        }
    }
    // A line between the last event before the moment and the first after it says where we are.
    if is_past && is_last_past {
        painter.hline(rect.x_range(), rect.bottom(), egui::Stroke::new(1.0, palette.accent));
    }
    let mut command = response.clicked().then_some(Command::Time(TimeCommand::To(event.time_yr)));
    response.context_menu(|ui| {
        if ui.button("Copy this line").clicked() {
            command = Some(Command::Copy(line(workspace, event, when)));
            ui.close();
        }
        if ui.button("Show the rule behind it").clicked() {
            command = Some(Command::ShowSource(event.kind.method()));
            ui.close();
        }
    });
    let hint = doubt.map_or_else(String::new, |doubt| format!("{doubt}\n"));
    response.on_hover_text(format!("{hint}Click to go there."));
    command
}

/// Stretches in which planets have open water, with their length.
fn mild(ui: &mut Ui, workspace: &Workspace) {
    let palette = workspace.palette();
    let style = workspace.settings.span_style;
    section(ui, palette, "Windows of mild climate");
    let planets = workspace.history.system().planets.iter().enumerate();
    let mut is_empty = true;
    for (index, planet) in planets {
        if matches!(workspace.selected, Body::Planet(only) if only != index) {
            continue;
        }
        for mild in mild_spans(&workspace.history, index) {
            is_empty = false;
            let ends = spans_apart(&[mild.from_yr, mild.until_yr], style);
            let length = span(mild.until_yr - mild.from_yr, LENGTH_DIGITS, style);
            let words = format!("{}: {} to {}, {length} long", planet.name, ends[0], ends[1]);
            ui.label(RichText::new(words).color(palette.text));
        }
    }
    if is_empty {
        ui.label(RichText::new("None: there is never open water on a planet here.").color(palette.dim));
    }
}
