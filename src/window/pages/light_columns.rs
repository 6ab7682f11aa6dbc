//! Groups of figures side by side, as many as the width holds.

use crate::system::light_quantities::LightQuantity;
use crate::units::number_text::number;
use crate::window::command::Command;
use crate::window::theme::{GRID, Palette};
use crate::window::widgets::figure_row::{FigureRow, UNIT, figure_row};
use egui::Ui;

/// Least width of a column, points.
const LEAST_WIDTH: f32 = 232.0;
/// Largest width of a column, points.
const LARGEST_WIDTH: f32 = 320.0;
/// Most columns.
const MOST: usize = 3;

/// Lays out columns; the closure draws what belongs into the column of its index, given how many there are.
pub(super) fn columns(ui: &mut Ui, mut draw: impl FnMut(&mut Ui, usize, usize)) {
    let gap = 6.0 * GRID;
    let room = ui.available_width();
    let count = (((room + gap) / (LEAST_WIDTH + gap)) as usize).clamp(1, MOST);
    let width = ((room - gap * (count - 1) as f32) / count as f32).min(LARGEST_WIDTH);
    ui.horizontal_top(|ui| {
        ui.spacing_mut().item_spacing.x = gap;
        for column in 0..count {
            ui.vertical(|ui| {
                ui.spacing_mut().item_spacing.x = 2.0 * GRID;
                ui.set_width(width);
                draw(ui, column, count);
            });
        }
    });
}

/// The figures of these keys in their order; a figure without a value takes a row with a dash, so that nothing jumps.
pub(super) fn figures<T>(
    ui: &mut Ui,
    palette: &Palette,
    rows: &'static [LightQuantity<T>],
    keys: &[&str],
    light: Option<&T>,
) -> Vec<Command> {
    let known = keys.iter().filter_map(|key| rows.iter().find(|row| row.key == *key));
    known.filter_map(|quantity| figure(ui, palette, quantity, quantity.name, light)).collect()
}

/// One figure under a name of the page's own.
pub(super) fn figure<T>(
    ui: &mut Ui,
    palette: &Palette,
    quantity: &LightQuantity<T>,
    name: &str,
    light: Option<&T>,
) -> Option<Command> {
    let value = light.and_then(quantity.value);
    let row = FigureRow {
        name,
        value,
        text: value.map_or_else(|| "–".to_owned(), |value| number(value, quantity.digits)),
        symbol: if value.is_some() { quantity.symbol } else { "" },
        spread: None,
        method: quantity.method,
        unit_room: UNIT,
        told_of: None,
    };
    figure_row(ui, palette, &row)
}
