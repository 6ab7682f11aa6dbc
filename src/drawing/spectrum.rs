//! The star's spectrum over wavelength, beside the reference star's.

use super::canvas::{Anchor, Area, Canvas, Point, Stroke, lettering, stroke};
use super::fonts::width;
use super::ink::Palette;
use super::legend::{Entry, Sample};
use super::page::{SMALL_SIZE, TEXT_SIZE};
use crate::figure::Spectrum;
use crate::figure::chart::BandMeaning;
use crate::figure::spectrum::{REFERENCE_K, SpectrumCurve, TICKS, VisiblePoint, place_of};
use crate::units::number_text::{fixed, number};

const LEFT: f64 = 66.0;
const TOP: f64 = 36.0;
const FOOT: f64 = 50.0;
/// Height of the visible band below the plot.
const BAND: f64 = 9.0;

/// What the lines stand for.
pub(super) fn entries(spectrum: &Spectrum) -> Vec<Entry> {
    let kelvin = |who: &str, temperature_k: f64| format!("{who}, {} K", number(temperature_k, 4));
    let star = spectrum.star.as_ref().map(|star| (Sample::Star, kelvin("the star", star.temperature_k)));
    let reference = spectrum.reference.as_ref().map(|_| (Sample::Reference, kelvin("reference: the Sun", REFERENCE_K)));
    star.into_iter().chain(reference).map(|(sample, words)| Entry { sample, words }).collect()
}

/// Draws a spectrum into an area.
pub(super) fn draw(canvas: &mut Canvas, area: Area, spectrum: &Spectrum, palette: &Palette) {
    let plot =
        Area { left: area.left + LEFT, top: area.top + TOP, right: area.right - 10.0, bottom: area.bottom - FOOT };
    let place = Places { plot, spectrum };
    heights(canvas, &place, palette);
    canvas.clipped(plot, |canvas| {
        if let Some(star) = &spectrum.star {
            canvas.polygon(&place.under(&place.points(star)), palette.band(BandMeaning::Spread));
            let visible: Vec<Point> =
                spectrum.visible.iter().map(|point| [place.x(point.place), place.y(point.height)]).collect();
            let ink = canvas.colours_across(&place.stops(palette.band(BandMeaning::Spread)));
            canvas.polygon(&place.under(&visible), &ink);
        }
    });
    shares(canvas, &place, palette);
    wavelengths(canvas, &place, palette);
    canvas.clipped(Area { top: plot.top - 2.0, ..plot }, |canvas| {
        if let Some(reference) = &spectrum.reference {
            canvas.polyline(&place.points(reference), Stroke { ink: palette.dim, width: 1.4, dashes: "5 4" });
        }
        if let Some(star) = &spectrum.star {
            canvas.polyline(&place.points(star), stroke(palette.text, 1.9));
        }
    });
    canvas.closed_line(
        &[[plot.left, plot.top], [plot.right, plot.top], [plot.right, plot.bottom], [plot.left, plot.bottom]],
        stroke(palette.dim, 1.0),
    );
    if let Some(star) = &spectrum.star {
        peak(canvas, &place, star, palette);
    }
}

struct Places<'a> {
    plot: Area,
    spectrum: &'a Spectrum,
}

impl Places<'_> {
    fn x(&self, place: f64) -> f64 {
        self.plot.left + place * self.plot.width()
    }

    /// Heights below the axis stand at its foot.
    fn y(&self, height: f64) -> f64 {
        let share = self.spectrum.axis.height(height).unwrap_or(-1.0).clamp(-0.02, 1.2);
        self.plot.bottom - share * self.plot.height()
    }

    fn points(&self, curve: &SpectrumCurve) -> Vec<Point> {
        curve.points.iter().map(|[place, height]| [self.x(*place), self.y(*height)]).collect()
    }

    /// The area between a line and the foot of the plot.
    fn under(&self, line: &[Point]) -> Vec<Point> {
        let (Some(first), Some(last)) = (line.first(), line.last()) else { return Vec::new() };
        let mut outline = line.to_vec();
        outline.extend([[last[0], self.plot.bottom], [first[0], self.plot.bottom]]);
        outline
    }

    /// The colours of the visible band, fading into a ground.
    fn stops(&self, ground: &str) -> Vec<(f64, String)> {
        self.spectrum.visible.iter().map(|point| (self.x(point.place), faded(point, ground))).collect()
    }
}

fn heights(canvas: &mut Canvas, place: &Places<'_>, palette: &Palette) {
    let plot = place.plot;
    for tick in place.spectrum.axis.ticks((plot.height() / 36.0).max(2.0) as usize) {
        let y = plot.bottom - tick.height * plot.height();
        canvas.line([plot.left, y], [plot.right, y], stroke(palette.hairline, 0.8));
        canvas.line([plot.left - 4.0, y], [plot.left, y], stroke(palette.dim, 1.0));
        canvas.text([plot.left - 7.0, y + 3.9], &tick.label, lettering(palette.dim, SMALL_SIZE, Anchor::End));
    }
    let name = lettering(palette.text, TEXT_SIZE, Anchor::Middle);
    canvas.text_upwards([plot.left - LEFT + 11.0, plot.centre()[1]], place.spectrum.title, name);
}

