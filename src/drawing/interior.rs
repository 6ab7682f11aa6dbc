//! The inside of the star, layer by layer: one small plot for each figure.

use super::canvas::{Anchor, Area, Canvas, Point, Stroke, lettering, stroke};
use super::fonts::{fitted, width};
use super::ink::Palette;
use super::legend::{Entry, Sample};
use super::page::{SMALL_SIZE, TEXT_SIZE};
use crate::figure::InteriorPicture;
use crate::figure::chart::BandMeaning;
use crate::figure::interior::{LayerPanel, MixedZone};

/// Room left of a plot for the labels of heights.
const LEFT: f64 = 46.0;
/// Room right of a plot, for half of a label.
const RIGHT: f64 = 12.0;
/// Room above a plot for its name.
const NAME: f64 = 18.0;
/// Room below a plot for the labels of places.
const FOOT: f64 = 22.0;
/// Room below all plots for the name of the axis.
const AXIS: f64 = 20.0;
/// Room between rows of plots.
const BETWEEN: f64 = 8.0;
/// Least width of a plot with its labels.
const LEAST_WIDTH: f64 = 250.0;
/// Distance between the hatching lines of mixed zones.
const HATCH: f64 = 9.0;

/// What hatching and lines stand for.
pub(super) fn entries(picture: &InteriorPicture) -> Vec<Entry> {
    let mixed = (!picture.mixed.is_empty())
        .then(|| Entry { sample: Sample::Hatched, words: "mixed: gas rises and sinks".to_owned() });
    // A panel of one line says in its name what the line is.
    let lines = picture.panels.iter().filter(|panel| panel.lines.len() > 1).flat_map(|panel| {
        let named = panel.lines.iter().enumerate();
        named.map(|(index, line)| {
            // The first has the pattern of every other panel's line.
            let words =
                if index == 0 { format!("{}: {}", panel.figure.name(), line.name) } else { line.name.to_owned() };
            Entry { sample: Sample::Layers(index), words }
        })
    });
    let levels = picture.panels.iter().filter_map(|panel| {
        let (_, words) = panel.level?;
        Some(Entry { sample: Sample::Level, words: words.to_owned() })
    });
    mixed.into_iter().chain(lines).chain(levels).collect()
}

/// The pattern of one of several lines in a panel.
pub(super) fn line_stroke(index: usize, palette: &Palette) -> Stroke<'_> {
    match index {
        0 => stroke(palette.text, 1.8),
        1 => Stroke { ink: palette.planet(1), width: 1.9, dashes: "7 4" },
        _ => Stroke { ink: palette.planet(0), width: 1.9, dashes: "2 2.5" },
    }
}

/// The line of a value that divides two regimes.
pub(super) fn level_stroke(palette: &Palette) -> Stroke<'_> {
    Stroke { ink: palette.text, width: 1.2, dashes: "1.5 4" }
}

/// Draws all panels into an area, as many side by side as there is room for.
pub(super) fn draw(canvas: &mut Canvas, area: Area, picture: &InteriorPicture, palette: &Palette) {
    let count = picture.panels.len().max(1);
    let columns = columns(area, count);
    let rows = count.div_ceil(columns);
    let each_wide = area.width() / columns as f64;
    let each_high = (area.height() - AXIS - BETWEEN * (rows - 1) as f64) / rows as f64;
    for (index, panel) in picture.panels.iter().enumerate() {
        let (column, row) = (index % columns, index / columns);
        let left = area.left + each_wide * column as f64;
        let top = area.top + (each_high + BETWEEN) * row as f64;
        let plot = Area {
            left: left + LEFT,
            top: top + NAME,
            right: left + each_wide - RIGHT,
            bottom: top + each_high - FOOT,
        };
        Places { plot, picture, panel }.draw(canvas, palette);
    }
    let name = format!("From the centre to the surface: {}", picture.scale.title());
    let name = fitted(&name, area.width(), TEXT_SIZE, false);
    let at = [area.centre()[0], area.bottom - 4.0];
    canvas.text(at, &name, lettering(palette.text, TEXT_SIZE, Anchor::Middle));
}

/// The number of columns that leaves no gap and whose plots come nearest to a pleasant shape.
fn columns(area: Area, count: usize) -> usize {
    let most = ((area.width() / LEAST_WIDTH) as usize).clamp(1, count);
    let badness = |columns: usize| {
        let high = (area.height() - AXIS) / count.div_ceil(columns) as f64 - NAME - FOOT;
        ((area.width() / columns as f64 - LEFT - RIGHT) / (1.6 * high.max(1.0))).ln().abs()
    };
    (1..=most)
        .filter(|columns| count.is_multiple_of(*columns))
        .min_by(|first, second| badness(*first).total_cmp(&badness(*second)))
        .unwrap_or(1)
}

