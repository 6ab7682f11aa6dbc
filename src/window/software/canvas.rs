//! A picture in memory onto which a frame of the window is painted.

use super::textures::Textures;
use super::triangle::{Clip, Rows, corner, fill};
use egui::epaint::Primitive;
use egui::{ClippedPrimitive, Color32, TexturesDelta};
use std::thread;

/// Rows that one thread paints at least: below this another thread costs more than it saves.
const LEAST_ROWS: usize = 96;
/// More threads than this gain nothing: the frame is mostly waiting for memory then.
const MOST_THREADS: usize = 8;

/// The picture: one number a pixel, red, green and blue in its lower three bytes.
#[derive(Debug, Default)]
pub struct Canvas {
    width: usize,
    height: usize,
    pixels: Vec<u32>,
    textures: Textures,
}

impl Canvas {
    /// Paints a frame: what [`egui::Context::tessellate`] made, over one colour.
    pub fn paint(
        &mut self,
        [width, height]: [usize; 2],
        pixels_per_point: f32,
        ground: Color32,
        primitives: &[ClippedPrimitive],
        textures: &mut TexturesDelta,
    ) {
        self.textures.take(textures);
        (self.width, self.height) = (width, height);
        let [red, green, blue, _] = ground.to_array().map(u32::from);
        self.pixels.clear();
        self.pixels.resize(width * height, red << 16 | green << 8 | blue);
        let threads = thread::available_parallelism().map_or(1, usize::from).min(MOST_THREADS).min(height / LEAST_ROWS);
        let band_rows = height.div_ceil(threads.max(1)).max(1);
        let (known, width) = (&self.textures, self.width);
        // Each thread paints every triangle, but only its own rows: the result does not depend on their number.
        thread::scope(|scope| {
            for (band, pixels) in self.pixels.chunks_mut((band_rows * width).max(1)).enumerate() {
                let mut rows = Rows { pixels, width, first: band * band_rows };
                scope.spawn(move || paint_band(&mut rows, known, pixels_per_point, primitives));
            }
        });
        self.textures.free(textures);
    }

    /// Width and height, pixels.
    #[must_use]
    pub fn size(&self) -> [usize; 2] {
        [self.width, self.height]
    }

    /// The pixels row by row, red, green and blue in the lower three bytes of each.
    #[must_use]
    pub fn pixels(&self) -> &[u32] {
        &self.pixels
    }

    /// The pixels row by row as red, green, blue.
    #[must_use]
    pub fn rgb(&self) -> Vec<u8> {
        self.pixels.iter().flat_map(|pixel| [(pixel >> 16) as u8, (pixel >> 8) as u8, *pixel as u8]).collect()
    }
}

