//! The Hertzsprung-Russell diagram: the star's whole way in its true colours, the moment as a dot.

use crate::figure::HrDiagram;
use crate::figure::hr_diagram::TrackPoint;
use crate::units::number_text::number;
use crate::window::command::{Command, TimeCommand};
use crate::window::theme::{GRID, Palette, small};
use crate::window::workspace::Workspace;
use egui::{Align2, Color32, Painter, Pos2, Rect, Role, Sense, Shape, Stroke, Ui, WidgetInfo, pos2, vec2};

/// Room left of the diagram for the labels of luminosities, points.
const LEFT: f32 = 48.0;
/// Room below the diagram for temperatures and the name of the axis, points.
const FOOT: f32 = 36.0;
/// Room above the diagram for the name of the axis, points.
const TOP: f32 = 20.0;
/// How near the pointer must come to the track to mean it, points.
const NEAR: f64 = 24.0;

/// Draws the page.
pub(super) fn show(ui: &mut Ui, workspace: &mut Workspace) -> Vec<Command> {
    let palette = workspace.palette();
    let diagram = workspace.derived.hr_diagram();
    let (area, response) = ui.allocate_exact_size(ui.available_size().max(vec2(160.0, 120.0)), Sense::click_and_drag());
    response.widget_info(|| WidgetInfo::labeled(Role::Image, true, description(workspace)));
    let rect = Rect::from_min_max(area.min + vec2(LEFT, TOP), area.max - vec2(2.0 * GRID, FOOT));
    let place = Places { rect };
    draw(ui, area, &place, diagram, workspace, palette);
    let mut commands = Vec::new();
    if let Some(pointer) = response.hover_pos().filter(|pointer| rect.contains(*pointer)) {
        let found = place.nearest(diagram, pointer);
        let is_held = response.dragged() || response.clicked();
        if let Some((point, distance)) = found
            && is_held
            && (distance < NEAR || response.dragged())
        {
            commands.push(Command::Time(TimeCommand::To(point.age_yr)));
        }
        let near = found.filter(|(_, distance)| *distance < NEAR).map(|(point, _)| point);
        reading(ui, &place, diagram, workspace, pointer, near);
    }
    commands
}

/// Screen places of the diagram.
struct Places {
    rect: Rect,
}

impl Places {
    fn at(&self, [left, bottom]: [f64; 2]) -> Pos2 {
        // Far beyond the frame the exact place does not matter, but the tessellator dislikes huge numbers.
        let (left, bottom) = (left.clamp(-2.0, 3.0) as f32, bottom.clamp(-2.0, 3.0) as f32);
        pos2(self.rect.left() + left * self.rect.width(), self.rect.bottom() - bottom * self.rect.height())
    }

    fn share_of(&self, position: Pos2) -> [f64; 2] {
        let left = (position.x - self.rect.left()) / self.rect.width();
        let bottom = (self.rect.bottom() - position.y) / self.rect.height();
        [f64::from(left), f64::from(bottom)]
    }

    /// The nearest point of the track and its distance in points.
    fn nearest(&self, diagram: &HrDiagram, pointer: Pos2) -> Option<(TrackPoint, f64)> {
        diagram.nearest(self.share_of(pointer), f64::from(self.rect.width()), f64::from(self.rect.height()))
    }
}

