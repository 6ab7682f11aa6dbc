//! What lines, bands and marks stand for, in rows above the plot.

use super::canvas::{Anchor, Area, Canvas, Stroke, lettering, stroke};
use super::fonts::{fitted, width};
use super::ink::{Palette, dashes};
use super::{interior, state_mark};
use crate::figure::chart::BandMeaning;
use crate::system::PlanetState;

/// One entry.
#[derive(Clone, Debug)]
pub(super) struct Entry {
    pub sample: Sample,
    pub words: String,
}

/// What stands before the words.
#[derive(Clone, Debug)]
pub(super) enum Sample {
    /// A line of the star.
    Star,
    /// A line of the reference.
    Reference,
    /// A line in true colour.
    TrueColour([u8; 3]),
    /// A line of a planet.
    Planet(usize),
    /// A planet with its state.
    State(usize, PlanetState),
    /// A thin neutral line.
    Thin,
    /// A dotted neutral line.
    Dotted,
    /// A band of this colour.
    Band(&'static str),
    /// A letter that stands for the words.
    Letter(char),
    /// A hatched area.
    Hatched,
    /// A line of several within one panel of the star's inside.
    Layers(usize),
    /// A value that divides two regimes.
    Level,
    /// The moment.
    Moment,
}

const SIZE: f64 = 12.0;
const ROW: f64 = 17.0;
const SAMPLE: f64 = 26.0;
const GAP: f64 = 18.0;
const MOST_ROWS: usize = 3;

/// The entries in rows that fit a width; entries beyond the last row are counted in words.
pub(super) fn rows(entries: &[Entry], room: f64) -> Vec<Vec<Entry>> {
    let mut rows: Vec<Vec<Entry>> = Vec::new();
    let mut used = 0.0;
    for (index, entry) in entries.iter().enumerate() {
        let words = fitted(&entry.words, (room - SAMPLE - 8.0).min(300.0), SIZE, false);
        let needed = SAMPLE + 6.0 + width(&words, SIZE, false) + GAP;
        // Room for the words that count what is left out.
        let is_last_row = rows.len() == MOST_ROWS && index + 1 < entries.len();
        let limit = if is_last_row { room - 60.0 } else { room };
        if rows.is_empty() || used + needed - GAP > limit {
            if rows.len() == MOST_ROWS {
                break;
            }
            rows.push(Vec::new());
            used = 0.0;
        }
        used += needed;
        if let Some(row) = rows.last_mut() {
            row.push(Entry { sample: entry.sample.clone(), words });
        }
    }
    rows
}

/// Height of so many rows.
pub(super) fn height(rows: usize) -> f64 {
    ROW * rows as f64
}

/// Draws rows from a corner; `count` is how many entries there were.
pub(super) fn draw(canvas: &mut Canvas, corner: [f64; 2], rows: &[Vec<Entry>], count: usize, palette: &Palette) {
    let shown: usize = rows.iter().map(Vec::len).sum();
    for (number, row) in rows.iter().enumerate() {
        let y = corner[1] + ROW * number as f64 + 0.5 * ROW;
        let mut x = corner[0];
        for entry in row {
            sample(canvas, [x, y], &entry.sample, palette);
            canvas.text([x + SAMPLE + 6.0, y + 4.2], &entry.words, lettering(palette.text, SIZE, Anchor::Start));
            x += SAMPLE + 6.0 + width(&entry.words, SIZE, false) + GAP;
        }
        if number + 1 == rows.len() && shown < count {
            let words = format!("and {} more", count - shown);
            canvas.text([x, y + 4.2], &words, lettering(palette.dim, SIZE, Anchor::Start));
        }
    }
}

fn sample(canvas: &mut Canvas, [x, y]: [f64; 2], sample: &Sample, palette: &Palette) {
    let mut line = |stroke: Stroke<'_>| canvas.line([x, y], [x + SAMPLE, y], stroke);
    match sample {
        Sample::Star => line(stroke(palette.text, 1.8)),
        Sample::Reference => line(Stroke { ink: palette.dim, width: 1.4, dashes: "5 4" }),
        Sample::Thin => line(stroke(palette.dim, 1.2)),
        Sample::Dotted => line(Stroke { ink: palette.dim, width: 1.0, dashes: "2 4" }),
        Sample::TrueColour(colour) => {
            line(stroke(palette.casing, 5.0));
            line(stroke(&super::ink::hex(*colour), 3.0));
        }
        Sample::Planet(index) => line(Stroke { ink: palette.planet(*index), width: 1.9, dashes: dashes(*index) }),
        Sample::State(index, state) => state_mark::draw(canvas, [x + 16.0, y], *state, palette.planet(*index)),
        Sample::Band(ink) => {
            canvas.rect(Area { left: x, top: y - 5.0, right: x + SAMPLE, bottom: y + 5.0 }, ink);
        }
        Sample::Hatched => {
            let area = Area { left: x, top: y - 5.0, right: x + SAMPLE, bottom: y + 5.0 };
            canvas.veil(area, palette.band(BandMeaning::Spread), 0.5);
            interior::hatch(canvas, area, x, palette);
        }
        Sample::Layers(index) => line(interior::line_stroke(*index, palette)),
        Sample::Level => line(interior::level_stroke(palette)),
        Sample::Letter(letter) => {
            let place = [x + SAMPLE, y + 4.2];
            canvas.text(place, &letter.to_string(), lettering(palette.dim, SIZE, Anchor::End));
        }
        Sample::Moment => {
            canvas.line([x + 13.0, y - 6.0], [x + 13.0, y + 6.0], stroke(palette.accent, 1.4));
            canvas.disc([x + 13.0, y], 3.2, palette.ground, Some(stroke(palette.accent, 1.5)));
        }
    }
}
