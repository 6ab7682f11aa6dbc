//! What a frame shows at one moment.

use super::raster::{Raster, Shape, coverage, dome_direction, mixed};
use crate::drawing::plot::light_on;
use crate::drawing::{Look, PictureProblem, Plot, Size, Subject, figure_svg, pixels};
use crate::figure::{SkyPicture, SkyView};
use crate::physics::light::{blackbody_tristimulus, decode_srgb, into_srgb_gamut, screen_colour};
use crate::system::{History, Moment};

/// Width of a flat frame of a sky, degrees.
pub const FIELD_DEG: f64 = 90.0;
/// Share of the height of a flat frame of a sky below the horizon.
const GROUND_SHARE: f64 = 0.16;
/// Half the width of a figure in a dome as the tangent of its angle, and the altitude of its middle, degrees.
const PANEL_HALF_WIDTH: f64 = 0.9;
const PANEL_ALTITUDE_DEG: f64 = 38.0;
const BLACK: [f64; 3] = [0.0; 3];

/// What is shown.
#[derive(Clone, Debug, PartialEq)]
pub enum FrameSubject {
    /// The star's disc in its true colour and to scale, on black; evenly bright, for the dimming towards the limb is not
    /// modelled.
    Star,
    /// The sky of a planet, with the star to scale.
    Sky {
        /// Index of the planet.
        planet: usize,
        /// How it is looked at.
        view: SkyView,
    },
    /// A plot.
    Figure {
        /// The plot.
        plot: Plot,
        /// Index of the planet that it shows; the usual one of the plot if none is chosen.
        planet: Option<usize>,
    },
}

/// Draws the star: `field_rsun` is the width of the frame, in a dome that of half the sky.
pub(super) fn star(moment: &Moment, shape: Shape, width_px: u32, field_rsun: f64) -> Raster {
    let sides_px = shape.sides_px(width_px);
    let centre = sides_px.map(|side| 0.5 * f64::from(side));
    let glow = moment
        .star
        .effective_temperature_k
        .filter(|_| moment.star.swatch.as_ref().is_some_and(|swatch| swatch.chromaticity.is_some()));
    let light = glow
        .and_then(|temperature_k| blackbody_tristimulus(temperature_k).ok())
        .and_then(screen_colour)
        .map_or(BLACK, |colour| colour.shown_linear(1.0));
    let radius_px = moment.star.radius_rsun.unwrap_or(0.0) / field_rsun * f64::from(width_px);
    Raster::of(sides_px, |x, y| {
        let inside = match shape {
            Shape::Flat => 1.0,
            Shape::Dome => dome_direction(f64::from(width_px), x, y).1,
        };
        let share = coverage(radius_px, (x - centre[0]).hypot(y - centre[1]));
        mixed(BLACK, light, share * inside)
    })
}

/// Draws the sky of a planet; black where there is none, with `false`.
pub(super) fn sky(
    history: &History,
    moment: &Moment,
    planet: usize,
    view: SkyView,
    (shape, width_px): (Shape, u32),
    is_for_light: bool,
) -> (Raster, bool) {
    let light = light_on(history, moment, planet, view);
    let picture = light.as_ref().and_then(|light| SkyPicture::new(light, view));
    let sides_px = shape.sides_px(width_px);
    let Some(picture) = picture else { return (Raster::of(sides_px, |_, _| BLACK), false) };
    let shown = |linear| if is_for_light { linear } else { within_screen(linear) };
    let [sky, ground, disc] = [picture.linear.sky, picture.linear.ground, picture.linear.disc].map(shown);
    let radius_deg = 0.5 * picture.star_diameter_deg;
    let altitude = view.altitude_deg.to_radians();
    let raster = match shape {
        Shape::Flat => {
            let px_per_deg = f64::from(width_px) / FIELD_DEG;
            let horizon_px = f64::from(sides_px[1]) * (1.0 - GROUND_SHARE);
            let centre = [0.5 * f64::from(width_px), horizon_px - view.altitude_deg * px_per_deg];
            Raster::of(sides_px, |x, y| {
                let share = coverage(radius_deg * px_per_deg, (x - centre[0]).hypot(y - centre[1]));
                let below = (y - horizon_px + 0.5).clamp(0.0, 1.0);
                mixed(mixed(sky, disc, share), ground, below)
            })
        }
        Shape::Dome => {
            let px_per_deg = f64::from(width_px) / 180.0;
            let star = [0.0, altitude.cos(), altitude.sin()];
            Raster::of(sides_px, |x, y| {
                let (Some(direction), inside) = dome_direction(f64::from(width_px), x, y) else { return BLACK };
                let share = coverage(radius_deg * px_per_deg, angle_deg(direction, star) * px_per_deg);
                mixed(BLACK, mixed(sky, disc, share), inside)
            })
        }
    };
    (raster, true)
}

