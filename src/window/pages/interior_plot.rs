//! Inks one panel of the star's inside: the data come ready made, nothing is computed here but places on the screen.

use crate::figure::InteriorPicture;
use crate::figure::interior::{LayerLine, LayerPanel};
use crate::units::number_text::number;
use crate::window::theme::{Palette, small};
use egui::{Align2, Painter, Pos2, Rect, Shape, Stroke, Ui, pos2, vec2};

/// Room left of the plot for the labels of heights, points.
const LEFT: f32 = 44.0;
/// Room above it for the title, points.
const TOP: f32 = 18.0;
/// Room below it for the labels of places, points.
const FOOT: f32 = 18.0;
/// Distance between the hatching lines of mixed zones, points.
const HATCH: f32 = 9.0;

/// Draws a panel into a rectangle.
pub(super) fn draw(
    ui: &Ui,
    area: Rect,
    picture: &InteriorPicture,
    panel: &LayerPanel,
    pointer: Option<Pos2>,
    palette: &Palette,
) {
    let rect = Rect::from_min_max(area.min + vec2(LEFT, TOP), area.max - vec2(8.0, FOOT));
    let painter = ui.painter();
    let inside = painter.with_clip_rect(rect.expand2(vec2(0.0, 2.0)).intersect(painter.clip_rect()));
    painter.text(pos2(area.left(), area.top() + 7.0), Align2::LEFT_CENTER, panel.figure.title(), small(), palette.dim);
    let place = Places { rect, panel };
    mixed_zones(&inside, rect, picture, palette);
    heights(painter, &place, palette);
    places(painter, rect, picture, palette);
    if let Some((value, words)) = panel.level {
        level(&inside, &place, value, words, palette);
    }
    for (index, line) in panel.lines.iter().enumerate() {
        draw_line(&inside, &place, line, index, palette);
    }
    if panel.lines.len() > 1 {
        legend(painter, rect, panel, palette);
    }
    if let Some(pointer) = pointer.filter(|pointer| rect.contains(*pointer)) {
        reading(painter, area, &place, pointer, palette);
    }
}

/// Screen places of the data.
struct Places<'a> {
    rect: Rect,
    panel: &'a LayerPanel,
}

impl Places<'_> {
    fn point(&self, [at, value]: [f64; 2]) -> Pos2 {
        let height = self.panel.axis.height(value).unwrap_or(-1.0).clamp(-0.5, 1.5) as f32;
        let x = self.rect.left() + at as f32 * self.rect.width();
        pos2(x, self.rect.bottom() - height * self.rect.height())
    }
}

/// Mixed zones: shade, hatching, edges and, where there is room, the word.
fn mixed_zones(painter: &Painter, rect: Rect, picture: &InteriorPicture, palette: &Palette) {
    painter.rect_filled(rect, 0.0, palette.ground);
    for zone in &picture.mixed {
        let [left, right] = zone.places.map(|place| rect.left() + place as f32 * rect.width());
        let zone = Rect::from_min_max(pos2(left, rect.top()), pos2(right.max(left + 1.0), rect.bottom()));
        painter.rect_filled(zone, 0.0, palette.spread.gamma_multiply(0.6));
        let hatching = painter.with_clip_rect(zone.intersect(painter.clip_rect()));
        let mut x = zone.left() - zone.height();
        // Counted from the plot's corner, so that neighbouring zones share one pattern.
        x = rect.left() + ((x - rect.left()) / HATCH).floor() * HATCH;
        while x < zone.right() {
            let line = [pos2(x, zone.bottom()), pos2(x + zone.height(), zone.top())];
            hatching.line_segment(line, Stroke::new(1.0, palette.hairline));
            x += HATCH;
        }
        for edge in [zone.left(), zone.right()] {
            painter.vline(edge, zone.y_range(), Stroke::new(1.0, palette.hairline));
        }
        let galley = painter.layout_no_wrap("mixed".to_owned(), small(), palette.dim);
        if zone.width() > galley.size().x + 10.0 {
            let at = pos2(zone.center().x - 0.5 * galley.size().x, zone.bottom() - galley.size().y - 2.0);
            let plate = Rect::from_min_size(at, galley.size()).expand2(vec2(3.0, 0.0));
            painter.rect_filled(plate, 2.0, palette.ground.gamma_multiply(0.85));
            painter.galley(at, galley, palette.dim);
        }
    }
}