fn draw(ui: &Ui, area: Rect, place: &Places, diagram: &HrDiagram, workspace: &Workspace, palette: &Palette) {
    let painter = ui.painter();
    let rect = place.rect;
    let inside = painter.with_clip_rect(rect.expand(1.0).intersect(painter.clip_rect()));
    axes(painter, area, place, diagram, palette);
    let mut taken: Vec<Rect> = Vec::new();
    radii(&inside, place, diagram, palette, &mut taken);
    main_sequence(&inside, place, diagram, palette, &mut taken);
    let sun = place.at(diagram.sun);
    inside.circle(sun, 5.0, Color32::TRANSPARENT, Stroke::new(1.2, palette.dim));
    inside.circle_filled(sun, 1.4, palette.dim);
    label(&inside, sun + vec2(9.0, -9.0), "Sun, today", palette.dim, palette, &mut taken);
    for run in workspace.derived.pinned_path() {
        let points: Vec<Pos2> = run.iter().map(|at| place.at(*at)).collect();
        inside.extend(Shape::dashed_line(&points, Stroke::new(1.4, palette.dim), 6.0, 4.0));
    }
    for run in &diagram.track {
        let points: Vec<Pos2> = run.iter().map(|point| place.at(point.place)).collect();
        inside.add(Shape::line(points.clone(), Stroke::new(5.0, palette.casing)));
        for (pair, point) in points.windows(2).zip(run) {
            let [r, g, b] = point.colour_srgb;
            inside.line_segment([pair[0], pair[1]], Stroke::new(3.0, Color32::from_rgb(r, g, b)));
        }
    }
    if let Some(pinned) = &workspace.pinned {
        let words = format!("dashed: {}", pinned.label);
        painter.text(pos2(area.left() + 120.0, area.top() + 7.0), Align2::LEFT_CENTER, words, small(), palette.dim);
    }
    let dot = moment_dot(&inside, place, diagram, workspace, palette);
    if let Some(dot) = dot {
        taken.push(Rect::from_center_size(dot, vec2(18.0, 18.0)));
    }
    for mark in &diagram.phases {
        let at = place.at(mark.place);
        if rect.contains(at) {
            inside.circle(at, 2.6, palette.ground, Stroke::new(1.2, palette.text));
            label(&inside, at + vec2(8.0, -8.0), &mark.label, palette.text, palette, &mut taken);
        }
    }
}

fn axes(painter: &Painter, area: Rect, place: &Places, diagram: &HrDiagram, palette: &Palette) {
    let rect = place.rect;
    let hairline = Stroke::new(1.0, palette.hairline.gamma_multiply(0.75));
    for tick in diagram.luminosity.ticks((rect.height() / 34.0).max(3.0) as usize) {
        let y = rect.bottom() - tick.height as f32 * rect.height();
        painter.hline(rect.x_range(), y, hairline);
        painter.text(pos2(rect.left() - 6.0, y), Align2::RIGHT_CENTER, tick.label, small(), palette.dim);
    }
    let mut last_left = f32::INFINITY;
    for tick in diagram.temperature_ticks((rect.width() / 70.0).max(3.0) as usize) {
        let x = rect.left() + tick.height as f32 * rect.width();
        painter.vline(x, rect.y_range(), hairline);
        let galley = painter.layout_no_wrap(tick.label, small(), palette.dim);
        let left = x - 0.5 * galley.size().x;
        // The marks come from the cool end, on the right: crowded labels give way.
        if left + galley.size().x < last_left - 8.0 {
            last_left = left;
            painter.galley(pos2(left, rect.bottom() + 4.0), galley, palette.dim);
        }
    }
    painter.text(pos2(area.left(), area.top() + 7.0), Align2::LEFT_CENTER, "Luminosity, L☉", small(), palette.dim);
    let name = "Effective temperature, K (hot on the left)";
    painter.text(pos2(rect.right(), area.bottom() - 8.0), Align2::RIGHT_CENTER, name, small(), palette.dim);
}

fn radii(painter: &Painter, place: &Places, diagram: &HrDiagram, palette: &Palette, taken: &mut Vec<Rect>) {
    for line in &diagram.radii {
        let ends = line.ends.map(|end| place.at(end));
        painter.extend(Shape::dashed_line(&ends, Stroke::new(1.0, palette.dim.gamma_multiply(0.6)), 2.0, 4.0));
        let galley = painter.layout_no_wrap(line.label.clone(), small(), palette.dim);
        // Inside the frame, a little up the line from its cool end.
        let at = ends[1] + (ends[0] - ends[1]).normalized() * 24.0;
        let plate = Rect::from_center_size(at, galley.size()).translate(vec2(-4.0, -2.0));
        let shift =
            vec2((place.rect.right() - plate.right()).min(0.0), (place.rect.bottom() - plate.bottom()).min(0.0));
        let plate = plate.translate(shift);
        painter.rect_filled(plate.expand(1.0), 2.0, palette.ground.gamma_multiply(0.85));
        painter.galley(plate.min, galley, palette.dim);
        taken.push(plate);
    }
}

