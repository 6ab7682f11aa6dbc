//! Strip charts over one shared time axis and one cursor.

use super::chart_view::{self, Frame};
use crate::figure::curves::Curve;
use crate::system::ticks::ticks;
use crate::window::command::Command;
use crate::window::theme::{GRID, small};
use crate::window::time_gesture;
use crate::window::workspace::Workspace;
use egui::{Align2, Rect, RichText, ScrollArea, Sense, Stroke, Ui, WidgetInfo, pos2, vec2};

/// Room left of the charts for their labels, points.
const LABELS: f32 = 52.0;
/// Room right of the charts, points.
const RIGHT: f32 = 10.0;
/// Least height of one chart, points.
const LEAST_HEIGHT: f32 = 92.0;
/// Room for the time labels under the charts, points.
const FOOT: f32 = 24.0;

/// Draws the charts.
pub(super) fn show(ui: &mut Ui, workspace: &mut Workspace) -> Vec<Command> {
    let mut commands = chooser(ui, workspace);
    let palette = workspace.palette();
    if workspace.derived.charts.is_empty() {
        ui.add_space(4.0 * GRID);
        ui.label(RichText::new("No curve is chosen. Pick one above.").color(palette.dim));
        return commands;
    }
    let count = workspace.derived.charts.len() as f32;
    let room = ui.available_height() - FOOT - GRID;
    let height = (room / count).max(LEAST_HEIGHT);
    let mut line_foot = None;
    ScrollArea::vertical().max_height(room).auto_shrink([false, true]).show(ui, |ui| {
        let (area, response) =
            ui.allocate_exact_size(vec2(ui.available_width(), height * count), Sense::click_and_drag());
        response.widget_info(|| WidgetInfo::slider(true, workspace.moment_yr, "Moment on the curves, years"));
        let plot =
            Rect::from_min_max(pos2(area.left() + LABELS, area.top()), pos2(area.right() - RIGHT, area.bottom()));
        commands.extend(time_gesture::commands(&response, plot, workspace));
        let hover = response.hover_pos().filter(|position| plot.x_range().contains(position.x));
        for (index, chart) in workspace.derived.charts.iter().enumerate() {
            let top = area.top() + index as f32 * height;
            let rect = Rect::from_min_max(pos2(plot.left(), top + 20.0), pos2(plot.right(), top + height - 8.0));
            let frame =
                Frame { rect, title_y: top + 9.0, left: area.left(), hover_x: hover.map(|position| position.x) };
            let references = workspace.derived.references.get(index).map_or(&[][..], Vec::as_slice);
            chart_view::draw(ui, &frame, chart, references, workspace);
        }
        let place = workspace.moment_place();
        if (0.0..=1.0).contains(&place) {
            let x = plot.left() + place as f32 * plot.width();
            line_foot = Some(pos2(x, area.bottom().min(ui.clip_rect().bottom()) - 8.0));
        }
        if let Some(position) = hover {
            ui.painter().vline(
                position.x,
                area.top() + 18.0..=area.bottom(),
                Stroke::new(1.0, palette.dim.gamma_multiply(0.5)),
            );
        }
    });
    workspace.chart_line_foot = line_foot;
    time_labels(ui, workspace);
    commands
}

/// One word for every chart; a tick says whether it is shown.
fn chooser(ui: &mut Ui, workspace: &Workspace) -> Vec<Command> {
    let mut commands = Vec::new();
    ui.horizontal_wrapped(|ui| {
        ui.spacing_mut().item_spacing.x = 3.0 * GRID;
        for curve in Curve::ALL {
            let mut is_shown = workspace.curves.contains(&curve);
            if ui.checkbox(&mut is_shown, RichText::new(curve.name()).font(small())).changed() {
                commands.push(Command::ToggleCurve(curve));
            }
        }
    });
    commands
}

fn time_labels(ui: &mut Ui, workspace: &Workspace) {
    let palette = workspace.palette();
    let (foot, _) = ui.allocate_exact_size(vec2(ui.available_width(), FOOT - GRID), Sense::hover());
    let plot = Rect::from_min_max(pos2(foot.left() + LABELS, foot.top()), pos2(foot.right() - RIGHT, foot.bottom()));
    let count = (plot.width() / 110.0).max(2.0) as usize;
    for tick in ticks(&workspace.derived.axis, workspace.view.from, workspace.view.to, count) {
        let x = plot.left() + workspace.view.place_of(tick.fraction) as f32 * plot.width();
        ui.painter().vline(x, foot.top()..=foot.top() + 3.0, Stroke::new(1.0, palette.dim));
        ui.painter().text(pos2(x, foot.top() + 3.0), Align2::CENTER_TOP, tick.label, small(), palette.dim);
    }
}
