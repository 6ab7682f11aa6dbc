//! Inks one chart: the data come ready made, nothing is computed here but places on the screen.

use crate::figure::chart::BandMeaning;
use crate::figure::{Chart, Owner, Run, Series};
use crate::system::PlanetState;
use crate::units::number_text::number;
use crate::window::theme::{Palette, small};
use crate::window::widgets::state_mark;
use crate::window::workspace::Workspace;
use egui::epaint::{Mesh, Vertex, WHITE_UV};
use egui::{Align2, Color32, Painter, Pos2, Rect, Shape, Stroke, Ui, pos2};

/// Where a chart is drawn.
pub(super) struct Frame {
    /// The plotting area.
    pub rect: Rect,
    /// Height of the title's middle.
    pub title_y: f32,
    /// Left edge, for tick labels and title.
    pub left: f32,
    /// Pointer over the charts, if it is.
    pub hover_x: Option<f32>,
}

/// Draws a chart.
pub(super) fn draw(ui: &Ui, frame: &Frame, chart: &Chart, references: &[Series], workspace: &Workspace) {
    let palette = workspace.palette();
    let rect = frame.rect;
    let painter = ui.painter();
    let inside = painter.with_clip_rect(rect.expand2(egui::vec2(0.0, 2.0)).intersect(painter.clip_rect()));
    painter.text(pos2(frame.left, frame.title_y), Align2::LEFT_CENTER, &chart.title, small(), palette.dim);
    let place = Places { rect, chart, workspace };
    for band in &chart.bands {
        let ink = band_ink(palette, band.meaning);
        for run in &band.runs {
            inside.add(Shape::mesh(band_mesh(&place, run, ink)));
        }
    }
    for tick in chart.axis.ticks((rect.height() / 19.0).max(2.0) as usize) {
        let y = rect.bottom() - tick.height as f32 * rect.height();
        painter.hline(rect.x_range(), y, Stroke::new(1.0, palette.hairline.gamma_multiply(0.75)));
        painter.text(pos2(rect.left() - 6.0, y), Align2::RIGHT_CENTER, tick.label, small(), palette.dim);
    }
    for level in &chart.levels {
        if let Some(y) = place.y(level.value) {
            let line = [pos2(rect.left(), y), pos2(rect.right(), y)];
            inside.extend(Shape::dashed_line(&line, Stroke::new(1.0, palette.dim.gamma_multiply(0.7)), 1.5, 4.0));
        }
    }
    for run in references.iter().flat_map(|series| &series.runs) {
        inside.extend(Shape::dashed_line(&place.points(run), Stroke::new(1.4, palette.dim), 6.0, 4.0));
    }
    for series in &chart.series {
        draw_series(&inside, &place, series, palette);
    }
    lanes(&inside, &place, palette);
    band_labels(&inside, &place, palette);
    direct_labels(&inside, &place, palette);
    moment_line(painter, &place, palette);
    moment_dots(&inside, &place, palette);
    reading(painter, frame, &place, palette);
}

/// Screen places of a chart's data.
struct Places<'a> {
    rect: Rect,
    chart: &'a Chart,
    workspace: &'a Workspace,
}

impl Places<'_> {
    fn x(&self, fraction: f64) -> f32 {
        self.rect.left() + self.workspace.view.place_of(fraction) as f32 * self.rect.width()
    }

    fn y(&self, value: f64) -> Option<f32> {
        // Far beyond the frame the exact place does not matter, but the tessellator dislikes huge numbers.
        let height = self.chart.axis.height(value)?.clamp(-3.0, 4.0) as f32;
        Some(self.rect.bottom() - height * self.rect.height())
    }

    fn points(&self, run: &Run) -> Vec<Pos2> {
        run.fractions
            .iter()
            .zip(&run.values)
            .filter_map(|(fraction, value)| Some(pos2(self.x(*fraction), self.y(*value)?)))
            .collect()
    }
}

fn band_ink(palette: &Palette, meaning: BandMeaning) -> Color32 {
    match meaning {
        BandMeaning::LiquidWater => palette.water,
        BandMeaning::HabitableZone => palette.zone,
        BandMeaning::StarBody => palette.star_body,
        BandMeaning::Spread => palette.spread,
        BandMeaning::Undecided => palette.casing.gamma_multiply(0.55),
    }
}

fn band_mesh(place: &Places<'_>, run: &[[f64; 3]], ink: Color32) -> Mesh {
    let mut mesh = Mesh::default();
    for [fraction, low, high] in run {
        let (Some(low_y), Some(high_y)) = (place.y(*low), place.y(*high)) else { continue };
        let first = mesh.vertices.len() as u32;
        for y in [low_y, high_y] {
            mesh.vertices.push(Vertex { pos: pos2(place.x(*fraction), y), uv: WHITE_UV, color: ink });
        }
        if first >= 2 {
            mesh.indices.extend([first - 2, first - 1, first, first - 1, first + 1, first]);
        }
    }
    mesh
}

