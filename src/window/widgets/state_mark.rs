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
        // A disc under its own cloud line.
        PlanetState::Moist => {
            painter.circle_filled(centre, 3.6, ink);
            painter.line_segment([at(-6.0, -5.5), at(6.0, -5.5)], stroke);
        }
        // Three plumes of steam.
        PlanetState::Runaway => {
            for x in [-4.0, 0.0, 4.0] {
                painter.line_segment([at(x - 1.0, 5.0), at(x + 1.0, 0.0)], stroke);
                painter.line_segment([at(x + 1.0, 0.0), at(x - 1.0, -5.0)], stroke);
            }
        }
        // A cracked square.
        PlanetState::Dry => {
            painter.add(Shape::closed_line(vec![at(-4.5, -4.5), at(4.5, -4.5), at(4.5, 4.5), at(-4.5, 4.5)], stroke));
            painter.line_segment([at(-1.5, -4.5), at(1.5, 4.5)], stroke);
        }
        // Two halves drifting apart.
        PlanetState::TornApart => {
            painter.line_segment([at(-1.5, -5.0), at(-5.0, 0.0)], stroke);
            painter.line_segment([at(-5.0, 0.0), at(-1.5, 5.0)], stroke);
            painter.line_segment([at(1.5, -5.0), at(5.0, 0.0)], stroke);
            painter.line_segment([at(5.0, 0.0), at(1.5, 5.0)], stroke);
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
