//! The sky over a planet's horizon to scale: star, half-degree ring, air and ground in their colours.

use super::canvas::{Anchor, Area, Canvas, Stroke, lettering, stroke};
use super::fonts::width;
use super::ink::{Palette, hex};
use super::page::SMALL_SIZE;
use crate::figure::SkyPicture;
use crate::figure::sky_picture::{Circle, Magnified, SkyLayout};
use crate::units::number_text::number;

/// Draws a sky into an area.
pub(super) fn draw(canvas: &mut Canvas, area: Area, picture: &SkyPicture, palette: &Palette) {
    let layout = picture.layout(area.width(), area.height());
    let line = readable_on(picture.sky_srgb);
    let horizon = area.top + layout.horizon_y;
    let star = moved(area, layout.star);
    canvas.clipped(area, |canvas| {
        canvas.rect(area, &hex(picture.sky_srgb));
        canvas.disc([star.x, star.y], star.radius.max(0.8), &hex(picture.disc_srgb), None);
        canvas.rect(Area { top: horizon, ..area }, &hex(picture.ground_srgb));
        canvas.line([area.left, horizon], [area.right, horizon], stroke(line, 0.6));
        ring(canvas, moved(area, layout.reference), line);
        marks(canvas, area, &layout, line);
        labels(canvas, area, picture, &layout, line);
        if let Some(magnified) = layout.magnified.filter(|_| picture.disc_is_seen) {
            inset(canvas, area, picture, magnified, palette);
        }
    });
    canvas.closed_line(
        &[[area.left, area.top], [area.right, area.top], [area.right, area.bottom], [area.left, area.bottom]],
        stroke(palette.dim, 1.0),
    );
}

fn moved(area: Area, circle: Circle) -> Circle {
    Circle { x: area.left + circle.x, y: area.top + circle.y, radius: circle.radius }
}

/// The half-degree disc as a dashed ring; too small for dashes, as a plain one.
fn ring(canvas: &mut Canvas, circle: Circle, ink: &str) {
    let dashes = if circle.radius < 3.0 { "" } else { "3 3" };
    canvas.circle([circle.x, circle.y], circle.radius.max(1.0), Stroke { ink, width: 1.2, dashes });
}

/// Round altitudes at the left edge.
fn marks(canvas: &mut Canvas, area: Area, layout: &SkyLayout, ink: &str) {
    for altitude_deg in &layout.marks {
        let y = area.top + layout.horizon_y - altitude_deg * layout.points_per_degree;
        if y > area.top + 10.0 {
            canvas.line([area.left, y], [area.left + 6.0, y], stroke(ink, 1.0));
            let words = format!("{altitude_deg}°");
            canvas.text([area.left + 10.0, y + 3.9], &words, lettering(ink, SMALL_SIZE, Anchor::Start));
        }
    }
}

/// Names beside the discs: outside where there is room, else inside the star and under the ring.
fn labels(canvas: &mut Canvas, area: Area, picture: &SkyPicture, layout: &SkyLayout, ink: &str) {
    let (star, half_degree) = (moved(area, layout.star), moved(area, layout.reference));
    let letters = |anchor| lettering(ink, SMALL_SIZE, anchor);
    if !picture.disc_is_seen {
        let words = "the star's disc is lost in the glare of the air";
        canvas.text([area.centre()[0], area.top + 16.0], words, letters(Anchor::Middle));
    } else if star.x - star.radius > area.left + 76.0 {
        canvas.text([star.x - star.radius - 7.0, star.y + 3.9], "star", letters(Anchor::End));
    } else {
        let inside = lettering(readable_on(picture.disc_srgb), SMALL_SIZE, Anchor::Middle);
        canvas.text([star.x, star.y + 3.9], "star", inside);
    }
    let words = "half a degree";
    if half_degree.x + half_degree.radius + 12.0 + width(words, SMALL_SIZE, false) < area.right {
        canvas.text([half_degree.x + half_degree.radius + 7.0, half_degree.y + 3.9], words, letters(Anchor::Start));
    } else {
        let y = half_degree.y + half_degree.radius.max(1.0) + 14.0;
        canvas.text([area.right - 6.0, y], words, letters(Anchor::End));
    }
}

/// Both discs once more, magnified, on neutral ground.
fn inset(canvas: &mut Canvas, area: Area, picture: &SkyPicture, magnified: Magnified, palette: &Palette) {
    let plate =
        Area { left: area.right - 118.0, top: area.top + 8.0, right: area.right - 8.0, bottom: area.top + 82.0 };
    canvas.rect(plate, palette.bed);
    let y = plate.top + 29.0;
    let casing = Some(stroke(palette.casing, 1.0));
    canvas.disc([plate.left + 30.0, y], magnified.star_radius.max(0.8), &hex(picture.disc_srgb), casing);
    ring(canvas, Circle { x: plate.right - 30.0, y, radius: magnified.reference_radius }, palette.on_bed);
    let words = format!("magnified {}×", number(magnified.factor, 2));
    canvas.text([plate.centre()[0], plate.bottom - 8.0], &words, lettering(palette.on_bed, SMALL_SIZE, Anchor::Middle));
}

/// Black or white, whichever stands out more.
fn readable_on(ground_srgb: [u8; 3]) -> &'static str {
    let [red, green, blue] = ground_srgb.map(|channel| {
        let share = f64::from(channel) / 255.0;
        if share <= 0.04045 { share / 12.92 } else { ((share + 0.055) / 1.055).powf(2.4) }
    });
    let luminance = 0.2126 * red + 0.7152 * green + 0.0722 * blue;
    // Contrasts with black and white are equal where (L + 0.05)² = 1.05 · 0.05 (WCAG 2.1).
    if luminance > 0.179 { "#000000" } else { "#ffffff" }
}