fn draw_series(painter: &Painter, place: &Places<'_>, series: &Series, palette: &Palette) {
    for run in &series.runs {
        let points = place.points(run);
        if run.colours_srgb.len() == points.len() && !points.is_empty() {
            painter.add(Shape::line(points.clone(), Stroke::new(5.0, palette.casing)));
            for (index, pair) in points.windows(2).enumerate() {
                let [r, g, b] = run.colours_srgb[index];
                painter.line_segment([pair[0], pair[1]], Stroke::new(3.0, Color32::from_rgb(r, g, b)));
            }
            continue;
        }
        match series.owner {
            Owner::Star => {
                painter.add(Shape::line(points, Stroke::new(1.8, palette.text)));
            }
            Owner::Planet(index) => {
                let stroke = Stroke::new(1.8, planet_ink(palette, index));
                painter.extend(dashed(&points, stroke, index));
            }
        }
    }
}

/// The colour of a planet's curve.
fn planet_ink(palette: &Palette, index: usize) -> Color32 {
    palette.planets[index % palette.planets.len()]
}

/// Dash patterns that tell planets apart without colour.
fn dashed(points: &[Pos2], stroke: Stroke, index: usize) -> Vec<Shape> {
    let patterns: [(&[f32], &[f32]); 6] = [
        (&[], &[]),
        (&[7.0], &[3.0]),
        (&[2.0], &[3.0]),
        (&[12.0], &[4.0]),
        (&[8.0, 2.0], &[3.0, 3.0]),
        (&[4.0], &[2.0]),
    ];
    let (dashes, gaps) = patterns[index % patterns.len()];
    if dashes.is_empty() {
        return vec![Shape::line(points.to_vec(), stroke)];
    }
    pieces(points, dashes, gaps).into_iter().map(|piece| Shape::line(piece, stroke)).collect()
}

/// Cuts a line into dashes that run smoothly through its many short segments.
fn pieces(points: &[Pos2], dashes: &[f32], gaps: &[f32]) -> Vec<Vec<Pos2>> {
    let mut found = Vec::new();
    let Some(mut here) = points.first().copied() else { return found };
    let (mut step, mut is_dash, mut left) = (0, true, dashes[0]);
    let mut piece = vec![here];
    for next in &points[1..] {
        loop {
            let distance = here.distance(*next);
            if distance < left {
                left -= distance;
                here = *next;
                piece.push(here);
                break;
            }
            here += (*next - here) * (left / distance.max(f32::EPSILON));
            if is_dash {
                piece.push(here);
                found.push(std::mem::take(&mut piece));
                left = gaps[step % gaps.len()];
            } else {
                step += 1;
                left = dashes[step % dashes.len()];
            }
            is_dash = !is_dash;
            piece = vec![here];
        }
    }
    if is_dash {
        found.push(piece);
    }
    found
}

/// Height of a lane of climate states, points.
const LANE: f32 = 13.0;

/// Climates of planets at the foot of the chart: shade, mark and, where there is room, the word.
fn lanes(painter: &Painter, place: &Places<'_>, palette: &Palette) {
    let room = ((place.rect.height() * 0.5) / LANE).floor().max(0.0) as usize;
    for (row, lane) in place.chart.lanes.iter().take(room).enumerate() {
        let bottom = place.rect.bottom() - LANE * row as f32;
        let ink = planet_ink(palette, lane.planet);
        for (from, to, state) in &lane.spans {
            let (left, right) = (place.x(*from).max(place.rect.left()), place.x(*to).min(place.rect.right()));
            if right <= left {
                continue;
            }
            let rect = Rect::from_min_max(pos2(left, bottom - LANE + 2.0), pos2(right, bottom - 1.0));
            painter.rect_filled(rect, 0.0, palette.ground);
            painter.rect_filled(rect, 0.0, ink.gamma_multiply(lane_shade(*state)));
            painter.vline(left, rect.y_range(), Stroke::new(1.0, palette.ground));
            let galley = painter.layout_no_wrap(state.name().to_owned(), small(), palette.text);
            if rect.width() > galley.size().x + 26.0 {
                state_mark::draw(painter, pos2(left + 9.0, rect.center().y), *state, palette.text);
                painter.galley(pos2(left + 19.0, rect.center().y - 0.5 * galley.size().y), galley, palette.text);
            } else if rect.width() > 16.0 {
                state_mark::draw(painter, rect.center(), *state, palette.text);
            }
        }
    }
}

/// How strongly a state is shaded: open water most.
pub(super) fn lane_shade(state: PlanetState) -> f32 {
    match state {
        PlanetState::Temperate => 0.55,
        PlanetState::Moist => 0.4,
        PlanetState::Runaway => 0.28,
        PlanetState::Frozen => 0.18,
        _ => 0.08,
    }
}

