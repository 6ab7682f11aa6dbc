//! The ribbon itself: colour is data, so it stands on neutral ground with a neutral casing.

use crate::figure::ribbon::Upright;
use crate::window::workspace::Workspace;
use egui::epaint::{Mesh, Vertex, WHITE_UV};
use egui::{Color32, Painter, Pos2, Rect, Shape, Stroke, pos2};

/// Draws the ribbon of the view across a band.
pub(super) fn draw(painter: &Painter, band: Rect, workspace: &Workspace) {
    let palette = workspace.palette();
    let uprights = &workspace.derived.ribbon.uprights;
    if !palette.is_dark {
        painter.rect_filled(band, 2.0, palette.bed);
    }
    let x_of = |upright: &Upright| band.left() + workspace.view.place_of(upright.fraction) as f32 * band.width();
    let half = |upright: &Upright| 0.5 * upright.height as f32 * band.height();
    let middle = band.center().y;
    let mut mesh = Mesh::default();
    for pair in uprights.windows(2) {
        if !(pair[0].glows && pair[1].glows) {
            continue;
        }
        let first = mesh.vertices.len() as u32;
        for upright in pair {
            let [r, g, b] = upright.colour_srgb;
            let color = Color32::from_rgb(r, g, b);
            let x = x_of(upright);
            for y in [middle - half(upright), middle + half(upright)] {
                mesh.vertices.push(Vertex { pos: pos2(x, y), uv: WHITE_UV, color });
            }
        }
        mesh.indices.extend([first, first + 1, first + 2, first + 1, first + 3, first + 2]);
    }
    painter.add(Shape::mesh(mesh));
    let casing = Stroke::new(1.0, palette.casing);
    let edge = |sign: f32| -> Vec<Pos2> {
        uprights.iter().map(|upright| pos2(x_of(upright), middle + sign * half(upright))).collect()
    };
    painter.add(Shape::line(edge(-1.0), casing));
    painter.add(Shape::line(edge(1.0), casing));
}
