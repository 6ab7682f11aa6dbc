//! A figure's SVG as pixels, as a PNG and as a page of PDF, in the bundled fonts.

use super::fonts::{BOLD, MATH, REGULAR, SYMBOLS};
use resvg::tiny_skia::{Pixmap, Transform};
use resvg::usvg::fontdb::Database;
use resvg::usvg::{Options, Tree};
use std::sync::{Arc, LazyLock};
use thiserror::Error;

/// Shortest and longest side of a figure, pixels.
pub const SIDE_RANGE_PX: [u32; 2] = [100, 16_384];
/// Most pixels of a figure.
pub const MOST_PIXELS: u64 = 100_000_000;

/// Width and height of a figure, pixels, within what can be drawn.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct Size {
    width_px: u32,
    height_px: u32,
}

impl Default for Size {
    fn default() -> Self {
        Self { width_px: 960, height_px: 600 }
    }
}

impl Size {
    /// A size.
    ///
    /// # Errors
    /// [`PictureProblem::Size`] outside [`SIDE_RANGE_PX`] or above [`MOST_PIXELS`].
    pub fn new(width_px: u32, height_px: u32) -> Result<Self, PictureProblem> {
        let [least, most] = SIDE_RANGE_PX;
        let fits = [width_px, height_px].into_iter().all(|side| (least..=most).contains(&side));
        if fits && u64::from(width_px) * u64::from(height_px) <= MOST_PIXELS {
            Ok(Self { width_px, height_px })
        } else {
            Err(PictureProblem::Size { width_px, height_px })
        }
    }

    /// A size known to be within what can be drawn.
    pub(super) const fn usual([width_px, height_px]: [u32; 2]) -> Self {
        Self { width_px, height_px }
    }

    /// Width and height, pixels.
    #[must_use]
    pub fn sides_px(self) -> [u32; 2] {
        [self.width_px, self.height_px]
    }
}

/// Why there is no picture.
#[derive(Clone, Debug, Error, PartialEq, Eq)]
pub enum PictureProblem {
    /// A size that can't be drawn.
    #[error(
        "the size is {width_px}x{height_px} pixels, allowed sides of {} to {} and at most {} million pixels in all; choose a size in that range, or an SVG, which has any size",
        SIDE_RANGE_PX[0], SIDE_RANGE_PX[1], MOST_PIXELS / 1_000_000
    )]
    Size {
        /// Width asked for.
        width_px: u32,
        /// Height asked for.
        height_px: u32,
    },
    /// The SVG is not understood; ours always is.
    #[error("the figure's own SVG can't be drawn: {reason}; please report it")]
    Svg {
        /// What the reader says.
        reason: String,
    },
}

/// The bundled fonts and no others, so that a figure looks alike everywhere.
static FONTS: LazyLock<Arc<Database>> = LazyLock::new(|| {
    let mut fonts = Database::new();
    for font in [REGULAR, BOLD, MATH, SYMBOLS] {
        fonts.load_font_data(font.to_vec());
    }
    fonts.set_sans_serif_family("Noto Sans");
    Arc::new(fonts)
});

fn tree(svg: &str) -> Result<Tree, PictureProblem> {
    let options = Options { fontdb: Arc::clone(&FONTS), font_family: "Noto Sans".to_owned(), ..Options::default() };
    Tree::from_str(svg, &options).map_err(|error| PictureProblem::Svg { reason: error.to_string() })
}

/// Red, green and blue of every pixel, row by row, sRGB; the figure's own ground makes them opaque.
///
/// # Errors
/// [`PictureProblem`] when the SVG is not understood or too large.
pub fn pixels(svg: &str, size: Size) -> Result<Vec<u8>, PictureProblem> {
    let [width_px, height_px] = size.sides_px();
    let tree = tree(svg)?;
    let mut pixmap = Pixmap::new(width_px, height_px).ok_or(PictureProblem::Size { width_px, height_px })?;
    let drawn = tree.size();
    let (across, down) = (width_px as f32 / drawn.width(), height_px as f32 / drawn.height());
    resvg::render(&tree, Transform::from_scale(across, down), &mut pixmap.as_mut());
    Ok(pixmap.data().chunks_exact(4).flat_map(|pixel| [pixel[0], pixel[1], pixel[2]]).collect())
}

/// A figure as a PNG with 8 bits a channel, marked as sRGB.
///
/// # Errors
/// [`PictureProblem`] when the SVG is not understood or too large.
pub fn png(svg: &str, size: Size) -> Result<Vec<u8>, PictureProblem> {
    let [width_px, height_px] = size.sides_px();
    let pixels = pixels(svg, size)?;
    let mut bytes = Vec::new();
    let mut encoder = png::Encoder::new(&mut bytes, width_px, height_px);
    encoder.set_color(png::ColorType::Rgb);
    encoder.set_depth(png::BitDepth::Eight);
    encoder.set_source_srgb(png::SrgbRenderingIntent::RelativeColorimetric);
    let unwritten = |error: png::EncodingError| PictureProblem::Svg { reason: error.to_string() };
    let mut writer = encoder.write_header().map_err(unwritten)?;
    writer.write_image_data(&pixels).map_err(unwritten)?;
    writer.finish().map_err(unwritten)?;
    Ok(bytes)
}

/// A figure as a page of PDF with its text as text; 96 pixels are an inch.
///
/// # Errors
/// [`PictureProblem`] when the SVG is not understood.
pub fn pdf(svg: &str) -> Result<Vec<u8>, PictureProblem> {
    let page = svg2pdf::PageOptions { dpi: 96.0 };
    svg2pdf::to_pdf(&tree(svg)?, svg2pdf::ConversionOptions::default(), page)
        .map_err(|error| PictureProblem::Svg { reason: error.to_string() })
}
