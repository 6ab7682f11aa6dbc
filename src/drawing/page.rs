//! The frame of every figure: title, legend, caption and credits about the room for the plot.

use super::canvas::{Anchor, Area, Canvas, lettering, stroke};
use super::fonts::{fitted, wrapped};
use super::ink::Palette;
use super::legend::{self, Entry};

/// Air about everything.
const AIR: f64 = 24.0;
const TITLE_SIZE: f64 = 18.0;
/// Usual text.
pub(super) const TEXT_SIZE: f64 = 12.0;
/// Labels of axes and marks.
pub(super) const SMALL_SIZE: f64 = 11.0;
const CREDITS_SIZE: f64 = 9.5;
const CAPTION_LINE: f64 = 16.0;
const CREDITS_LINE: f64 = 13.0;

/// The words about a plot.
#[derive(Clone, Debug)]
pub(super) struct Words {
    /// What is shown, of whom.
    pub title: String,
    /// The scenario and the moment.
    pub subtitle: String,
    /// What the plot says, in sentences.
    pub caption: String,
    /// Program, scenario and methods.
    pub credits: String,
}

/// Draws the frame and returns the room that is left for the plot with its axes.
pub(super) fn frame(
    canvas: &mut Canvas,
    [width, height]: [f64; 2],
    words: &Words,
    entries: &[Entry],
    palette: &Palette,
) -> Area {
    canvas.rect(Area { left: 0.0, top: 0.0, right: width, bottom: height }, palette.ground);
    let room = width - 2.0 * AIR;
    let title = fitted(&words.title, room, TITLE_SIZE, true);
    let mut heading = lettering(palette.text, TITLE_SIZE, Anchor::Start);
    heading.is_bold = true;
    canvas.text([AIR, AIR + 14.0], &title, heading);
    let subtitle = fitted(&words.subtitle, room, TEXT_SIZE, false);
    canvas.text([AIR, AIR + 33.0], &subtitle, lettering(palette.dim, TEXT_SIZE, Anchor::Start));
    let mut top = AIR + 44.0;
    let rows = legend::rows(entries, room);
    legend::draw(canvas, [AIR, top], &rows, entries.len(), palette);
    top += legend::height(rows.len()) + 10.0;
    let mut y = height - AIR + 4.0;
    for line in wrapped(&words.credits, room, CREDITS_SIZE, 2).iter().rev() {
        canvas.text([AIR, y], line, lettering(palette.dim, CREDITS_SIZE, Anchor::Start));
        y -= CREDITS_LINE;
    }
    y -= 5.0;
    for line in wrapped(&words.caption, room, TEXT_SIZE, 3).iter().rev() {
        canvas.text([AIR, y], line, lettering(palette.text, TEXT_SIZE, Anchor::Start));
        y -= CAPTION_LINE;
    }
    Area { left: AIR, top, right: width - AIR, bottom: y - 2.0 }
}

/// Says in the place of a plot why there is none.
pub(super) fn say_instead(canvas: &mut Canvas, area: Area, reason: &str, palette: &Palette) {
    canvas.closed_line(
        &[[area.left, area.top], [area.right, area.top], [area.right, area.bottom], [area.left, area.bottom]],
        stroke(palette.hairline, 1.0),
    );
    let [x, mut y] = area.centre();
    for line in wrapped(reason, area.width() - 40.0, TEXT_SIZE, 3) {
        canvas.text([x, y], &line, lettering(palette.dim, TEXT_SIZE, Anchor::Middle));
        y += 16.0;
    }
}
