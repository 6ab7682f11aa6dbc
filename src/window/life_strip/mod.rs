//! The scrubber along the bottom: a ribbon of the star's true colour over its whole life.

mod marks;
mod ribbon;
mod transport;

use super::command::Command;
use super::theme::{GRID, Palette, SMALL_SIZE, small};
use super::workspace::Workspace;
use super::{time_gesture, widgets};
use egui::{Align2, Pos2, Rect, Role, Sense, Stroke, Ui, WidgetInfo, pos2, vec2};

/// Height of the whole strip with its controls, points.
pub(super) const HEIGHT: f32 = 164.0;
/// Air left and right of the ribbon, points.
const INSET: f32 = 16.0;
/// Full height of the ribbon, points.
const RIBBON_HEIGHT: f32 = 62.0;

/// Draws the strip and returns what it was told.
pub(super) fn show(ui: &mut Ui, workspace: &Workspace) -> Vec<Command> {
    let palette = workspace.palette();
    let width = ui.available_width();
    let (strip, _) = ui.allocate_exact_size(vec2(width, 116.0), Sense::hover());
    let band = Rect::from_min_size(strip.min + vec2(INSET, 18.0), vec2(width - 2.0 * INSET, RIBBON_HEIGHT));
    let touch = Rect::from_min_max(pos2(band.left(), strip.top()), pos2(band.right(), band.bottom() + 8.0));
    let response = ui.interact(touch, ui.scope_id().with("life_strip"), Sense::click_and_drag());
    response.widget_info(|| WidgetInfo::slider(true, workspace.moment_yr, "Moment on the life strip, years"));
    let mut commands = time_gesture::commands(&response, band, workspace);
    ribbon::draw(ui.painter(), band, workspace);
    marks::time_ticks(ui.painter(), band, workspace);
    marks::phases(ui, band, workspace);
    commands.extend(marks::events(ui, band, workspace));
    marks::round(ui.painter(), band, workspace);
    draw_moment(ui, band, strip.top(), workspace, palette);
    if response.has_focus() {
        ui.painter().rect_stroke(band.expand(2.0), 3.0, Stroke::new(1.0, palette.accent), egui::StrokeKind::Outside);
    }
    ui.add_space(GRID);
    commands.extend(transport::show(ui, workspace));
    commands
}

/// The thin line of the moment with its time, and the quiet connector to the charts above.
fn draw_moment(ui: &Ui, band: Rect, top: f32, workspace: &Workspace, palette: &Palette) {
    let place = workspace.moment_place();
    if !(0.0..=1.0).contains(&place) {
        return;
    }
    let x = band.left() + place as f32 * band.width();
    let painter = ui.painter();
    // A dark casing on both sides keeps the line visible on any colour of the ribbon.
    painter.line_segment([pos2(x, top + 16.0), pos2(x, band.bottom() + 4.0)], Stroke::new(3.5, palette.ground));
    painter.line_segment([pos2(x, top + 16.0), pos2(x, band.bottom() + 4.0)], Stroke::new(1.5, palette.accent));
    let label = workspace.time_text(workspace.moment_yr);
    let galley = painter.layout_no_wrap(label, small(), palette.accent);
    let left = (x - 0.5 * galley.size().x).clamp(band.left(), (band.right() - galley.size().x).max(band.left()));
    let plate = Rect::from_min_size(Pos2::new(left, top + 1.0), galley.size());
    painter.rect_filled(plate.expand2(vec2(4.0, 1.0)), 3.0, palette.panel);
    painter.galley(plate.min, galley, palette.accent);
}

/// Leads the eye from the moment's line in the charts to the one on the strip: the two differ in width.
/// Drawn after both, over the border between their panels.
pub(super) fn connector(ui: &Ui, workspace: &Workspace) {
    let (Some(foot), place) = (workspace.chart_line_foot, workspace.moment_place()) else { return };
    if !(0.0..=1.0).contains(&place) {
        return;
    }
    let window = ui.ctx().content_rect();
    let strip_top = window.bottom() - HEIGHT + GRID;
    let x = window.left() + INSET + place as f32 * (window.width() - 2.0 * INSET);
    let quiet = Stroke::new(1.0, workspace.palette().accent.gamma_multiply(0.45));
    let painter = ui.painter().with_clip_rect(window);
    painter.line_segment([foot, pos2(foot.x, strip_top - 12.0)], quiet);
    painter.line_segment([pos2(foot.x, strip_top - 12.0), pos2(x, strip_top)], quiet);
}

/// A small text that gives way when there is no room.
fn fitting_text(painter: &egui::Painter, centre: Pos2, room: f32, text: &str, ink: egui::Color32) {
    let galley = painter.layout_no_wrap(text.to_owned(), small(), ink);
    if galley.size().x <= room {
        painter.text(centre, Align2::CENTER_CENTER, text, small(), ink);
    } else if room > 5.0 * SMALL_SIZE {
        let share = room / galley.size().x;
        let kept = (text.chars().count() as f32 * share) as usize;
        let short: String = text.chars().take(kept.saturating_sub(1)).collect();
        painter.text(centre, Align2::CENTER_CENTER, format!("{}…", short.trim_end()), small(), ink);
    }
}

/// Information for assistive technology about something that can be clicked.
fn named(response: &egui::Response, name: &str) {
    response.widget_info(|| WidgetInfo::labeled(Role::Button, true, name));
}

/// Icons used by the transport row.
use widgets::icon;
