//! The star's altitude: a slider to drag or step, and a field to type into.

use crate::units::entry::{EntryKind, parse_entry, write_entry};
use crate::window::theme::{Palette, small};
use crate::window::widgets::draft::keep_draft;
use egui::{EventFilter, Id, InputState, Key, Modifiers, Response, RichText, Slider, Stroke, StrokeKind, TextEdit, Ui};

/// Lowest and highest altitude, degrees.
const RANGE_DEG: [f64; 2] = [0.0, 90.0];

/// Draws both and returns a new altitude.
pub(super) fn show(ui: &mut Ui, palette: &Palette, altitude_deg: f64) -> Option<f64> {
    let moved = slider(ui, palette, altitude_deg);
    let typed = field(ui, palette, altitude_deg);
    typed.or(moved).filter(|chosen| *chosen != altitude_deg)
}

fn slider(ui: &mut Ui, palette: &Palette, altitude_deg: f64) -> Option<f64> {
    let mut dragged = altitude_deg;
    let slider = ui
        .scope(|ui| {
            ui.spacing_mut().slider_width = 64.0;
            // A rail of the colour of fields could not be seen on a light ground.
            ui.visuals_mut().widgets.inactive.bg_fill = palette.hairline;
            let slider = Slider::new(&mut dragged, RANGE_DEG[0]..=RANGE_DEG[1]).show_value(false).step_by(0.5);
            ui.add(slider).accessible_name("Altitude of the star, degrees")
        })
        .inner;
    let is_dragged = slider.changed();
    let stepped = stepped(ui, &slider, altitude_deg);
    slider.on_hover_text("Drag it, or press arrow up and down");
    stepped.or_else(|| is_dragged.then_some(dragged))
}

/// The altitude a degree on by arrow up or down; arrows to the side move the moment everywhere.
fn stepped(ui: &Ui, slider: &Response, altitude_deg: f64) -> Option<f64> {
    if !slider.has_focus() {
        return None;
    }
    let own_arrows = EventFilter { vertical_arrows: true, ..EventFilter::default() };
    ui.memory_mut(|memory| memory.set_focus_lock_filter(slider.id, own_arrows));
    let steps = ui.input_mut(|input| {
        let presses = |input: &mut InputState, key| input.count_and_consume_key(Modifiers::NONE, key) as f64;
        presses(input, Key::ArrowUp) - presses(input, Key::ArrowDown)
    });
    (steps != 0.0).then(|| (altitude_deg + steps).clamp(RANGE_DEG[0], RANGE_DEG[1]))
}

/// What is out of range or not understood stays in the field, outlined, with the reason beside it.
fn field(ui: &mut Ui, palette: &Palette, altitude_deg: f64) -> Option<f64> {
    let id = Id::unique("altitude_of_the_star");
    let draft = ui.data(|data| data.get_temp::<String>(id));
    let was_refused = draft.as_ref().is_some_and(|text| judged(text).is_none());
    let mut text = draft.unwrap_or_else(|| format!("{}°", write_entry(altitude_deg, EntryKind::AngleDeg)));
    let field = TextEdit::singleline(&mut text).id(id.with("field")).desired_width(46.0);
    let field = ui.add(field).accessible_name("Altitude of the star, typed");
    let given_up = ui.input(|input| input.key_pressed(Key::Escape));
    let entered = if field.lost_focus() && !given_up { judged(&text) } else { None };
    let is_refused = !field.has_focus() && judged(&text).is_none() && !given_up;
    let keeps_draft = !given_up && (field.has_focus() || is_refused && (field.lost_focus() || was_refused));
    keep_draft(ui, id, keeps_draft.then_some(text));
    if is_refused && keeps_draft {
        ui.painter().rect_stroke(field.rect.expand(1.0), 4.0, Stroke::new(1.5, palette.error), StrokeKind::Outside);
        ui.label(RichText::new("allowed: 0 to 90°").font(small()).color(palette.error));
    } else {
        field.on_hover_text("0° is the horizon, 90° overhead");
    }
    entered
}

fn judged(text: &str) -> Option<f64> {
    parse_entry(text, EntryKind::AngleDeg).ok().filter(|angle_deg| (RANGE_DEG[0]..=RANGE_DEG[1]).contains(angle_deg))
}
