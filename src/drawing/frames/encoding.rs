//! Frames as files in memory, and reading them back.

use super::raster::Raster;
use crate::physics::light::{encode_srgb, encode_srgb_16};
use exr::prelude::{
    Encoding, Image, Layer, LayerAttributes, ReadChannels, ReadLayers, SpecificChannels, Text, WritableImage, read,
};
use std::io::Cursor;
use thiserror::Error;

/// Word of a PNG's text that holds the fingerprint.
const KEYWORD: &str = "Comment";

/// Form of a frame.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
pub enum FrameFormat {
    /// PNG, 8 bits a channel, sRGB.
    #[default]
    Png8,
    /// PNG, 16 bits a channel, sRGB.
    Png16,
    /// `OpenEXR`, 32-bit floats, linear Rec. 709.
    Exr,
}

impl FrameFormat {
    /// Each form.
    pub const ALL: [Self; 3] = [Self::Png8, Self::Png16, Self::Exr];

    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::Png8 => "png8",
            Self::Png16 => "png16",
            Self::Exr => "exr",
        }
    }

    /// End of the file's name.
    #[must_use]
    pub fn extension(self) -> &'static str {
        match self {
            Self::Png8 | Self::Png16 => "png",
            Self::Exr => "exr",
        }
    }
}

/// Why a frame is no file.
#[derive(Clone, Debug, Error, PartialEq, Eq)]
pub enum FrameProblem {
    /// The writer refused.
    #[error("a frame can't be written as {form}: {reason}; please report it")]
    Unwritable {
        /// The form.
        form: &'static str,
        /// What the writer says.
        reason: String,
    },
}

/// A frame as the bytes of a file that carries its fingerprint.
///
/// # Errors
/// [`FrameProblem`] when the writer refuses.
pub fn encode(raster: &Raster, format: FrameFormat, fingerprint: &str) -> Result<Vec<u8>, FrameProblem> {
    let result = match format {
        FrameFormat::Png8 => {
            let bytes = each(raster, encode_srgb);
            png_bytes(raster, png::BitDepth::Eight, bytes.as_flattened(), fingerprint)
                .map_err(|error| error.to_string())
        }
        FrameFormat::Png16 => {
            let steps = each(raster, |linear| encode_srgb_16(linear).map(u16::to_be_bytes));
            png_bytes(raster, png::BitDepth::Sixteen, steps.as_flattened().as_flattened(), fingerprint)
                .map_err(|error| error.to_string())
        }
        FrameFormat::Exr => exr_bytes(raster, fingerprint).map_err(|error| error.to_string()),
    };
    result.map_err(|reason| FrameProblem::Unwritable { form: format.key(), reason })
}

/// Encodes every pixel; most have the colour of the one before.
fn each<T: Copy>(raster: &Raster, encode: impl Fn([f64; 3]) -> T) -> Vec<T> {
    let mut last: Option<([f32; 3], T)> = None;
    raster
        .pixels
        .iter()
        .map(|pixel| match last {
            Some((known, encoded)) if known == *pixel => encoded,
            _ => {
                let encoded = encode(pixel.map(f64::from));
                last = Some((*pixel, encoded));
                encoded
            }
        })
        .collect()
}

fn png_bytes(
    raster: &Raster,
    depth: png::BitDepth,
    data: &[u8],
    fingerprint: &str,
) -> Result<Vec<u8>, png::EncodingError> {
    let [width, height] = raster.sides_px;
    let mut bytes = Vec::new();
    let mut encoder = png::Encoder::new(&mut bytes, width, height);
    encoder.set_color(png::ColorType::Rgb);
    encoder.set_depth(depth);
    encoder.set_compression(png::Compression::Fast);
    encoder.set_source_srgb(png::SrgbRenderingIntent::RelativeColorimetric);
    encoder.add_text_chunk(KEYWORD.to_owned(), fingerprint.to_owned())?;
    let mut writer = encoder.write_header()?;
    writer.write_image_data(data)?;
    writer.finish()?;
    Ok(bytes)
}

fn exr_bytes(raster: &Raster, fingerprint: &str) -> Result<Vec<u8>, exr::error::Error> {
    let width = raster.sides_px[0] as usize;
    let channels = SpecificChannels::rgb(|place: exr::math::Vec2<usize>| {
        let [red, green, blue] = raster.pixels[place.y() * width + place.x()];
        (red, green, blue)
    });
    let mut attributes = LayerAttributes::named("frame");
    attributes.comments = Text::new_or_none(fingerprint);
    let encoding = Encoding::SMALL_FAST_LOSSLESS;
    let sides = (width, raster.sides_px[1] as usize);
    let image = Image::from_layer(Layer::new(sides, attributes, encoding, channels));
    let mut bytes = Cursor::new(Vec::new());
    image.write().non_parallel().to_buffered(&mut bytes)?;
    Ok(bytes.into_inner())
}