fn paint_band(rows: &mut Rows<'_>, textures: &Textures, pixels_per_point: f32, primitives: &[ClippedPrimitive]) {
    let last = rows.first + rows.pixels.len() / rows.width.max(1);
    for ClippedPrimitive { clip_rect, primitive } in primitives {
        let Primitive::Mesh(mesh) = primitive else { continue };
        let Some(texture) = textures.get(mesh.texture_id) else { continue };
        let whole = |points: f32| (points * pixels_per_point).round().clamp(0.0, 1e9) as usize;
        let clip = Clip {
            columns: [whole(clip_rect.left()), whole(clip_rect.right()).min(rows.width)],
            rows: [whole(clip_rect.top()).max(rows.first), whole(clip_rect.bottom()).min(last)],
        };
        if clip.columns[0] >= clip.columns[1] || clip.rows[0] >= clip.rows[1] {
            continue;
        }
        for triangle in mesh.indices.chunks_exact(3) {
            let corners = [0, 1, 2].map(|index| mesh.vertices.get(triangle[index] as usize));
            if let [Some(a), Some(b), Some(c)] = corners {
                fill(rows, clip, [a, b, c].map(|vertex| corner(vertex, pixels_per_point)), texture);
            }
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use egui::epaint::{ImageDelta, Mesh};
    use egui::{ColorImage, Rect, TextureId, TextureOptions, pos2, vec2};

    fn white() -> TexturesDelta {
        let mut delta = TexturesDelta::default();
        let image = ColorImage::filled([1, 1], Color32::WHITE);
        delta
            .set
            .insert(TextureId::default(), [ImageDelta::full(image, TextureOptions::NEAREST)].into_iter().collect());
        delta
    }

    fn painted(size: [usize; 2], meshes: Vec<Mesh>) -> Canvas {
        let whole = Rect::from_min_size(pos2(0.0, 0.0), vec2(size[0] as f32, size[1] as f32));
        let primitives: Vec<ClippedPrimitive> = meshes
            .into_iter()
            .map(|mesh| ClippedPrimitive { clip_rect: whole, primitive: Primitive::Mesh(mesh) })
            .collect();
        let mut canvas = Canvas::default();
        canvas.paint(size, 1.0, Color32::BLACK, &primitives, &mut white());
        canvas
    }

    fn rectangle(rect: Rect, colour: Color32) -> Mesh {
        let mut mesh = Mesh::default();
        mesh.add_colored_rect(rect, colour);
        mesh
    }

    #[test]
    fn a_rectangle_covers_just_the_pixels_whose_centres_it_holds() {
        let rect = Rect::from_min_max(pos2(1.0, 2.0), pos2(4.4, 5.6));
        let canvas = painted([8, 8], vec![rectangle(rect, Color32::WHITE)]);
        for y in 0..8_usize {
            for x in 0..8_usize {
                let is_inside = (1..4).contains(&x) && (2..6).contains(&y);
                assert_eq!(canvas.pixels()[8 * y + x], if is_inside { 0x00ff_ffff } else { 0 }, "{x} {y}");
            }
        }
    }

    #[test]
    fn triangles_that_share_an_edge_leave_no_gap_and_overlap_nowhere() {
        // Half-transparent: a pixel painted twice would be brighter than the rest.
        let colour = Color32::from_rgba_premultiplied(100, 100, 100, 100);
        let mut mesh = Mesh::default();
        let centre = pos2(150.3, 149.7);
        let rim = |step: u32| centre + 140.0 * egui::Vec2::angled(0.1 + std::f32::consts::TAU * step as f32 / 37.0);
        mesh.colored_vertex(centre, colour);
        for step in 0..37 {
            mesh.colored_vertex(rim(step), colour);
            mesh.add_triangle(0, 1 + step, 1 + (step + 1) % 37);
        }
        let canvas = painted([300, 300], vec![mesh]);
        for y in 0..300_usize {
            for x in 0..300_usize {
                let distance = pos2(x as f32 + 0.5, y as f32 + 0.5).distance(centre);
                let pixel = canvas.pixels()[300 * y + x];
                if distance < 138.0 {
                    assert_eq!(pixel, 0x0064_6464, "{x} {y}");
                } else if distance > 141.0 {
                    assert_eq!(pixel, 0, "{x} {y}");
                }
            }
        }
    }

    #[test]
    fn colours_run_evenly_between_corners() {
        let mut mesh = Mesh::default();
        for (at, colour) in [
            (pos2(0.0, 0.0), Color32::BLACK),
            (pos2(256.0, 0.0), Color32::WHITE),
            (pos2(256.0, 4.0), Color32::WHITE),
            (pos2(0.0, 4.0), Color32::BLACK),
        ] {
            mesh.colored_vertex(at, colour);
        }
        mesh.add_triangle(0, 1, 2);
        mesh.add_triangle(0, 2, 3);
        let canvas = painted([256, 4], vec![mesh]);
        for x in 0..256_usize {
            let grey = canvas.pixels()[256 + x] & 255;
            assert!(grey.abs_diff(x as u32) <= 1, "{x}: {grey}");
        }
    }

    #[test]
    fn wild_numbers_paint_nothing_and_stop_nothing() {
        let mut mesh = Mesh::default();
        for at in [pos2(f32::NAN, 0.0), pos2(1e30, 5.0), pos2(-1e30, f32::INFINITY), pos2(3.0, 3.0)] {
            mesh.colored_vertex(at, Color32::WHITE);
        }
        for triangle in [[0, 1, 2], [1, 2, 3], [3, 3, 3]] {
            mesh.add_triangle(triangle[0], triangle[1], triangle[2]);
        }
        assert_eq!(painted([20, 20], vec![mesh.clone()]).pixels().len(), 400);
        assert_eq!(painted([0, 0], vec![mesh]).pixels().len(), 0);
    }
}
