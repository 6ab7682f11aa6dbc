//! A field for a name or a title: the change is taken when the field is left.

use crate::window::theme::Palette;
use crate::window::widgets::draft::keep_draft;
use egui::{Id, Key, TextEdit, Ui};

/// A text field that returns a new text when it was entered; Escape brings the old one back.
pub(crate) fn text_entry(
    ui: &mut Ui,
    palette: &Palette,
    name: &str,
    value: &str,
    longest: usize,
    width: f32,
) -> Option<String> {
    let id = Id::unique(("text_entry", name));
    let draft = ui.data(|data| data.get_temp::<String>(id));
    let mut text = draft.unwrap_or_else(|| value.to_owned());
    let field = TextEdit::singleline(&mut text)
        .id(id.with("field"))
        .desired_width(width)
        .text_color(palette.text)
        .char_limit(longest);
    let response = ui.add(field).accessible_name(name);
    let given_up = ui.input(|input| input.key_pressed(Key::Escape));
    let is_editing = response.has_focus() && !given_up;
    keep_draft(ui, id, is_editing.then(|| text.clone()));
    let trimmed = text.trim();
    (response.lost_focus() && !given_up && trimmed != value && !trimmed.is_empty()).then(|| trimmed.to_owned())
}
