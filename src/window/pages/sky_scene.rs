//! Inks the sky over a horizon: colours and places come ready made.

use crate::figure::SkyPicture;
use crate::figure::sky_picture::{Circle, Magnified, SkyLayout};
use crate::units::number_text::number;
use crate::window::theme::{Palette, contrast, small};
use egui::{Align2, Color32, Painter, Pos2, Rect, Shape, Stroke, Ui, pos2, vec2};

/// Draws a sky into a rectangle.
pub(super) fn draw(ui: &Ui, rect: Rect, picture: &SkyPicture, palette: &Palette) {
    let layout = picture.layout(f64::from(rect.width()), f64::from(rect.height()));
    let painter = ui.painter().with_clip_rect(rect.intersect(ui.clip_rect()));
    let sky = ink(picture.sky_srgb);
    let line = readable_on(sky, palette);
    let horizon_y = rect.top() + layout.horizon_y as f32;
    painter.rect_filled(rect, 0.0, sky);
    let star = centre(rect, layout.star);
    painter.circle_filled(star, (layout.star.radius as f32).max(0.8), ink(picture.disc_srgb));
    let ground = Rect::from_min_max(pos2(rect.left(), horizon_y), rect.max);
    painter.rect_filled(ground, 0.0, ink(picture.ground_srgb));
    painter.hline(rect.x_range(), horizon_y, Stroke::new(1.0, line.gamma_multiply(0.5)));
    reference(&painter, rect, &layout, line);
    marks(&painter, rect, &layout, line);
    labels(&painter, rect, picture, &layout, (line, palette));
    if let Some(magnified) = layout.magnified.filter(|_| picture.disc_is_seen) {
        inset(&painter, rect, picture, magnified, palette);
    }
    ui.painter().rect_stroke(rect, 0.0, Stroke::new(1.0, palette.hairline), egui::StrokeKind::Outside);
}

fn centre(rect: Rect, circle: Circle) -> Pos2 {
    rect.min + vec2(circle.x as f32, circle.y as f32)
}

/// The half-degree disc as a dashed ring; too small for dashes, as a plain one.
fn reference(painter: &Painter, rect: Rect, layout: &SkyLayout, line: Color32) {
    ring(painter, centre(rect, layout.reference), layout.reference.radius as f32, line);
}

fn ring(painter: &Painter, centre: Pos2, radius: f32, line: Color32) {
    if radius < 3.0 {
        painter.circle_stroke(centre, radius.max(1.0), Stroke::new(1.0, line));
        return;
    }
    let rim: Vec<Pos2> = (0..=72)
        .map(|step| {
            let angle = std::f32::consts::TAU * step as f32 / 72.0;
            centre + vec2(angle.cos(), angle.sin()) * radius
        })
        .collect();
    painter.extend(Shape::dashed_line(&rim, Stroke::new(1.2, line), 3.0, 3.0));
}

/// Round altitudes at the left edge.
fn marks(painter: &Painter, rect: Rect, layout: &SkyLayout, line: Color32) {
    for altitude_deg in &layout.marks {
        let y = rect.top() + (layout.horizon_y - altitude_deg * layout.points_per_degree) as f32;
        if y < rect.top() + 8.0 {
            continue;
        }
        painter.hline(rect.left()..=rect.left() + 6.0, y, Stroke::new(1.0, line));
        let words = format!("{altitude_deg}°");
        painter.text(pos2(rect.left() + 10.0, y), Align2::LEFT_CENTER, words, small(), line);
    }
}

/// Names beside the discs: outside where there is room, else inside the star and under the ring.
fn labels(
    painter: &Painter,
    rect: Rect,
    picture: &SkyPicture,
    layout: &SkyLayout,
    (line, palette): (Color32, &Palette),
) {
    let (star, star_radius) = (centre(rect, layout.star), layout.star.radius as f32);
    let (ring, ring_radius) = (centre(rect, layout.reference), layout.reference.radius as f32);
    if !picture.disc_is_seen {
        let words = "the star's disc is lost in the glare of the air";
        painter.text(pos2(rect.center().x, rect.top() + 12.0), Align2::CENTER_CENTER, words, small(), line);
    } else if star.x - star_radius > rect.left() + 76.0 {
        painter.text(pos2(star.x - star_radius - 6.0, star.y), Align2::RIGHT_CENTER, "star", small(), line);
    } else {
        painter.text(star, Align2::CENTER_CENTER, "star", small(), readable_on(ink(picture.disc_srgb), palette));
    }
    let words = painter.layout_no_wrap("half a degree".to_owned(), small(), line);
    if ring.x + ring_radius + 10.0 + words.size().x < rect.right() {
        painter.galley(pos2(ring.x + ring_radius + 6.0, ring.y - 0.5 * words.size().y), words, line);
    } else {
        let left = rect.right() - 6.0 - words.size().x;
        painter.galley(pos2(left, ring.y + ring_radius.max(1.0) + 3.0), words, line);
    }
}

/// Both discs once more, magnified, on neutral ground.
fn inset(painter: &Painter, rect: Rect, picture: &SkyPicture, magnified: Magnified, palette: &Palette) {
    let plate = Rect::from_min_size(pos2(rect.right() - 112.0, rect.top() + 6.0), vec2(106.0, 70.0));
    painter.rect_filled(plate, 3.0, palette.bed);
    let y = plate.top() + 27.0;
    let (star_radius, half_degree) = (magnified.star_radius as f32, magnified.reference_radius as f32);
    let star = pos2(plate.left() + 30.0, y);
    painter.circle(star, star_radius.max(0.8), ink(picture.disc_srgb), Stroke::new(1.0, palette.casing));
    ring(painter, pos2(plate.right() - 30.0, y), half_degree, palette.on_bed);
    let words = format!("magnified {}×", number(magnified.factor, 2));
    painter.text(pos2(plate.center().x, plate.bottom() - 10.0), Align2::CENTER_CENTER, words, small(), palette.on_bed);
}

/// The theme's own ink or ground where one of them can be read on a colour, else black or white.
fn readable_on(ground: Color32, palette: &Palette) -> Color32 {
    let reads = |ink: &Color32| contrast(*ink, ground) >= 4.5;
    let black_or_white = [Color32::BLACK, Color32::WHITE].into_iter().find(reads);
    [palette.text, palette.ground].into_iter().find(reads).or(black_or_white).unwrap_or(Color32::WHITE)
}

fn ink([red, green, blue]: [u8; 3]) -> Color32 {
    Color32::from_rgb(red, green, blue)
}
