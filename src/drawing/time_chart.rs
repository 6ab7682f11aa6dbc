//! Charts over one time axis, one below the other.

use super::canvas::{Anchor, Area, Canvas, Point, Stroke, lettering, stroke};
use super::fonts::width;
use super::ink::{Palette, dashes, hex};
use super::legend::{Entry, Sample};
use super::page::{SMALL_SIZE, TEXT_SIZE};
use super::state_mark;
use crate::figure::chart::{Band, BandMeaning, Lane};
use crate::figure::{Chart, Owner, Run, Series};
use crate::system::ticks::ticks;
use crate::system::{PlanetState, TimeAxis};

/// Room left of the plot for the name of the axis and its labels.
const LEFT: f64 = 66.0;
/// Room right of the plot, for half of a label.
const RIGHT: f64 = 10.0;
/// Room below the lowest plot for ages and the name of the time axis.
pub(super) const FOOT: f64 = 38.0;
/// Room between two charts.
const BETWEEN: f64 = 14.0;
/// Room above each of several charts for its name.
const NAME: f64 = 18.0;
/// Height of one lane of climates.
const LANE: f64 = 14.0;

/// The time axis with the part of it that is shown, and the moment.
#[derive(Clone, Copy, Debug)]
pub(super) struct TimeView<'a> {
    pub axis: &'a TimeAxis,
    pub from_fraction: f64,
    pub to_fraction: f64,
    pub moment_yr: f64,
}

impl TimeView<'_> {
    /// Place of a fraction of the whole axis in an area.
    pub(super) fn x(&self, fraction: f64, area: Area) -> f64 {
        area.left + (fraction - self.from_fraction) / (self.to_fraction - self.from_fraction) * area.width()
    }

    /// The moment as a fraction of the whole axis, where it is in view.
    pub(super) fn moment(&self) -> Option<f64> {
        let fraction = self.axis.fraction_at(self.moment_yr);
        let is_on_axis = (self.axis.from_yr()..=self.axis.to_yr()).contains(&self.moment_yr);
        (is_on_axis && (self.from_fraction..=self.to_fraction).contains(&fraction)).then_some(fraction)
    }
}

/// What the lines and bands of charts stand for.
pub(super) fn entries(charts: &[Chart], palette: &Palette) -> Vec<Entry> {
    let mut found: Vec<Entry> = Vec::new();
    let mut add = |sample: Sample, words: String| {
        if !found.iter().any(|entry| entry.words == words) {
            found.push(Entry { sample, words });
        }
    };
    let has_several = charts.len() > 1;
    for series in charts.iter().flat_map(|chart| &chart.series).filter(|series| has_points(series)) {
        let colour = series.runs.iter().rev().find_map(|run| run.colours_srgb.first());
        match (series.owner, colour) {
            (Owner::Planet(index), _) => add(Sample::Planet(index), series.name.clone()),
            (Owner::Star, Some(colour)) => add(Sample::TrueColour(*colour), "the star, in its true colour".to_owned()),
            (Owner::Star, None) if has_several => add(Sample::Star, "the star".to_owned()),
            (Owner::Star, None) => {}
        }
    }
    for band in charts.iter().flat_map(|chart| &chart.bands).filter(|band| band.runs.iter().any(|run| run.len() > 1)) {
        add(Sample::Band(palette.band(band.meaning)), band_words(band));
    }
    add(Sample::Moment, "the moment".to_owned());
    found
}

fn has_points(series: &Series) -> bool {
    series.runs.iter().any(|run| run.values.len() > 1)
}

fn band_words(band: &Band) -> String {
    match band.meaning {
        BandMeaning::Spread => "typical spread of the method".to_owned(),
        BandMeaning::Undecided => "undecided: giant's radius, tides".to_owned(),
        BandMeaning::LiquidWater | BandMeaning::HabitableZone | BandMeaning::StarBody => band.name.clone(),
    }
}

/// Draws charts into an area. One chart has its name beside the axis; several have theirs above.
pub(super) fn draw(canvas: &mut Canvas, area: Area, charts: &[Chart], time: &TimeView<'_>, palette: &Palette) {
    let count = charts.len().max(1) as f64;
    let is_alone = charts.len() == 1;
    let heading = if is_alone { 0.0 } else { NAME };
    let each = (area.height() - FOOT - BETWEEN * (count - 1.0)) / count;
    for (index, chart) in charts.iter().enumerate() {
        let top = area.top + (each + BETWEEN) * index as f64;
        let left = area.left + if is_alone { LEFT } else { LEFT - 14.0 };
        let plot = Area { left, top: top + heading, right: area.right - RIGHT, bottom: top + each };
        let name = chart.title.split(':').next().unwrap_or_default();
        if !is_alone {
            canvas.text([plot.left, plot.top - 6.0], name, lettering(palette.text, TEXT_SIZE, Anchor::Start));
        }
        Places { plot, chart, time }.draw(canvas, is_alone.then_some(name), palette);
        if index + 1 == charts.len() {
            time_axis(canvas, plot, time, palette);
        }
    }
}

