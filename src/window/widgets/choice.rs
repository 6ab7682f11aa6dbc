//! A row of words of which one is chosen: pages, scales, looks.

use crate::window::theme::{Palette, small, usual};
use egui::{Align2, Response, Role, Sense, Stroke, Ui, WidgetInfo, pos2, vec2};

/// A small caption before a row of words, on one line with them.
pub(crate) fn caption(ui: &mut Ui, palette: &Palette, text: &str) {
    let galley = ui.painter().layout_no_wrap(text.to_owned(), small(), palette.dim);
    let (rect, response) = ui.allocate_exact_size(vec2(galley.size().x, 24.0), Sense::hover());
    response.widget_info(|| WidgetInfo::labeled(Role::Label, true, text));
    ui.painter().text(rect.left_center(), Align2::LEFT_CENTER, text, small(), palette.dim);
}

/// One word of the row; the chosen one is underlined, not only coloured.
pub(crate) fn word(ui: &mut Ui, palette: &Palette, text: &str, is_chosen: bool) -> Response {
    let galley = ui.painter().layout_no_wrap(text.to_owned(), usual(), palette.text);
    let (rect, response) = ui.allocate_exact_size(vec2(galley.size().x + 4.0, 24.0), Sense::click());
    response.widget_info(|| WidgetInfo::selected(Role::RadioButton, true, is_chosen, text));
    let ink = if is_chosen || response.hovered() || response.has_focus() { palette.text } else { palette.dim };
    ui.painter().text(rect.center(), Align2::CENTER_CENTER, text, usual(), ink);
    if is_chosen || response.has_focus() {
        let width = if response.has_focus() { 3.0 } else { 2.0 };
        let y = rect.bottom() - 1.0;
        ui.painter().line_segment([pos2(rect.left(), y), pos2(rect.right(), y)], Stroke::new(width, palette.accent));
    }
    response
}
