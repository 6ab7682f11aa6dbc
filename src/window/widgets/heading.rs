//! Headings of panel sections.

use crate::window::fonts::BOLD;
use crate::window::theme::{GRID, Palette, SMALL_SIZE};
use egui::{FontFamily, FontId, RichText, Ui};

/// A small bold heading with air above it.
pub(crate) fn section(ui: &mut Ui, palette: &Palette, text: &str) {
    ui.add_space(3.0 * GRID);
    ui.label(RichText::new(text).font(FontId::new(SMALL_SIZE + 0.5, FontFamily::Name(BOLD.into()))).color(palette.dim));
    ui.add_space(0.5 * GRID);
}