/// Names of bands of constant height, above their left end, where curves of the present rarely run.
fn band_labels(painter: &Painter, place: &Places<'_>, palette: &Palette) {
    for band in place.chart.bands.iter().filter(|band| band.meaning == BandMeaning::LiquidWater) {
        let Some(y) = band.runs.first().and_then(|run| run.first()).and_then(|[_, _, high]| place.y(*high)) else {
            continue;
        };
        let galley = painter.layout_no_wrap(band.name.clone(), small(), palette.dim);
        let x = freest_x(place, y - 6.0);
        let plate = Align2::CENTER_BOTTOM.anchor_size(pos2(x, y - 1.0), galley.size());
        painter.galley(plate.min, galley, palette.dim);
    }
}

/// Where along a height the curves keep farthest away.
fn freest_x(place: &Places<'_>, y: f32) -> f32 {
    let view = place.workspace.view;
    let clearance = |share: f64| {
        let fraction = view.fraction_of(share);
        let curves = place.chart.series.iter().filter_map(|series| place.y(place.chart.value_at(series, fraction)?));
        curves.map(|curve_y| (curve_y - y).abs()).fold(f32::INFINITY, f32::min)
    };
    let shares = (2..=16).map(|step| f64::from(step) * 0.05);
    let best = shares.max_by(|first, second| clearance(*first).total_cmp(&clearance(*second))).unwrap_or(0.5);
    place.rect.left() + best as f32 * place.rect.width()
}

/// Names of planets at the right end of their curves; crowded ones give way to each other.
fn direct_labels(painter: &Painter, place: &Places<'_>, palette: &Palette) {
    let mut labels: Vec<(f32, usize, &str)> = place
        .chart
        .series
        .iter()
        .filter_map(|series| {
            let Owner::Planet(index) = series.owner else { return None };
            let last = series.runs.last().and_then(|run| place.points(run).last().copied())?;
            (place.rect.right() - last.x < 2.0).then_some((last.y, index, series.name.as_str()))
        })
        .collect();
    labels.sort_by(|first, second| second.0.total_cmp(&first.0));
    let mut floor = f32::INFINITY;
    for (y, index, name) in labels {
        let wanted = y.clamp(place.rect.top() + 14.0, place.rect.bottom() - 1.0);
        let y = wanted.min(floor - 12.0);
        if y < place.rect.top() + 10.0 {
            continue;
        }
        let at = pos2(place.rect.right() - 4.0, y - 1.0);
        let galley = painter.layout_no_wrap(name.to_owned(), small(), planet_ink(palette, index));
        let plate = Align2::RIGHT_BOTTOM.anchor_size(at, galley.size());
        painter.rect_filled(plate.expand2(egui::vec2(2.0, 0.0)), 2.0, palette.ground.gamma_multiply(0.8));
        painter.galley(plate.min, galley, palette.text);
        floor = y;
    }
}

/// The line of the moment through this chart.
fn moment_line(painter: &Painter, place: &Places<'_>, palette: &Palette) {
    let moment = place.workspace.moment_place();
    if (0.0..=1.0).contains(&moment) {
        let x = place.rect.left() + moment as f32 * place.rect.width();
        painter.vline(x, place.rect.y_range(), Stroke::new(1.2, palette.accent));
    }
}

/// A ring on every curve at the moment.
fn moment_dots(painter: &Painter, place: &Places<'_>, palette: &Palette) {
    let fraction = place.workspace.derived.axis.fraction_at(place.workspace.moment_yr);
    for series in &place.chart.series {
        let Some(y) = place.chart.value_at(series, fraction).and_then(|value| place.y(value)) else { continue };
        painter.circle(pos2(place.x(fraction), y), 3.5, palette.ground, Stroke::new(1.6, palette.accent));
    }
}

/// Values at the pointer, or at the moment when the pointer is elsewhere, beside the title.
fn reading(painter: &Painter, frame: &Frame, place: &Places<'_>, palette: &Palette) {
    let Some(hover_x) = frame.hover_x else { return };
    let view = place.workspace.view;
    let fraction = view.fraction_of(f64::from((hover_x - place.rect.left()) / place.rect.width()));
    let mut words: Vec<String> = place
        .chart
        .series
        .iter()
        .filter_map(|series| {
            let value = place.chart.value_at(series, fraction)?;
            let figure = number(value, 3);
            Some(match series.owner {
                Owner::Star => format!("{figure} {}", place.chart.symbol),
                Owner::Planet(_) => format!("{} {figure}", series.name),
            })
        })
        .collect();
    let age_yr = place.workspace.derived.axis.age_at(fraction);
    words.insert(0, place.workspace.time_text(age_yr));
    let text = words.join(" · ");
    let galley = painter.layout_no_wrap(text, small(), palette.text);
    let plate = Align2::RIGHT_CENTER.anchor_size(pos2(place.rect.right(), frame.title_y), galley.size());
    painter.rect_filled(plate.expand2(egui::vec2(4.0, 0.0)), 2.0, palette.ground);
    painter.galley(plate.min, galley, palette.text);
}