/// Angle between two directions, degrees: exact for small ones too.
fn angle_deg(first: [f64; 3], second: [f64; 3]) -> f64 {
    let chord = [0, 1, 2].map(|axis| first[axis] - second[axis]);
    let length = (chord[0] * chord[0] + chord[1] * chord[1] + chord[2] * chord[2]).sqrt();
    2.0 * (0.5 * length).min(1.0).asin().to_degrees()
}

/// Linear light as a screen shows it: the hue within its colours, nothing brighter than white.
fn within_screen(linear: [f64; 3]) -> [f64; 3] {
    let largest = linear.into_iter().fold(0.0, f64::max);
    if largest <= 0.0 {
        return BLACK;
    }
    let mapped = into_srgb_gamut(linear.map(|channel| (channel / largest) as f32)).map(f64::from);
    mapped.map(|channel| channel * largest.min(1.0))
}

/// Draws a plot; in a dome on a panel in front.
pub(super) fn figure(
    subject: &Subject<'_>,
    plot: &Plot,
    shape: Shape,
    width_px: u32,
) -> Result<Raster, PictureProblem> {
    let panel_px = Shape::Flat.sides_px(match shape {
        Shape::Flat => width_px,
        // As sharp as the dome shows it: the panel takes about half of its width.
        Shape::Dome => (width_px / 2).max(480),
    });
    let size = Size::new(panel_px[0], panel_px[1])?;
    let svg = figure_svg(subject, plot, size, Look::Dark, "frame");
    let drawn = pixels(&svg, size)?;
    let decoded: Vec<[f64; 3]> = (0..=255_u8).map(|step| decode_srgb([step; 3])).collect();
    let light = |column: usize, row: usize| {
        let at = 3 * (row * panel_px[0] as usize + column);
        [0, 1, 2].map(|channel| decoded[usize::from(drawn[at + channel])][0])
    };
    let sides_px = shape.sides_px(width_px);
    if shape == Shape::Flat {
        return Ok(Raster::of(sides_px, |x, y| light(x as usize, y as usize)));
    }
    let altitude = PANEL_ALTITUDE_DEG.to_radians();
    let (sine, cosine) = altitude.sin_cos();
    let half_height = PANEL_HALF_WIDTH * f64::from(panel_px[1]) / f64::from(panel_px[0]);
    Ok(Raster::of(sides_px, |x, y| {
        let (Some([right, front, up]), _) = dome_direction(f64::from(width_px), x, y) else { return BLACK };
        // Gnomonic: the panel is a plane that touches the dome at its middle.
        let depth = front * cosine + up * sine;
        if depth <= 0.05 {
            return BLACK;
        }
        let across = right / depth / PANEL_HALF_WIDTH;
        let above = (up * cosine - front * sine) / depth / half_height;
        if across.abs() >= 1.0 || above.abs() >= 1.0 {
            return BLACK;
        }
        smooth(
            [0.5 * (across + 1.0) * f64::from(panel_px[0]), 0.5 * (1.0 - above) * f64::from(panel_px[1])],
            panel_px,
            light,
        )
    }))
}

/// Light between four pixels.
fn smooth([x, y]: [f64; 2], sides_px: [u32; 2], light: impl Fn(usize, usize) -> [f64; 3]) -> [f64; 3] {
    let place = |value: f64, side: u32| {
        let at = (value - 0.5).clamp(0.0, f64::from(side - 1));
        let first = at.floor() as usize;
        (first, (first + 1).min(side as usize - 1), at - at.floor())
    };
    let ((left, right, across), (top, bottom, down)) = (place(x, sides_px[0]), place(y, sides_px[1]));
    let above = mixed(light(left, top), light(right, top), across);
    let below = mixed(light(left, bottom), light(right, bottom), across);
    mixed(above, below, down)
}