/// Places of one panel.
struct Places<'a> {
    plot: Area,
    picture: &'a InteriorPicture,
    panel: &'a LayerPanel,
}

impl Places<'_> {
    fn point(&self, [place, value]: [f64; 2]) -> Point {
        let height = self.panel.axis.height(value).unwrap_or(-1.0).clamp(-0.5, 1.5);
        [self.plot.left + place * self.plot.width(), self.plot.bottom - height * self.plot.height()]
    }

    fn draw(&self, canvas: &mut Canvas, palette: &Palette) {
        let plot = self.plot;
        let name = fitted(self.panel.figure.title(), plot.width() + RIGHT, TEXT_SIZE, false);
        canvas.text([plot.left, plot.top - 6.0], &name, lettering(palette.text, TEXT_SIZE, Anchor::Start));
        for zone in &self.picture.mixed {
            self.mixed(canvas, zone, palette);
        }
        self.heights(canvas, palette);
        self.places(canvas, palette);
        if let Some((value, _)) = self.panel.level {
            let [from, to] = [0.0, 1.0].map(|place| self.point([place, value]));
            if (plot.top..=plot.bottom).contains(&from[1]) {
                canvas.line(from, to, level_stroke(palette));
            }
        }
        canvas.clipped(Area { top: plot.top - 1.0, bottom: plot.bottom + 1.0, ..plot }, |canvas| {
            for (index, line) in self.panel.lines.iter().enumerate() {
                let points: Vec<Point> = line.points.iter().map(|point| self.point(*point)).collect();
                canvas.polyline(&points, line_stroke(index, palette));
            }
        });
        let corners =
            [[plot.left, plot.top], [plot.right, plot.top], [plot.right, plot.bottom], [plot.left, plot.bottom]];
        canvas.closed_line(&corners, stroke(palette.dim, 1.0));
    }

    /// A mixed zone: shade, hatching and edges.
    fn mixed(&self, canvas: &mut Canvas, zone: &MixedZone, palette: &Palette) {
        let [left, right] = zone.places.map(|place| self.plot.left + place * self.plot.width());
        let area = Area { left, right: right.max(left + 1.0), ..self.plot };
        canvas.veil(area, palette.band(BandMeaning::Spread), 0.5);
        hatch(canvas, area, self.plot.left, palette);
        for edge in [area.left, area.right] {
            canvas.line([edge, area.top], [edge, area.bottom], stroke(palette.band(BandMeaning::Undecided), 1.0));
        }
    }

    fn heights(&self, canvas: &mut Canvas, palette: &Palette) {
        let plot = self.plot;
        for tick in self.panel.axis.ticks((plot.height() / 26.0).max(2.0) as usize) {
            let y = plot.bottom - tick.height * plot.height();
            canvas.line([plot.left, y], [plot.right, y], stroke(palette.hairline, 0.8));
            canvas.line([plot.left - 4.0, y], [plot.left, y], stroke(palette.dim, 1.0));
            canvas.text([plot.left - 7.0, y + 3.9], &tick.label, lettering(palette.dim, SMALL_SIZE, Anchor::End));
        }
    }

    fn places(&self, canvas: &mut Canvas, palette: &Palette) {
        let plot = self.plot;
        let mut last_right = f64::NEG_INFINITY;
        for tick in self.picture.scale.axis().ticks((plot.width() / 60.0).max(2.0) as usize) {
            let x = plot.left + tick.height * plot.width();
            canvas.line([x, plot.bottom], [x, plot.bottom + 4.0], stroke(palette.dim, 1.0));
            let half = 0.5 * width(&tick.label, SMALL_SIZE, false);
            if x - half > last_right + 8.0 {
                last_right = x + half;
                let at = [x, plot.bottom + 16.0];
                canvas.text(at, &tick.label, lettering(palette.dim, SMALL_SIZE, Anchor::Middle));
            }
        }
    }
}

/// Slanting lines across an area, counted from a place, so that neighbouring areas share one pattern.
pub(super) fn hatch(canvas: &mut Canvas, area: Area, from_x: f64, palette: &Palette) {
    let ink = stroke(palette.band(BandMeaning::Undecided), 0.7);
    let high = area.height();
    canvas.clipped(area, |canvas| {
        let mut x = from_x + ((area.left - high - from_x) / HATCH).floor() * HATCH;
        while x < area.right {
            canvas.line([x, area.bottom], [x + high, area.top], ink);
            x += HATCH;
        }
    });
}