fn heights(painter: &Painter, place: &Places<'_>, palette: &Palette) {
    let rect = place.rect;
    for tick in place.panel.axis.ticks((rect.height() / 24.0).max(2.0) as usize) {
        let y = rect.bottom() - tick.height as f32 * rect.height();
        painter.hline(rect.x_range(), y, Stroke::new(1.0, palette.hairline.gamma_multiply(0.75)));
        painter.text(pos2(rect.left() - 6.0, y), Align2::RIGHT_CENTER, tick.label, small(), palette.dim);
    }
}

/// Places along the foot, with words at both ends.
fn places(painter: &Painter, rect: Rect, picture: &InteriorPicture, palette: &Palette) {
    painter.hline(rect.x_range(), rect.bottom(), Stroke::new(1.0, palette.hairline));
    let middle = rect.bottom() + 10.0;
    let centre = painter.text(pos2(rect.left(), middle), Align2::LEFT_CENTER, "centre", small(), palette.dim);
    let surface = painter.text(pos2(rect.right(), middle), Align2::RIGHT_CENTER, "surface", small(), palette.dim);
    for tick in picture.scale.axis().ticks((rect.width() / 60.0).max(2.0) as usize) {
        let x = rect.left() + tick.height as f32 * rect.width();
        painter.vline(x, rect.bottom()..=rect.bottom() + 3.0, Stroke::new(1.0, palette.dim));
        let galley = painter.layout_no_wrap(tick.label, small(), palette.dim);
        let label = Align2::CENTER_CENTER.anchor_size(pos2(x, middle), galley.size());
        if label.left() > centre.right() + 6.0 && label.right() < surface.left() - 6.0 {
            painter.galley(label.min, galley, palette.dim);
        }
    }
}

fn level(painter: &Painter, place: &Places<'_>, value: f64, words: &str, palette: &Palette) {
    let (from, to) = (place.point([0.0, value]), place.point([1.0, value]));
    painter.extend(Shape::dashed_line(&[from, to], Stroke::new(1.0, palette.dim), 1.5, 4.0));
    painter.text(to + vec2(-4.0, 2.0), Align2::RIGHT_TOP, words, small(), palette.dim);
}

/// Lines of one panel differ in ink and in pattern.
fn draw_line(painter: &Painter, place: &Places<'_>, line: &LayerLine, index: usize, palette: &Palette) {
    let points: Vec<Pos2> = line.points.iter().map(|point| place.point(*point)).collect();
    painter.extend(patterned(&points, index, palette));
}

fn patterned(points: &[Pos2], index: usize, palette: &Palette) -> Vec<Shape> {
    match index {
        0 => vec![Shape::line(points.to_vec(), Stroke::new(1.8, palette.text))],
        1 => Shape::dashed_line(points, Stroke::new(1.8, palette.planets[1]), 7.0, 4.0),
        _ => Shape::dashed_line(points, Stroke::new(1.8, palette.planets[0]), 2.0, 3.0),
    }
}

/// Which line is which.
fn legend(painter: &Painter, rect: Rect, panel: &LayerPanel, palette: &Palette) {
    for (index, line) in panel.lines.iter().enumerate() {
        let y = rect.top() + 9.0 + 15.0 * index as f32;
        let galley = painter.layout_no_wrap(line.name.to_owned(), small(), palette.text);
        let left = rect.right() - 6.0 - galley.size().x;
        let plate = Rect::from_min_max(pos2(left - 32.0, y - 7.5), pos2(rect.right() - 2.0, y + 7.5));
        painter.rect_filled(plate, 2.0, palette.ground.gamma_multiply(0.85));
        painter.extend(patterned(&[pos2(left - 28.0, y), pos2(left - 6.0, y)], index, palette));
        painter.galley(pos2(left, y - 0.5 * galley.size().y), galley, palette.text);
    }
}

/// The values under the pointer.
fn reading(painter: &Painter, area: Rect, place: &Places<'_>, pointer: Pos2, palette: &Palette) {
    let rect = place.rect;
    painter.vline(pointer.x, rect.y_range(), Stroke::new(1.0, palette.dim.gamma_multiply(0.5)));
    let share = f64::from((pointer.x - rect.left()) / rect.width());
    let values: Vec<String> =
        place.panel.lines.iter().filter_map(|line| Some(number(line.value_at(share)?, 3))).collect();
    let words = values.join(" · ");
    painter.text(pos2(area.right() - 8.0, area.top() + 7.0), Align2::RIGHT_CENTER, words, small(), palette.text);
}
