//! A field for a number with a unit: takes what people type, keeps what it cannot understand.

use crate::system::limits::Limit;
use crate::units::entry::{EntryKind, parse_entry, write_entry};
use crate::window::theme::{GRID, Palette, ROW, small};
use crate::window::widgets::draft::keep_draft;
use egui::{
    Align2, Context, CursorIcon, Id, Key, Modifiers, RichText, Sense, Stroke, StrokeKind, TextEdit, Ui, pos2, vec2,
};

/// Width of the field itself, points.
const FIELD_WIDTH: f32 = 84.0;
/// A fine step against a usual one.
const FINE: f64 = 0.1;
/// Points that a drag takes for a step.
const POINTS_A_STEP: f32 = 4.0;
/// Width of the unit beside it, points.
const UNIT_WIDTH: f32 = 28.0;

/// What stays in a field between frames: the text being typed, and why it was refused.
#[derive(Clone, Default)]
struct Draft {
    text: String,
    refusal: Option<String>,
}

/// One row: name, field, unit. Returns a new permitted value when one was entered.
///
/// What cannot be understood stays in the field, outlined, with the reason below it;
/// the model keeps the last good value. Escape brings that value back.
pub(crate) fn value_entry(ui: &mut Ui, palette: &Palette, body: &str, limit: &Limit, value: f64) -> Option<f64> {
    let id = Id::unique(("value_entry", body, limit.key));
    let mut draft = ui.data(|data| data.get_temp::<Draft>(id));
    let mut text = draft.as_ref().map_or_else(|| write_entry(value, limit.entry), |draft| draft.text.clone());
    let accessible_name = format!("{} of {body}", limit.name);
    let mut steps = 0.0;
    let field_id = id.with("field");
    if ui.memory(|memory| memory.has_focus(field_id)) {
        steps += arrow_steps(ui);
    }
    let response = ui
        .horizontal(|ui| {
            steps += name_label(ui, palette, limit);
            ui.with_layout(egui::Layout::right_to_left(egui::Align::Center), |ui| {
                unit_label(ui, palette, if limit.entry == EntryKind::SpanYr { "" } else { limit.entry.symbol() });
                let field = TextEdit::singleline(&mut text)
                    .id(field_id)
                    .align(egui::Align2::RIGHT_CENTER)
                    .desired_width(FIELD_WIDTH - 2.0 * GRID);
                ui.add(field).accessible_name(accessible_name)
            })
            .inner
        })
        .inner;
    if steps != 0.0 {
        keep_draft::<Draft>(ui, id, None);
        ui.data_mut(|data| data.insert_temp(nudge_id(), true));
        let moved = limit.nudged(value, steps);
        return (moved != value).then_some(moved);
    }
    let mut entered = None;
    if response.has_focus() || response.lost_focus() {
        let given_up = ui.input(|input| input.key_pressed(Key::Escape));
        if given_up {
            draft = None;
        } else if response.lost_focus() {
            (entered, draft) = take(&text, limit, value);
        } else {
            let refusal = draft.and_then(|draft| draft.refusal);
            draft = Some(Draft { text, refusal });
        }
    }
    if response.gained_focus() {
        select_all(ui, response.id);
    }
    let refusal = draft.as_ref().and_then(|draft| draft.refusal.clone());
    keep_draft(ui, id, draft);
    match refusal {
        Some(refusal) => {
            ui.painter().rect_stroke(
                response.rect.expand(1.0),
                4.0,
                Stroke::new(1.5, palette.error),
                StrokeKind::Outside,
            );
            ui.label(RichText::new(refusal).font(small()).color(palette.error));
        }
        None => {
            response.on_hover_text(format!("{} Allowed: {}.", limit.meaning, limit.allowed()));
        }
    }
    entered
}

/// Judges a finished text: the new value, or the draft to keep.
fn take(text: &str, limit: &Limit, current: f64) -> (Option<f64>, Option<Draft>) {
    if text == write_entry(current, limit.entry) {
        return (None, None);
    }
    let judged = parse_entry(text, limit.entry)
        .map_err(|problem| problem.to_string())
        .and_then(|value| limit.check(value).map_err(|_| format!("allowed: {}", limit.allowed())));
    match judged {
        Ok(value) => ((value != current).then_some(value), None),
        Err(refusal) => (None, Some(Draft { text: text.to_owned(), refusal: Some(refusal) })),
    }
}

/// Steps by arrow keys: up and down one, with Shift a tenth.
fn arrow_steps(ui: &Ui) -> f64 {
    let mut steps = 0.0;
    ui.input_mut(|input| {
        for (modifiers, step) in [(Modifiers::SHIFT, FINE), (Modifiers::NONE, 1.0)] {
            steps += step * input.count_and_consume_key(modifiers, Key::ArrowUp) as f64;
            steps -= step * input.count_and_consume_key(modifiers, Key::ArrowDown) as f64;
        }
    });
    steps
}

/// The name of the field; dragged sideways it changes the value. Returns the steps dragged in this frame.
fn name_label(ui: &mut Ui, palette: &Palette, limit: &Limit) -> f64 {
    // The keyboard has the field itself: the name is for the pointer only.
    let (rect, response) = ui.allocate_exact_size(vec2(96.0, ROW), Sense::DRAG);
    let ink = if response.hovered() || response.dragged() { palette.accent } else { palette.text };
    let left = pos2(rect.left(), rect.center().y);
    ui.painter().text(left, Align2::LEFT_CENTER, limit.name, crate::window::theme::usual(), ink);
    let fine = if ui.input(|input| input.modifiers.shift) { FINE } else { 1.0 };
    let steps = f64::from(response.drag_delta().x / POINTS_A_STEP) * fine;
    response.on_hover_cursor(CursorIcon::ResizeHorizontal).on_hover_text(format!(
        "{} Allowed: {}. Drag sideways to change it, with Shift finely.",
        limit.meaning,
        limit.allowed()
    ));
    steps
}

/// Whether a value of this frame came from an arrow key or a drag: such values belong to one step of undo.
pub(crate) fn take_nudge(context: &Context) -> bool {
    context.data_mut(|data| data.remove_temp::<bool>(nudge_id())).unwrap_or(false)
}

fn nudge_id() -> Id {
    Id::unique("value_entry_nudge")
}

/// A unit of fixed width, so that fields stand under each other.
fn unit_label(ui: &mut Ui, palette: &Palette, symbol: &str) {
    let (rect, _) = ui.allocate_exact_size(vec2(UNIT_WIDTH, ROW), Sense::hover());
    ui.painter().text(pos2(rect.left(), rect.center().y), Align2::LEFT_CENTER, symbol, small(), palette.dim);
}

/// Selects the whole text of a field, so that typing replaces it.
fn select_all(ui: &Ui, id: Id) {
    if let Some(mut state) = egui::text_edit::TextEditState::load(ui.ctx(), id) {
        let all = egui::text::CCursorRange::two(egui::text::CCursor::new(0), egui::text::CCursor::new(usize::MAX));
        state.cursor.set_char_range(Some(all));
        state.store(ui.ctx(), id);
    }
}
