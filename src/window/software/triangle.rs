//! Fills one triangle: each pixel whose centre is inside, no pixel twice along a shared edge.

use super::textures::Texture;
use egui::{Pos2, pos2};

/// A corner in pixels.
#[derive(Clone, Copy, Debug)]
pub(super) struct Corner {
    pub(super) at: Pos2,
    pub(super) uv: Pos2,
    /// Premultiplied, channels 0 to 255.
    pub(super) colour: [f32; 4],
}

/// The rows and columns that may be painted: from, to (not included).
#[derive(Clone, Copy, Debug)]
pub(super) struct Clip {
    pub(super) columns: [usize; 2],
    pub(super) rows: [usize; 2],
}

/// Rows of a picture, blue in the lowest byte, from row `first` on.
pub(super) struct Rows<'a> {
    pub(super) pixels: &'a mut [u32],
    pub(super) width: usize,
    pub(super) first: usize,
}

/// A quantity that runs evenly over the plane: its value at the origin and its steps across and down.
#[derive(Clone, Copy)]
struct Even {
    origin: f32,
    across: f32,
    down: f32,
}

impl Even {
    fn at(self, x: f32, y: f32) -> f32 {
        self.origin + self.across * x + self.down * y
    }
}

/// Fills a triangle.
pub(super) fn fill(rows: &mut Rows<'_>, clip: Clip, corners: [Corner; 3], texture: &Texture) {
    let [a, b, c] = corners.map(|corner| corner.at);
    let area = (b.x - a.x) * (c.y - a.y) - (c.x - a.x) * (b.y - a.y);
    if !area.is_finite() || area.abs() < 1e-6 {
        return;
    }
    let even = |[va, vb, vc]: [f32; 3]| {
        let across = ((vb - va) * (c.y - a.y) - (vc - va) * (b.y - a.y)) / area;
        let down = ((vc - va) * (b.x - a.x) - (vb - va) * (c.x - a.x)) / area;
        Even { origin: va - across * a.x - down * a.y, across, down }
    };
    let is_flat = corners.iter().all(|corner| corner.colour == corners[0].colour && corner.uv == corners[0].uv);
    let flat = is_flat.then(|| tinted(corners[0].colour, texture.at(corners[0].uv.x, corners[0].uv.y)));
    if flat.is_some_and(|colour| colour.iter().all(|channel| *channel < 0.5)) {
        return;
    }
    let channels = [0, 1, 2, 3].map(|channel| even(corners.map(|corner| corner.colour[channel])));
    let uv = [even(corners.map(|corner| corner.uv.x)), even(corners.map(|corner| corner.uv.y))];
    let has_one_place = corners.iter().all(|corner| corner.uv == corners[0].uv);
    let one_texel = has_one_place.then(|| texture.at(corners[0].uv.x, corners[0].uv.y));
    let (top, bottom) = (a.y.min(b.y).min(c.y), a.y.max(b.y).max(c.y));
    let from = first_centre(top).max(clip.rows[0]);
    let to = first_centre(bottom).min(clip.rows[1]);
    for row in from..to {
        let y = row as f32 + 0.5;
        let Some((left, right)) = crossing(a, b, c, y) else { continue };
        let (left, right) = (first_centre(left).max(clip.columns[0]), first_centre(right).min(clip.columns[1]));
        if left >= right {
            continue;
        }
        let start = (row - rows.first) * rows.width;
        let run = &mut rows.pixels[start + left..start + right];
        if let Some(colour) = flat {
            fill_run(run, colour);
            continue;
        }
        for (pixel, column) in run.iter_mut().zip(left..) {
            let x = column as f32 + 0.5;
            let colour = channels.map(|channel| channel.at(x, y));
            let texel = one_texel.unwrap_or_else(|| texture.at(uv[0].at(x, y), uv[1].at(x, y)));
            *pixel = over(*pixel, tinted(colour, texel));
        }
    }
}

/// The first pixel of the picture whose centre is at or beyond a place.
fn first_centre(place: f32) -> usize {
    (place - 0.5).ceil().clamp(0.0, 1e9) as usize
}

/// Where a row crosses the outline.
fn crossing(a: Pos2, b: Pos2, c: Pos2, y: f32) -> Option<(f32, f32)> {
    let mut ends: Option<(f32, f32)> = None;
    for (from, to) in [(a, b), (b, c), (c, a)] {
        // Each edge is always taken the same way round, so that neighbours agree to the last bit.
        let (high, low) = if (from.y, from.x) <= (to.y, to.x) { (from, to) } else { (to, from) };
        if high.y > y || low.y <= y {
            continue;
        }
        let x = high.x + (low.x - high.x) * ((y - high.y) / (low.y - high.y));
        ends = Some(ends.map_or((x, x), |(least, most)| (least.min(x), most.max(x))));
    }
    ends
}

/// Vertex colour times texel, channels 0 to 255.
fn tinted(colour: [f32; 4], texel: [f32; 4]) -> [f32; 4] {
    std::array::from_fn(|channel| colour[channel] * texel[channel] * (1.0 / 255.0))
}

fn fill_run(run: &mut [u32], colour: [f32; 4]) {
    if colour[3] >= 254.5 {
        run.fill(packed(colour));
        return;
    }
    // Whole numbers: the same sum for every pixel of the run.
    let source = colour.map(|channel| (channel + 0.5) as u32);
    let rest = 255 - source[3].min(255);
    for pixel in run {
        let mixed = [16, 8, 0].map(|shift| ((*pixel >> shift) & 255) * rest);
        let channel = |index: usize| (source[index] + (mixed[index] + 127) / 255).min(255);
        *pixel = channel(0) << 16 | channel(1) << 8 | channel(2);
    }
}

/// A premultiplied colour over a pixel.
fn over(pixel: u32, colour: [f32; 4]) -> u32 {
    if colour[3] < 0.5 && colour[0] + colour[1] + colour[2] < 0.5 {
        return pixel;
    }
    let rest = 1.0 - colour[3] * (1.0 / 255.0);
    let mixed = |shift: u32, channel: f32| {
        let below = ((pixel >> shift) & 255) as f32;
        ((channel + below * rest + 0.5) as u32).min(255) << shift
    };
    mixed(16, colour[0]) | mixed(8, colour[1]) | mixed(0, colour[2])
}

/// An opaque colour as a pixel.
fn packed(colour: [f32; 4]) -> u32 {
    let [red, green, blue, _] = colour.map(|channel| ((channel + 0.5) as u32).min(255));
    red << 16 | green << 8 | blue
}

/// A corner of a mesh in pixels.
pub(super) fn corner(vertex: &egui::epaint::Vertex, pixels_per_point: f32) -> Corner {
    Corner {
        at: pos2(vertex.pos.x * pixels_per_point, vertex.pos.y * pixels_per_point),
        uv: vertex.uv,
        colour: vertex.color.to_array().map(f32::from),
    }
}
