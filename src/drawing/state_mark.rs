//! The mark of a planet's state: shape and word carry it, colour only helps.

use super::canvas::{Canvas, Point, stroke};
use crate::system::PlanetState;

/// Draws the mark of a state about a centre, some 11 units wide.
pub(super) fn draw(canvas: &mut Canvas, [x, y]: Point, state: PlanetState, ink: &str) {
    let line = stroke(ink, 1.6);
    let at = |right: f64, down: f64| [x + right, y + down];
    match state {
        // Six arms, like a snowflake.
        PlanetState::Frozen => {
            for arm in 0..3 {
                let angle = std::f64::consts::PI / 3.0 * f64::from(arm) + std::f64::consts::FRAC_PI_2;
                let (right, down) = (5.5 * angle.cos(), 5.5 * angle.sin());
                canvas.line(at(-right, -down), at(right, down), line);
            }
        }
        PlanetState::Temperate => canvas.disc([x, y], 5.0, ink, None),
        // A disc under its own cloud line.
        PlanetState::Moist => {
            canvas.disc([x, y], 3.6, ink, None);
            canvas.line(at(-6.0, -5.5), at(6.0, -5.5), line);
        }
        // Three plumes of steam.
        PlanetState::Runaway => {
            for plume in [-4.0, 0.0, 4.0] {
                canvas.polyline(&[at(plume - 1.0, 5.0), at(plume + 1.0, 0.0), at(plume - 1.0, -5.0)], line);
            }
        }
        // A cracked square.
        PlanetState::Dry => {
            canvas.closed_line(&[at(-4.5, -4.5), at(4.5, -4.5), at(4.5, 4.5), at(-4.5, 4.5)], line);
            canvas.line(at(-1.5, -4.5), at(1.5, 4.5), line);
        }
        // Two halves drifting apart.
        PlanetState::TornApart => {
            canvas.polyline(&[at(-1.5, -5.0), at(-5.0, 0.0), at(-1.5, 5.0)], line);
            canvas.polyline(&[at(1.5, -5.0), at(5.0, 0.0), at(1.5, 5.0)], line);
        }
        PlanetState::TooHot => canvas.closed_line(&[at(0.0, -5.5), at(5.5, 4.5), at(-5.5, 4.5)], line),
        PlanetState::Engulfed => {
            canvas.line(at(-4.5, -4.5), at(4.5, 4.5), line);
            canvas.line(at(-4.5, 4.5), at(4.5, -4.5), line);
        }
        PlanetState::Unbound => {
            canvas.line(at(-5.0, 5.0), at(4.0, -4.0), line);
            canvas.polyline(&[at(-1.0, -5.0), at(5.0, -5.0), at(5.0, 1.0)], line);
        }
        PlanetState::Dark => canvas.circle([x, y], 4.5, line),
    }
}
