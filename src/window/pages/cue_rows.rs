//! One cue: show time, moment, transition, note, and what can be done with it.

use crate::document::LONGEST_NOTE;
use crate::system::MomentRequest;
use crate::system::cues::{Cue, LONGEST_SHOW_S, Transition};
use crate::units::show_time::{parse_show_time, show_time_text};
use crate::window::command::{Command, TimeCommand};
use crate::window::system_panel::edit;
use crate::window::theme::{Palette, small};
use crate::window::widgets::draft::keep_draft;
use crate::window::widgets::text_entry::text_entry;
use crate::window::workspace::Workspace;
use egui::{Button, ComboBox, Id, Key, RichText, Stroke, StrokeKind, TextEdit, Ui};

/// Longest text of a moment, characters.
const LONGEST_MOMENT: usize = 120;

/// Width of the field for it: room for an event of a planet.
const MOMENT_WIDTH: f32 = 300.0;

/// Room for the button beside the note, with its air.
const REMOVE_WIDTH: f32 = 84.0;

/// Draws a cue and returns what it was told.
pub(super) fn row(ui: &mut Ui, workspace: &Workspace, index: usize) -> Vec<Command> {
    let palette = workspace.palette();
    let Some(cue) = workspace.scenario().cues.get(index) else { return Vec::new() };
    let number = index + 1;
    let mut commands = Vec::new();
    let mut refusal = None;
    ui.horizontal_wrapped(|ui| {
        let is_under_way = workspace.show.cue() == Some(index);
        let mark = if is_under_way { "→" } else { " " };
        ui.label(RichText::new(format!("{mark} {number}")).color(palette.text));
        let name = format!("Show time of cue {number}");
        match checked_entry(ui, palette, &name, &show_time_text(cue.show_time_s), 74.0, |text| {
            let show_time_s = parse_show_time(text).map_err(|problem| problem.to_string())?;
            let is_allowed = show_time_s <= LONGEST_SHOW_S;
            is_allowed
                .then_some(show_time_s)
                .ok_or_else(|| format!("allowed: up to {}", show_time_text(LONGEST_SHOW_S)))
        }) {
            Entry::Taken(show_time_s) => commands.push(moved(workspace, index, show_time_s)),
            Entry::Refused(reason) => refusal = Some(reason),
            Entry::Nothing => {}
        }
        let name = format!("Moment of cue {number}");
        let moment = |text: &str| {
            let moment = MomentRequest::parse(text).map_err(|problem| problem.to_string())?;
            let present_yr = workspace.history.system().star.present_age_yr;
            moment.time_yr(&workspace.history, Some(present_yr)).map_err(|problem| problem.to_string())?;
            Ok(moment)
        };
        match checked_entry(ui, palette, &name, &cue.moment.text(), MOMENT_WIDTH, moment) {
            Entry::Taken(moment) => commands.push(change(workspace, index, "moment", move |cue| cue.moment = moment)),
            Entry::Refused(reason) => refusal = refusal.take().or(Some(reason)),
            Entry::Nothing => {}
        }
        commands.extend(transition(ui, workspace, index, cue.transition));
        let present_yr = workspace.history.system().star.present_age_yr;
        let go = cue.moment.time_yr(&workspace.history, Some(present_yr)).ok();
        if button(ui, "Go there", format!("Go to the moment of cue {number}"), go.is_some())
            && let Some(time_yr) = go
        {
            commands.push(Command::Time(TimeCommand::To(time_yr)));
        }
        if button(ui, "Moment shown", format!("Take the moment shown for cue {number}"), true) {
            let moment = MomentRequest::Time(workspace.moment_yr);
            commands.push(change(workspace, index, "moment", move |cue| cue.moment = moment));
        }
    });
    if let Some(refusal) = refusal {
        ui.label(RichText::new(refusal).font(small()).color(palette.error));
    }
    ui.horizontal(|ui| {
        let name = format!("Note of cue {number}");
        let width = (ui.available_width() - REMOVE_WIDTH).max(80.0);
        if let Some(note) = text_entry(ui, palette, &name, &cue.note, LONGEST_NOTE, width) {
            commands.push(change(workspace, index, "note", move |cue| cue.note = note));
        }
        if button(ui, "Remove", format!("Remove cue {number}"), true) {
            commands.push(edit(format!("Remove cue {number}"), workspace.scenario(), |scenario| {
                scenario.cues.remove(index);
            }));
        }
    });
    ui.separator();
    commands
}

