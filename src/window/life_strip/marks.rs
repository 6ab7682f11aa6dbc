//! Round ages, phase names and event marks along the ribbon.

use super::{fitting_text, named};
use crate::system::Event;
use crate::system::ticks::ticks;
use crate::window::command::{Command, TimeCommand};
use crate::window::theme::small;
use crate::window::workspace::Workspace;
use egui::{Align2, Painter, Rect, Sense, Shape, Stroke, Ui, pos2, vec2};

/// Points that a time label takes with its air.
const LABEL_WIDTH: f32 = 110.0;

/// Marks and labels of round ages under the ribbon.
pub(super) fn time_ticks(painter: &Painter, band: Rect, workspace: &Workspace) {
    let palette = workspace.palette();
    let view = workspace.view;
    let count = (band.width() / LABEL_WIDTH).max(2.0) as usize;
    for tick in ticks(&workspace.derived.axis, view.from, view.to, count) {
        let x = band.left() + view.place_of(tick.fraction) as f32 * band.width();
        painter
            .line_segment([pos2(x, band.bottom() + 1.0), pos2(x, band.bottom() + 5.0)], Stroke::new(1.0, palette.dim));
        painter.text(pos2(x, band.bottom() + 6.0), Align2::CENTER_TOP, tick.label, small(), palette.dim);
    }
}

/// Brackets around the part that is played in a loop.
pub(super) fn round(painter: &Painter, band: Rect, workspace: &Workspace) {
    let Some(ends) = workspace.playback.loop_fractions else { return };
    let stroke = Stroke::new(2.0, workspace.palette().accent);
    for (fraction, inwards) in ends.into_iter().zip([5.0, -5.0]) {
        let place = workspace.view.place_of(fraction);
        if !(0.0..=1.0).contains(&place) {
            continue;
        }
        let x = band.left() + place as f32 * band.width();
        let (top, bottom) = (band.top() - 3.0, band.bottom() + 3.0);
        painter.vline(x, top..=bottom, stroke);
        for y in [top, bottom] {
            painter.line_segment([pos2(x, y), pos2(x + inwards, y)], stroke);
        }
    }
}

/// Names of the phases of life under the ages, each within its own stretch.
pub(super) fn phases(ui: &Ui, band: Rect, workspace: &Workspace) {
    let palette = workspace.palette();
    let y = band.bottom() + 29.0;
    let x_of = |fraction: f64| {
        (band.left() + workspace.view.place_of(fraction) as f32 * band.width()).clamp(band.left(), band.right())
    };
    for (index, (phase, from, to)) in workspace.derived.ribbon.phases.iter().enumerate() {
        let (left, right) = (x_of(*from), x_of(*to));
        if index > 0 {
            ui.painter().line_segment([pos2(left, y - 5.0), pos2(left, y + 5.0)], Stroke::new(1.0, palette.hairline));
        }
        let rect = Rect::from_min_max(pos2(left, y - 7.0), pos2(right, y + 7.0));
        fitting_text(ui.painter(), rect.center(), rect.width() - 8.0, phase.name(), palette.text);
        if rect.width() > 3.0 {
            let response = ui.interact(rect, ui.scope_id().with(("phase", index)), Sense::hover());
            response.on_hover_text(phase.name());
        }
    }
}

/// Event marks above the ribbon: hover says what and when, a click goes there.
pub(super) fn events(ui: &Ui, band: Rect, workspace: &Workspace) -> Vec<Command> {
    let palette = workspace.palette();
    let mut commands = Vec::new();
    for group in grouped(workspace, band) {
        let y = band.top() + 1.0;
        let tip = pos2(group.x, y + 6.0);
        let rect = Rect::from_center_size(pos2(group.x, y + 1.0), vec2(11.0, 13.0));
        let response = ui.interact(rect, ui.scope_id().with(("event", group.events[0].0)), Sense::click());
        let words: Vec<String> = group
            .events
            .iter()
            .map(|(_, event)| format!("{} · {}", workspace.time_text(event.time_yr), event.label(&workspace.history)))
            .collect();
        named(&response, &words.join("; "));
        let is_hot = response.hovered() || response.has_focus();
        let ink = if is_hot { palette.accent } else { palette.text };
        let mark = vec![tip, tip + vec2(-4.0, -7.0), tip + vec2(4.0, -7.0)];
        ui.painter().add(Shape::convex_polygon(mark, ink, Stroke::new(1.5, palette.panel)));
        if response.clicked() {
            commands.push(Command::Time(TimeCommand::To(group.events[0].1.time_yr)));
        }
        response.on_hover_text(words.join("\n"));
    }
    commands
}

/// Events that would cover each other, under one mark.
struct Group<'a> {
    x: f32,
    events: Vec<(usize, &'a Event)>,
}

fn grouped(workspace: &Workspace, band: Rect) -> Vec<Group<'_>> {
    let mut groups: Vec<Group<'_>> = Vec::new();
    for (index, event) in workspace.history.events().iter().enumerate() {
        let place = workspace.view.place_of(workspace.derived.axis.fraction_at(event.time_yr));
        if !(0.0..=1.0).contains(&place) || event.time_yr > workspace.derived.axis.to_yr() {
            continue;
        }
        let x = band.left() + place as f32 * band.width();
        match groups.last_mut() {
            Some(group) if x - group.x < 9.0 => group.events.push((index, event)),
            _ => groups.push(Group { x, events: vec![(index, event)] }),
        }
    }
    groups
}
