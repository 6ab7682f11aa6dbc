//! The Hertzsprung-Russell diagram: the star's whole way in its true colours, the moment as a ring.

use super::canvas::{Anchor, Area, Canvas, Point, Stroke, lettering, stroke};
use super::fonts::width;
use super::ink::{Palette, hex};
use super::legend::{Entry, Sample};
use super::page::{SMALL_SIZE, TEXT_SIZE};
use crate::figure::HrDiagram;
use crate::system::Moment;
use crate::units::number_text::number;

const LEFT: f64 = 66.0;
const FOOT: f64 = 38.0;
/// Masses named along the main sequence, solar masses.
const MARKED_MSUN: [f64; 7] = [0.1, 0.2, 0.5, 1.0, 2.0, 5.0, 20.0];

/// What the lines stand for.
pub(super) fn entries(diagram: &HrDiagram) -> Vec<Entry> {
    let colour = diagram.track.first().and_then(|run| run.first()).map(|point| point.colour_srgb);
    let track = colour.map(|colour| Entry {
        sample: Sample::TrueColour(colour),
        words: "the star's way, in its true colours".to_owned(),
    });
    let others = [
        (Sample::Thin, "stars of all masses at birth"),
        (Sample::Dotted, "equal radius"),
        (Sample::Moment, "the moment"),
    ];
    track.into_iter().chain(others.map(|(sample, words)| Entry { sample, words: words.to_owned() })).collect()
}

/// Draws a diagram into an area.
pub(super) fn draw(canvas: &mut Canvas, area: Area, diagram: &HrDiagram, moment: &Moment, palette: &Palette) {
    let plot = Area { left: area.left + LEFT, top: area.top, right: area.right - 10.0, bottom: area.bottom - FOOT };
    let place = Places { plot };
    axes(canvas, plot, diagram, palette);
    let mut taken: Vec<Area> = Vec::new();
    let at_moment = moment
        .star
        .effective_temperature_k
        .zip(moment.star.luminosity_lsun)
        .and_then(|(temperature_k, luminosity_lsun)| diagram.place(temperature_k, luminosity_lsun))
        .map(|at| place.at(at));
    taken.extend(at_moment.map(|[x, y]| Area { left: x - 9.0, top: y - 9.0, right: x + 9.0, bottom: y + 9.0 }));
    canvas.clipped(plot, |canvas| {
        let names = Names { plot, palette };
        for line in &diagram.radii {
            let ends = line.ends.map(|end| place.at(end));
            canvas.line(ends[0], ends[1], Stroke { ink: palette.dim, width: 0.8, dashes: "2 4" });
        }
        let births: Vec<Point> = diagram.main_sequence.iter().map(|(_, at)| place.at(*at)).collect();
        canvas.polyline(&births, stroke(palette.dim, 1.2));
        for run in &diagram.track {
            let points: Vec<Point> = run.iter().map(|point| place.at(point.place)).collect();
            canvas.polyline(&points, stroke(palette.casing, 5.2));
            let mut from = 0;
            // Neighbours of one colour are one line.
            for to in 1..points.len() {
                if to + 1 == points.len() || run[to].colour_srgb != run[from].colour_srgb {
                    canvas.polyline(&points[from..=to], stroke(&hex(run[from].colour_srgb), 3.2));
                    from = to;
                }
            }
        }
        for mark in &diagram.phases {
            canvas.disc(place.at(mark.place), 2.7, palette.ground, Some(stroke(palette.text, 1.2)));
        }
        let sun = place.at(diagram.sun);
        canvas.circle(sun, 5.0, stroke(palette.dim, 1.2));
        canvas.disc(sun, 1.4, palette.dim, None);
        if let Some(at) = at_moment {
            canvas.circle(at, 7.5, stroke(palette.accent, 2.0));
            canvas.disc(at, 2.6, palette.accent, None);
        }
        for mark in &diagram.phases {
            names.beside(canvas, place.at(mark.place), &mark.label, palette.text, &mut taken);
        }
        names.beside(canvas, sun, "Sun, today", palette.dim, &mut taken);
        for line in &diagram.radii {
            names.along(canvas, line.ends.map(|end| place.at(end)), &line.label, &mut taken);
        }
        for (mass_msun, at) in diagram.main_sequence.iter().filter(|(mass, _)| MARKED_MSUN.contains(mass)) {
            let at = place.at(*at);
            canvas.line([at[0] - 4.0, at[1]], [at[0] + 4.0, at[1]], stroke(palette.dim, 1.2));
            names.beside(canvas, at, &format!("{} M☉", number(*mass_msun, 2)), palette.dim, &mut taken);
        }
    });
    canvas.closed_line(
        &[[plot.left, plot.top], [plot.right, plot.top], [plot.right, plot.bottom], [plot.left, plot.bottom]],
        stroke(palette.dim, 1.0),
    );
}

