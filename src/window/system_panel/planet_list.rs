//! The planets as rows with their state now; a row can be chosen, added, copied, moved, removed.

use super::edit;
use crate::system::limits::MOST_PLANETS;
use crate::system::{Body, PlanetMoment, PlanetSpecification};
use crate::units::number_text::number;
use crate::window::command::Command;
use crate::window::theme::{GRID, ROW, small, usual};
use crate::window::widgets::heading::section;
use crate::window::widgets::state_mark;
use crate::window::workspace::Workspace;
use egui::{Align2, RichText, Role, Sense, Ui, WidgetInfo, pos2, vec2};

/// Draws the list with its buttons.
pub(super) fn show(ui: &mut Ui, workspace: &Workspace) -> Vec<Command> {
    let palette = workspace.palette();
    let mut commands = Vec::new();
    section(ui, palette, "Planets");
    let planets = &workspace.scenario().system.planets;
    if planets.is_empty() {
        ui.label(RichText::new("No planet yet. Add one to see what the star does to it.").color(palette.dim));
    }
    let moments = workspace.moment().planets;
    for (index, planet) in planets.iter().enumerate() {
        // While a new history is being computed the old one may have fewer planets.
        let moment = moments.get(index).filter(|moment| moment.name == planet.name);
        if row(ui, workspace, index, planet, moment) {
            let already = workspace.selected == Body::Planet(index);
            commands.push(Command::Select(if already { Body::Star } else { Body::Planet(index) }));
        }
    }
    ui.add_space(GRID);
    ui.horizontal_wrapped(|ui| commands.extend(buttons(ui, workspace)));
    commands
}

fn row(
    ui: &mut Ui,
    workspace: &Workspace,
    index: usize,
    planet: &PlanetSpecification,
    moment: Option<&PlanetMoment>,
) -> bool {
    let palette = workspace.palette();
    let (rect, response) = ui.allocate_exact_size(vec2(ui.available_width(), ROW + 2.0), Sense::click());
    let is_chosen = workspace.selected == Body::Planet(index);
    let state = moment.map_or("being computed", |moment| moment.state.name());
    response.widget_info(|| WidgetInfo::selected(Role::Button, true, is_chosen, format!("{}, {state}", planet.name)));
    if is_chosen || response.hovered() || response.has_focus() {
        ui.painter().rect_filled(rect, 4.0, palette.chosen);
    }
    if response.has_focus() {
        ui.painter().rect_stroke(rect, 4.0, egui::Stroke::new(1.0, palette.accent), egui::StrokeKind::Inside);
    }
    let ink = palette.planets[index % palette.planets.len()];
    let y = rect.center().y;
    if let Some(moment) = moment {
        state_mark::draw(ui.painter(), pos2(rect.left() + 12.0, y), moment.state, ink);
    }
    let painter = ui.painter().with_clip_rect(rect);
    let state_width = painter.layout_no_wrap(state.to_owned(), small(), palette.dim).size().x;
    painter.text(pos2(rect.right() - 6.0, y), Align2::RIGHT_CENTER, state, small(), palette.dim);
    let axis_au = moment.and_then(|moment| moment.semi_major_axis_au);
    let distance = axis_au.map_or_else(String::new, |axis_au| format!("{} au", number(axis_au, 3)));
    painter.text(pos2(rect.right() - 74.0, y), Align2::RIGHT_CENTER, distance, small(), palette.dim);
    let name_room =
        egui::Rect::from_min_max(rect.min, pos2(rect.right() - 80.0 - 48.0_f32.min(state_width), rect.max.y));
    painter.with_clip_rect(name_room).text(
        pos2(rect.left() + 24.0, y),
        Align2::LEFT_CENTER,
        &planet.name,
        usual(),
        palette.text,
    );
    response.on_hover_text(format!("{}: {state}", planet.name)).clicked()
}

fn buttons(ui: &mut Ui, workspace: &Workspace) -> Vec<Command> {
    let scenario = workspace.scenario();
    let count = scenario.system.planets.len();
    let mut commands = Vec::new();
    let has_room = count < MOST_PLANETS;
    let add = ui.add_enabled(has_room, egui::Button::new("Add planet"));
    if add.on_disabled_hover_text(format!("A system holds at most {MOST_PLANETS} planets.")).clicked() {
        let name = scenario.system.free_planet_name("Planet");
        let widest = scenario.system.planets.iter().map(|planet| planet.semi_major_axis_au).fold(0.0, f64::max);
        let semi_major_axis_au = if widest > 0.0 { (widest * 1.6).min(1e5) } else { 1.0 };
        commands.push(edit(format!("Add {name}"), scenario, |scenario| {
            scenario.system.planets.push(PlanetSpecification {
                name,
                semi_major_axis_au,
                ..PlanetSpecification::default()
            });
        }));
        commands.push(Command::Select(Body::Planet(count)));
    }
    let Body::Planet(index) = workspace.selected else { return commands };
    let Some(planet) = scenario.system.planets.get(index) else { return commands };
    let small_button = |ui: &mut Ui, text: &str, name: String, is_enabled: bool| {
        ui.add_enabled(is_enabled, egui::Button::new(text)).accessible_name(name.clone()).on_hover_text(name).clicked()
    };
    if small_button(ui, "Copy", format!("Copy {}", planet.name), has_room) {
        let mut copy = planet.clone();
        copy.name = scenario.system.free_planet_name(&planet.name);
        commands.push(edit(format!("Copy {}", planet.name), scenario, |scenario| {
            scenario.system.planets.insert(index + 1, copy);
        }));
        commands.push(Command::Select(Body::Planet(index + 1)));
    }
    if small_button(ui, "↑", format!("Move {} up", planet.name), index > 0) {
        commands.push(edit(format!("Move {} up", planet.name), scenario, |scenario| {
            scenario.system.planets.swap(index, index - 1);
        }));
        commands.push(Command::Select(Body::Planet(index - 1)));
    }
    if small_button(ui, "↓", format!("Move {} down", planet.name), index + 1 < count) {
        commands.push(edit(format!("Move {} down", planet.name), scenario, |scenario| {
            scenario.system.planets.swap(index, index + 1);
        }));
        commands.push(Command::Select(Body::Planet(index + 1)));
    }
    if small_button(ui, "Remove", format!("Remove {}", planet.name), true) {
        commands.push(edit(format!("Remove {}", planet.name), scenario, |scenario| {
            scenario.system.planets.remove(index);
        }));
        commands.push(Command::Select(Body::Star));
    }
    commands
}
