//! One planet's climate at the moment: by latitude, between its thresholds, and through time.

use super::chart_view::{self, Frame};
use super::{latitude_plot, light_gauge_view};
use crate::figure::{LatitudeFigure, LightGauge};
use crate::system::ticks::ticks;
use crate::system::{Body, PlanetClimate};
use crate::window::command::Command;
use crate::window::theme::{GRID, small};
use crate::window::time_gesture;
use crate::window::widgets::choice::word;
use crate::window::workspace::Workspace;
use egui::{Align2, Rect, RichText, ScrollArea, Sense, Stroke, Ui, WidgetInfo, pos2, vec2};

/// Width from which profile and thresholds stand beside each other, points.
const WIDE: f32 = 760.0;
/// Least heights, points.
const LEAST_PROFILE: f32 = 170.0;
const LEAST_CHART: f32 = 130.0;
/// Height beyond which the curve of latitudes would only look steep, points.
const MOST_PROFILE: f32 = 460.0;
/// Room beside the time chart for its labels, and under it for ages, points.
const LABELS: f32 = 52.0;
const RIGHT: f32 = 10.0;
const FOOT: f32 = 20.0;

/// Draws the page.
pub(super) fn show(ui: &mut Ui, workspace: &mut Workspace) -> Vec<Command> {
    let palette = workspace.palette();
    let planets = &workspace.history.system().planets;
    let chosen = match workspace.selected {
        Body::Planet(index) if index < planets.len() => Some(index),
        _ => planets.iter().position(|planet| planet.water.is_some()).or_else(|| (!planets.is_empty()).then_some(0)),
    };
    let mut commands = Vec::new();
    ui.horizontal_wrapped(|ui| {
        ui.spacing_mut().item_spacing.x = 3.0 * GRID;
        for (index, planet) in planets.iter().enumerate() {
            let name = format!("Climate of {}", planet.name);
            let response = word(ui, palette, &planet.name, chosen == Some(index));
            response.ctx.accesskit_node_builder(response.id, |node| node.set_label(name));
            if response.clicked() {
                commands.push(Command::Select(Body::Planet(index)));
            }
        }
    });
    let Some(index) = chosen else {
        ui.add_space(4.0 * GRID);
        ui.label(RichText::new("There is no planet. Add one on the left.").color(palette.dim));
        return commands;
    };
    let name = planets[index].name.clone();
    let Some(climate) = workspace.history.climate_at(index, workspace.moment_yr) else { return commands };
    ui.label(RichText::new(climate.in_words(&name)).color(palette.text));
    ScrollArea::vertical().auto_shrink(false).show(ui, |ui| {
        let (width, height) = (ui.available_width(), ui.available_height());
        let gauge = LightGauge::new(&name, &climate);
        if width >= WIDE {
            ui.horizontal_top(|ui| {
                let half = 0.5 * width - 2.0 * GRID;
                ui.vertical(|ui| {
                    ui.set_width(half);
                    profile(ui, workspace, index, &name, &climate, (height - GRID).clamp(LEAST_PROFILE, MOST_PROFILE));
                });
                ui.add_space(2.0 * GRID);
                ui.vertical(|ui| {
                    ui.set_width(half);
                    let top = ui.cursor().top();
                    light_gauge_view::show(ui, palette, gauge.as_ref(), index);
                    let used = ui.cursor().top() - top;
                    commands.extend(through_time(ui, workspace, index, (height - used - 2.0 * GRID).max(LEAST_CHART)));
                });
            });
        } else {
            let rest = height - light_gauge_view::HEIGHT - 4.0 * GRID;
            profile(ui, workspace, index, &name, &climate, (0.56 * rest).max(LEAST_PROFILE));
            light_gauge_view::show(ui, palette, gauge.as_ref(), index);
            commands.extend(through_time(ui, workspace, index, (0.44 * rest).max(LEAST_CHART)));
        }
    });
    commands
}

/// Temperature by latitude, or why there is none.
fn profile(ui: &mut Ui, workspace: &Workspace, index: usize, name: &str, climate: &PlanetClimate, height: f32) {
    match &climate.latitudes {
        Ok(belts) => {
            let figure = LatitudeFigure::new(name, climate, belts);
            latitude_plot::show(ui, workspace.palette(), &figure, index, height);
        }
        Err(reason) => {
            ui.add_space(2.0 * GRID);
            ui.label(
                RichText::new(format!("No climate by latitude. {}", reason.text())).color(workspace.palette().dim),
            );
            ui.add_space(2.0 * GRID);
        }
    }
}

/// Starlight and states through time, with the moment's line.
fn through_time(ui: &mut Ui, workspace: &mut Workspace, index: usize, height: f32) -> Vec<Command> {
    let chart = workspace.derived.climate_chart(index).clone();
    let (area, response) = ui.allocate_exact_size(vec2(ui.available_width(), height), Sense::click_and_drag());
    response.widget_info(|| WidgetInfo::slider(true, workspace.moment_yr, "Moment on the starlight, years"));
    let plot = Rect::from_min_max(
        pos2(area.left() + LABELS, area.top() + 20.0),
        pos2(area.right() - RIGHT, area.bottom() - FOOT),
    );
    let hover = response.hover_pos().filter(|position| plot.x_range().contains(position.x));
    let frame =
        Frame { rect: plot, title_y: area.top() + 9.0, left: area.left(), hover_x: hover.map(|position| position.x) };
    chart_view::draw(ui, &frame, &chart, &[], workspace);
    let palette = workspace.palette();
    let count = (plot.width() / 110.0).max(2.0) as usize;
    for tick in ticks(&workspace.derived.axis, workspace.view.from, workspace.view.to, count) {
        let x = plot.left() + workspace.view.place_of(tick.fraction) as f32 * plot.width();
        ui.painter().vline(x, plot.bottom()..=plot.bottom() + 3.0, Stroke::new(1.0, palette.dim));
        ui.painter().text(pos2(x, plot.bottom() + 4.0), Align2::CENTER_TOP, tick.label, small(), palette.dim);
    }
    time_gesture::commands(&response, plot, workspace)
}
