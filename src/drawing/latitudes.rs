//! A planet's surface temperature from pole to pole, with its ice.

use super::canvas::{Anchor, Area, Canvas, Point, Stroke, lettering, stroke};
use super::fonts::{fitted, width};
use super::ink::{Palette, dashes};
use super::page::{SMALL_SIZE, TEXT_SIZE};
use crate::figure::LatitudeFigure;
use crate::figure::chart::BandMeaning;
use crate::units::number_text::number;

/// Room left of the plot for its labels, right of it, above it for its name and below it for latitudes.
const LEFT: f64 = 66.0;
const RIGHT: f64 = 10.0;
const NAME: f64 = 18.0;
const FOOT: f64 = 22.0;

/// Latitudes with a label, degrees.
const LABELS: [(f64, &str); 7] = [
    (-90.0, "90° S"),
    (-60.0, "60° S"),
    (-30.0, "30° S"),
    (0.0, "equator"),
    (30.0, "30° N"),
    (60.0, "60° N"),
    (90.0, "90° N"),
];

/// Draws the figure of the planet with an index.
pub(super) fn draw(canvas: &mut Canvas, area: Area, figure: &LatitudeFigure, planet: usize, palette: &Palette) {
    let plot =
        Area { left: area.left + LEFT, top: area.top + NAME, right: area.right - RIGHT, bottom: area.bottom - FOOT };
    let place = Places { plot, figure };
    let name = fitted(figure.title, plot.width(), TEXT_SIZE, false);
    canvas.text([plot.left, plot.top - 6.0], &name, lettering(palette.text, TEXT_SIZE, Anchor::Start));
    for [from_deg, to_deg] in &figure.ice_deg {
        let ice = Area { left: place.x(*from_deg), right: place.x(*to_deg), ..plot };
        canvas.rect(ice, palette.band(BandMeaning::LiquidWater));
    }
    axes(canvas, &place, palette);
    for edge_deg in &figure.ice_edges_deg {
        let x = place.x(*edge_deg);
        canvas.line([x, plot.top], [x, plot.bottom], Stroke { ink: palette.dim, width: 1.0, dashes: "4 3" });
    }
    let line = Stroke { ink: palette.planet(planet), width: 2.2, dashes: dashes(planet) };
    let points = place.points();
    canvas.clipped(plot, |canvas| canvas.polyline(&points, line));
    names(canvas, &place, palette);
    let corners = [[plot.left, plot.top], [plot.right, plot.top], [plot.right, plot.bottom], [plot.left, plot.bottom]];
    canvas.closed_line(&corners, stroke(palette.dim, 1.0));
}

struct Places<'a> {
    plot: Area,
    figure: &'a LatitudeFigure,
}

impl Places<'_> {
    fn x(&self, latitude_deg: f64) -> f64 {
        self.plot.left + (latitude_deg + 90.0) / 180.0 * self.plot.width()
    }

    fn y(&self, value: f64) -> f64 {
        let height = self.figure.axis.height(value).unwrap_or(0.0).clamp(-1.0, 2.0);
        self.plot.bottom - height * self.plot.height()
    }

    fn points(&self) -> Vec<Point> {
        self.figure.profile.iter().map(|[latitude_deg, local_k]| [self.x(*latitude_deg), self.y(*local_k)]).collect()
    }
}

fn axes(canvas: &mut Canvas, place: &Places<'_>, palette: &Palette) {
    let plot = place.plot;
    for tick in place.figure.axis.ticks((plot.height() / 34.0).max(2.0) as usize) {
        let y = plot.bottom - tick.height * plot.height();
        canvas.line([plot.left, y], [plot.right, y], stroke(palette.hairline, 0.8));
        canvas.line([plot.left - 4.0, y], [plot.left, y], stroke(palette.dim, 1.0));
        canvas.text([plot.left - 7.0, y + 3.9], &tick.label, lettering(palette.dim, SMALL_SIZE, Anchor::End));
    }
    let mut last_right = f64::NEG_INFINITY;
    for (latitude_deg, label) in LABELS {
        let x = place.x(latitude_deg);
        canvas.line([x, plot.bottom], [x, plot.bottom + 4.0], stroke(palette.dim, 1.0));
        let half = 0.5 * width(label, SMALL_SIZE, false);
        if x - half > last_right + 6.0 {
            last_right = x + half;
            canvas.text([x, plot.bottom + 16.0], label, lettering(palette.dim, SMALL_SIZE, Anchor::Middle));
        }
    }
    for level in &place.figure.levels {
        let y = place.y(level.value);
        canvas.line([plot.left, y], [plot.right, y], Stroke { ink: palette.dim, width: 0.9, dashes: "1.5 4" });
    }
}

/// Names of levels and of the edges of the ice, on plates where they cross the curve.
fn names(canvas: &mut Canvas, place: &Places<'_>, palette: &Palette) {
    let plot = place.plot;
    for (index, level) in place.figure.levels.iter().enumerate() {
        let y = place.y(level.value);
        // The upper of two has its name above its line, the lower below, so that close lines keep theirs apart.
        let baseline = if index == 0 { y - 4.0 } else { y + 12.0 };
        if baseline - 9.0 < plot.top || baseline + 3.0 > plot.bottom {
            continue;
        }
        plate(canvas, [plot.centre()[0], baseline], &level.name, Anchor::Middle, palette);
    }
    for edge_deg in &place.figure.ice_edges_deg {
        let words = format!("ice edge {}°", number(edge_deg.abs(), 3));
        let (anchor, shift) = if *edge_deg > 0.0 { (Anchor::End, -5.0) } else { (Anchor::Start, 5.0) };
        let x = place.x(*edge_deg) + shift;
        // At the foot, where the curve is far: it is warm within the edges.
        let wide = width(&words, SMALL_SIZE, false);
        let reach = if *edge_deg > 0.0 { [x - wide, x] } else { [x, x + wide] };
        let is_inside = reach[0] > plot.left && reach[1] < plot.right;
        let meets_other = place.figure.ice_edges_deg.iter().any(|other| {
            other != edge_deg && (place.x(*other) - place.x(*edge_deg)).abs() < 2.0 * wide + 20.0 && *edge_deg < 0.0
        });
        if is_inside && !meets_other {
            plate(canvas, [x, plot.bottom - 7.0], &words, anchor, palette);
        }
    }
}

fn plate(canvas: &mut Canvas, [x, baseline]: Point, words: &str, anchor: Anchor, palette: &Palette) {
    let wide = width(words, SMALL_SIZE, false);
    let left = match anchor {
        Anchor::Start => x,
        Anchor::Middle => x - 0.5 * wide,
        Anchor::End => x - wide,
    };
    let ground = Area { left: left - 2.0, top: baseline - 9.5, right: left + wide + 2.0, bottom: baseline + 3.0 };
    canvas.veil(ground, palette.ground, 0.75);
    canvas.text([x, baseline], words, lettering(palette.dim, SMALL_SIZE, anchor));
}
