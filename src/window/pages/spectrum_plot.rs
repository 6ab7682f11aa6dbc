//! Inks a spectrum: the data come ready made, nothing is computed here but places on the screen.

use crate::figure::Spectrum;
use crate::figure::spectrum::{REFERENCE_K, SpectrumCurve, TICKS, VisiblePoint, place_of};
use crate::units::number_text::{fixed, number};
use crate::window::theme::{Palette, small};
use egui::epaint::{Mesh, Vertex, WHITE_UV};
use egui::{Align2, Color32, Painter, Pos2, Rect, Shape, Stroke, Ui, pos2, vec2};

/// Room left of the plot for the labels of heights, points.
const LEFT: f32 = 40.0;
/// Room above the plot for title and shares, points.
const TOP: f32 = 50.0;
/// Room below the plot for the visible band and the wavelengths, points.
const FOOT: f32 = 28.0;
/// Height of the visible band below the plot, points.
const BAND: f32 = 8.0;

/// Draws a spectrum into a rectangle.
pub(super) fn draw(ui: &Ui, area: Rect, spectrum: &Spectrum, palette: &Palette) {
    let rect = Rect::from_min_max(area.min + vec2(LEFT, TOP), area.max - vec2(8.0, FOOT));
    let painter = ui.painter();
    let inside = painter.with_clip_rect(rect.expand2(vec2(0.0, 2.0)).intersect(painter.clip_rect()));
    painter.text(pos2(area.left(), area.top() + 7.0), Align2::LEFT_CENTER, spectrum.title, small(), palette.dim);
    let place = Places { rect, spectrum };
    fills(&inside, &place, palette);
    heights(painter, &place, palette);
    shares(painter, area, &place, palette);
    wavelengths(painter, &place, palette);
    if let Some(reference) = &spectrum.reference {
        let points = place.points(reference);
        inside.extend(Shape::dashed_line(&points, Stroke::new(1.4, palette.dim), 5.0, 4.0));
    }
    if let Some(star) = &spectrum.star {
        inside.add(Shape::line(place.points(star), Stroke::new(1.8, palette.text)));
        peak(painter, &place, star, palette);
    }
    legend(painter, &place, palette);
}

/// Screen places of the data.
struct Places<'a> {
    rect: Rect,
    spectrum: &'a Spectrum,
}

impl Places<'_> {
    fn x(&self, place: f64) -> f32 {
        self.rect.left() + place as f32 * self.rect.width()
    }

    /// Heights below the axis stand at its foot.
    fn y(&self, height: f64) -> f32 {
        let share = self.spectrum.axis.height(height).unwrap_or(-1.0).clamp(-0.02, 1.2);
        self.rect.bottom() - share as f32 * self.rect.height()
    }

    fn points(&self, curve: &SpectrumCurve) -> Vec<Pos2> {
        curve.points.iter().map(|[place, height]| pos2(self.x(*place), self.y(*height))).collect()
    }
}

/// The area under the star's curve: the visible band in its colours, the rest in grey.
fn fills(painter: &Painter, place: &Places<'_>, palette: &Palette) {
    let spectrum = place.spectrum;
    if let Some(star) = &spectrum.star {
        let grey = star.points.iter().map(|[at, height]| (*at, *height, palette.spread));
        painter.add(Shape::mesh(under_curve(place, grey)));
        let colours = spectrum.visible.iter().map(|point| (point.place, point.height, ink(point, palette.spread)));
        painter.add(Shape::mesh(under_curve(place, colours)));
    }
}

fn under_curve(place: &Places<'_>, points: impl Iterator<Item = (f64, f64, Color32)>) -> Mesh {
    let mut mesh = Mesh::default();
    for (at, height, color) in points {
        let first = mesh.vertices.len() as u32;
        for y in [place.y(height).min(place.rect.bottom()), place.rect.bottom()] {
            mesh.vertices.push(Vertex { pos: pos2(place.x(at), y), uv: WHITE_UV, color });
        }
        if first >= 2 {
            mesh.indices.extend([first - 2, first - 1, first, first - 1, first + 1, first]);
        }
    }
    mesh
}

fn heights(painter: &Painter, place: &Places<'_>, palette: &Palette) {
    let rect = place.rect;
    for tick in place.spectrum.axis.ticks((rect.height() / 36.0).max(2.0) as usize) {
        let y = rect.bottom() - tick.height as f32 * rect.height();
        painter.hline(rect.x_range(), y, Stroke::new(1.0, palette.hairline.gamma_multiply(0.75)));
        painter.text(pos2(rect.left() - 6.0, y), Align2::RIGHT_CENTER, tick.label, small(), palette.dim);
    }
}

/// Name and share of each band over the part of the axis it takes.
fn shares(painter: &Painter, area: Rect, place: &Places<'_>, palette: &Palette) {
    for band in &place.spectrum.bands {
        let [left, right] = band.places.map(|at| place.x(at));
        if band.name != "infrared" {
            painter.vline(right, area.top() + 18.0..=place.rect.bottom(), Stroke::new(1.0, palette.hairline));
        }
        let x = 0.5 * (left + right);
        let share = band.share.map_or_else(|| "–".to_owned(), percent);
        painter.text(pos2(x, area.top() + 24.0), Align2::CENTER_CENTER, band.name, small(), palette.dim);
        painter.text(pos2(x, area.top() + 38.0), Align2::CENTER_CENTER, share, small(), palette.text);
    }
}

