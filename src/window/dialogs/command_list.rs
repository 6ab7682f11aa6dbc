//! Every command with a field to search: type a few letters of its words, choose with the arrows, Enter does it.

use super::{Answer, Reply};
use crate::window::command::shortcut_of;
use crate::window::offers::{Offer, offers};
use crate::window::theme::{GRID, ROW, small, usual};
use crate::window::workspace::Workspace;
use egui::{Align2, Key, Rect, Role, ScrollArea, Sense, TextEdit, Ui, WidgetInfo, pos2, vec2};

/// What was typed and which row is chosen.
#[derive(Debug, Default)]
pub(in crate::window) struct Search {
    typed: String,
    row: usize,
    has_focus: bool,
}

/// Draws field and list.
pub(super) fn show(ui: &mut Ui, workspace: &Workspace, search: &mut Search) -> Answer {
    let [up, down, enter] = [Key::ArrowUp, Key::ArrowDown, Key::Enter]
        .map(|key| ui.input_mut(|input| input.consume_key(egui::Modifiers::NONE, key)));
    let field =
        TextEdit::singleline(&mut search.typed).desired_width(f32::INFINITY).hint_text("Type what you want to do");
    let response = ui.add(field).accessible_name("Search all commands");
    if !search.has_focus {
        response.request_focus();
        search.has_focus = true;
    }
    if response.changed() {
        search.row = 0;
    }
    let found: Vec<Offer> =
        offers(workspace).into_iter().filter(|offer| offer.is_possible && is_meant(offer, &search.typed)).collect();
    search.row = match (up, down) {
        (true, _) => search.row.saturating_sub(1),
        (_, true) => search.row + 1,
        _ => search.row,
    }
    .min(found.len().saturating_sub(1));
    let mut clicked = None;
    ScrollArea::vertical().max_height(14.0 * ROW).auto_shrink([false, true]).show(ui, |ui| {
        ui.spacing_mut().item_spacing.y = 0.0;
        for (index, offer) in found.iter().enumerate() {
            if row(ui, workspace, offer, index == search.row, up || down) {
                clicked = Some(index);
            }
        }
        if found.is_empty() {
            ui.weak("No command has these words.");
        }
    });
    match clicked.or((enter && !found.is_empty()).then_some(search.row)) {
        Some(index) => Answer::Close(vec![Reply::Do(found[index].command.clone())]),
        None => Answer::Wait,
    }
}

/// Whether an offer holds every word that was typed, in any order.
fn is_meant(offer: &Offer, typed: &str) -> bool {
    let words = format!("{} {}", offer.menu.name(), offer.words).to_lowercase();
    typed.to_lowercase().split_whitespace().all(|part| words.contains(part))
}

/// One row: where the command stands, its words, its key. Returns whether it was clicked.
fn row(ui: &mut Ui, workspace: &Workspace, offer: &Offer, is_chosen: bool, has_moved: bool) -> bool {
    let palette = workspace.palette();
    let (rect, response) = ui.allocate_exact_size(vec2(ui.available_width(), ROW), Sense::click());
    response.widget_info(|| WidgetInfo::selected(Role::Button, true, is_chosen, &offer.words));
    if is_chosen || response.hovered() {
        ui.painter().rect_filled(rect, 3.0, palette.chosen);
    }
    if is_chosen {
        let bar = Rect::from_min_max(rect.left_top(), pos2(rect.left() + 2.0, rect.bottom()));
        ui.painter().rect_filled(bar, 0.0, palette.accent);
        if has_moved {
            response.scroll_to_me(None);
        }
    }
    let y = rect.center().y;
    let left = rect.left() + 2.0 * GRID;
    ui.painter().text(pos2(left, y), Align2::LEFT_CENTER, offer.menu.name(), small(), palette.dim);
    ui.painter().text(pos2(left + 120.0, y), Align2::LEFT_CENTER, &offer.words, usual(), palette.text);
    if let Some(shortcut) = shortcut_of(&offer.command) {
        let key = ui.ctx().format_shortcut(&shortcut);
        ui.painter().text(pos2(rect.right() - 2.0 * GRID, y), Align2::RIGHT_CENTER, key, small(), palette.dim);
    }
    response.clicked()
}
