//! Inks a planet's temperature from pole to pole.

use crate::figure::LatitudeFigure;
use crate::units::number_text::number;
use crate::window::theme::{Palette, small};
use egui::{Align2, Pos2, Rect, Role, Sense, Shape, Stroke, Ui, WidgetInfo, pos2, vec2};

/// Room left of the plot for its labels, right of it, above and below, points.
const LABELS: f32 = 52.0;
const RIGHT: f32 = 22.0;
const HEAD: f32 = 20.0;
const FOOT: f32 = 20.0;

/// Draws the figure in the ink of a planet.
pub(super) fn show(ui: &mut Ui, palette: &Palette, figure: &LatitudeFigure, planet: usize, height: f32) {
    let (area, response) = ui.allocate_exact_size(vec2(ui.available_width(), height), Sense::hover());
    response.widget_info(|| WidgetInfo::labeled(Role::Image, true, &figure.description));
    let rect = Rect::from_min_max(area.min + vec2(LABELS, HEAD), area.max - vec2(RIGHT, FOOT));
    let x = |latitude_deg: f64| rect.left() + ((latitude_deg + 90.0) / 180.0) as f32 * rect.width();
    let y = |value: f64| {
        let height = figure.axis.height(value).unwrap_or(0.0).clamp(-1.0, 2.0) as f32;
        rect.bottom() - height * rect.height()
    };
    let ink = palette.planets[planet % palette.planets.len()];
    let painter = ui.painter();
    painter.text(pos2(area.left(), area.top() + 9.0), Align2::LEFT_CENTER, figure.title, small(), palette.dim);
    for [from_deg, to_deg] in &figure.ice_deg {
        let stretch = Rect::from_min_max(pos2(x(*from_deg), rect.top()), pos2(x(*to_deg), rect.bottom()));
        painter.rect_filled(stretch, 0.0, palette.chosen);
        if stretch.width() > 22.0 {
            painter.text(pos2(stretch.center().x, rect.top() + 2.0), Align2::CENTER_TOP, "ice", small(), palette.dim);
        }
    }
    for tick in figure.axis.ticks((rect.height() / 40.0).max(2.0) as usize) {
        let y = rect.bottom() - tick.height as f32 * rect.height();
        painter.hline(rect.x_range(), y, Stroke::new(1.0, palette.hairline.gamma_multiply(0.75)));
        painter.text(pos2(rect.left() - 6.0, y), Align2::RIGHT_CENTER, tick.label, small(), palette.dim);
    }
    for (latitude_deg, label) in [
        (-90.0, "90° S"),
        (-60.0, "60° S"),
        (-30.0, "30° S"),
        (0.0, "equator"),
        (30.0, "30° N"),
        (60.0, "60° N"),
        (90.0, "90° N"),
    ] {
        let at = x(latitude_deg);
        painter.vline(at, rect.bottom()..=rect.bottom() + 3.0, Stroke::new(1.0, palette.dim));
        painter.text(pos2(at, rect.bottom() + 4.0), Align2::CENTER_TOP, label, small(), palette.dim);
    }
    for level in &figure.levels {
        let line = [pos2(rect.left(), y(level.value)), pos2(rect.right(), y(level.value))];
        painter.extend(Shape::dashed_line(&line, Stroke::new(1.0, palette.dim), 1.5, 4.0));
        let anchor = pos2(rect.center().x, line[0].y - 1.0);
        painter.text(anchor, Align2::CENTER_BOTTOM, &level.name, small(), palette.dim);
    }
    for edge_deg in &figure.ice_edges_deg {
        let at = x(*edge_deg);
        painter.extend(Shape::dashed_line(
            &[pos2(at, rect.top()), pos2(at, rect.bottom())],
            Stroke::new(1.2, palette.dim),
            4.0,
            3.0,
        ));
        let words = format!("ice edge {}°", number(edge_deg.abs(), 3));
        let (anchor, shift) = if *edge_deg > 0.0 { (Align2::RIGHT_TOP, -4.0) } else { (Align2::LEFT_TOP, 4.0) };
        painter.text(pos2(at + shift, rect.top() + 2.0), anchor, words, small(), palette.text);
    }
    let points: Vec<Pos2> =
        figure.profile.iter().map(|[latitude_deg, local_k]| pos2(x(*latitude_deg), y(*local_k))).collect();
    painter.add(Shape::line(points, Stroke::new(2.2, ink)));
    if let Some(pointer) = response.hover_pos().filter(|pointer| rect.contains(*pointer)) {
        let latitude_deg = f64::from((pointer.x - rect.left()) / rect.width()) * 180.0 - 90.0;
        if let Some(local_k) = figure.temperature_at_k(latitude_deg) {
            painter.circle(pos2(pointer.x, y(local_k)), 3.5, palette.ground, Stroke::new(1.6, palette.accent));
            let side = if latitude_deg < 0.0 { "S" } else { "N" };
            let words = format!("{}° {side} · {} K", number(latitude_deg.abs(), 2), number(local_k, 4));
            painter.text(pos2(rect.right(), area.top() + 9.0), Align2::RIGHT_CENTER, words, small(), palette.text);
        }
    }
}