/// Whether bytes are a whole frame of this form and size with this fingerprint; every pixel is read.
#[must_use]
pub fn is_kept(bytes: &[u8], format: FrameFormat, sides_px: [u32; 2], fingerprint: &str) -> bool {
    match format {
        FrameFormat::Png8 => png_is_kept(bytes, png::BitDepth::Eight, sides_px, fingerprint),
        FrameFormat::Png16 => png_is_kept(bytes, png::BitDepth::Sixteen, sides_px, fingerprint),
        FrameFormat::Exr => exr_is_kept(bytes, sides_px, fingerprint),
    }
}

fn png_is_kept(bytes: &[u8], depth: png::BitDepth, sides_px: [u32; 2], fingerprint: &str) -> bool {
    let Ok(mut reader) = png::Decoder::new(Cursor::new(bytes)).read_info() else { return false };
    let info = reader.info();
    let says = |text: &png::text_metadata::TEXtChunk| text.keyword == KEYWORD && text.text == fingerprint;
    let is_ours = info.uncompressed_latin1_text.iter().any(says);
    if !is_ours || [info.width, info.height] != sides_px || info.bit_depth != depth {
        return false;
    }
    let Some(size) = reader.output_buffer_size() else { return false };
    let mut frame = vec![0; size];
    // The end as well: a file that was cut off there has all its pixels.
    reader.next_frame(&mut frame).is_ok() && reader.finish().is_ok()
}

fn exr_is_kept(bytes: &[u8], sides_px: [u32; 2], fingerprint: &str) -> bool {
    let reader = read().no_deep_data().largest_resolution_level().all_channels().first_valid_layer().all_attributes();
    let Ok(image) = reader.non_parallel().from_buffered(Cursor::new(bytes)) else { return false };
    let layer = &image.layer_data;
    let sides = [layer.size.x(), layer.size.y()];
    let is_ours = layer.attributes.comments.as_ref().is_some_and(|comments| *comments == *fingerprint);
    is_ours && sides == sides_px.map(|side| side as usize)
}

#[cfg(test)]
mod tests {
    use super::*;

    fn raster() -> Raster {
        let ramp = |x: f64, y: f64| [x / 64.0, y / 48.0, if x > 60.0 { 5.0 } else { 0.2 }];
        Raster::of([64, 48], ramp)
    }

    #[test]
    fn what_is_written_is_kept_and_nothing_else() {
        for format in FrameFormat::ALL {
            let bytes = encode(&raster(), format, "print").expect("written");
            assert_eq!(bytes, encode(&raster(), format, "print").expect("written"), "{format:?} is stable");
            assert!(is_kept(&bytes, format, [64, 48], "print"), "{format:?}");
            assert!(!is_kept(&bytes, format, [64, 48], "other"));
            assert!(!is_kept(&bytes, format, [48, 64], "print"));
            for cut in [0, 10, bytes.len() / 2, bytes.len() - 1] {
                assert!(!is_kept(&bytes[..cut], format, [64, 48], "print"), "{format:?} cut at {cut}");
            }
            let mut spoilt = bytes.clone();
            let middle = bytes.len() / 2;
            spoilt[middle] ^= 0xff;
            if format != FrameFormat::Exr {
                assert!(!is_kept(&spoilt, format, [64, 48], "print"), "{format:?}");
            }
        }
    }

    #[test]
    fn other_libraries_read_the_same_light() {
        let raster = raster();
        let eight = image::load_from_memory(&encode(&raster, FrameFormat::Png8, "p").expect("written")).expect("a PNG");
        let sixteen =
            image::load_from_memory(&encode(&raster, FrameFormat::Png16, "p").expect("written")).expect("a PNG");
        assert_eq!((eight.color(), sixteen.color()), (image::ColorType::Rgb8, image::ColorType::Rgb16));
        let (eight, sixteen) = (eight.into_rgb8(), sixteen.into_rgb16());
        for (index, pixel) in raster.pixels.iter().enumerate() {
            let place = (index as u32 % 64, index as u32 / 64);
            for (channel, light) in pixel.iter().enumerate() {
                // The sRGB curve of IEC 61966-2-1.
                let linear = f64::from(*light).clamp(0.0, 1.0);
                let encoded =
                    if linear <= 0.003_130_8 { 12.92 * linear } else { 1.055 * linear.powf(1.0 / 2.4) - 0.055 };
                let (low, high) = (eight[place].0[channel], sixteen[place].0[channel]);
                assert!((f64::from(low) - 255.0 * encoded).abs() < 0.51, "{low} and {encoded}");
                assert!((f64::from(high) - 65_535.0 * encoded).abs() < 1.0, "{high} and {encoded}");
            }
        }
        let bytes = encode(&raster, FrameFormat::Exr, "p").expect("written");
        let found = read()
            .no_deep_data()
            .largest_resolution_level()
            .rgb_channels(
                |size, _| vec![[0.0_f32; 3]; size.area()],
                |pixels, place, (red, green, blue): (f32, f32, f32)| {
                    pixels[place.y() * 64 + place.x()] = [red, green, blue];
                },
            )
            .first_valid_layer()
            .all_attributes()
            .from_buffered(Cursor::new(&bytes))
            .expect("an EXR");
        assert_eq!(
            found.layer_data.channel_data.pixels, raster.pixels,
            "linear light to the last bit, above white too"
        );
    }
}
