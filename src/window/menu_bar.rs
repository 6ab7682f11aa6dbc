//! Title, menus, undo and redo along the top.

use super::command::{Command, shortcut_of};
use super::fonts::BOLD;
use super::offers::{Menu, Offer, offers};
use super::theme::{GRID, TEXT_SIZE, small};
use super::widgets::icon::{Icon, icon_button};
use super::workspace::Workspace;
use egui::{Align, Button, FontFamily, FontId, Layout, MenuBar, RichText, Ui};

/// Height of the bar, points.
pub(super) const HEIGHT: f32 = 38.0;

/// Draws the bar and returns what it was told.
pub(super) fn show(ui: &mut Ui, workspace: &Workspace) -> Vec<Command> {
    let palette = workspace.palette();
    let mut commands = Vec::new();
    MenuBar::new().ui(ui, |ui| {
        ui.set_height(HEIGHT - 2.0 * GRID);
        ui.add_space(2.0 * GRID);
        let title = RichText::new(&workspace.scenario().title)
            .font(FontId::new(TEXT_SIZE + 1.0, FontFamily::Name(BOLD.into())));
        let room = (ui.available_width() - 500.0).clamp(80.0, 340.0);
        ui.scope(|ui| {
            ui.set_max_width(room);
            ui.add(egui::Label::new(title.color(palette.text)).truncate());
        });
        if workspace.session.is_dirty() {
            ui.label(RichText::new("unsaved").font(small()).color(palette.accent))
                .on_hover_text("Changed since it was last saved");
        }
        ui.add_space(2.0 * GRID);
        let offers = offers(workspace);
        for shown in [Menu::Scenario, Menu::Edit, Menu::View, Menu::Page, Menu::Time, Menu::Help] {
            menu(ui, &offers, shown, &mut commands);
        }
        ui.with_layout(Layout::right_to_left(Align::Center), |ui| {
            ui.add_space(2.0 * GRID);
            let redo = workspace.session.redo_label();
            let name = redo.map_or_else(|| "Nothing to redo".to_owned(), |label| format!("Redo: {label}"));
            if icon_button(ui, palette, Icon::Redo, &name, redo.is_some()).clicked() {
                commands.push(Command::Redo);
            }
            let undo = workspace.session.undo_label();
            let name = undo.map_or_else(|| "Nothing to undo".to_owned(), |label| format!("Undo: {label}"));
            if icon_button(ui, palette, Icon::Undo, &name, undo.is_some()).clicked() {
                commands.push(Command::Undo);
            }
            message(ui, workspace, &mut commands);
        });
    });
    commands
}

/// The last message, or the progress of a computation.
fn message(ui: &mut Ui, workspace: &Workspace, commands: &mut Vec<Command>) {
    let palette = workspace.palette();
    if let Some(percent) = workspace.job.percent() {
        if ui.small_button("Cancel").clicked() {
            commands.push(Command::CancelComputation);
        }
        ui.label(RichText::new(format!("computing … {percent} %")).font(small()).color(palette.dim));
    } else if let Some(notice) = &workspace.notice {
        let ink = if notice.is_error { palette.error } else { palette.dim };
        ui.add(egui::Label::new(RichText::new(&notice.text).font(small()).color(ink)).truncate())
            .on_hover_text(&notice.text);
    }
}

/// A menu with what is offered under its name.
fn menu(ui: &mut Ui, offers: &[Offer], menu: Menu, commands: &mut Vec<Command>) {
    ui.menu_button(menu.name(), |ui| {
        for offer in offers.iter().filter(|offer| offer.menu == menu) {
            if offer.begins_part {
                ui.separator();
            }
            item(ui, offer, commands);
            if offer.command == Command::AskOpen {
                submenu(ui, offers, Menu::Recent, commands);
                submenu(ui, offers, Menu::BuiltIn, commands);
            }
        }
    });
}

fn submenu(ui: &mut Ui, offers: &[Offer], menu: Menu, commands: &mut Vec<Command>) {
    ui.menu_button(menu.name(), |ui| {
        let mut is_empty = true;
        for offer in offers.iter().filter(|offer| offer.menu == menu) {
            is_empty = false;
            item(ui, offer, commands);
        }
        if is_empty {
            ui.weak("No file yet");
        }
    });
}

/// A menu item with its key.
fn item(ui: &mut Ui, offer: &Offer, commands: &mut Vec<Command>) {
    let key = shortcut_of(&offer.command).map(|shortcut| ui.ctx().format_shortcut(&shortcut)).unwrap_or_default();
    let clicked = if let Some(is_chosen) = offer.is_chosen {
        let words = if key.is_empty() { offer.words.clone() } else { format!("{}   {key}", offer.words) };
        ui.radio(is_chosen, words).clicked()
    } else {
        let button = Button::new(&offer.words);
        let button = if key.is_empty() { button } else { button.shortcut_text(key) };
        ui.add_enabled(offer.is_possible, button).clicked()
    };
    if clicked {
        commands.push(offer.command.clone());
        ui.close();
    }
}
