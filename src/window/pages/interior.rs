//! The inside of the star at the moment, layer by layer, where its structure is computed.

use super::interior_plot;
use crate::figure::InteriorPicture;
use crate::figure::interior::{LayerFigure, LayerPanel, LayerScale};
use crate::units::number_text::number;
use crate::window::command::Command;
use crate::window::theme::{GRID, Palette, small};
use crate::window::widgets::choice::{caption, word};
use crate::window::workspace::Workspace;
use egui::{RichText, Role, ScrollArea, Sense, Ui, WidgetInfo, vec2};

/// Width from which two panels, and three, stand side by side, points.
const TWO_COLUMNS: f32 = 560.0;
const THREE_COLUMNS: f32 = 1200.0;
/// Least height of a panel, points.
const LEAST_HEIGHT: f32 = 150.0;
/// Room between panels, points.
const GAP: f32 = 12.0;

/// Draws the page.
pub(super) fn show(ui: &mut Ui, workspace: &Workspace) -> Vec<Command> {
    let palette = workspace.palette();
    let profile = match workspace.history.life().profile_at(workspace.moment_yr) {
        Ok(profile) => profile,
        Err(why) => {
            ui.add_space(4.0 * GRID);
            ui.label(RichText::new(format!("No layers to show: {why}.")).color(palette.dim));
            return Vec::new();
        }
    };
    let commands = switches(ui, palette, workspace.layer_scale);
    let picture = InteriorPicture::new(&profile, workspace.layer_scale, &LayerFigure::ALL);
    let words = picture.mixing_words();
    ui.label(RichText::new(format!("{words}. Hatched: mixed.")).font(small()).color(palette.dim));
    let columns = match ui.available_width() {
        width if width >= THREE_COLUMNS => 3,
        width if width >= TWO_COLUMNS => 2,
        _ => 1,
    };
    let rows = picture.panels.len().div_ceil(columns) as f32;
    let height = ((ui.available_height() - (rows - 1.0) * GAP) / rows - GRID).max(LEAST_HEIGHT);
    ScrollArea::vertical().auto_shrink(false).show(ui, |ui| {
        ui.spacing_mut().item_spacing = vec2(GAP, GAP);
        let width = (ui.available_width() - (columns as f32 - 1.0) * GAP) / columns as f32;
        for row in picture.panels.chunks(columns) {
            ui.horizontal(|ui| {
                for panel in row {
                    let (area, response) = ui.allocate_exact_size(vec2(width, height), Sense::hover());
                    response.widget_info(|| WidgetInfo::labeled(Role::Image, true, description(panel, &words)));
                    interior_plot::draw(ui, area, &picture, panel, response.hover_pos(), palette);
                }
            });
        }
    });
    commands
}

fn switches(ui: &mut Ui, palette: &Palette, chosen: LayerScale) -> Vec<Command> {
    let mut commands = Vec::new();
    ui.horizontal_wrapped(|ui| {
        ui.spacing_mut().item_spacing.x = 3.0 * GRID;
        caption(ui, palette, "Against");
        for scale in LayerScale::ALL {
            if word(ui, palette, scale.name(), chosen == scale).clicked() {
                commands.push(Command::SetLayerScale(scale));
            }
        }
    });
    commands
}

/// What a panel shows, in words: each line from the centre to the surface, and where the gas is mixed.
fn description(panel: &LayerPanel, mixing: &str) -> String {
    let lines: Vec<String> = panel
        .lines
        .iter()
        .filter_map(|line| {
            let [first, last] = [line.points.first()?, line.points.last()?];
            Some(format!("{} {} at the centre, {} at the surface", line.name, number(first[1], 3), number(last[1], 3)))
        })
        .collect();
    format!("{} through the star: {}. {mixing}", panel.figure.title(), lines.join("; "))
}
