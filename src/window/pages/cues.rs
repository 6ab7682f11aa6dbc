//! A show: its cues, a preview that moves the one moment, what to know before an audience sees it, and the export.

use super::cue_rows;
use crate::system::MomentRequest;
use crate::system::cues::{Cue, LONGEST_SHOW_S, MOST_CUES, Schedule, Transition};
use crate::units::show_time::show_time_text;
use crate::window::command::Command;
use crate::window::exports::Export;
use crate::window::system_panel::edit;
use crate::window::theme::{GRID, small};
use crate::window::widgets::icon::{Icon, icon_button};
use crate::window::workspace::Workspace;
use egui::{RichText, ScrollArea, Slider, Ui};
use std::sync::Arc;

/// Show time between the last cue and one that is added, s.
const NEXT_CUE_S: f64 = 10.0;

/// Draws the page.
pub(super) fn show(ui: &mut Ui, workspace: &mut Workspace) -> Vec<Command> {
    let palette = workspace.palette();
    let history = Arc::clone(&workspace.history);
    let cues = workspace.session.scenario().cues.clone();
    workspace.show.update(&history, &cues);
    let mut commands = Vec::new();
    ui.horizontal_wrapped(|ui| {
        let words = "A show runs through the star's life from cue to cue; the moment shown can be made a cue.";
        ui.label(RichText::new(words).font(small()).color(palette.dim));
        if ui.button("Add the moment shown").clicked() {
            if cues.len() < MOST_CUES {
                commands.push(add(workspace));
            } else {
                workspace.say_error(format!("A show holds at most {MOST_CUES} cues."));
            }
        }
        if ui.add_enabled(workspace.show.schedule().is_some(), egui::Button::new("Export frames …")).clicked() {
            commands.push(Command::AskExport(Export::Cues));
        }
    });
    ui.add_space(GRID);
    clock(ui, workspace, &mut commands);
    ui.add_space(GRID);
    ScrollArea::vertical().auto_shrink(false).show(ui, |ui| {
        if cues.is_empty() {
            let words = "No cue yet. Go to a moment on the strip below and add it, then another one.";
            ui.label(RichText::new(words).color(palette.dim));
        }
        for index in 0..cues.len() {
            commands.extend(cue_rows::row(ui, workspace, index));
        }
        if let Some(problem) = workspace.show.problem().filter(|_| !cues.is_empty()) {
            ui.label(RichText::new(problem).color(palette.error));
        }
        for warning in workspace.show.warnings() {
            let (lead, ink) = if warning.is_harmful() { ("Warning: ", palette.error) } else { ("Note: ", palette.dim) };
            ui.label(RichText::new(format!("{lead}{}", warning.text())).color(ink));
        }
        if workspace.show.is_too_long_to_check() {
            let words = "So long a show is looked through for flashes when it is exported from the command line.";
            ui.label(RichText::new(words).color(palette.dim));
        }
        ui.add_space(4.0 * GRID);
    });
    commands
}

/// The show clock: play, pause, and a place to drag.
fn clock(ui: &mut Ui, workspace: &mut Workspace, commands: &mut Vec<Command>) {
    let palette = workspace.palette();
    let Some(length_s) = workspace.show.schedule().map(Schedule::length_s).filter(|length_s| *length_s > 0.0) else {
        return;
    };
    ui.horizontal(|ui| {
        let is_running = workspace.show.is_running;
        let (icon, name) = if is_running { (Icon::Pause, "Pause the show") } else { (Icon::Play, "Play the show") };
        if icon_button(ui, palette, icon, name, true).clicked() {
            commands.push(Command::ToggleShow);
        }
        let mut show_time_s = workspace.show.clock_s.min(length_s);
        ui.spacing_mut().slider_width = (ui.available_width() - 190.0).max(120.0);
        let shown = format!("{} of {}", show_time_text(show_time_s), show_time_text(length_s));
        let slider = Slider::new(&mut show_time_s, 0.0..=length_s).show_value(false);
        let response = ui.add(slider).accessible_name("Show time, seconds");
        if response.changed() {
            commands.push(Command::SetShowTime(show_time_s));
        }
        ui.label(RichText::new(shown).color(palette.dim));
    });
}

/// A cue at the moment shown, after all others.
fn add(workspace: &Workspace) -> Command {
    let last_s = workspace.scenario().cues.iter().map(|cue| cue.show_time_s).reduce(f64::max);
    let show_time_s = last_s.map_or(0.0, |last_s| (last_s + NEXT_CUE_S).min(LONGEST_SHOW_S));
    let moment = MomentRequest::Time(workspace.moment_yr);
    let cue = Cue { show_time_s, moment, transition: Transition::default(), note: String::new() };
    edit("Add a cue", workspace.scenario(), |scenario| scenario.cues.push(cue))
}
