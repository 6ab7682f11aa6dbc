//! The mark of a planet's state: shape and word carry it, colour only helps.

use crate::system::PlanetState;
use egui::{Color32, Painter, Pos2, Shape, Stroke, vec2};

/// Draws the mark of a state about a centre.
pub(crate) fn draw(painter: &Painter, centre: Pos2, state: PlanetState, ink: Color32) {
    let stroke = Stroke::new(1.6, ink);
    let at = |x: f32, y: f32| centre + vec2(x, y);
    match state {
        // Six arms, like a snowflake.
        PlanetState::Frozen => {
            for arm in 0..3 {
                let angle = std::f32::consts::PI / 3.0 * arm as f32 + std::f32::consts::FRAC_PI_2;
                let tip = vec2(angle.cos(), angle.sin()) * 5.5;
                painter.line_segment([centre - tip, centre + tip], stroke);
            }
        }
        PlanetState::Temperate => {
            painter.circle_filled(centre, 5.0, ink);
        }
        PlanetState::TooHot => {
            painter.add(Shape::closed_line(vec![at(0.0, -5.5), at(5.5, 4.5), at(-5.5, 4.5)], stroke));
        }
        PlanetState::Engulfed => {
            painter.line_segment([at(-4.5, -4.5), at(4.5, 4.5)], stroke);
            painter.line_segment([at(-4.5, 4.5), at(4.5, -4.5)], stroke);
        }
        PlanetState::Unbound => {
            painter.line_segment([at(-5.0, 5.0), at(4.0, -4.0)], stroke);
            painter.line_segment([at(-1.0, -5.0), at(5.0, -5.0)], stroke);
            painter.line_segment([at(5.0, -5.0), at(5.0, 1.0)], stroke);
        }
        PlanetState::Dark => {
            painter.circle_stroke(centre, 4.5, stroke);
        }
    }
}
