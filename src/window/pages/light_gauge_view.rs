//! Inks where a planet's starlight stands between the thresholds of its climate.

use super::chart_view::lane_shade;
use crate::figure::LightGauge;
use crate::units::number_text::number;
use crate::window::theme::{Palette, small};
use crate::window::widgets::state_mark;
use egui::{Align2, Rect, Role, Sense, Stroke, Ui, WidgetInfo, pos2, vec2};

/// Height of the whole gauge, points.
pub(super) const HEIGHT: f32 = 112.0;
/// Height of one row and room above the first, points.
const ROW: f32 = 20.0;
const HEAD: f32 = 36.0;
/// Room between the rows, in which the thresholds are named.
const GAP: f32 = 4.0;
/// Room left of the rows for their names and right of them, points.
const LABELS: f32 = 96.0;
const RIGHT: f32 = 14.0;

/// Draws the gauge in the ink of a planet; nothing for a planet without thresholds.
pub(super) fn show(ui: &mut Ui, palette: &Palette, gauge: Option<&LightGauge>, planet: usize) {
    let Some(gauge) = gauge else { return };
    let (area, response) = ui.allocate_exact_size(vec2(ui.available_width(), HEIGHT), Sense::hover());
    response.widget_info(|| WidgetInfo::labeled(Role::Image, true, &gauge.description));
    let painter = ui.painter();
    let title = "Starlight over the Earth's, and what it makes of the planet";
    painter.text(pos2(area.left(), area.top() + 9.0), Align2::LEFT_CENTER, title, small(), palette.dim);
    let (left, right) = (area.left() + LABELS, area.right() - RIGHT);
    let x = |value: f64| {
        let place = gauge.axis.height(value).unwrap_or(0.0).clamp(0.0, 1.0) as f32;
        left + place * (right - left)
    };
    let ink = palette.planets[planet % palette.planets.len()];
    let top_of = |row: usize| area.top() + HEAD + row as f32 * (ROW + GAP);
    for (index, row) in gauge.rows.iter().enumerate() {
        let is_in_force = index == gauge.row_in_force;
        let y = top_of(index) + 0.5 * ROW;
        let text_ink = if is_in_force { palette.text } else { palette.dim };
        painter.text(pos2(area.left(), y), Align2::LEFT_CENTER, row.name, small(), text_ink);
        for (from, to, state) in &row.spans {
            let rect = Rect::from_min_max(pos2(x(*from), top_of(index)), pos2(x(*to), top_of(index) + ROW));
            let strength = if is_in_force { 1.0 } else { 0.45 };
            painter.rect_filled(rect, 0.0, ink.gamma_multiply(strength * lane_shade(*state)));
            painter.vline(rect.left(), rect.y_range(), Stroke::new(1.0, palette.ground));
            let galley = painter.layout_no_wrap(state.name().to_owned(), small(), text_ink);
            if rect.width() > galley.size().x + 26.0 {
                state_mark::draw(painter, pos2(rect.left() + 9.0, y), *state, text_ink);
                painter.galley(pos2(rect.left() + 19.0, y - 0.5 * galley.size().y), galley, text_ink);
            } else if rect.width() > 16.0 {
                state_mark::draw(painter, rect.center(), *state, text_ink);
            }
        }
        if is_in_force {
            let whole = Rect::from_min_max(pos2(left, top_of(index)), pos2(right, top_of(index) + ROW));
            painter.rect_stroke(whole, 0.0, Stroke::new(1.2, palette.dim), egui::StrokeKind::Outside);
        }
        // The thresholds of ice stand above both rows, those of open water below.
        let foot = top_of(1) + ROW + 3.0;
        let mut last = f32::NEG_INFINITY;
        for mark in &row.marks {
            let words = format!("{} {}", mark.name, number(mark.value, 3));
            let galley = painter.layout_no_wrap(words, small(), palette.dim);
            let half = 0.5 * galley.size().x;
            let at = x(mark.value).clamp(left + half, right - half).max(last + half + 6.0);
            last = at + half;
            let y = if index == 0 { top_of(0) - 3.0 - galley.size().y } else { foot };
            painter.galley(pos2(at - half, y), galley, palette.dim);
        }
    }
    let at = x(gauge.light_earth);
    painter.vline(at, top_of(0) - 3.0..=top_of(1) + ROW + 3.0, Stroke::new(2.0, palette.accent));
    painter.circle_filled(pos2(at, top_of(gauge.row_in_force) + 0.5 * ROW), 4.0, palette.accent);
    let words = format!("now {}", number(gauge.light_earth, 3));
    painter.text(pos2(area.right() - RIGHT, area.top() + 9.0), Align2::RIGHT_CENTER, words, small(), palette.text);
}
