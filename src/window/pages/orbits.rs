//! The system from above: orbits, habitable zone, the star's disc to scale, and planets that are lost.

use crate::figure::orbit_plan::{Orbit, OrbitPlan, PlanScale};
use crate::system::{Body, Moment};
use crate::units::number_text::number;
use crate::window::command::Command;
use crate::window::theme::{GRID, Palette, small};
use crate::window::widgets::choice::word;
use crate::window::widgets::state_mark;
use crate::window::workspace::Workspace;
use egui::epaint::{Mesh, Vertex, WHITE_UV};
use egui::{Align2, Color32, Pos2, Rect, RichText, Role, Sense, Shape, Stroke, Ui, WidgetInfo, pos2, vec2};

/// Smallest disc of the star that can be seen, points.
const SMALLEST_STAR: f32 = 1.5;
/// How near the pointer must come to an orbit to mean it, points.
const NEAR: f32 = 8.0;

/// Draws the page.
pub(super) fn show(ui: &mut Ui, workspace: &mut Workspace) -> Vec<Command> {
    let palette = workspace.palette();
    ui.horizontal_wrapped(|ui| {
        ui.spacing_mut().item_spacing.x = 3.0 * GRID;
        for scale in PlanScale::ALL {
            if word(ui, palette, scale.name(), workspace.plan_scale == scale).clicked() {
                workspace.plan_scale = scale;
                workspace.plan_rim_au = None;
            }
        }
        if workspace.plan_rim_au.is_some() && ui.button("Whole system").clicked() {
            workspace.plan_rim_au = None;
        }
        ui.label(
            RichText::new("Wheel zooms. Where on its orbit a planet stands is not known; it turns at its true pace.")
                .font(small())
                .color(palette.dim),
        );
    });
    let moment = workspace.moment();
    let plan = OrbitPlan::new(&moment, workspace.plan_scale, workspace.plan_rim_au);
    let (area, response) = ui.allocate_exact_size(ui.available_size().max(vec2(120.0, 120.0)), Sense::click());
    response.widget_info(|| WidgetInfo::labeled(Role::Image, true, description(&plan, &moment)));
    if response.hovered() {
        let wheel = ui.input(|input| input.smooth_scroll_delta().y);
        if wheel.abs() > 0.1 {
            let rim_au = plan.rim_au * (-f64::from(wheel) / 200.0).exp();
            workspace.plan_rim_au = Some(rim_au.clamp(1e-4, 1e6));
        }
    }
    let place = Places { centre: area.center(), reach: 0.5 * area.width().min(area.height()) - 2.0 * GRID };
    draw_ground(ui, &place, area, &plan, palette);
    draw_star(ui, &place, area, &plan, &moment, palette);
    let hovered = response.hover_pos().and_then(|pointer| nearest(&place, &plan, pointer));
    let mut plates: Vec<Rect> = Vec::new();
    for orbit in &plan.orbits {
        let is_marked = workspace.selected == Body::Planet(orbit.planet) || hovered == Some(orbit.planet);
        let mark = Mark { is_strong: is_marked, taken: &plates };
        plates.extend(draw_orbit(ui, &place, area, orbit, &moment, palette, &mark));
    }
    draw_lost(ui, area, &plan, &moment, palette);
    let mut commands = Vec::new();
    if let Some(index) = hovered {
        if response.clicked() {
            commands.push(Command::Select(Body::Planet(index)));
        }
        response.on_hover_text_at_pointer(words(&plan, &moment, index));
    }
    commands
}

/// Screen places of the plan.
struct Places {
    centre: Pos2,
    reach: f32,
}

impl Places {
    fn at(&self, angle: f64, radius: f64) -> Pos2 {
        let length = (radius.min(1e4) as f32) * self.reach;
        self.centre + vec2(angle.cos() as f32, -angle.sin() as f32) * length
    }
}

fn draw_ground(ui: &Ui, place: &Places, area: Rect, plan: &OrbitPlan, palette: &Palette) {
    let painter = ui.painter().with_clip_rect(area);
    if let Some([inner_au, outer_au]) = plan.zone_au {
        painter.add(Shape::mesh(ring(place, plan.radius(inner_au), plan.radius(outer_au), palette.zone)));
        let label =
            place.centre - vec2(0.0, place.reach * (0.5 * (plan.radius(inner_au) + plan.radius(outer_au))) as f32);
        // A narrow zone near the middle would put its name over orbits and star.
        if area.contains(label) && (plan.radius(outer_au) - plan.radius(inner_au)) as f32 * place.reach > 28.0 {
            painter.text(label, Align2::CENTER_CENTER, "habitable zone", small(), palette.dim);
        }
    }
    for ring_au in plan.rings_au() {
        let radius = plan.radius(ring_au) as f32 * place.reach;
        painter.circle_stroke(place.centre, radius, Stroke::new(1.0, palette.hairline));
        let label = place.centre + vec2(radius * 0.707, radius * 0.707);
        painter.text(label, Align2::LEFT_TOP, format!("{} au", number(ring_au, 2)), small(), palette.dim);
    }
}

/// A flat ring between two radii.
fn ring(place: &Places, inner: f64, outer: f64, ink: Color32) -> Mesh {
    let mut mesh = Mesh::default();
    for step in 0..=120_u32 {
        let angle = std::f64::consts::TAU * f64::from(step) / 120.0;
        for radius in [inner, outer] {
            mesh.vertices.push(Vertex { pos: place.at(angle, radius), uv: WHITE_UV, color: ink });
        }
        if step > 0 {
            let first = 2 * step;
            mesh.indices.extend([first - 2, first - 1, first, first - 1, first + 1, first]);
        }
    }
    mesh
}