struct Places {
    plot: Area,
}

impl Places {
    fn at(&self, [left, bottom]: [f64; 2]) -> Point {
        // Far beyond the frame the exact place does not matter.
        let (left, bottom) = (left.clamp(-2.0, 3.0), bottom.clamp(-2.0, 3.0));
        [self.plot.left + left * self.plot.width(), self.plot.bottom - bottom * self.plot.height()]
    }
}

fn axes(canvas: &mut Canvas, plot: Area, diagram: &HrDiagram, palette: &Palette) {
    for tick in diagram.luminosity.ticks((plot.height() / 34.0).max(3.0) as usize) {
        let y = plot.bottom - tick.height * plot.height();
        canvas.line([plot.left, y], [plot.right, y], stroke(palette.hairline, 0.8));
        canvas.line([plot.left - 4.0, y], [plot.left, y], stroke(palette.dim, 1.0));
        canvas.text([plot.left - 7.0, y + 3.9], &tick.label, lettering(palette.dim, SMALL_SIZE, Anchor::End));
    }
    let mut last_left = f64::INFINITY;
    for tick in diagram.temperature_ticks((plot.width() / 70.0).max(3.0) as usize) {
        let x = plot.left + tick.height * plot.width();
        canvas.line([x, plot.top], [x, plot.bottom], stroke(palette.hairline, 0.8));
        canvas.line([x, plot.bottom], [x, plot.bottom + 4.0], stroke(palette.dim, 1.0));
        let half = 0.5 * width(&tick.label, SMALL_SIZE, false);
        // The marks come from the cool end, on the right: crowded labels give way.
        if x + half < last_left - 8.0 {
            last_left = x - half;
            canvas.text([x, plot.bottom + 16.0], &tick.label, lettering(palette.dim, SMALL_SIZE, Anchor::Middle));
        }
    }
    let name = |anchor| lettering(palette.text, TEXT_SIZE, anchor);
    let at = [plot.centre()[0], plot.bottom + 33.0];
    canvas.text(at, "Effective temperature, K (hot on the left)", name(Anchor::Middle));
    canvas.text_upwards([plot.left - LEFT + 11.0, plot.centre()[1]], "Luminosity, L☉", name(Anchor::Middle));
}

/// Names on the diagram, each where it covers no other.
struct Names<'a> {
    plot: Area,
    palette: &'a Palette,
}

impl Names<'_> {
    fn is_free(&self, plate: Area, taken: &[Area]) -> bool {
        self.plot.holds(plate) && !taken.iter().any(|other| other.meets(plate))
    }

    fn write(&self, canvas: &mut Canvas, plate: Area, words: &str, ink: &str, taken: &mut Vec<Area>) {
        canvas.veil(plate, self.palette.ground, 0.8);
        let at = [plate.left + 2.0, plate.bottom - 3.5];
        canvas.text(at, words, lettering(ink, SMALL_SIZE, Anchor::Start));
        taken.push(plate);
    }

    /// Right of a place, left of it, above or below.
    fn beside(&self, canvas: &mut Canvas, [x, y]: Point, words: &str, ink: &str, taken: &mut Vec<Area>) {
        let wide = width(words, SMALL_SIZE, false) + 4.0;
        let plate = |left: f64, middle: f64| Area { left, top: middle - 7.5, right: left + wide, bottom: middle + 7.5 };
        let sides = [
            plate(x + 8.0, y),
            plate(x - 8.0 - wide, y),
            plate(x + 6.0, y - 12.0),
            plate(x + 6.0, y + 12.0),
            plate(x - 6.0 - wide, y - 12.0),
            plate(x - 6.0 - wide, y + 12.0),
        ];
        if let Some(side) = sides.into_iter().find(|side| self.is_free(*side, taken)) {
            self.write(canvas, side, words, ink, taken);
        }
    }

    /// On a line, as near to its second end as there is room.
    fn along(&self, canvas: &mut Canvas, ends: [Point; 2], words: &str, taken: &mut Vec<Area>) {
        let half = 0.5 * width(words, SMALL_SIZE, false) + 2.0;
        let at = |share: f64| {
            let [x, y] = [0, 1].map(|axis| ends[1][axis] + share * (ends[0][axis] - ends[1][axis]));
            Area { left: x - half, top: y - 7.5, right: x + half, bottom: y + 7.5 }
        };
        let found = (1..20).map(|step| at(0.03 * f64::from(step))).find(|plate| self.is_free(*plate, taken));
        if let Some(plate) = found {
            self.write(canvas, plate, words, self.palette.dim, taken);
        }
    }
}
