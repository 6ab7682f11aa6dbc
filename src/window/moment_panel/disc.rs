//! The star's disc in its true colour, to scale with the Sun, on neutral ground.

use crate::system::Moment;
use crate::units::number_text::number;
use crate::window::theme::{GRID, small};
use crate::window::workspace::Workspace;
use egui::{Align2, Color32, Rect, RichText, Role, Sense, Shape, Stroke, Ui, WidgetInfo, pos2, vec2};

/// Largest radius of a disc, points.
const LARGEST: f32 = 38.0;
/// Smallest disc that can be seen, points.
const SMALLEST: f32 = 1.5;

/// Draws star and Sun to one scale, with the colour in words and numbers below.
pub(super) fn show(ui: &mut Ui, workspace: &Workspace, moment: &Moment) {
    let palette = workspace.palette();
    let (rect, response) = ui.allocate_exact_size(vec2(ui.available_width(), 112.0), Sense::hover());
    response.widget_info(|| WidgetInfo::labeled(Role::Image, true, description(workspace, moment)));
    ui.painter().rect_filled(rect, 4.0, palette.bed);
    let painter = ui.painter().with_clip_rect(rect);
    let radius_rsun = moment.star.radius_rsun.unwrap_or(0.0) as f32;
    // The larger of the two fills the frame; the smaller keeps its true proportion.
    let scale = LARGEST / radius_rsun.max(1.0);
    let star_radius = (radius_rsun * scale).max(SMALLEST);
    let sun_radius = scale.max(SMALLEST);
    let star_centre = pos2(rect.left() + 0.31 * rect.width(), rect.center().y - 7.0);
    let sun_centre = pos2(rect.left() + 0.75 * rect.width(), rect.center().y - 7.0);
    let glow = moment.star.swatch.as_ref().filter(|swatch| swatch.chromaticity.is_some());
    let fill = glow.map_or(Color32::from_gray(8), |swatch| {
        let [r, g, b] = swatch.srgb;
        Color32::from_rgb(r, g, b)
    });
    painter.circle(star_centre, star_radius, fill, Stroke::new(1.0, palette.casing));
    let rim: Vec<egui::Pos2> = (0..=64)
        .map(|step| {
            let angle = std::f32::consts::TAU * step as f32 / 64.0;
            sun_centre + vec2(angle.cos(), angle.sin()) * sun_radius
        })
        .collect();
    if sun_radius > 4.0 {
        painter.extend(Shape::dashed_line(&rim, Stroke::new(1.0, palette.on_bed), 3.0, 3.0));
    } else {
        painter.circle_filled(sun_centre, sun_radius, palette.on_bed);
    }
    painter.text(
        pos2(sun_centre.x, rect.bottom() - 4.0),
        Align2::CENTER_BOTTOM,
        "Sun, same scale",
        small(),
        palette.on_bed,
    );
    if star_radius <= SMALLEST {
        let ring = Rect::from_center_size(star_centre, vec2(22.0, 22.0));
        painter.circle_stroke(ring.center(), 11.0, Stroke::new(1.0, palette.on_bed));
        painter.text(
            pos2(star_centre.x, rect.bottom() - 4.0),
            Align2::CENTER_BOTTOM,
            "drawn larger",
            small(),
            palette.on_bed,
        );
    }
    ui.add_space(0.5 * GRID);
    ui.label(RichText::new(colour_line(workspace, moment)).font(small()).color(palette.dim));
}

fn colour_line(workspace: &Workspace, moment: &Moment) -> String {
    match moment.star.swatch.as_ref().filter(|swatch| swatch.chromaticity.is_some()) {
        Some(swatch) => format!("{}, {} · blackbody on a D65 screen", workspace.colour_words, swatch.hex()),
        None => workspace.colour_words.to_owned(),
    }
}

fn description(workspace: &Workspace, moment: &Moment) -> String {
    let size = moment
        .star
        .radius_rsun
        .map_or_else(|| "no size".to_owned(), |radius| format!("{} solar radii", number(radius, 3)));
    format!("Disc of the star: {}, {size}", colour_line(workspace, moment))
}