fn draw_star(ui: &Ui, place: &Places, area: Rect, plan: &OrbitPlan, moment: &Moment, palette: &Palette) {
    let painter = ui.painter().with_clip_rect(area);
    let true_radius = plan.star_radius_au.map_or(0.0, |radius_au| plan.radius(radius_au) as f32 * place.reach);
    let glow = moment.star.swatch.as_ref().filter(|swatch| swatch.chromaticity.is_some());
    let fill = glow.map_or(Color32::from_gray(8), |swatch| {
        let [r, g, b] = swatch.srgb;
        Color32::from_rgb(r, g, b)
    });
    painter.circle(place.centre, true_radius.max(SMALLEST_STAR), fill, Stroke::new(1.0, palette.casing));
    if true_radius < SMALLEST_STAR {
        painter.circle_stroke(place.centre, 7.0, Stroke::new(1.0, palette.dim));
        let corner = area.left_bottom() + vec2(4.0, -4.0);
        painter.text(corner, Align2::LEFT_BOTTOM, "star drawn larger, in a ring", small(), palette.dim);
    }
}

/// How an orbit is drawn, and where names stand already.
struct Mark<'a> {
    is_strong: bool,
    taken: &'a [Rect],
}

/// Draws an orbit with its planet, and its name where that covers no other; returns where the name stands.
fn draw_orbit(
    ui: &Ui,
    place: &Places,
    area: Rect,
    orbit: &Orbit,
    moment: &Moment,
    palette: &Palette,
    mark: &Mark<'_>,
) -> Option<Rect> {
    let planet = moment.planets.get(orbit.planet)?;
    let painter = ui.painter().with_clip_rect(area);
    let ink = palette.planets[orbit.planet % palette.planets.len()];
    let path: Vec<Pos2> = orbit.path.iter().map(|(angle, radius)| place.at(*angle, *radius)).collect();
    painter.add(Shape::line(path, Stroke::new(if mark.is_strong { 2.6 } else { 1.3 }, ink)));
    let at = place.at(orbit.place.0, orbit.place.1);
    painter.circle_filled(at, 9.0, palette.ground);
    state_mark::draw(&painter, at, planet.state, ink);
    let is_right = at.x < area.right() - 90.0;
    let (anchor, shift) = if is_right { (Align2::LEFT_CENTER, 11.0) } else { (Align2::RIGHT_CENTER, -11.0) };
    let galley = painter.layout_no_wrap(planet.name.clone(), small(), palette.text);
    let plate = anchor.anchor_size(at + vec2(shift, 0.0), galley.size());
    if !mark.is_strong && mark.taken.iter().any(|taken| taken.intersects(plate)) {
        return None;
    }
    painter.rect_filled(plate.expand(1.0), 2.0, palette.ground.gamma_multiply(0.75));
    painter.galley(plate.min, galley, palette.text);
    Some(plate)
}

/// Planets without an orbit, by mark and word in the corner.
fn draw_lost(ui: &Ui, area: Rect, plan: &OrbitPlan, moment: &Moment, palette: &Palette) {
    for (row, (index, state)) in plan.lost.iter().enumerate() {
        let Some(planet) = moment.planets.get(*index) else { continue };
        let y = area.top() + 12.0 + 18.0 * row as f32;
        let ink = palette.planets[index % palette.planets.len()];
        state_mark::draw(ui.painter(), pos2(area.left() + 10.0, y), *state, ink);
        let text = format!("{}: {}", planet.name, state.name());
        ui.painter().text(pos2(area.left() + 22.0, y), Align2::LEFT_CENTER, text, small(), palette.text);
    }
}

/// The planet whose orbit or place the pointer is nearest to, if it is near at all.
fn nearest(place: &Places, plan: &OrbitPlan, pointer: Pos2) -> Option<usize> {
    let distance = |orbit: &Orbit| {
        let of_path = orbit.path.iter().map(|(angle, radius)| place.at(*angle, *radius).distance(pointer));
        of_path.fold(place.at(orbit.place.0, orbit.place.1).distance(pointer) - 4.0, f32::min)
    };
    let found = plan.orbits.iter().map(|orbit| (orbit.planet, distance(orbit)));
    found.min_by(|first, second| first.1.total_cmp(&second.1)).filter(|(_, near)| *near < NEAR).map(|(index, _)| index)
}

fn words(plan: &OrbitPlan, moment: &Moment, index: usize) -> String {
    let Some(planet) = moment.planets.get(index) else { return String::new() };
    let reach = plan.orbits.iter().find(|orbit| orbit.planet == index).map(|orbit| orbit.reach_au);
    let reach = reach.map_or_else(String::new, |[least_au, most_au]| {
        if most_au - least_au < 1e-6 * most_au {
            format!(", {} au from the star", number(least_au, 3))
        } else {
            format!(", {} to {} au from the star", number(least_au, 3), number(most_au, 3))
        }
    });
    format!("{}: {}{reach}", planet.name, planet.state.name())
}

fn description(plan: &OrbitPlan, moment: &Moment) -> String {
    let on_orbit = plan.orbits.iter().map(|orbit| words(plan, moment, orbit.planet));
    let lost = plan
        .lost
        .iter()
        .filter_map(|(index, state)| Some(format!("{}: {}", moment.planets.get(*index)?.name, state.name())));
    let all: Vec<String> = on_orbit.chain(lost).collect();
    format!("Plan of the orbits. {}", if all.is_empty() { "No planet".to_owned() } else { all.join("; ") })
}