/// A share with the digits it deserves.
fn percent(share: f64) -> String {
    let value = 100.0 * share;
    if value >= 1.0 || value == 0.0 { format!("{} %", fixed(value, 1)) } else { format!("{} %", number(value, 2)) }
}

/// The visible band in its colours under the plot, and round wavelengths.
fn wavelengths(painter: &Painter, place: &Places<'_>, palette: &Palette) {
    let rect = place.rect;
    let (top, bottom) = (rect.bottom() + 2.0, rect.bottom() + 2.0 + BAND);
    let mut mesh = Mesh::default();
    for point in &place.spectrum.visible {
        let first = mesh.vertices.len() as u32;
        for y in [top, bottom] {
            let pos = pos2(place.x(point.place), y);
            mesh.vertices.push(Vertex { pos, uv: WHITE_UV, color: ink(point, palette.ground) });
        }
        if first >= 2 {
            mesh.indices.extend([first - 2, first - 1, first, first - 1, first + 1, first]);
        }
    }
    painter.add(Shape::mesh(mesh));
    painter.hline(rect.x_range(), rect.bottom(), Stroke::new(1.0, palette.hairline));
    let mut last_right = f32::NEG_INFINITY;
    for tick in TICKS {
        let x = place.x(place_of(f64::from(tick.wavelength_nm)));
        painter.vline(x, rect.bottom()..=rect.bottom() + 4.0, Stroke::new(1.0, palette.dim));
        let galley = painter.layout_no_wrap(tick.label.to_owned(), small(), palette.dim);
        // The last label ends with the plot; crowded ones give way.
        let left = (x - 0.5 * galley.size().x).min(rect.right() - galley.size().x);
        if left > last_right + 6.0 {
            last_right = left + galley.size().x;
            painter.galley(pos2(left, bottom + 3.0), galley, palette.dim);
        }
    }
}

/// A ring at the peak with its wavelength; beyond an end an arrow points there.
fn peak(painter: &Painter, place: &Places<'_>, star: &SpectrumCurve, palette: &Palette) {
    let (x, y) = (place.x(star.peak.place), place.y(star.peak.height));
    let words = format!("peak {}", wavelength_text(star.peak.wavelength_nm));
    let is_left = star.peak.place < 0.5;
    let at = if star.peak.is_in_view {
        painter.circle(pos2(x, y), 3.5, palette.ground, Stroke::new(1.6, palette.accent));
        pos2(x, y)
    } else {
        let y = place.rect.top() + 12.0;
        let tip = if is_left { -7.0 } else { 7.0 };
        let arrow = vec![pos2(x + tip, y), pos2(x, y - 4.0), pos2(x, y + 4.0)];
        painter.add(Shape::convex_polygon(arrow, palette.accent, Stroke::NONE));
        pos2(x, y)
    };
    // To the side where the curve falls more slowly there would be no room for words.
    let (offset, anchor) = if is_left { (9.0, Align2::LEFT_CENTER) } else { (-9.0, Align2::RIGHT_CENTER) };
    let galley = painter.layout_no_wrap(words, small(), palette.text);
    let middle = pos2(at.x + offset, (at.y - 8.0).max(place.rect.top() + 7.0));
    let plate = anchor.anchor_size(middle, galley.size());
    painter.rect_filled(plate.expand2(vec2(3.0, 0.0)), 2.0, palette.ground.gamma_multiply(0.8));
    painter.galley(plate.min, galley, palette.text);
}

/// Says which line is which, at the right where spectra run low.
fn legend(painter: &Painter, place: &Places<'_>, palette: &Palette) {
    let rect = place.rect;
    let star = place.spectrum.star.as_ref().map(|star| format!("star, {} K", number(star.temperature_k, 4)));
    let reference = place.spectrum.reference.as_ref().map(|_| format!("reference, {} K", number(REFERENCE_K, 4)));
    let lines = [(star, palette.text, false), (reference, palette.dim, true)];
    for (row, (words, line_ink, is_dashed)) in lines.into_iter().filter(|line| line.0.is_some()).enumerate() {
        let Some(words) = words else { continue };
        let y = rect.top() + 8.0 + 15.0 * row as f32;
        let galley = painter.layout_no_wrap(words, small(), palette.dim);
        let left = rect.right() - 4.0 - galley.size().x;
        let plate = Rect::from_min_max(pos2(left - 28.0, y - 7.5), pos2(rect.right() - 2.0, y + 7.5));
        painter.rect_filled(plate, 2.0, palette.ground.gamma_multiply(0.8));
        let line = [pos2(left - 26.0, y), pos2(left - 6.0, y)];
        if is_dashed {
            painter.extend(Shape::dashed_line(&line, Stroke::new(1.4, line_ink), 5.0, 4.0));
        } else {
            painter.line_segment(line, Stroke::new(1.8, line_ink));
        }
        painter.galley(pos2(left, y - 0.5 * galley.size().y), galley, palette.dim);
    }
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
fn ink(point: &VisiblePoint, ground: Color32) -> Color32 {
    let [red, green, blue] = point.colour_srgb;
    ground.lerp_to_gamma(Color32::from_rgb(red, green, blue), point.visibility as f32)
}
