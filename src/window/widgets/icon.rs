//! Buttons whose sign is drawn, not typed: play, pause, steps, undo.

use crate::window::theme::Palette;
use egui::{Color32, Painter, Pos2, Rect, Response, Role, Sense, Shape, Stroke, Ui, Vec2, WidgetInfo, vec2};

/// A drawn sign.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(crate) enum Icon {
    /// Triangle to the right.
    Play,
    /// Two bars.
    Pause,
    /// Bar and triangle to the left.
    Previous,
    /// Triangle to the right and bar.
    Next,
    /// Arrow bent back.
    Undo,
    /// Arrow bent forth.
    Redo,
}

/// A button with a drawn sign; `name` is what assistive technology and the tooltip say.
pub(crate) fn icon_button(ui: &mut Ui, palette: &Palette, icon: Icon, name: &str, is_enabled: bool) -> Response {
    let (rect, response) = ui.allocate_exact_size(Vec2::splat(26.0), Sense::click());
    let response = if is_enabled { response } else { response.interact(Sense::hover()) };
    response.widget_info(|| WidgetInfo::labeled(Role::Button, is_enabled, name));
    if ui.is_rect_visible(rect) {
        let visuals = ui.style().interact(&response);
        if is_enabled && (response.hovered() || response.has_focus()) {
            ui.painter().rect(rect.shrink(1.0), 4.0, visuals.bg_fill, visuals.bg_stroke, egui::StrokeKind::Inside);
        }
        let ink = if is_enabled { palette.text } else { palette.dim.gamma_multiply(0.5) };
        draw(ui.painter(), rect.center(), icon, ink);
    }
    response.on_hover_text(name)
}

fn draw(painter: &Painter, centre: Pos2, icon: Icon, ink: Color32) {
    let at = |x: f32, y: f32| centre + vec2(x, y);
    let triangle = |points: Vec<Pos2>| Shape::convex_polygon(points, ink, Stroke::NONE);
    let bar = |x: f32| Rect::from_center_size(at(x, 0.0), vec2(2.5, 11.0));
    match icon {
        Icon::Play => {
            painter.add(triangle(vec![at(-4.0, -6.0), at(6.0, 0.0), at(-4.0, 6.0)]));
        }
        Icon::Pause => {
            painter.rect_filled(bar(-3.0), 0.5, ink);
            painter.rect_filled(bar(3.0), 0.5, ink);
        }
        Icon::Next => {
            painter.add(triangle(vec![at(-5.0, -5.0), at(3.0, 0.0), at(-5.0, 5.0)]));
            painter.rect_filled(bar(4.5), 0.5, ink);
        }
        Icon::Previous => {
            painter.add(triangle(vec![at(5.0, -5.0), at(5.0, 5.0), at(-3.0, 0.0)]));
            painter.rect_filled(bar(-4.5), 0.5, ink);
        }
        Icon::Undo | Icon::Redo => {
            let mirror = if icon == Icon::Undo { 1.0 } else { -1.0 };
            let arc: Vec<Pos2> = (0..=14)
                .map(|step| {
                    let angle = std::f32::consts::PI * (1.0 - step as f32 / 14.0 * 1.25);
                    at(mirror * (5.0 * angle.cos() + 0.5), 1.0 - 5.0 * angle.sin())
                })
                .collect();
            painter.add(Shape::line(arc, Stroke::new(1.6, ink)));
            painter.add(triangle(vec![at(-8.0 * mirror, 0.0), at(-mirror, 0.0), at(-4.5 * mirror, 5.0)]));
        }
    }
}