fn main_sequence(painter: &Painter, place: &Places, diagram: &HrDiagram, palette: &Palette, taken: &mut Vec<Rect>) {
    let points: Vec<Pos2> = diagram.main_sequence.iter().map(|(_, at)| place.at(*at)).collect();
    painter.add(Shape::line(points, Stroke::new(1.2, palette.dim)));
    for (mass_msun, at) in &diagram.main_sequence {
        let at = place.at(*at);
        if MARKED_MSUN.contains(mass_msun) && place.rect.contains(at) {
            painter.line_segment([at - vec2(4.0, 0.0), at + vec2(4.0, 0.0)], Stroke::new(1.2, palette.dim));
            let words = format!("{} M☉", number(*mass_msun, 2));
            label(painter, at + vec2(-8.0, 9.0), &words, palette.dim, palette, taken);
        }
    }
}

/// Masses named along the main sequence, solar masses.
const MARKED_MSUN: [f64; 7] = [0.1, 0.2, 0.5, 1.0, 2.0, 5.0, 20.0];

/// A name with a quiet ground, where it covers no other; left of the place if the right is taken.
fn label(painter: &Painter, at: Pos2, words: &str, ink: Color32, palette: &Palette, taken: &mut Vec<Rect>) {
    let galley = painter.layout_no_wrap(words.to_owned(), small(), ink);
    let mirror = vec2(-16.0, 0.0);
    let tries = [
        Align2::LEFT_CENTER.anchor_size(at, galley.size()),
        Align2::RIGHT_CENTER.anchor_size(at + mirror, galley.size()),
        Align2::LEFT_CENTER.anchor_size(at + vec2(0.0, 17.0), galley.size()),
        Align2::RIGHT_CENTER.anchor_size(at + mirror + vec2(0.0, 17.0), galley.size()),
    ];
    let frame = painter.clip_rect();
    let free = |plate: &&Rect| frame.contains_rect(**plate) && !taken.iter().any(|other| other.intersects(**plate));
    if let Some(plate) = tries.iter().find(free).copied() {
        painter.rect_filled(plate.expand(1.0), 2.0, palette.ground.gamma_multiply(0.75));
        painter.galley(plate.min, galley, ink);
        taken.push(plate);
    }
}

/// The star at the moment; returns where it stands.
fn moment_dot(
    painter: &Painter,
    place: &Places,
    diagram: &HrDiagram,
    workspace: &Workspace,
    palette: &Palette,
) -> Option<Pos2> {
    let star = workspace.history.star_at(workspace.moment_yr);
    let shines = !star.phase.is_dark() && star.luminosity_lsun > 0.0;
    let found = shines.then(|| diagram.place(star.effective_temperature_k, star.luminosity_lsun)).flatten();
    let Some(found) = found else {
        let words = "At this moment the star gives no light that is modelled.";
        painter.text(place.rect.center_top() + vec2(0.0, 14.0), Align2::CENTER_CENTER, words, small(), palette.dim);
        return None;
    };
    let at = place.at(found);
    painter.circle(at, 7.5, Color32::TRANSPARENT, Stroke::new(2.0, palette.accent));
    painter.circle_filled(at, 2.5, palette.accent);
    Some(at)
}

/// What stands under the pointer: on the track an age, elsewhere the axes with the radius they mean.
fn reading(
    ui: &Ui,
    place: &Places,
    diagram: &HrDiagram,
    workspace: &Workspace,
    pointer: Pos2,
    near: Option<TrackPoint>,
) {
    let palette = workspace.palette();
    let at = near.map_or_else(|| place.share_of(pointer), |point| point.place);
    let [temperature_k, luminosity_lsun, radius_rsun] = diagram.reading(at);
    let figures =
        format!("{} K, {} L☉, {} R☉", number(temperature_k, 3), number(luminosity_lsun, 3), number(radius_rsun, 3));
    let words =
        near.map_or_else(|| figures.clone(), |point| format!("{}: {figures}", workspace.time_text(point.age_yr)));
    if near.is_some() {
        ui.painter().circle_stroke(place.at(at), 5.0, Stroke::new(1.5, palette.text));
    }
    let galley = ui.painter().layout_no_wrap(words, small(), palette.text);
    let corner = pos2(place.rect.right() - galley.size().x - 4.0, place.rect.top() - 16.0);
    ui.painter().galley(corner, galley, palette.text);
}

fn description(workspace: &Workspace) -> String {
    let star = workspace.history.star_at(workspace.moment_yr);
    format!(
        "Hertzsprung-Russell diagram. The star now: {} K, {} solar luminosities, {}",
        number(star.effective_temperature_k, 3),
        number(star.luminosity_lsun, 3),
        star.phase.name()
    )
}
