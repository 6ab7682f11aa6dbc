//! The mark of a verdict: shape and word carry it, colour only helps.

use crate::system::statements::Verdict;
use crate::window::theme::Palette;
use egui::{Color32, Painter, Pos2, Shape, Stroke, vec2};

/// Draws the mark of a verdict about a centre.
pub(crate) fn draw(painter: &Painter, centre: Pos2, verdict: Verdict, ink: Color32) {
    let stroke = Stroke::new(2.0, ink);
    let at = |x: f32, y: f32| centre + vec2(x, y);
    match verdict {
        Verdict::Holds => {
            painter.add(Shape::line(vec![at(-5.0, 0.5), at(-1.5, 4.5), at(5.5, -4.5)], stroke));
        }
        // Two waves, one above the other.
        Verdict::WithinSpread => {
            for y in [-2.5, 2.5] {
                let wave = (0..=12).map(|step| {
                    let x = step as f32 - 6.0;
                    at(x, y - 1.4 * (x * std::f32::consts::PI / 6.0).sin())
                });
                painter.add(Shape::line(wave.collect(), Stroke::new(1.6, ink)));
            }
        }
        Verdict::DoesNotHold => {
            painter.line_segment([at(-4.5, -4.5), at(4.5, 4.5)], stroke);
            painter.line_segment([at(-4.5, 4.5), at(4.5, -4.5)], stroke);
        }
        Verdict::NotJudged => {
            painter.circle_stroke(centre, 4.5, Stroke::new(1.6, ink));
        }
    }
}

/// The colour that helps: the accent where nothing speaks against a statement, that of errors where something does.
pub(crate) fn ink(palette: &Palette, verdict: Verdict) -> Color32 {
    match verdict {
        Verdict::Holds => palette.accent,
        Verdict::WithinSpread => palette.text,
        Verdict::DoesNotHold => palette.error,
        Verdict::NotJudged => palette.dim,
    }
}