/// Marks, labels and name of the time axis under a plot.
pub(super) fn time_axis(canvas: &mut Canvas, plot: Area, time: &TimeView<'_>, palette: &Palette) {
    let count = (plot.width() / 105.0).max(2.0) as usize;
    let mut last_right = f64::NEG_INFINITY;
    for tick in ticks(time.axis, time.from_fraction, time.to_fraction, count) {
        let x = time.x(tick.fraction, plot);
        let half = 0.5 * width(&tick.label, SMALL_SIZE, false);
        canvas.line([x, plot.bottom], [x, plot.bottom + 4.0], stroke(palette.dim, 1.0));
        if x - half > last_right + 8.0 {
            last_right = x + half;
            let place = [x, plot.bottom + 16.0];
            canvas.text(place, &tick.label, lettering(palette.dim, SMALL_SIZE, Anchor::Middle));
        }
    }
    let name = format!("Time since the star reached the main sequence, {} scale", time.axis.scale().key());
    let place = [plot.centre()[0], plot.bottom + 33.0];
    canvas.text(place, &name, lettering(palette.text, TEXT_SIZE, Anchor::Middle));
}

/// Places of one chart.
struct Places<'a> {
    plot: Area,
    chart: &'a Chart,
    time: &'a TimeView<'a>,
}

