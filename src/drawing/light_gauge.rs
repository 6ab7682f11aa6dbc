//! Where a planet's starlight stands between the thresholds of its climate.

use super::canvas::{Anchor, Area, Canvas, lettering, stroke};
use super::fonts::{fitted, width};
use super::ink::Palette;
use super::page::{SMALL_SIZE, TEXT_SIZE};
use super::state_mark;
use super::time_chart::lane_shade;
use crate::figure::LightGauge;
use crate::figure::light_gauge::GaugeRow;
use crate::units::number_text::number;

/// Height of the whole gauge.
pub(super) const HEIGHT: f64 = HEAD + 2.0 * ROW + GAP + 36.0;
/// Height of one row, and room above the first for its name and thresholds.
const ROW: f64 = 20.0;
const HEAD: f64 = 36.0;
/// Room between the rows.
const GAP: f64 = 4.0;
/// Room left of the rows for their names and right of them.
const LEFT: f64 = 100.0;
const RIGHT: f64 = 10.0;

/// Draws the gauge of the planet with an index from the top of an area on.
pub(super) fn draw(canvas: &mut Canvas, area: Area, gauge: &LightGauge, planet: usize, palette: &Palette) {
    let first_top = area.top + HEAD;
    let rows =
        Area { left: area.left + LEFT, top: first_top, right: area.right - RIGHT, bottom: first_top + 2.0 * ROW + GAP };
    let place = Places { rows, gauge };
    let title =
        format!("Starlight over the Earth's, and what it makes of the planet: {} now", number(gauge.light_earth, 3));
    let title = fitted(&title, area.width(), TEXT_SIZE, false);
    canvas.text([area.left, area.top + 12.0], &title, lettering(palette.text, TEXT_SIZE, Anchor::Start));
    for (index, row) in gauge.rows.iter().enumerate() {
        place.row(canvas, index, row, palette.planet(planet), palette);
        place.marks(canvas, index, row, palette);
    }
    place.ticks(canvas, palette);
    place.now(canvas, palette);
}

struct Places<'a> {
    rows: Area,
    gauge: &'a LightGauge,
}

impl Places<'_> {
    fn x(&self, value: f64) -> f64 {
        self.rows.left + self.gauge.axis.height(value).unwrap_or(0.0).clamp(0.0, 1.0) * self.rows.width()
    }

    fn band(&self, index: usize) -> Area {
        let top = self.rows.top + (ROW + GAP) * index as f64;
        Area { top, bottom: top + ROW, ..self.rows }
    }

    fn row(&self, canvas: &mut Canvas, index: usize, row: &GaugeRow, ink: &str, palette: &Palette) {
        let is_in_force = index == self.gauge.row_in_force;
        let band = self.band(index);
        let middle = band.centre()[1];
        let text_ink = if is_in_force { palette.text } else { palette.dim };
        let at = [self.rows.left - 10.0, middle + 3.9];
        canvas.text(at, row.name, lettering(text_ink, SMALL_SIZE, Anchor::End));
        for (from, to, state) in &row.spans {
            let span = Area { left: self.x(*from), right: self.x(*to), ..band };
            let strength = if is_in_force { 1.0 } else { 0.45 };
            canvas.veil(span, ink, strength * lane_shade(*state));
            canvas.line([span.left, span.top], [span.left, span.bottom], stroke(palette.ground, 1.0));
            let words = state.name();
            if span.width() > width(words, SMALL_SIZE, false) + 28.0 {
                state_mark::draw(canvas, [span.left + 11.0, middle], *state, text_ink);
                let at = [span.left + 22.0, middle + 3.9];
                canvas.text(at, words, lettering(text_ink, SMALL_SIZE, Anchor::Start));
            } else if span.width() > 16.0 {
                state_mark::draw(canvas, span.centre(), *state, text_ink);
            }
        }
        let corners =
            [[band.left, band.top], [band.right, band.top], [band.right, band.bottom], [band.left, band.bottom]];
        let rim = if is_in_force { stroke(palette.text, 1.2) } else { stroke(palette.hairline, 1.0) };
        canvas.closed_line(&corners, rim);
    }

    /// Thresholds of ice stand above both rows, those of open water below.
    fn marks(&self, canvas: &mut Canvas, index: usize, row: &GaugeRow, palette: &Palette) {
        let band = self.band(index);
        let mut last_right = f64::NEG_INFINITY;
        for mark in &row.marks {
            let x = self.x(mark.value);
            canvas.line([x, band.top], [x, band.bottom], stroke(palette.dim, 1.2));
            let words = format!("{} {}", mark.name, number(mark.value, 3));
            let half = 0.5 * width(&words, SMALL_SIZE, false);
            let at = x.clamp(self.rows.left + half, (self.rows.right - half).max(self.rows.left + half));
            let at = at.max(last_right + half + 8.0);
            last_right = at + half;
            let baseline = if index == 0 { self.rows.top - 5.0 } else { self.rows.bottom + 14.0 };
            canvas.text([at, baseline], &words, lettering(palette.text, SMALL_SIZE, Anchor::Middle));
        }
    }

    fn ticks(&self, canvas: &mut Canvas, palette: &Palette) {
        let y = self.rows.bottom + 19.0;
        canvas.line([self.rows.left, y], [self.rows.right, y], stroke(palette.dim, 0.8));
        let mut last_right = f64::NEG_INFINITY;
        for tick in self.gauge.axis.ticks((self.rows.width() / 60.0).max(2.0) as usize) {
            let x = self.rows.left + tick.height * self.rows.width();
            canvas.line([x, y], [x, y + 3.0], stroke(palette.dim, 1.0));
            let half = 0.5 * width(&tick.label, SMALL_SIZE, false);
            if x - half > last_right + 6.0 {
                last_right = x + half;
                canvas.text([x, y + 14.0], &tick.label, lettering(palette.dim, SMALL_SIZE, Anchor::Middle));
            }
        }
    }

    /// The light at the moment; beyond an end an arrow points there.
    fn now(&self, canvas: &mut Canvas, palette: &Palette) {
        let x = self.x(self.gauge.light_earth);
        let y = self.band(self.gauge.row_in_force).centre()[1];
        let axis = &self.gauge.axis;
        if (axis.lowest..=axis.highest).contains(&self.gauge.light_earth) {
            canvas.line([x, self.rows.top - 3.0], [x, self.rows.bottom + 3.0], stroke(palette.accent, 1.4));
            canvas.disc([x, y], 3.6, palette.ground, Some(stroke(palette.accent, 1.6)));
        } else {
            let tip = if self.gauge.light_earth > axis.highest { 10.0 } else { -10.0 };
            canvas.polygon(&[[x + tip, y], [x, y - 6.0], [x, y + 6.0]], palette.accent);
        }
    }
}
