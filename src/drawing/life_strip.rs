//! The ribbon of a whole life in the star's true colours, with its phases and events.

use super::canvas::{Anchor, Area, Canvas, Point, lettering, stroke};
use super::fonts::width;
use super::ink::{Look, Palette, hex};
use super::legend::{Entry, Sample};
use super::page::SMALL_SIZE;
use super::time_chart::{FOOT, TimeView, time_axis};
use crate::figure::Ribbon;
use crate::figure::ribbon::Upright;
use crate::physics::star::Phase;
use crate::system::History;
use crate::units::time_words::short_span;

/// Height of the lines of phases and of event marks.
const PHASES: f64 = 20.0;
const EVENTS: f64 = 14.0;
/// Tallest ribbon worth its room.
const TALLEST: f64 = 320.0;

/// Draws the ribbon into an area.
pub(super) fn draw(
    canvas: &mut Canvas,
    area: Area,
    (ribbon, entries): (&Ribbon, &[Entry]),
    history: &History,
    time: &TimeView<'_>,
    (look, palette): (Look, &Palette),
) {
    let room = area.height() - FOOT - PHASES - EVENTS - 14.0;
    let height = room.clamp(20.0, TALLEST);
    let top = area.top + 14.0 + EVENTS + 0.4 * (room - height).max(0.0);
    let band = Area { left: area.left + 8.0, top, right: area.right - 8.0, bottom: top + height };
    // On white paper a white star would vanish.
    canvas.rect(band, if look == Look::Light { palette.bed } else { palette.ground });
    let glowing = ribbon.uprights.chunk_by(|first, second| first.glows && second.glows);
    for run in glowing.filter(|run| run.len() > 1) {
        let stops: Vec<(f64, String)> =
            run.iter().map(|upright| (time.x(upright.fraction, band), hex(upright.colour_srgb))).collect();
        let ink = canvas.colours_across(&stops);
        let mut outline = edge(run, band, time, -1.0);
        outline.extend(edge(run, band, time, 1.0).into_iter().rev());
        canvas.polygon(&outline, &ink);
    }
    for sign in [-1.0, 1.0] {
        canvas.polyline(&edge(&ribbon.uprights, band, time, sign), stroke(palette.casing, 0.8));
    }
    phases(canvas, band, (ribbon, entries), time, palette);
    events(canvas, band, history, time, palette);
    if let Some(fraction) = time.moment() {
        let x = time.x(fraction, band);
        canvas.line([x, band.top - EVENTS], [x, band.bottom], stroke(palette.ground, 3.4));
        canvas.line([x, band.top - EVENTS], [x, band.bottom], stroke(palette.accent, 1.6));
        let words = short_span(time.moment_yr);
        let half = 0.5 * width(&words, SMALL_SIZE, false);
        let at = x.clamp(band.left + half, (band.right - half).max(band.left + half));
        canvas.text([at, band.top - EVENTS - 4.0], &words, lettering(palette.accent, SMALL_SIZE, Anchor::Middle));
    }
    time_axis(canvas, Area { bottom: band.bottom + PHASES, ..band }, time, palette);
}

fn edge(uprights: &[Upright], band: Area, time: &TimeView<'_>, sign: f64) -> Vec<Point> {
    let middle = band.centre()[1];
    let y = |upright: &Upright| middle + sign * 0.5 * upright.height * band.height();
    uprights.iter().map(|upright| [time.x(upright.fraction, band), y(upright)]).collect()
}

/// The phases whose names need more room than their stretch has, each with a letter that stands for it.
pub(super) fn entries(width_of_page: f64, ribbon: &Ribbon, time: &TimeView<'_>) -> Vec<Entry> {
    // A little less than the ribbon will have: a name that hardly fits may as well be told apart by its letter.
    let band = Area { left: 0.0, top: 0.0, right: width_of_page - 66.0, bottom: 0.0 };
    let crowded = ribbon.phases.iter().filter(|phase| !has_room(phase, band, time));
    let letters = ('a'..='z').zip(crowded);
    letters.map(|(letter, phase)| Entry { sample: Sample::Letter(letter), words: phase.0.name().to_owned() }).collect()
}

fn stretch((_, from, to): &(Phase, f64, f64), band: Area, time: &TimeView<'_>) -> [f64; 2] {
    [from, to].map(|fraction| time.x(*fraction, band).clamp(band.left, band.right))
}

fn has_room(phase: &(Phase, f64, f64), band: Area, time: &TimeView<'_>) -> bool {
    let [left, right] = stretch(phase, band, time);
    width(phase.0.name(), SMALL_SIZE, false) + 8.0 < right - left
}

/// Names of the phases of life under the ribbon, or the letters that stand for them.
fn phases(
    canvas: &mut Canvas,
    band: Area,
    (ribbon, entries): (&Ribbon, &[Entry]),
    time: &TimeView<'_>,
    palette: &Palette,
) {
    canvas.line([band.left, band.bottom + PHASES], [band.right, band.bottom + PHASES], stroke(palette.dim, 1.0));
    for phase in &ribbon.phases {
        let [left, right] = stretch(phase, band, time);
        if left > band.left + 1.0 {
            canvas.line([left, band.bottom + 3.0], [left, band.bottom + PHASES], stroke(palette.dim, 0.8));
        }
        let name = phase.0.name();
        let letter = entries.iter().find(|entry| entry.words == name).and_then(|entry| match entry.sample {
            Sample::Letter(letter) => Some(letter.to_string()),
            _ => None,
        });
        let words = letter.as_deref().unwrap_or(name);
        if width(words, SMALL_SIZE, false) + 2.0 < right - left {
            let place = [0.5 * (left + right), band.bottom + 14.5];
            canvas.text(place, words, lettering(palette.text, SMALL_SIZE, Anchor::Middle));
        }
    }
}

/// A mark for each event that is not on top of the one before.
fn events(canvas: &mut Canvas, band: Area, history: &History, time: &TimeView<'_>, palette: &Palette) {
    let mut last_x = f64::NEG_INFINITY;
    for event in history.events() {
        let fraction = time.axis.fraction_at(event.time_yr);
        let is_shown = event.time_yr >= time.axis.from_yr() && event.time_yr <= time.axis.to_yr();
        let x = time.x(fraction, band);
        if is_shown && x - last_x > 7.0 && x >= band.left && x <= band.right {
            last_x = x;
            let y = band.top - 3.0;
            canvas.polygon(&[[x, y], [x - 3.6, y - 6.5], [x + 3.6, y - 6.5]], palette.text);
        }
    }
}