/// Name and share of each band over the part of the axis it takes.
fn shares(canvas: &mut Canvas, place: &Places<'_>, palette: &Palette) {
    let plot = place.plot;
    for band in &place.spectrum.bands {
        let [left, right] = band.places.map(|at| place.x(at));
        if band.name != "infrared" {
            canvas.line([right, plot.top - TOP + 6.0], [right, plot.bottom], stroke(palette.hairline, 1.0));
        }
        let x = 0.5 * (left + right);
        let share = band.share.map_or_else(|| "–".to_owned(), percent);
        canvas.text([x, plot.top - 22.0], band.name, lettering(palette.dim, SMALL_SIZE, Anchor::Middle));
        canvas.text([x, plot.top - 8.0], &share, lettering(palette.text, SMALL_SIZE, Anchor::Middle));
    }
}

/// A share with the digits it deserves.
fn percent(share: f64) -> String {
    let value = 100.0 * share;
    if value >= 1.0 || value == 0.0 { format!("{} %", fixed(value, 1)) } else { format!("{} %", number(value, 2)) }
}

fn wavelengths(canvas: &mut Canvas, place: &Places<'_>, palette: &Palette) {
    let plot = place.plot;
    let stops = place.stops(palette.ground);
    if let (Some(first), Some(last)) = (stops.first(), stops.last()) {
        let band = Area { left: first.0, top: plot.bottom + 2.0, right: last.0, bottom: plot.bottom + 2.0 + BAND };
        let ink = canvas.colours_across(&stops);
        canvas.rect(band, &ink);
    }
    let mut last_right = f64::NEG_INFINITY;
    for tick in TICKS {
        let x = place.x(place_of(f64::from(tick.wavelength_nm)));
        canvas.line([x, plot.bottom], [x, plot.bottom + 4.0], stroke(palette.dim, 1.0));
        let half = 0.5 * width(tick.label, SMALL_SIZE, false);
        let middle = x.min(plot.right + 8.0 - half);
        if middle - half > last_right + 8.0 {
            last_right = middle + half;
            let at = [middle, plot.bottom + BAND + 15.0];
            canvas.text(at, tick.label, lettering(palette.dim, SMALL_SIZE, Anchor::Middle));
        }
    }
    let at = [plot.centre()[0], plot.bottom + BAND + 33.0];
    canvas.text(at, "Wavelength, logarithmic", lettering(palette.text, TEXT_SIZE, Anchor::Middle));
}

/// A ring at the peak with its wavelength; beyond an end an arrow points there.
fn peak(canvas: &mut Canvas, place: &Places<'_>, star: &SpectrumCurve, palette: &Palette) {
    let (x, y) = (place.x(star.peak.place), place.y(star.peak.height));
    let words = format!("peak {}", wavelength_text(star.peak.wavelength_nm));
    let is_left = star.peak.place < 0.5;
    let at = if star.peak.is_in_view {
        canvas.disc([x, y], 3.6, palette.ground, Some(stroke(palette.accent, 1.6)));
        [x, y]
    } else {
        let y = place.plot.top + 14.0;
        let tip = if is_left { -7.0 } else { 7.0 };
        canvas.polygon(&[[x + tip, y], [x, y - 4.0], [x, y + 4.0]], palette.accent);
        [x, y]
    };
    // To the side where the curve falls more slowly there would be no room for words.
    let (offset, anchor) = if is_left { (10.0, Anchor::Start) } else { (-10.0, Anchor::End) };
    let baseline = (at[1] - 5.0).max(place.plot.top + 14.0);
    let wide = width(&words, SMALL_SIZE, false);
    let left = if is_left { at[0] + offset } else { at[0] + offset - wide };
    let plate = Area { left: left - 3.0, top: baseline - 11.0, right: left + wide + 3.0, bottom: baseline + 3.0 };
    canvas.veil(plate, palette.ground, 0.85);
    canvas.text([at[0] + offset, baseline], &words, lettering(palette.text, SMALL_SIZE, anchor));
}

/// `499 nm`, `1.11 µm`.
pub(super) fn wavelength_text(wavelength_nm: f64) -> String {
    if wavelength_nm < 1000.0 {
        format!("{} nm", number(wavelength_nm, 3))
    } else {
        format!("{} µm", number(wavelength_nm / 1000.0, 3))
    }
}

/// The colour of a wavelength, fading into the ground where the eye sees little.
fn faded(point: &VisiblePoint, ground: &str) -> String {
    let channel = |index: usize| {
        let start = 1 + 2 * index;
        let ground = ground.get(start..start + 2).and_then(|digits| u8::from_str_radix(digits, 16).ok());
        let (from, to) = (f64::from(ground.unwrap_or(255)), f64::from(point.colour_srgb[index]));
        (from + (to - from) * point.visibility.clamp(0.0, 1.0)).round() as u8
    };
    super::ink::hex([channel(0), channel(1), channel(2)])
}