fn transition(ui: &mut Ui, workspace: &Workspace, index: usize, chosen: Transition) -> Option<Command> {
    let mut command = None;
    let name = format!("Transition of cue {}", index + 1);
    let list = ComboBox::from_id_salt(&name).width(120.0).selected_text(chosen.name()).show_ui(ui, |ui| {
        for transition in Transition::ALL {
            if ui.selectable_label(transition == chosen, transition.name()).clicked() && transition != chosen {
                command = Some(change(workspace, index, "transition", move |cue| cue.transition = transition));
            }
        }
    });
    list.response.accessible_name(name).on_hover_text("How the show comes here from the cue before");
    command
}

fn change(workspace: &Workspace, index: usize, what: &str, change: impl FnOnce(&mut Cue)) -> Command {
    edit(format!("Change the {what} of cue {}", index + 1), workspace.scenario(), |scenario| {
        if let Some(cue) = scenario.cues.get_mut(index) {
            change(cue);
        }
    })
}

/// A new show time; rows stand in the order of the show.
fn moved(workspace: &Workspace, index: usize, show_time_s: f64) -> Command {
    edit(format!("Change the show time of cue {}", index + 1), workspace.scenario(), |scenario| {
        if let Some(cue) = scenario.cues.get_mut(index) {
            cue.show_time_s = show_time_s;
        }
        scenario.cues.sort_by(|first, second| first.show_time_s.total_cmp(&second.show_time_s));
    })
}

fn button(ui: &mut Ui, text: &str, name: String, is_enabled: bool) -> bool {
    ui.add_enabled(is_enabled, Button::new(text)).accessible_name(name.clone()).on_hover_text(name).clicked()
}

/// What became of a field.
enum Entry<T> {
    Nothing,
    Taken(T),
    Refused(String),
}

/// A field whose text has to mean something: what does not stays, outlined; Escape brings the old text back.
fn checked_entry<T>(
    ui: &mut Ui,
    palette: &Palette,
    name: &str,
    value: &str,
    width: f32,
    judge: impl Fn(&str) -> Result<T, String>,
) -> Entry<T> {
    let id = Id::unique(("checked_entry", name));
    let draft = ui.data(|data| data.get_temp::<String>(id));
    let mut text = draft.clone().unwrap_or_else(|| value.to_owned());
    let field = TextEdit::singleline(&mut text).id(id.with("field")).desired_width(width).char_limit(LONGEST_MOMENT);
    let response = ui.add(field).accessible_name(name);
    if ui.input(|input| input.key_pressed(Key::Escape)) && (response.has_focus() || response.lost_focus()) {
        keep_draft::<String>(ui, id, None);
        return Entry::Nothing;
    }
    if response.has_focus() {
        keep_draft(ui, id, Some(text));
        return Entry::Nothing;
    }
    if text == value {
        keep_draft::<String>(ui, id, None);
        return Entry::Nothing;
    }
    match judge(&text) {
        Ok(taken) => {
            keep_draft::<String>(ui, id, None);
            Entry::Taken(taken)
        }
        Err(reason) => {
            keep_draft(ui, id, Some(text));
            ui.painter().rect_stroke(
                response.rect.expand(1.0),
                4.0,
                Stroke::new(1.5, palette.error),
                StrokeKind::Outside,
            );
            Entry::Refused(reason)
        }
    }
}
