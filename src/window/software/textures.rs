//! Textures as the toolkit hands them over: letters, icons, pictures.

use egui::epaint::ImageDelta;
use egui::{Color32, ImageData, TextureFilter, TextureId, TexturesDelta};
use std::collections::HashMap;

/// A texture in memory, premultiplied.
#[derive(Debug)]
pub(super) struct Texture {
    width: usize,
    height: usize,
    texels: Vec<Color32>,
    is_smooth: bool,
}

/// Every texture by its name.
#[derive(Debug, Default)]
pub(super) struct Textures {
    known: HashMap<TextureId, Texture>,
}

impl Textures {
    /// Takes new and changed textures.
    pub(super) fn take(&mut self, delta: &mut TexturesDelta) {
        for (id, changes) in delta.set.drain() {
            for change in changes {
                self.change(id, &change);
            }
        }
    }

    /// Lets go of textures that are no longer used; to be called after painting.
    pub(super) fn free(&mut self, delta: &mut TexturesDelta) {
        for id in delta.free.drain() {
            self.known.remove(&id);
        }
    }

    pub(super) fn get(&self, id: TextureId) -> Option<&Texture> {
        self.known.get(&id)
    }

    fn change(&mut self, id: TextureId, change: &ImageDelta) {
        let ImageData::Color(image) = &change.image;
        let [width, height] = image.size;
        if let (Some([left, top]), Some(texture)) = (change.pos, self.known.get_mut(&id)) {
            // A patch that reaches over the edge would be the toolkit's mistake; it is cut.
            for row in 0..height.min(texture.height.saturating_sub(top)) {
                let kept = width.min(texture.width.saturating_sub(left));
                let from = row * width;
                let to = (top + row) * texture.width + left;
                texture.texels[to..to + kept].copy_from_slice(&image.pixels[from..from + kept]);
            }
        } else {
            let is_smooth = change.options.magnification == TextureFilter::Linear;
            self.known.insert(id, Texture { width, height, texels: image.pixels.clone(), is_smooth });
        }
    }
}

impl Texture {
    /// The colour at a place, 0 to 1 across and down, channels 0 to 255.
    pub(super) fn at(&self, u: f32, v: f32) -> [f32; 4] {
        let (x, y) = (u * self.width as f32, v * self.height as f32);
        if !self.is_smooth {
            return self.texel(x.floor() as i32, y.floor() as i32);
        }
        let (x, y) = (x - 0.5, y - 0.5);
        let (left, top) = (x.floor(), y.floor());
        let (across, down) = (x - left, y - top);
        let (left, top) = (left as i32, top as i32);
        // Letters stand on whole pixels: most places need one texel only.
        if across < 1e-3 && down < 1e-3 {
            return self.texel(left, top);
        }
        let corners = [(left, top), (left + 1, top), (left, top + 1), (left + 1, top + 1)];
        let shares = [(1.0 - across) * (1.0 - down), across * (1.0 - down), (1.0 - across) * down, across * down];
        let mut sum = [0.0; 4];
        for ((x, y), share) in corners.into_iter().zip(shares) {
            for (channel, value) in sum.iter_mut().zip(self.texel(x, y)) {
                *channel += share * value;
            }
        }
        sum
    }

    /// One texel; beyond the edge the nearest.
    fn texel(&self, x: i32, y: i32) -> [f32; 4] {
        let x = (x.max(0) as usize).min(self.width.saturating_sub(1));
        let y = (y.max(0) as usize).min(self.height.saturating_sub(1));
        self.texels.get(y * self.width + x).map_or([0.0; 4], |texel| texel.to_array().map(f32::from))
    }
}