impl Places<'_> {
    fn x(&self, fraction: f64) -> f64 {
        self.time.x(fraction, self.plot)
    }

    fn y(&self, value: f64) -> Option<f64> {
        // Far beyond the frame the exact place does not matter.
        let height = self.chart.axis.height(value)?.clamp(-2.0, 3.0);
        Some(self.plot.bottom - height * self.plot.height())
    }

    fn draw(&self, canvas: &mut Canvas, name: Option<&str>, palette: &Palette) {
        let plot = self.plot;
        canvas.clipped(plot, |canvas| {
            for band in &self.chart.bands {
                for run in &band.runs {
                    canvas.polygon(&self.outline(run), palette.band(band.meaning));
                }
            }
        });
        self.value_axis(canvas, name, palette);
        canvas.clipped(plot, |canvas| {
            for level in &self.chart.levels {
                if let Some(y) = self.y(level.value) {
                    let line = Stroke { ink: palette.dim, width: 0.9, dashes: "1.5 4" };
                    canvas.line([plot.left, y], [plot.right, y], line);
                }
            }
            for series in &self.chart.series {
                self.series(canvas, series, palette);
            }
            self.lanes(canvas, palette);
        });
        self.level_names(canvas, palette);
        self.moment(canvas, palette);
        canvas.closed_line(
            &[[plot.left, plot.top], [plot.right, plot.top], [plot.right, plot.bottom], [plot.left, plot.bottom]],
            stroke(palette.dim, 1.0),
        );
    }

    /// The edge of a band, along its lower values and back along its upper ones.
    fn outline(&self, run: &[[f64; 3]]) -> Vec<Point> {
        let edge = |upper: usize| {
            run.iter().filter_map(move |place| Some([self.x(place[0]), self.y(place[upper])?])).collect::<Vec<Point>>()
        };
        let mut outline = edge(1);
        outline.extend(edge(2).into_iter().rev());
        outline
    }

    fn value_axis(&self, canvas: &mut Canvas, name: Option<&str>, palette: &Palette) {
        let plot = self.plot;
        for tick in self.chart.axis.ticks((plot.height() / 34.0).max(2.0) as usize) {
            let y = plot.bottom - tick.height * plot.height();
            canvas.line([plot.left, y], [plot.right, y], stroke(palette.hairline, 0.8));
            canvas.line([plot.left - 4.0, y], [plot.left, y], stroke(palette.dim, 1.0));
            canvas.text([plot.left - 7.0, y + 3.9], &tick.label, lettering(palette.dim, SMALL_SIZE, Anchor::End));
        }
        if let Some(name) = name {
            let place = [plot.left - LEFT + 11.0, plot.centre()[1]];
            canvas.text_upwards(place, name, lettering(palette.text, TEXT_SIZE, Anchor::Middle));
        }
    }

    fn points(&self, run: &Run) -> Vec<Point> {
        let both = run.fractions.iter().zip(&run.values);
        both.filter_map(|(fraction, value)| Some([self.x(*fraction), self.y(*value)?])).collect()
    }

    fn series(&self, canvas: &mut Canvas, series: &Series, palette: &Palette) {
        for run in &series.runs {
            let points = self.points(run);
            if !points.is_empty() && run.colours_srgb.len() == points.len() {
                canvas.polyline(&points, stroke(palette.casing, 5.2));
                let stops: Vec<(f64, String)> =
                    points.iter().zip(&run.colours_srgb).map(|(point, colour)| (point[0], hex(*colour))).collect();
                let ink = canvas.colours_across(&stops);
                canvas.polyline(&points, stroke(&ink, 3.2));
                continue;
            }
            let line = match series.owner {
                Owner::Star => stroke(palette.text, 1.8),
                Owner::Planet(index) => Stroke { ink: palette.planet(index), width: 1.9, dashes: dashes(index) },
            };
            canvas.polyline(&points, line);
        }
    }

    /// Climates of planets at the foot of the chart: shade, mark and, where there is room, the word.
    fn lanes(&self, canvas: &mut Canvas, palette: &Palette) {
        let room = (self.plot.height() * 0.5 / LANE).floor().max(0.0) as usize;
        for (row, lane) in self.chart.lanes.iter().take(room).enumerate() {
            self.lane(canvas, self.plot.bottom - LANE * row as f64, lane, palette);
        }
    }

    fn lane(&self, canvas: &mut Canvas, bottom: f64, lane: &Lane, palette: &Palette) {
        let ends =
            |span: &(f64, f64, PlanetState)| [self.x(span.0).max(self.plot.left), self.x(span.1).min(self.plot.right)];
        let named = |state: PlanetState| format!("{}: {}", lane.name, state.name());
        let needed = |words: &str| width(words, 10.0, false) + 26.0;
        // The lane says once whose it is, where there is most room.
        let widest = lane
            .spans
            .iter()
            .map(|span| ends(span)[1] - ends(span)[0] - needed(&named(span.2)))
            .enumerate()
            .max_by(|first, second| first.1.total_cmp(&second.1))
            .filter(|(_, spare)| *spare > 0.0);
        for (index, span) in lane.spans.iter().enumerate() {
            let (state, [left, right]) = (span.2, ends(span));
            if right <= left {
                continue;
            }
            let area = Area { left, top: bottom - LANE + 1.0, right, bottom };
            canvas.rect(area, palette.ground);
            canvas.veil(area, palette.planet(lane.planet), lane_shade(state));
            canvas.line([left, area.top], [left, area.bottom], stroke(palette.ground, 1.0));
            let middle = area.centre()[1];
            let is_widest = widest.is_some_and(|(widest, _)| widest == index);
            let words = if is_widest { named(state) } else { state.name().to_owned() };
            if area.width() > needed(&words) {
                state_mark::draw(canvas, [left + 10.0, middle], state, palette.text);
                canvas.text([left + 20.0, middle + 3.5], &words, lettering(palette.text, 10.0, Anchor::Start));
            } else if area.width() > 16.0 {
                state_mark::draw(canvas, area.centre(), state, palette.text);
            }
        }
    }

    /// Names of levels inside the plot, where the curves keep farthest away: the lowest under its line, others above.
    fn level_names(&self, canvas: &mut Canvas, palette: &Palette) {
        for (index, level) in self.chart.levels.iter().enumerate() {
            let Some(y) = self.y(level.value) else { continue };
            let baseline = if index == 0 { y + 11.0 } else { y - 3.5 };
            if baseline < self.plot.top + 10.0 || baseline > self.plot.bottom - 3.0 {
                continue;
            }
            let half = 0.5 * width(&level.name, SMALL_SIZE, false) + 4.0;
            let x = self.freest_x(baseline - 4.0, half);
            canvas.text([x, baseline], &level.name, lettering(palette.dim, SMALL_SIZE, Anchor::Middle));
        }
    }

    fn freest_x(&self, y: f64, half: f64) -> f64 {
        let clearance = |x: f64| {
            let at = |x: f64| {
                let share = (x - self.plot.left) / self.plot.width();
                let fraction = self.time.from_fraction + share * (self.time.to_fraction - self.time.from_fraction);
                let curves =
                    self.chart.series.iter().filter_map(|series| self.y(self.chart.value_at(series, fraction)?));
                curves.map(|curve| (curve - y).abs()).fold(f64::INFINITY, f64::min)
            };
            [x - half, x - 0.5 * half, x, x + 0.5 * half, x + half].map(at).into_iter().fold(60.0, f64::min)
        };
        let (first, last) = (self.plot.left + half, self.plot.right - half);
        let places = (0..=40).map(|step| first + (last - first) * f64::from(step) / 40.0);
        // Of places as free as another the leftmost, so that names stand in one column.
        places
            .fold((first, f64::NEG_INFINITY), |best, x| {
                let free = clearance(x);
                if free > best.1 + 1e-9 { (x, free) } else { best }
            })
            .0
    }

    fn moment(&self, canvas: &mut Canvas, palette: &Palette) {
        let Some(fraction) = self.time.moment() else { return };
        let x = self.x(fraction);
        canvas.line([x, self.plot.top], [x, self.plot.bottom], stroke(palette.accent, 1.2));
        for series in &self.chart.series {
            let y = self.chart.value_at(series, fraction).and_then(|value| self.y(value));
            if let Some(y) = y.filter(|y| (self.plot.top..=self.plot.bottom).contains(y)) {
                canvas.disc([x, y], 3.4, palette.ground, Some(stroke(palette.accent, 1.6)));
            }
        }
    }
}

/// How strongly a state is shaded: open water most.
pub(super) fn lane_shade(state: PlanetState) -> f64 {
    match state {
        PlanetState::Temperate => 0.55,
        PlanetState::Moist => 0.4,
        PlanetState::Runaway => 0.28,
        PlanetState::Frozen => 0.18,
        _ => 0.08,
    }
}
