//! Title, menus, undo and redo along the top.

use super::command::{Command, shortcut_of};
use super::exports::Export;
use super::fonts::BOLD;
use super::theme::{GRID, TEXT_SIZE, small};
use super::widgets::icon::{Icon, icon_button};
use super::workspace::Workspace;
use crate::document::{Theme, built_in};
use crate::units::time_words::SpanStyle;
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
        let room = (ui.available_width() - 420.0).clamp(80.0, 340.0);
        ui.scope(|ui| {
            ui.set_max_width(room);
            ui.add(egui::Label::new(title.color(palette.text)).truncate());
        });
        if workspace.session.is_dirty() {
            ui.label(RichText::new("unsaved").font(small()).color(palette.accent))
                .on_hover_text("Changed since it was last saved");
        }
        ui.add_space(2.0 * GRID);
        scenario_menu(ui, workspace, &mut commands);
        edit_menu(ui, workspace, &mut commands);
        view_menu(ui, workspace, &mut commands);
        ui.menu_button("Help", |ui| {
            item(ui, "All keys", Command::ShowKeys, true, &mut commands);
            item(ui, "About Longember", Command::ShowAbout, true, &mut commands);
        });
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

fn scenario_menu(ui: &mut Ui, workspace: &Workspace, commands: &mut Vec<Command>) {
    ui.menu_button("Scenario", |ui| {
        item(ui, "New", Command::New, true, commands);
        item(ui, "Open …", Command::AskOpen, true, commands);
        ui.menu_button("Open recent", |ui| {
            let recent = workspace.settings.recent_files();
            if recent.is_empty() {
                ui.label(RichText::new("No file yet").color(workspace.palette().dim));
            }
            for path in recent {
                let name = path.file_name().unwrap_or(path.as_os_str()).to_string_lossy();
                if ui.button(name).on_hover_text(path.to_string_lossy()).clicked() {
                    commands.push(Command::Open(path.clone()));
                    ui.close();
                }
            }
        });
        ui.menu_button("Built-in scenarios", |ui| {
            for scenario in built_in::all() {
                let title = scenario.scenario().map_or_else(|_| scenario.name.to_owned(), |sheet| sheet.title);
                if ui.button(title).clicked() {
                    commands.push(Command::OpenBuiltIn(scenario.name));
                    ui.close();
                }
            }
        });
        ui.separator();
        item(ui, "Save", Command::Save, true, commands);
        item(ui, "Save as …", Command::AskSaveAs, true, commands);
        ui.separator();
        item(ui, "Export figure …", Command::AskExport(Export::Figure), true, commands);
        item(ui, "Export fact sheet …", Command::AskExport(Export::Sheet), true, commands);
        item(ui, "Export table …", Command::AskExport(Export::Table), true, commands);
        item(ui, "Copy fact sheet", Command::CopySheet, true, commands);
        ui.separator();
        item(ui, "Quit", Command::Quit, true, commands);
    });
}

fn edit_menu(ui: &mut Ui, workspace: &Workspace, commands: &mut Vec<Command>) {
    ui.menu_button("Edit", |ui| {
        let undo = workspace.session.undo_label();
        let text = undo.map_or_else(|| "Undo".to_owned(), |label| format!("Undo: {label}"));
        item(ui, &text, Command::Undo, undo.is_some(), commands);
        let redo = workspace.session.redo_label();
        let text = redo.map_or_else(|| "Redo".to_owned(), |label| format!("Redo: {label}"));
        item(ui, &text, Command::Redo, redo.is_some(), commands);
    });
}

fn view_menu(ui: &mut Ui, workspace: &Workspace, commands: &mut Vec<Command>) {
    ui.menu_button("View", |ui| {
        for theme in Theme::ALL {
            if ui.radio(workspace.theme() == theme, theme_name(theme)).clicked() {
                commands.push(Command::SetTheme(theme));
                ui.close();
            }
        }
        ui.separator();
        for scale in crate::system::TimeScale::ALL {
            if ui.radio(workspace.scale == scale, format!("{} time", scale.key())).clicked() {
                commands.push(Command::SetScale(scale));
                ui.close();
            }
        }
        ui.separator();
        for (style, text) in
            [(SpanStyle::Symbols, "Times as 7.600 Gyr"), (SpanStyle::Words, "Times as 7.600 billion years")]
        {
            if ui.radio(workspace.settings.span_style == style, text).clicked() {
                commands.push(Command::SetSpanStyle(style));
                ui.close();
            }
        }
        ui.separator();
        item(ui, "Whole life", Command::ShowWhole, workspace.view.width() < 1.0, commands);
    });
}

/// A theme in words for the menu.
fn theme_name(theme: Theme) -> &'static str {
    match theme {
        Theme::Dark => "Dark",
        Theme::Light => "Light",
        Theme::Dome => "Dome (dim amber)",
    }
}

/// A menu item with its key.
fn item(ui: &mut Ui, text: &str, command: Command, is_enabled: bool, commands: &mut Vec<Command>) {
    let mut button = Button::new(text);
    if let Some(shortcut) = shortcut_of(&command) {
        button = button.shortcut_text(ui.ctx().format_shortcut(&shortcut));
    }
    if ui.add_enabled(is_enabled, button).clicked() {
        commands.push(command);
        ui.close();
    }
}
